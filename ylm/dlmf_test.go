package ylm_test

import (
	"math/big"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
	"example.org/couplet/ylm"
)

// Identities of the NIST Digital Library of Mathematical Functions, version 1.2.4, sections 14.30
// and 34.3, each under its number, exact and over all arguments of a small domain.
func TestDLMF(t *testing.T) {
	for _, identity := range []struct {
		number string
		test   func(*testing.T)
	}{
		{"14.30.1", testDefinition},
		{"14.30.3", testRodrigues},
		{"14.30.4", testPole},
		{"14.30.5", testEquator},
		{"14.30.6", testConjugate},
		{"14.30.7", testInversion},
		{"14.30.8", testOrthonormal},
		{"14.30.9", testAdditionTheorem},
		{"34.3.19", testLegendreProduct},
		{"34.3.20", testHarmonicProduct},
		{"34.3.21", testLegendreIntegral},
		{"34.3.22", testGauntIntegral},
	} {
		t.Run(identity.number, identity.test)
	}
}

// eachLM calls do for all |m| <= l <= lmax.
func eachLM(lmax int, do func(l, m int)) {
	for l := range lmax + 1 {
		for m := -l; m <= l; m++ {
			do(l, m)
		}
	}
}

// ferrers returns P_l^m(z) exp(i m phi) on the sphere, for m >= 0, by recurrence in l, DLMF (14.10.3),
// from P_m^m = (-1)^m (2m-1)!! sin^m.
func ferrers(l, m int) ylm.Polynomial {
	before, p := ylm.Polynomial{}, pow(u.Neg(), m)
	for k := range int64(m) {
		p = p.Scale(number(2*k+1, 1))
	}
	for k := m; k < l; k++ {
		c := func(n int) rational.Complex { return number(int64(n), int64(k-m+1)) }
		before, p = p, p.Mul(z).Scale(c(2*k+1)).Sub(before.Scale(c(k+m)))
	}
	return p
}

// For negative m, P_l^-m = (-1)^m (l-m)!/(l+m)! P_l^m, DLMF (14.9.3), and exp(i m phi) sin^|m| is
// (x-iy)^|m|.
func testDefinition(t *testing.T) {
	eachLM(12, func(l, m int) {
		want := ferrers(l, max(m, -m)).Scale(normalization(t, l, m))
		if m < 0 {
			ratio := new(big.Rat).SetFrac(factorial(l+m), factorial(l-m))
			want = want.Scale(rational.FromRat(ratio).Complex()).Scale(sign(m)).Conj()
		}
		if got := ylm.Harmonic(l, m, ylm.Ladder); !got.Equal(want.Mul(constant(number(1, 1), 1))) {
			t.Errorf("Y_%d,%d = %v, want %v", l, m, got, want)
		}
	})
}

// For negative m the equation divides by sin^|m|: both sides are multiplied by sin^(2|m|).
func testRodrigues(t *testing.T) {
	sinSquare := constant(number(1, 1), 0).Sub(pow(z, 2))
	eachLM(8, func(l, m int) {
		d := pow(sinSquare, l)
		for range l + m {
			d = derivative(d, 2)
		}
		front := normalization(t, l, m).Mul(sign(l + m)).Scale(
			rational.FromRat(new(big.Rat).SetFrac(big.NewInt(1), new(big.Int).Lsh(factorial(l), uint(l)))))
		left := ylm.Harmonic(l, m, ylm.Ladder)
		right := d.Mul(pow(u, max(m, 0))).Mul(constant(front, 1))
		if m < 0 {
			left = left.Mul(pow(u.Mul(v), -m))
			right = right.Mul(pow(v, -m))
		}
		if !left.OnSphere().Equal(right.OnSphere()) {
			t.Errorf("l = %d, m = %d: %v, want %v", l, m, left, right)
		}
	})
}

func testPole(t *testing.T) {
	north := spherePoints[0]
	eachLM(12, func(l, m int) {
		var want rational.Complex
		if m == 0 {
			want = root(int64(2*l+1), 4)
		}
		for _, p := range []ylm.Polynomial{ylm.Harmonic(l, m, ylm.Ladder), ylm.Solid(l, m, ylm.Cartesian)} {
			if got := at(t, p, 1, north[0], north[1], north[2]); !got.Equal(want) {
				t.Errorf("Y_%d,%d at the pole is %v, want %v", l, m, got, want)
			}
		}
	})
}

func testEquator(t *testing.T) {
	var zero rational.Surd
	eachLM(8, func(l, m int) {
		for _, xy := range [][2]int64{{3, 4}, {-4, 3}, {4, -3}, {5, 0}} {
			x, y := rational.Ratio(xy[0], 5), rational.Ratio(xy[1], 5)
			var want rational.Complex
			if (l+m)%2 == 0 {
				low, high := factorial((l-m)/2), factorial((l+m)/2)
				num := new(big.Int).Mul(factorial(l-m), factorial(l+m))
				want = sqrtOf(t, num.Mul(num, big.NewInt(int64(2*l+1))), big.NewInt(4))
				den := low.Mul(low, high)
				want = want.Scale(rational.FromRat(new(big.Rat).SetFrac(big.NewInt(1), den.Lsh(den, uint(l)))))
				want = want.Mul(sign((l + m) / 2))
				turn := rational.Complex{Re: x.Sum(), Im: y.Sum()} // exp(i phi)
				if m < 0 {
					turn = turn.Conj()
				}
				for range max(m, -m) {
					want = want.Mul(turn)
				}
			}
			if got := at(t, ylm.Harmonic(l, m, ylm.Cartesian), 1, x, y, zero); !got.Equal(want) {
				t.Errorf("Y_%d,%d at (%v, %v, 0) is %v, want %v", l, m, x, y, got, want)
			}
		}
	})
}

func testConjugate(t *testing.T) {
	for _, vars := range []ylm.Variables{ylm.Ladder, ylm.Cartesian} {
		eachLM(12, func(l, m int) {
			if got, want := ylm.Harmonic(l, -m, vars), ylm.Harmonic(l, m, vars).Conj().Scale(sign(m)); !got.Equal(want) {
				t.Errorf("Y_%d,%d = %v, want %v", l, -m, got, want)
			}
			if got, want := ylm.Solid(l, -m, vars), ylm.Solid(l, m, vars).Conj().Scale(sign(m)); !got.Equal(want) {
				t.Errorf("r^l Y_%d,%d = %v, want %v", l, -m, got, want)
			}
		})
	}
}

// The point opposite to (theta, phi) is (pi-theta, phi+pi).
func testInversion(t *testing.T) {
	eachLM(12, func(l, m int) {
		p := ylm.Harmonic(l, m, ylm.Ladder)
		var terms []ylm.Term
		for term := range p.Terms() {
			term.Coeff = term.Coeff.Mul(sign(term.Powers[0] + term.Powers[1] + term.Powers[2]))
			terms = append(terms, term)
		}
		if got, want := ylm.NewPolynomial(ylm.Ladder, terms...), p.Scale(sign(l)); !got.Equal(want) {
			t.Errorf("Y_%d,%d at the opposite point is %v, want %v", l, m, got, want)
		}
	})
}

func testOrthonormal(t *testing.T) {
	eachLM(5, func(l1, m1 int) {
		bra := ylm.Harmonic(l1, m1, ylm.Ladder).Conj()
		eachLM(5, func(l2, m2 int) {
			var want ylm.Polynomial
			if l1 == l2 && m1 == m2 {
				want = constant(number(1, 1), 0)
			}
			if got := bra.Mul(ylm.Harmonic(l2, m2, ylm.Ladder)).Integral(); !got.Equal(want) {
				t.Errorf("(%d %d | %d %d) = %v, want %v", l1, m1, l2, m2, got, want)
			}
		})
	})
	eachLM(20, func(l, m int) {
		p := ylm.Harmonic(l, m, ylm.Ladder)
		if got := p.Conj().Mul(p).Integral(); !got.Equal(constant(number(1, 1), 0)) {
			t.Errorf("(%d %d | %d %d) = %v, want 1", l, m, l, m, got)
		}
	})
}

// One of the two directions is a point with rational coordinates, the other one stays variable.
func testAdditionTheorem(t *testing.T) {
	x, y := powers(ylm.Cartesian, 1, 0, 0), powers(ylm.Cartesian, 0, 1, 0)
	for l := range 7 {
		for _, point := range spherePoints {
			var left ylm.Polynomial
			for m := -l; m <= l; m++ {
				p := ylm.Harmonic(l, m, ylm.Ladder)
				c := at(t, p, 1, point[0], point[1], point[2]).Conj()
				left = left.Add(p.Mul(constant(c, 1)))
			}
			cosine := sum(x.Scale(point[0].Complex()), y.Scale(point[1].Complex()), z.Scale(point[2].Complex()))
			var right ylm.Polynomial
			for term := range legendre(l).Terms() {
				right = right.Add(pow(cosine, term.Powers[2]).Scale(term.Coeff))
			}
			right = right.Mul(constant(number(int64(2*l+1), 4), 2))
			if !left.OnSphere().Equal(right.OnSphere()) {
				t.Errorf("l = %d, other point %v: %v, want %v", l, point, left.OnSphere(), right.OnSphere())
			}
		}
	}
}

// legendreFromY returns P_l = sqrt(4 pi/(2l+1)) Y_l0.
func legendreFromY(l int) ylm.Polynomial {
	return ylm.Harmonic(l, 0, ylm.Ladder).Mul(constant(root(4, int64(2*l+1)), -1))
}

// threeZeroSquared returns (l1 l2 l3; 0 0 0)^2.
func threeZeroSquared(l1, l2, l3 int) rational.Complex {
	var zero rational.Half
	three := wigner.ThreeJ(rational.Int(l1), rational.Int(l2), rational.Int(l3), zero, zero, zero)
	return three.Mul(three).Complex()
}

func testLegendreProduct(t *testing.T) {
	for l1 := range 9 {
		for l2 := range 9 {
			var want ylm.Polynomial
			for l := max(l1-l2, l2-l1); l <= l1+l2; l++ {
				c := threeZeroSquared(l1, l2, l).Mul(number(int64(2*l+1), 1))
				want = want.Add(legendre(l).Scale(c))
			}
			if got := legendreFromY(l1).Mul(legendreFromY(l2)); !got.Equal(want) {
				t.Errorf("P_%d P_%d = %v, want %v", l1, l2, got, want)
			}
		}
	}
}

func testHarmonicProduct(t *testing.T) {
	eachLM(4, func(l1, m1 int) {
		eachLM(4, func(l2, m2 int) {
			m := -m1 - m2
			var want ylm.Polynomial
			var zero rational.Half
			for l := max(l1-l2, l2-l1); l <= l1+l2; l++ {
				j1, j2, j := rational.Int(l1), rational.Int(l2), rational.Int(l)
				c := wigner.ThreeJ(j1, j2, j, zero, zero, zero).Mul(
					wigner.ThreeJ(j1, j2, j, rational.Int(m1), rational.Int(m2), rational.Int(m)))
				c = c.Mul(rational.Root(int64((2*l1+1)*(2*l2+1)*(2*l+1)), 4))
				want = want.Add(ylm.Harmonic(l, m, ylm.Ladder).Conj().Mul(constant(c.Complex(), 1)))
			}
			got := ylm.Harmonic(l1, m1, ylm.Ladder).Mul(ylm.Harmonic(l2, m2, ylm.Ladder)).OnSphere()
			if !got.Equal(want) { // a sum of Y is in the form of OnSphere
				t.Errorf("Y_%d,%d Y_%d,%d = %v, want %v", l1, m1, l2, m2, got, want)
			}
		})
	})
}

// The integral over cos(theta) is that over the sphere divided by 2 pi.
func testLegendreIntegral(t *testing.T) {
	for l1 := range 7 {
		for l2 := range 7 {
			for l3 := range 7 {
				p := product(legendreFromY(l1), legendreFromY(l2), legendreFromY(l3), constant(number(1, 2), 2))
				want := constant(threeZeroSquared(l1, l2, l3).Mul(number(2, 1)), 0)
				if got := p.Integral(); !got.Equal(want) {
					t.Errorf("P_%d P_%d P_%d: %v, want %v", l1, l2, l3, got, want)
				}
			}
		}
	}
}

// Gaunt against the exact integral of the polynomials, for all l <= 5 and all m.
func testGauntIntegral(t *testing.T) {
	nonZero := 0
	eachLM(5, func(l1, m1 int) {
		eachLM(5, func(l2, m2 int) {
			pair := ylm.Harmonic(l1, m1, ylm.Ladder).Mul(ylm.Harmonic(l2, m2, ylm.Ladder))
			eachLM(5, func(l3, m3 int) {
				got := ylm.Gaunt(l1, m1, l2, m2, l3, m3)
				want := pair.Mul(ylm.Harmonic(l3, m3, ylm.Ladder)).Integral()
				// The unit of Gaunt is 1/sqrt(4 pi).
				if !constant(got.Complex().Mul(number(1, 2)), 1).Equal(want) {
					t.Errorf("Gaunt(%d %d %d %d %d %d) = %v/sqrt(4 pi), want %v", l1, m1, l2, m2, l3, m3, got, want)
				}
				if !got.IsZero() {
					nonZero++
				}
			})
		})
	})
	t.Logf("%d integrals, %d of them do not vanish", 36*36*36, nonZero)
}
