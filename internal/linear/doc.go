// Package linear solves small networks of heat capacities that are joined by conductances,
//
//	C_i dT_i/dt = −Σ_j G_ij (T_i − T_j) − Σ_a G_ia (T_i − T_a(t)) + P_i,
//
// in SI numbers. With constant conductances [Network.Modes] finds the decaying modes, and a [Curve] is
// the temperature of one node in closed form: constants, ramps and oscillations of what drives it, and an
// exponential for each mode. What is not linear is integrated by package rosenbrock as a [Dense] system.
package linear
