package eigen

// FaceResponse returns F(d, t) ≥ 0, the inverse of e^{−q d}/(s (q + H)), q = √s: the answer at the distance d from the
// face of a body of one face that takes in H·(what it answers to) less H times its own. H may be somewhat below 0,
// with H √t from −1/2 on.
func FaceResponse(d, h, t float64) float64 { return response(d, h, t) }

// FaceLoss returns Bi ∫ θ dt from 0 to t at the face of such a body, with H = Bi − curvature and θ = 1 − Bi F(0, t),
// also for Bi = +Inf.
func FaceLoss(bi, curvature, t float64) float64 { return earlyLoss(1, bi, curvature, t) }
