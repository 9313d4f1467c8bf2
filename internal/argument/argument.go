// Package argument holds the checks of momenta and projections that every symbol shares, and the
// text of their errors.
package argument

import (
	"fmt"

	"example.org/couplet/rational"
)

// Momentum returns an error unless j >= 0. The error names the function fn and the argument name.
func Momentum(fn, name string, j rational.Half) *rational.ArgumentError {
	if j.Twice() < 0 {
		return &rational.ArgumentError{Func: fn, Arg: name, Value: j.String(), Allowed: "an integer or half-integer >= 0"}
	}
	return nil
}

// Projection returns an error unless j-m is an integer.
func Projection(fn, jName, mName string, j, m rational.Half) *rational.ArgumentError {
	if (j.Twice()^m.Twice())&1 != 0 {
		return &rational.ArgumentError{Func: fn, Arg: mName, Value: m.String(),
			Allowed: fmt.Sprintf("%s plus or minus an integer, with %s = %s", jName, jName, j)}
	}
	return nil
}

// MostInRow is the largest 2j of a row: up to there all integers of the recurrences are exact in a float64.
const MostInRow = 1 << 24

// RowLimit returns an error unless the momentum of a row is at most MostInRow/2.
func RowLimit(fn, name string, j rational.Half) *rational.ArgumentError {
	if j.Twice() > MostInRow {
		return &rational.ArgumentError{Func: fn, Arg: name, Value: j.String(), Allowed: "at most 8388608 in a row"}
	}
	return nil
}
