package project_test

import (
	"flag"
	"fmt"
	"go/ast"
	"go/doc"
	"go/parser"
	"go/printer"
	"go/token"
	"io/fs"
	"os"
	"path"
	"path/filepath"
	"regexp"
	"slices"
	"strings"
	"testing"

	"example.org/couplet/internal/published"
)

var update = flag.Bool("update", false, "rewrite the listing of exported names in testdata/api.txt")

const modulePath = "example.org/couplet"

// publicPackages returns the parsed packages of the module that others can import, by import path.
func publicPackages(t *testing.T, root string) map[string]*doc.Package {
	t.Helper()
	packages := map[string]*doc.Package{}
	err := filepath.WalkDir(root, func(dir string, entry fs.DirEntry, err error) error {
		if err != nil || !entry.IsDir() {
			return err
		}
		if name := entry.Name(); dir != root && (name == "internal" || name == "examples" || name == "testdata" || strings.HasPrefix(name, ".")) {
			return fs.SkipDir
		}
		fset := token.NewFileSet()
		var files []*ast.File
		names, err := filepath.Glob(filepath.Join(dir, "*.go"))
		if err != nil {
			return err
		}
		for _, name := range names {
			if strings.HasSuffix(name, "_test.go") {
				continue
			}
			f, err := parser.ParseFile(fset, name, nil, parser.ParseComments)
			if err != nil {
				return err
			}
			files = append(files, f)
		}
		if len(files) == 0 {
			return nil
		}
		relative, err := filepath.Rel(root, dir)
		if err != nil {
			return err
		}
		importPath := path.Join(modulePath, filepath.ToSlash(relative))
		p, err := doc.NewFromFiles(fset, files, importPath)
		packages[importPath] = p
		return err
	})
	if err != nil {
		t.Fatal(err)
	}
	return packages
}

// source prints a declaration on one line, without comments and function bodies.
func source(node any) string {
	if f, ok := node.(*ast.FuncDecl); ok {
		bare := *f
		bare.Body, bare.Doc = nil, nil
		node = &bare
	}
	var b strings.Builder
	if err := printer.Fprint(&b, token.NewFileSet(), node); err != nil {
		panic(err)
	}
	return strings.Join(strings.Fields(b.String()), " ")
}

// listing returns a line for each exported name, and the names that have no documentation.
func listing(p *doc.Package) (lines, bare []string) {
	note := func(kind, name, text, documentation string) {
		lines = append(lines, fmt.Sprintf("%s: %s %s", p.ImportPath, kind, text))
		if strings.TrimSpace(documentation) == "" {
			bare = append(bare, p.ImportPath+"."+name)
		}
	}
	if p.Doc == "" {
		bare = append(bare, p.ImportPath)
	}
	values := func(list []*doc.Value) {
		for _, v := range list {
			for _, spec := range v.Decl.Specs {
				s := spec.(*ast.ValueSpec)
				for _, name := range s.Names {
					if name.IsExported() {
						note(v.Decl.Tok.String(), name.Name, name.Name, v.Doc+s.Doc.Text()+s.Comment.Text())
					}
				}
			}
		}
	}
	functions := func(list []*doc.Func) {
		for _, f := range list {
			note("func", f.Name, strings.TrimPrefix(source(f.Decl), "func "), f.Doc)
		}
	}
	values(p.Consts)
	values(p.Vars)
	functions(p.Funcs)
	for _, ty := range p.Types {
		spec := ty.Decl.Specs[0].(*ast.TypeSpec)
		text := ty.Name + " " + source(spec.Type)
		if s, ok := spec.Type.(*ast.StructType); ok {
			text = ty.Name + " struct"
			for _, field := range s.Fields.List {
				for _, name := range field.Names {
					if name.IsExported() {
						note("field", ty.Name+"."+name.Name, ty.Name+"."+name.Name+" "+source(field.Type), ty.Doc)
					}
				}
			}
		}
		note("type", ty.Name, text, ty.Doc)
		values(ty.Consts)
		values(ty.Vars)
		functions(ty.Funcs)
		functions(ty.Methods)
	}
	return lines, bare
}

// The exported names are a promise: a change must be made in the listing too, with
//
//	go test ./internal/project -run ExportedNames -update
func TestExportedNames(t *testing.T) {
	root := published.Root(t)
	var lines, bare []string
	for _, p := range publicPackages(t, root) {
		l, b := listing(p)
		lines, bare = append(lines, l...), append(bare, b...)
	}
	slices.Sort(lines)
	got := "# Exported names of the module; go test ./internal/project -run ExportedNames -update rewrites this file.\n" +
		strings.Join(lines, "\n") + "\n"
	name := filepath.Join(root, "testdata", "api.txt")
	if *update {
		if err := os.WriteFile(name, []byte(got), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	want, err := os.ReadFile(name)
	if err != nil {
		t.Fatal(err)
	}
	if got != string(want) {
		wanted := strings.Split(string(want), "\n")
		for _, line := range lines {
			if !slices.Contains(wanted, line) {
				t.Errorf("not in testdata/api.txt: %s", line)
			}
		}
		for _, line := range wanted {
			if line != "" && !strings.HasPrefix(line, "#") && !slices.Contains(lines, line) {
				t.Errorf("gone from the code: %s", line)
			}
		}
	}
	for _, b := range bare {
		t.Errorf("%s has no documentation", b)
	}
}

// The top folder holds what DEVELOPERS.md lists.
func TestTopFolder(t *testing.T) {
	allowed := regexp.MustCompile(`^(rational|wigner|racah|ylm|internal|examples|testdata|go\.mod|go\.sum|go\.work|go\.work\.sum|README\.md|DEVELOPERS\.md|CHANGELOG\.md|LICENSE|\..*)$`)
	entries, err := os.ReadDir(published.Root(t))
	if err != nil {
		t.Fatal(err)
	}
	for _, e := range entries {
		if !allowed.MatchString(e.Name()) {
			t.Errorf("%s stands at the top", e.Name())
		}
	}
}
