// Package mantissa multiplies positive numbers of 64 bits, which is half the work of double-double arithmetic and
// enough to round nearly all products to a float64: eleven bits are left to tell on which side of a boundary
// they are.
package mantissa

import (
	"math"
	"math/bits"

	"example.org/couplet/internal/dd"
)

// Number is M*2^(Exp-63), with the top bit of M set, so that it is between 2^Exp and twice that. Zero has M = 0.
//
// Relative errors are counted in units of 2^-64. Rounding to nearest leaves 1, rounding down leaves 2 by which
// the number is too small; errors of factors add up. As M is below 2^64, n units are at most n in M.
type Number struct {
	M   uint64
	Exp int
}

// Mul returns a*b, rounded down.
func (a Number) Mul(b Number) Number {
	h, l := bits.Mul64(a.M, b.M)
	top := uint64(int64(h) >> 63) // all ones where the top bit is set: a branch would be a random one
	return Number{h + (h+l>>63)&^top, a.Exp + b.Exp - int(top)}
}

// Words returns how many words of 64 bits hold, with a sign, every integer up to 1/a. It allows for an error of a
// factor of two.
func (a Number) Words() int { return (65 - a.Exp) >> 6 }

// FromMod64 returns the absolute value of the number between -2^63 and 2^63 that n is congruent to modulo 2^64,
// exactly, and its sign, 1 where it is negative.
func FromMod64(n uint64) (a Number, sign uint64) {
	sign = n >> 63
	n = n ^ -sign + sign
	shift := bits.LeadingZeros64(n)
	return Number{n << (shift & 63), 63 - shift}, sign
}

// FromMod128 does the same for two words, rounding down.
func FromMod128(high, low uint64) (a Number, sign uint64) {
	sign = high >> 63
	low, carry := bits.Add64(low^-sign, sign, 0)
	return fromWords(high^-sign+carry, low, 63), sign
}

// FromMod192 does the same for three words.
func FromMod192(high, middle, low uint64) (a Number, sign uint64) {
	sign = high >> 63
	low, carry := bits.Add64(low^-sign, sign, 0)
	middle, carry = bits.Add64(middle^-sign, 0, carry)
	high = high ^ -sign + carry
	if high == 0 {
		return fromWords(middle, low, 63), sign
	}
	return fromWords(high, middle, 127), sign
}

// fromWords returns (high*2^64 + low) * 2^(exp-63), rounded down.
func fromWords(high, low uint64, exp int) Number {
	if high == 0 {
		shift := bits.LeadingZeros64(low)
		return Number{low << (shift & 63), exp - shift}
	}
	shift := bits.LeadingZeros64(high)
	return Number{high<<(shift&63) | low>>1>>(63-shift&63), exp + 64 - shift}
}

// FromPair returns a > 0, to nearest. a must be in normal form.
func FromPair(a dd.Pair) Number {
	b := math.Float64bits(a.Hi)
	exp := int(b>>52) - 1023
	m := (b&(1<<52-1) | 1<<52) << 11
	// The low part is at most 2^10 ulp; adding and subtracting 3*2^51 rounds it.
	low := float64(a.Lo*math.Float64frombits(uint64(1023+63-exp)<<52)) + 3<<51
	m += uint64(int64(low - 3<<51))
	if m>>63 == 0 { // a power of two, less a little
		return Number{m << 1, exp - 1}
	}
	return Number{m, exp}
}

// Round returns the float64 nearest to the number whose M is above M-below and below M+above, negative where sign
// is 1. ok is false where that leaves two possibilities. The result must be a normal number.
func (a Number) Round(below, above, sign uint64) (f float64, ok bool) {
	low, high := ((a.M-below)>>10+1)>>1, ((a.M+above)>>10+1)>>1
	// The top bit of the 53 adds one to the exponent.
	return math.Float64frombits(sign<<63 | (uint64(a.Exp+1022)<<52 + low)), low == high
}
