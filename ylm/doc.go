// Package ylm computes spherical harmonics: exactly, as polynomials in the direction, and as
// float64 numbers; and the integrals over products of three of them.
//
//   - [Harmonic] is Y_lm as a [Polynomial] in the unit vector, [Solid] is r^l Y_lm, homogeneous.
//   - [Polynomial] does exact arithmetic with them, and [Polynomial.Integral] the integral over
//     the sphere.
//   - [Gaunt] is the integral of three Y, [SlaterCondonC] the c^k(l m, l' m') of Condon and Shortley.
//   - [Y] is the number Y_lm(theta, phi), [Index] the place of Y_lm in a list of all of them.
//
// # Conventions
//
// theta is the polar angle from the z axis, phi the azimuth from x towards y, both in radians:
//
//	x = r sin(theta) cos(phi),  y = r sin(theta) sin(phi),  z = r cos(theta)
//
// Arguments come as l before m, theta before phi. The phase is that of Condon and Shortley, DLMF
// (14.30.1):
//
//	Y_lm(theta, phi) = sqrt[ (2l+1)/(4 pi) (l-m)!/(l+m)! ] P_l^m(cos theta) exp(i m phi)
//
// with the Ferrers function P_l^m, which carries a factor (-1)^m: Y_11 = -sqrt(3/(8 pi)) (x+iy)/r,
// and Y_l,-m = (-1)^m conj(Y_lm). The integral of |Y_lm|^2 over the sphere is 1.
//
// The tensor operators of spectroscopy are C^(k)_q = sqrt(4 pi/(2k+1)) Y_kq. A Gaunt integral has
// no complex conjugate in it; c^k has the first of its three functions conjugated.
//
// A selection rule that fails, |m| > l among them, gives zero; a negative l panics with
// *rational.ArgumentError.
//
// # Accuracy
//
// Everything is exact but [Y] and [Polynomial.Eval]. The error of Y is below 1e-14 of the largest
// |Y_lm| that its l has, sqrt((2l+1)/(4 pi)), for all l <= 100, m, and angles of any size. The
// error of Eval is that of adding up the terms as they stand, which cancel more and more as the
// degree grows.
//
// All functions are safe for concurrent use, and all values are immutable.
package ylm
