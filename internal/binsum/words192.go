package binsum

import "math/bits"

// Words192 is a number modulo 2^192.
type Words192 struct{ High, Middle, Low uint64 }

// product192 returns the product of three numbers of one word.
func product192(a, b, c uint64) Words192 {
	h, l := bits.Mul64(a, b)
	middle, low := bits.Mul64(l, c)
	high, m := bits.Mul64(h, c)
	middle, carry := bits.Add64(middle, m, 0)
	return Words192{high + carry, middle, low}
}

// mul returns the product with a number of three words.
func (a Words192) mul(high, middle, low uint64) Words192 {
	m, l := bits.Mul64(a.Low, low)
	h1, m1 := bits.Mul64(a.Low, middle)
	h2, m2 := bits.Mul64(a.Middle, low)
	m, c1 := bits.Add64(m, m1, 0)
	m, c2 := bits.Add64(m, m2, 0)
	return Words192{h1 + h2 + c1 + c2 + a.Low*high + a.Middle*middle + a.High*low, m, l}
}

// sub returns the difference.
func (a Words192) sub(b Words192) Words192 {
	l, borrow := bits.Sub64(a.Low, b.Low, 0)
	m, borrow := bits.Sub64(a.Middle, b.Middle, borrow)
	return Words192{a.High - b.High - borrow, m, l}
}
