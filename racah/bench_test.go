package racah_test

import (
	"fmt"
	"math/rand/v2"
	"testing"

	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// drawSixJ returns sets of allowed arguments of a 6j symbol with every j between size/2 and size.
func drawSixJ(n, size int) [][6]rational.Half {
	r := rand.New(rand.NewPCG(6, 2026))
	half := func() rational.Half { return rational.Halves(size + r.IntN(size+1)) }
	sets := make([][6]rational.Half, 0, n)
	for len(sets) < n {
		q := [6]rational.Half{half(), half(), half(), half(), half(), half()}
		ok := wigner.Triad(q[0], q[1], q[2]) == wigner.NonZero && wigner.Triad(q[0], q[4], q[5]) == wigner.NonZero &&
			wigner.Triad(q[3], q[1], q[5]) == wigner.NonZero && wigner.Triad(q[3], q[4], q[2]) == wigner.NonZero
		if ok {
			sets = append(sets, q)
		}
	}
	return sets
}

// drawNineJ returns sets of allowed arguments of a 9j symbol with every j between size/2 and size.
func drawNineJ(n, size int) [][9]rational.Half {
	r := rand.New(rand.NewPCG(9, 2026))
	sets := make([][9]rational.Half, 0, n)
	for len(sets) < n {
		var q [9]rational.Half
		for i := range q {
			q[i] = rational.Halves(size + r.IntN(size+1))
		}
		ok := true
		for i := range 3 {
			ok = ok && wigner.Triad(q[3*i], q[3*i+1], q[3*i+2]) == wigner.NonZero && wigner.Triad(q[i], q[3+i], q[6+i]) == wigner.NonZero
		}
		if ok {
			sets = append(sets, q)
		}
	}
	return sets
}

func BenchmarkSixJ(b *testing.B) {
	for _, size := range []int{2, 8, 30, 100, 1000, 10000} {
		b.Run(fmt.Sprintf("route=exact/j=%d", size), func(b *testing.B) {
			sets := drawSixJ(64, size)
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				q := &sets[i%len(sets)]
				racah.SixJ(q[0], q[1], q[2], q[3], q[4], q[5])
			}
		})
	}
}

func BenchmarkNineJ(b *testing.B) {
	for _, size := range []int{2, 8, 30, 100} {
		b.Run(fmt.Sprintf("route=exact/j=%d", size), func(b *testing.B) {
			sets := drawNineJ(16, size)
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				q := &sets[i%len(sets)]
				racah.NineJ(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8])
			}
		})
	}
}

func BenchmarkSixJFloat(b *testing.B) {
	for _, size := range []int{1, 8, 16, 30, 50, 100, 1000} {
		b.Run(fmt.Sprintf("route=float/j=%d", size), func(b *testing.B) {
			sets := drawSixJ(256, size)
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				q := &sets[i&255]
				racah.SixJFloat(q[0], q[1], q[2], q[3], q[4], q[5])
			}
		})
	}
}

func BenchmarkNineJFloat(b *testing.B) {
	for _, size := range []int{1, 8, 30, 100} {
		b.Run(fmt.Sprintf("route=float/j=%d", size), func(b *testing.B) {
			sets := drawNineJ(16, size)
			b.ReportAllocs()
			for i := 0; b.Loop(); i++ {
				q := &sets[i&15]
				racah.NineJFloat(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8])
			}
		})
	}
}
