package verify

import (
	"math"
	"math/big"
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
