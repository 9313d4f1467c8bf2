package racah

import (
	"sync/atomic"

	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/rational"
)

// SixJFloat returns the float64 nearest to the 6j symbol of [SixJ], to even on a tie, whatever its size.
// Zeros and panics are those of SixJ; a value below the subnormal numbers becomes a zero with its sign. It
// allocates nothing while every triad adds up to 300 at most, but for tables that are built by the first calls.
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
	if f, ok := k.fewWords(false); ok { // as in float, whose call costs a nanosecond
		return f
	}
	return k.longer(false)
}

// WFloat returns the float64 nearest to the Racah coefficient of [W], to even on a tie, whatever its
// size. Zeros and panics are those of W; a value below the subnormal numbers becomes a zero with its sign. It
// allocates nothing while every triad adds up to 300 at most, but for tables that are built by the first calls.
func WFloat(a, b, c, d, e, f rational.Half) float64 {
	if max(a.Twice(), b.Twice(), c.Twice(), d.Twice(), e.Twice(), f.Twice()) <= smallTop {
		v, ok := small().at(a.Twice(), b.Twice(), e.Twice(), d.Twice(), c.Twice(), f.Twice())
		if !ok {
			forbidden("racah.WFloat", &wNames, a, b, e, d, c, f)
		}
		if wPhase(a, b, c, d) {
			return 0 - v // not -v: zeros have no sign
		}
		return v
	}
	var k tetrad
	if !k.set(a, b, e, d, c, f) {
		forbidden("racah.WFloat", &wNames, a, b, e, d, c, f)
		return 0
	}
	return k.float(wPhase(a, b, c, d))
}

// largeError bounds the relative error before rounding, derived at largeFront.
const largeError = 0x1p-98

// rowTotal is the T beyond which the row, in time proportional to it, is faster than the sum; a calibration.
const rowTotal = 4000

// fallbacks counts the values that only the exact route could round.
var fallbacks atomic.Int64

// float returns the value, or its negative: the integer sum, exact or its leading bits, times the front, rounded
// where the error bound allows, in 64 bits first and then in double-double, and by the exact route elsewhere.
func (k *tetrad) float(negative bool) float64 {
	if f, ok := k.fewWords(negative); ok {
		return f
	}
	return k.longer(negative)
}

// longer is float for what fewWords leaves open.
func (k *tetrad) longer(negative bool) float64 {
	f, ok := 0.0, false
	if k.T > rowTotal && k.T <= argument.MostInRow { // no 2j exceeds T
		f, ok = k.byRow(negative)
	}
	if !ok {
		f, ok = k.manyWords(negative)
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

// fewWords is the route for symbols whose binomials are in the tables; ok is false, too, where three words are
// not sure to hold the sum. No symbol exceeds 1, so that |S| <= 1/front.
func (k *tetrad) fewWords(negative bool) (f float64, ok bool) {
	if !k.Fits() || k.T >= dd.BinomialTops { // no triad is larger
		return 0, false
	}
	front := k.smallFront()
	var n mantissa.Number
	var sign uint64
	words := front.Words()
	switch words {
	case 1:
		n, sign = mantissa.FromMod64(k.Mod64())
	case 2:
		n, sign = mantissa.FromMod128(k.Mod128())
	default:
		w, ok := k.Mod192()
		if words > 3 || !ok {
			return 0, false
		}
		n, sign = mantissa.FromMod192(w.High, w.Middle, w.Low)
	}
	if n.M == 0 {
		return 0, true
	}
	if negative {
		sign ^= 1
	}
	if f, ok = front.Mul(n).Round(smallBelow, smallAbove, sign); ok {
		return f, ok
	}
	var s dd.Pair
	switch words {
	case 1:
		s = dd.FromInt64(int64(k.Mod64()))
	case 2:
		s = dd.FromMod128(k.Mod128()).Normal()
	default:
		return 0, false
	}
	return k.roundLarge(dd.Scaled{Pair: s}, negative)
}

func (k *tetrad) manyWords(negative bool) (f float64, ok bool) {
	if k.top() > dd.MostFactorials {
		return 0, false
	}
	sum := k.Sum()
	high, low, exp, minus := sum.Leading()
	if high == 0 {
		return 0, true
	}
	return k.roundLarge(dd.Scaled{Pair: dd.FromWords(high, low).Normal().Scale(0, minus), Exp: exp}, negative)
}

// roundLarge rounds the product of the front from factorials and the sum.
func (k *tetrad) roundLarge(sum dd.Scaled, negative bool) (f float64, ok bool) {
	if f, ok = k.largeFront().Mul(sum).Round(largeError); negative {
		f = -f
	}
	return f, ok
}

// How far M of the product of smallFront and the sum may be above and below that of the true value. Eight
// entries of tables leave 1 each, in either direction; eight products and the sum, which are rounded down, 2
// each; and 1 is for all that is of second order.
const (
	smallBelow = 8 + 1
	smallAbove = 8 + 2*9 + 1
)

// smallFront returns the triangle coefficients of three triads divided by that of the one in front, each by
//
//	Δ(abc)^2 = 1/[ (J+1) C(J, n1) C(J-n1, n2) ],    J = n1+n2+n3
//
// with the numbers of triads.
func (k *tetrad) smallFront() mantissa.Number {
	d := mantissa.SqrtBinomials()
	q1, q2, q3 := k.N1+k.S1, k.N2+k.S2, k.N3+k.S3
	front := d.RootNext[dd.Place(k.T, k.N1)].Mul(d.Root[dd.Place(k.N2+k.N3, k.N2)])
	first := delta(d, k.S1, q1-k.T, k.S1-(q1-k.T), q2-k.S3)
	second := delta(d, k.S2, q2-k.T, k.S2-(q2-k.T), q1-k.S3)
	third := delta(d, k.S3, q3-k.T, k.S3-(q3-k.T), q1-k.S2)
	return front.Mul(first).Mul(second.Mul(third))
}

// delta returns the triangle coefficient of a triad that adds up to j, x and y being two of its excesses, and
// rest = j-x: without the subtraction it is small enough to be inlined.
func delta(d *mantissa.Binomials, j, x, rest, y int) mantissa.Number {
	return d.InverseNext[dd.Place(j, x)].Mul(d.Inverse[dd.Place(rest, y)])
}

// top returns the largest number whose factorial is in the symbol.
func (k *tetrad) top() int { return max(k.T, k.S1, k.S2, k.S3) + 1 }

// largeFront returns the same front from factorials: sixteen factors with an error of u^2, and sixteen
// multiplications, that of the sum among them, with 5 u^2. With 2 for the sum and 2 for the rounding
// that is below 2^7 u^2 = 2^-99.
func (k *tetrad) largeFront() dd.Scaled {
	table := dd.Factorials(k.top())
	z := dd.Scaled{Pair: dd.Pair{Hi: 1}}
	for i, t := range k.triads() {
		up, down := table.Root, table.Inverse
		if i == 0 {
			up, down = down, up
		}
		z = z.Mul(up[t[1]]).Mul(up[t[2]]).Mul(up[t[3]]).Mul(down[t[0]+1])
	}
	return z
}
