package main

import (
	"bytes"
	"image/png"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"gonum.org/v1/plot/plotter"
)

// nearest returns the point of a curve next to x.
func nearest(curve plotter.XYs, x float64) plotter.XY {
	best := curve[0]
	for _, q := range curve {
		if math.Abs(q.X-x) < math.Abs(best.X-x) {
			best = q
		}
	}
	return best
}

// Points of the curves against first roots and coefficients of a printed table: Y. A. Çengel, Heat and Mass Transfer, 6th
// ed., table 4-2, to its digits.
func TestCurvesByATable(t *testing.T) {
	for _, c := range []struct {
		form        form
		bi, zeta, c float64
	}{
		{forms[0], 10, 1.4289, 1.2620},
		{forms[2], 1, 1.5708, 1.2732},
		{forms[2], 0.1, 0.5423, 1.0298},
	} {
		curve, err := centreCurve(c.form, c.bi)
		if err != nil {
			t.Fatal(err)
		}
		for _, fo := range []float64{0.5, 1, 2} {
			q := nearest(curve, math.Log10(fo))
			at := math.Pow(10, q.X)
			want := math.Log10(c.c) - c.zeta*c.zeta*at/math.Ln10
			// half a digit of the coefficient and of the root
			if tolerance := 3e-5 + 5e-5*2*c.zeta*at/math.Ln10 + 1e-3*math.Exp(-8*at); !(math.Abs(q.Y-want) <= tolerance) {
				t.Errorf("%s, Bi %v, Fo %v: log θ %v, by the table %v, want within %.2g", c.form.name, c.bi, at, q.Y, want, tolerance)
			}
		}
	}
}

// The curves lie in the order of their numbers and do not cross.
func TestCurvesAreInOrder(t *testing.T) {
	for _, f := range forms {
		for _, c := range []struct {
			name    string
			numbers []float64
			curve   func(form, float64) (plotter.XYs, error)
			at      float64 // a logarithm at which all curves are, and apart
		}{
			{"centre", biots, centreCurve, math.Log10(0.4)},
			{"position", places, positionCurve, math.Log10(2)},
			{"heat", heatBiots, heatCurve, -2.5},
		} {
			before := math.Inf(1)
			for _, x := range c.numbers {
				curve, err := c.curve(f, x)
				if err != nil {
					t.Fatal(err)
				}
				for i := 1; i < len(curve); i++ {
					if !(curve[i].X > curve[i-1].X) {
						t.Fatalf("%s %s %v: point %d does not lie to the right of the one before", f.name, c.name, x, i)
					}
				}
				y := nearest(curve, c.at).Y
				if !(y < before) {
					t.Errorf("%s %s: the curve of %v is at %v, that before it at %v", f.name, c.name, x, y, before)
				}
				before = y
			}
		}
	}
}

// The program writes what it says, charts that are not blank, and prints the table.
func TestRun(t *testing.T) {
	folder := filepath.Join(t.TempDir(), "new")
	var out bytes.Buffer
	if err := run(&out, []string{"-out", folder, "-body", "sphere"}); err != nil {
		t.Fatal(err)
	}
	text := out.String()
	for _, wanted := range []string{"Sphere, R is the radius", "1.57080", "1.27324", filepath.Join(folder, "sphere-heat")} {
		if !strings.Contains(text, wanted) {
			t.Errorf("%q is not in the output", wanted)
		}
	}
	if strings.Contains(text, "Plate") {
		t.Error("the plate is in the output for a sphere")
	}
	for _, name := range []string{"sphere-centre", "sphere-position", "sphere-heat"} {
		vectors, err := os.ReadFile(filepath.Join(folder, name+".svg"))
		if err != nil || !bytes.Contains(vectors, []byte("</svg>")) {
			t.Errorf("%s.svg: %v", name, err)
		}
		file, err := os.Open(filepath.Join(folder, name+".png"))
		if err != nil {
			t.Fatal(err)
		}
		picture, err := png.Decode(file)
		if err := file.Close(); err != nil {
			t.Error(err)
		}
		if err != nil {
			t.Fatal(err)
		}
		size, drawn := picture.Bounds(), 0
		const apart = 5 // points looked at
		for x := size.Min.X; x < size.Max.X; x += apart {
			for y := size.Min.Y; y < size.Max.Y; y += apart {
				if r, g, b, _ := picture.At(x, y).RGBA(); r+g+b < 3*0x8000 {
					drawn++
				}
			}
		}
		if part := apart * apart * float64(drawn) / float64(size.Dx()*size.Dy()); part < 0.01 || part > 0.2 {
			t.Errorf("%s.png: %.3f of it is dark", name, part)
		}
	}
}

func TestTableAlone(t *testing.T) {
	folder := filepath.Join(t.TempDir(), "none")
	var out bytes.Buffer
	if err := run(&out, []string{"-table", "-out", folder}); err != nil {
		t.Fatal(err)
	}
	if _, err := os.Stat(folder); !os.IsNotExist(err) {
		t.Errorf("a folder was made for the table: %v", err)
	}
	if n := strings.Count(out.String(), "root 1"); n != 3 {
		t.Errorf("%d tables, want 3", n)
	}
}

func TestBadInput(t *testing.T) {
	for _, args := range [][]string{{"-body", "cube"}, {"-out", ""}, {"more"}, {"-colour", "blue"}} {
		var out bytes.Buffer
		err := run(&out, args)
		if err == nil || strings.Contains(err.Error(), "\n") || out.Len() > 0 {
			t.Errorf("%q: %v, output %q, want an error of one line alone", args, err, out.String())
		}
	}
	var out bytes.Buffer
	if err := run(&out, []string{"-help"}); err != nil || !strings.Contains(out.String(), "-body") {
		t.Errorf("help: %v, %q", err, out.String())
	}
	if err := run(&out, []string{"-out", "/dev/null/charts", "-body", "plate"}); err == nil {
		t.Error("no error for a folder that cannot be")
	}
}

func TestTicks(t *testing.T) {
	var labels []string
	for _, tick := range (decades{}).Ticks(-2, 1) {
		if !tick.IsMinor() {
			labels = append(labels, tick.Label)
		}
	}
	if got, want := strings.Join(labels, " "), "0.01 0.02 0.05 0.1 0.2 0.5 1 2 5 10"; got != want {
		t.Errorf("labels %q, want %q", got, want)
	}
	if got, want := number(math.Inf(1))+number(0.05)+number(20), "∞0.0520"; got != want {
		t.Errorf("numbers %q, want %q", got, want)
	}
}
