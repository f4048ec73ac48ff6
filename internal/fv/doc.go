// Package fv discretises one-dimensional conduction by conservative finite volumes with enthalpy as
// the state: a graded grid of nodes, tables of temperature and conductivity integral over enthalpy,
// and the system of equations that an integrator takes. It works in coherent SI units.
//
// Each node stands for the volume between the midpoints to its neighbours; the outermost node lies on the
// surface. The state is the enthalpy of each volume above the start, in joule, and as last component the
// heat that has left, so that their sum is an invariant (S. V. Patankar, Numerical Heat Transfer and
// Fluid Flow, 1980, for the volumes; G. Kirchhoff's potential for the variable conductivity, H. S.
// Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., section 1.6; from memory).
package fv
