package dd

import "sync/atomic"

// BinomialTops bounds n in the tables of binomials C(n, k).
const BinomialTops = 156

// Places is how many binomials these tables hold.
const Places = BinomialTops * (BinomialTops + 1) / 2

// Place returns the place of C(n, k), 0 <= k <= n < BinomialTops.
func Place(n, k int) int { return n*(n+1)>>1 + k }

// BinomialError bounds the relative errors of [Binomials], in units of u^2: six for each of less than 50
// additions of numbers that are not exact.
const BinomialError = 300

var binomials atomic.Pointer[[Places]Pair]

// Binomials returns C(n, k) at Place(n, k), as 1-pairs that are exact below 2^104. The table is built on the
// first call.
func Binomials() *[Places]Pair {
	if t := binomials.Load(); t != nil {
		return t
	}
	t := new([Places]Pair)
	for n := range BinomialTops {
		t[Place(n, 0)], t[Place(n, n)] = Pair{Hi: 1}, Pair{Hi: 1}
		for k := 1; k < n; k++ {
			t[Place(n, k)] = t[Place(n-1, k-1)].Add(t[Place(n-1, k)])
		}
	}
	binomials.Store(t) // racing first calls store equal tables
	return t
}
