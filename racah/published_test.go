package racah_test

import (
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// The source of each row stands in the table.
func TestPublishedSixJNineJ(t *testing.T) {
	counts := published.Counter{}
	for _, row := range published.Rows(t, "published", "sixj_ninej_values.csv") {
		var q []rational.Half
		for _, column := range "abcdefghi" {
			if row.Text(string(column)) != "" {
				q = append(q, row.Half(string(column)))
			}
		}
		var got rational.Surd
		switch row.Text("kind") {
		case "6j":
			got = racah.SixJ(q[0], q[1], q[2], q[3], q[4], q[5])
		case "9j":
			got = racah.NineJ(q[0], q[1], q[2], q[3], q[4], q[5], q[6], q[7], q[8])
		default:
			t.Fatalf("unknown kind %q", row.Text("kind"))
		}
		if !row.Agrees(got) {
			t.Errorf("%v, published %v", got, row)
		}
		counts[row.Text("kind")+", "+row.Text("how")+": "+row.Text("source")]++
	}
	counts.Log(t)
}
