package binsum

import (
	"math/big"

	"example.org/couplet/rational"
)

// Quadruple is the sum in a 6j symbol,
//
//	S = Σ_t (-1)^t C(t+1, T+1) C(N1, t-S1) C(N2, t-S2) C(N3, t-S3)
//
// over all t for which no binomial is zero; there is at least one. T = N1+N2+N3.
type Quadruple struct{ T, N1, N2, N3, S1, S2, S3 int }

func (s *Quadruple) limits() (first, last int) {
	return max(s.T, s.S1, s.S2, s.S3), min(s.N1+s.S1, s.N2+s.S2, s.N3+s.S3)
}

// Fits reports whether the table of binomials reaches as far as the modular evaluations need.
func (s *Quadruple) Fits() bool {
	return min(s.N1+s.S1, s.N2+s.S2, s.N3+s.S3)+1 < tableTops
}

// Mod64 returns S modulo 2^64, where Fits.
func (s *Quadruple) Mod64() uint64 {
	first, last := s.limits()
	t := &binomials().low
	h, i, j, k := place(first+1, s.T+1), place(s.N1, first-s.S1), place(s.N2, first-s.S2), place(s.N3, first-s.S3)
	var total uint64
	for range last - first + 1 {
		total = t[h]*t[i]*(t[j]*t[k]) - total
		h += tableTops
		i++
		j++
		k++
	}
	if last&1 != 0 {
		total = -total
	}
	return total
}

// Mod128 returns S modulo 2^128, in two words, where Fits.
func (s *Quadruple) Mod128() (high, low uint64) {
	first, last := s.limits()
	t := binomials()
	h, i, j, k := place(first+1, s.T+1), place(s.N1, first-s.S1), place(s.N2, first-s.S2), place(s.N3, first-s.S3)
	if max(s.N1, s.N2, s.N3) <= oneWordTop { // two thirds of the multiplications
		for range last - first + 1 {
			a, b := mulWords(t.low[i], t.low[j], t.low[k])
			a, b = Mul128(a, b, t.high[h], t.low[h])
			high, low = sub128(a, b, high, low)
			h += tableTops
			i++
			j++
			k++
		}
		return negated(high, low, last)
	}
	for range last - first + 1 {
		a, b := Mul128(t.high[h], t.low[h], t.high[i], t.low[i])
		a, b = Mul128(a, b, t.high[j], t.low[j])
		a, b = Mul128(a, b, t.high[k], t.low[k])
		high, low = sub128(a, b, high, low)
		h += tableTops
		i++
		j++
		k++
	}
	return negated(high, low, last)
}

// Mod192 returns S modulo 2^192, in three words, where Fits; ok is false where a binomial with one of the N
// on top may exceed a word.
func (s *Quadruple) Mod192() (w Words192, ok bool) {
	if max(s.N1, s.N2, s.N3) > oneWordTop {
		return w, false
	}
	first, last := s.limits()
	t := binomials()
	h, i, j, k := place(first+1, s.T+1), place(s.N1, first-s.S1), place(s.N2, first-s.S2), place(s.N3, first-s.S3)
	for range last - first + 1 {
		w = product192(t.low[i], t.low[j], t.low[k]).mul(t.third[h], t.high[h], t.low[h]).sub(w)
		h += tableTops
		i++
		j++
		k++
	}
	if last&1 != 0 {
		w = Words192{}.sub(w)
	}
	return w, true
}

// Word returns S where a signed word is sure to hold it; ok is false elsewhere.
func (s *Quadruple) Word() (v int64, ok bool) {
	if !s.inWord() {
		return 0, false
	}
	return int64(s.Mod64()), true
}

// Int sets z to S and returns it.
func (s *Quadruple) Int(z *big.Int) *big.Int {
	if s.inWord() {
		return z.SetInt64(int64(s.Mod64()))
	}
	sum := s.Sum()
	return sum.Int(z)
}

// Sqrt returns S*sqrt(f), exactly.
func (s *Quadruple) Sqrt(f *rational.Factored) rational.Surd {
	if s.inWord() {
		return f.SqrtTimes(int64(s.Mod64()))
	}
	return f.SqrtTimesBig(s.Int(new(big.Int)))
}

// Sum describes S for the evaluation in as many words as it takes.
func (s *Quadruple) Sum() Sum {
	first, last := s.limits()
	return Sum{
		Terms: last - first + 1,
		Count: 4,
		Factors: [4]Binomial{
			{Top: first + 1, Low: s.T + 1, Move: TopUp},
			{Top: s.N1, Low: first - s.S1, Move: LowUp},
			{Top: s.N2, Low: first - s.S2, Move: LowUp},
			{Top: s.N3, Low: first - s.S3, Move: LowUp},
		},
		Negative: first&1 != 0,
		Bits:     s.bits(),
	}
}

// bits returns a b for which the absolute values of the terms add up to less than 2^b.
//
// The first binomial is largest at the last t. Of two of the others the products add up to one binomial,
// by Vandermonde's identity, and the third is at most its largest value on the way, in three ways; all
// three together add up to at most C(T, floor(T/2)), by the same identity.
func (s *Quadruple) bits() int {
	first, last := s.limits()
	return BinomialBits(last+1, s.T+1) + min(
		BinomialBits(s.T, s.T/2),
		BinomialBits(s.N1+s.N2, s.N2+s.S2-s.S1)+largestBits(s.N3, first-s.S3, last-s.S3),
		BinomialBits(s.N2+s.N3, s.N3+s.S3-s.S2)+largestBits(s.N1, first-s.S1, last-s.S1),
		BinomialBits(s.N3+s.N1, s.N1+s.S1-s.S3)+largestBits(s.N2, first-s.S2, last-s.S2))
}

// inWord reports whether a signed word is sure to hold S. The plain bound, which decides nearly always,
// comes first.
func (s *Quadruple) inWord() bool {
	_, last := s.limits()
	if last+1 >= tableTops {
		return false
	}
	return s.plainBits() <= 63 || s.bits() <= 63
}

// plainBits is the first of the bounds of bits, which is quick.
func (s *Quadruple) plainBits() int {
	_, last := s.limits()
	return BinomialBits(last+1, s.T+1) + BinomialBits(s.T, s.T/2)
}
