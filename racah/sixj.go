package racah

import (
	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/binsum"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// SixJ returns the exact Wigner 6j symbol
//
//	{ j1 j2 j3 }
//	{ l1 l2 l3 }
//
// by Racah's sum, DLMF (34.4.2), written with binomials. With (a b c) the one of the four triads with the
// largest sum (any of them would do), d, e, f the momenta opposite to a, b, c in the symbol, Δ the
// triangle coefficient of DLMF (34.2.5) and s(xyz) = x+y+z it is
//
//	Δ(aef) Δ(dbf) Δ(dec) / Δ(abc) Σ_t (-1)^t C(t+1, s(abc)+1) C(a+b-c, t-s(dec)) C(b+c-a, t-s(aef)) C(c+a-b, t-s(dbf))
//
// It is zero where one of the triads (j1 j2 j3), (j1 l2 l3), (l1 j2 l3), (l1 l2 j3) breaks a
// selection rule; [CheckSixJ] says which. It panics with *rational.ArgumentError for a negative
// argument. Any size is allowed; time grows like the size times the number of terms.
func SixJ(j1, j2, j3, l1, l2, l3 rational.Half) rational.Surd {
	q := sixJ{fn: "racah.SixJ", names: &sixJNames, j: [6]rational.Half{j1, j2, j3, l1, l2, l3}}
	return q.exact(0)
}

// W returns the exact Racah coefficient W(abcd;ef), which by Edmonds (6.2.13) is
//
//	(-1)^(a+b+c+d) { a b e }
//	               { d c f }
//
// It is zero where one of the triads (a b e), (a c f), (d b f), (d c e) breaks a selection rule;
// [CheckW] says which. It panics with *rational.ArgumentError for a negative argument.
func W(a, b, c, d, e, f rational.Half) rational.Surd {
	q := sixJ{fn: "racah.W", names: &wNames, j: [6]rational.Half{a, b, e, d, c, f}}
	return q.exact((a.Twice() + b.Twice() + c.Twice() + d.Twice()) / 2)
}

// CheckSixJ tells why the 6j symbol of [SixJ] vanishes, or that it does not: the first triad that
// breaks a selection rule, or that the zero is accidental, for which it computes the symbol. The
// error, a *rational.ArgumentError, names a malformed argument; CheckSixJ does not panic.
func CheckSixJ(j1, j2, j3, l1, l2, l3 rational.Half) (wigner.Verdict, error) {
	q := sixJ{fn: "racah.CheckSixJ", names: &sixJNames, j: [6]rational.Half{j1, j2, j3, l1, l2, l3}}
	return q.verdict()
}

// CheckW is [CheckSixJ] for the coefficient of [W].
func CheckW(a, b, c, d, e, f rational.Half) (wigner.Verdict, error) {
	q := sixJ{fn: "racah.CheckW", names: &wNames, j: [6]rational.Half{a, b, e, d, c, f}}
	return q.verdict()
}

// sixJ is a 6j symbol on its way from arguments to value: j1 j2 j3 l1 l2 l3.
type sixJ struct {
	fn    string
	names *[6]string
	j     [6]rational.Half
}

var (
	sixJNames = [6]string{"j1", "j2", "j3", "l1", "l2", "l3"}
	wNames    = [6]string{"a", "b", "e", "d", "c", "f"} // in the places of the 6j symbol
)

// sixJTriads are the places of the momenta that couple to zero, each followed by the places of the
// momenta opposite to them.
var sixJTriads = [4][6]int{
	{0, 1, 2, 3, 4, 5},
	{0, 4, 5, 3, 1, 2},
	{3, 1, 5, 0, 4, 2},
	{3, 4, 2, 0, 1, 5},
}

// rule returns the first selection rule that is broken, or an error for a malformed argument.
func (q *sixJ) rule() (wigner.Verdict, *rational.ArgumentError) {
	for i, j := range q.j {
		if err := argument.Momentum(q.fn, q.names[i], j); err != nil {
			return wigner.Verdict{}, err
		}
	}
	for _, t := range &sixJTriads {
		if r := wigner.Triad(q.j[t[0]], q.j[t[1]], q.j[t[2]]); r != wigner.NonZero {
			return wigner.Verdict{Rule: r, Args: q.names[t[0]] + " " + q.names[t[1]] + " " + q.names[t[2]]}, nil
		}
	}
	return wigner.Verdict{}, nil
}

func (q *sixJ) verdict() (wigner.Verdict, error) {
	v, err := q.rule()
	if err != nil {
		return v, err
	}
	if !v.Zero() && q.exact(0).IsZero() {
		v = wigner.Verdict{Rule: wigner.Accidental}
	}
	return v, nil
}

// exact returns (-1)^phase times the symbol.
func (q *sixJ) exact(phase int) rational.Surd {
	if v, err := q.rule(); err != nil {
		panic(err)
	} else if v.Zero() {
		return rational.Surd{}
	}
	var k tetrad
	k.set(&q.j)
	sum := k.sum()
	if phase&1 != 0 {
		sum.Negative = !sum.Negative
	}
	var front rational.Factored // squared
	mulTriangle(&front, k.a, k.b, k.c, -1)
	mulTriangle(&front, k.a, k.e, k.f, 1)
	mulTriangle(&front, k.d, k.b, k.f, 1)
	mulTriangle(&front, k.d, k.e, k.c, 1)
	return sum.Sqrt(&front)
}

// tetrad holds twice the arguments of an allowed 6j symbol {a b c; d e f}, the triad abc being the
// one that its sum treats apart.
type tetrad struct{ a, b, c, d, e, f int }

// set takes the triad with the largest sum for abc: the sum then starts at t = a+b+c, where its
// first binomial is 1, and stays smallest.
func (k *tetrad) set(j *[6]rational.Half) {
	best, most := 0, -1
	for i, t := range &sixJTriads {
		if s := j[t[0]].Twice() + j[t[1]].Twice() + j[t[2]].Twice(); s > most {
			best, most = i, s
		}
	}
	t := &sixJTriads[best]
	*k = tetrad{j[t[0]].Twice(), j[t[1]].Twice(), j[t[2]].Twice(), j[t[3]].Twice(), j[t[4]].Twice(), j[t[5]].Twice()}
}

// sum describes Σ_t (-1)^t C(t+1, s(abc)+1) C(a+b-c, t-s(dec)) C(b+c-a, t-s(aef)) C(c+a-b, t-s(dbf)).
//
// The tops of the last three binomials add up to s(abc), so that the sum of their products is at
// most C(s(abc), floor(s(abc)/2)), by Vandermonde's identity; the first binomial is largest at the
// last t.
func (k *tetrad) sum() binsum.Sum {
	abc, aef, dbf, dec := (k.a+k.b+k.c)/2, (k.a+k.e+k.f)/2, (k.d+k.b+k.f)/2, (k.d+k.e+k.c)/2
	ab, bc, ca := (k.a+k.b-k.c)/2, (k.b+k.c-k.a)/2, (k.c+k.a-k.b)/2
	first, last := max(abc, aef, dbf, dec), min(ab+dec, bc+aef, ca+dbf)
	return binsum.Sum{
		Terms: last - first + 1,
		Count: 4,
		Factors: [4]binsum.Binomial{
			{Top: first + 1, Low: abc + 1, Move: binsum.TopUp},
			{Top: ab, Low: first - dec, Move: binsum.LowUp},
			{Top: bc, Low: first - aef, Move: binsum.LowUp},
			{Top: ca, Low: first - dbf, Move: binsum.LowUp},
		},
		Negative: first&1 != 0,
		Bits:     binsum.BinomialBits(last+1, abc+1) + binsum.BinomialBits(abc, abc/2),
	}
}
