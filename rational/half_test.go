package rational_test

import (
	"encoding/json"
	"errors"
	"flag"
	"fmt"
	"math"
	"testing"

	"example.org/couplet/rational"
)

func TestHalfText(t *testing.T) {
	for _, c := range []struct {
		text  string
		twice int
		out   string
	}{
		{"0", 0, "0"}, {"-0", 0, "0"}, {"2", 4, "2"}, {"+2", 4, "2"}, {"-1", -2, "-1"},
		{"1/2", 1, "1/2"}, {"-3/2", -3, "-3/2"}, {"4/2", 4, "2"}, {"2.5", 5, "5/2"}, {"-0.5", -1, "-1/2"}, {"7.0", 14, "7"},
		{"1073741823", 2147483646, "1073741823"}, {"2147483647/2", 2147483647, "2147483647/2"}, {"-2147483647/2", -2147483647, "-2147483647/2"},
		{"1073741823.5", 2147483647, "2147483647/2"},
	} {
		h, err := rational.ParseHalf(c.text)
		if err != nil || h.Twice() != c.twice || h.String() != c.out {
			t.Errorf("ParseHalf(%q) = %v (twice %d), %v; want %s (twice %d)", c.text, h, h.Twice(), err, c.out, c.twice)
		}
	}
	for _, text := range []string{"", " 1", "1 ", "1/3", "2.25", ".5", "5.", "1/2/2", "--1", "+-1", "1_0", "1e3", "x", "3/-2", "1073741824", "2147483648/2", "-1073741824", "1073741824.0", "99999999999"} {
		h, err := rational.ParseHalf(text)
		if p := (*rational.ParseError)(nil); !errors.As(err, &p) {
			t.Errorf("ParseHalf(%q) = %v, %v; want a *ParseError", text, h, err)
		}
	}
	_, err := rational.ParseHalf("1/3")
	if want := `rational.ParseHalf: "1/3" at byte 0; allowed: an integer or a half, as 2, -3/2 or 2.5, at most 2147483647/2`; err.Error() != want {
		t.Errorf("error %q, want %q", err, want)
	}
}

func TestHalfArithmetic(t *testing.T) {
	for a := -5; a <= 5; a++ {
		for b := -5; b <= 5; b++ {
			x, y := rational.Halves(a), rational.Halves(b)
			if x.Add(y).Twice() != a+b || x.Sub(y).Twice() != a-b {
				t.Errorf("%v, %v: sum %v, difference %v", x, y, x.Add(y), x.Sub(y))
			}
			if (x.Cmp(y) < 0) != (a < b) || (x.Cmp(y) == 0) != (a == b) || (x == y) != (a == b) {
				t.Errorf("%v.Cmp(%v) = %d", x, y, x.Cmp(y))
			}
		}
		x := rational.Halves(a)
		if x.Float64() != float64(a)/2 || x.IsInt() != (a%2 == 0) || x.Neg().Twice() != -a || x.Abs().Twice() != max(a, -a) {
			t.Errorf("%v: Float64 %v, IsInt %v, Neg %v, Abs %v", x, x.Float64(), x.IsInt(), x.Neg(), x.Abs())
		}
		if got, want := x.Surd(), rational.Ratio(int64(a), 2); !got.Equal(want) {
			t.Errorf("%v.Surd() = %v", x, got)
		}
	}
	if rational.Int(3) != rational.Halves(6) {
		t.Error("Int(3) and Halves(6) differ")
	}
}

func TestHalfOverflow(t *testing.T) {
	top := rational.Halves(math.MaxInt32)
	for name, f := range map[string]func(){
		"rational.Int: n = 1073741824; allowed: from -1073741823 to 1073741823":               func() { rational.Int(1 << 30) },
		"rational.Halves: n/2 = -2147483648/2; allowed: from -2147483647/2 to 2147483647/2":   func() { rational.Halves(math.MinInt32) },
		"rational.Half.Add: h+k = 2147483648/2; allowed: from -2147483647/2 to 2147483647/2":  func() { top.Add(rational.Halves(1)) },
		"rational.Half.Sub: h-k = -2147483648/2; allowed: from -2147483647/2 to 2147483647/2": func() { top.Neg().Sub(rational.Halves(1)) },
	} {
		mustPanic(t, name, f)
	}
}

// mustPanic demands a panic with an *ArgumentError of this text.
func mustPanic(t *testing.T, text string, f func()) {
	t.Helper()
	defer func() {
		t.Helper()
		if e, ok := recover().(*rational.ArgumentError); !ok || e.Error() != text {
			t.Errorf("panic %v, want %q", e, text)
		}
	}()
	f()
}

func TestHalfFlagJSONAndMap(t *testing.T) {
	var j rational.Half
	set := flag.NewFlagSet("test", flag.ContinueOnError)
	set.TextVar(&j, "j", rational.Halves(1), "momentum")
	if j != rational.Halves(1) {
		t.Errorf("default %v", j)
	}
	if err := set.Parse([]string{"-j", "7/2"}); err != nil || j != rational.Halves(7) {
		t.Errorf("flag gave %v, %v", j, err)
	}
	in := map[rational.Half]rational.Half{rational.Halves(3): rational.Halves(-1)}
	text, err := json.Marshal(in)
	if err != nil || string(text) != `{"3/2":"-1/2"}` {
		t.Fatalf("JSON %s, %v", text, err)
	}
	var out map[rational.Half]rational.Half
	if err := json.Unmarshal(text, &out); err != nil || fmt.Sprint(out) != fmt.Sprint(in) {
		t.Errorf("JSON read back as %v, %v", out, err)
	}
}

func TestHalfLaTeX(t *testing.T) {
	for twice, want := range map[int]string{4: "2", -4: "-2", 3: `\frac{3}{2}`, -3: `-\frac{3}{2}`} {
		if got := rational.Halves(twice).LaTeX(); got != want {
			t.Errorf("LaTeX of %d/2 is %s, want %s", twice, got, want)
		}
	}
}
