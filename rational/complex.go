package rational

// Complex is an exact complex number whose parts are sums of surds. The zero value is 0.
//
// Complexes are immutable values, safe for concurrent use. == does not compile on them: use
// [Complex.Equal], and [Complex.Key] for maps.
type Complex struct{ Re, Im Sum }

// I is the imaginary unit.
func I() Complex { return Complex{Im: Ratio(1, 1).Sum()} }

// IPow returns i^n.
func IPow(n int) Complex {
	one := Ratio(1, 1).Sum()
	switch n & 3 {
	case 0:
		return Complex{Re: one}
	case 1:
		return Complex{Im: one}
	case 2:
		return Complex{Re: one.Neg()}
	}
	return Complex{Im: one.Neg()}
}

// Complex returns s as a Complex.
func (s Surd) Complex() Complex { return Complex{Re: s.Sum()} }

// IsZero reports whether c = 0.
func (c Complex) IsZero() bool { return c.Re.IsZero() && c.Im.IsZero() }

// IsReal reports whether the imaginary part of c is zero.
func (c Complex) IsReal() bool { return c.Im.IsZero() }

// Equal reports whether c = d.
func (c Complex) Equal(d Complex) bool { return c.Re.Equal(d.Re) && c.Im.Equal(d.Im) }

// Key returns a text that is the same for equal numbers and for no others, for use as a map key.
func (c Complex) Key() string { return c.String() }

// Neg returns -c.
func (c Complex) Neg() Complex { return Complex{c.Re.Neg(), c.Im.Neg()} }

// Conj returns the complex conjugate of c.
func (c Complex) Conj() Complex { return Complex{c.Re, c.Im.Neg()} }

// Add returns c + d.
func (c Complex) Add(d Complex) Complex { return Complex{c.Re.Add(d.Re), c.Im.Add(d.Im)} }

// Sub returns c - d.
func (c Complex) Sub(d Complex) Complex { return Complex{c.Re.Sub(d.Re), c.Im.Sub(d.Im)} }

// Scale returns s*c.
func (c Complex) Scale(s Surd) Complex { return Complex{c.Re.Scale(s), c.Im.Scale(s)} }

// Mul returns c*d.
func (c Complex) Mul(d Complex) Complex {
	return Complex{c.Re.Mul(d.Re).Sub(c.Im.Mul(d.Im)), c.Re.Mul(d.Im).Add(c.Im.Mul(d.Re))}
}

// Quo returns c/d at the cost of [Sum.QuoSum]. It panics with *ArgumentError for d = 0.
func (c Complex) Quo(d Complex) Complex {
	if d.IsZero() {
		panic(&ArgumentError{"rational.Complex.Quo", "d", "0", "anything but zero"})
	}
	n, norm := c.Mul(d.Conj()), d.AbsSquared()
	return Complex{n.Re.QuoSum(norm), n.Im.QuoSum(norm)}
}

// AbsSquared returns |c|^2.
func (c Complex) AbsSquared() Sum { return c.Re.Mul(c.Re).Add(c.Im.Mul(c.Im)) }

// Complex128 returns c with both parts rounded to the nearest float64.
func (c Complex) Complex128() complex128 { return complex(c.Re.Float64(), c.Im.Float64()) }
