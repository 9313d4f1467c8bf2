package racah

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/square"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// compareChain demands the sums of the chain {p q x; r s t} as Racah's sum gives them: those in words
// exactly, those in double-double within their bounds. It returns the largest error in units of its bound; ok is
// false where one of the triads without x is forbidden, or there is no x.
func compareChain(t *testing.T, p, q, r, s, u int) (exact bool, worst float64, ok bool) {
	t.Helper()
	h := rational.Halves
	if wigner.Triad(h(p), h(s), h(u)) != wigner.NonZero || wigner.Triad(h(r), h(q), h(u)) != wigner.NonZero {
		return false, 0, false
	}
	var l chain
	if l.set(p, q, r, s, u); l.n < 1 || !l.reaches() {
		return false, 0, false
	}
	words, pairs := make([]float64, l.n), make([]bounded, l.n)
	exact = l.words(words)
	l.pairs(pairs)
	for i := range words {
		k := newTetrad(p, q, l.first+2*i, r, s, u)
		want := new(big.Float).SetPrec(2000).SetInt(k.Int(new(big.Int)))
		if exact && want.Cmp(big.NewFloat(words[i])) != 0 {
			t.Fatalf("%+v: %.0f in words, want %.0f", k, words[i], want)
		}
		if size, _ := want.Float64(); math.Abs(size) >= mostWord && exact {
			t.Fatalf("%+v: %g is not refused", k, size)
		}
		v := pairs[i]
		got := new(big.Float).SetPrec(2000).SetFloat64(v.Hi)
		got.Add(got, new(big.Float).SetPrec(2000).SetFloat64(v.Lo))
		d, _ := got.Sub(got, want).Float64()
		if bound := v.err*uu - 13*uu*math.Abs(v.Hi); !(math.Abs(d) <= bound) { // the 13 is room for what follows
			t.Fatalf("%+v: %g %+g in double-double, want %g: error %g, bound %g", k, v.Hi, v.Lo, want, d, bound)
		} else if d != 0 {
			worst = max(worst, math.Abs(d)/bound)
		}
	}
	return exact, worst, true
}

// Every chain of small momenta, and random ones up to where the tables end.
func TestChains(t *testing.T) {
	const top = 8
	cases := 0
	var q [5]int
	var visit func(place int)
	visit = func(place int) {
		if place < len(q) {
			for q[place] = 0; q[place] <= top; q[place]++ {
				visit(place + 1)
			}
			return
		}
		exact, _, ok := compareChain(t, q[0], q[1], q[2], q[3], q[4])
		if ok {
			cases++
		}
		if ok && !exact {
			t.Fatalf("%v is not exact", q)
		}
	}
	visit(0)
	r := rand.New(rand.NewPCG(31, 31))
	large, words, worst := 0, 0, 0.0
	for range 200000 {
		size := []int{16, 30, 60, 100}[r.IntN(4)]
		for i := range q {
			q[i] = r.IntN(size + 1)
		}
		exact, off, ok := compareChain(t, q[0], q[1], q[2], q[3], q[4])
		if !ok {
			continue
		}
		large++
		if exact {
			words++
		}
		worst = max(worst, off)
		if large == 3000 {
			break
		}
	}
	t.Logf("%d small chains, %d larger ones, %d of them exact; errors up to %.3f of the bound", cases, large, words, worst)
	if cases < 4000 || large < 3000 || words < large/4 || words > large*3/4 {
		t.Error("the draw misses")
	}
	if worst < 1.0/64 {
		t.Error("the bound is far too wide")
	}
}

// A step rounds to the right integer up to mostWord, whatever cancels.
func TestWordStep(t *testing.T) {
	r := rand.New(rand.NewPCG(32, 32))
	cases := 0
	for range 1000000 {
		lead, d, e := 1+r.Int64N(1<<r.IntN(37)), r.Int64N(33)-16, r.Int64N(33)-16
		s, u := r.Int64N(2*mostWord)-mostWord, r.Int64N(2*mostWord)-mostWord
		v := -(d*s + e*u)
		if v >= mostWord || v <= -mostWord {
			continue
		}
		cases++
		if got := wordStep(float64(lead*d), float64(s), float64(lead*e), float64(u), float64(lead)); got != float64(v) {
			t.Fatalf("(%d s + %d t) of %d, %d: %.0f, want %d", d, e, s, u, got, v)
		}
	}
	if cases < 50000 {
		t.Errorf("only %d cases", cases)
	}
}

// drawArray returns a random allowed 9j symbol with 2j to size.
func drawArray(r *rand.Rand, size int) (q square.Array) {
	for {
		for i := range q {
			q[i] = r.IntN(size + 1)
		}
		if nineJAllowed(&q) {
			return q
		}
	}
}

// The products and sums keep within their bounds, too: what a bound misses, the rounding of the whole would
// show only by chance.
func TestChainsPair(t *testing.T) {
	r := rand.New(rand.NewPCG(33, 33))
	worst, cases, exacts := 0.0, 0, 0
	for cases < 2000 {
		q := drawArray(r, []int{4, 16, 30, 60}[r.IntN(4)])
		if cases == 0 {
			q = square.Array{6, 25, 27, 21, 2, 19, 23, 23, 26} // 2x+1 times a sum is beyond 2^53
		}
		var l [3]chain
		nineJChains(&l, &q)
		if max(l[0].n, l[1].n, l[2].n) > mostPairs || !l[0].reaches() || !l[1].reaches() || !l[2].reaches() {
			continue
		}
		cases++
		first, last := nineJRange(&q)
		sum, bound := chainsPair(&l, first, last)
		words, negative := nineJSum(&q, new(binsum.ProductRoom))
		z := new(big.Int).SetBits(words)
		if negative != (first&1 != 0) {
			z.Neg(z)
		}
		if max(l[0].n, l[1].n, l[2].n) > mostWords {
		} else if exact, ok := chainsExact(&l, first, last); ok {
			exacts++
			f := new(big.Float).SetPrec(2000).SetFloat64(exact.Hi)
			f.Add(f, new(big.Float).SetPrec(2000).SetFloat64(exact.Lo))
			f.Sub(f, new(big.Float).SetInt(z))
			if off, _ := f.Float64(); math.Abs(off) > 2*uu*math.Abs(exact.Hi) {
				t.Fatalf("%v: %g, want %v", q, exact, z)
			}
		}
		if z.Sign() == 0 {
			continue
		}
		want := new(big.Float).SetPrec(2000).SetInt(z)
		got := new(big.Float).SetPrec(2000).SetFloat64(sum.Hi)
		got.Add(got, new(big.Float).SetPrec(2000).SetFloat64(sum.Lo))
		d, _ := got.Sub(got, want).Quo(got, want).Float64()
		if !(math.Abs(d) <= bound) {
			t.Fatalf("%v: error %g, bound %g", q, d, bound)
		}
		worst = max(worst, math.Abs(d)/bound)
	}
	t.Logf("%d sums, %d of them exact; errors up to %.3f of the bound", cases, exacts, worst)
	if worst < 1.0/128 || exacts < cases/4 {
		t.Error("the bound is far too wide, or the draw misses")
	}
}

// A product with a factor that is zero but for its error.
func TestBoundedMul(t *testing.T) {
	p, s := bounded{dd.Pair{}, 0x1p60}, bounded{dd.Pair{}, 0x1p70}
	if p.mul(&s); p.err < 0x1p130*uu || p.err > 0x1p131*uu {
		t.Errorf("error %g, want %g", p.err, 0x1p130*uu)
	}
}

// A sum that is off by nearly its bound is rounded right or refused.
func TestNineJRound(t *testing.T) {
	r := rand.New(rand.NewPCG(44, 44))
	taken, refused := [2]int{}, [2]int{}
	for range 20000 {
		q := drawArray(r, 12)
		words, negative := nineJSum(&q, new(binsum.ProductRoom))
		if len(words) == 0 {
			continue
		}
		high, low, exp := binsum.Leading(words)
		sum := dd.FromWords(high, low).Normal().Scale(exp, negative)
		kind := r.IntN(2)
		bound := []float64{0x1p-58, 0x1p-67}[kind]
		sum.Lo += float64(sum.Hi * bound * []float64{-0.99, 0.99}[r.IntN(2)])
		f, ok := nineJRound(&q, sum, bound)
		if !ok {
			refused[kind]++
			continue
		}
		taken[kind]++
		if want := nineJExact(&q).Float64(); f != want {
			t.Fatalf("%v, off by nearly %g: %g, exact %g", q, bound, f, want)
		}
	}
	if taken[0] < 1000 || taken[1] < 1000 || refused[0] < 100 {
		t.Errorf("taken %v, refused %v", taken, refused)
	}
}
