// Package square knows the symmetries of a three by three array of numbers: a 9j symbol, or a 3j symbol
// written as Regge's square. An exchange of two rows or of two columns keeps the value of either up to a
// sign.
package square

// Array is read row by row.
type Array [9]int

// LinesEqual reports whether two rows, or two columns, are equal: their exchange then changes nothing but
// the sign. Every array that any odd one of the 72 symmetries leaves alone is of this kind.
func (a *Array) LinesEqual() bool {
	equal := func(i, j, step int) bool {
		return (a[i]^a[j])|(a[i+step]^a[j+step])|(a[i+2*step]^a[j+2*step]) == 0 // one branch
	}
	return equal(0, 3, 1) || equal(3, 6, 1) || equal(6, 0, 1) || equal(0, 1, 3) || equal(1, 2, 3) || equal(2, 0, 3)
}
