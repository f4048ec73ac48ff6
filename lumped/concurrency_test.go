package lumped

import (
	"context"
	"math"
	"sync"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

func TestManyGoroutines(t *testing.T) {
	closed := Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)}
	for _, s := range []*Solution{solve(t, closed), solve(t, ball())} {
		var wg sync.WaitGroup
		for i := range 8 {
			wg.Go(func() {
				for j := range 50 {
					at := seconds(float64(10 * (i + j)))
					a, err1 := s.At(shape.Centre(), at)
					b, err2 := s.TimeTo(shape.Centre(), a)
					if err1 != nil || err2 != nil || math.Abs(b.SI()-at.SI()) > 1e-8 {
						t.Errorf("at %v: %v, %v, back %v, %v", at, a, err1, b, err2)
					}
				}
				s.Derivation()
			})
		}
		wg.Wait()
	}
}

// A solution does not follow later changes of what it was made from.
func TestSolutionIsItsOwn(t *testing.T) {
	p := ball()
	p.Notes = []string{"first"}
	s := solve(t, p)
	p.Notes[0] = "second"
	s.Derivation().Lines[0].Symbol = "changed"
	r := s.Derivation()
	if r.Lines[0].Symbol != "V" || r.Notes[len(r.Notes)-1] != "first" {
		t.Errorf("the solution changed:\n%v", r)
	}
}

func TestAllocations(t *testing.T) {
	p := Problem{Body: sphere(0.05), Material: constantStuff(1000, 2000, 15), Initial: kelvin(373.15), Surface: constant(10, 298.15)}
	s, integrated := solve(t, p), solve(t, ball())
	for name, f := range map[string]func(){
		"closed At":         func() { s.At(shape.Centre(), seconds(100)) },
		"closed TimeTo":     func() { s.TimeTo(shape.Centre(), kelvin(320)) },
		"closed heat":       func() { s.HeatReleased(seconds(100)) },
		"integrated At":     func() { integrated.At(shape.Centre(), seconds(100)) },
		"integrated TimeTo": func() { integrated.TimeTo(shape.Centre(), kelvin(330)) },
	} {
		if n := testing.AllocsPerRun(100, f); n != 0 {
			t.Errorf("%s allocates %v times", name, n)
		}
	}
	few := testing.AllocsPerRun(20, func() { ball().Solve(context.Background()) })
	fine := ball()
	fine.Tolerance = units.KelvinDifference.Of(1e-7)
	if many := testing.AllocsPerRun(20, func() { fine.Solve(context.Background()) }); many > few+3 {
		t.Errorf("%v allocations at 1 mK, %v at 0.1 µK: the steps allocate", few, many)
	}
}
