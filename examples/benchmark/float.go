package main

import (
	_ "embed"
	"errors"
	"fmt"
	"io"
	"math"
	"os"
	"os/exec"
	"path/filepath"
	"runtime"
	"strconv"
	"time"

	"example.org/couplet/rational"
)

//go:embed c/library.c
var library []byte

// startLibrary compiles the C program and starts it. The program is gone when it ends.
func startLibrary() (*peer, error) {
	dir, err := os.MkdirTemp("", "benchmark-")
	if err != nil {
		return nil, err
	}
	defer os.RemoveAll(dir)
	source, program := filepath.Join(dir, "library.c"), filepath.Join(dir, "library")
	if err := os.WriteFile(source, library, 0o600); err != nil {
		return nil, err
	}
	if out, err := exec.Command("gcc", "-O2", source, "-o", program, "-lgsl", "-lgslcblas", "-lm").CombinedOutput(); err != nil {
		return nil, errors.New(firstLine(string(out), err))
	}
	p, err := start(program)
	if err == nil {
		p.name = "the GNU Scientific Library"
	}
	return p, err
}

// rounds is how often either side is timed, by turns.
const rounds = 15

// wrongBeyond is the relative error beyond which a value counts as wrong, and for a zero the absolute one.
const wrongBeyond = 1e-10

// floatTable prints a line for each symbol and size: passes over all sets, by turns.
func floatTable(w io.Writer, other *peer, sets int) error {
	fmt.Fprintf(w, "%-6s %5s %12s %12s %8s %s\n", "symbol", "J", "ours", "library", "ratio", "wrong values of the library")
	for _, c := range floatCells {
		q := c.draw(min(sets, c.most))
		timed := other != nil && !c.alone
		if timed {
			if err := load(other, c.name, q); err != nil {
				return err
			}
		}
		passes := passesFor(c.float, q)
		var ours, theirs []float64
		for range rounds {
			ours = append(ours, measureFloat(c.float, q, passes))
			if timed {
				ns, err := timeLibrary(other, passes)
				if err != nil {
					return err
				}
				theirs = append(theirs, ns*1e-9)
			}
		}
		if !timed {
			fmt.Fprintf(w, "%-6s %5d %12s\n", c.name, c.size, duration(median(ours)))
			continue
		}
		wrong, err := countWrong(other, c, q)
		if err != nil {
			return err
		}
		fmt.Fprintf(w, "%-6s %5d %12s %12s %8.1f %d of %d\n", c.name, c.size, duration(median(ours)), duration(median(theirs)), median(theirs)/median(ours), wrong, len(q))
	}
	return nil
}

// passesFor returns how many passes over the sets take some milliseconds.
func passesFor(symbol func(q []rational.Half) float64, sets [][]rational.Half) int {
	seconds := measureFloat(symbol, sets, 1) * float64(len(sets))
	return max(1, int(5e-3/seconds))
}

// measureFloat returns the seconds of a call.
func measureFloat(symbol func(q []rational.Half) float64, sets [][]rational.Half, passes int) float64 {
	sum := 0.0
	start := time.Now()
	for range passes {
		for _, q := range sets {
			sum += symbol(q)
		}
	}
	seconds := time.Since(start).Seconds()
	runtime.KeepAlive(sum)
	return seconds / float64(passes*len(sets))
}

func load(p *peer, name string, sets [][]rational.Half) error {
	if _, err := fmt.Fprintf(p.in, "load %s %d\n", name, len(sets)); err != nil {
		return err
	}
	for _, q := range sets {
		if _, err := fmt.Fprintln(p.in, twices(q)); err != nil {
			return err
		}
	}
	_, err := p.next()
	return err
}

func timeLibrary(p *peer, passes int) (ns float64, err error) {
	line, err := p.ask(fmt.Sprintf("time %d", passes))
	if err != nil {
		return 0, err
	}
	return strconv.ParseFloat(line, 64)
}

// countWrong returns how many values of the library are off by more than wrongBeyond.
func countWrong(p *peer, c cell, sets [][]rational.Half) (wrong int, err error) {
	line, err := p.ask("values")
	for i, q := range sets {
		if err != nil {
			return 0, err
		}
		theirs, err := strconv.ParseFloat(line, 64)
		if err != nil {
			return 0, err
		}
		ours := c.float(q)
		allowed := wrongBeyond * math.Abs(ours)
		if ours == 0 {
			allowed = wrongBeyond
		}
		if !(math.Abs(theirs-ours) <= allowed) { // NaN and Inf are wrong too
			wrong++
		}
		if i < len(sets)-1 {
			line, err = p.next()
			if err != nil {
				return 0, err
			}
		}
	}
	return wrong, nil
}

func firstLine(text string, err error) string {
	for i, r := range text {
		if r == '\n' {
			return text[:i]
		}
	}
	return text + err.Error()
}
