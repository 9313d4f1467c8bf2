package wigner

import "example.org/couplet/rational"

// CouplingMatrixFloat returns the matrix of [CouplingMatrix], row by row, each coefficient the nearest
// float64, in the layout that gonum's mat.NewDense takes. It is written to dst from index 0, reusing dst
// where its capacity suffices. The matrix has n = (2j1+1)(2j2+1) rows and columns. CouplingMatrixFloat panics
// with *rational.ArgumentError for a negative argument.
func CouplingMatrixFloat(dst []float64, j1, j2 rational.Half) []float64 {
	const fn = "wigner.CouplingMatrixFloat"
	mustMomentum(fn, "j1", j1)
	mustMomentum(fn, "j2", j2)
	a, b := j1.Twice(), j2.Twice() // loops over halves, since iterators would allocate
	n := (a + 1) * (b + 1)
	if cap(dst) < n*n {
		dst = make([]float64, n*n)
	}
	dst = dst[:n*n]
	clear(dst)
	first := 0 // column of j, m = -j
	for j := max(a-b, b-a); j <= a+b; j += 2 {
		row := 0
		for x := -a; x <= a; x += 2 {
			for y := -b; y <= b; y += 2 {
				if m := x + y; m <= j && -m <= j {
					dst[row*n+first+(m+j)/2] = ClebschGordanFloat(j1, rational.Halves(x), j2, rational.Halves(y), rational.Halves(j), rational.Halves(m))
				}
				row++
			}
		}
		first += j + 1
	}
	return dst
}
