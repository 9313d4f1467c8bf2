package lines

import (
	"strconv"

	"example.org/couplet/internal/argument"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// RelativeStrength returns the strength of the component from x to x', exactly, where a spectator s
// couples with j to x and with j' to x', and a tensor operator of rank k acts on j:
//
//	|<(j s)x||T(k)||(j' s)x'>|^2                    { j  x  s }^2
//	---------------------------- = (2x+1)(2x'+1)    { x' j' k }      square of Edmonds (7.1.7)
//	    |<j||T(k)||j'>|^2
//
// For a longer chain the factors of its steps multiply. A selection rule that fails gives zero. It
// panics with *rational.ArgumentError for a negative argument.
func RelativeStrength(k int, j, jp, s, x, xp rational.Half) rational.Surd {
	const fn = "lines.RelativeStrength"
	mustRank(fn, k)
	mustMomenta(fn, named{"j", j}, named{"jp", jp}, named{"s", s}, named{"x", x}, named{"xp", xp})
	return relativeStrength(rational.Int(k), j, jp, s, x, xp)
}

func relativeStrength(k, j, jp, s, x, xp rational.Half) rational.Surd {
	f := recoupling(k, j, jp, s, x, xp)
	return f.Mul(f).Mul(rational.Ratio(int64(x.Twice())+1, 1)).Mul(rational.Ratio(int64(xp.Twice())+1, 1))
}

// recoupling returns what a coupling step makes of a reduced element, less its roots:
//
//	      <(j s)x||T(k)||(j' s)x'>
//	--------------------------------- = (-1)^(j+s+x'+k) { j  x  s }    Edmonds (7.1.7)
//	sqrt((2x+1)(2x'+1)) <j||T(k)||j'>                   { x' j' k }
func recoupling(k, j, jp, s, x, xp rational.Half) rational.Surd {
	f := racah.SixJ(j, x, s, xp, jp, k)
	if (j.Twice()+s.Twice()+xp.Twice()+k.Twice())/2&1 != 0 {
		return f.Neg()
	}
	return f
}

// named is an argument with its name in the documentation.
type named struct {
	name  string
	value rational.Half
}

// mustMomenta panics for the first argument that is negative.
func mustMomenta(fn string, list ...named) {
	for _, a := range list {
		if err := argument.Momentum(fn, a.name, a.value); err != nil {
			panic(err)
		}
	}
}

// mustRank panics for a negative rank, and for one that no momentum of a level can use.
func mustRank(fn string, k int) {
	if k < 0 || k > 2*maxMomentum {
		panic(&rational.ArgumentError{Func: fn, Arg: "k", Value: strconv.Itoa(k), Allowed: "an integer from 0 to " + strconv.Itoa(2*maxMomentum)})
	}
}
