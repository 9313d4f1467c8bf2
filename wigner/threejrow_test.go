package wigner_test

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// compareRow takes every step-th member of a row against the correctly rounded symbol.
func compareRow(t *testing.T, e *verify.RowErrors, a, x, b, y, step int, row []float64) []float64 {
	t.Helper()
	h := rational.Halves
	jmin, row := wigner.ThreeJRow(row, h(a), h(x), h(b), h(y))
	if i := e.Compare(row, step, func(i int) float64 {
		return wigner.ThreeJFloat(h(a), h(b), jmin.Add(rational.Int(i)), h(x), h(y), h(-x-y))
	}); i >= 0 {
		t.Fatalf("2j1, 2m1, 2j2, 2m2 = %d %d %d %d: member %d = %g is %.2f ulp off", a, x, b, y, i, row[i], e.OfMember)
	}
	return row
}

// Every row with 2j to 14.
func TestThreeJRowExhaustive(t *testing.T) {
	var e verify.RowErrors
	var row []float64
	for a := range 15 {
		for b := range 15 {
			for x := -a; x <= a; x += 2 {
				for y := -b; y <= b; y += 2 {
					row = compareRow(t, &e, a, x, b, y, 1, row)
				}
			}
		}
	}
	e.Log(t, "2j to 14")
	if e.OfMember < verify.MemberBound/2 {
		t.Error("the bound is far too wide")
	}
}

// Random rows up to 2j = 100000, with projections close to the largest and to zero.
func TestThreeJRowLarge(t *testing.T) {
	r := rand.New(rand.NewPCG(25, 25))
	var row []float64
	for _, c := range []struct{ size, rows, members int }{{100, 100, 1000}, {1000, 40, 60}, {2000, 20, 60}, {20000, 4, 12}, {100000, 4, 8}} {
		var e verify.RowErrors
		for k := range max(2, published.Effort(t, c.rows)) {
			a, b := c.size-r.IntN(c.size/2), c.size-r.IntN(c.size/2)
			x, y := a-2*r.IntN(a+1), b-2*r.IntN(b+1)
			switch k % 4 {
			case 0:
				x = a - 2*r.IntN(3)
			case 1:
				x, y = a&1, -(b & 1)
			case 2: // a peak next to one end
				x, y = a-2*r.IntN(3), 2*r.IntN(3)-b
			}
			row = compareRow(t, &e, a, x, b, y, c.size/c.members+1, row)
		}
		e.Log(t, fmt.Sprintf("2j to %d", c.size))
	}
}

// Up to the limit of a row and, for single values, beyond it, with a j so small that the exact symbols are at
// hand. The double-double sums, the rows and the exact route each have a size here.
func TestThreeJRowLimit(t *testing.T) {
	h := rational.Halves
	var e verify.RowErrors
	for _, b := range []int{1<<18 + 2, 1<<19 + 2, 1<<21 + 2, 1<<23 + 2, 1<<24 - 1, 1 << 24, 1<<24 + 2, 1<<26 + 1} {
		for _, s := range []struct{ a, x, y int }{{6, 2, b/3*2 - b}, {1, -1, b}, {6, 0, b & 1}, {9, 3, b - 8}} {
			exact := func(j rational.Half) float64 {
				return wigner.ThreeJ(h(s.a), h(b), j, h(s.x), h(s.y), h(-s.x-s.y)).Float64()
			}
			for j := max(b-s.a, s.x+s.y, -s.x-s.y); j <= b+s.a; j += 2 {
				got, want := wigner.ThreeJFloat(h(s.a), h(b), h(j), h(s.x), h(s.y), h(-s.x-s.y)), exact(h(j))
				if got != want {
					t.Errorf("(%d %d %d; %d %d)/2 = %g, want %g", s.a, b, j, s.x, s.y, got, want)
				}
			}
			if b > 1<<24 {
				continue
			}
			jmin, row := wigner.ThreeJRow(nil, h(s.a), h(s.x), h(b), h(s.y))
			if i := e.Compare(row, 1, func(i int) float64 { return exact(jmin.Add(rational.Int(i))) }); i >= 0 {
				t.Errorf("(%d %d j; %d %d)/2: member %d = %g", s.a, b, s.x, s.y, i, row[i])
			}
		}
	}
	e.Log(t, "2j to 2^24")
}

// A single member; none; a zero in every second place; the slice that comes back; whole rows by
// DLMF (34.3.17), with m1 = m1' and m2 = m2'.
func TestThreeJRowShapes(t *testing.T) {
	h, i := rational.Halves, rational.Int
	jmin, row := wigner.ThreeJRow(nil, i(3), i(3), h(5), h(5))
	if jmin != h(11) || len(row) != 1 || row[0] != wigner.ThreeJFloat(i(3), h(5), h(11), i(3), h(5), h(-11)) {
		t.Errorf("stretched: %v from %v", row, jmin)
	}
	dst := make([]float64, 3, 50)
	if jmin, row = wigner.ThreeJRow(dst, i(3), i(4), i(2), i(0)); len(row) != 0 || jmin != i(0) {
		t.Errorf("|m| > j: %v from %v", row, jmin)
	}
	if jmin, row = wigner.ThreeJRow(dst, i(4), i(0), i(4), i(0)); jmin != i(0) || len(row) != 9 || &row[0] != &dst[0] {
		t.Errorf("%d members from %v", len(row), jmin)
	}
	for k := 1; k < len(row); k += 2 {
		if row[k] != 0 {
			t.Errorf("odd sum of momenta: %v", row)
		}
	}
	for _, size := range []int{1, 7, 300, 5000} {
		jmin, row := wigner.ThreeJRow(nil, h(size), h(size-2*(size/3)), h(size+1), h(1-size))
		sum := 0.0
		for k, v := range row {
			sum += float64(jmin.Twice()+2*k+1) * v * v
		}
		if math.Abs(sum-1) > 1e-14*math.Sqrt(float64(len(row))) {
			t.Errorf("2j = %d: the squares add up to %v", size, sum)
		}
	}
	row = make([]float64, 100)
	if n := testing.AllocsPerRun(10, func() { wigner.ThreeJRow(row, i(30), i(3), i(20), i(-5)) }); n != 0 {
		t.Errorf("%v allocations", n)
	}
	for want, f := range map[string]func(){
		"wigner.ThreeJRow: j2 = -1; allowed: an integer or half-integer >= 0":           func() { wigner.ThreeJRow(nil, i(1), i(0), i(-1), i(0)) },
		"wigner.ThreeJRow: m1 = 1/2; allowed: j1 plus or minus an integer, with j1 = 1": func() { wigner.ThreeJRow(nil, i(1), h(1), i(1), i(0)) },
		"wigner.ThreeJRow: j1 = 16777217/2; allowed: at most 8388608 in a row":          func() { wigner.ThreeJRow(nil, h(1<<24+1), h(1), i(1), i(0)) },
	} {
		if e := verify.Recovered(f); e == nil || e.Error() != want {
			t.Errorf("panic %v, want %s", e, want)
		}
	}
}

// Rows against single values.
func FuzzThreeJRow(f *testing.F) {
	f.Add(4, 2, 4, -2)
	f.Add(100, 0, 100, 0)
	f.Add(201, 201, 33, -33)
	f.Add(0, 0, 7, 3)
	f.Fuzz(func(t *testing.T, a, x, b, y int) {
		if a < 0 || b < 0 || a > 600 || b > 600 || x > a || -x > a || y > b || -y > b || (a-x)&1 != 0 || (b-y)&1 != 0 {
			t.Skip()
		}
		var e verify.RowErrors
		compareRow(t, &e, a, x, b, y, 1, nil)
	})
}

func BenchmarkThreeJRow(b *testing.B) {
	h := rational.Halves
	for _, size := range []int{20, 2000, 100000} {
		b.Run(fmt.Sprintf("twoj=%d", size), func(b *testing.B) {
			b.ReportAllocs()
			var row []float64
			for b.Loop() {
				_, row = wigner.ThreeJRow(row, h(size), h(size/4*2), h(size-2), h(-size/6*2))
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(len(row)), "ns/value")
		})
	}
}

func ExampleThreeJRow() {
	i := rational.Int
	jmin, row := wigner.ThreeJRow(nil, i(2), i(1), i(1), i(0))
	for k, v := range row {
		fmt.Printf("j = %v: %+.6f\n", jmin.Add(i(k)), v)
	}
	// Output:
	// j = 1: -0.316228
	// j = 2: +0.182574
	// j = 3: +0.276026
}
