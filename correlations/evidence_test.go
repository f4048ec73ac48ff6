package correlations_test

import (
	"go/ast"
	"go/parser"
	"go/token"
	"path/filepath"
	"strings"
	"testing"

	"example.com/coolward/correlations"
)

// defaults are the correlations that package surface takes by itself, by the function that it calls, with the name that the files of
// examples and of exact solutions have for them.
var defaults = map[string]struct {
	with correlations.Correlation
	id   string
}{
	"ChurchillSphere":            {correlations.ChurchillSphere(), "sphere.nat.churchill"},
	"WhitakerSphere":             {correlations.WhitakerSphere(), "sphere.for.whitaker"},
	"CliftSphere":                {correlations.CliftSphere(), "sphere.for.clift"},
	"ChurchillChuCylinder":       {correlations.ChurchillChuCylinder(), "hcyl.nat.churchill_chu"},
	"ChurchillBernsteinCylinder": {correlations.ChurchillBernsteinCylinder(), "cyl.for.churchill_bernstein"},
	"ChurchillChuPlate":          {correlations.ChurchillChuPlate(), "vplate.nat.churchill_chu"},
	"PlateLaminar":               {correlations.PlateLaminar(), "plate.for.lam_mean"},
	"PlateMixed":                 {correlations.PlateMixed(), "plate.for.mixed_mean"},
	"HorizontalPlateUp":          {correlations.HorizontalPlateUp(), "hplate.nat.up"},
	"RadziemskaPlateDown":        {correlations.RadziemskaPlateDown(), "hplate.nat.down_radziemska"},
	"YovanovichBody":             {correlations.YovanovichBody(), "body.nat.yovanovich"},
	"YovanovichVanoverbekeBody":  {correlations.YovanovichVanoverbekeBody(), "body.for.yovanovich_vanoverbeke"},
	"BromleySphere":              {correlations.BromleySphere(), "boil.film_bromley_h 0.67"},
	"BromleyCylinder":            {correlations.BromleyCylinder(), "boil.film_bromley_h 0.62"},
	"BerensonPlate":              {correlations.BerensonPlate(), "boil.film_berenson_h"},
}

// Whatever package surface takes by itself has, besides the arithmetic of checks.csv, a published example, an exact solution, or a
// second formula that it meets within the scatter of both: what TestCheckValues, TestExactSolutions and TestSecondFormula run.
func TestEveryDefaultHasEvidence(t *testing.T) {
	evidence := map[string][]string{}
	for _, file := range []string{"testdata/examples.csv", "testdata/exact.csv"} {
		for _, row := range readChecks(t, file) {
			id := row.id
			if c := row.text["Cf"]; c != "" {
				id += " " + c
			}
			evidence[id] = append(evidence[id], row.source)
		}
	}
	pairs := map[correlations.Correlation][]string{}
	for _, p := range secondFormulas {
		pairs[p.first] = append(pairs[p.first], p.second.Name())
		pairs[p.second] = append(pairs[p.second], p.first.Name())
	}
	taken := takenBySurface(t)
	for name := range taken {
		d, listed := defaults[name]
		if !listed {
			t.Errorf("package surface takes correlations.%s: not in the list of defaults with evidence", name)
			continue
		}
		known := byID[d.id]
		if known != (correlations.Correlation{}) && known != d.with {
			t.Errorf("%s: %s is %s", name, d.id, known.Name())
		}
		if len(evidence[d.id])+len(pairs[d.with]) == 0 {
			t.Errorf("%s has neither an example, nor an exact solution, nor a second formula", name)
		}
		t.Logf("%s: %d examples, second formulas: %s", name, len(evidence[d.id]), strings.Join(pairs[d.with], "; "))
	}
	for name := range defaults {
		if !taken[name] {
			t.Errorf("package surface does not take correlations.%s", name)
		}
	}
}

// takenBySurface returns the names of the correlations that the source of package surface calls.
func takenBySurface(t *testing.T) map[string]bool {
	t.Helper()
	files, err := filepath.Glob("surface/*.go")
	if err != nil {
		t.Fatal(err)
	}
	taken := map[string]bool{}
	for _, file := range files {
		if strings.HasSuffix(file, "_test.go") {
			continue
		}
		source, err := parser.ParseFile(token.NewFileSet(), file, nil, 0)
		if err != nil {
			t.Fatal(err)
		}
		ast.Inspect(source, func(n ast.Node) bool {
			call, ok := n.(*ast.CallExpr)
			if !ok || len(call.Args) != 0 {
				return true
			}
			if f, ok := call.Fun.(*ast.SelectorExpr); ok {
				if x, ok := f.X.(*ast.Ident); ok && x.Name == "correlations" {
					taken[f.Sel.Name] = true
				}
			}
			return true
		})
	}
	return taken
}
