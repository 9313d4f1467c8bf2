package mantissa

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/dd"
)

const prec = 300

func (a Number) big() *big.Float {
	return new(big.Float).SetMantExp(new(big.Float).SetPrec(prec).SetUint64(a.M), a.Exp-63)
}

// units returns the relative error of a in units of 2^-64, positive where a is too large.
func units(a Number, want *big.Float) float64 {
	d := new(big.Float).Sub(a.big(), want)
	f, _ := d.Quo(d, want).Float64()
	return f * 0x1p64
}

func draw(r *rand.Rand) Number {
	m := r.Uint64() | 1<<63
	switch r.IntN(8) {
	case 0:
		m = 1<<63 + r.Uint64N(4)
	case 1:
		m = 1<<64 - 1 - r.Uint64N(4)
	}
	return Number{m, r.IntN(200) - 100}
}

func TestMul(t *testing.T) {
	r := rand.New(rand.NewPCG(40, 40))
	worst := 0.0
	for range 200000 {
		a, b := draw(r), draw(r)
		c := a.Mul(b)
		if c.M>>63 == 0 {
			t.Fatalf("%v * %v = %v is not in normal form", a, b, c)
		}
		off := units(c, new(big.Float).Mul(a.big(), b.big()))
		if off > 0 {
			t.Fatalf("%v * %v = %v is too large", a, b, c)
		}
		worst = max(worst, -off)
	}
	if worst > 2 || worst < 1.9 {
		t.Errorf("error up to %.2f units, bound 2", worst)
	}
}

func TestFromWords(t *testing.T) {
	r := rand.New(rand.NewPCG(41, 41))
	worst := 0.0
	compare := func(a Number, sign uint64, v *big.Int) {
		if v.Sign() == 0 {
			if a.M != 0 {
				t.Fatalf("zero is %v", a)
			}
			return
		}
		off := units(a, new(big.Float).SetPrec(prec).SetInt(new(big.Int).Abs(v)))
		if a.M>>63 == 0 || off > 0 || sign != uint64(1-v.Sign())/2 || v.BitLen() <= 64 && off != 0 {
			t.Fatalf("%v is %v, sign %d", v, a, sign)
		}
		worst = max(worst, -off)
	}
	for range 200000 {
		w := [3]uint64{r.Uint64(), r.Uint64(), r.Uint64()}
		for i := range w {
			switch r.IntN(5) {
			case 0:
				w[i] = 0
			case 1:
				w[i] = ^uint64(0)
			case 2:
				w[i] = uint64(int64(w[i]) >> r.IntN(64))
			}
		}
		v := big.NewInt(int64(w[0]))
		if w[0] != 1<<63 { // out of range
			n, sign := FromMod64(w[0])
			compare(n, sign, v)
		}
		v.Lsh(v, 64).Add(v, new(big.Int).SetUint64(w[1]))
		n, sign := FromMod128(w[0], w[1])
		compare(n, sign, v)
		v.Lsh(v, 64).Add(v, new(big.Int).SetUint64(w[2]))
		n, sign = FromMod192(w[0], w[1], w[2])
		compare(n, sign, v)
	}
	if worst > 2 || worst < 1 {
		t.Errorf("error up to %.2f units, bound 2", worst)
	}
}

func TestFromPair(t *testing.T) {
	r := rand.New(rand.NewPCG(42, 42))
	worst := 0.0
	for range 200000 {
		hi := math.Ldexp(1+r.Float64(), r.IntN(800)-400)
		if r.IntN(4) == 0 {
			hi = math.Ldexp(1, r.IntN(800)-400)
		}
		half := (math.Nextafter(hi, math.Inf(1)) - hi) / 2
		p := dd.Pair{Hi: hi, Lo: half * (2*r.Float64() - 1)}.Normal()
		a := FromPair(p)
		if a.M>>63 == 0 {
			t.Fatalf("%v is %v", p, a)
		}
		want := new(big.Float).SetPrec(prec).SetFloat64(p.Hi)
		worst = max(worst, math.Abs(units(a, want.Add(want, new(big.Float).SetFloat64(p.Lo)))))
	}
	if worst > 1 || worst < 0.9 {
		t.Errorf("error up to %.2f units, bound 1", worst)
	}
}

// Round gives the nearest float64 to whatever lies within the bounds, and refuses where two are possible.
func TestRound(t *testing.T) {
	r := rand.New(rand.NewPCG(43, 43))
	refused := 0
	for range 200000 {
		a, below, above := draw(r), 1+r.Uint64N(40), 1+r.Uint64N(40)
		if r.IntN(2) == 0 { // close to the middle between two
			a.M = a.M>>11<<11 + 1<<10 + r.Uint64N(100) - 50
		}
		sign := r.Uint64N(2)
		f, ok := a.Round(below, above, sign)
		if math.Signbit(f) != (sign == 1) {
			t.Fatalf("sign %d gives %g", sign, f)
		}
		at := func(d float64) float64 {
			v := a.big()
			v.Add(v, new(big.Float).SetMantExp(big.NewFloat(d), a.Exp-63))
			g, _ := v.Float64()
			return g
		}
		low, high := at(0.5-float64(below)), at(float64(above)-0.5)
		if ok && (math.Abs(f) != low || math.Abs(f) != high) {
			t.Fatalf("%v less %d and plus %d rounds to %g, possible are %g and %g", a, below, above, f, low, high)
		}
		if !ok {
			refused++
			if a.M > 1<<63+100 && a.M < 1<<64-100 && at(-float64(below)-1) == at(float64(above)+1) {
				t.Fatalf("%v less %d and plus %d is refused though it is clear", a, below, above)
			}
		}
	}
	if refused < 1000 {
		t.Errorf("only %d refused", refused)
	}
}

// A front of n words: every integer up to its inverse fits, also where the front is off by a factor of two.
func TestWords(t *testing.T) {
	for exp := -400; exp < 0; exp++ {
		for _, m := range []uint64{1 << 63, 1<<64 - 1} {
			a := Number{m, exp}
			most := new(big.Float).Quo(big.NewFloat(2), a.big())
			words := a.Words()
			if limit := new(big.Float).SetMantExp(big.NewFloat(1), 64*words-1); most.Cmp(limit) > 0 || words < 0 {
				t.Fatalf("%v: up to %g in %d words", a, most, words)
			}
			if least := new(big.Float).SetMantExp(big.NewFloat(0x1p-4), 64*(words-1)-1); words > 1 && most.Cmp(least) < 0 {
				t.Fatalf("%v: up to %g in %d words, one is too many", a, most, words)
			}
		}
	}
}

func TestBinomials(t *testing.T) {
	b := SqrtBinomials()
	root := func(n *big.Int) *big.Float { return new(big.Float).Sqrt(new(big.Float).SetPrec(prec).SetInt(n)) }
	inverse := func(x *big.Float) *big.Float { return new(big.Float).Quo(new(big.Float).SetPrec(prec).SetInt64(1), x) }
	worst := 0.0
	compare := func(a Number, want *big.Float) {
		if a.M>>63 == 0 {
			t.Fatalf("%v is not in normal form", a)
		}
		worst = max(worst, math.Abs(units(a, want)))
	}
	for n := range dd.BinomialTops {
		for k := range n + 1 {
			c := new(big.Int).Binomial(int64(n), int64(k))
			w, next := root(c), root(new(big.Int).Mul(c, big.NewInt(int64(n+1))))
			i := dd.Place(n, k)
			compare(b.Root[i], w)
			compare(b.Inverse[i], inverse(w))
			compare(b.RootNext[i], next)
			compare(b.InverseNext[i], inverse(next))
		}
	}
	for n := 1; n < len(b.Sqrt); n++ {
		compare(b.Sqrt[n], root(big.NewInt(int64(n))))
	}
	if worst > 1+0x1p-30 || worst < 0.9 {
		t.Errorf("errors up to %v units, bound 1", worst)
	}
}
