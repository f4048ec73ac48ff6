// Package wall has the modes of conduction across a plate, a tube or a hollow sphere whose two faces may
// differ, and across a solid cylinder or sphere: the roots, eigenfunctions, norms and integrals from which
// temperatures follow for any start, any constant conditions at the faces and any uniform source.
//
// Lengths are over the way L from the inner face, or the centre, to the outer one, so that a place is its
// distance y from the inner face, 0 to 1, and time is the Fourier number α t/L². With the radius r = Ra + y the
// equation of conduction and the conditions at the faces are
//
//	(w T')' + w G = w ∂T/∂Fo,  w = (r/Rb)^m,  T'(0) = Ha (T − Ua),  −T'(1) = Hb (T − Ub),
//
// m = 0 in a plate, 1 in a cylinder and 2 in a sphere; H = h L/k from 0, an insulated face or one with a given
// flux, to +Inf, a prescribed temperature. The n-th mode is the one with n − 1 zeros, and its root lies between
// (n − 1)π and nπ whatever the radii and coefficients are, so that none is missed.
//
// For short times there is the body of one face, which is exact until the other face is felt.
package wall
