package racah_test

import (
	"testing"

	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// The symbols are compared with contractions of 3j symbols over all projections, DLMF (34.4.1) and
// (34.6.1): no formula is shared.

func h(twice int) rational.Half { return rational.Halves(twice) }

func threeJ(a, b, c, x, y, z int) rational.Surd {
	if x > a || -x > a || y > b || -y > b || z > c || -z > c {
		return rational.Surd{}
	}
	return wigner.ThreeJ(h(a), h(b), h(c), h(x), h(y), h(z))
}

func triad(a, b, c int) bool { return wigner.Triad(h(a), h(b), h(c)) == wigner.NonZero }

// sixJs calls do for all allowed symbols with arguments, twice their values, to top.
func sixJs(top int, do func(q [6]int)) {
	k := top + 1
	for n := range k * k * k {
		a, b, c := n%k, n/k%k, n/k/k
		if !triad(a, b, c) {
			continue
		}
		for n := range k * k * k {
			d, e, f := n%k, n/k%k, n/k/k
			if triad(a, e, f) && triad(d, b, f) && triad(d, e, c) {
				do([6]int{a, b, c, d, e, f})
			}
		}
	}
}

func sixJValue(q [6]int) rational.Surd {
	return racah.SixJ(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]))
}

// sixJImages are images of the symbol under generators of its 144 symmetries: two exchanges of
// columns, two columns turned upside down, and one of Regge's, DLMF (34.5.8) and (34.5.9).
func sixJImages(q [6]int) [4][6]int {
	a, b, c, d, e, f := q[0], q[1], q[2], q[3], q[4], q[5]
	return [4][6]int{
		{b, a, c, e, d, f}, {a, c, b, d, f, e}, {a, e, f, d, b, c},
		{a, (b + e + c - f) / 2, (b - e + c + f) / 2, d, (b + e - c + f) / 2, (-b + e + c + f) / 2},
	}
}

func TestSixJSymmetries(t *testing.T) {
	cases := 0
	sixJs(8, func(q [6]int) {
		cases++
		want := sixJValue(q)
		for i, image := range sixJImages(q) {
			if got := sixJValue(image); !got.Equal(want) {
				t.Fatalf("%v (halves): %v, image %d %v: %v", q, want, i, image, got)
			}
		}
	})
	t.Logf("%d symbols", cases)
	if cases < 10000 {
		t.Error("too few")
	}
}

func TestSixJContraction(t *testing.T) {
	cases := 0
	sixJs(8, func(q [6]int) {
		cases++
		a, b, c, d, e, f := q[0], q[1], q[2], q[3], q[4], q[5]
		// By rotational invariance each x = m1 gives the same; one of them, times 2a+1, is the sum.
		var sum rational.Sum
		x := a
		for y := -b; y <= b; y += 2 {
			z := -x - y
			first := threeJ(a, b, c, x, y, z)
			if first.IsZero() {
				continue
			}
			for u := -d; u <= d; u += 2 { // m1', m2', m3' of DLMF
				w := u - y // l1 j2 l3: -m1' + m2 + m3' = 0
				v := w - x // j1 l2 l3: m1 + m2' - m3' = 0
				term := first.Mul(threeJ(a, e, f, x, v, -w)).Mul(threeJ(d, b, f, -u, y, w)).Mul(threeJ(d, e, c, u, -v, z))
				if (d+u+e+v+f+w)/2&1 != 0 {
					term = term.Neg()
				}
				sum = sum.Add(term.Sum())
			}
		}
		if got, want := sixJValue(q), sum.Scale(rational.Ratio(int64(a+1), 1)); !got.Sum().Equal(want) {
			t.Fatalf("%v (halves): %v, contraction %v", q, got, want)
		}
	})
	t.Logf("%d symbols", cases)
	if cases < 10000 {
		t.Error("too few")
	}
}

// nineJs calls do for all allowed symbols with arguments, twice their values, to top.
func nineJs(top int, do func(q [9]int)) {
	var rows [][3]int
	k := top + 1
	for n := range k * k * k {
		if row := [3]int{n / k / k, n / k % k, n % k}; triad(row[0], row[1], row[2]) {
			rows = append(rows, row)
		}
	}
	for _, p := range rows {
		for _, q := range rows {
			for _, r := range rows {
				if triad(p[0], q[0], r[0]) && triad(p[1], q[1], r[1]) && triad(p[2], q[2], r[2]) {
					do([9]int{p[0], p[1], p[2], q[0], q[1], q[2], r[0], r[1], r[2]})
				}
			}
		}
	}
}

func nineJValue(q [9]int) rational.Surd {
	return racah.NineJ(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]), h(q[6]), h(q[7]), h(q[8]))
}

// nineJImages are images under generators of the 72 symmetries: the transposition, then two
// exchanges of rows, which change the sign where the sum of the arguments is odd.
func nineJImages(q [9]int) [3][9]int {
	return [3][9]int{
		{q[0], q[3], q[6], q[1], q[4], q[7], q[2], q[5], q[8]},
		{q[3], q[4], q[5], q[0], q[1], q[2], q[6], q[7], q[8]},
		{q[0], q[1], q[2], q[6], q[7], q[8], q[3], q[4], q[5]},
	}
}

func TestNineJSymmetries(t *testing.T) {
	cases, nonzero := 0, 0
	nineJs(4, func(q [9]int) {
		cases++
		value, total := nineJValue(q), 0
		for _, j := range q {
			total += j
		}
		for i, image := range nineJImages(q) {
			want := value
			if i > 0 && total/2&1 != 0 {
				want = want.Neg()
			}
			if got := nineJValue(image); !got.Equal(want) {
				t.Fatalf("%v (halves): %v, image %d %v: %v", q, value, i, image, got)
			}
		}
		if !value.IsZero() {
			nonzero++
		}
	})
	t.Logf("%d symbols, %d of them not zero", cases, nonzero)
	if nonzero < 5000 {
		t.Error("too few")
	}
}

func TestNineJContraction(t *testing.T) {
	cases := 0
	nineJs(4, func(q [9]int) {
		cases++
		// One projection of the last argument, times 2i+1, is the sum over all of them.
		var sum rational.Sum
		z := q[8]
		for a := -q[0]; a <= q[0]; a += 2 {
			for b := -q[1]; b <= q[1]; b += 2 {
				row1 := threeJ(q[0], q[1], q[2], a, b, -a-b)
				if row1.IsZero() {
					continue
				}
				for d := -q[3]; d <= q[3]; d += 2 {
					column1 := threeJ(q[0], q[3], q[6], a, d, -a-d)
					if column1.IsZero() {
						continue
					}
					row1column1 := row1.Mul(column1)
					for e := -q[4]; e <= q[4]; e += 2 {
						c, f, g, k := -a-b, -d-e, -a-d, -b-e
						if c+f+z != 0 || g+k+z != 0 {
							continue
						}
						term := row1column1.Mul(threeJ(q[3], q[4], q[5], d, e, f)).Mul(threeJ(q[6], q[7], q[8], g, k, z)).
							Mul(threeJ(q[1], q[4], q[7], b, e, k)).Mul(threeJ(q[2], q[5], q[8], c, f, z))
						sum = sum.Add(term.Sum())
					}
				}
			}
		}
		if got, want := nineJValue(q), sum.Scale(rational.Ratio(int64(q[8]+1), 1)); !got.Sum().Equal(want) {
			t.Fatalf("%v (halves): %v, contraction %v", q, got, want)
		}
	})
	t.Logf("%d symbols", cases)
	if cases < 9000 {
		t.Error("too few")
	}
}
