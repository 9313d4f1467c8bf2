package lines

import (
	"iter"
	"strings"

	"example.org/couplet/rational"
)

// State is one state of a level, all its quantum numbers by name, in coupling order: J=1 I1=1 F1=2
// I2=1 F=3. States are comparable values and may be map keys. The zero value has no quantum numbers.
type State struct {
	names      string // parted by spaces
	values     [maxNumbers]rational.Half
	degeneracy int
}

// Number returns a quantum number by its name. It panics with *rational.ArgumentError where the state
// has no number of this name; [State.Lookup] tells.
func (s State) Number(name string) rational.Half {
	v, ok := s.Lookup(name)
	if !ok {
		panic(&rational.ArgumentError{Func: "lines.State.Number", Arg: "name", Value: name, Allowed: nameList(s.names)})
	}
	return v
}

// Lookup returns a quantum number by its name; ok is false where the state has none of this name.
func (s State) Lookup(name string) (v rational.Half, ok bool) {
	place := placeOf(s.names, name)
	if place < 0 {
		return rational.Half{}, false
	}
	return s.values[place], true
}

// All yields the names and values of the quantum numbers in coupling order.
func (s State) All() iter.Seq2[string, rational.Half] {
	return func(yield func(string, rational.Half) bool) {
		rest, name := s.names, ""
		for i := 0; rest != ""; i++ {
			name, rest, _ = strings.Cut(rest, " ")
			if !yield(name, s.values[i]) {
				return
			}
		}
	}
}

// Degeneracy returns the number of magnetic substates that the state stands for: 2F+1 for the
// outermost total F.
func (s State) Degeneracy() int { return s.degeneracy }

// String returns the quantum numbers in coupling order: "L=1 S=1/2 J=3/2".
func (s State) String() string {
	var b strings.Builder
	for name, v := range s.All() {
		if b.Len() > 0 {
			b.WriteByte(' ')
		}
		b.WriteString(name + "=" + v.String())
	}
	return b.String()
}

// nameList returns names parted by spaces as text for an error.
func nameList(names string) string {
	if names == "" {
		return "none, there are no quantum numbers"
	}
	return strings.ReplaceAll(names, " ", ", ")
}
