package ylm

import (
	"math/big"

	"example.org/couplet/rational"
)

// In returns p written in the variables vars. It panics with *rational.ArgumentError for vars other
// than Cartesian and Ladder.
func (p Polynomial) In(vars Variables) Polynomial {
	vars.check("ylm.Polynomial.In")
	if p.vars == vars || p.isConstant() {
		return p
	}
	sum := collector{}
	for _, t := range p.terms {
		a, b := t.Powers[0], t.Powers[1]
		for k := range a + b + 1 {
			c := t.Coeff.Scale(mixed(a, b, k))
			if vars == Cartesian { // (x+iy)^a (x-iy)^b, with iy in the place of the second variable
				c = c.Mul(rational.IPow(k))
			} else { // x^a y^b = 2^-(a+b) (-i)^b (u+v)^a (u-v)^b, with u = x+iy, v = x-iy
				c = c.Mul(rational.IPow(-b)).Scale(powerOfTwo(-a - b))
			}
			sum.add(t, [3]int{a + b - k, k, t.Powers[2]}, c)
		}
	}
	return sum.polynomial(vars)
}

// mixed returns the coefficient of s^(a+b-k) t^k in (s+t)^a (s-t)^b.
func mixed(a, b, k int) rational.Surd {
	sum := new(big.Int)
	for j := max(0, k-a); j <= min(b, k); j++ {
		product := new(big.Int).Binomial(int64(a), int64(k-j))
		product.Mul(product, new(big.Int).Binomial(int64(b), int64(j)))
		if j&1 != 0 {
			product.Neg(product)
		}
		sum.Add(sum, product)
	}
	return integer(sum)
}

func integer(n *big.Int) rational.Surd { return rational.FromRat(new(big.Rat).SetInt(n)) }

// powerOfTwo returns 2^n.
func powerOfTwo(n int) rational.Surd {
	if n < 0 {
		return powerOfTwo(-n).Inv()
	}
	return integer(new(big.Int).Lsh(big.NewInt(1), uint(n)))
}
