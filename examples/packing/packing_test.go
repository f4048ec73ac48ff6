package main

import (
	"bytes"
	"context"
	"errors"
	"image/png"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"example.com/coolward/units"
)

func output(t *testing.T, args ...string) (string, error) {
	t.Helper()
	var out bytes.Buffer
	chart := filepath.Join(t.TempDir(), "chart.png")
	err := run(context.Background(), &out, append([]string{"-chart", chart}, args...))
	if err != nil {
		return out.String(), err
	}
	f, err := os.Open(chart)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	if _, err := png.DecodeConfig(f); err != nil {
		t.Errorf("%v: the chart is no picture: %v", args, err)
	}
	svg, err := os.ReadFile(strings.TrimSuffix(chart, ".png") + ".svg")
	if err != nil || !bytes.Contains(svg, []byte("temperature in °C")) {
		t.Errorf("%v: the second chart has no labelled axis: %v", args, err)
	}
	return out.String(), nil
}

func TestOutput(t *testing.T) {
	for _, tt := range []struct {
		args []string
		says []string
	}{
		{nil, []string{"steel 10 mm", "glass 100 mm", "lumped", "finite volumes", "exact series", "Churchill", "How sure", "at 95 %", "Caution"}},
		{[]string{"-speed", "2 m/s", "-material", "glass", "-diameter", "2 in", "-finish", "blackened"}, []string{"glass 50.8 mm", "Whitaker", "matt black lacquer"}},
		{[]string{"-target", "10 °C", "-diameter", "60 mm"}, []string{"never, tends to 25.0 °C", "No comparison"}},
		{[]string{"-target", "25 °C", "-diameter", "20 mm"}, []string{"never, tends to 25.0 °C"}},
		{[]string{"-target", "200 °C", "-diameter", "20 mm"}, []string{"at the start"}},
		{[]string{"-start", "25 °C", "-diameter", "20 mm"}, []string{"never, tends to 25.0 °C"}},
		{[]string{"-material", "steel", "-diameter", "60 mm", "-derivation"}, []string{"How the answer", "Biot number", "source:", "warning:"}},
		{[]string{"-help"}, []string{"Options, each number with its unit"}},
	} {
		if len(tt.args) == 1 && tt.args[0] == "-help" {
			var out bytes.Buffer
			if err := run(context.Background(), &out, tt.args); err != nil || !strings.Contains(out.String(), tt.says[0]) {
				t.Errorf("%v: %v\n%s", tt.args, err, &out)
			}
			continue
		}
		out, err := output(t, tt.args...)
		if err != nil {
			t.Errorf("%v: %v", tt.args, err)
			continue
		}
		words := strings.Join(strings.Fields(out), " ") // lines may break anywhere
		for _, s := range tt.says {
			if !strings.Contains(words, s) {
				t.Errorf("%v: the output lacks %q:\n%s", tt.args, s, out)
			}
		}
		if strings.Contains(out, "NaN") || strings.Contains(out, "Inf") {
			t.Errorf("%v: a number that is none:\n%s", tt.args, out)
		}
	}
}

// Bad input is one line that names what was wrong and what is accepted.
func TestBadInput(t *testing.T) {
	for _, tt := range []struct {
		args []string
		says string
	}{
		{[]string{"-diameter", "0 mm"}, "diameter: 0 m not accepted"},
		{[]string{"-diameter", "-5 mm"}, "diameter: -5 mm not accepted"},
		{[]string{"-diameter", ""}, "write a number and a unit"},
		{[]string{"-diameter", "60"}, "no unit behind the number"},
		{[]string{"-diameter", "60 mn"}, `unknown unit "mn"`},
		{[]string{"-diameter", "NaN mm"}, "no number"},
		{[]string{"-diameter", "60 s"}, "no unit of length"},
		{[]string{"-diameter", "1 km"}, "Rayleigh number"},
		{[]string{"-speed", "100 km/s"}, "Reynolds number"},
		{[]string{"-start", "3000 °C"}, "outside its range"},
		{[]string{"-start", "-300 °C"}, "above 0 K"},
		{[]string{"-accuracy", "1 °C"}, "as in 10 K"},
		{[]string{"-material", "wood"}, "steel or glass"},
		{[]string{"-finish", ""}, "polished or blackened"},
		{[]string{"-unknown"}, "not defined"},
		{[]string{"rest"}, "unexpected argument"},
	} {
		out, err := output(t, tt.args...)
		if err == nil || strings.Contains(err.Error(), "\n") || !strings.Contains(err.Error(), tt.says) {
			t.Errorf("%v: %v, want one line with %q\n%s", tt.args, err, tt.says, out)
		}
	}
	_, err := output(t, "-diameter", "1 km")
	var r *units.RangeError
	if !errors.As(err, &r) || r.Source == "" {
		t.Errorf("a ball of 1 km: %v; want a range error with its source", err)
	}
}
