package wigner

import (
	"fmt"

	"example.org/couplet/internal/argument"
	"example.org/couplet/rational"
)

// Operator is an operator of the angular momentum J, in units of hbar, that acts within the 2j+1
// states |j m> of any j.
type Operator uint8

// The operators. The phases are those of Condon and Shortley: J+ and J- have no negative elements.
const (
	Jx       Operator = iota // (J+ + J-)/2
	Jy                       // (J+ - J-)/(2i)
	Jz                       // diagonal, m
	JPlus                    // Jx + i Jy, raises m by 1
	JMinus                   // Jx - i Jy, lowers m by 1
	JSquared                 // Jx^2 + Jy^2 + Jz^2, diagonal, j(j+1)
)

// String returns the usual symbol: "Jx", "Jy", "Jz", "J+", "J-", "J^2".
func (o Operator) String() string {
	if o > JSquared {
		return fmt.Sprintf("Operator(%d)", uint8(o))
	}
	return [...]string{"Jx", "Jy", "Jz", "J+", "J-", "J^2"}[o]
}

// Element returns the exact matrix element <j mp| o |j m>. It is zero for |m| > j or |mp| > j. It
// panics with *rational.ArgumentError for a negative j and for a projection that does not differ
// from j by an integer, and for an o that is none of the operators above.
//
//	<j m±1| J± |j m> = sqrt((j∓m)(j±m+1))    Edmonds (2.3.17), Varshalovich sec. 2.3
func (o Operator) Element(j, mp, m rational.Half) rational.Complex {
	mustState("wigner.Operator.Element", "j", "mp", j, mp)
	mustState("wigner.Operator.Element", "j", "m", j, m)
	if o > JSquared {
		panic(&rational.ArgumentError{Func: "wigner.Operator.Element", Arg: "o", Value: o.String(), Allowed: "Jx to JSquared"})
	}
	if m.Abs().Cmp(j) > 0 || mp.Abs().Cmp(j) > 0 {
		return rational.Complex{}
	}
	step := (mp.Twice() - m.Twice()) / 2
	switch {
	case o == Jz && step == 0:
		return m.Surd().Complex()
	case o == JSquared && step == 0:
		return j.Surd().Mul(j.Add(rational.Int(1)).Surd()).Complex()
	case o == JPlus && step == 1, o == JMinus && step == -1:
		return ladder(j, m, step).Complex()
	case o == Jx && (step == 1 || step == -1):
		return ladder(j, m, step).Quo(rational.Ratio(2, 1)).Complex()
	case o == Jy && (step == 1 || step == -1): // 1/(2i) = -i/2 for J+, +i/2 for J-
		return rational.IPow(-step).Scale(ladder(j, m, step).Quo(rational.Ratio(2, 1)))
	}
	return rational.Complex{}
}

// ladder returns <j m+step| J± |j m> for step = ±1.
func ladder(j, m rational.Half, step int) rational.Surd {
	a := int64(j.Twice()-step*m.Twice()) / 2
	return rational.Root(a, 1).Mul(rational.Root(int64(j.Twice())+1-a, 1))
}

// Matrix returns the exact (2j+1) x (2j+1) matrix of o, rows and columns in the order of
// [Projections]: entry (0, 0) belongs to m = -j. For j = 1/2 that is the reverse of the order in which
// Pauli's matrices are printed. Its Complex128s and Float64s methods give it in
// floating point. It panics with *rational.ArgumentError for a negative j.
func (o Operator) Matrix(j rational.Half) rational.Matrix {
	mustMomentum("wigner.Operator.Matrix", "j", j)
	m := func(i int) rational.Half { return rational.Halves(2*i - j.Twice()) }
	return rational.NewMatrix(j.Twice()+1, j.Twice()+1, func(row, col int) rational.Complex {
		return o.Element(j, m(row), m(col))
	})
}

// mustState panics unless j >= 0 and j-m is an integer.
func mustState(fn, jName, mName string, j, m rational.Half) {
	mustMomentum(fn, jName, j)
	if err := argument.Projection(fn, jName, mName, j, m); err != nil {
		panic(err)
	}
}
