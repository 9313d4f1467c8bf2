package wigner_test

import (
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// Random values from SymPy; the head of the table names version and program.
func TestOracle(t *testing.T) {
	counts := published.Counter{}
	for _, row := range published.Rows(t, "oracle", "symbols.csv") {
		symbol := map[string]func(a, b, c, d, e, f rational.Half) rational.Surd{"3j": wigner.ThreeJ, "cg": wigner.ClebschGordan}[row.Text("symbol")]
		if symbol == nil {
			continue
		}
		a := row.Halves("a1", "a2", "a3", "a4", "a5", "a6")
		if got := symbol(a[0], a[1], a[2], a[3], a[4], a[5]); !row.Agrees(got) {
			t.Errorf("%v, SymPy %v", got, row)
		}
		counts["SymPy, "+row.Text("symbol")]++
	}
	counts.Log(t)
	if counts["SymPy, 3j"] != 500 || counts["SymPy, cg"] != 500 {
		t.Error("the table has 500 rows of each symbol")
	}
}
