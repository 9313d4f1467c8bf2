package binsum

import (
	"math/big"
	"math/bits"
)

// Numbers are little-endian slices of words here. Terms are positive and without leading zeros;
// totals have a fixed width and are in two's complement.

// mulWord returns x*m, in place where the capacity of x allows one more word.
func mulWord(x []big.Word, m uint) []big.Word {
	var carry uint
	for i := range x {
		hi, lo := bits.Mul(uint(x[i]), m)
		lo, c := bits.Add(lo, carry, 0)
		x[i], carry = big.Word(lo), hi+c
	}
	if carry != 0 {
		x = append(x, big.Word(carry))
	}
	return x
}

// divExact returns x/d in place, for a d > 0 that divides x.
//
// A division without remainder runs from the low end with the inverse of d modulo the word: two
// multiplications a word instead of a hardware division (Jebelean 1993).
func divExact(x []big.Word, d uint) []big.Word {
	if d == 1 {
		return x
	}
	shift := bits.TrailingZeros(d)
	d >>= shift
	// Newton's iteration doubles the correct bits, from 3 for the start value d itself.
	inverse := d
	for range 5 {
		inverse *= 2 - d*inverse
	}
	var carry, above uint
	for i := range x {
		if i+1 < len(x) {
			above = uint(x[i+1])
		} else {
			above = 0
		}
		w := uint(x[i])>>shift | above<<1<<(bits.UintSize-1-shift)
		w, borrow := bits.Sub(w, carry, 0)
		q := w * inverse
		hi, _ := bits.Mul(q, d)
		x[i], carry = big.Word(q), hi+borrow
	}
	for len(x) > 0 && x[len(x)-1] == 0 {
		x = x[:len(x)-1]
	}
	return x
}

// add adds x, which is not longer, to total.
func add(total, x []big.Word) {
	var carry uint
	for i, w := range x {
		var v uint
		v, carry = bits.Add(uint(total[i]), uint(w), carry)
		total[i] = big.Word(v)
	}
	for i := len(x); carry != 0 && i < len(total); i++ {
		total[i]++
		if total[i] != 0 {
			return
		}
	}
}

// subtract subtracts x, which is not longer, from total.
func subtract(total, x []big.Word) {
	var borrow uint
	for i, w := range x {
		var v uint
		v, borrow = bits.Sub(uint(total[i]), uint(w), borrow)
		total[i] = big.Word(v)
	}
	for i := len(x); borrow != 0 && i < len(total); i++ {
		total[i]--
		if total[i] != ^big.Word(0) {
			return
		}
	}
}

// magnitude returns |total| in place, without leading zeros, and whether the number, negated where
// negative is true, is negative.
func magnitude(total []big.Word, negative bool) ([]big.Word, bool) {
	if total[len(total)-1]>>(bits.UintSize-1) != 0 {
		negative = !negative
		carry := big.Word(1)
		for i := range total {
			total[i] = ^total[i] + carry
			if total[i] != 0 {
				carry = 0
			}
		}
	}
	for len(total) > 0 && total[len(total)-1] == 0 {
		total = total[:len(total)-1]
	}
	return total, negative && len(total) > 0
}
