package lines

import "example.org/couplet/rational"

// Component is one component of a line.
type Component struct {
	// Initial and Final are the states that it joins.
	Initial, Final State

	// Strength is the squared reduced element of the light's operator between the two states, exact
	// and rational, relative to a squared reduced element of 1 between the first momenta of their
	// chains. It includes all substates of both states, and is symmetric in them.
	Strength rational.Surd

	// Position is the energy of the final state less that of the initial one, in MHz: a frequency,
	// where the terms of the levels give absolute energies and the initial level is the lower one.
	Position float64
}

// Pattern is the components of a line, with the initial states as the slower index, and both in the
// order of [Level.States]. It is an ordinary slice, to be ranged over, sorted and cut at will.
type Pattern []Component

// Total returns the sum of all strengths, 0 for an empty pattern.
func (p Pattern) Total() rational.Surd {
	var sum rational.Sum
	for i := range p {
		sum = sum.Add(p[i].Strength.Sum())
	}
	total, _ := sum.Surd() // rational strengths make one term
	return total
}

// Shares returns the strength of every component divided by [Pattern.Total]; they add up to 1.
func (p Pattern) Shares() []rational.Surd {
	if len(p) == 0 {
		return nil
	}
	scale := p.Total().Inv()
	shares := make([]rational.Surd, len(p))
	for i := range p {
		shares[i] = p[i].Strength.Mul(scale)
	}
	return shares
}
