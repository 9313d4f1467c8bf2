package mantissa

import (
	"sync/atomic"

	"example.org/couplet/internal/dd"
)

// Binomials holds square roots of binomials C(n, k) at dd.Place(n, k), to nearest.
type Binomials struct {
	Root        [dd.Places]Number           // sqrt(C(n, k))
	Inverse     [dd.Places]Number           // 1/sqrt(C(n, k))
	RootNext    [dd.Places]Number           // sqrt((n+1) C(n, k))
	InverseNext [dd.Places]Number           // 1/sqrt((n+1) C(n, k))
	Sqrt        [2 * dd.BinomialTops]Number // sqrt(n)
}

var binomials atomic.Pointer[Binomials]

// SqrtBinomials returns the table, which is built on the first call.
func SqrtBinomials() *Binomials {
	if t := binomials.Load(); t != nil {
		return t
	}
	return newBinomials()
}

// The numbers before they are rounded are products of factorials in double-double, whose errors are below 2^-98.
func newBinomials() *Binomials {
	t := new(Binomials)
	f := dd.Factorials(2 * dd.BinomialTops)
	scaled := func(a dd.Scaled) Number {
		n := FromPair(a.Pair)
		n.Exp += a.Exp
		return n
	}
	for n := range t.Sqrt[1:] {
		t.Sqrt[n+1] = FromPair(f.Sqrt[n+1])
	}
	for n := range dd.BinomialTops {
		sqrt, inverseSqrt := dd.Scaled{Pair: f.Sqrt[n+1]}, dd.Scaled{Pair: f.InverseSqrt[n+1]}
		for k := range n + 1 {
			i := dd.Place(n, k)
			root := f.Root[n].Mul(f.Inverse[k]).Mul(f.Inverse[n-k])
			inverse := f.Inverse[n].Mul(f.Root[k]).Mul(f.Root[n-k])
			t.Root[i], t.RootNext[i] = scaled(root), scaled(root.Mul(sqrt))
			t.Inverse[i], t.InverseNext[i] = scaled(inverse), scaled(inverse.Mul(inverseSqrt))
		}
	}
	binomials.Store(t) // racing first calls store equal tables
	return t
}
