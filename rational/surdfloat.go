package rational

import (
	"fmt"
	"math/big"
)

// Float64 returns the float64 nearest to s, to even on a tie; ±Inf beyond the range of float64. The
// result is right for numerators and denominators of any size, subnormal results included.
func (s Surd) Float64() float64 {
	if s.isRational() {
		f, _ := s.Coeff().Float64()
		return f
	}
	// 66 bits leave the rounding to 53 or fewer a sticky bit to spare.
	f, _ := s.truncated(66).Float64()
	return f
}

// Float returns s rounded to nearest even at the given precision in bits. It panics with
// *ArgumentError for prec = 0 or prec > 2^24.
func (s Surd) Float(prec uint) *big.Float {
	mustPrec("rational.Surd.Float", prec)
	return s.rounded(prec)
}

func (s Surd) rounded(prec uint) *big.Float {
	z := new(big.Float).SetPrec(prec)
	if s.isRational() {
		return z.SetRat(s.Coeff())
	}
	return z.Set(s.truncated(prec + 3))
}

func mustPrec(fn string, prec uint) {
	if prec == 0 || prec > 1<<24 {
		panic(&ArgumentError{fn, "prec", fmt.Sprint(prec), "from 1 to 16777216"})
	}
}

// truncated returns an irrational s cut off after at least prec bits, with one more bit set that
// stands for the rest. Rounding the result to fewer than prec bits is rounding s itself: it is no
// tie and no short number, since s is neither.
func (s Surd) truncated(prec uint) *big.Float {
	num, den, rad := s.parts()
	square := new(big.Int).Mul(num, num)
	square.Mul(square, rad)
	den2 := new(big.Int).Mul(den, den)
	// s^2 * 4^shift has at least 2 prec bits before the point, so its root has prec.
	shift := int(prec) + (den2.BitLen()-square.BitLen())/2 + 2
	if shift >= 0 {
		square.Lsh(square, uint(2*shift))
	} else {
		den2.Lsh(den2, uint(-2*shift))
	}
	// The floor of the root of a floor is the floor of the root.
	root := square.Sqrt(square.Quo(square, den2))
	root.Lsh(root, 1).SetBit(root, 0, 1)
	if s.Sign() < 0 {
		root.Neg(root)
	}
	f := new(big.Float).SetPrec(uint(root.BitLen())).SetInt(root)
	return f.SetMantExp(f, -shift-1)
}
