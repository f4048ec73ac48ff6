package series_test

import (
	"errors"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A heated body takes in q A t, and its mean rises by that over ρ c V; at last every place rises as fast, the
// surface of a body of one coordinate by q R/(k (m + 2)) above the mean.
func TestConstantFlux(t *testing.T) {
	for _, stone := range stones() {
		p := stone.problem
		p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(-500))
		s := solve(t, p)
		for _, seconds := range []float64{0, 0.1, 3, 200} {
			q, err := s.HeatReleased(units.Second.Of(seconds))
			if want := -500 * p.Body.Area().SI() * seconds; err != nil || !(math.Abs(q.SI()-want) <= 1e-12*math.Abs(want)) {
				t.Errorf("%s after %v s: released %v, %v, want %v J", stone.name, seconds, q, err, want)
			}
			mean := kelvins(t, s, shape.Mean(), seconds)
			if want := 363.15 - q.SI()/(2500*800*p.Body.Volume().SI()); !(math.Abs(mean-want) <= rounded) {
				t.Errorf("%s after %v s: mean %v K, by the heat %v", stone.name, seconds, mean, want)
			}
		}
		m := map[shape.Family]float64{shape.Planar: 1, shape.Cylindrical: 2, shape.Spherical: 3}[p.Body.Family()]
		if ahead := kelvins(t, s, shape.Surface(), 3e3) - kelvins(t, s, shape.Mean(), 3e3); m > 0 && !(math.Abs(ahead-500*0.008/(m+2)) <= 1e-10) {
			t.Errorf("%s: surface %v K above the mean at last, want %v", stone.name, ahead, 500*0.008/(m+2))
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Errorf("%s: %v", stone.name, err)
		}
		if bound, err := s.TruncationError(units.Second.Of(30)); err != nil || !(bound.SI() > 0 && bound.SI() < 1e-11) {
			t.Errorf("%s: error bound %v, %v", stone.name, bound, err)
		}
		if !math.IsNaN(s.Biot()) {
			t.Errorf("%s: Biot number %v, want NaN", stone.name, s.Biot())
		}
	}
}

// The flux of a large coefficient towards far surroundings is constant while the body changes little.
func TestConstantFluxIsALimit(t *testing.T) {
	for _, stone := range stones() {
		p := stone.problem
		p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(-500))
		flux := solve(t, p)
		p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(500e-9), units.Kelvin.Of(1e9+363.15))
		far := solve(t, p)
		for _, place := range places {
			for _, seconds := range []float64{0.05, 1, 20, 100} {
				got, want := kelvins(t, flux, place, seconds), kelvins(t, far, place, seconds)
				if !(math.Abs(got-want) <= 1e-5) { // 1e-15 of the excess, and its change by Bi
					t.Errorf("%s, %s after %v s: %.12g K, by far surroundings %.12g", stone.name, place, seconds, got, want)
				}
			}
		}
	}
}

// A prescribed flux at a short time is that into a semi-infinite body.
func TestConstantFluxEarly(t *testing.T) {
	surface := boundary.Flux(units.WattPerSquareMetre.Of(-500))
	half := ground(t, 1, 2500, 800, 363.15, surface)
	for _, stone := range stones() {
		p := stone.problem
		p.Surface = surface
		s := solve(t, p)
		for _, depth := range []float64{0, 1e-6, 1e-5} {
			got, want := kelvins(t, s, shape.Below(units.Metre.Of(depth)), 1e-4)-363.15, deep(t, half, depth, 1e-4)-363.15
			if !(math.Abs(got-want) <= 2e-3*want) {
				t.Errorf("%s, %v m: %v K above the start, semi-infinite %v", stone.name, depth, got, want)
			}
		}
	}
}

func TestConstantFluxTimeTo(t *testing.T) {
	r := rand.New(rand.NewSource(8))
	for _, stone := range stones() {
		for range 60 {
			p := stone.problem
			q := math.Copysign(math.Pow(10, 10*r.Float64()-3), r.Float64()-0.5)
			p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(q))
			s := solve(t, p)
			target := units.Kelvin.Of(363.15 - math.Copysign(300*r.Float64(), q))
			for _, place := range places {
				d, err := s.TimeTo(place, target)
				if err != nil {
					t.Errorf("%s, %v W/m², %s, %v: %v", stone.name, q, place, target, err)
					continue
				}
				if T, err := s.At(place, d); err != nil || !(math.Abs(T.Sub(target).SI()) <= 1e-11) {
					t.Errorf("%s, %v W/m², %s: %v reached after %v, where it is off by %v K, %v", stone.name, q, place, target, d, T.Sub(target).SI(), err)
				}
				if d, err := s.TimeTo(place, units.Kelvin.Of(363.15+math.Copysign(1, q))); err != nil || d.SI() != 0 {
					t.Errorf("%s, %v W/m², %s: far side after %v, %v, want 0 s", stone.name, q, place, d, err)
				}
			}
		}
	}
	p := marble()
	p.Surface = boundary.Flux(units.HeatFlux{})
	idle := solve(t, p)
	var never *units.NeverError
	if _, err := idle.TimeTo(shape.Centre(), units.Celsius.Of(50)); !errors.As(err, &never) || never.Limit != p.Initial {
		t.Errorf("no flux: %v, want a NeverError", err)
	}
	if d, err := idle.TimeTo(shape.Centre(), p.Initial); err != nil || d.SI() != 0 {
		t.Errorf("no flux, the start: %v, %v, want 0 s", d, err)
	}
}

func TestConstantFluxRefusals(t *testing.T) {
	p := marble()
	p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(1e5))
	s := solve(t, p)
	var argument *units.ArgumentError
	check := func(name string, err error) {
		t.Helper()
		argument = nil
		if !errors.As(err, &argument) {
			t.Errorf("%s: %v, want an ArgumentError", name, err)
		}
	}
	_, err := s.At(shape.Centre(), units.Hour.Of(10))
	check("below 0 K", err)
	_, err = s.Mean(units.Hour.Of(10))
	check("mean below 0 K", err)
	_, _, err = s.OneTerm(shape.Centre(), units.Second.Of(1))
	check("one term", err)
	_, err = s.Track(shape.Centre())
	check("track", err)
	_, err = s.Oscillation(shape.Centre(), units.Second.Of(1))
	check("oscillation", err)
	p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(1e308))
	p.Conductivity = units.WattPerMetreKelvin.Of(1e-5)
	_, err = p.Solve(t.Context())
	check("overflow", err)
}
