// Package square holds the 72 permutations of a three by three array of numbers, under which a 9j
// symbol, and a 3j symbol written as Regge's square, keep their value up to a sign: permutations of
// rows and of columns, and the reflection in the diagonal.
package square

// Array is read row by row.
type Array [9]int

var permutations = [6]struct {
	order [3]int
	odd   bool
}{
	{[3]int{0, 1, 2}, false}, {[3]int{1, 2, 0}, false}, {[3]int{2, 0, 1}, false},
	{[3]int{1, 0, 2}, true}, {[3]int{0, 2, 1}, true}, {[3]int{2, 1, 0}, true},
}

// All calls yield with each of the 72 arrays that the permutations make of a, and with whether the
// permutation is odd: the reflection counts as even, the exchange of two rows or columns as odd.
func (a Array) All(yield func(b Array, odd bool) bool) {
	for _, rows := range permutations {
		for _, cols := range permutations {
			var b, reflected Array
			for i := range 3 {
				for j := range 3 {
					v := a[3*rows.order[i]+cols.order[j]]
					b[3*i+j], reflected[3*j+i] = v, v
				}
			}
			odd := rows.odd != cols.odd
			if !yield(b, odd) || !yield(reflected, odd) {
				return
			}
		}
	}
}

// OddSymmetry reports whether an odd permutation leaves a as it is.
func (a Array) OddSymmetry() bool {
	for b, odd := range a.All {
		if odd && b == a {
			return true
		}
	}
	return false
}
