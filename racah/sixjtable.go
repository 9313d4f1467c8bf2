package racah

import (
	"context"
	"fmt"
	"sync"
	"sync/atomic"

	"example.org/couplet/internal/binsum"
	"example.org/couplet/rational"
)

// SixJTable holds all 6j symbols with arguments up to a limit, for a hot loop that asks for the same ones
// again and again. It is read-only once it is built, and safe for all goroutines.
//
// Of the symbols that the 144 symmetries join, Regge's among them, one is kept: that makes C(2jmax+6, 6)
// float64 numbers, 0.6 MB for jmax = 8, 1.8 MB for 10, 75 MB for 20.
type SixJTable struct {
	top    int // 2 jmax
	values []float64
	blocks []int32 // where the numbers of c and f begin, at (top+1)c + f
}

// tableTop bounds 2 jmax.
const tableTop = 60

// NewSixJTable builds the table for all arguments up to jmax. That takes some 50 ns for every number that it
// keeps. It calls progress, where that is not nil, now and then with the numbers done and in all, and once at
// the end; it stops with the error of ctx where that is done. A *rational.ArgumentError tells of a jmax that
// is negative, or above 30, where the table would fill 0.7 GB.
func NewSixJTable(ctx context.Context, jmax rational.Half, progress func(done, total int)) (*SixJTable, error) {
	if jmax.Twice() < 0 || jmax.Twice() > tableTop {
		return nil, &rational.ArgumentError{Func: "racah.NewSixJTable", Arg: "jmax", Value: jmax.String(), Allowed: "from 0 to 30"}
	}
	t := &SixJTable{top: jmax.Twice()}
	total := 1 // C(top+6, 6)
	for i := 1; i <= 6; i++ {
		total = total * (t.top + i) / i
	}
	t.values = make([]float64, 0, total)
	t.blocks = make([]int32, (t.top+1)*(t.top+1))
	for c := range t.top + 1 {
		for f := range t.top + 1 - c {
			if err := ctx.Err(); err != nil {
				return nil, err
			}
			t.blocks[c*(t.top+1)+f] = int32(len(t.values))
			for b := range c + 1 {
				for e := range f + 1 {
					for d := range e + 1 {
						for a := range t.top - c - f + 1 {
							k := canonical(a, b, c, d, e, f)
							t.values = append(t.values, k.float(false))
						}
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

// canonical returns the symbol whose sorted sums of triads are s4-f <= s4-e <= s4-d <= s4 and whose sorted
// sums of pairs of columns are q <= q+b <= q+c, with q = s4+a. As both add up to the same, twice the sum of
// all arguments, s4 is a+b+c+a+a+d+e+f, and all six numbers are free.
//
// These are the sums in DLMF (34.4.2): the symbol depends on them only, which is what Regge found.
func canonical(a, b, c, d, e, f int) tetrad {
	s4 := 3*a + b + c + d + e + f
	s1, s2, s3 := s4-f, s4-e, s4-d
	q1, q2, q3 := s4+a, s4+a+b, s4+a+c
	return tetrad{binsum.Quadruple{T: s4, S1: s3, S2: s2, S3: s1, N1: q1 - s3, N2: q2 - s2, N3: q3 - s1}}
}

// JMax returns the largest argument of the table.
func (t *SixJTable) JMax() rational.Half { return rational.Halves(t.top) }

// Len returns how many numbers the table keeps, of 8 bytes each.
func (t *SixJTable) Len() int { return len(t.values) }

// At returns what [SixJFloat] returns, to the last bit. It panics with *rational.ArgumentError for an
// argument above the limit of the table, and for a negative one.
func (t *SixJTable) At(j1, j2, j3, l1, l2, l3 rational.Half) float64 {
	a, b, c, d, e, f := j1.Twice(), j2.Twice(), j3.Twice(), l1.Twice(), l2.Twice(), l3.Twice()
	if max(a, b, c, d, e, f) > t.top {
		panic(t.beyond(j1, j2, j3, l1, l2, l3))
	}
	v, ok := t.at(a, b, c, d, e, f)
	if !ok {
		forbidden("racah.SixJTable.At", &sixJNames, j1, j2, j3, l1, l2, l3)
	}
	return v
}

// at returns the value from twice the arguments, which are within the limit; ok is false for a forbidden
// symbol and for a negative argument.
func (t *SixJTable) at(a, b, c, d, e, f int) (v float64, ok bool) {
	s1, s2, s3, s4 := a+b+c, a+e+f, d+b+f, d+e+c // twice the sums
	if a|b|c|d|e|f|(s1-2*a)|(s1-2*b)|(s1-2*c)|(s2-2*a)|(s2-2*e)|(s2-2*f)|
		(s3-2*d)|(s3-2*b)|(s3-2*f)|(s4-2*d)|(s4-2*e)|(s4-2*c) < 0 || (s1|s2|s3|s4)&1 != 0 {
		return 0, false
	}
	q1, q2, q3 := a+b+d+e, b+c+e+f, c+a+f+d
	s1, s2 = min(s1, s2), max(s1, s2)
	s3, s4 = min(s3, s4), max(s3, s4)
	s1, s3 = min(s1, s3), max(s1, s3)
	s2, s4 = min(s2, s4), max(s2, s4)
	s2, s3 = min(s2, s3), max(s2, s3)
	q1, q2 = min(q1, q2), max(q1, q2)
	q2, q3 = min(q2, q3), max(q2, q3)
	q1, q2 = min(q1, q2), max(q1, q2)
	A, B, C := (q1-s4)>>1, (q2-q1)>>1, (q3-q1)>>1
	D, E, F := (s4-s3)>>1, (s4-s2)>>1, (s4-s1)>>1
	place := B*((F+1)*(F+2)>>1) + (E * (E + 1) >> 1) + D
	return t.values[int(t.blocks[C*(t.top+1)+F])+place*(t.top-C-F+1)+A], true
}

func (t *SixJTable) beyond(j ...rational.Half) *rational.ArgumentError {
	for i, q := range j {
		if q.Twice() > t.top {
			return &rational.ArgumentError{Func: "racah.SixJTable.At", Arg: sixJNames[i], Value: q.String(), Allowed: fmt.Sprintf("at most %v, the limit of the table", t.JMax())}
		}
	}
	return nil
}

// smallTop bounds 2j in the table that SixJFloat itself keeps: 74613 numbers, 0.6 MB, built by the first call
// in some milliseconds.
const smallTop = 16

var (
	smallTable atomic.Pointer[SixJTable]
	buildSmall sync.Once
)

func small() *SixJTable {
	if t := smallTable.Load(); t != nil {
		return t
	}
	buildSmall.Do(func() {
		t, err := NewSixJTable(context.Background(), rational.Halves(smallTop), nil)
		if err != nil {
			panic(err) // cannot be: the limit is within bounds
		}
		smallTable.Store(t)
	})
	return smallTable.Load()
}
