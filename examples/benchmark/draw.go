package main

import (
	"math/rand/v2"

	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// cell is a line of the table.
type cell struct {
	name   string
	size   int // J: every j is between J/2 and J
	symbol func(q []rational.Half) rational.Surd
	triads [][3]int
	places int
}

// cells are the lines of the table, the fast ones first.
var cells = func() (list []cell) {
	for _, size := range []int{2, 8, 30, 100, 1000} {
		list = append(list, cell{"3j", size, threeJ, [][3]int{{0, 1, 2}}, 3})
	}
	for _, size := range []int{2, 8, 30, 100, 1000} {
		list = append(list, cell{"6j", size, sixJ, [][3]int{{0, 1, 2}, {0, 4, 5}, {3, 1, 5}, {3, 4, 2}}, 6})
	}
	for _, size := range []int{2, 8, 30} {
		list = append(list, cell{"9j", size, nineJ, [][3]int{{0, 1, 2}, {3, 4, 5}, {6, 7, 8}, {0, 3, 6}, {1, 4, 7}, {2, 5, 8}}, 9})
	}
	return list
}()

func threeJ(q []rational.Half) rational.Surd {
	return wigner.ThreeJ(q[0], q[1], q[2], q[3], q[4], q[5])
}

func sixJ(q []rational.Half) rational.Surd {
	return racah.SixJ(q[0], q[1], q[2], q[3], q[4], q[5])
}

func nineJ(q []rational.Half) rational.Surd {
	return racah.NineJ(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8])
}

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
