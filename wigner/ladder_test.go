package wigner_test

import (
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

var one = rational.Int(1)

// raise returns sqrt((j-m)(j+m+1)), and lower sqrt((j+m)(j-m+1)).
func raise(j, m rational.Half) rational.Surd {
	up, down := j.Sub(m).Twice()/2, j.Add(m).Twice()/2
	return rational.Root(int64(up)*int64(down+1), 1)
}

func lower(j, m rational.Half) rational.Surd { return raise(j, m.Neg()) }

// stretched returns the amplitudes of |j j> in the product states |m1, j-m1>: J+ annihilates it, which
// fixes the ratio of neighbors, and the first amplitude, that of m1 = j1, is positive.
func stretched(j1, j2, j rational.Half) map[rational.Half]rational.Sum {
	c := rational.Ratio(1, 1)
	amplitudes := map[rational.Half]rational.Sum{}
	norm := rational.Sum{}
	for m1 := j1; m1.Cmp(j1.Neg()) >= 0; m1 = m1.Sub(one) {
		m2 := j.Sub(m1)
		if m2.Cmp(j2) > 0 {
			break
		}
		if m1 != j1 {
			c = c.Mul(raise(j2, m2.Sub(one))).Quo(raise(j1, m1)).Neg()
		}
		amplitudes[m1] = c.Sum()
		norm = norm.Add(c.Mul(c).Sum())
	}
	n, _ := norm.Surd()
	r, _ := n.Rat()
	root, err := rational.NewSurd(r.SetInt64(1), n.Coeff())
	if err != nil {
		panic(err)
	}
	for m1, a := range amplitudes {
		amplitudes[m1] = a.Quo(root)
	}
	return amplitudes
}

// lowered applies J- to the amplitudes of |j m> and normalizes.
func lowered(j1, j2, j, m rational.Half, state map[rational.Half]rational.Sum) map[rational.Half]rational.Sum {
	next := map[rational.Half]rational.Sum{}
	for m1, a := range state {
		m2 := m.Sub(m1)
		if down := m1.Sub(one); down.Cmp(j1.Neg()) >= 0 {
			next[down] = next[down].Add(a.Scale(lower(j1, m1)))
		}
		if m2.Cmp(j2.Neg()) > 0 {
			next[m1] = next[m1].Add(a.Scale(lower(j2, m2)))
		}
	}
	for m1, a := range next {
		next[m1] = a.Quo(lower(j, m))
	}
	return next
}

// Every coefficient with 2j1, 2j2 to 14 from ladder operators alone: no closed formula, no sum.
func TestLadderRoute(t *testing.T) {
	const top = 14
	cases, nonzero := 0, 0
	for a := range top + 1 {
		for b := range top + 1 {
			j1, j2 := rational.Halves(a), rational.Halves(b)
			for j := range wigner.Resultants(j1, j2) {
				state := stretched(j1, j2, j)
				for m := j; ; m = m.Sub(one) {
					for m1 := range wigner.Projections(j1) {
						m2 := m.Sub(m1)
						if m2.Abs().Cmp(j2) > 0 {
							continue
						}
						cases++
						want := state[m1]
						got := wigner.ClebschGordan(j1, m1, j2, m2, j, m)
						if !got.Sum().Equal(want) {
							t.Fatalf("(%v %v %v %v | %v %v) = %v, by ladder operators %v", j1, m1, j2, m2, j, m, got, want)
						}
						// DLMF (34.1.1) solved for the 3j symbol
						three := want.Quo(rational.Root(int64(j.Twice()+1), 1))
						if (j1.Sub(j2).Twice()+m.Twice())/2&1 != 0 {
							three = three.Neg()
						}
						if got := wigner.ThreeJ(j1, j2, j, m1, m2, m.Neg()); !got.Sum().Equal(three) {
							t.Fatalf("3j(%v %v %v; %v %v %v) = %v, by ladder operators %v", j1, j2, j, m1, m2, m.Neg(), got, three)
						}
						if !want.IsZero() {
							nonzero++
						}
					}
					if m == j.Neg() {
						break
					}
					state = lowered(j1, j2, j, m, state)
				}
			}
		}
	}
	t.Logf("%d coefficients, %d of them not zero", cases, nonzero)
	if cases < 50000 || nonzero < cases*9/10 {
		t.Errorf("only %d cases, %d not zero", cases, nonzero)
	}
}
