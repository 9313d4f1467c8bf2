package wigner_test

import (
	"fmt"
	"iter"
	"math/big"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// The identities of sections 34.1 to 34.3 of the NIST Digital Library of Mathematical Functions,
// version 1.2.4, https://dlmf.nist.gov/34, each as a subtest under its number, on all arguments of a
// small domain and in exact arithmetic.
//
// Momenta and projections are held as twice their values, so that 1 in an equation is 2 here, and 2j+1
// is j+1; factorials, phases and hypergeometric takes their arguments in the same way.
func TestDLMF(t *testing.T) {
	for _, list := range [][]identity{threeJSums, threeJSpecial, threeJSymmetries, threeJRecursions, threeJOrthogonality} {
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

// root compares a symbol with sign*sqrt(square), so that package rational takes no root on the right.
func (c *tally) root(symbol rational.Surd, sign int, square *big.Rat, args ...int) {
	sign *= square.Sign()
	c.count(sign)
	if symbol.Sign() != sign || symbol.Square().Cmp(square) != 0 {
		c.Helper()
		c.Fatalf("%s: %v is not %+d*sqrt(%v)", text(args), symbol, sign, square)
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
		halves[i] = rational.Halves(a)
	}
	return fmt.Sprint(halves)
}

// threeJs calls do for all 3j symbols with momenta to top that no selection rule forbids.
func threeJs(top int, do func(j1, j2, j3, m1, m2, m3 int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			for j3 := range resultants(j1, j2) {
				if j3 > top {
					break
				}
				for m1 := range projections(j1) {
					for m2 := range projections(j2) {
						if m3 := -m1 - m2; -j3 <= m3 && m3 <= j3 {
							do(j1, j2, j3, m1, m2, m3)
						}
					}
				}
			}
		}
	}
}

func resultants(a, b int) iter.Seq[int] { return steps(max(a-b, b-a), a+b) }
func projections(j int) iter.Seq[int]   { return steps(-j, j) }

// steps yields first to last in steps of one unit.
func steps(first, last int) iter.Seq[int] {
	return func(yield func(int) bool) {
		for i := first; i <= last && yield(i); i += 2 {
		}
	}
}

func threeJ(j1, j2, j3, m1, m2, m3 int) rational.Surd {
	h := rational.Halves
	return wigner.ThreeJ(h(j1), h(j2), h(j3), h(m1), h(m2), h(m3))
}

// timesThreeJ returns a multiple of a 3j symbol. Where the factor is zero the term is zero, though its
// symbol may have negative momenta.
func timesThreeJ(factor rational.Surd, j1, j2, j3, m1, m2, m3 int) rational.Surd {
	if factor.IsZero() {
		return factor
	}
	return factor.Mul(threeJ(j1, j2, j3, m1, m2, m3))
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

// delta returns the sum of one term that is 1 for true, and 0 for false.
func delta(equal bool) rational.Sum {
	if equal {
		return number(1).Sum()
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

// DLMF sections 34.1 and 34.2.
var threeJSums = []identity{
	{"34.1.1", 25000, 95, func(c *tally) { // Clebsch-Gordan coefficients
		h := rational.Halves
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			got := wigner.ClebschGordan(h(j1), h(m1), h(j2), h(m2), h(j3), h(-m3))
			c.surds(got, signed(j1-j2-m3, rational.Root(int64(j3+1), 1).Mul(threeJ(j1, j2, j3, m1, m2, m3))), j1, j2, j3, m1, m2, m3)
		})
	}},
	{"34.2.4", 25000, 95, func(c *tally) { // the sum for the symbol
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			sum := new(big.Rat)
			for s := 0; s <= j1+j2-j3; s += 2 {
				term := inFactorials(s, j1+j2-j3-s, j1-m1-s, j2+m2-s, j3-j2+m1+s, j3-j1-m2+s)
				sum.Add(sum, term.Mul(term, big.NewRat(int64(phase(s)), 1)))
			}
			front := new(big.Rat).SetInt(factorials(j1+m1, j1-m1, j2+m2, j2-m2, j3+m3, j3-m3))
			c.root(threeJ(j1, j2, j3, m1, m2, m3), phase(j1-j2-m3)*sum.Sign(),
				product(triangleSquared(j1, j2, j3), front, sum, sum), j1, j2, j3, m1, m2, m3)
		})
	}},
	// No denominator reaches zero before the series ends, for which it takes min(j1-m1, j3+m3) steps:
	// j1+j2+m3 = (j1-m1)+(j2-m2), and j2+j3-m1 = (j2+m2)+(j3+m3).
	{"34.2.6", 25000, 95, func(c *tally) { // the symbol as a hypergeometric function
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			f := hypergeometric([]int{-j1 - j2 - j3 - 2, -j1 + m1, -j3 - m3}, []int{-j1 - j2 - m3, -j2 - j3 + m1})
			front := ratio(factorials(j1+j2+m3, j2+j3-m1), factorials(j1+j2+j3+2))
			square := product(front, front, f, f,
				ratio(factorials(j1+m1, j3-m3), factorials(j1-m1, j2+m2, j2-m2, j3+m3)))
			square.Quo(square, triangleSquared(j1, j2, j3))
			c.root(threeJ(j1, j2, j3, m1, m2, m3), phase(j2-m1+m3)*f.Sign(), square, j1, j2, j3, m1, m2, m3)
		})
	}},
}

// Section 34.3(i).
var threeJSpecial = []identity{
	{"34.3.1", 860, 100, func(c *tally) {
		for j := range 41 {
			for m := range projections(j) {
				c.root(threeJ(j, j, 0, m, -m, 0), phase(j-m), big.NewRat(1, int64(j+1)), j, m)
			}
		}
	}},
	{"34.3.2", 860, 95, func(c *tally) { // j >= 1/2
		for j := 1; j <= 40; j++ {
			for m := range projections(j) {
				sign := phase(j-m) * big.NewInt(int64(m)).Sign()
				c.root(threeJ(j, j, 2, m, -m, 0), sign, big.NewRat(int64(m*m), int64(j*(j+1)*(j+2))), j, m)
			}
		}
	}},
	{"34.3.3", 860, 95, func(c *tally) { // j >= 1/2; zero for m = j
		for j := 1; j <= 40; j++ {
			for m := range projections(j) {
				square := big.NewRat(int64((j-m)*(j+m+2)), int64(2*j*(j+1)*(j+2)))
				c.root(threeJ(j, j, 2, m, -m-2, 2), phase(j-m), square, j, m)
			}
		}
	}},
	{"34.3.5", 2200, 50, func(c *tally) { // all projections zero
		for j1 := 0; j1 <= 28; j1 += 2 {
			for j2 := 0; j2 <= 28; j2 += 2 {
				for j3 := range resultants(j1, j2) {
					total, sign, square := j1+j2+j3, 0, new(big.Rat)
					if total%4 == 0 {
						sign = phase(total / 2)
						half := ratio(factorials(total/2), factorials(total/2-j1, total/2-j2, total/2-j3))
						square = product(ratio(factorials(total-2*j1, total-2*j2, total-2*j3), factorials(total+2)), half, half)
					}
					c.root(threeJ(j1, j2, j3, 0, 0, 0), sign, square, j1, j2, j3)
				}
			}
		}
	}},
	{"34.3.6", 4300, 100, func(c *tally) { // j3 = j1+j2
		for j1 := range 11 {
			for j2 := range 11 {
				for m1 := range projections(j1) {
					for m2 := range projections(j2) {
						square := ratio(factorials(2*j1, 2*j2, j1+j2+m1+m2, j1+j2-m1-m2),
							factorials(2*j1+2*j2+2, j1+m1, j1-m1, j2+m2, j2-m2))
						c.root(threeJ(j1, j2, j1+j2, m1, m2, -m1-m2), phase(j1-j2+m1+m2), square, j1, j2, m1, m2)
					}
				}
			}
		}
	}},
	{"34.3.7", 16000, 100, func(c *tally) { // m1 = j1
		threeJs(20, func(j1, j2, j3, m1, m2, m3 int) {
			if m1 == j1 {
				square := ratio(factorials(2*j1, -j1+j2+j3, j1+j2+m3, j3-m3),
					factorials(j1+j2+j3+2, j1-j2+j3, j1+j2-j3, -j1+j2-m3, j3+m3))
				c.root(threeJ(j1, j2, j3, j1, -j1-m3, m3), phase(j1-j2-m3), square, j1, j2, j3, m3)
			}
		})
	}},
}

// Section 34.3(iii). A square root in front of a symbol is zero where the symbol has no meaning.
var threeJRecursions = []identity{
	{"34.3.13", 25000, 90, func(c *tally) { // j2, j3 >= 1/2
		root := func(a, b int) rational.Surd { return rational.Root(int64(a*b), 4) }
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			if j2 == 0 || j3 == 0 {
				return
			}
			left := root(j1+j2+j3+2, -j1+j2+j3).Mul(threeJ(j1, j2, j3, m1, m2, m3))
			up := root(j2+m2, j3-m3).Mul(threeJ(j1, j2-1, j3-1, m1, m2-1, m3+1))
			down := root(j2-m2, j3+m3).Mul(threeJ(j1, j2-1, j3-1, m1, m2+1, m3-1))
			c.sums(left.Sum(), up.Sub(down), j1, j2, j3, m1, m2, m3)
		})
	}},
	{"34.3.14", 25000, 90, func(c *tally) {
		root := func(a, b, c, d int) rational.Surd { return rational.Root(int64(a*b*c*d), 16) }
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			factor := rational.Ratio(int64(j1*(j1+2)-j2*(j2+2)-j3*(j3+2)-2*m2*m3), 4)
			up := root(j2-m2, j2+m2+2, j3-m3+2, j3+m3).Mul(threeJ(j1, j2, j3, m1, m2+2, m3-2))
			down := root(j2-m2+2, j2+m2, j3-m3, j3+m3+2).Mul(threeJ(j1, j2, j3, m1, m2-2, m3+2))
			c.sums(factor.Mul(threeJ(j1, j2, j3, m1, m2, m3)).Sum(), up.Add(down), j1, j2, j3, m1, m2, m3)
		})
	}},
	{"34.3.15", 25000, 90, func(c *tally) {
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			root := func(j1 int) rational.Surd {
				square := (j1*j1 - (j2-j3)*(j2-j3)) * ((j2+j3+2)*(j2+j3+2) - j1*j1) * (j1*j1 - m1*m1)
				return rational.Root(int64(square), 64)
			}
			factor := rational.Ratio(int64((j1+1)*((j2*(j2+2)-j3*(j3+2))*m1-j1*(j1+2)*(m3-m2))), 8)
			down := timesThreeJ(rational.Ratio(int64(j1+2), 2).Mul(root(j1)), j1-2, j2, j3, m1, m2, m3)
			up := timesThreeJ(rational.Ratio(int64(j1), 2).Mul(root(j1+2)), j1+2, j2, j3, m1, m2, m3)
			c.sums(factor.Mul(threeJ(j1, j2, j3, m1, m2, m3)).Sum(), down.Add(up), j1, j2, j3, m1, m2, m3)
		})
	}},
}

// Section 34.3(iv).
var threeJOrthogonality = []identity{
	{"34.3.16", 41000, 3, func(c *tally) { // in j3, m3
		forPairs(7, func(j1, j2 int, coupled, projected [][2]int) {
			for _, p := range coupled {
				for _, q := range coupled {
					var sum rational.Sum
					for _, m := range projected {
						sum = sum.Add(threeJ(j1, j2, p[0], m[0], m[1], p[1]).Mul(threeJ(j1, j2, q[0], m[0], m[1], q[1])).Sum())
					}
					c.sums(sum.Scale(number(p[0]+1)), delta(p == q), j1, j2, p[0], q[0], p[1], q[1])
				}
			}
		})
	}},
	{"34.3.17", 41000, 3, func(c *tally) { // in m1, m2
		forPairs(7, func(j1, j2 int, coupled, projected [][2]int) {
			for _, m := range projected {
				for _, n := range projected {
					var sum rational.Sum
					for _, p := range coupled {
						term := threeJ(j1, j2, p[0], m[0], m[1], p[1]).Mul(threeJ(j1, j2, p[0], n[0], n[1], p[1]))
						sum = sum.Add(term.Mul(number(p[0] + 1)).Sum())
					}
					c.sums(sum, delta(m == n), j1, j2, m[0], n[0], m[1], n[1])
				}
			}
		})
	}},
	{"34.3.18", 280, 100, func(c *tally) { // normalization
		forPairs(8, func(j1, j2 int, _, projected [][2]int) {
			for j3 := range resultants(j1, j2) {
				var sum rational.Sum
				for _, m := range projected {
					for m3 := range projections(j3) {
						v := threeJ(j1, j2, j3, m[0], m[1], m3)
						sum = sum.Add(v.Mul(v).Sum())
					}
				}
				c.sums(sum, number(1).Sum(), j1, j2, j3)
			}
		})
	}},
}

// forPairs calls do for j1 and j2 to top, with the states (j3 m3) and (m1 m2) that they form.
func forPairs(top int, do func(j1, j2 int, coupled, projected [][2]int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			var coupled, projected [][2]int
			for j3 := range resultants(j1, j2) {
				for m3 := range projections(j3) {
					coupled = append(coupled, [2]int{j3, m3})
				}
			}
			for m1 := range projections(j1) {
				for m2 := range projections(j2) {
					projected = append(projected, [2]int{m1, m2})
				}
			}
			do(j1, j2, coupled, projected)
		}
	}
}
