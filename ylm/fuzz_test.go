package ylm_test

import (
	"math"
	"testing"

	"example.org/couplet/rational"
	"example.org/couplet/ylm"
)

// What holds for Y at any angles: the conjugate of DLMF (14.30.6) and the continuation to negative
// theta bit for bit, Unsöld's sum within the stated bound.
func FuzzY(f *testing.F) {
	for _, a := range angles {
		f.Add(uint8(3), int8(2), a[0], a[1])
		f.Add(uint8(100), int8(-71), a[0], a[1])
	}
	f.Fuzz(func(t *testing.T, degree uint8, order int8, theta, phi float64) {
		if math.IsNaN(theta-theta) || math.IsNaN(phi-phi) {
			t.Skip("NaN and Inf have a test of their own")
		}
		l := int(degree) % 101
		m := int(order) % (l + 1)
		y := ylm.Y(l, m, theta, phi)
		if got, want := ylm.Y(l, -m, theta, phi), conjugate(m, y); got != want {
			t.Errorf("Y(%d, %d, %v, %v) = %v, want %v", l, -m, theta, phi, got, want)
		}
		mirrored := y
		if m&1 != 0 {
			mirrored = -y
		}
		if got := ylm.Y(l, m, -theta, phi); got != mirrored {
			t.Errorf("Y(%d, %d, %v, %v) = %v, want %v", l, m, -theta, phi, got, mirrored)
		}
		if got := sumOfSquares(l, theta, phi); !(math.Abs(got-1) <= 2*boundTo100*math.Sqrt(float64(2*l+1))) {
			t.Errorf("l = %d, theta = %v, phi = %v: sum of squares is %v of (2l+1)/(4 pi)", l, theta, phi, got)
		}
	})
}

// Exact arithmetic does not depend on the variables it is done in, and evaluation is a homomorphism.
func FuzzPolynomial(f *testing.F) {
	f.Add([]byte{})
	f.Add([]byte{1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
	f.Add([]byte("a few terms, of both sets of variables"))
	f.Fuzz(func(t *testing.T, data []byte) {
		p := polynomialOf(ylm.Ladder, data[:len(data)/2])
		q := polynomialOf(ylm.Cartesian, data[len(data)/2:])
		if a, b := p.Mul(q), q.Mul(p); !a.Equal(b) || a.Key() != b.Key() {
			t.Errorf("(%v)(%v) = %v and %v", p, q, a, b)
		}
		if a := p.Add(q).Sub(p); !a.Equal(q) {
			t.Errorf("p+q-p = %v, want %v", a, q)
		}
		if a, b := p.Mul(q).OnSphere().Integral(), p.Mul(q).Integral(); !a.Equal(b) {
			t.Errorf("integral of (%v)(%v): %v and %v", p, q, a, b)
		}
		x, y, w := rational.Ratio(2, 3), rational.Ratio(-1, 2), rational.Ratio(3, 1)
		if a, b := at(t, p, 1, x, y, w).Mul(at(t, q, 1, x, y, w)), at(t, p.Mul(q), 2, x, y, w); !a.Equal(b) {
			t.Errorf("(%v)(%v) at a point: %v and %v", p, q, a, b)
		}
	})
}

// polynomialOf makes a term of every four bytes, eight terms at most.
func polynomialOf(vars ylm.Variables, data []byte) ylm.Polynomial {
	var terms []ylm.Term
	for ; len(data) >= 4 && len(terms) < 8; data = data[4:] {
		terms = append(terms, ylm.Term{
			Coeff:  rational.IPow(int(data[0])).Scale(rational.Root(int64(data[0]>>2), int64(data[1]>>4)+1)),
			RootPi: 1,
			Powers: [3]int{int(data[1] % 5), int(data[2] % 5), int(data[3] % 5)},
		})
	}
	return ylm.NewPolynomial(vars, terms...)
}
