// Package verify holds what the tests of several packages share: the panics of malformed arguments, and the
// errors of rows and of double-double numbers.
package verify

import (
	"math"
	"math/big"
	"testing"

	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/rational"
)

// Recovered returns the *rational.ArgumentError with which f panics, nil if it does not panic.
func Recovered(f func()) (e *rational.ArgumentError) {
	defer func() {
		if r := recover(); r != nil {
			e = r.(*rational.ArgumentError)
		}
	}()
	f()
	return nil
}

// Relative returns the relative error of p*2^exp.
func Relative(p dd.Pair, exp int, want *big.Float) float64 {
	got := new(big.Float).SetPrec(300).SetFloat64(p.Hi)
	got.Add(got, new(big.Float).SetPrec(300).SetFloat64(p.Lo))
	got.SetMantExp(got, exp)
	f, _ := got.Sub(got, want).Quo(got, want).Float64()
	return math.Abs(f)
}

// Big returns the number.
func Big(a mantissa.Number) *big.Float {
	return new(big.Float).SetMantExp(new(big.Float).SetPrec(300).SetUint64(a.M), a.Exp-63)
}

// Off returns by how much M is above that of the wanted number.
func Off(a mantissa.Number, want *big.Float) float64 {
	d := new(big.Float).Sub(Big(a), want)
	f, _ := d.SetMantExp(d, 63-a.Exp).Float64()
	return f
}

// The bounds that ThreeJRow and SixJRow state.
const (
	MemberBound  = 1.25    // ulp of the member
	LargestBound = 0x1p-60 // of the largest member
)

// RowErrors keeps the largest errors of the members of rows.
type RowErrors struct {
	OfLargest, OfMember float64 // relative to the largest member; in ulp of the member
	Members, Tiny       int     // compared, and those below 1e-30 of the largest
}

// Compare takes every step-th member of a row against its correctly rounded value, and returns the first one
// that is beyond the bounds, -1 if none is.
func (e *RowErrors) Compare(row []float64, step int, rounded func(i int) float64) (bad int) {
	largest := 0.0
	for _, v := range row {
		largest = max(largest, math.Abs(v))
	}
	for i := 0; i < len(row); i += step {
		want := rounded(i)
		d := math.Abs(row[i] - want)
		e.Members++
		if want != 0 && math.Abs(want) < 1e-30*largest {
			e.Tiny++
		}
		ulp := max(math.Nextafter(math.Abs(want), 2)-math.Abs(want), 0x1p-1074)
		if largest > 0 {
			e.OfLargest = max(e.OfLargest, d/largest)
		}
		if d > LargestBound*largest {
			e.OfMember = max(e.OfMember, d/ulp)
		}
		if d > max(MemberBound*ulp, LargestBound*largest) {
			return i
		}
	}
	return -1
}

// Log writes the errors to the log of a test.
func (e *RowErrors) Log(t testing.TB, what string) {
	t.Helper()
	t.Logf("%s: %d members, %d below 1e-30 of the largest; errors up to %.2f ulp of the member, 2^%.1f of the largest",
		what, e.Members, e.Tiny, e.OfMember, math.Log2(e.OfLargest))
}
