// Package lines computes line patterns: which components a line has, how strong each is, exactly,
// and where it falls.
//
//   - [Coupling] names the momenta of a chain, ((L S)J I)F, and [Coupling.Level] gives them values.
//   - [Between] joins two levels to a [Pattern], a slice of [Component]; [Multiplet] and [Hyperfine]
//     do so for the most common chains.
//   - [RelativeStrength] is the strength of one coupling step, for a loop of one's own.
//   - [Offset], [Rotation], [FineStructure], [AtomicNucleus], [MolecularNucleus] and [TermFunc] are the
//     terms of a level's energy, which place the components; [DipoleFactor], [QuadrupoleFactor],
//     [CasimirFunction] and [ProjectionFactor] are their exact angular factors.
//
// # Conventions
//
// Momenta couple one after the other. The light acts on the first; the others are spectators, and
// the same in both levels. Every coupling of a momentum j with a spectator s to a total x multiplies
// the squared reduced element of the dipole by
//
//	(2x+1)(2x'+1) { j  x  s }^2    square of Edmonds (7.1.7)
//	              { x' j' 1 }
//
// Strengths are exact and relative to |<j||T||j'>|^2 = 1 of the first momentum. With f for the
// outermost total, the strengths of all components
//
//	from one initial state f add up to            (2f+1)/(2j+1)
//	into one final state f' add up to             (2f'+1)/(2j'+1)
//	of a complete pattern, no total fixed, to     the product of (2s+1) over all spectators
//
// Parity is not looked at: a step from L to L is allowed unless L = 0. A strength is symmetric in the
// two levels and holds no power of the frequency; it is neither an oscillator strength nor a
// transition rate.
//
// Energies, constants and positions are in MHz. The position of a component is the energy of its
// final state less that of its initial one: a frequency where the initial level is the lower one.
// Energies are first-order: matrix elements between different states of a level are left out.
// The quadrupole coupling constant of an atom is B, with the energy +B/4 in the stretched state
// F = I+J; the eqQ of a linear molecule counts the field gradient q along the molecular axis, and
// q_J = -q J/(2J+3) puts a minus sign before Casimir's function. Magnetic constants multiply +I·J.
//
// A component that a selection rule forbids is left out of a pattern, and its strength is zero. A
// malformed argument, a negative momentum, panics with *[rational.ArgumentError]; [Coupling.Level]
// and [Between], made for data, return it instead, and [ParseCoupling] returns a *[rational.ParseError].
// Everything is safe for concurrent use; a Pattern is a slice and belongs to the caller.
//
// # Accuracy
//
// Strengths and angular factors are exact. An energy is a sum of terms, one rounded product of
// constant and factor each: some 10^-16 of the largest term.
package lines
