package dd

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"
)

const bigPrec = 300

func (a Pair) big() *big.Float {
	hi := new(big.Float).SetPrec(bigPrec).SetFloat64(a.Hi)
	return hi.Add(hi, new(big.Float).SetPrec(bigPrec).SetFloat64(a.Lo))
}

// units returns the relative error of a in units of u^2.
func units(a Pair, want *big.Float) float64 {
	d := new(big.Float).Sub(a.big(), want)
	f, _ := d.Quo(d, want).Float64()
	return math.Abs(f) * 0x1p106
}

// drawPair returns a random c-pair with Hi between 1 and 2.
func drawPair(r *rand.Rand, c float64) Pair {
	hi := 1 + r.Float64()
	return Pair{hi, (2*r.Float64() - 1) * c * 0x1p-53 * hi}
}

// The bound of Mul, and how far the parts may drift, for all pairs that occur in the fronts.
func TestMul(t *testing.T) {
	r := rand.New(rand.NewPCG(16, 16))
	for _, c := range [][2]float64{{1, 1}, {3, 1}, {3, 3}, {3, 5}, {7, 3}, {7, 7}, {7, 9}, {15, 3}} {
		a, b := c[0], c[1]
		bound := a*b + b + (a + b) + (a + b + 1)
		worst, drift := 0.0, 0.0
		for range 100000 {
			x, y := drawPair(r, a), drawPair(r, b)
			z := x.Mul(y)
			worst = max(worst, units(z, x.big().Mul(x.big(), y.big())))
			drift = max(drift, math.Abs(z.Lo/z.Hi)*0x1p53)
		}
		t.Logf("%g-pair times %g-pair: error %.1f u^2 of %g, low part %.1f u of %g", a, b, worst, bound, drift, a+b+1)
		if worst > bound || drift > (a+b+1)*(1+0x1p-40) {
			t.Error("beyond the bound")
		}
		if worst < bound/8 {
			t.Error("the bound is far too wide")
		}
	}
}

// Mul followed by Normal is DWTimesDW2, with an error of 5 u^2.
func TestMulNormal(t *testing.T) {
	r := rand.New(rand.NewPCG(17, 17))
	worst := 0.0
	for range 200000 {
		x, y := drawPair(r, 1).Normal(), drawPair(r, 1).Normal()
		z := x.Mul(y).Normal()
		if z.Hi != z.Hi+z.Lo {
			t.Fatalf("%v is not in normal form", z)
		}
		worst = max(worst, units(z, x.big().Mul(x.big(), y.big())))
	}
	if worst > 5 || worst < 1 {
		t.Errorf("error %.2f u^2, bound 5", worst)
	}
}

func TestFromInt64(t *testing.T) {
	r := rand.New(rand.NewPCG(18, 18))
	list := []int64{0, 1, -1, math.MaxInt64, math.MinInt64, math.MinInt64 + 1, 1<<53 + 1, -(1<<53 + 1), 1<<62 + 1, math.MaxInt64 - 511, math.MaxInt64 - 512, math.MaxInt64 - 513}
	for range 100000 {
		list = append(list, r.Int64()>>r.IntN(63), -r.Int64()>>r.IntN(63))
	}
	for _, n := range list {
		p := FromInt64(n)
		if p.big().Cmp(new(big.Float).SetPrec(bigPrec).SetInt64(n)) != 0 || p.Hi != p.Hi+p.Lo {
			t.Fatalf("%d is %v", n, p)
		}
	}
}

func TestFromMod128(t *testing.T) {
	r := rand.New(rand.NewPCG(19, 19))
	worst := 0.0
	try := func(high, low uint64) {
		v := new(big.Int).Lsh(big.NewInt(int64(high)), 64)
		v.Add(v, new(big.Int).SetUint64(low))
		p := FromMod128(high, low)
		if v.Sign() == 0 {
			if p != (Pair{}) {
				t.Fatalf("zero is %v", p)
			}
			return
		}
		if math.Abs(p.Lo) > 3*0x1p-53*math.Abs(p.Hi) {
			t.Fatalf("%v is no 3-pair", p)
		}
		worst = max(worst, units(p, new(big.Float).SetPrec(bigPrec).SetInt(v)))
	}
	for _, w := range []uint64{0, 1, 1 << 63, 1<<63 - 1, ^uint64(0), ^uint64(0) - 1, 1<<53 + 1, 1<<64 - 1<<10} {
		for _, v := range []uint64{0, 1, 1 << 63, ^uint64(0), 1<<11 - 1} {
			if w != 1<<63 || v != 0 { // -2^127 itself is out of range
				try(w, v)
			}
		}
	}
	for range 200000 {
		try(uint64(int64(r.Uint64())>>r.IntN(64)), r.Uint64())
		try(0, r.Uint64()>>r.IntN(64))
	}
	if worst > 2 || worst < 0.1 {
		t.Errorf("error %.2f u^2, bound 2", worst)
	}
}

// Round gives the nearest float64 to whatever lies within the error, and refuses where two are possible.
func TestRound(t *testing.T) {
	r := rand.New(rand.NewPCG(20, 20))
	const err = 0x1p-97
	refused := 0
	for range 200000 {
		hi := 1 + r.Float64()
		half := (math.Nextafter(hi, 3) - hi) / 2
		// A low part close to a tie, at a distance of some errors.
		p := Pair{hi, half * (1 - (2*r.Float64()-1)*0x1p-40*math.Exp2(-8*r.Float64()))}
		if r.IntN(2) == 0 {
			p.Lo = half + (2*r.Float64()-1)*8*err
		}
		f, ok := p.Round(err)
		slack := new(big.Float).SetPrec(bigPrec).Mul(p.big(), big.NewFloat(err*(1-0x1p-8)))
		low, _ := new(big.Float).Sub(p.big(), slack).Float64()
		high, _ := new(big.Float).Add(p.big(), slack).Float64()
		if ok && (f != low || f != high) {
			t.Fatalf("%v rounds to %v, possible are %v and %v", p, f, low, high)
		}
		if !ok {
			refused++
			wide := new(big.Float).SetPrec(bigPrec).Mul(p.big(), big.NewFloat(err*2))
			low, _ := new(big.Float).Sub(p.big(), wide).Float64()
			high, _ := new(big.Float).Add(p.big(), wide).Float64()
			if low == high {
				t.Fatalf("%v is refused though it is clear", p)
			}
		}
	}
	if refused < 1000 {
		t.Errorf("only %d refused", refused)
	}
	// A number that is itself a float64 is no tie.
	if f, ok := (Pair{Hi: 0.375}).Round(err); !ok || f != 0.375 {
		t.Errorf("0.375 rounds to %v, %v", f, ok)
	}
}

func TestScaledRound(t *testing.T) {
	for _, c := range []struct {
		a    Scaled
		want float64
		ok   bool
	}{
		{Scaled{Pair{1.5, 0}, 3}, 12, true},
		{Scaled{Pair{-1.5, 0}, -1022}, -1.5 * 0x1p-1022, true},
		{Scaled{Pair{1.5, 0}, -1023}, 0, false}, // subnormal
		{Scaled{Pair{1.5, 0}, -1074}, 0, false},
		{Scaled{Pair{1.5, 0}, -1100}, 0, true},
		{Scaled{Pair{1.5, 0}, 1023}, 1.5 * 0x1p1023, true},
		{Scaled{Pair{1.5, 0}, 1024}, 0, false},
		{Scaled{Pair{1, 0x1p-53}, 0}, 0, false}, // a tie
	} {
		if f, ok := c.a.Round(0x1p-97); f != c.want || ok != c.ok {
			t.Errorf("%v rounds to %g, %v; want %g, %v", c.a, f, ok, c.want, c.ok)
		}
	}
	if f, _ := (Scaled{Pair{-1.5, 0}, -1200}).Round(0x1p-97); f != 0 || !math.Signbit(f) {
		t.Errorf("negative underflow gives %g", f)
	}
}

func TestTables(t *testing.T) {
	f := Factorials(700) // beyond the first size
	factorial := big.NewInt(1)
	root := func(n *big.Int) *big.Float {
		x := new(big.Float).SetPrec(bigPrec).SetInt(n)
		return x.Sqrt(x)
	}
	inverse := func(x *big.Float) *big.Float {
		return new(big.Float).Quo(new(big.Float).SetPrec(bigPrec).SetInt64(1), x)
	}
	scaled := func(s Scaled, want *big.Float) float64 {
		return units(s.Pair, new(big.Float).SetMantExp(want, -s.Exp))
	}
	worst := 0.0
	for n := 1; n <= 700; n++ {
		factorial.Mul(factorial, big.NewInt(int64(n)))
		w := root(factorial)
		r := root(big.NewInt(int64(n)))
		worst = max(worst, scaled(f.Root[n], w), scaled(f.Inverse[n], inverse(w)), units(f.Sqrt[n], r), units(f.InverseSqrt[n], inverse(r)))
		if f.Root[n].Hi < 1 || f.Root[n].Hi >= 2 || f.Inverse[n].Hi < 1 || f.Inverse[n].Hi >= 2 {
			t.Fatalf("%d!: not between 1 and 2", n)
		}
	}
	if worst > 1 {
		t.Errorf("factorials: error %.2f u^2, bound 1", worst)
	}
	b := Binomials()
	worst = 0
	for n := range BinomialTops {
		for k := range n + 1 {
			c := new(big.Int).Binomial(int64(n), int64(k))
			off := units(b[Place(n, k)], new(big.Float).SetPrec(bigPrec).SetInt(c))
			if off != 0 && c.BitLen() <= 104 {
				t.Fatalf("C(%d, %d) is not exact", n, k)
			}
			worst = max(worst, off)
		}
	}
	t.Logf("binomials: largest error %.1f u^2 of %d", worst, BinomialError)
	if worst > BinomialError || worst == 0 {
		t.Error("the bound is wrong")
	}
}

// Times and Add keep within their bounds, and Add is exact for integers.
func TestTimesAndAdd(t *testing.T) {
	r := rand.New(rand.NewPCG(35, 35))
	worstTimes, worstAdd := 0.0, 0.0
	for range 200000 {
		const c = 3
		x, y := drawPair(r, c), drawPair(r, c)
		k := []float64{1, -1, -0x1p-3, 0x1p-60}[r.IntN(4)]
		y.Hi, y.Lo = y.Hi*k, y.Lo*k
		f := float64(1 + r.IntN(1<<30))
		worstTimes = max(worstTimes, units(x.Times(f), x.big().Mul(x.big(), big.NewFloat(f)))/(2*c+1))
		sum := x.Add(y)
		d, _ := new(big.Float).Sub(sum.big(), new(big.Float).Add(x.big(), y.big())).Float64()
		worstAdd = max(worstAdd, math.Abs(d)*0x1p106/(4*c+2)/max(math.Abs(x.Hi), math.Abs(y.Hi)))
		if sum.Hi != sum.Hi+sum.Lo {
			t.Fatalf("%v is not in normal form", sum)
		}
	}
	if worstTimes > 1 || worstTimes < 1.0/16 || worstAdd > 1 || worstAdd < 1.0/16 {
		t.Errorf("errors up to %.3f and %.3f of the bounds", worstTimes, worstAdd)
	}
	for range 200000 {
		draw := func() (Pair, *big.Int) {
			n := new(big.Int).Lsh(big.NewInt(r.Int64N(1<<62)), uint(r.IntN(42)))
			n.Add(n, big.NewInt(r.Int64()))
			if r.IntN(2) == 0 {
				n.Neg(n)
			}
			hi, _ := new(big.Float).SetInt(n).Float64()
			rest, _ := big.NewFloat(hi).Int(nil)
			lo, _ := new(big.Float).SetInt(rest.Sub(n, rest)).Float64()
			return Pair{hi, lo}, n
		}
		x, m := draw()
		y, n := draw()
		if r.IntN(3) == 0 { // cancel nearly
			y, n = Pair{-x.Hi, -x.Lo + float64(r.IntN(3))}, new(big.Int).Neg(m)
			n.Add(n, big.NewInt(int64(y.Lo+x.Lo)))
		}
		if sum := x.Add(y); sum.big().Cmp(new(big.Float).SetPrec(bigPrec).SetInt(m.Add(m, n))) != 0 {
			t.Fatalf("%v + %v = %v is not exact", x, y, sum)
		}
	}
}
