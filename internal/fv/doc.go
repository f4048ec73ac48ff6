// Package fv discretises one-dimensional conduction by conservative finite volumes with enthalpy as
// the state: graded grids of nodes, tables of temperature and conductivity integral over enthalpy,
// and the system of equations that an integrator takes. It works in coherent SI units.
//
// Each node stands for the volume between the midpoints to its neighbours; the outermost nodes of each part of a body
// lie at its ends, and where two parts meet a resistance lies between two nodes at one place. The state is the
// enthalpy of each volume above the start, in joule, and behind all of them the heat that has left through each face and
// that a source has given, so that their sum is an invariant (S. V. Patankar, Numerical Heat Transfer and
// Fluid Flow, 1980, for the volumes; G. Kirchhoff's potential for the variable conductivity, H. S.
// Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., section 1.6; from memory). A lump of one
// temperature at a face is one more element at the end of the chain, so that the equations stay tridiagonal.
package fv
