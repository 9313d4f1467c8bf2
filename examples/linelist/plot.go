package main

import (
	"bytes"
	"cmp"
	"image/color"
	"math"
	"path/filepath"
	"slices"
	"strconv"
	"strings"

	"gonum.org/v1/plot"
	"gonum.org/v1/plot/font"
	"gonum.org/v1/plot/plotter"
	"gonum.org/v1/plot/text"
	"gonum.org/v1/plot/vg"
	"gonum.org/v1/plot/vg/draw"
)

const (
	plotWidth  = 20 * vg.Centimeter
	plotHeight = 13 * vg.Centimeter
	plotMargin = 5 * vg.Millimeter
)

// drawPlot returns the stick spectrum of a list as a picture in the format of the suffix. A width
// above 0 adds the profile of Gaussians of this full width at half maximum, each as high as its stick.
func drawPlot(l *lineList, path string, width float64) ([]byte, error) {
	s := newSticks(l, width)
	p := plot.New()
	p.Title.Padding = vg.Points(6)
	p.Title.Text = wrap(l.title, p.Title.TextStyle, plotWidth-2*plotMargin)
	p.X.Label.Text = "offset (MHz) from " + fixed(l.reference) + " MHz\nlabels: upper - lower quantum number"
	if width > 0 {
		p.X.Label.Text += "; profile: Gaussians, full width at half maximum " + full(width) + " MHz"
	}
	p.X.Label.TextStyle.Font.Size, p.Y.Label.TextStyle.Font.Size = 11, 11
	p.Y.Label.Text = "share of the total strength"
	p.X.Tick.Marker, p.Y.Tick.Marker = plot.TickerFunc(ticks), plot.TickerFunc(ticks)
	p.X.Min, p.X.Max = s.ends()
	p.Y.Min = 0
	// Room above the highest point for a label: a fraction of the height, a third at most.
	p.Y.Max = s.highest(p.X.Min, p.X.Max) / (1 - min(1.0/3, float64((s.longest()+vg.Points(12))/(plotHeight*3/4))))
	if width > 0 {
		p.Add(s.profile(p.X.Min, p.X.Max))
	}
	p.Add(s)
	return render(p, strings.ToLower(filepath.Ext(path))[1:])
}

// render draws a plot on white with a margin around.
func render(p *plot.Plot, format string) ([]byte, error) {
	c, err := draw.NewFormattedCanvas(plotWidth, plotHeight, format)
	if err != nil {
		return nil, err
	}
	whole := draw.New(c)
	whole.FillPolygon(color.White, []vg.Point{whole.Min, {X: whole.Max.X, Y: whole.Min.Y}, whole.Max, {X: whole.Min.X, Y: whole.Max.Y}})
	p.Draw(draw.Crop(whole, plotMargin, -plotMargin, plotMargin, -plotMargin))
	var b bytes.Buffer
	_, err = c.WriteTo(&b)
	return b.Bytes(), err
}

// ticks returns labeled marks at multiples of 1, 2 or 5 times a power of ten, from four to ten of them.
func ticks(low, high float64) []plot.Tick {
	step := math.Pow(10, math.Floor(math.Log10((high-low)/4)))
	for _, factor := range []float64{5, 2} {
		if factor*step <= (high-low)/4 {
			step *= factor
			break
		}
	}
	decimals := max(0, int(-math.Floor(math.Log10(step)*(1-1e-12))))
	var list []plot.Tick
	const slack = 1e-9 // of a step: 0.3/0.1 is less than 3
	for n := math.Ceil(low/step - slack); n <= high/step+slack; n++ {
		list = append(list, plot.Tick{Value: n * step, Label: strconv.FormatFloat(n*step+0, 'f', decimals, 64)})
	}
	return list
}

// sticks draws a line from 0 for each component, and labels those that have room.
type sticks struct {
	points plotter.XYs
	labels []string
	style  text.Style
	width  float64 // full width at half maximum of the profile, 0 for none
}

func newSticks(l *lineList, width float64) *sticks {
	s := &sticks{width: width, style: text.Style{
		Color: color.Black, Font: font.From(plot.DefaultFont, 9), Rotation: math.Pi / 2,
		XAlign: draw.XLeft, YAlign: draw.YCenter, Handler: plot.DefaultTextHandler,
	}}
	names := l.names()
	for _, e := range l.entries {
		s.points = append(s.points, plotter.XY{X: e.offset, Y: e.share.Float64()})
		var label []string
		for i, name := range names {
			if i == len(names)-1 || l.varies(name) {
				label = append(label, name+" "+e.Final.Number(name).String()+" - "+e.Initial.Number(name).String())
			}
		}
		s.labels = append(s.labels, strings.Join(label, ", "))
	}
	return s
}

// varies reports whether a number takes more than one value in the upper or in the lower level.
func (l *lineList) varies(name string) bool {
	one := l.entries[0]
	return slices.ContainsFunc(l.entries, func(e entry) bool {
		return e.Final.Number(name) != one.Final.Number(name) || e.Initial.Number(name) != one.Initial.Number(name)
	})
}

// ends returns the range of the axis: the sticks, which are sorted, with a margin.
func (s *sticks) ends() (low, high float64) {
	low, high = s.points[0].X, s.points[len(s.points)-1].X
	margin := max(0.08*(high-low), 1.5*s.width)
	if margin == 0 {
		margin = 1
	}
	return low - margin, high + margin
}

// height returns the highest of the profile between two points.
func (s *sticks) height(low, high float64) float64 {
	top := max(s.gaussians(low), s.gaussians(high))
	for i := range 33 {
		top = max(top, s.gaussians(low+(high-low)*float64(i)/32))
	}
	return top
}

// highest returns the highest of sticks and profile.
func (s *sticks) highest(low, high float64) float64 {
	top := 0.0
	for _, p := range s.points {
		top = max(top, p.Y)
	}
	if s.width > 0 {
		for _, p := range s.profile(low, high).XYs {
			top = max(top, p.Y)
		}
	}
	return top
}

// profile returns the sum of a Gaussian for each stick.
func (s *sticks) profile(low, high float64) *plotter.Line {
	const perWidth = 12 // so that a chord leaves its arc by less than a line's width
	n := int(min(20000, max(400, perWidth*(high-low)/s.width)))
	var curve plotter.XYs
	for i := range n + 1 {
		curve = append(curve, plotter.XY{X: low + (high-low)*float64(i)/float64(n)})
	}
	curve = append(curve, s.points...) // no narrow peak falls between two steps
	for i := range curve {
		curve[i].Y = s.gaussians(curve[i].X)
	}
	slices.SortFunc(curve, func(a, b plotter.XY) int { return cmp.Compare(a.X, b.X) })
	return &plotter.Line{XYs: curve, LineStyle: draw.LineStyle{Color: color.Gray{150}, Width: vg.Points(1.2)}}
}

// gaussians returns the profile at x, 0 where there is none. Sticks beyond six widths add less than
// 10^-43 of themselves; the others are found by their order.
func (s *sticks) gaussians(x float64) float64 {
	sum := 0.0
	if s.width == 0 {
		return 0
	}
	first, _ := slices.BinarySearchFunc(s.points, x-6*s.width, func(p plotter.XY, low float64) int { return cmp.Compare(p.X, low) })
	for _, p := range s.points[first:] {
		d := (x - p.X) / s.width
		if d < -6 {
			break
		}
		sum += p.Y * math.Exp(-4*math.Ln2*d*d)
	}
	return sum
}

func (s *sticks) longest() vg.Length {
	var n vg.Length
	for _, label := range s.labels {
		n = max(n, s.style.Width(label))
	}
	return n
}

// Plot draws the sticks, then the labels of those that have room, each above the profile.
func (s *sticks) Plot(c draw.Canvas, p *plot.Plot) {
	x, y := p.Transforms(&c)
	for _, pt := range s.points {
		c.StrokeLine2(draw.LineStyle{Color: color.Black, Width: vg.Points(1.5)}, x(pt.X), y(0), x(pt.X), y(pt.Y))
	}
	line := float64(s.style.Font.Size*1.2/(x(p.X.Max)-x(p.X.Min))) * (p.X.Max - p.X.Min) // height of a line of text in MHz
	for _, i := range s.labeled(line) {
		pt := s.points[i]
		foot := max(pt.Y, s.height(pt.X-line/2, pt.X+line/2))
		c.FillText(s.style, vg.Point{X: x(pt.X) - vg.Points(2), Y: y(foot) + vg.Points(4)}, s.labels[i])
	}
}

// labeled returns the sticks that get a label: from the strongest down, those that have no stronger
// one within the height of a line of text. Cells of this height keep the outermost sticks seen.
func (s *sticks) labeled(line float64) []int {
	order := make([]int, len(s.points))
	for i := range order {
		order[i] = i
	}
	slices.SortStableFunc(order, func(a, b int) int { return cmp.Compare(s.points[b].Y, s.points[a].Y) })
	type span struct{ low, high float64 }
	cells := make(map[int]span)
	var list []int
	for _, i := range order {
		x := s.points[i].X
		cell := int(math.Floor((x - s.points[0].X) / line))
		own, taken := cells[cell]
		left, onLeft := cells[cell-1]
		right, onRight := cells[cell+1]
		if !taken {
			own = span{x, x}
			if !(onLeft && x-left.high < line) && !(onRight && right.low-x < line) {
				list = append(list, i)
			}
		}
		cells[cell] = span{min(own.low, x), max(own.high, x)}
	}
	return list
}

// wrap breaks a text into lines of a width at most, where it has spaces.
func wrap(title string, style text.Style, width vg.Length) string {
	var done []string
	line := ""
	for _, word := range strings.Fields(title) {
		if longer := strings.TrimSpace(line + " " + word); line == "" || style.Width(longer) <= width {
			line = longer
			continue
		}
		done, line = append(done, line), word
	}
	return strings.Join(append(done, line), "\n")
}
