package rational

import "math/big"

// Sign returns -1, 0 or +1. Zero is decided by the canonical form, the sign of anything else by
// intervals that are narrowed until they leave out zero.
func (s Sum) Sign() int {
	if v, ok := s.Surd(); ok {
		return v.Sign()
	}
	sign := 0
	s.refine(64, func(lo, hi *big.Float) bool {
		sign = lo.Sign()
		return sign == hi.Sign() && sign != 0
	})
	return sign
}

// Cmp returns -1, 0 or +1 as s is less than, equal to or greater than t.
func (s Sum) Cmp(t Sum) int { return s.Sub(t).Sign() }

// Float64 returns the float64 nearest to s, to even on a tie; ±Inf beyond the range of float64.
func (s Sum) Float64() float64 {
	if v, ok := s.Surd(); ok {
		return v.Float64()
	}
	var f float64
	s.refine(64, func(lo, hi *big.Float) bool {
		a, _ := lo.Float64()
		b, _ := hi.Float64()
		f = a
		return a == b && (a != 0 || lo.Sign() == hi.Sign()) // the same zero on both sides
	})
	return f
}

// Float returns s rounded to nearest even at the given precision in bits. It panics with
// *ArgumentError for prec = 0 or prec > 2^24.
func (s Sum) Float(prec uint) *big.Float {
	mustPrec("rational.Sum.Float", prec)
	if v, ok := s.Surd(); ok {
		return v.Float(prec)
	}
	var f *big.Float
	s.refine(prec+32, func(lo, hi *big.Float) bool {
		f = new(big.Float).SetPrec(prec).Set(lo)
		return f.Cmp(new(big.Float).SetPrec(prec).Set(hi)) == 0
	})
	return f
}

// refine calls done with ever narrower intervals lo <= s <= hi until it returns true. A sum of two
// or more terms is irrational, so that neither zero nor a rounding boundary can be its value and
// the loop ends.
func (s Sum) refine(prec uint, done func(lo, hi *big.Float) bool) {
	for ; ; prec *= 2 {
		lo := new(big.Float).SetPrec(prec).SetMode(big.ToNegativeInf)
		hi := new(big.Float).SetPrec(prec).SetMode(big.ToPositiveInf)
		for _, t := range s.terms {
			// t is within an ulp of its rounded value, which one step in the last place covers.
			v := t.rounded(prec)
			ulp := new(big.Float).SetMantExp(big.NewFloat(1), v.MantExp(nil)-int(prec))
			lo.Add(lo, new(big.Float).SetPrec(2*prec).Sub(v, ulp))
			hi.Add(hi, new(big.Float).SetPrec(2*prec).Add(v, ulp))
		}
		if done(lo, hi) {
			return
		}
	}
}
