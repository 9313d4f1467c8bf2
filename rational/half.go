package rational

import (
	"cmp"
	"math"
	"strconv"
	"strings"
)

// Half is an integer or half of an odd integer: the value of a quantum number j or m. The zero
// value is 0. Halves are comparable with == and usable as map keys, and they work with
// [flag.TextVar] and encoding/json through their text methods.
//
// A Half is four bytes wide and holds twice its value as an int32, so |h| <= 2147483647/2
// (2^31-1 halves). A constructor or sum that leaves that range panics with *ArgumentError; nothing
// wraps around.
type Half struct{ twice int32 }

// The range is symmetric so that Neg and Abs cannot overflow.
const maxTwice = math.MaxInt32

func checkedHalf(fn, arg string, twice int64) Half {
	if twice < -maxTwice || twice > maxTwice {
		panic(&ArgumentError{fn, arg, strconv.FormatInt(twice, 10) + "/2", "from -2147483647/2 to 2147483647/2"})
	}
	return Half{int32(twice)}
}

// Int returns n as a Half. It panics with *ArgumentError for |n| > 1073741823.
func Int(n int) Half {
	if n > maxTwice/2 || n < -maxTwice/2 {
		panic(&ArgumentError{"rational.Int", "n", strconv.Itoa(n), "from -1073741823 to 1073741823"})
	}
	return Half{int32(2 * n)}
}

// Halves returns n/2: Halves(3) is 3/2. It panics with *ArgumentError for |n| > 2147483647.
func Halves(n int) Half { return checkedHalf("rational.Halves", "n/2", int64(n)) }

// Twice returns 2h.
func (h Half) Twice() int { return int(h.twice) }

// IsInt reports whether h is an integer.
func (h Half) IsInt() bool { return h.twice&1 == 0 }

// Float64 returns h, which a float64 holds exactly.
func (h Half) Float64() float64 { return float64(h.twice) / 2 }

// Add returns h + k. It panics with *ArgumentError where the sum leaves the range of Half.
func (h Half) Add(k Half) Half {
	return checkedHalf("rational.Half.Add", "h+k", int64(h.twice)+int64(k.twice))
}

// Sub returns h - k. It panics with *ArgumentError where the difference leaves the range of Half.
func (h Half) Sub(k Half) Half {
	return checkedHalf("rational.Half.Sub", "h-k", int64(h.twice)-int64(k.twice))
}

// Neg returns -h.
func (h Half) Neg() Half { return Half{-h.twice} }

// Abs returns |h|.
func (h Half) Abs() Half { return Half{max(h.twice, -h.twice)} }

// Cmp returns -1, 0 or +1 as h is less than, equal to or greater than k.
func (h Half) Cmp(k Half) int { return cmp.Compare(h.twice, k.twice) }

// Surd returns h as a Surd.
func (h Half) Surd() Surd { return Ratio(int64(h.twice), 2) }

// String returns h as "2" or "-3/2".
func (h Half) String() string {
	if h.IsInt() {
		return strconv.Itoa(int(h.twice / 2))
	}
	return strconv.Itoa(int(h.twice)) + "/2"
}

// LaTeX returns h as "2" or "-\frac{3}{2}".
func (h Half) LaTeX() string {
	if h.IsInt() {
		return h.String()
	}
	s := `\frac{` + strconv.Itoa(int(h.Abs().twice)) + `}{2}`
	if h.twice < 0 {
		s = "-" + s
	}
	return s
}

// MarshalText returns the text of [Half.String].
func (h Half) MarshalText() ([]byte, error) { return []byte(h.String()), nil }

// UnmarshalText reads what [ParseHalf] reads.
func (h *Half) UnmarshalText(text []byte) error {
	v, err := ParseHalf(string(text))
	if err == nil {
		*h = v
	}
	return err
}

// ParseHalf reads an integer ("2", "-1"), a fraction over 2 ("-3/2") or a decimal that ends in .0
// or .5 ("2.5"), with an optional sign and nothing else. The error is a *[ParseError].
func ParseHalf(s string) (Half, error) {
	const allowed = "an integer or a half, as 2, -3/2 or 2.5, at most 2147483647/2"
	digits, twice := s, int64(2)
	half := int64(0)
	if d, ok := strings.CutSuffix(s, "/2"); ok {
		digits, twice = d, 1
	} else if d, ok := strings.CutSuffix(s, ".5"); ok {
		digits, half = d, 1
	} else if d, ok := strings.CutSuffix(s, ".0"); ok {
		digits = d
	}
	n, err := strconv.ParseInt(digits, 10, 32)
	if err != nil {
		return Half{}, &ParseError{"rational.ParseHalf", s, 0, allowed}
	}
	if digits[0] == '-' {
		half = -half
	}
	v := twice*n + half
	if v < -maxTwice || v > maxTwice {
		return Half{}, &ParseError{"rational.ParseHalf", s, 0, allowed}
	}
	return Half{int32(v)}, nil
}
