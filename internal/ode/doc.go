// Package ode integrates one first-order equation dy/dt = f(t, y) from t = 0, to a tolerance, and
// keeps the result as a continuous function of time.
//
// The method is the explicit pair of orders 5 and 4 of J. R. Dormand and P. J. Prince, "A family of
// embedded Runge-Kutta formulae", J. Comput. Appl. Math. 6 (1980) 19-26, with its own continuous
// extension of order 4 (E. Hairer, S. P. Nørsett, G. Wanner, Solving Ordinary Differential Equations
// I, 2nd ed., sec. II.4 to II.6; coefficients from memory, their order conditions are checked in the
// tests). The last stage of a step is the first of the next, so a step costs six evaluations, and one
// more that measures the defect of the extension.
//
// It suits equations that are not stiff: where f pulls y to an equilibrium at the rate λ, steps are no
// longer than about 3.3/λ however smooth y is.
package ode
