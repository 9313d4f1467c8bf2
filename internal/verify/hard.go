package verify

import (
	"math"
	"math/big"
	"slices"
	"sort"

	"example.org/couplet/internal/dd"
)

// Hardness returns how close a number in normal form lies to a float64 or to the middle between two, in units
// of half the last place. Numbers that are one or the other, as far as can be told, count as 1.
func Hardness(p dd.Pair) float64 {
	half := (math.Nextafter(math.Abs(p.Hi), math.Inf(1)) - math.Abs(p.Hi)) / 2
	t := math.Abs(p.Lo) / half
	if t = min(t, math.Abs(1-t)); t < 0x1p-44 {
		return 1
	}
	return t
}

// AlikeBits returns how many bits of x, after the 53 of a float64 and the one that decides the rounding, are
// alike.
func AlikeBits(x *big.Float) int {
	mantissa := new(big.Float).SetMantExp(x, 54-x.MantExp(nil)) // 53 bits and the one that decides, as an integer
	whole, _ := mantissa.Int(nil)
	rest := new(big.Float).SetPrec(300).Sub(mantissa, new(big.Float).SetPrec(300).SetInt(whole))
	rest.Abs(rest)
	if f, _ := rest.Float64(); f > 0.5 {
		rest.Sub(big.NewFloat(1).SetPrec(300), rest)
	}
	return -rest.MantExp(nil)
}

// Hardest keeps the 40 hardest cases.
type Hardest struct {
	hardness []float64 // ascending
	texts    []string
}

const kept = 40

// Wants reports whether a case of this hardness belongs to the hardest so far.
func (h *Hardest) Wants(hardness float64) bool {
	return len(h.texts) < kept || hardness < h.hardness[kept-1]
}

// Add adds a case, unless it is there already.
func (h *Hardest) Add(hardness float64, text string) {
	// An image of a symbol has the same value, and the same hardness but for the errors of double-double.
	const same = 0x1p-40
	i := sort.SearchFloat64s(h.hardness, hardness)
	if i < len(h.hardness) && h.hardness[i] < hardness+same || i > 0 && h.hardness[i-1] > hardness-same {
		return
	}
	h.hardness = append(h.hardness[:i:i], append([]float64{hardness}, h.hardness[i:]...)...)
	h.texts = append(h.texts[:i:i], append([]string{text}, h.texts[i:]...)...)
	if len(h.texts) > kept {
		h.hardness, h.texts = h.hardness[:kept], h.texts[:kept]
	}
}

// Texts returns the cases, the hardest first.
func (h *Hardest) Texts() []string { return h.texts }

// NearOdd calls do for numbers q between low and high for which q*kappa is within 2^-bits of an odd integer: for
// the denominators in the continued fraction of kappa, and their multiples.
func NearOdd(kappa *big.Float, low, high int64, bits uint, do func(q int64)) {
	const fraction = 100 // bits of kappa after the point that are used
	scaled, _ := new(big.Float).SetMantExp(kappa, fraction).Int(nil)
	one := new(big.Int).Lsh(big.NewInt(1), fraction)
	most := new(big.Int).Rsh(one, bits)
	// Euclid's algorithm: q kappa is r/one away from an integer, on alternating sides.
	r0, r1 := new(big.Int).Set(one), new(big.Int).Mod(scaled, one)
	q0, q1 := int64(0), int64(1)
	quotient, product := new(big.Int), new(big.Int)
	for q1 <= high && r1.Sign() > 0 {
		if r1.Cmp(most) < 0 {
			multiples := high / q1
			if n := quotient.Quo(most, r1); n.IsInt64() {
				multiples = min(multiples, n.Int64())
			}
			for t := max(1, (low+q1-1)/q1); t <= multiples; t++ {
				product.Mul(scaled, big.NewInt(t*q1))
				product.Add(product, quotient.Rsh(one, 1)) // to round
				if product.Rsh(product, fraction).Bit(0) == 1 {
					do(t * q1)
				}
			}
		}
		quotient.QuoRem(r0, r1, product)
		r0, r1, product = r1, product, r0
		if !quotient.IsInt64() || quotient.Int64() > (high-q0)/q1 {
			return
		}
		q0, q1 = q1, q0+quotient.Int64()*q1
	}
}

// Closest keeps the 40 cases with the most bits alike.
type Closest struct{ cases []closeCase }

type closeCase struct {
	bits int
	line string
}

// Add adds a case, unless it is there already or 40 are closer.
func (c *Closest) Add(bits int, line string) {
	added := closeCase{bits, line}
	if slices.Contains(c.cases, added) {
		return
	}
	c.cases = append(c.cases, added)
	slices.SortStableFunc(c.cases, func(a, b closeCase) int { return b.bits - a.bits })
	c.cases = c.cases[:min(len(c.cases), kept)]
}

// Lines returns the cases, the closest first.
func (c *Closest) Lines() (lines []string) {
	for _, q := range c.cases {
		lines = append(lines, q.line)
	}
	return lines
}
