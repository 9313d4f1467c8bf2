package wigner

import (
	"math/big"
	"testing"

	"example.org/couplet/internal/square"
)

// The bound on the terms that regge.sum derives, on all squares with J to 16 and, where one word ends
// and the next begins, on the squares with the largest terms there are, the ones close to J/3 everywhere.
func TestSumBound(t *testing.T) {
	check := func(r regge) (bits, bound int) {
		s := r.sum()
		total := new(big.Int)
		for term := range s.Magnitudes() {
			total.Add(total, term)
		}
		if total.BitLen() > s.Bits {
			t.Fatalf("square %v: the terms add up to %d bits, more than the bound %d", r.Array, total.BitLen(), s.Bits)
		}
		return total.BitLen(), s.Bits
	}
	tight := 0
	squares := func(total, low, high int) {
		for a := low; a <= high; a++ {
			for b := low; b <= high; b++ {
				for c := low; c <= high; c++ {
					for d := low; d <= high; d++ {
						r := regge{square.Array{a, b, total - a - b, c, d, total - c - d, total - a - c, total - b - d, a + b + c + d - total}}
						if min(r.Array[2], r.Array[5], r.Array[6], r.Array[7], r.Array[8]) < 0 {
							continue
						}
						if bits, bound := check(r); bits == bound {
							tight++
						}
					}
				}
			}
		}
	}
	for total := range 17 {
		squares(total, 0, total)
	}
	for total := 62; total <= 70; total++ {
		squares(total, total/3-2, total/3+3)
	}
	if tight == 0 {
		t.Error("no sum comes up to the bound")
	}
}
