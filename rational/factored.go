package rational

import (
	"fmt"
	"math/big"
	"math/bits"
	"sync/atomic"
)

// Factored is a positive rational number held as the exponents of its prime factors. It is built
// up from factorials and integers, and is what the prefactor of a coupling coefficient, the square
// root of a quotient of factorials, is before it becomes a [Surd]: exponents add where the numbers
// themselves would run to thousands of digits, and the squarefree part is read off.
//
// The zero value is 1. A Factored is a builder, changed in place by its methods: unlike the values
// of this package it must not be copied, and is not safe for use from several goroutines. It allocates
// nothing while all its primes are below 313. The exponents are 32 bits wide; a product of so many
// factors that one leaves that range is wrong.
type Factored struct {
	few   [inlinePrimes]int32 // exponents of the first primes, in order
	many  []int32             // exponents of the primes after those
	inUse int                 // every exponent of few from here on is zero
}

const (
	inlinePrimes   = 64  // the 64th prime is 311
	firstMany      = 313 // the 65th
	factorialTable = firstMany
)

var smallTable atomic.Pointer[[factorialTable]factorial]

// smallFactorials returns, for every n < 313, the exponents of n! on the first 64 primes, and how many of
// these primes are at most n. The table is built on the first call; after that this is one load, where
// sync.OnceValue makes two calls.
func smallFactorials() *[factorialTable]factorial {
	if t := smallTable.Load(); t != nil {
		return t
	}
	return newSmallFactorials()
}

func newSmallFactorials() *[factorialTable]factorial {
	var t [factorialTable]factorial
	primes := primesTo(firstMany)
	for n := range t {
		t[n].count = countTo(primes, uint32(n))
		for i := range t[n].count {
			t[n].exponents[i] = uint16(legendre(uint32(n), primes[i]))
		}
	}
	smallTable.Store(&t) // racing first calls store equal tables
	return &t
}

type factorial struct {
	exponents [inlinePrimes]uint16
	count     int
}

// legendre returns the exponent of the prime p in n! (Legendre's formula).
func legendre(n, p uint32) int32 {
	e := uint32(0)
	for n >= p {
		n /= p
		e += n
	}
	return int32(e)
}

// MulFactorial multiplies f by (n!)^power. It panics with *ArgumentError unless 0 <= n < 2^32 and
// |n*power| < 2^30.
func (f *Factored) MulFactorial(n, power int) {
	if n < 0 || uint64(n) > 1<<32-1 {
		panic(&ArgumentError{"rational.Factored.MulFactorial", "n", fmt.Sprint(n), "from 0 to 4294967295"})
	}
	mustPower("rational.Factored.MulFactorial", n, power)
	if n < factorialTable {
		row := &smallFactorials()[n]
		few := f.few[:row.count]
		for i, e := range row.exponents[:row.count] {
			few[i] += int32(power) * int32(e)
		}
		f.inUse = max(f.inUse, row.count)
		return
	}
	primes := primesTo(uint32(n))
	count := countTo(primes, uint32(n))
	f.grow(count)
	for i := range f.few {
		f.few[i] += int32(power) * legendre(uint32(n), primes[i])
	}
	for i := range count - inlinePrimes {
		f.many[i] += int32(power) * legendre(uint32(n), primes[inlinePrimes+i])
	}
}

// MulInt multiplies f by n^power. It panics with *ArgumentError unless 1 <= n < 2^32 and |power| < 2^25.
//
// A prime factor p of n makes the lists of primes and of exponents reach to p, which takes seconds and
// gigabytes for the largest.
func (f *Factored) MulInt(n, power int) {
	if n < 1 || uint64(n) > 1<<32-1 {
		panic(&ArgumentError{"rational.Factored.MulInt", "n", fmt.Sprint(n), "from 1 to 4294967295"})
	}
	mustPower("rational.Factored.MulInt", 32, power)
	rest := uint32(n)
	primes := primesTo(firstMany)
	for i := 0; rest > 1; i++ {
		if i == len(primes) {
			primes = primesTo(rest)
		}
		p := primes[i]
		if uint64(p)*uint64(p) > uint64(rest) { // rest is a prime
			primes = primesTo(rest)
			f.mulPrime(countTo(primes, rest)-1, power)
			return
		}
		for rest%p == 0 {
			rest /= p
			f.mulPrime(i, power)
		}
	}
}

// mustPower panics where power times the largest exponent in n! does not fit.
func mustPower(fn string, n, power int) {
	if power >= -1<<10 && power <= 1<<10 && n < 1<<20 {
		return
	}
	if p := int64(power); p <= -1<<30 || p >= 1<<30 || int64(n)*max(p, -p) >= 1<<30 {
		panic(&ArgumentError{fn, "power", fmt.Sprint(power), "powers that keep every exponent below 2^30"})
	}
}

func (f *Factored) mulPrime(i, power int) {
	if i < inlinePrimes {
		f.few[i] += int32(power)
		f.inUse = max(f.inUse, i+1)
		return
	}
	f.grow(i + 1)
	f.many[i-inlinePrimes] += int32(power)
}

// grow makes room for the exponents of the first count primes.
func (f *Factored) grow(count int) {
	f.inUse = max(f.inUse, min(count, inlinePrimes))
	if more := count - inlinePrimes - len(f.many); more > 0 {
		f.many = append(f.many, make([]int32, more)...)
	}
}

// SqrtTimes returns n*sqrt(f).
func (f *Factored) SqrtTimes(n int64) Surd {
	if n == 0 {
		return Surd{}
	}
	if len(f.many) == 0 {
		if s, ok := f.sqrtWords(n); ok {
			return s
		}
	}
	return f.SqrtTimesBig(big.NewInt(n))
}

// sqrtWords is SqrtTimes where everything fits into words; ok is false where it does not.
func (f *Factored) sqrtWords(n int64) (s Surd, ok bool) {
	num, den, rad := magnitude(n), uint64(1), uint64(1)
	var over uint64 // collects the high words; zero at the end if nothing overflowed
	primes := primesTo(firstMany)
	for i, e := range f.few[:f.inUse] {
		if e == 0 {
			continue
		}
		p := uint64(primes[i])
		if e&1 != 0 {
			rad = mulOver(rad, p, &over)
		}
		k := e >> 1 // rounds down, so that p^(-1/2) = sqrt(p)/p
		for ; k < 0; k++ {
			if num%p == 0 {
				num /= p
			} else {
				den = mulOver(den, p, &over)
			}
		}
		for ; k > 0; k-- {
			num = mulOver(num, p, &over)
		}
	}
	if over != 0 || num > maxNum {
		return Surd{}, false
	}
	return Surd{num: signed(num, n < 0), den: den, rad: rad}, true
}

// mulOver returns the low word of a*b and or-s the high one into over.
func mulOver(a, b uint64, over *uint64) uint64 {
	hi, lo := bits.Mul64(a, b)
	*over |= hi
	return lo
}

// SqrtTimesBig returns n*sqrt(f). It does not change n.
func (f *Factored) SqrtTimesBig(n *big.Int) Surd {
	if n.Sign() == 0 {
		return Surd{}
	}
	var product struct{ num, den, rad wordProduct }
	f.each(func(p uint, e int32) {
		if e&1 != 0 {
			product.rad.mul(p, 1)
		}
		if k := e >> 1; k > 0 {
			product.num.mul(p, k)
		} else if k < 0 {
			product.den.mul(p, -k)
		}
	})
	rest := new(big.Int).Set(n)
	cancel(rest, product.den.words)
	if len(product.num.words) > 0 {
		rest.Mul(rest, product.num.int())
	}
	return newSurd(rest, product.den.int(), product.rad.int())
}

// Int sets z to f, which must be an integer, and returns it. It panics with *ArgumentError where
// f has a denominator.
func (f *Factored) Int(z *big.Int) *big.Int {
	var w wordProduct
	f.each(func(p uint, e int32) {
		if e < 0 {
			panic(&ArgumentError{"rational.Factored.Int", "f", fmt.Sprintf("a fraction with %d^%d", p, e), "an integer"})
		}
		w.mul(p, e)
	})
	return z.Set(w.int())
}

// each calls do for every prime with a non-zero exponent, in ascending order.
func (f *Factored) each(do func(p uint, e int32)) {
	primes := primesTo(firstMany)
	for i, e := range f.few[:f.inUse] {
		if e != 0 {
			do(uint(primes[i]), e)
		}
	}
	if len(f.many) == 0 {
		return
	}
	primes = primeList.Load().primes[inlinePrimes:] // grow has seen to the length
	for i, e := range f.many {
		if e != 0 {
			do(uint(primes[i]), e)
		}
	}
}
