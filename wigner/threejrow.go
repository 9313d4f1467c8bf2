package wigner

import (
	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/row"
	"example.org/couplet/rational"
)

// ThreeJRow returns the 3j symbols
//
//	( j1 j2    j   )
//	( m1 m2 -m1-m2 )
//
// for all j from jmin, the larger of |j1-j2| and |m1+m2|, to j1+j2 in steps of 1: members[i] belongs to
// jmin+i. They are written to dst from index 0, reusing dst where its capacity suffices. There are none, and
// jmin is 0, where |m1| > j1 or |m2| > j2. ThreeJRow panics with *rational.ArgumentError for a negative j,
// for a j-m that is not an integer, and for a j above 2^23.
//
// Every member is within 1.25 ulp of its value, or within 2^-60 of the largest member where that is more,
// for j1 and j2 to 50000: next to a change of sign only, and in particular where the symbol is an accidental
// zero. The members are computed together, from the recurrence of DLMF (34.3.15), in time proportional to
// their number.
func ThreeJRow(dst []float64, j1, m1, j2, m2 rational.Half) (jmin rational.Half, members []float64) {
	const fn = "wigner.ThreeJRow"
	mustState(fn, "j1", "m1", j1, m1)
	mustState(fn, "j2", "m2", j2, m2)
	if err := argument.RowLimit(fn, "j1", j1); err != nil {
		panic(err)
	}
	if err := argument.RowLimit(fn, "j2", j2); err != nil {
		panic(err)
	}
	if m1.Abs().Cmp(j1) > 0 || m2.Abs().Cmp(j2) > 0 {
		return rational.Half{}, dst[:0]
	}
	a, b, x, y := j1.Twice(), j2.Twice(), m1.Twice(), m2.Twice()
	first := max(a-b, b-a, x+y, -x-y)
	members = row.Slice(dst, (a+b-first)/2+1)
	// DLMF (34.3.15) for the cyclic symbol (j j1 j2; m m1 m2), times 16:
	//   l(2j) = 8 sqrt[ (j^2-(j1-j2)^2) ((j1+j2+1)^2-j^2) (j^2-m^2) ]
	//   d(2j) = -16 (2j+1) { [j1(j1+1) - j2(j2+1)] m - j(j+1) (m2-m1) }
	square := func(n int) int64 { return int64(n) * int64(n+2) }
	r := row.Recurrence{
		First: first,
		D:     [4]float64{float64(a - b), float64(a + b + 2), float64(x + y)},
		N:     3,
		C:     [3]dd.Pair{dd.FromInt64((square(b) - square(a)) * int64(x+y)), dd.FromInt64(int64(x - y))},
	}
	r.Solve(members, 1, (a-b+x+y)&2 != 0)
	return rational.Halves(first), members
}
