package ylm_test

import (
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/ylm"
)

// The components of L = -i r × grad, acting on polynomials in u = x+iy, v = x-iy and z. They fix all
// relative phases of the Y_lm of one l, and use no formula of the package but the polynomials.

func raise(p ylm.Polynomial) ylm.Polynomial { // Lx + i Ly
	return product(constant(number(2, 1), 0), z, derivative(p, 1)).Sub(u.Mul(derivative(p, 2)))
}

func lower(p ylm.Polynomial) ylm.Polynomial { // Lx - i Ly
	return v.Mul(derivative(p, 2)).Sub(product(constant(number(2, 1), 0), z, derivative(p, 0)))
}

func lz(p ylm.Polynomial) ylm.Polynomial {
	return u.Mul(derivative(p, 0)).Sub(v.Mul(derivative(p, 1)))
}

// The three operators against L = -i r × grad in x, y and z, for all monomials of degree 3 and less.
func TestOperatorsAreThoseOfAngularMomentum(t *testing.T) {
	minusI := rational.IPow(3)
	coordinate := [3]ylm.Polynomial{powers(ylm.Cartesian, 1, 0, 0), powers(ylm.Cartesian, 0, 1, 0), powers(ylm.Cartesian, 0, 0, 1)}
	component := func(p ylm.Polynomial, i int) ylm.Polynomial {
		j, k := (i+1)%3, (i+2)%3
		return coordinate[j].Mul(derivative(p, k)).Sub(coordinate[k].Mul(derivative(p, j))).Scale(minusI)
	}
	for a := range 4 {
		for b := range 4 - a {
			for c := range 4 - a - b {
				p := powers(ylm.Ladder, a, b, c)
				q := p.In(ylm.Cartesian)
				x, iy := component(q, 0), component(q, 1).Scale(rational.I())
				for name, pair := range map[string][2]ylm.Polynomial{
					"Lx + i Ly": {raise(p), x.Add(iy)},
					"Lx - i Ly": {lower(p), x.Sub(iy)},
					"Lz":        {lz(p), component(q, 2)},
				} {
					if !pair[0].Equal(pair[1]) {
						t.Errorf("%s on %v: %v, want %v", name, p, pair[0], pair[1])
					}
				}
			}
		}
	}
}

// Edmonds, section 2.3: L± Y_lm = sqrt(l(l+1) - m(m±1)) Y_l,m±1, Lz Y_lm = m Y_lm.
func TestSolidUnderLadderOperators(t *testing.T) {
	eachLM(10, func(l, m int) {
		p := ylm.Solid(l, m, ylm.Ladder)
		up := root(int64(l*(l+1)-m*(m+1)), 1)
		if got, want := raise(p), ylm.Solid(l, m+1, ylm.Ladder).Scale(up); !got.Equal(want) {
			t.Errorf("L+ on r^%d Y_%d,%d = %v, want %v", l, l, m, got, want)
		}
		down := root(int64(l*(l+1)-m*(m-1)), 1)
		if got, want := lower(p), ylm.Solid(l, m-1, ylm.Ladder).Scale(down); !got.Equal(want) {
			t.Errorf("L- on r^%d Y_%d,%d = %v, want %v", l, l, m, got, want)
		}
		if got, want := lz(p), p.Scale(number(int64(m), 1)); !got.Equal(want) {
			t.Errorf("Lz on r^%d Y_%d,%d = %v, want %v", l, l, m, got, want)
		}
	})
}

// The Laplacian is 4 d/du d/dv + (d/dz)^2, and the sum of three second derivatives in x, y and z.
func TestSolidSatisfiesLaplace(t *testing.T) {
	eachLM(12, func(l, m int) {
		p := ylm.Solid(l, m, ylm.Ladder)
		if d := derivative(derivative(p, 0), 1).Scale(number(4, 1)).Add(derivative(derivative(p, 2), 2)); !d.IsZero() {
			t.Errorf("Laplacian of r^%d Y_%d,%d = %v", l, l, m, d)
		}
		q := ylm.Solid(l, m, ylm.Cartesian)
		if d := sum(derivative(derivative(q, 0), 0), derivative(derivative(q, 1), 1), derivative(derivative(q, 2), 2)); !d.IsZero() {
			t.Errorf("Laplacian of r^%d Y_%d,%d in x, y, z = %v", l, l, m, d)
		}
		for term := range p.Terms() {
			if n := term.Powers[0] + term.Powers[1] + term.Powers[2]; n != l {
				t.Errorf("r^%d Y_%d,%d has a term of degree %d", l, l, m, n)
			}
		}
	})
}

// Two closed formulas, one for each form.
func TestSolidOnSphereIsHarmonic(t *testing.T) {
	for _, vars := range []ylm.Variables{ylm.Ladder, ylm.Cartesian} {
		eachLM(12, func(l, m int) {
			solid, want := ylm.Solid(l, m, vars), ylm.Harmonic(l, m, vars)
			if got := solid.OnSphere(); !got.Equal(want) || got.Variables() != want.Variables() {
				t.Errorf("r^%d Y_%d,%d on the sphere is %v, want %v", l, l, m, got, want)
			}
			if equal := solid.Equal(want); equal != (l-max(m, -m) < 2) {
				t.Errorf("l = %d, m = %d: the two forms are equal: %v", l, m, equal)
			}
		})
	}
}
