package lines_test

import (
	"errors"
	"slices"
	"strings"
	"testing"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

func TestParseCoupling(t *testing.T) {
	for _, test := range []struct{ text, want, names, spectators string }{
		{"J", "J", "J", ""},
		{"(J I)F", "(J I)F", "J I F", "I"},
		{"((L S)J I)F", "((L S)J I)F", "L S J I F", "S I"},
		{" ( (J  I1 ) F1 I2 ) F ", "((J I1)F1 I2)F", "J I1 F1 I2 F", "I1 I2"},
		{"((((N S)J I_a)F1 I2)F2 i3)f", "((((N S)J I_a)F1 I2)F2 i3)f", "N S J I_a F1 I2 F2 i3 f", "S I_a I2 i3"},
	} {
		c := parseCoupling(t, test.text)
		if c.String() != test.want || strings.Join(c.Names(), " ") != test.names || strings.Join(c.Spectators(), " ") != test.spectators {
			t.Errorf("%q is %v with %q and %q", test.text, c, c.Names(), c.Spectators())
		}
		if again := parseCoupling(t, c.String()); again != c {
			t.Errorf("%q reads back as %v", c, again)
		}
	}
	if c := (lines.Coupling{}); c.String() != "" || c.Names() != nil && len(c.Names()) > 0 || c.Spectators() != nil {
		t.Errorf("zero coupling: %q", c)
	}
}

func TestParseCouplingErrors(t *testing.T) {
	for _, test := range []struct {
		text    string
		offset  int
		allowed string
	}{
		{"", 0, "a name or ("},
		{"1", 0, "a name or ("},
		{"_J", 0, "a name or ("},
		{"()F", 1, "a name or ("},
		{"(J)F", 2, "the name of one momentum; chains couple from the left, as ((a b)c d)e"},
		{"(J (I1 I2)I)F", 3, "the name of one momentum; chains couple from the left, as ((a b)c d)e"},
		{"(J,I)F", 2, "the name of one momentum; chains couple from the left, as ((a b)c d)e"},
		{"(J I", 4, ")"},
		{"(J I K)F", 5, ")"},
		{"(J I)", 5, "the name of the total"},
		{"(J I)F G", 7, "the end of the text"},
		{"(J I)F)", 6, "the end of the text"},
		{"J\tI", 1, "the end of the text"},
		{"(J J)F", 3, "a name other than J, which is taken"},
		{"((L S)J I)L", 10, "a name other than L, which is taken"},
		{"(((((a b)c d)e f)g h)i j)k", 5, "at most 4 couplings"},
		{"(Jé I)F", 2, "the name of one momentum; chains couple from the left, as ((a b)c d)e"},
	} {
		_, err := lines.ParseCoupling(test.text)
		var e *rational.ParseError
		if !errors.As(err, &e) {
			t.Errorf("%q: %v", test.text, err)
			continue
		}
		if e.Func != "lines.ParseCoupling" || e.Text != test.text || e.Offset != test.offset || e.Allowed != test.allowed {
			t.Errorf("%q: %v, want byte %d, allowed %q", test.text, err, test.offset, test.allowed)
		}
	}
}

// What parses prints itself back, and couples spins 1/2 to a level with 2 to the number of momenta
// states, substates counted.
func FuzzParseCoupling(f *testing.F) {
	for _, seed := range []string{"J", "((L S)J I)F", "(((J I1)F1 I2)F2 I3)F", " ( a b ) c ", "(J (I K)L)M", "((", "(J J)J", "(é I)F", "(J I)F)"} {
		f.Add(seed)
	}
	f.Fuzz(func(t *testing.T, text string) {
		c, err := lines.ParseCoupling(text)
		if err != nil {
			var e *rational.ParseError
			if !errors.As(err, &e) || e.Offset < 0 || e.Offset > len(text) || e.Allowed == "" {
				t.Fatalf("%q: %v", text, err)
			}
			return
		}
		again, err := lines.ParseCoupling(c.String())
		if err != nil || again != c {
			t.Fatalf("%q prints as %q, which reads as %q, %v", text, c, again, err)
		}
		names := c.Names()
		numbers := map[string]rational.Half{names[0]: rational.Halves(1)}
		for _, s := range c.Spectators() {
			numbers[s] = rational.Halves(1)
		}
		l, err := c.Level(numbers)
		if err != nil || len(names) != 1+2*len(c.Spectators()) {
			t.Fatalf("%q: %v", text, err)
		}
		substates := 0
		for s := range l.States() {
			substates += s.Degeneracy()
			var order []string
			for name := range s.All() {
				order = append(order, name)
			}
			if !slices.Equal(order, names) {
				t.Fatalf("%q: state of %q", text, order)
			}
		}
		if want := 1 << (1 + len(c.Spectators())); substates != want {
			t.Fatalf("%q: %d substates, want %d", text, substates, want)
		}
	})
}
