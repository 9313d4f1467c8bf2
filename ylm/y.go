package ylm

import (
	"fmt"
	"math"
	"math/bits"
	"strconv"

	"example.org/couplet/rational"
)

// Y_lm as a number: a normalization times sin(theta)^|m|, times a Gegenbauer polynomial that starts
// from 1 and is carried upwards in l, times exp(i m phi).
//
// DLMF (18.11.1), Table 18.6.1 and Table 18.9.1. Time grows like l. The worst error seen, in units
// of the largest |Y_lm|, is 4e-15 for l <= 100 and 1.3e-14 for l <= 1000.

// Y returns the spherical harmonic Y_lm(theta, phi), DLMF (14.30.1), in the Condon-Shortley phase.
//
// The angles, in radians, may be any finite numbers: beyond 0 <= theta <= pi the formula continues,
// Y_lm(-theta, phi) = Y_lm(theta, phi+pi). They are taken as they stand, so that math.Pi is not
// quite the south pole. Special cases are
//
//	Y(l, m, theta, phi) = 0 for |m| > l
//	Y(l, m, 0, phi) = 0 for m != 0
//	Y(l, m, theta, phi) = NaN+i*NaN where theta or phi is NaN or ±Inf, unless |m| > l
//
// The absolute error is below 1e-14 sqrt((2l+1)/(4 pi)) for l <= 100, and below 5e-14 times that
// root for l <= 1000. No intermediate result overflows or underflows at any l; a value too small
// for a float64 becomes zero.
//
// Y panics with *rational.ArgumentError for negative l. It allocates nothing.
func Y(l, m int, theta, phi float64) complex128 {
	checkDegree("ylm.Y", "l", l)
	if exceeds(m, l) {
		return 0
	}
	value := polar(l, max(m, -m), theta)
	if m > 0 && m&1 != 0 {
		value = -value
	}
	p := azimuthal(m, phi)
	return complex(value*real(p), value*imag(p))
}

// maxIndexDegree keeps (l+1)^2 within an int.
const maxIndexDegree = 1<<(bits.UintSize/2-1) - 1

// Index returns l*l + l + m, the place of Y_lm in the order (0,0), (1,-1), (1,0), (1,1), (2,-2)...
// It panics with *rational.ArgumentError unless |m| <= l and 0 <= l < 2^31; the limit is 2^15 where
// int has 32 bits.
func Index(l, m int) int {
	if l < 0 || l > maxIndexDegree {
		panic(&rational.ArgumentError{Func: "ylm.Index", Arg: "l", Value: strconv.Itoa(l),
			Allowed: fmt.Sprintf("an integer from 0 to %d", maxIndexDegree)})
	}
	if exceeds(m, l) {
		panic(&rational.ArgumentError{Func: "ylm.Index", Arg: "m", Value: strconv.Itoa(m),
			Allowed: fmt.Sprintf("an integer from %d to %d, with l = %d", -l, l, l)})
	}
	return l*l + l + m
}

// polar returns (-1)^m Y_lm(theta, 0), for 0 <= m <= l.
//
// With C the Gegenbauer polynomial of degree l-m and order m+1/2, divided by its value at 1,
//
//	(-1)^m Y_lm(theta, 0) = sqrt((2l+1)/(4 pi)) K sin(theta)^m C(cos(theta))
//	K = sqrt[(l+m)!/(l-m)!] / (2^m m!)
//
// K alone runs up to (1+sqrt(2))^l, and C down to the inverse, so both come with an exponent.
func polar(l, m int, theta float64) float64 {
	half, cohalf := math.Sincos(theta / 2)
	// The lower half of the sphere is mirrored onto the upper: l-m is the parity of C.
	flip := false
	if math.Abs(half) > math.Abs(cohalf) {
		half, flip = cohalf, (l-m)&1 != 0
	}
	versine := 2 * half * half // 1-|cos(theta)|, without the cancellation
	if math.IsNaN(versine) {
		return versine
	}
	c, cExp := gegenbauer(l-m, m, versine)
	f, fExp := sinePower(l, m, math.Sin(theta))
	if flip {
		c = -c
	}
	exp := max(cExp+fExp, -1<<20) // what has a lower exponent is zero in any case
	return math.Ldexp(math.Sqrt((2*float64(l)+1)/(4*math.Pi))*f*c, int(exp))
}

// block is how many steps of a loop go by between two looks at the exponent. A factor of one step
// is between 1e-10 and 1e18 for all l < 2^31, so that 16 stay within the range of float64.
const block = 16

// gegenbauer returns, as c times 2^exp, the Gegenbauer polynomial of degree n and order m+1/2 at
// x = 1-versine, divided by its value at x = 1.
//
// The recurrence of Table 18.9.1 of the DLMF is, for the polynomials so divided,
//
//	(k+2m+1) C_(k+1) = (2k+2m+1) x C_k - k C_(k-1)
//
// Next to x = 1 their slope is about k^2/(2m+2), and a rounding error of x, or of an intermediate
// result, would grow as much. So the recurrence is one for the differences D_k = C_k - C_(k-1),
// which knows of x only by 1-x (Reinsch's way to sum a Fourier series):
//
//	(k+2m+1) D_(k+1) = k D_k - (2k+2m+1) (1-x) C_k
func gegenbauer(n, m int, versine float64) (c float64, exp int64) {
	c = 1
	var d float64
	order := 2*float64(m) + 1
	for k := range n {
		fk := float64(k)
		inverse := 1 / (fk + order)
		d = fk*inverse*d - (2*fk+order)*inverse*versine*c
		c += d
		if k%block == block-1 {
			_, e := math.Frexp(max(math.Abs(c), math.Abs(d)))
			c, d = math.Ldexp(c, -e), math.Ldexp(d, -e)
			exp += int64(e)
		}
	}
	return c, exp
}

// sinePower returns, as f times 2^exp, the factor K sin(theta)^m of [polar], with
//
//	K^2 = product over i = 1...m of (l+i)(l-i+1) / (2i)^2
func sinePower(l, m int, sine float64) (f float64, exp int64) {
	s, sExp := math.Frexp(sine)
	square, squareExp := 1.0, int64(0) // K^2
	f, exp = 1, int64(m)*int64(sExp)
	fl := float64(l)
	for i := 1; i <= m; i++ {
		fi := float64(i)
		square *= (fl + fi) * (fl - fi + 1) / (4 * fi * fi)
		f *= s
		if i%block == 0 {
			var e, e2 int
			f, e = math.Frexp(f)
			square, e2 = math.Frexp(square)
			exp, squareExp = exp+int64(e), squareExp+int64(e2)
		}
	}
	if squareExp&1 != 0 { // an even exponent has a square root
		square *= 2
		squareExp--
	}
	return f * math.Sqrt(square), exp + squareExp/2
}

// azimuthal returns exp(i m phi).
//
// The rounding error of m*phi would be an error of the phase; [math.FMA] finds it, and the phase
// is turned back by it.
func azimuthal(m int, phi float64) complex128 {
	fm := float64(m)
	angle := fm * phi
	if math.IsInf(angle, 0) && !math.IsInf(phi, 0) { // beyond the range of float64: by squaring
		p := azimuthal(m/2, phi)
		return p * p * azimuthal(m%2, phi)
	}
	sin, cos := math.Sincos(angle)
	p := complex(cos, sin)
	if rest := math.FMA(fm, phi, -angle); rest != 0 {
		sin, cos = math.Sincos(rest)
		p *= complex(cos, sin)
	}
	return p
}
