package binsum

import "math/bits"

// mul128 returns the product of two numbers of two words modulo 2^128.
func mul128(ah, al, bh, bl uint64) (high, low uint64) {
	high, low = bits.Mul64(al, bl)
	return high + ah*bl + al*bh, low
}

// sub128 returns the difference of two numbers of two words modulo 2^128.
func sub128(ah, al, bh, bl uint64) (high, low uint64) {
	low, borrow := bits.Sub64(al, bl, 0)
	high, _ = bits.Sub64(ah, bh, borrow)
	return high, low
}
