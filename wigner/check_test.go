package wigner_test

import (
	"errors"
	"testing"

	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// All arguments with 2j from -1 to 4 and 2m from -5 to 5, allowed or not.
func TestCheckThreeJ(t *testing.T) {
	counts := map[wigner.Rule]int{}
	malformed := 0
	h := rational.Halves
	for n := range 6 * 6 * 6 * 11 * 11 * 11 {
		digit := func(base int) int { d := n % base; n /= base; return d }
		j := [3]int{digit(6) - 1, digit(6) - 1, digit(6) - 1}
		m := [3]int{digit(11) - 5, digit(11) - 5, digit(11) - 5}
		var value rational.Surd
		panicked := verify.Recovered(func() { value = wigner.ThreeJ(h(j[0]), h(j[1]), h(j[2]), h(m[0]), h(m[1]), h(m[2])) })
		verdict, err := wigner.CheckThreeJ(h(j[0]), h(j[1]), h(j[2]), h(m[0]), h(m[1]), h(m[2]))
		bad, out := false, false
		for i := range 3 {
			bad = bad || j[i] < 0 || (j[i]-m[i])%2 != 0
			out = out || max(m[i], -m[i]) > j[i]
		}
		if bad != (panicked != nil) || bad != (err != nil) {
			t.Fatalf("j %v, m %v (halves): panic %v, error %v", j, m, panicked, err)
		}
		if bad {
			malformed++
			continue
		}
		want := wigner.NonZero
		switch {
		case (j[0]+j[1]+j[2])%2 != 0:
			want = wigner.HalfIntegerSum
		case j[0]+j[1] < j[2] || j[1]+j[2] < j[0] || j[2]+j[0] < j[1]:
			want = wigner.Triangle
		case out:
			want = wigner.ProjectionRange
		case m[0]+m[1]+m[2] != 0:
			want = wigner.ProjectionSum
		}
		if want == wigner.NonZero && verdict.Zero() {
			want = verdict.Rule
			if want < wigner.Symmetry {
				t.Fatalf("j %v, m %v (halves): %v", j, m, verdict)
			}
		}
		if verdict.Rule != want || verdict.Zero() != value.IsZero() {
			t.Fatalf("j %v, m %v (halves): value %v, verdict %v, want %v", j, m, value, verdict, want)
		}
		counts[want]++
	}
	t.Logf("%d malformed, %v", malformed, counts)
	for r := wigner.NonZero; r <= wigner.Symmetry; r++ {
		if counts[r] == 0 {
			t.Errorf("no case of %v", r)
		}
	}
}

func TestVerdictText(t *testing.T) {
	h := rational.Halves
	for _, c := range []struct {
		j1, j2, j3, m1, m2, m3 int // twice the values
		want                   string
	}{
		{2, 2, 2, 2, -2, 0, "not zero"},
		{2, 2, 6, 0, 0, 0, "zero: triangle rule broken (j1 j2 j3)"},
		{2, 1, 2, 0, 1, 0, "zero: the sum of a triad is half-integral (j1 j2 j3)"},
		{2, 2, 2, 0, 4, -4, "zero: projection exceeds its momentum (m2)"},
		{2, 2, 2, 2, 2, 2, "zero: projections do not add up (m1 m2 m3)"},
		{2, 2, 2, 0, 0, 0, "zero by symmetry: an exchange of lines changes the sign only"},
		// <3 2|3 Lz^2 - L^2|3 2> = 12 - 12, a quadrupole element that no rule forbids
		{6, 6, 4, 4, -4, 0, "accidental zero: no rule forbids it"},
		// no two columns are alike, but two rows of Regge's square: 2 3 4, 2 3 4, 5 3 1
		{7, 6, 5, 3, 0, -3, "zero by symmetry: an exchange of lines changes the sign only"},
	} {
		v, err := wigner.CheckThreeJ(h(c.j1), h(c.j2), h(c.j3), h(c.m1), h(c.m2), h(c.m3))
		if err != nil || v.String() != c.want {
			t.Errorf("%v: %v, %v; want %s", c, v, err, c.want)
		}
		if v, err = wigner.CheckClebschGordan(h(c.j1), h(c.m1), h(c.j2), h(c.m2), h(c.j3), h(-c.m3)); err != nil || v.Zero() != (c.want != "not zero") {
			t.Errorf("Clebsch-Gordan of %v: %v, %v", c, v, err)
		}
	}
	if got := wigner.Rule(99).String(); got != "Rule(99)" {
		t.Errorf("unknown rule prints as %q", got)
	}
}

func TestMalformedArguments(t *testing.T) {
	h := rational.Halves
	for _, c := range []struct {
		want string
		f    func()
	}{
		{"wigner.ThreeJ: j2 = -1/2; allowed: an integer or half-integer >= 0", func() { wigner.ThreeJ(h(2), h(-1), h(2), h(0), h(1), h(0)) }},
		{"wigner.ThreeJ: m3 = 1/2; allowed: j3 plus or minus an integer, with j3 = 1", func() { wigner.ThreeJ(h(2), h(2), h(2), h(0), h(0), h(1)) }},
		{"wigner.ClebschGordan: m = -1/2; allowed: j plus or minus an integer, with j = 2", func() { wigner.ClebschGordan(h(2), h(0), h(2), h(0), h(4), h(-1)) }},
		{"wigner.ClebschGordan: m1 = 1/2; allowed: j1 plus or minus an integer, with j1 = 1", func() { wigner.ClebschGordan(h(2), h(1), h(2), h(0), h(4), h(0)) }},
		{"wigner.Projections: j = -1; allowed: an integer or half-integer >= 0", func() { wigner.Projections(h(-2)) }},
		{"wigner.Resultants: j2 = -1; allowed: an integer or half-integer >= 0", func() { wigner.Resultants(h(2), h(-2)) }},
		{"wigner.ProductStates: j1 = -1; allowed: an integer or half-integer >= 0", func() { wigner.ProductStates(h(-2), h(2)) }},
		{"wigner.CoupledStates: j1 = -1; allowed: an integer or half-integer >= 0", func() { wigner.CoupledStates(h(-2), h(2)) }},
		{"wigner.CouplingMatrix: j2 = -1; allowed: an integer or half-integer >= 0", func() { wigner.CouplingMatrix(h(2), h(-2)) }},
		{"wigner.CouplingMatrixFloat: j1 = -1; allowed: an integer or half-integer >= 0", func() { wigner.CouplingMatrixFloat(nil, h(-2), h(2)) }},
		{"wigner.Operator.Matrix: j = -1; allowed: an integer or half-integer >= 0", func() { wigner.Jx.Matrix(h(-2)) }},
		{"wigner.Operator.Element: mp = 1/2; allowed: j plus or minus an integer, with j = 1", func() { wigner.Jx.Element(h(2), h(1), h(0)) }},
		{"wigner.Basis: m = 2; allowed: from -1 to 1", func() { wigner.Basis(h(2), h(4)) }},
		{"wigner.State.Add: t = a state of j = 1/2; allowed: a state of j = 1", func() { wigner.Basis(h(2), h(0)).Add(wigner.Basis(h(1), h(1))) }},
		{"wigner.State.Inner: t = a state of j = 1/2; allowed: a state of j = 1", func() { wigner.Basis(h(2), h(0)).Inner(wigner.Basis(h(1), h(1))) }},
		{"wigner.State.Amplitude: m = 1/2; allowed: j plus or minus an integer, with j = 1", func() { wigner.Basis(h(2), h(0)).Amplitude(h(1)) }},
	} {
		if e := verify.Recovered(c.f); e == nil || e.Error() != c.want {
			t.Errorf("panic %v, want %s", e, c.want)
		}
	}
	_, err := wigner.CheckClebschGordan(h(2), h(0), h(2), h(0), h(4), h(-1))
	var e *rational.ArgumentError
	if !errors.As(err, &e) || e.Func != "wigner.CheckClebschGordan" || e.Value != "-1/2" {
		t.Errorf("CheckClebschGordan: %v", err)
	}
}
