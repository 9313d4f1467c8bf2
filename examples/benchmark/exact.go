package main

import (
	_ "embed"
	"fmt"
	"io"
	"strconv"
	"strings"
	"time"

	"example.org/couplet/rational"
)

//go:embed sympy.py
var sympy string

// startSymPy returns a Python process that knows SymPy.
func startSymPy(python string) (*peer, error) {
	p, err := start(python, "-c", sympy)
	if err != nil {
		return nil, err
	}
	p.name, err = p.next() // its version
	return p, err
}

// exactTable prints a line for each symbol and size: one call on either side after the other.
func exactTable(w io.Writer, other *peer, sets int) error {
	fmt.Fprintf(w, "%-6s %5s %12s %12s %8s %s\n", "symbol", "J", "ours", "SymPy", "ratio", "values that differ")
	for _, c := range exactCells {
		var ours, theirs, ratios []float64
		differ := 0
		for _, q := range c.draw(sets) {
			value, seconds := measureExact(c.exact, q)
			ours = append(ours, seconds)
			if other == nil {
				continue
			}
			a, err := askSymPy(other, c.name, q)
			if err != nil {
				return err
			}
			theirs = append(theirs, a.seconds)
			ratios = append(ratios, a.seconds/seconds)
			if strconv.Itoa(value.Sign()) != a.sign || value.Square().String() != a.square {
				differ++
			}
		}
		if other == nil {
			fmt.Fprintf(w, "%-6s %5d %12s\n", c.name, c.size, duration(median(ours)))
		} else {
			fmt.Fprintf(w, "%-6s %5d %12s %12s %8.0f %d of %d\n", c.name, c.size, duration(median(ours)), duration(median(theirs)), median(ratios), differ, len(ours))
		}
	}
	return nil
}

// measureExact returns the value of a symbol and the seconds that a call takes, the best of three rounds
// of at least a millisecond each.
func measureExact(symbol func(q []rational.Half) rational.Surd, q []rational.Half) (rational.Surd, float64) {
	value := symbol(q)
	best := 0.0
	for round := range 3 {
		calls, start := 0, time.Now()
		for time.Since(start) < time.Millisecond {
			for range 8 {
				value = symbol(q)
			}
			calls += 8
		}
		if s := time.Since(start).Seconds() / float64(calls); round == 0 || s < best {
			best = s
		}
	}
	return value, best
}

type answer struct {
	seconds      float64
	sign, square string
}

func askSymPy(p *peer, name string, q []rational.Half) (a answer, err error) {
	line, err := p.ask(name + twices(q))
	if err != nil {
		return a, err
	}
	fields := strings.Fields(line)
	if len(fields) != 4 {
		return a, fmt.Errorf("SymPy answers %q", line)
	}
	a.seconds, err = strconv.ParseFloat(fields[0], 64)
	a.sign, a.square = fields[1], fields[2]+"/"+fields[3]
	return a, err
}

// twices returns twice the arguments, a space before each.
func twices(q []rational.Half) string {
	var b strings.Builder
	for _, j := range q {
		fmt.Fprintf(&b, " %d", j.Twice())
	}
	return b.String()
}
