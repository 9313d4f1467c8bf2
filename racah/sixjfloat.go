package racah

import (
	"sync/atomic"

	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/rational"
)

// SixJFloat returns the float64 nearest to the 6j symbol of [SixJ], to even on a tie, whatever its size.
// Zeros and panics are those of SixJ. It allocates nothing while every triad adds up to 300 at most, but for
// tables that are built by the first calls.
func SixJFloat(j1, j2, j3, l1, l2, l3 rational.Half) float64 {
	a, b, c, d, e, f := j1.Twice(), j2.Twice(), j3.Twice(), l1.Twice(), l2.Twice(), l3.Twice()
	if max(a, b, c, d, e, f) <= smallTop {
		v, ok := small().at(a, b, c, d, e, f)
		if !ok {
			forbidden("racah.SixJFloat", &sixJNames, j1, j2, j3, l1, l2, l3)
		}
		return v
	}
	var k tetrad
	if !k.set(j1, j2, j3, l1, l2, l3) {
		forbidden("racah.SixJFloat", &sixJNames, j1, j2, j3, l1, l2, l3)
		return 0
	}
	return k.float(false)
}

// WFloat returns the float64 nearest to the Racah coefficient of [W], to even on a tie, whatever its
// size. Zeros and panics are those of W. It allocates nothing while every triad adds up to 300 at most.
func WFloat(a, b, c, d, e, f rational.Half) float64 {
	var k tetrad
	if !k.set(a, b, e, d, c, f) {
		forbidden("racah.WFloat", &wNames, a, b, e, d, c, f)
		return 0
	}
	return k.float(wPhase(a, b, c, d))
}

// Bounds on the relative error before rounding, derived at smallFront and largeFront.
const (
	smallError = 0x1p-97
	largeError = 0x1p-98
)

// fallbacks counts the values that only the exact route could round.
var fallbacks atomic.Int64

// float returns the value, or its negative: the front in double-double times the integer sum, which is
// exact, rounded where the error bound allows, and by the exact route elsewhere.
func (k *tetrad) float(negative bool) float64 {
	var sum binsum.Quadruple
	k.sum(&sum)
	f, ok := 0.0, false
	if sum.Fits() && sum.T < dd.BinomialTops { // no triad is larger
		f, ok = k.fewWords(&sum, negative)
	} else {
		f, ok = k.manyWords(&sum, negative)
	}
	if ok {
		return f
	}
	fallbacks.Add(1)
	v := k.exact()
	if negative {
		v = v.Neg()
	}
	return v.Float64()
}

// fewWords is the route for symbols whose binomials are in the tables. No symbol exceeds 1, so that
// |S| <= 1/front tells how many words hold the sum.
func (k *tetrad) fewWords(sum *binsum.Quadruple, negative bool) (f float64, ok bool) {
	front := k.smallFront(sum)
	var s dd.Pair
	switch {
	case front.Hi > 0x1p-62:
		s = dd.FromInt64(int64(sum.Mod64()))
	case front.Hi > 0x1p-126:
		s = dd.FromMod128(sum.Mod128())
	default:
		if front.Hi > 0x1p-190 {
			if w, ok := sum.Mod192(); ok {
				s = dd.FromMod192(w.High, w.Middle, w.Low)
				break
			}
		}
		words := sum.Sum()
		if high, low, exp, sign := words.Leading(); high != 0 {
			s = dd.FromWords(high, low).Scale(exp, sign)
		}
	}
	if s.Hi == 0 {
		return 0, true
	}
	return front.Mul(s.Scale(0, negative)).Round(smallError)
}

func (k *tetrad) manyWords(sum *binsum.Quadruple, negative bool) (f float64, ok bool) {
	if k.top() > dd.MostFactorials {
		return 0, false
	}
	words := sum.Sum()
	high, low, exp, sign := words.Leading()
	if high == 0 {
		return 0, true
	}
	s := dd.Scaled{Pair: dd.FromWords(high, low).Normal().Scale(0, sign != negative), Exp: exp}
	return k.largeFront().Mul(s).Round(largeError)
}

// smallFront returns Δ(aef) Δ(dbf) Δ(dec) / Δ(abc), each triangle coefficient by
//
//	Δ(abc)^2 = 1/[ (J+1) C(J, n1) C(J-n1, n2) ],    J = n1+n2+n3
//
// In units of u^2 the eight entries have errors of 19 each; four products of 1-pairs cost 7 each, two of
// 3-pairs 25 each, that of the two 7-pairs 85, and that with the sum, 15*3, costs 85 with 2 for the sum
// itself (dd.Pair.Mul): 404 in all with the 2 of the rounding, below 2^9 u^2 = 2^-97.
func (k *tetrad) smallFront(s *binsum.Quadruple) dd.Pair {
	d := dd.SqrtBinomials()
	front := d.RootNext[dd.Place(s.T, s.N1)].Mul(d.Root[dd.Place(k.c, s.N2)])
	aef, dbf, dec := delta(d, s.S2, k.a, k.e), delta(d, s.S3, k.d, k.b), delta(d, s.S1, k.d, k.e)
	return front.Mul(aef).Mul(dbf.Mul(dec))
}

// delta returns the triangle coefficient of three momenta that add up to j, the first two of them given as
// twice their values, with an error of 45 u^2.
func delta(d *dd.Binomials, j, x, y int) dd.Pair {
	return d.InverseNext[dd.Place(j, j-x)].Mul(d.Inverse[dd.Place(x, j-y)])
}

// top returns the largest number whose factorial is in the symbol.
func (k *tetrad) top() int {
	return max(k.a+k.b+k.c, k.a+k.e+k.f, k.d+k.b+k.f, k.d+k.e+k.c)/2 + 1
}

// largeFront returns the same front from factorials: sixteen factors with an error of u^2, and sixteen
// multiplications, that of the sum among them, with 5 u^2. With 2 for the sum and 2 for the rounding
// that is below 2^7 u^2 = 2^-99.
func (k *tetrad) largeFront() dd.Scaled {
	t := dd.Factorials(k.top())
	z := dd.Scaled{Pair: dd.Pair{Hi: 1}}
	triangle := func(up, down []dd.Scaled, x, y, w int) {
		z = z.Mul(up[(x+y-w)/2]).Mul(up[(y+w-x)/2]).Mul(up[(w+x-y)/2]).Mul(down[(x+y+w)/2+1])
	}
	triangle(t.Inverse, t.Root, k.a, k.b, k.c)
	triangle(t.Root, t.Inverse, k.a, k.e, k.f)
	triangle(t.Root, t.Inverse, k.d, k.b, k.f)
	triangle(t.Root, t.Inverse, k.d, k.e, k.c)
	return z
}
