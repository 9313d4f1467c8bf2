// Package row computes whole rows of coupling coefficients from the three-term recurrences that they obey,
// from both ends towards the middle (Schulten and Gordon 1975), in double-double arithmetic.
package row

import (
	"math"

	"example.org/couplet/internal/dd"
)

// Recurrence is that of the 3j symbols and of the 6j symbols x(j) in one momentum j,
//
//	J l(J+2) x(j+1) + d(J) x(j) + (J+2) l(J) x(j-1) = 0,    J = 2j
//	l(J) = sqrt[ (J^2-A) (B-J^2) (J^2-C) (D - E J^2) ]
//	d(J) = -2 (J+1) [ C0 + C1 J(J+2) + E J^2(J+2)^2 ]
//
// E is 0 for 3j symbols and 1 for 6j symbols. All of these are integers. A to D, C1 and what is added up with
// them is below 2^53 and so exact in a float64; C0 and the bracket in d(J) are exact in two. Where J can be 0,
// C0 is 0: the whole recurrence has a factor J there, which is taken out.
type Recurrence struct {
	First      int // J of the first member
	A, B, C, D float64
	E          float64
	C0         dd.Pair
	C1         float64
}

// link returns l(J), normal or nearly so, with an error below 15 u^2.
func (r *Recurrence) link(J float64) dd.Pair {
	jj := float64(J * J)
	a, b, c, d := jj-r.A, r.B-jj, jj-r.C, r.D-float64(r.E*jj)
	p, q := float64(a*b), float64(c*d)
	s := float64(p * q)
	rest := math.FMA(p, q, -s) + math.FMA(p, math.FMA(c, d, -q), float64(math.FMA(a, b, -p)*q))
	root := math.Sqrt(s)
	return dd.Pair{Hi: root, Lo: float64((math.FMA(-root, root, s) + rest) * (0.5 / root))}
}

// diagonal returns d(J), for J = 0 without its factor J, with an error below 3 u^2. The bracket is an
// integer that Normal leaves exact, whatever cancels in it.
func (r *Recurrence) diagonal(J float64) dd.Pair {
	jj := float64(J * (J + 2))
	c := r.C1 + float64(r.E*jj)
	if J == 0 {
		return dd.Pair{Hi: float64(-4 * c)} // (J+2) c, and J+1 = 1
	}
	p := float64(c * jj)
	return dd.Pair{Hi: p, Lo: math.FMA(c, jj, -p)}.Add(r.C0).Times(-2 * (J + 1))
}

// Solve fills x with the members that belong to First, First+2 and so on, such that the sum of
// w (2j+1) x(j)^2 is 1 and the last has the given sign. Where low is not nil it is as long as x and is filled
// with what is left of the members, so that x+low is their value in double-double. Solve allocates nothing.
//
// A recurrence is stable while its solution grows or oscillates, and not while it decays. So either end is
// followed until its members stop growing, and then both by turns to where they meet. What double-double
// leaves of the errors is far below an ulp; what is left is the rounding of the members and of their scale.
func (r *Recurrence) Solve(x, low []float64, w float64, negative bool) {
	n := len(x)
	if n == 1 {
		v := inverse(root(dd.Pair{Hi: w * float64(r.First+1)})).Scale(0, negative)
		x[0] = v.Hi
		if low != nil {
			low[0] = v.Lo
		}
		return
	}
	up, down := r.start(0, 1), r.start(n-1, -1)
	x[0], x[n-1] = 1, 1
	if low != nil {
		low[0], low[n-1] = 0, 0
	}
	for up.at+1 < down.at {
		// Whichever still grows alone, otherwise whichever is behind.
		e := &down
		if up.grows && !down.grows || up.grows == down.grows && up.at <= n-1-down.at {
			e = &up
		}
		r.advance(e)
		if low != nil {
			x[e.at], low[e.at] = e.here.Hi, e.here.Lo
		} else {
			x[e.at] = e.here.Hi + e.here.Lo
		}
		if math.Abs(e.here.Hi) >= 1<<limit {
			e.shrink(x, low)
		}
	}
	// The ends are neighbors now. One step more gives both of them two members in common, and the ratio of
	// the two solutions by least squares, so that a zero among them does no harm.
	upNext, downNext := up, down
	r.advance(&upNext)
	r.advance(&downNext)
	product := up.here.Mul(downNext.here).Normal().Add(upNext.here.Mul(down.here).Normal())
	square := downNext.here.Mul(downNext.here).Normal().Add(down.here.Mul(down.here).Normal())
	ratio := product.Mul(inverse(square)).Normal() // up/down
	total := up.norm.Add(down.norm.Mul(ratio.Mul(ratio).Normal()).Normal())
	upScale := inverse(root(total.Times(w)))
	downScale := upScale.Mul(ratio).Normal()
	if (downScale.Hi < 0) != negative {
		upScale, downScale = upScale.Scale(0, true), downScale.Scale(0, true)
	}
	if low == nil {
		rescale(x[:up.at+1], upScale)
		rescale(x[up.at+1:], downScale)
		return
	}
	rescalePairs(x[:up.at+1], low, upScale)
	rescalePairs(x[up.at+1:], low[up.at+1:], downScale)
}

func rescale(x []float64, scale dd.Pair) {
	for i, v := range x {
		x[i] = math.FMA(v, scale.Hi, float64(v*scale.Lo))
	}
}

func rescalePairs(x, low []float64, scale dd.Pair) {
	for i, v := range x {
		p := dd.Pair{Hi: v, Lo: low[i]}.Mul(scale).Normal()
		x[i], low[i] = p.Hi, p.Lo
	}
}

// end is one end of the solution: where it has come to, with the last two members.
type end struct {
	at, step     int
	j, half      float64 // J of the last member, and 1 upwards, -1 downwards
	here, before dd.Pair
	link         dd.Pair // between the two
	norm         dd.Pair // sum of (2j+1) x^2 so far
	grows        bool
}

func (r *Recurrence) start(at, step int) end {
	j := r.twice(at)
	return end{at: at, step: step, j: j, half: float64(step), here: dd.Pair{Hi: 1}, norm: dd.Pair{Hi: j + 1}, grows: true}
}

// twice returns J of the i-th member.
func (r *Recurrence) twice(i int) float64 { return float64(r.First + 2*i) }

// advance goes on by one member.
func (r *Recurrence) advance(e *end) {
	outer, inner := e.j+1+e.half, e.j+1-e.half // the factors of the two links, outer the J of the one ahead, too
	if inner == 0 {
		inner = 1 // without its factor J
	}
	sum := r.diagonal(e.j).Mul(e.here).Add(e.link.Times(outer).Mul(e.before))
	e.link = r.link(outer)
	t := e.link.Times(-inner)
	q := 1 / t.Hi
	v := dd.Pair{Hi: float64(sum.Hi * q)}
	v.Lo = float64((math.FMA(-v.Hi, t.Hi, sum.Hi) + (sum.Lo - float64(v.Hi*t.Lo))) * q)
	e.grows = math.Abs(v.Hi) >= math.Abs(e.here.Hi) || v.Hi == 0 // a zero in every second place is no decay
	e.before, e.here = e.here, v
	e.at += e.step
	e.j += 2 * e.half
	e.norm = e.norm.Add(v.Mul(v).Times(e.j + 1))
}

// Members are kept below 2^480, so that their squares do not overflow, and shrunk with all that came
// before. What that pushes out of the range of float64 would be zero in the end, too.
const limit = 480

func (e *end) shrink(x, low []float64) {
	zeros := 0 // two in a row are all that follow; one may stand between others
	for i := e.at; i >= 0 && i < len(x) && zeros < 2; i -= e.step {
		if x[i] == 0 {
			zeros++
			continue
		}
		zeros = 0
		x[i] *= 1.0 / (1 << limit)
		if low != nil {
			low[i] *= 1.0 / (1 << limit)
		}
	}
	e.before, e.here = e.before.Scale(-limit, false), e.here.Scale(-limit, false)
	e.norm = e.norm.Scale(-2*limit, false)
}

// Error returns a bound on the error of a solution in double-double, as
//
//	sqrt( Σ w (2j+1) (x(j)-true value)^2 ),
//
// which is proved after the fact. Divided by 2(J+1) J(J+2) the recurrence says that the vector with the
// members sqrt(2j+1) x(j) is the eigenvector of a symmetric tridiagonal matrix to the eigenvalue that is part
// of C1. The other eigenvalues are at the distance gap or more. Then what is orthogonal to the eigenvector in
// a vector of length 1 is at most the length of its residual, divided by gap.
//
// The residual is computed here, in double-double. Each of its three terms has an error of 48 u^2 at the
// most: 15 of l(J), 6 and 15 of its two products, 12 of two sums. The sum that normalizes the vector has 4 u^2
// for each term, and 160 for the ends and for its root.
// Members that have been lost by underflow are below 2^-500 of the largest.
func (r *Recurrence) Error(x, low []float64, w, gap float64) float64 {
	const uu = 0x1p-106
	n := len(x)
	residual, size := 0.0, 0.0 // sums of squares
	link := dd.Pair{}          // between i-1 and i
	for i := range n {
		J := r.twice(i)
		here := dd.Pair{Hi: x[i], Lo: low[i]}
		sum := r.diagonal(J).Mul(here).Normal()
		magnitude := math.Abs(sum.Hi)
		if i > 0 {
			term := link.Times(J + 2).Mul(dd.Pair{Hi: x[i-1], Lo: low[i-1]}).Normal()
			sum = sum.Add(term)
			magnitude += math.Abs(term.Hi)
		}
		factor := J
		if J == 0 {
			factor = 1 // without its factor J, as the diagonal
		}
		if i < n-1 {
			link = r.link(J + 2)
			term := link.Times(factor).Mul(dd.Pair{Hi: x[i+1], Lo: low[i+1]}).Normal()
			sum = sum.Add(term)
			magnitude += math.Abs(term.Hi)
		}
		scale := 1 / (2 * (J + 1) * (J + 2) * factor)
		weight := w * (J + 1)
		sum.Hi, magnitude = float64(sum.Hi*scale), float64(magnitude*scale)
		residual += float64(weight * sum.Hi * sum.Hi)
		size += float64(weight * magnitude * magnitude)
	}
	length := math.Sqrt(residual) + float64(48*uu*math.Sqrt(size))
	return float64(1.01*length/gap) + float64(float64(n+40)*4*uu) // 1.01 for the roundings here and the second order
}

// These two have relative errors of some u^2 and return numbers in normal form.

func inverse(a dd.Pair) dd.Pair {
	q := 1 / a.Hi
	e := math.FMA(-a.Lo, q, math.FMA(-a.Hi, q, 1))
	return dd.Pair{Hi: q, Lo: float64(q * e)}.Normal()
}

func root(a dd.Pair) dd.Pair {
	q := math.Sqrt(a.Hi)
	return dd.Pair{Hi: q, Lo: (math.FMA(-q, q, a.Hi) + a.Lo) / (2 * q)}.Normal()
}

// Round returns the float64 nearest to a member that is off by bound, relative to it, at the most, and by 2^-101
// more. ok is false where that leaves two possibilities, and for bounds from 2^-60, which would do so often.
func Round(v dd.Pair, bound float64) (f float64, ok bool) {
	if !(bound < 0x1p-60) {
		return 0, false
	}
	return v.Round(float64(bound*(1+0x1p-20)) + 0x1p-100)
}

// Slice returns dst with n members, or a new slice where its capacity does not suffice.
func Slice(dst []float64, n int) []float64 {
	if cap(dst) < n {
		return make([]float64, n)
	}
	return dst[:n]
}

// Sum adds up products in double-double.
type Sum struct {
	Value     dd.Pair
	Magnitude float64 // sum of the absolute values
}

// Add adds w*v.
func (s *Sum) Add(v dd.Pair, w float64) {
	t := v.Times(w).Normal()
	s.Value = s.Value.Add(t)
	s.Magnitude += math.Abs(t.Hi)
}
