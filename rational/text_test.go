package rational_test

import (
	"encoding/json"
	"errors"
	"fmt"
	"math/big"
	"strings"
	"testing"

	"example.org/couplet/rational"
)

func TestSurdText(t *testing.T) {
	for _, c := range []struct{ in, out, latex string }{
		{"0", "0", "0"}, {"-0", "0", "0"}, {"0*sqrt(3)", "0", "0"}, {"3", "3", "3"}, {"-3/2", "-3/2", `-\frac{3}{2}`}, {"2.5", "5/2", `\frac{5}{2}`},
		{"-1/3*sqrt(14)", "-1/3*sqrt(14)", `-\frac{1}{3}\sqrt{14}`}, {"sqrt(2/7)", "1/7*sqrt(14)", `\frac{1}{7}\sqrt{14}`},
		{"sqrt(14)", "sqrt(14)", `\sqrt{14}`}, {"-sqrt(8)", "-2*sqrt(2)", `-2\sqrt{2}`}, {"sqrt(49/4)", "7/2", `\frac{7}{2}`},
		{" + 3 * sqrt( 5 / 2 ) / 2 ", "3/4*sqrt(10)", `\frac{3}{4}\sqrt{10}`}, {"1/sqrt(2)", "1/2*sqrt(2)", `\frac{1}{2}\sqrt{2}`},
		{"sqrt(2)*sqrt(2)", "2", "2"}, {"6/4", "3/2", `\frac{3}{2}`}, {"   1   +   2  ", "3", "3"}, {"1/2+1/3*sqrt(4)", "7/6", `\frac{7}{6}`}, {"i*i", "-1", "-1"}, {"sqrt(0.5)", "1/2*sqrt(2)", `\frac{1}{2}\sqrt{2}`},
		{"sqrt(18446744073709551556)", "2*sqrt(4611686018427387889)", `2\sqrt{4611686018427387889}`},
		{"sqrt(19797974722548328581036887527)", "65521*sqrt(4611686018427387847)", `65521\sqrt{4611686018427387847}`}, // beyond a word, with the square of the last prime of the trial
		{"sqrt(18446744073709551557)", "sqrt(18446744073709551557)", `\sqrt{18446744073709551557}`},                   // the largest prime of 64 bits
		{"sqrt(18446744030759878681)", "4294967291", "4294967291"},                                                    // the largest square of a prime of 64 bits
	} {
		s, err := rational.ParseSurd(c.in)
		if err != nil || s.String() != c.out || s.LaTeX() != c.latex {
			t.Errorf("%q: %v, %s, %v; want %s, %s", c.in, s, s.LaTeX(), err, c.out, c.latex)
		}
	}
}

func TestTextRoundTrip(t *testing.T) {
	var list []rational.Surd
	for _, s := range surds(t) {
		if s.Radicand().BitLen() < 100 {
			list = append(list, s)
		}
	}
	var sum rational.Sum
	for i, s := range list {
		if back, err := rational.ParseSurd(s.String()); err != nil || !back.Equal(s) {
			t.Errorf("%v reads back as %v, %v", s, back, err)
		}
		sum = sum.Add(s.Sum())
		if back, err := rational.ParseSum(sum.String()); err != nil || !back.Equal(sum) {
			t.Errorf("%v reads back as %v, %v", sum, back, err)
		}
		c := rational.Complex{Re: list[len(list)-1-i].Sum(), Im: sum}
		if back, err := rational.ParseComplex(c.String()); err != nil || !back.Equal(c) {
			t.Errorf("%v reads back as %v, %v", c, back, err)
		}
	}
}

func TestComplexText(t *testing.T) {
	for _, c := range []struct{ in, out, latex string }{
		{"i", "i", `\mathrm{i}`}, {"-i", "-i", `-\mathrm{i}`}, {"1-i", "1 - i", `1 - \mathrm{i}`}, {"21*i", "21*i", `21\,\mathrm{i}`},
		{"1/2 - 1/2*sqrt(3)*i", "1/2 - 1/2*sqrt(3)*i", `\frac{1}{2} - \frac{1}{2}\sqrt{3}\,\mathrm{i}`},
		{"1/i", "-i", `-\mathrm{i}`}, {"i*i*i*i", "1", "1"}, {"0*i", "0", "0"}, {"sqrt(3)*i+sqrt(2)", "sqrt(2) + sqrt(3)*i", `\sqrt{2} + \sqrt{3}\,\mathrm{i}`},
	} {
		z, err := rational.ParseComplex(c.in)
		if err != nil || z.String() != c.out || z.LaTeX() != c.latex {
			t.Errorf("%q: %v, %s, %v; want %s, %s", c.in, z, z.LaTeX(), err, c.out, c.latex)
		}
	}
}

func TestTextErrors(t *testing.T) {
	semiprime := new(big.Int).Mul(big.NewInt(4294967311), big.NewInt(4294967357)).String() // two primes above 2^32
	for _, c := range []struct {
		in      string
		offset  int
		allowed string
	}{
		{"", 0, "a number, sqrt(...) or i"}, {"-", 1, "a number, sqrt(...) or i"}, {"1/0", 2, "a divisor other than zero"}, {"1/sqrt(0)", 2, "a divisor other than zero"},
		{"sqrt(-2)", 5, "a radicand without sign, as 14 or 2/7"}, {"sqrt 2", 5, "("}, {"sqrt(2", 6, ")"}, {"sqrt(2/0)", 8, "a denominator other than zero"},
		{"1 2", 2, "+, -, *, / or the end of the text"}, {"2^3", 1, "+, -, *, / or the end of the text"}, {"1.", 2, "a digit"}, {"1e5", 1, "+, -, *, / or the end of the text"},
		{"x", 0, "a number, sqrt(...) or i"}, {"1+", 2, "a number, sqrt(...) or i"}, {"--1", 1, "a number, sqrt(...) or i"}, {"1/2+sqrt(3)", 0, "a single real term, as -1/3*sqrt(14)"},
		{"i", 0, "a single real term, as -1/3*sqrt(14)"},
		{"sqrt(" + semiprime + ")", 5, "a radicand that can be factored (radicand 18446744400127067027 is 2^64 or more after division by the primes below 65536)"},
		{"sqrt(1" + strings.Repeat("0", 40000) + ")", 5, "a radicand that can be factored (radicand of 132878 bits, more than 131072)"},
	} {
		s, err := rational.ParseSurd(c.in)
		var p *rational.ParseError
		if !errors.As(err, &p) || p.Offset != c.offset || p.Allowed != c.allowed || p.Text != c.in {
			t.Errorf("ParseSurd(%.30q) = %v, %v; want an error at byte %d that allows %s", c.in, s, err, c.offset, c.allowed)
		}
	}
	if _, err := rational.ParseSum("1+i"); err == nil || err.Error() != `rational.ParseSum: "1+i" at byte 0; allowed: a real number, as 1/2 - sqrt(3)` {
		t.Errorf("ParseSum: %v", err)
	}
	r, _ := new(big.Rat).SetString(semiprime)
	for _, radicand := range []*big.Rat{big.NewRat(-1, 2), r, new(big.Rat).Inv(r)} {
		if _, err := rational.NewSurd(big.NewRat(1, 1), radicand); err == nil || !strings.HasPrefix(err.Error(), "rational.NewSurd: ") {
			t.Errorf("NewSurd of radicand %v: %v", radicand, err)
		}
	}
	if s, err := rational.NewSurd(big.NewRat(-2, 3), big.NewRat(8, 3)); err != nil || s.String() != "-4/9*sqrt(6)" {
		t.Errorf("NewSurd(-2/3, 8/3) = %v, %v", s, err)
	}
}

func TestJSON(t *testing.T) {
	type record struct {
		J rational.Half
		A rational.Surd
		B rational.Sum
		C rational.Complex
	}
	in := record{rational.Halves(3), rational.Root(2, 7), rational.Root(2, 1).Add(rational.Ratio(1, 2)), rational.I()}
	text, err := json.Marshal(in)
	if want := `{"J":"3/2","A":"1/7*sqrt(14)","B":"1/2 + sqrt(2)","C":"i"}`; err != nil || string(text) != want {
		t.Fatalf("JSON %s, %v; want %s", text, err, want)
	}
	var out record
	if err := json.Unmarshal(text, &out); err != nil || out.J != in.J || !out.A.Equal(in.A) || !out.B.Equal(in.B) || !out.C.Equal(in.C) {
		t.Errorf("JSON read back as %+v, %v", out, err)
	}
	for _, bad := range []string{`{"J":"1/3"}`, `{"A":"1+"}`, `{"B":"i"}`, `{"C":"k"}`, `{"A":3}`} {
		if err := json.Unmarshal([]byte(bad), &out); err == nil {
			t.Errorf("JSON %s is taken", bad)
		}
	}
}

// Reading text never panics, and what is read comes back from its own text.
func FuzzSurdText(f *testing.F) {
	for _, s := range []string{"0", "-3/2", "2.5", "-1/3*sqrt(14)", "sqrt(2/7)", "1/2 - 1/2*sqrt(3)*i", "1/sqrt(2)", "sqrt(18446744073709551615)", "i/i", "1/0", "sqrt(", "9223372036854775808"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, text string) {
		if strings.Count(text, "sqrt") > 20 { // factoring takes up to a millisecond each
			t.Skip()
		}
		c, err := rational.ParseComplex(text)
		if err != nil {
			var p *rational.ParseError
			if !errors.As(err, &p) || p.Offset < 0 || p.Offset > len(text) || p.Allowed == "" {
				t.Fatalf("%q: error %v", text, err)
			}
			return
		}
		back, err := rational.ParseComplex(c.String())
		if err != nil && strings.Contains(err.Error(), "that can be factored") {
			t.Skip() // a product of long radicands
		}
		if err != nil || !back.Equal(c) || back.Key() != c.Key() {
			t.Fatalf("%q is %v, which reads back as %v, %v", text, c, back, err)
		}
		if s, err := rational.ParseSurd(text); err == nil && !s.Complex().Equal(c) {
			t.Fatalf("%q is %v as surd and %v as complex", text, s, c)
		}
	})
}

func FuzzHalfText(f *testing.F) {
	for _, s := range []string{"0", "-3/2", "2.5", "2147483647/2", "-0.5", "1/3", "+7"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, text string) {
		h, err := rational.ParseHalf(text)
		if err != nil {
			return
		}
		if back, err := rational.ParseHalf(h.String()); err != nil || back != h {
			t.Fatalf("%q is %v, which reads back as %v, %v", text, h, back, err)
		}
		if s, err := rational.ParseSurd(text); err != nil || !s.Equal(h.Surd()) {
			t.Fatalf("%q is %v as half and %v, %v as surd", text, h, s, err)
		}
	})
}

func ExampleParseSum() {
	s, err := rational.ParseSum("1/2 + sqrt(2/3) - 3/sqrt(5)")
	fmt.Println(s, err)
	_, err = rational.ParseSum("1/2 + sqrt(-2)")
	fmt.Println(err)
	// Output:
	// 1/2 - 3/5*sqrt(5) + 1/3*sqrt(6) <nil>
	// rational.ParseSum: "1/2 + sqrt(-2)" at byte 11; allowed: a radicand without sign, as 14 or 2/7
}
