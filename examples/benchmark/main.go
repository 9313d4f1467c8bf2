// Benchmark times the exact 3j, 6j and 9j symbols of this library beside those of SymPy, the
// computer-algebra system, on the same random allowed arguments, one call after the other in one run,
// and compares the values.
//
//	go run ./examples/benchmark [-sets 16] [-python python3]
//
// For each symbol and size J the arguments are drawn between J/2 and J. The table gives the median time
// of a call on either side, the median of the ratios, and the number of values that differ. Without
// SymPy it says how to get it and prints our times alone.
package main

import (
	"bufio"
	_ "embed"
	"flag"
	"fmt"
	"io"
	"os"
	"os/exec"
	"slices"
	"strconv"
	"strings"
	"time"

	"example.org/couplet/rational"
)

//go:embed driver.py
var driver string

func main() {
	sets := flag.Int("sets", 16, "argument `sets` for each symbol and size, at least 1")
	python := flag.String("python", "python3", "Python `interpreter` that has SymPy")
	flag.Parse()
	if *sets < 1 || flag.NArg() > 0 {
		fmt.Fprintf(os.Stderr, "benchmark: -sets = %d, arguments %q; allowed: -sets of 1 or more, no arguments\n", *sets, flag.Args())
		os.Exit(2)
	}
	other, err := startPeer(*python)
	if err != nil {
		fmt.Fprintf(os.Stderr, "benchmark: no SymPy behind %q (%v); on Debian `apt-get install python3-sympy` and -python /usr/bin/python3 bring it; our times alone:\n", *python, err)
	} else {
		fmt.Println("beside", other.version)
	}
	if err := run(os.Stdout, other, *sets); err != nil {
		fmt.Fprintln(os.Stderr, "benchmark:", err)
		os.Exit(1)
	}
}

// run prints a line for each symbol and size.
func run(w io.Writer, other *peer, sets int) error {
	fmt.Fprintf(w, "%-6s %5s %12s %12s %8s %s\n", "symbol", "J", "ours", "SymPy", "ratio", "values that differ")
	for _, c := range cells {
		var ours, theirs, ratios []float64
		differ := 0
		for _, q := range c.draw(sets) {
			value, seconds := measure(c.symbol, q)
			ours = append(ours, seconds)
			if other == nil {
				continue
			}
			a, err := other.ask(c.name, q)
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

// measure returns the value of a symbol and the seconds that a call takes, the best of three rounds of
// at least a millisecond each.
func measure(symbol func(q []rational.Half) rational.Surd, q []rational.Half) (rational.Surd, float64) {
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

func median(v []float64) float64 {
	v = slices.Sorted(slices.Values(v))
	return (v[(len(v)-1)/2] + v[len(v)/2]) / 2
}

func duration(seconds float64) string {
	switch {
	case seconds < 1e-6:
		return fmt.Sprintf("%.0f ns", seconds*1e9)
	case seconds < 1e-3:
		return fmt.Sprintf("%.3g us", seconds*1e6)
	}
	return fmt.Sprintf("%.3g ms", seconds*1e3)
}

// peer is a running Python process that computes the same symbols.
type peer struct {
	version string
	in      io.Writer
	out     *bufio.Scanner
}

type answer struct {
	seconds      float64
	sign, square string
}

func startPeer(python string) (*peer, error) {
	command := exec.Command(python, "-c", driver)
	in, err := command.StdinPipe()
	if err != nil {
		return nil, err
	}
	out, err := command.StdoutPipe()
	if err != nil {
		return nil, err
	}
	if err := command.Start(); err != nil {
		return nil, err
	}
	p := &peer{in: in, out: bufio.NewScanner(out)}
	p.out.Buffer(nil, 1<<20)
	if !p.out.Scan() {
		return nil, fmt.Errorf("it does not start: %v", command.Wait())
	}
	p.version = p.out.Text()
	return p, nil
}

// ask sends the arguments of a symbol and reads its value.
func (p *peer) ask(name string, q []rational.Half) (a answer, err error) {
	line := name
	for _, j := range q {
		line += " " + strconv.Itoa(j.Twice())
	}
	if _, err := fmt.Fprintln(p.in, line); err != nil {
		return a, err
	}
	if !p.out.Scan() {
		return a, fmt.Errorf("SymPy gives no answer to %q", line)
	}
	fields := strings.Fields(p.out.Text())
	if len(fields) != 4 {
		return a, fmt.Errorf("SymPy answers %q to %q", p.out.Text(), line)
	}
	a.seconds, err = strconv.ParseFloat(fields[0], 64)
	a.sign, a.square = fields[1], fields[2]+"/"+fields[3]
	return a, err
}
