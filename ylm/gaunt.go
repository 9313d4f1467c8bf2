package ylm

import (
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// Gaunt returns the integral of Y_l1m1 Y_l2m2 Y_l3m3 over the sphere, no function conjugated, in
// units of 1/sqrt(4 pi). By DLMF (34.3.22) it is
//
//	sqrt[(2l1+1)(2l2+1)(2l3+1)] ( l1 l2 l3 ) ( l1 l2 l3 )
//	                            (  0  0  0 ) ( m1 m2 m3 )
//
// Gaunt(l, m, l, -m, 0, 0) is (-1)^m, the norm of Y_lm in these units.
//
// It is zero where |m| > l for one of the three, m1+m2+m3 != 0, l1+l2+l3 is odd or the three break
// the triangle rule. It panics with *rational.ArgumentError for a negative l, and for one above
// 1073741823.
func Gaunt(l1, m1, l2, m2, l3, m3 int) rational.Surd {
	const fn = "ylm.Gaunt"
	checkMomentum(fn, "l1", l1)
	checkMomentum(fn, "l2", l2)
	checkMomentum(fn, "l3", l3)
	threes, ok := threeJs(l1, m1, l2, m2, l3, m3)
	if !ok {
		return rational.Surd{}
	}
	return hats(l1, l2, l3).Mul(threes)
}

// SlaterCondonC returns the coefficient c^k(l1 m1, l2 m2) of Condon and Shortley, the matrix element
// of the tensor operator C^(k)_q = sqrt(4 pi/(2k+1)) Y_kq with q = m1-m2 between two spherical
// harmonics, the first conjugated:
//
//	c^k(l1 m1, l2 m2) = sqrt(4 pi/(2k+1)) integral of conj(Y_l1m1) Y_k,m1-m2 Y_l2m2
//	                  = (-1)^m1 sqrt[(2l1+1)(2l2+1)] ( l1 k l2 ) (  l1    k   l2 )
//	                                                 (  0 0  0 ) ( -m1 m1-m2  m2 )
//
// which is DLMF (14.30.6) put into (34.3.22). It is what the angular part of an electrostatic
// integral between electrons is made of, times a Slater integral F^k or G^k:
// a^k = c^k(l1 m1, l1 m1) c^k(l2 m2, l2 m2), b^k = c^k(l1 m1, l2 m2)^2.
//
// It is zero where |m| > l for one of the two, |m1-m2| > k, k+l1+l2 is odd or the three break the
// triangle rule. It panics with *rational.ArgumentError for a negative k or l, and for one above
// 1073741823.
func SlaterCondonC(k, l1, m1, l2, m2 int) rational.Surd {
	const fn = "ylm.SlaterCondonC"
	checkMomentum(fn, "k", k)
	checkMomentum(fn, "l1", l1)
	checkMomentum(fn, "l2", l2)
	threes, ok := threeJs(l1, -m1, k, m1-m2, l2, m2)
	if !ok {
		return rational.Surd{}
	}
	c := hats(l1, l2).Mul(threes)
	if m1&1 != 0 {
		return c.Neg()
	}
	return c
}

func exceeds(m, l int) bool { return m > l || m < -l }

// threeJs returns (l1 l2 l3; 0 0 0) (l1 l2 l3; m1 m2 m3); ok is false where a rule makes it zero. Two
// rules are tested here: |m| > l, since a Half does not hold every int, and an odd sum, to save the
// work. A sum of two m that has wrapped around does no harm, as one of the two exceeds its l.
func threeJs(l1, m1, l2, m2, l3, m3 int) (product rational.Surd, ok bool) {
	if exceeds(m1, l1) || exceeds(m2, l2) || exceeds(m3, l3) || (l1^l2^l3)&1 != 0 {
		return rational.Surd{}, false
	}
	j1, j2, j3 := rational.Int(l1), rational.Int(l2), rational.Int(l3)
	three := wigner.ThreeJ(j1, j2, j3, rational.Int(m1), rational.Int(m2), rational.Int(m3))
	if three.IsZero() {
		return rational.Surd{}, false
	}
	var zero rational.Half
	return wigner.ThreeJ(j1, j2, j3, zero, zero, zero).Mul(three), true
}

// hats returns the square root of the product of 2l+1.
func hats(ls ...int) rational.Surd {
	var f rational.Factored
	for _, l := range ls {
		f.MulInt(2*l+1, 1)
	}
	return f.SqrtTimes(1)
}
