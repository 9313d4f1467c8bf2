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

// modulo returns v modulo 2^128 in two words.
func modulo(v *big.Int) (high, low uint64) {
	m := new(big.Int).And(v, new(big.Int).Sub(new(big.Int).Lsh(big.NewInt(1), 128), big.NewInt(1)))
	return new(big.Int).Rsh(m, 64).Uint64(), new(big.Int).And(m, new(big.Int).SetUint64(^uint64(0))).Uint64()
}

// evaluator is what Triple and Quadruple have in common.
type evaluator interface {
	Sum() Sum
	Int(z *big.Int) *big.Int
	Mod64() uint64
	Mod128() (high, low uint64)
	inWord() bool
}

// check compares every evaluation of a sum with the sum of its terms, and the bound with theirs.
func check(t *testing.T, e evaluator, modular bool) (tight bool) {
	t.Helper()
	s := e.Sum()
	want, absolute := plain(&s)
	if absolute.BitLen() > s.Bits {
		t.Fatalf("%+v: the terms add up to %d bits, more than the bound %d", e, absolute.BitLen(), s.Bits)
	}
	if got := e.Int(new(big.Int)); got.Cmp(want) != 0 {
		t.Fatalf("%+v: %v, want %v", e, got, want)
	}
	if got := s.Int(new(big.Int)); got.Cmp(want) != 0 {
		t.Fatalf("%+v in words: %v, want %v", e, got, want)
	}
	if e.inWord() && !want.IsInt64() {
		t.Fatalf("%+v: %v does not fit into a word", e, want)
	}
	if modular {
		high, low := modulo(want)
		if h, l := e.Mod128(); h != high || l != low || e.Mod64() != low {
			t.Fatalf("%+v: modulo 2^128 %#x %#x, modulo 2^64 %#x, want %#x %#x", e, h, l, e.Mod64(), high, low)
		}
	}
	high, low, exp, negative := s.Leading()
	if want.Sign() == 0 {
		if high != 0 || low != 0 || exp != 0 || negative {
			t.Fatalf("%+v: leading bits of zero", e)
		}
		return false
	}
	lead := new(big.Int).Lsh(new(big.Int).SetUint64(high), 64)
	lead.Or(lead, new(big.Int).SetUint64(low))
	cut := new(big.Int).Abs(want)
	if exp >= 0 {
		cut.Rsh(cut, uint(exp))
	} else {
		cut.Lsh(cut, uint(-exp))
	}
	if lead.Cmp(cut) != 0 || high>>63 == 0 || negative != (want.Sign() < 0) {
		t.Fatalf("%+v: leading bits %#x %#x * 2^%d, negative %v, of %v", e, high, low, exp, negative, want)
	}
	return absolute.BitLen() == s.Bits
}

// All triples with N to 8, then random ones up to 600 on both sides of every change of route.
func TestTriple(t *testing.T) {
	tight := 0
	try := func(n1, n2, n3, a, b int) {
		s := &Triple{n1, n2, n3, a, b}
		if first, last := s.limits(); first <= last && check(t, s, max(n1, n2, n3) < tableTops) {
			tight++
		}
	}
	const top = 8
	for n1 := range top + 1 {
		for n2 := range top + 1 {
			for n3 := range top + 1 {
				for a := range n1 + n2 + 1 {
					for b := range n1 + n3 + 1 {
						try(n1, n2, n3, a, b)
					}
				}
			}
		}
	}
	r := rand.New(rand.NewPCG(7, 7))
	for _, n := range []int{21, 22, 23, 43, 44, 45, 60, 128, 131, 160, 250, 600} {
		for range 4000 / n {
			n1, n2, n3 := r.IntN(n+1), r.IntN(n+1), r.IntN(n+1)
			try(n1, n2, n3, r.IntN(n1+n2+1), r.IntN(n1+n3+1))
			try(n, n, n, n-r.IntN(3), n-r.IntN(3)) // close to the largest terms
		}
	}
	if tight == 0 {
		t.Error("no sum comes up to the bound")
	}
}

// All quadruples of 6j symbols with arguments to 3, then random ones.
func TestQuadruple(t *testing.T) {
	cases, tight := 0, 0
	try := func(a, b, c, d, e, f int) { // twice the arguments of a 6j symbol
		for _, x := range [][3]int{{a, b, c}, {a, e, f}, {d, b, f}, {d, e, c}} {
			if (x[0]+x[1]+x[2])&1 != 0 || x[0]+x[1] < x[2] || x[1]+x[2] < x[0] || x[2]+x[0] < x[1] {
				return
			}
		}
		s := &Quadruple{(a + b + c) / 2, (a + b - c) / 2, (b + c - a) / 2, (c + a - b) / 2, (d + e + c) / 2, (a + e + f) / 2, (d + b + f) / 2}
		cases++
		if check(t, s, s.Fits()) {
			tight++
		}
	}
	const k = 7
	for n := range k * k * k * k * k * k {
		try(n%k, n/k%k, n/k/k%k, n/k/k/k%k, n/k/k/k/k%k, n/k/k/k/k/k)
	}
	r := rand.New(rand.NewPCG(8, 8))
	for _, n := range []int{10, 16, 20, 30, 40, 60, 66, 70, 130, 260} {
		for range 400000 / n {
			x := func() int { return n/2 + r.IntN(n/2+1) }
			try(x(), x(), x(), x(), x(), x())
		}
	}
	if cases < 10000 || tight == 0 {
		t.Errorf("%d cases, %d come up to the bound", cases, tight)
	}
}

// Tops so large that the factors of a step do not fit into one word together.
func TestLargeTops(t *testing.T) {
	r := rand.New(rand.NewPCG(21, 21))
	for range 300 {
		s := Sum{Terms: 4, Count: 4, Negative: r.IntN(2) == 0}
		for i := range s.Factors {
			low := 4 + r.IntN(5)
			s.Factors[i] = Binomial{Top: 1<<22 + r.IntN(1<<24), Low: low, Move: Move(r.IntN(3))}
			if r.IntN(2) == 0 { // large bottoms, so that the denominators are large too
				s.Factors[i].Low = s.Factors[i].Top - low
			}
		}
		want, absolute := plain(&s)
		s.Bits = absolute.BitLen()
		if got := s.Int(new(big.Int)); got.Cmp(want) != 0 {
			t.Fatalf("%+v: %v, want %v", s, got, want)
		}
	}
}

func TestAllocations(t *testing.T) {
	triple, quadruple := Triple{30, 20, 10, 20, 15}, Quadruple{60, 20, 20, 20, 60, 60, 60}
	long := Triple{120, 100, 80, 110, 90}
	for name, f := range map[string]func(){
		"Mod64":   func() { triple.Mod64(); quadruple.Mod64() },
		"Mod128":  func() { triple.Mod128(); quadruple.Mod128() },
		"Leading": func() { s := long.Sum(); s.Leading() },
	} {
		if n := testing.AllocsPerRun(100, f); n != 0 {
			t.Errorf("%s: %v allocations", name, n)
		}
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
