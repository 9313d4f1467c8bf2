package racah

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/internal/square"
	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// drawTetrad returns a random allowed symbol with 2j to size.
func drawTetrad(r *rand.Rand, size int) (k tetrad) {
	for {
		var j [6]rational.Half
		for i := range j {
			j[i] = rational.Halves(r.IntN(size + 1))
		}
		if k.set(j[0], j[1], j[2], j[3], j[4], j[5]) {
			return k
		}
	}
}

func newTetrad(a, b, c, d, e, f int) (k tetrad) {
	k.setMomenta(a, b, c, d, e, f)
	return k
}

// Every tier, on the same small symbols, gives the bits of the exact route.
func TestForcedTiers(t *testing.T) {
	r := rand.New(rand.NewPCG(14, 14))
	open := 0 // after 64 bits
	for range 4000 {
		k := drawTetrad(r, 12)
		want := k.exact().Float64()
		front := k.smallFront()
		one, sign1 := mantissa.FromMod64(k.Mod64())
		two, sign2 := mantissa.FromMod128(k.Mod128())
		w, ok := k.Mod192()
		three, sign3 := mantissa.FromMod192(w.High, w.Middle, w.Low)
		if one != two || two != three || sign1 != sign2 || sign2 != sign3 || !ok {
			t.Fatalf("%+v: sums %v %d, %v %d, %v %d", k, one, sign1, two, sign2, three, sign3)
		}
		if got, ok := front.Mul(one).Round(smallBelow, smallAbove, sign1); ok && want != 0 && got != want {
			t.Fatalf("%+v in 64 bits: %g, exact %g", k, got, want)
		} else if !ok {
			open++
		}
		for i, tier := range []func(bool) (float64, bool){k.fewWords, k.manyWords} {
			if got, ok := tier(false); !ok || math.Float64bits(got) != math.Float64bits(want) {
				t.Fatalf("%+v, route %d: %g, %v, exact %g", k, i, got, ok, want)
			}
		}
	}
	t.Logf("%d of 4000 open after 64 bits", open)
	if open == 0 || open > 200 {
		t.Error("too many, or none")
	}
}

// Each of the four triads may stand in front, and the columns in any order: the classical symmetries on the
// sum itself, which set would hide by its choice.
func TestEveryTriadInFront(t *testing.T) {
	cases := 0
	const top = 6
	var q [6]int
	var visit func(place int)
	visit = func(place int) {
		if place < 6 {
			for q[place] = 0; q[place] <= top; q[place]++ {
				visit(place + 1)
			}
			return
		}
		var chosen tetrad
		h := rational.Halves
		if !chosen.set(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5])) {
			return
		}
		want := chosen.exact()
		for _, p := range [][6]int{{0, 1, 2, 3, 4, 5}, {0, 4, 5, 3, 1, 2}, {3, 1, 5, 0, 4, 2}, {3, 4, 2, 0, 1, 5}} {
			a, b, c, d, e, f := q[p[0]], q[p[1]], q[p[2]], q[p[3]], q[p[4]], q[p[5]]
			for _, k := range []tetrad{newTetrad(a, b, c, d, e, f), newTetrad(b, c, a, e, f, d), newTetrad(b, a, c, e, d, f)} {
				if got := k.exact(); !got.Equal(want) {
					t.Fatalf("%v (halves): %v, as %+v: %v", q, want, k, got)
				}
				cases++
			}
		}
	}
	visit(0)
	if cases < 30000 {
		t.Errorf("only %d cases", cases)
	}
}

// momenta gives the arguments back, whatever triad is in front.
func TestMomenta(t *testing.T) {
	r := rand.New(rand.NewPCG(37, 37))
	for range 10000 {
		chosen := drawTetrad(r, 20)
		a, b, c, d, e, f := chosen.momenta()
		if k := newTetrad(a, b, c, d, e, f); k != chosen {
			t.Fatalf("%+v has momenta %d %d %d, %d %d %d: %+v", chosen, a, b, c, d, e, f, k)
		}
	}
	k := newTetrad(6, 5, 3, 4, 5, 7)
	if a, b, c, d, e, f := k.momenta(); [6]int{a, b, c, d, e, f} != [6]int{6, 5, 3, 4, 5, 7} {
		t.Errorf("momenta are %d %d %d, %d %d %d", a, b, c, d, e, f)
	}
}

// The route by rows, forced on small symbols and large ones, gives the bits of the routes by sums where it
// does not refuse, and refuses little but zeros and what is far below the largest of its row.
func TestByRow(t *testing.T) {
	r := rand.New(rand.NewPCG(38, 38))
	taken, refused, zeros := 0, 0, 0
	for _, c := range []struct{ size, draws int }{{8, 4000}, {40, 2000}, {400, 300}, {4000, 20}, {20000, 3}} {
		for range c.draws {
			k := drawTetrad(r, c.size)
			want, ok := k.manyWords(false)
			if !ok {
				want = k.exact().Float64()
			}
			f, ok := k.byRow(false)
			minus, okMinus := k.byRow(true)
			if !ok {
				refused++
				if want == 0 {
					zeros++
				}
				continue
			}
			taken++
			if math.Float64bits(f) != math.Float64bits(want) || !okMinus || minus != -f {
				t.Fatalf("%+v: %g by its row, %g for the negative, want %g", k, f, minus, want)
			}
		}
	}
	t.Logf("%d values by their rows, %d refused, %d of them zeros", taken, refused, zeros)
	if refused-zeros > taken/20 || zeros == 0 {
		t.Error("too many refused, or no zero")
	}
}

// The fronts are as accurate as they claim before they are rounded, and not much more: a smaller bound
// makes this test fail.
func TestFrontErrors(t *testing.T) {
	r := rand.New(rand.NewPCG(15, 15))
	below, above, worstLarge := 0.0, 0.0, 0.0
	for range 6000 {
		k := drawTetrad(r, []int{6, 20, 60, 80}[r.IntN(4)])
		if k.T >= dd.BinomialTops {
			continue
		}
		var f rational.Factored
		for i, t := range k.triads() {
			power := 1
			if i == 0 {
				power = -1
			}
			mulTriangle(&f, t[1], t[2], t[3], power)
		}
		want := f.SqrtTimes(1).Float(300)
		n, _ := mantissa.FromMod128(r.Uint64()>>r.IntN(64), r.Uint64()|1)
		off := verify.Off(k.smallFront().Mul(n), new(big.Float).Mul(want, verify.Big(n)))
		below, above = max(below, off), max(above, -off)
		large := k.largeFront()
		worstLarge = max(worstLarge, verify.Relative(large.Pair, large.Exp, want))
	}
	t.Logf("largest errors: %.1f above and %.1f below, of %d and %d, in M; %.1f of %.0f u^2", below, above, smallBelow, smallAbove, worstLarge*0x1p106, largeError*0x1p106)
	if below > smallBelow || above > smallAbove-2 || worstLarge > largeError { // the sum itself may lack 2 more
		t.Error("the error exceeds the bound")
	}
	if below < smallBelow/16 || above < smallAbove/4 || worstLarge < largeError/64 {
		t.Error("the bound is far too wide")
	}
}

// The routes of the 9j symbol give the bits of the exact one, and their fronts are as accurate as they
// claim, and not much more.
func TestNineJTiers(t *testing.T) {
	r := rand.New(rand.NewPCG(24, 24))
	below, above, worstLarge := 0.0, 0.0, 0.0
	cases, refused, zeros := 0, 0, 0
	for range 3000000 {
		var q square.Array
		size := []int{4, 8, 16}[r.IntN(3)]
		for i := range q {
			q[i] = r.IntN(size + 1)
		}
		if !nineJAllowed(&q) {
			continue
		}
		cases++
		var f rational.Factored
		for _, p := range &nineJTriads {
			x, y, z := q[p[0]], q[p[1]], q[p[2]]
			mulTriangle(&f, (x+y-z)/2, (y+z-x)/2, (z+x-y)/2, 1)
		}
		want := f.SqrtTimes(1).Float(300)
		n, _ := mantissa.FromMod128(r.Uint64()>>r.IntN(64), r.Uint64()|1)
		off := verify.Off(nineJSmallFront(&q).Mul(n), new(big.Float).Mul(want, verify.Big(n)))
		below, above = max(below, off), max(above, -off)
		large := nineJLargeFront(&q)
		worstLarge = max(worstLarge, verify.Relative(large.Pair, large.Exp, want))
		if size > 8 {
			continue
		}
		exact := nineJExact(&q)
		for _, order := range &nineJOrders { // every order of the rows, the shortest among them
			image := square.Array{}
			for i, row := range order.rows {
				copy(image[3*i:], q[3*row:3*row+3])
			}
			sum, negative := nineJSum(&image, new(binsum.ProductRoom))
			v := f.SqrtTimesBig(new(big.Int).SetBits(sum))
			if negative {
				v = v.Neg()
			}
			if total := q[0] + q[1] + q[2] + q[3] + q[4] + q[5] + q[6] + q[7] + q[8]; order.odd && total&2 != 0 {
				v = v.Neg()
			}
			if !v.Equal(exact) {
				t.Fatalf("%v: %v, with rows in the order %v %v", q, exact, order.rows, v)
			}
		}
		value := exact.Float64()
		if chains, ok := nineJByChains(&q); !ok || math.Float64bits(chains) != math.Float64bits(value) {
			t.Fatalf("%v: %g, %v by chains, exact %g", q, chains, ok, value)
		}
		many, okMany := nineJManyWords(&q)
		if rows, ok := nineJByRows(&q); !ok {
			refused++
			if value == 0 {
				zeros++
			}
		} else if math.Float64bits(rows) != math.Float64bits(value) {
			t.Fatalf("%v: %g by rows, exact %g", q, rows, value)
		}
		if !okMany || math.Float64bits(many) != math.Float64bits(value) {
			t.Fatalf("%v: %g, %v by many words, exact %g", q, many, okMany, value)
		}
	}
	if refused > zeros+cases/1000 || zeros == 0 {
		t.Errorf("the route by rows refused %d, %d of them zeros", refused, zeros)
	}
	t.Logf("%d symbols; largest errors: %.1f above and %.1f below, of %d and %d, in M; %.1f of %.0f u^2", cases, below, above, nineJSmallBelow, nineJSmallAbove, worstLarge*0x1p106, largeError*0x1p106)
	if cases < 2000 || below > nineJSmallBelow-1 || above > nineJSmallAbove-1 || worstLarge > largeError { // the sum itself may be 1 off
		t.Error("the error exceeds the bound, or the draw misses")
	}
	if below < nineJSmallBelow/16 || above < nineJSmallAbove/4 || worstLarge < largeError/64 {
		t.Error("the bound is far too wide")
	}
}

func nineJAllowed(q *square.Array) bool {
	for _, p := range &nineJTriads {
		if wigner.Triad(rational.Halves(q[p[0]]), rational.Halves(q[p[1]]), rational.Halves(q[p[2]])) != wigner.NonZero {
			return false
		}
	}
	return true
}

// The bound that is proved after the fact holds for rows of 6j symbols, and is not much wider than the error.
func TestRowError(t *testing.T) {
	r := rand.New(rand.NewPCG(29, 29))
	h := rational.Halves
	least, cases := math.Inf(1), 0
	for range 20000 {
		size := []int{2, 6, 20, 60, 200}[r.IntN(5)]
		var q [5]int
		for i := range q {
			q[i] = r.IntN(size + 1)
		}
		a, b, d, e, f := q[0], q[1], q[2], q[3], q[4]
		if cases == 300 || wigner.Triad(h(a), h(e), h(f)) != wigner.NonZero || wigner.Triad(h(d), h(b), h(f)) != wigner.NonZero {
			continue
		}
		rec, n, negative := newSixJRow(a, b, d, e, f)
		if n < 1 {
			continue
		}
		cases++
		members, low := make([]float64, n), make([]float64, n)
		rec.Solve(members, low, float64(f+1), negative)
		bound := rec.Error(members, low, float64(f+1), sixJGap(f))
		sum := new(big.Float).SetPrec(300)
		for i := range members {
			j := rec.First + 2*i
			v := new(big.Float).SetPrec(300).SetFloat64(members[i])
			v.Add(v, new(big.Float).SetPrec(300).SetFloat64(low[i]))
			v.Sub(v, SixJ(h(a), h(b), h(j), h(d), h(e), h(f)).Float(300))
			v.Mul(v, v)
			sum.Add(sum, v.Mul(v, new(big.Float).SetInt64(int64(j+1)*int64(f+1))))
		}
		root, _ := sum.Sqrt(sum).Float64()
		if root > bound {
			t.Fatalf("%v (halves of j1 j2 l1 l2 l3): error %g, bound %g", q, root, bound)
		}
		if bound > 0x1p-85 {
			t.Errorf("%v (halves of j1 j2 l1 l2 l3): bound %g", q, bound)
		}
		if root > 0 {
			least = min(least, bound/root)
		}
	}
	t.Logf("%d rows; the bound is at least %.0f times the error", cases, least)
	if cases < 300 || least > 200 {
		t.Error("too few rows, or the bound is far too wide")
	}
}

// A solution with an admixture of a neighboring eigenvector, l3-1 or l3+1, which the residual must show
// through the gap: the bound is the admixture at least, and for the nearer of the two not much more.
func TestRowErrorOfAdmixture(t *testing.T) {
	const admixture = 0x1p-40
	cases := 0
	const k = 9
	for n := range k * k * k * k {
		a, b, d, e := n%k, n/k%k, n/k/k%k, n/k/k/k
		if (a+b+d+e)&1 != 0 {
			continue
		}
		lowest, highest := max(distance(a, e), distance(b, d)), min(a+e, b+d)
		for f := lowest; f <= highest; f += 2 {
			for _, other := range []int{f - 2, f + 2} {
				if other < lowest || other > highest {
					continue
				}
				r, n, negative := newSixJRow(a, b, d, e, f)
				v, low := make([]float64, n), make([]float64, n)
				r.Solve(v, low, float64(f+1), negative)
				next, _, negative := newSixJRow(a, b, d, e, other)
				mixed := make([]float64, n)
				next.Solve(mixed, nil, float64(f+1), negative) // of the same length, in the weight of f
				for i := range v {
					v[i] += admixture * mixed[i]
				}
				nearer := other < f || f < 2
				if bound := r.Error(v, low, float64(f+1), sixJGap(f)); bound < admixture*(1-0x1p-10) || nearer && bound > 1.02*admixture {
					t.Fatalf("%d %d %d %d %d (halves), with %d: bound %g for an admixture of %g", a, b, d, e, f, other, bound, admixture)
				}
				cases++
			}
		}
	}
	if cases < 5000 {
		t.Errorf("only %d cases", cases)
	}
}
