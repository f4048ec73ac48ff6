package shape

import (
	"math"

	"example.com/coolward/units"
)

// Factors returns the bodies of one coordinate whose intersection b is, the one with the nearest
// exposed face first: a long cylinder and a plate for a cylinder that is exposed on all its faces, three
// plates for a brick, and b itself for a body of one coordinate. It returns nil for a body that is no
// such intersection. The temperature in b is a product of those in its factors where the
// coefficient is constant (A. B. Newman, Industrial and Engineering Chemistry 28 (1936) 545–548, from memory).
func (b Body) Factors() []Body {
	switch {
	case b.Family() != Compact:
		if b.form == noForm {
			return nil
		}
		return []Body{b}
	case b.form == cylinder:
		round, flat := b.Exposing(Outside), Plate(b.b, units.SquareMetre.Of(math.Pi/4*b.a.SI()*b.a.SI()))
		if b.b.SI() < b.a.SI() {
			return []Body{flat, round}
		}
		return []Body{round, flat}
	case b.form == brick:
		edges := [3]units.Length{b.a, b.b, b.c}
		for i := 1; i < len(edges); i++ {
			for j := i; j > 0 && edges[j].SI() < edges[j-1].SI(); j-- {
				edges[j], edges[j-1] = edges[j-1], edges[j]
			}
		}
		face := func(u, v units.Length) units.Area { return units.SquareMetre.Of(u.SI() * v.SI()) }
		return []Body{Plate(edges[0], face(edges[1], edges[2])), Plate(edges[1], face(edges[0], edges[2])), Plate(edges[2], face(edges[0], edges[1]))}
	}
	return nil
}
