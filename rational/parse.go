package rational

import (
	"fmt"
	"math/big"
	"strings"
)

// ParseError is the error of the functions of this package that read text.
type ParseError struct {
	Func    string // function with its package, "rational.ParseSurd"
	Text    string // the whole text
	Offset  int    // byte at which reading stopped
	Allowed string // what would have been accepted there
}

// Error names function, text, position and what is allowed there.
func (e *ParseError) Error() string {
	return fmt.Sprintf("%s: %q at byte %d; allowed: %s", e.Func, abbreviate(e.Text), e.Offset, e.Allowed)
}

// ParseSurd reads a number r*sqrt(n): products and quotients, by * and /, of integers, decimals
// and sqrt(a) or sqrt(a/b), with sums of such where they come to a single term. Spaces are free.
// It reads all that [Surd.String] writes within the limits below, and "sqrt(2/7)", "3/sqrt(2)", "2.5".
//
// A radicand must be factored for the canonical form. Its numerator and denominator may have up to
// 2^17 bits each, as long as what is left of them after division by all primes below 2^16 is less
// than 2^64; reading one that has two large prime factors takes about a millisecond. Every symbol
// with j1+j2+j3 below 65536 stays within this.
//
// The error is a *[ParseError], and names the byte at which reading stopped, 0 where the text reads but
// is no single real term.
func ParseSurd(text string) (Surd, error) {
	z, err := parse("rational.ParseSurd", text)
	if err != nil {
		return Surd{}, err
	}
	if s, ok := z.Re.Surd(); ok && z.IsReal() {
		return s, nil
	}
	return Surd{}, &ParseError{"rational.ParseSurd", text, 0, "a single real term, as -1/3*sqrt(14)"}
}

// ParseSum reads a sum of terms as [ParseSurd] reads them: "1/2 - sqrt(2/7)". Limits and errors are
// those of ParseSurd.
func ParseSum(text string) (Sum, error) {
	z, err := parse("rational.ParseSum", text)
	if err != nil {
		return Sum{}, err
	}
	if !z.IsReal() {
		return Sum{}, &ParseError{"rational.ParseSum", text, 0, "a real number, as 1/2 - sqrt(3)"}
	}
	return z.Re, nil
}

// ParseComplex reads a sum of terms as [ParseSurd] reads them, in which i is one more factor:
// "1/2 - 1/2*sqrt(3)*i". Limits and errors are those of ParseSurd.
func ParseComplex(text string) (Complex, error) { return parse("rational.ParseComplex", text) }

// parse reads the grammar of all three:
//
//	sum    = [sign] term { sign term }
//	term   = factor { ("*" | "/") factor }
//	factor = number | "sqrt" "(" number [ "/" number ] ")" | "i"
//	number = digits [ "." digits ]
func parse(fn, text string) (Complex, error) {
	p := &parser{fn: fn, text: text}
	var re, im []Surd
	negative := p.accept('-')
	if !negative {
		p.accept('+')
	}
	for {
		t, phase, err := p.term()
		if err != nil {
			return Complex{}, err
		}
		if negative != (phase&2 != 0) {
			t = t.Neg()
		}
		if phase&1 == 0 {
			re = append(re, t)
		} else {
			im = append(im, t)
		}
		switch {
		case p.accept('+'):
			negative = false
		case p.accept('-'):
			negative = true
		case p.pos == len(text):
			return Complex{SumOf(re...), SumOf(im...)}, nil
		default:
			return Complex{}, p.fail("+, -, *, / or the end of the text")
		}
	}
}

type parser struct {
	fn, text string
	pos      int
}

func (p *parser) fail(allowed string) error { return &ParseError{p.fn, p.text, p.pos, allowed} }

func (p *parser) skipSpace() {
	for p.pos < len(p.text) && p.text[p.pos] == ' ' {
		p.pos++
	}
}

// accept reads the byte c with the spaces around it, if it comes next.
func (p *parser) accept(c byte) bool {
	p.skipSpace()
	if p.pos == len(p.text) || p.text[p.pos] != c {
		return false
	}
	p.pos++
	p.skipSpace()
	return true
}

// term returns the value of a term and its power of i.
func (p *parser) term() (value Surd, phase int, err error) {
	value, phase, err = p.factor()
	for err == nil {
		divide := false
		if !p.accept('*') {
			if divide = p.accept('/'); !divide {
				return value, phase, nil
			}
		}
		start := p.pos
		var v Surd
		var ph int
		if v, ph, err = p.factor(); err != nil {
			break
		}
		if divide && v.IsZero() {
			p.pos = start
			return Surd{}, 0, p.fail("a divisor other than zero")
		}
		if divide {
			v, ph = v.Inv(), -ph
		}
		value, phase = value.Mul(v), phase+ph
	}
	return Surd{}, 0, err
}

// factor returns the value of a factor and its power of i.
func (p *parser) factor() (v Surd, phase int, err error) {
	rest := p.text[p.pos:]
	switch {
	case strings.HasPrefix(rest, "sqrt"):
		p.pos += len("sqrt")
		v, err = p.root()
	case strings.HasPrefix(rest, "i"):
		p.pos++
		v, phase = Ratio(1, 1), 1
	default:
		var r *big.Rat
		if r, err = p.number("a number, sqrt(...) or i"); err == nil {
			v = FromRat(r)
		}
	}
	p.skipSpace()
	return v, phase, err
}

func (p *parser) root() (Surd, error) {
	if !p.accept('(') {
		return Surd{}, p.fail("(")
	}
	start := p.pos
	const allowed = "a radicand without sign, as 14 or 2/7"
	r, err := p.number(allowed)
	if err != nil {
		return Surd{}, err
	}
	if p.accept('/') {
		d, err := p.number(allowed)
		if err != nil {
			return Surd{}, err
		}
		if d.Sign() == 0 {
			return Surd{}, p.fail("a denominator other than zero")
		}
		r.Quo(r, d)
	}
	if !p.accept(')') {
		return Surd{}, p.fail(")")
	}
	s, err := sqrtRat(r)
	if err != nil {
		p.pos = start
		return Surd{}, p.fail("a radicand that can be factored (" + err.Error() + ")")
	}
	return s, nil
}

func (p *parser) number(allowed string) (*big.Rat, error) {
	digits := func() string {
		start := p.pos
		for p.pos < len(p.text) && p.text[p.pos] >= '0' && p.text[p.pos] <= '9' {
			p.pos++
		}
		return p.text[start:p.pos]
	}
	number := digits()
	if number == "" {
		return nil, p.fail(allowed)
	}
	if p.pos < len(p.text) && p.text[p.pos] == '.' {
		p.pos++
		decimals := digits()
		if decimals == "" {
			return nil, p.fail("a digit")
		}
		number += "." + decimals
	}
	r, ok := new(big.Rat).SetString(number)
	if !ok {
		return nil, p.fail(allowed)
	}
	return r, nil
}
