package binsum

import (
	"iter"
	"math/big"
)

// Magnitudes yields the |t(k)|, each multiplied together by math/big: slow, and independent of the
// evaluators, for tests and for whoever wants to look at the terms.
func (s *Sum) Magnitudes() iter.Seq[*big.Int] {
	return func(yield func(*big.Int) bool) {
		for k := range s.Terms {
			term := big.NewInt(1)
			for _, f := range s.Factors[:s.Count] {
				top, low := f.Top, f.Low
				switch f.Move {
				case LowUp:
					low += k
				case LowDown:
					low -= k
				case TopUp:
					top += k
				}
				term.Mul(term, new(big.Int).Binomial(int64(top), int64(low)))
			}
			if !yield(term) {
				return
			}
		}
	}
}
