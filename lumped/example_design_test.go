package lumped_test

import (
	"cmp"
	"context"
	"fmt"
	"log"
	"slices"

	"example.com/coolward/lumped"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
	"example.com/coolward/units/uncertain"
)

var steel = metal{
	density:      units.KilogramPerCubicMetre.Of(7830),
	specificHeat: units.JoulePerKilogramKelvin.Of(470),
	conductivity: units.WattPerMetreKelvin.Of(45),
}

// How sure is a time when every input has a range? Low, likely and high, and which input moves it most. The same call
// serves every model: only the function that it is given differs.
func Example_howSure() {
	var study uncertain.Study
	d := uncertain.Add(&study, "diameter", uncertain.PlusMinus(units.Millimetre.Of(40), units.Millimetre.Of(0.2)).Rectangular(), uncertain.Source("calliper"))
	h := uncertain.Add(&study, "coefficient", uncertain.PerCent(units.WattPerSquareMetreKelvin.Of(25), 20).Normal(0.95), uncertain.Model("scatter of the correlation"))
	room := uncertain.Add(&study, "room", uncertain.Between(units.Celsius.Of(18), units.Celsius.Of(26)).Rectangular(), uncertain.Assumed("over a shift"))
	start := uncertain.Add(&study, "start", uncertain.PlusMinus(units.Celsius.Of(300), units.KelvinDifference.Of(5)).Rectangular(), uncertain.Source("oven"))

	r, err := uncertain.Propagate(context.Background(), &study, func(x uncertain.Draw) (units.Duration, error) {
		solution, err := lumped.Problem{
			Body: shape.Sphere(d.In(x)), Material: steel, Initial: start.In(x),
			Surface: boundary.Constant(h.In(x), room.In(x)),
		}.Solve(context.Background())
		if err != nil {
			return units.Duration{}, err
		}
		return solution.TimeTo(shape.Slowest(), units.Celsius.Of(50))
	})
	if err != nil {
		log.Fatal(err)
	}
	most := slices.MaxFunc(r.Shares, func(a, b uncertain.Share) int { return cmp.Compare(a.Total, b.Total) })
	fmt.Printf("low %.0f min, likely %.0f min, high %.0f min\n", r.Low.In(units.Minute), r.Likely.In(units.Minute), r.High.In(units.Minute))
	fmt.Println("moved most by the", most.Inputs[0])
	// Output:
	// low 31 min, likely 38 min, high 47 min
	// moved most by the coefficient
}

// A lithium cell with a heat of 1.2 W inside, of a can and what is in it: how warm it becomes, when it is at 45 °C, and
// which coefficient would keep it below that for an hour.
func Example_cell() {
	roll := metal{units.KilogramPerCubicMetre.Of(2700), units.JoulePerKilogramKelvin.Of(900), units.WattPerMetreKelvin.Of(1)}
	can := shape.Cylinder(units.Millimetre.Of(21), units.Millimetre.Of(70))
	cell := lumped.Problem{
		Body: can,
		Parts: []lumped.Part{
			{Name: "roll", Material: roll, Mass: units.Gram.Of(55)},
			{Name: "can", Material: steel, Mass: units.Gram.Of(14)},
		},
		Initial: units.Celsius.Of(25),
		Surface: boundary.Constant(units.WattPerSquareMetreKelvin.Of(9), units.Celsius.Of(25)),
		Source:  units.HeatSourceOf(units.Watt.Of(1.2), can.Volume()),
	}
	solution, err := cell.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	tau, err := solution.TimeConstant(units.Duration{})
	if err != nil {
		log.Fatal(err)
	}
	limit := units.Celsius.Of(45)
	t, err := solution.TimeTo(shape.Mean(), limit)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("time constant %.1f min, 45 °C after %.1f min\n", tau.In(units.Minute), t.In(units.Minute))

	h, err := lumped.JustMeeting(context.Background(),
		units.WattPerSquareMetreKelvin.Of(1), units.WattPerSquareMetreKelvin.Of(100), shape.Mean(), limit, units.Hour.Of(1),
		func(h units.HeatTransferCoefficient) lumped.Problem {
			p := cell
			p.Surface = boundary.Constant(h, units.Celsius.Of(25))
			return p
		})
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("%.1f W/(m² K) would keep it below 45 °C for an hour\n", h.In(units.WattPerSquareMetreKelvin))
	// Output:
	// time constant 19.6 min, 45 °C after 31.1 min
	// 11.0 W/(m² K) would keep it below 45 °C for an hour
}

// A pan of soup, in a cold room that is loaded at noon and warms for an hour: when is it between 55 and 15 °C, and how late may it
// be put in to be below 15 °C at six?
func ExampleProblem_LatestStart() {
	water := metal{units.KilogramPerCubicMetre.Of(1000), units.JoulePerKilogramKelvin.Of(4100), units.WattPerMetreKelvin.Of(0.6)}
	hours, celsius := units.Hour.Of, units.Celsius.Of
	room := boundary.Log(
		[]units.Duration{hours(0), hours(1), hours(3)},
		[]units.Temperature{celsius(3), celsius(9), celsius(3)},
	).Holding()
	pan := lumped.Problem{
		Body:     shape.Plate(units.Millimetre.Of(30), units.SquareMetre.Of(0.15)),
		Material: water,
		Initial:  celsius(75),
		Surface:  boundary.Following(units.WattPerSquareMetreKelvin.Of(20), room),
		Horizon:  hours(6),
	}
	solution, err := pan.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	stays, err := solution.Within(shape.Mean(), celsius(15), celsius(55))
	if err != nil {
		log.Fatal(err)
	}
	for _, stay := range stays {
		fmt.Printf("between 55 and 15 °C from %.2f h to %.2f h\n", stay.From.In(units.Hour), stay.To.In(units.Hour))
	}
	late, err := pan.LatestStart(context.Background(), shape.Mean(), celsius(15), hours(6))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("in at %.2f h at the latest\n", late.In(units.Hour))
	// Output:
	// between 55 and 15 °C from 0.28 h to 1.85 h
	// in at 4.47 h at the latest
}

// The same ball as one temperature, and with the resistance inside counted: what the surface and the centre are at.
func ExampleProblem_FirstOrder() {
	glass := metal{units.KilogramPerCubicMetre.Of(2500), units.JoulePerKilogramKelvin.Of(840), units.WattPerMetreKelvin.Of(1)}
	ball := lumped.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(16)),
		Material: glass,
		Initial:  units.Celsius.Of(500),
		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(40), units.Celsius.Of(30)),
	}
	for _, ball.FirstOrder = range []bool{false, true} {
		solution, err := ball.Solve(context.Background())
		if err != nil {
			log.Fatal(err)
		}
		t, err := solution.TimeTo(shape.Slowest(), units.Celsius.Of(60))
		if err != nil {
			log.Fatal(err)
		}
		wall, err := solution.At(shape.Surface(), t)
		if err != nil {
			log.Fatal(err)
		}
		late, err := solution.LumpingErrorInTime(shape.Centre(), units.Celsius.Of(60))
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("60 °C in the centre after %.0f s, exact %.0f s later; the surface is at %.1f °C then\n", t.In(units.Second), late.In(units.Second), wall.In(units.Celsius))
	}
	// Output:
	// 60 °C in the centre after 385 s, exact 39 s later; the surface is at 60.0 °C then
	// 60 °C in the centre after 423 s, exact 1 s later; the surface is at 55.9 °C then
}

// What the scatter of the coefficient does to a time is not symmetric.
func ExampleProblem_TimeBand() {
	band, err := lumped.Problem{
		Body: shape.Sphere(units.Millimetre.Of(40)), Material: steel, Initial: units.Celsius.Of(300),
		Surface: boundary.Constant(units.WattPerSquareMetreKelvin.Of(25), units.Celsius.Of(22)),
	}.TimeBand(context.Background(), shape.Centre(), units.Celsius.Of(50), 0.25)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("%.0f min, %.0f to %.0f min\n", band.Likely.In(units.Minute), band.Shortest.In(units.Minute), band.Longest.In(units.Minute))
	// Output:
	// 38 min, 30 to 50 min
}
