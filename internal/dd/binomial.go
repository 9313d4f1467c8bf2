package dd

import "sync/atomic"

// BinomialTops bounds n in the table of binomials C(n, k).
const BinomialTops = 156

// Bounds on the relative errors of the entries of [Binomials], in units of u^2.
const (
	BinomialError = 19
	ValueError    = 300 // six for each of less than 50 additions of numbers that are not exact
)

// Binomials holds binomials and their square roots at the places Place(n, k), as 1-pairs.
type Binomials struct {
	Value       [places]Pair // C(n, k), exact below 2^104
	Root        [places]Pair // sqrt(C(n, k))
	Inverse     [places]Pair // 1/sqrt(C(n, k))
	RootNext    [places]Pair // sqrt((n+1) C(n, k))
	InverseNext [places]Pair // 1/sqrt((n+1) C(n, k))
}

const places = BinomialTops * (BinomialTops + 1) / 2

// Place returns the place of C(n, k), 0 <= k <= n < BinomialTops.
func Place(n, k int) int { return n*(n+1)/2 + k }

var binomials atomic.Pointer[Binomials]

// SqrtBinomials returns the table, which is built on the first call.
func SqrtBinomials() *Binomials {
	if t := binomials.Load(); t != nil {
		return t
	}
	return newBinomials()
}

// The entries are products of up to four roots with an error of u^2 each and three multiplications of
// 1-pairs, each brought to normal form: algorithm DWTimesDW2 of Joldes, Muller and Popescu (2017), with
// an error below 5 u^2 (Muller and Rideau 2022). That makes 4 + 3*5 = 19.
func newBinomials() *Binomials {
	t := new(Binomials)
	f := Factorials(BinomialTops)
	times := func(a, b Pair) Pair { return a.Mul(b).Normal() }
	for n := range BinomialTops {
		for k := range n + 1 {
			i := Place(n, k)
			t.Value[i] = Pair{Hi: 1}
			if 0 < k && k < n {
				t.Value[i] = t.Value[Place(n-1, k-1)].Add(t.Value[Place(n-1, k)])
			}
			root := times(times(f.Root[n].Pair, f.Inverse[k].Pair), f.Inverse[n-k].Pair).Scale(f.Root[n].Exp+f.Inverse[k].Exp+f.Inverse[n-k].Exp, false)
			inverse := times(times(f.Inverse[n].Pair, f.Root[k].Pair), f.Root[n-k].Pair).Scale(f.Inverse[n].Exp+f.Root[k].Exp+f.Root[n-k].Exp, false)
			t.Root[i], t.Inverse[i] = root, inverse
			// sqrt(n+1) = sqrt((n+1)!)/sqrt(n!) would cost two roots; this table has them directly.
			t.RootNext[i] = times(root, f.Sqrt[n+1])
			t.InverseNext[i] = times(inverse, f.InverseSqrt[n+1])
		}
	}
	binomials.Store(t) // racing first calls store equal tables
	return t
}
