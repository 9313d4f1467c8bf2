package racah

import (
	"math/big"

	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/square"
	"example.org/couplet/rational"
)

// NineJFloat returns the float64 nearest to the 9j symbol of [NineJ], to even on a tie, whatever its size.
// Zeros and panics are those of NineJ. It allocates nothing while every argument is at most 8.
//
// Time grows like the square of the size times the length of the sum of [NineJ].
func NineJFloat(a, b, c, d, e, f, g, h, i rational.Half) float64 {
	t, ok := nineJArray(a, b, c, d, e, f, g, h, i)
	if !ok {
		forbiddenNineJ("racah.NineJFloat", a, b, c, d, e, f, g, h, i)
		return 0
	}
	return nineJFloat(&t)
}

// nineJSmallError is the bound on the relative error before rounding, derived at nineJSmallFront; that of
// the long route is largeError.
const nineJSmallError = 0x1p-96

// nineJFloat returns the value of an allowed symbol: the six triangle coefficients in double-double times
// the integer sum, which is exact, rounded where the error bound allows, and by the exact route elsewhere.
func nineJFloat(t *square.Array) float64 {
	f, ok := nineJFewWords(t)
	if !ok {
		f, ok = nineJManyWords(t)
	}
	if ok {
		return f
	}
	fallbacks.Add(1)
	return nineJExact(t).Float64()
}

// nineJFewWords is the route for symbols whose sum fits into two words; ok is false for others too. No
// symbol exceeds 1, by DLMF (34.7.2), so that the sum is at most 1/front.
func nineJFewWords(t *square.Array) (f float64, ok bool) {
	front, ok := nineJSmallFront(t)
	var s dd.Pair
	switch {
	case !ok || front.Hi < 0x1p-126:
		return 0, false
	case front.Hi > 0x1p-62:
		var sum uint64
		sum, ok = nineJMod64(t)
		s = dd.FromInt64(int64(sum))
	default:
		var high, low uint64
		high, low, ok = nineJMod128(t)
		s = dd.FromMod128(high, low)
	}
	if !ok {
		return 0, false
	}
	if s.Hi == 0 {
		return 0, true
	}
	return front.Mul(s).Round(nineJSmallError)
}

// nineJSmallFront returns the product of the six triangle coefficients, where the tables hold them.
//
// In units of u^2 the coefficients, 3-pairs, have errors of 45 each: two of 19 and 7 for the product. Three
// products of 3-pairs cost 25 each, 7*7 costs 85, 15*7 costs 157, and the product with the sum, 23*3, 125
// with 2 more for the sum itself (dd.Pair.Mul): 716 in all with the 2 of the rounding, below 2^10 u^2. That
// is why nineJSmallError is wider than smallError.
func nineJSmallFront(t *square.Array) (front dd.Pair, ok bool) {
	d := dd.SqrtBinomials()
	var deltas [6]dd.Pair
	for i, p := range &nineJTriads {
		j := (t[p[0]] + t[p[1]] + t[p[2]]) / 2
		if j >= dd.BinomialTops {
			return dd.Pair{}, false
		}
		deltas[i] = delta(d, j, t[p[0]], t[p[1]])
	}
	return deltas[0].Mul(deltas[1]).Mul(deltas[2].Mul(deltas[3])).Mul(deltas[4].Mul(deltas[5])), true
}

// nineJMod64 returns the sum of nineJSum modulo 2^64, where the tables of binomials reach far enough.
func nineJMod64(t *square.Array) (sum uint64, ok bool) {
	first, last := nineJRange(t)
	var s binsum.Quadruple
	for x := first; x <= last; x += 2 {
		term := uint64(x + 1)
		for _, k := range nineJFactors(t, x) {
			k.sum(&s)
			if !s.Fits() {
				return 0, false
			}
			term *= s.Mod64()
		}
		sum += term
	}
	if first&1 != 0 {
		sum = -sum
	}
	return sum, true
}

// nineJMod128 returns the sum of nineJSum modulo 2^128, where the tables of binomials reach far enough.
func nineJMod128(t *square.Array) (high, low uint64, ok bool) {
	first, last := nineJRange(t)
	var s binsum.Quadruple
	for x := first; x <= last; x += 2 {
		h, l := uint64(0), uint64(x+1)
		for _, k := range nineJFactors(t, x) {
			k.sum(&s)
			if !s.Fits() {
				return 0, 0, false
			}
			if v, ok := s.Word(); ok {
				h, l = binsum.Mul128(h, l, uint64(v>>63), uint64(v))
			} else {
				sh, sl := s.Mod128()
				h, l = binsum.Mul128(h, l, sh, sl)
			}
		}
		high, low = binsum.Add128(high, low, h, l)
	}
	if first&1 != 0 {
		high, low = binsum.Negate128(high, low)
	}
	return high, low, true
}

// nineJManyWords is the route for sums of any length.
func nineJManyWords(t *square.Array) (f float64, ok bool) {
	image, negative := nineJShortest(t)
	z := nineJSum(new(big.Int), &image)
	if z.Sign() == 0 {
		return 0, true
	}
	high, low, exp := binsum.Leading(z.Bits())
	s := dd.Scaled{Pair: dd.FromWords(high, low).Normal().Scale(0, negative != (z.Sign() < 0)), Exp: exp}
	return nineJLargeFront(t).Mul(s).Round(largeError)
}

// nineJLargeFront returns the same front from factorials: 24 factors with an error of u^2, and 24
// multiplications, that of the sum among them, with 5 u^2. With 2 for the sum and 2 for the rounding that is
// below 2^8 u^2 = 2^-98.
func nineJLargeFront(t *square.Array) dd.Scaled {
	top := 0
	for _, p := range &nineJTriads {
		top = max(top, (t[p[0]]+t[p[1]]+t[p[2]])/2+1)
	}
	table := dd.Factorials(top)
	z := dd.Scaled{Pair: dd.Pair{Hi: 1}}
	for _, p := range &nineJTriads {
		x, y, w := t[p[0]], t[p[1]], t[p[2]]
		z = z.Mul(table.Root[(x+y-w)/2]).Mul(table.Root[(y+w-x)/2]).Mul(table.Root[(w+x-y)/2]).Mul(table.Inverse[(x+y+w)/2+1])
	}
	return z
}
