package racah

import (
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
// argument.
//
// Arguments may be up to 2^26. Time grows like the number of terms times the length of the sum, at most some four
// times as many bits as the largest argument has units; tables of primes reach to the largest triad.
func SixJ(j1, j2, j3, l1, l2, l3 rational.Half) rational.Surd {
	var k tetrad
	if !k.set(j1, j2, j3, l1, l2, l3) {
		forbidden("racah.SixJ", &sixJNames, j1, j2, j3, l1, l2, l3)
		return rational.Surd{}
	}
	return k.exact()
}

// W returns the exact Racah coefficient W(abcd;ef), which by Edmonds (6.2.13) is
//
//	(-1)^(a+b+c+d) { a b e }
//	               { d c f }
//
// It is zero where one of the triads (a b e), (a c f), (d b f), (d c e) breaks a selection rule;
// [CheckW] says which. It panics with *rational.ArgumentError for a negative argument.
func W(a, b, c, d, e, f rational.Half) rational.Surd {
	var k tetrad
	if !k.set(a, b, e, d, c, f) {
		forbidden("racah.W", &wNames, a, b, e, d, c, f)
		return rational.Surd{}
	}
	v := k.exact()
	if wPhase(a, b, c, d) {
		return v.Neg()
	}
	return v
}

// wPhase reports whether (-1)^(a+b+c+d) = -1; the sum is an integer for an allowed coefficient.
func wPhase(a, b, c, d rational.Half) bool {
	return (a.Twice()+b.Twice()+c.Twice()+d.Twice())&2 != 0
}

// CheckSixJ tells why the 6j symbol of [SixJ] vanishes, or that it does not: the first triad that
// breaks a selection rule, or that the zero is accidental, for which it computes the symbol, at the cost
// of SixJ: whoever takes arguments from strangers limits their size. The error, a *rational.ArgumentError,
// names a malformed argument; CheckSixJ does not panic.
func CheckSixJ(j1, j2, j3, l1, l2, l3 rational.Half) (wigner.Verdict, error) {
	q := sixJ{fn: "racah.CheckSixJ", names: &sixJNames, j: [6]rational.Half{j1, j2, j3, l1, l2, l3}}
	return q.verdict()
}

// CheckW is [CheckSixJ] for the coefficient of [W].
func CheckW(a, b, c, d, e, f rational.Half) (wigner.Verdict, error) {
	q := sixJ{fn: "racah.CheckW", names: &wNames, j: [6]rational.Half{a, b, e, d, c, f}}
	return q.verdict()
}

// sixJ is a 6j symbol by its arguments j1 j2 j3 l1 l2 l3, for whoever must tell what is wrong with them.
type sixJ struct {
	fn    string
	names *[6]string
	j     [6]rational.Half
}

var (
	sixJNames = [6]string{"j1", "j2", "j3", "l1", "l2", "l3"}
	wNames    = [6]string{"a", "b", "e", "d", "c", "f"} // in the places of the 6j symbol
)

// sixJTriads are the places of the momenta that couple to zero.
var sixJTriads = [4][3]int{{0, 1, 2}, {0, 4, 5}, {3, 1, 5}, {3, 4, 2}}

// rule returns the first selection rule that is broken, or an error for a malformed argument.
func (q *sixJ) rule() (wigner.Verdict, *rational.ArgumentError) {
	return checkTriads(q.fn, q.names[:], q.j[:], sixJTriads[:])
}

func (q *sixJ) verdict() (wigner.Verdict, error) {
	v, err := q.rule()
	if err != nil {
		return v, err
	}
	if v.Zero() {
		return v, nil
	}
	var k tetrad
	if k.set(q.j[0], q.j[1], q.j[2], q.j[3], q.j[4], q.j[5]); k.exact().IsZero() {
		v = wigner.Verdict{Rule: wigner.Accidental}
	}
	return v, nil
}

// forbidden panics for a malformed argument.
func forbidden(fn string, names *[6]string, j1, j2, j3, l1, l2, l3 rational.Half) {
	q := sixJ{fn, names, [6]rational.Half{j1, j2, j3, l1, l2, l3}}
	if _, err := q.rule(); err != nil {
		panic(err)
	}
}

// tetrad is an allowed 6j symbol as its sum sees it. T, S1, S2, S3 are the sums of the four triads, T that of the
// one that is treated apart, in front; N1+S1, N2+S2, N3+S3 are those of the pairs of columns. With another
// triad in front the four change places, and the sums of the columns stay.
type tetrad struct{ binsum.Quadruple }

// set takes the symbol {j1 j2 j3; l1 l2 l3}, with the triad of the largest sum in front: the sum then starts at
// t = T, where its first binomial is 1, and stays smallest. It returns false for a symbol that a selection
// rule forbids and for a negative argument.
func (k *tetrad) set(j1, j2, j3, l1, l2, l3 rational.Half) bool {
	// 64 bits hold the sums of Halves on every platform.
	a, b, c := int64(j1.Twice()), int64(j2.Twice()), int64(j3.Twice())
	d, e, f := int64(l1.Twice()), int64(l2.Twice()), int64(l3.Twice())
	abc, aef, dbf, dec := a+b+c, a+e+f, d+b+f, d+e+c
	if (abc-2*a)|(abc-2*b)|(abc-2*c)|(aef-2*a)|(aef-2*e)|(aef-2*f)|
		(dbf-2*d)|(dbf-2*b)|(dbf-2*f)|(dec-2*d)|(dec-2*e)|(dec-2*c) < 0 || (abc|aef|dbf|dec)&1 != 0 {
		return false
	}
	// The choice is random to a processor: a table is faster than a branch.
	front, most := 0, abc
	if aef > most {
		front, most = 1, aef
	}
	if dbf > most {
		front, most = 2, dbf
	}
	if dec > most {
		front = 3
	}
	s := [4]int{int(abc >> 1), int(aef >> 1), int(dbf >> 1), int(dec >> 1)}
	k.place(&s, front, int((a+b+d+e)>>1), int((b+c+e+f)>>1), int((a+c+d+f)>>1))
	return true
}

// place sets k from the sums of the triads (abc), (aef), (dbf), (dec), the one with the given index in front,
// and those of the columns 1 and 2, 2 and 3, 1 and 3. A pair of columns is opposite to a momentum, say c for
// the first pair. With abc in front S1 is dec, the other triad with c; aef and dbf are paired alike, and
// exclusive or finds the partner.
func (k *tetrad) place(s *[4]int, front, q1, q2, q3 int) {
	k.T, k.S1, k.S2, k.S3 = s[front&3], s[front&3^3], s[front&3^1], s[front&3^2]
	k.N1, k.N2, k.N3 = q1-k.S1, q2-k.S2, q3-k.S3
}

// setMomenta takes the allowed symbol {a b c; d e f}, from twice its arguments, with abc in front.
func (k *tetrad) setMomenta(a, b, c, d, e, f int) {
	s := [4]int{(a + b + c) >> 1, (a + e + f) >> 1, (d + b + f) >> 1, (d + e + c) >> 1}
	k.place(&s, 0, (a+b+d+e)>>1, (b+c+e+f)>>1, (a+c+d+f)>>1)
}

// triads returns the numbers that the four triangle coefficients depend on: the sum of a triad and the three by
// which two momenta exceed the third. Each of the latter is the sum of two columns less that of a triad, as
// N1 to N3 are. The triad in front comes first.
func (k *tetrad) triads() [4][4]int {
	q1, q2, q3 := k.N1+k.S1, k.N2+k.S2, k.N3+k.S3
	return [4][4]int{
		{k.T, k.N1, k.N2, k.N3},
		{k.S1, q1 - k.T, q2 - k.S3, q3 - k.S2},
		{k.S2, q1 - k.S3, q2 - k.T, q3 - k.S1},
		{k.S3, q1 - k.S2, q2 - k.S1, q3 - k.T},
	}
}

// momenta returns twice the arguments, {a b c; d e f} with abc in front: two triads have one momentum in common, and
// the two columns that are opposite to it have the others.
func (k *tetrad) momenta() (a, b, c, d, e, f int) {
	q1, q2, q3 := k.N1+k.S1, k.N2+k.S2, k.N3+k.S3
	return k.T + k.S2 - q2, k.T + k.S3 - q3, k.T + k.S1 - q1, k.S3 + k.S1 - q2, k.S2 + k.S1 - q3, k.S2 + k.S3 - q1
}

// exact returns the value.
func (k *tetrad) exact() rational.Surd {
	var front rational.Factored // squared
	for i, t := range k.triads() {
		power := 1
		if i == 0 {
			power = -1
		}
		mulTriangle(&front, t[1], t[2], t[3], power)
	}
	return k.Sqrt(&front)
}
