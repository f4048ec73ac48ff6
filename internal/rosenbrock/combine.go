package rosenbrock

import "gonum.org/v1/gonum/floats"

// combine sets dst = base + scale Σ w_j u_j for one to five slices, all of one length.
func combine(dst, base []float64, scale float64, w []float64, u *[stages][]float64) {
	n := len(dst)
	base = base[:n]
	switch len(w) {
	case 1, 2: // here the vector instructions of gonum are faster than one pass
		floats.AddScaledTo(dst, base, w[0]*scale, u[0][:n])
		if len(w) == 2 {
			floats.AddScaled(dst, w[1]*scale, u[1][:n])
		}
	case 3:
		w0, w1, w2 := w[0]*scale, w[1]*scale, w[2]*scale
		u0, u1, u2 := u[0][:n], u[1][:n], u[2][:n]
		for i := range dst {
			dst[i] = base[i] + (w0*u0[i] + w1*u1[i] + w2*u2[i])
		}
	case 4:
		w0, w1, w2, w3 := w[0]*scale, w[1]*scale, w[2]*scale, w[3]*scale
		u0, u1, u2, u3 := u[0][:n], u[1][:n], u[2][:n], u[3][:n]
		for i := range dst {
			dst[i] = base[i] + ((w0*u0[i] + w1*u1[i]) + (w2*u2[i] + w3*u3[i]))
		}
	case 5:
		w0, w1, w2, w3, w4 := w[0]*scale, w[1]*scale, w[2]*scale, w[3]*scale, w[4]*scale
		u0, u1, u2, u3, u4 := u[0][:n], u[1][:n], u[2][:n], u[3][:n], u[4][:n]
		for i := range dst {
			dst[i] = base[i] + ((w0*u0[i] + w1*u1[i]) + (w2*u2[i] + w3*u3[i]) + w4*u4[i])
		}
	}
}
