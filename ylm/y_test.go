package ylm_test

import (
	"fmt"
	"math"
	"math/cmplx"
	"testing"

	"example.org/couplet/ylm"
)

// bounds are those that the documentation of Y states, in units of sqrt((2l+1)/(4 pi)).
const (
	boundTo100  = 1e-14
	boundTo1000 = 5e-14
)

// angles reach every branch of Y: the poles and what is next to them, the equator, angles beyond
// the first turn, and azimuths whose multiples lose digits or overflow. The last four are the worst
// of some thousand random ones at l = 100.
var angles = [][2]float64{
	{0, 0}, {0, 1}, {math.Pi, 2}, {-math.Pi, 0.5}, {2 * math.Pi, 3},
	{1e-300, 0.3}, {5e-324, 0.3}, {1e-8, 2}, {1e-4, -1}, {1e-3, 6.2}, {0.01, 4}, {0.03, 1}, {0.1, 3},
	{math.Pi - 1e-8, 1.5}, {math.Pi - 0.001, 4.4}, {math.Pi - 0.03, 0.1}, {2.7, -7},
	{math.Pi / 2, 0}, {math.Pi / 2, math.Pi / 2}, {math.Pi/2 - 1e-9, 2 * math.Pi}, {1.3, 5}, {1.1, 1e-200},
	{math.Pi / 3, 6.1}, {math.Pi / 4, 3.9}, {0.5, 5.9}, {2.3, -12345.678},
	{3.5, 1}, {5, 2}, {6.2, 2.5}, {-0.7, 1.7}, {-2.2, -3}, {1e3, 0.2},
	{1e22, 1e22}, {1.2, 1e300}, {1.4, math.MaxFloat64}, {math.MaxFloat64, 5e15},
	{2, 1000}, {1.6, 2.9}, {1.9192443526643, 3.8205145684462614}, {1.5730, 0.607},
}

// worst keeps the largest of the errors that it is shown.
type worst struct {
	error float64
	where string
}

func (w *worst) see(e float64, l, m int, d *direction) {
	if !(e <= w.error) {
		*w = worst{e, fmt.Sprintf("l = %d, m = %d, theta = %v, phi = %v", l, m, d.theta, d.phi)}
	}
}

// check fails for errors above the stated bound, and for a bound that promises far too little.
func (w *worst) check(t *testing.T, bound float64) {
	t.Helper()
	t.Logf("worst error %.3g sqrt((2l+1)/(4 pi)), at %s; bound %g", w.error, w.where, bound)
	if !(w.error <= bound) {
		t.Errorf("error %g at %s, above the stated bound %g", w.error, w.where, bound)
	}
	if bound > 20*w.error {
		t.Errorf("the stated bound %g is more than 20 times the worst error %g", bound, w.error)
	}
}

// All l <= 100 and all m, against the exact polynomials. The harmonics of negative m are those of
// positive m conjugated: bit for bit in Y, exactly in the polynomials (TestDLMF/14.30.6).
func TestAccuracyOfYTo100(t *testing.T) {
	const lmax, prec = 100, precision(400)
	var directions []*direction
	for _, a := range angles {
		directions = append(directions, prec.direction(a[0], a[1], lmax))
	}
	var w worst
	for l := range lmax + 1 {
		for m := range l + 1 {
			h := prec.harmonic(t, l, m)
			for _, d := range directions {
				y := ylm.Y(l, m, d.theta, d.phi)
				w.see(h.error(d, y), l, m, d)
				if got, want := ylm.Y(l, -m, d.theta, d.phi), conjugate(m, y); got != want {
					t.Fatalf("Y(%d, %d, %v, %v) = %v, want %v", l, -m, d.theta, d.phi, got, want)
				}
			}
		}
	}
	w.check(t, boundTo100)
}

// conjugate returns (-1)^m conj(y).
func conjugate(m int, y complex128) complex128 {
	if m&1 != 0 {
		y = -y
	}
	return cmplx.Conj(y)
}

func TestAccuracyOfYTo1000(t *testing.T) {
	var w worst
	for _, l := range []int{250, 500, 1000} {
		prec := precision(200 + 13*l/10)
		var directions []*direction
		for _, theta := range []float64{0, 1e-8, 1e-3, 0.02, 0.3, 0.8, 1.1, 1.4, math.Pi / 2, 1.6, 1.69275, 2, 2.0144486708920337, 2.34, 3, 3.141, 4.5} {
			directions = append(directions, prec.direction(theta, 2.9, l))
		}
		// K of the kernel peaks next to m = 0.7 l, at 1e382 for l = 1000.
		for _, m := range []int{0, 1, 2, l / 10, l / 3, l / 2, 7 * l / 10, 9 * l / 10, l - 1, l} {
			h := prec.harmonic(t, l, m)
			for _, d := range directions {
				w.see(h.error(d, ylm.Y(l, m, d.theta, d.phi)), l, m, d)
			}
		}
	}
	w.check(t, boundTo1000)
}

// Unsöld's theorem, DLMF (14.30.9) at equal angles: the squares of all |Y_lm| of one l add up to
// (2l+1)/(4 pi). A range of m that overflows or underflows on the way would take away 1e-4 and more;
// there is no stated bound beyond l = 1000 to compare with.
func TestSumOverMAtLargeDegree(t *testing.T) {
	for _, l := range []int{1000, 2500} {
		for _, theta := range []float64{0.01, 0.4, 1.2, math.Pi / 2, 3} {
			if sum := sumOfSquares(l, theta, 0); !(math.Abs(sum-1) < 1e-12) {
				t.Errorf("l = %d, theta = %v: sum of squares is %v of (2l+1)/(4 pi)", l, theta, sum)
			}
		}
	}
}

// sumOfSquares returns the sum of |Y_lm|^2 over m in units of (2l+1)/(4 pi). A bound b on the errors
// of Y, in its unit, is one of 2 b sqrt(2l+1) on the sum.
func sumOfSquares(l int, theta, phi float64) float64 {
	sum := 0.0
	for m := -l; m <= l; m++ {
		y := ylm.Y(l, m, theta, phi)
		sum += real(y)*real(y) + imag(y)*imag(y)
	}
	return sum / (float64(2*l+1) / (4 * math.Pi))
}

// DLMF (14.30.4), and (14.30.5) at l = m: there |Y_ll|^2 is (2l+1)!!/(2l)!!/(4 pi), and that quotient
// 2 sqrt(l/pi) (1 + 3/(8l) - 7/(128 l^2) + 9/(1024 l^3)...), by the series of DLMF (5.11.13).
func TestHugeDegree(t *testing.T) {
	for _, l := range []int{1000, 30000, 1000000} {
		fl := float64(l)
		axis := math.Sqrt((2*fl + 1) / (4 * math.Pi))
		if got := real(ylm.Y(l, 0, 0, 0)); math.Abs(got-axis) > 1e-15*axis {
			t.Errorf("Y(%d, 0, 0, 0) = %v, want %v", l, got, axis)
		}
		series := 1 + 3/(8*fl) - 7/(128*fl*fl) + 9/(1024*fl*fl*fl)
		want := math.Sqrt(math.Sqrt(fl/math.Pi) * series / (2 * math.Pi))
		if got := real(ylm.Y(l, l, math.Pi/2, 0)); math.Abs(got-want) > boundTo1000*axis {
			t.Errorf("Y(%d, %d, pi/2, 0) = %v, want %v", l, l, got, want)
		}
		if got := ylm.Y(l, l, 1e-300, 0); got != 0 {
			t.Errorf("Y(%d, %d, 1e-300, 0) = %v, want 0", l, l, got)
		}
	}
}

func TestSpecialValuesOfY(t *testing.T) {
	for l := range 5 {
		for m := -l; m <= l; m++ {
			if got := ylm.Y(l, m, 0, 1.5); m != 0 && got != 0 {
				t.Errorf("Y(%d, %d, 0, 1.5) = %v, want 0", l, m, got)
			}
			for _, bad := range []float64{math.NaN(), math.Inf(1), math.Inf(-1)} {
				for _, y := range []complex128{ylm.Y(l, m, bad, 1), ylm.Y(l, m, 1, bad), ylm.Y(l, m, 0, bad)} {
					if !math.IsNaN(real(y)) || !math.IsNaN(imag(y)) {
						t.Errorf("Y(%d, %d) with an angle %v = %v, want NaN+NaNi", l, m, bad, y)
					}
				}
			}
		}
		for _, m := range []int{l + 1, -l - 1, math.MaxInt, math.MinInt} {
			if got := ylm.Y(l, m, 1, 2); got != 0 {
				t.Errorf("Y(%d, %d, 1, 2) = %v, want 0", l, m, got)
			}
		}
	}
	// A value below the range of float64, about (sin 0.1)^1000 = 1e-1001.
	if got := ylm.Y(1000, 1000, 0.1, 0); got != 0 {
		t.Errorf("Y(1000, 1000, 0.1, 0) = %v, want 0", got)
	}
	// -sqrt(3/(8 pi)) sin(theta), far below the smallest square of a float64.
	if got, want := real(ylm.Y(1, 1, 1e-300, 0)), -math.Sqrt(3/(8*math.Pi))*1e-300; math.Abs(got/want-1) > 1e-15 {
		t.Errorf("Y(1, 1, 1e-300, 0) = %v, want %v", got, want)
	}
}

func TestIndex(t *testing.T) {
	next := 0
	for l := range 50 {
		for m := -l; m <= l; m++ {
			if got := ylm.Index(l, m); got != next {
				t.Fatalf("Index(%d, %d) = %d, want %d", l, m, got, next)
			}
			next++
		}
	}
}

func TestYDoesNotAllocate(t *testing.T) {
	for _, l := range []int{0, 1, 10, 100} {
		if n := testing.AllocsPerRun(10, func() { ylm.Y(l, l/2, 0.7, 1e10) }); n != 0 {
			t.Errorf("Y at l = %d makes %v allocations", l, n)
		}
		if n := testing.AllocsPerRun(10, func() { ylm.Index(l, -l) }); n != 0 {
			t.Errorf("Index at l = %d makes %v allocations", l, n)
		}
	}
}
