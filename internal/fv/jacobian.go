package fv

// Linearise implements rosenbrock.System.
func (y *System) Linearise(t, h float64, state, f, ft []float64) error {
	if y.straight && y.storage.owner == y {
		y.conductionOf(state, f)
	} else {
		y.slopes(state)
		y.conduction(f)
	}
	clear(ft)
	clear(y.extra)
	for k := range y.links {
		l := &y.links[k]
		i := l.at
		flow, toA, toB, err := l.linearise(t, y.element(i, state[i]), y.element(i+1, state[i+1]))
		if err != nil {
			return err
		}
		f[i] -= flow
		f[i+1] += flow
		y.lower[i+1] = -toA * y.dT[i]
		y.upper[i] = toB * y.dT[i+1]
	}
	if y.source != nil {
		if err := y.lineariseSource(t, h, state, f, ft); err != nil {
			return err
		}
	}
	for k := range y.ports {
		p := &y.ports[k]
		q, slope, inTime, err := p.linearise(t, h, y.element(p.at, state[p.at]))
		if err != nil {
			return err
		}
		f[y.chain+k], ft[y.chain+k] = q*p.area, inTime*p.area
		if p.Prescribed != nil {
			f[y.chain+k], ft[y.chain+k] = f[p.at], ft[p.at]
		}
		f[p.at] -= q * p.area
		ft[p.at] -= inTime * p.area
		p.slope = slope * p.area * y.dT[p.at]
		y.extra[p.at] += p.slope
	}
	return nil
}

// slopes sets potentials and the derivatives of all that is conduction.
func (y *System) slopes(state []float64) {
	y.storage.owner = y
	for k := range y.parts {
		y.look(&y.parts[k], state, true)
	}
	for k := range y.lumps {
		i := y.lumps[k].at
		y.dT[i] = y.perVolume[i]
		y.phi[i], y.dphi[i] = 0, 0 // its flow is that of a link
	}
	g := y.conduct
	lower, upper, dphi := y.lower[1:len(g)+1], y.upper[:len(g)], y.dphi[:len(g)+1]
	for i, c := range g {
		upper[i] = -c * dphi[i+1]
		lower[i] = -c * dphi[i]
	}
}

// conductionOf sets the rates of the chain where all properties are constant: then the potential of an element is its
// enthalpy times its derivative.
func (y *System) conductionOf(state, f []float64) {
	g := y.conduct
	e, dphi, f0 := state[1:len(g)+1], y.dphi[1:len(g)+1], f[:len(g)]
	last, in := state[0]*y.dphi[0], 0.0
	for i, c := range g {
		next := e[i] * dphi[i]
		through := c * (last - next)
		f0[i] = in - through
		in, last = through, next
	}
	f[len(g)] = in
}

// lineariseSource adds what the source gives, and its derivatives by differences.
func (y *System) lineariseSource(t, h float64, state, f, ft []float64) error {
	clear(y.given) // the storage was another system's, and a lump has no source
	sum, sumInTime := 0.0, 0.0
	soon := t + timeStep*h
	for i, v := range y.Grid.Volumes {
		k := y.first + i
		T := y.element(k, state[k])
		s, err := y.given1(i, t, T)
		if err != nil {
			return err
		}
		warmer, err := y.given1(i, t, T+wallStep)
		if err != nil {
			return err
		}
		inTime := 0.0
		if soon > t {
			s1, err := y.given1(i, soon, T)
			if err != nil {
				return err
			}
			inTime = v * (s1 - s) / (soon - t)
		}
		f[k] += v * s
		ft[k] += inTime
		sum += v * s
		sumInTime += inTime
		y.given[k] = v * (warmer - s) / wallStep * y.dT[k]
		y.extra[k] -= y.given[k]
	}
	f[y.heat], ft[y.heat] = sum, sumInTime
	return nil
}

// Factor implements rosenbrock.System.
func (y *System) Factor(d float64) {
	n := len(y.sums)
	sums := y.sums[:n]
	y.diagonalShift = d
	for i, x := range y.extra[:n] {
		sums[i] = d + x
	}
	y.solver.Factor(y.lower, sums, y.upper)
}

// Solve implements rosenbrock.System.
func (y *System) Solve(b []float64) {
	n := len(y.sums)
	y.solver.Solve(b[:n])
	for k := range y.ports {
		p := &y.ports[k]
		if p.Prescribed != nil {
			b[n+k] = (b[n+k] + y.inflow(p.at, b)) / y.diagonalShift
			continue
		}
		b[n+k] = (b[n+k] + p.slope*b[p.at]) / y.diagonalShift
	}
	if y.source == nil {
		return
	}
	sum := b[y.heat]
	for i, s := range y.given {
		sum += s * b[i]
	}
	b[y.heat] = sum / y.diagonalShift
}

// inflow returns the change of what comes to an element from its neighbours and the source, for a change of the
// state.
func (y *System) inflow(i int, change []float64) float64 {
	sum := 0.0
	if i > 0 {
		sum += y.upper[i-1]*change[i] - y.lower[i]*change[i-1]
	}
	if i < y.chain-1 {
		sum += y.lower[i+1]*change[i] - y.upper[i]*change[i+1]
	}
	if y.source != nil {
		sum += y.given[i] * change[i]
	}
	return sum
}
