package lines_test

import (
	"math/big"
	"strings"
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

// chainOf tells, for a scheme of the table, the coupling, and the columns of its momenta without the
// suffix _l or _u of those that differ between the levels.
var chainOf = map[string]struct {
	coupling string
	columns  map[string]string // momentum: column
}{
	"LSJ":   {"(L S)J", map[string]string{"L": "L", "S": "S", "J": "J"}},
	"JI":    {"(J I)F", map[string]string{"J": "J", "I": "I1", "F": "F"}},
	"NSJI":  {"((N S)J I)F", map[string]string{"N": "N", "S": "S", "J": "J", "I": "I1", "F": "F"}},
	"JI1I2": {"((J I1)F1 I2)F", map[string]string{"J": "J", "I1": "I1", "F1": "F1", "I2": "I2", "F": "F"}},
}

// spectatorColumns are the columns that hold for both levels.
var spectatorColumns = map[string]bool{"S": true, "I1": true, "I2": true}

// pair returns the numbers of a level in a row, taking the entry of index i from lists like "1|1|2".
func pair(row published.Row, scheme, suffix string, i int) map[string]rational.Half {
	numbers := make(map[string]rational.Half)
	for momentum, column := range chainOf[scheme].columns {
		if !spectatorColumns[column] {
			column += suffix
		}
		text := row.Text(column)
		if list := strings.Split(text, "|"); len(list) > 1 {
			text = list[i]
		}
		h, err := rational.ParseHalf(text)
		if err != nil {
			panic(err)
		}
		numbers[momentum] = h
	}
	return numbers
}

// unresolved returns how many transitions a row adds up.
func unresolved(row published.Row, scheme string) int {
	n := 1
	for _, column := range chainOf[scheme].columns {
		if !spectatorColumns[column] {
			n = max(n, 1+strings.Count(row.Text(column+"_l"), "|"), 1+strings.Count(row.Text(column+"_u"), "|"))
		}
	}
	return n
}

func parseCoupling(t testing.TB, text string) lines.Coupling {
	t.Helper()
	c, err := lines.ParseCoupling(text)
	if err != nil {
		t.Fatal(err)
	}
	return c
}

func mustLevel(t testing.TB, c lines.Coupling, numbers map[string]rational.Half, terms ...lines.Term) lines.Level {
	t.Helper()
	l, err := c.Level(numbers, terms...)
	if err != nil {
		t.Fatal(err)
	}
	return l
}

func between(t testing.TB, a, b lines.Level) lines.Pattern {
	t.Helper()
	p, err := lines.Between(a, b)
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// publishedBlock is the rows of one block with what is computed for them.
type publishedBlock struct {
	name, scheme string
	rows         []published.Row
	strengths    []rational.Surd
	lower, upper []map[string]rational.Half // of every transition
}

func (b *publishedBlock) add(t *testing.T, row published.Row) {
	coupling := parseCoupling(t, chainOf[b.scheme].coupling)
	var sum rational.Sum
	for i := range unresolved(row, b.scheme) {
		l, u := pair(row, b.scheme, "_l", i), pair(row, b.scheme, "_u", i)
		p := between(t, mustLevel(t, coupling, l), mustLevel(t, coupling, u))
		if len(p) == 0 && unresolved(row, b.scheme) > 1 {
			continue // a group may list pairs that are forbidden, 0 to 0
		}
		if len(p) != 1 {
			t.Fatalf("%s: %v to %v has %d components, want 1", b.name, l, u, len(p))
		}
		sum = sum.Add(p[0].Strength.Sum())
		b.lower, b.upper = append(b.lower, l), append(b.upper, u)
	}
	s, _ := sum.Surd()
	b.rows, b.strengths = append(b.rows, row), append(b.strengths, s)
}

// common returns the numbers that are the same in all transitions; the first momentum and the
// spectators always are.
func common(list []map[string]rational.Half) map[string]rational.Half {
	numbers := make(map[string]rational.Half)
	for name, v := range list[0] {
		same := true
		for _, other := range list {
			same = same && other[name] == v
		}
		if same {
			numbers[name] = v
		}
	}
	return numbers
}

// The source of each row stands in the table. Rows of Zeeman patterns, scheme JM, belong to another
// part of the package.
func TestPublishedIntensities(t *testing.T) {
	counts, left := published.Counter{}, 0
	var blocks []*publishedBlock
	find := make(map[string]*publishedBlock)
	rows := published.Rows(t, "published", "relative_intensities.csv")
	for _, row := range rows {
		scheme := row.Text("scheme")
		if scheme == "JM" {
			left++
			continue
		}
		if chainOf[scheme].columns == nil {
			t.Fatalf("unknown scheme %q", scheme)
		}
		b := find[row.Text("block")]
		if b == nil {
			b = &publishedBlock{name: row.Text("block"), scheme: scheme}
			blocks, find[b.name] = append(blocks, b), b
		}
		b.add(t, row)
		source, _, _ := strings.Cut(row.Text("source"), ", entry")
		counts[row.Text("how")+": "+source]++
	}
	if len(blocks) < 69 || len(rows)-left < 320 {
		t.Errorf("%d blocks and %d rows: the table held more, 69 and 320", len(blocks), len(rows)-left)
	}
	for _, b := range blocks {
		b.check(t)
	}
	counts.Log(t)
	t.Logf("%d blocks; %d rows of scheme JM left for later", len(blocks), left)
}

// check compares shares and published numbers, and the transitions of the block with the whole
// pattern of its levels, less what its rows hold fixed.
func (b *publishedBlock) check(t *testing.T) {
	coupling := parseCoupling(t, chainOf[b.scheme].coupling)
	whole := between(t, mustLevel(t, coupling, common(b.lower)), mustLevel(t, coupling, common(b.upper)))
	if len(whole) != len(b.lower) {
		t.Errorf("%s: %d transitions, the pattern has %d components", b.name, len(b.lower), len(whole))
	}
	total := whole.Total()
	for i, row := range b.rows {
		share, ok := b.strengths[i].Quo(total).Rat()
		if !ok {
			t.Fatalf("%s: irrational share", b.name)
		}
		frac := ratio(t, row.Text("frac_num")+"/"+row.Text("frac_den"))
		if share.Cmp(frac) != 0 {
			t.Errorf("%s: %v to %v: share %v, want %v", b.name, b.lower[i], b.upper[i], share, frac)
		}
		if row.Text("published") == "" {
			continue
		}
		number := share.Mul(share, ratio(t, row.Text("scale")))
		off := new(big.Rat).Sub(number, ratio(t, row.Text("published")))
		if off.Abs(off).Cmp(ratio(t, row.Text("tol"))) > 0 {
			t.Errorf("%s: %v to %v: %v, published %v", b.name, b.lower[i], b.upper[i], number, row.Text("published"))
		}
	}
}

func ratio(t *testing.T, text string) *big.Rat {
	t.Helper()
	r, ok := new(big.Rat).SetString(text)
	if !ok {
		t.Fatalf("%q is no number", text)
	}
	return r
}
