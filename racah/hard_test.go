package racah

import (
	"flag"
	"fmt"
	"math"
	"math/big"
	"math/rand/v2"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/internal/published"
	"example.org/couplet/internal/square"
	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
)

var (
	search   = flag.Int("search", 0, "search so many random symbols for hard cases, and rewrite testdata/hard")
	directed = flag.Int("directed", 0, "search so many rows of symbols for very hard cases, and rewrite testdata/hard")
)

// hardKind is one of the two files of hard cases.
type hardKind struct {
	name, file string
	columns    int
	draw       func(r *rand.Rand) (q []int, p dd.Pair, ok bool) // twice the arguments, and the value before rounding
	share      int                                              // of the draws that are asked for
	symbol     func(a, b, c int) []int                          // of the directed search
	divisor    func(b, c int64) []int64                         // of 2X, squared, as factors
}

var hardKinds = []hardKind{
	{"6j", "sixj", 6, drawHardSixJ, 1,
		func(a, b, c int) []int { return []int{a, b, c, 2, c, b} },
		func(b, c int64) []int64 { return []int64{b, b + 1, b + 2, c, c + 1, c + 2} }},
	{"9j", "ninej", 9, drawHardNineJ, 20,
		func(a, b, c int) []int { return []int{a, b, c, c, 2, c, b, b, 0} },
		func(b, c int64) []int64 { return []int64{b, b + 1, b + 1, b + 2, c, c + 1, c + 1, c + 2} }},
}

const hardHead = `# %s symbols that lie close to a boundary of rounding: to the middle of two float64 numbers, or to one of them.
# Found by go test ./racah -run HardCases -search %d: random symbols, seed 31, by the double-double value before
# rounding; the closest ones are kept. Arguments are twice their values, row by row.
# bits is how many bits after the 53 of the float64, and the one that decides, are alike; value is the correctly
# rounded one, by the exact route.
%s,bits,value
`

const directedHead = `# %s symbols that lie very close to the middle of two float64 numbers.
# Found by go test ./racah -run HardCases -directed %d: for random j2 and j3 the value of {j1 j2 j3; 1 j3 j2}, which
# the 9j symbol {j1 j2 j3; j3 1 j3; j2 j2 0} contains, is X = j2(j2+1) + j3(j3+1) - j1(j1+1) times a number that
# does not depend on j1, DLMF (34.5.7); its continued fraction gives the X close to a middle, and a square root
# tells whether there is a j1. The closest ones are kept. Arguments are twice their values, row by row.
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
		if *directed > 0 {
			kind.direct(t, *directed)
		}
		for _, file := range []string{kind.file + ".csv", kind.file + "_directed.csv"} {
			rows := published.Rows(t, "hard", file)
			for i, row := range rows {
				if testing.Short() && i%5 != 0 { // the larger ones take time
					continue
				}
				q := make([]int, kind.columns)
				for i := range q {
					q[i] = row.Half(fmt.Sprintf("a%d", i+1)).Twice() / 2 // the columns are twice the values
				}
				exact, got := hardValues(q)
				if want := fmt.Sprintf("%x", exact.Float64()); fmt.Sprintf("%x", got) != want || row.Text("value") != want {
					t.Errorf("%s %v: %x, exact %s", kind.name, row, got, want)
				}
				long := exact.Float(300)
				if bits := verify.AlikeBits(long); fmt.Sprint(bits) != row.Text("bits") {
					t.Errorf("%s %v: %d bits alike", kind.name, row, bits)
				}
				if f, _ := long.Float64(); f != got { // rounded by math/big
					t.Errorf("%s %v: %x, from 300 bits %x", kind.name, row, got, f)
				}
			}
			if len(rows) != 40 {
				t.Errorf("%s: %d cases", file, len(rows))
			}
		}
	}
}

// direct is the search of directedHead.
func (kind hardKind) direct(t *testing.T, draws int) {
	r := rand.New(rand.NewPCG(36, 36))
	var found verify.Closest
	const size = 1 << 18 // of 2 j2 and 2 j3: the factorials of double-double reach four times as far
	for range draws {
		b, c := size/2+r.Int64N(size/2), size/2+r.Int64N(size/2)
		product := new(big.Float).SetPrec(200).SetInt64(4)
		for _, f := range kind.divisor(b, c) {
			product.Mul(product, new(big.Float).SetInt64(f))
		}
		// The value is 4X kappa, 4X up to some 2bc; the middles are odd integers when it is scaled to 54 bits.
		kappa := new(big.Float).Quo(new(big.Float).SetPrec(200).SetInt64(1), product.Sqrt(product))
		high := 2*b*c + 2*min(b, c)
		top := new(big.Float).Mul(kappa, new(big.Float).SetInt64(high))
		kappa.SetMantExp(kappa, 54-top.MantExp(nil))
		f, _ := kappa.Float64()
		verify.NearOdd(kappa, int64(0x1p53/f)+1, high, 36, func(x int64) {
			for _, x := range []int64{x, -x} {
				square := b*(b+2) + c*(c+2) - x + 1
				a := int64(math.Sqrt(float64(square))) - 1
				if (a+1)*(a+1) == square && (a+b+c)&1 == 0 && a >= max(b-c, c-b) && a <= b+c {
					q := kind.symbol(int(a), int(b), int(c))
					found.Add(hardLine(q))
				}
			}
		})
	}
	kind.write(t, "_directed", fmt.Sprintf(directedHead, kind.name, draws, kind.head()), found.Lines())
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
	q3, s1 := r.IntN(40), r.IntN(40)
	q2, s2 := r.IntN(q3+1), r.IntN(s1+1)
	k := canonical(r.IntN(20), q2, q3, r.IntN(s2+1), s2, s1)
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
	a, b, c, d, e, f := k.momenta()
	q = []int{a, b, c, d, e, f}
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
	sum, negative := nineJSum(&t, new(binsum.ProductRoom))
	if len(sum) == 0 {
		return nil, p, false
	}
	high, low, exp := binsum.Leading(sum)
	return t[:], nineJLargeFront(&t).Mul(dd.Scaled{Pair: dd.FromWords(high, low).Normal().Scale(0, negative), Exp: exp}).Pair, true
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
	var lines []string
	for _, text := range found.Texts() {
		q := make([]int, kind.columns)
		for i, field := range strings.Split(text, ",") {
			if _, err := fmt.Sscan(field, &q[i]); err != nil {
				t.Fatal(err)
			}
		}
		_, line := hardLine(q)
		lines = append(lines, line)
	}
	kind.write(t, "", fmt.Sprintf(hardHead, kind.name, draws, kind.head()), lines)
}

// hardLine returns the line for a case, and how many bits of it are alike.
func hardLine(q []int) (bits int, line string) {
	exact, _ := hardValues(q)
	bits = verify.AlikeBits(exact.Float(300))
	return bits, fmt.Sprintf("%s,%d,%x", strings.Trim(strings.ReplaceAll(fmt.Sprint(q), " ", ","), "[]"), bits, exact.Float64())
}

// head returns the names of the columns of arguments.
func (kind hardKind) head() string {
	columns := make([]string, kind.columns)
	for i := range columns {
		columns[i] = fmt.Sprintf("a%d", i+1)
	}
	return strings.Join(columns, ",")
}

func (kind hardKind) write(t *testing.T, suffix, head string, lines []string) {
	name := filepath.Join(published.Root(t), "testdata", "hard", kind.file+suffix+".csv")
	if err := os.WriteFile(name, []byte(head+strings.Join(lines, "\n")+"\n"), 0o644); err != nil {
		t.Fatal(err)
	}
}
