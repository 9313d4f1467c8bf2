package rational

import (
	"cmp"
	"fmt"
	"math"
	"math/big"
	"math/bits"
)

// Surd is an exact real number r*sqrt(n), r rational and n a squarefree positive integer: the value
// of every 3j, 6j and 9j symbol and of every product and quotient of them. The zero value is 0.
//
// Surds are immutable values, safe for concurrent use. Equal numbers have equal parts, but == does
// not compile on them, since large parts stand behind a pointer: use [Surd.Equal], and [Surd.Key]
// for maps.
type Surd struct {
	_    [0]func() // == must not compile
	num  int64     // signed numerator of r; 0 only in the zero Surd, where all fields are zero
	den  uint64    // denominator of r, coprime to num
	rad  uint64    // n
	wide *wideSurd // holds the value instead of the words where one of them would overflow
}

// wideSurd is never changed after it is built.
type wideSurd struct{ num, den, rad *big.Int }

// maxNum bounds |num|, so that Neg cannot overflow.
const maxNum = math.MaxInt64

func magnitude(n int64) uint64 {
	if n < 0 {
		return -uint64(n)
	}
	return uint64(n)
}

// signed returns ±m for m <= maxNum.
func signed(m uint64, negative bool) int64 {
	if negative {
		return -int64(m)
	}
	return int64(m)
}

// newSurd returns num/den*sqrt(rad), which must be in lowest terms with rad squarefree. It keeps the
// arguments: the caller must not change them afterwards.
func newSurd(num, den, rad *big.Int) Surd {
	if num.Sign() == 0 {
		return Surd{}
	}
	if num.IsInt64() && num.Int64() != math.MinInt64 && den.IsUint64() && rad.IsUint64() {
		return Surd{num: num.Int64(), den: den.Uint64(), rad: rad.Uint64()}
	}
	return Surd{wide: &wideSurd{num, den, rad}}
}

// parts returns numerator, denominator and radicand as big integers, which the caller must not
// change.
func (s Surd) parts() (num, den, rad *big.Int) {
	if s.wide != nil {
		return s.wide.num, s.wide.den, s.wide.rad
	}
	if s.num == 0 {
		return new(big.Int), big.NewInt(1), big.NewInt(1)
	}
	return big.NewInt(s.num), new(big.Int).SetUint64(s.den), new(big.Int).SetUint64(s.rad)
}

// Ratio returns num/den. It panics with *ArgumentError for den = 0.
func Ratio(num, den int64) Surd {
	if den == 0 {
		panic(&ArgumentError{"rational.Ratio", "den", "0", "any other integer"})
	}
	if num == 0 {
		return Surd{}
	}
	n, d := magnitude(num), magnitude(den)
	g := gcd(n, d)
	if n /= g; n > maxNum { // only -2^63 itself
		return FromRat(big.NewRat(num, den))
	}
	return Surd{num: signed(n, (num < 0) != (den < 0)), den: d / g, rad: 1}
}

// FromRat returns r as a Surd.
func FromRat(r *big.Rat) Surd {
	return newSurd(new(big.Int).Set(r.Num()), new(big.Int).Set(r.Denom()), big.NewInt(1))
}

// Root returns sqrt(num/den). It panics with *ArgumentError for negative num and for den < 1.
//
// The canonical form takes the squares out of num and den; for operands of more than 50 bits this
// can take a millisecond, and the first time some ten for a list of primes.
func Root(num, den int64) Surd {
	if num < 0 || den < 1 {
		panic(&ArgumentError{"rational.Root", "num/den", fmt.Sprintf("%d/%d", num, den), "num >= 0 and den >= 1"})
	}
	if num == 0 {
		return Surd{}
	}
	g := int64(gcd(uint64(num), uint64(den)))
	outer, inner := splitSquare(uint64(num / g))
	outerDen, innerDen := splitSquare(uint64(den / g))
	return Surd{num: int64(outer), den: outerDen, rad: inner}.Quo(Surd{num: 1, den: 1, rad: innerDen})
}

// NewSurd returns coeff*sqrt(radicand), for numbers that come from data: unlike [Root] it returns an error
// for a negative radicand, a *ArgumentError, and for one that the canonical form cannot factor within the
// limits stated at [ParseSurd].
func NewSurd(coeff, radicand *big.Rat) (Surd, error) {
	if radicand.Sign() < 0 {
		return Surd{}, &ArgumentError{"rational.NewSurd", "radicand", radicand.String(), "radicand >= 0"}
	}
	root, err := sqrtRat(radicand)
	if err != nil {
		return Surd{}, fmt.Errorf("rational.NewSurd: %w", err)
	}
	return FromRat(coeff).Mul(root), nil
}

// Sign returns -1, 0 or +1.
func (s Surd) Sign() int {
	if s.wide != nil {
		return s.wide.num.Sign()
	}
	return cmp.Compare(s.num, 0)
}

// IsZero reports whether s = 0.
func (s Surd) IsZero() bool { return s.num == 0 && s.wide == nil }

// Coeff returns the rational factor r of s = r*sqrt(n), as a fresh copy.
func (s Surd) Coeff() *big.Rat {
	num, den, _ := s.parts()
	return new(big.Rat).SetFrac(num, den)
}

// Radicand returns the squarefree n of s = r*sqrt(n), as a fresh copy; it is 1 for s = 0.
func (s Surd) Radicand() *big.Int {
	_, _, rad := s.parts()
	return new(big.Int).Set(rad)
}

// Square returns s^2.
func (s Surd) Square() *big.Rat {
	num, den, rad := s.parts()
	n := new(big.Int).Mul(num, num)
	return new(big.Rat).SetFrac(n.Mul(n, rad), new(big.Int).Mul(den, den))
}

// Rat returns s as a rational number, a fresh copy; ok is false where s is irrational.
func (s Surd) Rat() (r *big.Rat, ok bool) {
	if !s.isRational() {
		return nil, false
	}
	return s.Coeff(), true
}

func (s Surd) isRational() bool {
	return s.wide == nil && s.rad <= 1 || s.wide != nil && isOne(s.wide.rad)
}

func isOne(n *big.Int) bool { return n.IsUint64() && n.Uint64() == 1 }

// Neg returns -s.
func (s Surd) Neg() Surd {
	if s.wide != nil {
		return Surd{wide: &wideSurd{new(big.Int).Neg(s.wide.num), s.wide.den, s.wide.rad}}
	}
	s.num = -s.num
	return s
}

// Abs returns |s|.
func (s Surd) Abs() Surd {
	if s.Sign() < 0 {
		return s.Neg()
	}
	return s
}

// Equal reports whether s = t.
func (s Surd) Equal(t Surd) bool {
	if s.wide == nil || t.wide == nil { // words and wide values never meet
		return s.wide == t.wide && s.num == t.num && s.den == t.den && s.rad == t.rad
	}
	return s.wide.num.Cmp(t.wide.num) == 0 && s.wide.den.Cmp(t.wide.den) == 0 && s.wide.rad.Cmp(t.wide.rad) == 0
}

// Cmp returns -1, 0 or +1 as s is less than, equal to or greater than t.
func (s Surd) Cmp(t Surd) int {
	if a, b := s.Sign(), t.Sign(); a != b || a == 0 {
		return cmp.Compare(a, b)
	}
	return s.Square().Cmp(t.Square()) * s.Sign()
}

// Key returns a text that is the same for equal numbers and for no others, for use as a map key.
func (s Surd) Key() string { return s.String() }

// Inv returns 1/s. It panics with *ArgumentError for s = 0.
func (s Surd) Inv() Surd {
	if s.IsZero() {
		panic(&ArgumentError{"rational.Surd.Inv", "s", "0", "anything but zero"})
	}
	// 1/(n/d sqrt(r)) = d/(n r) sqrt(r); d and r may share factors.
	if s.wide == nil {
		g := gcd(s.den, s.rad)
		hi, den := bits.Mul64(magnitude(s.num), s.rad/g)
		if num := s.den / g; hi == 0 && num <= maxNum {
			return Surd{num: signed(num, s.num < 0), den: den, rad: s.rad}
		}
	}
	num, den, rad := s.parts()
	r := new(big.Rat).SetFrac(den, new(big.Int).Mul(num, rad))
	return newSurd(r.Num(), r.Denom(), rad)
}

// Quo returns s/t. It panics with *ArgumentError for t = 0.
func (s Surd) Quo(t Surd) Surd {
	if t.IsZero() {
		panic(&ArgumentError{"rational.Surd.Quo", "t", "0", "anything but zero"})
	}
	return s.Mul(t.Inv())
}

// Mul returns s*t.
func (s Surd) Mul(t Surd) Surd {
	if s.wide == nil && t.wide == nil {
		if s.num == 0 || t.num == 0 {
			return Surd{}
		}
		if p, ok := mulWords(s, t); ok {
			return p
		}
	}
	n1, d1, r1 := s.parts()
	n2, d2, r2 := t.parts()
	// sqrt(r1 r2) = g sqrt((r1/g)(r2/g)) with g = gcd(r1, r2), squarefree since r1 and r2 are.
	g := new(big.Int).GCD(nil, nil, r1, r2)
	rad := new(big.Int).Quo(r1, g)
	rad.Mul(rad, new(big.Int).Quo(r2, g))
	num := new(big.Int).Mul(n1, n2)
	c := new(big.Rat).SetFrac(num.Mul(num, g), new(big.Int).Mul(d1, d2))
	if c.Sign() == 0 {
		return Surd{}
	}
	return newSurd(c.Num(), c.Denom(), rad)
}

// mulWords is Mul within words; ok is false where the product does not fit.
func mulWords(s, t Surd) (p Surd, ok bool) {
	n1, n2, d1, d2 := magnitude(s.num), magnitude(t.num), s.den, t.den
	r1, r2, g := s.rad, t.rad, uint64(1)
	if r1 != 1 && r2 != 1 {
		g = gcd(r1, r2)
		r1, r2 = r1/g, r2/g
	}
	reduce(&n1, &d2)
	reduce(&n2, &d1)
	reduce(&g, &d1)
	reduce(&g, &d2)
	var over uint64
	num := mulOver(mulOver(n1, n2, &over), g, &over)
	den := mulOver(d1, d2, &over)
	rad := mulOver(r1, r2, &over)
	if over != 0 || num > maxNum {
		return Surd{}, false
	}
	return Surd{num: signed(num, (s.num < 0) != (t.num < 0)), den: den, rad: rad}, true
}

// reduce divides a and b by their greatest common divisor.
func reduce(a, b *uint64) {
	if *a == 1 || *b == 1 {
		return
	}
	g := gcd(*a, *b)
	*a, *b = *a/g, *b/g
}

// gcd returns the greatest common divisor of a and b, both positive (binary algorithm).
func gcd(a, b uint64) uint64 {
	shift := bits.TrailingZeros64(a | b)
	a >>= bits.TrailingZeros64(a)
	for b != 0 {
		b >>= bits.TrailingZeros64(b)
		if a > b {
			a, b = b, a
		}
		b -= a
	}
	return a << shift
}

// Add returns s + t.
func (s Surd) Add(t Surd) Sum { return s.Sum().Add(t.Sum()) }

// Sub returns s - t.
func (s Surd) Sub(t Surd) Sum { return s.Sum().Sub(t.Sum()) }

// Sum returns s as a sum of one term, or none for s = 0.
func (s Surd) Sum() Sum {
	if s.IsZero() {
		return Sum{}
	}
	return Sum{terms: []Surd{s}}
}
