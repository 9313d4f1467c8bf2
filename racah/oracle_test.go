package racah_test

import (
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// Random values from SymPy; the head of the table names version and program.
func TestOracle(t *testing.T) {
	counts := published.Counter{}
	for _, row := range published.Rows(t, "oracle", "symbols.csv") {
		var got rational.Surd
		switch row.Text("symbol") {
		case "6j":
			a := row.Halves("a1", "a2", "a3", "a4", "a5", "a6")
			got = racah.SixJ(a[0], a[1], a[2], a[3], a[4], a[5])
		case "w":
			a := row.Halves("a1", "a2", "a3", "a4", "a5", "a6")
			got = racah.W(a[0], a[1], a[2], a[3], a[4], a[5])
		case "9j":
			a := row.Halves("a1", "a2", "a3", "a4", "a5", "a6", "a7", "a8", "a9")
			got = racah.NineJ(a[0], a[1], a[2], a[3], a[4], a[5], a[6], a[7], a[8])
		default:
			continue
		}
		if !row.Agrees(got) {
			t.Errorf("%v, SymPy %v", got, row)
		}
		counts["SymPy, "+row.Text("symbol")]++
	}
	counts.Log(t)
	if counts["SymPy, 6j"] != 500 || counts["SymPy, w"] != 500 || counts["SymPy, 9j"] != 500 {
		t.Error("the table has 500 rows of each symbol")
	}
}
