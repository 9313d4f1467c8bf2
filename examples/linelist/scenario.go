package main

import (
	"errors"
	"fmt"
	"maps"
	"slices"
	"strings"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

// scenario is what a file describes.
type scenario struct {
	title, species, source string
	lower, upper           level
	line                   table
	reference              float64 // MHz; 0 for the mean frequency
}

// level is a level under its name in the file.
type level struct {
	lines.Level
	name    string
	numbers map[string]rational.Half
}

// maxStates bounds the states of a level, and with them the time a file can take.
const maxStates = 2000

func readScenario(name string, data []byte) (*scenario, error) {
	top, err := parseDocument(name, data)
	if err != nil {
		return nil, err
	}
	if err := top.only("title", "species", "source", "level", "line"); err != nil {
		return nil, err
	}
	s := new(scenario)
	if s.title, err = top.text("title"); err != nil {
		return nil, err
	}
	if s.species, err = top.text("species"); err != nil {
		return nil, err
	}
	if top.has("source") {
		if s.source, err = top.text("source"); err != nil {
			return nil, err
		}
	}
	levels, err := readLevels(top)
	if err != nil {
		return nil, err
	}
	return s, s.readLine(top, levels)
}

func readLevels(top table) (map[string]level, error) {
	all, err := top.table("level")
	if err != nil {
		return nil, err
	}
	levels := make(map[string]level)
	for _, name := range all.keys() {
		t, err := all.table(name)
		if err != nil {
			return nil, err
		}
		if levels[name], err = readLevel(name, t); err != nil {
			return nil, err
		}
	}
	return levels, nil
}

// readLine reads the table of the line, and picks its levels.
func (s *scenario) readLine(top table, levels map[string]level) error {
	t, err := top.table("line")
	if err != nil {
		return err
	}
	s.line = t
	if err := t.only("lower", "upper", "reference"); err != nil {
		return err
	}
	for _, end := range []struct {
		key   string
		level *level
	}{{"lower", &s.lower}, {"upper", &s.upper}} {
		name, err := t.text(end.key)
		if err != nil {
			return err
		}
		l, ok := levels[name]
		if !ok {
			return t.fail(end.key, "the name of a level: "+strings.Join(slices.Sorted(maps.Keys(levels)), ", "))
		}
		*end.level = l
	}
	if !t.has("reference") {
		return nil
	}
	if s.reference, err = t.quantity("reference"); err == nil && s.reference <= 0 {
		err = t.fail("reference", "a frequency above 0")
	}
	return err
}

func readLevel(name string, t table) (level, error) {
	text, err := t.text("coupling")
	if err != nil {
		return level{}, err
	}
	coupling, err := lines.ParseCoupling(text)
	if err != nil {
		var e *rational.ParseError
		errors.As(err, &e) // the only type it has
		return level{}, t.fail("coupling", fmt.Sprintf("at byte %d %s", e.Offset, e.Allowed))
	}
	keys := []string{"coupling", "numbers", "energy"}
	names := coupling.Names()
	for i := 2; i < len(names); i += 2 {
		keys = append(keys, energyBy+names[i])
	}
	if err := t.only(append(keys, "A_hfs", "B_hfs", "B_rot", "D_rot", "eqQ", "C_I")...); err != nil {
		return level{}, err
	}
	q, err := t.table("numbers")
	if err != nil {
		return level{}, err
	}
	l := level{name: name, numbers: make(map[string]rational.Half)}
	for _, key := range q.keys() {
		if l.numbers[key], err = q.half(key); err != nil {
			return level{}, err
		}
	}
	if l.Level, err = coupling.Level(l.numbers); err != nil {
		return level{}, numbersError(q, err)
	}
	states := 0
	for range l.States() {
		if states++; states > maxStates {
			return level{}, q.failValue(names[0], l.numbers[names[0]].String(), fmt.Sprintf("numbers that make %d states at most", maxStates))
		}
	}
	terms, err := readTerms(t, l)
	if err != nil {
		return level{}, err
	}
	if l.Level, err = coupling.Level(l.numbers, terms...); err != nil {
		return level{}, numbersError(q, err)
	}
	return l, nil
}

// numbersError puts the line of a number into an error of Coupling.Level.
func numbersError(q table, err error) error {
	var e *rational.ArgumentError
	errors.As(err, &e) // the only type it has
	return q.failValue(e.Arg, e.Value, e.Allowed)
}
