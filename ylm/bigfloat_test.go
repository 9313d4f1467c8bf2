package ylm_test

import (
	"math"
	"math/big"
	"sync"
	"testing"

	"example.org/couplet/ylm"
)

// The reference values of this file come from the exact polynomials and from Taylor series of sine
// and cosine in long floats, and from nothing that Y uses.

// precision is that of the long floats, in bits. Y_lm cancels up to 1.28 l of them.
type precision uint

func (prec precision) float() *big.Float { return new(big.Float).SetPrec(uint(prec)) }

// piBits reduce any float64 and leave 2000 bits.
const piBits = 3200

// bigPi is pi by Machin's formula, 16 atan(1/5) - 4 atan(1/239).
var bigPi = sync.OnceValue(func() *big.Float {
	atan := func(n int64) *big.Int { // 2^piBits atan(1/n)
		sum := new(big.Int)
		power := new(big.Int).Lsh(big.NewInt(1), piBits)
		power.Quo(power, big.NewInt(n))
		for k := int64(1); power.Sign() != 0; k += 2 {
			term := new(big.Int).Quo(power, big.NewInt(k))
			if k%4 == 1 {
				sum.Add(sum, term)
			} else {
				sum.Sub(sum, term)
			}
			power.Quo(power, big.NewInt(n*n))
		}
		return sum
	}
	pi := atan(5)
	pi.Lsh(pi, 4).Sub(pi, new(big.Int).Lsh(atan(239), 2))
	f := precision(piBits).float().SetInt(pi)
	return f.SetMantExp(f, -piBits)
})

// sinCos returns sine and cosine of x, which must be finite, by their Taylor series.
func (prec precision) sinCos(x float64) (sin, cos *big.Float) {
	const wide = precision(piBits)
	r := wide.float().SetFloat64(x)
	period := wide.float().Add(bigPi(), bigPi())
	turns, _ := wide.float().Quo(r, period).Int(nil)
	r.Sub(r, period.Mul(period, wide.float().SetInt(turns)))

	arg := prec.float().Set(r)
	square := prec.float().Mul(arg, arg)
	series := func(first *big.Float, start int64) *big.Float {
		sum, term := prec.float().Set(first), prec.float().Set(first)
		for k := start; term.Sign() != 0 && sum.MantExp(nil)-term.MantExp(nil) < int(prec); k += 2 {
			term.Mul(term, square)
			term.Quo(term, prec.float().SetInt64(-k*(k+1)))
			sum.Add(sum, term)
		}
		return sum
	}
	return series(arg, 2), series(prec.float().SetInt64(1), 1)
}

// direction is a pair of angles with what the reference values need of them.
type direction struct {
	theta, phi     float64
	cos, cosSquare *big.Float
	ladder         []bigComplex // powers of x+iy
}

type bigComplex struct{ re, im *big.Float }

func (prec precision) direction(theta, phi float64, maxM int) *direction {
	sin, cos := prec.sinCos(theta)
	sinPhi, cosPhi := prec.sinCos(phi)
	product := func(a, b *big.Float) *big.Float { return prec.float().Mul(a, b) }
	d := &direction{theta: theta, phi: phi, cos: cos, cosSquare: product(cos, cos)}
	u := bigComplex{product(sin, cosPhi), product(sin, sinPhi)}
	power := bigComplex{prec.float().SetInt64(1), prec.float()}
	for range maxM + 1 {
		d.ladder = append(d.ladder, power)
		power = bigComplex{
			prec.float().Sub(product(power.re, u.re), product(power.im, u.im)),
			prec.float().Add(product(power.re, u.im), product(power.im, u.re)),
		}
	}
	return d
}

// bigHarmonic is the exact Y_lm with its coefficients in long floats: (x±iy)^|m| times a polynomial
// in z^2, times z where l-m is odd. The last coefficient is that of the lowest power.
type bigHarmonic struct {
	l, m         int
	coefficients []*big.Float
}

func (prec precision) harmonic(t *testing.T, l, m int) *bigHarmonic {
	t.Helper()
	h := &bigHarmonic{l: l, m: m}
	rootPi := prec.float().Sqrt(prec.float().Set(bigPi()))
	want := [3]int{m, 0, l - m}
	if m < 0 {
		want = [3]int{0, -m, l + m}
	}
	for term := range ylm.Harmonic(l, m, ylm.Ladder).Terms() {
		c, ok := term.Coeff.Re.Surd()
		if !ok || !term.Coeff.IsReal() || term.RootPi != 1 || term.Powers != want {
			t.Fatalf("Y_%d,%d has the term %v", l, m, term)
		}
		h.coefficients = append(h.coefficients, prec.float().Quo(c.Float(uint(prec)), rootPi))
		want[2] -= 2
	}
	if want[2] >= 0 {
		t.Fatalf("Y_%d,%d ends with the power %d of z", l, m, want[2]+2)
	}
	return h
}

// error returns |y - Y_lm| / sqrt((2l+1)/(4 pi)).
func (h *bigHarmonic) error(d *direction, y complex128) float64 {
	value := new(big.Float).SetPrec(d.cos.Prec())
	for _, c := range h.coefficients {
		value.Mul(value, d.cosSquare)
		value.Add(value, c)
	}
	if (h.l-h.m)&1 != 0 {
		value.Mul(value, d.cos)
	}
	difference := func(y float64, part *big.Float) float64 {
		exact := new(big.Float).Mul(value, part)
		f, _ := exact.Sub(exact, new(big.Float).SetFloat64(y)).Float64()
		return f
	}
	u := d.ladder[max(h.m, -h.m)]
	im := imag(y)
	if h.m < 0 { // compare the conjugates
		im = -im
	}
	return math.Hypot(difference(real(y), u.re), difference(im, u.im)) / math.Sqrt(float64(2*h.l+1)/(4*math.Pi))
}
