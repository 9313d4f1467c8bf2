package racah_test

import (
	"example.org/couplet/internal/dlmf"
	"example.org/couplet/rational"
)

// DLMF version 1.2.4, sections 34.6 and 34.7.
var nineJIdentities = []dlmf.Identity{
	{Equation: "34.6.1", Cases: 1600, Percent: 95, Try: func(c *dlmf.Tally) { // contraction of six 3j symbols over all projections
		nineJs(3, func(q [9]int) {
			var sum rational.Sum
			for m13 := range dlmf.Projections(q[2]) {
				for m23 := range dlmf.Projections(q[5]) {
					m33 := -m13 - m23
					if m33 >= -q[8] && m33 <= q[8] {
						sum = sum.Add(columnContraction(q, m13, m23).Scale(threeJ(q[2], q[5], q[8], m13, m23, m33)))
					}
				}
			}
			c.Sums(sum, nineJValue(q).Sum(), q[:]...)
		})
	}},
	{Equation: "34.6.2", Cases: 38000, Percent: 95, Try: func(c *dlmf.Tally) { // three 6j symbols
		nineJs(5, func(q [9]int) {
			var sum rational.Sum
			for j := range dlmf.Resultants(q[0], q[8]) {
				term := sixJ(q[0], q[3], q[6], q[7], q[8], j).
					Mul(sixJ(q[1], q[4], q[7], q[3], j, q[5])).
					Mul(sixJ(q[2], q[5], q[8], j, q[0], q[1]))
				sum = sum.Add(dlmf.Signed(2*j, term.Mul(dlmf.Number(j+1))).Sum())
			}
			c.Sums(sum, nineJValue(q).Sum(), q[:]...)
		})
	}},
	{Equation: "34.7.1", Cases: 24000, Percent: 95, Try: func(c *dlmf.Tally) { // one argument zero
		sixJs(9, func(q [6]int) {
			j11, j12, j13, j22, j21, j31 := q[0], q[1], q[2], q[3], q[4], q[5]
			right := rational.Root(1, int64((j13+1)*(j31+1))).Mul(sixJ(j11, j12, j13, j22, j21, j31))
			c.Surds(nineJ(j11, j12, j13, j21, j22, j13, j31, j31, 0), dlmf.Signed(j12+j21+j13+j31, right), q[:]...)
		})
	}},
	{Equation: "34.7(ii)", Cases: 260000, Percent: 95, Try: func(c *dlmf.Tally) { // symmetries
		nineJs(5, func(q [9]int) {
			value, total := nineJValue(q), 0
			for _, j := range q {
				total += j
			}
			for i, image := range nineJArrangements {
				var p [9]int
				for place, from := range image {
					p[place] = q[from]
				}
				want := value
				if i >= 3 {
					want = dlmf.Signed(total, value)
				}
				c.Surds(nineJValue(p), want, q[:]...)
			}
		})
	}},
	{Equation: "34.7.2", Cases: 7400, Percent: 25, Try: func(c *dlmf.Tally) { // orthogonality
		quadruples(3, func(j1, j2, j3, j4 int) {
			for j := range 7 {
				coupled := coupledPairs(j1, j3, j2, j4, j)
				for _, p := range coupled {
					for _, q := range coupled {
						var sum rational.Sum
						for _, r := range coupledPairs(j1, j2, j3, j4, j) {
							term := nineJ(j1, j2, r[0], j3, j4, r[1], p[0], p[1], j).Mul(nineJ(j1, j2, r[0], j3, j4, r[1], q[0], q[1], j))
							sum = sum.Add(term.Mul(dlmf.Number((r[0] + 1) * (r[1] + 1) * (p[0] + 1) * (p[1] + 1))).Sum())
						}
						c.Sums(sum, dlmf.Delta(p == q, dlmf.Number(1)), j1, j2, j3, j4, p[0], p[1], q[0], q[1], j)
					}
				}
			}
		})
	}},
	{Equation: "34.7.3", Cases: 7400, Percent: 95, Try: func(c *dlmf.Tally) { // sum of products of two
		quadruples(3, func(j1, j2, j3, j4 int) {
			for j := range 7 {
				for _, p := range coupledPairs(j1, j2, j3, j4, j) { // j12 j34
					for _, q := range coupledPairs(j1, j4, j2, j3, j) { // j14 j23
						var sum rational.Sum
						for _, r := range coupledPairs(j1, j3, j2, j4, j) { // j13 j24
							term := nineJ(j1, j2, p[0], j3, j4, p[1], r[0], r[1], j).Mul(nineJ(j1, j3, r[0], j4, j2, r[1], q[0], q[1], j))
							sum = sum.Add(dlmf.Signed(2*j2+r[1]+q[1]-p[1], term.Mul(dlmf.Number((r[0]+1)*(r[1]+1)))).Sum())
						}
						right := nineJ(j1, j2, p[0], j4, j3, p[1], q[0], q[1], j)
						c.Sums(sum, right.Sum(), j1, j2, j3, j4, p[0], p[1], q[0], q[1], j)
					}
				}
			}
		})
	}},
	{Equation: "34.7.4", Cases: 8700, Percent: 90, Try: func(c *dlmf.Tally) { // sum over the projections of five 3j symbols
		nineJs(3, func(q [9]int) {
			value := nineJValue(q)
			for m13 := range dlmf.Projections(q[2]) {
				for m23 := range dlmf.Projections(q[5]) {
					if m33 := -m13 - m23; m33 >= -q[8] && m33 <= q[8] {
						left := value.Mul(threeJ(q[2], q[5], q[8], m13, m23, m33))
						c.Sums(columnContraction(q, m13, m23), left.Sum(), append(q[:], m13, m23)...)
					}
				}
			}
		})
	}},
	{Equation: "34.7.5", Cases: 19000, Percent: 80, Try: func(c *dlmf.Tally) { // a sum of a 9j symbol and a 6j symbol is a product of two
		dlmf.Triads(4, func(j21, j22, j23 int) {
			dlmf.Triads(4, func(j31, j32, j33 int) {
				for j11 := range dlmf.Resultants(j21, j31) {
					for j12 := range dlmf.Resultants(j22, j32) {
						for j := range common(j11, j33, j12, j23) {
							var sum rational.Sum
							for k := range common(j11, j12, j23, j33) {
								term := nineJ(j11, j12, k, j21, j22, j23, j31, j32, j33).Mul(sixJ(j11, j12, k, j23, j33, j))
								sum = sum.Add(term.Mul(dlmf.Number(k + 1)).Sum())
							}
							right := sixJ(j21, j22, j23, j12, j, j32).Mul(sixJ(j31, j32, j33, j, j11, j21))
							c.Sums(sum, dlmf.Signed(2*j, right).Sum(), j11, j12, j21, j22, j23, j31, j32, j33, j)
						}
					}
				}
			})
		})
	}},
}

// nineJArrangements are images of the nine places: the transposition and the cyclic permutations of
// rows and of columns, which change nothing, then exchanges of rows and of columns, which change the
// sign where the sum of all arguments is odd.
var nineJArrangements = [7][9]int{
	{0, 3, 6, 1, 4, 7, 2, 5, 8},
	{3, 4, 5, 6, 7, 8, 0, 1, 2},
	{1, 2, 0, 4, 5, 3, 7, 8, 6},
	{3, 4, 5, 0, 1, 2, 6, 7, 8},
	{0, 1, 2, 6, 7, 8, 3, 4, 5},
	{1, 0, 2, 4, 3, 5, 7, 6, 8},
	{0, 2, 1, 3, 5, 4, 6, 8, 7},
}

// coupledPairs lists the pairs of momenta that a, b and c, d couple to and that themselves couple to j.
func coupledPairs(a, b, c, d, j int) (list [][2]int) {
	for e := range dlmf.Resultants(a, b) {
		for f := range dlmf.Resultants(c, d) {
			if triad(e, f, j) {
				list = append(list, [2]int{e, f})
			}
		}
	}
	return list
}

// columnContraction returns the right side of (34.7.4), the sum over the projections of the first two
// columns of the product of the 3j symbols of the rows and of these columns, for m33 = -m13-m23.
func columnContraction(q [9]int, m13, m23 int) (sum rational.Sum) {
	m33 := -m13 - m23
	for m11 := range dlmf.Projections(q[0]) {
		row1 := threeJ(q[0], q[1], q[2], m11, -m11-m13, m13)
		if row1.IsZero() {
			continue
		}
		for m21 := range dlmf.Projections(q[3]) {
			m12, m22, m31 := -m11-m13, -m21-m23, -m11-m21
			m32 := -m12 - m22
			term := row1.Mul(threeJ(q[3], q[4], q[5], m21, m22, m23)).Mul(threeJ(q[6], q[7], q[8], m31, m32, m33)).
				Mul(threeJ(q[0], q[3], q[6], m11, m21, m31)).Mul(threeJ(q[1], q[4], q[7], m12, m22, m32))
			sum = sum.Add(term.Sum())
		}
	}
	return sum
}
