// Package wigner computes what the coupling of two angular momenta needs: Wigner 3j symbols and
// Clebsch-Gordan coefficients, exactly and as float64; the states that couple; and the operators of one angular
// momentum with the states on which they act.
//
// # Conventions
//
// Every j and m is a [rational.Half]. Phases are those of Condon and Shortley: (j1 j1 j2 j-j1 | j j)
// is positive, J+ and J- have no negative elements. The 3j symbol is that of DLMF chapter 34,
//
//	(j1 m1 j2 m2 | j m) = (-1)^(j1-j2+m) sqrt(2j+1) ( j1 j2  j )    DLMF (34.1.1)
//	                                                ( m1 m2 -m )
//
// Angular momenta are in units of hbar.
//
// A selection rule that fails gives zero; [CheckThreeJ] and [CheckClebschGordan] name it, and tell it
// from an accidental zero. A malformed argument, a negative j or a projection that does not differ
// from its j by an integer, panics with *[rational.ArgumentError]; the checkers return it instead.
//
// Every function is safe for concurrent use. Tables of primes and of small factorials are built on
// the first call, not on import.
//
// # Accuracy
//
// The functions whose names end in Float return the nearest float64, to even on a tie, rows are within the
// bound that they state, and all others are exact. Symbols may have arguments up to
// 2^26, where time and memory allow; beyond, the exact route may panic.
package wigner
