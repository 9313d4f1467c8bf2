package ylm_test

import (
	"math/big"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/ylm"
)

// Small exact tools that the tests share.

func number(num, den int64) rational.Complex { return rational.Ratio(num, den).Complex() }

func root(num, den int64) rational.Complex { return rational.Root(num, den).Complex() }

func sign(n int) rational.Complex { return rational.IPow(2 * n) }

// constant returns c/sqrt(pi)^rootPi.
func constant(c rational.Complex, rootPi int) ylm.Polynomial {
	return ylm.NewPolynomial(ylm.Cartesian, ylm.Term{Coeff: c, RootPi: rootPi})
}

// powers returns the product of the variables to these powers.
func powers(vars ylm.Variables, a, b, c int) ylm.Polynomial {
	return ylm.NewPolynomial(vars, ylm.Term{Coeff: number(1, 1), Powers: [3]int{a, b, c}})
}

// The Ladder variables.
var (
	u = powers(ylm.Ladder, 1, 0, 0) // x+iy
	v = powers(ylm.Ladder, 0, 1, 0) // x-iy
	z = powers(ylm.Ladder, 0, 0, 1)
)

func sum(terms ...ylm.Polynomial) ylm.Polynomial {
	var s ylm.Polynomial
	for _, t := range terms {
		s = s.Add(t)
	}
	return s
}

func product(factors ...ylm.Polynomial) ylm.Polynomial {
	p := constant(number(1, 1), 0)
	for _, f := range factors {
		p = p.Mul(f)
	}
	return p
}

func pow(p ylm.Polynomial, n int) ylm.Polynomial {
	q := constant(number(1, 1), 0)
	for range n {
		q = q.Mul(p)
	}
	return q
}

// derivative returns the derivative of p by its i-th variable.
func derivative(p ylm.Polynomial, i int) ylm.Polynomial {
	var terms []ylm.Term
	for t := range p.Terms() {
		if n := t.Powers[i]; n > 0 {
			t.Coeff = t.Coeff.Mul(number(int64(n), 1))
			t.Powers[i]--
			terms = append(terms, t)
		}
	}
	return ylm.NewPolynomial(p.Variables(), terms...)
}

// at returns the exact value of p, which must have one power of pi in all its terms, at a point with
// rational coordinates, without that power.
func at(t *testing.T, p ylm.Polynomial, rootPi int, x, y, z rational.Surd) rational.Complex {
	t.Helper()
	point := [3]rational.Complex{x.Complex(), y.Complex(), z.Complex()}
	var value rational.Complex
	for term := range p.In(ylm.Cartesian).Terms() {
		if term.RootPi != rootPi {
			t.Fatalf("%v: power of 1/sqrt(pi) is %d, want %d", p, term.RootPi, rootPi)
		}
		c := term.Coeff
		for i, n := range term.Powers {
			for range n {
				c = c.Mul(point[i])
			}
		}
		value = value.Add(c)
	}
	return value
}

// spherePoints are points with rational coordinates on the unit sphere: the sums of the squares of
// the numerators are squares.
var spherePoints = [][3]rational.Surd{
	{rational.Ratio(0, 1), rational.Ratio(0, 1), rational.Ratio(1, 1)},
	{rational.Ratio(3, 5), rational.Ratio(-4, 5), rational.Ratio(0, 1)},
	{rational.Ratio(1, 3), rational.Ratio(2, 3), rational.Ratio(-2, 3)},
	{rational.Ratio(-3, 13), rational.Ratio(4, 13), rational.Ratio(12, 13)},
	{rational.Ratio(6, 11), rational.Ratio(-9, 11), rational.Ratio(-2, 11)},
}

func factorial(n int) *big.Int { return new(big.Int).MulRange(1, int64(n)) }

// sqrtOf returns sqrt(num/den).
func sqrtOf(t *testing.T, num, den *big.Int) rational.Complex {
	t.Helper()
	s, err := rational.NewSurd(big.NewRat(1, 1), new(big.Rat).SetFrac(num, den))
	if err != nil {
		t.Fatal(err)
	}
	return s.Complex()
}

// normalization returns sqrt((2l+1)/(4 pi) (l-m)!/(l+m)!) without the pi.
func normalization(t *testing.T, l, m int) rational.Complex {
	num := factorial(l - m)
	return sqrtOf(t, num.Mul(num, big.NewInt(int64(2*l+1))), new(big.Int).Mul(big.NewInt(4), factorial(l+m)))
}

// legendre returns the Legendre polynomial P_l(z) by Bonnet's recurrence, DLMF (18.9.1) with Table
// 18.9.1: (l+1) P_(l+1) = (2l+1) z P_l - l P_(l-1).
func legendre(l int) ylm.Polynomial {
	before, p := ylm.Polynomial{}, constant(number(1, 1), 0)
	for k := range int64(l) {
		before, p = p, p.Mul(z).Scale(number(2*k+1, k+1)).Sub(before.Scale(number(k, k+1)))
	}
	return p
}
