package dd

import (
	"math"
	"math/bits"
)

// FromMod128 returns the number between -2^127 and 2^127 that high*2^64 + low is congruent to modulo
// 2^128, as a 3-pair with a relative error below 2 u^2; it is exactly zero for zero.
func FromMod128(high, low uint64) Pair {
	negative := false
	if int64(high) < 0 {
		var borrow uint64
		low, borrow = bits.Sub64(0, low, 0)
		high, _ = bits.Sub64(0, high, borrow)
		negative = true
	}
	if high|low == 0 {
		return Pair{}
	}
	shift := bits.LeadingZeros64(high)
	if high == 0 {
		shift = 64 + bits.LeadingZeros64(low)
		high, low = low, 0
	}
	high, low = high<<(shift&63)|low>>1>>(63-shift&63), low<<(shift&63)
	return FromWords(high, low).Scale(-shift, negative)
}

// FromMod192 is FromMod128 for three words, the number being between -2^191 and 2^191.
func FromMod192(high, middle, low uint64) Pair {
	negative := int64(high) < 0
	if negative {
		var borrow uint64
		low, borrow = bits.Sub64(0, low, 0)
		middle, borrow = bits.Sub64(0, middle, borrow)
		high, _ = bits.Sub64(0, high, borrow)
	}
	if high == 0 {
		if int64(middle) < 0 { // more than FromMod128 takes
			return FromWords(middle, low).Scale(0, negative)
		}
		return FromMod128(middle, low).Scale(0, negative)
	}
	shift := bits.LeadingZeros64(high)
	high, middle = high<<(shift&63)|middle>>1>>(63-shift&63), middle<<(shift&63)|low>>1>>(63-shift&63)
	return FromWords(high, middle).Scale(64-shift, negative)
}

// Scale returns a*2^exp, or its negative. The result must be far from underflow and overflow.
func (a Pair) Scale(exp int, negative bool) Pair {
	factor := math.Float64frombits(uint64(1023+exp) << 52)
	if negative {
		factor = -factor
	}
	return Pair{float64(a.Hi * factor), float64(a.Lo * factor)}
}
