package ylm_test

import (
	"fmt"
	"math"

	"example.org/couplet/rational"
	"example.org/couplet/ylm"
)

// The table of l = 2 as a textbook prints it.
func ExampleHarmonic() {
	for m := 2; m >= -2; m-- {
		fmt.Printf("%2d  %v\n", m, ylm.Harmonic(2, m, ylm.Ladder))
	}
	// Output:
	//  2  1/8*sqrt(30)/sqrt(pi)*(x+iy)^2
	//  1  -1/4*sqrt(30)/sqrt(pi)*(x+iy)*z
	//  0  1/4*sqrt(5)/sqrt(pi)*(3*z^2 - 1)
	// -1  1/4*sqrt(30)/sqrt(pi)*(x-iy)*z
	// -2  1/8*sqrt(30)/sqrt(pi)*(x-iy)^2
}

// The solid harmonic of a quadrupole, and the form that it takes for r = 1.
func ExampleSolid() {
	p := ylm.Solid(2, 0, ylm.Cartesian)
	fmt.Println(p)
	fmt.Println(p.OnSphere())
	// Output:
	// 1/4*sqrt(5)/sqrt(pi)*(2*z^2 - x^2 - y^2)
	// 1/4*sqrt(5)/sqrt(pi)*(3*z^2 - 1)
}

// The d orbital called xy is a combination of m = 2 and m = -2.
func ExamplePolynomial() {
	up, down := ylm.Harmonic(2, 2, ylm.Cartesian), ylm.Harmonic(2, -2, ylm.Cartesian)
	factor := rational.IPow(-1).Scale(rational.Root(1, 2)) // -i/sqrt(2)
	orbital := up.Sub(down).Scale(factor)
	fmt.Println(orbital)
	fmt.Println("norm:", orbital.Mul(orbital).Integral())
	// Output:
	// 1/2*sqrt(15)/sqrt(pi)*x*y
	// norm: 1
}

// A product of two dipole patterns, derived by hand: z^2 = 1/3 + 2/3 P_2(z). The check is exact.
func ExamplePolynomial_OnSphere() {
	y1, y2, y0 := ylm.Harmonic(1, 0, ylm.Ladder), ylm.Solid(2, 0, ylm.Ladder), ylm.Harmonic(0, 0, ylm.Ladder)
	unit := ylm.NewPolynomial(ylm.Ladder, ylm.Term{Coeff: rational.Ratio(1, 2).Complex(), RootPi: 1}) // 1/sqrt(4 pi)
	byHand := y0.Add(y2.Scale(rational.Root(4, 5).Complex())).Mul(unit)

	product := y1.Mul(y1)
	fmt.Println(product.Equal(byHand))
	fmt.Println(product.OnSphere().Equal(byHand.OnSphere()))
	// Output:
	// false
	// true
}

// The integral of cos(theta)^2 over all directions.
func ExamplePolynomial_Integral() {
	square := ylm.NewPolynomial(ylm.Cartesian, ylm.Term{Coeff: rational.Ratio(1, 1).Complex(), Powers: [3]int{0, 0, 2}})
	integral := square.Integral()
	fmt.Println(integral)
	c, rootPi, _ := integral.Constant()
	fmt.Printf("%v times (1/sqrt(pi))^%d\n", c, rootPi)
	// Output:
	// 4/3*pi
	// 4/3 times (1/sqrt(pi))^-2
}

func ExamplePolynomial_LaTeX() {
	fmt.Println(ylm.Harmonic(3, 1, ylm.Ladder).LaTeX())
	// Output:
	// -\frac{1}{8}\sqrt{21}\,\pi^{-1/2}\,(x+\mathrm{i}y)\,(5\,z^{2} - 1)
}

func ExamplePolynomial_Terms() {
	for t := range ylm.Harmonic(2, 0, ylm.Ladder).Terms() {
		fmt.Printf("%v pi^(-%d/2) z^%d\n", t.Coeff, t.RootPi, t.Powers[2])
	}
	// Output:
	// 3/4*sqrt(5) pi^(-1/2) z^2
	// -1/4*sqrt(5) pi^(-1/2) z^0
}

func ExamplePolynomial_Eval() {
	fmt.Printf("%.6f\n", ylm.Solid(2, 1, ylm.Cartesian).Eval(1, 2, 2))
	// Output:
	// (-1.545097-3.090194i)
}

// Two f functions of m = 3 and -3 with Y_20: the integral is 1/6 sqrt(5/pi).
func ExampleGaunt() {
	g := ylm.Gaunt(3, 3, 3, -3, 2, 0)
	fmt.Printf("%v/sqrt(4 pi) = %.6f\n", g, g.Float64()/math.Sqrt(4*math.Pi))
	// Output:
	// 1/3*sqrt(5)/sqrt(4 pi) = 0.210261
}

// The exchange integral between the electrons of the configuration 1s 2p, in units of G^1.
func ExampleSlaterCondonC() {
	c := ylm.SlaterCondonC(1, 0, 0, 1, 0)
	fmt.Printf("c^1(00,10) = %v, b^1 = %v\n", c, c.Mul(c))
	// Output:
	// c^1(00,10) = 1/3*sqrt(3), b^1 = 1/3
}

// Y_21 = -sqrt(15/(8 pi)) sin(theta) cos(theta) exp(i phi), halfway between the z axis and the x and
// y axes; the sign is that of the phase convention.
func ExampleY() {
	fmt.Printf("%.6f\n", real(ylm.Y(2, 1, math.Pi/4, 0)))
	fmt.Printf("%.6f\n", imag(ylm.Y(2, 1, math.Pi/4, math.Pi/2)))
	// Output:
	// -0.386274
	// -0.386274
}

func ExampleIndex() {
	const lmax = 2
	values := make([]complex128, ylm.Index(lmax, lmax)+1)
	for l := range lmax + 1 {
		for m := -l; m <= l; m++ {
			values[ylm.Index(l, m)] = ylm.Y(l, m, 0.5, 0)
		}
	}
	fmt.Println(len(values), ylm.Index(1, -1), ylm.Index(2, 0))
	// Output:
	// 9 1 6
}
