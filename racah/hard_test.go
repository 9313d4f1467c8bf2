package racah

import (
	"flag"
	"fmt"
	"math/rand/v2"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/internal/published"
	"example.org/couplet/internal/square"
	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
)

var search = flag.Int("search", 0, "search so many random symbols for hard cases, and rewrite testdata/hard")

// hardKind is one of the two files of hard cases.
type hardKind struct {
	name, file string
	columns    int
	draw       func(r *rand.Rand) (q []int, p dd.Pair, ok bool) // twice the arguments, and the value before rounding
	share      int                                              // of the draws that are asked for
}

var hardKinds = []hardKind{
	{"6j", "sixj.csv", 6, drawHardSixJ, 1},
	{"9j", "ninej.csv", 9, drawHardNineJ, 20},
}

const hardHead = `# %s symbols that lie close to a boundary of rounding: to the middle of two float64 numbers, or to one of them.
# Found by go test ./racah -run HardCases -search %d: random symbols, seed 31, by the double-double value before
# rounding; the closest ones are kept. Arguments are twice their values, row by row.
# bits is how many bits after the 53 of the float64, and the one that decides, are alike; value is the correctly
# rounded one, by the exact route.
%s,bits,value
`

// Symbols close to a boundary of rounding, searched for on purpose.
func TestHardCases(t *testing.T) {
	for _, kind := range hardKinds {
		if *search > 0 {
			kind.search(t, *search)
		}
		rows := published.Rows(t, "hard", kind.file)
		for _, row := range rows {
			q := make([]int, kind.columns)
			for i := range q {
				q[i] = row.Half(fmt.Sprintf("a%d", i+1)).Twice() / 2 // the columns are twice the values
			}
			exact, got := hardValues(q)
			if want := fmt.Sprintf("%x", exact.Float64()); fmt.Sprintf("%x", got) != want || row.Text("value") != want {
				t.Errorf("%s %v: %x, exact %s", kind.name, row, got, want)
			}
			if bits := verify.AlikeBits(exact.Float(300)); fmt.Sprint(bits) != row.Text("bits") {
				t.Errorf("%s %v: %d bits alike", kind.name, row, bits)
			}
		}
		if len(rows) != 40 {
			t.Errorf("%s: %d cases", kind.name, len(rows))
		}
	}
}

func hardValues(q []int) (exact rational.Surd, rounded float64) {
	h := rational.Halves
	if len(q) == 6 {
		return SixJ(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5])), SixJFloat(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]))
	}
	return NineJ(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]), h(q[6]), h(q[7]), h(q[8])),
		NineJFloat(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]), h(q[6]), h(q[7]), h(q[8]))
}

func drawHardSixJ(r *rand.Rand) (q []int, p dd.Pair, ok bool) {
	c, f := r.IntN(40), r.IntN(40)
	b, e := r.IntN(c+1), r.IntN(f+1)
	k := canonical(r.IntN(20), b, c, r.IntN(e+1), e, f)
	if !k.Fits() || k.T >= dd.BinomialTops {
		return nil, p, false
	}
	front := k.smallFront()
	if front.Words() > 2 {
		return nil, p, false
	}
	high, low := k.Mod128()
	n, _ := mantissa.FromMod128(high, low)
	if _, ok := front.Mul(n).Round(64, 64, 0); ok || n.M == 0 { // most are far from every boundary
		return nil, p, false
	}
	s, q1, q2, q3 := [4]int{k.T, k.S2, k.S3, k.S1}, k.N1+k.S1, k.N2+k.S2, k.N3+k.S3
	// The triads (abc), (aef), (dbf), (dec): each pair has a momentum in common, and the columns of all but it.
	q = []int{s[0] + s[1] - q2, s[0] + s[2] - q3, s[0] + s[3] - q1, s[2] + s[3] - q2, s[1] + s[3] - q3, s[1] + s[2] - q1}
	return q, k.largeFront().Mul(dd.Scaled{Pair: dd.FromMod128(high, low).Normal()}).Pair, true
}

func drawHardNineJ(r *rand.Rand) (q []int, p dd.Pair, ok bool) {
	couple := func(a, b int) int { return max(a-b, b-a) + 2*r.IntN(min(a, b)+1) }
	a, b, d, e := 1+r.IntN(16), 1+r.IntN(16), 1+r.IntN(16), 1+r.IntN(16)
	t := square.Array{a, b, couple(a, b), d, e, couple(d, e), couple(a, d), couple(b, e), 0}
	t[8] = couple(t[2], t[5])
	if !nineJAllowed(&t) {
		return nil, p, false
	}
	if nineJSmallFront(&t).Words() > 2 {
		return nil, p, false
	}
	high, low, ok := nineJMod128(&t)
	return t[:], nineJLargeFront(&t).Mul(dd.Scaled{Pair: dd.FromMod128(high, low).Normal()}).Pair, ok
}

func (kind hardKind) search(t *testing.T, draws int) {
	r := rand.New(rand.NewPCG(31, 31))
	var found verify.Hardest
	for range draws / kind.share {
		q, p, ok := kind.draw(r)
		if !ok || p.Hi == 0 {
			continue
		}
		if h := verify.Hardness(p); found.Wants(h) {
			found.Add(h, strings.Trim(strings.ReplaceAll(fmt.Sprint(q), " ", ","), "[]"))
		}
	}
	columns := make([]string, kind.columns)
	for i := range columns {
		columns[i] = fmt.Sprintf("a%d", i+1)
	}
	var out strings.Builder
	fmt.Fprintf(&out, hardHead, kind.name, draws, strings.Join(columns, ","))
	for _, text := range found.Texts() {
		q := make([]int, kind.columns)
		for i, field := range strings.Split(text, ",") {
			if _, err := fmt.Sscan(field, &q[i]); err != nil {
				t.Fatal(err)
			}
		}
		exact, _ := hardValues(q)
		fmt.Fprintf(&out, "%s,%d,%x\n", text, verify.AlikeBits(exact.Float(300)), exact.Float64())
	}
	if err := os.WriteFile(filepath.Join(published.Root(t), "testdata", "hard", kind.file), []byte(out.String()), 0o644); err != nil {
		t.Fatal(err)
	}
}
