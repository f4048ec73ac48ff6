package coolward_test

import (
	"context"
	"encoding/json"
	"errors"
	"fmt"
	"math"
	"math/rand/v2"
	"runtime"
	"strconv"
	"strings"
	"sync"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.com/coolward"
	"example.com/coolward/correlations/surface"
	"example.com/coolward/fdm"
	"example.com/coolward/lumped"
	"example.com/coolward/props"
	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
	"example.com/coolward/units/uncertain"
)

var ctx = context.Background()

// A forged steel ball is hung up in a hall: when can it be handled?
func Example() {
	ball := shape.Sphere(units.Millimetre.Of(80))
	hall := units.Celsius.Of(22)
	exchange := surface.Sum{
		surface.Convection{Body: ball, Fluid: props.Air(), Ambient: hall, Speed: units.MetrePerSecond.Of(0.8)},
		surface.Radiation{Emissivity: 0.8, Surroundings: hall},
	}
	problem := coolward.Problem{
		Body:     ball,
		Material: props.CarbonSteel(),
		Initial:  units.Celsius.Of(650),
		Surface:  boundary.Function(exchange.Flux),
		Horizon:  units.Hour.Of(12),
		Accuracy: units.KelvinDifference.Of(2),
	}
	solution, err := problem.Solve(context.Background())
	if err != nil {
		fmt.Println(err)
		return
	}
	wait, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(40))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%v: %.2v\n", solution.Model(), wait)

	_, err = solution.TimeTo(shape.Centre(), units.Celsius.Of(15))
	var never *units.NeverError
	fmt.Println(errors.As(err, &never), never.Limit)
	// Output:
	// finite volumes: 2.3 h
	// true 22 °C
}

// chosen is a case of the choice: a glass or steel ball with a constant or a varying exchange.
func steelBall(mm float64) coolward.Problem {
	b := shape.Sphere(units.Millimetre.Of(mm))
	room := units.Celsius.Of(25)
	exchange := surface.Sum{
		surface.Convection{Body: b, Fluid: props.Air(), Ambient: room},
		surface.Radiation{Emissivity: 0.8, Surroundings: room},
	}
	return coolward.Problem{
		Body: b, Material: props.CarbonSteel(), Initial: units.Celsius.Of(180),
		Surface: boundary.Function(exchange.Flux), Horizon: units.Hour.Of(20), Until: units.Celsius.Of(50),
	}
}

func constantBall(t testing.TB, mm, h float64) coolward.Problem {
	t.Helper()
	m, err := props.Constant("porcelain", units.KilogramPerCubicMetre.Of(2300), units.JoulePerKilogramKelvin.Of(840), units.WattPerMetreKelvin.Of(1.3))
	require.NoError(t, err)
	return coolward.Problem{
		Body: shape.Sphere(units.Millimetre.Of(mm)), Material: m, Initial: units.Celsius.Of(180),
		Surface: boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Celsius.Of(25)),
	}
}

func TestChoice(t *testing.T) {
	steel := steelBall(60)
	steelConstantH := steel
	steelConstantH.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(800), units.Celsius.Of(25))
	bodies := map[string]coolward.Problem{}
	for name, body := range map[string]shape.Body{
		"cylinder": shape.Cylinder(units.Millimetre.Of(60), units.Metre.Of(1)).Exposing(shape.Outside),
		"plate":    shape.Plate(units.Millimetre.Of(60), units.SquareMetre.Of(1)),
		"brick":    shape.Brick(units.Millimetre.Of(60), units.Millimetre.Of(80), units.Millimetre.Of(100)),
	} {
		p := constantBall(t, 60, 20)
		p.Body = body
		bodies[name] = p
	}
	held := constantBall(t, 60, 20)
	held.Surface = boundary.Temperature(units.Celsius.Of(40))
	bath := bodies["plate"]
	bath.Material, bath.Horizon, bath.Accuracy = props.CarbonSteel(), units.Hour.Of(1), units.KelvinDifference.Of(1)
	logged := bodies["brick"]
	logged.Horizon = units.Hour.Of(1)
	logged.Surface = boundary.Following(units.WattPerSquareMetreKelvin.Of(20), boundary.Log(
		[]units.Duration{{}, units.Minute.Of(20), units.Minute.Of(60)}, []units.Temperature{units.Celsius.Of(25), units.Celsius.Of(30), units.Celsius.Of(22)}))
	heated := bodies["plate"]
	heated.Opposite, heated.Source = boundary.Flux(units.WattPerSquareMetre.Of(-500)), units.WattPerCubicMetre.Of(1000)
	lagged := bodies["plate"]
	lagged.Horizon = units.Hour.Of(1)
	lagged.Layers = []fdm.Layer{{Material: lagged.Material, Thickness: units.Millimetre.Of(20)}, {Material: props.CarbonSteel(), Thickness: units.Millimetre.Of(40)}}
	lagged.Material = nil
	pot := bodies["plate"]
	pot.Body, pot.Horizon = pot.Body.Exposing(shape.Front), units.Hour.Of(1)
	pot.OppositeLump = &fdm.Lump{HeatCapacity: units.JoulePerKelvin.Of(5000), Coefficient: units.WattPerSquareMetreKelvin.Of(300), Initial: units.Celsius.Of(20)}
	weighed := constantBall(t, 60, 20)
	weighed.Body, weighed.Accuracy = shape.Measured(units.CubicCentimetre.Of(8), units.SquareCentimetre.Of(30)), units.KelvinDifference.Of(90)
	loose := constantBall(t, 60, 20)
	loose.Accuracy = units.KelvinDifference.Of(60)
	for _, tt := range []struct {
		name    string
		problem coolward.Problem
		model   coolward.Model
		why     string
	}{
		{"small steel ball in air", steelBall(10), coolward.Lumped, "by about"},
		{"constants throughout", constantBall(t, 60, 20), coolward.Series, "properties, coefficients and sources are constant"},
		{"cylinder", bodies["cylinder"], coolward.Series, "properties, coefficients and sources are constant"},
		{"plate", bodies["plate"], coolward.Series, "properties, coefficients and sources are constant"},
		{"brick", bodies["brick"], coolward.Series, "coefficients and sources are constant"},
		{"surface held", held, coolward.Series, "temperature of a face is given"},
		{"steel plate", bath, coolward.Lumped, "by about"},
		{"constants, low demands", loose, coolward.Lumped, "60 K allowed"},
		{"large steel ball in air", steelBall(400), coolward.FiniteVolumes, "h varies"},
		{"steel in a stirred bath", steelConstantH, coolward.FiniteVolumes, "properties vary"},
		{"insulated", constantBall(t, 60, 0), coolward.Lumped, "at most"},
		{"brick in a logged ambient", logged, coolward.Series, "properties, coefficients and sources are constant"},
		{"plate with two faces and a source", heated, coolward.Series, "properties, coefficients and sources are constant"},
		{"two layers", lagged, coolward.FiniteVolumes, "there are layers"},
		{"lump at a face", pot, coolward.FiniteVolumes, "a lump at a face"},
		{"weighed body", weighed, coolward.Lumped, "by about"},
	} {
		s, err := tt.problem.Solve(ctx)
		if err != nil {
			t.Errorf("%s: %v", tt.name, err)
			continue
		}
		if s.Model() != tt.model || !strings.Contains(s.Reason(), tt.why) {
			t.Errorf("%s: %v because %q, want %v because of %q", tt.name, s.Model(), s.Reason(), tt.model, tt.why)
		}
	}
}

// A randomProblem is any of what the one call takes.
func randomProblem(t testing.TB, random *rand.Rand) coolward.Problem {
	t.Helper()
	between := func(low, high float64) float64 { return low * math.Pow(high/low, random.Float64()) }
	any := func(all ...shape.Body) shape.Body { return all[random.IntN(len(all))] }
	d := units.Millimetre.Of(between(4, 300))
	p := coolward.Problem{
		Body: any(
			shape.Sphere(d), shape.Sphere(d), shape.Cylinder(d, units.Metre.Of(1)).Exposing(shape.Outside),
			shape.Plate(d, units.SquareMetre.Of(1)), shape.Plate(d, units.SquareMetre.Of(1)).Exposing(shape.Back),
			shape.Tube(d, d.Scale(0.1+0.8*random.Float64()), units.Metre.Of(1)), shape.HollowSphere(d, d.Scale(0.1+0.8*random.Float64())),
		),
		Initial:  units.Celsius.Of(40 + 500*random.Float64()),
		Horizon:  units.Minute.Of(between(2, 600)),
		Accuracy: units.KelvinDifference.Of(between(0.05, 20)),
	}
	porcelain, err := props.Constant("porcelain", units.KilogramPerCubicMetre.Of(2300), units.JoulePerKilogramKelvin.Of(840), units.WattPerMetreKelvin.Of(between(0.2, 60)))
	require.NoError(t, err)
	p.Material = porcelain
	if random.IntN(3) == 0 {
		p.Material = props.CarbonSteel()
	}
	condition := func() boundary.Condition {
		h, ambient := units.WattPerSquareMetreKelvin.Of(between(2, 2000)), units.Celsius.Of(5+100*random.Float64())
		switch random.IntN(6) {
		case 0:
			return boundary.Sum(boundary.Power(units.WattPerSquareMetreKelvin.Of(6), units.KelvinDifference.Of(50), 0.25, ambient), boundary.Radiation(random.Float64(), ambient))
		case 1:
			return boundary.Following(h, boundary.Oscillation(ambient, units.KelvinDifference.Of(20*random.Float64()), p.Horizon.Scale(0.3), units.Duration{}))
		case 2:
			return boundary.Function(surface.Sum{
				surface.Convection{Body: shape.Sphere(d), Fluid: props.Air(), Ambient: ambient, Speed: units.MetrePerSecond.Of(1)},
				surface.Radiation{Emissivity: 0.8, Surroundings: ambient},
			}.Flux)
		case 3:
			return boundary.Temperature(ambient)
		}
		return boundary.Constant(h, ambient)
	}
	p.Surface = condition()
	if twoFaced := p.Body.Family() != shape.Spherical && p.Body.Family() != shape.Cylindrical; twoFaced && random.IntN(3) == 0 {
		p.Opposite = condition()
	}
	if random.IntN(6) == 0 {
		p.Source = units.WattPerCubicMetre.Of(between(10, 1e4))
	}
	if random.IntN(8) == 0 {
		p.Layers = []fdm.Layer{
			{Material: p.Material, Thickness: p.Body.Thickness().Scale(0.3), Contact: units.SquareMetreKelvinPerWatt.Of(between(1e-5, 1e-2))},
			{Material: porcelain, Thickness: p.Body.Thickness().Scale(0.7)},
		}
		p.Material = nil
	}
	if random.IntN(8) == 0 {
		start, depth := p.Initial.SI(), p.Body.Thickness().SI()
		p.Initial = units.Temperature{}
		p.Profile = func(d units.Length) (units.Temperature, error) {
			return units.Kelvin.Of(start + 30*math.Cos(3*d.SI()/depth)), nil
		}
	}
	return p
}

// largestDifference is how far two solutions are apart at the places that people ask for, over five decades of
// the horizon, but from the first thousandth of the time in which heat crosses the body.
func largestDifference(t testing.TB, p coolward.Problem, one, other interface {
	At(shape.Place, units.Duration) (units.Temperature, error)
},
) (largest float64) {
	t.Helper()
	outer := p.Material
	if outer == nil {
		outer = p.Layers[0].Material
	}
	at := units.Celsius.Of(100)
	k, err := outer.Conductivity(at)
	require.NoError(t, err)
	c, err := outer.SpecificHeat(at)
	require.NoError(t, err)
	crossing := math.Pow(p.Body.ConductionLength().SI(), 2) / units.DiffusivityOf(k, outer.Density(), c).SI()
	for i := range 26 {
		at := p.Horizon.Scale(math.Pow(10, -float64(i)/5))
		if at.SI() < 1e-3*crossing {
			break
		}
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
			a, err := one.At(place, at)
			require.NoError(t, err)
			b, err := other.At(place, at)
			require.NoError(t, err)
			largest = max(largest, math.Abs(a.SI()-b.SI()))
		}
	}
	return largest
}

// checkChoice holds the answer of the one call against finite volumes on a fine grid, and returns the model that was
// chosen.
func checkChoice(t *testing.T, p coolward.Problem) coolward.Model {
	t.Helper()
	s, err := p.Solve(ctx)
	require.NoError(t, err, "%+v", p)
	finest, err := fdm.Problem{
		Body: p.Body, Material: p.Material, Layers: p.Layers, Initial: p.Initial, Profile: p.Profile, Surface: p.Surface, Opposite: p.Opposite,
		Source:  func(units.Length, units.Duration, units.Temperature) (units.HeatSource, error) { return p.Source, nil },
		Horizon: p.Horizon, Cells: 200, Tolerance: units.KelvinDifference.Of(1e-3),
	}.Solve(ctx)
	require.NoError(t, err, "%+v", p)
	own, err := finest.LargestError()
	require.NoError(t, err)
	if e := largestDifference(t, p, s, finest); e > p.Accuracy.SI()+own.SI() {
		t.Errorf("%v, %v, %v (%s): off by %g K, allowed %v", p.Body, p.Surface, s.Model(), s.Reason(), e, p.Accuracy)
	}
	if s.Model() == coolward.Lumped || s.Biot() == (lumped.Biot{}) {
		return s.Model()
	}
	lump, err := lumped.Problem{
		Body: p.Body, Material: p.Material, Initial: p.Initial, Surface: p.Surface, Opposite: p.Opposite, Source: p.Source, Horizon: p.Horizon,
	}.Solve(ctx)
	require.NoError(t, err)
	if e := largestDifference(t, p, lump, finest); e < p.Accuracy.SI()/3 {
		t.Errorf("%v, %v, %v (%s): one temperature errs by %g K alone, allowed %v", p.Body, p.Surface, s.Model(), s.Reason(), e, p.Accuracy)
	}
	return s.Model()
}

// For a thousand random problems, what was chosen is within the accuracy wanted of finite volumes on a fine
// grid, and one temperature for the body is not passed over where a third of the accuracy would have been kept.
func TestChoiceIsGoodEnough(t *testing.T) {
	const shards = 4
	var counts [shards]map[coolward.Model]int
	t.Run("random problems", func(t *testing.T) {
		for shard := range shards {
			counts[shard] = map[coolward.Model]int{}
			t.Run(fmt.Sprint("part ", shard), func(t *testing.T) {
				t.Parallel()
				random := rand.New(rand.NewPCG(1, uint64(shard)))
				for range 1000 / shards {
					counts[shard][checkChoice(t, randomProblem(t, random))]++
				}
			})
		}
	})
	for _, m := range []coolward.Model{coolward.Lumped, coolward.Series, coolward.FiniteVolumes} {
		total := 0
		for _, c := range counts {
			total += c[m]
		}
		if total < 50 {
			t.Errorf("the random problems led to %v %d times only", m, total)
		}
	}
}

// A 5 cm ball of 1000 kg/m³ and 2000 J/(kg K) in air of 25 °C, from 100 to 45 °C: it takes hours if the air only
// conducts and well under an hour in practice (common practice, no source). With nothing assumed but an
// emissivity of 0.9 the correlation and radiation give that second order of time. The expected minutes are
// independent recomputations with film-temperature air.
func TestFiveCentimetreBall(t *testing.T) {
	ball := shape.Sphere(units.Centimetre.Of(5))
	room := units.Celsius.Of(25)
	m, err := props.Constant("wet solid", units.KilogramPerCubicMetre.Of(1000), units.JoulePerKilogramKelvin.Of(2000), units.WattPerMetreKelvin.Of(0.5))
	require.NoError(t, err)
	convection := surface.Convection{Body: ball, Fluid: props.Air(), Ambient: room}
	radiation := surface.Radiation{Emissivity: 0.9, Surroundings: room}
	conduction := boundary.Constant(units.WattPerSquareMetreKelvin.Of(2*0.024/0.05), room)
	moving := boundary.Constant(units.WattPerSquareMetreKelvin.Of(20*0.024/0.05), room)
	for _, tt := range []struct {
		name           string
		surface        boundary.Condition
		want, tol      float64 // minutes
		contributes    string
		source         string
		exactToSeconds float64
	}{
		{"Nu = 2", conduction, 382.45, 0.01, "conduction into still air alone", "exact exponential, 22 947 s", 22947},
		{"Nu = 20", moving, 38.245, 0.001, "ten times that", "exact exponential, 2 294.7 s", 2294.7},
		{"natural convection", boundary.Function(convection.Flux), 51.1, 0.5, "about half of the heat of the next row", "independent recomputation", 0},
		{"with radiation", boundary.Function(surface.Sum{convection, radiation}.Flux), 26.6, 0.3, "convection and radiation, about half each", "independent recomputation", 0},
	} {
		s, err := lumped.Problem{Body: ball, Material: m, Initial: units.Celsius.Of(100), Surface: tt.surface, Horizon: units.Hour.Of(10)}.Solve(ctx)
		require.NoError(t, err)
		got, err := s.TimeTo(shape.Centre(), units.Celsius.Of(45))
		require.NoError(t, err)
		if math.Abs(got.In(units.Minute)-tt.want) > tt.tol {
			t.Errorf("%s (%s): %.3f min, want %.3f ± %g (%s)", tt.name, tt.contributes, got.In(units.Minute), tt.want, tt.tol, tt.source)
		}
		if tt.exactToSeconds > 0 {
			last := math.Pow(10, math.Floor(math.Log10(tt.exactToSeconds))-4) // five digits are given
			assert.InDelta(t, tt.exactToSeconds, got.SI(), last/2*1.0001, tt.name)
		}
	}
	parts, err := surface.Sum{convection, radiation}.Parts(units.Duration{}, units.Celsius.Of(70))
	require.NoError(t, err)
	// At 70 °C, h = 6.1 by radiation by hand: 0.9·5.67e-8·(343.15²+298.15²)(343.15+298.15) = 6.76.
	byHand := 0.9 * 5.670374419e-8 * (343.15*343.15 + 298.15*298.15) * (343.15 + 298.15) * 45
	assert.InEpsilon(t, byHand, parts[1].Flux.SI(), 1e-12)
	assert.InDelta(t, 0.5, parts[1].Share, 0.05, "radiation is about half")
}

// The answer can be recomputed from the printed derivation alone.
func TestDerivationRecomputes(t *testing.T) {
	p := constantBall(t, 5, 8)
	p.Accuracy = units.KelvinDifference.Of(3)
	s, err := p.Solve(ctx)
	require.NoError(t, err)
	require.Equal(t, coolward.Lumped, s.Model())
	text := s.Derivation().String()
	tau, start, ambient := printed(t, text, "τ"), printed(t, text, "T0"), printed(t, text, "T∞")
	at := units.Minute.Of(7)
	got, err := s.At(shape.Mean(), at)
	require.NoError(t, err)
	want := ambient + (start-ambient)*math.Exp(-at.SI()/tau)
	assert.InDelta(t, want, got.SI(), 1e-6, "from τ, T0 and T∞ as printed")

	// τ itself from what is printed above it.
	volume, area := printed(t, text, "V"), printed(t, text, "A")
	h, rho, c := printed(t, text, "h"), printed(t, text, "ρ"), printed(t, text, "c")
	assert.InEpsilon(t, rho*c*volume/(h*area), tau, 1e-8)

	b, err := json.Marshal(s.Derivation())
	require.NoError(t, err)
	assert.True(t, json.Valid(b))
}

// printed reads the number of a line "name  symbol = number unit  formula" in SI.
func printed(t *testing.T, text, symbol string) float64 {
	t.Helper()
	for _, line := range strings.Split(text, "\n") {
		left, right, ok := strings.Cut(line, " = ")
		fields := strings.Fields(left)
		if !ok || len(fields) == 0 || fields[len(fields)-1] != symbol {
			continue
		}
		value := strings.Fields(right)
		if len(value) > 1 {
			if v, err := units.ParseValue(value[0] + " " + value[1]); err == nil {
				return v.SI()
			}
		}
		x, err := strconv.ParseFloat(value[0], 64)
		require.NoError(t, err, line)
		return x
	}
	t.Fatalf("no line for %s in\n%s", symbol, text)
	return 0
}

func TestRefusals(t *testing.T) {
	good := constantBall(t, 20, 10)
	change := func(f func(*coolward.Problem)) coolward.Problem {
		p := good
		f(&p)
		return p
	}
	nan := func(units.Duration, units.Temperature) (units.HeatFlux, error) {
		return units.WattPerSquareMetre.Of(math.NaN()), nil
	}
	for _, tt := range []struct {
		name    string
		problem coolward.Problem
	}{
		{"zero problem", coolward.Problem{}},
		{"no body", change(func(p *coolward.Problem) { p.Body = shape.Body{} })},
		{"zero diameter", change(func(p *coolward.Problem) { p.Body = shape.Sphere(units.Length{}) })},
		{"negative diameter", change(func(p *coolward.Problem) { p.Body = shape.Sphere(units.Metre.Of(-1)) })},
		{"NaN diameter", change(func(p *coolward.Problem) { p.Body = shape.Sphere(units.Metre.Of(math.NaN())) })},
		{"no material", change(func(p *coolward.Problem) { p.Material = nil })},
		{"empty material", change(func(p *coolward.Problem) { p.Material = props.Solid{} })},
		{"forgotten start", change(func(p *coolward.Problem) { p.Initial = units.Temperature{} })},
		{"no surface", change(func(p *coolward.Problem) { p.Surface = boundary.Condition{} })},
		{"nil function", change(func(p *coolward.Problem) { p.Surface = boundary.Function(nil) })},
		{"constant flux", change(func(p *coolward.Problem) { p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(9)) })},
		{"NaN from the function", change(func(p *coolward.Problem) { p.Surface = boundary.Function(nan); p.Horizon = units.Hour.Of(1) })},
		{"function without horizon", change(func(p *coolward.Problem) { p.Surface = steelBall(10).Surface })},
		{"measured body", change(func(p *coolward.Problem) { p.Body = shape.Measured(units.CubicMetre.Of(1), units.SquareMetre.Of(7)) })},
		{"brick of steel", change(func(p *coolward.Problem) {
			p.Body, p.Material = shape.Brick(units.Metre.Of(1), units.Metre.Of(1), units.Metre.Of(1)), props.CarbonSteel()
		})},
		{"given temperature of steel", change(func(p *coolward.Problem) {
			p.Surface, p.Material = boundary.Temperature(units.Celsius.Of(40)), props.CarbonSteel()
		})},
		{"given flux", change(func(p *coolward.Problem) { p.Surface = boundary.Flux(units.WattPerSquareMetre.Of(10)) })},
		{"negative horizon", change(func(p *coolward.Problem) { p.Horizon = units.Second.Of(-1) })},
		{"accuracy beyond all numbers", change(func(p *coolward.Problem) { p.Accuracy = units.KelvinDifference.Of(1e-9) })},
		{"negative accuracy", change(func(p *coolward.Problem) { p.Accuracy = units.KelvinDifference.Of(-1) })},
	} {
		s, err := tt.problem.Solve(ctx)
		var a *units.ArgumentError
		if !errors.As(err, &a) || a.Field == "" || a.Accepted == "" || s != nil {
			t.Errorf("%s: %v, %v; want an argument error that names the field", tt.name, s, err)
		}
	}
	small := steelBall(20)
	small.Initial = units.Celsius.Of(1500)
	_, err := small.Solve(ctx)
	var r *units.RangeError
	if !errors.As(err, &r) || r.Source == "" {
		t.Errorf("steel above its range: %v; want a range error with its source", err)
	}
	huge := steelBall(5000)
	room := units.Celsius.Of(25)
	huge.Surface = boundary.Function(surface.Convection{Body: huge.Body, Fluid: props.Air(), Ambient: room}.Flux)
	_, err = huge.Solve(ctx)
	if !errors.As(err, &r) || !strings.Contains(r.Quantity, "Rayleigh") {
		t.Errorf("a ball of 5 m: %v; want the Rayleigh number out of range", err)
	}
	var none *coolward.Solution
	if _, err := none.At(shape.Centre(), units.Second.Of(1)); err == nil || none.Model() != 0 || none.Reason() != "" {
		t.Errorf("no solution at all: %v", err)
	}
	var zero coolward.Solution
	_, errAt := zero.At(shape.Centre(), units.Second.Of(1))
	_, errTime := zero.TimeTo(shape.Centre(), room)
	_, errMean := zero.Mean(units.Second.Of(1))
	_, errHeat := zero.HeatReleased(units.Second.Of(1))
	for _, err := range []error{errAt, errTime, errMean, errHeat} {
		var a *units.ArgumentError
		assert.ErrorAs(t, err, &a, "the zero solution")
	}
	assert.Empty(t, zero.Derivation().Lines)
}

// An ambient equal to the start is no error; a target that is not passed is never reached, and the answer says
// what the body tends to.
func TestNever(t *testing.T) {
	for _, p := range []coolward.Problem{constantBall(t, 20, 10), constantBall(t, 200, 100), steelBall(10), steelBall(300)} {
		p.Until = units.Temperature{}
		for _, target := range []float64{10, 25} {
			s, err := p.Solve(ctx)
			require.NoError(t, err)
			_, err = s.TimeTo(shape.Centre(), units.Celsius.Of(target))
			var never *units.NeverError
			if !errors.As(err, &never) || math.Abs(never.Limit.In(units.Celsius)-25) > 1e-6 {
				t.Errorf("%v, %v: time to %g °C: %v; want never, tends to 25 °C", p.Body, s.Model(), target, err)
			}
		}
		p.Initial = units.Celsius.Of(25)
		s, err := p.Solve(ctx)
		require.NoError(t, err)
		T, err := s.At(shape.Centre(), units.Minute.Of(30))
		require.NoError(t, err)
		assert.InDelta(t, 25, T.In(units.Celsius), 1e-9, "%v starts at ambient", p.Body)
		_, err = s.TimeTo(shape.Surface(), units.Celsius.Of(30))
		var never *units.NeverError
		assert.ErrorAs(t, err, &never)
	}
}

// A temperature near the limit is reached, however large the accuracy is: only within 1 mK of it does the
// target count as the limit.
func TestNearTheLimit(t *testing.T) {
	for _, accuracy := range []float64{0.5, 5, 50} {
		p := steelBall(300)
		p.Until, p.Accuracy, p.Horizon = units.Temperature{}, units.KelvinDifference.Of(accuracy), units.Hour.Of(200)
		s, err := p.Solve(ctx)
		require.NoError(t, err)
		got, err := s.TimeTo(shape.Centre(), units.Celsius.Of(25.9))
		require.NoError(t, err, "accuracy %g K, %v", accuracy, s.Model())
		T, err := s.At(shape.Centre(), got)
		require.NoError(t, err)
		assert.InDelta(t, 25.9, T.In(units.Celsius), 1e-6)
	}
}

// What the model cannot reach is an error, not a silent answer; what a body is heated to is warned of.
func TestHonesty(t *testing.T) {
	solid, err := props.Constant("solid", units.KilogramPerCubicMetre.Of(900), units.JoulePerKilogramKelvin.Of(2000), units.WattPerMetreKelvin.Of(0.3))
	require.NoError(t, err)
	wax, err := props.Melting(props.Melt{
		Name: "wax", Solid: solid, Liquid: solid, LatentHeat: units.KilojoulePerKilogram.Of(200),
		Solidus: units.Celsius.Of(60), Liquidus: units.Celsius.Of(60),
	})
	require.NoError(t, err)
	p := steelBall(300)
	p.Material, p.Accuracy = wax, units.KelvinDifference.Of(1e-6)
	_, err = p.Solve(ctx)
	var c *units.ConvergenceError
	assert.ErrorAs(t, err, &c)

	heated := steelBall(20)
	heated.Initial, heated.Until = units.Celsius.Of(20), units.Temperature{}
	oven := units.Celsius.Of(200)
	heated.Surface = boundary.Function(surface.Radiation{Emissivity: 0.9, Surroundings: oven}.Flux)
	heated.Warnings = []string{"a warning of the caller"}
	s, err := heated.Solve(ctx)
	require.NoError(t, err)
	assert.Contains(t, s.Derivation().String(), "hot surface")
	assert.Contains(t, s.Derivation().Warnings, "a warning of the caller")
}

func TestManyGoroutines(t *testing.T) {
	s, err := steelBall(300).Solve(ctx)
	require.NoError(t, err)
	want, err := s.TimeTo(shape.Centre(), units.Celsius.Of(60))
	require.NoError(t, err)
	var group sync.WaitGroup
	for range 8 {
		group.Go(func() {
			for range 20 {
				if got, err := s.TimeTo(shape.Centre(), units.Celsius.Of(60)); err != nil || got != want {
					t.Errorf("got %v, %v; want %v", got, err, want)
				}
				_ = s.Derivation()
			}
		})
	}
	group.Wait()
}

func TestCancelled(t *testing.T) {
	cancelled, cancel := context.WithCancel(ctx)
	cancel()
	if _, err := steelBall(300).Solve(cancelled); !errors.Is(err, context.Canceled) {
		t.Errorf("got %v, want context.Canceled", err)
	}
}

// No numbers make a solution panic, or answer with a number that is none.
func FuzzSolve(f *testing.F) {
	f.Add(0.05, 180.0, 25.0, 10.0, 3600.0, 50.0, 0.5)
	f.Add(1e-9, 3000.0, 1.0, 1e9, 1e12, 0.0, 1e-6)
	f.Add(0.0, math.Inf(1), math.NaN(), -1.0, 0.0, 1e308, 0.0)
	f.Fuzz(func(t *testing.T, diameter, start, ambient, h, horizon, target, accuracy float64) {
		m, err := props.Constant("fuzz", units.KilogramPerCubicMetre.Of(2000), units.JoulePerKilogramKelvin.Of(800), units.WattPerMetreKelvin.Of(1))
		if err != nil {
			t.Fatal(err)
		}
		s, err := coolward.Problem{
			Body: shape.Sphere(units.Metre.Of(diameter)), Material: m, Initial: units.Kelvin.Of(start),
			Surface: boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Kelvin.Of(ambient)),
			Horizon: units.Second.Of(horizon), Accuracy: units.KelvinDifference.Of(accuracy),
		}.Solve(ctx)
		if err != nil {
			return
		}
		for _, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean(), {}} {
			T, err := s.At(place, units.Second.Of(horizon))
			if err == nil && (!T.IsFinite() || T.SI() < math.Min(start, ambient)*(1-1e-9)-1e-9 || T.SI() > math.Max(start, ambient)*(1+1e-9)+1e-9) {
				t.Errorf("%v at %g s: %v, between %g and %g K expected", place, horizon, T.SI(), start, ambient)
			}
			if d, err := s.TimeTo(place, units.Kelvin.Of(target)); err == nil && !(d.IsFinite() && d.SI() >= 0) {
				t.Errorf("time to %g K: %v", target, d)
			}
		}
		if q, err := s.HeatReleased(units.Second.Of(horizon)); err == nil && !q.IsFinite() {
			t.Errorf("heat %v", q)
		}
	})
}

func BenchmarkSolve(b *testing.B) {
	room := units.Celsius.Of(25)
	ball := shape.Sphere(units.Centimetre.Of(5))
	m, err := props.Constant("wet solid", units.KilogramPerCubicMetre.Of(1000), units.JoulePerKilogramKelvin.Of(2000), units.WattPerMetreKelvin.Of(0.5))
	if err != nil {
		b.Fatal(err)
	}
	exchange := surface.Sum{
		surface.Convection{Body: ball, Fluid: props.Air(), Ambient: room},
		surface.Radiation{Emissivity: 0.9, Surroundings: room},
	}
	predict := func() error {
		s, err := lumped.Problem{
			Body: ball, Material: m, Initial: units.Celsius.Of(100), Surface: boundary.Function(exchange.Flux),
			Horizon: units.Hour.Of(2), Until: units.Celsius.Of(45),
		}.Solve(ctx)
		if err != nil {
			return err
		}
		_, err = s.TimeTo(shape.Centre(), units.Celsius.Of(45))
		return err
	}
	b.Run("lumped, natural convection and radiation", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			if err := predict(); err != nil {
				b.Fatal(err)
			}
		}
	})
	b.Run("lumped, on all processors (compare -cpu 1,2)", func(b *testing.B) {
		// A service has something in memory. On an empty heap the collector runs forty times a second,
		// which costs two processors a tenth.
		live := make([]byte, 64<<20)
		defer runtime.KeepAlive(live)
		b.RunParallel(func(pb *testing.PB) {
			for pb.Next() {
				if err := predict(); err != nil {
					b.Error(err)
					return
				}
			}
		})
	})
	for _, bb := range []struct {
		name    string
		problem coolward.Problem
	}{
		{"choice, lumped", steelBall(10)},
		{"choice, series", constantBall(b, 60, 20)},
		{"choice, finite volumes", steelBall(300)},
	} {
		b.Run(bb.name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if _, err := bb.problem.Solve(ctx); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

// Package uncertain through the models.

// warmSphere is a sphere of 20 mm radius, k = 2 W/(m·K), whose time to lose 90 % of its excess at the centre is asked.
func warmSphere(h units.HeatTransferCoefficient, k units.Conductivity) (units.Duration, error) {
	solution, err := series.Problem{
		Body:         shape.Sphere(units.Millimetre.Of(40)),
		Conductivity: k,
		Density:      units.KilogramPerCubicMetre.Of(2000),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(1000),
		Initial:      units.Celsius.Of(120),
		Surface:      boundary.Constant(h, units.Celsius.Of(20)),
	}.Solve(ctx)
	if err != nil {
		return units.Duration{}, err
	}
	return solution.TimeTo(shape.Centre(), units.Celsius.Of(30))
}

// The time falls as h rises, so the interval of the time has its ends where that of h has them: at 25 % less and 25 %
// more. The exact changes are those of ln(C1/0.1)/ζ1² with the first root ζ1 of 1 − ζ cot ζ = Bi and C1 = 4 (sin ζ −
// ζ cos ζ)/(2ζ − sin 2ζ) (H. S. Carslaw, J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., 9.4; the next term is below 1e-4
// of the answer). The figures that are given for a body in general, +32/−19, +24/−14 and +6/−4 %, are those of a long cylinder: at
// Bi = 1 a plate has +23.4/−14.0, a cylinder +24.1/−14.4 and the sphere +24.6/−14.7.
func TestUncertainCoefficient(t *testing.T) {
	for _, c := range []struct{ biot, slower, faster float64 }{
		{0.1, 32.26, -19.35},
		{1, 24.60, -14.69},
		{10, 6.13, -3.61},
	} {
		var s uncertain.Study
		s.OmitShares = true
		h := uncertain.Add(&s, "h", uncertain.PerCent(units.WattPerSquareMetreKelvin.Of(100*c.biot), 25).Normal(0.95), uncertain.Model("scatter of a correlation"))
		r, err := uncertain.Propagate(ctx, &s, func(x uncertain.Draw) (units.Duration, error) {
			return warmSphere(h.In(x), units.WattPerMetreKelvin.Of(2))
		})
		require.NoError(t, err)
		assert.True(t, r.Converged)
		assert.InDelta(t, c.slower, 100*(r.High.Ratio(r.Likely)-1), 0.01+200*r.Errors.High.Ratio(r.Likely), "Bi %g, h 25 %% less", c.biot)
		assert.InDelta(t, c.faster, 100*(r.Low.Ratio(r.Likely)-1), 0.01+200*r.Errors.Low.Ratio(r.Likely), "Bi %g, h 25 %% more", c.biot)
	}
}

// At a small Biot number the film decides and k hardly matters; at a large one it is the other way round.
func TestUncertainShares(t *testing.T) {
	for _, c := range []struct {
		biot          float64
		larger, least float64 // share of h or k, and how large it is at least
		ofFilm        bool
	}{
		{0.1, 0.99, 0.99, true}, // d ln t/d ln k is about Bi/5 of that of h, squared
		{10, 0.90, 0.90, false},
	} {
		s := uncertain.Study{Trials: 5120}
		h := uncertain.Add(&s, "h", uncertain.PerCent(units.WattPerSquareMetreKelvin.Of(100*c.biot), 25).Normal(0.95), uncertain.Model("scatter of a correlation"))
		k := uncertain.Add(&s, "k", uncertain.PerCent(units.WattPerMetreKelvin.Of(2), 25).Normal(0.95), uncertain.Assumed("another clay"))
		model := func(x uncertain.Draw) (units.Duration, error) { return warmSphere(h.In(x), k.In(x)) }
		r, err := uncertain.Propagate(ctx, &s, model)
		require.NoError(t, err)
		l, err := uncertain.Linearise(&s, model)
		require.NoError(t, err)
		large, small := 1, 0
		if c.ofFilm {
			large, small = 0, 1
		}
		assert.Greater(t, r.Shares[large].Total, c.least-r.Shares[large].TotalError, "Bi %g: %+v", c.biot, r.Shares)
		assert.Less(t, r.Shares[small].Total, 1-c.least+r.Shares[small].TotalError, "Bi %g: %+v", c.biot, r.Shares)
		assert.Less(t, r.Halvings[large].StandardUncertainty.Ratio(r.StandardUncertainty), 0.65, "Bi %g", c.biot)
		assert.Greater(t, r.Halvings[small].StandardUncertainty.Ratio(r.StandardUncertainty), 0.93, "Bi %g", c.biot)
		assert.Greater(t, l.Contributions[large].Change.Abs().Ratio(l.Contributions[small].Change.Abs()), 2.0, "Bi %g", c.biot)
	}
}

// A room that may be too warm: the cases that never get there are told apart from the rest. The limit lies at the 97th
// percentile of the room.
func TestUncertainNever(t *testing.T) {
	m, err := props.Constant("potato", units.KilogramPerCubicMetre.Of(1080), units.JoulePerKilogramKelvin.Of(3600), units.WattPerMetreKelvin.Of(0.55))
	require.NoError(t, err)
	s := uncertain.Study{Trials: 2000, OmitShares: true}
	room := uncertain.Add(&s, "room", uncertain.Between(units.Celsius.Of(3.06), units.Celsius.Of(5.06)).Rectangular(), uncertain.Source("thermostat"))
	r, err := uncertain.Propagate(ctx, &s, func(x uncertain.Draw) (units.Duration, error) {
		solution, err := lumped.Problem{
			Body:     shape.Sphere(units.Millimetre.Of(40)),
			Material: m,
			Initial:  units.Celsius.Of(60),
			Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(12), room.In(x)),
		}.Solve(ctx)
		if err != nil {
			return units.Duration{}, err
		}
		return solution.TimeTo(shape.Mean(), units.Celsius.Of(5))
	})
	require.NoError(t, err)
	require.Len(t, r.Missing, 1)
	assert.Equal(t, uncertain.Never, r.Missing[0].Kind)
	assert.InDelta(t, 0.97, float64(r.Answered)/float64(r.Cases), 0.01)
	var never *units.NeverError
	require.ErrorAs(t, r.Missing[0].First, &never)
	assert.Equal(t, units.Celsius.Of(5), never.Target)
	assert.Contains(t, r.String(), "97 % of the cases have an answer (3 % never reach it); of those about ")
}

// BenchmarkUncertain propagates through the closed form of lumped on one core, 10 240 evaluations each time, beside as many plain ones.
func BenchmarkUncertain(b *testing.B) {
	m, err := props.Constant("potato", units.KilogramPerCubicMetre.Of(1080), units.JoulePerKilogramKelvin.Of(3600), units.WattPerMetreKelvin.Of(0.55))
	if err != nil {
		b.Fatal(err)
	}
	answer := func(h units.HeatTransferCoefficient, d units.Length, room units.Temperature) (units.Duration, error) {
		solution, err := lumped.Problem{
			Body: shape.Sphere(d), Material: m, Initial: units.Celsius.Of(60), Surface: boundary.Constant(h, room),
		}.Solve(ctx)
		if err != nil {
			return units.Duration{}, err
		}
		return solution.TimeTo(shape.Mean(), units.Celsius.Of(10))
	}
	const trials = 10240
	b.Run("10 240 plain predictions", func(b *testing.B) {
		for b.Loop() {
			for i := range trials {
				if _, err := answer(units.WattPerSquareMetreKelvin.Of(12+float64(i)*1e-4), units.Millimetre.Of(40), units.Celsius.Of(4)); err != nil {
					b.Fatal(err)
				}
			}
		}
	})
	b.Run("10 240 samples", func(b *testing.B) {
		s := uncertain.Study{Workers: 1, Trials: trials, OmitShares: true}
		h := uncertain.Add(&s, "h", uncertain.WithinFactor(units.WattPerSquareMetreKelvin.Of(12), 1.25).LogNormal(0.95), uncertain.Model("scatter of a correlation"))
		d := uncertain.Add(&s, "diameter", uncertain.PlusMinus(units.Millimetre.Of(40), units.Millimetre.Of(3)).Rectangular(), uncertain.Source("sieve"))
		room := uncertain.Add(&s, "room", uncertain.Between(units.Celsius.Of(3), units.Celsius.Of(5)).ArcSine(), uncertain.Source("thermostat"))
		for b.Loop() {
			if _, err := uncertain.Propagate(ctx, &s, func(x uncertain.Draw) (units.Duration, error) {
				return answer(h.In(x), d.In(x), room.In(x))
			}); err != nil {
				b.Fatal(err)
			}
		}
	})
}
