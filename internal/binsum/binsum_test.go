package binsum

import (
	"math/big"
	"math/bits"
	"math/rand/v2"
	"testing"
)

// plain adds up the terms as math/big gives them, and their absolute values.
func plain(s *Sum) (value, absolute *big.Int) {
	value, absolute = new(big.Int), new(big.Int)
	negative := s.Negative
	for term := range s.Magnitudes() {
		absolute.Add(absolute, term)
		if negative {
			term.Neg(term)
		}
		value.Add(value, term)
		negative = !negative
	}
	return value, absolute
}

// drawSum returns a sum with tops up to size and a bound that holds.
func drawSum(r *rand.Rand, size int) Sum {
	for {
		s := Sum{Count: 1 + r.IntN(4), Terms: 1 + r.IntN(size), Negative: r.IntN(2) == 0}
		ok := true
		for i := range s.Count {
			f := Binomial{Move: Move(r.IntN(3))}
			f.Top = r.IntN(size + 1)
			f.Low = r.IntN(f.Top + 1)
			ok = ok && (f.Move == TopUp || f.Move == LowUp && f.Low+s.Terms-1 <= f.Top || f.Move == LowDown && f.Low-s.Terms+1 >= 0)
			s.Factors[i] = f
		}
		if ok {
			_, absolute := plain(&s)
			s.Bits = absolute.BitLen()
			return s
		}
	}
}

// Every route gives the sum of the terms, whatever the moves, for sums of one word and of many.
func TestRoutesAgree(t *testing.T) {
	r := rand.New(rand.NewPCG(7, 7))
	words, full := 0, 0
	for _, size := range []int{3, 8, 16, 30, 70, 200, 700} {
		for range min(400, 20000/size) {
			s := drawSum(r, size)
			want, _ := plain(&s)
			if got := s.Int(new(big.Int)); got.Cmp(want) != 0 {
				t.Fatalf("%+v: %v, want %v", s, got, want)
			}
			if got := s.long(new(big.Int)); got.Cmp(want) != 0 {
				t.Fatalf("%+v by many words: %v, want %v", s, got, want)
			}
			v, ok := s.Word()
			if ok && !want.IsInt64() || ok && v != want.Int64() {
				t.Fatalf("%+v by one word: %v, want %v", s, v, want)
			}
			if ok {
				words++
				if s.Bits > 60 {
					full++
				}
			} else if s.Bits <= 63 && size < 30 {
				t.Fatalf("%+v is refused by one word", s)
			}
		}
	}
	if words < 500 || full < 5 {
		t.Errorf("%d sums in one word, %d of more than 60 bits: the draw misses an edge", words, full)
	}
}

// No allocation while the result stays in a word.
func TestWordAllocations(t *testing.T) {
	s := drawSum(rand.New(rand.NewPCG(8, 8)), 12)
	if n := testing.AllocsPerRun(100, func() { s.Word() }); n != 0 {
		t.Errorf("%v allocations", n)
	}
}

func TestBinomialBits(t *testing.T) {
	for top := range 400 {
		for low := range top + 1 {
			c := new(big.Int).Binomial(int64(top), int64(low))
			b := BinomialBits(top, low)
			if c.BitLen() > b {
				t.Fatalf("C(%d, %d) has %d bits, more than %d", top, low, c.BitLen(), b)
			}
			if top < 67 && c.BitLen() != b {
				t.Fatalf("C(%d, %d) has %d bits, not %d", top, low, c.BitLen(), b)
			}
		}
	}
}

func TestDivExact(t *testing.T) {
	r := rand.New(rand.NewPCG(9, 9))
	for range 20000 {
		q := new(big.Int)
		for range r.IntN(7) {
			q.Lsh(q, 64).Or(q, new(big.Int).SetUint64(r.Uint64()))
		}
		d := uint(r.Uint64())>>r.IntN(bits.UintSize-1) | 1
		d <<= r.IntN(1 + bits.LeadingZeros(d))
		x := new(big.Int).Mul(q, new(big.Int).SetUint64(uint64(d)))
		if got := new(big.Int).SetBits(divExact(x.Bits(), d)); got.Cmp(q) != 0 {
			t.Fatalf("quotient by %d: %v, want %v", d, got, q)
		}
	}
}
