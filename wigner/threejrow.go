package wigner

import (
	"math"

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
	r, n, negative := newThreeJRow(j1.Twice(), m1.Twice(), j2.Twice(), m2.Twice())
	members = row.Slice(dst, n)
	r.Solve(members, nil, 1, negative)
	return rational.Halves(r.First), members
}

// newThreeJRow returns the recurrence of a row, how many members it has, and whether the last is negative;
// arguments are twice their values.
//
// It is DLMF (34.3.15) for the cyclic symbol (j j1 j2; m m1 m2), times 16:
//
//	l(2j) = 8 sqrt[ (j^2-(j1-j2)^2) ((j1+j2+1)^2-j^2) (j^2-m^2) ]
//	d(2j) = -16 (2j+1) { [j1(j1+1) - j2(j2+1)] m - j(j+1) (m2-m1) }
func newThreeJRow(a, x, b, y int) (r row.Recurrence, n int, negative bool) {
	casimir := func(n int) int64 { return int64(n) * int64(n+2) }
	square := func(n int) float64 { return float64(int64(n) * int64(n)) }
	ba, m := float64(casimir(b)-casimir(a)), float64(x+y)
	r = row.Recurrence{
		First: max(a-b, b-a, x+y, -x-y),
		A:     square(a - b), B: square(a + b + 2), C: square(x + y), D: 1,
		C0: dd.Pair{Hi: ba}.Mul(dd.Pair{Hi: m}), // exact
		C1: float64(x - y),
	}
	return r, (a+b-r.First)/2 + 1, (a-b+x+y)&2 != 0
}

// threeJGap is the distance between the eigenvalues in the recurrence, for its Error: C1 is 2(m1-m2), and
// with m1+m2 fixed m1-m2 goes in steps of 2. The matrix is that of J1z - J2z in the coupled states.
const threeJGap = 4

// byRow is the route for large symbols: it computes the row over the largest momentum, with a bound that is
// proved after the fact, and takes the member from it. ok is false where that leaves the rounding open: close
// to zeros, and for values far below the largest of the row.
func (r *regge) byRow(coefficient bool) (f float64, ok bool) {
	c := 0 // the largest momentum has the smallest entry in the first row
	for i, n := range r[:3] {
		if n < r[c] {
			c = i
		}
	}
	twiceJ := func(i int) int { return r[3+i%3] + r[6+i%3] }
	twiceM := func(i int) int { return r[6+i%3] - r[3+i%3] }
	rec, n, negative := newThreeJRow(twiceJ(c+1), twiceM(c+1), twiceJ(c+2), twiceM(c+2))
	buffer := make([]float64, 2*n)
	x, low := buffer[:n], buffer[n:]
	rec.Solve(x, low, 1, negative)
	k := (twiceJ(c) - rec.First) / 2
	v := dd.Pair{Hi: x[k], Lo: low[k]}
	bound := rec.Error(x, low, 1, threeJGap) / math.Sqrt(float64(twiceJ(c)+1)) / math.Abs(v.Hi)
	if coefficient {
		v = v.Mul(dd.Sqrt(r.twiceJ3()+1)).Scale(0, r.parity() != 0)
	}
	return row.Round(v, bound)
}
