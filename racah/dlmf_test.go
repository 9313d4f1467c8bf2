package racah_test

import (
	"testing"

	"example.org/couplet/internal/dlmf"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// The identities of sections 34.4 to 34.7 of the NIST Digital Library of Mathematical Functions,
// version 1.2.4, https://dlmf.nist.gov/34, each as a subtest under its number, on all arguments of a
// small domain and in exact arithmetic.
//
// Momenta and projections are held as twice their values, so that 1 in an equation is 2 here, and 2j+1
// is j+1; factorials, phases and hypergeometric take their arguments in the same way.
func TestDLMF(t *testing.T) {
	for _, list := range [][]dlmf.Identity{sixJSums, sixJSpecial, sixJSymmetries, sixJRecursion, sixJOrthogonality, sixJSingleSums, nineJIdentities} {
		for _, id := range list {
			t.Run(id.Equation, id.Run)
		}
	}
}

func sixJ(j1, j2, j3, l1, l2, l3 int) rational.Surd {
	return racah.SixJ(h(j1), h(j2), h(j3), h(l1), h(l2), h(l3))
}

func nineJ(j11, j12, j13, j21, j22, j23, j31, j32, j33 int) rational.Surd {
	return racah.NineJ(h(j11), h(j12), h(j13), h(j21), h(j22), h(j23), h(j31), h(j32), h(j33))
}
