package wigner_test

import "example.org/couplet/internal/dlmf"

// DLMF version 1.2.4, section 34.3(ii): the symmetries, (34.3.11) and (34.3.12) those of Regge.
// Arguments are given as twice their values; j2+j3+m1 and its like are even then, and their halves
// stand for momenta and projections.
var threeJSymmetries = []dlmf.Identity{
	{Equation: "34.3.8", Cases: 510000, Percent: 95, Try: func(c *dlmf.Tally) { // cyclic permutations of the columns
		threeJs(20, func(j1, j2, j3, m1, m2, m3 int) {
			value := threeJ(j1, j2, j3, m1, m2, m3)
			c.Surds(threeJ(j2, j3, j1, m2, m3, m1), value, j1, j2, j3, m1, m2, m3)
			c.Surds(threeJ(j3, j1, j2, m3, m1, m2), value, j1, j2, j3, m1, m2, m3)
		})
	}},
	{Equation: "34.3.9", Cases: 250000, Percent: 95, Try: func(c *dlmf.Tally) { // exchange of two columns
		threeJs(20, func(j1, j2, j3, m1, m2, m3 int) {
			image := dlmf.Signed(j1+j2+j3, threeJ(j2, j1, j3, m2, m1, m3))
			c.Surds(threeJ(j1, j2, j3, m1, m2, m3), image, j1, j2, j3, m1, m2, m3)
		})
	}},
	{Equation: "34.3.10", Cases: 250000, Percent: 95, Try: func(c *dlmf.Tally) { // all projections reversed
		threeJs(20, func(j1, j2, j3, m1, m2, m3 int) {
			image := dlmf.Signed(j1+j2+j3, threeJ(j1, j2, j3, -m1, -m2, -m3))
			c.Surds(threeJ(j1, j2, j3, m1, m2, m3), image, j1, j2, j3, m1, m2, m3)
		})
	}},
	{Equation: "34.3.11", Cases: 250000, Percent: 95, Try: func(c *dlmf.Tally) {
		threeJs(20, func(j1, j2, j3, m1, m2, m3 int) {
			image := threeJ(j1, (j2+j3+m1)/2, (j2+j3-m1)/2, j2-j3, (j3-j2+m1)/2+m2, (j3-j2+m1)/2+m3)
			c.Surds(threeJ(j1, j2, j3, m1, m2, m3), image, j1, j2, j3, m1, m2, m3)
		})
	}},
	{Equation: "34.3.12", Cases: 250000, Percent: 95, Try: func(c *dlmf.Tally) {
		threeJs(20, func(j1, j2, j3, m1, m2, m3 int) {
			image := threeJ((j1+j2-m3)/2, (j2+j3-m1)/2, (j1+j3-m2)/2,
				j3-(j1+j2+m3)/2, j1-(j2+j3+m1)/2, j2-(j1+j3+m2)/2)
			c.Surds(threeJ(j1, j2, j3, m1, m2, m3), image, j1, j2, j3, m1, m2, m3)
		})
	}},
}
