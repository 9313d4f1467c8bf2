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

// primePower is p^e.
type primePower struct {
	p uint
	e int32
}

// removeCommon divides n by the largest divisor that it shares with the product of the powers, and
// lowers the powers accordingly.
//
// Residues modulo whole words of primes find the primes that divide n with one pass over n for
// every word instead of one for every prime.
func removeCommon(n *big.Int, powers []primePower) {
	var quotient, divisor, rest big.Int // here, so that they are allocated once
	for start := 0; start < len(powers); {
		group, end := powers[start].p, start+1
		for ; end < len(powers); end++ {
			hi, lo := bits.Mul(group, powers[end].p)
			if hi != 0 {
				break
			}
			group = lo
		}
		residue := remainder(n, group)
		for i := start; i < end; i++ {
			c := &powers[i]
			if residue%c.p != 0 {
				continue
			}
			divisor.SetUint64(uint64(c.p))
			for ; c.e > 0; c.e-- {
				if quotient.QuoRem(n, &divisor, &rest); rest.Sign() != 0 {
					break
				}
				n.Set(&quotient)
			}
		}
		start = end
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
