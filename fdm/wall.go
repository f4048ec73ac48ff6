package fdm

import (
	"math"
	"slices"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A wall is the way of the heat that is divided into cells: from the inner end, which is the centre of a solid
// body and the opposite face of any other, to the surface.
type wall struct {
	layers   []Layer // from the surface inwards; one for a body of one material
	cells    []int   // of each layer
	grading  []fv.Grading
	geometry fv.Geometry
	length   float64
	half     bool // of a plate whose halves are alike
	whole    float64
}

// twoFaces reports whether the body has a face across the wall.
func (p Problem) twoFaces() bool {
	switch p.Body.Family() {
	case shape.Planar, shape.HollowSpherical, shape.HollowCylindrical:
		return true
	}
	return false
}

// bothExposed reports whether the body is exposed on two faces.
func (p Problem) bothExposed() bool {
	return p.twoFaces() && p.Body.ConductionLength().SI() < 0.75*p.Body.Thickness().SI()
}

// symmetric reports whether one half of the plate says all.
func (p Problem) symmetric() bool {
	return p.Body.Family() == shape.Planar && p.bothExposed() && p.Opposite.IsZero() && len(p.Layers) == 0 &&
		p.Profile == nil && p.Source == nil && p.SurfaceLump == nil && p.OppositeLump == nil
}

// wall returns the way of the heat in a problem that was checked.
func (p Problem) wall(start units.Temperature) wall {
	w := wall{layers: p.Layers, whole: p.Body.Thickness().SI(), half: p.symmetric()}
	w.length = w.whole
	if w.half {
		w.length = p.Body.ConductionLength().SI()
	}
	if len(w.layers) == 0 {
		w.layers = []Layer{{Material: p.Material, Thickness: p.Body.Thickness()}}
	}
	w.geometry = p.geometry()
	w.divide(p, start)
	return w
}

func (p Problem) geometry() fv.Geometry {
	b := p.Body
	g := fv.Geometry{}
	switch b.Family() {
	case shape.Spherical, shape.HollowSpherical:
		g.Exponent, g.Factor = 2, 4*math.Pi
	case shape.Cylindrical, shape.HollowCylindrical:
		g.Exponent, g.Factor = 1, 2*math.Pi*b.Length().SI()
	default:
		g.Factor = b.Area().SI()
		if p.bothExposed() && !p.symmetric() {
			g.Factor /= 2
		}
		return g
	}
	g.Radius = b.InnerDiameter().SI() / 2
	if g.Radius > 0 && b.Exposed() == shape.Inside {
		g.Inwards, g.Radius = true, b.Diameter().SI()/2
	}
	return g
}

// divide gives cells to the layers and grades them towards exposed faces and towards each other.
func (w *wall) divide(p Problem, start units.Temperature) {
	n, ratio := p.cells(), 0.0
	if d := p.Smallest.SI(); d > 0 {
		ratio = d * float64(n) / w.length
	}
	shares := w.shares(start)
	last := len(w.layers) - 1
	for j := range w.layers {
		count := n
		if last > 0 {
			// Even, so that half of them meet at the same nodes.
			count = max(2*int(math.Round(shares[j]*float64(n)/2)), leastOfLayer)
		}
		w.cells = append(w.cells, count)
		g := fv.Grading{High: j > 0 || p.exchanges(true), Low: j < last || !w.half && p.exchanges(false)}
		if j == 0 && g.High && ratio > 0 || j == last && !w.half && p.exchanges(false) && ratio > 0 {
			g.Ratio = ratio
			if last > 0 {
				g.Ratio *= float64(count) / float64(n) * w.length / w.layers[j].Thickness.SI()
			}
			g.Ratio = min(max(g.Ratio, 1e-9), 1)
		}
		if p.Uniform {
			g = fv.Grading{}
		}
		w.grading = append(w.grading, g)
	}
}

// leastOfLayer is the least number of cells of one of several layers.
const leastOfLayer = 8

// exchanges reports whether heat may cross the surface, or the inner end.
func (p Problem) exchanges(surface bool) bool {
	if surface {
		return true
	}
	return p.twoFaces() && (!p.opposite().IsZero() || p.OppositeLump != nil)
}

// shares returns the part of the cells that goes to each layer: half of them alike, half by the square root of
// the time in which heat comes through.
func (w *wall) shares(start units.Temperature) []float64 {
	shares := make([]float64, len(w.layers))
	sum := 0.0
	for j, l := range w.layers {
		k, err1 := l.Material.Conductivity(start)
		c, err2 := l.Material.SpecificHeat(start)
		shares[j] = l.Thickness.SI()
		if err1 == nil && err2 == nil && k.SI() > 0 && c.SI() > 0 {
			shares[j] *= math.Sqrt(l.Material.Density().SI() * c.SI() / k.SI())
		}
		sum += shares[j]
	}
	for j := range shares {
		shares[j] = (shares[j]/sum + 1/float64(len(shares))) / 2
	}
	return shares
}

// grid returns the grid, or one with half the cells of each layer, and half of those, and so on.
func (w wall) grid(halvings int) *fv.Grid {
	var parts []fv.Part
	for j := len(w.layers) - 1; j >= 0; j-- {
		n := w.cells[j] >> halvings
		length := w.layers[j].Thickness.SI()
		if len(w.layers) == 1 {
			length = w.length
		}
		parts = append(parts, fv.Part{Length: length, Cells: n, Grading: w.grading[j]})
	}
	return fv.NewGrid(w.geometry, parts)
}

// count returns the number of cells, or those of a coarser grid.
func (w wall) count(halvings int) int {
	n := 0
	for _, c := range w.cells {
		n += c >> halvings
	}
	return n
}

// least returns the number of cells of the layer that has the fewest.
func (w wall) least() int { return slices.Min(w.cells) }

// depth returns the depth below the surface of a distance from the inner end.
func (w wall) depth(x float64) float64 { return max(w.length-x, 0) }

// distance returns the distance from the inner end of a depth below the surface. In a plate of like halves both say
// the same.
func (w wall) distance(depth float64) float64 {
	if w.half && depth > w.length {
		depth = max(w.whole-depth, 0)
	}
	return max(w.length-depth, 0)
}

// cells returns the number of cells that is asked for.
func (p Problem) cells() int {
	if p.Cells != 0 {
		return p.Cells
	}
	if d := p.Smallest.SI(); d > 0 {
		n := 0.2 * p.Body.Thickness().SI() / d
		return int(min(max(n, defaultCells), 4*defaultCells))
	}
	return defaultCells
}
