// Package dd is the double-double arithmetic in which coupling coefficients are rounded: a number is
// the unevaluated sum of two float64, and every operation has a proven bound, so that a result is
// either rounded correctly or known to be too close to call.
//
// u is 2^-53 throughout. Products that must be rounded are written float64(x*y), and those that must
// not as math.FMA, so that the bits are the same on every platform.
package dd

import "math"

// Pair is Hi + Lo. It is called a c-pair where |Lo| <= c u |Hi|; a 1-pair is in normal form, Hi being
// the sum rounded to a float64.
type Pair struct{ Hi, Lo float64 }

// Mul returns a*b. The product of an a-pair and a b-pair is an (a+b+1)-pair, to first order in u, and
// differs from a*b by at most
//
//	(ab + b + (a+b) + (a+b+1)) u^2
//
// relative to it, plus terms in u^3: Lo*Lo is left out, and the three roundings are those of
// a.Hi*b.Lo <= b u, of the sum of both cross terms <= (a+b) u, and of their sum with the error of
// a.Hi*b.Hi <= (a+b+1) u. The parts must stay clear of underflow, and of overflow.
func (a Pair) Mul(b Pair) Pair {
	p := float64(a.Hi * b.Hi)
	e := math.FMA(a.Hi, b.Hi, -p)
	return Pair{p, e + math.FMA(a.Lo, b.Hi, float64(a.Hi*b.Lo))}
}

// Times returns a*f, for a c-pair a (c+1)-pair, with a relative error below (2c+1) u^2.
func (a Pair) Times(f float64) Pair {
	p := float64(a.Hi * f)
	return Pair{p, math.FMA(a.Hi, f, -p) + float64(a.Lo*f)}
}

// Add returns a+b in normal form. For c-pairs the error is below (4c+2) u^2 times the larger of |a| and
// |b|; for integers below 2^104, all parts being integers, there is none.
func (a Pair) Add(b Pair) Pair {
	s := a.Hi + b.Hi
	t := s - a.Hi
	e := (a.Hi - (s - t)) + (b.Hi - t) // Knuth's two-sum
	return Pair{s, e + (a.Lo + b.Lo)}.Normal()
}

// Normal returns a in normal form, exactly (Dekker's fast two-sum, |a.Lo| <= |a.Hi|).
func (a Pair) Normal() Pair {
	hi := a.Hi + a.Lo
	return Pair{hi, a.Lo - (hi - a.Hi)}
}

// FromInt64 returns n, exactly, as a 1-pair.
func FromInt64(n int64) Pair {
	hi := float64(n)
	if hi == 0x1p63 { // the conversion back would overflow
		return Pair{hi, float64(n-math.MaxInt64) - 1}
	}
	return Pair{hi, float64(n - int64(hi))}
}

// FromWords returns high*2^64 + low as a 3-pair, for high with its top bit set, with a relative error
// below 2 u^2.
func FromWords(high, low uint64) Pair {
	// high = a + b exactly, with |b| <= 2^10. Where a is 2^64 its low word is 0.
	a, back := float64(high), uint64(0)
	if a < 0x1p64 {
		back = uint64(a)
	}
	b := float64(int64(high - back))
	// The roundings of low and of the sum are below 2^10 + 2^21, and the number is at least 2^127.
	return Pair{float64(a * 0x1p64), float64(b*0x1p64) + float64(low)}
}

// Round returns the float64 nearest to a number that differs from a by at most err*|a|, to even on a
// tie. ok is false where that leaves two possibilities. a must be far from underflow and overflow.
//
// err must allow for 2 u^2 beyond the error of a, for the roundings here.
func (a Pair) Round(err float64) (f float64, ok bool) {
	a = a.Normal()
	e := float64(math.Abs(a.Hi) * err)
	f = a.Hi + (a.Lo - e)
	return f, f == a.Hi+(a.Lo+e)
}

// Sqrt returns the square root of n > 0, below 2^53, in normal form with an error below 8 u^2: the root
// rounded, and half of what is left of n divided by it.
func Sqrt(n int) Pair {
	x := float64(n)
	q := math.Sqrt(x)
	return Pair{q, math.FMA(-q, q, x) / (2 * q)}.Normal()
}
