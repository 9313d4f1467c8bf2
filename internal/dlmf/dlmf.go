// Package dlmf runs identities of the NIST Digital Library of Mathematical Functions as subtests, and
// holds the arithmetic that their tests share: plain, and none of it from the packages under test.
//
// Momenta and projections are held as twice their values, so that 1 in an equation is 2 here, and 2j+1
// is j+1; factorials, phases and hypergeometric functions take their arguments in the same way.
package dlmf

import (
	"fmt"
	"iter"
	"math/big"
	"testing"

	"example.org/couplet/rational"
)

// Identity is an equation with the number of cases that its domain must hold, and with the share of
// them, in percent, in which both sides must differ from zero.
type Identity struct {
	Equation string
	Cases    int
	Percent  int
	Try      func(c *Tally)
}

// Run runs the subtest.
func (id Identity) Run(t *testing.T) {
	c := Tally{T: t}
	id.Try(&c)
	t.Logf("%d cases, %d not zero", c.cases, c.nonzero)
	if c.cases < id.Cases || 100*c.nonzero < id.Percent*c.cases {
		t.Errorf("want %d cases and %d%% not zero", id.Cases, id.Percent)
	}
}

// Tally counts the cases of a subtest.
type Tally struct {
	*testing.T
	cases, nonzero int
}

// Sums compares the two sides of an identity. It stops the subtest at the first difference.
func (c *Tally) Sums(left, right rational.Sum, args ...int) {
	c.count(right.Sign())
	if !left.Equal(right) {
		c.Helper()
		c.Fatalf("%s: %v is not %v", Text(args), left, right)
	}
}

// Surds is Sums for single surds.
func (c *Tally) Surds(left, right rational.Surd, args ...int) {
	c.count(right.Sign())
	if !left.Equal(right) {
		c.Helper()
		c.Fatalf("%s: %v is not %v", Text(args), left, right)
	}
}

// Root compares a sum with sign*sqrt(square), so that package rational takes no root on the right.
func (c *Tally) Root(sum rational.Sum, sign int, square *big.Rat, args ...int) {
	sign *= square.Sign()
	c.count(sign)
	if s, ok := sum.Surd(); !ok || s.Sign() != sign || s.Square().Cmp(square) != 0 {
		c.Helper()
		c.Fatalf("%s: %v is not %+d*sqrt(%v)", Text(args), sum, sign, square)
	}
}

func (c *Tally) count(sign int) {
	c.cases++
	if sign != 0 {
		c.nonzero++
	}
}

// Text lists arguments, each half of what is given.
func Text(args []int) string {
	halves := make([]rational.Half, len(args))
	for i, a := range args {
		halves[i] = rational.Halves(a)
	}
	return fmt.Sprint(halves)
}

// Resultants yields the momenta to which a and b couple.
func Resultants(a, b int) iter.Seq[int] { return Steps(Distance(a, b), a+b) }

// Projections yields -j to j.
func Projections(j int) iter.Seq[int] { return Steps(-j, j) }

// Distance returns |a-b|.
func Distance(a, b int) int { return max(a-b, b-a) }

// Steps yields first to last in steps of one unit.
func Steps(first, last int) iter.Seq[int] {
	return func(yield func(int) bool) {
		for i := first; i <= last && yield(i); i += 2 {
		}
	}
}

// Triads calls do for all momenta to top that couple to zero.
func Triads(top int, do func(j1, j2, j3 int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			for j3 := range Resultants(j1, j2) {
				if j3 <= top {
					do(j1, j2, j3)
				}
			}
		}
	}
}

// Pairs calls do for all j1 and j2 to top.
func Pairs(top int, do func(j1, j2 int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			do(j1, j2)
		}
	}
}

// Phase returns (-1)^n.
func Phase(twice int) int {
	if twice%2 != 0 {
		panic("phase of a half-integer")
	}
	return 1 - twice&2
}

// Signed returns (-1)^n s.
func Signed(twice int, s rational.Surd) rational.Surd {
	if Phase(twice) < 0 {
		return s.Neg()
	}
	return s
}

// Number returns n.
func Number(n int) rational.Surd { return rational.Ratio(int64(n), 1) }

// Delta returns s where equal is true, otherwise 0.
func Delta(equal bool, s rational.Surd) rational.Sum {
	if equal {
		return s.Sum()
	}
	return rational.Sum{}
}

// Factorials returns the product of the factorials of its arguments, which must not be negative.
func Factorials(twice ...int) *big.Int {
	product := big.NewInt(1)
	for _, n := range twice {
		if n < 0 || n%2 != 0 {
			panic("no factorial")
		}
		product.Mul(product, new(big.Int).MulRange(1, int64(n/2)))
	}
	return product
}

// InFactorials returns the inverse of factorials, 0 where an argument is negative.
func InFactorials(twice ...int) *big.Rat {
	for _, n := range twice {
		if n < 0 {
			return new(big.Rat)
		}
	}
	return Ratio(big.NewInt(1), Factorials(twice...))
}

// Ratio returns num/den.
func Ratio(num, den *big.Int) *big.Rat { return new(big.Rat).SetFrac(num, den) }

// Product returns the product of its arguments, 1 for none.
func Product(factors ...*big.Rat) *big.Rat {
	p := big.NewRat(1, 1)
	for _, f := range factors {
		p.Mul(p, f)
	}
	return p
}

// TriangleSquared returns the square of (34.2.5).
func TriangleSquared(a, b, c int) *big.Rat {
	return Ratio(Factorials(a+b-c, a-b+c, -a+b+c), Factorials(a+b+c+2))
}

// Hypergeometric returns the generalized hypergeometric function at 1, with the given parameters in
// numerator and denominator. The series must end; it panics where a denominator reaches zero first.
func Hypergeometric(num, den []int) *big.Rat {
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
