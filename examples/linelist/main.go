// Linelist computes the components of a spectral line from a file that describes its two levels:
// where each falls, how strong it is, exactly, and what share of the line it holds.
//
// Usage:
//
//	linelist [options] [FILE]
//
// FILE is a TOML file that describes a line; without one the program runs an invented demonstration.
//
//	-format table|csv|json   form of the list; table is the default
//	-o FILE                  write the list to FILE instead of standard output
//	-velocity                add velocities, v = c (reference - frequency)/reference
//	-plot FILE               draw the components as sticks, to a file that ends in .png or .svg
//	-width MHz               draw the profile too, each component a Gaussian of this full width at half maximum
//
// A file reads
//
//	title = "HCN J = 1-0"
//	species = "HCN"
//	source = "where the numbers come from"      # may be left out
//	[level.ground]                              # a name of your own
//	coupling = "(J I)F"                         # or (L S)J, ((L S)J I)F, ((J I1)F1 I2)F: chains from the left
//	numbers = { J = 0, I = "1" }                # a half is "3/2"; totals that are left out take all allowed values
//	energy = "0 cm-1"                           # of the whole level; also
//	energy_by_F = { 1 = "12 cm-1" }             # energies by the values of a total, such as the J of a multiplet
//	A_hfs = "3417.34 MHz"                       # an atom, its J fixed: magnetic dipole constant A
//	B_hfs = "12.5 MHz"                          # electric quadrupole constant B
//	B_rot = "44.316 GHz"                        # a linear molecule: B N(N+1) - D N^2(N+1)^2, N the first number
//	D_rot = "87.2 kHz"
//	eqQ = "-4.708 MHz"                          # quadrupole coupling constant, field gradient along the axis
//	C_I = "10.1 kHz"                            # nuclear spin-rotation constant, +C_I I.N
//	[line]
//	lower = "ground"
//	upper = "excited"
//	reference = "88631.602 MHz"                 # zero of the offsets; if left out, the mean weighted with the strengths
//
// Nuclear spins are the numbers whose names begin with I. Two are told apart: eqQ = { I1 = "-5.69 MHz",
// I2 = "-1.36 MHz" }. Units are Hz, kHz, MHz, GHz, THz and cm-1.
//
// Results go to standard output, messages to standard error. The exit status is 0, or 2 for wrong
// input, which is one line that names file, line, key, value and what is allowed; no file is then
// written or touched.
package main

import (
	"bytes"
	_ "embed"
	"errors"
	"flag"
	"fmt"
	"io"
	"os"
	"strings"
)

func main() { os.Exit(run(os.Args[1:], os.Stdout, os.Stderr)) }

// run is the program with its exit status.
func run(args []string, stdout, stderr io.Writer) int {
	err := linelist(args, stdout)
	if errors.Is(err, flag.ErrHelp) {
		_, err = io.WriteString(stdout, usage)
	}
	if err != nil {
		fmt.Fprintln(stderr, "linelist: "+strings.Join(strings.Fields(err.Error()), " ")) // one line, whatever the file held
		return 2
	}
	return 0
}

//go:embed demo.toml
var demo []byte

// linelist reads, computes and renders everything before it writes anything.
func linelist(args []string, stdout io.Writer) error {
	opt, err := parseOptions(args)
	if err != nil {
		return err
	}
	name, data := "built-in demonstration", demo
	if opt.file != "" {
		name = opt.file
		if data, err = os.ReadFile(name); err != nil {
			return fmt.Errorf("%s: %v; allowed: a TOML file that can be read", name, cause(err))
		}
	}
	s, err := readScenario(name, data)
	if err != nil {
		return err
	}
	list, err := s.list()
	if err != nil {
		return err
	}
	var text bytes.Buffer
	if err := writers[opt.format](&text, list, opt.velocity); err != nil {
		return err
	}
	var files []file
	if opt.list != "" {
		files = append(files, file{"-o", opt.list, text.Bytes()})
	}
	if opt.plot != "" {
		picture, err := drawPlot(list, opt.plot, opt.width)
		if err != nil {
			return err
		}
		files = append(files, file{"-plot", opt.plot, picture})
	}
	if err := writeFiles(files); err != nil || opt.list != "" {
		return err
	}
	if _, err := stdout.Write(text.Bytes()); err != nil {
		return fmt.Errorf("standard output: %v; allowed: a place that can be written", err)
	}
	return nil
}
