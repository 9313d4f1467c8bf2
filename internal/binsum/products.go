package binsum

import (
	"math/big"
	"math/bits"
)

// ProductRoom is room for what [SumOfProducts] returns.
type ProductRoom [3*stackWidth + 2]big.Word

// SumOfProducts returns |Σ w S1 S2 S3| over n terms, without leading zeros, and whether the sum is negative;
// term returns the i-th w > 0 and its three sums. It computes in the room where that is wide enough, and
// allocates nothing while no sum has more than 1400 bits.
func SumOfProducts(n int, term func(i int) (w uint, s [3]Quadruple), room *ProductRoom) (total []big.Word, negative bool) {
	most := 0
	for i := range n {
		w, s := term(i)
		most = max(most, bits.Len(w)+s[0].plainBits()+s[1].plainBits()+s[2].plainBits())
	}
	width := (most+bits.Len(uint(n)))/bits.UintSize + 2 // room for the sign
	total = room[:]
	if width > len(room) {
		total = make([]big.Word, width)
	}
	total = total[:width]
	clear(total)
	var stack buffer
	var here, there ProductRoom
	product, next := here[:0], there[:0]
	for i := range n {
		w, s := term(i)
		product = append(product[:0], big.Word(w))
		minus := false
		for k := range s {
			if v, ok := s[k].Word(); ok && bits.UintSize == 64 {
				product = mulWord(product, uint(max(v, -v)))
				minus = minus != (v < 0)
				continue
			}
			sum := s[k].Sum()
			factor, negative := sum.words(&stack)
			next = mul(next, product, factor)
			product, next = next, product
			minus = minus != negative
		}
		if minus {
			subtract(total, product)
		} else {
			add(total, product)
		}
	}
	return magnitude(total, false)
}

// mul returns x*y in the place of z, which is grown where it does not suffice.
func mul(z, x, y []big.Word) []big.Word {
	z = z[:0]
	for range len(x) + len(y) {
		z = append(z, 0)
	}
	for i, m := range y {
		var carry uint
		for j, v := range x {
			hi, lo := bits.Mul(uint(v), uint(m))
			lo, c := bits.Add(lo, uint(z[i+j]), 0)
			hi += c
			lo, c = bits.Add(lo, carry, 0)
			z[i+j], carry = big.Word(lo), hi+c
		}
		z[i+len(x)] = big.Word(carry)
	}
	for len(z) > 0 && z[len(z)-1] == 0 {
		z = z[:len(z)-1]
	}
	return z
}
