package wall

import (
	"math"
	"testing"

	"example.com/coolward/internal/table"
)

// problemOf returns the problem of a row.
func problemOf(t *testing.T, row map[string]string) Problem {
	number := func(column string) float64 { return table.Number(t, row[column]) }
	return Problem{
		Body: body(int(number("m")), number("ra")), Ha: number("ha"), Hb: number("hb"),
		Drive: Drive{Ua: number("ua"), Ub: number("ub"), Qa: number("qa"), Qb: number("qb"), G: number("g")},
	}
}

// Every temperature is within its own bound, and so are fluxes and heats, of which in a tube the short-time form leaves
// out the same share.
func TestAnswers(t *testing.T) {
	worst := map[string]float64{}
	for _, row := range table.Named(t, "testdata/answers.csv") {
		p := problemOf(t, row)
		s := Solve(p)
		fo, want := table.Number(t, row["fo"]), table.Number(t, row["value"])
		probe := Probe{Y: table.Number(t, row["y"])}
		tolerance := s.Bound(fo)
		switch row["quantity"] {
		case "inner flux":
			probe.Quantity = InnerFlux
		case "outer flux":
			probe.Quantity = OuterFlux
		case "inner heat":
			probe.Quantity = InnerHeat
		case "outer heat":
			probe.Quantity = OuterHeat
		}
		if probe.Quantity != Value {
			tolerance = (1e-11+s.LeftOut(fo)/s.size)*math.Abs(want) + s.Bound(fo)
		}
		got := s.Ask(probe, fo)
		off := math.Abs(got - want)
		if !(off <= tolerance) {
			t.Errorf("%v: got %.17g, off by %.3g, tolerance %.3g", row, got, off, tolerance)
		}
		worst[row["quantity"]] = math.Max(worst[row["quantity"]], off/(math.Abs(want)+1e-3))
	}
	t.Log("worst, relative:", worst)
}
