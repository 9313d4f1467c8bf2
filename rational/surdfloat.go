package rational

import (
	"fmt"
	"math"
	"math/big"
)

// Float64 returns the float64 nearest to s, to even on a tie; ±Inf beyond the range of float64. The
// result is right for numerators and denominators of any size, subnormal results included.
func (s Surd) Float64() float64 {
	if s.wide == nil && s.num != 0 {
		if f, ok := s.quick(); ok {
			return f
		}
	}
	if s.isRational() {
		f, _ := s.Coeff().Float64()
		return f
	}
	// 66 bits leave the rounding to 53 or fewer a sticky bit to spare.
	f, _ := s.truncated(66).Float64()
	return f
}

// Float returns s rounded to nearest even at the given precision in bits. It panics with
// *ArgumentError for prec = 0 or prec > 2^24.
func (s Surd) Float(prec uint) *big.Float {
	mustPrec("rational.Surd.Float", prec)
	return s.rounded(prec)
}

func (s Surd) rounded(prec uint) *big.Float {
	z := new(big.Float).SetPrec(prec)
	if s.isRational() {
		return z.SetRat(s.Coeff())
	}
	return z.Set(s.truncated(prec + 3))
}

func mustPrec(fn string, prec uint) {
	if prec == 0 || prec > 1<<24 {
		panic(&ArgumentError{fn, "prec", fmt.Sprint(prec), "from 1 to 16777216"})
	}
}

// truncated returns an irrational s cut off after at least prec bits, with one more bit set that
// stands for the rest. Rounding the result to fewer than prec bits is rounding s itself: it is no
// tie and no short number, since s is neither.
func (s Surd) truncated(prec uint) *big.Float {
	num, den, rad := s.parts()
	square := new(big.Int).Mul(num, num)
	square.Mul(square, rad)
	den2 := new(big.Int).Mul(den, den)
	// s^2 * 4^shift has at least 2 prec bits before the point, so its root has prec.
	shift := int(prec) + (den2.BitLen()-square.BitLen())/2 + 2
	if shift >= 0 {
		square.Lsh(square, uint(2*shift))
	} else {
		den2.Lsh(den2, uint(-2*shift))
	}
	// The floor of the root of a floor is the floor of the root.
	root := square.Sqrt(square.Quo(square, den2))
	root.Lsh(root, 1).SetBit(root, 0, 1)
	if s.Sign() < 0 {
		root.Neg(root)
	}
	f := new(big.Float).SetPrec(uint(root.BitLen())).SetInt(root)
	return f.SetMantExp(f, -shift-1)
}

// quick is Float64 in double-double arithmetic, for a non-zero value in words; ok is false where its error
// leaves the rounding open.
//
// In units of u^2 = 2^-106, relative: numerator, denominator and radicand are pairs without error. The
// root is q + e with q rounded and e = (r - q^2)/(2q) below 2u: leaving out e^2/(2q) costs 2, the roundings
// of the residue and of the quotient cost 6. The product leaves out a product of low parts, at most 2u
// each, and rounds three of up to 4u: 4 + 12. The division leaves out the square of a relative 3u and
// rounds four times at 3u or less: 9 + 12. That is below 64 with the rounding test, 2^-100. Nothing is
// near underflow or overflow: 2^-64 <= |s| < 2^95.
func (s Surd) quick() (f float64, ok bool) {
	h, l := split(magnitude(s.num))
	if s.rad != 1 {
		rh, rl := split(s.rad)
		q := math.Sqrt(rh)
		e := (math.FMA(-q, q, rh) + rl) / (2 * q)
		p := float64(h * q)
		low := math.FMA(h, q, -p) + (float64(h*e) + float64(l*q))
		h, l = twoSum(p, low)
	}
	if s.den != 1 {
		dh, dl := split(s.den)
		q := h / dh
		rest := math.FMA(-q, dh, h) + (l - float64(q*dl))
		h, l = twoSum(q, rest/dh)
	}
	err := float64(h * 0x1p-100)
	f = h + (l - err)
	if f != h+(l+err) {
		return 0, false
	}
	if s.num < 0 {
		f = -f
	}
	return f, true
}

// split returns n as a float64 and what is left, exactly.
func split(n uint64) (hi, lo float64) {
	top := n &^ (1<<11 - 1) // 53 bits
	return twoSum(float64(top), float64(n-top))
}

// twoSum returns a + b exactly, for |a| >= |b| (Dekker).
func twoSum(a, b float64) (hi, lo float64) {
	hi = a + b
	return hi, b - (hi - a)
}
