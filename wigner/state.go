package wigner

import (
	"fmt"
	"strings"

	"example.org/couplet/rational"
)

// State is an exact state vector of one angular momentum j: a combination of the 2j+1 states |j m>,
// not necessarily normalized. The zero value is the null vector of j = 0.
//
// States are immutable values, safe for concurrent use; use [State.Equal] to compare them.
type State struct {
	j          rational.Half
	amplitudes []rational.Complex // from m = -j up; nil stands for all zero; never changed
}

// Basis returns the state |j m>. It panics with *rational.ArgumentError unless m is one of -j ... j.
func Basis(j, m rational.Half) State {
	mustState("wigner.Basis", "j", "m", j, m)
	if m.Abs().Cmp(j) > 0 {
		panic(&rational.ArgumentError{Func: "wigner.Basis", Arg: "m", Value: m.String(), Allowed: fmt.Sprintf("from %v to %v", j.Neg(), j)})
	}
	s := null(j)
	s.amplitudes[s.index(m)] = rational.Ratio(1, 1).Complex()
	return s
}

func null(j rational.Half) State { return State{j, make([]rational.Complex, j.Twice()+1)} }

func (s State) index(m rational.Half) int { return (m.Twice() + s.j.Twice()) / 2 }

// J returns the angular momentum of the state.
func (s State) J() rational.Half { return s.j }

// Amplitude returns <j m|s>; it is zero for |m| > j. It panics with *rational.ArgumentError where
// j-m is not an integer.
func (s State) Amplitude(m rational.Half) rational.Complex {
	mustState("wigner.State.Amplitude", "j", "m", s.j, m)
	if s.amplitudes == nil || m.Abs().Cmp(s.j) > 0 {
		return rational.Complex{}
	}
	return s.amplitudes[s.index(m)]
}

// Apply returns o|s>.
func (s State) Apply(o Operator) State {
	z := null(s.j)
	for m := range Projections(s.j) {
		a := s.Amplitude(m)
		if a.IsZero() {
			continue
		}
		for step := -2; step <= 2; step += 2 {
			mp := rational.Halves(m.Twice() + step)
			if e := o.Element(s.j, mp, m); !e.IsZero() {
				z.amplitudes[z.index(mp)] = z.amplitudes[z.index(mp)].Add(e.Mul(a))
			}
		}
	}
	return z
}

// Scale returns c|s>.
func (s State) Scale(c rational.Complex) State {
	z := null(s.j)
	for i, a := range s.amplitudes {
		z.amplitudes[i] = a.Mul(c)
	}
	return z
}

// Add returns |s> + |t>. It panics with *rational.ArgumentError for states of different j.
func (s State) Add(t State) State {
	s.mustMatch("wigner.State.Add", t)
	z := null(s.j)
	for m := range Projections(s.j) {
		z.amplitudes[z.index(m)] = s.Amplitude(m).Add(t.Amplitude(m))
	}
	return z
}

// Inner returns <s|t>. It panics with *rational.ArgumentError for states of different j.
func (s State) Inner(t State) rational.Complex {
	s.mustMatch("wigner.State.Inner", t)
	var z rational.Complex
	for m := range Projections(s.j) {
		z = z.Add(s.Amplitude(m).Conj().Mul(t.Amplitude(m)))
	}
	return z
}

// Equal reports whether s and t are the same vector of the same j.
func (s State) Equal(t State) bool {
	if s.j != t.j {
		return false
	}
	for m := range Projections(s.j) {
		if !s.Amplitude(m).Equal(t.Amplitude(m)) {
			return false
		}
	}
	return true
}

func (s State) mustMatch(fn string, t State) {
	if s.j != t.j {
		panic(&rational.ArgumentError{Func: fn, Arg: "t", Value: "a state of j = " + t.j.String(), Allowed: "a state of j = " + s.j.String()})
	}
}

// String returns the state as a sum over kets from m = j down: "sqrt(6)|2 0>", "|1/2 1/2> + (i)|1/2
// -1/2>"; the null vector is "0".
func (s State) String() string {
	var terms []string
	for m := s.j; m.Cmp(s.j.Neg()) >= 0; m = m.Sub(rational.Int(1)) {
		a := s.Amplitude(m)
		if a.IsZero() {
			continue
		}
		ket := "|" + s.j.String() + " " + m.String() + ">"
		switch text := a.String(); {
		case text == "1":
			terms = append(terms, ket)
		case len(a.Re.Terms())+len(a.Im.Terms()) == 1 && a.IsReal() && !strings.HasPrefix(text, "-"):
			terms = append(terms, text+ket)
		default:
			terms = append(terms, "("+text+")"+ket)
		}
	}
	if terms == nil {
		return "0"
	}
	return strings.Join(terms, " + ")
}
