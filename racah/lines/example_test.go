package lines_test

import (
	"fmt"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

// The hyperfine components of HCN J=1-0: 1 : 3 : 5, and where they fall.
func Example() {
	coupling, err := lines.ParseCoupling("(J I)F")
	if err != nil {
		fmt.Println(err)
		return
	}
	level := func(j int) lines.Level {
		l, err := coupling.Level(
			map[string]rational.Half{"J": rational.Int(j), "I": rational.Int(1)},
			lines.Rotation{B: 44315.975, D: 0.0872},
			lines.MolecularNucleus{Spin: "I", EqQ: -4.708, CI: 0.010},
		)
		if err != nil {
			panic(err)
		}
		return l
	}
	pattern, err := lines.Between(level(0), level(1))
	if err != nil {
		fmt.Println(err)
		return
	}
	shares := pattern.Shares()
	for i, c := range pattern {
		fmt.Printf("F = %v-%v  %.2f MHz  strength %v, share %v\n",
			c.Final.Number("F"), c.Initial.Number("F"), c.Position, c.Strength, shares[i])
	}
	fmt.Println("total", pattern.Total())
	// Output:
	// F = 0-1  88633.94 MHz  strength 1/3, share 1/9
	// F = 1-1  88630.41 MHz  strength 1, share 1/3
	// F = 2-1  88631.85 MHz  strength 5/3, share 5/9
	// total 3
}

// The triplet 3P - 3D in LS coupling.
func ExampleMultiplet() {
	for _, c := range lines.Multiplet(rational.Int(1), rational.Int(2), rational.Int(1)) {
		fmt.Printf("J = %v - %v: %v\n", c.Initial.Number("J"), c.Final.Number("J"), c.Strength)
	}
	// Output:
	// J = 0 - 1: 1/3
	// J = 1 - 1: 1/4
	// J = 1 - 2: 3/4
	// J = 2 - 1: 1/60
	// J = 2 - 2: 1/4
	// J = 2 - 3: 7/5
}

// The hydroxyl line at 18 cm, within J = 3/2: 1 : 5 : 9 : 1.
func ExampleHyperfine() {
	pattern := lines.Hyperfine(rational.Halves(3), rational.Halves(3), rational.Halves(1))
	for i, share := range pattern.Shares() {
		fmt.Printf("%v to %v: %v\n", pattern[i].Initial, pattern[i].Final, share)
	}
	// Output:
	// J=3/2 I=1/2 F=1 to J=3/2 I=1/2 F=1: 5/16
	// J=3/2 I=1/2 F=1 to J=3/2 I=1/2 F=2: 1/16
	// J=3/2 I=1/2 F=2 to J=3/2 I=1/2 F=1: 1/16
	// J=3/2 I=1/2 F=2 to J=3/2 I=1/2 F=2: 9/16
}

// Two nuclear spins: the 15 components of N2H+ J=1-0 add up to seven groups, since the lower level
// does not split.
func ExampleHyperfine_twoSpins() {
	groups := make(map[[2]rational.Half]rational.Sum)
	pattern := lines.Hyperfine(rational.Int(0), rational.Int(1), rational.Int(1), rational.Int(1))
	for _, c := range pattern {
		g := [2]rational.Half{c.Final.Number("F1"), c.Final.Number("F")}
		groups[g] = groups[g].Add(c.Strength.Sum())
	}
	fmt.Println(len(pattern), "components,", len(groups), "groups; F1=2 F=3:", groups[[2]rational.Half{rational.Int(2), rational.Int(3)}])
	// Output: 15 components, 7 groups; F1=2 F=3: 7/3
}

func ExampleParseCoupling() {
	c, err := lines.ParseCoupling("((L S)J I)F")
	fmt.Println(c.Names(), c.Spectators(), err)
	_, err = lines.ParseCoupling("(J (I1 I2)I)F")
	fmt.Println(err)
	// Output:
	// [L S J I F] [S I] <nil>
	// lines.ParseCoupling: "(J (I1 I2)I)F" at byte 3; allowed: the name of one momentum; chains couple from the left, as ((a b)c d)e
}

// The upper level of a D2 line: J is fixed, F takes what J and I allow.
func ExampleCoupling_Level() {
	c, _ := lines.ParseCoupling("((L S)J I)F")
	numbers := map[string]rational.Half{"L": rational.Int(1), "S": rational.Halves(1), "J": rational.Halves(3), "I": rational.Halves(3)}
	level, err := c.Level(numbers, lines.AtomicNucleus{Spin: "I", A: 84.7185, B: 12.4965})
	if err != nil {
		fmt.Println(err)
		return
	}
	for s := range level.States() {
		fmt.Printf("F=%v: %.3f MHz, %d substates\n", s.Number("F"), level.Energy(s), s.Degeneracy())
	}
	numbers["J"] = rational.Halves(5)
	_, err = c.Level(numbers)
	fmt.Println(err)
	// Output:
	// F=0: -302.074 MHz, 1 substates
	// F=1: -229.852 MHz, 3 substates
	// F=2: -72.911 MHz, 5 substates
	// F=3: 193.741 MHz, 7 substates
	// lines.Coupling.Level: J = 5/2; allowed: 1/2, 3/2
}

// The oxygen lines at 777 nm: energies of the upper levels by J, in MHz from 3s 5S.
func ExampleFineStructure() {
	c, _ := lines.ParseCoupling("(L S)J")
	lower, _ := c.Level(map[string]rational.Half{"L": rational.Int(0), "S": rational.Int(2)})
	upper, err := c.Level(map[string]rational.Half{"L": rational.Int(1), "S": rational.Int(2)},
		lines.FineStructure{Total: "J", Energy: map[rational.Half]float64{
			rational.Int(1): 385459862, rational.Int(2): 385520450, rational.Int(3): 385630653,
		}})
	if err != nil {
		fmt.Println(err)
		return
	}
	pattern, _ := lines.Between(lower, upper)
	for _, c := range pattern {
		fmt.Printf("J = 2 - %v: %.0f MHz, %v\n", c.Final.Number("J"), c.Position, c.Strength)
	}
	// Output:
	// J = 2 - 1: 385459862 MHz, 1
	// J = 2 - 2: 385520450 MHz, 5/3
	// J = 2 - 3: 385630653 MHz, 7/3
}

// The share of the light from F=2 that goes to F'=3 on the D2 line of 87Rb is 7/10: the strength over
// the sum (2F+1)/(2J+1) of all components from F=2.
func ExampleRelativeStrength() {
	half, threeHalves := rational.Halves(1), rational.Halves(3)
	s := lines.RelativeStrength(1, half, threeHalves, threeHalves, rational.Int(2), rational.Int(3))
	fmt.Println(s, s.Float64(), s.Quo(rational.Ratio(5, 2)))
	// Output: 7/4 1.75 7/10
}

func ExampleCasimirFunction() {
	for f := range 3 {
		fmt.Println(lines.CasimirFunction(rational.Int(1), rational.Int(1), rational.Int(f)))
	}
	// Output:
	// 1/2
	// -1/4
	// 1/20
}

func ExampleQuadrupoleFactor() {
	j, i := rational.Halves(3), rational.Halves(3)
	for f := range 4 {
		fmt.Println(lines.DipoleFactor(j, i, rational.Int(f)), lines.QuadrupoleFactor(j, i, rational.Int(f)))
	}
	// Output:
	// -15/4 5/4
	// -11/4 1/4
	// -3/4 -3/4
	// 9/4 1/4
}

// Landé's g factor of 2P3/2, from the parts of L and of S with g = 1 and 2.
func ExampleProjectionFactor() {
	l, s, j := rational.Int(1), rational.Halves(1), rational.Halves(3)
	ofL := lines.ProjectionFactor(1, l, s, j).Mul(l.Surd())
	ofS := lines.ProjectionFactor(1, s, l, j).Mul(s.Surd())
	g := ofL.Add(ofS.Mul(rational.Ratio(2, 1))).Quo(j.Surd())
	fmt.Println(g)
	// Output: 4/3
}
