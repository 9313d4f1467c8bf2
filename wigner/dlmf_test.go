package wigner_test

import (
	"math/big"
	"testing"

	"example.org/couplet/internal/dlmf"
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
	for _, list := range [][]dlmf.Identity{threeJSums, threeJSpecial, threeJSymmetries, threeJRecursions, threeJOrthogonality} {
		for _, id := range list {
			t.Run(id.Equation, id.Run)
		}
	}
}

// threeJs calls do for all 3j symbols with momenta to top that no selection rule forbids.
func threeJs(top int, do func(j1, j2, j3, m1, m2, m3 int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			for j3 := range dlmf.Resultants(j1, j2) {
				if j3 > top {
					break
				}
				for m1 := range dlmf.Projections(j1) {
					for m2 := range dlmf.Projections(j2) {
						if m3 := -m1 - m2; -j3 <= m3 && m3 <= j3 {
							do(j1, j2, j3, m1, m2, m3)
						}
					}
				}
			}
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

// DLMF sections 34.1 and 34.2.
var threeJSums = []dlmf.Identity{
	{Equation: "34.1.1", Cases: 25000, Percent: 95, Try: func(c *dlmf.Tally) { // Clebsch-Gordan coefficients
		h := rational.Halves
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			got := wigner.ClebschGordan(h(j1), h(m1), h(j2), h(m2), h(j3), h(-m3))
			c.Surds(got, dlmf.Signed(j1-j2-m3, rational.Root(int64(j3+1), 1).Mul(threeJ(j1, j2, j3, m1, m2, m3))), j1, j2, j3, m1, m2, m3)
		})
	}},
	{Equation: "34.2.4", Cases: 25000, Percent: 95, Try: func(c *dlmf.Tally) { // the sum for the symbol
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			sum := new(big.Rat)
			for s := 0; s <= j1+j2-j3; s += 2 {
				term := dlmf.InFactorials(s, j1+j2-j3-s, j1-m1-s, j2+m2-s, j3-j2+m1+s, j3-j1-m2+s)
				sum.Add(sum, term.Mul(term, big.NewRat(int64(dlmf.Phase(s)), 1)))
			}
			front := new(big.Rat).SetInt(dlmf.Factorials(j1+m1, j1-m1, j2+m2, j2-m2, j3+m3, j3-m3))
			c.Root(threeJ(j1, j2, j3, m1, m2, m3).Sum(), dlmf.Phase(j1-j2-m3)*sum.Sign(),
				dlmf.Product(dlmf.TriangleSquared(j1, j2, j3), front, sum, sum), j1, j2, j3, m1, m2, m3)
		})
	}},
	// No denominator reaches zero before the series ends, for which it takes min(j1-m1, j3+m3) steps:
	// j1+j2+m3 = (j1-m1)+(j2-m2), and j2+j3-m1 = (j2+m2)+(j3+m3).
	{Equation: "34.2.6", Cases: 25000, Percent: 95, Try: func(c *dlmf.Tally) { // the symbol as a hypergeometric function
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			f := dlmf.Hypergeometric([]int{-j1 - j2 - j3 - 2, -j1 + m1, -j3 - m3}, []int{-j1 - j2 - m3, -j2 - j3 + m1})
			front := dlmf.Ratio(dlmf.Factorials(j1+j2+m3, j2+j3-m1), dlmf.Factorials(j1+j2+j3+2))
			square := dlmf.Product(front, front, f, f,
				dlmf.Ratio(dlmf.Factorials(j1+m1, j3-m3), dlmf.Factorials(j1-m1, j2+m2, j2-m2, j3+m3)))
			square.Quo(square, dlmf.TriangleSquared(j1, j2, j3))
			c.Root(threeJ(j1, j2, j3, m1, m2, m3).Sum(), dlmf.Phase(j2-m1+m3)*f.Sign(), square, j1, j2, j3, m1, m2, m3)
		})
	}},
}

// Section 34.3(i).
var threeJSpecial = []dlmf.Identity{
	{Equation: "34.3.1", Cases: 860, Percent: 100, Try: func(c *dlmf.Tally) {
		for j := range 41 {
			for m := range dlmf.Projections(j) {
				c.Root(threeJ(j, j, 0, m, -m, 0).Sum(), dlmf.Phase(j-m), big.NewRat(1, int64(j+1)), j, m)
			}
		}
	}},
	{Equation: "34.3.2", Cases: 860, Percent: 95, Try: func(c *dlmf.Tally) { // j >= 1/2
		for j := 1; j <= 40; j++ {
			for m := range dlmf.Projections(j) {
				sign := dlmf.Phase(j-m) * big.NewInt(int64(m)).Sign()
				c.Root(threeJ(j, j, 2, m, -m, 0).Sum(), sign, big.NewRat(int64(m*m), int64(j*(j+1)*(j+2))), j, m)
			}
		}
	}},
	{Equation: "34.3.3", Cases: 860, Percent: 95, Try: func(c *dlmf.Tally) { // j >= 1/2; zero for m = j
		for j := 1; j <= 40; j++ {
			for m := range dlmf.Projections(j) {
				square := big.NewRat(int64((j-m)*(j+m+2)), int64(2*j*(j+1)*(j+2)))
				c.Root(threeJ(j, j, 2, m, -m-2, 2).Sum(), dlmf.Phase(j-m), square, j, m)
			}
		}
	}},
	{Equation: "34.3.5", Cases: 2200, Percent: 50, Try: func(c *dlmf.Tally) { // all projections zero
		for j1 := 0; j1 <= 28; j1 += 2 {
			for j2 := 0; j2 <= 28; j2 += 2 {
				for j3 := range dlmf.Resultants(j1, j2) {
					total, sign, square := j1+j2+j3, 0, new(big.Rat)
					if total%4 == 0 {
						sign = dlmf.Phase(total / 2)
						half := dlmf.Ratio(dlmf.Factorials(total/2), dlmf.Factorials(total/2-j1, total/2-j2, total/2-j3))
						square = dlmf.Product(dlmf.Ratio(dlmf.Factorials(total-2*j1, total-2*j2, total-2*j3), dlmf.Factorials(total+2)), half, half)
					}
					c.Root(threeJ(j1, j2, j3, 0, 0, 0).Sum(), sign, square, j1, j2, j3)
				}
			}
		}
	}},
	{Equation: "34.3.6", Cases: 4300, Percent: 100, Try: func(c *dlmf.Tally) { // j3 = j1+j2
		for j1 := range 11 {
			for j2 := range 11 {
				for m1 := range dlmf.Projections(j1) {
					for m2 := range dlmf.Projections(j2) {
						square := dlmf.Ratio(dlmf.Factorials(2*j1, 2*j2, j1+j2+m1+m2, j1+j2-m1-m2),
							dlmf.Factorials(2*j1+2*j2+2, j1+m1, j1-m1, j2+m2, j2-m2))
						c.Root(threeJ(j1, j2, j1+j2, m1, m2, -m1-m2).Sum(), dlmf.Phase(j1-j2+m1+m2), square, j1, j2, m1, m2)
					}
				}
			}
		}
	}},
	{Equation: "34.3.7", Cases: 16000, Percent: 100, Try: func(c *dlmf.Tally) { // m1 = j1
		threeJs(20, func(j1, j2, j3, m1, m2, m3 int) {
			if m1 == j1 {
				square := dlmf.Ratio(dlmf.Factorials(2*j1, -j1+j2+j3, j1+j2+m3, j3-m3),
					dlmf.Factorials(j1+j2+j3+2, j1-j2+j3, j1+j2-j3, -j1+j2-m3, j3+m3))
				c.Root(threeJ(j1, j2, j3, j1, -j1-m3, m3).Sum(), dlmf.Phase(j1-j2-m3), square, j1, j2, j3, m3)
			}
		})
	}},
}

// Section 34.3(iii). A square root in front of a symbol is zero where the symbol has no meaning.
var threeJRecursions = []dlmf.Identity{
	{Equation: "34.3.13", Cases: 25000, Percent: 90, Try: func(c *dlmf.Tally) { // j2, j3 >= 1/2
		root := func(a, b int) rational.Surd { return rational.Root(int64(a*b), 4) }
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			if j2 == 0 || j3 == 0 {
				return
			}
			left := root(j1+j2+j3+2, -j1+j2+j3).Mul(threeJ(j1, j2, j3, m1, m2, m3))
			up := root(j2+m2, j3-m3).Mul(threeJ(j1, j2-1, j3-1, m1, m2-1, m3+1))
			down := root(j2-m2, j3+m3).Mul(threeJ(j1, j2-1, j3-1, m1, m2+1, m3-1))
			c.Sums(left.Sum(), up.Sub(down), j1, j2, j3, m1, m2, m3)
		})
	}},
	{Equation: "34.3.14", Cases: 25000, Percent: 90, Try: func(c *dlmf.Tally) {
		root := func(a, b, c, d int) rational.Surd { return rational.Root(int64(a*b*c*d), 16) }
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			factor := rational.Ratio(int64(j1*(j1+2)-j2*(j2+2)-j3*(j3+2)-2*m2*m3), 4)
			up := root(j2-m2, j2+m2+2, j3-m3+2, j3+m3).Mul(threeJ(j1, j2, j3, m1, m2+2, m3-2))
			down := root(j2-m2+2, j2+m2, j3-m3, j3+m3+2).Mul(threeJ(j1, j2, j3, m1, m2-2, m3+2))
			c.Sums(factor.Mul(threeJ(j1, j2, j3, m1, m2, m3)).Sum(), up.Add(down), j1, j2, j3, m1, m2, m3)
		})
	}},
	{Equation: "34.3.15", Cases: 25000, Percent: 90, Try: func(c *dlmf.Tally) {
		threeJs(12, func(j1, j2, j3, m1, m2, m3 int) {
			root := func(j1 int) rational.Surd {
				square := (j1*j1 - (j2-j3)*(j2-j3)) * ((j2+j3+2)*(j2+j3+2) - j1*j1) * (j1*j1 - m1*m1)
				return rational.Root(int64(square), 64)
			}
			factor := rational.Ratio(int64((j1+1)*((j2*(j2+2)-j3*(j3+2))*m1-j1*(j1+2)*(m3-m2))), 8)
			down := timesThreeJ(rational.Ratio(int64(j1+2), 2).Mul(root(j1)), j1-2, j2, j3, m1, m2, m3)
			up := timesThreeJ(rational.Ratio(int64(j1), 2).Mul(root(j1+2)), j1+2, j2, j3, m1, m2, m3)
			c.Sums(factor.Mul(threeJ(j1, j2, j3, m1, m2, m3)).Sum(), down.Add(up), j1, j2, j3, m1, m2, m3)
		})
	}},
}

// Section 34.3(iv).
var threeJOrthogonality = []dlmf.Identity{
	{Equation: "34.3.16", Cases: 41000, Percent: 3, Try: func(c *dlmf.Tally) { // in j3, m3
		forPairs(7, func(j1, j2 int, coupled, projected [][2]int) {
			for _, p := range coupled {
				for _, q := range coupled {
					var sum rational.Sum
					for _, m := range projected {
						sum = sum.Add(threeJ(j1, j2, p[0], m[0], m[1], p[1]).Mul(threeJ(j1, j2, q[0], m[0], m[1], q[1])).Sum())
					}
					c.Sums(sum.Scale(dlmf.Number(p[0]+1)), dlmf.Delta(p == q, dlmf.Number(1)), j1, j2, p[0], q[0], p[1], q[1])
				}
			}
		})
	}},
	{Equation: "34.3.17", Cases: 41000, Percent: 3, Try: func(c *dlmf.Tally) { // in m1, m2
		forPairs(7, func(j1, j2 int, coupled, projected [][2]int) {
			for _, m := range projected {
				for _, n := range projected {
					var sum rational.Sum
					for _, p := range coupled {
						term := threeJ(j1, j2, p[0], m[0], m[1], p[1]).Mul(threeJ(j1, j2, p[0], n[0], n[1], p[1]))
						sum = sum.Add(term.Mul(dlmf.Number(p[0] + 1)).Sum())
					}
					c.Sums(sum, dlmf.Delta(m == n, dlmf.Number(1)), j1, j2, m[0], n[0], m[1], n[1])
				}
			}
		})
	}},
	{Equation: "34.3.18", Cases: 280, Percent: 100, Try: func(c *dlmf.Tally) { // normalization
		forPairs(8, func(j1, j2 int, _, projected [][2]int) {
			for j3 := range dlmf.Resultants(j1, j2) {
				var sum rational.Sum
				for _, m := range projected {
					for m3 := range dlmf.Projections(j3) {
						v := threeJ(j1, j2, j3, m[0], m[1], m3)
						sum = sum.Add(v.Mul(v).Sum())
					}
				}
				c.Sums(sum, dlmf.Number(1).Sum(), j1, j2, j3)
			}
		})
	}},
}

// forPairs calls do for j1 and j2 to top, with the states (j3 m3) and (m1 m2) that they form.
func forPairs(top int, do func(j1, j2 int, coupled, projected [][2]int)) {
	for j1 := range top + 1 {
		for j2 := range top + 1 {
			var coupled, projected [][2]int
			for j3 := range dlmf.Resultants(j1, j2) {
				for m3 := range dlmf.Projections(j3) {
					coupled = append(coupled, [2]int{j3, m3})
				}
			}
			for m1 := range dlmf.Projections(j1) {
				for m2 := range dlmf.Projections(j2) {
					projected = append(projected, [2]int{m1, m2})
				}
			}
			do(j1, j2, coupled, projected)
		}
	}
}
