package main

import (
	"errors"
	"math"
	"strconv"
	"strings"

	"gonum.org/v1/gonum/unit/constant"

	"example.org/couplet/rational"
)

// units holds what a unit is in MHz; a wave number times the speed of light is a frequency.
var units = map[string]float64{
	"Hz":   1e-6,
	"kHz":  1e-3,
	"MHz":  1,
	"GHz":  1e3,
	"THz":  1e6,
	"cm-1": float64(constant.LightSpeedInVacuum) * 1e2 / 1e6,
}

const quantityAllowed = `a string of a number, a space and a unit (Hz, kHz, MHz, GHz, THz, cm-1), as "3417.34 MHz", up to 1e18 MHz`

// maxQuantity keeps all that is computed from quantities and numbers finite.
const maxQuantity = 1e18

// quantity returns an energy or a frequency in MHz.
func (t table) quantity(key string) (float64, error) {
	text, ok := t.values[key].(string)
	if !ok {
		return 0, t.fail(key, quantityAllowed)
	}
	v, err := parseQuantity(text)
	if err != nil {
		return 0, t.fail(key, quantityAllowed)
	}
	return v, nil
}

var errQuantity = errors.New("not a quantity")

func parseQuantity(text string) (float64, error) {
	fields := strings.Fields(text)
	if len(fields) != 2 || strings.Trim(fields[0], "+-.0123456789eE") != "" { // Go reads more: 0x1p4, 1_0, inf
		return 0, errQuantity
	}
	factor, ok := units[fields[1]]
	number, err := strconv.ParseFloat(fields[0], 64)
	if v := number * factor; ok && err == nil && math.Abs(v) <= maxQuantity {
		return v, nil
	}
	return 0, errQuantity
}

// maxNumber bounds the quantum numbers, and with them the time a file can take.
const maxNumber = 10000

// half returns a quantum number, written as an integer, a decimal or a string.
func (t table) half(key string) (rational.Half, error) {
	text := ""
	switch v := t.values[key].(type) {
	case string:
		text = v
	case int64:
		text = strconv.FormatInt(v, 10)
	case float64:
		text = strconv.FormatFloat(v, 'f', -1, 64)
	}
	h, err := rational.ParseHalf(text)
	if err != nil || h.Twice() < 0 || h.Cmp(rational.Int(maxNumber)) > 0 {
		return rational.Half{}, t.fail(key, `an integer or half-integer from 0 to 10000, as 2, 1.5 or "3/2"`)
	}
	return h, nil
}
