package wigner_test

import (
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/wigner"
)

// The head of the table names its source and how it was taken from there.
func TestPublishedClebschGordan(t *testing.T) {
	counts := published.Counter{}
	for _, row := range published.Rows(t, "published", "clebsch_gordan_tables.csv") {
		j1, m1, j2, m2 := row.Half("j1"), row.Half("m1"), row.Half("j2"), row.Half("m2")
		j, m := row.Half("J"), row.Half("M")
		if got := wigner.ClebschGordan(j1, m1, j2, m2, j, m); !row.Agrees(got) {
			t.Errorf("%v, published %v", got, row)
		}
		counts["Particle Data Group, table of Clebsch-Gordan coefficients (memory, some read)"]++
	}
	counts.Log(t)
}
