package racah_test

import (
	"math"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/internal/verify"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// compareNineJ demands the bits of the exact route, rounded.
func compareNineJ(t *testing.T, q [9]int) float64 {
	t.Helper()
	got := racah.NineJFloat(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]), h(q[6]), h(q[7]), h(q[8]))
	if want := nineJValue(q).Float64(); math.Float64bits(got) != math.Float64bits(want) {
		t.Fatalf("9j %v (halves) = %g, exact %g", q, got, want)
	}
	return got
}

// Every symbol with 2j to 6, bit for bit.
func TestRoundedNineJExhaustive(t *testing.T) {
	top := 6
	if testing.Short() {
		top = 4
	}
	racah.Fallbacks()
	values, zeros := 0, 0
	nineJs(top, func(q [9]int) {
		values++
		if compareNineJ(t, q) == 0 {
			zeros++
		}
	})
	t.Logf("%d symbols, %d of them zero; %d by the exact route", values, zeros, racah.Fallbacks())
	if zeros < values/100 {
		t.Error("too few zeros")
	}
}

// Random symbols up to sizes that only the long route takes, with nearly stretched ones.
func TestRoundedNineJRandom(t *testing.T) {
	r := rand.New(rand.NewPCG(23, 23))
	between := func(lo, hi int) int { return lo + r.IntN(hi-lo+1) }
	couple := func(a, b int) int {
		if r.IntN(4) == 0 {
			return a + b - 2*between(0, min(2, a, b))
		}
		return max(a-b, b-a) + 2*between(0, min(a, b))
	}
	for _, c := range []struct{ size, draws int }{{4, 20000}, {8, 20000}, {12, 20000}, {16, 20000}, {30, 20000}, {60, 1000}, {100, 50}, {200, 10}, {1000, 1}} {
		racah.Fallbacks()
		values, nonzero := 0, 0
		for range 40 * published.Effort(t, c.draws) {
			if values == published.Effort(t, c.draws) {
				break
			}
			a, b, d, e := between(0, c.size), between(0, c.size), between(0, c.size), between(0, c.size)
			q := [9]int{a, b, couple(a, b), d, e, couple(d, e), couple(a, d), couple(b, e), 0}
			q[8] = couple(q[2], q[5])
			if !triad(q[6], q[7], q[8]) {
				continue
			}
			values++
			if compareNineJ(t, q) != 0 {
				nonzero++
			}
		}
		t.Logf("j to about %3d: %6d symbols, %6d not zero, %d by the exact route", c.size/2, values, nonzero, racah.Fallbacks())
		if nonzero < values/2 || values == 0 {
			t.Error("the draw misses")
		}
	}
}

// Published values pin the order of the arguments; no allocation while every j is at most 100; rules and
// panics are those of NineJ.
func TestNineJFloat(t *testing.T) {
	for _, row := range published.Rows(t, "published", "sixj_ninej_values.csv") {
		if row.Text("kind") != "9j" {
			continue
		}
		q := row.Halves("a", "b", "c", "d", "e", "f", "g", "h", "i")
		if got, want := racah.NineJFloat(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8]), row.SignedRoot().Float64(); got != want {
			t.Errorf("%g, published %v", got, row)
		}
	}
	for _, size := range []int{1, 4, 8, 16, 30, 50, 100} {
		sets := append(drawNineJ(60, size), zeroNineJs(size)...)
		if n := testing.AllocsPerRun(4, func() {
			for _, q := range sets {
				racah.NineJFloat(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8])
			}
		}); n != 0 {
			t.Errorf("j = %d: %v allocations", size, n)
		}
	}
	i := rational.Int
	if f := racah.NineJFloat(i(1), i(1), i(3), i(1), i(1), i(1), i(1), i(1), i(1)); f != 0 || math.Signbit(f) {
		t.Errorf("a broken triangle gives %g", f)
	}
	want := "racah.NineJFloat: e = -1; allowed: an integer or half-integer >= 0"
	if e := verify.Recovered(func() { racah.NineJFloat(i(1), i(1), i(1), i(1), i(-1), i(1), i(1), i(1), i(1)) }); e == nil || e.Error() != want {
		t.Errorf("panic %v, want %s", e, want)
	}
}

// zeroNineJs returns accidental zeros with 2j to 2 size: with a 0 the symbol is a 6j symbol, DLMF (34.7.1), and
// that with a 1 is proportional to b(b+1) + c(c+1) - a(a+1), DLMF (34.5.7).
func zeroNineJs(size int) (sets [][9]rational.Half) {
	i := rational.Int
	for a := range size + 1 {
		for b := range a {
			for c := range b + 1 {
				if a <= b+c && b*(b+1)+c*(c+1) == a*(a+1) {
					sets = append(sets, [9]rational.Half{i(a), i(b), i(c), i(c), i(1), i(c), i(b), i(b), i(0)})
				}
			}
		}
	}
	return sets
}

// The accidental zeros are that, and are told without the exact route.
func TestNineJFloatZeros(t *testing.T) {
	racah.Fallbacks()
	sets := zeroNineJs(100)
	for _, q := range sets {
		if v, err := racah.CheckNineJ(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8]); err != nil || v.Rule != wigner.Accidental {
			t.Errorf("%v: %v, %v", q, v, err)
		}
		if f := racah.NineJFloat(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8]); f != 0 || math.Signbit(f) {
			t.Errorf("%v: %g", q, f)
		}
	}
	if n := racah.Fallbacks(); n != 0 || len(sets) < 50 {
		t.Errorf("%d zeros, %d by the exact route", len(sets), n)
	}
}

// Float against exact. The arguments are coupled to each other by the selectors, so that most are allowed.
func FuzzNineJ(f *testing.F) {
	f.Add(uint8(2), uint8(2), uint8(2), uint8(2), uint8(0), uint8(1), uint8(1), uint8(1), uint8(2))
	f.Add(uint8(6), uint8(25), uint8(21), uint8(2), uint8(4), uint8(0), uint8(4), uint8(0), uint8(9)) // 27, 19, 23, 23, 26
	f.Add(uint8(40), uint8(42), uint8(44), uint8(46), uint8(20), uint8(21), uint8(22), uint8(23), uint8(24))
	f.Add(uint8(99), uint8(0), uint8(100), uint8(1), uint8(0), uint8(1), uint8(50), uint8(0), uint8(50))
	f.Fuzz(func(t *testing.T, a, b, d, e, toC, toF, toG, toH, toI uint8) {
		couple := func(a, b int, selector uint8) int {
			return max(a-b, b-a) + 2*(int(selector)%(min(a, b)+1))
		}
		q := [9]int{int(a) % 120, int(b) % 120, 0, int(d) % 120, int(e) % 120}
		q[2], q[5] = couple(q[0], q[1], toC), couple(q[3], q[4], toF)
		q[6], q[7] = couple(q[0], q[3], toG), couple(q[1], q[4], toH)
		q[8] = couple(q[2], q[5], toI)
		if max(q[2], q[5], q[6], q[7], q[8]) > 160 || !triad(q[6], q[7], q[8]) {
			t.Skip()
		}
		compareNineJ(t, q)
	})
}
