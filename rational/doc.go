// Package rational holds the exact numbers of angular momentum algebra: integers and half-integers,
// square roots of rationals, finite sums of them, complex numbers and matrices over those.
//
//   - [Half] is a quantum number, integer or half-integer.
//   - [Surd] is r*sqrt(n), the value of a coupling coefficient.
//   - [Sum] is a finite sum of surds, [Complex] a pair of sums, [Matrix] a matrix of complexes.
//   - [Factored] builds a surd from factorials without ever holding a long number.
//
// # Conventions
//
// The zero value of every type is the number 0 (the empty matrix; 1 for Factored). Values are
// immutable and safe for concurrent use, methods return new ones, and what they hand out in the
// types of math/big are fresh copies. Every number has one canonical form: r in lowest terms, n
// squarefree, the terms of a sum in the order of their radicands. == does not compile on Surd, Sum
// and Complex; their Equal methods compare, and Key gives a text for maps.
//
// A value that fits into 64-bit words is held in them, larger ones stand behind a pointer. The two are
// told apart only by speed: products and quotients of the former allocate nothing.
//
// Malformed arguments (division by zero, an index out of range) panic with *[ArgumentError];
// functions that read text return errors instead.
//
// # Text
//
// String, MarshalText and the Parse functions use one notation: integers, fractions and decimals,
// * and /, sqrt( ) around a number or a fraction, + and - between terms, i for the imaginary unit:
//
//	-3/2    2.5    -1/3*sqrt(14)    sqrt(2/7)    1/2 - 1/2*sqrt(3)*i
//
// encoding/json uses the same text, in quotes.
//
// # Accuracy
//
// All arithmetic is exact. Float64 is the nearest float64, to even on a tie, for values of any
// size; Float(prec) is rounded in the same way to prec bits.
package rational
