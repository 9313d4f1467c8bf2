package wigner_test

import (
	"slices"
	"testing"

	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

func commutator(a, b rational.Matrix) rational.Matrix { return a.Mul(b).Sub(b.Mul(a)) }

// The algebra of angular momentum, Edmonds (2.1.1) and (2.3.1), for every j to 5.
func TestOperatorAlgebra(t *testing.T) {
	i := rational.I()
	for twice := range 11 {
		j := rational.Halves(twice)
		x, y, z := wigner.Jx.Matrix(j), wigner.Jy.Matrix(j), wigner.Jz.Matrix(j)
		plus, minus, squared := wigner.JPlus.Matrix(j), wigner.JMinus.Matrix(j), wigner.JSquared.Matrix(j)
		two := rational.Ratio(2, 1).Complex()
		for name, c := range map[string][2]rational.Matrix{
			"[Jx, Jy] = i Jz":          {commutator(x, y), z.Scale(i)},
			"[Jy, Jz] = i Jx":          {commutator(y, z), x.Scale(i)},
			"[Jz, Jx] = i Jy":          {commutator(z, x), y.Scale(i)},
			"[J+, J-] = 2 Jz":          {commutator(plus, minus), z.Scale(two)},
			"J+ = Jx + i Jy":           {plus, x.Add(y.Scale(i))},
			"J- = Jx - i Jy":           {minus, x.Sub(y.Scale(i))},
			"J^2 = Jx^2 + Jy^2 + Jz^2": {squared, x.Mul(x).Add(y.Mul(y)).Add(z.Mul(z))},
			"J^2 = J- J+ + Jz^2 + Jz":  {squared, minus.Mul(plus).Add(z.Mul(z)).Add(z)},
			"J^2 = j(j+1)":             {squared, rational.Identity(twice + 1).Scale(rational.Ratio(int64(twice*(twice+2)), 4).Complex())},
			"Jx is Hermitian":          {x, x.Adjoint()},
			"Jy is Hermitian":          {y, y.Adjoint()},
			"J- is the adjoint of J+":  {minus, plus.Adjoint()},
		} {
			if !c[0].Equal(c[1]) {
				t.Errorf("j = %v: %s fails:\n%v\n%v", j, name, c[0], c[1])
			}
		}
		if lowest := z.At(0, 0); !lowest.Equal(j.Neg().Surd().Complex()) {
			t.Errorf("j = %v: the first state has m = %v", j, lowest)
		}
	}
}

// For j = 1/2 the operators are half of Pauli's matrices, here in the order m = -1/2, +1/2.
func TestPauliMatrices(t *testing.T) {
	j := rational.Halves(1)
	for op, want := range map[wigner.Operator][4]complex128{
		wigner.Jx: {0, 0.5, 0.5, 0},
		wigner.Jy: {0, 0.5i, -0.5i, 0},
		wigner.Jz: {-0.5, 0, 0, 0.5},
	} {
		if got := op.Matrix(j).Complex128s(nil); [4]complex128(got) != want {
			t.Errorf("%v = %v, want %v", op, got, want)
		}
	}
}

func TestOperatorElementOutside(t *testing.T) {
	h := rational.Halves
	if e := wigner.JPlus.Element(h(2), h(4), h(2)); !e.IsZero() {
		t.Errorf("<1 2|J+|1 1> = %v", e)
	}
	want := "wigner.Operator.Element: o = Operator(77); allowed: Jx to JSquared"
	if e := verify.Recovered(func() { wigner.Operator(77).Element(h(2), h(2), h(2)) }); e == nil || e.Error() != want {
		t.Errorf("panic %v, want %s", e, want)
	}
}

// The states must do what the matrices do.
func TestStateApply(t *testing.T) {
	for twice := range 8 {
		j := rational.Halves(twice)
		for op := wigner.Jx; op <= wigner.JSquared; op++ {
			m := op.Matrix(j)
			col := 0
			for ket := range wigner.Projections(j) {
				image := wigner.Basis(j, ket).Apply(op)
				row := 0
				for bra := range wigner.Projections(j) {
					if got, want := wigner.Basis(j, bra).Inner(image), m.At(row, col); !got.Equal(want) || !image.Amplitude(bra).Equal(want) {
						t.Errorf("<%v %v|%v|%v %v> = %v, want %v", j, bra, op, j, ket, got, want)
					}
					row++
				}
				col++
			}
		}
	}
}

func TestStateArithmetic(t *testing.T) {
	h := rational.Halves
	up, down := wigner.Basis(h(1), h(1)), wigner.Basis(h(1), h(-1))
	s := up.Add(down.Scale(rational.I()))
	if got := s.Inner(s); !got.Equal(rational.Ratio(2, 1).Complex()) {
		t.Errorf("<s|s> = %v", got)
	}
	if got := down.Inner(s); !got.Equal(rational.I()) {
		t.Errorf("<down|s> = %v", got)
	}
	if got := s.Inner(down); !got.Equal(rational.I().Neg()) {
		t.Errorf("<s|down> = %v", got)
	}
	for _, c := range []struct {
		state wigner.State
		want  string
	}{
		{s, "|1/2 1/2> + (i)|1/2 -1/2>"}, {wigner.State{}, "0"}, {up.Apply(wigner.JPlus), "0"},
		{s.Scale(rational.Root(3, 4).Neg().Complex()), "(-1/2*sqrt(3))|1/2 1/2> + (-1/2*sqrt(3)*i)|1/2 -1/2>"},
		{s.Scale(rational.Root(3, 4).Complex()), "1/2*sqrt(3)|1/2 1/2> + (1/2*sqrt(3)*i)|1/2 -1/2>"},
	} {
		if got := c.state.String(); got != c.want {
			t.Errorf("%s, want %s", got, c.want)
		}
	}
	zero := wigner.State{}
	if zero.J() != h(0) || !zero.Amplitude(h(0)).IsZero() || !zero.Add(zero).Equal(zero) || up.Equal(down) || up.Equal(zero) || !up.Equal(wigner.Basis(h(1), h(1))) {
		t.Error("the zero value, or Equal")
	}
	if !up.Amplitude(h(3)).IsZero() {
		t.Error("an amplitude beyond j")
	}
}

// The columns of the coupling matrix are eigenvectors of the J^2 and Jz of the product space: a route
// to the coefficients through the operators, on which orthogonality says nothing.
func TestCouplingMatrix(t *testing.T) {
	for a := range 6 {
		for b := range 6 {
			j1, j2 := rational.Halves(a), rational.Halves(b)
			c := wigner.CouplingMatrix(j1, j2)
			n, _ := c.Dims()
			if !c.Mul(c.Adjoint()).Equal(rational.Identity(n)) || !c.Adjoint().Mul(c).Equal(rational.Identity(n)) {
				t.Errorf("%v x %v: not unitary", j1, j2)
			}
			total := func(op wigner.Operator) rational.Matrix { // op x 1 + 1 x op
				left, right := op.Matrix(j1), op.Matrix(j2)
				return rational.NewMatrix(n, n, func(row, col int) rational.Complex {
					var e rational.Complex
					if row%(b+1) == col%(b+1) {
						e = left.At(row/(b+1), col/(b+1))
					}
					if row/(b+1) == col/(b+1) {
						e = e.Add(right.At(row%(b+1), col%(b+1)))
					}
					return e
				})
			}
			plus, z := total(wigner.JPlus), total(wigner.Jz)
			col := 0
			for j, m := range wigner.CoupledStates(j1, j2) {
				vector := rational.NewMatrix(n, 1, func(i, _ int) rational.Complex { return c.At(i, col) })
				if !z.Mul(vector).Equal(vector.Scale(m.Surd().Complex())) {
					t.Errorf("%v x %v: column of (%v, %v) has another m", j1, j2, j, m)
				}
				raised := rational.NewMatrix(n, 1, func(i, _ int) rational.Complex {
					if m == j {
						return rational.Complex{}
					}
					return c.At(i, col+1).Scale(raise(j, m)) // the next column is (j, m+1)
				})
				if !plus.Mul(vector).Equal(raised) {
					t.Errorf("%v x %v: J+ does not take column (%v, %v) to the next", j1, j2, j, m)
				}
				col++
			}
		}
	}
}

// The float matrix is the exact one, rounded, and goes where it is told.
func TestCouplingMatrixFloat(t *testing.T) {
	dst := make([]float64, 5, 2000)
	for a := range 6 {
		for b := range 6 {
			j1, j2 := rational.Halves(a), rational.Halves(b)
			want := wigner.CouplingMatrix(j1, j2).Float64s(nil)
			for i := range dst[:cap(dst)] {
				dst[:cap(dst)][i] = 99
			}
			got := wigner.CouplingMatrixFloat(dst, j1, j2)
			if !slices.Equal(got, want) || &got[0] != &dst[0] {
				t.Errorf("%v x %v: %v, want %v", j1, j2, got, want)
			}
		}
	}
	if got := wigner.CouplingMatrixFloat(nil, rational.Int(0), rational.Int(0)); len(got) != 1 || got[0] != 1 {
		t.Errorf("0 x 0: %v", got)
	}
	if n := testing.AllocsPerRun(10, func() { wigner.CouplingMatrixFloat(dst, rational.Int(3), rational.Halves(5)) }); n != 0 {
		t.Errorf("%v allocations", n)
	}
}

func TestIteratorsStop(t *testing.T) {
	h := rational.Halves
	for range wigner.Projections(h(3)) {
		break
	}
	for range wigner.ProductStates(h(3), h(2)) {
		break
	}
	for range wigner.CoupledStates(h(3), h(2)) {
		break
	}
	var got []string
	for j := range wigner.Resultants(h(3), h(2)) {
		got = append(got, j.String())
	}
	if len(got) != 3 || got[0] != "1/2" || got[2] != "5/2" {
		t.Errorf("3/2 and 1 couple to %v", got)
	}
}
