package racah_test

import (
	"fmt"
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/internal/verify"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// compareRow takes every step-th member of a row against the correctly rounded symbol.
func compareRow(t *testing.T, e *verify.RowErrors, q [5]int, step int, row []float64) []float64 {
	t.Helper()
	jmin, row := racah.SixJRow(row, h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]))
	if i := e.Compare(row, step, func(i int) float64 {
		return racah.SixJFloat(h(q[0]), h(q[1]), jmin.Add(rational.Int(i)), h(q[2]), h(q[3]), h(q[4]))
	}); i >= 0 {
		t.Fatalf("%v (halves of j1 j2 l1 l2 l3): member %d = %g is %.2f ulp off", q, i, row[i], e.OfMember)
	}
	return row
}

// Every row with the other arguments to 2j = 9, forbidden ones too.
func TestSixJRowExhaustive(t *testing.T) {
	var e verify.RowErrors
	var row []float64
	const k = 10
	for n := range k * k * k * k * k {
		row = compareRow(t, &e, [5]int{n % k, n / k % k, n / k / k % k, n / k / k / k % k, n / k / k / k / k}, 1, row)
	}
	e.Log(t, "2j to 9")
	if e.OfMember < verify.MemberBound/2 || e.Members < 100000 {
		t.Error("the bound is far too wide, or the domain too small")
	}
}

// Rows up to their limit, and single symbols beyond it, with so many small arguments that the exact symbols
// are at hand.
func TestSixJRowLimit(t *testing.T) {
	var e verify.RowErrors
	for _, b := range []int{1<<18 + 2, 1<<19 + 2, 1<<21 + 2, 1<<23 + 2, 1<<24 - 6, 1<<24 + 2} {
		for _, q := range [][5]int{{6, b, 4, b + 2, b}, {5, b + 1, 4, b, b + 3}, {b, b, b, b, 6}} {
			jmin := max(q[0]-q[1], q[1]-q[0], q[2]-q[3], q[3]-q[2])
			exact := func(i int) float64 {
				return racah.SixJ(h(q[0]), h(q[1]), h(jmin+2*i), h(q[2]), h(q[3]), h(q[4])).Float64()
			}
			for i := range 4 {
				if got := racah.SixJFloat(h(q[0]), h(q[1]), h(jmin+2*i), h(q[2]), h(q[3]), h(q[4])); got != exact(i) {
					t.Fatalf("%v (halves of j1 j2 l1 l2 l3), member %d = %g, want %g", q, i, got, exact(i))
				}
			}
			if b > 1<<24 {
				continue
			}
			_, row := racah.SixJRow(nil, h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]))
			if i := e.Compare(row[:min(len(row), 40)], 1, exact); i >= 0 { // fatal, as the 9j symbol from wrong rows would take ages
				t.Fatalf("%v (halves of j1 j2 l1 l2 l3): member %d = %g, want %g", q, i, row[i], exact(i))
			}
		}
		if b > 1<<24 {
			continue
		}
		// By DLMF (34.6.2), from exact 6j symbols.
		q := [9]int{4, b, b + 2, 6, b - 2, b, 2, b, b}
		want := new(big.Float).SetPrec(300)
		for x := b - 4; x <= b+4; x += 2 {
			term := racah.SixJ(h(q[0]), h(q[3]), h(q[6]), h(q[7]), h(q[8]), h(x)).
				Mul(racah.SixJ(h(q[1]), h(q[4]), h(q[7]), h(q[3]), h(x), h(q[5]))).
				Mul(racah.SixJ(h(q[2]), h(q[5]), h(q[8]), h(x), h(q[0]), h(q[1]))).Float(300)
			term.Mul(term, new(big.Float).SetInt64(int64(x+1)))
			if x&1 != 0 {
				term.Neg(term)
			}
			want.Add(want, term)
		}
		nearest, _ := want.Float64()
		got := racah.NineJFloat(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]), h(q[6]), h(q[7]), h(q[8]))
		if got != nearest || got == 0 {
			t.Errorf("halves of %v: %g, want %g", q, got, nearest)
		}
	}
	e.Log(t, "2j to 2^24")
}

// Random rows up to 2j = 100000.
func TestSixJRowLarge(t *testing.T) {
	r := rand.New(rand.NewPCG(26, 26))
	var row []float64
	for _, c := range []struct{ size, rows, members int }{{100, 300, 100}, {1000, 80, 12}, {4000, 20, 8}, {20000, 4, 6}, {100000, 2, 3}} {
		var e verify.RowErrors
		for e.Members < max(4, published.Effort(t, c.rows)*4) {
			var q [5]int
			for i := range q {
				q[i] = c.size - r.IntN(c.size/2)
			}
			switch e.Members % 3 { // l3 at one of its limits: a peak next to one end
			case 0:
				q[4] = max(q[0]-q[3], q[3]-q[0], q[1]-q[2], q[2]-q[1])
			case 1:
				q[4] = min(q[0]+q[3], q[1]+q[2])
			}
			if triad(q[0], q[3], q[4]) && triad(q[2], q[1], q[4]) {
				row = compareRow(t, &e, q, c.size/c.members+1, row)
			}
		}
		e.Log(t, fmt.Sprintf("2j to %d", c.size))
	}
}

// A row that no j fits; one that another triad forbids; whole rows by DLMF (34.5.14), with l3 = l3'.
func TestSixJRowShapes(t *testing.T) {
	i := rational.Int
	if jmin, row := racah.SixJRow([]float64{1}, i(1), i(1), i(7), i(1), i(1)); len(row) != 0 || jmin != i(0) {
		t.Errorf("%v from %v", row, jmin)
	}
	if jmin, row := racah.SixJRow(nil, i(1), i(1), i(1), h(1), i(1)); len(row) != 0 || jmin != i(0) {
		t.Errorf("%v from %v", row, jmin)
	}
	dst := []float64{5, 5, 5, 5}
	if jmin, row := racah.SixJRow(dst, i(1), i(1), i(1), i(1), i(5)); len(row) != 3 || jmin != i(0) || row[0] != 0 || row[2] != 0 || &row[0] != &dst[0] {
		t.Errorf("%v from %v", row, jmin)
	}
	for _, size := range []int{1, 6, 301, 5000} {
		jmin, row := racah.SixJRow(nil, h(size), h(size+1), h(size+2), h(size+1), h(2*(size/3)+1))
		sum := 0.0
		for k, v := range row {
			sum += float64(jmin.Twice()+2*k+1) * float64(2*(size/3)+2) * v * v
		}
		if math.Abs(sum-1) > 1e-14*math.Sqrt(float64(len(row))) {
			t.Errorf("2j = %d: the squares add up to %v", size, sum)
		}
	}
	row := make([]float64, 100)
	if n := testing.AllocsPerRun(10, func() { racah.SixJRow(row, i(30), i(20), i(25), i(28), i(22)) }); n != 0 {
		t.Errorf("%v allocations", n)
	}
	for want, f := range map[string]func(){
		"racah.SixJRow: l2 = -1; allowed: an integer or half-integer >= 0": func() { racah.SixJRow(nil, i(1), i(1), i(1), i(-1), i(1)) },
		"racah.SixJRow: l3 = 8388609; allowed: at most 8388608 in a row":   func() { racah.SixJRow(nil, i(1), i(1), i(1), i(1), i(1<<23+1)) },
	} {
		if e := verify.Recovered(f); e == nil || e.Error() != want {
			t.Errorf("panic %v, want %s", e, want)
		}
	}
}

// Rows against single values.
func FuzzSixJRow(f *testing.F) {
	f.Add(4, 4, 4, 4, 4)
	f.Add(100, 90, 80, 100, 90)
	f.Add(1, 2, 3, 4, 5)
	f.Fuzz(func(t *testing.T, a, b, d, e, g int) {
		if min(a, b, d, e, g) < 0 || max(a, b, d, e, g) > 400 {
			t.Skip()
		}
		var found verify.RowErrors
		compareRow(t, &found, [5]int{a, b, d, e, g}, 1, nil)
	})
}

func BenchmarkSixJRow(b *testing.B) {
	for _, s := range []int{20, 2000, 100000} {
		b.Run(fmt.Sprintf("twoj=%d", s), func(b *testing.B) {
			b.ReportAllocs()
			var row []float64
			for b.Loop() {
				_, row = racah.SixJRow(row, h(s), h(s-4), h(s-2), h(s-6), h(s-8))
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(len(row)), "ns/value")
		})
	}
}

func ExampleSixJRow() {
	i := rational.Int
	jmin, row := racah.SixJRow(nil, i(2), i(1), i(1), i(2), i(2))
	for k, v := range row {
		fmt.Printf("j = %v: %+.6f\n", jmin.Add(i(k)), v)
	}
	// Output:
	// j = 1: +0.152753
	// j = 2: +0.152753
	// j = 3: +0.043644
}
