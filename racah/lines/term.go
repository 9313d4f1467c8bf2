package lines

import (
	"fmt"
	"maps"
	"math"
	"slices"
	"strconv"
	"strings"

	"example.org/couplet/rational"
)

// Term is a term of the energy of a level, to first order: its expectation value in the states of
// the coupling. The terms of this package are [Offset], [Rotation], [FineStructure], [AtomicNucleus],
// [MolecularNucleus] and [TermFunc]; a constant that is not finite is an error of [Coupling.Level].
type Term interface {
	// bind returns the energy in MHz as a function of the state, or the error of Coupling.Level.
	bind(l *Level) (func(State) float64, error)
}

// Offset is an energy in MHz that all states of a level share.
type Offset float64

// Rotation is the energy of a linear rotor, with N the first momentum of the coupling, J or N by name:
//
//	B N(N+1) - D N^2 (N+1)^2
//
// The rotational constant B and the centrifugal distortion constant D are in MHz.
type Rotation struct{ B, D float64 }

// FineStructure is an energy that depends on one total, such as the J of a multiplet.
type FineStructure struct {
	Total  string                    // name of the total
	Energy map[rational.Half]float64 // in MHz, for every value that the total takes in the level, and no other
}

// AtomicNucleus is the hyperfine energy of a nuclear spin I in an atom, with J the total to which I
// couples, itself the first momentum or a total:
//
//	A K/2 + B [3/4 K(K+1) - I(I+1)J(J+1)] / [2I(2I-1) J(2J-1)],    K = F(F+1) - I(I+1) - J(J+1)
//
// Casimir 1936; the constants of Arimondo, Inguscio and Violino 1977, in MHz. The factors are
// [DipoleFactor] and [QuadrupoleFactor]; that of B is zero for I < 1 or J < 1. A and B belong to one J.
type AtomicNucleus struct {
	Spin string // name of I, a spectator
	A, B float64
}

// MolecularNucleus is the hyperfine energy of a nuclear spin I in a linear molecule in a Σ state, with
// N the first momentum of the coupling. For the first spectator, |(N I)F>, it is
//
//	-eqQ Y(N,I,F) + C_I K/2,    K = F(F+1) - I(I+1) - N(N+1)
//
// with Y of [CasimirFunction], Townes and Schawlow 1955. For a later spectator, as the second nucleus
// of |((N I1)F1 I)F>, the field gradient and N are projected step by step on the total to which I
// couples, here F1. With P(k) for [ProjectionFactor] and Q for [QuadrupoleFactor] it is
//
//	-eqQ N/(2N+3) P(2; N,I1,F1) Q(F1,I,F) + C_I N P(1; N,I1,F1) K'/(2 F1),    K' = F(F+1) - I(I+1) - F1(F1+1)
//
// which is the first-order energy: off-diagonal elements in F1 are left out. EqQ and CI are in MHz.
type MolecularNucleus struct {
	Spin    string // name of I, a spectator
	EqQ, CI float64
}

// TermFunc is an energy of the caller's own, in MHz.
type TermFunc func(State) float64

func (t Offset) bind(*Level) (func(State) float64, error) {
	return func(State) float64 { return float64(t) }, finite(constant{"Offset", float64(t)})
}

func (t Rotation) bind(*Level) (func(State) float64, error) {
	return func(s State) float64 {
		n := s.values[0].Float64()
		square := n * (n + 1)
		return float64(t.B*square) - float64(t.D*(square*square))
	}, finite(constant{"Rotation.B", t.B}, constant{"Rotation.D", t.D})
}

func (t TermFunc) bind(*Level) (func(State) float64, error) {
	if t == nil {
		return nil, &rational.ArgumentError{Func: levelFunc, Arg: "TermFunc", Value: "nil", Allowed: "a function"}
	}
	return t, nil
}

func (t FineStructure) bind(l *Level) (func(State) float64, error) {
	place := l.coupling.place(t.Total)
	if place < 2 || place&1 == 1 {
		return nil, l.wrongName("FineStructure.Total", t.Total, 0)
	}
	taken := make(map[rational.Half]bool)
	for s := range l.States() {
		taken[s.values[place]] = true
	}
	allowed := func() string { return l.coupling.Names()[place] + " = " + halfList(taken) }
	for _, x := range sortedKeys(taken) {
		if _, ok := t.Energy[x]; !ok {
			return nil, &rational.ArgumentError{Func: levelFunc, Arg: "FineStructure.Energy", Value: "none for " + x.String(), Allowed: allowed()}
		}
	}
	for _, x := range sortedKeys(t.Energy) {
		if !taken[x] {
			return nil, &rational.ArgumentError{Func: levelFunc, Arg: "FineStructure.Energy", Value: "one for " + x.String(), Allowed: allowed()}
		}
		if err := finite(constant{"FineStructure.Energy", t.Energy[x]}); err != nil {
			return nil, err
		}
	}
	energy := maps.Clone(t.Energy)
	return func(s State) float64 { return energy[s.values[place]] }, nil
}

func (t AtomicNucleus) bind(l *Level) (func(State) float64, error) {
	place, err := l.spectator("AtomicNucleus.Spin", t.Spin)
	if err != nil {
		return nil, err
	}
	return func(s State) float64 {
		j, i, f := s.values[place-1], s.values[place], s.values[place+1]
		return float64(t.A*DipoleFactor(j, i, f).Float64()) + float64(t.B*QuadrupoleFactor(j, i, f).Float64())
	}, finite(constant{"AtomicNucleus.A", t.A}, constant{"AtomicNucleus.B", t.B})
}

func (t MolecularNucleus) bind(l *Level) (func(State) float64, error) {
	place, err := l.spectator("MolecularNucleus.Spin", t.Spin)
	if err != nil {
		return nil, err
	}
	return func(s State) float64 {
		energy := 0.0
		if t.EqQ != 0 {
			energy -= float64(t.EqQ * chainQuadrupole(&s, place).Float64())
		}
		if t.CI != 0 {
			energy += float64(t.CI * chainDipole(&s, place).Float64())
		}
		return energy
	}, finite(constant{"MolecularNucleus.EqQ", t.EqQ}, constant{"MolecularNucleus.CI", t.CI})
}

// chainQuadrupole returns the factor of -eqQ for the spectator at a place.
func chainQuadrupole(s *State, place int) rational.Surd {
	x, i, f := s.values[place-1], s.values[place], s.values[place+1]
	return QuadrupoleFactor(x, i, f).Mul(projection(2, s, place)).Mul(axisFactor(s.values[0]))
}

// chainDipole returns <I·N> for the spectator I at a place and the first momentum N.
func chainDipole(s *State, place int) rational.Surd {
	x, i, f := s.values[place-1], s.values[place], s.values[place+1]
	if x == (rational.Half{}) {
		return rational.Surd{}
	}
	return DipoleFactor(x, i, f).Mul(projection(1, s, place)).Mul(s.values[0].Surd()).Quo(x.Surd())
}

// projection returns the product of the projection factors from the first momentum on to the total
// before a place.
func projection(k int, s *State, place int) rational.Surd {
	p := rational.Ratio(1, 1)
	for i := 2; i < place; i += 2 {
		p = p.Mul(ProjectionFactor(k, s.values[i-2], s.values[i-1], s.values[i]))
	}
	return p
}

// spectator returns the place of a spectator.
func (l *Level) spectator(arg, name string) (int, error) {
	if place := l.coupling.place(name); place&1 == 1 && place > 0 {
		return place, nil
	}
	return 0, l.wrongName(arg, name, 1)
}

// wrongName returns the error for a name that is not one of the totals, parity 0, or the spectators,
// parity 1.
func (l *Level) wrongName(arg, name string, parity int) error {
	var allowed []string
	for i, n := range l.coupling.Names() {
		if i > 0 && i&1 == parity {
			allowed = append(allowed, n)
		}
	}
	kind := [2]string{"total", "spectator"}[parity]
	text := "a " + kind + " of " + l.coupling.String() + ": " + strings.Join(allowed, ", ")
	if allowed == nil {
		text = "nothing, " + l.coupling.String() + " has no " + kind
	}
	return &rational.ArgumentError{Func: levelFunc, Arg: arg, Value: strconv.Quote(name), Allowed: text}
}

type constant struct {
	name  string
	value float64
}

// finite returns an error for the first constant that is not.
func finite(list ...constant) error {
	for _, c := range list {
		if math.IsNaN(c.value) || math.IsInf(c.value, 0) {
			return &rational.ArgumentError{Func: levelFunc, Arg: c.name, Value: fmt.Sprint(c.value), Allowed: "a finite number of MHz"}
		}
	}
	return nil
}

func sortedKeys[V any](m map[rational.Half]V) []rational.Half {
	return slices.SortedFunc(maps.Keys(m), rational.Half.Cmp)
}

func halfList(m map[rational.Half]bool) string {
	var list []string
	for _, h := range sortedKeys(m) {
		list = append(list, h.String())
	}
	return strings.Join(list, ", ")
}
