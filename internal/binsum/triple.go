package binsum

import (
	"math/big"

	"example.org/couplet/rational"
)

// Triple is the sum in a 3j symbol,
//
//	S = Σ_k (-1)^k C(N1, k) C(N2, A-k) C(N3, B-k)
//
// over all k for which no binomial is zero; there is at least one.
type Triple struct{ N1, N2, N3, A, B int }

func (s *Triple) limits() (first, last int) {
	return max(0, s.A-s.N2, s.B-s.N3), min(s.N1, s.A, s.B)
}

// Mod64 returns S modulo 2^64. The N must be below 189.
func (s *Triple) Mod64() uint64 {
	first, last := s.limits()
	t := &binomials().low
	i, j, k := place(s.N1, first), place(s.N2, s.A-first), place(s.N3, s.B-first)
	var total uint64
	for range last - first + 1 {
		total = t[i]*t[j]*t[k] - total
		i++
		j--
		k--
	}
	if last&1 != 0 { // total has the last term with sign +
		total = -total
	}
	return total
}

// Mod128 returns S modulo 2^128, in two words. The N must be below 189.
func (s *Triple) Mod128() (high, low uint64) {
	first, last := s.limits()
	t := binomials()
	i, j, k := place(s.N1, first), place(s.N2, s.A-first), place(s.N3, s.B-first)
	if max(s.N1, s.N2, s.N3) <= oneWordTop { // half the multiplications
		for range last - first + 1 {
			h, l := mulWords(t.low[i], t.low[j], t.low[k])
			high, low = sub128(h, l, high, low)
			i++
			j--
			k--
		}
		return negated(high, low, last)
	}
	for range last - first + 1 {
		h, l := Mul128(t.high[i], t.low[i], t.high[j], t.low[j])
		h, l = Mul128(h, l, t.high[k], t.low[k])
		high, low = sub128(h, l, high, low)
		i++
		j--
		k--
	}
	return negated(high, low, last)
}

// Int sets z to S and returns it.
func (s *Triple) Int(z *big.Int) *big.Int {
	if s.inWord() {
		return z.SetInt64(int64(s.Mod64()))
	}
	sum := s.Sum()
	return sum.Int(z)
}

// Sqrt returns S*sqrt(f), exactly.
func (s *Triple) Sqrt(f *rational.Factored) rational.Surd {
	if s.inWord() {
		return f.SqrtTimes(int64(s.Mod64()))
	}
	return f.SqrtTimesBig(s.Int(new(big.Int)))
}

// Sum describes S for the evaluation in as many words as it takes.
func (s *Triple) Sum() Sum {
	first, last := s.limits()
	return Sum{
		Terms: last - first + 1,
		Count: 3,
		Factors: [4]Binomial{
			{Top: s.N1, Low: first, Move: LowUp},
			{Top: s.N2, Low: s.A - first, Move: LowDown},
			{Top: s.N3, Low: s.B - first, Move: LowDown},
		},
		Negative: first&1 != 0,
		Bits:     s.Bits(),
	}
}

// Bits returns a b for which the absolute values of the terms add up to less than 2^b.
//
// Of two of the three binomials the products add up to one binomial, by Vandermonde's identity; the third
// is at most its largest value on the way: Σ_k C(N1, k) C(N2, A-k) C(N3, B-k) <= C(N1+N2, A) max C(N3, B-k),
// and two more such bounds, of which the smallest counts. The first is at most C(N, floor(N/2)) with
// N = N1+N2+N3, by the same identity.
func (s *Triple) Bits() int {
	first, last := s.limits()
	n := s.N1 + s.N2 + s.N3
	return min(
		BinomialBits(n, n/2),
		BinomialBits(s.N1+s.N2, s.A)+largestBits(s.N3, s.B-last, s.B-first),
		BinomialBits(s.N1+s.N3, s.B)+largestBits(s.N2, s.A-last, s.A-first),
		BinomialBits(s.N2+s.N3, s.A+s.N3-s.B)+largestBits(s.N1, first, last))
}

// inWord reports whether a signed word is sure to hold S: for N1+N2+N3 <= 66, |S| <= C(66, 33) < 2^63.
func (s *Triple) inWord() bool {
	return s.N1+s.N2+s.N3 <= 66 || max(s.N1, s.N2, s.N3) < tableTops && s.Bits() <= 63
}
