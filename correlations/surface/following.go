package surface

import (
	"errors"

	"example.com/coolward/units"
)

// A Follower is a part with one temperature around it that may change: [Convection], [Radiation], [Enclosure], [Evaporation], [Contact],
// [GivenCoefficient].
type Follower interface {
	Part

	// In returns the same part with that temperature around it.
	In(ambient units.Temperature) Part
}

// Following is a part in an ambient temperature that goes with time. The temperature in the part itself
// is not used and may be left 0.
//
//	yard := boundary.Log(times, temperatures)
//	surface.Following{
//		Part:    surface.Convection{Body: ball, Fluid: props.Air()},
//		Ambient: yard.At,
//	}
type Following struct {
	Part    Follower
	Ambient TemperatureCourse
}

// Name returns the name of the part.
func (f Following) Name() string {
	if f.Part == nil {
		return "following"
	}
	return f.Part.Name()
}

// Check returns the error of the part in the ambient temperature at the beginning, and an
// [*units.ArgumentError] if there is no part or no course. That the course does not answer at the
// beginning is no error here.
func (f Following) Check() error {
	if err := f.check(); err != nil {
		return err
	}
	ambient, err := f.Ambient(units.Duration{})
	if err != nil {
		var bad *units.ArgumentError
		if errors.As(err, &bad) {
			return err
		}
		ambient = units.Kelvin.Of(300)
	}
	return f.Part.In(ambient).Check()
}

func (f *Following) check() error {
	if f.Part == nil {
		return &units.ArgumentError{Field: "following: part", Accepted: "a part with an ambient temperature, such as surface.Convection"}
	}
	if f.Ambient == nil {
		return &units.ArgumentError{Field: "following: ambient", Accepted: "a course of temperature, such as the At of a boundary.Log"}
	}
	return nil
}

// Flux returns the flux of the part in the ambient temperature of time t. Its errors are those of
// the course and of the part, and an [*units.ArgumentError] if there is no part or no course.
func (f Following) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := f.check(); err != nil {
		return units.HeatFlux{}, err
	}
	ambient, err := f.Ambient(t)
	if err != nil {
		return units.HeatFlux{}, err
	}
	// In returns an interface, which allocates; these two need not.
	switch p := f.Part.(type) {
	case Convection:
		p.Ambient = ambient
		return p.Flux(t, wall)
	case Radiation:
		p.Surroundings = ambient
		return p.Flux(t, wall)
	}
	return f.Part.In(ambient).Flux(t, wall)
}

// Low returns the same part at its lower end.
func (f Following) Low() Part { return f.at(Part.Low) }

// High returns the same part at its upper end.
func (f Following) High() Part { return f.at(Part.High) }

func (f Following) at(end func(Part) Part) Part {
	if f.Part == nil {
		return f
	}
	return Following{Part: follower{f.Part, end}, Ambient: f.Ambient}
}

// A follower is another at one end of what is known of it. The end is taken when the ambient temperature
// is there: a part without one fails its check and has no ends.
type follower struct {
	Follower
	end func(Part) Part
}

func (f follower) In(ambient units.Temperature) Part { return f.end(f.Follower.In(ambient)) }

func (f follower) Notes() []string { return f.end(f.Follower).Notes() }

// Sources returns those of the part.
func (f Following) Sources() []string { return f.texts(Part.Sources) }

// Notes returns those of the part.
func (f Following) Notes() []string {
	return append(f.texts(Part.Notes), f.Name()+": in an ambient temperature that goes with time")
}

// Warnings returns those of the part.
func (f Following) Warnings() []string { return f.texts(Part.Warnings) }

func (f Following) texts(of func(Part) []string) []string {
	if f.Part == nil {
		return nil
	}
	return of(f.Part)
}
