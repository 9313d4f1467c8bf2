package lines_test

import (
	"testing"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// momenta yields 0, 1/2 ... last/2.
func momenta(last int) func(func(rational.Half) bool) {
	return func(yield func(rational.Half) bool) {
		for n := 0; n <= last; n++ {
			if !yield(rational.Halves(n)) {
				return
			}
		}
	}
}

// steps yields from, from+1 ... up to last/2, for the momenta that differ from one by an integer.
func steps(from rational.Half, last int) func(func(rational.Half) bool) {
	return func(yield func(rational.Half) bool) {
		for n := from.Twice() & 1; n <= last; n += 2 {
			if !yield(rational.Halves(n)) {
				return
			}
		}
	}
}

// product names a state of uncoupled projections; the first momentum's stands apart.
type product struct {
	first rational.Half
	rest  string // projections of the spectators
}

// coupled returns |((j s1)x1 s2)x2 m> by Clebsch-Gordan coefficients, as amplitudes of products.
func coupled(j rational.Half, spectators, totals []rational.Half, m rational.Half) map[product]rational.Sum {
	last := len(spectators) - 1
	if last < 0 {
		return map[product]rational.Sum{{first: m}: rational.Ratio(1, 1).Sum()}
	}
	z := make(map[product]rational.Sum)
	inner := j
	if last > 0 {
		inner = totals[last-1]
	}
	for ms := range wigner.Projections(spectators[last]) {
		mi := m.Sub(ms)
		if mi.Abs().Cmp(inner) > 0 {
			continue
		}
		c := wigner.ClebschGordan(inner, mi, spectators[last], ms, totals[last], m)
		for p, amplitude := range coupled(j, spectators[:last], totals[:last], mi) {
			p.rest += ms.String() + " "
			z[p] = z[p].Add(amplitude.Scale(c))
		}
	}
	return z
}

// direct returns the squared reduced element between two states of a chain without any 6j symbol:
// the sum of |<x m|T_q|x' m'>|^2 over all m, q and m', Edmonds (5.4.7), with <j||T||j'> = 1 for
// the first momentum, on which the operator acts by the Wigner-Eckart theorem, Edmonds (5.4.1).
func direct(k, j, jp rational.Half, spectators, totals, totalsPrime []rational.Half) rational.Sum {
	x, xp := totals[len(totals)-1], totalsPrime[len(totals)-1]
	var sum rational.Sum
	for mp := range wigner.Projections(xp) {
		right := coupled(jp, spectators, totalsPrime, mp)
		for q := range wigner.Projections(k) {
			m := mp.Add(q)
			if m.Abs().Cmp(x) > 0 {
				continue
			}
			left := coupled(j, spectators, totals, m)
			var element rational.Sum
			for p, amplitude := range right {
				bra := product{p.first.Add(q), p.rest}
				other, ok := left[bra]
				if !ok {
					continue
				}
				t := wigner.ThreeJ(j, k, jp, bra.first.Neg(), q, p.first)
				if j.Sub(bra.first).Twice()/2&1 != 0 {
					t = t.Neg()
				}
				element = element.Add(other.Mul(amplitude).Scale(t))
			}
			sum = sum.Add(element.Mul(element))
		}
	}
	return sum
}

// All steps (j s)x to (j' s)x' with j, j' <= 5/2 and s <= 2, for the ranks 0 to 3, against the
// contraction of Clebsch-Gordan coefficients.
func TestRelativeStrengthDirect(t *testing.T) {
	zero, nonzero := 0, 0
	for k := range 4 {
		rank := rational.Int(k)
		for j := range momenta(5) {
			for jp := range steps(j, 5) {
				if wigner.Triad(j, rank, jp) != wigner.NonZero {
					continue
				}
				for s := range momenta(4) {
					for x := range wigner.Resultants(j, s) {
						for xp := range wigner.Resultants(jp, s) {
							got := lines.RelativeStrength(k, j, jp, s, x, xp)
							want := direct(rank, j, jp, []rational.Half{s}, []rational.Half{x}, []rational.Half{xp})
							if !got.Sum().Equal(want) {
								t.Errorf("rank %d, (%v %v)%v to (%v %v)%v: %v, directly %v", k, j, s, x, jp, s, xp, got, want)
							}
							if got.IsZero() {
								zero++
							} else {
								nonzero++
							}
						}
					}
				}
			}
		}
	}
	if nonzero != 1134 || zero != 449 {
		t.Errorf("%d strengths and %d zeros: the domain has 1134 and 449", nonzero, zero)
	}
}

// Patterns of chains with two spectators against the same contraction, every pair of states, with
// those that the pattern leaves out.
func TestBetweenDirect(t *testing.T) {
	c := parseCoupling(t, "((J I1)F1 I2)F")
	checked := 0
	for j := range momenta(2) {
		for jp := range steps(j, 3) {
			for i1 := range momenta(3) {
				for i2 := range momenta(2) {
					lower := mustLevel(t, c, map[string]rational.Half{"J": j, "I1": i1, "I2": i2})
					upper := mustLevel(t, c, map[string]rational.Half{"J": jp, "I1": i1, "I2": i2})
					type pair struct{ a, b lines.State }
					got := make(map[pair]rational.Surd)
					for _, comp := range between(t, lower, upper) {
						got[pair{comp.Initial, comp.Final}] = comp.Strength
					}
					for a := range lower.States() {
						for b := range upper.States() {
							want := direct(rational.Int(1), j, jp, []rational.Half{i1, i2}, chainTotals(a), chainTotals(b))
							if g := got[pair{a, b}]; !g.Sum().Equal(want) {
								t.Errorf("%v to %v: %v, directly %v", a, b, g, want)
							}
							checked++
						}
					}
				}
			}
		}
	}
	if checked != 845 {
		t.Errorf("%d pairs: the domain has 845", checked)
	}
}

func chainTotals(s lines.State) []rational.Half {
	return []rational.Half{s.Number("F1"), s.Number("F")}
}

// sumsHold compares the sums of a complete pattern with their closed forms: (2f+1)/(2j+1) from each
// initial state, (2f'+1)/(2j'+1) into each final one, the product of (2s+1) altogether.
func sumsHold(t *testing.T, p lines.Pattern, lower, upper lines.Level, spectators ...rational.Half) {
	t.Helper()
	first := lower.Coupling().Names()[0]
	rows, columns := make(map[lines.State]rational.Sum), make(map[lines.State]rational.Sum)
	for _, c := range p {
		rows[c.Initial] = rows[c.Initial].Add(c.Strength.Sum())
		columns[c.Final] = columns[c.Final].Add(c.Strength.Sum())
		if c.Strength.Sign() <= 0 {
			t.Errorf("%v to %v: strength %v, want it positive", c.Initial, c.Final, c.Strength)
		}
	}
	check := func(sums map[lines.State]rational.Sum, l lines.Level) {
		for s := range l.States() {
			want := rational.Ratio(int64(s.Degeneracy()), int64(s.Number(first).Twice())+1)
			if got := sums[s]; !got.Equal(want.Sum()) {
				t.Errorf("sum over the components of %v is %v, want %v", s, got, want)
			}
		}
	}
	check(rows, lower)
	check(columns, upper)
	want := int64(1)
	for _, s := range spectators {
		want *= int64(s.Twice()) + 1
	}
	if got := p.Total(); !got.Equal(rational.Ratio(want, 1)) {
		t.Errorf("total %v, want %d", got, want)
	}
	var one rational.Sum
	for _, s := range p.Shares() {
		one = one.Add(s.Sum())
	}
	if !one.Equal(rational.Ratio(1, 1).Sum()) {
		t.Errorf("shares add up to %v", one)
	}
}

// Closed forms: orthogonality of the 6j symbols, Edmonds (6.2.9), for all chains with one spectator,
// first momenta up to 4 and spectators up to 7/2, and for chains with two up to 2 and 3/2.
func TestSums(t *testing.T) {
	one, two := parseCoupling(t, "(L S)J"), parseCoupling(t, "((N S)J I)F")
	patterns := 0
	for l := range momenta(8) {
		for lp := range steps(l, 8) {
			if wigner.Triad(l, rational.Int(1), lp) != wigner.NonZero {
				continue
			}
			for s := range momenta(7) {
				lower := mustLevel(t, one, map[string]rational.Half{"L": l, "S": s})
				upper := mustLevel(t, one, map[string]rational.Half{"L": lp, "S": s})
				sumsHold(t, between(t, lower, upper), lower, upper, s)
				patterns++
				for i := range momenta(3) {
					if l.Twice() > 4 || lp.Twice() > 4 || s.Twice() > 3 {
						continue
					}
					lower := mustLevel(t, two, map[string]rational.Half{"N": l, "S": s, "I": i})
					upper := mustLevel(t, two, map[string]rational.Half{"N": lp, "S": s, "I": i})
					sumsHold(t, between(t, lower, upper), lower, upper, s, i)
					patterns++
				}
			}
		}
	}
	if patterns != 336 {
		t.Errorf("%d patterns: the domain has 336", patterns)
	}
}

// Strengths do not depend on which level is the initial one; positions change sign.
func TestSymmetry(t *testing.T) {
	c := parseCoupling(t, "((N S)J I)F")
	half, one := rational.Halves(1), rational.Int(1)
	a := mustLevel(t, c, map[string]rational.Half{"N": one, "S": half, "I": one}, lines.Rotation{B: 5, D: 0.25})
	b := mustLevel(t, c, map[string]rational.Half{"N": rational.Int(2), "S": half, "I": one}, lines.Offset(7))
	type pair struct{ a, b lines.State }
	back := make(map[pair]lines.Component)
	for _, comp := range between(t, b, a) {
		back[pair{comp.Final, comp.Initial}] = comp
	}
	there := between(t, a, b)
	if len(there) != len(back) || len(there) == 0 {
		t.Fatalf("%d components there, %d back", len(there), len(back))
	}
	for _, comp := range there {
		other := back[pair{comp.Initial, comp.Final}]
		if !other.Strength.Equal(comp.Strength) || other.Position != -comp.Position {
			t.Errorf("%v to %v: %v at %v, back %v at %v", comp.Initial, comp.Final, comp.Strength, comp.Position, other.Strength, other.Position)
		}
		if want := 7 - (5*2 - 0.25*4); comp.Position != want {
			t.Errorf("position %v, want %v", comp.Position, want)
		}
	}
}

// What no dipole joins has no components; a chain without spectators has one.
func TestNothingAllowed(t *testing.T) {
	half, one, two := rational.Halves(1), rational.Int(1), rational.Int(2)
	zero := rational.Half{}
	ls, bare := parseCoupling(t, "(L S)J"), parseCoupling(t, "J")
	level := func(l, s rational.Half) lines.Level {
		return mustLevel(t, ls, map[string]rational.Half{"L": l, "S": s})
	}
	for _, test := range []struct {
		why  string
		a, b lines.Level
		want int
	}{
		{"L = 0 to 0", level(zero, half), level(zero, half), 0},
		{"L = 0 to 2", level(zero, half), level(two, half), 0},
		{"L differs by half an integer", level(half, half), level(one, half), 0},
		{"S differs", level(one, one), level(two, zero), 0},
		{"J = 0 to 0 fixed", mustLevel(t, ls, map[string]rational.Half{"L": one, "S": one, "J": zero}),
			mustLevel(t, ls, map[string]rational.Half{"L": one, "S": one, "J": zero}), 0},
		{"zero levels", lines.Level{}, lines.Level{}, 0},
		{"J = 0 to 1, no spectator", mustLevel(t, bare, map[string]rational.Half{"J": zero}),
			mustLevel(t, bare, map[string]rational.Half{"J": one}), 1},
		{"J = 0 to 0, no spectator", mustLevel(t, bare, map[string]rational.Half{"J": zero}),
			mustLevel(t, bare, map[string]rational.Half{"J": zero}), 0},
	} {
		p := between(t, test.a, test.b)
		if len(p) != test.want || test.want == 0 && (p.Shares() != nil || !p.Total().IsZero()) {
			t.Errorf("%s: %v", test.why, p)
		}
	}
	if got := len(lines.Multiplet(one, one, one)); got != 6 { // 3P-3P without J = 0 to 0
		t.Errorf("3P-3P has %d components, want 6", got)
	}
}
