package ylm

import (
	"fmt"
	"math/big"
	"strconv"
	"strings"

	"example.org/couplet/rational"
)

// notation is a way to write a polynomial.
type notation struct {
	variables [2][3]string // of Cartesian and Ladder
	times     string
	surd      func(rational.Surd) string
	complex   func(rational.Complex) string
	pi        func(rootPi int) string // with the sign of multiplication or division before it
	power     func(base string, n int) string
}

var plainText = notation{
	variables: [2][3]string{{"x", "y", "z"}, {"(x+iy)", "(x-iy)", "z"}},
	times:     "*",
	surd:      rational.Surd.String,
	complex:   rational.Complex.String,
	pi: func(rootPi int) string {
		sign := "*"
		if rootPi > 0 {
			sign = "/"
		}
		switch n := max(rootPi, -rootPi); {
		case n == 1:
			return sign + "sqrt(pi)"
		case n == 2:
			return sign + "pi"
		case n&1 == 0:
			return sign + "pi^" + strconv.Itoa(n/2)
		default:
			return sign + "pi^(" + strconv.Itoa(n) + "/2)"
		}
	},
	power: func(base string, n int) string { return base + "^" + strconv.Itoa(n) },
}

var latex = notation{
	variables: [2][3]string{{"x", "y", "z"}, {`(x+\mathrm{i}y)`, `(x-\mathrm{i}y)`, "z"}},
	times:     `\,`,
	surd:      rational.Surd.LaTeX,
	complex:   rational.Complex.LaTeX,
	pi: func(rootPi int) string {
		if rootPi == -2 {
			return `\,\pi`
		}
		return `\,\pi^{` + rational.Halves(-rootPi).String() + "}"
	},
	power: func(base string, n int) string { return fmt.Sprintf("%s^{%d}", base, n) },
}

// String returns p as text, factors that all terms share first:
//
//	-1/8*sqrt(21)/sqrt(pi)*(x+iy)*(5*z^2 - 1)
//
// (x+iy) and (x-iy) are the Ladder variables; i stands for the imaginary unit in coefficients, too.
func (p Polynomial) String() string { return p.text(&plainText) }

// LaTeX returns p for math mode, in the form of [Polynomial.String].
func (p Polynomial) LaTeX() string { return p.text(&latex) }

func (p Polynomial) text(n *notation) string {
	if len(p.terms) == 0 {
		return "0"
	}
	names := &n.variables[p.vars]
	if len(p.terms) == 1 {
		return n.term(names, p.terms[0])
	}
	front, rest := p.factorOut()
	sum := n.sum(names, rest)
	one := rational.Ratio(1, 1).Complex()
	if front.RootPi == 0 && front.degree() == 0 && front.Coeff.Equal(one) {
		return sum
	}
	f := n.term(names, front)
	if f == "-1" {
		return "-(" + sum + ")"
	}
	return f + n.times + "(" + sum + ")"
}

// sum writes terms with the signs between them.
func (n *notation) sum(names *[3]string, terms []Term) string {
	var b strings.Builder
	for i, t := range terms {
		text := n.term(names, t)
		if i > 0 {
			if minus, ok := strings.CutPrefix(text, "-"); ok {
				b.WriteString(" - ")
				text = minus
			} else {
				b.WriteString(" + ")
			}
		}
		b.WriteString(text)
	}
	return b.String()
}

// term writes coefficient, pi and variables; a coefficient 1 or -1 only where it would be missed.
func (n *notation) term(names *[3]string, t Term) string {
	coeff := n.coefficient(t.Coeff)
	var b strings.Builder
	if t.RootPi != 0 {
		b.WriteString(n.pi(t.RootPi))
	}
	for i, power := range t.Powers {
		if power > 0 {
			b.WriteString(n.times)
			if power > 1 {
				b.WriteString(n.power(names[i], power))
			} else {
				b.WriteString(names[i])
			}
		}
	}
	rest := b.String()
	if sign, one := strings.CutSuffix(coeff, "1"); one && (sign == "" || sign == "-") {
		if without, ok := strings.CutPrefix(rest, n.times); ok {
			return sign + without
		}
	}
	return coeff + rest
}

// coefficient writes c, in parentheses where it is a sum.
func (n *notation) coefficient(c rational.Complex) string {
	if len(c.Re.Terms())+len(c.Im.Terms()) > 1 {
		return "(" + n.complex(c) + ")"
	}
	return n.complex(c)
}

// factorOut returns p as a term times a sum of terms. The first coefficient of the sum is positive,
// and where one real surd goes into all coefficients they are integers without a common factor.
func (p Polynomial) factorOut() (front Term, rest []Term) {
	front = p.terms[0]
	for _, t := range p.terms {
		for i := range front.Powers {
			front.Powers[i] = min(front.Powers[i], t.Powers[i])
		}
		if t.RootPi != front.RootPi {
			front.RootPi = 0 // and stays so
		}
	}
	factor := p.content()
	front.Coeff = factor.Complex()
	rest = make([]Term, len(p.terms))
	for i, t := range p.terms {
		rest[i] = Term{t.Coeff.Scale(factor.Inv()), t.RootPi - front.RootPi, t.Powers}
		for j := range t.Powers {
			rest[i].Powers[j] -= front.Powers[j]
		}
	}
	return front, rest
}

// content returns the real surd that goes into all coefficients; where their radicands differ, 1 or
// -1, the sign of the first.
func (p Polynomial) content() rational.Surd {
	var parts []rational.Surd
	for _, t := range p.terms {
		parts = append(append(parts, t.Coeff.Re.Terms()...), t.Coeff.Im.Terms()...)
	}
	sign := rational.Ratio(int64(parts[0].Sign()), 1)
	num, den := new(big.Int), big.NewInt(1)
	for _, s := range parts {
		if s.Radicand().Cmp(parts[0].Radicand()) != 0 {
			return sign
		}
		r := s.Coeff()
		num.GCD(nil, nil, num, r.Num().Abs(r.Num()))
		common := new(big.Int).GCD(nil, nil, den, r.Denom())
		den.Mul(den, r.Denom()).Quo(den, common)
	}
	// The first coefficient without its rational part is its square root.
	root := parts[0].Quo(rational.FromRat(parts[0].Coeff()))
	return sign.Mul(root).Mul(rational.FromRat(new(big.Rat).SetFrac(num, den)))
}
