package lines

import (
	"strconv"
	"strings"

	"example.org/couplet/rational"
)

// Coupling names the momenta of a chain: a first one, and spectators that couple to it one after
// the other, each followed by the name of the total. ((J I1)F1 I2)F has the first momentum J, the
// spectators I1 and I2, and the totals F1 and F. Couplings are comparable values. The zero value has
// no momenta and no levels.
type Coupling struct {
	names string // "J I1 F1 I2 F": the first momentum, then spectators and totals by turns
}

// The places of the momenta in a chain: 0 is the first, 1, 3, 5 ... are spectators, 2, 4, 6 ... the
// totals that they make with all before them.
const (
	maxSpectators = 4
	maxNumbers    = 1 + 2*maxSpectators
)

// ParseCoupling reads a chain as the trade writes it, "((L S)J I)F": a pair of parentheses holds what
// is coupled, the name of the total follows. A name is a letter with letters, digits and _ after it;
// no name may appear twice. Spaces are free where they part no name. A name alone, "J", is a chain
// without spectators; there may be up to four of these.
//
// The error is a *rational.ParseError and tells the byte at which reading stopped.
func ParseCoupling(text string) (Coupling, error) {
	p := couplingParser{text: text}
	p.skipSpace()
	for p.accept('(') {
		p.depth++
	}
	if p.depth > maxSpectators {
		return Coupling{}, p.fail("at most " + strconv.Itoa(maxSpectators) + " couplings")
	}
	if err := p.name("a name or ("); err != nil {
		return Coupling{}, err
	}
	for range p.depth {
		if err := p.name("the name of one momentum; chains couple from the left, as ((a b)c d)e"); err != nil {
			return Coupling{}, err
		}
		if !p.accept(')') {
			return Coupling{}, p.fail(")")
		}
		if err := p.name("the name of the total"); err != nil {
			return Coupling{}, err
		}
	}
	if p.pos != len(text) {
		return Coupling{}, p.fail("the end of the text")
	}
	return Coupling{strings.Join(p.names, " ")}, nil
}

type couplingParser struct {
	text       string
	pos, depth int
	names      []string
}

func (p *couplingParser) fail(allowed string) error {
	return &rational.ParseError{Func: "lines.ParseCoupling", Text: p.text, Offset: p.pos, Allowed: allowed}
}

func (p *couplingParser) skipSpace() {
	for p.pos < len(p.text) && p.text[p.pos] == ' ' {
		p.pos++
	}
}

// accept reads the byte c and the spaces after it, if it comes next.
func (p *couplingParser) accept(c byte) bool {
	if p.pos == len(p.text) || p.text[p.pos] != c {
		return false
	}
	p.pos++
	p.skipSpace()
	return true
}

// name reads a name and the spaces after it.
func (p *couplingParser) name(allowed string) error {
	start := p.pos
	for p.pos < len(p.text) && nameByte(p.text[p.pos], p.pos == start) {
		p.pos++
	}
	name := p.text[start:p.pos]
	if name == "" {
		return p.fail(allowed)
	}
	for _, n := range p.names {
		if n == name {
			p.pos = start
			return p.fail("a name other than " + name + ", which is taken")
		}
	}
	p.names = append(p.names, name)
	p.skipSpace()
	return nil
}

func nameByte(c byte, first bool) bool {
	return 'A' <= c && c <= 'Z' || 'a' <= c && c <= 'z' || !first && ('0' <= c && c <= '9' || c == '_')
}

// String returns the chain as text that [ParseCoupling] reads back.
func (c Coupling) String() string {
	var text string
	for i, name := range c.Names() {
		switch {
		case i == 0:
			text = name
		case i&1 == 1:
			text = "(" + text + " " + name + ")"
		default:
			text += name
		}
	}
	return text
}

// Names returns the names in coupling order, as a fresh slice: the first momentum, then spectators
// and totals by turns. ((L S)J I)F gives L, S, J, I, F.
func (c Coupling) Names() []string { return strings.Fields(c.names) }

// Spectators returns the names of the spectators in coupling order, as a fresh slice.
func (c Coupling) Spectators() []string {
	var list []string
	for i, name := range c.Names() {
		if i&1 == 1 {
			list = append(list, name)
		}
	}
	return list
}

// count returns the number of momenta.
func (c Coupling) count() int {
	if c.names == "" {
		return 0
	}
	return 1 + strings.Count(c.names, " ")
}

// place returns the place of a name in the chain, -1 for a name that is not there.
func (c Coupling) place(name string) int { return placeOf(c.names, name) }

// placeOf returns the place of name among names parted by spaces, -1 if it is not there.
func placeOf(names, name string) int {
	for i := 0; names != ""; i++ {
		first, rest, _ := strings.Cut(names, " ")
		if first == name {
			return i
		}
		names = rest
	}
	return -1
}
