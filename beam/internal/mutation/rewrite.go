package mutation

import (
	_ "embed"
	"fmt"
	"go/ast"
	"go/constant"
	"go/token"
	"go/types"
	"slices"
	"strings"
)

// A Mutant is one small change to the code.
type Mutant struct {
	ID     int    // from 1, in the order of files and places
	File   string // from the root of the module
	Line   int
	In     string // the function or variable it stands in
	Before string // source, on one line
	After  string
}

func (m Mutant) String() string {
	return fmt.Sprintf("%s:%d: %s: %s -> %s", m.File, m.Line, m.In, m.Before, m.After)
}

//go:embed helpers.go.txt
var helpers string

// A site is a stretch of source that is rewritten. Sites nest.
type site struct {
	pos, end token.Pos
	inner    []*site // in order
	render   func(s *site) string
}

// A rewriter turns a package into one that holds all of its mutants.
type rewriter struct {
	*source
	mutants []Mutant

	// of the file at hand
	file    *ast.File
	text    []byte
	base    token.Pos
	open    []*site               // from the file down to the node at hand
	negated map[ast.Expr]bool     // conditions and returned booleans
	alone   map[ast.Stmt]bool     // statements of a list, which may be left out
	kept    map[ast.Expr]bool     // constants that stay: indexes, capacities, keys
	within  map[ast.Expr]ast.Node // what stands around a constant, to show it in
}

// rewrite lists the mutants of a package and gives the text of its files with
// all of them in it.
func rewrite(s *source) (mutants []Mutant, text []string) {
	r := &rewriter{source: s}
	for i, f := range s.files {
		text = append(text, r.rewriteFile(f, s.text[i]))
	}
	return r.mutants, text
}

// helperFile is the text of the functions that rewritten code calls.
func helperFile(name string, mutants int) string {
	return strings.NewReplacer("PACKAGE", name, "COUNT", fmt.Sprint(mutants)).Replace(helpers)
}

func (r *rewriter) rewriteFile(f *ast.File, text []byte) string {
	r.file, r.text, r.base = f, text, r.fset.File(f.Pos()).Pos(0)
	r.negated, r.alone, r.kept, r.within = map[ast.Expr]bool{}, map[ast.Stmt]bool{}, map[ast.Expr]bool{}, map[ast.Expr]ast.Node{}
	ast.Inspect(f, r.mark)
	whole := &site{pos: r.base, end: r.base + token.Pos(len(text))}
	r.open = []*site{whole}
	for _, d := range f.Decls {
		r.walk(d)
	}
	return r.slice(whole, whole.pos, whole.end)
}

// slice is the source between two places with the inner sites of s rewritten.
func (r *rewriter) slice(s *site, from, to token.Pos) string {
	var b strings.Builder
	at := from
	for _, in := range s.inner {
		if in.pos < from || in.end > to {
			continue
		}
		b.Write(r.text[at-r.base : in.pos-r.base])
		b.WriteString(in.render(in))
		at = in.end
	}
	b.Write(r.text[at-r.base : to-r.base])
	return b.String()
}

func (r *rewriter) node(s *site, n ast.Node) string { return r.slice(s, n.Pos(), n.End()) }

func (r *rewriter) original(n ast.Node) string {
	return plain(string(r.text[n.Pos()-r.base : n.End()-r.base]))
}

// mark notes the roles that only the parent of a node knows.
func (r *rewriter) mark(n ast.Node) bool {
	stand := func(list []ast.Stmt) {
		for _, s := range list {
			r.alone[s] = true
		}
	}
	condition := func(e ast.Expr) {
		if e != nil && !r.relation(e) {
			r.negated[e] = true
		}
	}
	switch n := n.(type) {
	case *ast.IfStmt:
		condition(n.Cond)
	case *ast.ForStmt:
		condition(n.Cond)
	case *ast.SwitchStmt:
		if n.Tag == nil {
			for _, c := range n.Body.List {
				for _, e := range c.(*ast.CaseClause).List {
					condition(e)
				}
			}
		}
	case *ast.ReturnStmt:
		for _, e := range n.Results {
			if isBool(r.info.Types[e].Type) {
				condition(e)
			}
		}
	case *ast.BlockStmt:
		stand(n.List)
	case *ast.CaseClause:
		stand(n.Body)
	case *ast.CommClause:
		stand(n.Body)
	case *ast.IndexExpr:
		r.kept[n.Index] = true
	case *ast.SliceExpr:
		r.kept[n.Low], r.kept[n.High], r.kept[n.Max] = true, true, true
	case *ast.AssignStmt:
		for _, e := range n.Rhs {
			r.within[e] = n
		}
	case *ast.KeyValueExpr:
		r.kept[n.Key] = true
		r.within[n.Value] = n
	case *ast.BinaryExpr:
		r.within[n.X], r.within[n.Y] = n, n
		if n.Op == token.SHL || n.Op == token.SHR {
			r.kept[n.X], r.kept[n.Y] = true, true
		}
	case *ast.CallExpr:
		for _, a := range n.Args {
			r.within[a] = n
		}
		if b, ok := r.used(n.Fun).(*types.Builtin); ok && b.Name() == "make" {
			for _, a := range n.Args[1:] {
				r.kept[a] = true
			}
		}
	}
	return true
}

// relation reports an expression whose own mutants hold its negation.
func (r *rewriter) relation(e ast.Expr) bool {
	switch e := ast.Unparen(e).(type) {
	case *ast.BinaryExpr:
		switch e.Op {
		case token.LSS, token.LEQ, token.GTR, token.GEQ, token.EQL, token.NEQ:
			return true
		}
	case *ast.UnaryExpr:
		return e.Op == token.NOT
	case *ast.CallExpr:
		name, _, ok := r.method(e)
		return ok && (name == "Less" || name == "AtMost") || r.isAtMost(e)
	}
	return false
}

// walk visits a node and what is in it.
func (r *rewriter) walk(root ast.Node) {
	var depth []int
	ast.Inspect(root, func(n ast.Node) bool {
		if n == nil {
			r.open = r.open[:depth[len(depth)-1]]
			depth = depth[:len(depth)-1]
			return true
		}
		before := len(r.open)
		if !r.visit(n) {
			r.open = r.open[:before]
			return false
		}
		depth = append(depth, before)
		return true
	})
}

// visit opens the sites of a node; false if nothing in it is of interest.
func (r *rewriter) visit(n ast.Node) bool {
	switch n := n.(type) {
	case *ast.GenDecl:
		return n.Tok == token.VAR
	case *ast.FuncType, *ast.StructType, *ast.InterfaceType, *ast.ArrayType, *ast.MapType:
		return false
	case *ast.LabeledStmt:
		delete(r.alone, n.Stmt)
	case ast.Stmt:
		r.statement(n)
	case ast.Expr:
		return r.expression(n)
	}
	return true
}

func (r *rewriter) enter(n ast.Node, render func(s *site) string) {
	s := &site{pos: n.Pos(), end: n.End(), render: render}
	top := r.open[len(r.open)-1]
	top.inner = append(top.inner, s)
	r.open = append(r.open, s)
}

// add lists a mutant and returns its number.
func (r *rewriter) add(n ast.Node, before, after string) int {
	p := r.fset.Position(n.Pos())
	r.mutants = append(r.mutants, Mutant{
		ID: len(r.mutants) + 1, File: r.display(p.Filename), Line: p.Line, In: enclosing(r.file, n.Pos()),
		Before: before, After: after,
	})
	return len(r.mutants)
}

// call rewrites a node into a call of a helper with the given parts of it as
// operands.
func (r *rewriter) call(n ast.Node, helper string, id int, parts ...ast.Expr) {
	r.enter(n, func(s *site) string {
		var b strings.Builder
		fmt.Fprintf(&b, "%s(%d", helper, id)
		for _, p := range parts {
			b.WriteString(", " + r.node(s, p))
		}
		return b.String() + ")"
	})
}

// whole rewrites a node into a call of a helper with all of it as operand.
func (r *rewriter) whole(n ast.Node, format string, args ...any) {
	r.enter(n, func(s *site) string {
		return fmt.Sprintf(format, append(slices.Clip(args), r.slice(s, s.pos, s.end))...)
	})
}

var opposite = map[token.Token]token.Token{
	token.ADD: token.SUB, token.SUB: token.ADD, token.MUL: token.QUO, token.QUO: token.MUL, token.REM: token.MUL,
	token.ADD_ASSIGN: token.SUB_ASSIGN, token.SUB_ASSIGN: token.ADD_ASSIGN, token.MUL_ASSIGN: token.QUO_ASSIGN, token.QUO_ASSIGN: token.MUL_ASSIGN,
	token.EQL: token.NEQ, token.NEQ: token.EQL, token.LAND: token.LOR, token.LOR: token.LAND,
	// boundaries
	token.LSS: token.LEQ, token.LEQ: token.LSS, token.GTR: token.GEQ, token.GEQ: token.GTR,
}

var negation = map[token.Token]token.Token{
	token.LSS: token.GEQ, token.LEQ: token.GTR, token.GTR: token.LEQ, token.GEQ: token.LSS,
}

var helperOf = map[token.Token]string{
	token.ADD: "mutationAdd", token.SUB: "mutationSub", token.MUL: "mutationMul", token.QUO: "mutationDiv", token.REM: "mutationRem",
	token.LSS: "mutationLess", token.LEQ: "mutationAtMost", token.GTR: "mutationMore", token.GEQ: "mutationAtLeast",
}

func (r *rewriter) statement(n ast.Stmt) {
	if !r.alone[n] {
		return
	}
	switch n := n.(type) {
	case *ast.ExprStmt:
		call, ok := ast.Unparen(n.X).(*ast.CallExpr)
		if b, builtin := r.used(callee(call)).(*types.Builtin); ok && !(builtin && b.Name() == "panic") {
			r.leaveOut(n)
		}
	case *ast.IncDecStmt:
		r.leaveOut(n)
	case *ast.AssignStmt:
		if n.Tok == token.DEFINE || !slices.ContainsFunc(n.Lhs, func(e ast.Expr) bool { return !isBlank(e) }) {
			return
		}
		r.leaveOut(n)
		if op, ok := opposite[n.Tok]; ok && isNumber(r.info.Types[n.Lhs[0]].Type) {
			x, y := n.Lhs[0], n.Rhs[0]
			id := r.add(n, r.original(n), r.original(x)+" "+op.String()+" "+r.original(y))
			r.enter(n, func(s *site) string {
				return fmt.Sprintf("if mutationOn(%d) { %s %s %s } else { %s }", id, r.node(s, x), op, r.node(s, y), r.slice(s, s.pos, s.end))
			})
		}
	}
}

func (r *rewriter) leaveOut(n ast.Stmt) {
	id := r.add(n, r.original(n), "nothing")
	r.whole(n, "if !mutationOn(%d) { %s }", id)
}

// expression opens the sites of an expression; false if it is done with.
func (r *rewriter) expression(n ast.Expr) bool {
	tv := r.info.Types[n]
	if tv.IsType() {
		return false
	}
	if r.negated[n] && isBool(tv.Type) {
		after := "!(" + r.original(n) + ")"
		if tv.Value != nil {
			after = fmt.Sprint(!constant.BoolVal(tv.Value))
		}
		id := r.add(n, r.original(n), after)
		r.whole(n, "mutationNot(%d, %s)", id)
	}
	if tv.Value != nil {
		r.constant(n, tv)
		return false
	}
	switch n := n.(type) {
	case *ast.BinaryExpr:
		r.binary(n, tv.Type)
	case *ast.UnaryExpr:
		switch {
		case n.Op == token.NOT && isBool(tv.Type):
			id := r.add(n, r.original(n), r.original(n.X))
			r.call(n, "mutationDropNot", id, n.X)
		case n.Op == token.SUB && isNumber(tv.Type):
			id := r.add(n, r.original(n), r.original(n.X))
			r.call(n, "mutationMinus", id, n.X)
		}
	case *ast.CallExpr:
		r.calls(n)
	}
	return true
}

func (r *rewriter) constant(n ast.Expr, tv types.TypeAndValue) {
	basic, ok := tv.Type.(*types.Basic)
	if !ok || r.kept[n] || basic.Info()&(types.IsInteger|types.IsFloat) == 0 || basic.Kind() == types.UntypedRune {
		return
	}
	name := basic.Name()
	if basic.Info()&types.IsUntyped != 0 {
		name = types.Default(basic).(*types.Basic).Name()
	}
	before := r.original(n)
	if call, ok := r.within[n].(*ast.CallExpr); ok && r.isFunc(call, "math", "Inf") {
		id := r.add(n, r.original(call), "math.Inf(-("+before+"))")
		r.whole(n, "mutationSign(%d, "+name+"(%s))", id)
		return
	}
	helper, after := "mutationCount", before+" + 1"
	switch value := constant.ToFloat(tv.Value); {
	case basic.Info()&types.IsInteger != 0:
		if v, exact := constant.Int64Val(tv.Value); exact {
			after = fmt.Sprint(v + 1)
		}
	case constant.Sign(value) == 0:
		helper, after = "mutationValue", "1"
	default:
		v, _ := constant.Float64Val(value)
		helper, after = "mutationValue", fmt.Sprintf("%.9g", v*1.01+1e-6)
	}
	id := r.add(n, r.around(n, before), r.around(n, after))
	r.whole(n, helper+"(%d, "+name+"(%s))", id)
}

// around shows a constant within what it stands in, if that is short.
func (r *rewriter) around(n ast.Expr, with string) string {
	outer, ok := r.within[n]
	if !ok || outer.End()-outer.Pos() > 60 {
		return with
	}
	return plain(string(r.text[outer.Pos()-r.base:n.Pos()-r.base]) + with + string(r.text[n.End()-r.base:outer.End()-r.base]))
}

func (r *rewriter) binary(n *ast.BinaryExpr, t types.Type) {
	operand := r.info.Types[n.X].Type
	if isUntyped(operand) {
		operand = r.info.Types[n.Y].Type
	}
	with := func(op token.Token) string { return r.original(n.X) + " " + op.String() + " " + r.original(n.Y) }
	switch n.Op {
	case token.LSS, token.LEQ, token.GTR, token.GEQ:
		if !isBool(t) {
			return
		}
		id := r.add(n, r.original(n), with(opposite[n.Op]))
		r.add(n, r.original(n), with(negation[n.Op]))
		r.call(n, helperOf[n.Op], id, n.X, n.Y)
	case token.EQL, token.NEQ:
		if !isBool(t) {
			return
		}
		id := r.add(n, r.original(n), with(opposite[n.Op]))
		r.whole(n, "mutationNot(%d, %s)", id)
	case token.LAND, token.LOR:
		if !isBool(t) || !isBool(r.info.Types[n.X].Type) || !isBool(r.info.Types[n.Y].Type) {
			return
		}
		// By De Morgan, so that the right side is asked only where it was, or
		// would be.
		id := r.add(n, r.original(n), with(opposite[n.Op]))
		r.enter(n, func(s *site) string {
			return fmt.Sprintf("(mutationNot(%[1]d, mutationNot(%[1]d, %[2]s) %[3]s mutationNot(%[1]d, %[4]s)))", id, r.node(s, n.X), n.Op, r.node(s, n.Y))
		})
	case token.ADD, token.SUB, token.MUL, token.QUO, token.REM:
		if !isNumber(t) || !isNumber(operand) {
			return
		}
		id := r.add(n, r.original(n), with(opposite[n.Op]))
		r.call(n, helperOf[n.Op], id, n.X, n.Y)
	}
}

// methodHelpers are the methods that have an opposite, which the type must have
// too.
var methodHelpers = map[string]struct{ opposite, helper string }{
	"Add": {"Sub", "mutationAddCall"}, "Sub": {"Add", "mutationSubCall"},
	"Mul": {"Div", "mutationMulCall"}, "Div": {"Mul", "mutationDivCall"},
	"Min": {"Max", "mutationMinCall"}, "Max": {"Min", "mutationMaxCall"},
}

func (r *rewriter) calls(n *ast.CallExpr) {
	if n.Ellipsis.IsValid() {
		return
	}
	if b, ok := r.used(n.Fun).(*types.Builtin); ok {
		other := map[string]string{"min": "max", "max": "min"}[b.Name()]
		if other == "" || len(n.Args) < 2 {
			return
		}
		id := r.add(n, r.original(n), other+strings.TrimPrefix(r.original(n), b.Name()))
		r.call(n, map[string]string{"min": "mutationMin", "max": "mutationMax"}[b.Name()], id, n.Args...)
		return
	}
	for name, other := range map[string]string{"Min": "Max", "Max": "Min"} {
		if r.isFunc(n, "math", name) {
			fun, args := r.original(n.Fun), r.original(n)[len(r.original(n.Fun)):]
			swapped := strings.TrimSuffix(fun, name) + other
			id := r.add(n, fun+args, swapped+args)
			r.enter(n, func(s *site) string {
				return fmt.Sprintf("mutationEither(%d, %s, %s)%s", id, fun, swapped, r.slice(s, n.Fun.End(), s.end))
			})
			return
		}
	}
	if r.isAtMost(n) {
		id := r.add(n, r.original(n), "!"+r.original(n.Fun)+"("+r.original(n.Args[1])+", "+r.original(n.Args[0])+")")
		r.add(n, r.original(n), "!"+r.original(n))
		r.call(n, "mutationAtMostFunc", id, append([]ast.Expr{n.Fun}, n.Args...)...)
		return
	}
	name, t, ok := r.method(n)
	if !ok {
		return
	}
	x, y := n.Fun.(*ast.SelectorExpr).X, n.Args[0]
	switch h, paired := methodHelpers[name]; {
	case name == "Less" || name == "AtMost":
		id := r.add(n, r.original(n), "!"+r.original(y)+"."+name+"("+r.original(x)+")")
		r.add(n, r.original(n), "!"+r.original(n))
		r.call(n, "mutation"+name+"Call", id, x, y)
	case paired && hasMethod(t, h.opposite):
		id := r.add(n, r.original(n), r.original(x)+"."+h.opposite+"("+r.original(y)+")")
		r.call(n, h.helper, id, x, y)
	}
}

// method gives the name and the type T of a call x.name(y) in which x and y are
// values of T, and whose result is a T or, for a relation, a bool.
func (r *rewriter) method(n *ast.CallExpr) (name string, t types.Type, ok bool) {
	sel, selector := n.Fun.(*ast.SelectorExpr)
	if !selector || len(n.Args) != 1 {
		return "", nil, false
	}
	s := r.info.Selections[sel]
	if s == nil || s.Kind() != types.MethodVal || len(s.Index()) != 1 {
		return "", nil, false
	}
	t = r.info.Types[sel.X].Type
	if _, named := t.(*types.Named); !named || !hasMethod(t, sel.Sel.Name) {
		return "", nil, false
	}
	sig := s.Obj().Type().(*types.Signature)
	_, relation := map[string]bool{"Less": true, "AtMost": true}[sel.Sel.Name]
	fits := sig.Params().Len() == 1 && sig.Results().Len() == 1 && types.Identical(sig.Params().At(0).Type(), t) &&
		(types.Identical(sig.Results().At(0).Type(), t) && !relation || isBool(sig.Results().At(0).Type()) && relation)
	return sel.Sel.Name, t, fits
}

// hasMethod reports whether a value of t has a method of that name.
func hasMethod(t types.Type, name string) bool {
	set := types.NewMethodSet(t)
	return set.Lookup(nil, name) != nil
}

// isAtMost reports a call of a function AtMost of two numbers.
func (r *rewriter) isAtMost(n *ast.CallExpr) bool {
	f, ok := r.used(n.Fun).(*types.Func)
	if !ok || f.Name() != "AtMost" || len(n.Args) != 2 {
		return false
	}
	sig := f.Type().(*types.Signature)
	return sig.Recv() == nil && sig.Results().Len() == 1 && isBool(sig.Results().At(0).Type()) && isNumber(sig.Params().At(0).Type())
}

func (r *rewriter) isFunc(n *ast.CallExpr, pkg, name string) bool {
	f, ok := r.used(n.Fun).(*types.Func)
	return ok && f.Pkg() != nil && f.Pkg().Path() == pkg && f.Name() == name && f.Type().(*types.Signature).Recv() == nil
}

// used is the object that a name stands for; nil for anything but a name.
func (r *rewriter) used(e ast.Expr) types.Object {
	switch e := ast.Unparen(e).(type) {
	case *ast.Ident:
		return r.info.Uses[e]
	case *ast.SelectorExpr:
		return r.info.Uses[e.Sel]
	}
	return nil
}

func callee(n *ast.CallExpr) ast.Expr {
	if n == nil {
		return nil
	}
	return n.Fun
}

func isBlank(e ast.Expr) bool {
	id, ok := e.(*ast.Ident)
	return ok && id.Name == "_"
}

func isBool(t types.Type) bool {
	b, ok := t.(*types.Basic)
	return ok && (b.Kind() == types.Bool || b.Kind() == types.UntypedBool)
}

func isUntyped(t types.Type) bool {
	b, ok := t.(*types.Basic)
	return ok && b.Info()&types.IsUntyped != 0
}

func isNumber(t types.Type) bool {
	if t == nil {
		return false
	}
	b, ok := t.Underlying().(*types.Basic)
	return ok && b.Info()&(types.IsInteger|types.IsFloat) != 0
}
