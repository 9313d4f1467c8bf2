package main

import (
	"math"
	"testing"

	"example.org/couplet/rational"
)

// published is a component as in print: its numbers by name, upper and lower, and its position.
type published struct {
	upper, lower string // values of the outermost total
	value        float64
}

func find(t *testing.T, l *lineList, p published) entry {
	t.Helper()
	names := l.names()
	total := names[len(names)-1]
	for _, e := range l.entries {
		if e.Final.Number(total).String() == p.upper && e.Initial.Number(total).String() == p.lower {
			return e
		}
	}
	t.Fatalf("no component %s - %s", p.upper, p.lower)
	return entry{}
}

func checkShares(t *testing.T, l *lineList, want []published) {
	t.Helper()
	var sum float64
	for _, p := range want {
		sum += p.value
	}
	if len(want) != len(l.entries) {
		t.Errorf("%d components, published %d", len(l.entries), len(want))
	}
	for _, p := range want {
		share := find(t, l, p).share
		if !share.Equal(rational.Ratio(int64(p.value), int64(sum))) {
			t.Errorf("%s - %s: share %v, published %v of %v", p.upper, p.lower, share, p.value, sum)
		}
	}
}

// Lines as used in radio astronomy, from memory. Left out are the spin of the proton, whose couplings
// are a few kHz, and digits of the constants that memory does not hold: 3 kHz.
func TestPublishedHCN(t *testing.T) {
	l := testList(t, "testdata/hcn.toml")
	for _, p := range []published{{"1", "1", 88630.4156}, {"2", "1", 88631.8475}, {"0", "1", 88633.9357}} {
		got := find(t, l, p).Position
		t.Logf("F = %s - %s: %.4f MHz, published %.4f", p.upper, p.lower, got, p.value)
		if math.Abs(got-p.value) > 0.003 {
			t.Errorf("F = %s - %s: %.4f MHz, published %.4f", p.upper, p.lower, got, p.value)
		}
	}
	checkShares(t, l, []published{{"1", "1", 3}, {"2", "1", 5}, {"0", "1", 1}}) // common practice, no source
	// The line's center is 2B - 4D; the strongest component lies 0.83 km/s to the blue of it, the
	// others 4.0 and -7.9 km/s, -4.8 and 7.1 from the strongest, common practice, no source.
	strongest := find(t, l, published{"2", "1", 0}).velocity
	for f, want := range map[string]float64{"1": 4.84, "0": -7.06} {
		if got := find(t, l, published{f, "1", 0}).velocity - strongest; math.Abs(got-want) > 0.03 {
			t.Errorf("F = %s - 1 at %.3f km/s from the strongest, published %.2f", f, got, want)
		}
	}
}

// Shifts and strength factors of Steck, Rubidium 87 D Line Data, from memory; printed to 0.1 kHz, and
// a frequency of 384 THz in double precision is good to 0.06 kHz, twice.
func TestPublishedRubidium(t *testing.T) {
	l := testList(t, "testdata/rb87_d2.toml")
	upper := map[string]float64{"0": -302.0738, "1": -229.8518, "2": -72.9113, "3": 193.7408}
	lower := map[string]float64{"1": -4271.6766, "2": 2563.0060}
	for _, e := range l.entries {
		u, d := e.Final.Number("F").String(), e.Initial.Number("F").String()
		want := upper[u] - lower[d]
		t.Logf("F' = %s, F = %s: offset %.4f MHz, published %.4f", u, d, e.offset, want)
		if math.Abs(e.offset-want) > 0.0002 {
			t.Errorf("F' = %s, F = %s: offset %.4f MHz, published %.4f", u, d, e.offset, want)
		}
	}
	// S_FF' weighted with 2F+1: 7/10, 1/4, 1/20 times 5; 5/12, 5/12, 1/6 times 3; all over 8. In 32nds.
	checkShares(t, l, []published{{"3", "2", 14}, {"2", "2", 5}, {"1", "2", 1}, {"2", "1", 5}, {"1", "1", 5}, {"0", "1", 2}})
}

// Wavelengths in air of Moore's multiplet table, in Ångström, and intensities 3 : 5 : 7, common
// practice, both from memory. The table has two digits after the point.
func TestPublishedOxygen(t *testing.T) {
	l := testList(t, "testdata/oxygen_777.toml")
	const airIndex = 1.0002749 // near 777 nm
	for _, p := range []published{{"1", "2", 7775.39}, {"2", "2", 7774.17}, {"3", "2", 7771.94}} {
		got := 299792458 / (find(t, l, p).Position * 1e6) / airIndex * 1e10
		t.Logf("J' = %s: %.3f Ångström, published %.2f", p.upper, got, p.value)
		if math.Abs(got-p.value) > 0.01 {
			t.Errorf("J' = %s: %.3f Ångström, published %.2f", p.upper, got, p.value)
		}
	}
	checkShares(t, l, []published{{"1", "2", 3}, {"2", "2", 5}, {"3", "2", 7}})
}

// Units against the defined speed of light: 1 cm-1 is 29979.2458 MHz.
func TestQuantities(t *testing.T) {
	for text, want := range map[string]float64{
		"1 cm-1": 29979.2458, "2.5 MHz": 2.5, "-3 kHz": -0.003, "1e6 Hz": 1, "12.3 GHz": 12300, "+0.5 THz": 500000, " 0  MHz ": 0,
	} {
		if got, err := parseQuantity(text); err != nil || math.Abs(got-want) > 1e-15*math.Abs(want) {
			t.Errorf("%q = %v MHz, %v, want %v", text, got, err, want)
		}
	}
	for _, text := range []string{"", "1", "MHz", "1MHz", "1 mhz", "1 eV", "1 MHz extra", "inf MHz", "nan MHz", "0x1p4 MHz", "1_0 MHz", "1e400 MHz", "1e19 MHz", "1,5 MHz", "- MHz", "1\u00a0\u00a0"} {
		if got, err := parseQuantity(text); err == nil {
			t.Errorf("%q = %v MHz", text, got)
		}
	}
}
