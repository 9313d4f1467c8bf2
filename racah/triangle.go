package racah

import (
	"example.org/couplet/internal/argument"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// mulTriangle multiplies f by Δ(abc)^(2 power), with x = a+b-c, y = a-b+c, z = -a+b+c in any order, where
//
//	Δ(abc)^2 = (a+b-c)! (a-b+c)! (-a+b+c)! / (a+b+c+1)!    DLMF (34.2.5)
func mulTriangle(f *rational.Factored, x, y, z, power int) {
	f.MulFactorial(x, power)
	f.MulFactorial(y, power)
	f.MulFactorial(z, power)
	f.MulFactorial(x+y+z+1, -power)
}

// checkTriads returns the first triad, by places, that breaks a selection rule, or an error for a negative
// momentum.
func checkTriads(fn string, names []string, j []rational.Half, triads [][3]int) (wigner.Verdict, *rational.ArgumentError) {
	for i, momentum := range j {
		if err := argument.Momentum(fn, names[i], momentum); err != nil {
			return wigner.Verdict{}, err
		}
	}
	for _, t := range triads {
		if r := wigner.Triad(j[t[0]], j[t[1]], j[t[2]]); r != wigner.NonZero {
			return wigner.Verdict{Rule: r, Args: names[t[0]] + " " + names[t[1]] + " " + names[t[2]]}, nil
		}
	}
	return wigner.Verdict{}, nil
}
