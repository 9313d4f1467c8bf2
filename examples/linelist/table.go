package main

import (
	"encoding/csv"
	"encoding/json"
	"fmt"
	"io"
	"strconv"
	"strings"
	"text/tabwriter"

	"example.org/couplet/racah/lines"
)

// writers are the forms of the list, by the value of -format.
var writers = map[string]func(w io.Writer, l *lineList, velocity bool) error{
	"table": writeTable,
	"csv":   writeCSV,
	"json":  writeJSON,
}

const velocityText = "radio definition, v = c (reference - frequency) / reference"

// notes are the lines of text that go with a list.
func (l *lineList) notes(velocity bool) []string {
	list := []string{
		"Strengths are " + l.normalization + "; they add up to " + l.total.String() + ".",
		"Shares are strengths divided by this total.",
		"Offsets are from " + fixed(l.reference) + " MHz, " + l.referenceText + ".",
		"g' is the degeneracy of the upper state.",
	}
	if velocity {
		list = append(list, "Velocities: "+velocityText+".")
	}
	return list
}

// head are the lines that tell what a list is about.
func (l *lineList) head() []string {
	list := []string{l.title, "species: " + l.species}
	if l.source != "" {
		list = append(list, "source: "+l.source)
	}
	return append(list, "lower level (\") "+l.lower.describe(), "upper level (') "+l.upper.describe())
}

func writeTable(w io.Writer, l *lineList, velocity bool) error {
	for _, text := range l.head() {
		fmt.Fprintln(w, text)
	}
	fmt.Fprintln(w)
	t := tabwriter.NewWriter(w, 0, 0, 2, ' ', tabwriter.AlignRight)
	columns := []string{"frequency/MHz", "offset/MHz"}
	if velocity {
		columns = append(columns, "v/(km/s)")
	}
	for _, mark := range []string{"'", `"`} {
		for _, name := range l.names() {
			columns = append(columns, name+mark)
		}
	}
	columns = append(columns, "strength", "decimal", "share", "g'")
	fmt.Fprintln(t, strings.Join(columns, "\t")+"\t")
	for _, e := range l.entries {
		row := []string{fixed(e.Position), fixed(e.offset)}
		if velocity {
			row = append(row, fixed(e.velocity))
		}
		for _, state := range []lines.State{e.Final, e.Initial} {
			for _, name := range l.names() {
				row = append(row, state.Number(name).String())
			}
		}
		row = append(row, e.Strength.String(), fmt.Sprintf("%.6f", e.Strength.Float64()), fmt.Sprintf("%.6f", e.share.Float64()),
			strconv.Itoa(e.Final.Degeneracy()))
		fmt.Fprintln(t, strings.Join(row, "\t")+"\t")
	}
	if err := t.Flush(); err != nil {
		return err
	}
	fmt.Fprintln(w)
	for _, text := range l.notes(velocity) {
		fmt.Fprintln(w, text)
	}
	return nil
}

// writeCSV writes comments, which begin with #, a header row, and rows with numbers in full.
func writeCSV(w io.Writer, l *lineList, velocity bool) error {
	for _, text := range append(l.head(), l.notes(velocity)...) {
		fmt.Fprintln(w, "# "+text)
	}
	t := csv.NewWriter(w)
	columns := []string{"frequency_MHz", "offset_MHz"}
	if velocity {
		columns = append(columns, "velocity_radio_km_s")
	}
	names := l.lower.Coupling().Names()
	for _, end := range []string{"upper_", "lower_"} {
		for _, name := range names {
			columns = append(columns, end+name)
		}
	}
	t.Write(append(columns, "strength", "strength_decimal", "share", "share_decimal", "upper_degeneracy"))
	for _, e := range l.entries {
		row := []string{full(e.Position), full(e.offset)}
		if velocity {
			row = append(row, full(e.velocity))
		}
		for _, state := range []lines.State{e.Final, e.Initial} {
			for _, v := range state.All() {
				row = append(row, v.String())
			}
		}
		t.Write(append(row, e.Strength.String(), full(e.Strength.Float64()), e.share.String(), full(e.share.Float64()), strconv.Itoa(e.Final.Degeneracy())))
	}
	t.Flush()
	return t.Error()
}

// full returns the shortest text that reads back as v.
func full(v float64) string { return strconv.FormatFloat(v, 'f', -1, 64) }

// listJSON is the form of -format json.
type listJSON struct {
	Title         string      `json:"title"`
	Species       string      `json:"species"`
	Source        string      `json:"source,omitempty"`
	Lower         string      `json:"lower"`
	Upper         string      `json:"upper"`
	Normalization string      `json:"strengths_are"`
	Total         string      `json:"total_strength"`
	Reference     float64     `json:"reference_MHz"`
	ReferenceIs   string      `json:"reference_is"`
	VelocityIs    string      `json:"velocity_is,omitempty"`
	Lines         []entryJSON `json:"lines"`
}

type entryJSON struct {
	Frequency  float64           `json:"frequency_MHz"`
	Offset     float64           `json:"offset_MHz"`
	Velocity   *float64          `json:"velocity_radio_km_s,omitempty"`
	Upper      map[string]string `json:"upper"`
	Lower      map[string]string `json:"lower"`
	Strength   string            `json:"strength"`
	Decimal    float64           `json:"strength_decimal"`
	Share      string            `json:"share"`
	ShareValue float64           `json:"share_decimal"`
	Degeneracy int               `json:"upper_degeneracy"`
}

func writeJSON(w io.Writer, l *lineList, velocity bool) error {
	out := listJSON{Title: l.title, Species: l.species, Source: l.source, Lower: l.lower.describe(), Upper: l.upper.describe(),
		Normalization: l.normalization, Total: l.total.String(), Reference: l.reference, ReferenceIs: l.referenceText}
	if velocity {
		out.VelocityIs = velocityText
	}
	for _, e := range l.entries {
		j := entryJSON{Frequency: e.Position, Offset: e.offset, Upper: numbersText(e.Final), Lower: numbersText(e.Initial), Strength: e.Strength.String(),
			Decimal: e.Strength.Float64(), Share: e.share.String(), ShareValue: e.share.Float64(), Degeneracy: e.Final.Degeneracy()}
		if velocity {
			j.Velocity = &e.velocity
		}
		out.Lines = append(out.Lines, j)
	}
	encoder := json.NewEncoder(w)
	encoder.SetIndent("", "  ")
	encoder.SetEscapeHTML(false)
	return encoder.Encode(out)
}

func numbersText(s lines.State) map[string]string {
	m := make(map[string]string)
	for name, v := range s.All() {
		m[name] = v.String()
	}
	return m
}
