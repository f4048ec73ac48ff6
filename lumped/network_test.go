package lumped

import (
	"context"
	"errors"
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

func joule(x float64) units.HeatCapacity      { return units.JoulePerKelvin.Of(x) }
func conductance(x float64) units.Conductance { return units.WattPerKelvin.Of(x) }

func solveNetwork(t testing.TB, n Network) *NetworkSolution {
	t.Helper()
	s, err := n.Solve(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	return s
}

func nodeAt(t testing.TB, s *NetworkSolution, node string, at float64) float64 {
	t.Helper()
	T, err := s.At(node, seconds(at))
	if err != nil {
		t.Fatal(err)
	}
	return T.SI()
}

// cup is a cup with what is in it, in a room.
func cup(content, wall, inside, outside, tea, china, room float64) Network {
	return Network{
		Nodes:        []Node{{Name: "tea", Capacity: joule(content), Initial: kelvin(tea)}, {Name: "cup", Capacity: joule(wall), Initial: kelvin(china)}},
		Surroundings: []Surroundings{{"room", boundary.Steady(kelvin(room))}},
		Links:        []Link{{From: "tea", To: "cup", Conductance: conductance(inside)}, {From: "cup", To: "room", Conductance: conductance(outside)}},
	}
}

// Two nodes against the solution of their quadratic equation, from the elementary theory of linear equations:
// λ² − (G/C1 + (G+H)/C2) λ + G H/(C1 C2) = 0, and both exponentials from the start and its slope.
func TestTwoNodesInClosedForm(t *testing.T) {
	property := func(a, b, c, d, e, f, g uint8) bool {
		u := func(x uint8) float64 { return float64(x) / 255 }
		c1, c2 := math.Pow(10, 1+3*u(a)), math.Pow(10, 1+3*u(b))
		gi, h := math.Pow(10, -1+2*u(c)), math.Pow(10, -1+2*u(d))
		T1, T2, room := 280+100*u(e), 280+100*u(f), 270+40*u(g)
		s := solveNetwork(t, cup(c1, c2, gi, h, T1, T2, room))
		sum, product := gi/c1+(gi+h)/c2, gi/c1*h/c2
		fast := (sum + math.Sqrt(sum*sum-4*product)) / 2
		slow := product / fast
		slope := -gi / c1 * (T1 - T2)
		// θ1 = A e^(−slow t) + B e^(−fast t)
		b2 := -(slope + slow*(T1-room)) / (fast - slow)
		a2 := T1 - room - b2
		for _, at := range []float64{0.1 / fast, 1 / slow, 3 / slow} {
			want := room + a2*math.Exp(-slow*at) + b2*math.Exp(-fast*at)
			if math.Abs(nodeAt(t, s, "tea", at)-want) > 1e-9 {
				return false
			}
		}
		tau := s.TimeConstants()
		limit, ok := s.Limit("tea")
		return ok && limit.SI() == room && len(tau) == 2 &&
			math.Abs(tau[0].SI()*slow-1) < 1e-12 && math.Abs(tau[1].SI()*fast-1) < 1e-12
	}
	if err := quick.Check(property, nil); err != nil {
		t.Error(err)
	}
}

// One node is the closed form of a body: half of the excess is gone after τ ln 2.
func TestOneNode(t *testing.T) {
	s := solveNetwork(t, Network{
		Nodes:     []Node{{Name: "block", Capacity: joule(1000), Initial: kelvin(400)}},
		Exposures: []Exposure{{"block", units.SquareMetre.Of(0.5), constant(4, 300)}},
	})
	got, err := s.TimeTo("block", kelvin(350))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "half of the excess", got.SI(), 500*math.Ln2, 1e-9)
	heat, err := s.HeatReleased(got)
	if err != nil {
		t.Fatal(err)
	}
	within(t, "heat", heat.SI(), 50_000, 1e-6)
	within(t, "for ever", nodeAt(t, s, "block", 1e12), 300, 0)
}

// Heat from a heater and a flux that enters leaves again: at rest the node is (P + q A)/(h A) above the ambient, and
// what is set free in it, but not what enters through its surface, is released on balance.
func TestPowerAndFlux(t *testing.T) {
	area := units.SquareMetre.Of(0.5)
	s := solveNetwork(t, Network{
		Nodes: []Node{{Name: "block", Capacity: joule(1000), Initial: kelvin(315), Power: units.Watt.Of(20)}},
		Exposures: []Exposure{
			{"block", area, boundary.Sum(constant(4, 300), boundary.Flux(units.WattPerSquareMetre.Of(-20)))},
		},
	})
	within(t, "at rest", nodeAt(t, s, "block", 5000), 315, 1e-12)
	heat, err := s.HeatReleased(seconds(5000))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "heat released", heat.SI(), 20*5000, 1e-6)
}

// A log with a step is followed by an integration as by the closed form.
func TestIntegratedFollowsLog(t *testing.T) {
	n := cup(1000, 300, 5, 0.5, 363, 293, 283)
	n.Surroundings[0].Temperature = boundary.Log(
		[]units.Duration{seconds(0), seconds(700), seconds(700), seconds(1500)},
		[]units.Temperature{kelvin(283), kelvin(290), kelvin(350), kelvin(300)},
	)
	n.Horizon = seconds(1500)
	want := solveNetwork(t, n)
	n.Links[1] = Link{From: "cup", To: "room", Flow: func(a, b units.Temperature) (units.Power, error) { return units.Watt.Of(0.5 * a.Sub(b).SI()), nil }}
	got := solveNetwork(t, n)
	for _, at := range []float64{100, 699, 700, 701, 800, 1500} {
		for _, node := range []string{"tea", "cup"} {
			within(t, node, nodeAt(t, got, node, at), nodeAt(t, want, node, at), 0.01)
		}
	}
}

// Bodies that only have each other keep their heat and come to the temperature of mixing.
func TestIsolatedNetworkKeepsItsHeat(t *testing.T) {
	n := Network{
		Nodes: []Node{
			{Name: "water", Capacity: joule(4000), Initial: kelvin(293)},
			{Name: "shot", Capacity: joule(130), Initial: kelvin(373)},
			{Name: "cup", Capacity: joule(0.08), Initial: kelvin(288)},
		},
		Links: []Link{{From: "water", To: "shot", Conductance: conductance(30)}, {From: "cup", To: "water", Conductance: conductance(5)}},
	}
	s := solveNetwork(t, n)
	mixed := (4000*293 + 130*373 + 0.08*288) / 4130.08
	for _, at := range []float64{0, 0.001, 1, 10, 1e9} {
		mean, err := s.Mean(seconds(at))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "mean", mean.SI(), mixed, 1e-11)
		heat, err := s.HeatReleased(seconds(at))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "heat released", heat.SI(), 0, 1e-7)
	}
	within(t, "shot in the end", nodeAt(t, s, "shot", 1e6), mixed, 1e-11)
	if got := len(s.TimeConstants()); got != 2 {
		t.Errorf("%d time constants, want one less than nodes", got)
	}
	// The cup is at first colder than the mixture; heat set free in the water then has nowhere to go.
	n.Nodes[0].Power = units.Watt.Of(20)
	s = solveNetwork(t, n)
	within(t, "rise with power", nodeAt(t, s, "water", 2e4)-nodeAt(t, s, "water", 1e4), 20*1e4/4130.08, 1e-8)
	if limit, ok := s.Limit("water"); ok {
		t.Errorf("a limit of %v with heat that has nowhere to go", limit)
	}
	if _, err := s.TimeTo("cup", kelvin(1000)); err != nil {
		t.Errorf("a rise for ever does not reach: %v", err)
	}
	if got, err := s.TimeTo("water", kelvin(200)); err != nil || got.SI() != 0 {
		t.Errorf("a target behind: %v, %v", got, err)
	}
}

// A cup first warms and then cools: the first crossing, the far side, and never.
func TestFirstCrossing(t *testing.T) {
	s := solveNetwork(t, cup(1000, 300, 5, 0.5, 363, 293, 293))
	peak, at := 0.0, 0.0
	for x := 0.0; x < 2000; x++ {
		if T := nodeAt(t, s, "cup", x); T > peak {
			peak, at = T, x
		}
	}
	up, err := s.TimeTo("cup", kelvin(peak-1))
	if err != nil || up.SI() >= at {
		t.Errorf("first at %v, %v, want before the peak at %g s", up, err, at)
	}
	within(t, "there", nodeAt(t, s, "cup", up.SI()), peak-1, 1e-9)
	var never *units.NeverError
	if _, err := s.TimeTo("cup", kelvin(peak+1)); !errors.As(err, &never) || never.Limit != kelvin(293) || never.Condition != "" {
		t.Errorf("above the peak: %v", err)
	}
	// In a colder room the limit lies behind the start, but the cup heads for the target, and misses it.
	colder := solveNetwork(t, cup(1000, 300, 5, 0.5, 363, 293, 283))
	if got, err := colder.TimeTo("cup", kelvin(peak+1)); !errors.As(err, &never) || never.Limit != kelvin(283) {
		t.Errorf("above the peak in a colder room: %v, %v", got, err)
	}
	if _, err := s.TimeTo("tea", kelvin(293)); !errors.As(err, &never) {
		t.Errorf("the limit itself: %v", err)
	}
	if got, err := s.TimeTo("tea", kelvin(370)); err != nil || got.SI() != 0 {
		t.Errorf("above the start of what cools: %v, %v", got, err)
	}
	if got, err := s.TimeTo("tea", kelvin(363)); err != nil || got.SI() != 0 {
		t.Errorf("the start: %v, %v", got, err)
	}
}

// The long response of one node to what changes around it, from the theory of first-order systems: it is τ behind a
// ramp, and shows 1/√(1 + (ωτ)²) of a swing.
func TestChangingSurroundings(t *testing.T) {
	const tau = 200.0
	follow := func(c boundary.Course) *NetworkSolution {
		return solveNetwork(t, Network{
			Nodes:        []Node{{Name: "x", Capacity: joule(tau), Initial: kelvin(300)}},
			Surroundings: []Surroundings{{"air", c}},
			Links:        []Link{{From: "air", To: "x", Conductance: conductance(1)}},
			Horizon:      seconds(20_000),
		})
	}
	ramp := follow(boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(0.01)))
	for _, at := range []float64{10, 200, 10_000} {
		within(t, "ramp", nodeAt(t, ramp, "x", at), 300+0.01*(at-tau*(-math.Expm1(-at/tau))), 1e-9)
	}
	const period = 1000.0
	swing := follow(boundary.Oscillation(kelvin(300), units.KelvinDifference.Of(10), seconds(period), seconds(0)))
	omega := 2 * math.Pi / period
	highest := 0.0
	for at := 18_000.0; at < 19_000; at++ {
		highest = max(highest, nodeAt(t, swing, "x", at)-300)
	}
	within(t, "swing", highest, 10/math.Hypot(1, omega*tau), 1e-4)
	at := 19_000 + math.Atan(omega*tau)/omega
	within(t, "zero of the swing", nodeAt(t, swing, "x", at), 300, 1e-9)
	// A log with a step, a bend and a rest, against a chain of the closed forms.
	log := boundary.Log(
		[]units.Duration{seconds(0), seconds(100), seconds(100), seconds(300)},
		[]units.Temperature{kelvin(300), kelvin(320), kelvin(310), kelvin(290)},
	)
	s := follow(log.Holding())
	first := 300 + 0.2*(100-tau*(-math.Expm1(-100/tau)))
	within(t, "at the step", nodeAt(t, s, "x", 100), first, 1e-9)
	second := 290 + 0.1*tau + (first-310-0.1*tau)*math.Exp(-200/tau)
	within(t, "at the bend", nodeAt(t, s, "x", 300), second, 1e-9)
	within(t, "at rest", nodeAt(t, s, "x", 500), 290+(second-290)*math.Exp(-200/tau), 1e-9)
	var horizon *units.HorizonError
	if _, err := ramp.TimeTo("x", kelvin(499)); !errors.As(err, &horizon) || horizon.Limit.SI() != 500 {
		t.Errorf("beyond the horizon of a ramp: %v", err)
	}
	var never *units.NeverError
	if _, err := ramp.TimeTo("x", kelvin(501)); !errors.As(err, &never) || never.Condition == "" {
		t.Errorf("beyond where the ramp ends: %v", err)
	}
	if got, err := ramp.TimeTo("x", kelvin(290)); err != nil || got.SI() != 0 {
		t.Errorf("behind the start: %v, %v", got, err)
	}
	if _, err := s.TimeTo("x", kelvin(290)); !errors.As(err, &never) {
		t.Errorf("the rest of a log, which is only tended to: %v", err)
	}
	var late *units.RangeError
	_, err := Network{
		Nodes:        []Node{{Name: "x", Capacity: joule(tau), Initial: kelvin(300)}},
		Surroundings: []Surroundings{{"air", log}},
		Links:        []Link{{From: "air", To: "x", Conductance: conductance(1)}},
		Horizon:      seconds(301),
	}.Solve(context.Background())
	if !errors.As(err, &late) {
		t.Errorf("a log that ends before the horizon: %v", err)
	}
}

// What is integrated agrees with the closed form where a function states the same, and keeps the heat.
func TestIntegratedAgainstClosedForm(t *testing.T) {
	closed := cup(1000, 300, 5, 0.5, 363, 293, 283)
	open := closed
	open.Links = []Link{
		{From: "tea", To: "cup", Flow: func(a, b units.Temperature) (units.Power, error) { return units.Watt.Of(5 * a.Sub(b).SI()), nil }},
		{From: "room", To: "cup", Flow: func(a, b units.Temperature) (units.Power, error) { return units.Watt.Of(0.5 * a.Sub(b).SI()), nil }},
	}
	open.Horizon = seconds(3000)
	want, got := solveNetwork(t, closed), solveNetwork(t, open)
	for _, at := range []float64{0, 1, 50, 500, 3000} {
		for _, node := range []string{"tea", "cup"} {
			within(t, node, nodeAt(t, got, node, at), nodeAt(t, want, node, at), 0.01)
		}
		a, _ := want.HeatReleased(seconds(at))
		b, _ := got.HeatReleased(seconds(at))
		within(t, "heat", b.SI(), a.SI(), 13)
	}
	for _, target := range []float64{315, 340} {
		a, err1 := want.TimeTo("tea", kelvin(target))
		b, err2 := got.TimeTo("tea", kelvin(target))
		if err1 != nil || err2 != nil || math.Abs(a.SI()-b.SI()) > 1 {
			t.Errorf("tea to %g K: %v, %v, want %v, %v", target, b, err2, a, err1)
		}
	}
	if limit, ok := got.Limit("tea"); !ok || math.Abs(limit.SI()-283) > 1e-3 {
		t.Errorf("limit %v, %v, want 283 K", limit, ok)
	}
	var never *units.NeverError
	if _, err := got.TimeTo("tea", kelvin(283)); !errors.As(err, &never) {
		t.Errorf("the limit of an integration: %v", err)
	}
	var horizon *units.HorizonError
	if _, err := got.TimeTo("tea", kelvin(284)); !errors.As(err, &horizon) {
		t.Errorf("after the horizon: %v", err)
	}
	// Two plates that radiate to each other, and to nothing else: σ A (T1⁴ − T2⁴).
	plates := solveNetwork(t, Network{
		Nodes:   []Node{{Name: "hot", Capacity: joule(500), Initial: kelvin(900)}, {Name: "cold", Capacity: joule(700), Initial: kelvin(300)}},
		Horizon: seconds(5000),
		Links: []Link{{From: "hot", To: "cold", Flow: func(a, b units.Temperature) (units.Power, error) {
			return units.Watt.Of(0.05 * sigma * (math.Pow(a.SI(), 4) - math.Pow(b.SI(), 4))), nil
		}}},
	})
	for _, at := range []float64{1, 100, 5000} {
		heat, err := plates.HeatReleased(seconds(at))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "heat that stays", heat.SI(), 0, 1e-5)
	}
	if limit, ok := plates.Limit("hot"); !ok || math.Abs(limit.SI()-550) > 0.01 {
		t.Errorf("plates tend to %v, %v, want 550 K", limit, ok)
	}
}

// Radiation alone to surroundings near 0 K: t = (η³ − 1) C/(3 A σ T0³) for a fall by the factor η.
func TestRadiatingNode(t *testing.T) {
	const c, area, T0 = 1000.0, 0.02, 1000.0
	s := solveNetwork(t, Network{
		Nodes:     []Node{{Name: "ball", Capacity: joule(c), Initial: kelvin(T0)}},
		Exposures: []Exposure{{"ball", units.SquareMetre.Of(area), boundary.Radiation(1, kelvin(1))}},
		Horizon:   units.Hour.Of(1),
	})
	got, err := s.TimeTo("ball", kelvin(T0/2))
	if err != nil {
		t.Fatal(err)
	}
	want := 7 * c / (3 * area * sigma * T0 * T0 * T0)
	within(t, "half", got.SI(), want, 1e-4*want)
}

func TestNetworkRefusals(t *testing.T) {
	good := cup(1000, 300, 5, 0.5, 363, 293, 293)
	change := func(f func(n *Network)) Network {
		n := cup(1000, 300, 5, 0.5, 363, 293, 293)
		f(&n)
		return n
	}
	for _, c := range []struct {
		name string
		n    Network
	}{
		{"empty", Network{}},
		{"no capacity", change(func(n *Network) { n.Nodes[1].Capacity = joule(0) })},
		{"negative capacity", change(func(n *Network) { n.Nodes[1].Capacity = joule(-1) })},
		{"no initial temperature", change(func(n *Network) { n.Nodes[0].Initial = units.Temperature{} })},
		{"power that is no number", change(func(n *Network) { n.Nodes[0].Power = units.Watt.Of(math.NaN()) })},
		{"one name twice", change(func(n *Network) { n.Nodes[1].Name = "tea" })},
		{"node and surroundings of one name", change(func(n *Network) { n.Surroundings[0].Name = "tea" })},
		{"surroundings of no temperature", change(func(n *Network) { n.Surroundings[0].Temperature = boundary.Course{} })},
		{"link from nowhere", change(func(n *Network) { n.Links[0].From = "x" })},
		{"link to nowhere", change(func(n *Network) { n.Links[0].To = "x" })},
		{"link with itself", change(func(n *Network) { n.Links[0].To = "tea" })},
		{"link of surroundings", change(func(n *Network) { n.Links[0] = Link{From: "room", To: "room", Conductance: conductance(1)} })},
		{"no conductance", change(func(n *Network) { n.Links[0].Conductance = conductance(0) })},
		{"negative conductance", change(func(n *Network) { n.Links[0].Conductance = conductance(-1) })},
		{"two kinds of link", change(func(n *Network) {
			n.Links[0].Flow = func(a, b units.Temperature) (units.Power, error) { return units.Power{}, nil }
		})},
		{"exposure of nothing", change(func(n *Network) { n.Exposures = []Exposure{{"x", units.SquareMetre.Of(1), constant(1, 300)}} })},
		{"exposure of no area", change(func(n *Network) { n.Exposures = []Exposure{{"tea", units.SquareMetre.Of(0), constant(1, 300)}} })},
		{"a stated temperature", change(func(n *Network) {
			n.Exposures = []Exposure{{"tea", units.SquareMetre.Of(1), boundary.Temperature(kelvin(300))}}
		})},
		{"no horizon for a ramp", change(func(n *Network) {
			n.Surroundings[0].Temperature = boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(1))
		})},
		{"no horizon for radiation", change(func(n *Network) {
			n.Exposures = []Exposure{{"tea", units.SquareMetre.Of(1), boundary.Radiation(1, kelvin(300))}}
		})},
		{"a ramp to 0 K", change(func(n *Network) {
			n.Surroundings[0].Temperature, n.Horizon = boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(-1)), seconds(400)
		})},
		{"a swing to 0 K", change(func(n *Network) {
			n.Surroundings[0].Temperature, n.Horizon = boundary.Oscillation(kelvin(300), units.KelvinDifference.Of(400), seconds(1), seconds(0)), seconds(400)
		})},
		{"negative horizon", change(func(n *Network) { n.Horizon = seconds(-1) })},
		{"negative tolerance", change(func(n *Network) { n.Tolerance = units.KelvinDifference.Of(-1) })},
		{"no finite ratios", change(func(n *Network) { n.Nodes[0].Capacity, n.Links[0].Conductance = joule(1e-300), conductance(1e300) })},
	} {
		var a *units.ArgumentError
		if s, err := c.n.Solve(context.Background()); !errors.As(err, &a) || s != nil || a.Accepted == "" {
			t.Errorf("%s: %v", c.name, err)
		}
	}
	var a *units.ArgumentError
	var none context.Context
	if _, err := good.Solve(none); !errors.As(err, &a) {
		t.Errorf("no context: %v", err)
	}
	s := solveNetwork(t, good)
	for name, err := range map[string]error{
		"unknown node":  second(s.At("x", seconds(1))),
		"negative time": second(s.At("tea", seconds(-1))),
		"no number":     second(s.At("tea", seconds(math.NaN()))),
		"target":        second(s.TimeTo("tea", units.Temperature{})),
		"zero solution": second((&NetworkSolution{}).At("tea", seconds(1))),
		"no solution":   second((*NetworkSolution)(nil).Mean(seconds(1))),
		"heat":          second(s.HeatReleased(seconds(-1))),
	} {
		if !errors.As(err, &a) {
			t.Errorf("%s: %v", name, err)
		}
	}
	if r := (*NetworkSolution)(nil).Derivation(); len(r.Lines) != 0 {
		t.Error("a derivation of nothing")
	}
}

// second drops an answer.
func second[T any](_ T, err error) error { return err }

// An exchange that fails ends the solution where it was.
func TestNetworkGivesUp(t *testing.T) {
	broken := errors.New("broken")
	n := cup(1000, 300, 5, 0.5, 363, 293, 293)
	n.Horizon = seconds(3000)
	n.Links[0] = Link{From: "tea", To: "cup", Flow: func(a, b units.Temperature) (units.Power, error) {
		if a.SI() < 340 {
			return units.Power{}, broken
		}
		return units.Watt.Of(5 * a.Sub(b).SI()), nil
	}}
	s, err := n.Solve(context.Background())
	var c *units.ConvergenceError
	if s == nil || !errors.As(err, &c) || !errors.Is(err, broken) {
		t.Fatalf("%v, %v", s, err)
	}
	if _, err := s.At("tea", c.Time); err != nil {
		t.Errorf("what was computed: %v", err)
	}
	if _, err := s.TimeTo("tea", kelvin(320)); !errors.As(err, &c) {
		t.Errorf("beyond it: %v", err)
	}
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	if s, err := n.Solve(ctx); s != nil || !errors.Is(err, context.Canceled) {
		t.Errorf("ended before: %v, %v", s, err)
	}
}

func steadily(name string, T float64) Surroundings {
	return Surroundings{name, boundary.Steady(kelvin(T))}
}
