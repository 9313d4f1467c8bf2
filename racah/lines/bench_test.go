package lines_test

import (
	"fmt"
	"testing"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

func BenchmarkRelativeStrength(b *testing.B) {
	for _, j := range []int{1, 8, 30} {
		b.Run(fmt.Sprintf("j=%d", j), func(b *testing.B) {
			jp, s := rational.Int(j+1), rational.Halves(5)
			x := rational.Halves(2*j + 3)
			b.ReportAllocs()
			for b.Loop() {
				lines.RelativeStrength(1, rational.Int(j), jp, s, x, x)
			}
		})
	}
}

func BenchmarkBetween(b *testing.B) {
	for _, bench := range []struct{ name, coupling, lower, upper string }{
		{"line=D2", "(J I)F", "J=1/2 I=3/2", "J=3/2 I=3/2"},
		{"line=N2H", "((J I1)F1 I2)F", "J=0 I1=1 I2=1", "J=1 I1=1 I2=1"},
		{"line=threeSpins", "(((J I1)F1 I2)F2 I3)F", "J=4 I1=1 I2=3/2 I3=1/2", "J=5 I1=1 I2=3/2 I3=1/2"},
	} {
		b.Run(bench.name, func(b *testing.B) {
			c, err := lines.ParseCoupling(bench.coupling)
			if err != nil {
				b.Fatal(err)
			}
			level := func(text string) lines.Level {
				l, err := c.Level(halves(b, text))
				if err != nil {
					b.Fatal(err)
				}
				return l
			}
			lower, upper := level(bench.lower), level(bench.upper)
			var p lines.Pattern
			b.ReportAllocs()
			for b.Loop() {
				p, _ = lines.Between(lower, upper)
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(len(p)), "ns/component")
		})
	}
}

func BenchmarkCasimirFunction(b *testing.B) {
	j, i, f := rational.Int(3), rational.Halves(3), rational.Halves(7)
	b.ReportAllocs()
	for b.Loop() {
		lines.CasimirFunction(j, i, f)
	}
}
