package racah

import (
	"math"
	"slices"

	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/internal/row"
	"example.org/couplet/internal/square"
	"example.org/couplet/rational"
)

// NineJFloat returns the float64 nearest to the 9j symbol of [NineJ], to even on a tie, whatever its size.
// Zeros and panics are those of NineJ; a value below the subnormal numbers becomes a zero with its sign. Time
// grows like the size where no argument is above 2^23 and the symbol is neither an accidental zero, nor too
// close to a rounding boundary, nor far below the terms of its sum, and like that of NineJ elsewhere. It
// allocates nothing while every argument is at most 100, zeros included, but for tables that are built by the
// first calls, and for what only the exact route can round, of which no case is known.
func NineJFloat(a, b, c, d, e, f, g, h, i rational.Half) float64 {
	var t square.Array
	if !nineJArray(&t, a, b, c, d, e, f, g, h, i) {
		forbiddenNineJ("racah.NineJFloat", a, b, c, d, e, f, g, h, i)
		return 0
	}
	return nineJFloat(&t)
}

// nineJFloat returns the value of an allowed symbol, rounded where the error bound allows, and by the exact
// route elsewhere.
func nineJFloat(t *square.Array) float64 {
	if antisymmetric(t) {
		return 0
	}
	f, ok := nineJByChains(t)
	if !ok {
		f, ok = nineJByRows(t)
	}
	if !ok {
		f, ok = nineJManyWords(t)
	}
	if ok {
		return f
	}
	fallbacks.Add(1)
	return nineJExact(t).Float64()
}

// Limits to the lengths of chains that are summed up exactly, and of any; and, in halves, to the sum of the
// momenta where it is tried exactly: a calibration, most succeed below and few above.
const (
	mostWords    = 24
	mostPairs    = 64
	exactMomenta = 108
)

// nineJByChains is the route for symbols whose triads are in the tables: the sum over x, from the chains of
// the three 6j symbols, times the six triangle coefficients. ok is false where the rounding stays open: for
// zeros, of those that are not summed up exactly, and close to boundaries.
func nineJByChains(t *square.Array) (f float64, ok bool) {
	var chains [3]chain
	nineJChains(&chains, t)
	longest, largest := 0, 0
	for k := range chains {
		l := &chains[k]
		if !l.reaches() {
			return 0, false
		}
		longest = max(longest, l.n)
		largest = max(largest, l.p+l.q+l.r+l.s+l.t)
	}
	if longest > mostPairs {
		return 0, false
	}
	first, last := nineJRange(t)
	sum, bound, ok := dd.Pair{}, 0.0, false
	if longest <= mostWords && largest <= exactMomenta {
		sum, ok = chainsExact(&chains, first, last)
	}
	if !ok {
		sum, bound = chainsPair(&chains, first, last)
	}
	if sum.Hi == 0 {
		return 0, ok
	}
	if !(bound < 0x1p-58) {
		return 0, false
	}
	return nineJRound(t, sum.Scale(0, first&1 != 0), bound)
}

// nineJRound rounds the product of the triangle coefficients and a sum that is off by bound, relative to it, at
// the most.
func nineJRound(t *square.Array, sum dd.Pair, bound float64) (f float64, ok bool) {
	sum = sum.Normal()
	if bound < 0x1p-66 { // 1/4 in M
		n := mantissa.FromPair(sum.Scale(0, sum.Hi < 0))
		f, ok = nineJSmallFront(t).Mul(n).Round(nineJSmallBelow, nineJSmallAbove, math.Float64bits(sum.Hi)>>63)
		if ok {
			return f, ok
		}
	}
	return nineJLargeFront(t).Mul(dd.Scaled{Pair: sum}).Round(bound + largeError)
}

// nineJChains sets the chains of the three symbols of nineJFactors.
func nineJChains(l *[3]chain, t *square.Array) {
	l[0].set(t[0], t[8], t[5], t[1], t[2]) // { a b c; f i x }
	l[1].set(t[1], t[5], t[3], t[7], t[4]) // { d e f; b x h }
	l[2].set(t[7], t[3], t[0], t[8], t[6]) // { g h i; x a d }
}

// chainsExact returns Σ (2x+1) S1 S2 S3; ok is false where a sum or the total is too large.
func chainsExact(chains *[3]chain, first, last int) (sum dd.Pair, ok bool) {
	var sums [3][mostWords]float64
	for k := range chains {
		l := &chains[k]
		if !l.words(sums[k][:l.n]) {
			return dd.Pair{}, false
		}
	}
	i, j, k := (first-chains[0].first)/2, (first-chains[1].first)/2, (first-chains[2].first)/2
	var high, low uint64
	magnitude := 0.0
	for x := first; x <= last; x += 2 {
		// The first product is below 2^57, as x+1 is below 2^8.
		p, q, r := int64(sums[0][i])*int64(x+1), int64(sums[1][j]), int64(sums[2][k])
		h, l := binsum.MulInt64(p, q)
		h, l = binsum.Mul128(h, l, uint64(r>>63), uint64(r))
		high, low = binsum.Add128(high, low, h, l)
		magnitude += math.Abs(float64(float64(p) * float64(q) * float64(r)))
		i, j, k = i+1, j+1, k+1
	}
	return dd.FromMod128(high, low), magnitude < 0x1p126
}

// chainsPair returns the same sum in double-double and a bound of its relative error: the roundings of the
// sum add 10 of Σ |(2x+1) S1 S2 S3| for each term.
func chainsPair(chains *[3]chain, first, last int) (sum dd.Pair, bound float64) {
	var product, other [mostPairs]bounded
	n := (last-first)/2 + 1
	l := &chains[0]
	l.pairs(product[:l.n])
	terms := product[(first-l.first)/2:][:n]
	for k := range chains[1:] {
		l := &chains[1+k]
		l.pairs(other[:l.n])
		factors := other[(first-l.first)/2:][:n]
		for i := range terms {
			terms[i].mul(&factors[i])
		}
	}
	var total row.Sum
	for i := range terms {
		w := float64(first + 2*i + 1)
		total.Add(terms[i].Pair, w)
		bound += float64(w * terms[i].err)
	}
	bound += float64(float64(10*n) * total.Magnitude)
	return total.Value, float64(1.01*uu*bound) / math.Abs(total.Value.Hi) // 1.01 for the roundings here
}

// How far M of the product of nineJSmallFront and the sum may be above and below that of the true value. Twelve
// entries of tables leave 1 each and so does the sum, in either direction; twelve products, which are rounded
// down, 2 each; and 1 is for all that is of second order, and for the bound of the sum.
const (
	nineJSmallBelow = 13 + 1
	nineJSmallAbove = 13 + 2*12 + 1
)

// nineJSmallFront returns the product of the six triangle coefficients of a symbol whose triads are below
// dd.BinomialTops.
func nineJSmallFront(t *square.Array) mantissa.Number {
	d := mantissa.SqrtBinomials()
	triad := func(x, y, z int) mantissa.Number {
		j := (x + y + z) >> 1
		return delta(d, j, j-x, x, j-y)
	}
	rows := triad(t[0], t[1], t[2]).Mul(triad(t[3], t[4], t[5])).Mul(triad(t[6], t[7], t[8]))
	return rows.Mul(triad(t[0], t[3], t[6]).Mul(triad(t[1], t[4], t[7])).Mul(triad(t[2], t[5], t[8])))
}

// rowMembers is how long rows may be without allocation: 2j to 200.
const rowMembers = 201

// nineJByRows computes the rows over x of the three 6j symbols in the sum of [NineJ], each with a bound that is
// proved after the fact, and adds up their products in double-double. ok is false where that leaves the
// rounding open.
//
// With p, q, r the symbols, and e the bound of [row.Recurrence.Error] for p, whose weight is w,
// Schwarz's inequality bounds what the error of p adds by e/sqrt(w) sqrt(Σ (2x+1) q^2 r^2), and for q and r
// alike. The roundings of a term and of the sums add 40 u^2 + 6n u^2 of Σ (2x+1) |pqr| at the most.
func nineJByRows(t *square.Array) (f float64, ok bool) {
	if slices.Max(t[:]) > argument.MostInRow {
		return 0, false
	}
	a, b, c, d, e, ff, g, h, i := t[0], t[1], t[2], t[3], t[4], t[5], t[6], t[7], t[8]
	// { a b c; f i x } = { a i x; f b c }, { d e f; b x h } = { b f x; d h e }, { g h i; x a d } = { a i x; h d g }
	arguments := [3][5]int{{a, i, ff, b, c}, {b, ff, d, h, e}, {a, i, h, d, g}}
	first, last := nineJRange(t)
	n := (last-first)/2 + 1
	var stack [6 * rowMembers]float64
	buffer := stack[:]
	var x, low [3][]float64
	var bounds, weights [3]float64
	for k, q := range &arguments {
		r, length, negative := newSixJRow(q[0], q[1], q[2], q[3], q[4])
		if 2*length > len(buffer) {
			buffer = make([]float64, 2*length)
		}
		x[k], low[k] = buffer[:length], buffer[length:2*length]
		buffer = buffer[2*length:]
		weights[k] = float64(q[4] + 1)
		r.Solve(x[k], low[k], weights[k], negative)
		bounds[k] = r.Error(x[k], low[k], weights[k], sixJGap(q[4]))
		skip := (first - r.First) / 2
		x[k], low[k] = x[k][skip:skip+n], low[k][skip:skip+n]
	}
	var sum row.Sum
	var others [3]float64 // Σ (2x+1) times the squares of the other two
	for k := range n {
		p, q, r := dd.Pair{Hi: x[0][k], Lo: low[0][k]}, dd.Pair{Hi: x[1][k], Lo: low[1][k]}, dd.Pair{Hi: x[2][k], Lo: low[2][k]}
		w := float64(first + 2*k + 1)
		sum.Add(p.Mul(q).Mul(r), w)
		qr, rp, pq := q.Hi*r.Hi, r.Hi*p.Hi, p.Hi*q.Hi
		others[0] += float64(w * qr * qr)
		others[1] += float64(w * rp * rp)
		others[2] += float64(w * pq * pq)
	}
	bound := float64(40+6*n) * uu * sum.Magnitude
	for k := range bounds {
		bound += float64(bounds[k] / math.Sqrt(weights[k]) * math.Sqrt(others[k]))
	}
	bound = float64(bound * 1.01 / math.Abs(sum.Value.Hi)) // for the roundings here and the second order
	if !(bound < 0x1p-58) {
		return 0, false
	}
	return sum.Value.Scale(0, first&1 != 0).Round(bound + 0x1p-100)
}

// nineJManyWords is the route for sums of any length.
func nineJManyWords(t *square.Array) (f float64, ok bool) {
	if nineJTop(t) > dd.MostFactorials {
		return 0, false
	}
	image, negative := nineJShortest(t)
	var room binsum.ProductRoom
	sum, below := nineJSum(&image, &room)
	if len(sum) == 0 {
		return 0, true
	}
	high, low, exp := binsum.Leading(sum)
	s := dd.Scaled{Pair: dd.FromWords(high, low).Normal().Scale(0, negative != below), Exp: exp}
	return nineJLargeFront(t).Mul(s).Round(largeError)
}

// nineJTop returns the largest number whose factorial is in the symbol.
func nineJTop(t *square.Array) int {
	top := 0
	for _, p := range &nineJTriads {
		top = max(top, (t[p[0]]+t[p[1]]+t[p[2]])/2+1)
	}
	return top
}

// nineJLargeFront returns the same front from factorials: 24 factors with an error of u^2, and 24
// multiplications, that of the sum among them, with 5 u^2. With 2 for the sum and 2 for the rounding that is
// below 2^8 u^2 = 2^-98.
func nineJLargeFront(t *square.Array) dd.Scaled {
	table := dd.Factorials(nineJTop(t))
	z := dd.Scaled{Pair: dd.Pair{Hi: 1}}
	for _, p := range &nineJTriads {
		x, y, w := t[p[0]], t[p[1]], t[p[2]]
		z = z.Mul(table.Root[(x+y-w)/2]).Mul(table.Root[(y+w-x)/2]).Mul(table.Root[(w+x-y)/2]).Mul(table.Inverse[(x+y+w)/2+1])
	}
	return z
}
