package racah

import (
	"math/big"

	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/square"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// NineJ returns the exact Wigner 9j symbol, its arguments given row by row:
//
//	{ a b c }
//	{ d e f } = Σ_x (-1)^(2x) (2x+1) { a b c } { d e f } { g h i }
//	{ g h i }                        { f i x } { b x h } { x a d }
//
// which is DLMF (34.6.2) for the transposed symbol. The three 6j symbols are written as in [SixJ], with
// the triads (a i x), (b x f) and (x h d) in front of their sums. Then all triangle coefficients that
// depend on x cancel, and those of the rows and columns of the 9j symbol stand before a sum of integers.
//
// It is zero where a row or a column breaks a selection rule; [CheckNineJ] says which. It panics with
// *rational.ArgumentError for a negative argument.
func NineJ(a, b, c, d, e, f, g, h, i rational.Half) rational.Surd {
	q := nineJ{"racah.NineJ", [9]rational.Half{a, b, c, d, e, f, g, h, i}}
	if v, err := q.rule(); err != nil {
		panic(err)
	} else if v.Zero() {
		return rational.Surd{}
	}
	return q.exact()
}

// CheckNineJ tells why the 9j symbol of [NineJ] vanishes, or that it does not: the first row or column
// that breaks a selection rule, the exchange of lines that changes its sign, or that the zero is
// accidental, for which it computes the symbol. The error, a *rational.ArgumentError, names a
// malformed argument; CheckNineJ does not panic.
func CheckNineJ(a, b, c, d, e, f, g, h, i rational.Half) (wigner.Verdict, error) {
	q := nineJ{"racah.CheckNineJ", [9]rational.Half{a, b, c, d, e, f, g, h, i}}
	v, err := q.rule()
	if err != nil {
		return v, err
	}
	if v.Zero() {
		return v, nil
	}
	if twice, array := q.twice(); twice/2&1 == 1 && array.OddSymmetry() {
		return wigner.Verdict{Rule: wigner.Symmetry}, nil
	}
	if q.exact().IsZero() {
		return wigner.Verdict{Rule: wigner.Accidental}, nil
	}
	return wigner.Verdict{}, nil
}

// nineJ is a 9j symbol on its way from arguments to value.
type nineJ struct {
	fn string
	j  [9]rational.Half
}

// nineJTriads are the places of the rows and columns.
var nineJTriads = [6][3]int{{0, 1, 2}, {3, 4, 5}, {6, 7, 8}, {0, 3, 6}, {1, 4, 7}, {2, 5, 8}}

func nineJName(place int) string { return "abcdefghi"[place : place+1] }

// rule returns the first selection rule that is broken, or an error for a malformed argument.
func (q *nineJ) rule() (wigner.Verdict, *rational.ArgumentError) {
	for i, j := range q.j {
		if err := argument.Momentum(q.fn, nineJName(i), j); err != nil {
			return wigner.Verdict{}, err
		}
	}
	for _, t := range &nineJTriads {
		if r := wigner.Triad(q.j[t[0]], q.j[t[1]], q.j[t[2]]); r != wigner.NonZero {
			return wigner.Verdict{Rule: r, Args: nineJName(t[0]) + " " + nineJName(t[1]) + " " + nineJName(t[2])}, nil
		}
	}
	return wigner.Verdict{}, nil
}

// twice returns twice the arguments and their sum.
func (q *nineJ) twice() (total int, a square.Array) {
	for i, j := range q.j {
		a[i] = j.Twice()
		total += a[i]
	}
	return total, a
}

// exact returns the value of an allowed symbol.
func (q *nineJ) exact() rational.Surd {
	_, t := q.twice()
	var f rational.Factored
	for _, p := range &nineJTriads {
		mulTriangle(&f, t[p[0]], t[p[1]], t[p[2]], 1)
	}
	var z big.Int
	return f.SqrtTimesBig(nineJSum(&z, &t))
}

// nineJSum sets z to Σ_x (-1)^(2x) (2x+1) S1 S2 S3, S1 to S3 being the sums in the three 6j symbols,
// and returns it.
func nineJSum(z *big.Int, t *square.Array) *big.Int {
	a, b, c, d, e, f, g, h, i := t[0], t[1], t[2], t[3], t[4], t[5], t[6], t[7], t[8]
	first := max(distance(a, i), distance(b, f), distance(d, h))
	last := min(a+i, b+f, d+h)
	term, factor := new(big.Int), new(big.Int)
	var s binsum.Quadruple
	for x := first; x <= last; x += 2 { // twice the x of the formula
		factors := [3]tetrad{
			{a, i, x, f, b, c}, // { a b c; f i x } with its triad (a i x) in front
			{b, x, f, d, e, h}, // { d e f; b x h } with (b x f)
			{x, h, d, g, a, i}, // { g h i; x a d } with (x h d)
		}
		term.SetInt64(int64(x + 1))
		for n := range factors {
			factors[n].sum(&s)
			term.Mul(term, s.Int(factor))
		}
		z.Add(z, term)
	}
	if first&1 != 0 {
		z.Neg(z)
	}
	return z
}

func distance(a, b int) int { return max(a-b, b-a) }
