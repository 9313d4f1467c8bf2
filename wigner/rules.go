package wigner

import (
	"fmt"

	"example.org/couplet/rational"
)

// Rule is a reason for which a symbol vanishes, or NonZero.
type Rule uint8

// The rules, in the order in which they are tested.
const (
	NonZero         Rule = iota // the symbol does not vanish
	HalfIntegerSum              // the sum of the three momenta of a triad is not an integer
	Triangle                    // a triad breaks the triangle rule |a-b| <= c <= a+b
	ProjectionRange             // a projection exceeds its momentum, |m| > j
	ProjectionSum               // the projections do not add up
	Symmetry                    // a symmetry of the symbol changes its sign and leaves its arguments alone
	Accidental                  // no rule forbids the symbol, its terms cancel
)

var ruleTexts = [...]string{
	NonZero:         "not zero",
	HalfIntegerSum:  "zero: the sum of a triad is half-integral",
	Triangle:        "zero: triangle rule broken",
	ProjectionRange: "zero: projection exceeds its momentum",
	ProjectionSum:   "zero: projections do not add up",
	Symmetry:        "zero by symmetry: an exchange of lines changes the sign only",
	Accidental:      "accidental zero: no rule forbids it",
}

// String returns the rule in words.
func (r Rule) String() string {
	if int(r) < len(ruleTexts) {
		return ruleTexts[r]
	}
	return fmt.Sprintf("Rule(%d)", uint8(r))
}

// Verdict is what a checker finds about a symbol: the first rule that makes it vanish, and which
// arguments break it.
type Verdict struct {
	Rule Rule
	Args string // names of the arguments that break the rule, "j1 j2 j3" or "m2"; may be empty
}

// Zero reports whether the symbol vanishes.
func (v Verdict) Zero() bool { return v.Rule != NonZero }

// String returns the verdict in words.
func (v Verdict) String() string {
	if v.Args == "" {
		return v.Rule.String()
	}
	return v.Rule.String() + " (" + v.Args + ")"
}

// Triad returns NonZero where a, b and c can couple to zero: their sum is an integer and
// |a-b| <= c <= a+b. Otherwise it returns the rule that is broken, HalfIntegerSum or Triangle. No
// argument is malformed here: a negative one breaks one of the two rules.
func Triad(a, b, c rational.Half) Rule {
	// 64 bits hold the sums of Halves on every platform.
	x, y, z := int64(a.Twice()), int64(b.Twice()), int64(c.Twice())
	if (x+y+z)&1 != 0 {
		return HalfIntegerSum
	}
	if x+y < z || y+z < x || z+x < y {
		return Triangle
	}
	return NonZero
}
