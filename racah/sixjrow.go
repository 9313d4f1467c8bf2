package racah

import (
	"math"

	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/row"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// SixJRow returns the 6j symbols
//
//	{ j1 j2 j  }
//	{ l1 l2 l3 }
//
// for all j from jmin, the larger of |j1-j2| and |l1-l2|, to the smaller of j1+j2 and l1+l2, in steps of 1:
// members[i] belongs to jmin+i. They are written to dst from index 0, reusing dst where its capacity
// suffices. There are none, and jmin is 0, where no j fits; they are all zero where (j1 l2 l3) or (l1 j2 l3)
// breaks a selection rule. SixJRow panics with *rational.ArgumentError for a negative argument, and for one
// above 2^23.
//
// Every member is within 1.25 ulp of its value, or within 2^-60 of the largest member where that is more,
// for arguments to 50000: next to a change of sign only, and in particular where the symbol is an accidental
// zero. The members are computed together, from the recurrence of DLMF (34.5.11), in time proportional to
// their number.
func SixJRow(dst []float64, j1, j2, l1, l2, l3 rational.Half) (jmin rational.Half, members []float64) {
	const fn = "racah.SixJRow"
	for _, q := range [...]struct {
		name string
		j    rational.Half
	}{{"j1", j1}, {"j2", j2}, {"l1", l1}, {"l2", l2}, {"l3", l3}} {
		if err := argument.Momentum(fn, q.name, q.j); err != nil {
			panic(err)
		}
		if err := argument.RowLimit(fn, q.name, q.j); err != nil {
			panic(err)
		}
	}
	a, b, d, e, f := j1.Twice(), j2.Twice(), l1.Twice(), l2.Twice(), l3.Twice()
	first, last := max(distance(a, b), distance(d, e)), min(a+b, d+e)
	if first > last || (a+b+d+e)&1 != 0 {
		return rational.Half{}, dst[:0]
	}
	members = row.Slice(dst, (last-first)/2+1)
	jmin = rational.Halves(first)
	if wigner.Triad(j1, l2, l3) != wigner.NonZero || wigner.Triad(l1, j2, l3) != wigner.NonZero {
		clear(members)
		return jmin, members
	}
	r, _, negative := newSixJRow(a, b, d, e, f)
	r.Solve(members, nil, float64(f+1), negative)
	return jmin, members
}

// newSixJRow returns the recurrence of a row, how many members it has, and whether the last is negative;
// arguments are twice j1, j2, l1, l2, l3, and fulfill all rules.
//
// It is DLMF (34.5.11) for {j j1 j2; l3 l1 l2}, times 32. With A for 2j1 (2j1+2), B for j2, D, E, F for l1, l2,
// l3 alike, the bracket there is
//
//	1/16 [ J^2(J+2)^2 + (2F - A - B - D - E) J(J+2) + (A-B)(E-D) ]
func newSixJRow(a, b, d, e, f int) (r row.Recurrence, n int, negative bool) {
	casimir := func(n int) int64 { return int64(n) * int64(n+2) }
	square := func(n int) float64 { return float64(int64(n) * int64(n)) }
	ab, ed := float64(casimir(a)-casimir(b)), float64(casimir(e)-casimir(d))
	r = row.Recurrence{
		First: max(distance(a, b), distance(d, e)),
		A:     square(a - b), B: square(a + b + 2), C: square(d - e), D: square(d + e + 2), E: 1,
		C0: dd.Pair{Hi: ab}.Mul(dd.Pair{Hi: ed}), // exact
		C1: float64(2*casimir(f) - casimir(a) - casimir(b) - casimir(d) - casimir(e)),
	}
	return r, (min(a+b, d+e)-r.First)/2 + 1, (a+b+d+e)&2 != 0
}

// sixJGap returns the distance between the eigenvalues in the recurrence, for its Error, f being 2 l3: C1 has
// the part 2F = 2f(f+2), and l3 goes in steps of 1, f in steps of 2.
func sixJGap(f int) float64 {
	if f < 2 { // there is no smaller one
		return float64(8 * (f + 2))
	}
	return float64(8 * f)
}

// byRow is the route for large symbols: it computes the shortest row that the symbol is in, with a bound that is
// proved after the fact, and takes the member from it. ok is false where that leaves the rounding open: close to
// zeros, and for values far below the largest of the row.
func (k *tetrad) byRow(negative bool) (f float64, ok bool) {
	a, b, c, d, e, g := k.momenta()
	rec, n, minus := newSixJRow(a, b, d, e, g)
	member, opposite := c, g
	for _, q := range [...][6]int{{b, c, a, e, g, d}, {c, a, b, g, d, e}, {e, c, d, b, g, a}, {g, a, e, c, d, b}, {d, b, g, a, e, c}} {
		if r, length, last := newSixJRow(q[0], q[1], q[3], q[4], q[5]); length < n {
			rec, n, minus, member, opposite = r, length, last, q[2], q[5]
		}
	}
	buffer := make([]float64, 2*n)
	x, low := buffer[:n], buffer[n:]
	weight := float64(opposite + 1)
	rec.Solve(x, low, weight, minus)
	i := (member - rec.First) / 2
	v := dd.Pair{Hi: x[i], Lo: low[i]}
	bound := rec.Error(x, low, weight, sixJGap(opposite)) / math.Sqrt(weight*float64(member+1)) / math.Abs(v.Hi)
	return row.Round(v.Scale(0, negative), bound)
}
