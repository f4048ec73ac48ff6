// Package fit finds the constants of a cooling curve from readings, in SI numbers.
//
// For one exponential, y = a + (s − a) exp(−t/τ) with the start s and the ambient a, both are linear once τ is known. So
// the sum of squares is a function of τ alone (G. H. Golub, V. Pereyra, SIAM J. Numer. Anal. 10 (1973) 413–432,
// from memory), which is scanned over all τ that the readings could tell, and its minimum cannot be missed for
// want of a good start. An interval is where that sum, at its least with the wanted quantity held, rises by no more than
// Student's t allows (D. M. Bates, D. G. Watts, Nonlinear Regression Analysis and Its Applications, Wiley 1988,
// ch. 6, from memory): it is not symmetric, and it is open on a side where the readings put no bound.
package fit
