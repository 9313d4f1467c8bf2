// Package binsum evaluates alternating sums of products of binomial coefficients, the integer part
// of every 3j and 6j symbol. A [Sum] describes such a sum once; the evaluators differ only in how
// wide their accumulators are.
package binsum

import (
	"math/big"
	"math/bits"

	"example.org/couplet/rational"
)

// Move is how a binomial C(Top, Low) changes from one term to the next.
type Move uint8

// The three moves that occur.
const (
	LowUp   Move = iota // C(Top, Low+1)
	LowDown             // C(Top, Low-1)
	TopUp               // C(Top+1, Low)
)

// Binomial is the factor C(Top, Low) of the first term, 0 <= Low <= Top, and its move.
type Binomial struct {
	Top, Low int
	Move     Move
}

// Sum is the alternating sum
//
//	S = ± [ t(0) - t(1) + t(2) - ... ± t(Terms-1) ],  t(k) = product of Count binomials after k moves.
//
// No binomial leaves 0 <= Low <= Top within the sum.
type Sum struct {
	Terms    int
	Count    int         // factors in use
	Factors  [4]Binomial // the first Count of them
	Negative bool        // sign of the first term
	Bits     int         // the sum of the |t(k)| is less than 2^Bits
}

// Int sets z to S and returns it.
//
// Every term but the first follows from the one before by a multiplication and an exact division by a
// word or two, so that the cost is proportional to Terms times the length of S.
func (s *Sum) Int(z *big.Int) *big.Int {
	var stack buffer
	total, negative := s.words(&stack)
	z.SetBits(append(z.Bits()[:0], total...))
	if negative {
		z.Neg(z)
	}
	return z
}

// Leading returns the 128 leading bits of |S| and what they must be multiplied by,
//
//	(high*2^64 + low) * 2^exp <= |S|,
//
// with the top bit of high set and what follows low left out, and whether S is negative. All are zero
// for S = 0. Up to 1400 bits it allocates nothing.
func (s *Sum) Leading() (high, low uint64, exp int, negative bool) {
	var stack buffer
	total, negative := s.words(&stack)
	high, low, exp = Leading(total)
	return high, low, exp, negative
}

// Leading returns the 128 leading bits of a number given by its words, without leading zeros, as
// [Sum.Leading] does.
func Leading(x []big.Word) (high, low uint64, exp int) {
	if len(x) == 0 {
		return 0, 0, 0
	}
	// The next 64 bits below the position, zeros below the end.
	position := len(x)*bits.UintSize - bits.LeadingZeros(uint(x[len(x)-1]))
	take := func() (v uint64) {
		for range 64 / bits.UintSize {
			position -= bits.UintSize
			v = v<<(bits.UintSize-1)<<1 | uint64(window(x, position))
		}
		return v
	}
	high = take()
	low = take()
	return high, low, position
}

// window returns the word of bits from position up, zeros below position 0.
func window(x []big.Word, position int) big.Word {
	if position <= -bits.UintSize {
		return 0
	}
	index, offset := position>>wordLog, uint(position)&(bits.UintSize-1)
	var w big.Word
	if index >= 0 {
		w = x[index] >> offset
	}
	if index+1 < len(x) {
		w |= x[index+1] << 1 << (bits.UintSize - 1 - offset)
	}
	return w
}

// wordLog is the logarithm of the size of a word, 5 or 6.
const wordLog = 5 + bits.UintSize>>6

// stackWidth is the widest sum, in words, that is computed without allocation.
const stackWidth = 24

type buffer [2 * stackWidth]big.Word

// words returns |S|, without leading zeros, and whether S is negative. It computes in the buffer where
// that is wide enough.
func (s *Sum) words(stack *buffer) (total []big.Word, negative bool) {
	width := s.Bits/bits.UintSize + 2 // room for the sign, and for a word before it is divided out
	words := stack[:]
	if width > stackWidth {
		words = make([]big.Word, 2*width)
	}
	total, term := words[:width], words[width:width]
	clear(total)
	term = s.first(term)
	add(total, term)
	factors := s.Factors
	for k := 1; k < s.Terms; k++ {
		term = next(term, factors[:s.Count])
		if k&1 == 0 {
			add(total, term)
		} else {
			subtract(total, term)
		}
	}
	return magnitude(total, s.Negative)
}

// first appends t(0) to an empty slice.
func (s *Sum) first(term []big.Word) []big.Word {
	term = append(term, 1)
	if s.Bits/bits.UintSize+2 > stackWidth {
		return append(term[:0], s.firstFactored().Bits()...)
	}
	table := binomials()
	for _, b := range s.Factors[:s.Count] {
		if b.Top < tableTops && bits.UintSize == 64 {
			if i := place(b.Top, b.Low); table.high[i]|table.third[i] == 0 {
				term = mulWord(term, uint(table.low[i]))
				continue
			}
		}
		// One factor after the other: C(n, k) = n/k C(n-1, k-1).
		k := min(b.Low, b.Top-b.Low)
		for i := 1; i <= k; i++ {
			term = divExact(mulWord(term, uint(b.Top-k+i)), uint(i))
		}
	}
	return term
}

// firstFactored returns t(0), multiplied together from its primes: the way for long numbers.
func (s *Sum) firstFactored() *big.Int {
	var f rational.Factored
	for _, b := range s.Factors[:s.Count] {
		if b.Low != 0 && b.Low != b.Top {
			f.MulFactorial(b.Top, 1)
			f.MulFactorial(b.Low, -1)
			f.MulFactorial(b.Top-b.Low, -1)
		}
	}
	return f.Int(new(big.Int))
}

// next changes term from t(k) to t(k+1), and the factors with it.
func next(term []big.Word, factors []Binomial) []big.Word {
	// Each binomial changes by num/den; as many of these as fit into a word are taken together.
	num, den := uint(1), uint(1)
	var dens [4]uint
	n := 0
	for i := range factors {
		a, b := factors[i].advance()
		if hi, lo := bits.Mul(num, a); hi == 0 {
			num = lo
		} else {
			term = mulWord(term, num)
			num = a
		}
		if hi, lo := bits.Mul(den, b); hi == 0 {
			den = lo
		} else {
			dens[n], n = den, n+1
			den = b
		}
	}
	term = mulWord(term, num)
	for _, d := range dens[:n] {
		term = divExact(term, d)
	}
	return divExact(term, den)
}

// advance makes one move and returns the quotient num/den of the new binomial and the old one.
func (b *Binomial) advance() (num, den uint) {
	switch b.Move {
	case LowUp: // C(T, L+1)/C(T, L) = (T-L)/(L+1)
		num, den = uint(b.Top-b.Low), uint(b.Low+1)
		b.Low++
	case LowDown: // C(T, L-1)/C(T, L) = L/(T-L+1)
		num, den = uint(b.Low), uint(b.Top-b.Low+1)
		b.Low--
	case TopUp: // C(T+1, L)/C(T, L) = (T+1)/(T+1-L)
		num, den = uint(b.Top+1), uint(b.Top+1-b.Low)
		b.Top++
	}
	return num, den
}

// BinomialBits returns a b with C(top, low) < 2^b.
func BinomialBits(top, low int) int {
	if top < 67 { // the last row that a word holds
		return bits.Len64(binomials().low[place(top, low)])
	}
	low = min(low, top-low)
	// C(n, k) <= n^k/k! and k! >= (k/3)^k, so C <= (3n/k)^k; and C < 2^n.
	if low == 0 {
		return 1
	}
	return min(top, low*bits.Len(uint(3*top/low)))
}

// largestBits returns a b with C(top, low) < 2^b for all low between the given ones.
func largestBits(top, low, high int) int { return BinomialBits(top, min(max(top/2, low), high)) }
