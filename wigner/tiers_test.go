package wigner

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/dd"
	"example.org/couplet/rational"
)

// squares calls do for all symbols with 2j to top.
func squares(top int, do func(r *regge)) {
	h := rational.Halves
	for a := range top + 1 {
		for b := range top + 1 {
			for c := range top + 1 {
				for x := -a; x <= a; x += 2 {
					for y := -b; y <= b; y += 2 {
						var r regge
						if r.set(h(a), h(b), h(c), h(x), h(y), h(-x-y)) {
							do(&r)
						}
					}
				}
			}
		}
	}
}

// Every tier, on the same small symbols, gives the bits of the exact route.
func TestForcedTiers(t *testing.T) {
	squares(9, func(r *regge) {
		for _, coefficient := range []bool{false, true} {
			want := r.exact(coefficient).Float64()
			for i, tier := range []func(bool) (float64, bool){r.oneWord, r.twoWords, r.manyWords} {
				got, ok := tier(coefficient)
				if !ok || math.Float64bits(got) != math.Float64bits(want) {
					t.Fatalf("square %v, tier %d: %g, %v, exact %g", *r, i, got, ok, want)
				}
			}
		}
	})
}

// Every orientation of the square gives the same value: Regge's even symmetries on the sum itself.
func TestEveryOrientation(t *testing.T) {
	cases := 0
	squares(10, func(r *regge) {
		for _, coefficient := range []bool{false, true} {
			want := r.exactBy(r, coefficient)
			for i := range 6 {
				image := r.image(i)
				if got := r.exactBy(&image, coefficient); !got.Equal(want) {
					t.Fatalf("square %v: %v, image %v: %v", *r, want, image, got)
				}
				cases++
			}
		}
	})
	if cases < 100000 {
		t.Errorf("only %d cases", cases)
	}
}

// The fronts are as accurate as they claim before they are rounded, and not much more: a smaller bound
// makes this test fail.
func TestFrontErrors(t *testing.T) {
	r := rand.New(rand.NewPCG(12, 12))
	one := dd.Pair{Hi: 1}
	worstSmall, worstLarge := 0.0, 0.0
	for range 20000 {
		total := 1 + r.IntN(130)
		a, b := r.IntN(total+1), r.IntN(total+1)
		c, d := r.IntN(total+1), r.IntN(total+1)
		q := regge{a, b, total - a - b, c, d, total - c - d, total - a - c, total - b - d, a + b + c + d - total}
		if min(q[2], q[5], q[6], q[7], q[8]) < 0 {
			continue
		}
		for _, coefficient := range []bool{false, true} {
			var f rational.Factored
			for i, n := range q {
				f.MulFactorial(n, 1-2*b2i(i < 3))
			}
			f.MulFactorial(total+1, -1)
			if coefficient {
				f.MulInt(q.twiceJ3()+1, 1)
			}
			want := f.SqrtTimes(1).Float(300)
			worstSmall = max(worstSmall, relative(q.smallFront(one, coefficient), 0, want))
			if !coefficient {
				large := q.largeFront()
				worstLarge = max(worstLarge, relative(large.Pair, large.Exp, want))
			}
		}
	}
	t.Logf("largest errors: %.1f of %.0f u^2 and %.1f of %.0f u^2", worstSmall*0x1p106, smallError*0x1p106, worstLarge*0x1p106, largeError*0x1p106)
	if worstSmall > smallError || worstLarge > largeError {
		t.Error("the error exceeds the bound")
	}
	if worstSmall < smallError/64 || worstLarge < largeError/64 {
		t.Error("the bound is far too wide")
	}
}

func b2i(b bool) int {
	if b {
		return 1
	}
	return 0
}

func relative(p dd.Pair, exp int, want *big.Float) float64 {
	got := new(big.Float).SetPrec(300).SetFloat64(p.Hi)
	got.Add(got, new(big.Float).SetPrec(300).SetFloat64(p.Lo))
	got.SetMantExp(got, exp)
	f, _ := got.Sub(got, want).Quo(got, want).Float64()
	return math.Abs(f)
}
