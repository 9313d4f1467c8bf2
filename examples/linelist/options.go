package main

import (
	"errors"
	"flag"
	"fmt"
	"io"
	"math"
	"path/filepath"
	"strconv"
	"strings"
)

// usage is the part of the package comment that a user needs.
const usage = `usage:

  linelist [options] [FILE]

FILE is a TOML file that describes a line; without one the program runs an invented demonstration.

  -format table|csv|json   form of the list; table is the default
  -o FILE                  write the list to FILE instead of standard output
  -velocity                add velocities, v = c (reference - frequency)/reference
  -plot FILE               draw the components as sticks, to a file that ends in .png or .svg
  -width MHz               draw the profile too, each component a Gaussian of this full width at half maximum

A file reads

  title = "HCN J = 1-0"
  species = "HCN"
  source = "where the numbers come from"      # may be left out
  [level.ground]                              # a name of your own
  coupling = "(J I)F"                         # or (L S)J, ((L S)J I)F, ((J I1)F1 I2)F: chains from the left
  numbers = { J = 0, I = "1" }                # a half is "3/2"; totals that are left out take all allowed values
  energy = "0 cm-1"                           # of the whole level; also
  energy_by_F = { 1 = "12 cm-1" }             # energies by the values of a total, such as the J of a multiplet
  A_hfs = "3417.34 MHz"                       # an atom, its J fixed: magnetic dipole constant A
  B_hfs = "12.5 MHz"                          # electric quadrupole constant B
  B_rot = "44.316 GHz"                        # a linear molecule: B N(N+1) - D N^2(N+1)^2, N the first number
  D_rot = "87.2 kHz"
  eqQ = "-4.708 MHz"                          # quadrupole coupling constant, field gradient along the axis
  C_I = "10.1 kHz"                            # nuclear spin-rotation constant, +C_I I.N
  [line]
  lower = "ground"
  upper = "excited"
  reference = "88631.602 MHz"                 # zero of the offsets; if left out, the mean weighted with the strengths

Nuclear spins are the numbers whose names begin with I. Two are told apart: eqQ = { I1 = "-5.69 MHz",
I2 = "-1.36 MHz" }. Units are Hz, kHz, MHz, GHz, THz and cm-1.
`

// options are the arguments of the program.
type options struct {
	file     string // empty for the demonstration
	format   string
	list     string // empty for standard output
	velocity bool
	plot     string  // empty for no plot
	width    float64 // full width at half maximum in MHz; 0 for no profile
}

func parseOptions(args []string) (options, error) {
	opt := options{format: "table"}
	set := flag.NewFlagSet("linelist", flag.ContinueOnError)
	set.SetOutput(io.Discard)
	set.Func("format", "", func(v string) error {
		if writers[v] == nil {
			return errors.New("not a format; allowed: table, csv, json")
		}
		opt.format = v
		return nil
	})
	set.Func("width", "", func(v string) error {
		w, err := strconv.ParseFloat(v, 64)
		if err != nil || !(w > 0) || math.IsInf(w, 0) {
			return errors.New("not a width; allowed: a finite number of MHz above 0")
		}
		opt.width = w
		return nil
	})
	set.Func("o", "", pathOption(&opt.list))
	set.Func("plot", "", pathOption(&opt.plot))
	set.BoolVar(&opt.velocity, "velocity", false, "")

	// Options may stand before and after the file.
	var files []string
	for rest := args; ; {
		if err := set.Parse(rest); errors.Is(err, flag.ErrHelp) {
			return opt, err
		} else if err != nil {
			return opt, fmt.Errorf("%v; options: -format table|csv|json, -o FILE, -velocity, -plot FILE, -width MHz", err)
		}
		if set.NArg() == 0 {
			break
		}
		files, rest = append(files, set.Arg(0)), set.Args()[1:]
	}
	return opt, opt.check(files)
}

// pathOption returns the setter of a file name.
func pathOption(path *string) func(string) error {
	return func(v string) error {
		if v == "" {
			return errors.New("no name; allowed: the name of a file")
		}
		*path = v
		return nil
	}
}

// check finds what is wrong with options together, and sets the file.
func (opt *options) check(files []string) error {
	switch suffix := strings.ToLower(filepath.Ext(opt.plot)); {
	case len(files) > 1:
		return fmt.Errorf("argument %q: a second file; allowed: one file", files[1])
	case len(files) == 1 && files[0] == "":
		return errors.New(`argument "": no name; allowed: the name of a TOML file`)
	case opt.plot != "" && suffix != ".png" && suffix != ".svg":
		return fmt.Errorf("-plot = %q: unknown suffix; allowed: a name that ends in .png or .svg", opt.plot)
	case opt.plot == "" && opt.width != 0:
		return fmt.Errorf("-width = %v: there is no plot; allowed: with -plot FILE", opt.width)
	case opt.plot != "" && filepath.Clean(opt.plot) == filepath.Clean(opt.list):
		return fmt.Errorf("-plot = %q: the list goes there; allowed: another file than that of -o", opt.plot)
	}
	if len(files) == 1 {
		opt.file = files[0]
	}
	return nil
}
