package wigner_test

import (
	"fmt"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

func ExampleClebschGordan() {
	half, one := rational.Halves(1), rational.Int(1)
	// How much of |3/2 1/2> has the spin up, in a p state?
	c := wigner.ClebschGordan(one, rational.Int(0), half, half, rational.Halves(3), half)
	fmt.Println(c, "squared is", c.Square())
	// Output: 1/3*sqrt(6) squared is 2/3
}

func ExampleThreeJ() {
	j, m := rational.Int, rational.Int
	fmt.Println(wigner.ThreeJ(j(2), j(2), j(4), m(1), m(-1), m(0)))
	fmt.Println(wigner.ThreeJ(j(1), j(1), j(3), m(0), m(0), m(0)))
	// Output:
	// 2/105*sqrt(70)
	// 0
}

func ExampleCheckThreeJ() {
	check := func(j1, j2, j3, m1, m2, m3 int) {
		i := rational.Int
		if verdict, err := wigner.CheckThreeJ(i(j1), i(j2), i(j3), i(m1), i(m2), i(m3)); err != nil {
			fmt.Println("malformed:", err)
		} else {
			fmt.Println(verdict)
		}
	}
	check(1, 1, 3, 0, 0, 0)
	check(1, 1, 1, 0, 0, 0)
	check(3, 3, 2, 2, -2, 0)
	check(1, -1, 1, 0, 0, 0)
	// Output:
	// zero: triangle rule broken (j1 j2 j3)
	// zero by symmetry: an exchange of lines changes the sign only
	// accidental zero: no rule forbids it
	// malformed: wigner.CheckThreeJ: j2 = -1; allowed: an integer or half-integer >= 0
}

func ExampleState_Apply() {
	// The ladder of j = 3/2, from the lowest state to the highest and one step beyond.
	j := rational.Halves(3)
	s := wigner.Basis(j, j.Neg())
	for range j.Twice() + 2 {
		fmt.Println(s)
		s = s.Apply(wigner.JPlus)
	}
	// Output:
	// |3/2 -3/2>
	// sqrt(3)|3/2 -1/2>
	// 2*sqrt(3)|3/2 1/2>
	// 6|3/2 3/2>
	// 0
}

func ExampleOperator_Matrix() {
	j := rational.Int(1)
	x, y, z := wigner.Jx.Matrix(j), wigner.Jy.Matrix(j), wigner.Jz.Matrix(j)
	fmt.Print(y)
	fmt.Println("[Jx, Jy] = i Jz:", x.Mul(y).Sub(y.Mul(x)).Equal(z.Scale(rational.I())))
	// Output:
	//              0   1/2*sqrt(2)*i              0
	// -1/2*sqrt(2)*i               0  1/2*sqrt(2)*i
	//              0  -1/2*sqrt(2)*i              0
	// [Jx, Jy] = i Jz: true
}

func ExampleOperator_Matrix_spectrum() {
	// Jx^2 + Jy^2 + Jz^2 is j(j+1) on every state.
	for twice := range 5 {
		j := rational.Halves(twice)
		sum := wigner.JSquared.Matrix(j).Sub(wigner.JSquared.Matrix(j))
		for _, op := range []wigner.Operator{wigner.Jx, wigner.Jy, wigner.Jz} {
			sum = sum.Add(op.Matrix(j).Mul(op.Matrix(j)))
		}
		fmt.Println("j =", j, "J^2 =", sum.At(0, 0), "diagonal:", sum.Equal(rational.Identity(twice+1).Scale(sum.At(0, 0))))
	}
	// Output:
	// j = 0 J^2 = 0 diagonal: true
	// j = 1/2 J^2 = 3/4 diagonal: true
	// j = 1 J^2 = 2 diagonal: true
	// j = 3/2 J^2 = 15/4 diagonal: true
	// j = 2 J^2 = 6 diagonal: true
}

func ExampleResultants() {
	for j := range wigner.Resultants(rational.Int(1), rational.Halves(3)) {
		fmt.Println(j)
	}
	// Output:
	// 1/2
	// 3/2
	// 5/2
}
