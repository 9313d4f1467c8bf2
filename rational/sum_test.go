package rational_test

import (
	"fmt"
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"example.org/couplet/rational"
)

func parseSum(t testing.TB, text string) rational.Sum {
	t.Helper()
	s, err := rational.ParseSum(text)
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// sums returns random sums of up to four small surds, 0 among them.
func sums(n int) []rational.Sum {
	r := rand.New(rand.NewPCG(3, 3))
	list := []rational.Sum{{}}
	for len(list) < n {
		var s rational.Sum
		for range r.IntN(5) {
			s = s.Add(rational.Ratio(r.Int64N(21)-10, 1+r.Int64N(6)).Mul(rational.Root(1+r.Int64N(30), 1)).Sum())
		}
		list = append(list, s)
	}
	return list
}

// value is s at 400 bits by big.Float's own square roots.
func value(s rational.Sum) *big.Float {
	z := new(big.Float).SetPrec(400)
	for _, t := range s.Terms() {
		z.Add(z, new(big.Float).SetPrec(400).Set(wantFloat(t)))
	}
	return z
}

func close400(t *testing.T, what string, got rational.Sum, want *big.Float) {
	t.Helper()
	diff := new(big.Float).Sub(value(got), want)
	if diff.Sign() != 0 && diff.MantExp(nil) > -300 {
		t.Errorf("%s = %v, off by %g", what, got, diff)
	}
}

func TestSumArithmetic(t *testing.T) {
	list := sums(60)
	for _, a := range list {
		if !a.Sub(a).IsZero() || !a.Neg().Neg().Equal(a) || a.Sign() != value(a).Sign() {
			t.Errorf("%v: a-a = %v, sign %d", a, a.Sub(a), a.Sign())
		}
		if len(a.Terms()) > 1 != func() bool { _, ok := a.Surd(); return !ok }() {
			t.Errorf("%v: Surd() and Terms() disagree", a)
		}
		for _, b := range list {
			x, y := value(a), value(b)
			f := func() *big.Float { return new(big.Float).SetPrec(400) }
			close400(t, fmt.Sprintf("(%v) + (%v)", a, b), a.Add(b), f().Add(x, y))
			close400(t, fmt.Sprintf("(%v) - (%v)", a, b), a.Sub(b), f().Sub(x, y))
			close400(t, fmt.Sprintf("(%v) * (%v)", a, b), a.Mul(b), f().Mul(x, y))
			if !a.Add(b).Equal(b.Add(a)) || !a.Add(b).Sub(b).Equal(a) || !a.Mul(b).Equal(b.Mul(a)) {
				t.Errorf("%v and %v: sums do not come back", a, b)
			}
			if a.Cmp(b) != x.Cmp(y) || (a.Cmp(b) == 0) != a.Equal(b) || a.Equal(b) != (a.Key() == b.Key()) {
				t.Errorf("(%v).Cmp(%v) = %d", a, b, a.Cmp(b))
			}
			if !b.IsZero() && !a.QuoSum(b).Mul(b).Equal(a) {
				t.Errorf("(%v)/(%v) = %v", a, b, a.QuoSum(b))
			}
		}
	}
	q := rational.Root(2, 7)
	if got := list[5].Quo(q).Scale(q); !got.Equal(list[5]) {
		t.Errorf("%v / %v * %v = %v", list[5], q, q, got)
	}
	mustPanic(t, "rational.Sum.Quo: t = 0; allowed: anything but zero", func() { list[1].Quo(rational.Surd{}) })
	mustPanic(t, "rational.Sum.QuoSum: t = 0; allowed: anything but zero", func() { list[1].QuoSum(rational.Sum{}) })
	mustPanic(t, "rational.Sum.Float: prec = 0; allowed: from 1 to 16777216", func() { list[1].Float(0) })
}

// Numbers that float arithmetic takes for zero.
func TestSumSign(t *testing.T) {
	// p - q sqrt(2) for the solutions of Pell's equation p^2 - 2 q^2 = ±1: as small as 1/p, with
	// alternating sign.
	p, q := big.NewInt(1), big.NewInt(1)
	for n := range 400 {
		s := rational.FromRat(new(big.Rat).SetInt(p)).Sub(rational.FromRat(new(big.Rat).SetInt(q)).Mul(rational.Root(2, 1)))
		want := 1 - 2*((n+1)%2) // 1 - sqrt(2) is negative
		if s.Sign() != want {
			t.Fatalf("sign of %v is %d, want %d", s, s.Sign(), want)
		}
		f, _ := value(s).Float64()
		if p.BitLen() < 100 && s.Float64() != f {
			t.Errorf("%v = %g, want %g", s, s.Float64(), f)
		}
		p, q = new(big.Int).Add(p, new(big.Int).Lsh(q, 1)), new(big.Int).Add(p, q)
	}
	// (sqrt(2)+sqrt(3))^2 = 5 + 2 sqrt(6), exactly.
	root := parseSum(t, "sqrt(2)+sqrt(3)")
	if d := root.Mul(root).Sub(parseSum(t, "5+2*sqrt(6)")); !d.IsZero() || d.Sign() != 0 {
		t.Errorf("identity leaves %v", d)
	}
}

func TestSumFloat64(t *testing.T) {
	scale := func(e int) rational.Surd {
		var f rational.Factored
		f.MulInt(2, 2*e)
		return f.SqrtTimes(1)
	}
	for _, c := range []struct {
		s    rational.Sum
		want float64
	}{
		{parseSum(t, "sqrt(2)-sqrt(3)"), math.Sqrt2 - math.Sqrt(3)},
		{parseSum(t, "sqrt(2)+sqrt(3)").Scale(scale(2000)), math.Inf(1)},
		{parseSum(t, "sqrt(2)-sqrt(3)").Scale(scale(2000)), math.Inf(-1)},
		{parseSum(t, "sqrt(2)+sqrt(3)").Scale(scale(-2000)), 0},
		{parseSum(t, "sqrt(2)+1").Scale(scale(-1075)), 0x1p-1074}, // 1.2 steps of the smallest
		{parseSum(t, "sqrt(2)+9007199254740993").Add(parseSum(t, "-sqrt(3)")), 9007199254740992},
		{parseSum(t, "sqrt(3)+9007199254740993").Add(parseSum(t, "-sqrt(2)")), 9007199254740994},
	} {
		if got := c.s.Float64(); got != c.want {
			if want, _ := value(c.s).Float64(); got != want {
				t.Errorf("%v = %g, want %g", c.s, got, c.want)
			}
		}
	}
	if got := parseSum(t, "sqrt(2)-sqrt(3)").Scale(scale(-2000)).Float64(); got != 0 || !math.Signbit(got) {
		t.Errorf("negative underflow gives %g, want -0", got)
	}
	for _, s := range sums(300) {
		for _, prec := range []uint{5, 53, 100} {
			if got, want := s.Float(prec), new(big.Float).SetPrec(prec).Set(value(s)); got.Cmp(want) != 0 {
				t.Errorf("(%v).Float(%d) = %g, want %g", s, prec, got, want)
			}
		}
		if want, _ := value(s).Float64(); s.Float64() != want {
			t.Errorf("%v = %g, want %g", s, s.Float64(), want)
		}
	}
}

// sqrt(r) and a rational number that brings it to within 2^-64 of a tie of 54 bits, above or below.
func TestSumFloat64BesideTies(t *testing.T) {
	cases := 0
	for r := int64(2); r < 200; r++ {
		root := rational.Root(r, 1)
		if _, ok := root.Rat(); ok {
			continue
		}
		v, _ := root.Float(64).Rat(nil)
		for k := range int64(4) {
			tie := big.NewRat(1<<53+2*k+1, 1<<40)
			s := rational.FromRat(tie.Sub(tie, v)).Add(root)
			want := math.Ldexp(float64(1<<53+2*k), -40)
			if root.Cmp(rational.FromRat(v)) > 0 {
				want = math.Ldexp(float64(1<<53+2*k+2), -40)
			}
			cases++
			if got := s.Float64(); got != want {
				t.Errorf("%v = %v, want %v", s, got, want)
			}
			if got := s.Neg().Float64(); got != -want {
				t.Errorf("%v = %v, want %v", s.Neg(), got, -want)
			}
		}
	}
	if cases < 700 {
		t.Errorf("only %d cases", cases)
	}
}

// p - q sqrt(2) for solutions of Pell's equation, far below the subnormal numbers, keeps its sign.
func TestSumFloat64Vanishing(t *testing.T) {
	var tiny rational.Factored
	tiny.MulInt(2, -3000)
	p, q := big.NewInt(1), big.NewInt(1)
	for range 120 {
		s := rational.FromRat(new(big.Rat).SetInt(p)).Sub(rational.FromRat(new(big.Rat).SetInt(q)).Mul(rational.Root(2, 1))).Scale(tiny.SqrtTimes(1))
		if f := s.Float64(); f != 0 || math.Signbit(f) != (s.Sign() < 0) {
			t.Errorf("%v = %v", s, f)
		}
		p, q = new(big.Int).Add(p, new(big.Int).Lsh(q, 1)), new(big.Int).Add(p, q)
	}
}

// Random sums in another order of the terms, whose partial sums may vanish, leave words and come back.
func TestSumOfOrder(t *testing.T) {
	r := rand.New(rand.NewPCG(22, 22))
	for range 2000 {
		terms := make([]rational.Surd, 1+r.IntN(8))
		var one rational.Sum
		for i := range terms {
			terms[i] = rational.Ratio(r.Int64()>>r.IntN(63), 1+r.Int64()>>r.IntN(62)).Mul(rational.Root(1+r.Int64N(4), 1))
			one = one.Add(terms[i].Sum())
		}
		terms = append(terms, terms[0].Neg())
		one = one.Sub(terms[0].Sum())
		r.Shuffle(len(terms), func(i, j int) { terms[i], terms[j] = terms[j], terms[i] })
		if got := rational.SumOf(terms...); !got.Equal(one) {
			t.Fatalf("%v, term by term %v", got, one)
		}
	}
}

// A tie of 54 bits, and a sum beside it by p - q sqrt(2), which is as small as 1/(2p) for the solutions of
// Pell's equation: the first intervals hold the tie.
func TestSumFloat64NearTies(t *testing.T) {
	p, q := big.NewInt(1), big.NewInt(1)
	for n := range 200 {
		if n > 2 {
			beside := rational.FromRat(new(big.Rat).SetInt(p)).Sub(rational.FromRat(new(big.Rat).SetInt(q)).Mul(rational.Root(2, 1)))
			s := rational.Ratio(1<<53+1, 1).Sum().Add(beside)
			want := float64(1 << 53)
			if n%2 == 1 { // p > q sqrt(2)
				want += 2
			}
			if got := s.Float64(); got != want {
				t.Errorf("p of %d bits: %.0f, want %.0f", p.BitLen(), got, want)
			}
			if got, _ := s.Float(53).Float64(); got != want {
				t.Errorf("p of %d bits: Float(53) gives %.0f, want %.0f", p.BitLen(), got, want)
			}
		}
		p, q = new(big.Int).Add(p, new(big.Int).Lsh(q, 1)), new(big.Int).Add(p, q)
	}
}

func TestComplexArithmetic(t *testing.T) {
	parts := sums(8)
	var list []rational.Complex
	for i, re := range parts {
		list = append(list, rational.Complex{Re: re, Im: parts[(5*i+3)%len(parts)]}, rational.Complex{Im: re})
	}
	one := rational.Ratio(1, 1).Complex()
	for _, a := range list {
		if !a.Add(a.Neg()).IsZero() || !a.Conj().Conj().Equal(a) || !a.Mul(a.Conj()).Equal(rational.Complex{Re: a.AbsSquared()}) {
			t.Errorf("%v: negative, conjugate or square", a)
		}
		if a.IsReal() != a.Equal(a.Conj()) {
			t.Errorf("%v: IsReal %v", a, a.IsReal())
		}
		if z := a.Complex128(); real(z) != a.Re.Float64() || imag(z) != a.Im.Float64() {
			t.Errorf("%v: %v", a, z)
		}
		for _, b := range list {
			if !a.Add(b).Sub(b).Equal(a) || !a.Mul(b).Equal(b.Mul(a)) || a.Equal(b) != (a.Key() == b.Key()) {
				t.Errorf("%v and %v", a, b)
			}
			if !b.IsZero() && !a.Quo(b).Mul(b).Equal(a) {
				t.Errorf("(%v)/(%v) = %v", a, b, a.Quo(b))
			}
		}
	}
	z := one
	for n := range 9 {
		if !rational.IPow(n).Equal(z) || !rational.IPow(-n).Mul(z).Equal(one) {
			t.Errorf("i^%d = %v", n, rational.IPow(n))
		}
		z = z.Mul(rational.I())
	}
	if got := one.Scale(rational.Root(2, 1)).Add(rational.I()); got.String() != "sqrt(2) + i" {
		t.Errorf("sqrt(2) + i prints as %v", got)
	}
	mustPanic(t, "rational.Complex.Quo: d = 0; allowed: anything but zero", func() { one.Quo(rational.Complex{}) })
}

func TestMatrix(t *testing.T) {
	entry := func(shift int) func(i, j int) rational.Complex {
		return func(i, j int) rational.Complex {
			return rational.Complex{Re: rational.Ratio(int64(i*i-2*j+shift), 3).Sum(), Im: rational.Root(int64(i+j), 2).Sum()}
		}
	}
	a, b, c := rational.NewMatrix(2, 3, entry(0)), rational.NewMatrix(2, 3, entry(4)), rational.NewMatrix(3, 4, entry(-1))
	if !a.Add(b).Sub(b).Equal(a) || a.Equal(b) || a.Equal(c) {
		t.Error("Add, Sub or Equal")
	}
	if !a.Mul(c).Adjoint().Equal(c.Adjoint().Mul(a.Adjoint())) || !a.Add(b).Mul(c).Equal(a.Mul(c).Add(b.Mul(c))) {
		t.Error("the product is not linear, or the adjoint of a product not the product of the adjoints")
	}
	var want rational.Complex
	for k := range 3 {
		want = want.Add(a.At(1, k).Mul(c.At(k, 2)))
	}
	if got := a.Mul(c).At(1, 2); !got.Equal(want) {
		t.Errorf("entry of the product %v, want %v", got, want)
	}
	if !rational.Identity(2).Mul(a).Equal(a) || !a.Mul(rational.Identity(3)).Equal(a) || !a.Scale(rational.I()).Scale(rational.I()).Equal(a.Scale(rational.Ratio(-1, 1).Complex())) {
		t.Error("Identity or Scale")
	}
	if z := a.Complex128s(make([]complex128, 1, 10)); len(z) != 6 || z[4] != a.At(1, 1).Complex128() {
		t.Errorf("Complex128s gives %v", z)
	}
	dst := make([]float64, 9)
	for i := range dst {
		dst[i] = 99
	}
	if f := rational.Identity(2).Float64s(dst); len(f) != 4 || &f[0] != &dst[0] || f[0] != 1 || f[1] != 0 || f[3] != 1 {
		t.Errorf("Float64s gives %v", f)
	}
	want2 := "\\begin{pmatrix}\n1 & \\mathrm{i} \\\\\n0 & -\\frac{1}{2}\\sqrt{3} \\\\\n\\end{pmatrix}"
	if got := rational.NewMatrix(2, 2, func(i, j int) rational.Complex {
		return [...]rational.Complex{rational.Ratio(1, 1).Complex(), rational.I(), {}, rational.Root(3, 4).Neg().Complex()}[2*i+j]
	}).LaTeX(); got != want2 {
		t.Errorf("LaTeX %q, want %q", got, want2)
	}
	mustPanic(t, "rational.Matrix.Float64s: entry 0, 1 = -2/3 + 1/2*sqrt(2)*i; allowed: a real number", func() { a.Float64s(nil) })
	mustPanic(t, "rational.Matrix.Mul: n = 2 x 3 matrix; allowed: a shape that fits a 2 x 3 matrix", func() { a.Mul(b) })
	mustPanic(t, "rational.Matrix.Add: n = 3 x 4 matrix; allowed: a shape that fits a 2 x 3 matrix", func() { a.Add(c) })
	mustPanic(t, "rational.Matrix.Sub: n = 2 x 4 matrix; allowed: a shape that fits a 2 x 3 matrix", func() { a.Sub(rational.NewMatrix(2, 4, entry(0))) })
	mustPanic(t, "rational.Matrix.Sub: n = 3 x 4 matrix; allowed: a shape that fits a 2 x 3 matrix", func() { a.Sub(c) })
	mustPanic(t, "rational.Matrix.At: i, j = 2, 0; allowed: i from 0 to 1, j from 0 to 2", func() { a.At(2, 0) })
	mustPanic(t, "rational.Matrix.At: i, j = 0, 3; allowed: i from 0 to 1, j from 0 to 2", func() { a.At(0, 3) })
	mustPanic(t, "rational.Matrix.At: i, j = 0, -1; allowed: i from 0 to 1, j from 0 to 2", func() { a.At(0, -1) })
	mustPanic(t, "rational.NewMatrix: rows, cols = -1, 2; allowed: both >= 0", func() { rational.NewMatrix(-1, 2, nil) })
	if rows, cols := (rational.Matrix{}).Dims(); rows != 0 || cols != 0 || (rational.Matrix{}).String() != "" {
		t.Error("the zero value is not the empty matrix")
	}
}

func ExampleMatrix() {
	half := rational.Ratio(1, 2)
	m := rational.NewMatrix(2, 2, func(i, j int) rational.Complex {
		if i == j {
			return half.Complex()
		}
		return half.Mul(rational.Root(3, 1)).Complex().Mul(rational.IPow(1 + 2*i))
	})
	fmt.Print(m)
	fmt.Println(m.Mul(m.Adjoint()).Equal(rational.Identity(2)))
	// Output:
	//            1/2  1/2*sqrt(3)*i
	// -1/2*sqrt(3)*i            1/2
	// false
}

func ExampleSum_QuoSum() {
	one := rational.Ratio(1, 1)
	fmt.Println(one.Sum().QuoSum(one.Add(rational.Root(2, 1))))
	// Output: -1 + sqrt(2)
}
