package ylm

import (
	"cmp"
	"fmt"
	"iter"
	"math"
	"slices"
	"strings"

	"example.org/couplet/rational"
)

// Variables are the three variables that a [Polynomial] is written in.
type Variables uint8

const (
	Cartesian Variables = iota // x, y, z
	Ladder                     // x+iy, x-iy, z; r^2 = (x+iy)(x-iy) + z^2
)

// String returns "x, y, z" or "x+iy, x-iy, z".
func (v Variables) String() string {
	if v > Ladder {
		return fmt.Sprintf("Variables(%d)", uint8(v))
	}
	names := plainText.variables[v]
	return strings.NewReplacer("(", "", ")", "").Replace(strings.Join(names[:], ", "))
}

func (v Variables) check(fn string) {
	if v > Ladder {
		panic(&rational.ArgumentError{Func: fn, Arg: "vars", Value: v.String(), Allowed: "Cartesian or Ladder"})
	}
}

// Term is one term of a [Polynomial].
type Term struct {
	Coeff  rational.Complex
	RootPi int    // the term has the factor (1/sqrt(pi))^RootPi
	Powers [3]int // exponents of the three variables, none negative
}

func (t Term) degree() int { return t.Powers[0] + t.Powers[1] + t.Powers[2] }

// Polynomial is an exact polynomial in x, y and z, or in x+iy, x-iy and z, whose coefficients are
// complex sums of square roots, each with a power of 1/sqrt(pi). A spherical harmonic has the first
// power in all its terms, a product of two the second. The zero value is 0.
//
// Polynomials are immutable values, safe for concurrent use, and have one canonical form in each of
// the two sets of variables: higher degrees come first, then higher powers of z. The operands of a
// method may be in different variables: the result is in those of the receiver, unless that is a
// constant. == does not compile on them: use [Polynomial.Equal], and [Polynomial.Key] for maps.
type Polynomial struct {
	_     [0]func() // == must not compile
	vars  Variables // Cartesian for constants
	terms []Term    // canonical; never changed after it is built
}

// NewPolynomial returns the sum of the terms, which may come in any order and repeat their powers.
// It panics with *rational.ArgumentError for a negative power, and for vars other than Cartesian
// and Ladder.
func NewPolynomial(vars Variables, terms ...Term) Polynomial {
	const fn = "ylm.NewPolynomial"
	vars.check(fn)
	sum := collector{}
	for i, t := range terms {
		if slices.Min(t.Powers[:]) < 0 {
			panic(&rational.ArgumentError{Func: fn, Arg: fmt.Sprintf("terms[%d].Powers", i),
				Value: fmt.Sprint(t.Powers), Allowed: "powers >= 0"})
		}
		sum.add(t, t.Powers, t.Coeff)
	}
	return sum.polynomial(vars)
}

// collector adds up terms of equal powers.
type collector map[monomial]rational.Complex

type monomial struct {
	powers [3]int
	rootPi int
}

// add adds c times the powers, with the power of 1/sqrt(pi) that t has.
func (s collector) add(t Term, powers [3]int, c rational.Complex) {
	m := monomial{powers, t.RootPi}
	s[m] = s[m].Add(c)
}

// polynomial returns the sum in canonical form.
func (s collector) polynomial(vars Variables) Polynomial {
	p := Polynomial{vars: vars, terms: make([]Term, 0, len(s))}
	for m, c := range s {
		if !c.IsZero() {
			p.terms = append(p.terms, Term{c, m.rootPi, m.powers})
		}
	}
	slices.SortFunc(p.terms, compareTerms)
	if p.isConstant() {
		p.vars = Cartesian
	}
	return p
}

// compareTerms puts higher degrees first, then higher powers of z, of the first and of the second
// variable, then lower powers of 1/sqrt(pi).
func compareTerms(s, t Term) int {
	return cmp.Or(
		cmp.Compare(t.degree(), s.degree()),
		cmp.Compare(t.Powers[2], s.Powers[2]),
		cmp.Compare(t.Powers[0], s.Powers[0]),
		cmp.Compare(s.RootPi, t.RootPi),
	)
}

func (p Polynomial) isConstant() bool { return len(p.terms) == 0 || p.terms[0].degree() == 0 }

// Variables returns the variables that p is written in; Cartesian for a constant.
func (p Polynomial) Variables() Variables { return p.vars }

// Terms returns an iterator over the terms of p in canonical order. No two have the same powers,
// and no coefficient is zero.
func (p Polynomial) Terms() iter.Seq[Term] { return slices.Values(p.terms) }

// IsZero reports whether p = 0.
func (p Polynomial) IsZero() bool { return len(p.terms) == 0 }

// Constant returns p as c times (1/sqrt(pi))^rootPi; ok is false where p has a variable in it, or
// terms with different powers of pi.
func (p Polynomial) Constant() (c rational.Complex, rootPi int, ok bool) {
	switch {
	case len(p.terms) == 0:
		return rational.Complex{}, 0, true
	case len(p.terms) == 1 && p.isConstant():
		return p.terms[0].Coeff, p.terms[0].RootPi, true
	}
	return rational.Complex{}, 0, false
}

// align returns the variables for the result of an operation on p and q, and both in them.
func align(p, q Polynomial) (Variables, []Term, []Term) {
	vars := p.vars
	if p.isConstant() {
		vars = q.vars
	}
	return vars, p.In(vars).terms, q.In(vars).terms
}

// Equal reports whether p = q as polynomials in x, y and z, whatever variables they are written in.
// Polynomials that agree on the unit sphere only are not equal; see [Polynomial.OnSphere].
func (p Polynomial) Equal(q Polynomial) bool {
	_, a, b := align(p, q)
	return slices.EqualFunc(a, b, func(s, t Term) bool {
		return s.Powers == t.Powers && s.RootPi == t.RootPi && s.Coeff.Equal(t.Coeff)
	})
}

// Key returns a text that is the same for equal polynomials and for no others, for use as a map key.
func (p Polynomial) Key() string {
	var b strings.Builder
	for _, t := range p.In(Ladder).terms {
		fmt.Fprint(&b, t.Powers, t.RootPi, " ", t.Coeff.Key(), ";")
	}
	return b.String()
}

// Neg returns -p.
func (p Polynomial) Neg() Polynomial { return p.Scale(rational.IPow(2)) }

// Add returns p + q.
func (p Polynomial) Add(q Polynomial) Polynomial {
	vars, a, b := align(p, q)
	sum := collector{}
	for _, t := range a {
		sum.add(t, t.Powers, t.Coeff)
	}
	for _, t := range b {
		sum.add(t, t.Powers, t.Coeff)
	}
	return sum.polynomial(vars)
}

// Sub returns p - q.
func (p Polynomial) Sub(q Polynomial) Polynomial { return p.Add(q.Neg()) }

// Mul returns p*q.
func (p Polynomial) Mul(q Polynomial) Polynomial {
	vars, a, b := align(p, q)
	sum := collector{}
	for _, s := range a {
		for _, t := range b {
			powers := s.Powers
			for i := range powers {
				powers[i] += t.Powers[i]
			}
			sum.add(Term{RootPi: s.RootPi + t.RootPi}, powers, s.Coeff.Mul(t.Coeff))
		}
	}
	return sum.polynomial(vars)
}

// Scale returns c*p. A factor with a power of pi in it is a constant polynomial, for [Polynomial.Mul].
func (p Polynomial) Scale(c rational.Complex) Polynomial {
	sum := collector{}
	for _, t := range p.terms {
		sum.add(t, t.Powers, t.Coeff.Mul(c))
	}
	return sum.polynomial(p.vars)
}

// Conj returns the complex conjugate of p for real x, y and z.
func (p Polynomial) Conj() Polynomial {
	sum := collector{}
	for _, t := range p.terms {
		powers := t.Powers
		if p.vars == Ladder {
			powers[0], powers[1] = powers[1], powers[0]
		}
		sum.add(t, powers, t.Coeff.Conj())
	}
	return sum.polynomial(p.vars)
}

// Eval returns the value of p at the point (x, y, z), which need not lie on the unit sphere.
//
// The terms are added up in float64 numbers, with an error of a few 1e-16 times the degree and the
// sum of their absolute values. For a spherical harmonic that sum exceeds the result by a factor
// that grows like 2.4^l; [Y] has no such loss.
func (p Polynomial) Eval(x, y, z float64) complex128 {
	v := [3]complex128{complex(x, 0), complex(y, 0), complex(z, 0)}
	if p.vars == Ladder {
		v[0], v[1] = complex(x, y), complex(x, -y)
	}
	var sum complex128
	for _, t := range p.terms {
		value := t.Coeff.Complex128() * complex(math.Pow(math.Pi, -float64(t.RootPi)/2), 0)
		for i, n := range t.Powers {
			value *= power(v[i], n)
		}
		sum += value
	}
	return sum
}

// power returns v^n, n >= 0.
func power(v complex128, n int) complex128 {
	result := complex(1, 0)
	for ; n > 0; n >>= 1 {
		if n&1 != 0 {
			result *= v
		}
		v *= v
	}
	return result
}
