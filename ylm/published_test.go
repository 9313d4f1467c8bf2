package ylm_test

import (
	"fmt"
	"strings"
	"testing"

	"example.org/couplet/internal/published"
	"example.org/couplet/rational"
	"example.org/couplet/ylm"
)

// rowsOfKind returns the rows of one kind of the table, whose head names the sources and explains
// the columns, and how many of them come from where and how.
func rowsOfKind(t *testing.T, kind string) ([]published.Row, published.Counter) {
	t.Helper()
	var rows []published.Row
	counts := published.Counter{}
	for _, row := range published.Rows(t, "published", "d_functions_and_ylm.csv") {
		if row.Text("kind") == kind {
			rows = append(rows, row)
			counts[fmt.Sprintf("%s (%s)", row.Text("source"), row.Text("how"))]++
		}
	}
	if len(rows) == 0 {
		t.Fatalf("no rows of kind %s", kind)
	}
	return rows, counts
}

// integer returns a field that holds an integer.
func integer(t *testing.T, row published.Row, column string) int {
	t.Helper()
	h := row.Half(column)
	if !h.IsInt() {
		t.Fatalf("column %s: %v is no integer", column, h)
	}
	return h.Twice() / 2
}

func TestPublishedHarmonics(t *testing.T) {
	rows, counts := rowsOfKind(t, "Y")
	for _, row := range rows {
		l, m := integer(t, row, "j1"), integer(t, row, "m1")
		want := harmonicFromText(t, row.Text("expr"), m).Mul(constant(row.SignedRoot().Complex(), 1))
		for _, got := range []ylm.Polynomial{
			ylm.Harmonic(l, m, ylm.Ladder), ylm.Harmonic(l, m, ylm.Cartesian), ylm.Solid(l, m, ylm.Ladder).OnSphere(),
		} {
			if !got.Equal(want.OnSphere()) {
				t.Errorf("Y_%d,%d = %v, published %v", l, m, got, want)
			}
		}
	}
	counts.Log(t)
}

func TestPublishedSlaterCondon(t *testing.T) {
	rows, counts := rowsOfKind(t, "ck")
	for _, row := range rows {
		k, l1, m1 := integer(t, row, "k"), integer(t, row, "j1"), integer(t, row, "m1")
		l2, m2 := integer(t, row, "j2"), integer(t, row, "m2")
		want := row.SignedRoot()
		exchanged := want
		if (m1-m2)%2 != 0 {
			exchanged = want.Neg()
		}
		// The head of the table gives the symmetries by which the rest of it follows.
		for _, c := range []struct {
			l1, m1, l2, m2 int
			want           rational.Surd
		}{{l1, m1, l2, m2, want}, {l1, -m1, l2, -m2, want}, {l2, m2, l1, m1, exchanged}} {
			if got := ylm.SlaterCondonC(k, c.l1, c.m1, c.l2, c.m2); !got.Equal(c.want) {
				t.Errorf("c^%d(%d %d, %d %d) = %v, published %v", k, c.l1, c.m1, c.l2, c.m2, got, c.want)
			}
		}
	}
	counts.Log(t)
}

func TestPublishedGaunt(t *testing.T) {
	rows, counts := rowsOfKind(t, "gaunt")
	for _, row := range rows {
		var a [6]int
		for i, column := range []string{"j1", "m1", "j2", "m2", "j3", "m3"} {
			a[i] = integer(t, row, column)
		}
		// The table holds sign*sqrt(num/(den*pi)), Gaunt is in units of 1/sqrt(4 pi).
		want := row.SignedRoot().Mul(rational.Ratio(2, 1))
		if got := ylm.Gaunt(a[0], a[1], a[2], a[3], a[4], a[5]); !got.Equal(want) {
			t.Errorf("Gaunt%v = %v, published %v", a, got, want)
		}
	}
	counts.Log(t)
}

// The head of the table names the program that computed it.
func TestOracleGaunt(t *testing.T) {
	rows := 0
	for _, row := range published.Rows(t, "oracle", "symbols.csv") {
		if row.Text("symbol") != "gaunt" {
			continue
		}
		var a [6]int
		for i := range a {
			a[i] = integer(t, row, fmt.Sprintf("a%d", i+1))
		}
		rows++
		if got, want := ylm.Gaunt(a[0], a[1], a[2], a[3], a[4], a[5]), row.SignedRoot(); !got.Equal(want) {
			t.Errorf("Gaunt%v = %v, want %v", a, got, want)
		}
	}
	if rows != 500 {
		t.Error("the table has 500 rows of the symbol gaunt")
	}
	t.Logf("%d rows", rows)
}

// harmonicFromText returns expr exp(i m phi) as a polynomial, with c = cos(theta), s = sin(theta) in
// expr. s^n exp(i m phi) is (x±iy)^|m| times a power of (x+iy)(x-iy) = s^2.
func harmonicFromText(t *testing.T, expr string, m int) ylm.Polynomial {
	t.Helper()
	p := &trigText{t: t, rest: expr}
	inSAndC := p.sum()
	if p.rest != "" {
		t.Fatalf("%q: cannot read %q", expr, p.rest)
	}
	var terms []ylm.Term
	for term := range inSAndC.Terms() {
		s, c := term.Powers[0], term.Powers[2]
		pairs := s - max(m, -m)
		if pairs < 0 || pairs&1 != 0 {
			t.Fatalf("%q exp(%d i phi) is no polynomial in x, y and z", expr, m)
		}
		term.Powers = [3]int{max(m, 0) + pairs/2, max(-m, 0) + pairs/2, c}
		terms = append(terms, term)
	}
	return ylm.NewPolynomial(ylm.Ladder, terms...)
}

// trigText reads sums and products of c, s and integers, with ** for powers, into a polynomial that
// has s in the place of x and c in that of z.
type trigText struct {
	t    *testing.T
	rest string
}

func (p *trigText) accept(token string) bool {
	rest, ok := strings.CutPrefix(p.rest, token)
	p.rest = rest
	return ok
}

func (p *trigText) sum() ylm.Polynomial {
	total := p.product()
	for {
		switch {
		case p.accept("+"):
			total = total.Add(p.product())
		case p.accept("-"):
			total = total.Sub(p.product())
		default:
			return total
		}
	}
}

func (p *trigText) product() ylm.Polynomial {
	total := p.factor()
	for p.accept("*") {
		total = total.Mul(p.factor())
	}
	return total
}

func (p *trigText) factor() ylm.Polynomial {
	var base ylm.Polynomial
	switch {
	case p.accept("("):
		base = p.sum()
		if !p.accept(")") {
			p.t.Fatalf(") missing at %q", p.rest)
		}
	case p.accept("s"):
		base = powers(ylm.Cartesian, 1, 0, 0)
	case p.accept("c"):
		base = powers(ylm.Cartesian, 0, 0, 1)
	default:
		base = constant(number(int64(p.number()), 1), 0)
	}
	if p.accept("**") {
		return pow(base, p.number())
	}
	return base
}

func (p *trigText) number() int {
	n, digits := 0, 0
	for ; digits < len(p.rest) && p.rest[digits] >= '0' && p.rest[digits] <= '9'; digits++ {
		n = 10*n + int(p.rest[digits]-'0')
	}
	if digits == 0 {
		p.t.Fatalf("number expected at %q", p.rest)
	}
	p.rest = p.rest[digits:]
	return n
}
