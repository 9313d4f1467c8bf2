package ylm

import (
	"math/big"

	"example.org/couplet/rational"
)

// OnSphere returns the polynomial that agrees with p on the unit sphere and has, in Ladder
// variables, no term with both x+iy and x-iy in it:
//
//	(x+iy)(x-iy) = 1 - z^2
//
// There is one such polynomial only: polynomials agree on the sphere exactly when their OnSphere
// are equal. That of a [Solid] harmonic is the [Harmonic].
func (p Polynomial) OnSphere() Polynomial {
	sum := collector{}
	for _, t := range p.In(Ladder).terms {
		pairs := min(t.Powers[0], t.Powers[1])
		powers := [3]int{t.Powers[0] - pairs, t.Powers[1] - pairs, t.Powers[2]}
		for k := range pairs + 1 { // (1-z^2)^pairs
			binomial := new(big.Int).Binomial(int64(pairs), int64(k))
			c := t.Coeff.Mul(rational.IPow(2 * k)).Scale(integer(binomial))
			sum.add(t, powers, c)
			powers[2] += 2
		}
	}
	return sum.polynomial(Ladder).In(p.vars)
}

// Integral returns the integral of p over the unit sphere, a constant; [Polynomial.Constant] takes
// it apart. Of the terms in Ladder variables those with equal powers of x+iy and x-iy, and an even
// power of z, contribute: in cos(theta) they are beta functions, DLMF (5.12.1),
//
//	integral of (x+iy)^a (x-iy)^a z^c = 4 pi 2^a a! / [(c+1)(c+3)...(c+2a+1)]
func (p Polynomial) Integral() Polynomial {
	sum := collector{}
	for _, t := range p.In(Ladder).terms {
		a, c := t.Powers[0], t.Powers[2]
		if t.Powers[1] != a || c&1 != 0 {
			continue
		}
		value := rational.Ratio(4, int64(c)+1)
		for k := 1; k <= a; k++ {
			value = value.Mul(rational.Ratio(2*int64(k), int64(c)+2*int64(k)+1))
		}
		sum.add(Term{RootPi: t.RootPi - 2}, [3]int{}, t.Coeff.Scale(value))
	}
	return sum.polynomial(Cartesian)
}
