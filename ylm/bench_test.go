package ylm_test

import (
	"fmt"
	"testing"

	"example.org/couplet/ylm"
)

func BenchmarkY(b *testing.B) {
	for _, lm := range [][2]int{{1, 0}, {1, 1}, {3, 2}, {10, 0}, {10, 5}, {30, 15}, {100, 0}, {100, 50}, {100, 100}, {1000, 500}} {
		b.Run(fmt.Sprintf("l=%d/m=%d", lm[0], lm[1]), func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				ylm.Y(lm[0], lm[1], 0.7, 1.9)
			}
		})
	}
}

func BenchmarkGaunt(b *testing.B) {
	for _, l := range []int{2, 10, 50} {
		b.Run(fmt.Sprintf("l=%d", l), func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				ylm.Gaunt(l, 1, l, 1, 2*l-2, -2)
			}
		})
	}
}

func BenchmarkHarmonic(b *testing.B) {
	for _, vars := range []ylm.Variables{ylm.Ladder, ylm.Cartesian} {
		for _, l := range []int{2, 10} {
			name := map[ylm.Variables]string{ylm.Ladder: "ladder", ylm.Cartesian: "cartesian"}[vars]
			b.Run(fmt.Sprintf("vars=%s/l=%d", name, l), func(b *testing.B) {
				b.ReportAllocs()
				for b.Loop() {
					ylm.Harmonic(l, 1, vars)
				}
			})
		}
	}
}

// BenchmarkIntegral is the exact route to a Gaunt integral that uses no 3j symbol.
func BenchmarkIntegral(b *testing.B) {
	for _, l := range []int{2, 5} {
		b.Run(fmt.Sprintf("l=%d", l), func(b *testing.B) {
			p, q, r := ylm.Harmonic(l, 1, ylm.Ladder), ylm.Harmonic(l, 0, ylm.Ladder), ylm.Harmonic(2*l, -1, ylm.Ladder)
			b.ReportAllocs()
			for b.Loop() {
				p.Mul(q).Mul(r).Integral()
			}
		})
	}
}
