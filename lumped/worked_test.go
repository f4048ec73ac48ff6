package lumped

import (
	"encoding/json"
	"math"
	"testing"

	"example.com/coolward/internal/physics"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// inputs of a worked example, in SI units.
type inputs struct {
	D           float64 `json:"D_m"`
	Rho         float64 `json:"rho"`
	Cp          float64 `json:"cp"`
	H           float64 `json:"h"`
	H0          float64 `json:"h_initial"`
	Exponent    float64 `json:"exponent"`
	Emissivity  float64 `json:"emissivity"`
	Start       float64 `json:"Ti_K"`
	Ambient     float64 `json:"Tinf_K"`
	Surrounding float64 `json:"Tsur_K"`
	Target      float64 `json:"T_K"`
	Theta       float64 `json:"theta"`
	Tau         float64 `json:"tau_s"`
	Time        float64 `json:"t_s"`
	Period      float64 `json:"period_s"`
	Amplitude   float64 `json:"amplitude_K"`
	Sigma       float64 `json:"sigma"`
}

// problem returns the problem of a worked example: a start, an ambient and a size that the example leaves open are
// chosen, since they do not matter.
func (in inputs) problem() Problem {
	if in.Start == 0 {
		in.Start, in.Ambient = 400, 300
	}
	if in.D == 0 { // τ = ρ c D/(6 h)
		in.D, in.Rho, in.Cp, in.H = 0.006, 1000, 1000, 1000/in.Tau
	}
	p := Problem{Body: sphere(in.D), Material: constantStuff(in.Rho, in.Cp, 30), Initial: kelvin(in.Start), Horizon: seconds(1e5)}
	in.Emissivity *= in.Sigma / physics.StefanBoltzmann // so that the σ of the example holds
	h := units.WattPerSquareMetreKelvin.Of
	switch {
	case in.H0 > 0:
		p.Surface = boundary.Power(h(in.H0), units.KelvinDifference.Of(in.Start-in.Ambient), in.Exponent, kelvin(in.Ambient))
	case in.Emissivity > 0 && in.H == 0:
		p.Surface = boundary.Radiation(in.Emissivity, kelvin(in.Surrounding))
	case in.Emissivity > 0:
		p.Horizon, p.Tolerance = seconds(60), units.KelvinDifference.Of(1e-9)
		p.Surface = boundary.Sum(boundary.Constant(h(in.H), kelvin(in.Ambient)), boundary.Radiation(in.Emissivity, kelvin(in.Surrounding)))
	case in.Period > 0:
		p.Initial, p.Horizon = kelvin(300), seconds(40*in.Period)
		p.Surface = boundary.Following(h(in.H), boundary.Oscillation(kelvin(300), units.KelvinDifference.Of(in.Amplitude), seconds(in.Period), seconds(0)))
	default:
		p.Surface = boundary.Constant(h(in.H), kelvin(in.Ambient))
	}
	return p
}

// answer returns what a worked example asks for.
func (in inputs) answer(t *testing.T, quantity string) float64 {
	p := in.problem()
	s := solve(t, p)
	target := kelvin(in.Target)
	if in.Theta > 0 {
		target = kelvin(300 + 100*in.Theta)
	}
	switch quantity {
	case "time", "time to 217.7 degC":
		got, err := s.TimeTo(shape.Centre(), target)
		if err != nil {
			t.Fatal(err)
		}
		return got.SI()
	case "steady temperature":
		return s.limit
	case "theta":
		got, err := s.Mean(seconds(in.Time))
		if err != nil {
			t.Fatal(err)
		}
		return (got.SI() - 300) / 100
	case "amplitude of the body", "time lag":
		// The last peak, where the rate passes 0 downwards; that of the ambient is a quarter of a period
		// after the start of a period.
		all, err := s.RateCrossings(units.KelvinPerSecond.Of(0))
		if err != nil {
			t.Fatal(err)
		}
		last := all[len(all)-1]
		if last.Rising {
			last = all[len(all)-2]
		}
		if quantity == "time lag" {
			return math.Mod(last.Time.SI(), in.Period) - in.Period/4
		}
		top, err := s.Mean(last.Time)
		if err != nil {
			t.Fatal(err)
		}
		return top.SI() - 300
	}
	t.Fatal("no such quantity: ", quantity)
	return 0
}

// Worked examples of textbooks and handbooks: to the digits printed, and to the digits that other software
// gives for the same inputs, which for the one that it integrated are nine.
func TestWorkedExamples(t *testing.T) {
	for _, row := range table.Named(t, "testdata/worked.csv") {
		var in inputs
		if err := json.Unmarshal([]byte(row["inputs"]), &in); err != nil {
			t.Fatal(err)
		}
		name := row["id"] + ", " + row["title"] + ", " + row["quantity"] + " (" + row["source"] + ", " + row["status"] + ")"
		got, recomputed, digits := in.answer(t, row["quantity"]), table.Number(t, row["recomputed"]), 2e-11
		if row["id"] == "L11" {
			digits = 2e-9
		}
		within(t, name+": recomputed", got, recomputed, digits*recomputed)
		if row["published"] != "" {
			within(t, name+": published", got, table.Number(t, row["published"]), table.Number(t, row["tolerance"]))
		}
	}
}
