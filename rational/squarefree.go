package rational

import (
	"fmt"
	"math"
	"math/big"
	"math/bits"
)

// Limits of the radicands that are factored, stated at [ParseSurd].
const (
	trialLimit   = 1 << 16 // primes below are divided out of a radicand of any length
	radicandBits = 1 << 17 // the longest radicand
)

// splitSquare returns the largest outer with n = outer^2 * inner, for n >= 1: inner is squarefree.
//
// Trial division up to the cube root leaves 1, a prime, the square of a prime or a product of two
// primes, and of these only the square has a part to take out.
func splitSquare(n uint64) (outer, inner uint64) {
	outer, inner = 1, 1
	limit := uint32(1 << 12)
	for start := 0; ; limit = uint32(min(uint64(limit)<<3, 1<<22)) { // 2^22 is beyond the cube root of 2^64
		primes := primesTo(limit)
		for ; start < len(primes); start++ {
			p := uint64(primes[start])
			if hi, cube := bits.Mul64(p*p, p); hi != 0 || cube > n {
				// The root of a square of p < 2^32 is p up to 2^-20, and that rounds to p.
				if root := uint64(math.Sqrt(float64(n))); root*root == n {
					return outer * root, inner
				}
				return outer, inner * n
			}
			for e := 0; n%p == 0; e++ {
				n /= p
				if e&1 == 0 {
					inner *= p
				} else {
					inner /= p
					outer *= p
				}
			}
		}
	}
}

// sqrtRat returns sqrt(r) for r >= 0, or an error where r is beyond the limits.
func sqrtRat(r *big.Rat) (Surd, error) {
	num, err := sqrtInt(r.Num())
	if err != nil {
		return Surd{}, err
	}
	den, err := sqrtInt(r.Denom())
	if err != nil {
		return Surd{}, err
	}
	return num.Quo(den), nil
}

func sqrtInt(n *big.Int) (Surd, error) {
	if n.Sign() == 0 {
		return Surd{}, nil
	}
	if n.BitLen() > radicandBits {
		return Surd{}, fmt.Errorf("radicand of %d bits, more than %d", n.BitLen(), radicandBits)
	}
	if n.IsUint64() {
		outer, inner := splitSquare(n.Uint64())
		return newSurd(new(big.Int).SetUint64(outer), big.NewInt(1), new(big.Int).SetUint64(inner)), nil
	}
	rest := new(big.Int).Set(n)
	outer, inner := removePrimes(rest)
	if !rest.IsUint64() {
		return Surd{}, fmt.Errorf("radicand %s is 2^64 or more after division by the primes below %d",
			abbreviate(n.String()), trialLimit)
	}
	o, i := splitSquare(rest.Uint64())
	big64 := func(n uint64) *big.Int { return new(big.Int).SetUint64(n) }
	// The primes of rest are all above the trial limit, so the product of the two squarefree parts
	// is squarefree.
	return newSurd(big64(o).Mul(big64(o), outer.int()), big.NewInt(1), big64(i).Mul(big64(i), inner.int())), nil
}

// removePrimes divides n by all primes below the trial limit as often as it goes, and returns what that
// took out, as the largest outer with outer^2*inner.
func removePrimes(n *big.Int) (outer, inner wordProduct) {
	primes := primesTo(trialLimit)
	primes = primes[:countTo(primes, trialLimit)]
	var quotient, divisor, rest big.Int
	for len(primes) > 0 {
		// One pass over n finds which primes of a word divide it.
		group, count := uint(primes[0]), 1
		for ; count < len(primes); count++ {
			hi, lo := bits.Mul(group, uint(primes[count]))
			if hi != 0 {
				break
			}
			group = lo
		}
		residue := remainder(n, group)
		for _, p := range primes[:count] {
			if residue%uint(p) != 0 {
				continue
			}
			// Powers of p from the largest in a word down: a division takes out many factors at once.
			e := int32(0)
			for power, k := largestPower(uint(p)); k > 0; {
				if quotient.QuoRem(n, divisor.SetUint64(uint64(power)), &rest); rest.Sign() == 0 {
					n.Set(&quotient)
					e += k
				} else {
					power, k = power/uint(p), k-1
				}
			}
			outer.mul(uint(p), e/2)
			inner.mul(uint(p), e%2)
		}
		primes = primes[count:]
	}
	return outer, inner
}

// largestPower returns the largest power of p in a word, and its exponent.
func largestPower(p uint) (power uint, k int32) {
	power, k = p, 1
	for {
		hi, lo := bits.Mul(power, p)
		if hi != 0 {
			return power, k
		}
		power, k = lo, k+1
	}
}

// abbreviate shortens the digits of a long number for a message.
func abbreviate(s string) string {
	if len(s) <= 40 {
		return s
	}
	return fmt.Sprintf("%s...%s (%d characters)", s[:15], s[len(s)-15:], len(s))
}
