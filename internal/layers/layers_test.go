// Package layers keeps the direction of the imports: data moves from units through properties and
// correlations to surfaces, and from there to the solvers, never back.
package layers

import (
	"go/parser"
	"go/token"
	"io/fs"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
)

const module = "example.com/coolward"

// allowed lists, for each folder of the root module, the folders of it that its code may import. A
// pattern that ends in / stands for everything below. The root package may import all of them.
var allowed = []struct {
	folder  string
	imports []string
}{
	{"internal/", []string{"internal/"}},
	{"units/unitstest", []string{"units"}},
	{"units/", []string{"units", "units/", "internal/"}},
	{"units", []string{"internal/"}},
	{"props/", []string{"units", "units/", "props", "internal/"}},
	{"props", []string{"units", "internal/"}},
	{"correlations/surface", []string{"units", "units/", "props", "correlations", "internal/"}},
	{"correlations", []string{"units", "internal/"}},
	{"lumped", []string{"units", "units/", "internal/"}},
	{"series", []string{"units", "units/", "internal/"}},
	{"fdm", []string{"units", "units/", "internal/"}},
}

// libraries are what code and tests of the root module may import besides the standard library.
var libraries = []string{"gonum.org/v1/gonum/", "github.com/google/go-cmp/", "github.com/stretchr/testify/"}

func TestImports(t *testing.T) {
	root := filepath.Join("..", "..")
	seen := map[string]bool{}
	err := filepath.WalkDir(root, func(path string, d fs.DirEntry, err error) error {
		if err != nil {
			return err
		}
		name := d.Name()
		if d.IsDir() {
			if path != root && (strings.HasPrefix(name, ".") || name == "testdata" || name == "examples") {
				return filepath.SkipDir
			}
			return nil
		}
		if !strings.HasSuffix(name, ".go") {
			return nil
		}
		folder, err := filepath.Rel(root, filepath.Dir(path))
		if err != nil {
			return err
		}
		folder = filepath.ToSlash(folder)
		file, err := parser.ParseFile(token.NewFileSet(), path, nil, parser.ImportsOnly)
		if err != nil {
			return err
		}
		for _, spec := range file.Imports {
			imported, err := strconv.Unquote(spec.Path.Value)
			if err != nil {
				return err
			}
			check(t, path, folder, imported, strings.HasSuffix(name, "_test.go"))
			seen[imported] = true
		}
		return nil
	})
	if err != nil {
		t.Fatal(err)
	}
	for _, library := range libraries {
		used := false
		for imported := range seen {
			used = used || strings.HasPrefix(imported, library)
		}
		if !used {
			t.Errorf("%s is required and not used", library)
		}
	}
}

func check(t *testing.T, path, folder, imported string, test bool) {
	t.Helper()
	inner, ours := strings.CutPrefix(imported, module+"/")
	switch {
	case imported == module:
		if folder != "." {
			t.Errorf("%s imports the module root", path)
		}
	case ours:
		if folder == "." || inner == folder && test {
			return
		}
		for _, rule := range allowed {
			if !within(folder, rule.folder) {
				continue
			}
			for _, a := range rule.imports {
				if within(inner, a) {
					return
				}
			}
			break
		}
		t.Errorf("%s imports %s, which is not below it", path, inner)
	case strings.Contains(strings.Split(imported, "/")[0], "."):
		for _, library := range libraries {
			if strings.HasPrefix(imported, library) {
				return
			}
		}
		t.Errorf("%s imports %s, which is none of the libraries of the root module", path, imported)
	}
}

func within(folder, pattern string) bool {
	if strings.HasSuffix(pattern, "/") {
		return strings.HasPrefix(folder, pattern)
	}
	return folder == pattern
}
