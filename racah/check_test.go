package racah_test

import (
	"context"
	"errors"
	"fmt"
	"math"
	"testing"

	"example.org/couplet/internal/verify"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// wantRule returns the first rule that a triad breaks, by the definition.
func wantRule(triads ...[3]int) wigner.Rule {
	for _, t := range triads {
		if (t[0]+t[1]+t[2])%2 != 0 {
			return wigner.HalfIntegerSum
		}
		if t[0] > t[1]+t[2] || t[1] > t[0]+t[2] || t[2] > t[0]+t[1] {
			return wigner.Triangle
		}
	}
	return wigner.NonZero
}

// All 6j symbols with arguments from -1/2 to 2, allowed or not, and the W coefficients of the same
// arguments: Edmonds (6.2.13) joins the two.
func TestCheckSixJAndW(t *testing.T) {
	counts := map[wigner.Rule]int{}
	for n := range 6 * 6 * 6 * 6 * 6 * 6 {
		var q [6]int
		bad := false
		for i := range q {
			q[i] = n%6 - 1
			n /= 6
			bad = bad || q[i] < 0
		}
		a, b, c, d, e, f := h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5])
		var value, w rational.Surd
		panic6j := verify.Recovered(func() { value = racah.SixJ(a, b, c, d, e, f) })
		panicW := verify.Recovered(func() { w = racah.W(a, b, e, d, c, f) })
		verdict, err := racah.CheckSixJ(a, b, c, d, e, f)
		verdictW, errW := racah.CheckW(a, b, e, d, c, f)
		if bad != (panic6j != nil) || bad != (panicW != nil) || bad != (err != nil) || bad != (errW != nil) {
			t.Fatalf("%v (halves): panics %v, %v, errors %v, %v", q, panic6j, panicW, err, errW)
		}
		if bad {
			continue
		}
		want := wantRule([3]int{q[0], q[1], q[2]}, [3]int{q[0], q[4], q[5]}, [3]int{q[3], q[1], q[5]}, [3]int{q[3], q[4], q[2]})
		if want == wigner.NonZero && value.IsZero() {
			want = wigner.Accidental
		}
		if verdict.Rule != want || verdictW.Rule != want || verdict.Zero() != value.IsZero() {
			t.Fatalf("%v (halves): value %v, verdicts %v, %v, want %v", q, value, verdict, verdictW, want)
		}
		if (q[0]+q[1]+q[4]+q[3])/2%2 != 0 && !value.IsZero() {
			w = w.Neg()
		}
		if !w.Equal(value) {
			t.Fatalf("%v (halves): 6j %v, W with its phase %v", q, value, w)
		}
		counts[want]++
	}
	t.Log(counts)
	if counts[wigner.NonZero] < 500 || counts[wigner.Accidental] == 0 {
		t.Errorf("the domain misses a kind: %v", counts)
	}
}

func TestCheckNineJ(t *testing.T) {
	counts := map[wigner.Rule]int{}
	nineJs(4, func(q [9]int) {
		verdict, err := racah.CheckNineJ(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]), h(q[6]), h(q[7]), h(q[8]))
		if err != nil || verdict.Zero() != nineJValue(q).IsZero() {
			t.Fatalf("%v (halves): %v, %v, value %v", q, verdict, err, nineJValue(q))
		}
		counts[verdict.Rule]++
	})
	t.Log(counts)
	if counts[wigner.NonZero] == 0 || counts[wigner.Symmetry] == 0 || counts[wigner.Accidental] == 0 {
		t.Errorf("the domain misses a kind: %v", counts)
	}
}

func TestVerdictsAndPanics(t *testing.T) {
	i := rational.Int
	v, err := racah.CheckSixJ(i(1), i(1), i(3), i(1), i(1), i(1))
	if err != nil || v.String() != "zero: triangle rule broken (j1 j2 j3)" {
		t.Errorf("%v, %v", v, err)
	}
	v, err = racah.CheckW(i(1), i(1), i(1), i(1), i(1), h(1))
	if err != nil || v.String() != "zero: the sum of a triad is half-integral (a c f)" {
		t.Errorf("%v, %v", v, err)
	}
	v, err = racah.CheckNineJ(i(1), i(1), i(1), i(1), i(1), i(1), i(1), i(1), i(3))
	if err != nil || v.String() != "zero: triangle rule broken (g h i)" {
		t.Errorf("%v, %v", v, err)
	}
	// Two equal rows, and an odd sum.
	v, err = racah.CheckNineJ(i(1), i(1), i(1), i(1), i(1), i(1), i(1), i(1), i(1))
	if err != nil || v.Rule != wigner.Symmetry {
		t.Errorf("%v, %v", v, err)
	}
	// Of two broken triads the first counts, rows before columns.
	v, err = racah.CheckNineJ(i(1), i(1), i(1), i(1), i(1), i(1), i(1), i(5), i(9))
	if err != nil || v.Args != "g h i" {
		t.Errorf("%v, %v", v, err)
	}
	v, err = racah.CheckNineJ(i(1), i(1), i(1), i(1), i(1), i(1), i(4), i(4), i(4))
	if err != nil || v.Args != "a d g" {
		t.Errorf("%v, %v", v, err)
	}
	for want, f := range map[string]func(){
		"racah.SixJ: l2 = -1; allowed: an integer or half-integer >= 0": func() { racah.SixJ(i(1), i(1), i(1), i(1), i(-1), i(1)) },
		"racah.W: c = -1/2; allowed: an integer or half-integer >= 0":   func() { racah.W(i(1), i(1), h(-1), i(1), i(1), i(1)) },
		"racah.NineJ: h = -1; allowed: an integer or half-integer >= 0": func() { racah.NineJ(i(1), i(1), i(1), i(1), i(1), i(1), i(1), i(-1), i(1)) },
		"racah.CheckNineJ: a = -1; allowed: an integer or half-integer >= 0": func() {
			_, err := racah.CheckNineJ(i(-1), i(1), i(1), i(1), i(1), i(1), i(1), i(1), i(1))
			var e *rational.ArgumentError
			errors.As(err, &e)
			panic(e)
		},
	} {
		if e := verify.Recovered(f); e == nil || e.Error() != want {
			t.Errorf("panic %v, want %s", e, want)
		}
	}
}

func ExampleSixJ() {
	i := rational.Int
	fmt.Println(racah.SixJ(i(2), i(2), i(1), rational.Halves(1), rational.Halves(1), rational.Halves(3)))
	fmt.Println(racah.CheckSixJ(i(2), i(2), i(2), rational.Halves(3), rational.Halves(3), rational.Halves(3)))
	// Output:
	// -1/10*sqrt(5)
	// accidental zero: no rule forbids it <nil>
}

func ExampleNineJ() {
	// How much of the LS-coupled state 3P1 of an s and a p electron is (1/2, 3/2) in jj coupling? The
	// coefficient is a 9j symbol times sqrt((2S+1)(2L+1)(2j1+1)(2j2+1)).
	i, half := rational.Int, rational.Halves(1)
	nine := racah.NineJ(half, half, i(1), i(0), i(1), i(1), half, rational.Halves(3), i(1))
	coefficient := nine.Mul(rational.Root(3*3*2*4, 1))
	fmt.Println(coefficient, coefficient.Square())
	// Output: 1/3*sqrt(3) 1/3
}

// Whatever the arguments, a malformed one panics with an *ArgumentError, all others give a value within
// the bound of the orthogonality relation, DLMF (34.5.14), that the checker and an image under Regge's
// symmetry, DLMF (34.5.9), agree with.
func FuzzSixJ(f *testing.F) {
	f.Add(4, 4, 4, 3, 3, 3)
	f.Add(2, 2, 2, 2, 2, 2)
	f.Add(-1, 2, 2, 2, 2, 2)
	f.Add(100, 90, 80, 100, 90, 80)
	f.Fuzz(func(t *testing.T, a, b, c, d, e, f int) {
		if max(a, b, c, d, e, f) > 300 || min(a, b, c, d, e, f) < -300 {
			t.Skip()
		}
		q := [6]int{a, b, c, d, e, f}
		var value rational.Surd
		bad := verify.Recovered(func() { value = sixJValue(q) })
		verdict, err := racah.CheckSixJ(h(a), h(b), h(c), h(d), h(e), h(f))
		if (bad != nil) != (err != nil) || bad == nil && verdict.Zero() != value.IsZero() {
			t.Fatalf("%v (halves): %v, panic %v, error %v, verdict %v", q, value, bad, err, verdict)
		}
		if bad != nil {
			return
		}
		if got := racah.SixJFloat(h(a), h(b), h(c), h(d), h(e), h(f)); math.Float64bits(got) != math.Float64bits(value.Float64()) {
			t.Fatalf("%v (halves): %v, float %g, rounded %g", q, value, got, value.Float64())
		}
		if verdict.Zero() && verdict.Rule != wigner.Accidental {
			return
		}
		for _, image := range sixJImages(q) {
			if got := sixJValue(image); !got.Equal(value) {
				t.Fatalf("%v (halves): %v, image %v: %v", q, value, image, got)
			}
		}
		for i := range 3 {
			if value.Abs().Cmp(rational.Root(1, int64(q[i]+1)*int64(q[i+3]+1))) > 0 {
				t.Fatalf("%v (halves): %v is too large", q, value)
			}
		}
	})
}

// Negative arguments so large that sums of them leave 32 bits are refused on every platform.
func TestHugeNegative(t *testing.T) {
	huge := -(1<<31 - 1)
	table, err := racah.NewSixJTable(context.Background(), h(4), nil)
	if err != nil {
		t.Fatal(err)
	}
	for _, q := range [][6]int{{0, huge, huge, 0, huge, huge}, {-1 << 30, 16, -1 << 30, -1 << 30, 2, -1 << 30}, {huge, huge, huge, huge, huge, huge}} {
		for name, f := range map[string]func(a, b, c, d, e, f rational.Half) float64{
			"SixJFloat": racah.SixJFloat, "WFloat": racah.WFloat, "SixJTable.At": table.At,
		} {
			if e := verify.Recovered(func() { f(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5])) }); e == nil {
				t.Errorf("%s %v does not panic", name, q)
			}
		}
	}
}
