package main

import (
	"bytes"
	"encoding/csv"
	"encoding/json"
	"errors"
	"flag"
	"os"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"github.com/google/go-cmp/cmp"
)

var update = flag.Bool("update", false, "rewrite the golden files")

// program runs the program.
func program(args ...string) (status int, stdout, stderr string) {
	var out, messages bytes.Buffer
	status = run(args, &out, &messages)
	return status, out.String(), messages.String()
}

// succeed runs the program and returns what it writes to standard output.
func succeed(t *testing.T, args ...string) string {
	t.Helper()
	status, stdout, stderr := program(args...)
	if status != 0 || stderr != "" {
		t.Fatalf("%q: status %d, %s", args, status, stderr)
	}
	return stdout
}

func TestGolden(t *testing.T) {
	for _, test := range []struct {
		golden string
		args   []string
	}{
		{"demo.txt", nil},
		{"demo.csv", []string{"-format", "csv"}},
		{"hcn.txt", []string{"-velocity", "testdata/hcn.toml"}},
		{"hcn.json", []string{"testdata/hcn.toml", "-format=json", "-velocity"}},
		{"rb87_d2.txt", []string{"testdata/rb87_d2.toml"}},
		{"rb87_d2.csv", []string{"-format", "csv", "-velocity", "testdata/rb87_d2.toml"}},
		{"oxygen_777.txt", []string{"testdata/oxygen_777.toml"}},
		{"oxygen_777.json", []string{"-format", "json", "testdata/oxygen_777.toml"}},
	} {
		got := succeed(t, test.args...)
		name := filepath.Join("testdata", "golden", test.golden)
		if *update {
			if err := os.WriteFile(name, []byte(got), 0o644); err != nil {
				t.Fatal(err)
			}
		}
		want, err := os.ReadFile(name)
		if err != nil {
			t.Fatal(err)
		}
		if diff := cmp.Diff(string(want), got); diff != "" {
			t.Errorf("%s differs, golden is -:\n%s", name, diff)
		}
	}
}

// What the demonstration prints says that it is invented, in every form.
func TestDemoIsMarked(t *testing.T) {
	for format := range writers {
		if out := succeed(t, "-format", format); !strings.Contains(out, "INVENTED") {
			t.Errorf("format %s does not say that the data are invented", format)
		}
	}
}

// The usage goes to standard output. It is the package comment, line by line, and what it shows of a
// file is right.
func TestHelp(t *testing.T) {
	source, err := os.ReadFile("main.go")
	if err != nil {
		t.Fatal(err)
	}
	comment, _, _ := strings.Cut(strings.NewReplacer("//\t", "  ", "// ", "", "//", "").Replace(string(source)), "package main")
	usage := succeed(t, "-h")
	if text := strings.TrimPrefix(usage, "usage:\n\n"); !strings.Contains(comment, text) {
		t.Errorf("the package comment does not hold the usage:\n%s", cmp.Diff(text, comment))
	}
	_, sample, _ := strings.Cut(usage, "A file reads\n")
	sample, _, _ = strings.Cut(sample, "Nuclear spins")
	// The sample shows the keys of two trades at once, and one level: the second is added here.
	ground, line, _ := strings.Cut(sample, "[line]")
	ground = regexp.MustCompile(`(?m)^ *(A_hfs|B_hfs) .*\n`).ReplaceAllString(ground, "")
	excited := strings.NewReplacer("level.ground", "level.excited", "J = 0", "J = 1", "energy_by_F = { 1 =", "energy_by_F = { 0 = \"12 cm-1\", 2 = \"12 cm-1\", 1 =").Replace(ground[strings.Index(ground, "[level"):])
	name := filepath.Join(t.TempDir(), "in.toml")
	if err := os.WriteFile(name, []byte(ground+excited+"[line]"+line), 0o644); err != nil {
		t.Fatal(err)
	}
	succeed(t, name)
}

// testList returns the list of an input.
func testList(t *testing.T, name string) *lineList {
	t.Helper()
	data, err := os.ReadFile(name)
	if err != nil {
		t.Fatal(err)
	}
	s, err := readScenario(name, data)
	if err != nil {
		t.Fatal(err)
	}
	l, err := s.list()
	if err != nil {
		t.Fatal(err)
	}
	return l
}

var inputs = []string{"demo.toml", "testdata/hcn.toml", "testdata/rb87_d2.toml", "testdata/oxygen_777.toml"}

func TestCSVReadsBack(t *testing.T) {
	for _, name := range inputs {
		l := testList(t, name)
		r := csv.NewReader(strings.NewReader(succeed(t, "-format", "csv", "-velocity", name)))
		r.Comment = '#'
		rows, err := r.ReadAll()
		if err != nil || len(rows) != 1+len(l.entries) {
			t.Fatalf("%s: %d rows, %v", name, len(rows), err)
		}
		for i, e := range l.entries {
			field := make(map[string]string)
			for c, column := range rows[0] {
				field[column] = rows[i+1][c]
			}
			for column, want := range map[string]float64{"frequency_MHz": e.Position, "offset_MHz": e.offset, "velocity_radio_km_s": e.velocity,
				"strength_decimal": e.Strength.Float64(), "share_decimal": e.share.Float64(), "upper_degeneracy": float64(e.Final.Degeneracy())} {
				if got, err := strconv.ParseFloat(field[column], 64); err != nil || got != want {
					t.Errorf("%s: %s = %q, want %v", name, column, field[column], want)
				}
			}
			want := map[string]string{"strength": e.Strength.String(), "share": e.share.String()}
			for n, v := range e.Final.All() {
				want["upper_"+n] = v.String()
			}
			for n, v := range e.Initial.All() {
				want["lower_"+n] = v.String()
			}
			for column, w := range want {
				if field[column] != w {
					t.Errorf("%s: %s = %q, want %q", name, column, field[column], w)
				}
			}
			if len(field) != len(want)+6 {
				t.Errorf("%s: columns %q", name, rows[0])
			}
		}
	}
}

func TestJSONReadsBack(t *testing.T) {
	for _, name := range inputs {
		l := testList(t, name)
		var got listJSON
		d := json.NewDecoder(strings.NewReader(succeed(t, "-format", "json", "-velocity", name)))
		d.DisallowUnknownFields()
		if err := d.Decode(&got); err != nil {
			t.Fatal(err)
		}
		if got.Title != l.title || got.Total != l.total.String() || got.Reference != l.reference || len(got.Lines) != len(l.entries) {
			t.Errorf("%s: %+v", name, got)
		}
		for i, e := range l.entries {
			want := entryJSON{e.Position, e.offset, &e.velocity, numbersText(e.Final), numbersText(e.Initial), e.Strength.String(), e.Strength.Float64(),
				e.share.String(), e.share.Float64(), e.Final.Degeneracy()}
			if diff := cmp.Diff(want, got.Lines[i]); diff != "" {
				t.Errorf("%s: %s", name, diff)
			}
		}
	}
}

type brokenWriter struct{}

func (brokenWriter) Write([]byte) (int, error) { return 0, errors.New("no room left") }

func TestStandardOutputFails(t *testing.T) {
	var messages bytes.Buffer
	if status := run(nil, brokenWriter{}, &messages); status != 2 || messages.String() != "linelist: standard output: no room left; allowed: a place that can be written\n" {
		t.Errorf("status %d, %q", status, messages.String())
	}
}
