package rational

import (
	"sort"
	"sync"
	"sync/atomic"
)

// The prime list grows to the largest number asked for and is never changed in place: a reader
// loads the slice that is published, so no lock stands on the way of a symbol.
var (
	primeList  atomic.Pointer[primeTable]
	primeMutex sync.Mutex
)

type primeTable struct {
	limit  uint32 // every prime up to here is in the list
	primes []uint32
}

// primesTo returns all primes up to n, perhaps more. The slice is shared: read only.
func primesTo(n uint32) []uint32 {
	if t := primeList.Load(); t != nil && t.limit >= n {
		return t.primes
	}
	primeMutex.Lock()
	defer primeMutex.Unlock()
	t := primeList.Load()
	if t == nil || t.limit < n {
		limit := max(n, 1<<12)
		if t != nil && t.limit < 1<<31 {
			limit = max(limit, 2*t.limit) // doubling keeps the total work linear
		}
		t = &primeTable{limit, sieve(limit)}
		primeList.Store(t)
	}
	return t.primes
}

// countTo returns how many of the primes are at most n.
func countTo(primes []uint32, n uint32) int {
	return sort.Search(len(primes), func(i int) bool { return primes[i] > n })
}

// sieve returns the primes up to n >= 2 (Eratosthenes, odd numbers only).
func sieve(n uint32) []uint32 {
	half := (uint64(n) + 1) / 2 // entry i stands for 2i+1
	composite := make([]bool, half)
	for i := uint64(1); (2*i+1)*(2*i+1) <= uint64(n); i++ {
		if composite[i] {
			continue
		}
		for k := 2 * i * (i + 1); k < half; k += 2*i + 1 {
			composite[k] = true
		}
	}
	primes := []uint32{2}
	for i := uint64(1); i < half; i++ {
		if !composite[i] {
			primes = append(primes, uint32(2*i+1))
		}
	}
	return primes
}
