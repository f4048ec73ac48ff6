package fdm

import (
	"context"
	"math"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A Problem is a body of one coordinate that exchanges heat through one face or two. Fields without a
// default must be set.
type Problem struct {
	// Body is a sphere, a hollow sphere, a plate, or a cylinder or a tube whose ends are not exposed.
	Body shape.Body

	// Material is what the whole body is made of. A body of several materials has Layers instead.
	Material Material
	Layers   []Layer // from the surface inwards; together they are as thick as the body

	Initial units.Temperature // of the whole body, unless there is a Profile
	// Profile gives the temperature at the start at a depth below the surface, instead of Initial.
	Profile shape.Profile

	// Surface is what happens at the surface, Opposite at the face across the wall: the back of a plate,
	// the inside of a hollow body. The zero Opposite is what Surface says if that face is exposed, and
	// insulation if not. A plate that is exposed alike on both faces is solved for one half of it.
	Surface, Opposite boundary.Condition

	// SurfaceLump and OppositeLump are bodies of one temperature at the faces, which exchange heat beside
	// the conditions; a face that has one may be without a condition. Nil: none.
	SurfaceLump, OppositeLump *Lump

	// Source gives the heat that is set free per volume at a depth below the surface, negative where it is taken up;
	// nil: none.
	Source func(depth units.Length, t units.Duration, T units.Temperature) (units.HeatSource, error)

	// Horizon is how long the body is followed, above 0. A surface that jumps in time is best solved up to the
	// jump, since a short event may pass between steps, which are at most a sixteenth of the horizon
	// for a function of time.
	Horizon units.Duration

	// Until, if it is set, ends the solution once every node of the body has passed that temperature;
	// the solution then ends there. It does nothing if it equals Initial.
	Until units.Temperature

	// Stop are events that end the solution; see [Event].
	Stop []Event

	// Accuracy is the largest numerical error that is wanted at the surface, the centre or the opposite face, where
	// layers meet, and in the mean, from a Fourier number of 1e-4 of the outermost layer on: 1 µK to 10 K. The
	// grid and the tolerance are then chosen so that the estimate keeps it ([Solution.LargestError]). If neither
	// it nor Cells, Smallest or Tolerance is set it is 10 mK, for which up to 512 cells are taken; a solution that needs more,
	// as of a body that melts at one temperature, then carries a warning.
	Accuracy units.TemperatureDifference

	// Cells is the number of cells between centre and surface, or across the wall where two faces are
	// apart, 4 to 10 000; 0 stands for 100 if a tolerance or a scheme is set. They are closer at exposed
	// faces and where layers meet.
	Cells int

	// Smallest is about the thickness of the cells at exposed faces; 0 stands for a fifth of the mean. A
	// sudden change is met from the time on in which heat comes through that thickness. If Cells is 0 it
	// is 100 to 400, as that thickness asks for.
	Smallest units.Length

	// Uniform makes all cells of a layer alike.
	Uniform bool

	// Tolerance is the estimated error allowed in one step, its root mean square over the volume, and three times
	// that at one place, 1 nK to 10 K; 0 stands for 1 mK if cells are set. With a
	// material whose specific heat jumps many-fold, a larger one takes more steps, not fewer.
	Tolerance units.TemperatureDifference

	// Scheme is how time is stepped; the zero Scheme adapts the steps to the tolerance. The others take
	// steps of TimeStep.
	Scheme   Scheme
	TimeStep units.Duration

	// Progress, if it is set, is called after every step with the part of the horizon that is done,
	// 0 to 1, from the goroutine that solves.
	Progress func(done float64)

	Sources, Notes []string // repeated unread in the derivation

	shared *sharedTables // of a study
	work   *workspace    // for one run after the other
}

// A Layer is a part of a body that is made of one material.
type Layer struct {
	Material  Material
	Thickness units.Length // above 0
	// Contact is the resistance between this layer and the next one inwards; 0: perfect contact. The
	// innermost layer has none.
	Contact units.ThermalInsulance
	// ContactAt, if it is set, gives that resistance for the temperatures on both sides instead, as in a
	// gap that opens or is crossed by radiation.
	ContactAt func(outer, inner units.Temperature) (units.ThermalInsulance, error)
}

// A Lump is a body of one temperature at a face: well-stirred liquid in a pot, a heater, the air of a
// room, a thin shell.
type Lump struct {
	HeatCapacity units.HeatCapacity // of the whole lump, above 0
	// Coefficient is that of the heat between the lump and the face, over the area of the face, above 0.
	Coefficient units.HeatTransferCoefficient
	Initial     units.Temperature
	// Exchange is what leaves the lump elsewhere, through Area: any condition but a prescribed temperature; the power of a
	// heater is a flux that enters. The zero Exchange is none, the zero Area that of the face.
	Exchange boundary.Condition
	Area     units.Area
}

const (
	defaultCells     = 100
	defaultTolerance = 1e-3 // K
	leastCells       = 4
	mostCells        = 10_000
	leastTolerance   = 1e-9
	mostTolerance    = 10.0
	mostSteps        = 20_000
	stepsPerHorizon  = 16 // least number of steps with a function of time
)

// Solve computes the temperatures over the horizon, on the grid that is asked for or on one that keeps the
// accuracy, and on coarser ones for the extrapolation and the estimates of its error. The context ends it between two
// steps.
//
// Errors: [*units.ArgumentError] for a field that cannot be, and [*units.RangeError] for a start outside
// the range of the material, both with a nil solution; [*units.ConvergenceError] when the run ended
// early, because the body left the range of its material (the cause is a [*units.RangeError]), a
// function of the caller failed (the cause is its error), the context ended (the cause is its error) or the
// tolerance could not be kept, and when an accuracy that was asked for is not met. The solution beside a
// ConvergenceError is not nil and is readable until then.
func (p Problem) Solve(ctx context.Context) (*Solution, error) {
	if ctx == nil {
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if p.work == nil {
		p.work = &workspace{}
	}
	s, err := p.prepare()
	if err != nil {
		return nil, err
	}
	if p.choosesGrid() {
		s, err = s.search(ctx)
	} else {
		err = s.solve(ctx)
	}
	s.problem.work = nil
	if s.fine == nil {
		return nil, err
	}
	s.findLimit()
	if err == nil && p.Progress != nil {
		p.Progress(1)
	}
	return s, err
}

// solve makes the runs of one grid. The fine run stays nil if it cannot begin.
func (s *Solution) solve(ctx context.Context) error {
	p := s.problem
	system, err := s.system(0)
	if err != nil {
		return s.atStart(err)
	}
	if err := s.checkStep(system); err != nil {
		return err
	}
	fine := runner{ctx: ctx, problem: p, wall: s.wall, start: s.start.SI(), share: shareOfFine}
	s.fine, err = fine.run(system, p.Horizon.SI(), p.Until, p.Stop)
	if err != nil {
		s.coarseFailure = err
		return err
	}
	s.stepFactor = stepSafety / (1 - math.Pow(2, -s.timeOrder()))
	s.first, s.throughCell = s.firstTime(), s.timeThroughCell()
	if err := s.climb(ctx); err != nil {
		return err
	}
	if err := s.locate(); err != nil {
		return err
	}
	s.estimate()
	return nil
}

// prepare checks the problem and makes what its runs share.
func (p Problem) prepare() (*Solution, error) {
	p.Sources = append([]string(nil), p.Sources...)
	p.Notes = append([]string(nil), p.Notes...)
	p.Layers = append([]Layer(nil), p.Layers...)
	p.Stop = append([]Event(nil), p.Stop...)
	if err := p.check(); err != nil {
		return nil, err
	}
	s := &Solution{problem: p, start: p.Initial, bounds: boundsOf(&p)}
	if p.Profile != nil {
		var err error
		if s.start, err = p.profile(units.Length{}); err != nil {
			return nil, err
		}
	}
	s.wall = p.wall(s.start)
	for _, l := range s.wall.layers {
		t, err := p.table(l.Material, s.start)
		if err != nil {
			return nil, err
		}
		s.tables = append(s.tables, t)
		change, err := p.change(l.Material, s.start)
		if err != nil {
			return nil, err
		}
		s.changes = append(s.changes, change)
		if err := p.checkDerived(l, s.start); err != nil {
			return nil, err
		}
	}
	return s, nil
}

// system returns the equations on the grid, or on one with half the cells, and half of those, and so on.
func (s *Solution) system(halvings int) (*fv.System, error) {
	p, w := s.problem, s.wall
	m := fv.Model{Grid: w.grid(halvings), Tolerance: p.tolerance(), Duration: p.Horizon.SI(), Scratch: p.work.scratchOf()}
	// Parts of the grid begin at the inner end.
	for j := len(w.layers) - 1; j >= 0; j-- {
		m.Tables = append(m.Tables, s.tables[j])
		m.Changes = append(m.Changes, s.changes[j])
		if j > 0 {
			m.Contacts = append(m.Contacts, contact(w.layers[j-1]))
		}
	}
	m.Surface = fv.Face{Exchange: exchange(p.Surface), Lump: p.SurfaceLump.inSI(m.Grid.Area)}
	if !w.half {
		m.Opposite = fv.Face{Exchange: exchange(p.opposite()), Lump: p.OppositeLump.inSI(m.Grid.Inner)}
	}
	if p.Profile != nil {
		m.Profile = func(x float64) (float64, error) {
			T, err := p.profile(units.Metre.Of(w.depth(x)))
			return T.SI(), err
		}
	}
	if p.Source != nil {
		m.Source = func(x, t, T float64) (float64, error) {
			q, err := p.Source(units.Metre.Of(w.depth(x)), units.Second.Of(t), units.Kelvin.Of(T))
			return q.SI(), err
		}
	}
	return fv.NewSystem(m)
}

// profile returns the temperature at the start at a depth, or an error that says where it cannot be.
func (p Problem) profile(depth units.Length) (units.Temperature, error) {
	T, err := p.Profile(depth)
	if err != nil {
		return T, err
	}
	return T, units.CheckTemperature("profile: temperature "+depth.String()+" below the surface", T)
}

// tolerance returns the tolerance in kelvin.
func (p Problem) tolerance() float64 {
	if t := p.Tolerance.SI(); t != 0 {
		return t
	}
	if p.choosesGrid() {
		return forSteps * p.accuracy()
	}
	return defaultTolerance
}
