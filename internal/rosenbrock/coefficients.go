package rosenbrock

// Gamma is the diagonal coefficient of the method: every stage solves with the matrix 1/(Gamma h) − J.
const Gamma = 0.25

// The coefficients of stage i = 2 … 6 in the transformed form of Hairer and Wanner, (7.25): a weighs
// the earlier stages in the argument, c in the right-hand side. Stage 6 has the argument of stage 5
// plus u5, and the new state is the argument of stage 6 plus u6, which is also the error estimate.
var (
	a2 = [...]float64{3.0}
	a3 = [...]float64{1.831036793486759, 0.4955183967433795}
	a4 = [...]float64{2.304376582692669, -0.05249275245743001, -1.176798761832782}
	a5 = [...]float64{-7.170454962423024, -4.741636671481785, -16.31002631330971, -1.062004044111401}

	c2 = [...]float64{-12.0}
	c3 = [...]float64{-8.791795173947035, -2.207865586973518}
	c4 = [...]float64{10.81793056857153, 6.780270611428266, 19.53485944642410}
	c5 = [...]float64{34.19095006749676, 15.49671153725963, 54.74760875964130, 14.16005392148534}
	c6 = [...]float64{34.62605830930532, 15.30084976114473, 56.99955578662667, 18.40807009793095, -5.714285714285717}

	alpha = [...]float64{0, 0.75, 0.21, 0.63, 1, 1}
	gamma = [...]float64{0.25, -0.5, -0.023504, -0.0362, 0, 0}

	// Continuous extension: y(s) = (1−s) y0 + s (y1 + (1−s) (Σ dense2 u + s Σ dense3 u)).
	dense2 = [...]float64{25.09876703708589, 11.62013104361867, 28.49148307714626, -5.664021568594133}
	dense3 = [...]float64{1.638054557396973, -0.7373619806678748, 8.477918219238990, 15.99253148779520, -1.882352941176471}
)
