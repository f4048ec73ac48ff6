package wall

import (
	"math"

	"example.com/coolward/internal/root"
)

// A search looks for the first time at which a temperature is at a target. On any interval the temperature is a sum
// of terms each of which is monotone there, so that the values at both ends enclose it: an interval whose enclosure
// leaves the target out is passed over, another is halved. No crossing is missed.
type search struct {
	s      *Solution
	p      Probe
	target float64
	a      []float64 // coefficients of the modes
	source []float64 // those of a source of 1
	slow   float64   // that of exp(−ζ² Fo) − 1 of a slow first mode
	drives [3]Drive  // everything at Fo = 0 by parts, of which the answers are monotone in early times
	left   int       // intervals that may still be looked at
}

// mostIntervals bounds a search; some tens are usual.
const mostIntervals = 5000

// First returns the first Fo from the given one to the end at which a Value or Mean is at the target, and whether there
// is one. A target that is touched to within the rounding may go either way. It is NaN, and not found, if the search is
// given up because the temperature stays too close to the target.
func (s *Solution) First(p Probe, target, from, end float64) (float64, bool) {
	d := s.problem.Drive
	q := search{s: s, p: p, target: target, left: mostIntervals, drives: [3]Drive{{Ub: d.Ub, Qb: d.Qb}, {Ua: d.Ua, Qa: d.Qa}, {G: d.G}}}
	q.a = make([]float64, len(s.all.c))
	q.source = make([]float64, len(s.all.c))
	for n := range q.a {
		w := s.weight(p, &s.Modes.All[n])
		q.a[n], q.source[n] = w*s.all.c[n], w*s.unit.c[n]
	}
	q.slow = s.all.slow * s.weight(p, &s.Modes.All[0])
	end = math.Min(end, q.settled())
	for lo := from; lo < end; {
		hi := end
		if s.problem.Start == nil && lo < s.Join {
			hi = math.Min(hi, s.Join)
		}
		if s.source.used() {
			if i := s.source.at(lo) + 1; i < len(s.source.pieces) {
				hi = math.Min(hi, s.source.pieces[i].from)
			}
			for i := s.source.at(lo); i >= 0 && q.recent(i, lo); i-- {
				hi = math.Min(hi, s.source.pieces[i].from+s.Join)
			}
		}
		if fo, ok := q.within(lo, hi); ok {
			return fo, true
		}
		if q.left < 0 {
			return math.NaN(), false
		}
		lo = hi
	}
	return 0, false
}

// recent reports whether the begin of a piece is less than the join ago.
func (q *search) recent(i int, fo float64) bool { return q.s.source.pieces[i].from+q.s.Join > fo }

// settled returns a time from which the target is not crossed.
func (q *search) settled() float64 {
	if q.s.source.used() {
		return math.Inf(1)
	}
	base := q.s.all.base(q.p, 1, 0) - q.slow
	gap := math.Abs(q.target - base)
	total, slowest := math.Abs(q.slow), math.Inf(1)
	if q.slow != 0 {
		slowest = q.s.Modes.All[0].Rate
	}
	for n, a := range q.a {
		total += math.Abs(a)
		if rate := q.s.Modes.All[n].Rate; a != 0 && rate > 0 {
			slowest = math.Min(slowest, rate)
		}
	}
	if rise := math.Abs(q.s.Steady.Rise); rise > 0 {
		return (gap + total) / rise * 2
	}
	if gap == 0 || total == 0 {
		gap = total * math.SmallestNonzeroFloat64
	}
	const last = 745 // exp(−745) is the least float64
	return math.Min(math.MaxFloat64, math.Max(q.s.Join, math.Min(last, math.Log(total/gap)+1)/slowest))
}

func (q *search) value(fo float64) float64 { return q.s.Ask(q.p, fo) - q.target }

// within searches an interval, the earlier half first.
func (q *search) within(lo, hi float64) (float64, bool) {
	if q.left--; q.left < 0 {
		return 0, false
	}
	least, most, monotone := q.enclose(lo, hi)
	if least > q.target || most < q.target {
		return 0, false
	}
	if monotone || hi-lo <= 1e-10*hi || hi < 1e-290 {
		a, b := q.value(lo), q.value(hi)
		switch {
		case a == 0:
			return lo, true
		case (a > 0) == (b > 0) && b != 0:
			return 0, false
		case lo == 0: // over the logarithm
			for lo = hi; (q.value(lo) > 0) != (a > 0) && lo > 1e-290; {
				lo, hi = lo/64, lo
			}
		}
		return root.Find(q.value, lo, hi, 0)
	}
	mid := lo + (hi-lo)/2
	if lo < hi/64 {
		mid = math.Max(8*lo, hi/64)
	} else if lo < hi/4 {
		mid = math.Sqrt(lo) * math.Sqrt(hi)
	}
	if fo, ok := q.within(lo, mid); ok {
		return fo, true
	}
	return q.within(mid, hi)
}

// A sum is the enclosure of a sum of monotone terms.
type sum struct {
	least, most   float64
	rising, falls bool
}

func (s *sum) add(a, b float64) {
	s.least += math.Min(a, b)
	s.most += math.Max(a, b)
	s.rising = s.rising || b > a
	s.falls = s.falls || b < a
}

// enclose returns bounds of the temperature on an interval that lies on one side of the join and in one piece of the
// source, and whether it is monotone there.
func (q *search) enclose(lo, hi float64) (least, most float64, monotone bool) {
	s, t := q.s, sum{}
	uniform := s.problem.Start == nil
	if uniform && hi <= s.Join {
		for _, d := range q.drives {
			if d != (Drive{}) {
				t.add(s.early(d, q.p, lo), s.early(d, q.p, hi))
			}
		}
	} else {
		t.add(s.all.base(q.p, 1, lo), s.all.base(q.p, 1, hi))
		slope := sum{} // of the derivative
		if q.slow != 0 {
			rate := s.Modes.All[0].Rate
			t.add(q.slow*math.Expm1(-rate*lo), q.slow*math.Expm1(-rate*hi))
			slope.add(-rate*q.slow*math.Exp(-rate*lo), -rate*q.slow*math.Exp(-rate*hi))
		}
		slope.add(s.Steady.Rise, s.Steady.Rise)
		for n, a := range q.a {
			if a == 0 {
				continue
			}
			rate := s.Modes.All[n].Rate
			before, after := a*math.Exp(-rate*lo), a*math.Exp(-rate*hi)
			t.add(before, after)
			slope.add(-rate*before, -rate*after)
			if rate*lo > 800 {
				break
			}
		}
		monotone = !s.source.used() && (slope.least > 0 || slope.most < 0)
	}
	if s.source.used() {
		q.encloseSource(&t, lo, hi)
	}
	slack := s.size * 1e-15
	still := t.most-t.least <= 4*slack // to within rounding
	return t.least - slack, t.most + slack, monotone || still || !(t.rising && t.falls)
}

// encloseSource adds what the source gives on a part of one piece.
func (q *search) encloseSource(t *sum, lo, hi float64) {
	s := q.s
	i := s.source.at(lo)
	part := &s.source.pieces[i]
	a, b := lo-part.from, hi-part.from
	ga, gb := part.g+part.slope*a, part.g+part.slope*b
	area := func(age, g float64) float64 { return part.area + age*(part.g+g)/2 }
	if ga > 0 != (gb > 0) && part.slope != 0 { // the area has its extreme in between
		zero := -part.g / part.slope
		t.add(s.unit.base(q.p, ga, area(a, ga)), s.unit.base(q.p, 0, area(zero, 0)))
		t.add(0, s.unit.base(q.p, gb, area(b, gb))-s.unit.base(q.p, 0, area(zero, 0)))
	} else {
		t.add(s.unit.base(q.p, ga, area(a, ga)), s.unit.base(q.p, gb, area(b, gb)))
	}
	// the answer to a recent step is monotone as a whole; what it gives to the modes is taken from them
	modes := len(s.Modes.All)
	for n, z := range s.source.z[i*modes : (i+1)*modes] {
		c := q.source[n]
		if c == 0 {
			continue
		}
		mode := &s.Modes.All[n]
		za, zb := moved(mode, z, part.slope, a), moved(mode, z, part.slope, b)
		for j := i; j >= 0 && q.recent(j, lo); j-- {
			step := &s.source.pieces[j]
			za -= step.jump * math.Exp(-mode.Rate*(lo-step.from))
			zb -= step.jump * math.Exp(-mode.Rate*(hi-step.from))
		}
		t.add(c*za, c*zb)
	}
	for ; i >= 0 && q.recent(i, lo); i-- {
		if step := &s.source.pieces[i]; step.jump != 0 {
			answer := func(age float64) float64 {
				return step.jump * (s.early(Drive{G: 1}, q.p, age) - s.unit.base(q.p, 1, age))
			}
			t.add(answer(lo-step.from), answer(hi-step.from))
		}
	}
}
