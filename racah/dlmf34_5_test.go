package racah_test

import (
	"iter"
	"math/big"

	"example.org/couplet/internal/dlmf"
	"example.org/couplet/rational"
)

// DLMF version 1.2.4, section 34.5(i): an argument of 0, 1/2 or 1.
var sixJSpecial = []dlmf.Identity{
	{Equation: "34.5.1", Cases: 2400, Percent: 100, Try: func(c *dlmf.Tally) {
		dlmf.Triads(20, func(j1, j2, j3 int) {
			square := big.NewRat(1, int64((j2+1)*(j3+1)))
			c.Root(sixJ(j1, j2, j3, 0, j3, j2).Sum(), dlmf.Phase(j1+j2+j3), square, j1, j2, j3)
		})
	}},
	{Equation: "34.5.2", Cases: 2400, Percent: 90, Try: func(c *dlmf.Tally) { // j3 >= 1/2
		dlmf.Triads(20, func(j1, j2, j3 int) {
			if j3 >= 1 {
				square := fraction([]int{j1 + j3 - j2, j1 + j2 - j3 + 2}, []int{2, 2, j2 + 1, j2 + 2, j3, j3 + 1})
				c.Root(sixJ(j1, j2, j3, 1, j3-1, j2+1).Sum(), dlmf.Phase(j1+j2+j3), square, j1, j2, j3)
			}
		})
	}},
	{Equation: "34.5.3", Cases: 2400, Percent: 90, Try: func(c *dlmf.Tally) { // j2, j3 >= 1/2
		dlmf.Triads(20, func(j1, j2, j3 int) {
			if j2 >= 1 && j3 >= 1 {
				square := fraction([]int{j2 + j3 - j1, j1 + j2 + j3 + 2}, []int{2, 2, j2, j2 + 1, j3, j3 + 1})
				c.Root(sixJ(j1, j2, j3, 1, j3-1, j2-1).Sum(), dlmf.Phase(j1+j2+j3), square, j1, j2, j3)
			}
		})
	}},
	{Equation: "34.5.4", Cases: 2300, Percent: 85, Try: func(c *dlmf.Tally) { // j2, j3 >= 1
		dlmf.Triads(20, func(j1, j2, j3 int) {
			if total := j1 + j2 + j3; j2 >= 2 && j3 >= 2 {
				square := fraction([]int{total, total + 2, total - 2*j1, total - 2*j1 - 2},
					[]int{2, 2, 2, 2, j2 - 1, j2, j2 + 1, j3 - 1, j3, j3 + 1})
				c.Root(sixJ(j1, j2, j3, 2, j3-2, j2-2).Sum(), dlmf.Phase(total), square, j1, j2, j3)
			}
		})
	}},
	{Equation: "34.5.5", Cases: 2400, Percent: 80, Try: func(c *dlmf.Tally) { // j2 >= 1/2, j3 >= 1
		dlmf.Triads(20, func(j1, j2, j3 int) {
			if total := j1 + j2 + j3; j2 >= 1 && j3 >= 2 {
				square := fraction([]int{2, total + 2, total - 2*j1, total - 2*j2, total - 2*j3 + 2},
					[]int{2, 2, 2, 2, j2, j2 + 1, j2 + 2, j3 - 1, j3, j3 + 1})
				c.Root(sixJ(j1, j2, j3, 2, j3-2, j2).Sum(), dlmf.Phase(total), square, j1, j2, j3)
			}
		})
	}},
	{Equation: "34.5.6", Cases: 2400, Percent: 80, Try: func(c *dlmf.Tally) { // j3 >= 1
		dlmf.Triads(20, func(j1, j2, j3 int) {
			if total := j1 + j2 + j3; j3 >= 2 {
				square := fraction([]int{total - 2*j2 - 2, total - 2*j2, total - 2*j3 + 2, total - 2*j3 + 4},
					[]int{2, 2, 2, 2, j2 + 1, j2 + 2, j2 + 3, j3 - 1, j3, j3 + 1})
				c.Root(sixJ(j1, j2, j3, 2, j3-2, j2+2).Sum(), dlmf.Phase(total), square, j1, j2, j3)
			}
		})
	}},
	{Equation: "34.5.7", Cases: 2400, Percent: 95, Try: func(c *dlmf.Tally) { // j2, j3 >= 1/2
		dlmf.Triads(20, func(j1, j2, j3 int) {
			if j2 >= 1 && j3 >= 1 {
				x := j2*(j2+2) + j3*(j3+2) - j1*(j1+2)
				square := fraction([]int{x, x}, []int{2, 2, j2, j2 + 1, j2 + 2, j3, j3 + 1, j3 + 2})
				c.Root(sixJ(j1, j2, j3, 2, j3, j2).Sum(), dlmf.Phase(j1+j2+j3+2)*big.NewInt(int64(x)).Sign(), square, j1, j2, j3)
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
	return dlmf.Ratio(a, b)
}

// Section 34.5(ii). Arguments are given as twice their values; j2+l2+j3-l3 and its like are even
// then, and their halves stand for momenta.
var sixJSymmetries = []dlmf.Identity{
	{Equation: "34.5.8", Cases: 320000, Percent: 95, Try: func(c *dlmf.Tally) { // exchange of columns, two columns upside down
		sixJs(12, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			value := sixJ(j1, j2, j3, l1, l2, l3)
			c.Surds(sixJ(j2, j1, j3, l2, l1, l3), value, q[:]...)
			c.Surds(sixJ(j1, j3, j2, l1, l3, l2), value, q[:]...)
			c.Surds(sixJ(j1, l2, l3, l1, j2, j3), value, q[:]...)
		})
	}},
	{Equation: "34.5.9", Cases: 100000, Percent: 95, Try: func(c *dlmf.Tally) { // Regge
		sixJs(12, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			image := sixJ(j1, (j2+l2+j3-l3)/2, (j2-l2+j3+l3)/2, l1, (j2+l2-j3+l3)/2, (-j2+l2+j3+l3)/2)
			c.Surds(image, sixJ(j1, j2, j3, l1, l2, l3), q[:]...)
		})
	}},
	{Equation: "34.5.10", Cases: 100000, Percent: 95, Try: func(c *dlmf.Tally) { // Regge
		sixJs(12, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			image := sixJ((j2+l2+j3-l3)/2, (j1-l1+j3+l3)/2, (j1+l1+j2-l2)/2,
				(j2+l2-j3+l3)/2, (-j1+l1+j3+l3)/2, (j1+l1-j2+l2)/2)
			c.Surds(image, sixJ(j1, j2, j3, l1, l2, l3), q[:]...)
		})
	}},
}

// Section 34.5(iii).
var sixJRecursion = []dlmf.Identity{
	{Equation: "34.5.11", Cases: 100000, Percent: 95, Try: func(c *dlmf.Tally) { // with (34.5.12) and (34.5.13)
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
			c.Sums(term(rational.Ratio(int64(factor), 16), j1).Sum(), up.Add(down), q[:]...)
		})
	}},
}

// Sections 34.5(iv) and, from (34.5.15) on, 34.5(vi).
var sixJOrthogonality = []dlmf.Identity{
	{Equation: "34.5.14", Cases: 21000, Percent: 29, Try: func(c *dlmf.Tally) { // orthogonality
		quadruples(8, func(j1, j2, l1, l2 int) {
			for l3 := range common(j1, l2, l1, j2) {
				for k3 := range common(j1, l2, l1, j2) {
					var sum rational.Sum
					for j3 := range dlmf.Resultants(j1, j2) {
						term := sixJ(j1, j2, j3, l1, l2, l3).Mul(sixJ(j1, j2, j3, l1, l2, k3))
						sum = sum.Add(term.Mul(dlmf.Number((j3 + 1) * (l3 + 1))).Sum())
					}
					c.Sums(sum, dlmf.Delta(l3 == k3, dlmf.Number(1)), j1, j2, l1, l2, l3, k3)
				}
			}
		})
	}},
	{Equation: "34.5.15", Cases: 21000, Percent: 95, Try: func(c *dlmf.Tally) { // Racah's sum
		quadruples(8, func(j1, j2, j3, j4 int) {
			for k := range common(j1, j4, j2, j3) {
				for n := range common(j1, j3, j2, j4) {
					var sum rational.Sum
					for j := range dlmf.Resultants(j1, j2) {
						term := sixJ(j1, j2, j, j3, j4, k).Mul(sixJ(j1, j2, j, j4, j3, n))
						sum = sum.Add(dlmf.Signed(j+k+n, term.Mul(dlmf.Number(j+1))).Sum())
					}
					c.Sums(sum, sixJ(j1, j4, k, j2, j3, n).Sum(), j1, j2, j3, j4, k, n)
				}
			}
		})
	}},
	{Equation: "34.5.16", Cases: 40000, Percent: 95, Try: func(c *dlmf.Tally) { // Biedenharn and Elliott
		sixJs(5, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			value := sixJ(j1, j2, j3, l1, l2, l3)
			dlmf.Pairs(5, func(k1, k2 int) { // j1' and j2'
				if !triad(k1, k2, j3) {
					return
				}
				for n3 := range common(k1, l2, l1, k2) { // l3'
					left := dlmf.Signed(j1+j2+j3+k1+k2+l1+l2, value.Mul(sixJ(k1, k2, j3, l1, l2, n3)))
					var sum rational.Sum
					for j := range common(j1, k1, l3, n3) {
						term := sixJ(j1, k1, j, k2, j2, j3).Mul(sixJ(l3, n3, j, k1, j1, l2)).Mul(sixJ(l3, n3, j, k2, j2, l1))
						sum = sum.Add(dlmf.Signed(l3+n3+j, term.Mul(dlmf.Number(j+1))).Sum())
					}
					c.Sums(sum, left.Sum(), j1, j2, j3, k1, k2, l1, l2, l3, n3)
				}
			})
		})
	}},
}

// quadruples calls do for all four momenta to top.
func quadruples(top int, do func(a, b, c, d int)) {
	dlmf.Pairs(top, func(a, b int) {
		dlmf.Pairs(top, func(c, d int) { do(a, b, c, d) })
	})
}

// common yields the momenta to which both a, b and c, d couple.
func common(a, b, c, d int) iter.Seq[int] {
	if (a+b+c+d)%2 != 0 {
		return dlmf.Steps(0, -1)
	}
	return dlmf.Steps(max(dlmf.Distance(a, b), dlmf.Distance(c, d)), min(a+b, c+d))
}

// Section 34.5(vi): sums of one symbol, and of 3j symbols.
var sixJSingleSums = []dlmf.Identity{
	{Equation: "34.5.17", Cases: 1700, Percent: 100, Try: func(c *dlmf.Tally) {
		dlmf.Pairs(16, func(j1, j2 int) {
			for k := range dlmf.Resultants(j1, j2) {
				var sum rational.Sum
				for j := range dlmf.Resultants(j1, j2) {
					sum = sum.Add(sixJ(j1, j2, j, j1, j2, k).Mul(dlmf.Number(j + 1)).Sum())
				}
				c.Sums(sum, dlmf.Signed(2*(j1+j2), dlmf.Number(1)).Sum(), j1, j2, k)
			}
		})
	}},
	{Equation: "34.5.18", Cases: 1700, Percent: 15, Try: func(c *dlmf.Tally) {
		dlmf.Pairs(16, func(j1, j2 int) {
			for k := range common(j1, j1, j2, j2) {
				var sum rational.Sum
				for j := range dlmf.Resultants(j1, j2) {
					sum = sum.Add(dlmf.Signed(j1+j2+j, sixJ(j1, j2, j, j2, j1, k).Mul(dlmf.Number(j+1))).Sum())
				}
				c.Sums(sum, dlmf.Delta(k == 0, rational.Root(int64((j1+1)*(j2+1)), 1)), j1, j2, k)
			}
		})
	}},
	{Equation: "34.5.19", Cases: 810, Percent: 0, Try: func(c *dlmf.Tally) { // 2 min(j1,j2) - j odd; zero, though no term needs to be
		dlmf.Pairs(16, func(j1, j2 int) {
			for j := 2*min(j1, j2) - 2; j >= 0; j -= 4 {
				var sum rational.Sum
				terms := 0
				for l := range dlmf.Resultants(j1, j2) {
					term := sixJ(j1, j2, l, j2, j1, j)
					terms += term.Abs().Sign()
					sum = sum.Add(term.Sum())
				}
				if terms < 2 {
					c.Fatalf("%s: %d terms", dlmf.Text([]int{j1, j2, j}), terms)
				}
				c.Sums(sum, rational.Sum{}, j1, j2, j)
			}
		})
	}},
	{Equation: "34.5.20", Cases: 1700, Percent: 100, Try: func(c *dlmf.Tally) {
		dlmf.Pairs(16, func(j1, j2 int) {
			for j := range dlmf.Resultants(j1, j2) {
				var sum rational.Sum
				for l := range dlmf.Resultants(j1, j2) {
					sum = sum.Add(dlmf.Signed(l+j, sixJ(j1, j2, l, j1, j2, j)).Sum())
				}
				c.Sums(sum, dlmf.Signed(2*min(j1, j2), rational.Ratio(1, int64(j+1))).Sum(), j1, j2, j)
			}
		})
	}},
	{Equation: "34.5.21", Cases: 960, Percent: 100, Try: func(c *dlmf.Tally) { // j2 <= j1
		dlmf.Pairs(16, func(j1, j2 int) {
			if j2 > j1 {
				return
			}
			for j := range dlmf.Resultants(j2, j2) {
				var sum rational.Sum
				for l := range dlmf.Resultants(j1, j2) {
					sum = sum.Add(dlmf.Signed(l+j+j1+j2, sixJ(j1, j2, l, j2, j1, j)).Sum())
				}
				square := dlmf.Ratio(dlmf.Factorials(2*j1-j, 2*j2+j+2), dlmf.Factorials(2*j2-j, 2*j1+j+2))
				c.Root(sum, 1, dlmf.Product(square, big.NewRat(1, int64((j+1)*(j+1)))), j1, j2, j)
			}
		})
	}},
	{Equation: "34.5.22", Cases: 810, Percent: 100, Try: func(c *dlmf.Tally) { // j2 < j1
		dlmf.Pairs(16, func(j1, j2 int) {
			if j2 >= j1 {
				return
			}
			for j := range dlmf.Resultants(j2, j2) {
				var sum rational.Sum
				for l := range dlmf.Resultants(j1, j2) {
					term := sixJ(j1, j2, l, j2, j1, j).Mul(rational.Ratio(4, int64(l*(l+2))))
					sum = sum.Add(dlmf.Signed(l+j+j1+j2, term).Sum())
				}
				factor := big.NewRat(4, int64(j1*(j1+2)-j2*(j2+2)))
				square := dlmf.Ratio(dlmf.Factorials(2*j1-j, 2*j2+j+2), dlmf.Factorials(2*j2-j, 2*j1+j+2))
				c.Root(sum, 1, dlmf.Product(square, factor, factor), j1, j2, j)
			}
		})
	}},
	{Equation: "34.5.23", Cases: 50000, Percent: 95, Try: func(c *dlmf.Tally) { // sum over the projections of three 3j symbols
		sixJs(6, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			value := sixJ(j1, j2, j3, l1, l2, l3)
			for m1 := range dlmf.Projections(j1) {
				for m2 := range dlmf.Projections(j2) {
					if m3 := -m1 - m2; m3 < -j3 || m3 > j3 {
						continue
					}
					left := value.Mul(threeJ(j1, j2, j3, m1, m2, -m1-m2)).Sum()
					c.Sums(primedContraction(j1, j2, j3, l1, l2, l3, m1, m2), left, j1, j2, j3, l1, l2, l3, m1, m2)
				}
			}
		})
	}},
}
