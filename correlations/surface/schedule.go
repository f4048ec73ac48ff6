package surface

import (
	"fmt"

	"example.com/coolward/units"
)

// A Schedule is a part that another takes over from at stated times: a fan that is switched on, a door that
// opens, a body that goes from the furnace into a tank. The last stage stays.
//
//	surface.Schedule{
//		{Part: still},
//		{From: units.Minute.Of(10), Part: fan},
//	}
//
// The flux jumps where a stage begins.
type Schedule []Stage

// A Stage is what happens from a time on.
type Stage struct {
	From units.Duration // 0 in the first stage, later in each than in the one before
	Part Part
}

// Name returns the names of the parts, each once.
func (s Schedule) Name() string {
	name := ""
	seen := map[string]bool{}
	for _, stage := range s {
		if stage.Part == nil || seen[stage.Part.Name()] {
			continue
		}
		if name != "" {
			name += ", then "
		}
		name += stage.Part.Name()
		seen[stage.Part.Name()] = true
	}
	if name == "" {
		return "schedule"
	}
	return name
}

// Check returns the error of the first part that is not usable, and an [*units.ArgumentError] if there is
// no stage, if the first is not from 0 on, and if the times do not rise.
func (s Schedule) Check() error {
	if len(s) == 0 {
		return s.empty()
	}
	for i, stage := range s {
		field := fmt.Sprintf("schedule: stage %d", i+1)
		if stage.Part == nil {
			return &units.ArgumentError{Field: field + ": part", Accepted: "a part; surface.GivenFlux{} where no heat passes"}
		}
		if i == 0 && stage.From.SI() != 0 {
			return &units.ArgumentError{Field: field + ": from", Value: stage.From, Accepted: "0 s, where every run begins"}
		}
		if i > 0 && !(stage.From.SI() > s[i-1].From.SI() && stage.From.IsFinite()) {
			return &units.ArgumentError{Field: field + ": from", Value: stage.From, Accepted: "finite, later than the stage before, " + s[i-1].From.String()}
		}
		if err := stage.Part.Check(); err != nil {
			return err
		}
	}
	return nil
}

func (s Schedule) empty() error {
	return &units.ArgumentError{Field: "schedule: stages", Accepted: "at least one stage, the first from 0 s on"}
}

// Flux returns the flux of the stage that t lies in, at the time of a change that of the new one. It returns
// the errors of [Schedule.Check] but for those of the parts that are not asked, the error of the
// part, and an [*units.ArgumentError] for a time below 0.
func (s Schedule) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if len(s) == 0 {
		return units.HeatFlux{}, s.empty()
	}
	if err := units.CheckNotNegative("schedule: time", t); err != nil {
		return units.HeatFlux{}, err
	}
	now, last := 0, 0.0
	for i := range s {
		from := s[i].From.SI()
		if s[i].Part == nil || i == 0 && from != 0 || i > 0 && !(from > last && s[i].From.IsFinite()) {
			return units.HeatFlux{}, s.Check()
		}
		if last = from; from <= t.SI() {
			now = i
		}
	}
	return s[now].Part.Flux(t, wall)
}

// Low returns the same schedule with every part at its lower end.
func (s Schedule) Low() Part { return s.each(Part.Low) }

// High returns the same schedule with every part at its upper end.
func (s Schedule) High() Part { return s.each(Part.High) }

func (s Schedule) each(end func(Part) Part) Part {
	ends := make(Schedule, len(s))
	for i, stage := range s {
		ends[i] = stage
		if stage.Part != nil {
			ends[i].Part = end(stage.Part)
		}
	}
	return ends
}

func (s Schedule) parts() Sum {
	parts := make(Sum, len(s))
	for i, stage := range s {
		parts[i] = stage.Part
	}
	return parts
}

// Sources returns those of all parts.
func (s Schedule) Sources() []string { return s.parts().Sources() }

// Notes returns those of all parts, and the times of the changes.
func (s Schedule) Notes() []string {
	list := s.parts().Notes()
	for _, stage := range s {
		if stage.Part != nil && stage.From.SI() > 0 {
			list = append(list, fmt.Sprintf("schedule: %s from %v on", stage.Part.Name(), stage.From))
		}
	}
	return list
}

// Warnings returns those of all parts.
func (s Schedule) Warnings() []string { return s.parts().Warnings() }
