package wigner_test

import (
	"math"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// compareFloats demands the bits of the exact route, rounded, of the 3j symbol and, with the last
// projection turned around, of the Clebsch-Gordan coefficient. It returns the 3j symbol.
func compareFloats(t *testing.T, q [6]rational.Half) float64 {
	t.Helper()
	got, exact := wigner.ThreeJFloat(q[0], q[1], q[2], q[3], q[4], q[5]), wigner.ThreeJ(q[0], q[1], q[2], q[3], q[4], q[5])
	if want := exact.Float64(); math.Float64bits(got) != math.Float64bits(want) {
		t.Fatalf("3j %v = %g, exact %g = %v", q, got, want, exact)
	}
	got = wigner.ClebschGordanFloat(q[0], q[3], q[1], q[4], q[2], q[5].Neg())
	exact = wigner.ClebschGordan(q[0], q[3], q[1], q[4], q[2], q[5].Neg())
	if want := exact.Float64(); math.Float64bits(got) != math.Float64bits(want) {
		t.Fatalf("Clebsch-Gordan %v = %g, exact %g = %v", q, got, want, exact)
	}
	return got
}

// Every symbol with 2j to 24, bit for bit.
func TestRoundedExhaustive(t *testing.T) {
	top := 24
	if testing.Short() {
		top = 12
	}
	h := rational.Halves
	wigner.Fallbacks()
	values, zeros := 0, 0
	for a := range top + 1 {
		for b := range top + 1 {
			for c := max(a-b, b-a); c <= min(a+b, top); c += 2 {
				for x := -a; x <= a; x += 2 {
					for y := -b; y <= b; y += 2 {
						if z := -x - y; z <= c && z >= -c {
							values++
							if compareFloats(t, [6]rational.Half{h(a), h(b), h(c), h(x), h(y), h(z)}) == 0 {
								zeros++
							}
						}
					}
				}
			}
		}
	}
	t.Logf("%d symbols, %d of them zero, and as many coefficients; %d by the exact route", values, zeros, wigner.Fallbacks())
	if zeros < values/200 {
		t.Errorf("only %d zeros", zeros)
	}
}

// Random symbols of every size at which the route changes and beyond, with nearly stretched ones and
// ones next to the edge of the allowed region.
func TestRoundedRandom(t *testing.T) {
	r := rand.New(rand.NewPCG(11, 11))
	h := rational.Halves
	between := func(lo, hi int) int { return lo + r.IntN(hi-lo+1) }
	for _, c := range []struct{ size, draws int }{{4, 20000}, {16, 20000}, {22, 20000}, {30, 20000}, {43, 20000}, {60, 20000}, {100, 5000}, {175, 1000}, {400, 300}, {1000, 60}, {10000, 2}} {
		wigner.Fallbacks()
		values, nonzero := 0, 0
		for range published.Effort(t, c.draws) {
			a, b := between(0, 2*c.size), between(0, 2*c.size)
			third := between(0, min(a, b)) // c = |a-b| + 2*third
			switch r.IntN(4) {
			case 0:
				third = min(a, b) - between(0, min(3, min(a, b))) // nearly stretched
			case 1:
				third = between(0, min(3, min(a, b)))
			}
			j3 := max(a-b, b-a) + 2*third
			x, y := 2*between(0, a)-a, 2*between(0, b)-b
			if r.IntN(3) == 0 { // next to the largest projections
				x, y = a-2*between(0, min(a, 3)), 2*between(0, min(b, 3))-b
			}
			if z := -x - y; z <= j3 && z >= -j3 {
				values++
				if compareFloats(t, [6]rational.Half{h(a), h(b), h(j3), h(x), h(y), h(z)}) != 0 {
					nonzero++
				}
			}
		}
		t.Logf("j to %5d: %6d symbols and coefficients, %6d not zero, %d by the exact route", c.size, values, nonzero, wigner.Fallbacks())
		if values >= 20 && nonzero < values/2 {
			t.Errorf("j to %d: only %d of %d values are not zero", c.size, nonzero, values)
		}
	}
}

// Stretched symbols with opposite projections fall as the square root of a binomial, through 1e-300, the
// subnormal numbers and out of the range of float64; both signs.
func TestRoundedTiny(t *testing.T) {
	h := rational.Halves
	wigner.Fallbacks()
	small, subnormal, underflow, values := 0, 0, 0, 0
	for a := 980; a <= 1100; a += 3 {
		for d := range 3 {
			x, y := -a+2*d, a
			f := math.Abs(compareFloats(t, [6]rational.Half{h(a), h(a), h(2 * a), h(x), h(y), h(-x - y)}))
			values++
			switch {
			case f == 0:
				underflow++
			case f < 0x1p-1022:
				subnormal++
			case f < 1e-300:
				small++
			}
		}
	}
	t.Logf("%d symbols and coefficients, %d below 1e-300, %d subnormal, %d below them, %d by the exact route", values, small, subnormal, underflow, wigner.Fallbacks())
	if small == 0 || subnormal == 0 || underflow == 0 {
		t.Error("the draw misses a kind")
	}
}

// Selection rules and malformed arguments are those of the exact functions.
func TestFloatRules(t *testing.T) {
	h := rational.Halves
	for n := range 5 * 5 * 5 * 9 * 9 * 9 {
		digit := func(base int) int { d := n % base; n /= base; return d }
		q := [6]rational.Half{h(digit(5) - 1), h(digit(5) - 1), h(digit(5) - 1), h(digit(9) - 4), h(digit(9) - 4), h(digit(9) - 4)}
		var exact, cg rational.Surd
		var got, gotCG float64
		bad := verify.Recovered(func() { exact = wigner.ThreeJ(q[0], q[1], q[2], q[3], q[4], q[5]) })
		badFloat := verify.Recovered(func() { got = wigner.ThreeJFloat(q[0], q[1], q[2], q[3], q[4], q[5]) })
		verify.Recovered(func() { cg = wigner.ClebschGordan(q[0], q[3], q[1], q[4], q[2], q[5]) })
		badCG := verify.Recovered(func() { gotCG = wigner.ClebschGordanFloat(q[0], q[3], q[1], q[4], q[2], q[5]) })
		if (bad == nil) != (badFloat == nil) || (bad == nil) != (badCG == nil) {
			t.Fatalf("%v: panics %v, %v, %v", q, bad, badFloat, badCG)
		}
		if bad == nil && (got != exact.Float64() || gotCG != cg.Float64()) {
			t.Fatalf("%v: %g and %g, exact %v and %v", q, got, gotCG, exact, cg)
		}
		if badFloat != nil && badFloat.Func != "wigner.ThreeJFloat" || badCG != nil && badCG.Func != "wigner.ClebschGordanFloat" {
			t.Fatalf("%v: panics name %s and %s", q, badFloat.Func, badCG.Func)
		}
	}
}

// Numbers that pin sign and order of the arguments; squares by DLMF (34.2.4), from the tests of the exact
// route.
func TestFloatValues(t *testing.T) {
	h := rational.Halves
	for _, c := range []struct {
		got, want float64
	}{
		{wigner.ThreeJFloat(h(4), h(4), h(8), h(2), h(-2), h(0)), math.Sqrt(70) * 2 / 105},
		{wigner.ClebschGordanFloat(h(1), h(1), h(1), h(-1), h(0), h(0)), math.Sqrt(0.5)},
		{wigner.ClebschGordanFloat(h(1), h(-1), h(1), h(1), h(0), h(0)), -math.Sqrt(0.5)},
		{wigner.ClebschGordanFloat(h(2), h(0), h(1), h(1), h(1), h(1)), -math.Sqrt(1. / 3)},
	} {
		if math.Abs(c.got-c.want) > 1e-15 {
			t.Errorf("%g, want %g", c.got, c.want)
		}
	}
}

// No allocation while j1+j2+j3 <= 300, accidental zeros and zeros by symmetry among them.
func TestFloatAllocations(t *testing.T) {
	for _, size := range []int{1, 8, 30, 50, 100} {
		sets := draw(200, size)
		zero := rational.Int(0)
		sets = append(sets, [6]rational.Half{rational.Int(size), rational.Int(size), rational.Int(size - 1 + size%2), zero, zero, zero})
		sets = append(sets, [6]rational.Half{rational.Int(100), rational.Int(100), zero, rational.Int(7), rational.Int(-7), zero})
		if n := testing.AllocsPerRun(2, func() {
			for _, q := range sets {
				wigner.ThreeJFloat(q[0], q[1], q[2], q[3], q[4], q[5])
				wigner.ClebschGordanFloat(q[0], q[3], q[1], q[4], q[2], q[5].Neg())
			}
		}); n != 0 {
			t.Errorf("j = %d: %v allocations", size, n)
		}
	}
}
