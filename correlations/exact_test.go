package correlations_test

import (
	"math"
	"strings"
	"testing"

	"example.com/coolward/correlations"
)

// The exact problems behind the formulas, and how far the formulas may be from them.
func TestExactSolutions(t *testing.T) {
	boundaryLayer := func(c correlations.Correlation, coefficient float64) func(pr float64) float64 {
		return func(pr float64) float64 { return nu(t, c, groups{Re: 1e4, Pr: pr}) / 100 / coefficient }
	}
	buoyant := func(c correlations.Correlation) func(pr float64) float64 {
		return func(pr float64) float64 { return nu(t, c, groups{Ra: 4e8 * pr, Pr: pr}) / 100 }
	}
	constant := func(nu float64) func(float64) float64 { return func(float64) float64 { return nu } }
	var sphere, cube float64
	for body := range correlations.ConvexBodies() {
		switch body.Name {
		case "sphere":
			sphere = body.BodyNu
		case "cube, face up":
			cube = body.BodyNu
		}
	}
	disk, err := correlations.CylinderBodyNu(0)
	if err != nil {
		t.Fatal(err)
	}
	formulas := []struct {
		row, name string
		low, high float64 // Pr
		got       func(pr float64) float64
		tolerance float64
		why       string
	}{
		{"plate.for.lam_local", "Pohlhausen", 0.7, 1000, boundaryLayer(correlations.PlateLaminarLocal(), 1), 0.021, "within 2 % for Pr 0.7 to 1000"},
		{"plate.for.lam_local", "Churchill and Ozoe", 0.01, 1000, boundaryLayer(correlations.ChurchillOzoePlateLocal(), 1), 0.0145, "within 1.4 % for Pr 0.01 to 1000"},
		{"plate.for.lam_local", "Churchill and Ozoe, mean", 0.01, 1000, boundaryLayer(correlations.ChurchillOzoePlate(), 2), 0.0145, "the mean is twice the local one"},
		{"plate.for.lam_local", "liquid metal", 0.01, 0.01, boundaryLayer(correlations.PlateLiquidMetalLocal(), 1), 0.10, "the limit Pr → 0 lies above"},
		{"vplate.nat.ede_local", "Le Fevre", 0.7, 100, buoyant(correlations.LeFevrePlateLocal()), 0.005, "within 0.5 %"},
		{"vplate.nat.ede_local", "Eckert", 0.7, 100, buoyant(correlations.EckertPlateLocal()), 0.08, "an integral method"},
		{"rot.disk.lam", "rotating disk", 0.71, 0.71, boundaryLayer(correlations.RotatingDisk(), 1), 0.11, "the textbook value for air is 10 % above"},
		{"tube.lam.developed", "tube", 0, 0, nil, 1e-10, "exact"},
		{"sphere.conduction", "sphere", 0, 0, constant(nu(t, correlations.SphereConduction(), groups{})), 0, "exact"},
		{"body.Nu0", "body", 0, 0, nil, 5e-4, "tables with 4 digits"},
	}
	rows := readChecks(t, "testdata/exact.csv")
	if len(rows) != 22 {
		t.Errorf("%d rows", len(rows))
	}
	for _, row := range rows {
		checked := false
		for _, f := range formulas {
			pr := row.in["Pr"]
			if f.row != row.id || pr < f.low || pr > f.high {
				continue
			}
			got := f.got
			switch row.inputs {
			case "Graetz, uniform wall temperature":
				got = constant(nu(t, correlations.TubeLaminar(), groups{}))
			case "uniform flux 48/11":
				got = constant(nu(t, correlations.TubeLaminarFlux(), groups{}))
			case "sphere 2 sqrt(pi)":
				got = constant(sphere)
			case "cube, from capacitance 0.66067818 a":
				got = constant(cube)
			case "thin disk 4 sqrt(2/pi)":
				got = constant(disk)
			}
			checked = true
			if x := got(pr); !(math.Abs(x/row.want-1) <= f.tolerance) {
				t.Errorf("%s %s, %s: got %.10g, want %.10g ± %g (%s; %s)", row.id, row.inputs, f.name, x, row.want, f.tolerance, f.why, row.source)
			}
		}
		if !checked && row.id != "rot.disk.lam" { // the disk of the textbook is for air alone
			t.Errorf("%s %s is not checked", row.id, row.inputs)
		}
	}
}

// The body gravity function of a sphere against its definition, integrated, and against the table of Lee, Yovanovich
// and Jafarpur 1991, from memory.
func TestGravityOfSphere(t *testing.T) {
	// With u = cos θ: P = 2π R sin θ, dA = 2π R² du, A = 4π R².
	const n = 20000
	sum := 0.0
	for i := range n {
		u := -1 + (2*float64(i)+1)/n
		sin2 := 1 - u*u
		sum += math.Cbrt(2*math.Pi*sin2/math.Sqrt(4*math.Pi)) / n
	}
	if want := math.Pow(sum, 0.75); math.Abs(correlations.SphereGravity/want-1) > 1e-5 {
		t.Errorf("sphere: %v, integrated %v", correlations.SphereGravity, want)
	}
	for body := range correlations.ConvexBodies() {
		if body.Name == "sphere" && math.Abs(body.Gravity/correlations.SphereGravity-1) > 0.01 {
			t.Errorf("table %v, integral %v: more than the known 0.9 %%", body.Gravity, correlations.SphereGravity)
		}
	}
	// The known number at rest of the cylinder as long as wide is that of the table.
	got, err := correlations.CylinderBodyNu(1)
	if err != nil || math.Abs(got/3.444-1) > 2e-4 {
		t.Errorf("cylinder: %v, %v, want 3.444", got, err)
	}
}

// The spheroids of the table against potential theory and the integral of the gravity function. The number at
// rest is 4 π C / A^(1/2) with the capacitance C = (a² - b²)^(1/2) / arcosh(a/b), or with arccos if b > a, for the semi-axis a along
// the vertical and b across (J. D. Jackson, Classical Electrodynamics, from memory). The tabulated gravity functions are up
// to 1 % above the integral for round bodies and more for flat ones, whose upper and lower faces the integral leaves out.
func TestSpheroids(t *testing.T) {
	known := map[string]struct{ a, gravity float64 }{
		"sphere": {1, 0.01}, "prolate spheroid 1.93": {1.93, 0.01}, "oblate spheroid 0.5": {0.5, 0.021}, "oblate spheroid 0.1": {0.1, 0.145},
	}
	seen := 0
	for body := range correlations.ConvexBodies() {
		// How a body lies does not matter at rest.
		if strings.HasPrefix(body.Name, "cube") && body.BodyNu != 3.388 || strings.HasPrefix(body.Name, "cylinder") && body.BodyNu != 3.444 {
			t.Errorf("%s: at rest %v", body.Name, body.BodyNu)
		}
		if body.Name == "two spheres that touch" {
			// Each has the integral of a sphere, with twice its surface.
			if want := correlations.SphereGravity / math.Pow(2, 1.0/8); math.Abs(body.Gravity/want-1) > 0.01 {
				t.Errorf("%s: gravity function %v, integral %v", body.Name, body.Gravity, want)
			}
		}
		k, ok := known[body.Name]
		if !ok {
			continue
		}
		seen++
		a := k.a
		const n = 2000
		var area, sum float64
		var perimeters, areas [n]float64
		for i := range n {
			sin, cos := math.Sincos(math.Pi * (float64(i) + 0.5) / n)
			slope := math.Hypot(a*sin, cos)
			areas[i] = 2 * math.Pi * sin * slope * math.Pi / n
			perimeters[i] = 2 * math.Pi * sin * a * sin / slope
			area += areas[i]
		}
		for i := range n {
			sum += math.Cbrt(perimeters[i]/math.Sqrt(area)) * areas[i] / area
		}
		if want := math.Pow(sum, 0.75); !(body.Gravity >= want && body.Gravity <= want*(1+k.gravity)) {
			t.Errorf("%s: gravity function %v, integral %v", body.Name, body.Gravity, want)
		}
		capacitance := 1.0
		switch {
		case a > 1:
			capacitance = math.Sqrt(a*a-1) / math.Acosh(a)
		case a < 1:
			capacitance = math.Sqrt(1-a*a) / math.Acos(a)
		}
		if want := 4 * math.Pi * capacitance / math.Sqrt(area); math.Abs(body.BodyNu/want-1) > 1e-3 {
			t.Errorf("%s: at rest %v, exact %v", body.Name, body.BodyNu, want)
		}
	}
	if seen != len(known) {
		t.Errorf("%d spheroids", seen)
	}
}
