// Package eigen evaluates the exact solutions of transient conduction in a plate, a long cylinder and a
// sphere that start at one temperature and exchange heat with a constant coefficient: θ = (T − T∞)/(T0 − T∞)
// over the Fourier number Fo = α t/R² for the Biot number Bi = h R/k.
//
// From Fo = [Join] on, for a cylinder [CylinderJoin], it sums the series of eigenfunctions, of which a few
// terms are enough then. Below, it takes the first images of the Laplace transform, which are exact to
// exp(−1/Fo); for a cylinder, whose images are no closed terms, what they leave out is inverted by quadrature.
// All of it is arranged so that no digits are lost at small or large Biot numbers or where two terms of
// a formula cancel.
package eigen
