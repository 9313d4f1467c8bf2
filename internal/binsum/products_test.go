package binsum

import (
	"math/big"
	"math/rand/v2"
	"testing"
)

// Sums of products against math/big, in room that is not empty, and beyond it.
func TestSumOfProducts(t *testing.T) {
	r := rand.New(rand.NewPCG(34, 34))
	draw := func(size int) (s Quadruple) {
		for {
			s = Quadruple{N1: r.IntN(size), N2: r.IntN(size), N3: r.IntN(size)}
			s.T = s.N1 + s.N2 + s.N3
			s.S1, s.S2, s.S3 = r.IntN(s.T+1), r.IntN(s.T+1), r.IntN(s.T+1)
			if first, last := s.limits(); first <= last {
				return s
			}
		}
	}
	var room ProductRoom
	beyond, negatives, zeros := 0, 0, 0
	for range 3000 {
		size := []int{3, 10, 60, 600}[r.IntN(4)]
		weights, sums := make([]uint, 1+r.IntN(4)), make([][3]Quadruple, 4)
		want := new(big.Int)
		for i := range weights {
			weights[i] = 1 + uint(r.IntN(size))
			product := new(big.Int).SetUint64(uint64(weights[i]))
			for k := range sums[i] {
				sums[i][k] = draw(size)
				product.Mul(product, sums[i][k].Int(new(big.Int)))
			}
			want.Add(want, product)
		}
		for i := range room {
			room[i] = big.Word(r.Uint64())
		}
		total, negative := SumOfProducts(len(weights), func(i int) (uint, [3]Quadruple) { return weights[i], sums[i] }, &room)
		got := new(big.Int).SetBits(total)
		if negative {
			got.Neg(got)
			negatives++
		}
		if got.Cmp(want) != 0 || len(total) > 0 && total[len(total)-1] == 0 {
			t.Fatalf("weights %v, sums %+v: %v, want %v", weights, sums[:len(weights)], total, want)
		}
		if len(total) > len(room) {
			beyond++
		}
		if len(total) == 0 {
			zeros++
		}
	}
	if beyond == 0 || negatives == 0 || zeros == 0 {
		t.Errorf("%d beyond the room, %d negative, %d zero", beyond, negatives, zeros)
	}
	if n := testing.AllocsPerRun(10, func() {
		SumOfProducts(2, func(i int) (uint, [3]Quadruple) {
			s := Quadruple{300, 100, 100, 100, 300, 300, 300} // all arguments 100
			return 1, [3]Quadruple{s, s, s}
		}, &room)
	}); n != 0 {
		t.Errorf("%v allocations", n)
	}
}
