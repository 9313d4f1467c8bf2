// Package racah computes the recoupling coefficients of three and four angular momenta, exactly and as
// float64: Wigner's 6j and 9j symbols and Racah's W.
//
// # Conventions
//
// Every argument is a [rational.Half]. Symbols and phases are those of DLMF chapter 34; the 9j symbol
// is given row by row. Racah's coefficient is
//
//	W(abcd;ef) = (-1)^(a+b+c+d) { a b e }    Edmonds (6.2.13)
//	                            { d c f }
//
// A triad that breaks a selection rule gives zero; [CheckSixJ], [CheckW] and [CheckNineJ] name it, and
// tell it from an accidental zero. A negative argument panics with *[rational.ArgumentError]; the
// checkers return it instead. Every function is safe for concurrent use.
//
// # Accuracy
//
// The functions whose names end in Float return the nearest float64, to even on a tie, rows are within the
// bound that they state, and all others are exact. Symbols may have arguments up to
// 2^26, where time and memory allow; beyond, the exact route may panic.
package racah
