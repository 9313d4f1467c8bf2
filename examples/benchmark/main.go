// Benchmark times the coupling coefficients of this library beside those of others, on the same random
// allowed arguments and in one run, and compares the values.
//
//	go run ./examples/benchmark [-route float|exact] [-sets N] [-python python3]
//
// Route float is the correctly rounded float64 functions beside the GNU Scientific Library: either side
// passes over all sets by turns, and the table gives the median time of a call, the ratio, and how many
// values of the other library are wrong by more than 1e-10 of the value. It needs gcc and the library.
//
// Route exact is the exact functions beside SymPy, the computer-algebra system, one call after the
// other: the table gives the medians, the median of the ratios, and the number of values that differ.
//
// For each symbol and size J the arguments are drawn between J/2 and J. Where the other side is not to
// be had, the program says how to get it and prints our times alone.
package main

import (
	"flag"
	"fmt"
	"os"
	"slices"
)

func main() {
	route := flag.String("route", "float", "`route` to time, float or exact")
	sets := flag.Int("sets", 0, "argument `sets` for each symbol and size; 256 for float and 16 for exact if not given")
	python := flag.String("python", "python3", "Python `interpreter` that has SymPy")
	flag.Parse()
	if *sets < 0 || *sets > 4096 || flag.NArg() > 0 || *route != "float" && *route != "exact" {
		fmt.Fprintf(os.Stderr, "benchmark: -route = %q, -sets = %d, arguments %q; allowed: -route float or exact, -sets from 1 to 4096, no arguments\n", *route, *sets, flag.Args())
		os.Exit(2)
	}
	if err := run(*route, *sets, *python); err != nil {
		fmt.Fprintln(os.Stderr, "benchmark:", err)
		os.Exit(1)
	}
}

func run(route string, sets int, python string) error {
	if route == "exact" {
		other, err := startSymPy(python)
		if err != nil {
			fmt.Fprintf(os.Stderr, "benchmark: no SymPy behind %q (%v); on Debian `apt-get install python3-sympy` and -python /usr/bin/python3 bring it; our times alone:\n", python, err)
			other = nil
		} else {
			fmt.Println("beside", other.name)
		}
		return exactTable(os.Stdout, other, given(sets, 16))
	}
	other, err := startLibrary()
	if err != nil {
		fmt.Fprintf(os.Stderr, "benchmark: no GNU Scientific Library (%v); on Debian `apt-get install gcc libgsl-dev` brings it; our times alone:\n", err)
		other = nil
	} else {
		fmt.Println("beside", other.name)
	}
	return floatTable(os.Stdout, other, given(sets, 256))
}

func given(n, usual int) int {
	if n == 0 {
		return usual
	}
	return n
}

func median(v []float64) float64 {
	v = slices.Sorted(slices.Values(v))
	return (v[(len(v)-1)/2] + v[len(v)/2]) / 2
}

func duration(seconds float64) string {
	switch {
	case seconds < 1e-7:
		return fmt.Sprintf("%.1f ns", seconds*1e9)
	case seconds < 1e-6:
		return fmt.Sprintf("%.0f ns", seconds*1e9)
	case seconds < 1e-3:
		return fmt.Sprintf("%.3g us", seconds*1e6)
	}
	return fmt.Sprintf("%.3g ms", seconds*1e3)
}
