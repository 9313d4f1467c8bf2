package racah

import (
	"math/big"
	"math/bits"

	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/square"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// NineJ returns the exact Wigner 9j symbol, its arguments given row by row:
//
//	{ a b c }
//	{ d e f } = Σ_x (-1)^(2x) (2x+1) { a b c } { d e f } { g h i }
//	{ g h i }                        { f i x } { b x h } { x a d }
//
// which is DLMF (34.6.2) for the transposed symbol. The three 6j symbols are written as in [SixJ], with
// the triads (a i x), (b x f) and (x h d) in front of their sums. Then all triangle coefficients that
// depend on x cancel, and those of the rows and columns of the 9j symbol stand before a sum of integers.
//
// It is zero where a row or a column breaks a selection rule; [CheckNineJ] says which. It panics with
// *rational.ArgumentError for a negative argument.
func NineJ(a, b, c, d, e, f, g, h, i rational.Half) rational.Surd {
	var t square.Array
	if !nineJArray(&t, a, b, c, d, e, f, g, h, i) {
		forbiddenNineJ("racah.NineJ", a, b, c, d, e, f, g, h, i)
		return rational.Surd{}
	}
	return nineJExact(&t)
}

// CheckNineJ tells why the 9j symbol of [NineJ] vanishes, or that it does not: the first row or column
// that breaks a selection rule, the exchange of lines that changes its sign, or that the zero is
// accidental, for which it computes the symbol. The error, a *rational.ArgumentError, names a
// malformed argument; CheckNineJ does not panic.
func CheckNineJ(a, b, c, d, e, f, g, h, i rational.Half) (wigner.Verdict, error) {
	q := nineJ{"racah.CheckNineJ", [9]rational.Half{a, b, c, d, e, f, g, h, i}}
	v, err := q.rule()
	if err != nil {
		return v, err
	}
	if v.Zero() {
		return v, nil
	}
	var t square.Array
	nineJArray(&t, a, b, c, d, e, f, g, h, i)
	if antisymmetric(&t) {
		return wigner.Verdict{Rule: wigner.Symmetry}, nil
	}
	if nineJExact(&t).IsZero() {
		return wigner.Verdict{Rule: wigner.Accidental}, nil
	}
	return wigner.Verdict{}, nil
}

// nineJ is a 9j symbol by its arguments, for whoever must tell what is wrong with them.
type nineJ struct {
	fn string
	j  [9]rational.Half
}

// nineJTriads are the places of the rows and columns.
var nineJTriads = [6][3]int{{0, 1, 2}, {3, 4, 5}, {6, 7, 8}, {0, 3, 6}, {1, 4, 7}, {2, 5, 8}}

var nineJNames = []string{"a", "b", "c", "d", "e", "f", "g", "h", "i"}

// rule returns the first selection rule that is broken, or an error for a malformed argument.
func (q *nineJ) rule() (wigner.Verdict, *rational.ArgumentError) {
	return checkTriads(q.fn, nineJNames, q.j[:], nineJTriads[:])
}

// forbiddenNineJ panics for a malformed argument.
func forbiddenNineJ(fn string, a, b, c, d, e, f, g, h, i rational.Half) {
	q := nineJ{fn, [9]rational.Half{a, b, c, d, e, f, g, h, i}}
	if _, err := q.rule(); err != nil {
		panic(err)
	}
}

// nineJArray sets t to twice the arguments, in place: a copy of what was just written has to wait. It returns
// false for a symbol that a selection rule forbids and for a negative argument.
func nineJArray(t *square.Array, a, b, c, d, e, f, g, h, i rational.Half) bool {
	t[0], t[1], t[2] = a.Twice(), b.Twice(), c.Twice()
	t[3], t[4], t[5] = d.Twice(), e.Twice(), f.Twice()
	t[6], t[7], t[8] = g.Twice(), h.Twice(), i.Twice()
	sign, odd := int64(0), int64(0)
	triad := func(x, y, z int) {
		// 64 bits hold the sums of Halves on every platform.
		s := int64(x) + int64(y) + int64(z)
		sign |= (s - 2*int64(x)) | (s - 2*int64(y)) | (s - 2*int64(z))
		odd |= s
	}
	triad(t[0], t[1], t[2])
	triad(t[3], t[4], t[5])
	triad(t[6], t[7], t[8])
	triad(t[0], t[3], t[6])
	triad(t[1], t[4], t[7])
	triad(t[2], t[5], t[8])
	return sign >= 0 && odd&1 == 0
}

// antisymmetric reports whether an exchange of equal rows or columns changes the sign, so that the symbol is zero.
func antisymmetric(t *square.Array) bool {
	total := t[0] + t[1] + t[2] + t[3] + t[4] + t[5] + t[6] + t[7] + t[8]
	return total&2 != 0 && t.LinesEqual()
}

// nineJOrders are the permutations of the rows, with whether they are odd.
var nineJOrders = [6]struct {
	rows [3]int
	odd  bool
}{
	{[3]int{0, 1, 2}, false}, {[3]int{1, 2, 0}, false}, {[3]int{2, 0, 1}, false},
	{[3]int{1, 0, 2}, true}, {[3]int{0, 2, 1}, true}, {[3]int{2, 1, 0}, true},
}

// nineJShortest returns the symbol with its rows in the order in which its sum has the fewest terms, and
// whether that changes its sign: an odd permutation does, where the sum of all arguments is odd. The search
// pays for long sums only.
func nineJShortest(t *square.Array) (best square.Array, negative bool) {
	fewest := -1
	total := 0
	for _, twice := range t {
		total += twice
	}
	for _, order := range &nineJOrders {
		p, q, r := 3*order.rows[0], 3*order.rows[1], 3*order.rows[2]
		first := max(distance(t[p], t[r+2]), distance(t[p+1], t[q+2]), distance(t[q], t[r+1]))
		last := min(t[p]+t[r+2], t[p+1]+t[q+2], t[q]+t[r+1])
		if terms := last - first; fewest < 0 || terms < fewest {
			fewest = terms
			best = square.Array{t[p], t[p+1], t[p+2], t[q], t[q+1], t[q+2], t[r], t[r+1], t[r+2]}
			negative = order.odd && total&2 != 0
		}
	}
	return best, negative
}

// nineJExact returns the value of an allowed symbol, from twice its arguments.
func nineJExact(t *square.Array) rational.Surd {
	var f rational.Factored
	for _, p := range &nineJTriads {
		x, y, z := t[p[0]], t[p[1]], t[p[2]]
		mulTriangle(&f, (x+y-z)/2, (y+z-x)/2, (z+x-y)/2, 1)
	}
	if z, ok := nineJWord(t); ok {
		return f.SqrtTimes(z)
	}
	image, negative := nineJShortest(t)
	sum, below := nineJSum(&image, new(binsum.ProductRoom))
	z := new(big.Int).SetBits(sum)
	if negative != below {
		z.Neg(z)
	}
	return f.SqrtTimesBig(z)
}

// nineJRange returns twice the first and the last x of the sum.
func nineJRange(t *square.Array) (first, last int) {
	return max(distance(t[0], t[8]), distance(t[1], t[5]), distance(t[3], t[7])), min(t[0]+t[8], t[1]+t[5], t[3]+t[7])
}

// nineJFactors sets k to the three 6j symbols of the sum, x given as twice its value.
func nineJFactors(k *[3]tetrad, t *square.Array, x int) {
	a, b, c, d, e, f, g, h, i := t[0], t[1], t[2], t[3], t[4], t[5], t[6], t[7], t[8]
	k[0].setMomenta(a, i, x, f, b, c) // { a b c; f i x } with its triad (a i x) in front
	k[1].setMomenta(b, x, f, d, e, h) // { d e f; b x h } with (b x f)
	k[2].setMomenta(x, h, d, g, a, i) // { g h i; x a d } with (x h d)
}

// nineJSum returns |Σ_x (2x+1) S1 S2 S3|, S1 to S3 being the sums in the three 6j symbols, and whether
// (-1)^(2x) times the sum is negative. It computes in room where that is wide enough.
func nineJSum(t *square.Array, room *binsum.ProductRoom) (sum []big.Word, negative bool) {
	first, last := nineJRange(t)
	sum, negative = binsum.SumOfProducts((last-first)/2+1, func(i int) (w uint, s [3]binsum.Quadruple) {
		var k [3]tetrad
		x := first + 2*i
		nineJFactors(&k, t, x)
		return uint(x + 1), [3]binsum.Quadruple{k[0].Quadruple, k[1].Quadruple, k[2].Quadruple}
	}, room)
	return sum, len(sum) > 0 && negative != (first&1 != 0)
}

// nineJWord returns the same sum where no product in it leaves a word; ok is false elsewhere.
func nineJWord(t *square.Array) (z int64, ok bool) {
	first, last := nineJRange(t)
	room := 63 - bits.Len(uint((last+1)*((last-first)/2+1))) // for the product of three sums
	var k [3]tetrad
	for x := first; x <= last; x += 2 {
		term, left := int64(x+1), room
		nineJFactors(&k, t, x)
		for i := range k {
			v, ok := k[i].Word()
			if left -= bits.Len64(uint64(max(v, -v))); !ok || left < 0 {
				return 0, false
			}
			term *= v
		}
		z += term
	}
	if first&1 != 0 {
		z = -z
	}
	return z, true
}

func distance(a, b int) int { return max(a-b, b-a) }
