package wigner

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/internal/verify"
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
			for i, tier := range []func(bool) (float64, bool){r.fewWords, r.manyWords} {
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
	below, above, worstLarge := 0.0, 0.0, 0.0
	for range 20000 {
		total := 1 + r.IntN(dd.BinomialTops-1)
		a, b := r.IntN(total+1), r.IntN(total+1)
		c, d := r.IntN(total+1), r.IntN(total+1)
		q := regge{a, b, total - a - b, c, d, total - c - d, total - a - c, total - b - d, a + b + c + d - total}
		if min(q[2], q[5], q[6], q[7], q[8]) < 0 {
			continue
		}
		sum := r.Uint64() >> r.IntN(64)
		if sum == 0 {
			continue
		}
		n, _ := mantissa.FromMod128(sum, r.Uint64())
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
			small := q.smallFront(coefficient)
			off := verify.Off(small.Mul(n), new(big.Float).Mul(want, verify.Big(n)))
			below, above = max(below, off), max(above, -off)
			if !coefficient {
				large := q.largeFront()
				worstLarge = max(worstLarge, verify.Relative(large.Pair, large.Exp, want))
			}
		}
	}
	t.Logf("largest errors: %.1f above and %.1f below, of %d and %d, in M; %.1f of %.0f u^2", below, above, smallBelow, smallAbove, worstLarge*0x1p106, largeError*0x1p106)
	if below > smallBelow || above > smallAbove-2 || worstLarge > largeError { // the sum itself may lack 2 more
		t.Error("the error exceeds the bound")
	}
	if below < smallBelow/16 || above < smallAbove/4 || worstLarge < largeError/64 {
		t.Error("the bound is far too wide")
	}
}

func b2i(b bool) int {
	if b {
		return 1
	}
	return 0
}

// The route by rows, forced on small symbols and large ones, gives the bits of the routes by sums where it
// does not refuse, and refuses little but zeros and what is far below the largest of its row.
func TestByRow(t *testing.T) {
	taken, refused := 0, 0
	compare := func(r *regge, want func(coefficient bool) float64) {
		for _, coefficient := range []bool{false, true} {
			f, ok := r.byRow(coefficient)
			if !ok {
				refused++
				continue
			}
			taken++
			if w := want(coefficient); math.Float64bits(f) != math.Float64bits(w) {
				t.Fatalf("square %v, coefficient %v: %g by its row, %g", *r, coefficient, f, w)
			}
		}
	}
	squares(9, func(r *regge) { compare(r, r.float) })
	random := rand.New(rand.NewPCG(27, 27))
	h := rational.Halves
	for _, c := range []struct{ size, draws int }{{40, 1000}, {400, 300}, {4000, 20}, {40000, 2}} {
		for range c.draws {
			a, b := c.size-random.IntN(c.size/2+1), c.size-random.IntN(c.size/2+1)
			j3 := max(a-b, b-a) + 2*random.IntN(min(a, b)+1)
			x, y := a-2*random.IntN(a+1), b-2*random.IntN(b+1)
			var r regge
			if r.set(h(a), h(b), h(j3), h(x), h(y), h(-x-y)) {
				compare(&r, func(coefficient bool) float64 {
					f, ok := r.manyWords(coefficient)
					if !ok {
						f = r.exact(coefficient).Float64()
					}
					return f
				})
			}
		}
	}
	t.Logf("%d values by their rows, %d refused", taken, refused)
	if refused > taken/20 {
		t.Error("too many refused")
	}
}

// The bound that is proved after the fact holds, and is not much wider than the error.
func TestRowError(t *testing.T) {
	r := rand.New(rand.NewPCG(28, 28))
	h := rational.Halves
	least := math.Inf(1)
	for _, size := range []int{3, 8, 20, 60, 200} {
		for range 12 {
			a, b := r.IntN(size+1), r.IntN(size+1)
			x, y := a-2*r.IntN(a+1), b-2*r.IntN(b+1)
			rec, n, negative := newThreeJRow(a, x, b, y)
			members, low := make([]float64, n), make([]float64, n)
			rec.Solve(members, low, 1, negative)
			bound := rec.Error(members, low, 1, threeJGap)
			sum := new(big.Float).SetPrec(300)
			for i := range members {
				j := rec.First + 2*i
				d := new(big.Float).SetPrec(300).SetFloat64(members[i])
				d.Add(d, new(big.Float).SetPrec(300).SetFloat64(low[i]))
				d.Sub(d, ThreeJ(h(a), h(b), h(j), h(x), h(y), h(-x-y)).Float(300))
				d.Mul(d, d)
				sum.Add(sum, d.Mul(d, new(big.Float).SetInt64(int64(j+1))))
			}
			root, _ := sum.Sqrt(sum).Float64()
			if root > bound {
				t.Fatalf("2j1, 2m1, 2j2, 2m2 = %d %d %d %d: error %g, bound %g", a, x, b, y, root, bound)
			}
			if bound > 0x1p-85 {
				t.Errorf("2j1, 2m1, 2j2, 2m2 = %d %d %d %d: bound %g", a, x, b, y, bound)
			}
			if root > 0 {
				least = min(least, bound/root)
			}
		}
	}
	t.Logf("the bound is at least %.0f times the error", least)
	if least > 200 {
		t.Error("the bound is far too wide")
	}
}

// A solution with an admixture of the neighboring eigenvector, which the residual must show through the gap:
// the bound is the admixture, neither less nor much more.
func TestRowErrorOfAdmixture(t *testing.T) {
	const admixture = 0x1p-40
	for a := 1; a <= 12; a++ {
		for b := 1; b <= 12; b++ {
			for x := -a; x < a; x += 2 {
				for y := -b + 2; y <= b; y += 2 {
					r, n, negative := newThreeJRow(a, x, b, y)
					v, low := make([]float64, n), make([]float64, n)
					r.Solve(v, low, 1, negative)
					next, _, negative := newThreeJRow(a, x+2, b, y-2)
					other := make([]float64, n)
					next.Solve(other, nil, 1, negative)
					for i := range v {
						v[i] += admixture * other[i]
					}
					if bound := r.Error(v, low, 1, threeJGap); bound < admixture*(1-0x1p-10) || bound > 1.02*admixture {
						t.Fatalf("2j1, 2m1, 2j2, 2m2 = %d %d %d %d: bound %g for an admixture of %g", a, x, b, y, bound, admixture)
					}
				}
			}
		}
	}
}
