package main

import (
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// base is a file without fault; each case of TestWrongFiles replaces a part of it.
const base = `title = "a line"
species = "HCN"

[level.ground]
coupling = "(J I)F"
numbers = { J = 0, I = 1 }
B_rot = "44.3 GHz"

[level.excited]
coupling = "(J I)F"
numbers = { J = 1, I = 1 }
B_rot = "44.3 GHz"
eqQ = "-4.7 MHz"

[level."2P"]
coupling = "((L S)J I)F"
numbers = { L = 1, S = "1/2", J = "3/2", I = "3/2" }
energy = "12578.95 cm-1"
A_hfs = "84.7 MHz"
B_hfs = "12.5 MHz"

[line]
lower = "ground"
upper = "excited"
`

const (
	quantityText = `a string of a number, a space and a unit (Hz, kHz, MHz, GHz, THz, cm-1), as "3417.34 MHz", up to 1e18 MHz`
	oneLineText  = `a string of one line, not empty`
	halfText     = `an integer or half-integer from 0 to 10000, as 2, 1.5 or "3/2"`
	levelKeys    = `coupling, numbers, energy, energy_by_F, A_hfs, B_hfs, B_rot, D_rot, eqQ, C_I`
)

// Every fault ends with one line that names file, line, key, value and what is allowed, status 2, and
// no file.
func TestWrongFiles(t *testing.T) {
	for _, test := range []struct{ why, old, new, want string }{
		{"not TOML", `coupling = "(J I)F"`, `coupling : "(J I)F"`, `5: column 10: expected '=' after key; allowed: a file in TOML`},
		{"key given twice", `species = "HCN"`, `title = "b"`, `2: column 1: key title is already defined; allowed: a file in TOML`},
		{"unknown key", `species = "HCN"`, "species = \"HCN\"\ncolor = \"red\"", `3: unknown key color = "red"; allowed: title, species, source, level, line`},
		{"unknown table", `[line]`, `[lines]`, `22: unknown key lines = a table; allowed: title, species, source, level, line`},
		{"unknown key of a level", `B_rot = "44.3 GHz"`, `B = "44.3 GHz"`, `7: unknown key level.ground.B = "44.3 GHz"; allowed: ` + levelKeys},
		{"unknown key of the line", `lower = "ground"`, `from = "ground"`, `23: unknown key line.from = "ground"; allowed: lower, upper, reference`},
		{"title missing", `title = "a line"`, ``, `1: title = missing; allowed: ` + oneLineText},
		{"title of two lines", `title = "a line"`, `title = "a\nline"`, `1: title = "a\nline"; allowed: ` + oneLineText},
		{"title a number", `title = "a line"`, `title = 7`, `1: title = 7; allowed: ` + oneLineText},
		{"title a date", `title = "a line"`, `title = 2026-01-02`, `1: title = 2026-01-02; allowed: ` + oneLineText},
		{"species empty", `species = "HCN"`, `species = " "`, `2: species = " "; allowed: ` + oneLineText},
		{"source an array", `species = "HCN"`, "species = \"HCN\"\nsource = [1]", `3: source = an array; allowed: ` + oneLineText},
		{"levels in an array", base[strings.Index(base, "[level.ground]"):], "[[level]]\ncoupling = \"J\"\n", `4: level = an array; allowed: a table with at least one key`},
		{"no levels", base[strings.Index(base, "[level.ground]"):], "", `1: level = missing; allowed: a table with at least one key`},
		{"level a string", "[level.ground]", "level.ground = \"x\"\n[level.ground2]", `4: level.ground = "x"; allowed: a table with at least one key`},
		{"no line", base[strings.Index(base, "[line]"):], "", `1: line = missing; allowed: a table with at least one key`},
		{"coupling missing", `coupling = "(J I)F"`, ``, `4: level.ground.coupling = missing; allowed: ` + oneLineText},
		{"coupling broken", `coupling = "(J I)F"`, `coupling = "(J I F"`, `5: level.ground.coupling = "(J I F"; allowed: at byte 5 )`},
		{"coupling from the right", `coupling = "(J I)F"`, `coupling = "(J (I K)T)F"`,
			`5: level.ground.coupling = "(J (I K)T)F"; allowed: at byte 3 the name of one momentum; chains couple from the left, as ((a b)c d)e`},
		{"numbers missing", `numbers = { J = 0, I = 1 }`, ``, `4: level.ground.numbers = missing; allowed: a table with at least one key`},
		{"numbers empty", `numbers = { J = 0, I = 1 }`, `numbers = {}`, `6: level.ground.numbers = a table; allowed: a table with at least one key`},
		{"number missing", `numbers = { J = 0, I = 1 }`, `numbers = { J = 0 }`, `6: level.ground.numbers.I = missing; allowed: an integer or half-integer >= 0`},
		{"number unknown", `numbers = { J = 0, I = 1 }`, `numbers = { J = 0, I = 1, K = 2 }`, `6: level.ground.numbers.K = 2; allowed: J, I, F`},
		{"number no half", `numbers = { J = 0, I = 1 }`, `numbers = { J = 0, I = 1.25 }`, `6: level.ground.numbers.I = 1.25; allowed: ` + halfText},
		{"number negative", `numbers = { J = 0, I = 1 }`, `numbers = { J = 0, I = "-1/2" }`, `6: level.ground.numbers.I = "-1/2"; allowed: ` + halfText},
		{"number infinite", `numbers = { J = 0, I = 1 }`, `numbers = { J = 0, I = inf }`, `6: level.ground.numbers.I = +Inf; allowed: ` + halfText},
		{"number too large", `numbers = { J = 0, I = 1 }`, `numbers = { J = 10001, I = 1 }`, `6: level.ground.numbers.J = 10001; allowed: ` + halfText},
		{"number a boolean", `numbers = { J = 0, I = 1 }`, `numbers = { J = true, I = 1 }`, `6: level.ground.numbers.J = true; allowed: ` + halfText},
		{"total that no coupling allows", `numbers = { J = 1, I = 1 }`, `numbers = { J = 1, I = 1, F = 3 }`, `11: level.excited.numbers.F = 3; allowed: 0, 1, 2`},
		{"inner total not allowed", `J = "3/2", I = "3/2"`, `J = "5/2", I = "3/2"`, `17: level.2P.numbers.J = 5/2; allowed: 1/2, 3/2`},
		{"too many states", `numbers = { J = 0, I = 1 }`, `numbers = { J = 5000, I = 5000 }`, `6: level.ground.numbers.J = 5000; allowed: numbers that make 2000 states at most`},
		{"unit missing", `eqQ = "-4.7 MHz"`, `eqQ = "-4.7"`, `13: level.excited.eqQ = "-4.7"; allowed: ` + quantityText},
		{"quantity a number", `eqQ = "-4.7 MHz"`, `eqQ = -4.7`, `13: level.excited.eqQ = -4.7; allowed: ` + quantityText},
		{"unit unknown", `eqQ = "-4.7 MHz"`, `eqQ = "-4.7 mHz"`, `13: level.excited.eqQ = "-4.7 mHz"; allowed: ` + quantityText},
		{"quantity infinite", `eqQ = "-4.7 MHz"`, `eqQ = "inf MHz"`, `13: level.excited.eqQ = "inf MHz"; allowed: ` + quantityText},
		{"quantity beyond float64", `eqQ = "-4.7 MHz"`, `eqQ = "1e999 MHz"`, `13: level.excited.eqQ = "1e999 MHz"; allowed: ` + quantityText},
		{"energy beyond float64", `energy = "12578.95 cm-1"`, `energy = "nan cm-1"`, `18: level.2P.energy = "nan cm-1"; allowed: ` + quantityText},
		{"long value", `eqQ = "-4.7 MHz"`, `eqQ = "` + strings.Repeat("4", 100) + `"`, `13: level.excited.eqQ = "` + strings.Repeat("4", 60) + `..."; allowed: ` + quantityText},
		{"constant of no nucleus", `eqQ = "-4.7 MHz"`, `eqQ = { I2 = "-4.7 MHz" }`, `13: unknown key level.excited.eqQ.I2 = "-4.7 MHz"; allowed: I`},
		{"constant by nucleus empty", `eqQ = "-4.7 MHz"`, `eqQ = {}`, `13: level.excited.eqQ = a table; allowed: a table with at least one key`},
		{"constant by nucleus without unit", `eqQ = "-4.7 MHz"`, `eqQ = { I = "-4.7" }`, `13: level.excited.eqQ.I = "-4.7"; allowed: ` + quantityText},
		{"two nuclei, one constant", "coupling = \"(J I)F\"\nnumbers = { J = 1, I = 1 }", "coupling = \"((J I1)F1 I2)F\"\nnumbers = { J = 1, I1 = 1, I2 = 1 }",
			`13: level.excited.eqQ = "-4.7 MHz"; allowed: one constant by nucleus: { I1 = "..." }, for I1, I2`},
		{"no nucleus", "coupling = \"(J I)F\"\nnumbers = { J = 1, I = 1 }", "coupling = \"(J S)F\"\nnumbers = { J = 1, S = 1 }",
			`13: level.excited.eqQ = "-4.7 MHz"; allowed: only where the coupling has a nuclear spin, whose name begins with I`},
		{"no quadrupole", `numbers = { J = 1, I = 1 }`, `numbers = { J = 1, I = 0.5 }`, `13: level.excited.eqQ = "-4.7 MHz"; allowed: no quadrupole constant for I = 1/2, only for 1 and above`},
		{"no quadrupole of J", `J = "3/2", I = "3/2"`, `J = "1/2", I = "3/2"`, `20: level.2P.B_hfs = "12.5 MHz"; allowed: no quadrupole constant for J = 1/2, only for 1 and above`},
		{"no quadrupole of I", `J = "3/2", I = "3/2"`, `J = "3/2", I = "1/2"`, `20: level.2P.B_hfs = "12.5 MHz"; allowed: no quadrupole constant for I = 1/2, only for 1 and above`},
		{"hyperfine constant without J", `J = "3/2", I = "3/2"`, `I = "3/2"`, `19: level.2P.A_hfs = "84.7 MHz"; allowed: only where numbers fix J`},
		{"rotation of an atom", `A_hfs = "84.7 MHz"`, `B_rot = "84.7 MHz"`, `19: level.2P.B_rot = "84.7 MHz"; allowed: only where the first number of the coupling is J or N, not L`},
		{"molecular constant of an atom", `A_hfs = "84.7 MHz"`, `C_I = "84.7 MHz"`, `19: level.2P.C_I = "84.7 MHz"; allowed: only where the first number of the coupling is J or N, not L`},
		{"distortion alone", `B_rot = "44.3 GHz"`, `D_rot = "44.3 kHz"`, `7: level.ground.D_rot = "44.3 kHz"; allowed: only beside B_rot`},
		{"energy by no total", `energy = "12578.95 cm-1"`, `energy_by_L = { 1 = "1 cm-1" }`,
			`18: unknown key level.2P.energy_by_L = a table; allowed: coupling, numbers, energy, energy_by_J, energy_by_F, A_hfs, B_hfs, B_rot, D_rot, eqQ, C_I`},
		{"energy for no value", `energy = "12578.95 cm-1"`, `energy_by_J = { "1/2" = "1 cm-1" }`, `18: level.2P.energy_by_J."1/2" = "1 cm-1"; allowed: energies for J = 3/2, each once`},
		{"energy missing", `energy = "12578.95 cm-1"`, `energy_by_F = { 0 = "1 cm-1", 1 = "2 cm-1", 3 = "3 cm-1" }`, `18: level.2P.energy_by_F.2 = missing; allowed: energies for F = 0, 1, 2, 3, each once`},
		{"energy twice", `energy = "12578.95 cm-1"`, `energy_by_J = { "3/2" = "1 cm-1", "1.5" = "1 cm-1" }`, `18: level.2P.energy_by_J."3/2" = "1 cm-1"; allowed: energies for J = 3/2, each once`},
		{"energy without unit", `energy = "12578.95 cm-1"`, `energy_by_J = { "3/2" = 1 }`, `18: level.2P.energy_by_J."3/2" = 1; allowed: ` + quantityText},
		{"energies not in a table", `energy = "12578.95 cm-1"`, `energy_by_J = "1 cm-1"`, `18: level.2P.energy_by_J = "1 cm-1"; allowed: a table with at least one key`},
		{"level unknown", `lower = "ground"`, `lower = "grund"`, `23: line.lower = "grund"; allowed: the name of a level: 2P, excited, ground`},
		{"level missing", `upper = "excited"`, ``, `22: line.upper = missing; allowed: ` + oneLineText},
		{"reference not positive", `upper = "excited"`, "upper = \"excited\"\nreference = \"0 MHz\"", `25: line.reference = "0 MHz"; allowed: a frequency above 0`},
		{"reference a number", `upper = "excited"`, "upper = \"excited\"\nreference = 88631.6", `25: line.reference = 88631.6; allowed: ` + quantityText},
		{"couplings differ", `upper = "excited"`, `upper = "2P"`, `24: line.upper = "2P" with the coupling ((L S)J I)F; allowed: a level with the coupling of the lower one, (J I)F`},
		{"spins differ", `numbers = { J = 1, I = 1 }`, `numbers = { J = 1, I = 2 }`, `24: line.upper = "excited" without a component from "ground": I is 1 below and 2 above; allowed: levels that a dipole joins`},
		{"forbidden", `numbers = { J = 1, I = 1 }`, `numbers = { J = 2, I = 1 }`,
			`24: line.upper = "excited" without a component from "ground": J goes from 0 to 2, which breaks the triangle rule with 1; allowed: levels that a dipole joins`},
		{"forbidden by totals", "numbers = { J = 0, I = 1 }\nB_rot = \"44.3 GHz\"\n\n[level.excited]\ncoupling = \"(J I)F\"\nnumbers = { J = 1, I = 1 }",
			"numbers = { J = 1, I = 1, F = 0 }\nB_rot = \"44.3 GHz\"\n\n[level.excited]\ncoupling = \"(J I)F\"\nnumbers = { J = 2, I = 1, F = 3 }",
			`24: line.upper = "excited" without a component from "ground": the totals that are fixed break the triangle rule with 1; allowed: levels that a dipole joins`},
		{"levels turned around", "lower = \"ground\"\nupper = \"excited\"", "lower = \"excited\"\nupper = \"ground\"",
			`24: line.upper = "ground", whose state J=0 I=1 F=1 lies -88602.3500 MHz above J=1 I=1 F=0 of "excited"; allowed: an upper level whose energies lie above those of the lower one`},
	} {
		t.Run(test.why, func(t *testing.T) {
			text := strings.Replace(base, test.old, test.new, 1)
			if text == base {
				t.Fatal("nothing is replaced")
			}
			dir := t.TempDir()
			name := filepath.Join(dir, "in.toml")
			if err := os.WriteFile(name, []byte(text), 0o644); err != nil {
				t.Fatal(err)
			}
			wantFailure(t, dir, "linelist: "+name+":"+test.want, "-o", filepath.Join(dir, "list"), "-plot", filepath.Join(dir, "plot.svg"), name)
		})
	}
}

// wantFailure runs the program, and expects one line on standard error, status 2, and in the folder no
// file but the input.
func wantFailure(t *testing.T, dir, want string, args ...string) {
	t.Helper()
	status, stdout, stderr := program(args...)
	if status != 2 || stdout != "" || stderr != want+"\n" {
		t.Errorf("status %d, output %q, message\n%swant\n%s", status, stdout, stderr, want)
	}
	for _, name := range files(t, dir) {
		if name != "in.toml" {
			t.Errorf("there is a file %s", name)
		}
	}
}

func files(t *testing.T, dir string) []string {
	t.Helper()
	list, err := os.ReadDir(dir)
	if err != nil {
		t.Fatal(err)
	}
	var names []string
	for _, e := range list {
		names = append(names, e.Name())
	}
	return names
}

func TestBaseIsRight(t *testing.T) {
	name := filepath.Join(t.TempDir(), "in.toml")
	if err := os.WriteFile(name, []byte(base), 0o644); err != nil {
		t.Fatal(err)
	}
	succeed(t, name)
}

// Bytes that are no text, and text with control characters, keep the message on one line of text.
func TestWrongBytes(t *testing.T) {
	for _, text := range []string{"\xff\xfe\x00", "\x00", "a = \"\x1b[31m\"", "\"a\\nb\\u001b\" = 1", "title = \"a\" # \x01", "[line]\nlower = '''\n\n'''"} {
		dir := t.TempDir()
		name := filepath.Join(dir, "in.toml")
		if err := os.WriteFile(name, []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
		status, stdout, stderr := program(name)
		line, rest, _ := strings.Cut(stderr, "\n")
		if status != 2 || stdout != "" || rest != "" || !strings.HasPrefix(line, "linelist: "+name+":") || !strings.Contains(line, "; allowed: ") ||
			strings.ContainsFunc(line, func(r rune) bool { return r < ' ' }) {
			t.Errorf("%q: status %d, %q, %q", text, status, stdout, stderr)
		}
	}
}

func TestWrongOptions(t *testing.T) {
	dir := t.TempDir()
	here := func(name string) string { return filepath.Join(dir, name) }
	const options = "; options: -format table|csv|json, -o FILE, -velocity, -plot FILE, -width MHz"
	const folder = "; allowed: a file in a folder that can be written"
	for _, test := range []struct {
		args []string
		want string
	}{
		{[]string{"-color"}, `flag provided but not defined: -color` + options},
		{[]string{"-format", "xml"}, `invalid value "xml" for flag -format: not a format; allowed: table, csv, json` + options},
		{[]string{"-format"}, `flag needs an argument: -format` + options},
		{[]string{"-width", "-1", "-plot", here("a.png")}, `invalid value "-1" for flag -width: not a width; allowed: a finite number of MHz above 0` + options},
		{[]string{"-width", "0", "-plot", here("a.png")}, `invalid value "0" for flag -width: not a width; allowed: a finite number of MHz above 0` + options},
		{[]string{"-width", "NaN", "-plot", here("a.png")}, `invalid value "NaN" for flag -width: not a width; allowed: a finite number of MHz above 0` + options},
		{[]string{"-width", "inf", "-plot", here("a.png")}, `invalid value "inf" for flag -width: not a width; allowed: a finite number of MHz above 0` + options},
		{[]string{"-width", "1 kHz", "-plot", here("a.png")}, `invalid value "1 kHz" for flag -width: not a width; allowed: a finite number of MHz above 0` + options},
		{[]string{"-width", "1"}, `-width = 1: there is no plot; allowed: with -plot FILE`},
		{[]string{"-velocity=maybe"}, `invalid boolean value "maybe" for -velocity: parse error` + options},
		{[]string{"-o", ""}, `invalid value "" for flag -o: no name; allowed: the name of a file` + options},
		{[]string{""}, `argument "": no name; allowed: the name of a TOML file`},
		{[]string{"a.toml", "b.toml"}, `argument "b.toml": a second file; allowed: one file`},
		{[]string{"-plot", here("a.jpg")}, `-plot = "` + here("a.jpg") + `": unknown suffix; allowed: a name that ends in .png or .svg`},
		{[]string{"-plot", here("a")}, `-plot = "` + here("a") + `": unknown suffix; allowed: a name that ends in .png or .svg`},
		{[]string{"-plot", here("a.svg"), "-o", here("./a.svg")}, `-plot = "` + here("a.svg") + `": the list goes there; allowed: another file than that of -o`},
		{[]string{here("none.toml")}, here("none.toml") + `: no such file or directory; allowed: a TOML file that can be read`},
		{[]string{dir}, dir + `: is a directory; allowed: a TOML file that can be read`},
		{[]string{"-o", here("none/list")}, `-o = "` + here("none/list") + `": no such file or directory` + folder},
		{[]string{"-o", dir}, `-o = "` + dir + `": not a regular file` + folder},
		// The list is complete when the plot fails, and is not put in its place.
		{[]string{"-o", here("list"), "-plot", here("none/a.png")}, `-plot = "` + here("none/a.png") + `": no such file or directory` + folder},
	} {
		wantFailure(t, dir, "linelist: "+test.want, test.args...)
	}
}
