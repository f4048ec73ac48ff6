package derivation_test

import (
	"encoding/json"
	"fmt"
	"math"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.com/coolward/units"
	"example.com/coolward/units/derivation"
)

func Example() {
	var r derivation.Record
	r.Title = "Time constant of a copper slug"
	c := units.JoulePerKelvin.Of(38.5)
	g := units.WattPerKelvin.Of(0.07)
	r.Add("C", "heat capacity", c, "mass × specific heat")
	r.Add("G", "conductance to the air", g, "h A")
	r.Add("τ", "time constant", units.TimeConstantOf(c, g), "C / G")
	r.Note("one temperature for the whole slug")
	r.Warn("the surface may be hot")
	fmt.Print(r)
	// Output:
	// Time constant of a copper slug
	//   heat capacity           C = 38.5 J/K         mass × specific heat
	//   conductance to the air  G = 70 mW/K          h A
	//   time constant           τ = 9.166666667 min  C / G
	//   note: one temperature for the whole slug
	//   warning: the surface may be hot
}

func TestJSONCarriesEveryDigit(t *testing.T) {
	var r derivation.Record
	r.Add("t", "time", units.Second.Of(math.Pi), "")
	r.AddNumber("Bi", "Biot number", 1.0/3, "h R / k")
	r.Add("T", "start", units.Celsius.Of(180), "")
	r.Source("handbook")
	r.Source("handbook")
	b, err := json.Marshal(r)
	require.NoError(t, err)
	var out struct {
		Lines []struct {
			Symbol, Unit string
			Number, SI   float64
		}
		Sources []string
	}
	require.NoError(t, json.Unmarshal(b, &out))
	require.Len(t, out.Lines, 3)
	assert.Equal(t, math.Pi, out.Lines[0].SI)
	assert.Equal(t, 1.0/3, out.Lines[1].Number)
	assert.Equal(t, "°C", out.Lines[2].Unit)
	assert.InDelta(t, 180, out.Lines[2].Number, 1e-12)
	assert.Equal(t, []string{"handbook"}, out.Sources, "a source stands once")

	v, ok := r.Value("Bi")
	assert.True(t, ok)
	assert.Equal(t, 1.0/3, v.SI())
	_, ok = r.Value("Nu")
	assert.False(t, ok)

	r.AddNumber("x", "nothing", math.NaN(), "")
	_, err = json.Marshal(r)
	var a *units.ArgumentError
	require.ErrorAs(t, err, &a)
}
