package rational_test

import (
	"fmt"
	"math"
	"math/big"
	"math/rand/v2"
	"reflect"
	"testing"

	"example.org/couplet/rational"
)

// surds returns numbers of all kinds: zero, words, values at the edge of a word and far beyond.
func surds(t testing.TB) []rational.Surd {
	list := []rational.Surd{
		{}, rational.Ratio(1, 1), rational.Ratio(-1, 1), rational.Ratio(-3, 2), rational.Root(2, 1), rational.Root(2, 7).Neg(),
		rational.Root(14, 9), rational.Ratio(math.MaxInt64, 1), rational.Ratio(math.MinInt64, 1), rational.Ratio(1, math.MinInt64),
		rational.Root(math.MaxInt64, 1), rational.Root(math.MaxInt64, math.MaxInt64-1), rational.Ratio(math.MaxInt64, math.MaxInt64-1),
	}
	for _, text := range []string{
		"18446744073709551615*sqrt(2)", "1/18446744073709551615*sqrt(3)", "1/18446744073709551616", "sqrt(36893488147419103230)",
		"123456789012345678901234567890/987654321098765432109876543211*sqrt(30)", "-3/100000000000000000000000000000000000000007*sqrt(6469693230)",
	} {
		s, err := rational.ParseSurd(text)
		if err != nil {
			t.Fatal(err)
		}
		list = append(list, s)
	}
	var f rational.Factored
	f.MulFactorial(50, 1)
	f.MulFactorial(31, -3)
	f.MulInt(97, 1)
	return append(list, f.SqrtTimes(12345), f.SqrtTimes(-1))
}

// checkCanonical demands lowest terms and a squarefree radicand (trial division, small primes).
func checkCanonical(t *testing.T, s rational.Surd) {
	t.Helper()
	rad := s.Radicand()
	if rad.Sign() <= 0 || s.IsZero() && rad.Cmp(big.NewInt(1)) != 0 {
		t.Errorf("%v: radicand %v", s, rad)
	}
	for p := int64(2); p < 1000; p++ {
		if new(big.Int).Mod(rad, big.NewInt(p*p)).Sign() == 0 {
			t.Errorf("%v: radicand %v holds %d^2", s, rad, p)
		}
	}
}

// squareOf returns sign(s)*s^2, which determines s and which big.Rat computes on its own.
func squareOf(s rational.Surd) *big.Rat {
	r := s.Coeff()
	z := new(big.Rat).Mul(r, r)
	z.Mul(z, new(big.Rat).SetInt(s.Radicand()))
	if s.Sign() < 0 {
		z.Neg(z)
	}
	return z
}

func TestSurdArithmetic(t *testing.T) {
	list := surds(t)
	for _, a := range list {
		checkCanonical(t, a)
		if got := squareOf(a); new(big.Rat).Abs(got).Cmp(a.Square()) != 0 {
			t.Errorf("%v: square %v", a, a.Square())
		}
		if !a.Neg().Neg().Equal(a) || a.Neg().Sign() != -a.Sign() || a.Abs().Sign() < 0 || squareOf(a.Abs()).Cmp(a.Square()) != 0 {
			t.Errorf("%v: Neg %v, Abs %v", a, a.Neg(), a.Abs())
		}
		for _, b := range list {
			p := a.Mul(b)
			checkCanonical(t, p)
			if squareOf(p).Cmp(new(big.Rat).Mul(squareOf(a), squareOf(b))) != 0 {
				t.Errorf("%v * %v = %v", a, b, p)
			}
			if a.Cmp(b) != squareOf(a).Cmp(squareOf(b)) {
				t.Errorf("%v.Cmp(%v) = %d", a, b, a.Cmp(b))
			}
			if (a.Cmp(b) == 0) != a.Equal(b) || a.Equal(b) != (a.Key() == b.Key()) {
				t.Errorf("%v and %v: Equal %v, Cmp %d", a, b, a.Equal(b), a.Cmp(b))
			}
			if b.IsZero() {
				continue
			}
			q := a.Quo(b)
			checkCanonical(t, q)
			if !q.Mul(b).Equal(a) {
				t.Errorf("%v / %v = %v", a, b, q)
			}
		}
	}
	third, fifth := rational.Ratio(1<<62, 3).Mul(rational.Ratio(1<<62, 1)), rational.Ratio(1<<62, 5).Mul(rational.Ratio(1<<62, 1))
	if third.Equal(fifth) || third.Equal(third.Mul(rational.Root(2, 1))) || third.Equal(third.Neg()) {
		t.Error("Equal leaves out a part of long values")
	}
	mustPanic(t, "rational.Surd.Quo: t = 0; allowed: anything but zero", func() { list[1].Quo(rational.Surd{}) })
	mustPanic(t, "rational.Surd.Inv: s = 0; allowed: anything but zero", func() { rational.Surd{}.Inv() })
	mustPanic(t, "rational.Ratio: den = 0; allowed: any other integer", func() { rational.Ratio(1, 0) })
	mustPanic(t, "rational.Root: num/den = -1/2; allowed: num >= 0 and den >= 1", func() { rational.Root(-1, 2) })
}

// Values at the edge of a word must come out in the same form whatever way they are reached.
func TestSurdOneForm(t *testing.T) {
	big1, err := rational.ParseSurd("9223372036854775808*sqrt(5)")
	if err != nil {
		t.Fatal(err)
	}
	half := big1.Quo(rational.Ratio(2, 1))
	word := rational.Ratio(1<<62, 1).Mul(rational.Root(5, 1))
	if !half.Equal(word) || half.Key() != word.Key() {
		t.Errorf("%v and %v differ", half, word)
	}
	if again := half.Mul(rational.Ratio(2, 1)); !again.Equal(big1) {
		t.Errorf("%v and %v differ", again, big1)
	}
}

// The inverse of a denominator that is no signed word.
func TestInvAtTheEdge(t *testing.T) {
	parse := func(text string) rational.Surd {
		s, err := rational.ParseSurd(text)
		if err != nil {
			t.Fatal(err)
		}
		return s
	}
	for _, c := range [][2]string{{"1/9223372036854775808", "9223372036854775808"}, {"-1/9223372036854775808", "-9223372036854775808"},
		{"1/9223372036854775807", "9223372036854775807"}, {"1/18446744073709551615*sqrt(2)", "18446744073709551615/2*sqrt(2)"}} {
		a, b := parse(c[0]), parse(c[1])
		if !a.Inv().Equal(b) || !b.Inv().Equal(a) || a.Inv().Key() != c[1] {
			t.Errorf("1/(%s) = %v, want %s", c[0], a.Inv(), c[1])
		}
	}
}

func TestNotComparable(t *testing.T) {
	for _, v := range []any{rational.Surd{}, rational.Sum{}, rational.Complex{}, rational.Matrix{}} {
		if reflect.TypeOf(v).Comparable() {
			t.Errorf("== compiles on %T", v)
		}
	}
}

func TestSurdHandsOutCopies(t *testing.T) {
	for _, s := range surds(t) {
		before := s.String()
		s.Coeff().Num().SetInt64(7)
		s.Coeff().Add(s.Coeff(), big.NewRat(1, 3))
		s.Radicand().SetInt64(7)
		s.Square().SetInt64(7)
		if r, ok := s.Rat(); ok {
			r.Num().SetInt64(7)
			r.SetInt64(7)
		}
		if s.String() != before {
			t.Errorf("%s became %v", before, s)
		}
	}
	for _, text := range []string{"22/7", "123456789012345678901234567890/11111111111111111111111111111111111"} {
		r, _ := new(big.Rat).SetString(text)
		s := rational.FromRat(r)
		r.Num().Add(r.Num(), big.NewInt(1))
		r.Denom().SetInt64(5)
		if s.String() != text {
			t.Errorf("FromRat shares memory with its argument: %v", s)
		}
	}
	n := new(big.Int).Lsh(big.NewInt(3), 100)
	before := n.String()
	var f rational.Factored
	f.MulFactorial(20, -2)
	f.MulFactorial(9, 3)
	f.SqrtTimesBig(n)
	if n.String() != before {
		t.Errorf("SqrtTimesBig changes its argument to %v", n)
	}
	sum := rational.Root(2, 1).Add(rational.Root(3, 1))
	sum.Terms()[0] = rational.Ratio(7, 1)
	if sum.String() != "sqrt(2) + sqrt(3)" {
		t.Errorf("Terms shares memory with the sum: %v", sum)
	}
}

// wantFloat rounds a surd by a route of its own: big.Float's square root at 3,000 bits more than the
// numbers have. An irrational number is never that close to a rounding boundary here.
func wantFloat(s rational.Surd) *big.Float {
	r := s.Coeff()
	prec := uint(3000 + r.Num().BitLen() + r.Denom().BitLen() + s.Radicand().BitLen())
	root := new(big.Float).SetPrec(prec).SetInt(s.Radicand())
	root.Sqrt(root)
	c := new(big.Float).SetPrec(prec).SetRat(r)
	return c.Mul(c, root)
}

func TestSurdFloat64(t *testing.T) {
	list := surds(t)
	// From the largest float to below the smallest: scale by powers of two.
	for e := -1100; e <= 1100; e += 7 {
		var f rational.Factored
		f.MulInt(2, e)
		f.MulInt(3, 1)
		f.MulInt(97, -1)
		list = append(list, f.SqrtTimes(5), f.SqrtTimes(-7), f.SqrtTimes(5).Mul(f.SqrtTimes(3)))
	}
	r := rand.New(rand.NewPCG(1, 1))
	for range 2000 {
		list = append(list, rational.Ratio(r.Int64()-1<<62, r.Int64N(1<<uint(1+r.IntN(62)))+1).Mul(rational.Root(1+r.Int64N(1<<20), 1)))
	}
	subnormal, infinite := 0, 0
	for _, s := range list {
		want, _ := wantFloat(s).Float64()
		got := s.Float64()
		if got != want || math.Signbit(got) != math.Signbit(want) {
			t.Errorf("%v.Float64() = %g, want %g", s, got, want)
		}
		if got != 0 && math.Abs(got) < 0x1p-1022 {
			subnormal++
		}
		if math.IsInf(got, 0) {
			infinite++
		}
		for _, prec := range []uint{1, 2, 24, 53, 113} {
			if got, want := s.Float(prec), new(big.Float).SetPrec(prec).Set(wantFloat(s)); got.Cmp(want) != 0 || got.Prec() != prec {
				t.Errorf("%v.Float(%d) = %g, want %g", s, prec, got, want)
			}
		}
	}
	if subnormal == 0 || infinite == 0 {
		t.Errorf("%d subnormal and %d infinite values: the draw misses an edge", subnormal, infinite)
	}
	mustPanic(t, "rational.Surd.Float: prec = 0; allowed: from 1 to 16777216", func() { rational.Surd{}.Float(0) })
}

// Ties of rational numbers go to even, in the normal and in the subnormal range, and a number just
// beside a tie goes to its own side.
func TestSurdFloat64Ties(t *testing.T) {
	power := func(e int) rational.Surd {
		var f rational.Factored
		f.MulInt(2, 2*e)
		return f.SqrtTimes(1)
	}
	tiny := power(-2000)
	for _, c := range []struct {
		value    string
		exponent int
		want     float64
	}{
		{"9007199254740993", 0, 9007199254740992}, // 2^53+1: tie, even below
		{"9007199254740995", 0, 9007199254740996}, // 2^53+3: tie, even above
		{"1", -1075, 0},                         // half the smallest subnormal
		{"3", -1075, 0x1p-1073},                 // 1.5 of it: tie, even above
		{"5", -1075, 0x1p-1073},                 // 2.5 of it: tie, even below
		{"9007199254740991", -1075, 0x1p-1022},  // largest subnormal and a half
		{"18014398509481983", 970, math.Inf(1)}, // the largest float and half a step: tie, up
	} {
		s, err := rational.ParseSurd(c.value)
		if err != nil {
			t.Fatal(err)
		}
		s = s.Mul(power(c.exponent))
		if got := s.Float64(); got != c.want {
			t.Errorf("%s * 2^%d rounds to %g, want %g", c.value[:min(20, len(c.value))], c.exponent, got, c.want)
		}
		above, _ := s.Add(tiny).Surd()
		if want, _ := wantFloat(above).Float64(); above.Float64() != want {
			t.Errorf("%s * 2^%d and a little rounds to %g, want %g", c.value[:min(20, len(c.value))], c.exponent, above.Float64(), want)
		}
	}
}

// k q sqrt(2) next to the tie k p of 54 bits, for the solutions p^2 - 2 q^2 = ±1 of Pell's equation: it is
// off by less than 2^-20, to the side that the sign of p^2 - 2 q^2 tells.
func TestSurdFloat64NearTies(t *testing.T) {
	cases := 0
	p, q, sign := int64(1), int64(1), -1
	for ; p < 1<<53; p, q, sign = p+2*q, p+q, -sign {
		if p < 1<<38 {
			continue
		}
		k := (1<<54-1)/p | 1 // odd, so that k p is odd
		if k*p >= 1<<54 {
			k -= 2
		}
		if k < 1 || k*p < 1<<53 {
			continue
		}
		cases++
		s := rational.Ratio(k*q, 1).Mul(rational.Root(2, 1))
		want := float64(k*p - int64(sign)) // even, 53 bits: below the tie where p^2 > 2 q^2
		if got := s.Float64(); got != want {
			t.Errorf("%v = %.0f, want %.0f", s, got, want)
		}
		if got := s.Neg().Float64(); got != -want {
			t.Errorf("%v = %.0f, want %.0f", s.Neg(), got, -want)
		}
	}
	if cases < 6 {
		t.Errorf("only %d cases", cases)
	}
}

// sqrt(2) at twenty places: Euclid's number, 1.41421356237309504880 (DLMF does not print it;
// OEIS A002193, from memory).
func TestSurdFloatDigits(t *testing.T) {
	if got := rational.Root(2, 1).Float(100).Text('f', 20); got != "1.41421356237309504880" {
		t.Errorf("sqrt(2) = %s", got)
	}
}

func TestFactored(t *testing.T) {
	factorial := func(n int64) *big.Int { return new(big.Int).MulRange(1, n) }
	for _, n := range []int{0, 1, 2, 10, 100, 311, 312, 313, 314, 400, 1000, 5000} {
		var f rational.Factored
		f.MulFactorial(n, 1)
		if got := f.Int(new(big.Int)); got.Cmp(factorial(int64(n))) != 0 {
			t.Errorf("%d! is wrong", n)
		}
		f.MulFactorial(n, 1)
		if got := f.SqrtTimes(-3); got.Sign() >= 0 || got.Coeff().Num().CmpAbs(new(big.Int).Mul(big.NewInt(3), factorial(int64(n)))) != 0 {
			t.Errorf("-3 sqrt(%d!^2) is wrong", n)
		}
		f.MulFactorial(n, -2)
		if got := f.SqrtTimes(5); !got.Equal(rational.Ratio(5, 1)) {
			t.Errorf("5 sqrt(%d!/%d!) = %v", n, n, got)
		}
	}
	for n := 1; n <= 3000; n++ {
		var f rational.Factored
		f.MulInt(n, 3)
		f.MulInt(n, -2)
		if got := f.Int(new(big.Int)); got.Cmp(big.NewInt(int64(n))) != 0 {
			t.Fatalf("MulInt(%d) gives %v", n, got)
		}
		if got, want := f.SqrtTimes(1), rational.Root(int64(n), 1); !got.Equal(want) {
			t.Fatalf("sqrt(%d) = %v, want %v", n, got, want)
		}
	}
	mustPanic(t, "rational.Factored.MulFactorial: n = -1; allowed: from 0 to 4294967295", func() { new(rational.Factored).MulFactorial(-1, 1) })
	mustPanic(t, "rational.Factored.MulInt: n = 0; allowed: from 1 to 4294967295", func() { new(rational.Factored).MulInt(0, 1) })
	mustPanic(t, "rational.Factored.Int: f = a fraction with 2^-1; allowed: an integer", func() {
		var f rational.Factored
		f.MulInt(2, -1)
		f.Int(new(big.Int))
	})
}

// Word and big route must agree: the same product, once small enough for words and once scaled
// beyond them and back.
func TestFactoredRoutesAgree(t *testing.T) {
	r := rand.New(rand.NewPCG(2, 2))
	words := 0
	for range 5000 {
		var f, g rational.Factored
		for range 6 {
			n, power := r.IntN(30), r.IntN(3)-1
			f.MulFactorial(n, power)
			g.MulFactorial(n, power)
		}
		n := r.Int64N(1<<40) - 1<<39
		g.MulFactorial(400, 2) // forces the long route
		scale := new(big.Rat).SetInt(new(big.Int).MulRange(1, 400))
		got, want := f.SqrtTimes(n), g.SqrtTimes(n).Quo(rational.FromRat(scale))
		if !got.Equal(want) {
			t.Fatalf("%v, by the long route %v", got, want)
		}
		if got.Coeff().Num().IsInt64() {
			words++
		}
	}
	if words < 1000 {
		t.Errorf("only %d of 5000 values fit into words", words)
	}
}

func TestSurdAllocations(t *testing.T) {
	a, b := rational.Root(14, 27), rational.Root(22, 35)
	var sink rational.Surd
	for name, f := range map[string]func(){
		"Mul":  func() { sink = a.Mul(b) },
		"Quo":  func() { sink = a.Quo(b) },
		"Neg":  func() { sink = a.Neg() },
		"Root": func() { sink = rational.Root(12, 35) },
	} {
		if n := testing.AllocsPerRun(100, f); n != 0 {
			t.Errorf("%s allocates %v times", name, n)
		}
	}
	_ = sink
}

func ExampleSurd() {
	a, b := rational.Root(2, 3), rational.Root(3, 7)
	fmt.Println(a, "*", b, "=", a.Mul(b))
	fmt.Println(a.Add(b))
	fmt.Println(a.Mul(b).LaTeX(), a.Mul(b).Float64())
	// Output:
	// 1/3*sqrt(6) * 1/7*sqrt(21) = 1/7*sqrt(14)
	// 1/3*sqrt(6) + 1/7*sqrt(21)
	// \frac{1}{7}\sqrt{14} 0.5345224838248488
}
