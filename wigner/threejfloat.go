package wigner

import (
	"sync/atomic"

	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/dd"
	"example.org/couplet/rational"
)

// ThreeJFloat returns the float64 nearest to the 3j symbol of [ThreeJ], to even on a tie, whatever its
// size. Zeros and panics are those of ThreeJ; a value below the subnormal numbers becomes a zero with its
// sign. It allocates nothing while j1+j2+j3 <= 300, but for tables that are built by the first calls.
func ThreeJFloat(j1, j2, j3, m1, m2, m3 rational.Half) float64 {
	var r regge
	if !r.set(j1, j2, j3, m1, m2, m3) {
		forbidden("wigner.ThreeJFloat", &threeJNames, j1, j2, j3, m1, m2, m3)
		return 0
	}
	if max(j1.Twice(), j2.Twice(), j3.Twice()) <= smallTop {
		return small().at(&r)
	}
	return r.float(false)
}

// ClebschGordanFloat returns the float64 nearest to the coefficient of [ClebschGordan], to even on a
// tie, whatever its size. Zeros and panics are those of ClebschGordan. It allocates nothing while
// j1+j2+j <= 300.
func ClebschGordanFloat(j1, m1, j2, m2, j, m rational.Half) float64 {
	var r regge
	if !r.set(j1, j2, j, m1, m2, m.Neg()) {
		forbidden("wigner.ClebschGordanFloat", &cgNames, j1, j2, j, m1, m2, m.Neg())
		return 0
	}
	return r.float(true)
}

// Bounds on the relative error before rounding, derived at smallFront and largeFront.
const (
	smallError = 0x1p-97
	largeError = 0x1p-98
)

// rowTotal is the J beyond which the row, in time proportional to J, is faster than the sum; a calibration.
const rowTotal = 6000

// fallbacks counts the values that only the exact route could round.
var fallbacks atomic.Int64

// float returns the value: the front in double-double times the integer sum, which is exact, rounded
// where the error bound allows, and by the exact route elsewhere.
func (r *regge) float(coefficient bool) float64 {
	var f float64
	var ok bool
	total := r.total()
	if total <= 66 { // |S| <= C(66, 33) < 2^63, see binsum.Triple
		f, ok = r.oneWord(coefficient)
	} else if total < dd.BinomialTops {
		f, ok = r.twoWords(coefficient)
	} else if total > rowTotal && total <= argument.MostInRow { // no 2j exceeds J
		f, ok = r.byRow(coefficient)
	}
	if !ok {
		f, ok = r.manyWords(coefficient)
	}
	if ok {
		return f
	}
	fallbacks.Add(1)
	return r.exact(coefficient).Float64()
}

func (r *regge) oneWord(coefficient bool) (f float64, ok bool) {
	sum := r.sum()
	s := int64(sum.Mod64())
	if s == 0 {
		return 0, true
	}
	if r.sign(r, coefficient) != 0 {
		s = -s
	}
	return r.smallFront(coefficient).Mul(dd.FromInt64(s)).Round(smallError)
}

// twoWords returns ok = false, too, where two words are not sure to hold the sum. No symbol exceeds 1, so that
// |S| <= 1/front.
func (r *regge) twoWords(coefficient bool) (f float64, ok bool) {
	front := r.smallFront(coefficient)
	if front.Hi < 0x1p-126 {
		return 0, false
	}
	sum := r.sum()
	s := dd.FromMod128(sum.Mod128())
	if s.Hi == 0 {
		return 0, true
	}
	return front.Mul(s.Scale(0, r.sign(r, coefficient) != 0)).Round(smallError)
}

func (r *regge) manyWords(coefficient bool) (f float64, ok bool) {
	if r.total() >= dd.MostFactorials {
		return 0, false
	}
	image := r.shortest()
	sum := image.sum()
	words := sum.Sum()
	high, low, exp, negative := words.Leading()
	if high == 0 {
		return 0, true
	}
	s := dd.Scaled{Pair: dd.FromWords(high, low).Normal(), Exp: exp}
	front := image.largeFront()
	if coefficient {
		front = front.Mul(dd.Scaled{Pair: dd.Factorials(r.total() + 1).Sqrt[r.twiceJ3()+1]})
	}
	if f, ok = front.Mul(s).Round(largeError); negative != (r.sign(&image, coefficient) != 0) {
		f = -f
	}
	return f, ok
}

// smallFront returns the square root of
//
//	Π (ji+mi)!(ji-mi)! / (n1! n2! n3! (J+1)!)
//	  = C(2j1, n1) C(2j2, n1) / [ (J+1) C(J, n1) C(2j1, j1+m1) C(2j2, j2+m2) C(2j3, j3+m3) ]
//
// times 2j3+1 for a Clebsch-Gordan coefficient.
//
// In units of u^2 the six entries have errors of 19 each, sqrt(2j3+1) of 1; the products of 1-pairs cost 7
// each, w*sqrt = 3*1 costs 13, v*w = 3*5 costs 37, u*(vw) = 3*9 costs 61, and the product with the sum, 13*3,
// costs 75 with 2 more for the sum itself (dd.Pair.Mul): 326 in all with the 2 of the rounding, below
// 2^9 u^2 = 2^-97.
func (r *regge) smallFront(coefficient bool) dd.Pair {
	d := dd.SqrtBinomials()
	n3, n2, n1 := r[0], r[1], r[2]
	u := d.Root[dd.Place(n1+n2, n1)].Mul(d.Root[dd.Place(n1+n3, n1)])
	v := d.Inverse[dd.Place(n1+n2, r[3])].Mul(d.Inverse[dd.Place(n1+n3, r[4])])
	w := d.Inverse[dd.Place(n2+n3, r[5])].Mul(d.InverseNext[dd.Place(n1+n2+n3, n1)])
	if coefficient {
		w = w.Mul(dd.Factorials(dd.BinomialTops).Sqrt[n2+n3+1])
	}
	return u.Mul(v.Mul(w))
}

// largeFront returns the square root of the same quotient of factorials. It and sqrt(2j3+1) are eleven
// factors with an error of u^2, and eleven multiplications, that of the sum among them, with 5 u^2. With 2
// for the sum and 2 for the rounding that is below 2^7 u^2 = 2^-99.
func (r *regge) largeFront() dd.Scaled {
	t := dd.Factorials(r.total() + 1)
	z := t.Inverse[r.total()+1]
	for i, n := range r {
		if i < 3 {
			z = z.Mul(t.Inverse[n])
		} else {
			z = z.Mul(t.Root[n])
		}
	}
	return z
}
