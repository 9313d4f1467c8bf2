package lines

import (
	"strconv"
	"strings"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// dipole is the rank of the operator of a line.
var dipole = rational.Int(1)

// Between returns the pattern of the line between two levels of one coupling: all components that an
// electric or magnetic dipole on the first momentum allows. Its strengths are products of
// [RelativeStrength] over the coupling steps, its positions differences of [Level.Energy]. The
// pattern is empty where the first momenta break the triangle rule with 1, or a spectator differs.
//
// The error, a *rational.ArgumentError, tells of levels of different couplings.
func Between(initial, final Level) (Pattern, error) {
	if initial.coupling != final.coupling {
		return nil, &rational.ArgumentError{Func: "lines.Between", Arg: "final", Value: "a level of " + final.coupling.String(),
			Allowed: "a level of " + initial.coupling.String() + ", as the initial one"}
	}
	w := walk{n: initial.coupling.count()}
	if !initial.meets(&final, w.n) {
		return nil, nil
	}
	var finals []State
	var energies []float64
	for s := range final.States() {
		finals = append(finals, s)
		energies = append(energies, final.Energy(s))
	}
	var p Pattern
	for a := range initial.States() {
		energy := initial.Energy(a)
		w.from(&a)
		for i := range finals {
			if s := w.to(&finals[i]); !s.IsZero() {
				p = append(p, Component{Initial: a, Final: finals[i], Strength: s, Position: energies[i] - energy})
			}
		}
	}
	return p, nil
}

// meets reports whether the n momenta of two levels let any light through: the first obey the
// triangle rule, the spectators are the same.
func (l *Level) meets(m *Level, n int) bool {
	if n == 0 || wigner.Triad(l.values[0], dipole, m.values[0]) != wigner.NonZero {
		return false
	}
	for i := 1; i < n; i += 2 {
		if l.values[i] != m.values[i] {
			return false
		}
	}
	return true
}

// walk multiplies the strengths of the coupling steps between one initial state and many final
// ones. The final states come sorted, so that neighbors share most inner totals, and their product.
type walk struct {
	n       int // number of momenta
	initial *State
	final   [maxNumbers]rational.Half // of the previous call
	product [maxNumbers]rational.Surd // up to the total at each place
	known   int                       // the last place at which product holds for final
}

func (w *walk) from(a *State) {
	w.initial, w.known = a, 0
	w.product[0] = rational.Ratio(1, 1)
}

// to returns the strength of the component into the state b.
func (w *walk) to(b *State) rational.Surd {
	i := 2
	for i <= w.known && b.values[i] == w.final[i] {
		i += 2
	}
	w.final = b.values
	a := w.initial
	for ; i < w.n; i += 2 {
		w.product[i] = w.product[i-2]
		if !w.product[i].IsZero() {
			step := relativeStrength(dipole, a.values[i-2], b.values[i-2], a.values[i-1], a.values[i], b.values[i])
			w.product[i] = w.product[i].Mul(step)
		}
	}
	w.known = w.n - 1
	return w.product[w.n-1]
}

// Multiplet returns the pattern of an LS multiplet: all components from (L S)J to (L' S)J', with
// quantum numbers named L, S and J, and positions 0. Its strengths add up to 2S+1. It panics with
// *rational.ArgumentError for a negative argument.
func Multiplet(l, lp, s rational.Half) Pattern {
	return complete("lines.Multiplet", l, lp, []string{"L", "S", "J"}, s)
}

// Hyperfine returns the hyperfine pattern of a line from J to J', of an atom or a molecule, with
// nuclear spins that couple to J one after the other, and positions 0. The quantum numbers are named
// J, I, F for one spin; J, I1, F1, I2, F for two, and so on. Its strengths add up to the product of
// (2I+1). It panics with *rational.ArgumentError for a negative argument, and unless there are from
// one to four spins.
func Hyperfine(j, jp rational.Half, spins ...rational.Half) Pattern {
	const fn = "lines.Hyperfine"
	if len(spins) < 1 || len(spins) > maxSpectators {
		panic(&rational.ArgumentError{Func: fn, Arg: "spins", Value: strconv.Itoa(len(spins)) + " of them", Allowed: "from one to four"})
	}
	names := []string{"J", "I", "F"}
	if len(spins) > 1 {
		names = names[:1]
		for i := range spins {
			names = append(names, "I"+strconv.Itoa(i+1), "F"+strconv.Itoa(i+1))
		}
		names[len(names)-1] = "F"
	}
	return complete(fn, j, jp, names, spins...)
}

// complete returns the pattern between two levels without a fixed total. It panics for the function
// fn where there are no such levels.
func complete(fn string, first, firstPrime rational.Half, names []string, spectators ...rational.Half) Pattern {
	numbers := make(map[string]rational.Half)
	for i, s := range spectators {
		numbers[names[2*i+1]] = s
	}
	level := func(first rational.Half) Level {
		numbers[names[0]] = first
		l, err := Coupling{strings.Join(names, " ")}.Level(numbers)
		if err != nil {
			e := *err.(*rational.ArgumentError) // the only type it has
			e.Func = fn
			panic(&e)
		}
		return l
	}
	p, err := Between(level(first), level(firstPrime))
	if err != nil {
		panic(err) // one coupling, no error
	}
	return p
}
