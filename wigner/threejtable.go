package wigner

import (
	"context"
	"fmt"
	"sync"
	"sync/atomic"

	"example.org/couplet/rational"
)

// ThreeJTable holds all 3j symbols with momenta up to a limit, for a hot loop that asks for the same ones
// again and again. It is read-only once it is built, and safe for all goroutines.
//
// Of the symbols that Regge's 72 symmetries join one is kept, at the place that Rasch and Yu (2003) give it:
// that makes C(2jmax+5, 5) float64 numbers, 0.4 MB for jmax = 10, 10 MB for 20, 66 MB for 30.
type ThreeJTable struct {
	top    int       // 2 jmax, the largest entry of a square
	values []float64 // of the canonical squares
	place  []places  // by entry
	orders [36]order
}

// places are the contributions of an entry to the place of a square, by its role.
type places struct{ l, x, t, b int32 }

// tableTop bounds 2 jmax.
const tableTop = 128

// NewThreeJTable builds the table for all j up to jmax. That takes some 40 ns for every number that it
// keeps. It calls progress, where that is not nil, now and then with the numbers done and in all, and once at
// the end; it stops with the error of ctx where that is done. A *rational.ArgumentError tells of a jmax that
// is negative, or above 64, where the table would fill 2 GB.
func NewThreeJTable(ctx context.Context, jmax rational.Half, progress func(done, total int)) (*ThreeJTable, error) {
	if jmax.Twice() < 0 || jmax.Twice() > tableTop {
		return nil, &rational.ArgumentError{Func: "wigner.NewThreeJTable", Arg: "jmax", Value: jmax.String(), Allowed: "from 0 to 64"}
	}
	t := &ThreeJTable{top: jmax.Twice(), orders: newOrders()}
	t.place = make([]places, t.top+2)
	for n := range t.place {
		t.place[n] = places{int32(choose(n+4, 5)), int32(choose(n+3, 4)), int32(choose(n+2, 3)), int32(choose(n+1, 2))}
	}
	total := choose(t.top+5, 5)
	t.values = make([]float64, 0, total)
	for l := range t.top + 1 {
		for x := range l + 1 {
			if err := ctx.Err(); err != nil {
				return nil, err
			}
			for tt := range x + 1 {
				for b := range tt + 1 {
					for s := range b + 1 {
						r := regge{s, l, x + b - tt, x, b, s + l - tt, l + b - tt, s + x - tt, tt}
						t.values = append(t.values, r.float(false))
					}
				}
			}
		}
		if progress != nil {
			progress(len(t.values), total)
		}
	}
	return t, nil
}

// choose returns C(n, k) for results that fit.
func choose(n, k int) int {
	c := 1
	for i := 1; i <= k; i++ {
		c = c * (n - k + i) / i
	}
	return c
}

// JMax returns the largest j of the table.
func (t *ThreeJTable) JMax() rational.Half { return rational.Halves(t.top) }

// Len returns how many numbers the table keeps, of 8 bytes each.
func (t *ThreeJTable) Len() int { return len(t.values) }

// At returns what [ThreeJFloat] returns, to the last bit. It panics with
// *rational.ArgumentError for a j above the limit of the table, and for malformed arguments as ThreeJFloat
// does.
func (t *ThreeJTable) At(j1, j2, j3, m1, m2, m3 rational.Half) float64 {
	var r regge
	allowed := r.set(j1, j2, j3, m1, m2, m3)
	if max(j1.Twice(), j2.Twice(), j3.Twice()) > t.top {
		panic(t.beyond(j1, j2, j3))
	}
	if !allowed {
		forbidden("wigner.ThreeJTable.At", &threeJNames, j1, j2, j3, m1, m2, m3)
		return 0
	}
	return t.at(&r)
}

// at returns the value of an allowed symbol within the limit.
func (t *ThreeJTable) at(r *regge) float64 {
	// The smallest entry and its place: four bits at the low end hold the place.
	smallest := min(
		min(r[0]<<4, r[1]<<4|1, r[2]<<4|2),
		min(r[3]<<4|3, r[4]<<4|4, r[5]<<4|5),
		min(r[6]<<4|6, r[7]<<4|7, r[8]<<4|8))
	s, at := smallest>>4, smallest&15
	// The largest of those in its row and column, which is the largest of all.
	o := t.orders[4*at : 4*at+4 : 4*at+4]
	largest := max(r[o[0].l]<<2, r[o[1].l]<<2|1, r[o[2].l]<<2|2, r[o[3].l]<<2|3)
	l := largest >> 2
	p := &o[largest&3]
	b, x, tt, odd := r[p.b], r[p.x], r[p.t], p.odd
	if other := r[p.b2]; other < b {
		b, x, tt, odd = other, r[p.x2], r[p.t2], odd^1
	}
	v := t.values[int(t.place[l].l+t.place[x].x+t.place[tt].t+t.place[b].b)+s]
	if odd&r.total()&1 != 0 {
		return 0 - v // not -v: zeros have no sign
	}
	return v
}

func (t *ThreeJTable) beyond(j ...rational.Half) *rational.ArgumentError {
	for i, q := range j {
		if q.Twice() > t.top {
			return &rational.ArgumentError{Func: "wigner.ThreeJTable.At", Arg: threeJNames.j[i], Value: q.String(), Allowed: fmt.Sprintf("at most %v, the limit of the table", t.JMax())}
		}
	}
	return nil
}

// order says where the entries of a square stand that are to come to the places
//
//	S L .
//	X B .
//	. . T
//
// of Rasch and Yu, by a reflection and permutations of rows and columns, when S is at a given place and L in
// its row or column; b2, x2, t2 are B, X, T with the last two rows exchanged. odd is 1 where the permutation
// is odd.
type order struct{ l, b, x, t, b2, x2, t2, odd int }

// newOrders returns the orders for S at each of the nine places, four each for the places of L: the two
// others in its row, then the two others in its column.
func newOrders() (list [36]order) {
	for at := range 9 {
		for k := range 4 {
			// Indices along and across the line that S and L share.
			s, line := at%3, at/3
			place := func(across, along int) int { return 3*across + along }
			if k >= 2 {
				s, line = at/3, at%3
				place = func(across, along int) int { return 3*along + across }
			}
			l := (s + 1 + k%2) % 3
			c := [3]int{s, l, 3 - s - l}
			r := [3]int{line, (line + 1) % 3, (line + 2) % 3}
			list[4*at+k] = order{
				l: place(r[0], c[1]),
				b: place(r[1], c[1]), x: place(r[1], c[0]), t: place(r[2], c[2]),
				b2: place(r[2], c[1]), x2: place(r[2], c[0]), t2: place(r[1], c[2]),
				odd: k % 2, // the rows are in cyclic order, and so are the columns for k even
			}
		}
	}
	return list
}

// smallTop bounds 2j in the table that ThreeJFloat itself keeps: 20349 numbers, 0.2 MB, built by the first call
// in about a millisecond.
const smallTop = 16

var (
	smallTable atomic.Pointer[ThreeJTable]
	buildSmall sync.Once
)

func small() *ThreeJTable {
	if t := smallTable.Load(); t != nil {
		return t
	}
	buildSmall.Do(func() {
		t, err := NewThreeJTable(context.Background(), rational.Halves(smallTop), nil)
		if err != nil {
			panic(err) // cannot be: the limit is within bounds
		}
		smallTable.Store(t)
	})
	return smallTable.Load()
}
