package main

import (
	"cmp"
	"fmt"
	"slices"
	"strconv"
	"strings"

	"gonum.org/v1/gonum/unit/constant"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// lineList is the result: the components of a line, by frequency.
type lineList struct {
	*scenario
	entries       []entry
	total         rational.Surd
	normalization string
	referenceText string
}

// entry is one component.
type entry struct {
	lines.Component               // the lower state is the initial one
	share           rational.Surd // of the total strength
	offset          float64       // MHz from the reference
	velocity        float64       // km/s, radio definition
}

// list computes the components of the line.
func (s *scenario) list() (*lineList, error) {
	if s.lower.Coupling() != s.upper.Coupling() {
		return nil, s.line.failValue("upper", fmt.Sprintf("%q with the coupling %v", s.upper.name, s.upper.Coupling()),
			fmt.Sprintf("a level with the coupling of the lower one, %v", s.lower.Coupling()))
	}
	pattern, err := lines.Between(s.lower.Level, s.upper.Level)
	if err != nil {
		return nil, err // the couplings are the same: no error
	}
	if len(pattern) == 0 {
		return nil, s.line.failValue("upper", fmt.Sprintf("%q without a component from %q: %s", s.upper.name, s.lower.name, s.whyForbidden()),
			"levels that a dipole joins")
	}
	l := &lineList{scenario: s, total: pattern.Total()}
	for i, share := range pattern.Shares() {
		l.entries = append(l.entries, entry{Component: pattern[i], share: share})
	}
	slices.SortStableFunc(l.entries, func(a, b entry) int { return cmp.Compare(a.Position, b.Position) })
	if low := l.entries[0]; !(low.Position > 0) {
		return nil, s.line.failValue("upper", fmt.Sprintf("%q, whose state %v lies %s MHz above %v of %q", s.upper.name, low.Final, fixed(low.Position), low.Initial, s.lower.name),
			"an upper level whose energies lie above those of the lower one")
	}
	l.place()
	l.normalization = "relative to a squared reduced element of 1 between the " + s.lower.Coupling().Names()[0] + " of the two levels"
	return l, nil
}

// place sets offsets and velocities.
func (l *lineList) place() {
	if l.reference == 0 {
		// The offsets from one component are exact where the frequencies are large.
		base, mean := l.entries[0].Position, 0.0
		for _, e := range l.entries {
			mean += float64(e.share.Float64() * (e.Position - base))
		}
		l.reference = base + mean
		l.referenceText = "the mean frequency, weighted with the strengths"
	} else {
		l.referenceText = "the reference of the file"
	}
	for i := range l.entries {
		e := &l.entries[i]
		e.offset = e.Position - l.reference
		e.velocity = -float64(constant.LightSpeedInVacuum) / 1e3 * e.offset / l.reference
	}
}

// whyForbidden tells why no component joins the levels.
func (s *scenario) whyForbidden() string {
	coupling := s.lower.Coupling()
	for _, name := range coupling.Spectators() {
		if a, b := s.lower.numbers[name], s.upper.numbers[name]; a != b {
			return fmt.Sprintf("%s is %v below and %v above", name, a, b)
		}
	}
	first := coupling.Names()[0]
	if a, b := s.lower.numbers[first], s.upper.numbers[first]; wigner.Triad(a, rational.Int(1), b) != wigner.NonZero {
		return fmt.Sprintf("%s goes from %v to %v, which breaks the triangle rule with 1", first, a, b)
	}
	return "the totals that are fixed break the triangle rule with 1"
}

// names returns the quantum numbers that tell the states apart: the first number and the totals.
func (l *lineList) names() []string {
	var list []string
	for i, name := range l.lower.Coupling().Names() {
		if i&1 == 0 {
			list = append(list, name)
		}
	}
	return list
}

// describe returns a level in words.
func (l level) describe() string {
	var numbers []string
	for _, name := range l.Coupling().Names() {
		if v, ok := l.numbers[name]; ok {
			numbers = append(numbers, name+" = "+v.String())
		}
	}
	return l.name + ": " + l.Coupling().String() + " with " + strings.Join(numbers, ", ")
}

// fixed returns a number of MHz or km/s to four decimals, without the sign of a rounded zero.
func fixed(v float64) string {
	text := strconv.FormatFloat(v, 'f', 4, 64)
	if text == "-0.0000" {
		return text[1:]
	}
	return text
}
