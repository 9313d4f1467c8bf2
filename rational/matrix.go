package rational

import (
	"fmt"
	"strings"
)

// Matrix is an exact dense matrix of complex numbers. The zero value is the empty matrix.
//
// Matrices are immutable values, safe for concurrent use. Indices count from 0; an index out of
// range panics with *ArgumentError, as do operands whose shapes do not fit.
type Matrix struct {
	rows, cols int
	entries    []Complex // row-major; never changed after it is built
}

// NewMatrix returns the matrix with entry(i, j) in row i, column j. It panics with *ArgumentError
// for a negative number of rows or columns.
func NewMatrix(rows, cols int, entry func(i, j int) Complex) Matrix {
	if rows < 0 || cols < 0 {
		panic(&ArgumentError{"rational.NewMatrix", "rows, cols", fmt.Sprintf("%d, %d", rows, cols), "both >= 0"})
	}
	m := Matrix{rows, cols, make([]Complex, 0, rows*cols)}
	for i := range rows {
		for j := range cols {
			m.entries = append(m.entries, entry(i, j))
		}
	}
	return m
}

// Identity returns the n x n unit matrix.
func Identity(n int) Matrix {
	return NewMatrix(n, n, func(i, j int) Complex {
		if i == j {
			return Ratio(1, 1).Complex()
		}
		return Complex{}
	})
}

// Dims returns the number of rows and of columns.
func (m Matrix) Dims() (rows, cols int) { return m.rows, m.cols }

// At returns the entry in row i, column j.
func (m Matrix) At(i, j int) Complex {
	if i < 0 || i >= m.rows || j < 0 || j >= m.cols {
		panic(&ArgumentError{"rational.Matrix.At", "i, j", fmt.Sprintf("%d, %d", i, j),
			fmt.Sprintf("i from 0 to %d, j from 0 to %d", m.rows-1, m.cols-1)})
	}
	return m.entries[i*m.cols+j]
}

// Equal reports whether m and n have the same shape and entries.
func (m Matrix) Equal(n Matrix) bool {
	if m.rows != n.rows || m.cols != n.cols {
		return false
	}
	for i := range m.entries {
		if !m.entries[i].Equal(n.entries[i]) {
			return false
		}
	}
	return true
}

// Add returns m + n.
func (m Matrix) Add(n Matrix) Matrix {
	m.mustFit("rational.Matrix.Add", n, n.rows == m.rows && n.cols == m.cols)
	return NewMatrix(m.rows, m.cols, func(i, j int) Complex { return m.At(i, j).Add(n.At(i, j)) })
}

// Sub returns m - n.
func (m Matrix) Sub(n Matrix) Matrix {
	m.mustFit("rational.Matrix.Sub", n, n.rows == m.rows && n.cols == m.cols)
	return NewMatrix(m.rows, m.cols, func(i, j int) Complex { return m.At(i, j).Sub(n.At(i, j)) })
}

// Scale returns c*m.
func (m Matrix) Scale(c Complex) Matrix {
	return NewMatrix(m.rows, m.cols, func(i, j int) Complex { return m.At(i, j).Mul(c) })
}

// Mul returns the matrix product m*n.
func (m Matrix) Mul(n Matrix) Matrix {
	m.mustFit("rational.Matrix.Mul", n, n.rows == m.cols)
	return NewMatrix(m.rows, n.cols, func(i, j int) Complex {
		var z Complex
		for k := range m.cols {
			if a, b := m.At(i, k), n.At(k, j); !a.IsZero() && !b.IsZero() {
				z = z.Add(a.Mul(b))
			}
		}
		return z
	})
}

// Adjoint returns the conjugate transpose of m.
func (m Matrix) Adjoint() Matrix {
	return NewMatrix(m.cols, m.rows, func(i, j int) Complex { return m.At(j, i).Conj() })
}

func (m Matrix) mustFit(fn string, n Matrix, fits bool) {
	if !fits {
		panic(&ArgumentError{fn, "n", fmt.Sprintf("%d x %d matrix", n.rows, n.cols),
			fmt.Sprintf("a shape that fits a %d x %d matrix", m.rows, m.cols)})
	}
}

// Complex128s writes the entries, row by row and each part rounded to the nearest float64, to dst
// from index 0, reusing dst where its capacity suffices, and returns the result.
func (m Matrix) Complex128s(dst []complex128) []complex128 {
	dst = append(dst[:0], make([]complex128, len(m.entries))...)
	for i, c := range m.entries {
		dst[i] = c.Complex128()
	}
	return dst
}

// Float64s writes the entries, row by row and rounded to the nearest float64, to dst from index 0,
// reusing dst where its capacity suffices, and returns the result, which is in the layout that
// gonum's mat.NewDense takes. It panics with *ArgumentError for an entry that is not real.
func (m Matrix) Float64s(dst []float64) []float64 {
	dst = append(dst[:0], make([]float64, len(m.entries))...)
	for i, c := range m.entries {
		if !c.IsReal() {
			panic(&ArgumentError{"rational.Matrix.Float64s", fmt.Sprintf("entry %d, %d", i/m.cols, i%m.cols), c.String(), "a real number"})
		}
		dst[i] = c.Re.Float64()
	}
	return dst
}

// LaTeX returns m for math mode, as a pmatrix environment of amsmath.
func (m Matrix) LaTeX() string {
	var b strings.Builder
	b.WriteString("\\begin{pmatrix}\n")
	for i, c := range m.entries {
		b.WriteString(c.LaTeX())
		if i%m.cols == m.cols-1 {
			b.WriteString(" \\\\\n")
		} else {
			b.WriteString(" & ")
		}
	}
	b.WriteString("\\end{pmatrix}")
	return b.String()
}

// String returns the rows on lines of their own, the entries separated by two or more spaces and
// aligned in columns.
func (m Matrix) String() string {
	texts := make([]string, len(m.entries))
	width := make([]int, m.cols)
	for i, c := range m.entries {
		texts[i] = c.String()
		width[i%m.cols] = max(width[i%m.cols], len(texts[i]))
	}
	var b strings.Builder
	for i, t := range texts {
		fmt.Fprintf(&b, "%*s", width[i%m.cols], t)
		if i%m.cols == m.cols-1 {
			b.WriteByte('\n')
		} else {
			b.WriteString("  ")
		}
	}
	return b.String()
}
