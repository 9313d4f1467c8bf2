package wigner

import (
	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/square"
	"example.org/couplet/rational"
)

// ThreeJ returns the exact Wigner 3j symbol
//
//	( j1 j2 j3 )
//	( m1 m2 m3 )
//
// in the Condon-Shortley phase, by the sum of DLMF (34.2.4), written with binomials:
//
//	(-1)^(j1-j2-m3) sqrt[ Π (ji+mi)!(ji-mi)! / (n1! n2! n3! (J+1)!) ] Σ_k (-1)^k C(n1,k) C(n2,j1-m1-k) C(n3,j2+m2-k)
//
// with J = j1+j2+j3, n1 = J-2j3, n2 = J-2j2, n3 = J-2j1.
//
// It is zero where a triad or a projection breaks a selection rule; [CheckThreeJ] says which. It
// panics with *rational.ArgumentError for a negative j and for a j-m that is not an integer.
//
// Every j may be up to 2^26. Time grows like the number of terms, one more than the smallest of ji±mi and n1 to n3,
// times the length of the sum, at most J bits; tables of primes and of their exponents reach to J.
func ThreeJ(j1, j2, j3, m1, m2, m3 rational.Half) rational.Surd {
	var r regge
	if !r.set(j1, j2, j3, m1, m2, m3) {
		forbidden("wigner.ThreeJ", &threeJNames, j1, j2, j3, m1, m2, m3)
		return rational.Surd{}
	}
	return r.exact(false)
}

// ClebschGordan returns the exact Clebsch-Gordan coefficient (j1 m1 j2 m2 | j m) in the
// Condon-Shortley phase, which makes (j1 j1 j2 j-j1 | j j) positive. By DLMF (34.1.1) it is
//
//	(-1)^(j1-j2+m) sqrt(2j+1) ( j1 j2  j )
//	                          ( m1 m2 -m )
//
// Zeros, panics and cost are those of [ThreeJ]; [CheckClebschGordan] names the rule.
func ClebschGordan(j1, m1, j2, m2, j, m rational.Half) rational.Surd {
	var r regge
	if !r.set(j1, j2, j, m1, m2, m.Neg()) {
		forbidden("wigner.ClebschGordan", &cgNames, j1, j2, j, m1, m2, m.Neg())
		return rational.Surd{}
	}
	return r.exact(true)
}

// CheckThreeJ tells why the 3j symbol of [ThreeJ] vanishes, or that it does not: the first broken
// selection rule, the symmetry that changes its sign, or that its zero is accidental. To tell an
// accidental zero it computes the symbol, at the cost of ThreeJ: whoever takes arguments from strangers
// limits their size. The error, a *rational.ArgumentError, names a malformed
// argument; CheckThreeJ does not panic.
func CheckThreeJ(j1, j2, j3, m1, m2, m3 rational.Half) (Verdict, error) {
	q := symbol{"wigner.CheckThreeJ", &threeJNames, [3]rational.Half{j1, j2, j3}, [3]rational.Half{m1, m2, m3}}
	return q.verdict()
}

// CheckClebschGordan is [CheckThreeJ] for the coefficient of [ClebschGordan].
func CheckClebschGordan(j1, m1, j2, m2, j, m rational.Half) (Verdict, error) {
	q := symbol{"wigner.CheckClebschGordan", &cgNames, [3]rational.Half{j1, j2, j}, [3]rational.Half{m1, m2, m.Neg()}}
	return q.verdict()
}

// symbol is a 3j symbol by its arguments, for whoever must tell what is wrong with them.
type symbol struct {
	fn    string
	names *symbolNames
	j, m  [3]rational.Half
}

// symbolNames are the names of the arguments in messages.
type symbolNames struct{ j, m [3]string }

var (
	threeJNames = symbolNames{[3]string{"j1", "j2", "j3"}, [3]string{"m1", "m2", "m3"}}
	cgNames     = symbolNames{[3]string{"j1", "j2", "j"}, [3]string{"m1", "m2", "m"}}
)

// forbidden panics for a malformed argument.
func forbidden(fn string, names *symbolNames, j1, j2, j3, m1, m2, m3 rational.Half) {
	q := symbol{fn, names, [3]rational.Half{j1, j2, j3}, [3]rational.Half{m1, m2, m3}}
	if err := q.check(); err != nil {
		panic(err)
	}
}

// check returns an error for a malformed argument.
func (q *symbol) check() *rational.ArgumentError {
	for i, j := range q.j {
		if err := argument.Momentum(q.fn, q.names.j[i], j); err != nil {
			return err
		}
		if err := argument.Projection(q.fn, q.names.j[i], q.names.m[i], j, q.m[i]); err != nil {
			if q.names == &cgNames && i == 2 { // the caller gave the opposite sign
				err.Value = q.m[i].Neg().String()
			}
			return err
		}
	}
	return nil
}

// rule returns the first selection rule that well-formed arguments break.
func (q *symbol) rule() Verdict {
	if r := Triad(q.j[0], q.j[1], q.j[2]); r != NonZero {
		return Verdict{r, q.names.j[0] + " " + q.names.j[1] + " " + q.names.j[2]}
	}
	sum := int64(0)
	for i, m := range q.m {
		if m.Abs().Twice() > q.j[i].Twice() {
			return Verdict{ProjectionRange, q.names.m[i]}
		}
		sum += int64(m.Twice())
	}
	if sum != 0 {
		return Verdict{ProjectionSum, q.names.m[0] + " " + q.names.m[1] + " " + q.names.m[2]}
	}
	return Verdict{}
}

func (q *symbol) verdict() (Verdict, error) {
	if err := q.check(); err != nil {
		return Verdict{}, err
	}
	if v := q.rule(); v.Zero() {
		return v, nil
	}
	var r regge
	r.set(q.j[0], q.j[1], q.j[2], q.m[0], q.m[1], q.m[2])
	if r.total()&1 == 1 && (*square.Array)(&r).LinesEqual() {
		return Verdict{Rule: Symmetry}, nil
	}
	if r.exact(false).IsZero() {
		return Verdict{Rule: Accidental}, nil
	}
	return Verdict{}, nil
}

// regge is the square of Regge (1958), whose rows and columns all add up to J:
//
//	-j1+j2+j3  j1-j2+j3  j1+j2-j3
//	  j1-m1      j2-m2     j3-m3
//	  j1+m1      j2+m2     j3+m3
type regge square.Array

// set takes a symbol that no selection rule forbids; it returns false for any other and for malformed
// arguments.
func (r *regge) set(j1, j2, j3, m1, m2, m3 rational.Half) bool {
	// 64 bits hold the sums of Halves on every platform. A negative j makes j-m or j+m negative.
	a, b, c := int64(j1.Twice()), int64(j2.Twice()), int64(j3.Twice())
	x, y, z := int64(m1.Twice()), int64(m2.Twice()), int64(m3.Twice())
	n3, n2, n1 := b-a+c, a-b+c, a+b-c
	if n1|n2|n3|(a-x)|(a+x)|(b-y)|(b+y)|(c-z)|(c+z) < 0 || (n1|(a-x)|(b-y)|(c-z))&1 != 0 || x+y+z != 0 {
		return false
	}
	r[0], r[1], r[2] = int(n3>>1), int(n2>>1), int(n1>>1)
	r[3], r[4], r[5] = int((a-x)>>1), int((b-y)>>1), int((c-z)>>1)
	r[6], r[7], r[8] = int((a+x)>>1), int((b+y)>>1), int((c+z)>>1)
	return true
}

// total returns J.
func (r *regge) total() int { return r[0] + r[1] + r[2] }

// sum sets s to the sum of DLMF (34.2.4), in place: a copy of what was just written has to wait. It has as many
// terms as the smallest entry of the square has units, and one.
func (r *regge) sum(s *binsum.Triple) {
	s.N1, s.N2, s.N3, s.A, s.B = r[2], r[1], r[0], r[3], r[7]
}

// parity returns n for the phase (-1)^n of the 3j symbol in the orientation of the square: j1-j2-m3, which
// is (j1+m1) - (j2-m2).
func (r *regge) parity() int { return (r[6] - r[4]) & 1 }

// sign returns n for the sign (-1)^n before the sum of r, or of an even image of r. A coefficient has none
// in its own orientation, since the phases of DLMF (34.1.1) and (34.2.4) cancel.
func (r *regge) sign(image *regge, coefficient bool) int {
	if coefficient {
		return image.parity() ^ r.parity()
	}
	return image.parity()
}

// image returns one of the six squares that r becomes by a cyclic permutation of its rows, for i >= 3 after
// a reflection in the diagonal. These are even: they keep the value of the 3j symbol.
func (r *regge) image(i int) (q regge) {
	for row := range 3 {
		for col := range 3 {
			from := 3*((row+i)%3) + col
			if i >= 3 {
				from = 3*col + (row+i)%3
			}
			q[3*row+col] = r[from]
		}
	}
	return q
}

// shortest returns the image whose sum needs the fewest bits. Where one momentum is small beside the
// others, or a projection close to the largest, that is a few bits instead of some j1+j2+j3.
func (r *regge) shortest() regge {
	best := *r
	var sum binsum.Triple
	r.sum(&sum)
	least := sum.Bits()
	for i := 1; i < 6; i++ {
		image := r.image(i)
		image.sum(&sum)
		if bits := sum.Bits(); bits < least {
			best, least = image, bits
		}
	}
	return best
}

// exact returns the value as a 3j symbol or as a Clebsch-Gordan coefficient.
func (r *regge) exact(coefficient bool) rational.Surd {
	if r.total() <= 66 { // one word holds the sum in any orientation
		return r.exactBy(r, coefficient)
	}
	image := r.shortest()
	return r.exactBy(&image, coefficient)
}

// exactBy returns the value by the sum of an image of r.
func (r *regge) exactBy(image *regge, coefficient bool) rational.Surd {
	var front rational.Factored // squared
	for i, n := range image {
		if i < 3 {
			front.MulFactorial(n, -1)
		} else {
			front.MulFactorial(n, 1)
		}
	}
	front.MulFactorial(r.total()+1, -1)
	if coefficient {
		front.MulInt(r.twiceJ3()+1, 1)
	}
	var sum binsum.Triple
	image.sum(&sum)
	v := sum.Sqrt(&front)
	if r.sign(image, coefficient) != 0 {
		return v.Neg()
	}
	return v
}

func (r *regge) twiceJ3() int { return r[0] + r[1] }
