// Package shape describes bodies by what a calliper measures, and the places in them.
//
//	ball := shape.Sphere(units.Millimetre.Of(60))
//	ball.VolumeToArea()     // 10 mm, the length of lumped analysis
//	ball.ConductionLength() // 30 mm, the radius, the length of the exact solutions
//
// A body knows its faces: a cylinder is exposed all round and at its ends, a plate on both faces, a tube on its
// outside. [Body.Exposing] insulates the others, so that a long cylinder is one whose ends are not exposed.
//
// Half thickness, radius and V/A are derived here and named in results, so that nobody passes the
// wrong one. A body or a place is checked where it is used: constructors return no error, and every
// solver refuses a body whose Check fails.
package shape
