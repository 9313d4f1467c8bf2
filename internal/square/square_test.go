package square

import "testing"

var orders = []struct {
	order [3]int
	odd   bool
}{
	{[3]int{0, 1, 2}, false}, {[3]int{1, 2, 0}, false}, {[3]int{2, 0, 1}, false},
	{[3]int{1, 0, 2}, true}, {[3]int{0, 2, 1}, true}, {[3]int{2, 1, 0}, true},
}

// All arrays with entries to 3, against all 36 odd symmetries: permutations of rows and of columns, of
// which one is odd, with and without the reflection in the diagonal.
func TestLinesEqual(t *testing.T) {
	fixed := 0
	for n := range 1 << 18 {
		var a Array
		for i := range a {
			a[i] = n >> (2 * i) & 3
		}
		want := false
		for _, rows := range orders {
			for _, columns := range orders {
				if rows.odd == columns.odd {
					continue
				}
				same, reflected := true, true
				for i := range 3 {
					for j := range 3 {
						v := a[3*rows.order[i]+columns.order[j]]
						same = same && v == a[3*i+j]
						reflected = reflected && v == a[3*j+i]
					}
				}
				want = want || same || reflected
			}
		}
		if want {
			fixed++
		}
		if a.LinesEqual() != want {
			t.Fatalf("%v: LinesEqual %v, an odd symmetry %v", a, !want, want)
		}
	}
	if fixed == 0 {
		t.Error("no array has an odd symmetry")
	}
}
