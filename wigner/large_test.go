package wigner_test

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// checkSquare compares sign and square of a value with a sign and a rational number computed here.
func checkSquare(t *testing.T, what string, got rational.Surd, sign int, square *big.Rat) {
	t.Helper()
	if got.Sign() != sign || got.Square().Cmp(square) != 0 {
		t.Errorf("%s: sign %d, want %d; squares equal: %v", what, got.Sign(), sign, got.Square().Cmp(square) == 0)
	}
}

func parity(n int) int { return 1 - 2*(n&1) }

// Symbols with j3 = j1+j2, DLMF (34.3.6), with factorials gathered into binomials, up to thousands.
func TestLargeStretched(t *testing.T) {
	r := rand.New(rand.NewPCG(4, 4))
	tiny := 0
	for _, size := range []int{10, 100, 700, 1500, 6000} {
		for range 20 {
			a, b := size+r.IntN(size), size+r.IntN(size) // twice j1 and j2
			x, y := r.IntN(a+1), r.IntN(b+1)             // j1+m1 and j2+m2
			if size == 1500 {
				x, y = r.IntN(20), b-r.IntN(20) // nearly opposite projections: far below 1e-300
			}
			square := new(big.Rat).SetFrac(
				new(big.Int).Mul(new(big.Int).Binomial(int64(a), int64(x)), new(big.Int).Binomial(int64(b), int64(y))),
				new(big.Int).Mul(big.NewInt(int64(a+b+1)), new(big.Int).Binomial(int64(a+b), int64(x+y))))
			m1, m2 := 2*x-a, 2*y-b
			h := rational.Halves
			got := wigner.ThreeJ(h(a), h(b), h(a+b), h(m1), h(m2), h(-m1-m2))
			checkSquare(t, "stretched symbol", got, parity((a-b+m1+m2)/2), square)
			if f := math.Abs(got.Float64()); f < 1e-300 {
				tiny++
			}
		}
	}
	if tiny < 10 {
		t.Errorf("only %d values below 1e-300", tiny)
	}
}

// Symbols with all m = 0, DLMF (34.3.5), the ones with the most terms.
func TestLargeZeroProjections(t *testing.T) {
	o := rational.Int(0)
	for _, j := range [][3]int{{40, 40, 40}, {67, 66, 33}, {100, 100, 100}, {101, 99, 50}, {500, 600, 700}, {1500, 1000, 800}} {
		total := j[0] + j[1] + j[2]
		factorial := func(n int) *big.Int { return new(big.Int).MulRange(1, int64(n)) }
		num, den := factorial(total/2), factorial(total+1)
		num.Mul(num, num)
		for _, x := range j {
			num.Mul(num, factorial(total-2*x))
			f := factorial(total/2 - x)
			den.Mul(den, f.Mul(f, f))
		}
		got := wigner.ThreeJ(rational.Int(j[0]), rational.Int(j[1]), rational.Int(j[2]), o, o, o)
		checkSquare(t, "m = 0", got, parity(total/2), new(big.Rat).SetFrac(num, den))
		odd := wigner.ThreeJ(rational.Int(j[0]), rational.Int(j[1]), rational.Int(j[2]-1), o, o, o)
		if !odd.IsZero() {
			t.Errorf("%v with the last lowered by 1: %v", j, odd)
		}
	}
}

// The recurrence in m, DLMF (34.3.14), at sizes where every route is in use: one word, a few, many.
func TestLargeRecurrence(t *testing.T) {
	r := rand.New(rand.NewPCG(5, 5))
	h := rational.Halves
	root := func(a, b, c, d int) rational.Surd { // sqrt(abcd/16), of factors given as twice their values
		return rational.Root(int64(a/2), 1).Mul(rational.Root(int64(b/2), 1)).Mul(rational.Root(int64(c/2), 1)).Mul(rational.Root(int64(d/2), 1))
	}
	for _, size := range []int{20, 43, 44, 45, 86, 90, 200, 209, 1000} { // j1+j2+j3 near 66 changes the route, near 312 the tables
		for range 12 {
			a, b := size+r.IntN(4), size+r.IntN(4)
			c := (a + b) % 2
			c += 2 * (size / 2)
			m2, m3 := b-2*r.IntN(b+1), c-2*r.IntN(c+1)
			m1 := -m2 - m3
			if max(m1, -m1) > a {
				continue
			}
			value := func(m2, m3 int) rational.Surd { return wigner.ThreeJ(h(a), h(b), h(c), h(m1), h(m2), h(m3)) }
			left := value(m2, m3).Mul(rational.Ratio(int64(a*(a+2)-b*(b+2)-c*(c+2)-2*m2*m3), 4))
			right := value(m2+2, m3-2).Mul(root(b-m2, b+m2+2, c-m3+2, c+m3)).Sum().
				Add(value(m2-2, m3+2).Mul(root(b-m2+2, b+m2, c-m3, c+m3+2)).Sum())
			if !left.Sum().Equal(right) {
				t.Errorf("DLMF 34.3.14 fails for %d %d %d; %d %d %d (halves)", a, b, c, m1, m2, m3)
			}
		}
	}
}

// No argument may wrap around on the way to the selection rules.
func TestHugeArguments(t *testing.T) {
	top := rational.Halves(math.MaxInt32)
	zero := rational.Int(0)
	if v := wigner.ThreeJ(top, top, zero, top, top, zero); !v.IsZero() {
		t.Errorf("projections that do not add up give %v", v)
	}
	if v, err := wigner.CheckThreeJ(top, zero, rational.Halves(1), top, zero, top.Neg()); err != nil || v.Rule != wigner.Triangle {
		t.Errorf("%v, %v", v, err)
	}
	if v := wigner.ThreeJ(top, top, rational.Int(1), top, top, rational.Int(1)); !v.IsZero() {
		t.Errorf("projections whose sum does not fit into 32 bits give %v", v)
	}
	if r := wigner.Triad(top, top, rational.Int(0)); r != wigner.NonZero {
		t.Errorf("triad of large arguments: %v", r)
	}
	if r := wigner.Triad(top, rational.Halves(1), rational.Int(1)); r != wigner.Triangle {
		t.Errorf("triad of unlike arguments: %v", r)
	}
}

// No symbol with every j to 8 allocates.
func TestThreeJAllocations(t *testing.T) {
	const top = 16
	h := rational.Halves
	sweep := func() {
		for a := range top + 1 {
			for b := range a + 1 {
				for c := a - b; c <= min(a+b, top); c += 2 {
					for x := -a; x <= a; x += 2 {
						for y := -b; y <= b; y += 2 {
							if z := -x - y; z <= c && z >= -c {
								wigner.ThreeJ(h(a), h(b), h(c), h(x), h(y), h(z))
							}
						}
					}
				}
			}
		}
	}
	if n := testing.AllocsPerRun(4, sweep); n != 0 { // the average leaves out what the runtime allocates once
		t.Errorf("%v allocations", n)
	}
}

// Whatever the arguments, a malformed one panics with an *ArgumentError, all others give a value
// within the bound of the orthogonality relation, DLMF (34.3.18), that an exchange of columns and the
// checker agree with.
func FuzzThreeJ(f *testing.F) {
	f.Add(2, 2, 2, 2, -2, 0)
	f.Add(6, 6, 4, 4, -4, 0)
	f.Add(-1, 2, 2, 0, 0, 0)
	f.Add(100, 90, 80, 10, -20, 10)
	f.Fuzz(func(t *testing.T, a, b, c, x, y, z int) {
		if max(a, b, c, x, y, z) > 400 || min(a, b, c, x, y, z) < -400 {
			t.Skip()
		}
		h := rational.Halves
		var value, swapped rational.Surd
		bad := verify.Recovered(func() { value = wigner.ThreeJ(h(a), h(b), h(c), h(x), h(y), h(z)) })
		verify.Recovered(func() { swapped = wigner.ThreeJ(h(b), h(a), h(c), h(y), h(x), h(z)) })
		verdict, err := wigner.CheckThreeJ(h(a), h(b), h(c), h(x), h(y), h(z))
		if (bad != nil) != (err != nil) {
			t.Fatalf("panic %v, error %v", bad, err)
		}
		if bad != nil {
			return
		}
		if verdict.Zero() != value.IsZero() {
			t.Fatalf("value %v, verdict %v", value, verdict)
		}
		if f := wigner.ThreeJFloat(h(a), h(b), h(c), h(x), h(y), h(z)); math.Float64bits(f) != math.Float64bits(value.Float64()) {
			t.Fatalf("value %v, float %g, rounded %g", value, f, value.Float64())
		}
		if parity((a+b+c)/2) < 0 {
			swapped = swapped.Neg()
		}
		if !swapped.Equal(value) || value.Abs().Cmp(rational.Root(1, int64(max(a, b, c)+1))) > 0 {
			t.Fatalf("value %v, columns exchanged %v", value, swapped)
		}
	})
}
