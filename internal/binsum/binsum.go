// Package binsum evaluates alternating sums of products of binomial coefficients, the integer part
// of every 3j and 6j symbol. A [Sum] describes such a sum once; the evaluators differ only in how
// wide their accumulators are.
package binsum

import (
	"math/big"
	"math/bits"
	"sync"

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

// tableTops bounds Top in the table of binomials.
const tableTops = 96

// pascal returns C(top, low) modulo 2^64 at index top*tableTops + low.
var pascal = sync.OnceValue(func() *[tableTops * tableTops]uint64 {
	var t [tableTops * tableTops]uint64
	for top := range tableTops {
		t[top*tableTops] = 1
		for low := 1; low <= top; low++ {
			t[top*tableTops+low] = t[(top-1)*tableTops+low-1] + t[(top-1)*tableTops+low]
		}
	}
	return &t
})

// tableStep is the change of index in the table that a move makes.
var tableStep = [...]int{LowUp: 1, LowDown: -1, TopUp: tableTops}

// Word returns S where one signed word is sure to hold it; ok is false elsewhere.
//
// Everything is computed modulo 2^64, so that only S itself must fit, not its terms nor the
// binomials.
func (s *Sum) Word() (value int64, ok bool) {
	if s.Bits > 63 {
		return 0, false
	}
	var index, step [4]int
	for i, f := range s.Factors[:s.Count] {
		last := f.Top
		if f.Move == TopUp {
			last += s.Terms - 1
		}
		if last >= tableTops {
			return 0, false
		}
		index[i], step[i] = f.Top*tableTops+f.Low, tableStep[f.Move]
	}
	table := pascal()
	var total uint64
	for range s.Terms {
		t := uint64(1)
		for i := range s.Count {
			t *= table[index[i]]
			index[i] += step[i]
		}
		total = t - total // the last term ends with sign +
	}
	if s.Negative == (s.Terms&1 == 1) {
		total = -total
	}
	return int64(total), true
}

// Int sets z to S and returns it.
func (s *Sum) Int(z *big.Int) *big.Int {
	if v, ok := s.Word(); ok {
		return z.SetInt64(v)
	}
	return s.long(z)
}

// long is Int by as many words as it takes.
//
// The first term is multiplied together from its primes. Every further one follows from the one
// before by a multiplication and an exact division by a word or two, so that the cost is
// proportional to Terms times the length of S.
func (s *Sum) long(z *big.Int) *big.Int {
	width := s.Bits/bits.UintSize + 2 // room for the sign, and for a word before it is divided out
	var stack [2 * stackWidth]big.Word
	words := stack[:]
	if width > stackWidth {
		words = make([]big.Word, 2*width)
	}
	total, term := words[:width], words[width:width]
	term = append(term, s.first(z).Bits()...)
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
	return setSigned(z, total, s.Negative)
}

// stackWidth is the widest sum, in words, that is computed without allocation.
const stackWidth = 24

// first sets z to t(0) and returns it.
func (s *Sum) first(z *big.Int) *big.Int {
	var f rational.Factored
	for _, b := range s.Factors[:s.Count] {
		if b.Low != 0 && b.Low != b.Top {
			f.MulFactorial(b.Top, 1)
			f.MulFactorial(b.Low, -1)
			f.MulFactorial(b.Top-b.Low, -1)
		}
	}
	return f.Int(z)
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
		return bits.Len64(pascal()[top*tableTops+low])
	}
	low = min(low, top-low)
	// C(n, k) <= n^k/k! and k! >= (k/3)^k, so C <= (3n/k)^k; and C < 2^n.
	if low == 0 {
		return 1
	}
	return min(top, low*bits.Len(uint(3*top/low)))
}

// Sqrt returns S*sqrt(f).
func (s *Sum) Sqrt(f *rational.Factored) rational.Surd {
	if v, ok := s.Word(); ok {
		return f.SqrtTimes(v)
	}
	var z big.Int
	return f.SqrtTimesBig(s.Int(&z))
}
