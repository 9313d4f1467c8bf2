package racah

import (
	"math"

	"example.org/couplet/internal/dd"
)

// chain is the recurrence in x for the sums S(x) of the 6j symbols {p q x; r s t}, with the triad (p q x)
// in front as in [SixJ]. It is DLMF (34.5.11) in the form of newSixJRow, of which the roots are gone with the
// triangle coefficients that S does not have:
//
//	J f(J+2) S(x+1) + d(J) S(x) + (J+2) g(J) S(x-1) = 0,    J = 2x
//	f(J) = (J^2-C) (B-J^2),    g(J) = (J^2-A) (D-J^2)
//
// All of these are integers, S too, and at both ends S is a product of binomials.
type chain struct {
	p, q, r, s, t int // twice the momenta
	first, n      int // J of the first sum, and how many there are
	a, b, c, d    float64
	c0, c1        float64
}

// set starts the chain of {p q x; r s t}, from twice the momenta. While these are below 2^8 all numbers in the
// recurrence are below 2^52.
func (l *chain) set(p, q, r, s, t int) {
	casimir := func(n int) int { return n * (n + 2) }
	square := func(n int) float64 { return float64(n * n) }
	l.p, l.q, l.r, l.s, l.t = p, q, r, s, t
	l.first = max(distance(p, q), distance(r, s))
	l.n = (min(p+q, r+s)-l.first)>>1 + 1
	l.a, l.b = square(p-q), square(p+q+2)
	l.c, l.d = square(r-s), square(r+s+2)
	p, q, r, s = casimir(p), casimir(q), casimir(r), casimir(s)
	l.c0, l.c1 = float64((p-q)*(s-r)), float64(2*casimir(t)-p-q-r-s)
}

// factors returns the three factors of the recurrence, exactly; for J = 0 without their factor J.
func (l *chain) factors(J float64) (above, here, below float64) {
	jj, next := float64(J*J), float64((J+2)*(J+2))
	above = float64(J * float64((next-l.c)*(l.b-next)))
	below = float64((J + 2) * float64((jj-l.a)*(l.d-jj)))
	jj += 2 * J
	if J == 0 {
		return float64((4 - l.c) * (l.b - 4)), -4 * l.c1, 0
	}
	return above, float64(-2 * (J + 1) * (float64(jj*(jj+l.c1)) + l.c0)), below
}

// reaches reports whether the table of binomials reaches the ends: where there is one term, t is not above
// the sum of p, q, r, s.
func (l *chain) reaches() bool {
	return (int64(l.p)+int64(l.q)+int64(l.r)+int64(l.s))/2+1 < dd.BinomialTops
}

// end returns the places of the four binomials in the sum at one of the ends, where it has one term, and its
// sign: those of setMomenta, with twice x for c.
func (l *chain) end(x int) (h, i, j, k int, sign float64) {
	total, s1, s2, s3 := (l.p+l.q+x)>>1, (l.r+l.s+x)>>1, (l.p+l.s+l.t)>>1, (l.r+l.q+l.t)>>1
	t := max(total, s1, s2, s3)
	return dd.Place(t+1, total+1), dd.Place(total-x, t-s1), dd.Place(total-l.p, t-s2), dd.Place(total-l.q, t-s3), float64(1 - 2*(t&1))
}

// mostWord bounds the integers that words computes. With all before exact, the error of the next one before
// it is rounded is below 4u of it, plus u^2 |d S|/lead, which is below 2^-10: less than 1/2.
const mostWord = 1 << 49

// words fills v with the sums, exactly; ok is false where one of them reaches mostWord. The first half
// comes from below and the other from above, which is two rows of operations that do not wait for each
// other.
func (l *chain) words(v []float64) (ok bool) {
	table := dd.Binomials()
	end := func(x int) float64 {
		h, i, j, k, sign := l.end(x)
		return float64(sign*table[h].Hi*table[i].Hi) * float64(table[j].Hi*table[k].Hi)
	}
	n := len(v)
	v[0], v[n-1] = end(l.first), end(l.first+2*(n-1))
	largest := max(magnitude(v[0]), magnitude(v[n-1]))
	var low, high float64 // the members before those at i and k
	for i, k := 0, n-1; i+1 < k; {
		above, here, below := l.factors(float64(l.first + 2*i))
		next := wordStep(here, v[i], below, low, above)
		low = v[i]
		i++
		v[i] = next
		largest = max(largest, magnitude(next))
		if i+1 == k {
			break
		}
		above, here, below = l.factors(float64(l.first + 2*k))
		next = wordStep(here, v[k], above, high, below)
		high = v[k]
		k--
		v[k] = next
		largest = max(largest, magnitude(next))
	}
	return largest < magnitude(mostWord)
}

// magnitude returns an integer that grows with |v|: to compare these is faster.
func magnitude(v float64) uint64 { return math.Float64bits(math.Abs(v)) }

// wordStep returns -(d s + e t)/lead, which is an integer, see mostWord.
func wordStep(d, s, e, t, lead float64) float64 {
	p := float64(d * s)
	sum := math.FMA(e, t, p) + math.FMA(d, s, -p)
	const round = 3 << 51 // adding and subtracting it rounds to an integer
	return (round - float64(sum*(1/lead))) - round
}

// bounded is a number in normal form and, in units of u^2, a bound of its absolute error, which leaves room
// for 13 times the number itself.
type bounded struct {
	dd.Pair
	err float64
}

// What the errors of numbers in a chain are relative to them, with the room: that of a product of four exact
// binomials, and what a step adds.
const (
	endError  = 3*7 + 13
	stepError = 12 + 13
)

const uu = 0x1p-106

// mul multiplies p by s. The 7 of the product and the 13 to be left are covered by what both leave.
func (p *bounded) mul(s *bounded) {
	p.err = float64((math.Abs(p.Hi)+float64(p.err*uu))*s.err) + float64(math.Abs(s.Hi)*p.err)
	p.Pair = p.Pair.Mul(s.Pair).Normal()
}

// pairs fills v with the sums in double-double, each with a bound that is carried along. In units of u^2 a
// factor times a 1-pair costs 3, the sum of two of these 10 of the larger, the division 12 of the result, and
// normal form nothing. So the bounds obey
//
//	e(x+1) = { |d| [e(x) + 13 |S(x)|] + |(J+2) g| [e(x-1) + 13 |S(x-1)|] } / |J f| + 12 |S(x+1)|
//
// and err is e + 13 |S|, at the least.
func (l *chain) pairs(v []bounded) {
	table := dd.Binomials()
	end := func(x int) bounded {
		h, i, j, k, sign := l.end(x)
		s := table[h].Mul(table[i]).Normal().Mul(table[j].Mul(table[k]).Normal()).Normal()
		err := float64(s.Hi * endError)
		if s.Hi > 0x1p103 { // otherwise all four are exact
			err += float64(s.Hi * (4 * dd.BinomialError))
		}
		return bounded{dd.Pair{Hi: sign * s.Hi, Lo: sign * s.Lo}, err}
	}
	n := len(v)
	v[0], v[n-1] = end(l.first), end(l.first+2*(n-1))
	var low, high bounded // the members before those at i and k
	for i, k := 0, n-1; i+1 < k; {
		above, here, below := l.factors(float64(l.first + 2*i))
		pairStep(&v[i+1], here, &v[i], below, &low, above)
		low = v[i]
		i++
		if i+1 == k {
			break
		}
		above, here, below = l.factors(float64(l.first + 2*k))
		pairStep(&v[k-1], here, &v[k], above, &high, below)
		high = v[k]
		k--
	}
}

// pairStep sets v to -(d s + e t)/lead.
func pairStep(v *bounded, d float64, s *bounded, e float64, t *bounded, lead float64) {
	sum := s.Times(d).Add(t.Times(e))
	q := -1 / lead
	hi := float64(sum.Hi * q)
	v.Pair = dd.Pair{Hi: hi, Lo: float64((math.FMA(hi, lead, sum.Hi) + sum.Lo) * q)}.Normal()
	v.err = float64((float64(math.Abs(d)*s.err)+float64(e*t.err))*-q) + float64(math.Abs(v.Hi)*stepError)
}
