package racah_test

import (
	"math"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/internal/verify"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// compareFloats demands the bits of the exact route, rounded, of the 6j symbol and of the W coefficient
// of the same arguments. It returns the 6j symbol.
func compareFloats(t *testing.T, q [6]int) float64 {
	t.Helper()
	a, b, c, d, e, f := h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5])
	got, want := racah.SixJFloat(a, b, c, d, e, f), racah.SixJ(a, b, c, d, e, f).Float64()
	if math.Float64bits(got) != math.Float64bits(want) {
		t.Fatalf("6j %v (halves) = %g, exact %g", q, got, want)
	}
	w, want := racah.WFloat(a, b, e, d, c, f), racah.W(a, b, e, d, c, f).Float64()
	if math.Float64bits(w) != math.Float64bits(want) {
		t.Fatalf("W of 6j %v (halves) = %g, exact %g", q, w, want)
	}
	return got
}

// Every symbol with 2j to 14, bit for bit.
func TestRoundedExhaustive(t *testing.T) {
	top := 14
	if testing.Short() {
		top = 8
	}
	racah.Fallbacks()
	values, zeros := 0, 0
	sixJs(top, func(q [6]int) {
		values++
		if compareFloats(t, q) == 0 {
			zeros++
		}
	})
	t.Logf("%d symbols, %d of them zero, and as many coefficients; %d by the exact route", values, zeros, racah.Fallbacks())
	if zeros == 0 {
		t.Error("no accidental zero")
	}
}

// Random symbols of every size at which the route changes and beyond, with nearly stretched ones.
func TestRoundedRandom(t *testing.T) {
	r := rand.New(rand.NewPCG(13, 13))
	between := func(lo, hi int) int { return lo + r.IntN(hi-lo+1) }
	// couple returns a momentum to which a and b couple, one time in two close to the largest or smallest.
	couple := func(a, b int) int {
		n := min(a, b)
		switch r.IntN(4) {
		case 0:
			return a + b - 2*between(0, min(3, n))
		case 1:
			return max(a-b, b-a) + 2*between(0, min(3, n))
		}
		return max(a-b, b-a) + 2*between(0, n)
	}
	for _, c := range []struct{ size, draws int }{{4, 20000}, {8, 20000}, {14, 30000}, {20, 30000}, {32, 30000}, {44, 20000}, {65, 20000}, {100, 10000}, {130, 4000}, {200, 1000}, {1000, 40}, {10000, 8}} {
		racah.Fallbacks()
		values, nonzero, tiny := 0, 0, 0
		for range published.Effort(t, c.draws) {
			// j1, j2 -> j3 and l1; then l2 from j3 and l1, l3 from j1 and l2, and the last triad by luck.
			a, b, d := between(0, c.size), between(0, c.size), between(0, c.size)
			cc := couple(a, b)
			e := couple(d, cc)
			f := couple(a, e)
			if wigner.Triad(h(d), h(b), h(f)) != wigner.NonZero {
				continue
			}
			values++
			v := math.Abs(compareFloats(t, [6]int{a, b, cc, d, e, f}))
			if v != 0 {
				nonzero++
			}
			if v != 0 && v < 1e-30 {
				tiny++
			}
		}
		t.Logf("j to about %4d: %6d symbols and coefficients, %6d not zero, %d below 1e-30, %d by the exact route", c.size/2, values, nonzero, tiny, racah.Fallbacks())
		if values < published.Effort(t, c.draws)/4 || nonzero < values/2 {
			t.Errorf("%d of %d values not zero: the draw misses", nonzero, values)
		}
	}
}

// {j j 2j; j j 2j}, with four stretched triads, falls as one over a binomial, through 1e-300, the
// subnormal numbers and out of the range of float64; its neighbors with a smaller last argument too.
func TestRoundedTiny(t *testing.T) {
	racah.Fallbacks()
	small, subnormal, underflow, values := 0, 0, 0, 0
	for n := 480; n <= 560; n++ {
		for k := range 2 {
			v := math.Abs(compareFloats(t, [6]int{n, n, 2 * n, n, n, 2*n - 2*k}))
			values++
			switch {
			case v == 0:
				underflow++
			case v < 0x1p-1022:
				subnormal++
			case v < 1e-300:
				small++
			}
		}
	}
	t.Logf("%d symbols and coefficients, %d below 1e-300, %d subnormal, %d below them, %d by the exact route", values, small, subnormal, underflow, racah.Fallbacks())
	if small == 0 || subnormal == 0 || underflow == 0 {
		t.Error("the draw misses a kind")
	}
}

// Selection rules and malformed arguments are those of the exact functions.
func TestFloatRules(t *testing.T) {
	for n := range 5 * 5 * 5 * 5 * 5 * 5 {
		var q [6]rational.Half
		for i := range q {
			q[i] = h(n%5 - 1)
			n /= 5
		}
		var exact, w rational.Surd
		var got, gotW float64
		bad := verify.Recovered(func() { exact = racah.SixJ(q[0], q[1], q[2], q[3], q[4], q[5]) })
		badFloat := verify.Recovered(func() { got = racah.SixJFloat(q[0], q[1], q[2], q[3], q[4], q[5]) })
		verify.Recovered(func() { w = racah.W(q[0], q[1], q[2], q[3], q[4], q[5]) })
		badW := verify.Recovered(func() { gotW = racah.WFloat(q[0], q[1], q[2], q[3], q[4], q[5]) })
		if (bad == nil) != (badFloat == nil) || (bad == nil) != (badW == nil) {
			t.Fatalf("%v: panics %v, %v, %v", q, bad, badFloat, badW)
		}
		if bad == nil && (got != exact.Float64() || gotW != w.Float64()) {
			t.Fatalf("%v: %g and %g, exact %v and %v", q, got, gotW, exact, w)
		}
		if badFloat != nil && badFloat.Func != "racah.SixJFloat" || badW != nil && badW.Func != "racah.WFloat" {
			t.Fatalf("%v: panics name %s and %s", q, badFloat.Func, badW.Func)
		}
	}
}

// Published values pin sign and order of the arguments: {1 2 3; 2 1 2} and its like have no symmetry that
// would hide an exchange.
func TestFloatValues(t *testing.T) {
	for _, row := range published.Rows(t, "published", "sixj_ninej_values.csv") {
		if row.Text("kind") != "6j" {
			continue
		}
		q := row.Halves("a", "b", "c", "d", "e", "f")
		if got, want := racah.SixJFloat(q[0], q[1], q[2], q[3], q[4], q[5]), row.SignedRoot().Float64(); got != want {
			t.Errorf("%g, published %v", got, row)
		}
	}
}

// No allocation while the triads add up to 300 at most.
func TestFloatAllocations(t *testing.T) {
	for _, size := range []int{1, 8, 30, 50, 100} {
		sets := drawSixJ(200, size)
		sets = append(sets, [6]rational.Half{rational.Int(5), rational.Int(5), rational.Int(3), rational.Int(3), rational.Int(3), rational.Int(3)})
		if n := testing.AllocsPerRun(2, func() {
			for _, q := range sets {
				racah.SixJFloat(q[0], q[1], q[2], q[3], q[4], q[5])
			}
		}); n != 0 {
			t.Errorf("j = %d: %v allocations", size, n)
		}
	}
}
