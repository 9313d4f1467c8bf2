package main

import (
	"math/rand/v2"

	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// cell is a line of a table.
type cell struct {
	symbol
	size  int  // J: every j is between J/2 and J
	most  int  // sets at the most
	alone bool // the other side is not asked: it cannot do this size
}

// symbol is what the tables compare.
type symbol struct {
	name   string
	places int // momenta
	triads [][3]int
	exact  func(q []rational.Half) rational.Surd
	float  func(q []rational.Half) float64
}

var (
	threeJ = symbol{"3j", 3, [][3]int{{0, 1, 2}},
		func(q []rational.Half) rational.Surd { return wigner.ThreeJ(q[0], q[1], q[2], q[3], q[4], q[5]) },
		func(q []rational.Half) float64 { return wigner.ThreeJFloat(q[0], q[1], q[2], q[3], q[4], q[5]) }}
	sixJ = symbol{"6j", 6, [][3]int{{0, 1, 2}, {0, 4, 5}, {3, 1, 5}, {3, 4, 2}},
		func(q []rational.Half) rational.Surd { return racah.SixJ(q[0], q[1], q[2], q[3], q[4], q[5]) },
		func(q []rational.Half) float64 { return racah.SixJFloat(q[0], q[1], q[2], q[3], q[4], q[5]) }}
	nineJ = symbol{"9j", 9, [][3]int{{0, 1, 2}, {3, 4, 5}, {6, 7, 8}, {0, 3, 6}, {1, 4, 7}, {2, 5, 8}},
		func(q []rational.Half) rational.Surd {
			return racah.NineJ(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8])
		},
		func(q []rational.Half) float64 {
			return racah.NineJFloat(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8])
		}}
)

// The lines of the tables.
var (
	exactCells = []cell{
		{threeJ, 2, 4096, false}, {threeJ, 8, 4096, false}, {threeJ, 30, 4096, false}, {threeJ, 100, 4096, false}, {threeJ, 1000, 4096, false},
		{sixJ, 2, 4096, false}, {sixJ, 8, 4096, false}, {sixJ, 30, 4096, false}, {sixJ, 100, 4096, false}, {sixJ, 1000, 4096, false},
		{nineJ, 2, 4096, false}, {nineJ, 8, 4096, false}, {nineJ, 30, 4096, false},
	}
	floatCells = []cell{
		{threeJ, 1, 4096, false}, {threeJ, 8, 4096, false}, {threeJ, 16, 4096, false}, {threeJ, 30, 4096, false}, {threeJ, 50, 4096, false},
		{threeJ, 100, 64, true}, {threeJ, 1000, 64, true}, {threeJ, 20000, 16, true},
		{sixJ, 1, 4096, false}, {sixJ, 8, 4096, false}, {sixJ, 16, 4096, false}, {sixJ, 30, 4096, false}, {sixJ, 50, 4096, false},
		{sixJ, 100, 64, true}, {sixJ, 1000, 64, true},
		{nineJ, 1, 4096, false}, {nineJ, 8, 4096, false}, {nineJ, 16, 4096, false}, {nineJ, 30, 64, false},
		{nineJ, 50, 16, true}, {nineJ, 100, 8, true},
	}
)

// draw returns n sets of allowed arguments, the same in every run.
func (c cell) draw(n int) [][]rational.Half {
	r := rand.New(rand.NewPCG(uint64(c.size), uint64(c.places)))
	var sets [][]rational.Half
	for len(sets) < n {
		q := make([]rational.Half, c.places)
		for i := range q {
			q[i] = rational.Halves(c.size + r.IntN(c.size+1))
		}
		ok := true
		for _, t := range c.triads {
			ok = ok && wigner.Triad(q[t[0]], q[t[1]], q[t[2]]) == wigner.NonZero
		}
		if ok && c.places == 3 {
			q, ok = project(r, q)
		}
		if ok {
			sets = append(sets, q)
		}
	}
	return sets
}

// project appends projections that add up to zero; ok is false where the draw gives none.
func project(r *rand.Rand, j []rational.Half) (q []rational.Half, ok bool) {
	m := func(j rational.Half) rational.Half { return rational.Halves(2*r.IntN(j.Twice()+1) - j.Twice()) }
	m1, m2 := m(j[0]), m(j[1])
	m3 := m1.Add(m2).Neg()
	return append(j, m1, m2, m3), m3.Abs().Cmp(j[2]) <= 0
}
