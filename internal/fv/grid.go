package fv

import "math"

// A Grid is the division of a body into volumes.
type Grid struct {
	Nodes       []float64 // distance of each node from the centre, from 0 to the surface
	Volumes     []float64 // volume of each node
	Conductance []float64 // area over distance, from each node to the next
	Area        float64   // exposed surface
	Volume      float64   // whole volume
}

// surfaceSpacing is the distance of the nodes at the surface relative to that of uniform nodes.
const surfaceSpacing = 0.2

// Sphere divides a solid sphere by cells+1 nodes, cells ≥ 2. With s from 0 at the surface to 1 at the
// centre in equal steps, a node lies at the depth R (a s + (1−a) s²): a smooth map, which keeps the
// order 2 of uniform nodes, with spacings from a to 2−a of the uniform one. Grids of which one has
// twice the cells of the other have every second node in common.
func Sphere(radius float64, cells int) *Grid {
	return graded(radius, cells,
		func(r float64) float64 { return 4 * math.Pi * r * r },
		func(from, to float64) float64 {
			return 4 * math.Pi / 3 * (to - from) * (to*to + to*from + from*from)
		})
}

// Cylinder divides a solid cylinder whose ends are insulated, as [Sphere] does.
func Cylinder(radius, length float64, cells int) *Grid {
	return graded(radius, cells,
		func(r float64) float64 { return 2 * math.Pi * r * length },
		func(from, to float64) float64 { return math.Pi * length * (to - from) * (to + from) })
}

// Slab divides a slab of the given depth between an insulated face, or a plane of symmetry, and the
// exposed area, as [Sphere] does.
func Slab(depth, area float64, cells int) *Grid {
	return graded(depth, cells,
		func(float64) float64 { return area },
		func(from, to float64) float64 { return area * (to - from) })
}

// graded divides a body of the given length from centre to surface, with the area that heat crosses
// at a distance from the centre, and the volume between two distances.
func graded(length float64, cells int, area func(r float64) float64, volume func(from, to float64) float64) *Grid {
	n := cells + 1
	g := &Grid{
		Nodes: make([]float64, n), Volumes: make([]float64, n), Conductance: make([]float64, cells),
		Area: area(length), Volume: volume(0, length),
	}
	for i := range g.Nodes {
		s := float64(cells-i) / float64(cells)
		g.Nodes[i] = length * (1 - s*(surfaceSpacing+(1-surfaceSpacing)*s))
	}
	g.Nodes[0], g.Nodes[cells] = 0, length
	face := 0.0
	for i := range cells {
		next := (g.Nodes[i] + g.Nodes[i+1]) / 2
		g.Volumes[i] = volume(face, next)
		g.Conductance[i] = area(next) / (g.Nodes[i+1] - g.Nodes[i])
		face = next
	}
	g.Volumes[cells] = volume(face, length)
	return g
}
