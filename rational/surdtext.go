package rational

import (
	"math/big"
	"strings"
)

// String returns s as text that [ParseSurd] reads back: "0", "-3/2", "sqrt(14)", "-1/3*sqrt(14)".
func (s Surd) String() string {
	num, den, rad := s.parts()
	r := ratioText(num, den)
	if isOne(rad) {
		return r
	}
	root := "sqrt(" + rad.String() + ")"
	switch r {
	case "1":
		return root
	case "-1":
		return "-" + root
	}
	return r + "*" + root
}

func ratioText(num, den *big.Int) string {
	if isOne(den) {
		return num.String()
	}
	return num.String() + "/" + den.String()
}

// LaTeX returns s for math mode: "-\frac{1}{3}\sqrt{14}".
func (s Surd) LaTeX() string {
	num, den, rad := s.parts()
	var b strings.Builder
	if num.Sign() < 0 {
		b.WriteByte('-')
	}
	abs := new(big.Int).Abs(num)
	if !isOne(den) {
		b.WriteString(`\frac{` + abs.String() + `}{` + den.String() + `}`)
	} else if !isOne(abs) || isOne(rad) {
		b.WriteString(abs.String())
	}
	if !isOne(rad) {
		b.WriteString(`\sqrt{` + rad.String() + `}`)
	}
	return b.String()
}

// MarshalText returns the text of [Surd.String].
func (s Surd) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText reads what [ParseSurd] reads.
func (s *Surd) UnmarshalText(text []byte) error {
	v, err := ParseSurd(string(text))
	if err == nil {
		*s = v
	}
	return err
}

// String returns s as text that [ParseSum] reads back: "1/2 - 1/3*sqrt(14)".
func (s Sum) String() string { return joinTerms(s.texts(Surd.String, "", "")) }

// LaTeX returns s for math mode.
func (s Sum) LaTeX() string { return joinTerms(s.texts(Surd.LaTeX, "", "")) }

// MarshalText returns the text of [Sum.String].
func (s Sum) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText reads what [ParseSum] reads.
func (s *Sum) UnmarshalText(text []byte) error {
	v, err := ParseSum(string(text))
	if err == nil {
		*s = v
	}
	return err
}

// String returns c as text that [ParseComplex] reads back: "1/2 - 1/2*sqrt(3)*i".
func (c Complex) String() string {
	return joinTerms(append(c.Re.texts(Surd.String, "", ""), c.Im.texts(Surd.String, "*", "i")...))
}

// LaTeX returns c for math mode; the imaginary unit is \mathrm{i}.
func (c Complex) LaTeX() string {
	return joinTerms(append(c.Re.texts(Surd.LaTeX, "", ""), c.Im.texts(Surd.LaTeX, `\,`, `\mathrm{i}`)...))
}

// MarshalText returns the text of [Complex.String].
func (c Complex) MarshalText() ([]byte, error) { return []byte(c.String()), nil }

// UnmarshalText reads what [ParseComplex] reads.
func (c *Complex) UnmarshalText(text []byte) error {
	v, err := ParseComplex(string(text))
	if err == nil {
		*c = v
	}
	return err
}

// texts returns the terms as text, each multiplied by the unit where there is one.
func (s Sum) texts(text func(Surd) string, times, unit string) []string {
	z := make([]string, len(s.terms))
	for i, t := range s.terms {
		z[i] = text(t)
		if sign, one := strings.CutSuffix(z[i], "1"); unit != "" && one && (sign == "" || sign == "-") {
			z[i] = sign + unit // i, not 1*i
		} else if unit != "" {
			z[i] += times + unit
		}
	}
	return z
}

// joinTerms puts a sign between the terms; no terms are 0.
func joinTerms(terms []string) string {
	if len(terms) == 0 {
		return "0"
	}
	var b strings.Builder
	for i, t := range terms {
		if i == 0 {
			b.WriteString(t)
		} else if minus, ok := strings.CutPrefix(t, "-"); ok {
			b.WriteString(" - " + minus)
		} else {
			b.WriteString(" + " + t)
		}
	}
	return b.String()
}
