package props

import (
	"math"
	"slices"
	"strconv"
	"strings"

	"example.com/coolward/internal/property"
	"example.com/coolward/units"
)

const givenByCaller = "given by the caller"

// Constant returns a solid whose density, specific heat and conductivity are the same at any temperature above
// 0 K. Use [Solid.Within] to give it the range in which that is known to hold. It returns a
// [*units.ArgumentError] unless the name is not empty and the values are finite and above 0.
func Constant(name string, density units.Density, specificHeat units.SpecificHeat, conductivity units.Conductivity) (Solid, error) {
	if err := checkOwn("props.Constant", name, density); err != nil {
		return Solid{}, err
	}
	if err := units.CheckPositive("props.Constant: specific heat of "+name, specificHeat); err != nil {
		return Solid{}, err
	}
	if err := units.CheckPositive("props.Constant: conductivity of "+name, conductivity); err != nil {
		return Solid{}, err
	}
	return newSolid(material{
		name: name, source: givenByCaller, density: density.SI(), low: 0, high: math.Inf(1), constant: true,
		curve: property.Constant{K: conductivity.SI(), C: specificHeat.SI()},
	}), nil
}

// Within returns s restricted to the temperatures from low to high, beyond which it gives a range error. It
// returns a [*units.ArgumentError] unless low is below high and both are in the range that s has.
func (s Solid) Within(low, high units.Temperature) (Solid, error) {
	if s.m == nil {
		return Solid{}, errNoSolid()
	}
	for _, T := range []units.Temperature{low, high} {
		if !s.m.covers(T.SI()) {
			return Solid{}, s.refuse("range", T)
		}
	}
	if low.Compare(high) >= 0 {
		return Solid{}, &units.ArgumentError{Field: "range of " + s.m.name, Value: low, Accepted: "a low end below the high end " + high.String()}
	}
	m := *s.m
	m.low, m.high = low.SI(), high.SI()
	m.kinks = slices.DeleteFunc(slices.Clone(m.kinks), func(t float64) bool { return t <= m.low || t >= m.high })
	return newSolid(m), nil
}

// A Row is one line of a table of properties.
type Row struct {
	Temperature  units.Temperature
	Conductivity units.Conductivity
	SpecificHeat units.SpecificHeat
}

// Tabulated returns a solid from a table of at least two rows with rising temperatures. Its range ends with the table.
// Between the rows stands the monotone piecewise cubic of F. N. Fritsch and J. Butland (SIAM J. Sci. Stat. Comput. 5
// (1984) 300–304), which passes through every row, has a continuous slope and never overshoots. The enthalpy is its exact integral.
//
// It returns a [*units.ArgumentError] that names the row for a table that cannot be used. Source is repeated by
// [Solid.Source] and may be empty.
func Tabulated(name string, density units.Density, rows []Row, source string) (Solid, error) {
	const who = "props.Tabulated"
	if err := checkOwn(who, name, density); err != nil {
		return Solid{}, err
	}
	if len(rows) < 2 {
		return Solid{}, &units.ArgumentError{Field: who + ": rows of " + name, Value: len(rows), Accepted: "at least 2 rows"}
	}
	t, k, c := make([]float64, len(rows)), make([]float64, len(rows)), make([]float64, len(rows))
	for i, r := range rows {
		field := who + ": " + name + ", row " + strconv.Itoa(i+1)
		if err := units.CheckTemperature(field+": temperature", r.Temperature); err != nil {
			return Solid{}, err
		}
		if err := units.CheckPositive(field+": conductivity", r.Conductivity); err != nil {
			return Solid{}, err
		}
		if err := units.CheckPositive(field+": specific heat", r.SpecificHeat); err != nil {
			return Solid{}, err
		}
		t[i], k[i], c[i] = r.Temperature.SI(), r.Conductivity.SI(), r.SpecificHeat.SI()
		if i > 0 && t[i] <= t[i-1] {
			return Solid{}, &units.ArgumentError{Field: field + ": temperature", Value: r.Temperature, Accepted: "above " + rows[i-1].Temperature.String() + ", the row before"}
		}
	}
	curve, err := property.NewTable(t, k, c)
	if err != nil {
		return Solid{}, &units.ArgumentError{Field: who + ": rows of " + name, Value: len(rows), Accepted: "rows that can be interpolated: " + err.Error()}
	}
	// Rows at extreme distances or with extreme values overflow the slopes of the interpolant.
	for i := 1; i < len(t); i++ {
		for j := 1; j < 8; j++ {
			x := t[i-1] + (t[i]-t[i-1])*float64(j)/8
			if !usable(curve.Conductivity(x)) || !usable(curve.SpecificHeat(x)) || !(curve.Enthalpy(t[i]) > curve.Enthalpy(t[i-1])) {
				return Solid{}, &units.ArgumentError{
					Field: who + ": " + name + ", row " + strconv.Itoa(i+1) + ": temperature", Value: rows[i].Temperature,
					Accepted: "rows far enough apart, and values moderate enough, to be interpolated",
				}
			}
		}
	}
	return newSolid(material{
		name: name, source: sourceOr(source), density: density.SI(), low: t[0], high: t[len(t)-1], curve: curve,
	}), nil
}

// A Law describes a solid by functions of the temperature, for [Function].
type Law struct {
	Name         string
	Density      units.Density
	Conductivity func(units.Temperature) units.Conductivity // called from many goroutines, if the solid is used by many
	SpecificHeat func(units.Temperature) units.SpecificHeat // likewise
	Low, High    units.Temperature                          // the range, closed
	Kinks        []units.Temperature                        // rising, inside the range: where a function or its slope jumps
	Source       string                                     // may be empty
}

// Function returns a solid from functions of the temperature. The enthalpy is their integral, by Gauss quadrature on
// panels between the kinks, made once; a value of it within a panel costs eight calls of the specific heat.
//
// It returns a [*units.ArgumentError] for a field that cannot be used, for a function that gives a value that is not finite
// and above 0 at one of the temperatures at which it is called while the solid is made, and for a
// specific heat too rough to be integrated between the kinks. A value that is not finite and above 0 elsewhere gives the
// same error when the property is asked for there.
func Function(law Law) (Solid, error) {
	const who = "props.Function"
	if err := checkOwn(who, law.Name, law.Density); err != nil {
		return Solid{}, err
	}
	if law.Conductivity == nil {
		return Solid{}, &units.ArgumentError{Field: who + ": conductivity of " + law.Name, Accepted: "a function of the temperature"}
	}
	if law.SpecificHeat == nil {
		return Solid{}, &units.ArgumentError{Field: who + ": specific heat of " + law.Name, Accepted: "a function of the temperature"}
	}
	if err := units.CheckTemperature(who+": low end of "+law.Name, law.Low); err != nil {
		return Solid{}, err
	}
	if err := units.CheckTemperature(who+": high end of "+law.Name, law.High); err != nil {
		return Solid{}, err
	}
	ends := []float64{law.Low.SI()}
	for _, T := range slices.Concat(law.Kinks, []units.Temperature{law.High}) {
		if last := ends[len(ends)-1]; !(T.SI() > last && T.SI() <= law.High.SI()) {
			return Solid{}, &units.ArgumentError{
				Field: who + ": kinks and high end of " + law.Name, Value: T,
				Accepted: "kinks that rise between the ends of the range, and the high end above " + units.Kelvin.Of(last).String(),
			}
		}
		ends = append(ends, T.SI())
	}
	k := func(t float64) float64 { return law.Conductivity(units.Kelvin.Of(t)).SI() }
	c := func(t float64) float64 { return law.SpecificHeat(units.Kelvin.Of(t)).SI() }
	if err := probe(who, law, ends); err != nil {
		return Solid{}, err
	}
	curve, err := property.NewFunctions(k, c, ends)
	if err != nil {
		return Solid{}, &units.ArgumentError{
			Field: who + ": specific heat of " + law.Name, Value: "a function " + err.Error(),
			Accepted: "a function that is smooth between the kinks",
		}
	}
	kinks := slices.Clone(ends[1 : len(ends)-1])
	return newSolid(material{
		name: law.Name, source: sourceOr(law.Source), density: law.Density.SI(), low: law.Low.SI(), high: law.High.SI(),
		kinks: kinks, curve: curve,
	}), nil
}

// probe calls both functions all over the range.
func probe(who string, law Law, ends []float64) error {
	const perPiece = 64
	for i := 1; i < len(ends); i++ {
		for j := 0; j <= perPiece; j++ {
			t := min(ends[i-1]+(ends[i]-ends[i-1])*float64(j)/perPiece, ends[i])
			T := units.Kelvin.Of(t)
			if err := units.CheckPositive(who+": conductivity of "+law.Name+" at "+T.String(), law.Conductivity(T)); err != nil {
				return err
			}
			if err := units.CheckPositive(who+": specific heat of "+law.Name+" at "+T.String(), law.SpecificHeat(T)); err != nil {
				return err
			}
		}
	}
	return nil
}

func checkOwn(who, name string, density units.Density) error {
	if err := checkName(who, name); err != nil {
		return err
	}
	return units.CheckPositive(who+": density of "+name, density)
}

func checkName(who, name string) error {
	if strings.TrimSpace(name) == "" {
		return &units.ArgumentError{Field: who + ": name", Value: strconv.Quote(name), Accepted: "a name that is not empty"}
	}
	return nil
}

func sourceOr(source string) string {
	if source == "" {
		return givenByCaller
	}
	return source
}
