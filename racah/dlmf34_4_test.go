package racah_test

import (
	"math/big"

	"example.org/couplet/internal/dlmf"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// DLMF version 1.2.4, section 34.4, and with it Edmonds (6.2.13).
var sixJSums = []dlmf.Identity{
	{Equation: "34.4.1", Cases: 3400, Percent: 95, Try: func(c *dlmf.Tally) { // contraction of four 3j symbols over all projections
		sixJs(6, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			var sum rational.Sum
			for m1 := range dlmf.Projections(j1) {
				for m2 := range dlmf.Projections(j2) {
					term := threeJ(j1, j2, j3, m1, m2, -m1-m2)
					sum = sum.Add(primedContraction(j1, j2, j3, l1, l2, l3, m1, m2).Scale(term))
				}
			}
			c.Sums(sum, sixJ(j1, j2, j3, l1, l2, l3).Sum(), q[:]...)
		})
	}},
	{Equation: "34.4.2", Cases: 24000, Percent: 95, Try: func(c *dlmf.Tally) { // the sum for the symbol
		sixJs(9, func(q [6]int) {
			sign, square := directSixJ(q)
			c.Root(sixJ(q[0], q[1], q[2], q[3], q[4], q[5]).Sum(), sign, square, q[:]...)
		})
	}},
	{Equation: "Edmonds(6.2.13)", Cases: 24000, Percent: 95, Try: func(c *dlmf.Tally) { // W(abcd;ef) against (34.4.2)
		sixJs(9, func(q [6]int) {
			a, b, e, d, cc, f := q[0], q[1], q[2], q[3], q[4], q[5]
			sign, square := directSixJ(q)
			c.Root(racah.W(h(a), h(b), h(cc), h(d), h(e), h(f)).Sum(), dlmf.Phase(a+b+cc+d)*sign, square, a, b, cc, d, e, f)
		})
	}},
	// No denominator reaches zero before the series ends, for which it takes at most j1-j2+j3 steps:
	// each is at least that far below zero, by the triads (l1 l2 j3), (j1 l2 l3) and (l1 j2 l3).
	{Equation: "34.4.3", Cases: 24000, Percent: 95, Try: func(c *dlmf.Tally) { // the symbol as a hypergeometric function
		sixJs(9, func(q [6]int) {
			j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
			f := dlmf.Hypergeometric([]int{-j1 + j2 - j3, j2 - l1 - l3, -j1 - l2 - l3 - 2, -j3 - l1 - l2 - 2},
				[]int{-j1 + j2 - l1 - l2, j2 - j3 - l2 - l3, -j1 - j3 - l1 - l3 - 2})
			front := dlmf.Ratio(dlmf.Factorials(j1-j2+l1+l2, -j2+j3+l2+l3, j1+j3+l1+l3+2),
				dlmf.Factorials(j1-j2+j3, -j2+l1+l3, j1+l2+l3+2, j3+l1+l2+2))
			square := dlmf.Product(front, front, f, f, dlmf.TriangleSquared(j1, j2, j3), dlmf.TriangleSquared(j2, l1, l3))
			square.Quo(square, dlmf.Product(dlmf.TriangleSquared(j1, l2, l3), dlmf.TriangleSquared(j3, l1, l2)))
			c.Root(sixJ(j1, j2, j3, l1, l2, l3).Sum(), dlmf.Phase(j1+j3+l1+l3)*f.Sign(), square, q[:]...)
		})
	}},
}

// primedContraction returns the right side of (34.5.23), the sum over m1', m2', m3' of the signed
// product of three 3j symbols, for m3 = -m1-m2.
func primedContraction(j1, j2, j3, l1, l2, l3, m1, m2 int) (sum rational.Sum) {
	for n1 := range dlmf.Projections(l1) {
		n3 := n1 - m2
		n2 := n3 - m1
		if n2 < -l2 || n2 > l2 || n3 < -l3 || n3 > l3 {
			continue
		}
		term := threeJ(j1, l2, l3, m1, n2, -n3).Mul(threeJ(l1, j2, l3, -n1, m2, n3)).Mul(threeJ(l1, l2, j3, n1, -n2, -m1-m2))
		sum = sum.Add(dlmf.Signed(l1+l2+l3+n1+n2+n3, term).Sum())
	}
	return sum
}

// directSixJ returns sign and square of a 6j symbol by (34.4.2).
func directSixJ(q [6]int) (sign int, square *big.Rat) {
	j1, j2, j3, l1, l2, l3 := q[0], q[1], q[2], q[3], q[4], q[5]
	sum := new(big.Rat)
	for s := 0; s <= j1+j2+l1+l2; s += 2 {
		term := dlmf.InFactorials(s-j1-j2-j3, s-j1-l2-l3, s-l1-j2-l3, s-l1-l2-j3,
			j1+j2+l1+l2-s, j2+j3+l2+l3-s, j3+j1+l3+l1-s)
		term.Mul(term, new(big.Rat).SetInt(dlmf.Factorials(s+2)))
		sum.Add(sum, term.Mul(term, big.NewRat(int64(dlmf.Phase(s)), 1)))
	}
	return sum.Sign(), dlmf.Product(dlmf.TriangleSquared(j1, j2, j3), dlmf.TriangleSquared(j1, l2, l3),
		dlmf.TriangleSquared(l1, j2, l3), dlmf.TriangleSquared(l1, l2, j3), sum, sum)
}
