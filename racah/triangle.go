package racah

import "example.org/couplet/rational"

// mulTriangle multiplies f by Δ(abc)^(2 power), with a, b, c given as twice their values, where
//
//	Δ(abc)^2 = (a+b-c)! (a-b+c)! (-a+b+c)! / (a+b+c+1)!    DLMF (34.2.5)
func mulTriangle(f *rational.Factored, a, b, c, power int) {
	f.MulFactorial((a+b-c)/2, power)
	f.MulFactorial((a-b+c)/2, power)
	f.MulFactorial((b-a+c)/2, power)
	f.MulFactorial((a+b+c)/2+1, -power)
}
