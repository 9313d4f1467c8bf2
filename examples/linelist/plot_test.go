package main

import (
	"bytes"
	"encoding/xml"
	"errors"
	"image/color"
	"image/png"
	"io"
	"math"
	"slices"
	"strings"
	"testing"

	"gonum.org/v1/plot"
	"gonum.org/v1/plot/plotter"
)

// svgTexts returns the texts of a picture.
func svgTexts(t *testing.T, picture []byte) []string {
	t.Helper()
	var list []string
	d := xml.NewDecoder(bytes.NewReader(picture))
	in := false
	for {
		token, err := d.Token()
		if errors.Is(err, io.EOF) {
			return list
		}
		if err != nil {
			t.Fatal(err)
		}
		switch token := token.(type) {
		case xml.StartElement:
			in = token.Name.Local == "text"
		case xml.CharData:
			if in {
				list = append(list, strings.TrimSpace(string(token)))
			}
			in = false
		}
	}
}

func TestPlotTexts(t *testing.T) {
	picture, err := drawPlot(testList(t, "testdata/rb87_d2.toml"), "a.SVG", 6)
	if err != nil {
		t.Fatal(err)
	}
	texts := svgTexts(t, picture)
	for _, want := range []string{"87Rb D2 line, 5S1/2 - 5P3/2", "offset (MHz) from 384230484.4685 MHz", "share of the total strength",
		"labels: upper - lower quantum number; profile: Gaussians, full width at half maximum 6 MHz", "F 3 - 2", "F 2 - 2", "F 1 - 1", "-2000", "0.4"} {
		if !slices.Contains(texts, want) {
			t.Errorf("no text %q in %q", want, texts)
		}
	}
	// Too near to the stick of F 1 - 1, as strong or stronger.
	for _, label := range []string{"F 0 - 1", "F 2 - 1"} {
		if slices.Contains(texts, label) {
			t.Errorf("label %q would overlap", label)
		}
	}
}

// The picture is grey on white and holds something.
func TestPlotPNG(t *testing.T) {
	picture, err := drawPlot(testList(t, "demo.toml"), "a.png", 0.15)
	if err != nil {
		t.Fatal(err)
	}
	m, err := png.Decode(bytes.NewReader(picture))
	if err != nil {
		t.Fatal(err)
	}
	dark := 0
	for y := range m.Bounds().Dy() {
		for x := range m.Bounds().Dx() {
			c := color.NRGBAModel.Convert(m.At(x, y)).(color.NRGBA)
			if c.R != c.G || c.G != c.B || c.A != 255 {
				t.Fatalf("color %v at %d, %d", c, x, y)
			}
			if c.R < 128 {
				dark++
			}
		}
	}
	if share := float64(dark) / float64(m.Bounds().Dx()*m.Bounds().Dy()); share < 0.005 || share > 0.1 {
		t.Errorf("%.3f of the picture is dark", share)
	}
}

// Labels never come within a line of a stronger stick; where there is room, every stick has one.
func TestLabeled(t *testing.T) {
	s := &sticks{points: plotter.XYs{{X: 0, Y: 1}, {X: 0.9, Y: 2}, {X: 1.95, Y: 1}, {X: 2.05, Y: 3}, {X: 3.06, Y: 1}, {X: 3.06, Y: 1}, {X: 9, Y: 0.1}}}
	if got, want := s.labeled(1), []int{3, 1, 4, 6}; !slices.Equal(got, want) {
		t.Errorf("labels on %v, want %v", got, want)
	}
	for _, beside := range []plotter.XYs{ // the nearer of two sticks in the next cell counts
		{{X: 0, Y: 3}, {X: 0.9, Y: 2}, {X: 1.2, Y: 1}},
		{{X: 0, Y: 3}, {X: 2.8, Y: 1}, {X: 3.1, Y: 2}, {X: 3.9, Y: 3}},
	} {
		if got := (&sticks{points: beside}).labeled(1); got[0] != 0 || slices.Contains(got, 1) || slices.Contains(got, 2) {
			t.Errorf("%v: labels on %v", beside, got)
		}
	}
	if got := s.labeled(1e-3); len(got) != 6 { // two sticks coincide
		t.Errorf("labels on %v", got)
	}
}

func TestTicks(t *testing.T) {
	for _, test := range []struct {
		low, high float64
		want      string
	}{
		{-1.9, 3.1, "-1 0 1 2 3"},
		{0, 0.61, "0.0 0.1 0.2 0.3 0.4 0.5 0.6"},
		{-0.3, 0.1, "-0.3 -0.2 -0.1 0.0 0.1"},
		{-2800, 4200, "-2000 -1000 0 1000 2000 3000 4000"},
		{0.0101, 0.0149, "0.011 0.012 0.013 0.014"},
		{0, 10, "0 2 4 6 8 10"},
	} {
		var labels []string
		for _, tick := range ticks(test.low, test.high) {
			labels = append(labels, tick.Label)
		}
		if got := strings.Join(labels, " "); got != test.want {
			t.Errorf("ticks from %v to %v: %s, want %s", test.low, test.high, got, test.want)
		}
	}
}

// The profile is at half its height half its width away, and adds up.
func TestProfile(t *testing.T) {
	s := &sticks{width: 2, points: plotter.XYs{{X: -50, Y: 1}, {X: 0, Y: 3}, {X: 0, Y: 1}}}
	for x, want := range map[float64]float64{0: 4, 1: 2, -1: 2, -50: 1, -49: 0.5, -25: 0} {
		if got := s.gaussians(x); math.Abs(got-want) > 1e-15 {
			t.Errorf("profile at %v is %v, want %v", x, got, want)
		}
	}
	if line := s.profile(-60, 10); !slices.IsSortedFunc(line.XYs, func(a, b plotter.XY) int { return int(math.Copysign(1, a.X-b.X)) }) || line.XYs[0].X != -60 {
		t.Error("the curve is not sorted")
	}
}

func TestWrap(t *testing.T) {
	style := plot.New().Title.TextStyle
	if got, want := wrap("one two three four", style, style.Width("one two")+1), "one two\nthree\nfour"; got != want {
		t.Errorf("%q, want %q", got, want)
	}
}
