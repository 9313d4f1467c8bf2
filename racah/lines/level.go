package lines

import (
	"fmt"
	"iter"
	"maps"
	"slices"
	"strings"

	"example.org/couplet/internal/argument"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// Level is a set of states of one coupling: the first momentum and the spectators have values, each
// total is fixed or takes all allowed ones. With them go the terms of the energy of its states.
// Levels are immutable values. The zero value has no states.
type Level struct {
	coupling Coupling
	values   [maxNumbers]rational.Half
	free     [maxNumbers]bool // totals that take all allowed values
	energies []func(State) float64
}

// maxMomentum bounds the momenta of a level together, so that no sum and no degeneracy overflows.
const maxMomentum = 1 << 24

// Level returns the level of the coupling in which numbers gives the values of the momenta by name:
// of the first one and of all spectators, and of those totals that are fixed. The terms add up to
// the energy of its states; without terms it is 0.
//
// The error, a *rational.ArgumentError, names the momentum that is missing, unknown or negative, or
// the fixed total that the momenta before it cannot make, with the values that they can; or the
// constant of a term that does not fit the coupling.
func (c Coupling) Level(numbers map[string]rational.Half, terms ...Term) (Level, error) {
	l := Level{coupling: c}
	if err := l.setNumbers(numbers); err != nil {
		return Level{}, err
	}
	if err := l.checkTotals(); err != nil {
		return Level{}, err
	}
	for _, t := range terms {
		energy, err := t.bind(&l)
		if err != nil {
			return Level{}, err
		}
		l.energies = append(l.energies, energy)
	}
	return l, nil
}

const levelFunc = "lines.Coupling.Level"

func (l *Level) setNumbers(numbers map[string]rational.Half) error {
	for _, name := range slices.Sorted(maps.Keys(numbers)) {
		if l.coupling.place(name) < 0 {
			return &rational.ArgumentError{Func: levelFunc, Arg: name, Value: numbers[name].String(), Allowed: nameList(l.coupling.names)}
		}
	}
	sum := int64(0) // of twice the momenta that couple
	for i, name := range l.coupling.Names() {
		v, ok := numbers[name]
		isTotal := i > 0 && i&1 == 0
		if !ok && !isTotal {
			return &rational.ArgumentError{Func: levelFunc, Arg: name, Value: "missing", Allowed: "an integer or half-integer >= 0"}
		}
		if err := argument.Momentum(levelFunc, name, v); err != nil {
			return err
		}
		if !isTotal {
			if sum += int64(v.Twice()); sum > 2*maxMomentum {
				return &rational.ArgumentError{Func: levelFunc, Arg: name, Value: v.String(),
					Allowed: fmt.Sprintf("momenta that add up to %d at most", maxMomentum)}
			}
		}
		l.values[i], l.free[i] = v, !ok
	}
	return nil
}

// checkTotals returns an error for the first fixed total that those before it cannot make. The
// values that a total can take when those before it vary are again a range in steps of 1.
func (l *Level) checkTotals() error {
	names := l.coupling.Names()
	low, high := l.values[0], l.values[0]
	for i := 2; i < len(names); i += 2 {
		s := l.values[i-1]
		low, high = least(low, high, s), high.Add(s)
		if l.free[i] {
			continue
		}
		x := l.values[i]
		if x.Cmp(low) < 0 || x.Cmp(high) > 0 || !x.Sub(low).IsInt() {
			return &rational.ArgumentError{Func: levelFunc, Arg: names[i], Value: x.String(), Allowed: stepText(low, high)}
		}
		low, high = x, x
	}
	return nil
}

// least returns the smallest momentum that s makes with one of low, low+1 ... high.
func least(low, high, s rational.Half) rational.Half {
	switch {
	case s.Cmp(low) <= 0:
		return low.Sub(s)
	case s.Cmp(high) >= 0:
		return s.Sub(high)
	}
	return rational.Halves((s.Twice() - low.Twice()) & 1)
}

// stepText returns low, low+1 ... high as text.
func stepText(low, high rational.Half) string {
	if high.Sub(low).Cmp(rational.Int(4)) > 0 {
		return fmt.Sprintf("%v to %v in steps of 1", low, high)
	}
	var list []string
	for x := low; x.Cmp(high) <= 0; x = x.Add(rational.Int(1)) {
		list = append(list, x.String())
	}
	return strings.Join(list, ", ")
}

// Coupling returns the coupling of the level.
func (l Level) Coupling() Coupling { return l.coupling }

// States yields the states of the level: all allowed values of the free totals, ascending, the
// innermost as the slowest.
func (l Level) States() iter.Seq[State] {
	return func(yield func(State) bool) {
		if n := l.coupling.count(); n > 0 {
			s := State{names: l.coupling.names, values: l.values}
			l.couple(&s, 2, n, yield)
		}
	}
}

// couple runs through the totals of s from the place i on. It returns false where yield did.
func (l *Level) couple(s *State, i, n int, yield func(State) bool) bool {
	if i >= n {
		s.degeneracy = s.values[n-1].Twice() + 1
		return yield(*s)
	}
	if !l.free[i] {
		s.values[i] = l.values[i]
		return wigner.Triad(s.values[i-2], s.values[i-1], s.values[i]) != wigner.NonZero || l.couple(s, i+2, n, yield)
	}
	for x := range wigner.Resultants(s.values[i-2], s.values[i-1]) {
		s.values[i] = x
		if !l.couple(s, i+2, n, yield) {
			return false
		}
	}
	return true
}

// Energy returns the energy of a state of the level, in MHz: the sum of the terms given to
// [Coupling.Level], each to first order. It panics with *rational.ArgumentError for a state of
// another coupling.
func (l Level) Energy(s State) float64 {
	if s.names != l.coupling.names {
		panic(&rational.ArgumentError{Func: "lines.Level.Energy", Arg: "s", Value: s.String(), Allowed: "a state of " + l.coupling.String()})
	}
	sum := 0.0
	for _, energy := range l.energies {
		sum += energy(s)
	}
	return sum
}
