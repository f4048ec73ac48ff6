package series

import (
	"context"
	"fmt"
	"math"
	"strings"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A Reading is a temperature that was measured in a body.
type Reading struct {
	Place       shape.Place // or shape.Mean()
	Time        units.Duration
	Temperature units.Temperature
	Error       units.TemperatureDifference // by which it may be off, 0 or above
}

// A Fit is what readings say about a body: a problem that gives them all.
type Fit struct {
	Problem     Problem // with what was found put in
	Biot        float64 // h R/k; +Inf for a prescribed surface temperature
	Fourier     float64 // α t/R² of the reading, of two the first
	Diffusivity units.Diffusivity

	// By how much the answers may be off, relatively and to first order, if every reading is off by its Error
	// to the worst side: 0.01 is 1 %.
	BiotSpread, DiffusivitySpread float64

	biot, diffusivity []float64 // relative change for a kelvin more of each reading
}

// Moves returns by how much the Biot number and the diffusivity would be off, relatively and to first order, if the
// readings, in their order, were too high by the given differences.
func (f Fit) Moves(by ...units.TemperatureDifference) (biot, diffusivity float64) {
	for i, d := range by {
		if i < len(f.biot) {
			biot += f.biot[i] * d.SI()
			diffusivity += f.diffusivity[i] * d.SI()
		}
	}
	return biot, diffusivity
}

// An UnidentifiedError reports readings from which what is wanted does not follow: they do not depend on it, no value
// of it gives them, or several do.
type UnidentifiedError struct {
	Wanted  string // such as "heat transfer coefficient"
	Reason  string
	Answers []Fit // where several give the readings
}

// Error says why, with the Biot numbers of several answers.
func (e *UnidentifiedError) Error() string {
	s := e.Wanted + ": not to be had from the readings: " + e.Reason
	if len(e.Answers) > 0 {
		var each []string
		for _, f := range e.Answers {
			each = append(each, fmt.Sprintf("%.3g", f.Biot))
		}
		s += ": Bi " + strings.Join(each, ", ")
	}
	return s
}

const (
	coefficientName  = "heat transfer coefficient"
	conductivityName = "conductivity"
	diffusivityName  = "diffusivity"
	bothName         = "Biot number and diffusivity"
)

// FitCoefficient finds the heat transfer coefficient from one reading; all else in p is known, and the coefficient in
// p.Surface, a boundary.Constant, is of no account. There is one answer at most: by the maximum principle every place
// is nearer to the ambient the larger the coefficient is.
//
// It returns an [*UnidentifiedError] if no Biot number from 1e-9 to 1e9 gives the reading, or if its error moves the
// answer by more than a factor e, and an [*units.ArgumentError] for a field that cannot be used, such as a
// reading that is not between the start and the ambient.
func (p Problem) FitCoefficient(ctx context.Context, reading Reading) (Fit, error) {
	one, err := p.atBiot(ctx, 1)
	if err != nil {
		return Fit{}, err
	}
	theta, err := one.read(reading)
	if err != nil {
		return Fit{}, err
	}
	at := func(u float64) (*Solution, error) { return p.atBiot(ctx, math.Exp(u)) }
	low, err1 := at(-farBiot)
	high, err2 := at(farBiot)
	if err1 != nil || err2 != nil {
		return Fit{}, outOfRange("heat transfer coefficient for a Biot number of 1e9 or 1e-9", one.Biot())
	}
	if least := high.thetaOf(reading); !(theta > least) {
		return Fit{}, &UnidentifiedError{Wanted: coefficientName, Reason: "the largest coefficient leads to " + high.temperature(least).String() + ", and not to " + reading.Temperature.String()}
	}
	if most := low.thetaOf(reading); !(theta < most) {
		return Fit{}, &UnidentifiedError{Wanted: coefficientName, Reason: "no heat has come from the surface: without a coefficient the reading would be " + low.temperature(most).String()}
	}
	u, ok := root.Find(func(u float64) float64 {
		s, err := at(u)
		if err != nil {
			return math.NaN()
		}
		return s.misfit(reading, theta)
	}, -farBiot, farBiot, 0)
	if !ok {
		return Fit{}, notFound(coefficientName)
	}
	return p.fit(ctx, coefficientName, math.Exp(u), units.Diffusivity{}, reading)
}

// farBiot is the logarithm of 1e9.
var farBiot = math.Log(1e9)

// FitDiffusivity finds the diffusivity from one reading where the Biot number is known, or the surface temperature
// prescribed: p.Density and p.SpecificHeat are of no account but for the problem of the answer, whose Density is
// changed. There is one answer at most, because every place moves to the ambient all the time.
//
// It returns an [*UnidentifiedError] if the reading, at the surface of a prescribed temperature or with a
// coefficient of 0, does not depend on it, and if its error moves the answer by more than a factor e, and
// an [*units.ArgumentError] for a field that cannot be used.
func (p Problem) FitDiffusivity(ctx context.Context, reading Reading) (Fit, error) {
	s, err := p.Solve(ctx)
	if err != nil {
		return Fit{}, err
	}
	if err := s.plain(); err != nil {
		return Fit{}, err
	}
	theta, err := s.read(reading)
	if err != nil {
		return Fit{}, err
	}
	where, err := s.positionOf(reading.Place)
	if err != nil {
		return Fit{}, err
	}
	fo, ok := s.timeAt(where, theta)
	if !ok || fo == 0 {
		return Fit{}, &UnidentifiedError{Wanted: diffusivityName, Reason: "the " + reading.Place.String() + " does not depend on it"}
	}
	return p.fit(ctx, diffusivityName, s.Biot(), s.diffusivityFor(fo, reading.Time), reading)
}

// FitConductivity finds the conductivity from one reading; all else in p is known. Where p.Surface is a boundary.Constant
// two conductivities can give the same reading: the surface, and all places at late times, stay
// warm with a large one, which the heat of the core follows, and with a small one, which keeps it inside.
//
// It returns an [*UnidentifiedError] if none or several with Biot numbers from 1e-4 to 1e4 give the reading,
// or if its error moves the answer by more than a factor e, and an [*units.ArgumentError] for a field that
// cannot be used.
func (p Problem) FitConductivity(ctx context.Context, reading Reading) (Fit, error) {
	if _, prescribed := p.Surface.SurfaceTemperature(); prescribed {
		f, err := p.FitDiffusivity(ctx, reading)
		if err == nil { // density and specific heat are known here
			f.Problem.Density = p.Density
			f.Problem.Conductivity = units.WattPerMetreKelvin.Of(f.Diffusivity.SI() * p.Density.SI() * p.SpecificHeat.SI())
		}
		return f, err
	}
	one, err := p.Solve(ctx)
	if err != nil {
		return Fit{}, err
	}
	if err := one.plain(); err != nil {
		return Fit{}, err
	}
	theta, err := one.read(reading)
	if err != nil {
		return Fit{}, err
	}
	if one.Biot() == 0 {
		return Fit{}, &UnidentifiedError{Wanted: conductivityName, Reason: "a coefficient of 0 leaves the body as it is"}
	}
	at := func(u float64) (*Solution, error) { // by the logarithm of the Biot number
		q := p
		q.Conductivity = p.Conductivity.Scale(one.Biot() / math.Exp(u))
		return q.Solve(ctx)
	}
	biots, err := scan(func(u float64) (float64, error) {
		s, err := at(u)
		if err != nil {
			return 0, err
		}
		return s.misfit(reading, theta), nil
	})
	if err != nil {
		return Fit{}, err
	}
	return choose(conductivityName, biots, func(bi float64) (Fit, error) {
		alpha := units.SquareMetrePerSecond.Of(one.diffusivity * one.Biot() / bi)
		return p.fit(ctx, conductivityName, bi, alpha, reading)
	})
}

// FitBiotAndDiffusivity finds both from two readings, at two places, at two times, or both; p.Conductivity,
// p.Density, p.SpecificHeat and the coefficient in p.Surface, a boundary.Constant, are of no account but that
// with density and specific heat the conductivity and the coefficient of the answer follow.
//
// For each Biot number the first reading gives one diffusivity; the Biot numbers for which that gives the second
// reading too are searched for between 1e-4 and 1e4. The surface and the centre at one time, or any place at one
// time and another at late times, leave one answer; a place between them at two times may leave two.
//
// It returns an [*UnidentifiedError] if none or several give the readings, or if their errors move the answer by more
// than a factor e, and an [*units.ArgumentError] for a field that cannot be used.
func (p Problem) FitBiotAndDiffusivity(ctx context.Context, first, second Reading) (Fit, error) {
	one, err := p.atBiot(ctx, 1)
	if err != nil {
		return Fit{}, err
	}
	if _, err := one.read(first); err != nil {
		return Fit{}, err
	}
	theta, err := one.read(second)
	if err != nil {
		return Fit{}, err
	}
	if first.Place == second.Place && first.Time == second.Time {
		return Fit{}, &units.ArgumentError{Field: "second reading", Value: second.Place.String() + " after " + second.Time.String(), Accepted: "another place or another time than that of the first"}
	}
	biots, err := scan(func(u float64) (float64, error) {
		s, fo, err := p.through(ctx, math.Exp(u), first)
		if err != nil {
			return 0, err
		}
		return s.misfitAt(second.Place, fo*second.Time.Ratio(first.Time), theta), nil
	})
	if err != nil {
		return Fit{}, err
	}
	return choose(bothName, biots, func(bi float64) (Fit, error) {
		s, fo, err := p.through(ctx, bi, first)
		if err != nil {
			return Fit{}, err
		}
		return p.fit(ctx, bothName, bi, s.diffusivityFor(fo, first.Time), first, second)
	})
}

// atBiot solves p with the coefficient that gives a Biot number.
func (p Problem) atBiot(ctx context.Context, bi float64) (*Solution, error) {
	_, ambient, ok := p.Surface.Constants()
	if !ok {
		return nil, &units.ArgumentError{Field: "surface condition", Value: p.Surface.String(), Accepted: "boundary.Constant(h, ambient), of which the ambient counts"}
	}
	if err := p.Body.Check(); err != nil {
		return nil, err
	}
	factors := p.Body.Factors()
	if factors == nil {
		_, err := p.Solve(ctx) // says what is wrong
		return nil, err
	}
	h := bi * p.Conductivity.SI() / factors[0].ConductionLength().SI()
	p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), ambient)
	s, err := p.Solve(ctx)
	if err != nil {
		return nil, err
	}
	return s, s.plain()
}

// through returns the solution for a Biot number, and the Fourier number at which it gives a reading.
func (p Problem) through(ctx context.Context, bi float64, r Reading) (*Solution, float64, error) {
	s, err := p.atBiot(ctx, bi)
	if err != nil {
		return nil, 0, err
	}
	theta, err := s.read(r)
	if err != nil {
		return nil, 0, err
	}
	where, err := s.positionOf(r.Place)
	if err != nil {
		return nil, 0, err
	}
	fo, ok := s.timeAt(where, theta)
	if !ok {
		return nil, 0, notFound(bothName)
	}
	return s, fo, nil
}

// fit makes the answer for a Biot number and a diffusivity, the zero one for that of p, and refuses one that the
// errors of the readings leave open.
func (p Problem) fit(ctx context.Context, wanted string, bi float64, alpha units.Diffusivity, readings ...Reading) (Fit, error) {
	_, ambient, convective := p.Surface.Constants()
	length := p.Body.Factors()[0].ConductionLength().SI()
	k := p.Conductivity.SI()
	switch wanted {
	case diffusivityName:
		p.Density = units.KilogramPerCubicMetre.Of(k / (alpha.SI() * p.SpecificHeat.SI()))
	case conductivityName, bothName:
		k = alpha.SI() * p.Density.SI() * p.SpecificHeat.SI()
		p.Conductivity = units.WattPerMetreKelvin.Of(k)
	}
	if convective && (wanted == coefficientName || wanted == bothName) {
		p.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(bi*k/length), ambient)
	}
	s, err := p.Solve(ctx)
	if err != nil {
		return Fit{}, err
	}
	f := Fit{Problem: p, Biot: s.Biot(), Fourier: s.Fourier(readings[0].Time), Diffusivity: units.SquareMetrePerSecond.Of(s.diffusivity)}
	f.biot, f.diffusivity, err = s.inverse(wanted, readings)
	if err != nil {
		return Fit{}, err
	}
	for i, r := range readings {
		f.BiotSpread += math.Abs(f.biot[i]) * r.Error.SI()
		f.DiffusivitySpread += math.Abs(f.diffusivity[i]) * r.Error.SI()
	}
	if spread := math.Max(f.BiotSpread, f.DiffusivitySpread); !(spread <= 1) {
		return Fit{}, &UnidentifiedError{Wanted: wanted, Reason: fmt.Sprintf("their errors move it by a factor of %.2g", math.Exp(spread))}
	}
	return f, nil
}

// least is the change of θ for a relative change of 1 below which a reading does not depend on what is wanted.
const least = 1e-9

// inverse returns the relative changes of Biot number and diffusivity for a kelvin more of each reading.
func (s *Solution) inverse(wanted string, readings []Reading) (biot, diffusivity []float64, err error) {
	n := len(readings)
	byBiot, byFourier := make([]float64, n), make([]float64, n)
	for i, r := range readings {
		where, err := s.positionOf(r.Place)
		if err != nil {
			return nil, nil, err
		}
		T := s.sensitivity(where, s.Fourier(r.Time))
		byBiot[i], byFourier[i] = T.Coefficient.SI(), T.Time.SI()
	}
	biot, diffusivity = make([]float64, n), make([]float64, n)
	small := least * math.Abs(s.excess)
	var unseen bool
	switch wanted {
	case coefficientName:
		biot[0] = 1 / byBiot[0]
		unseen = !(math.Abs(byBiot[0]) > small)
	case diffusivityName:
		diffusivity[0] = 1 / byFourier[0]
		unseen = !(math.Abs(byFourier[0]) > small)
	case conductivityName: // one more of the diffusivity is one less of the Biot number
		diffusivity[0] = 1 / (byFourier[0] - byBiot[0])
		biot[0] = -diffusivity[0]
		unseen = !(math.Abs(byFourier[0]-byBiot[0]) > small)
	default:
		det := byBiot[0]*byFourier[1] - byBiot[1]*byFourier[0]
		biot[0], biot[1] = byFourier[1]/det, -byFourier[0]/det
		diffusivity[0], diffusivity[1] = -byBiot[1]/det, byBiot[0]/det
		unseen = !(math.Abs(det) > small*math.Abs(s.excess))
	}
	if unseen {
		return nil, nil, &UnidentifiedError{Wanted: wanted, Reason: "they hardly depend on it"}
	}
	return biot, diffusivity, nil
}

// read returns θ of a reading, which must lie between the ambient and the start.
func (s *Solution) read(r Reading) (float64, error) {
	if _, err := s.positionOf(r.Place); err != nil {
		return 0, err
	}
	for _, err := range []error{
		units.CheckPositive("reading: time", r.Time),
		units.CheckTemperature("reading: temperature", r.Temperature),
		units.CheckNotNegative("reading: error", r.Error),
	} {
		if err != nil {
			return 0, err
		}
	}
	theta := (r.Temperature.SI() - s.ambient.SI()) / s.excess
	if !(theta > 0 && theta < 1) {
		return 0, &units.ArgumentError{Field: "reading: temperature", Value: r.Temperature, Accepted: "between the start of " + s.problem.Initial.String() + " and the ambient of " + s.ambient.String()}
	}
	return theta, nil
}

// positionOf returns the position of a place, nil for the mean.
func (s *Solution) positionOf(place shape.Place) (*position, error) {
	if place.IsMean() {
		return nil, nil
	}
	p, err := s.position(place)
	return &p, err
}

// thetaOf returns θ at the place and time of a reading.
func (s *Solution) thetaOf(r Reading) float64 {
	where, err := s.positionOf(r.Place)
	switch {
	case err != nil:
		return math.NaN()
	case where == nil:
		return s.meanTheta(s.Fourier(r.Time))
	}
	return s.theta(where, s.Fourier(r.Time))
}

// misfit is 0 where the solution gives θ of a reading, and falls with θ: it is smooth where θ is near 1 or 0.
func (s *Solution) misfit(r Reading, theta float64) float64 {
	return logit(s.thetaOf(r)) - logit(theta)
}

// misfitAt is misfit at a Fourier number.
func (s *Solution) misfitAt(place shape.Place, fo, theta float64) float64 {
	return s.misfit(Reading{Place: place, Time: units.Second.Of(fo * s.scale)}, theta)
}

// logit returns ln(θ/(1 − θ)), with ends that are finite.
func logit(theta float64) float64 {
	return math.Log(math.Max(theta, 1e-300)) - math.Log(math.Max(1-theta, 1e-17))
}

// diffusivityFor returns the diffusivity for which a time has a Fourier number.
func (s *Solution) diffusivityFor(fo float64, t units.Duration) units.Diffusivity {
	return units.SquareMetrePerSecond.Of(s.diffusivity * fo / s.Fourier(t))
}

// scan returns the Biot numbers from 1e-4 to 1e4 at which f, over their logarithm, changes its sign. Between its samples
// it follows a dip towards zero, so that two answers near each other are seen.
func scan(f func(u float64) (float64, error)) ([]float64, error) {
	const far, pieces = 9.210340371976184, 160 // ln 1e4
	var failure error
	value := func(u float64) float64 {
		y, err := f(u)
		if err != nil {
			failure, y = err, math.NaN()
		}
		return y
	}
	var u, y [pieces + 1]float64
	for i := range u {
		u[i] = far * (2*float64(i)/pieces - 1)
		y[i] = value(u[i])
	}
	var edges, at []float64 // u and y with the dips between them
	for i := range u {
		edges, at = append(edges, u[i]), append(at, y[i])
		if i < 1 || i == pieces || !(y[i]*y[i-1] > 0 && y[i]*y[i+1] > 0 && math.Abs(y[i]) < math.Min(math.Abs(y[i-1]), math.Abs(y[i+1]))) {
			continue
		}
		sign := math.Copysign(1, y[i])
		if dip := lowest(func(u float64) float64 { return sign * value(u) }, u[i-1], u[i+1]); sign*value(dip) < 0 {
			edges, at = append(edges, dip), append(at, -sign)
			if dip < u[i] {
				n := len(edges)
				edges[n-1], edges[n-2], at[n-1], at[n-2] = edges[n-2], edges[n-1], at[n-2], at[n-1]
			}
		}
	}
	var found []float64
	for i := 1; i < len(at) && failure == nil; i++ {
		if at[i-1]*at[i] > 0 || at[i-1] == 0 {
			continue
		}
		zero, ok := root.Find(value, edges[i-1], edges[i], 0)
		if !ok && failure == nil {
			failure = notFound("Biot number")
		}
		found = append(found, math.Exp(zero))
	}
	return found, failure
}

// lowest returns where f, which falls and rises between lo and hi, is least, or where it is below zero.
func lowest(f func(u float64) float64, lo, hi float64) float64 {
	const golden = 0.6180339887498949
	a, b := hi-golden*(hi-lo), lo+golden*(hi-lo)
	fa, fb := f(a), f(b)
	for range 60 {
		switch {
		case fa < 0:
			return a
		case fa < fb:
			hi, b, fb = b, a, fa
			a = hi - golden*(hi-lo)
			fa = f(a)
		default:
			lo, a, fa = a, b, fb
			b = lo + golden*(hi-lo)
			fb = f(b)
		}
	}
	return a
}

// choose returns the one answer, or says that there is none or several.
func choose(wanted string, biots []float64, fit func(bi float64) (Fit, error)) (Fit, error) {
	switch len(biots) {
	case 0:
		return Fit{}, &UnidentifiedError{Wanted: wanted, Reason: "no Biot number from 1e-4 to 1e4 gives them"}
	case 1:
		return fit(biots[0])
	}
	several := &UnidentifiedError{Wanted: wanted, Reason: "several answers give them"}
	for _, bi := range biots {
		f, err := fit(bi)
		if err != nil {
			return Fit{}, err
		}
		several.Answers = append(several.Answers, f)
	}
	return Fit{}, several
}

func notFound(wanted string) error {
	return &units.ConvergenceError{Method: "fit of the " + wanted, Reason: "the search left the range of float64"}
}
