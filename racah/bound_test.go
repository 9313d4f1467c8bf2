package racah

import (
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// The bound on the terms that tetrad.sum derives, for every choice of the triad in front.
func TestSumBound(t *testing.T) {
	r := rand.New(rand.NewPCG(10, 10))
	cases, tight := 0, 0
	for range 200000 {
		size := []int{2, 4, 10, 24, 40, 90}[r.IntN(6)]
		var j [6]rational.Half
		for i := range j {
			j[i] = rational.Halves(r.IntN(size + 1))
		}
		q := sixJ{names: &sixJNames, j: j}
		if v, _ := q.rule(); v.Rule != wigner.NonZero {
			continue
		}
		for _, places := range sixJTriads {
			var twice [6]int
			for i, p := range places {
				twice[i] = j[p].Twice()
			}
			k := tetrad{twice[0], twice[1], twice[2], twice[3], twice[4], twice[5]}
			s := k.sum()
			total := new(big.Int)
			for term := range s.Magnitudes() {
				total.Add(total, term)
			}
			cases++
			if total.BitLen() > s.Bits {
				t.Fatalf("%+v: the terms add up to %d bits, more than the bound %d", k, total.BitLen(), s.Bits)
			}
			if total.BitLen() >= s.Bits-1 {
				tight++
			}
		}
	}
	if cases < 10000 || tight == 0 {
		t.Errorf("%d cases, %d close to the bound", cases, tight)
	}
}
