package racah_test

import (
	"fmt"
	"iter"
	"math/big"
	"testing"

	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// The identities of sections 34.4 to 34.7 of the NIST Digital Library of Mathematical Functions,
// version 1.2.4, https://dlmf.nist.gov/34, each as a subtest under its number, on all arguments of a
// small domain and in exact arithmetic.
//
// Momenta and projections are held as twice their values, so that 1 in an equation is 2 here, and 2j+1
// is j+1; factorials, phases and hypergeometric take their arguments in the same way.
func TestDLMF(t *testing.T) {
	for _, list := range [][]identity{sixJSums, sixJSpecial, sixJSymmetries, sixJRecursion, sixJOrthogonality, sixJSingleSums, nineJIdentities} {
		for _, id := range list {
			t.Run(id.equation, id.run)
		}
	}
}

// identity is an equation with the number of cases that its domain must hold, and with the share of
// them, in percent, in which both sides must differ from zero.
type identity struct {
	equation string
	cases    int
	percent  int
	try      func(c *tally)
}

func (id identity) run(t *testing.T) {
	c := tally{T: t}
	id.try(&c)
	t.Logf("%d cases, %d not zero", c.cases, c.nonzero)
	if c.cases < id.cases || 100*c.nonzero < id.percent*c.cases {
		t.Errorf("want %d cases and %d%% not zero", id.cases, id.percent)
	}
}

// tally counts the cases of a subtest.
type tally struct {
	*testing.T
	cases, nonzero int
}

// sums compares the two sides of an identity. It stops the subtest at the first difference.
func (c *tally) sums(left, right rational.Sum, args ...int) {
	c.count(right.Sign())
	if !left.Equal(right) {
		c.Helper()
		c.Fatalf("%s: %v is not %v", text(args), left, right)
	}
}

// surds is sums for single surds.
func (c *tally) surds(left, right rational.Surd, args ...int) {
	c.count(right.Sign())
	if !left.Equal(right) {
		c.Helper()
		c.Fatalf("%s: %v is not %v", text(args), left, right)
	}
}

// root compares a sum with sign*sqrt(square), so that package rational takes no root on the right.
func (c *tally) root(sum rational.Sum, sign int, square *big.Rat, args ...int) {
	sign *= square.Sign()
	c.count(sign)
	if s, ok := sum.Surd(); !ok || s.Sign() != sign || s.Square().Cmp(square) != 0 {
		c.Helper()
		c.Fatalf("%s: %v is not %+d*sqrt(%v)", text(args), sum, sign, square)
	}
}

func (c *tally) count(sign int) {
	c.cases++
	if sign != 0 {
		c.nonzero++
	}
}

// text lists arguments, each half of what is given.
func text(args []int) string {
	halves := make([]rational.Half, len(args))
	for i, a := range args {
		halves[i] = h(a)
	}
	return fmt.Sprint(halves)
}

func resultants(a, b int) iter.Seq[int] { return steps(distance(a, b), a+b) }
func projections(j int) iter.Seq[int]   { return steps(-j, j) }
func distance(a, b int) int             { return max(a-b, b-a) }

// steps yields first to last in steps of one unit.
func steps(first, last int) iter.Seq[int] {
	return func(yield func(int) bool) {
		for i := first; i <= last && yield(i); i += 2 {
		}
	}
}

// triads calls do for all momenta to top that couple to zero.
func triads(top int, do func(j1, j2, j3 int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			for j3 := range resultants(j1, j2) {
				if j3 <= top {
					do(j1, j2, j3)
				}
			}
		}
	}
}

// pairs calls do for all j1 and j2 to top.
func pairs(top int, do func(j1, j2 int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			do(j1, j2)
		}
	}
}

func sixJ(j1, j2, j3, l1, l2, l3 int) rational.Surd {
	return racah.SixJ(h(j1), h(j2), h(j3), h(l1), h(l2), h(l3))
}

func nineJ(j11, j12, j13, j21, j22, j23, j31, j32, j33 int) rational.Surd {
	return racah.NineJ(h(j11), h(j12), h(j13), h(j21), h(j22), h(j23), h(j31), h(j32), h(j33))
}

// phase returns (-1)^n.
func phase(twice int) int {
	if twice%2 != 0 {
		panic("phase of a half-integer")
	}
	return 1 - twice&2
}

// signed returns (-1)^n s.
func signed(twice int, s rational.Surd) rational.Surd {
	if phase(twice) < 0 {
		return s.Neg()
	}
	return s
}

// number returns n.
func number(n int) rational.Surd { return rational.Ratio(int64(n), 1) }

// delta returns s where equal is true, otherwise 0.
func delta(equal bool, s rational.Surd) rational.Sum {
	if equal {
		return s.Sum()
	}
	return rational.Sum{}
}

// factorials returns the product of the factorials of its arguments, which must not be negative.
func factorials(twice ...int) *big.Int {
	product := big.NewInt(1)
	for _, n := range twice {
		if n < 0 || n%2 != 0 {
			panic("no factorial")
		}
		product.Mul(product, new(big.Int).MulRange(1, int64(n/2)))
	}
	return product
}

// inFactorials returns the inverse of factorials, 0 where an argument is negative.
func inFactorials(twice ...int) *big.Rat {
	for _, n := range twice {
		if n < 0 {
			return new(big.Rat)
		}
	}
	return ratio(big.NewInt(1), factorials(twice...))
}

func ratio(num, den *big.Int) *big.Rat { return new(big.Rat).SetFrac(num, den) }

func product(factors ...*big.Rat) *big.Rat {
	p := big.NewRat(1, 1)
	for _, f := range factors {
		p.Mul(p, f)
	}
	return p
}

// triangleSquared returns the square of (34.2.5).
func triangleSquared(a, b, c int) *big.Rat {
	return ratio(factorials(a+b-c, a-b+c, -a+b+c), factorials(a+b+c+2))
}

// hypergeometric returns the generalized hypergeometric function at 1, with the given parameters in
// numerator and denominator. The series must end; it panics where a denominator reaches zero first.
func hypergeometric(num, den []int) *big.Rat {
	term, sum := big.NewRat(1, 1), big.NewRat(1, 1)
	for n := 0; ; n++ {
		a, b := int64(1), int64(n+1)
		for _, p := range num {
			a *= int64(p/2 + n)
		}
		if a == 0 {
			return sum
		}
		for _, p := range den {
			b *= int64(p/2 + n)
		}
		term.Mul(term, big.NewRat(a, b))
		sum.Add(sum, term)
	}
}
