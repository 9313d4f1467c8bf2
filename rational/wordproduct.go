package rational

import (
	"math/big"
	"math/bits"
)

// wordProduct multiplies many small integers: it packs them into words, then multiplies the words
// in a balanced tree, so that the long multiplications meet operands of equal length.
type wordProduct struct {
	words []uint // no factors stand for 1
}

func (w *wordProduct) mul(p uint, power int32) {
	for ; power > 0; power-- {
		if last := len(w.words) - 1; last >= 0 {
			if hi, lo := bits.Mul(w.words[last], p); hi == 0 {
				w.words[last] = lo
				continue
			}
		}
		w.words = append(w.words, p)
	}
}

// int returns the product.
func (w *wordProduct) int() *big.Int { return treeProduct(w.words) }

// Below this many words the schoolbook product by single words is as fast as the tree.
const treeLeaf = 16

func treeProduct(words []uint) *big.Int {
	if len(words) == 0 {
		return big.NewInt(1)
	}
	if len(words) > treeLeaf {
		half := len(words) / 2
		a := treeProduct(words[:half])
		return a.Mul(a, treeProduct(words[half:]))
	}
	z := new(big.Int).SetUint64(uint64(words[0]))
	if len(words) == 1 {
		return z
	}
	m := new(big.Int)
	for _, w := range words[1:] {
		z.Mul(z, m.SetUint64(uint64(w)))
	}
	return z
}

// cancel divides n and the words by what n shares with their product.
//
// gcd(n, w) = gcd(n mod w, w) takes one pass over n for a whole word of primes.
func cancel(n *big.Int, words []uint) {
	var quotient, divisor, rest big.Int // here, so that they are allocated once
	for i, w := range words {
		g := w
		if r := remainder(n, w); r != 0 {
			g = uint(gcd(uint64(r), uint64(w)))
		}
		if g > 1 {
			quotient.QuoRem(n, divisor.SetUint64(uint64(g)), &rest)
			n.Set(&quotient)
			words[i] = w / g
		}
	}
}

// remainder returns |n| mod m.
func remainder(n *big.Int, m uint) uint {
	r := uint(0)
	words := n.Bits()
	for i := len(words) - 1; i >= 0; i-- {
		_, r = bits.Div(r, uint(words[i]), m)
	}
	return r
}
