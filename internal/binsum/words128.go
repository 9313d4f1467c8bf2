package binsum

import "math/bits"

// Mul128 returns the product of two numbers of two words modulo 2^128.
func Mul128(ah, al, bh, bl uint64) (high, low uint64) {
	high, low = bits.Mul64(al, bl)
	return high + ah*bl + al*bh, low
}

// MulInt64 returns the product of two numbers with a sign as one modulo 2^128.
func MulInt64(a, b int64) (high, low uint64) {
	high, low = bits.Mul64(uint64(a), uint64(b))
	return high - uint64(a>>63)&uint64(b) - uint64(b>>63)&uint64(a), low
}

// mulWords returns the product of three numbers of one word modulo 2^128.
func mulWords(a, b, c uint64) (high, low uint64) {
	h, l := bits.Mul64(a, b)
	high, low = bits.Mul64(l, c)
	return high + h*c, low
}

// negated returns (-1)^n times a number of two words modulo 2^128.
func negated(high, low uint64, n int) (h, l uint64) {
	if n&1 != 0 {
		return sub128(0, 0, high, low)
	}
	return high, low
}

// Add128 returns the sum of two numbers of two words modulo 2^128.
func Add128(ah, al, bh, bl uint64) (high, low uint64) {
	low, carry := bits.Add64(al, bl, 0)
	high, _ = bits.Add64(ah, bh, carry)
	return high, low
}

// sub128 returns the difference of two numbers of two words modulo 2^128.
func sub128(ah, al, bh, bl uint64) (high, low uint64) {
	low, borrow := bits.Sub64(al, bl, 0)
	high, _ = bits.Sub64(ah, bh, borrow)
	return high, low
}
