package fv

import "math"

// A Geometry is how the area that heat crosses goes with the distance from the inner end, which is the
// centre of a solid body and the face opposite to the surface of any other.
type Geometry struct {
	Exponent int     // area = Factor · radius^Exponent: 0 for a slab, 1 for a cylinder, 2 for a sphere
	Factor   float64 // area of a slab, 2π times the length of a cylinder, 4π for a sphere
	Radius   float64 // of the inner end; 0 in the centre
	Inwards  bool    // the radius falls with the distance, from the outside of a hollow body to its inside
}

// radius returns the radius at a distance from the inner end.
func (g Geometry) radius(x float64) float64 {
	if g.Inwards {
		return g.Radius - x
	}
	return g.Radius + x
}

// Area returns the area at a distance from the inner end.
func (g Geometry) Area(x float64) float64 {
	switch r := g.radius(x); g.Exponent {
	case 1:
		return g.Factor * r
	case 2:
		return g.Factor * r * r
	}
	return g.Factor
}

// Between returns the volume between two distances from the inner end.
func (g Geometry) Between(from, to float64) float64 {
	a, b := g.radius(from), g.radius(to)
	switch g.Exponent {
	case 1:
		return g.Factor / 2 * (to - from) * (b + a)
	case 2:
		return g.Factor / 3 * (to - from) * (b*b + b*a + a*a)
	}
	return g.Factor * (to - from)
}

// conductance returns the heat flow per difference of the potential between two distances: of the exact
// steady flow in a hollow body, and in a solid one by the area midway, which is exact where it loses heat
// evenly.
func (g Geometry) conductance(from, to float64) float64 {
	if g.Radius == 0 || g.Exponent == 0 {
		return g.Area((from+to)/2) / (to - from)
	}
	a, b := g.radius(from), g.radius(to)
	if g.Exponent == 1 {
		return g.Factor / math.Abs(math.Log1p((b-a)/a))
	}
	return g.Factor * a * b / (to - from)
}

// A Part is a stretch of one material.
type Part struct {
	Length  float64
	Cells   int // 2 or more
	Grading Grading
}

// A Grid is the division of a body into volumes. Where two parts meet, each has a node of its own.
type Grid struct {
	Nodes       []float64 // distance of each node from the inner end
	Volumes     []float64 // volume of each node
	Conductance []float64 // heat flow per potential from each node to the next; 0 from part to part
	First       []int     // first node of each part, and at last the number of nodes
	Geometry    Geometry
	Length      float64
	Inner       float64 // area at the inner end
	Area        float64 // of the surface
	Volume      float64 // whole volume
}

// NewGrid divides a body of one or several parts, from the inner end to the surface. Each node stands for the volume
// between the midpoints to its neighbours.
func NewGrid(geometry Geometry, parts []Part) *Grid {
	n := len(parts)
	for _, p := range parts {
		n += p.Cells
	}
	g := &Grid{
		Nodes: make([]float64, 0, n), Volumes: make([]float64, 0, n), Conductance: make([]float64, 0, n-1),
		Geometry: geometry, Inner: geometry.Area(0),
	}
	for j, p := range parts {
		g.First = append(g.First, len(g.Nodes))
		if j > 0 {
			g.Conductance = append(g.Conductance, 0)
		}
		from := g.Length
		g.Length += p.Length
		place := func(i int) float64 {
			switch i {
			case 0:
				return from
			case p.Cells:
				return g.Length
			}
			return from + p.Length*p.Grading.at(float64(i)/float64(p.Cells), float64(p.Cells-i)/float64(p.Cells))
		}
		face, x := from, from
		for i := range p.Cells {
			far := place(i + 1)
			next := (x + far) / 2
			g.Nodes = append(g.Nodes, x)
			g.Volumes = append(g.Volumes, geometry.Between(face, next))
			g.Conductance = append(g.Conductance, geometry.conductance(x, far))
			face, x = next, far
		}
		g.Nodes = append(g.Nodes, x)
		g.Volumes = append(g.Volumes, geometry.Between(face, x))
	}
	g.First = append(g.First, n)
	g.Area, g.Volume = geometry.Area(g.Length), geometry.Between(0, g.Length)
	return g
}

// Sphere divides a solid sphere, graded towards the surface.
func Sphere(radius float64, cells int) *Grid {
	return NewGrid(Geometry{Exponent: 2, Factor: 4 * math.Pi}, []Part{{radius, cells, Grading{High: true}}})
}

// Slab divides a slab of the given depth between an insulated face, or a plane of symmetry, and the
// exposed area, graded towards it.
func Slab(depth, area float64, cells int) *Grid {
	return NewGrid(Geometry{Factor: area}, []Part{{depth, cells, Grading{High: true}}})
}
