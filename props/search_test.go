package props_test

import (
	"errors"
	"strings"
	"testing"

	"example.com/coolward/props"
	"example.com/coolward/units"
)

// Search finds by name and synonym, solids and fluids, in either case; and stops when told to.
func TestSearch(t *testing.T) {
	found := func(text string) map[string]bool {
		names := map[string]bool{}
		for s := range props.Search(text) {
			names[s.Name()] = true
		}
		return names
	}
	for _, r := range []struct {
		text  string
		names []string
	}{
		{"STEEL", []string{"carbon steel", "stainless steel", "steel AISI 1010"}},
		{" air", []string{"air"}},
		{"pvc", []string{"PVC", "PVC foam"}},
		{"expanded polystyrene", []string{"EPS"}},
		{"1.44", []string{"stainless steel AISI 316", "duplex stainless steel 2205"}},
	} {
		got := found(r.text)
		for _, name := range r.names {
			if !got[name] {
				t.Errorf("%q: %s is not found", r.text, name)
			}
		}
		if got["gold"] {
			t.Errorf("%q: gold is found", r.text)
		}
	}
	total := 0
	for range props.Solids() {
		total++
	}
	for range props.Fluids() {
		total++
	}
	if got := len(found("")); got != total {
		t.Errorf("the empty text finds %d of %d", got, total)
	}
	if got := found("unobtainium"); len(got) != 0 {
		t.Errorf("unobtainium: %v", got)
	}
	for _, text := range []string{"steel", "water"} {
		for range props.Search(text) {
			break
		}
	}
}

// Ranges, order and sources of the emissivities.
func TestEmissivities(t *testing.T) {
	n := 0
	seen := map[string]bool{}
	for e := range props.Emissivities("") {
		n++
		if !(0 < e.Least && e.Least <= e.Most && e.Most <= 1) {
			t.Errorf("%s: %g to %g", e.Surface, e.Least, e.Most)
		}
		if e.Low.Compare(e.High) > 0 || e.Low.SI() != 0 && !(e.Low.SI() > 200) {
			t.Errorf("%s: %v to %v", e.Surface, e.Low, e.High)
		}
		if !strings.Contains(e.Source, "read") && !strings.Contains(e.Source, "from memory") {
			t.Errorf("%s: source %q", e.Surface, e.Source)
		}
		key := e.Surface + e.Low.String()
		if seen[key] {
			t.Errorf("%s stands twice", e.Surface)
		}
		seen[key] = true
		if got := strings.TrimSpace(e.Surface); got != e.Surface || got == "" {
			t.Errorf("name %q", e.Surface)
		}
	}
	if n != 65 {
		t.Errorf("%d surfaces, want the 65 of the tables", n)
	}
	for range props.Emissivities("steel") {
		break
	}
	// A polished metal emits less than the same metal oxidised, and nonmetals more than either.
	mean := func(surface string) float64 {
		sum, n := 0.0, 0.0
		for e := range props.Emissivities(surface) {
			sum += (e.Least + e.Most) / 2
			n++
		}
		return sum / n
	}
	for _, metal := range []string{"copper", "nickel", "titanium", "cast iron"} {
		if polished, oxidised := mean(metal+" polished"), mean(metal+" oxidised"); !(polished < oxidised) {
			t.Errorf("%s: polished %g, oxidised %g", metal, polished, oxidised)
		}
	}
}

// A writer that takes nothing.
type full struct{}

var errFull = errors.New("full")

func (full) Write([]byte) (int, error) { return 0, errFull }

func TestWriteTable(t *testing.T) {
	T := []units.Temperature{units.Celsius.Of(20), units.Celsius.Of(100)}
	column := props.ColumnOf("k", props.Solid.Conductivity, units.MilliwattPerMetreKelvin, 4)
	var b strings.Builder
	if err := props.WriteTable(&b, props.CarbonSteel(), units.Celsius, T, column); err != nil {
		t.Fatal(err)
	}
	for _, part := range []string{"carbon steel\n", "k, mW/(m·K)", "20.00", "53330", "50670", "Source: EN 1993-1-2", "Uncertainty: ", "Caution: "} {
		if !strings.Contains(b.String(), part) {
			t.Errorf("%q is missing in\n%s", part, b.String())
		}
	}
	b.Reset()
	fluid := props.ColumnOf("µ", func(f props.Medium, T units.Temperature) (units.Viscosity, error) {
		s, err := f.At(T, units.StandardAtmosphere.Of(1))
		return s.Viscosity, err
	}, units.MicropascalSecond, 3)
	if err := props.WriteTable(&b, props.Air(), units.Celsius, T, fluid); err != nil || !strings.Contains(b.String(), "18.2") || strings.Contains(b.String(), "Caution") {
		t.Errorf("%v\n%s", err, b.String())
	}
	b.Reset()
	var outside *units.RangeError
	if err := props.WriteTable(&b, props.CarbonSteel(), units.Celsius, []units.Temperature{units.Celsius.Of(20), units.Celsius.Of(1300)}, column); !errors.As(err, &outside) || b.Len() != 0 {
		t.Errorf("1300 °C: %v, written %q", err, b.String())
	}
	if err := props.WriteTable(full{}, props.CarbonSteel(), units.Celsius, T, column); !errors.Is(err, errFull) {
		t.Errorf("full writer: %v", err)
	}
	var bad *units.ArgumentError
	if err := props.WriteTable(nil, props.CarbonSteel(), units.Celsius, T, column); !errors.As(err, &bad) {
		t.Errorf("no writer: %v", err)
	}
	if err := props.WriteTable(&b, props.CarbonSteel(), units.Celsius, T, props.Column[props.Solid]{}); !errors.As(err, &bad) {
		t.Errorf("zero column: %v", err)
	}
	nothing := props.ColumnOf[props.Solid]("k", nil, units.WattPerMetreKelvin, 3)
	if err := props.WriteTable(&b, props.CarbonSteel(), units.Celsius, T, nothing); !errors.As(err, &bad) {
		t.Errorf("column without a property: %v", err)
	}
}
