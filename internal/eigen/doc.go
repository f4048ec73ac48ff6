// Package eigen evaluates the exact solutions of transient conduction in a plate, a long cylinder and a
// sphere that start at one temperature and exchange heat with a constant coefficient: θ = (T − T∞)/(T0 − T∞)
// over the Fourier number Fo = α t/R² for the Biot number Bi = h R/k.
//
// From Fo = [Join] on, for a cylinder [CylinderJoin], it sums the series of eigenfunctions, of which a few
// terms are enough then; a term is computed when it is first needed. Below, it takes the first images of the Laplace
// transform, which are exact to exp(−1/Fo); for a cylinder, whose images are no closed terms, what they leave out is
// inverted by quadrature. All of it is arranged so that no digits are lost at small or large Biot numbers or where two
// terms of a formula cancel.
//
// Roots are found in one or two steps of a method of high order from a guess of a few digits. The exponential, the
// cosine, J0 and erfcx are taken from tables with short polynomials, in a half to a quarter of the time of package
// math: decay.go, circular.go, bessel.go and erfcx.go.
package eigen
