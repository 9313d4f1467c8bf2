package wigner

// Fallbacks returns how many values only the exact route could round, and starts counting again.
func Fallbacks() int64 { return fallbacks.Swap(0) }
