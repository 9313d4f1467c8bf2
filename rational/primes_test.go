package rational

import "testing"

// The sieve against trial division, for every limit: the squares of primes are where it could err.
func TestSieve(t *testing.T) {
	prime := func(n uint32) bool {
		for d := uint32(2); d*d <= n; d++ {
			if n%d == 0 {
				return false
			}
		}
		return n > 1
	}
	var want []uint32
	for n := uint32(2); n < 3000; n++ {
		if prime(n) {
			want = append(want, n)
		}
		got := sieve(n)
		if len(got) != len(want) || got[len(got)-1] != want[len(want)-1] {
			t.Fatalf("%d primes up to %d, the last %d; want %d, %d", len(got), n, got[len(got)-1], len(want), want[len(want)-1])
		}
	}
}

// The quick route of Float64 must refuse next to a tie, and be taken nearly always.
func TestQuickFloat64(t *testing.T) {
	taken := 0
	for n := int64(1); n <= 3000; n++ {
		for d := int64(1); d < 40; d++ {
			s := Ratio(n, d).Mul(Root(n+d, 1))
			f, ok := s.quick()
			if !ok {
				continue
			}
			taken++
			if want, _ := s.Float(400).Float64(); f != want {
				t.Fatalf("%v = %g, want %g", s, f, want)
			}
		}
	}
	if taken < 3000*39-10 {
		t.Errorf("the quick route was taken %d times", taken)
	}
	if f, ok := Ratio(1<<53+1, 1).quick(); ok {
		t.Errorf("a tie is rounded to %v", f)
	}
}
