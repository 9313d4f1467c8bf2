// Package square knows the symmetries of a three by three array of numbers: a 9j symbol, or a 3j symbol
// written as Regge's square. An exchange of two rows or of two columns keeps the value of either up to a
// sign.
package square

// Array is read row by row.
type Array [9]int

// LinesEqual reports whether two rows, or two columns, are equal: their exchange then changes nothing but
// the sign. Every array that any odd one of the 72 symmetries leaves alone is of this kind.
func (a Array) LinesEqual() bool {
	for _, p := range [3][2]int{{0, 1}, {1, 2}, {2, 0}} {
		i, j := p[0], p[1]
		rows := a[3*i] == a[3*j] && a[3*i+1] == a[3*j+1] && a[3*i+2] == a[3*j+2]
		columns := a[i] == a[j] && a[3+i] == a[3+j] && a[6+i] == a[6+j]
		if rows || columns {
			return true
		}
	}
	return false
}
