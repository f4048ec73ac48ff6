// Package eigen evaluates the exact solution of transient conduction in a solid that starts at one
// temperature and exchanges heat with a constant coefficient: θ = (T − T∞)/(T0 − T∞) over the Fourier
// number Fo = α t/R² for the Biot number Bi = h R/k.
//
// From Fo = [Join] on it sums the series of eigenfunctions, of which a few terms are enough then; below it
// takes the first images of the Laplace transform, which are exact to exp(−1/Fo). Both are arranged
// so that no digits are lost at small or large Biot numbers or where two terms of a formula cancel.
package eigen
