package wigner

import (
	"sync/atomic"

	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
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
// tie, whatever its size. Zeros and panics are those of ClebschGordan; a value below the subnormal numbers
// becomes a zero with its sign. It allocates nothing while j1+j2+j <= 300, but for tables that are built by the
// first calls.
func ClebschGordanFloat(j1, m1, j2, m2, j, m rational.Half) float64 {
	var r regge
	if !r.set(j1, j2, j, m1, m2, m.Neg()) {
		forbidden("wigner.ClebschGordanFloat", &cgNames, j1, j2, j, m1, m2, m.Neg())
		return 0
	}
	return r.float(true)
}

// largeError bounds the relative error before rounding, derived at largeFront.
const largeError = 0x1p-98

// rowTotal is the J beyond which the row, in time proportional to J, is faster than the sum; a calibration.
const rowTotal = 6000

// fallbacks counts the values that only the exact route could round.
var fallbacks atomic.Int64

// float returns the value: the integer sum, exact or its leading bits, times the front, rounded where the error
// bound allows, in 64 bits first and then in double-double, and by the exact route elsewhere.
func (r *regge) float(coefficient bool) float64 {
	var f float64
	var ok bool
	total := r.total()
	if total < dd.BinomialTops {
		f, ok = r.fewWords(coefficient)
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

// fewWords is the route for symbols whose binomials are in the tables; ok is false, too, where two words are not
// sure to hold the sum. No symbol exceeds 1, so that |S| <= 1/front.
func (r *regge) fewWords(coefficient bool) (f float64, ok bool) {
	var sum binsum.Triple
	r.sum(&sum)
	sign := uint64(r.sign(r, coefficient))
	if r.total() <= 66 { // |S| <= C(66, 33) < 2^63, see binsum.Triple
		s := sum.Mod64()
		if s == 0 {
			return 0, true
		}
		n, minus := mantissa.FromMod64(s)
		if f, ok = r.smallFront(coefficient).Mul(n).Round(smallBelow, smallAbove, sign^minus); ok {
			return f, ok
		}
		return r.roundLarge(r, dd.Scaled{Pair: dd.FromInt64(int64(s))}, coefficient)
	}
	front := r.smallFront(coefficient)
	if front.Words() > 2 {
		return 0, false
	}
	high, low := sum.Mod128()
	if high|low == 0 {
		return 0, true
	}
	n, minus := mantissa.FromMod128(high, low)
	if f, ok = front.Mul(n).Round(smallBelow, smallAbove, sign^minus); ok {
		return f, ok
	}
	return r.roundLarge(r, dd.Scaled{Pair: dd.FromMod128(high, low).Normal()}, coefficient)
}

func (r *regge) manyWords(coefficient bool) (f float64, ok bool) {
	if r.total() >= dd.MostFactorials {
		return 0, false
	}
	image := r.shortest()
	var sum binsum.Triple
	image.sum(&sum)
	words := sum.Sum()
	high, low, exp, negative := words.Leading()
	if high == 0 {
		return 0, true
	}
	return r.roundLarge(&image, dd.Scaled{Pair: dd.FromWords(high, low).Normal().Scale(0, negative), Exp: exp}, coefficient)
}

// roundLarge rounds the product of the front from factorials and the sum of an image of r.
func (r *regge) roundLarge(image *regge, sum dd.Scaled, coefficient bool) (f float64, ok bool) {
	front := image.largeFront()
	if coefficient {
		front = front.Mul(dd.Scaled{Pair: dd.Factorials(r.total() + 1).Sqrt[r.twiceJ3()+1]})
	}
	if f, ok = front.Mul(sum).Round(largeError); r.sign(image, coefficient) != 0 {
		f = -f
	}
	return f, ok
}

// How far M of the product of smallFront and the sum may be above and below that of the true value. Seven entries
// of tables leave 1 each, in either direction; seven products and the sum, which are rounded down, 2 each; and
// 1 is for all that is of second order.
const (
	smallBelow = 7 + 1
	smallAbove = 7 + 2*8 + 1
)

// smallFront returns the square root of
//
//	Π (ji+mi)!(ji-mi)! / (n1! n2! n3! (J+1)!)
//	  = C(2j1, n1) C(2j2, n1) / [ (J+1) C(J, n1) C(2j1, j1+m1) C(2j2, j2+m2) C(2j3, j3+m3) ]
//
// times 2j3+1 for a Clebsch-Gordan coefficient.
func (r *regge) smallFront(coefficient bool) mantissa.Number {
	d := mantissa.SqrtBinomials()
	n3, n2, n1 := r[0], r[1], r[2]
	u := d.Root[dd.Place(n1+n2, n1)].Mul(d.Root[dd.Place(n1+n3, n1)])
	v := d.Inverse[dd.Place(n1+n2, r[3])].Mul(d.Inverse[dd.Place(n1+n3, r[4])])
	w := d.Inverse[dd.Place(n2+n3, r[5])].Mul(d.InverseNext[dd.Place(n1+n2+n3, n1)])
	if coefficient {
		w = w.Mul(d.Sqrt[n2+n3+1])
	}
	return u.Mul(v).Mul(w)
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
