package main

import (
	"errors"
	"fmt"
)

// validate reports every way in which t contradicts itself.
func (t table) validate() error {
	var errs []error
	fail := func(format string, args ...any) { errs = append(errs, fmt.Errorf(format, args...)) }

	byName := map[string]quantity{}
	fields := map[string]bool{}
	unitNames := map[string]bool{}
	for _, q := range t.Quantities {
		if _, taken := byName[q.Name]; taken {
			fail("%s: the name is taken", q.Name)
		}
		byName[q.Name] = q
		if fields[q.Field] {
			fail("%s: the field %s is taken, so that a conversion between the two types would compile", q.Name, q.Field)
		}
		fields[q.Field] = true
		if len(q.Units) == 0 || q.Units[0].Num != "1" || q.Units[0].Den != "" {
			fail("%s: the first unit must be the SI unit", q.Name)
		}
		symbols := map[string]bool{}
		for _, u := range q.Units {
			if unitNames[u.Name] {
				fail("%s: the unit name %s is taken", q.Name, u.Name)
			}
			unitNames[u.Name] = true
			for _, s := range append([]string{u.Symbol}, u.Aliases...) {
				if symbols[s] {
					fail("%s: the symbol %s is taken", q.Name, s)
				}
				symbols[s] = true
			}
		}
		for _, symbol := range []string{q.SI, q.US} {
			if q.Preferred(symbol) == "" {
				fail("%s: %s is to be printed but is not among its units", q.Name, symbol)
			}
		}
	}

	for _, p := range t.Products {
		a, okA := byName[p.A]
		b, okB := byName[p.B]
		c, okC := byName[p.C]
		if !okA || !okB || p.C != "" && !okC {
			fail("%s x %s = %s: unknown quantity", p.A, p.B, p.C)
			continue
		}
		for i := range a.Dim {
			if a.Dim[i]+b.Dim[i] != c.Dim[i] {
				fail("%s x %s = %s: the dimensions do not agree", p.A, p.B, p.C)
				break
			}
		}
	}
	for _, inv := range t.Inverses {
		a, okA := byName[inv.A]
		b, okB := byName[inv.B]
		if !okA || !okB {
			fail("1/%s = %s: unknown quantity", inv.A, inv.B)
			continue
		}
		for i := range a.Dim {
			if a.Dim[i] != -b.Dim[i] {
				fail("1/%s = %s: the dimensions do not agree", inv.A, inv.B)
				break
			}
		}
	}
	for _, q := range t.Quantities {
		made := map[string]bool{}
		for _, m := range t.methods(q.Name) {
			if made[m.Name] {
				fail("%s.%s is made twice", q.Name, m.Name)
			}
			made[m.Name] = true
		}
	}
	return errors.Join(errs...)
}
