package lines_test

import (
	"math"
	"testing"

	"example.org/couplet/racah"
	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

func phase(twice int) rational.Surd {
	if twice/2&1 != 0 {
		return rational.Ratio(-1, 1)
	}
	return rational.Ratio(1, 1)
}

// stretchedReduced returns <j||T(k)||j> of the tensor with <j j|T_0|j j> = 1, Edmonds (5.4.1); ok is
// false where there is none.
func stretchedReduced(j rational.Half, k int) (r rational.Surd, ok bool) {
	s := wigner.ThreeJ(j, rational.Int(k), j, j.Neg(), rational.Half{}, j)
	if s.IsZero() {
		return s, false
	}
	return s.Inv(), true
}

// The factors of A and B are those of the scalar products of two tensors of rank 1 and 2, by Edmonds
// (7.1.6) with a 6j symbol: <I·J> = I J <T1·U1> and B/4 <T2·U2>, T and U being 1 when stretched.
func TestFactorsByTensors(t *testing.T) {
	quadrupoles := 0
	for j := range momenta(9) {
		for i := range momenta(9) {
			for f := range wigner.Resultants(j, i) {
				for k := 1; k <= 2; k++ {
					want := rational.Surd{}
					tj, okJ := stretchedReduced(j, k)
					ti, okI := stretchedReduced(i, k)
					if okJ && okI {
						want = racah.SixJ(f, i, j, rational.Int(k), j, i).Mul(phase(j.Twice() + i.Twice() + f.Twice())).Mul(tj).Mul(ti)
					}
					got := lines.QuadrupoleFactor(j, i, f).Mul(rational.Ratio(4, 1))
					if k == 1 {
						got = lines.DipoleFactor(j, i, f)
						want = want.Mul(j.Surd()).Mul(i.Surd())
					} else if !got.IsZero() {
						quadrupoles++
					}
					if !got.Equal(want) {
						t.Errorf("rank %d, J=%v I=%v F=%v: %v, by tensors %v", k, j, i, f, got, want)
					}
				}
			}
		}
	}
	if quadrupoles != 330 {
		t.Errorf("%d quadrupole factors: the domain has 330", quadrupoles)
	}
}

// Rows of Casimir's function from Townes and Schawlow 1955, Microwave Spectroscopy, appendix I, from memory.
func TestCasimirFunctionPublished(t *testing.T) {
	for _, test := range []struct {
		j, twiceI, twiceF int
		want              float64
	}{
		{1, 2, 0, 0.5}, {1, 2, 2, -0.25}, {1, 2, 4, 0.05},
		{2, 2, 2, 0.25}, {2, 2, 4, -0.25}, {2, 2, 6, 0.071429},
		{1, 3, 1, 0.25}, {1, 3, 3, -0.2}, {1, 3, 5, 0.05},
		{1, 5, 3, 0.14}, {1, 5, 5, -0.16}, {1, 5, 7, 0.05},
		{0, 2, 2, 0}, // no quadrupole energy without rotation
		{1, 1, 3, 0}, // nor for a spin 1/2
		{1, 2, 6, 0}, // F is not allowed
	} {
		y := lines.CasimirFunction(rational.Int(test.j), rational.Halves(test.twiceI), rational.Halves(test.twiceF))
		if got := math.Round(y.Float64()*1e6) / 1e6; got != test.want {
			t.Errorf("Y(%d, %d/2, %d/2) = %v, published %v", test.j, test.twiceI, test.twiceF, y, test.want)
		}
	}
}

// The energies of one J add up to zero over all magnetic substates; the largest momenta keep to exact
// arithmetic.
func TestFactorTraces(t *testing.T) {
	for n := range 20 {
		j := rational.Halves(n)
		if n >= 10 {
			j = rational.Halves(1<<20 + n)
		}
		for i := range momenta(9) {
			var dipole, quadrupole rational.Sum
			for f := range wigner.Resultants(j, i) {
				weight := rational.Ratio(int64(f.Twice())+1, 1)
				dipole = dipole.Add(lines.DipoleFactor(j, i, f).Mul(weight).Sum())
				quadrupole = quadrupole.Add(lines.QuadrupoleFactor(j, i, f).Mul(weight).Sum())
			}
			if !dipole.IsZero() || !quadrupole.IsZero() {
				t.Errorf("J=%v I=%v: traces %v and %v", j, i, dipole, quadrupole)
			}
		}
	}
	big := rational.Halves(math.MaxInt32 - 1) // K^2 takes 124 bits
	if got := lines.DipoleFactor(big, rational.Halves(1), big.Add(rational.Halves(1))); got.String() != "1073741823/2" {
		t.Errorf("dipole factor of the largest J: %v", got)
	}
	if got := lines.QuadrupoleFactor(rational.Int(1<<29), rational.Int(1<<29-1), rational.Int(1<<30-1)); !got.Equal(rational.Ratio(1, 4)) {
		t.Errorf("stretched quadrupole factor: %v", got)
	}
}

// tensorElement returns <j m|T_0|j m> of the tensor that is 1 for m = j.
func tensorElement(k int, j, m rational.Half) rational.Surd {
	switch k {
	case 0:
		return rational.Ratio(1, 1)
	case 1: // Jz
		return m.Surd().Quo(j.Surd())
	}
	tj, tm := int64(j.Twice()), int64(m.Twice()) // 3Jz^2 - J^2
	return rational.Ratio(3*tm*tm-tj*(tj+2), 2*tj*(tj-1))
}

// The projection factor is the expectation value of T_0 in the stretched state of the total, by
// Clebsch-Gordan coefficients; for rank 1 it is Landé's.
func TestProjectionFactorDirect(t *testing.T) {
	for k := range 3 {
		for j := range momenta(7) {
			for s := range momenta(5) {
				for x := range wigner.Resultants(j, s) {
					var want rational.Sum
					if j.Twice() >= k && x.Twice() >= k {
						for p, amplitude := range coupled(j, []rational.Half{s}, []rational.Half{x}, x) {
							want = want.Add(amplitude.Mul(amplitude).Scale(tensorElement(k, j, p.first)))
						}
					}
					got := lines.ProjectionFactor(k, j, s, x)
					if !got.Sum().Equal(want) {
						t.Errorf("rank %d, (%v %v)%v: %v, directly %v", k, j, s, x, got, want)
					}
					if k == 1 && x.Twice() > 0 && j.Twice() > 0 {
						product := lines.DipoleFactor(j, x, s).Neg() // <j·x> = (j^2 + x^2 - s^2)/2
						g := product.Quo(x.Surd().Mul(x.Add(rational.Int(1)).Surd()))
						if !got.Equal(g.Mul(x.Surd()).Quo(j.Surd())) {
							t.Errorf("(%v %v)%v: %v, Landé's factor makes %v", j, s, x, got, g)
						}
					}
				}
			}
		}
	}
}

// scalarProduct returns the expectation value of T(k)·U(k) in |((j i1)f1 i2)f f>, T acting on j and U
// on i2, both 1 when stretched, by Clebsch-Gordan coefficients alone.
func scalarProduct(k int, j, i1, f1, i2, f rational.Half) rational.Sum {
	tj, okJ := stretchedReduced(j, k)
	ti, okI := stretchedReduced(i2, k)
	var sum rational.Sum
	if !okJ || !okI {
		return sum
	}
	type projections struct{ j, i1, i2 rational.Half }
	amplitudes := make(map[projections]rational.Surd)
	for m2 := range wigner.Projections(i2) {
		for m1 := range wigner.Projections(i1) {
			mf1 := f.Sub(m2)
			m := mf1.Sub(m1)
			if mf1.Abs().Cmp(f1) > 0 || m.Abs().Cmp(j) > 0 {
				continue
			}
			amplitudes[projections{m, m1, m2}] = wigner.ClebschGordan(j, m, i1, m1, f1, mf1).Mul(wigner.ClebschGordan(f1, mf1, i2, m2, f, f))
		}
	}
	element := func(x, mp, m rational.Half, q rational.Half, reduced rational.Surd) rational.Surd { // Edmonds (5.4.1)
		return wigner.ThreeJ(x, rational.Int(k), x, mp.Neg(), q, m).Mul(reduced).Mul(phase(x.Sub(mp).Twice()))
	}
	for q := range wigner.Projections(rational.Int(k)) {
		for p, amplitude := range amplitudes {
			bra := projections{p.j.Add(q), p.i1, p.i2.Sub(q)}
			other, ok := amplitudes[bra]
			if !ok {
				continue
			}
			term := element(j, bra.j, p.j, q, tj).Mul(element(i2, bra.i2, p.i2, q.Neg(), ti)).Mul(phase(q.Twice()))
			sum = sum.Add(term.Mul(amplitude).Mul(other).Sum())
		}
	}
	return sum
}

// The energies of the second nucleus against the product basis: -eqQ J/(2J+3) T2·U2/4 and
// C_I J I T1·U1. The factor is exact until the last rounding, so the floats are equal.
func TestSecondNucleusDirect(t *testing.T) {
	c := parseCoupling(t, "((J I1)F1 I2)F")
	checked, nonzero := 0, 0
	for j := range momenta(5) {
		for i1 := range momenta(3) {
			for i2 := range momenta(3) {
				numbers := map[string]rational.Half{"J": j, "I1": i1, "I2": i2}
				quadrupole := mustLevel(t, c, numbers, lines.MolecularNucleus{Spin: "I2", EqQ: -1})
				magnetic := mustLevel(t, c, numbers, lines.MolecularNucleus{Spin: "I2", CI: 1})
				axis := rational.Ratio(int64(j.Twice()), 8*(int64(j.Twice())+3)) // J/(2J+3)/4
				for s := range quadrupole.States() {
					f1, f := s.Number("F1"), s.Number("F")
					q, _ := scalarProduct(2, j, i1, f1, i2, f).Scale(axis).Surd()
					if got := quadrupole.Energy(s); got != q.Float64() {
						t.Errorf("%v: quadrupole factor %v, directly %v", s, got, q)
					}
					m, _ := scalarProduct(1, j, i1, f1, i2, f).Scale(j.Surd().Mul(i2.Surd())).Surd()
					if got := magnetic.Energy(s); got != m.Float64() {
						t.Errorf("%v: dipole factor %v, directly %v", s, got, m)
					}
					checked++
					if !q.IsZero() {
						nonzero++
					}
				}
			}
		}
	}
	if checked != 446 || nonzero != 205 {
		t.Errorf("%d states, %d with a quadrupole energy: the domain has 446 and 205", checked, nonzero)
	}
}

// A first nucleus without spin leaves Casimir's function to the second, and the second has no energy
// on the average over F, within each F1.
func TestSecondNucleusReduces(t *testing.T) {
	c := parseCoupling(t, "((J I1)F1 I2)F")
	for j := 1; j <= 4; j++ {
		for i2 := range momenta(5) {
			for i1 := range momenta(3) {
				l := mustLevel(t, c, map[string]rational.Half{"J": rational.Int(j), "I1": i1, "I2": i2}, lines.MolecularNucleus{Spin: "I2", EqQ: -3, CI: 0.5})
				trace, scale := make(map[rational.Half]float64), 0.0
				for s := range l.States() {
					e := l.Energy(s)
					if i1 == (rational.Half{}) {
						y := lines.CasimirFunction(rational.Int(j), i2, s.Number("F")).Float64()
						k := lines.DipoleFactor(rational.Int(j), i2, s.Number("F")).Float64()
						if want := float64(3*y) + float64(0.5*k); e != want {
							t.Errorf("%v: %v, Casimir's function gives %v", s, e, want)
						}
					}
					trace[s.Number("F1")] += float64(s.Degeneracy()) * e
					scale = max(scale, math.Abs(float64(s.Degeneracy())*e))
				}
				for f1, sum := range trace {
					if math.Abs(sum) > 1e-14*scale { // a dozen terms, each good to 2^-52 of the largest
						t.Errorf("J=%d I1=%v F1=%v I2=%v: trace %v", j, i1, f1, i2, sum)
					}
				}
			}
		}
	}
}
