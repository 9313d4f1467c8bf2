package wigner

import (
	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/square"
	"example.org/couplet/rational"
)

// ThreeJ returns the exact Wigner 3j symbol
//
//	( j1 j2 j3 )
//	( m1 m2 m3 )
//
// in the Condon-Shortley phase, by the sum of DLMF (34.2.4), written with binomials:
//
//	(-1)^(j1-j2-m3) sqrt[ Π (ji+mi)!(ji-mi)! / (n1! n2! n3! (J+1)!) ] Σ_k (-1)^k C(n1,k) C(n2,j1-m1-k) C(n3,j2+m2-k)
//
// with J = j1+j2+j3, n1 = J-2j3, n2 = J-2j2, n3 = J-2j1.
//
// It is zero where a triad or a projection breaks a selection rule; [CheckThreeJ] says which. It
// panics with *rational.ArgumentError for a negative j and for a j-m that is not an integer. Any j
// is allowed; time grows like J times the number of terms, memory like J.
func ThreeJ(j1, j2, j3, m1, m2, m3 rational.Half) rational.Surd {
	q := symbol{fn: "wigner.ThreeJ", names: &threeJNames, j: [3]rational.Half{j1, j2, j3}, m: [3]rational.Half{m1, m2, m3}}
	if err := q.check(); err != nil {
		panic(err)
	}
	if q.rule().Zero() {
		return rational.Surd{}
	}
	return q.exact(false)
}

// ClebschGordan returns the exact Clebsch-Gordan coefficient (j1 m1 j2 m2 | j m) in the
// Condon-Shortley phase, which makes (j1 j1 j2 j-j1 | j j) positive. By DLMF (34.1.1) it is
//
//	(-1)^(j1-j2+m) sqrt(2j+1) ( j1 j2  j )
//	                          ( m1 m2 -m )
//
// Zeros, panics and cost are those of [ThreeJ]; [CheckClebschGordan] names the rule.
func ClebschGordan(j1, m1, j2, m2, j, m rational.Half) rational.Surd {
	q := clebschGordan("wigner.ClebschGordan", j1, m1, j2, m2, j, m)
	if err := q.check(); err != nil {
		panic(err)
	}
	if q.rule().Zero() {
		return rational.Surd{}
	}
	return q.exact(true)
}

// CheckThreeJ tells why the 3j symbol of [ThreeJ] vanishes, or that it does not: the first broken
// selection rule, the symmetry that changes its sign, or that its zero is accidental. To tell an
// accidental zero it computes the symbol. The error, a *rational.ArgumentError, names a malformed
// argument; CheckThreeJ does not panic.
func CheckThreeJ(j1, j2, j3, m1, m2, m3 rational.Half) (Verdict, error) {
	q := symbol{fn: "wigner.CheckThreeJ", names: &threeJNames, j: [3]rational.Half{j1, j2, j3}, m: [3]rational.Half{m1, m2, m3}}
	return q.verdict()
}

// CheckClebschGordan is [CheckThreeJ] for the coefficient of [ClebschGordan].
func CheckClebschGordan(j1, m1, j2, m2, j, m rational.Half) (Verdict, error) {
	q := clebschGordan("wigner.CheckClebschGordan", j1, m1, j2, m2, j, m)
	return q.verdict()
}

// symbol is a 3j symbol on its way from arguments to value.
type symbol struct {
	fn    string
	names *symbolNames
	j, m  [3]rational.Half
}

// symbolNames are the names of the arguments in messages.
type symbolNames struct{ j, m [3]string }

var (
	threeJNames = symbolNames{[3]string{"j1", "j2", "j3"}, [3]string{"m1", "m2", "m3"}}
	cgNames     = symbolNames{[3]string{"j1", "j2", "j"}, [3]string{"m1", "m2", "m"}}
)

func clebschGordan(fn string, j1, m1, j2, m2, j, m rational.Half) symbol {
	return symbol{fn, &cgNames, [3]rational.Half{j1, j2, j}, [3]rational.Half{m1, m2, m.Neg()}}
}

// check returns an error for a malformed argument.
func (q *symbol) check() *rational.ArgumentError {
	for i, j := range q.j {
		if err := argument.Momentum(q.fn, q.names.j[i], j); err != nil {
			return err
		}
		if err := argument.Projection(q.fn, q.names.j[i], q.names.m[i], j, q.m[i]); err != nil {
			if q.names == &cgNames && i == 2 { // the caller gave the opposite sign
				err.Value = q.m[i].Neg().String()
			}
			return err
		}
	}
	return nil
}

// rule returns the first selection rule that well-formed arguments break.
func (q *symbol) rule() Verdict {
	if r := Triad(q.j[0], q.j[1], q.j[2]); r != NonZero {
		return Verdict{r, q.names.j[0] + " " + q.names.j[1] + " " + q.names.j[2]}
	}
	sum := int64(0)
	for i, m := range q.m {
		if m.Abs().Twice() > q.j[i].Twice() {
			return Verdict{ProjectionRange, q.names.m[i]}
		}
		sum += int64(m.Twice())
	}
	if sum != 0 {
		return Verdict{ProjectionSum, q.names.m[0] + " " + q.names.m[1] + " " + q.names.m[2]}
	}
	return Verdict{}
}

func (q *symbol) verdict() (Verdict, error) {
	if err := q.check(); err != nil {
		return Verdict{}, err
	}
	if v := q.rule(); v.Zero() {
		return v, nil
	}
	r := q.square()
	if r.total()&1 == 1 && r.OddSymmetry() {
		return Verdict{Rule: Symmetry}, nil
	}
	if q.exact(false).IsZero() {
		return Verdict{Rule: Accidental}, nil
	}
	return Verdict{}, nil
}

// regge is the square of Regge (1958), whose rows and columns all add up to J:
//
//	-j1+j2+j3  j1-j2+j3  j1+j2-j3
//	  j1-m1      j2-m2     j3-m3
//	  j1+m1      j2+m2     j3+m3
type regge struct{ square.Array }

func (r *regge) total() int { return r.Array[0] + r.Array[1] + r.Array[2] }

// square returns the square of an allowed symbol.
func (q *symbol) square() (r regge) {
	a, b, c := q.j[0].Twice(), q.j[1].Twice(), q.j[2].Twice()
	r.Array[0], r.Array[1], r.Array[2] = (b-a+c)/2, (a-b+c)/2, (a-c+b)/2
	for i := range 3 {
		r.Array[3+i] = (q.j[i].Twice() - q.m[i].Twice()) / 2
		r.Array[6+i] = (q.j[i].Twice() + q.m[i].Twice()) / 2
	}
	return r
}

// exact returns the value of an allowed symbol, as a 3j symbol or as a Clebsch-Gordan coefficient.
func (q *symbol) exact(coefficient bool) rational.Surd {
	r := q.square()
	sum := r.sum()
	var front rational.Factored // squared
	r.prefactor(&front)
	if coefficient {
		front.MulInt(q.j[2].Twice()+1, 1) // the two phases of DLMF (34.1.1) and (34.2.4) cancel
	} else if r.phase() {
		sum.Negative = !sum.Negative
	}
	return sum.Sqrt(&front)
}

// phase reports whether (-1)^(j1-j2-m3) = -1; j1-j2-m3 = (j1+m1) - (j2-m2).
func (r *regge) phase() bool { return (r.Array[6]-r.Array[4])&1 != 0 }

// sum describes Σ_k (-1)^k C(n1,k) C(n2,j1-m1-k) C(n3,j2+m2-k). It has as many terms as the
// smallest entry of the square has units, and one.
//
// The absolute values of its terms add up to at most C(n1+n2, j1-m1) max_i C(n3, i), by
// Vandermonde's identity, and that is at most C(J, floor(J/2)), by the same.
func (r *regge) sum() binsum.Sum {
	n3, n2, n1 := r.Array[0], r.Array[1], r.Array[2]
	a, b := r.Array[3], r.Array[7]
	first, last := max(0, a-n2, b-n3), min(n1, a, b)
	return binsum.Sum{
		Terms: last - first + 1,
		Count: 3,
		Factors: [4]binsum.Binomial{
			{Top: n1, Low: first, Move: binsum.LowUp},
			{Top: n2, Low: a - first, Move: binsum.LowDown},
			{Top: n3, Low: b - first, Move: binsum.LowDown},
		},
		Negative: first&1 != 0,
		Bits:     binsum.BinomialBits(n1+n2+n3, (n1+n2+n3)/2),
	}
}

// prefactor multiplies f by the square of the factor in front of the sum.
func (r *regge) prefactor(f *rational.Factored) {
	for i, n := range r.Array {
		if i < 3 {
			f.MulFactorial(n, -1)
		} else {
			f.MulFactorial(n, 1)
		}
	}
	f.MulFactorial(r.total()+1, -1)
}
