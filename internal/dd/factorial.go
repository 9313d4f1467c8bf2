package dd

import (
	"math"
	"math/big"
	"sync"
	"sync/atomic"
)

// Scaled is a Pair times 2^Exp.
type Scaled struct {
	Pair
	Exp int
}

// Mul returns a*b in normal form, for numbers in normal form, with a relative error below 5 u^2:
// algorithm DWTimesDW2 of Joldes, Muller and Popescu (2017), with the bound of Muller and Rideau (2022).
func (a Scaled) Mul(b Scaled) Scaled { return Scaled{a.Pair.Mul(b.Pair).Normal(), a.Exp + b.Exp} }

// Roots holds square roots, and those of factorials with Hi between 1 and 2, in normal form and with
// relative errors below u^2.
type Roots struct {
	Root, Inverse     []Scaled // sqrt(n!), 1/sqrt(n!)
	Sqrt, InverseSqrt []Pair   // sqrt(n), 1/sqrt(n); not for n = 0
}

var (
	roots      atomic.Pointer[Roots]
	rootsMutex sync.Mutex
)

// MostFactorials is how far Factorials reaches: beyond, the table would take more than 100 MB.
const MostFactorials = 1 << 20

// Factorials returns a table for all n up to top <= MostFactorials, perhaps more. It is built when first asked for, and
// again where a larger one is asked for; the slices are never changed.
func Factorials(top int) *Roots {
	if t := roots.Load(); t != nil && len(t.Root) > top {
		return t
	}
	rootsMutex.Lock()
	defer rootsMutex.Unlock()
	t := roots.Load()
	if t == nil {
		t = newRoots(max(top, 1<<9))
	} else if len(t.Root) <= top {
		t = newRoots(max(top, min(2*len(t.Root), MostFactorials))) // doubling keeps the total work linear
	}
	roots.Store(t)
	return t
}

func newRoots(top int) *Roots {
	t := &Roots{make([]Scaled, top+1), make([]Scaled, top+1), make([]Pair, top+1), make([]Pair, top+1)}
	const prec = 160 // a rounding error for each factor of n! leaves 2^-140 at n = 2^20
	factorial := new(big.Float).SetPrec(prec).SetInt64(1)
	one := new(big.Float).SetPrec(prec).SetInt64(1)
	for n := range top + 1 {
		r := new(big.Float).SetPrec(prec)
		if n > 0 {
			m := new(big.Float).SetPrec(prec).SetInt64(int64(n))
			factorial.Mul(factorial, m)
			r.Sqrt(m)
			root := fromBig(r)
			t.Sqrt[n] = root.Scale(root.Exp, false)
			inverse := fromBig(r.Quo(one, r))
			t.InverseSqrt[n] = inverse.Scale(inverse.Exp, false)
		}
		r.Sqrt(factorial)
		t.Root[n] = fromBig(r)
		t.Inverse[n] = fromBig(r.Quo(one, r))
	}
	return t
}

// fromBig returns x > 0 with Hi between 1 and 2.
func fromBig(x *big.Float) Scaled {
	exp := x.MantExp(nil) - 1
	x = new(big.Float).SetMantExp(x, -exp)
	hi, _ := x.Float64()
	lo, _ := new(big.Float).Sub(x, new(big.Float).SetFloat64(hi)).Float64()
	return Scaled{Pair{hi, lo}, exp}
}

// Round is Pair.Round for the scaled number. ok is also false where the result is not in the range of
// normal numbers, but for results that are far below it: these are zero, with the sign of a.
func (a Scaled) Round(err float64) (f float64, ok bool) {
	f, ok = a.Pair.Round(err)
	if !ok {
		return 0, false
	}
	exp := a.Exp + int(math.Float64bits(f)>>52&0x7ff) // biased
	if exp < -60 {
		return math.Copysign(0, f), true
	}
	if exp < 1 || exp > 0x7fe {
		return 0, false
	}
	return math.Float64frombits(math.Float64bits(f) + uint64(a.Exp)<<52), true
}
