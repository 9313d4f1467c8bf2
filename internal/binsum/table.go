package binsum

import (
	"math/bits"
	"sync/atomic"
)

// tableTops bounds the tops of the binomials in the table.
const tableTops = 189

// oneWordTop is the last row of binomials that fit into a word each: C(67, 33) < 2^64.
const oneWordTop = 67

// pascal holds C(top, low) modulo 2^192, in three words, at index place(top, low).
type pascal struct {
	low, high, third [tableTops * tableTops]uint64
}

var pascalTable atomic.Pointer[pascal]

// binomials returns the table, which is built on the first call. A hot loop passes here: this is one
// load where sync.OnceValue makes two calls.
func binomials() *pascal {
	if t := pascalTable.Load(); t != nil {
		return t
	}
	return newPascal()
}

func newPascal() *pascal {
	t := new(pascal)
	for top := range tableTops {
		t.low[place(top, 0)] = 1
		for k := 1; k <= top; k++ {
			a, b := place(top-1, k-1), place(top-1, k)
			sum, carry := bits.Add64(t.low[a], t.low[b], 0)
			t.low[place(top, k)] = sum
			sum, carry = bits.Add64(t.high[a], t.high[b], carry)
			t.high[place(top, k)] = sum
			t.third[place(top, k)] = t.third[a] + t.third[b] + carry
		}
	}
	pascalTable.Store(t) // racing first calls store equal tables
	return t
}

func place(top, low int) int { return top*tableTops + low }
