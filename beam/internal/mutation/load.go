package mutation

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"go/ast"
	"go/importer"
	"go/parser"
	"go/token"
	"go/types"
	"io"
	"os"
	"os/exec"
	"path/filepath"
	"slices"
	"strings"
)

// source is a package as it stands: parsed, type-checked, and as bytes.
type source struct {
	path string // import path
	dir  string
	root string // of the module
	name string

	fset  *token.FileSet
	files []*ast.File
	names []string // absolute, one a file
	text  [][]byte
	info  *types.Info
}

// listed is what the go command says of a package.
type listed struct {
	ImportPath string
	Dir        string
	Name       string
	Export     string
	GoFiles    []string
	DepOnly    bool
	Module     *struct{ Dir string }
}

// load reads one package, named as for the go command from a directory.
func load(dir, pattern string) (*source, error) {
	list, err := goList(dir, pattern)
	if err != nil {
		return nil, err
	}
	exports := map[string]string{}
	var target *listed
	for i := range list {
		exports[list[i].ImportPath] = list[i].Export
		if list[i].DepOnly {
			continue
		}
		if target != nil {
			return nil, fmt.Errorf("%s names more than one package", pattern)
		}
		target = &list[i]
	}
	if target == nil || len(target.GoFiles) == 0 {
		return nil, fmt.Errorf("%s names no package with Go files", pattern)
	}
	s := &source{path: target.ImportPath, dir: target.Dir, root: target.Dir, name: target.Name, fset: token.NewFileSet()}
	if target.Module != nil {
		s.root = target.Module.Dir
	}
	for _, name := range target.GoFiles {
		name = filepath.Join(target.Dir, name)
		text, err := os.ReadFile(name)
		if err != nil {
			return nil, err
		}
		f, err := parser.ParseFile(s.fset, name, text, parser.SkipObjectResolution)
		if err != nil {
			return nil, err
		}
		s.names, s.text, s.files = append(s.names, name), append(s.text, text), append(s.files, f)
	}
	lookup := func(path string) (io.ReadCloser, error) {
		file, ok := exports[path]
		if !ok || file == "" {
			return nil, fmt.Errorf("no export data of %s", path)
		}
		return os.Open(file)
	}
	s.info = &types.Info{
		Types:      map[ast.Expr]types.TypeAndValue{},
		Uses:       map[*ast.Ident]types.Object{},
		Selections: map[*ast.SelectorExpr]*types.Selection{},
	}
	config := types.Config{Importer: importer.ForCompiler(s.fset, "gc", lookup)}
	if _, err := config.Check(s.path, s.fset, s.files, s.info); err != nil {
		return nil, fmt.Errorf("type-checking %s: %w", s.path, err)
	}
	return s, nil
}

func goList(dir, pattern string) ([]listed, error) {
	cmd := exec.Command("go", "list", "-export", "-deps", "-json=ImportPath,Dir,Name,Export,GoFiles,DepOnly,Module", "--", pattern)
	cmd.Dir = dir
	var stderr bytes.Buffer
	cmd.Stderr = &stderr
	out, err := cmd.Output()
	if err != nil {
		return nil, fmt.Errorf("go list %s: %w\n%s", pattern, err, stderr.Bytes())
	}
	var list []listed
	for d := json.NewDecoder(bytes.NewReader(out)); ; {
		var l listed
		err := d.Decode(&l)
		if errors.Is(err, io.EOF) {
			return list, nil
		}
		if err != nil {
			return nil, fmt.Errorf("go list %s: %w", pattern, err)
		}
		list = append(list, l)
	}
}

// display is the name of a file for people: from the root of the module.
func (s *source) display(file string) string {
	rel, err := filepath.Rel(s.root, file)
	if err != nil {
		return file
	}
	return filepath.ToSlash(rel)
}

// plain puts source text on one line.
func plain(text string) string { return strings.Join(strings.Fields(text), " ") }

// enclosing names the function or variable that a place stands in.
func enclosing(f *ast.File, pos token.Pos) string {
	i := slices.IndexFunc(f.Decls, func(d ast.Decl) bool { return d.Pos() <= pos && pos < d.End() })
	if i < 0 {
		return ""
	}
	switch d := f.Decls[i].(type) {
	case *ast.FuncDecl:
		if d.Recv == nil || len(d.Recv.List) == 0 {
			return d.Name.Name
		}
		return receiver(d.Recv.List[0].Type) + "." + d.Name.Name
	case *ast.GenDecl:
		for _, spec := range d.Specs {
			if v, ok := spec.(*ast.ValueSpec); ok && v.Pos() <= pos && pos < v.End() {
				return v.Names[0].Name
			}
		}
	}
	return ""
}

func receiver(e ast.Expr) string {
	switch e := e.(type) {
	case *ast.StarExpr:
		return receiver(e.X)
	case *ast.IndexExpr:
		return receiver(e.X)
	case *ast.IndexListExpr:
		return receiver(e.X)
	case *ast.Ident:
		return e.Name
	}
	return ""
}
