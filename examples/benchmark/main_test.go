package main

import (
	"bytes"
	"io"
	"strings"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// Without another side the tables have our times alone, a line for each symbol and size.
func TestTableWithoutPeer(t *testing.T) {
	var b bytes.Buffer
	for _, table := range []struct {
		print func(w io.Writer, other *peer, sets int) error
		cells []cell
	}{{exactTable, exactCells}, {floatTable, floatCells}} {
		b.Reset()
		if err := table.print(&b, nil, 1); err != nil {
			t.Fatal(err)
		}
		lines := strings.Split(strings.TrimSpace(b.String()), "\n")
		if len(lines) != len(table.cells)+1 {
			t.Errorf("%d lines for %d cells", len(lines), len(table.cells))
		}
		for _, line := range lines[1:] {
			if !strings.HasSuffix(line, "s") { // ns, us, ms
				t.Errorf("no time in %q", line)
			}
		}
	}
}

// The draws keep to the sizes, fulfill the rules and, nearly all, give values that are not zero.
func TestDraw(t *testing.T) {
	for _, c := range append(exactCells, floatCells...) {
		if c.size > 30 {
			continue
		}
		nonzero := 0
		for _, q := range c.draw(50) {
			for _, j := range q[:c.places] {
				if 2*j.Twice() < 2*c.size || j.Cmp(rational.Int(c.size)) > 0 {
					t.Errorf("%s, J = %d: %v is out of bounds", c.name, c.size, j)
				}
			}
			for _, triad := range c.triads {
				if r := wigner.Triad(q[triad[0]], q[triad[1]], q[triad[2]]); r != wigner.NonZero {
					t.Errorf("%s %v: %v", c.name, q, r)
				}
			}
			if !c.exact(q).IsZero() {
				nonzero++
			}
		}
		if least := 35; nonzero < least && (c.size > 1 || nonzero < least/2) { // many of the smallest vanish by symmetry
			t.Errorf("%s, J = %d: %d of 50 not zero", c.name, c.size, nonzero)
		}
	}
}

func TestUnitsOfTime(t *testing.T) {
	for seconds, want := range map[float64]string{1.2e-8: "12.0 ns", 2.5e-7: "250 ns", 3.456e-6: "3.46 us", 0.25: "250 ms"} {
		if got := duration(seconds); got != want {
			t.Errorf("%g s prints as %s, want %s", seconds, got, want)
		}
	}
	if m := median([]float64{3, 1, 2, 10}); m != 2.5 {
		t.Errorf("median %g", m)
	}
}

// An interpreter that does not exist, and one that knows no SymPy, are errors.
func TestNoPeer(t *testing.T) {
	for _, name := range []string{"no-such-interpreter", "false"} {
		if p, err := startSymPy(name); err == nil {
			t.Errorf("%s gives %v", name, p)
		}
	}
}
