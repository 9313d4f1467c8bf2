package ylm

import "example.org/couplet/rational"

// Harmonic returns Y_lm as a polynomial in the unit vector (x, y, z) = (sin(theta) cos(phi),
// sin(theta) sin(phi), cos(theta)), of the lowest degree in each variable that there is, as tables
// print it. By DLMF (14.30.3), for m >= 0,
//
//	Y_lm = (-1)^m sqrt[ (2l+1)/(4 pi) (l-m)!/(l+m)! ] (x+iy)^m
//	       Σ_k (-1)^k (2l-2k)! / [2^l k! (l-k)! (l-m-2k)!] z^(l-m-2k)
//
// and Y_l,-m = (-1)^m conj(Y_lm). It agrees with [Solid] on the unit sphere; off the sphere the two
// differ where l-|m| >= 2.
//
// It is zero for |m| > l. It panics with *rational.ArgumentError for negative l and for vars other
// than Cartesian and Ladder.
func Harmonic(l, m int, vars Variables) Polynomial {
	const fn = "ylm.Harmonic"
	checkDegree(fn, "l", l)
	vars.check(fn)
	if m > l || m < -l {
		return Polynomial{}
	}
	ladder, variable := m, 0
	if m < 0 {
		ladder, variable = -m, 1
	}
	terms := make([]Term, (l-ladder)/2+1)
	for k := range terms {
		square := norm(l, -2*l)
		square.MulFactorial(l-ladder, 1)
		square.MulFactorial(l+ladder, -1)
		square.MulFactorial(2*l-2*k, 2)
		square.MulFactorial(k, -2)
		square.MulFactorial(l-k, -2)
		square.MulFactorial(l-ladder-2*k, -2)
		terms[k] = harmonicTerm(square, k+max(m, 0))
		terms[k].Powers[variable] = ladder
		terms[k].Powers[2] = l - ladder - 2*k
	}
	return NewPolynomial(Ladder, terms...).In(vars)
}

// Solid returns the solid harmonic r^l Y_lm, a homogeneous polynomial of degree l in the Cartesian
// coordinates of a point, which satisfies Laplace's equation (Varshalovich et al. 1988, section
// 5.1):
//
//	r^l Y_lm = sqrt[ (2l+1)/(4 pi) (l+m)! (l-m)! ] Σ (-(x+iy)/2)^p ((x-iy)/2)^q z^s / (p! q! s!)
//
// over all p, q, s >= 0 with p+q+s = l and p-q = m. The other solid harmonic, r^(-l-1) Y_lm, is
// this one divided by r^(2l+1).
//
// Zeros and panics are those of [Harmonic].
func Solid(l, m int, vars Variables) Polynomial {
	const fn = "ylm.Solid"
	checkDegree(fn, "l", l)
	vars.check(fn)
	if m > l || m < -l {
		return Polynomial{}
	}
	var terms []Term
	for p := max(m, 0); 2*p-m <= l; p++ {
		q, s := p-m, l-2*p+m
		square := norm(l, -2*(p+q))
		square.MulFactorial(l+m, 1)
		square.MulFactorial(l-m, 1)
		square.MulFactorial(p, -2)
		square.MulFactorial(q, -2)
		square.MulFactorial(s, -2)
		t := harmonicTerm(square, p)
		t.Powers = [3]int{p, q, s}
		terms = append(terms, t)
	}
	return NewPolynomial(Ladder, terms...).In(vars)
}

// norm returns (2l+1)/4 times 2^twos; the pi of (2l+1)/(4 pi) is kept apart.
func norm(l, twos int) *rational.Factored {
	var f rational.Factored
	f.MulInt(2*l+1, 1)
	f.MulInt(2, twos-2)
	return &f
}

// harmonicTerm returns (-1)^sign sqrt(square/pi) as a term without variables.
func harmonicTerm(square *rational.Factored, sign int) Term {
	c := square.SqrtTimes(1 - 2*int64(sign&1))
	return Term{Coeff: c.Complex(), RootPi: 1}
}
