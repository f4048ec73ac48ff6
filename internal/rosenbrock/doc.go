// Package rosenbrock integrates stiff systems y' = f(t, y) by a linearly implicit method of order 4
// with an embedded one of order 3: six stages, L-stable, stiffly accurate, with the additional
// conditions that keep the order for parabolic problems, and a continuous extension of its own. For systems whose
// ∂f/∂y jumps there is an implicit method of order 2 beside it, [IntegrateImplicit].
//
// Method: G. Steinebach, Order-reduction of ROW methods for DAEs and method of lines applications,
// Preprint 1741, TH Darmstadt, 1995, written as in E. Hairer and G. Wanner, Solving Ordinary
// Differential Equations II, 2nd ed., section IV.7. The coefficients are from memory; a test recomputes the
// order conditions, the stability function at infinity and the observed orders.
package rosenbrock
