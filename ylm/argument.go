package ylm

import (
	"math"
	"strconv"

	"example.org/couplet/rational"
)

// checkDegree panics for negative l.
func checkDegree(fn, name string, l int) {
	if l < 0 {
		panic(&rational.ArgumentError{Func: fn, Arg: name, Value: strconv.Itoa(l), Allowed: "an integer >= 0"})
	}
}

// checkMomentum panics for an l that is negative or that no rational.Half can hold.
func checkMomentum(fn, name string, l int) {
	if l < 0 || l > math.MaxInt32/2 {
		panic(&rational.ArgumentError{Func: fn, Arg: name, Value: strconv.Itoa(l),
			Allowed: "an integer from 0 to 1073741823"})
	}
}
