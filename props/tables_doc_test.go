package props_test

import (
	"os"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// The table of the fluids on the front page of the package says what the fluids say.
func TestTableOfFluids(t *testing.T) {
	text, err := os.ReadFile("doc.go")
	if err != nil {
		t.Fatal(err)
	}
	line := regexp.MustCompile(`(?m)^//\t(\S.*?)  +([\d.]+) K to ([\d.]+) K  +(\S.*?)  +([\d.]+) %, ([\d.]+) %, ([\d.]+) %, ([\d.]+) %$`)
	rows := map[string][]string{}
	for _, m := range line.FindAllStringSubmatch(string(text), -1) {
		rows[m[1]] = m[2:]
	}
	for f := range props.Fluids() {
		r, ok := rows[f.Name()]
		if !ok {
			t.Errorf("%s has no row", f.Name())
			continue
		}
		low, high := f.Range()
		end := strings.TrimPrefix(strings.Split(r[2], " to ")[1], "where it condenses")
		_, most, err := f.PressureRange(high)
		if err != nil {
			t.Fatal(err)
		}
		if end != "" {
			if p, err := units.Parse[units.Pressure](end); err != nil || p.Sub(most).SI() != 0 {
				t.Errorf("%s: pressure to %v, printed %s (%v)", f.Name(), most, end, err)
			}
		}
		for i, want := range []float64{
			low.SI(), high.SI(), 100 * f.DensityUncertainty(), 100 * f.SpecificHeatUncertainty(),
			100 * f.ConductivityUncertainty(), 100 * f.ViscosityUncertainty(),
		} {
			printed := append(r[:2:2], r[3:]...)[i]
			if got, err := strconv.ParseFloat(printed, 64); err != nil || got < want*(1-1e-9) || got > want*(1+1e-9) {
				t.Errorf("%s: printed %s, want %g", f.Name(), printed, want)
			}
		}
	}
}

// So does that of the solids, and the number of the others is that of the list to ten.
func TestTableOfSolids(t *testing.T) {
	text, err := os.ReadFile("doc.go")
	if err != nil {
		t.Fatal(err)
	}
	line := regexp.MustCompile(`(?m)^//\t(\S.*?)  +(\S+ (?:K|°C)) to (\S+ (?:K|°C))  +(\S.*?)  +([\d.]+) %, ([\d.]+) %, ([\d.]+) %$`)
	rows := line.FindAllStringSubmatch(string(text), -1)
	for _, r := range rows {
		s, err := props.FindSolid(r[1])
		if err != nil {
			t.Error(err)
			continue
		}
		low, high := s.Range()
		for i, end := range []units.Temperature{low, high} {
			printed, err := units.Parse[units.Temperature](strings.ReplaceAll(r[2+i], "−", "-"))
			check(t, s.Name()+", end of the range", printed.SI(), cell{end.SI(), 1e-9}, 0, "the solid")
			if err != nil {
				t.Error(err)
			}
		}
		for i, want := range []float64{s.DensityUncertainty(), s.SpecificHeatUncertainty(), s.ConductivityUncertainty()} {
			check(t, s.Name()+", uncertainty", parseCell(t, r[5+i]).value, cell{100 * want, 0}, 1e-9, "the solid")
		}
	}
	all := 0
	for range props.Solids() {
		all++
	}
	m := regexp.MustCompile(`these and some (\d+) more`).FindStringSubmatch(string(text))
	if len(rows) != 9 || m == nil {
		t.Fatalf("%d rows, want 9; others: %v", len(rows), m)
	}
	check(t, "other solids", float64(all-len(rows)), cell{parseCell(t, m[1]).value, 5}, 0, "doc.go")
}
