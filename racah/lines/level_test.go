package lines_test

import (
	"errors"
	"math"
	"strings"
	"testing"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

// halves reads "L=1 S=1/2" as numbers by name.
func halves(t testing.TB, text string) map[string]rational.Half {
	t.Helper()
	numbers := make(map[string]rational.Half)
	for _, field := range strings.Fields(text) {
		name, value, _ := strings.Cut(field, "=")
		h, err := rational.ParseHalf(value)
		if err != nil {
			t.Fatal(err)
		}
		numbers[name] = h
	}
	return numbers
}

func TestLevelStates(t *testing.T) {
	for _, test := range []struct{ coupling, numbers, want string }{
		{"J", "J=2", "J=2"},
		{"(L S)J", "L=1 S=1/2", "L=1 S=1/2 J=1/2, L=1 S=1/2 J=3/2"},
		{"(L S)J", "L=1 S=1 J=0", "L=1 S=1 J=0"},
		{"((L S)J I)F", "L=1 S=1/2 J=3/2 I=1/2", "L=1 S=1/2 J=3/2 I=1/2 F=1, L=1 S=1/2 J=3/2 I=1/2 F=2"},
		// A fixed outer total leaves the inner ones that reach it.
		{"((L S)J I)F", "L=1 S=1 I=1/2 F=5/2", "L=1 S=1 J=2 I=1/2 F=5/2"},
		{"((J I1)F1 I2)F", "J=1 I1=1/2 I2=1/2",
			"J=1 I1=1/2 F1=1/2 I2=1/2 F=0, J=1 I1=1/2 F1=1/2 I2=1/2 F=1, J=1 I1=1/2 F1=3/2 I2=1/2 F=1, J=1 I1=1/2 F1=3/2 I2=1/2 F=2"},
		{"((J I1)F1 I2)F", "J=1 I1=1 I2=1 F=3", "J=1 I1=1 F1=2 I2=1 F=3"},
	} {
		l := mustLevel(t, parseCoupling(t, test.coupling), halves(t, test.numbers))
		var got []string
		for s := range l.States() {
			got = append(got, s.String())
			if outermost := l.Coupling().Names()[len(l.Coupling().Names())-1]; s.Degeneracy() != s.Number(outermost).Twice()+1 {
				t.Errorf("%v: degeneracy %d", s, s.Degeneracy())
			}
		}
		if text := strings.Join(got, ", "); text != test.want {
			t.Errorf("%s with %s: %s, want %s", test.coupling, test.numbers, text, test.want)
		}
	}
	for range (lines.Level{}).States() {
		t.Error("the zero level has a state")
	}
}

// Iterations may stop early.
func TestEarlyStop(t *testing.T) {
	l := mustLevel(t, parseCoupling(t, "((J I1)F1 I2)F"), halves(t, "J=1 I1=1 I2=1"))
	for s := range l.States() {
		for range s.All() {
			break
		}
		break
	}
}

func TestLevelErrors(t *testing.T) {
	big := map[string]rational.Half{"J": rational.Int(1 << 23), "I": rational.Int(1<<23 + 1)}
	for _, test := range []struct {
		why, coupling       string
		numbers             map[string]rational.Half
		arg, value, allowed string
	}{
		{"missing first", "(J I)F", halves(t, "I=1"), "J", "missing", "an integer or half-integer >= 0"},
		{"missing spectator", "(J I)F", halves(t, "J=1"), "I", "missing", "an integer or half-integer >= 0"},
		{"negative", "(J I)F", halves(t, "J=1 I=-1/2"), "I", "-1/2", "an integer or half-integer >= 0"},
		{"negative total", "(J I)F", halves(t, "J=1 I=1 F=-1"), "F", "-1", "an integer or half-integer >= 0"},
		{"unknown, first by name", "(J I)F", halves(t, "J=1 I=1 F1=2 K=1"), "F1", "2", "J, I, F"},
		{"no momenta", "", halves(t, "J=1"), "J", "1", "none, there are no quantum numbers"},
		{"total too large", "(J I)F", halves(t, "J=1 I=1/2 F=5/2"), "F", "5/2", "1/2, 3/2"},
		{"total half-integral", "(J I)F", halves(t, "J=1 I=1 F=3/2"), "F", "3/2", "0, 1, 2"},
		{"total of a free one", "((L S)J I)F", halves(t, "L=2 S=1 I=7/2 F=8"), "F", "8", "1/2 to 13/2 in steps of 1"},
		{"least total inside the range", "((L S)J I)F", halves(t, "L=2 S=2 I=3/2 F=0"), "F", "0", "1/2 to 11/2 in steps of 1"},
		{"least total above the range", "((L S)J I)F", halves(t, "L=1 S=1 I=4 F=1"), "F", "1", "2, 3, 4, 5, 6"},
		{"inner total", "((L S)J I)F", halves(t, "L=1 S=1/2 J=5/2 I=1"), "J", "5/2", "1/2, 3/2"},
		{"outer total of a fixed inner one", "((L S)J I)F", halves(t, "L=1 S=1/2 J=1/2 I=1/2 F=2"), "F", "2", "0, 1"},
		{"together too large", "(J I)F", big, "I", "8388609", "momenta that add up to 16777216 at most"},
	} {
		var c lines.Coupling
		if test.coupling != "" {
			c = parseCoupling(t, test.coupling)
		}
		_, err := c.Level(test.numbers)
		checkArgument(t, test.why, err, "lines.Coupling.Level", test.arg, test.value, test.allowed)
	}
}

func checkArgument(t *testing.T, why string, err error, fn, arg, value, allowed string) {
	t.Helper()
	var e *rational.ArgumentError
	if !errors.As(err, &e) {
		t.Errorf("%s: error %v", why, err)
		return
	}
	if want := (rational.ArgumentError{Func: fn, Arg: arg, Value: value, Allowed: allowed}); *e != want {
		t.Errorf("%s: %v, want %v", why, e, &want)
	}
}

// The ranges named in errors are those that the states run through.
func TestTotalRanges(t *testing.T) {
	c := parseCoupling(t, "((L S)J I)F")
	for l := range momenta(5) {
		for s := range momenta(5) {
			for i := range momenta(5) {
				numbers := map[string]rational.Half{"L": l, "S": s, "I": i}
				reached := make(map[rational.Half]bool)
				for state := range mustLevel(t, c, numbers).States() {
					reached[state.Number("F")] = true
				}
				for f := range momenta(17) {
					numbers["F"] = f
					level, err := c.Level(numbers)
					if (err == nil) != reached[f] {
						t.Errorf("L=%v S=%v I=%v F=%v: error %v, reached %v", l, s, i, f, err, reached[f])
					}
					states := 0
					for state := range level.States() {
						states++
						if state.Number("F") != f {
							t.Errorf("%v, fixed at F=%v", state, f)
						}
					}
					if (states > 0) != reached[f] {
						t.Errorf("L=%v S=%v I=%v F=%v: %d states", l, s, i, f, states)
					}
				}
			}
		}
	}
}

func TestTermErrors(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(-1)
	half, threeHalves := rational.Halves(1), rational.Halves(3)
	const spectators, total = "a spectator of ((L S)J I)F: S, I", "a total of ((L S)J I)F: J, F"
	for _, test := range []struct {
		term                lines.Term
		arg, value, allowed string
	}{
		{lines.Offset(nan), "Offset", "NaN", "a finite number of MHz"},
		{lines.Rotation{B: inf}, "Rotation.B", "-Inf", "a finite number of MHz"},
		{lines.Rotation{D: nan}, "Rotation.D", "NaN", "a finite number of MHz"},
		{lines.AtomicNucleus{Spin: "I", A: nan}, "AtomicNucleus.A", "NaN", "a finite number of MHz"},
		{lines.AtomicNucleus{Spin: "I", B: nan}, "AtomicNucleus.B", "NaN", "a finite number of MHz"},
		{lines.AtomicNucleus{Spin: "J", A: 1}, "AtomicNucleus.Spin", `"J"`, spectators},
		{lines.AtomicNucleus{A: 1}, "AtomicNucleus.Spin", `""`, spectators},
		{lines.MolecularNucleus{Spin: "I", EqQ: nan}, "MolecularNucleus.EqQ", "NaN", "a finite number of MHz"},
		{lines.MolecularNucleus{Spin: "I", CI: inf}, "MolecularNucleus.CI", "-Inf", "a finite number of MHz"},
		{lines.MolecularNucleus{Spin: "L", CI: 1}, "MolecularNucleus.Spin", `"L"`, spectators},
		{lines.MolecularNucleus{Spin: "I2", CI: 1}, "MolecularNucleus.Spin", `"I2"`, spectators},
		{lines.FineStructure{Total: "S"}, "FineStructure.Total", `"S"`, total},
		{lines.FineStructure{Total: "L"}, "FineStructure.Total", `"L"`, total},
		{lines.FineStructure{Total: ""}, "FineStructure.Total", `""`, total},
		{lines.FineStructure{Total: "J", Energy: map[rational.Half]float64{half: 0}}, "FineStructure.Energy", "none for 3/2", "J = 1/2, 3/2"},
		{lines.FineStructure{Total: "J", Energy: map[rational.Half]float64{half: 0, threeHalves: 1, rational.Int(2): 1}}, "FineStructure.Energy", "one for 2", "J = 1/2, 3/2"},
		{lines.FineStructure{Total: "J", Energy: map[rational.Half]float64{half: nan, threeHalves: 1}}, "FineStructure.Energy", "NaN", "a finite number of MHz"},
		{lines.TermFunc(nil), "TermFunc", "nil", "a function"},
	} {
		_, err := parseCoupling(t, "((L S)J I)F").Level(halves(t, "L=1 S=1/2 I=1"), lines.Offset(1), test.term)
		checkArgument(t, test.arg+" = "+test.value, err, "lines.Coupling.Level", test.arg, test.value, test.allowed)
	}
	_, err := parseCoupling(t, "J").Level(halves(t, "J=1"), lines.AtomicNucleus{Spin: "I", A: 1})
	checkArgument(t, "no spectators", err, "lines.Coupling.Level", "AtomicNucleus.Spin", `"I"`, "nothing, J has no spectator")
}

// Terms add up, and what the caller does to a map later changes nothing.
func TestEnergySum(t *testing.T) {
	energies := map[rational.Half]float64{rational.Halves(1): 100, rational.Halves(3): 200}
	l := mustLevel(t, parseCoupling(t, "(L S)J"), halves(t, "L=1 S=1/2"), lines.Offset(1000),
		lines.FineStructure{Total: "J", Energy: energies},
		lines.TermFunc(func(s lines.State) float64 { return 7 * s.Number("S").Float64() }))
	clear(energies)
	var got []float64
	for s := range l.States() {
		got = append(got, l.Energy(s))
	}
	if len(got) != 2 || got[0] != 1103.5 || got[1] != 1203.5 {
		t.Errorf("energies %v", got)
	}
}

func TestStateNumbers(t *testing.T) {
	l := mustLevel(t, parseCoupling(t, "(J I1)F1"), halves(t, "J=1 I1=1/2 F1=3/2"))
	for s := range l.States() {
		if f, ok := s.Lookup("F1"); !ok || f != rational.Halves(3) || s.Number("J") != rational.Int(1) {
			t.Errorf("state %v: F1 = %v", s, f)
		}
		if f, ok := s.Lookup("F"); ok || f != (rational.Half{}) { // a part of a name is none
			t.Errorf("state %v: F = %v", s, f)
		}
	}
	if s := (lines.State{}); s.String() != "" || s.Degeneracy() != 0 {
		t.Errorf("zero state %v", s)
	}
}

func panics(t *testing.T, why, fn, arg, value, allowed string, f func()) {
	t.Helper()
	defer func() {
		t.Helper()
		err, _ := recover().(error)
		checkArgument(t, why, err, fn, arg, value, allowed)
	}()
	f()
}

func TestBadArguments(t *testing.T) {
	minus, one, zero := rational.Halves(-1), rational.Int(1), rational.Half{}
	const momentum = "an integer or half-integer >= 0"
	for _, test := range []struct {
		fn, arg, value, allowed string
		call                    func()
	}{
		{"lines.RelativeStrength", "k", "-1", "an integer from 0 to 33554432", func() { lines.RelativeStrength(-1, one, one, one, one, one) }},
		{"lines.RelativeStrength", "k", "2147483647", "an integer from 0 to 33554432", func() { lines.RelativeStrength(math.MaxInt32, one, one, one, one, one) }},
		{"lines.RelativeStrength", "j", "-1/2", momentum, func() { lines.RelativeStrength(1, minus, one, one, one, one) }},
		{"lines.RelativeStrength", "jp", "-1/2", momentum, func() { lines.RelativeStrength(1, one, minus, one, one, one) }},
		{"lines.RelativeStrength", "s", "-1/2", momentum, func() { lines.RelativeStrength(1, one, one, minus, one, one) }},
		{"lines.RelativeStrength", "x", "-1/2", momentum, func() { lines.RelativeStrength(1, one, one, one, minus, one) }},
		{"lines.RelativeStrength", "xp", "-1/2", momentum, func() { lines.RelativeStrength(1, one, one, one, one, minus) }},
		{"lines.ProjectionFactor", "k", "-2", "an integer from 0 to 33554432", func() { lines.ProjectionFactor(-2, one, one, one) }},
		{"lines.ProjectionFactor", "s", "-1/2", momentum, func() { lines.ProjectionFactor(1, one, minus, one) }},
		{"lines.DipoleFactor", "j", "-1/2", momentum, func() { lines.DipoleFactor(minus, one, one) }},
		{"lines.QuadrupoleFactor", "i", "-1/2", momentum, func() { lines.QuadrupoleFactor(one, minus, one) }},
		{"lines.CasimirFunction", "f", "-1/2", momentum, func() { lines.CasimirFunction(one, one, minus) }},
		{"lines.Multiplet", "L", "-1/2", momentum, func() { lines.Multiplet(one, minus, one) }},
		{"lines.Multiplet", "S", "-1/2", momentum, func() { lines.Multiplet(one, one, minus) }},
		{"lines.Hyperfine", "J", "-1/2", momentum, func() { lines.Hyperfine(minus, one, one) }},
		{"lines.Hyperfine", "I2", "-1/2", momentum, func() { lines.Hyperfine(one, one, one, minus) }},
		{"lines.Hyperfine", "spins", "0 of them", "from one to four", func() { lines.Hyperfine(one, one) }},
		{"lines.Hyperfine", "spins", "5 of them", "from one to four", func() { lines.Hyperfine(one, one, one, one, one, one, one) }},
		{"lines.State.Number", "name", "K", "J, I, F", func() { lines.Hyperfine(one, one, one)[0].Initial.Number("K") }},
		{"lines.State.Number", "name", "J", "none, there are no quantum numbers", func() { lines.State{}.Number("J") }},
		{"lines.Level.Energy", "s", "L=0 S=0 J=0", "a state of (J I)F", func() {
			l := mustLevel(t, parseCoupling(t, "(J I)F"), halves(t, "J=1 I=1"))
			l.Energy(lines.Multiplet(zero, one, zero)[0].Initial)
		}},
	} {
		panics(t, test.fn+" "+test.arg, test.fn, test.arg, test.value, test.allowed, test.call)
	}
}

func TestBetweenError(t *testing.T) {
	a := mustLevel(t, parseCoupling(t, "(J I)F"), halves(t, "J=1 I=1"))
	b := mustLevel(t, parseCoupling(t, "(J I1)F"), halves(t, "J=1 I1=1"))
	_, err := lines.Between(a, b)
	checkArgument(t, "couplings", err, "lines.Between", "final", "a level of (J I1)F", "a level of (J I)F, as the initial one")
}
