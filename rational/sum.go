package rational

import (
	"cmp"
	"math/big"
	"math/bits"
	"slices"
)

// Sum is an exact finite sum of surds, one for each radicand. It is zero exactly when it has no
// terms: square roots of different squarefree integers are linearly independent over the rationals
// (Besicovitch 1940). The zero value is 0.
//
// Sums are immutable values, safe for concurrent use. == does not compile on them: use [Sum.Equal],
// and [Sum.Key] for maps.
type Sum struct {
	_     [0]func()
	terms []Surd // non-zero, radicands ascending; never changed after it is built
}

// SumOf returns the sum of its arguments, 0 for none.
func SumOf(terms ...Surd) Sum {
	sorted := slices.DeleteFunc(slices.Clone(terms), Surd.IsZero)
	slices.SortFunc(sorted, cmpRadicand)
	var z []Surd
	for _, t := range sorted {
		if last := len(z) - 1; last < 0 || cmpRadicand(z[last], t) != 0 {
			z = append(z, t)
		} else if z[last] = addCoeff(z[last], t); z[last].IsZero() {
			z = z[:last]
		}
	}
	return Sum{terms: z}
}

// Terms returns the terms in the order of their radicands, as a fresh slice.
func (s Sum) Terms() []Surd { return append([]Surd(nil), s.terms...) }

// Surd returns s as a single surd; ok is false where s has more than one term.
func (s Sum) Surd() (v Surd, ok bool) {
	switch len(s.terms) {
	case 0:
		return Surd{}, true
	case 1:
		return s.terms[0], true
	}
	return Surd{}, false
}

// IsZero reports whether s = 0.
func (s Sum) IsZero() bool { return len(s.terms) == 0 }

// Equal reports whether s = t.
func (s Sum) Equal(t Sum) bool {
	if len(s.terms) != len(t.terms) {
		return false
	}
	for i := range s.terms {
		if !s.terms[i].Equal(t.terms[i]) {
			return false
		}
	}
	return true
}

// Key returns a text that is the same for equal numbers and for no others, for use as a map key.
func (s Sum) Key() string { return s.String() }

// Neg returns -s.
func (s Sum) Neg() Sum {
	z := make([]Surd, len(s.terms))
	for i, t := range s.terms {
		z[i] = t.Neg()
	}
	return Sum{terms: z}
}

// Add returns s + t.
func (s Sum) Add(t Sum) Sum {
	if s.IsZero() {
		return t
	}
	if t.IsZero() {
		return s
	}
	z := make([]Surd, 0, len(s.terms)+len(t.terms))
	a, b := s.terms, t.terms
	for len(a) > 0 && len(b) > 0 {
		switch cmpRadicand(a[0], b[0]) {
		case -1:
			z, a = append(z, a[0]), a[1:]
		case 1:
			z, b = append(z, b[0]), b[1:]
		default:
			if c := addCoeff(a[0], b[0]); !c.IsZero() {
				z = append(z, c)
			}
			a, b = a[1:], b[1:]
		}
	}
	z = append(append(z, a...), b...)
	return Sum{terms: z}
}

// Sub returns s - t.
func (s Sum) Sub(t Sum) Sum { return s.Add(t.Neg()) }

// Scale returns s*t.
func (s Sum) Scale(t Surd) Sum { return s.Mul(t.Sum()) }

// Mul returns s*t.
func (s Sum) Mul(t Sum) Sum {
	var z Sum
	for _, a := range s.terms {
		for _, b := range t.terms {
			z = z.Add(a.Mul(b).Sum())
		}
	}
	return z
}

// Quo returns s/t. It panics with *ArgumentError for t = 0.
func (s Sum) Quo(t Surd) Sum {
	if t.IsZero() {
		panic(&ArgumentError{"rational.Sum.Quo", "t", "0", "anything but zero"})
	}
	return s.Scale(t.Inv())
}

// QuoSum returns s/t. It panics with *ArgumentError for t = 0.
//
// The denominator is made rational one prime p after the other: it is a + b*sqrt(p) with a and b
// free of p, and a - b*sqrt(p) takes p out. With k different primes in the radicands of t this
// takes at most k rounds, and numerator and denominator grow to at most 2^k times as many terms as
// s and to 2^k terms.
func (s Sum) QuoSum(t Sum) Sum {
	if t.IsZero() {
		panic(&ArgumentError{"rational.Sum.QuoSum", "t", "0", "anything but zero"})
	}
	for len(t.terms) > 1 {
		conjugate := t.conjugate()
		s, t = s.Mul(conjugate), t.Mul(conjugate)
	}
	return s.Quo(t.terms[0])
}

// conjugate changes the sign of sqrt(q) in t, for a q > 1 that divides some radicands and is
// coprime to the others. There is one where t has two terms.
func (s Sum) conjugate() Sum {
	one := big.NewInt(1)
	_, _, q := s.terms[len(s.terms)-1].parts()
	// Shrink q until it divides or is coprime to every radicand.
	for _, t := range s.terms {
		_, _, rad := t.parts()
		if g := new(big.Int).GCD(nil, nil, q, rad); g.Cmp(one) != 0 {
			q = g
		}
	}
	z := make([]Surd, len(s.terms))
	for i, t := range s.terms {
		_, _, rad := t.parts()
		z[i] = t
		if new(big.Int).GCD(nil, nil, q, rad).Cmp(one) != 0 {
			z[i] = t.Neg()
		}
	}
	return Sum{terms: z}
}

// cmpRadicand compares the radicands of two non-zero surds.
func cmpRadicand(s, t Surd) int {
	if s.wide == nil && t.wide == nil {
		return cmp.Compare(s.rad, t.rad)
	}
	_, _, a := s.parts()
	_, _, b := t.parts()
	return a.Cmp(b)
}

// addCoeff returns s + t for non-zero surds of one radicand.
func addCoeff(s, t Surd) Surd {
	if s.wide == nil && t.wide == nil {
		if z, ok := addWords(s, t); ok {
			return z
		}
	}
	n1, d1, rad := s.parts()
	n2, d2, _ := t.parts()
	r := new(big.Rat).SetFrac(n1, d1)
	r.Add(r, new(big.Rat).SetFrac(n2, d2))
	return newSurd(r.Num(), r.Denom(), rad)
}

// addWords is addCoeff within words; ok is false where an intermediate result does not fit.
func addWords(s, t Surd) (z Surd, ok bool) {
	g := gcd(s.den, t.den)
	h1, a := bits.Mul64(magnitude(s.num), t.den/g)
	h2, b := bits.Mul64(magnitude(t.num), s.den/g)
	h3, den := bits.Mul64(s.den, t.den/g)
	if h1|h2|h3 != 0 || a > maxNum || b > maxNum {
		return Surd{}, false
	}
	num := signed(a, s.num < 0) + signed(b, t.num < 0)
	if num == 0 {
		return Surd{}, true
	}
	if (num < 0) != (s.num < 0) && (num < 0) != (t.num < 0) || magnitude(num) > maxNum {
		return Surd{}, false // the sum wrapped around
	}
	m := magnitude(num)
	reduce(&m, &den)
	return Surd{num: signed(m, num < 0), den: den, rad: s.rad}, true
}

// Complex returns s as a Complex.
func (s Sum) Complex() Complex { return Complex{Re: s} }
