package property

// StainlessSteel returns stainless steel by EN 1993-1-2:2005, Annex C, from memory: k = 14.6 + 1.27e-2 t and
// c = 450 + 0.280 t − 2.91e-4 t² + 1.34e-7 t³, t in °C.
func StainlessSteel() *Pieces {
	return NewPieces(Piece{zeroCelsius, [4]float64{14.6, 1.27e-2}, [4]float64{450, 0.280, -2.91e-4, 1.34e-7}})
}

// AluminiumAlloy returns an aluminium alloy by EN 1999-1-2:2007, clause 3.3, from memory: c = 903 + 0.41 t, and a straight
// line for k.
func AluminiumAlloy(k0, slope float64) *Pieces {
	return NewPieces(Piece{zeroCelsius, [4]float64{k0, slope}, [4]float64{903, 0.41}})
}

// Timber returns softwood in a fire by EN 1995-1-2:2004, Annex B, from memory, up to 800 °C, with the moisture w by
// mass of dry wood. The tables are joined by straight lines. The density of the annex falls as the wood dries and
// chars; here the specific heat is taken per initial mass, which gives the same heat per volume.
func Timber(w float64) *Pieces {
	type point struct{ t, v float64 }
	conductivity := []point{{20, 0.12}, {200, 0.15}, {350, 0.07}, {500, 0.09}, {800, 0.35}}
	heat := []point{
		{20, 1530},
		{99, 1770},
		{99, 13600},
		{120, 13500},
		{120, 2120},
		{200, 2000},
		{250, 1620},
		{300, 710},
		{350, 850},
		{400, 1000},
		{600, 1400},
		{800, 1650},
	}
	ratio := []point{
		{20, 1 + w}, {99, 1 + w}, {120, 1}, {200, 1}, {250, 0.93}, {300, 0.76}, {350, 0.52}, {400, 0.38}, {600, 0.28}, {800, 0.26},
	}
	at := func(table []point, from, to float64) [4]float64 {
		for i := 1; i < len(table); i++ {
			a, b := table[i-1], table[i]
			if a.t <= from && to <= b.t {
				slope := (b.v - a.v) / (b.t - a.t)
				return [4]float64{a.v + slope*(from-a.t), slope}
			}
		}
		return [4]float64{}
	}
	ends := []float64{20, 99, 120, 200, 250, 300, 350, 400, 500, 600, 800}
	var pieces []Piece
	for i := 1; i < len(ends); i++ {
		from, to := ends[i-1], ends[i]
		c := times(at(heat, from, to), at(ratio, from, to))
		for j := range c {
			c[j] /= 1 + w
		}
		pieces = append(pieces, Piece{from + zeroCelsius, at(conductivity, from, to), c})
	}
	return NewPieces(pieces...)
}
