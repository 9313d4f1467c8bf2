package racah_test

import (
	"iter"
	"math/big"

	"example.org/couplet/rational"
)

// DLMF version 1.2.4, section 34.5(i): an argument of 0, 1/2 or 1.
var sixJSpecial = []identity{
	{"34.5.1", 2400, 100, func(c *tally) {
		triads(20, func(j1, j2, j3 int) {
			square := big.NewRat(1, int64((j2+1)*(j3+1)))
			c.root(sixJ(j1, j2, j3, 0, j3, j2).Sum(), phase(j1+j2+j3), square, j1, j2, j3)
		})
	}},
	{"34.5.2", 2400, 90, func(c *tally) { // j3 >= 1/2
		triads(20, func(j1, j2, j3 int) {
			if j3 >= 1 {
				square := fraction([]int{j1 + j3 - j2, j1 + j2 - j3 + 2}, []int{2, 2, j2 + 1, j2 + 2, j3, j3 + 1})
				c.root(sixJ(j1, j2, j3, 1, j3-1, j2+1).Sum(), phase(j1+j2+j3), square, j1, j2, j3)
			}
		})
	}},
	{"34.5.3", 2400, 90, func(c *tally) { // j2, j3 >= 1/2
		triads(20, func(j1, j2, j3 int) {
			if j2 >= 1 && j3 >= 1 {
				square := fraction([]int{j2 + j3 - j1, j1 + j2 + j3 + 2}, []int{2, 2, j2, j2 + 1, j3, j3 + 1})
				c.root(sixJ(j1, j2, j3, 1, j3-1, j2-1).Sum(), phase(j1+j2+j3), square, j1, j2, j3)
			}
		})
	}},
	{"34.5.4", 2300, 85, func(c *tally) { // j2, j3 >= 1
		triads(20, func(j1, j2, j3 int) {
			if total := j1 + j2 + j3; j2 >= 2 && j3 >= 2 {
				square := fraction([]int{total, total + 2, total - 2*j1, total - 2*j1 - 2},
					[]int{2, 2, 2, 2, j2 - 1, j2, j2 + 1, j3 - 1, j3, j3 + 1})
				c.root(sixJ(j1, j2, j3, 2, j3-2, j2-2).Sum(), phase(total), square, j1, j2, j3)
			}
		})
	}},
	{"34.5.5", 2400, 80, func(c *tally) { // j2 >= 1/2, j3 >= 1
		triads(20, func(j1, j2, j3 int) {
			if total := j1 + j2 + j3; j2 >= 1 && j3 >= 2 {
				square := fraction([]int{2, total + 2, total - 2*j1, total - 2*j2, total - 2*j3 + 2},
					[]int{2, 2, 2, 2, j2, j2 + 1, j2 + 2, j3 - 1, j3, j3 + 1})
				c.root(sixJ(j1, j2, j3, 2, j3-2, j2).Sum(), phase(total), square, j1, j2, j3)
			}
		})
	}},
	{"34.5.6", 2400, 80, func(c *tally) { // j3 >= 1
		triads(20, func(j1, j2, j3 int) {
			if total := j1 + j2 + j3; j3 >= 2 {
				square := fraction([]int{total - 2*j2 - 2, total - 2*j2, total - 2*j3 + 2, total - 2*j3 + 4},
					[]int{2, 2, 2, 2, j2 + 1, j2 + 2, j2 + 3, j3 - 1, j3, j3 + 1})
				c.root(sixJ(j1, j2, j3, 2, j3-2, j2+2).Sum(), phase(total), square, j1, j2, j3)
			}
		})
	}},
	{"34.5.7", 2400, 95, func(c *tally) { // j2, j3 >= 1/2
		triads(20, func(j1, j2, j3 int) {
			if j2 >= 1 && j3 >= 1 {
				x := j2*(j2+2) + j3*(j3+2) - j1*(j1+2)
				square := fraction([]int{x, x}, []int{2, 2, j2, j2 + 1, j2 + 2, j3, j3 + 1, j3 + 2})
				c.root(sixJ(j1, j2, j3, 2, j3, j2).Sum(), phase(j1+j2+j3+2)*big.NewInt(int64(x)).Sign(), square, j1, j2, j3)
			}
		})
	}},
}

// fraction returns the quotient of two products.
func fraction(num, den []int) *big.Rat {
	a, b := big.NewInt(1), big.NewInt(1)
	for _, n := range num {
		a.Mul(a, big.NewInt(int64(n)))
	}
	for _, n := range den {
		b.Mul(b, big.NewInt(int64(n)))
	}
	return ratio(a, b)
}

// Section 34.5(ii). Arguments are given as twice their values; j2+l2+j3-l3 and its like are even
// then, and their halves stand for momenta.
var sixJSymmetries = []identity{
	{"34.5.8", 320000, 95, func(c *tally) { // exchange of columns, two columns upside down
		sixJs(12, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			value := sixJ(j1, j2, j3, l1, l2, l3)
			c.surds(sixJ(j2, j1, j3, l2, l1, l3), value, q[:]...)
			c.surds(sixJ(j1, j3, j2, l1, l3, l2), value, q[:]...)
			c.surds(sixJ(j1, l2, l3, l1, j2, j3), value, q[:]...)
		})
	}},
	{"34.5.9", 100000, 95, func(c *tally) { // Regge
		sixJs(12, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			image := sixJ(j1, (j2+l2+j3-l3)/2, (j2-l2+j3+l3)/2, l1, (j2+l2-j3+l3)/2, (-j2+l2+j3+l3)/2)
			c.surds(image, sixJ(j1, j2, j3, l1, l2, l3), q[:]...)
		})
	}},
	{"34.5.10", 100000, 95, func(c *tally) { // Regge
		sixJs(12, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			image := sixJ((j2+l2+j3-l3)/2, (j1-l1+j3+l3)/2, (j1+l1+j2-l2)/2,
				(j2+l2-j3+l3)/2, (-j1+l1+j3+l3)/2, (j1+l1-j2+l2)/2)
			c.surds(image, sixJ(j1, j2, j3, l1, l2, l3), q[:]...)
		})
	}},
}

// Section 34.5(iii).
var sixJRecursion = []identity{
	{"34.5.11", 100000, 95, func(c *tally) { // with (34.5.12) and (34.5.13)
		sixJs(12, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			square := func(j int) int { return j * (j + 2) } // 4 times that of (34.5.12)
			e := func(j int) rational.Surd {
				a := (j*j - (j2-j3)*(j2-j3)) * ((j2+j3+2)*(j2+j3+2) - j*j)
				b := (j*j - (l2-l3)*(l2-l3)) * ((l2+l3+2)*(l2+l3+2) - j*j)
				return rational.Root(int64(a)*int64(b), 256)
			}
			// A term whose factor is zero is zero, though its symbol may have a negative momentum.
			term := func(factor rational.Surd, j1 int) rational.Surd {
				if factor.IsZero() {
					return factor
				}
				return factor.Mul(sixJ(j1, j2, j3, l1, l2, l3))
			}
			J1, J2, J3, L1, L2, L3 := square(j1), square(j2), square(j3), square(l1), square(l2), square(l3)
			factor := (j1 + 1) * ((J3+J2-J1)*(L3+L2-J1) - 2*(J3*L3+J2*L2-J1*L1))
			up := term(rational.Ratio(int64(j1), 2).Mul(e(j1+2)), j1+2)
			down := term(rational.Ratio(int64(j1+2), 2).Mul(e(j1)), j1-2)
			c.sums(term(rational.Ratio(int64(factor), 16), j1).Sum(), up.Add(down), q[:]...)
		})
	}},
}

// Sections 34.5(iv) and, from (34.5.15) on, 34.5(vi).
var sixJOrthogonality = []identity{
	{"34.5.14", 21000, 29, func(c *tally) { // orthogonality
		quadruples(8, func(j1, j2, l1, l2 int) {
			for l3 := range common(j1, l2, l1, j2) {
				for k3 := range common(j1, l2, l1, j2) {
					var sum rational.Sum
					for j3 := range resultants(j1, j2) {
						term := sixJ(j1, j2, j3, l1, l2, l3).Mul(sixJ(j1, j2, j3, l1, l2, k3))
						sum = sum.Add(term.Mul(number((j3 + 1) * (l3 + 1))).Sum())
					}
					c.sums(sum, delta(l3 == k3, number(1)), j1, j2, l1, l2, l3, k3)
				}
			}
		})
	}},
	{"34.5.15", 21000, 95, func(c *tally) { // Racah's sum
		quadruples(8, func(j1, j2, j3, j4 int) {
			for k := range common(j1, j4, j2, j3) {
				for n := range common(j1, j3, j2, j4) {
					var sum rational.Sum
					for j := range resultants(j1, j2) {
						term := sixJ(j1, j2, j, j3, j4, k).Mul(sixJ(j1, j2, j, j4, j3, n))
						sum = sum.Add(signed(j+k+n, term.Mul(number(j+1))).Sum())
					}
					c.sums(sum, sixJ(j1, j4, k, j2, j3, n).Sum(), j1, j2, j3, j4, k, n)
				}
			}
		})
	}},
	{"34.5.16", 40000, 95, func(c *tally) { // Biedenharn and Elliott
		sixJs(5, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			value := sixJ(j1, j2, j3, l1, l2, l3)
			pairs(5, func(k1, k2 int) { // j1' and j2'
				if !triad(k1, k2, j3) {
					return
				}
				for n3 := range common(k1, l2, l1, k2) { // l3'
					left := signed(j1+j2+j3+k1+k2+l1+l2, value.Mul(sixJ(k1, k2, j3, l1, l2, n3)))
					var sum rational.Sum
					for j := range common(j1, k1, l3, n3) {
						term := sixJ(j1, k1, j, k2, j2, j3).Mul(sixJ(l3, n3, j, k1, j1, l2)).Mul(sixJ(l3, n3, j, k2, j2, l1))
						sum = sum.Add(signed(l3+n3+j, term.Mul(number(j+1))).Sum())
					}
					c.sums(sum, left.Sum(), j1, j2, j3, k1, k2, l1, l2, l3, n3)
				}
			})
		})
	}},
}

// quadruples calls do for all four momenta to top.
func quadruples(top int, do func(a, b, c, d int)) {
	pairs(top, func(a, b int) {
		pairs(top, func(c, d int) { do(a, b, c, d) })
	})
}

// common yields the momenta to which both a, b and c, d couple.
func common(a, b, c, d int) iter.Seq[int] {
	if (a+b+c+d)%2 != 0 {
		return steps(0, -1)
	}
	return steps(max(distance(a, b), distance(c, d)), min(a+b, c+d))
}

// Section 34.5(vi): sums of one symbol, and of 3j symbols.
var sixJSingleSums = []identity{
	{"34.5.17", 1700, 100, func(c *tally) {
		pairs(16, func(j1, j2 int) {
			for k := range resultants(j1, j2) {
				var sum rational.Sum
				for j := range resultants(j1, j2) {
					sum = sum.Add(sixJ(j1, j2, j, j1, j2, k).Mul(number(j + 1)).Sum())
				}
				c.sums(sum, signed(2*(j1+j2), number(1)).Sum(), j1, j2, k)
			}
		})
	}},
	{"34.5.18", 1700, 15, func(c *tally) {
		pairs(16, func(j1, j2 int) {
			for k := range common(j1, j1, j2, j2) {
				var sum rational.Sum
				for j := range resultants(j1, j2) {
					sum = sum.Add(signed(j1+j2+j, sixJ(j1, j2, j, j2, j1, k).Mul(number(j+1))).Sum())
				}
				c.sums(sum, delta(k == 0, rational.Root(int64((j1+1)*(j2+1)), 1)), j1, j2, k)
			}
		})
	}},
	{"34.5.19", 810, 0, func(c *tally) { // 2 min(j1,j2) - j odd; zero, though no term needs to be
		pairs(16, func(j1, j2 int) {
			for j := 2*min(j1, j2) - 2; j >= 0; j -= 4 {
				var sum rational.Sum
				terms := 0
				for l := range resultants(j1, j2) {
					term := sixJ(j1, j2, l, j2, j1, j)
					terms += term.Abs().Sign()
					sum = sum.Add(term.Sum())
				}
				if terms < 2 {
					c.Fatalf("%s: %d terms", text([]int{j1, j2, j}), terms)
				}
				c.sums(sum, rational.Sum{}, j1, j2, j)
			}
		})
	}},
	{"34.5.20", 1700, 100, func(c *tally) {
		pairs(16, func(j1, j2 int) {
			for j := range resultants(j1, j2) {
				var sum rational.Sum
				for l := range resultants(j1, j2) {
					sum = sum.Add(signed(l+j, sixJ(j1, j2, l, j1, j2, j)).Sum())
				}
				c.sums(sum, signed(2*min(j1, j2), rational.Ratio(1, int64(j+1))).Sum(), j1, j2, j)
			}
		})
	}},
	{"34.5.21", 960, 100, func(c *tally) { // j2 <= j1
		pairs(16, func(j1, j2 int) {
			if j2 > j1 {
				return
			}
			for j := range resultants(j2, j2) {
				var sum rational.Sum
				for l := range resultants(j1, j2) {
					sum = sum.Add(signed(l+j+j1+j2, sixJ(j1, j2, l, j2, j1, j)).Sum())
				}
				square := ratio(factorials(2*j1-j, 2*j2+j+2), factorials(2*j2-j, 2*j1+j+2))
				c.root(sum, 1, product(square, big.NewRat(1, int64((j+1)*(j+1)))), j1, j2, j)
			}
		})
	}},
	{"34.5.22", 810, 100, func(c *tally) { // j2 < j1
		pairs(16, func(j1, j2 int) {
			if j2 >= j1 {
				return
			}
			for j := range resultants(j2, j2) {
				var sum rational.Sum
				for l := range resultants(j1, j2) {
					term := sixJ(j1, j2, l, j2, j1, j).Mul(rational.Ratio(4, int64(l*(l+2))))
					sum = sum.Add(signed(l+j+j1+j2, term).Sum())
				}
				factor := big.NewRat(4, int64(j1*(j1+2)-j2*(j2+2)))
				square := ratio(factorials(2*j1-j, 2*j2+j+2), factorials(2*j2-j, 2*j1+j+2))
				c.root(sum, 1, product(square, factor, factor), j1, j2, j)
			}
		})
	}},
	{"34.5.23", 50000, 95, func(c *tally) { // sum over the projections of three 3j symbols
		sixJs(6, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			value := sixJ(j1, j2, j3, l1, l2, l3)
			for m1 := range projections(j1) {
				for m2 := range projections(j2) {
					if m3 := -m1 - m2; m3 < -j3 || m3 > j3 {
						continue
					}
					left := value.Mul(threeJ(j1, j2, j3, m1, m2, -m1-m2)).Sum()
					c.sums(primedContraction(j1, j2, j3, l1, l2, l3, m1, m2), left, j1, j2, j3, l1, l2, l3, m1, m2)
				}
			}
		})
	}},
}
