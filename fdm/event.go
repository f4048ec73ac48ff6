package fdm

import (
	"math"

	"example.com/coolward/internal/fv"
	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// An Event ends a solution when something passes its limit; see [Reaches], [Differs] and [When]. It is
// looked for at the end of each step, which is at most a sixteenth of the horizon, and then located on the
// continuous extension to 1e-12 of the step, of what is extrapolated.
type Event struct {
	name   string
	places []shape.Place
	value  func(m Moment) (float64, error)
}

// Reaches is the event that a place passes a temperature, from either side.
func Reaches(place shape.Place, target units.Temperature) Event {
	return Event{
		name: place.String() + " at " + target.String(), places: []shape.Place{place},
		value: func(m Moment) (float64, error) {
			T, err := m.At(place)
			return T.SI() - target.SI(), err
		},
	}
}

// Differs is the event that two places come to differ by more than a limit, whichever is hotter, as for a
// body that might crack; or by less, if they start further apart.
func Differs(one, other shape.Place, limit units.TemperatureDifference) Event {
	return Event{
		name: one.String() + " and " + other.String() + " apart by " + limit.String(), places: []shape.Place{one, other},
		value: func(m Moment) (float64, error) {
			a, err := m.At(one)
			if err != nil {
				return 0, err
			}
			b, err := m.At(other)
			return math.Abs(a.SI()-b.SI()) - limit.SI(), err
		},
	}
}

// When is the event that a function changes its sign. Its values mean nothing else.
func When(name string, f func(m Moment) (float64, error)) Event { return Event{name: name, value: f} }

// A Moment is the body at one time of a solution. It is valid during the call of the function that it is handed to.
type Moment struct {
	tr       *track
	body     shape.Body
	time     float64
	step     int
	get      func(i int) float64
	s        *Solution // once it is made, which extrapolates; nil: the state on one grid
	fraction float64   // of the step
}

// Time returns the time.
func (m Moment) Time() units.Duration { return units.Second.Of(m.time) }

// At returns the temperature at a place, with the errors of [Solution.At].
func (m Moment) At(place shape.Place) (units.Temperature, error) {
	if m.tr == nil {
		return units.Temperature{}, &units.ArgumentError{Field: "fdm.Moment", Accepted: "one that an event is handed"}
	}
	if m.s != nil {
		g, err := m.s.gauge(place)
		if err != nil {
			return units.Temperature{}, err
		}
		return units.Kelvin.Of(m.s.temperature(&g, m.step, m.fraction)), nil
	}
	p, err := m.tr.probe(place, m.body)
	if err != nil {
		return units.Temperature{}, err
	}
	return units.Kelvin.Of(m.tr.read(&p, m.step, m.get)), nil
}

// An eventError is that of the function of an event.
type eventError struct {
	name  string
	cause error
}

func (e *eventError) Error() string { return e.name + ": " + e.cause.Error() }
func (e *eventError) Unwrap() error { return e.cause }

// A watch looks for events in a run.
type watch struct {
	tr     *track
	body   shape.Body
	events []Event
	last   []float64 // values at the end of the last step
	before []float64
}

// watch returns the watch over a run that begins.
func (tr *track) watch(events []Event, p Problem) (*watch, error) {
	w := &watch{tr: tr, body: p.Body, events: events, last: make([]float64, len(events)), before: make([]float64, len(events))}
	start := tr.system.Start()
	for i := range events {
		v, err := w.value(i, Moment{get: func(k int) float64 { return start[k] }})
		if err != nil {
			return w, err
		}
		w.last[i] = v
	}
	return w, nil
}

func (w *watch) value(i int, m Moment) (float64, error) {
	e := w.events[i]
	m.tr, m.body = w.tr, w.body
	v, err := e.value(m)
	if err == nil && math.IsNaN(v) {
		err = &units.ArgumentError{Field: "event: " + e.name + " at " + units.Second.Of(m.time).String(), Value: v, Accepted: "a number"}
	}
	if err != nil {
		return v, &eventError{e.name, err}
	}
	return v, nil
}

// passed reports whether an event has happened in the step that ends with the state y.
func (w *watch) passed(t float64, y []float64) (bool, error) {
	if len(w.events) == 0 {
		return false, nil
	}
	any := false
	copy(w.before, w.last)
	for i := range w.events {
		v, err := w.value(i, Moment{time: t, step: fv.Latest, get: func(k int) float64 { return y[k] }})
		if err != nil {
			return false, err
		}
		w.last[i] = v
		any = any || w.happened(i)
	}
	return any, nil
}

func (w *watch) happened(i int) bool {
	a, b := w.before[i], w.last[i]
	return a < 0 && b >= 0 || a > 0 && b <= 0
}

// locate finds the event that ended a solution once more, by what is extrapolated.
func (s *Solution) locate() error {
	if s.fine.stopped == "" || s.weight == 0 {
		return nil
	}
	s.fine.stopped = ""
	return s.fine.events.locate(s)
}

// locate ends the track at the first event in its last step, by the solution if there is one already.
func (w *watch) locate(by *Solution) error {
	h := w.tr.history
	k := h.Steps() - 1
	if k < 0 {
		return nil
	}
	var failure error
	for i := range w.events {
		if !w.happened(i) {
			continue
		}
		t0, length := h.Time(k), h.Time(k+1)-h.Time(k)
		fraction, ok := root.Find(func(s float64) float64 {
			v, err := w.value(i, Moment{
				time: t0 + s*length, step: k, fraction: s, s: by, get: func(j int) float64 { return h.Value(k, s, j) },
			})
			if err != nil {
				failure = err
				return math.NaN()
			}
			return v
		}, 0, 1, 1e-13)
		if failure != nil {
			return failure
		}
		if !ok {
			fraction = 1
		}
		if at := t0 + fraction*length; w.tr.stopped == "" || at < w.tr.end {
			w.tr.end, w.tr.stopped = at, w.events[i].name
		}
	}
	return nil
}

// Stopped returns the event that ended the solution, by its name, and when; false if none did.
func (s *Solution) Stopped() (event string, at units.Duration, ok bool) {
	if !s.made() || s.fine.stopped == "" {
		return "", units.Duration{}, false
	}
	return s.fine.stopped, s.Horizon(), true
}

func (p Problem) checkEvents() error {
	for _, e := range p.Stop {
		if e.value == nil {
			return &units.ArgumentError{Field: "event", Value: e.name, Accepted: "fdm.Reaches, Differs, or When with a function"}
		}
		for _, place := range e.places {
			if _, err := place.Depth(p.Body); err != nil && !place.IsMean() {
				return err
			}
		}
	}
	return nil
}
