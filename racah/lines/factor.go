package lines

import (
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// DipoleFactor returns the exact first-order factor of a magnetic hyperfine constant A, or of a
// nuclear spin-rotation constant C_I, in the state |(J I)F>:
//
//	<I·J> = K/2,    K = F(F+1) - I(I+1) - J(J+1)
//
// It is zero where J, I and F break the triangle rule. It panics with *rational.ArgumentError for a
// negative argument.
func DipoleFactor(j, i, f rational.Half) rational.Surd {
	mustMomenta("lines.DipoleFactor", named{"j", j}, named{"i", i}, named{"f", f})
	if wigner.Triad(j, i, f) != wigner.NonZero {
		return rational.Surd{}
	}
	return rational.Ratio(fourK(j, i, f), 8)
}

// fourK returns 4K. The largest j and i with f = 0 just fit.
func fourK(j, i, f rational.Half) int64 {
	square := func(h rational.Half) int64 { return int64(h.Twice()) * (int64(h.Twice()) + 2) } // 4h(h+1)
	return square(f) - square(i) - square(j)
}

// QuadrupoleFactor returns the exact first-order factor of the electric quadrupole constant B of an
// atom in the state |(J I)F>:
//
//	3/4 K(K+1) - I(I+1)J(J+1)
//	-------------------------      Casimir 1936; K as in [DipoleFactor]
//	  2I(2I-1) J(2J-1)
//
// It is 1/4 for F = I+J. It is zero for I < 1 or J < 1, which have no quadrupole, and where J, I and F
// break the triangle rule. It panics with *rational.ArgumentError for a negative argument.
func QuadrupoleFactor(j, i, f rational.Half) rational.Surd {
	mustMomenta("lines.QuadrupoleFactor", named{"j", j}, named{"i", i}, named{"f", f})
	return quadrupoleFactor(j, i, f)
}

func quadrupoleFactor(j, i, f rational.Half) rational.Surd {
	if wigner.Triad(j, i, f) != wigner.NonZero || i.Twice() < 2 || j.Twice() < 2 {
		return rational.Surd{}
	}
	k, ti, tj := fourK(j, i, f), int64(i.Twice()), int64(j.Twice())
	kk := rational.Ratio(3, 4).Mul(rational.Ratio(k, 4)).Mul(rational.Ratio(k+4, 4))
	iijj := rational.Ratio(ti*(ti+2), 4).Mul(rational.Ratio(tj*(tj+2), 4))
	top, _ := kk.Sub(iijj).Surd() // rational terms make one
	return top.Quo(rational.Ratio(ti*(ti-1), 1).Mul(rational.Ratio(tj*(tj-1), 2)))
}

// CasimirFunction returns Casimir's function Y(J,I,F), exactly: a nucleus in a linear molecule has, to
// first order, the quadrupole energy -eqQ Y in the state |(J I)F>.
//
//	                3/4 K(K+1) - I(I+1)J(J+1)
//	Y(J,I,F) = --------------------------------      Townes and Schawlow 1955; K as in [DipoleFactor]
//	              2 (2J-1)(2J+3) I(2I-1)
//
// Zeros and panics are those of [QuadrupoleFactor].
func CasimirFunction(j, i, f rational.Half) rational.Surd {
	mustMomenta("lines.CasimirFunction", named{"j", j}, named{"i", i}, named{"f", f})
	return quadrupoleFactor(j, i, f).Mul(axisFactor(j))
}

// axisFactor returns J/(2J+3): a field gradient q along the axis of a linear molecule is
// q_J = -q J/(2J+3) along J in the stretched state M = J.
func axisFactor(j rational.Half) rational.Surd {
	return rational.Ratio(int64(j.Twice()), 2*(int64(j.Twice())+3))
}

// ProjectionFactor returns how much of a tensor operator T(k) of the momentum j is left within the
// states of the total x to which j couples with a spectator s. In these states T(k) acts as the
// factor times a tensor of x, both tensors normalized to 1 in their stretched states:
//
//	<(j s)x x|T(k)_0|(j s)x x>                                     { j x s } ( x k x)   ( j k j)
//	-------------------------- = (-1)^(j+s+x+k) (2x+1)             { x j k } (-x 0 x) / (-j 0 j)
//	      <j j|T(k)_0|j j>
//
// by Edmonds (5.4.1) and (7.1.7). It is 1 for s = 0, and for k = 1 it is Landé's factor x g/j, with
// g = <j·x>/x(x+1). It is zero where T(k) vanishes in the states of j or of x, 2j < k or 2x < k, and
// where j, s and x break the triangle rule. It panics with *rational.ArgumentError for a negative
// argument.
func ProjectionFactor(k int, j, s, x rational.Half) rational.Surd {
	const fn = "lines.ProjectionFactor"
	mustRank(fn, k)
	mustMomenta(fn, named{"j", j}, named{"s", s}, named{"x", x})
	r := rational.Int(k)
	own := stretched(j, r)
	if own.IsZero() {
		return rational.Surd{}
	}
	p := recoupling(r, j, j, s, x, x).Mul(rational.Ratio(int64(x.Twice())+1, 1))
	return p.Mul(stretched(x, r)).Quo(own)
}

// stretched returns ( j k j; -j 0 j ).
func stretched(j, k rational.Half) rational.Surd {
	return wigner.ThreeJ(j, k, j, j.Neg(), rational.Half{}, j)
}
