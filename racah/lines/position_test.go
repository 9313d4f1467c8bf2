package lines_test

import (
	"math"
	"testing"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

// near compares a position with a published one.
func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	t.Logf("%s: %.5f MHz, published %.5f", what, got, want)
	if !(math.Abs(got-want) <= tolerance) {
		t.Errorf("%s: %.5f MHz, published %.5f, off by %.5f, tolerance %.5f", what, got, want, got-want, tolerance)
	}
}

// HCN J=1-0. The wrong sign of eqQ would exchange the outer components; that of C_I would move them by
// 40 kHz. Constants of Ahrens et al. 2002, Z. Naturforsch. 57a, 669, lines as in the catalogs of
// radio astronomy, all from memory. Left out are the spin of the proton, whose couplings to rotation
// and nitrogen are a few kHz, and the digits of the constants that memory does not hold: 3 kHz.
func TestPositionsHCN(t *testing.T) {
	c := parseCoupling(t, "(J I)F")
	level := func(j int) lines.Level {
		return mustLevel(t, c, map[string]rational.Half{"J": rational.Int(j), "I": rational.Int(1)},
			lines.Rotation{B: 44315.97497, D: 0.0872169}, lines.MolecularNucleus{Spin: "I", EqQ: -4.70783, CI: 0.01009})
	}
	p := between(t, level(0), level(1))
	want := []float64{88633.9357, 88630.4156, 88631.8475} // F = 0-1, 1-1, 2-1
	if len(p) != len(want) {
		t.Fatalf("%d components", len(p))
	}
	for i, comp := range p {
		if f := comp.Final.Number("F"); f != rational.Int(i) {
			t.Fatalf("component %d has F = %v", i, f)
		}
		near(t, comp.Final.String(), comp.Position, want[i], 0.003)
	}
}

// C17O J=1-0 splits by eqQ = 4.32 and C_I = -0.0316 MHz; the wrong sign of C_I would shift the
// intervals by 0.2 and 0.4 MHz. Klapper et al. 2003, ApJ 582, 262, from memory, with 20 kHz for what
// memory does not hold.
func TestPositionsC17O(t *testing.T) {
	c := parseCoupling(t, "(J I)F")
	l := mustLevel(t, c, map[string]rational.Half{"J": rational.Int(1), "I": rational.Halves(5)},
		lines.MolecularNucleus{Spin: "I", EqQ: 4.3179, CI: -0.0316})
	energy := make(map[rational.Half]float64)
	for s := range l.States() {
		energy[s.Number("F")] = l.Energy(s)
	}
	low, high, middle := energy[rational.Halves(3)], energy[rational.Halves(5)], energy[rational.Halves(7)]
	near(t, "F = 5/2 less 7/2", high-middle, 112360.0070-112358.9820, 0.02)
	near(t, "F = 7/2 less 3/2", middle-low, 112358.9820-112358.7774, 0.02)
}

// N2H+ J=1-0, seven groups by F1 and F of the upper level: frequencies of Caselli, Myers and Thaddeus
// 1995, ApJ 455, L77; eqQ of the outer and the inner nitrogen, all from memory. What is left out,
// elements off-diagonal in F1, is (eqQ/5)^2 over intervals of 2 MHz: 40 kHz from each neighbor, and
// F = 1 of F1 = 1 has two. The wrong sign of the inner eqQ would turn the order of F1 = 2 around.
func TestPositionsN2H(t *testing.T) {
	c := parseCoupling(t, "((J I1)F1 I2)F")
	one := rational.Int(1)
	l := mustLevel(t, c, map[string]rational.Half{"J": one, "I1": one, "I2": one},
		lines.MolecularNucleus{Spin: "I1", EqQ: -5.69, CI: 0.0117}, lines.MolecularNucleus{Spin: "I2", EqQ: -1.36, CI: 0.0113})
	want := map[[2]int]float64{
		{1, 0}: 93171.6210, {1, 2}: 93171.9168, {1, 1}: 93172.0533,
		{2, 2}: 93173.4796, {2, 3}: 93173.7767, {2, 1}: 93173.9666, {0, 1}: 93176.2650,
	}
	states, reference := 0, 0.0
	for s := range l.States() {
		if s.Number("F") == rational.Int(3) {
			reference = l.Energy(s)
		}
	}
	for s := range l.States() {
		states++
		group := [2]int{s.Number("F1").Twice() / 2, s.Number("F").Twice() / 2}
		near(t, s.String(), l.Energy(s)-reference, want[group]-93173.7767, 0.08)
	}
	if states != len(want) {
		t.Errorf("%d states", states)
	}
}

// The hyperfine splitting of the ground state of cesium defines the second: 9192.631770 MHz, which
// is 4A. That of the hydrogen atom is A.
func TestPositionsClock(t *testing.T) {
	c := parseCoupling(t, "(J I)F")
	for _, test := range []struct {
		twiceI        int
		a, difference float64
	}{
		{7, 2298.1579425, 9192.631770},
		{1, 1420.405751768, 1420.405751768},
	} {
		l := mustLevel(t, c, map[string]rational.Half{"J": rational.Halves(1), "I": rational.Halves(test.twiceI)}, lines.AtomicNucleus{Spin: "I", A: test.a})
		var e []float64
		for s := range l.States() {
			e = append(e, l.Energy(s))
		}
		near(t, "ground state", e[1]-e[0], test.difference, 1e-11*test.difference)
	}
}

// 87Rb D2: shifts of the hyperfine levels, from A and B, as printed to 0.1 kHz in Steck, Rubidium 87 D
// line data, from memory; the constants for 5P3/2 are those of its table. With B of the other sign
// F' = 3 and F' = 0 would move by 6.2 and 31 MHz.
func TestPositionsRubidium(t *testing.T) {
	c := parseCoupling(t, "(J I)F")
	i := rational.Halves(3)
	for _, test := range []struct {
		twiceJ int
		term   lines.AtomicNucleus
		want   map[int]float64 // by F
	}{
		{1, lines.AtomicNucleus{Spin: "I", A: 3417.34130545215}, map[int]float64{1: -4271.6766, 2: 2563.0060}},
		{3, lines.AtomicNucleus{Spin: "I", A: 84.7185, B: 12.4965}, map[int]float64{0: -302.0738, 1: -229.8518, 2: -72.9113, 3: 193.7408}},
	} {
		l := mustLevel(t, c, map[string]rational.Half{"J": rational.Halves(test.twiceJ), "I": i}, test.term)
		for s := range l.States() {
			near(t, s.String(), l.Energy(s), test.want[s.Number("F").Twice()/2], 0.0001)
		}
	}
}

// O I 777 nm: wavelengths in air from Moore's multiplet tables, from memory, and level energies of the
// NIST database, from memory; the position of each line in MHz by its wave number.
func TestPositionsOxygen(t *testing.T) {
	const perCentimeter = 29979.2458 // MHz
	c := parseCoupling(t, "(L S)J")
	two := rational.Int(2)
	lower := mustLevel(t, c, map[string]rational.Half{"L": {}, "S": two}, lines.Offset(73768.200*perCentimeter))
	upper := mustLevel(t, c, map[string]rational.Half{"L": rational.Int(1), "S": two}, lines.FineStructure{Total: "J", Energy: map[rational.Half]float64{
		rational.Int(1): 86625.757 * perCentimeter,
		rational.Int(2): 86627.778 * perCentimeter,
		rational.Int(3): 86631.454 * perCentimeter,
	}})
	want := map[int]float64{1: 7775.39, 2: 7774.17, 3: 7771.94} // Ångström
	p := between(t, lower, upper)
	if len(p) != 3 {
		t.Fatalf("%d components", len(p))
	}
	for _, comp := range p {
		const index = 1.0002749 // of air near 777 nm
		got := 299792458 / (comp.Position * 1e6) / index * 1e10
		if w := want[comp.Final.Number("J").Twice()/2]; math.Abs(got-w) > 0.01 { // the tables have two digits
			t.Errorf("%v: %.3f Å, published %.2f", comp.Final, got, w)
		}
	}
}
