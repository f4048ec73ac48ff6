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
