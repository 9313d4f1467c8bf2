// Package published reads the tables of published values under testdata for the tests of this
// module: comma-separated values under a header row, after lines that start with # and tell where
// the values come from.
package published

import (
	"encoding/csv"
	"fmt"
	"maps"
	"math/big"
	"os"
	"path/filepath"
	"sort"
	"strconv"
	"testing"

	"example.org/couplet/rational"
)

// Row is one line of a table, by column.
type Row struct {
	t      testing.TB
	fields map[string]string
}

// Rows returns the rows of a table, its path given relative to the folder testdata at the top of
// the module. It fails the test where the table cannot be read or has no rows.
func Rows(t testing.TB, path ...string) []Row {
	t.Helper()
	name := filepath.Join(append([]string{Root(t), "testdata"}, path...)...)
	f, err := os.Open(name)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	r := csv.NewReader(f)
	r.Comment = '#'
	lines, err := r.ReadAll()
	if err != nil {
		t.Fatalf("%s: %v", name, err)
	}
	if len(lines) < 2 {
		t.Fatalf("%s: no rows", name)
	}
	rows := make([]Row, 0, len(lines)-1)
	for _, line := range lines[1:] {
		row := Row{t, make(map[string]string, len(line))}
		for i, column := range lines[0] {
			row.fields[column] = line[i]
		}
		rows = append(rows, row)
	}
	return rows
}

// Root returns the top folder of the module.
func Root(t testing.TB) string {
	t.Helper()
	dir, err := os.Getwd()
	if err != nil {
		t.Fatal(err)
	}
	for ; ; dir = filepath.Dir(dir) {
		if _, err := os.Stat(filepath.Join(dir, "testdata", "published")); err == nil {
			return dir
		}
		if dir == filepath.Dir(dir) {
			t.Fatal("no folder testdata/published above the package")
		}
	}
}

// Text returns the field of a column, which must exist.
func (r Row) Text(column string) string {
	r.t.Helper()
	v, ok := r.fields[column]
	if !ok {
		r.t.Fatalf("no column %q", column)
	}
	return v
}

// Half returns a quantum number.
func (r Row) Half(column string) rational.Half {
	r.t.Helper()
	h, err := rational.ParseHalf(r.Text(column))
	if err != nil {
		r.t.Fatalf("column %q: %v", column, err)
	}
	return h
}

// Halves returns the quantum numbers of several columns.
func (r Row) Halves(columns ...string) []rational.Half {
	r.t.Helper()
	q := make([]rational.Half, len(columns))
	for i, column := range columns {
		q[i] = r.Half(column)
	}
	return q
}

// SignedRoot returns sign*sqrt(num/den) from the columns of these names.
func (r Row) SignedRoot() rational.Surd {
	r.t.Helper()
	root, err := rational.ParseSurd("sqrt(" + r.Text("num") + "/" + r.Text("den") + ")")
	if err != nil {
		r.t.Fatal(err)
	}
	switch r.Text("sign") {
	case "1":
		return root
	case "-1":
		return root.Neg()
	}
	return rational.Surd{}
}

// Agrees reports whether v = sign*sqrt(num/den), from the columns of these names. It compares squares,
// so that no number need be factored.
func (r Row) Agrees(v rational.Surd) bool {
	r.t.Helper()
	square, ok := new(big.Rat).SetString(r.Text("num") + "/" + r.Text("den"))
	if !ok {
		r.t.Fatalf("num/den = %s/%s", r.Text("num"), r.Text("den"))
	}
	return v.Square().Cmp(square) == 0 && strconv.Itoa(v.Sign()) == r.Text("sign")
}

// String returns the fields that are not empty, by column.
func (r Row) String() string {
	fields := maps.Clone(r.fields)
	maps.DeleteFunc(fields, func(_, v string) bool { return v == "" })
	return fmt.Sprint(fields)
}

// Counter counts rows by where they come from and how.
type Counter map[string]int

// Log writes the counts to the log of the test, sorted.
func (c Counter) Log(t testing.TB) {
	t.Helper()
	keys := make([]string, 0, len(c))
	for k := range c {
		keys = append(keys, k)
	}
	sort.Strings(keys)
	total := 0
	for _, k := range keys {
		t.Logf("%5d  %s", c[k], k)
		total += c[k]
	}
	t.Logf("%5d  rows in all", total)
}

// Effort scales the number of draws of a random test by the environment variable COUPLET_EFFORT, 1
// where it is not set, and to a tenth in a short run.
func Effort(t testing.TB, n int) int {
	t.Helper()
	if text := os.Getenv("COUPLET_EFFORT"); text != "" {
		effort, err := strconv.ParseFloat(text, 64)
		if err != nil || effort <= 0 {
			t.Fatalf("COUPLET_EFFORT = %q; allowed: a positive number", text)
		}
		return int(effort * float64(n))
	}
	if testing.Short() {
		return max(1, n/10)
	}
	return n
}
