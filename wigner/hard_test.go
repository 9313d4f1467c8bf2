package wigner

import (
	"flag"
	"fmt"
	"math/big"
	"math/rand/v2"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"example.org/couplet/internal/argument"
	"example.org/couplet/internal/binsum"
	"example.org/couplet/internal/dd"
	"example.org/couplet/internal/mantissa"
	"example.org/couplet/internal/published"
	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
)

var (
	search   = flag.Int("search", 0, "search so many random symbols for hard cases, and rewrite testdata/hard/threej.csv")
	directed = flag.Bool("directed", false, "search for very hard cases, and rewrite testdata/hard/threej_directed.csv")
)

const hardHead = `# 3j symbols that lie close to a boundary of rounding: to the middle of two float64 numbers, or to one of them.
# Found by go test ./wigner -run HardCases -search %d: random symbols with j1+j2+j3 from 20 to 150, seed 30, by
# the double-double value before rounding; the closest ones are kept. Arguments are twice their values.
# bits is how many bits after the 53 of the float64, and the one that decides, are alike; value is the correctly
# rounded one, by the exact route.
j1,j2,j3,m1,m2,m3,bits,value
`

const directedHead = `# 3j symbols that lie very close to the middle of two float64 numbers.
# Found by go test ./wigner -run HardCases -directed: (j j 1; m -m 0) is m times a number that depends on j only,
# by the Wigner-Eckart theorem; for each j to 2^23 the continued fraction of that number gives the m close to a
# middle. The closest ones are kept. Arguments are twice their values.
# bits is how many bits after the 53 of the float64, and the one that decides, are alike; value is the correctly
# rounded one, by the exact route.
j1,j2,j3,m1,m2,m3,bits,value
`

// Symbols close to a boundary of rounding, searched for on purpose.
func TestHardCases(t *testing.T) {
	if *search > 0 {
		searchHardCases(t, *search)
	}
	if *directed {
		directHardCases(t)
	}
	for _, file := range []string{"threej.csv", "threej_directed.csv"} {
		rows := published.Rows(t, "hard", file)
		for _, row := range rows {
			var j [6]rational.Half
			for i, column := range []string{"j1", "j2", "j3", "m1", "m2", "m3"} {
				j[i] = rational.Halves(row.Half(column).Twice() / 2) // the columns are twice the values
			}
			exact := ThreeJ(j[0], j[1], j[2], j[3], j[4], j[5])
			got := ThreeJFloat(j[0], j[1], j[2], j[3], j[4], j[5])
			if want := fmt.Sprintf("%x", exact.Float64()); fmt.Sprintf("%x", got) != want || row.Text("value") != want {
				t.Errorf("%v: %x, exact %s", row, got, want)
			}
			long := exact.Float(300)
			if bits := verify.AlikeBits(long); fmt.Sprint(bits) != row.Text("bits") {
				t.Errorf("%v: %d bits alike", row, bits)
			}
			if f, _ := long.Float64(); f != got { // rounded by math/big
				t.Errorf("%v: %x, from 300 bits %x", row, got, f)
			}
		}
		if len(rows) != 40 {
			t.Errorf("%s: %d cases", file, len(rows))
		}
	}
}

// directHardCases is the search of directedHead.
func directHardCases(t *testing.T) {
	var found verify.Closest
	h := rational.Halves
	for n := int64(2); n < argument.MostInRow; n++ { // 2j
		product := new(big.Float).SetPrec(200).SetInt64(n * (n + 2))
		product.Mul(product, new(big.Float).SetInt64(n+1))
		// The value is 2m kappa; the middles are odd integers when it is scaled to 54 bits, in two binades.
		kappa := new(big.Float).Quo(big.NewFloat(1), product.Sqrt(product))
		top := new(big.Float).Mul(kappa, new(big.Float).SetInt64(n))
		kappa.SetMantExp(kappa, 54-top.MantExp(nil))
		for range 2 {
			f, _ := kappa.Float64()
			verify.NearOdd(kappa, int64(0x1p53/f)+1, min(n, int64(0x1p54/f)), 38, func(m int64) {
				if (m+n)&1 == 0 {
					exact := ThreeJ(h(int(n)), h(int(n)), h(2), h(int(m)), h(int(-m)), h(0))
					bits := verify.AlikeBits(exact.Float(300))
					found.Add(bits, fmt.Sprintf("%d,%d,2,%d,%d,0,%d,%x", n, n, m, -m, bits, exact.Float64()))
				}
			})
			kappa.SetMantExp(kappa, 1)
		}
	}
	name := filepath.Join(published.Root(t), "testdata", "hard", "threej_directed.csv")
	if err := os.WriteFile(name, []byte(directedHead+strings.Join(found.Lines(), "\n")+"\n"), 0o644); err != nil {
		t.Fatal(err)
	}
}

func searchHardCases(t *testing.T, draws int) {
	r := rand.New(rand.NewPCG(30, 30))
	var found verify.Hardest
	for range draws {
		total := 20 + r.IntN(131)
		a, b := r.IntN(total/2+1), r.IntN(total/2+1)
		c, d := r.IntN(total+1), r.IntN(total+1)
		q := regge{a, b, total - a - b, c, d, total - c - d, total - a - c, total - b - d, a + b + c + d - total}
		if min(q[2], q[5], q[6], q[7], q[8]) < 0 {
			continue
		}
		front := q.smallFront(false)
		if front.Words() > 2 {
			continue
		}
		var sum binsum.Triple
		q.sum(&sum)
		high, low := sum.Mod128()
		n, _ := mantissa.FromMod128(high, low)
		if _, ok := front.Mul(n).Round(64, 64, 0); ok || n.M == 0 { // most are far from every boundary
			continue
		}
		p := q.largeFront().Mul(dd.Scaled{Pair: dd.FromMod128(high, low).Normal()})
		if h := verify.Hardness(p.Pair); found.Wants(h) {
			found.Add(h, fmt.Sprintf("%d,%d,%d,%d,%d,%d", q[3]+q[6], q[4]+q[7], q[5]+q[8], q[6]-q[3], q[7]-q[4], q[8]-q[5]))
		}
	}
	var out strings.Builder
	fmt.Fprintf(&out, hardHead, draws)
	for _, text := range found.Texts() {
		var q [6]int
		if _, err := fmt.Sscanf(text, "%d,%d,%d,%d,%d,%d", &q[0], &q[1], &q[2], &q[3], &q[4], &q[5]); err != nil {
			t.Fatal(err)
		}
		h := rational.Halves
		exact := ThreeJ(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]))
		fmt.Fprintf(&out, "%s,%d,%x\n", text, verify.AlikeBits(exact.Float(300)), exact.Float64())
	}
	if err := os.WriteFile(filepath.Join(published.Root(t), "testdata", "hard", "threej.csv"), []byte(out.String()), 0o644); err != nil {
		t.Fatal(err)
	}
}
