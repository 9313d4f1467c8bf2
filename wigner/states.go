package wigner

import (
	"iter"

	"example.org/couplet/internal/argument"
	"example.org/couplet/rational"
)

// Projections yields the allowed projections of j, from -j to j in steps of 1. It panics with
// *rational.ArgumentError for negative j.
func Projections(j rational.Half) iter.Seq[rational.Half] {
	mustMomentum("wigner.Projections", "j", j)
	return halves(-j.Twice(), j.Twice())
}

// Resultants yields the momenta to which j1 and j2 couple, from |j1-j2| to j1+j2 in steps of 1. It
// panics with *rational.ArgumentError for a negative argument.
func Resultants(j1, j2 rational.Half) iter.Seq[rational.Half] {
	mustMomentum("wigner.Resultants", "j1", j1)
	mustMomentum("wigner.Resultants", "j2", j2)
	return halves(j1.Sub(j2).Abs().Twice(), j1.Add(j2).Twice())
}

// ProductStates yields the projections (m1, m2) of the (2j1+1)(2j2+1) states |j1 m1>|j2 m2>, with m1
// the slower, both ascending. It panics with *rational.ArgumentError for a negative argument.
func ProductStates(j1, j2 rational.Half) iter.Seq2[rational.Half, rational.Half] {
	mustMomentum("wigner.ProductStates", "j1", j1)
	mustMomentum("wigner.ProductStates", "j2", j2)
	return func(yield func(m1, m2 rational.Half) bool) {
		for m1 := range Projections(j1) {
			for m2 := range Projections(j2) {
				if !yield(m1, m2) {
					return
				}
			}
		}
	}
}

// CoupledStates yields the (j, m) of the (2j1+1)(2j2+1) states |(j1 j2) j m>, with j the slower, both
// ascending. It panics with *rational.ArgumentError for a negative argument.
func CoupledStates(j1, j2 rational.Half) iter.Seq2[rational.Half, rational.Half] {
	mustMomentum("wigner.CoupledStates", "j1", j1)
	mustMomentum("wigner.CoupledStates", "j2", j2)
	return func(yield func(j, m rational.Half) bool) {
		for j := range Resultants(j1, j2) {
			for m := range Projections(j) {
				if !yield(j, m) {
					return
				}
			}
		}
	}
}

// CouplingMatrix returns all Clebsch-Gordan coefficients of j1 and j2: the real orthogonal matrix
// with (j1 m1 j2 m2 | j m) in the row of (m1, m2), in the order of [ProductStates], and the column of
// (j, m), in the order of [CoupledStates]. Its adjoint is its inverse, DLMF (34.3.16) and (34.3.17).
// It panics with *rational.ArgumentError for a negative argument.
func CouplingMatrix(j1, j2 rational.Half) rational.Matrix {
	mustMomentum("wigner.CouplingMatrix", "j1", j1)
	mustMomentum("wigner.CouplingMatrix", "j2", j2)
	type state struct{ a, b rational.Half }
	collect := func(states iter.Seq2[rational.Half, rational.Half]) (list []state) {
		for a, b := range states {
			list = append(list, state{a, b})
		}
		return list
	}
	rows, columns := collect(ProductStates(j1, j2)), collect(CoupledStates(j1, j2))
	return rational.NewMatrix(len(rows), len(columns), func(i, k int) rational.Complex {
		return ClebschGordan(j1, rows[i].a, j2, rows[i].b, columns[k].a, columns[k].b).Complex()
	})
}

func mustMomentum(fn, name string, j rational.Half) {
	if err := argument.Momentum(fn, name, j); err != nil {
		panic(err)
	}
}

// halves yields first/2, first/2+1, ... up to last/2.
func halves(first, last int) iter.Seq[rational.Half] {
	return func(yield func(rational.Half) bool) {
		for i := range (last-first)/2 + 1 { // a counter of halves could overflow an int of 32 bits
			if !yield(rational.Halves(first + 2*i)) {
				return
			}
		}
	}
}
