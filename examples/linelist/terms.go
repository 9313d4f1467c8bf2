package main

import (
	"strings"

	"example.org/couplet/racah/lines"
	"example.org/couplet/rational"
)

// energyBy begins the key of energies given for each value of a total.
const energyBy = "energy_by_"

// readTerms reads the energy of a level and its constants.
func readTerms(t table, l level) ([]lines.Term, error) {
	var terms []lines.Term
	for _, read := range []func(table, level) ([]lines.Term, error){readEnergy, readFineStructure, readRotation, readAtom, readMolecule} {
		more, err := read(t, l)
		if err != nil {
			return nil, err
		}
		terms = append(terms, more...)
	}
	return terms, nil
}

func readEnergy(t table, l level) ([]lines.Term, error) {
	if !t.has("energy") {
		return nil, nil
	}
	v, err := t.quantity("energy")
	return []lines.Term{lines.Offset(v)}, err
}

// readFineStructure reads the energies given for each value of a total.
func readFineStructure(t table, l level) ([]lines.Term, error) {
	var terms []lines.Term
	for _, key := range t.keys() {
		total, ok := strings.CutPrefix(key, energyBy)
		if !ok {
			continue
		}
		by, err := t.table(key)
		if err != nil {
			return nil, err
		}
		term := lines.FineStructure{Total: total, Energy: make(map[rational.Half]float64)}
		taken := make(map[rational.Half]bool)
		var values []string
		for s := range l.States() {
			if x := s.Number(total); !taken[x] {
				taken[x] = true
				values = append(values, x.String())
			}
		}
		allowed := "energies for " + total + " = " + strings.Join(values, ", ") + ", each once"
		for _, k := range by.keys() {
			x, err := rational.ParseHalf(k)
			if _, twice := term.Energy[x]; err != nil || !taken[x] || twice {
				return nil, by.fail(k, allowed)
			}
			if term.Energy[x], err = by.quantity(k); err != nil {
				return nil, err
			}
		}
		for _, x := range values {
			h, _ := rational.ParseHalf(x)
			if _, ok := term.Energy[h]; !ok {
				return nil, by.failValue(x, "missing", allowed)
			}
		}
		terms = append(terms, term)
	}
	return terms, nil
}

// mustRotate returns an error for a constant of a molecule in a coupling that has no rotation.
func mustRotate(t table, l level, key string) error {
	if first := l.Coupling().Names()[0]; first != "J" && first != "N" {
		return t.fail(key, "only where the first number of the coupling is J or N, not "+first)
	}
	return nil
}

func readRotation(t table, l level) ([]lines.Term, error) {
	var r lines.Rotation
	for _, c := range []struct {
		key   string
		value *float64
	}{{"B_rot", &r.B}, {"D_rot", &r.D}} {
		if !t.has(c.key) {
			continue
		}
		err := mustRotate(t, l, c.key)
		if err == nil {
			*c.value, err = t.quantity(c.key)
		}
		if err != nil {
			return nil, err
		}
	}
	if !t.has("B_rot") && t.has("D_rot") {
		return nil, t.fail("D_rot", "only beside B_rot")
	}
	return []lines.Term{r}, nil
}

// nuclei returns the names of the nuclear spins in the coupling.
func nuclei(l level) []string {
	var list []string
	for _, name := range l.Coupling().Spectators() {
		if strings.HasPrefix(name, "I") {
			list = append(list, name)
		}
	}
	return list
}

// perNucleus calls set with the constant of every nucleus that has one: all from a string, where there
// is one nucleus, or from a table by names.
func perNucleus(t table, l level, key string, set func(at table, key, nucleus string, v float64) error) error {
	if !t.has(key) {
		return nil
	}
	names := nuclei(l)
	if len(names) == 0 {
		return t.fail(key, "only where the coupling has a nuclear spin, whose name begins with I")
	}
	if _, ok := t.values[key].(map[string]any); !ok {
		if len(names) > 1 {
			return t.fail(key, "one constant by nucleus: { "+names[0]+` = "..." }, for `+strings.Join(names, ", "))
		}
		v, err := t.quantity(key)
		if err != nil {
			return err
		}
		return set(t, key, names[0], v)
	}
	by, err := t.table(key)
	if err != nil {
		return err
	}
	if err := by.only(names...); err != nil {
		return err
	}
	for _, name := range by.keys() {
		v, err := by.quantity(name)
		if err != nil {
			return err
		}
		if err := set(by, name, name, v); err != nil {
			return err
		}
	}
	return nil
}

// hasQuadrupole returns an error where a momentum is too small for a quadrupole interaction.
func hasQuadrupole(at table, key, name string, value rational.Half) error {
	if value.Twice() < 2 {
		return at.fail(key, "no quadrupole constant for "+name+" = "+value.String()+", only for 1 and above")
	}
	return nil
}

// readAtom reads A_hfs and B_hfs. They belong to one J, the number to which the nucleus couples.
func readAtom(t table, l level) ([]lines.Term, error) {
	atoms := make(map[string]lines.AtomicNucleus)
	for _, key := range []string{"A_hfs", "B_hfs"} {
		err := perNucleus(t, l, key, func(at table, atKey, nucleus string, v float64) error {
			j, ok := joined(l, nucleus)
			if !ok {
				return at.fail(atKey, "only where numbers fix "+j)
			}
			n := atoms[nucleus]
			n.Spin = nucleus
			if key == "A_hfs" {
				n.A = v
			} else {
				n.B = v
				if err := hasQuadrupole(at, atKey, nucleus, l.numbers[nucleus]); err != nil {
					return err
				}
				if err := hasQuadrupole(at, atKey, j, l.numbers[j]); err != nil {
					return err
				}
			}
			atoms[nucleus] = n
			return nil
		})
		if err != nil {
			return nil, err
		}
	}
	var terms []lines.Term
	for _, name := range nuclei(l) {
		if n, ok := atoms[name]; ok {
			terms = append(terms, n)
		}
	}
	return terms, nil
}

// joined returns the name of the number to which a nucleus couples, and whether it is fixed.
func joined(l level, nucleus string) (string, bool) {
	names := l.Coupling().Names()
	for i, name := range names {
		if name == nucleus {
			_, ok := l.numbers[names[i-1]]
			return names[i-1], ok
		}
	}
	return "", false
}

// readMolecule reads eqQ and C_I.
func readMolecule(t table, l level) ([]lines.Term, error) {
	var terms []lines.Term
	for _, key := range []string{"eqQ", "C_I"} {
		err := perNucleus(t, l, key, func(at table, atKey, nucleus string, v float64) error {
			if err := mustRotate(at, l, atKey); err != nil {
				return err
			}
			if key == "C_I" {
				terms = append(terms, lines.MolecularNucleus{Spin: nucleus, CI: v})
				return nil
			}
			terms = append(terms, lines.MolecularNucleus{Spin: nucleus, EqQ: v})
			return hasQuadrupole(at, atKey, nucleus, l.numbers[nucleus])
		})
		if err != nil {
			return nil, err
		}
	}
	return terms, nil
}
