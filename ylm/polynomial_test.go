package ylm_test

import (
	"math"
	"math/cmplx"
	"reflect"
	"slices"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/ylm"
)

// samples are polynomials of every kind: zero, constants, both sets of variables, mixed powers of
// pi, coefficients that are sums of different roots.
func samples() []ylm.Polynomial {
	mixed, _ := rational.ParseComplex("1/2 - sqrt(3) + sqrt(2/7)*i")
	return []ylm.Polynomial{
		{},
		constant(number(1, 1), 0),
		constant(number(-3, 2), 0),
		constant(root(3, 4), -3),
		z,
		u,
		v.Neg(),
		powers(ylm.Cartesian, 1, 0, 0),
		powers(ylm.Cartesian, 0, 3, 1).Scale(mixed),
		sum(pow(u, 2), z, constant(mixed, 0)),
		sum(powers(ylm.Cartesian, 1, 1, 0), powers(ylm.Cartesian, 0, 1, 0).Mul(constant(rational.I(), 1))),
		ylm.Harmonic(3, 1, ylm.Ladder),
		ylm.Harmonic(4, -2, ylm.Cartesian),
		ylm.Solid(3, 0, ylm.Cartesian),
		ylm.Solid(4, 2, ylm.Ladder).Add(ylm.Harmonic(2, 0, ylm.Ladder).Mul(constant(number(1, 3), 1))),
	}
}

func TestPolynomialIsARing(t *testing.T) {
	one := constant(number(1, 1), 0)
	check := func(name string, got, want ylm.Polynomial) {
		t.Helper()
		if !got.Equal(want) || got.Key() != want.Key() {
			t.Errorf("%s: %v, want %v", name, got, want)
		}
	}
	for _, p := range samples() {
		check("p + 0", p.Add(ylm.Polynomial{}), p)
		check("p * 1", p.Mul(one), p)
		check("p * 0", p.Mul(ylm.Polynomial{}), ylm.Polynomial{})
		check("p - p", p.Sub(p), ylm.Polynomial{})
		check("-(-p)", p.Neg().Neg(), p)
		check("conj conj p", p.Conj().Conj(), p)
		check("conj of p in x, y, z", p.In(ylm.Cartesian).Conj(), p.In(ylm.Ladder).Conj())
		check("there and back", p.In(ylm.Cartesian).In(ylm.Ladder), p)
		check("twice on the sphere", p.OnSphere().OnSphere(), p.OnSphere())
		check("2p", p.Scale(number(2, 1)), p.Add(p))
		for _, q := range samples() {
			check("p + q", p.Add(q), q.Add(p))
			check("p * q", p.Mul(q), q.Mul(p))
			check("p - q", p.Sub(q).Add(q), p)
			check("conj pq", p.Mul(q).Conj(), p.Conj().Mul(q.Conj()))
			check("pq in x, y, z", p.In(ylm.Cartesian).Mul(q.In(ylm.Cartesian)), p.In(ylm.Ladder).Mul(q.In(ylm.Ladder)))
			check("pq on the sphere", p.OnSphere().Mul(q.OnSphere()).OnSphere(), p.Mul(q).OnSphere())
			for _, r := range samples() {
				check("p (q + r)", p.Mul(q.Add(r)), p.Mul(q).Add(p.Mul(r)))
			}
		}
	}
}

func TestPolynomialEqualAndKey(t *testing.T) {
	all := samples()
	for i, p := range all {
		for j, q := range all {
			if equal := p.Equal(q); equal != (i == j) || equal != (p.Key() == q.Key()) {
				t.Errorf("%v and %v: equal %v, keys %q and %q", p, q, equal, p.Key(), q.Key())
			}
		}
	}
	if reflect.TypeFor[ylm.Polynomial]().Comparable() {
		t.Error("== compiles on Polynomial")
	}
	var zero ylm.Polynomial
	if c, rootPi, ok := zero.Constant(); !ok || !c.IsZero() || rootPi != 0 || !zero.IsZero() {
		t.Errorf("zero value: Constant = %v, %d, %v", c, rootPi, ok)
	}
	if !u.Mul(v).Sub(v.Mul(u)).Equal(zero) {
		t.Error("uv - vu is not the zero value")
	}
}

func TestPolynomialVariables(t *testing.T) {
	x := powers(ylm.Cartesian, 1, 0, 0)
	two := constant(number(2, 1), 0)
	for name, c := range map[string]struct{ got, want ylm.Variables }{
		"receiver first":           {u.Add(x).Variables(), ylm.Ladder},
		"receiver second":          {x.Mul(u).Variables(), ylm.Cartesian},
		"constant times ladder":    {two.Mul(u).Variables(), ylm.Ladder},
		"zero plus ladder":         {ylm.Polynomial{}.Add(u).Variables(), ylm.Ladder},
		"a constant has none":      {u.Sub(u).Add(two).Variables(), ylm.Cartesian},
		"constant in ladder":       {two.In(ylm.Ladder).Variables(), ylm.Cartesian},
		"z in the other variables": {z.In(ylm.Cartesian).Variables(), ylm.Cartesian},
		"conjugate":                {u.Conj().Variables(), ylm.Ladder},
		"on the sphere":            {u.Mul(z).OnSphere().Variables(), ylm.Ladder},
		"on the sphere, x":         {x.OnSphere().Variables(), ylm.Cartesian},
	} {
		if c.got != c.want {
			t.Errorf("%s: variables %v, want %v", name, c.got, c.want)
		}
	}
	for v, want := range map[ylm.Variables]string{ylm.Cartesian: "x, y, z", ylm.Ladder: "x+iy, x-iy, z", 3: "Variables(3)"} {
		if got := v.String(); got != want {
			t.Errorf("String() = %q, want %q", got, want)
		}
	}
}

func TestConstant(t *testing.T) {
	for _, c := range []struct {
		p      ylm.Polynomial
		ok     bool
		value  rational.Complex
		rootPi int
	}{
		{constant(root(2, 3), 3), true, root(2, 3), 3},
		{constant(rational.I(), -2), true, rational.I(), -2},
		{z, false, rational.Complex{}, 0},
		{constant(number(1, 1), 1).Add(constant(number(1, 1), 2)), false, rational.Complex{}, 0},
		{ylm.Harmonic(0, 0, ylm.Ladder), true, number(1, 2), 1},
	} {
		if value, rootPi, ok := c.p.Constant(); ok != c.ok || !value.Equal(c.value) || rootPi != c.rootPi {
			t.Errorf("(%v).Constant() = %v, %d, %v", c.p, value, rootPi, ok)
		}
	}
}

// Nothing that a caller holds is part of a polynomial.
func TestPolynomialIsImmutable(t *testing.T) {
	terms := []ylm.Term{{Coeff: number(1, 1), Powers: [3]int{1, 0, 0}}, {Coeff: number(2, 1), Powers: [3]int{0, 2, 0}}}
	p := ylm.NewPolynomial(ylm.Ladder, terms...)
	want := p.Key()
	terms[0].Powers[0], terms[1].Coeff = 5, number(7, 1)
	for term := range p.Terms() {
		term.Powers[2] = 9
	}
	for _, term := range slices.Collect(p.Terms()) {
		term.Powers[2] = 9
	}
	p.Add(u)
	p.Scale(number(3, 1))
	if p.Key() != want {
		t.Errorf("the polynomial has become %v", p)
	}
}

func TestNewPolynomialAddsUpTerms(t *testing.T) {
	term := func(n int64, rootPi, a, b, c int) ylm.Term {
		return ylm.Term{Coeff: number(n, 1), RootPi: rootPi, Powers: [3]int{a, b, c}}
	}
	p := ylm.NewPolynomial(ylm.Cartesian, term(1, 0, 0, 0, 1), term(2, 0, 1, 0, 0), term(3, 0, 0, 0, 1),
		term(5, 1, 0, 0, 1), term(-2, 0, 1, 0, 0), term(0, 0, 4, 4, 4))
	got := slices.Collect(p.Terms())
	if len(got) != 2 || !got[0].Coeff.Equal(number(4, 1)) || got[0].RootPi != 0 || got[1].RootPi != 1 {
		t.Errorf("terms %v, want 4 z and 5/sqrt(pi) z", got)
	}
}

func TestPolynomialText(t *testing.T) {
	x, y := powers(ylm.Cartesian, 1, 0, 0), powers(ylm.Cartesian, 0, 1, 0)
	one := constant(number(1, 1), 0)
	mixed, _ := rational.ParseComplex("1/2 + sqrt(3)*i")
	for _, c := range []struct {
		p           ylm.Polynomial
		text, latex string
	}{
		{ylm.Polynomial{}, "0", "0"},
		{one, "1", "1"},
		{one.Neg(), "-1", "-1"},
		{constant(rational.I(), 0), "i", `\mathrm{i}`},
		{x, "x", "x"},
		{z.Neg(), "-z", "-z"},
		{pow(u, 2).Mul(v), "(x+iy)^2*(x-iy)", `(x+\mathrm{i}y)^{2}\,(x-\mathrm{i}y)`},
		{x.Add(y), "x + y", "x + y"},
		{x.Add(y).Neg(), "-(x + y)", "-(x + y)"},
		{x.Sub(y), "x - y", "x - y"},
		{x.Mul(z).Sub(y.Mul(z)), "z*(x - y)", `z\,(x - y)`},
		{y.Mul(z).Sub(x.Mul(z)), "-z*(x - y)", `-z\,(x - y)`},
		{z.Add(constant(number(1, 1), 0)), "z + 1", "z + 1"},
		{x.Scale(number(4, 3)).Add(y.Scale(number(-2, 5))), "2/15*(10*x - 3*y)", `\frac{2}{15}\,(10\,x - 3\,y)`},
		{x.Scale(rational.I()).Add(y), "i*x + y", `\mathrm{i}\,x + y`},
		{x.Scale(mixed), "(1/2 + sqrt(3)*i)*x", `(\frac{1}{2} + \sqrt{3}\,\mathrm{i})\,x`},
		{x.Scale(root(2, 1)).Sub(y.Scale(mixed)), "sqrt(2)*x + (-1/2 - sqrt(3)*i)*y",
			`\sqrt{2}\,x + (-\frac{1}{2} - \sqrt{3}\,\mathrm{i})\,y`},
		{x.Scale(root(2, 1)).Neg().Add(y), "-(sqrt(2)*x - y)", `-(\sqrt{2}\,x - y)`},
		{x.Mul(constant(number(1, 1), 1)), "1/sqrt(pi)*x", `\pi^{-1/2}\,x`},
		{x.Mul(constant(number(-1, 1), -1)), "-sqrt(pi)*x", `-\pi^{1/2}\,x`},
		{x.Mul(constant(number(1, 2), 2)), "1/2/pi*x", `\frac{1}{2}\,\pi^{-1}\,x`},
		{constant(number(4, 1), -2), "4*pi", `4\,\pi`},
		{constant(number(1, 1), -2), "pi", `\pi`},
		{constant(number(1, 1), 3), "1/pi^(3/2)", `\pi^{-3/2}`},
		{constant(number(2, 1), 4), "2/pi^2", `2\,\pi^{-2}`},
		{constant(number(2, 1), -4), "2*pi^2", `2\,\pi^{2}`},
		{constant(number(2, 1), -3), "2*pi^(3/2)", `2\,\pi^{3/2}`},
		{z.Mul(constant(number(2, 1), 1)).Add(one.Scale(number(2, 1))), "2*(1/sqrt(pi)*z + 1)", `2\,(\pi^{-1/2}\,z + 1)`},
		{z.Mul(constant(number(1, 1), 1)).Sub(one), "1/sqrt(pi)*z - 1", `\pi^{-1/2}\,z - 1`},
		{z.Mul(constant(number(1, 1), 1)).Sub(constant(number(1, 1), 1)), "1/sqrt(pi)*(z - 1)", `\pi^{-1/2}\,(z - 1)`},
	} {
		if got := c.p.String(); got != c.text {
			t.Errorf("String: %s, want %s", got, c.text)
		}
		if got := c.p.LaTeX(); got != c.latex {
			t.Errorf("LaTeX: %s, want %s", got, c.latex)
		}
	}
}

// The integral of x^a y^b z^c over the sphere is 4 pi (a-1)!! (b-1)!! (c-1)!! / (a+b+c+1)!! for even
// a, b and c, else 0 (common practice, no source; by Gaussian integrals).
func TestIntegralOfMonomials(t *testing.T) {
	oddFactorial := func(n int) int64 { // n!! for odd n
		f := int64(1)
		for ; n > 1; n -= 2 {
			f *= int64(n)
		}
		return f
	}
	for a := range 7 {
		for b := range 7 {
			for c := range 7 {
				var want ylm.Polynomial
				if a%2 == 0 && b%2 == 0 && c%2 == 0 {
					num := 4 * oddFactorial(a-1) * oddFactorial(b-1) * oddFactorial(c-1)
					want = constant(number(num, oddFactorial(a+b+c+1)), 3)
				}
				got := powers(ylm.Cartesian, a, b, c).Mul(constant(number(1, 1), 5)).Integral()
				if !got.Equal(want) {
					t.Errorf("integral of x^%d y^%d z^%d = %v, want %v", a, b, c, got, want)
				}
			}
		}
	}
}

// Eval against exact values at points with small coordinates, and, for the harmonics, against Y.
func TestEval(t *testing.T) {
	const x, y, w = 0.5, -2, 0.75
	exact := [3]rational.Surd{rational.Ratio(1, 2), rational.Ratio(-2, 1), rational.Ratio(3, 4)}
	eachLM(6, func(l, m int) {
		for _, vars := range []ylm.Variables{ylm.Cartesian, ylm.Ladder} {
			p := ylm.Solid(l, m, vars)
			want := at(t, p, 1, exact[0], exact[1], exact[2]).Complex128() / complex(math.Sqrt(math.Pi), 0)
			if got := p.Eval(x, y, w); cmplx.Abs(got-want) > 1e-14*math.Pow(5, float64(l)) {
				t.Errorf("r^%d Y_%d,%d in %v at (%v, %v, %v) = %v, want %v", l, l, m, vars, x, y, w, got, want)
			}
			const theta, phi = 1.1, -2.3
			sin, cos := math.Sincos(theta)
			got := ylm.Harmonic(l, m, vars).Eval(sin*math.Cos(phi), sin*math.Sin(phi), cos)
			if want := ylm.Y(l, m, theta, phi); cmplx.Abs(got-want) > 1e-13 {
				t.Errorf("Y_%d,%d in %v = %v, want %v", l, m, vars, got, want)
			}
		}
	})
	if got, want := constant(rational.I(), -3).Eval(9, 9, 9), complex(0, math.Pow(math.Pi, 1.5)); cmplx.Abs(got-want) > 1e-14 {
		t.Errorf("i pi^(3/2) = %v, want %v", got, want)
	}
	if got := (ylm.Polynomial{}).Eval(1, 2, 3); got != 0 {
		t.Errorf("0 = %v", got)
	}
}
