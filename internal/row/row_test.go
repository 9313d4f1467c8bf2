package row

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/dd"
)

// A member that is off by nearly its bound is rounded right or refused.
func TestRound(t *testing.T) {
	r := rand.New(rand.NewPCG(45, 45))
	taken, refused := 0, 0
	for range 200000 {
		v := dd.Pair{Hi: 1 + r.Float64()}
		half := (math.Nextafter(v.Hi, 3) - v.Hi) / 2
		v.Lo = half * (2*r.Float64() - 1)
		if r.IntN(2) == 0 { // close to the middle between two
			v.Lo = half * (1 - 0x1p-8*r.Float64())
		}
		want, _ := new(big.Float).Add(new(big.Float).SetPrec(200).SetFloat64(v.Hi), big.NewFloat(v.Lo)).Float64()
		bound := math.Ldexp(1, -61-r.IntN(10))
		v.Lo += float64(v.Hi * bound * []float64{-0.99, 0.99}[r.IntN(2)])
		f, ok := Round(v.Normal(), bound)
		if !ok {
			refused++
			continue
		}
		if taken++; f != want {
			t.Fatalf("%v, off by nearly %g: %g, want %g", v, bound, f, want)
		}
	}
	if taken < 100000 || refused < 1000 {
		t.Errorf("%d taken, %d refused", taken, refused)
	}
	for _, bound := range []float64{0x1p-60, 1, math.Inf(1), math.NaN()} {
		if f, ok := Round(dd.Pair{Hi: 1.5}, bound); ok {
			t.Errorf("bound %g gives %g", bound, f)
		}
	}
}
