package wigner_test

import (
	"fmt"
	"math/rand/v2"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// draw returns sets of allowed arguments of a 3j symbol with every j between size/2 and size.
func draw(n, size int) [][6]rational.Half {
	r := rand.New(rand.NewPCG(20, 26))
	between := func(lo, hi int) int { return lo + r.IntN(hi-lo+1) }
	sets := make([][6]rational.Half, 0, n)
	for len(sets) < n {
		a, b, c := between(size, 2*size), between(size, 2*size), between(size, 2*size)
		if (a+b+c)&1 != 0 || a+b < c || b+c < a || c+a < b {
			continue
		}
		x, y := 2*between(0, a)-a, 2*between(0, b)-b
		if z := -x - y; z <= c && z >= -c {
			sets = append(sets, [6]rational.Half{rational.Halves(a), rational.Halves(b), rational.Halves(c),
				rational.Halves(x), rational.Halves(y), rational.Halves(z)})
		}
	}
	return sets
}

func BenchmarkThreeJ(b *testing.B) {
	for _, size := range []int{2, 8, 30, 100, 1000, 10000} {
		b.Run(fmt.Sprintf("route=exact/j=%d", size), func(b *testing.B) {
			sets := draw(64, size)
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				q := &sets[i%len(sets)]
				wigner.ThreeJ(q[0], q[1], q[2], q[3], q[4], q[5])
			}
		})
	}
}

func BenchmarkThreeJFloat(b *testing.B) {
	for _, size := range []int{1, 8, 16, 30, 50, 100, 1000} {
		b.Run(fmt.Sprintf("route=float/j=%d", size), func(b *testing.B) {
			sets := draw(256, size)
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				q := &sets[i&255]
				wigner.ThreeJFloat(q[0], q[1], q[2], q[3], q[4], q[5])
			}
		})
	}
}

// With -cpu 1,2 the time of an operation halves.
func BenchmarkThreeJFloatParallel(b *testing.B) {
	sets := draw(256, 8)
	b.RunParallel(func(p *testing.PB) {
		for i := 0; p.Next(); i++ {
			q := &sets[i&255]
			wigner.ThreeJFloat(q[0], q[1], q[2], q[3], q[4], q[5])
		}
	})
}
