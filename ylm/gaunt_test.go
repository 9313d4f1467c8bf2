package ylm_test

import (
	"fmt"
	"math"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/ylm"
)

// c^k against the integral of its definition, for all l, k <= 4.
func TestSlaterCondonIsItsIntegral(t *testing.T) {
	eachLM(4, func(l1, m1 int) {
		eachLM(4, func(l2, m2 int) {
			pair := ylm.Harmonic(l1, m1, ylm.Ladder).Conj().Mul(ylm.Harmonic(l2, m2, ylm.Ladder))
			for k := range 5 {
				operator := ylm.Harmonic(k, m1-m2, ylm.Ladder).Mul(constant(root(4, int64(2*k+1)), -1))
				want := pair.Mul(operator).Integral()
				got := ylm.SlaterCondonC(k, l1, m1, l2, m2)
				if !constant(got.Complex(), 0).Equal(want) {
					t.Errorf("c^%d(%d %d, %d %d) = %v, want %v", k, l1, m1, l2, m2, got, want)
				}
			}
		})
	})
}

// Each row but the last breaks one rule and keeps the others.
func TestGauntSelectionRules(t *testing.T) {
	for _, c := range []struct {
		rule string
		a    [6]int
	}{
		{"|m1| > l1", [6]int{1, 2, 3, -1, 2, -1}},
		{"|m2| > l2", [6]int{2, -1, 1, 2, 3, -1}},
		{"|m3| > l3", [6]int{2, 1, 3, 1, 1, -2}},
		{"m1+m2+m3 != 0", [6]int{1, 1, 1, 1, 2, 2}},
		{"odd sum", [6]int{2, 1, 2, -1, 1, 0}},
		{"triangle", [6]int{1, 1, 2, -1, 5, 0}},
		{"|m| > l without overflow", [6]int{1, math.MaxInt, 1, math.MinInt, 0, 1}},
		{"no rule, but 3 m^2 = l(l+1)", [6]int{3, 2, 2, 0, 3, -2}},
	} {
		if got := ylm.Gaunt(c.a[0], c.a[1], c.a[2], c.a[3], c.a[4], c.a[5]); !got.IsZero() {
			t.Errorf("%s: Gaunt%v = %v, want 0", c.rule, c.a, got)
		}
	}
	for _, c := range []struct {
		rule string
		a    [5]int
	}{
		{"|m1| > l1", [5]int{2, 1, 2, 1, 1}},
		{"|m2| > l2", [5]int{2, 1, 1, 1, 2}},
		{"|m1-m2| > k", [5]int{2, 2, 2, 2, -2}},
		{"odd sum", [5]int{1, 2, 1, 2, 1}},
		{"triangle", [5]int{6, 2, 1, 2, 1}},
		{"|m| > l without overflow", [5]int{1, 1, math.MaxInt, 2, math.MinInt}},
	} {
		if got := ylm.SlaterCondonC(c.a[0], c.a[1], c.a[2], c.a[3], c.a[4]); !got.IsZero() {
			t.Errorf("%s: SlaterCondonC%v = %v, want 0", c.rule, c.a, got)
		}
	}
}

// Every order of the three, and all m reversed, give the same integral. Closure at the pole: with
// DLMF (14.30.4) in (34.3.20), the sum over l of sqrt(2l+1) Gaunt(l1 0 l2 0 l 0) is
// sqrt[(2l1+1)(2l2+1)].
func TestGauntAtLargeDegree(t *testing.T) {
	for _, c := range [][6]int{{40, 13, 35, -20, 51, 7}, {100, -3, 90, 8, 20, -5}, {200, 200, 200, -199, 2, -1}} {
		want := ylm.Gaunt(c[0], c[1], c[2], c[3], c[4], c[5])
		if want.IsZero() {
			t.Errorf("Gaunt%v = 0", c)
		}
		for name, got := range map[string]rational.Surd{
			"second first": ylm.Gaunt(c[2], c[3], c[0], c[1], c[4], c[5]),
			"third first":  ylm.Gaunt(c[4], c[5], c[0], c[1], c[2], c[3]),
			"m reversed":   ylm.Gaunt(c[0], -c[1], c[2], -c[3], c[4], -c[5]),
		} {
			if !got.Equal(want) {
				t.Errorf("Gaunt%v with %s = %v, want %v", c, name, got, want)
			}
		}
	}
	const l1, l2 = 60, 47
	var total rational.Sum
	for l := l1 - l2; l <= l1+l2; l++ {
		total = total.Add(ylm.Gaunt(l1, 0, l2, 0, l, 0).Mul(rational.Root(int64(2*l+1), 1)).Sum())
	}
	if want := rational.Root((2*l1+1)*(2*l2+1), 1).Sum(); !total.Equal(want) {
		t.Errorf("sum over l = %v, want %v", total, want)
	}
}

func TestArgumentErrors(t *testing.T) {
	term := ylm.Term{Coeff: rational.I(), Powers: [3]int{1, -2, 0}}
	cases := []struct {
		text string
		call func()
	}{
		{"ylm.Y: l = -1; allowed: an integer >= 0", func() { ylm.Y(-1, 0, 0, 0) }},
		{"ylm.Y: l = -2; allowed: an integer >= 0", func() { ylm.Y(-2, 1, math.NaN(), 0) }},
		{"ylm.Harmonic: l = -3; allowed: an integer >= 0", func() { ylm.Harmonic(-3, 0, ylm.Ladder) }},
		{"ylm.Harmonic: vars = Variables(2); allowed: Cartesian or Ladder", func() { ylm.Harmonic(1, 2, 2) }},
		{"ylm.Solid: l = -1; allowed: an integer >= 0", func() { ylm.Solid(-1, 5, ylm.Cartesian) }},
		{"ylm.Solid: vars = Variables(7); allowed: Cartesian or Ladder", func() { ylm.Solid(1, 0, 7) }},
		{"ylm.Polynomial.In: vars = Variables(2); allowed: Cartesian or Ladder", func() { ylm.Polynomial{}.In(2) }},
		{"ylm.NewPolynomial: vars = Variables(9); allowed: Cartesian or Ladder", func() { ylm.NewPolynomial(9) }},
		{"ylm.NewPolynomial: terms[1].Powers = [1 -2 0]; allowed: powers >= 0",
			func() { ylm.NewPolynomial(ylm.Ladder, ylm.Term{}, term) }},
		{"ylm.Index: l = -1; allowed: an integer from 0 to " + indexLimit(), func() { ylm.Index(-1, 0) }},
		{"ylm.Index: m = 3; allowed: an integer from -2 to 2, with l = 2", func() { ylm.Index(2, 3) }},
		{"ylm.Index: m = -1; allowed: an integer from 0 to 0, with l = 0", func() { ylm.Index(0, -1) }},
		{"ylm.SlaterCondonC: k = -1; allowed: an integer from 0 to 1073741823", func() { ylm.SlaterCondonC(-1, 1, 5, 1, 0) }},
		{"ylm.SlaterCondonC: l1 = -1; allowed: an integer from 0 to 1073741823", func() { ylm.SlaterCondonC(1, -1, 0, 1, 0) }},
		{"ylm.SlaterCondonC: l2 = 1073741824; allowed: an integer from 0 to 1073741823", func() { ylm.SlaterCondonC(1, 1, 0, 1<<30, 0) }},
	}
	for i := range 3 { // l1, l2 and l3
		var a [6]int
		a[2*i] = -4
		cases = append(cases, struct {
			text string
			call func()
		}{
			fmt.Sprintf("ylm.Gaunt: l%d = -4; allowed: an integer from 0 to 1073741823", i+1),
			func() { ylm.Gaunt(a[0], a[1], a[2], a[3], a[4], a[5]) },
		})
	}
	for _, c := range cases {
		func() {
			defer func() {
				err, ok := recover().(*rational.ArgumentError)
				if !ok {
					t.Errorf("no panic with *rational.ArgumentError; want %q", c.text)
				} else if err.Error() != c.text {
					t.Errorf("panic with %q, want %q", err, c.text)
				}
			}()
			c.call()
		}()
	}
}

func indexLimit() string {
	if math.MaxInt == math.MaxInt32 {
		return "32767"
	}
	return "2147483647"
}

func TestLargestIndex(t *testing.T) {
	l := math.MaxInt32
	if math.MaxInt == math.MaxInt32 {
		l = 32767
	}
	if got, want := ylm.Index(l, l)+1, (l+1)*(l+1); got != want {
		t.Errorf("Index(%d, %d)+1 = %d, want %d", l, l, got, want)
	}
}
