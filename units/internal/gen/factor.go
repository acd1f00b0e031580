package main

import (
	"fmt"
	"go/constant"
	"go/token"
	"go/types"
	"math/big"
)

// factors returns a function that writes the factor of a unit exactly: as a
// decimal, or where it has none as the quotient of two. Expressions are
// evaluated as the compiler evaluates constants, without rounding.
func (t table) factors() (func(unit) (string, error), error) {
	pkg := types.NewPackage("factors", "factors")
	eval := func(expr string) (constant.Value, error) {
		tv, err := types.Eval(token.NewFileSet(), pkg, token.NoPos, expr)
		if err != nil {
			return nil, err
		}
		return constant.ToFloat(tv.Value), nil
	}
	for _, b := range t.Bases {
		v, err := eval(b.Value)
		if err != nil {
			return nil, fmt.Errorf("%s: %w", b.Name, err)
		}
		pkg.Scope().Insert(types.NewConst(token.NoPos, pkg, b.Name, types.Typ[types.UntypedFloat], v))
	}
	text := func(expr string) (string, bool, error) {
		v, err := eval(expr)
		if err != nil {
			return "", false, err
		}
		s, ok := decimalText(v)
		return s, ok, nil
	}
	return func(u unit) (string, error) {
		if s, ok, err := text(u.Expr()); ok || err != nil {
			return s, err
		}
		num, okNum, err := text(u.Num)
		if err != nil {
			return "", err
		}
		den, okDen, err := text(u.Den)
		if err != nil {
			return "", err
		}
		if !okNum || !okDen {
			return "", fmt.Errorf("%s is not a quotient of decimals", u.Expr())
		}
		return num + "/" + den, nil
	}, nil
}

// decimalText writes v as a decimal, if it has a finite one.
func decimalText(v constant.Value) (string, bool) {
	r, ok := new(big.Rat).SetString(v.ExactString())
	if !ok {
		return "", false
	}
	digits, exact := r.FloatPrec()
	if !exact {
		return "", false
	}
	return r.FloatString(digits), true
}
