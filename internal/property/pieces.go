package property

// A Piece is a solid from the temperature From on: conductivity and specific heat are polynomials of the distance from
// there, with the coefficients in rising order.
type Piece struct {
	From float64
	K, C [4]float64
}

// Pieces is a solid given by pieces, each of which ends where the next begins. The enthalpy is the exact integral, zero at
// the start of the first.
type Pieces struct {
	pieces []Piece
	h      []float64 // enthalpy at the start of each
}

// NewPieces returns the solid of at least one piece, in rising order.
func NewPieces(pieces ...Piece) *Pieces {
	p := &Pieces{pieces, make([]float64, len(pieces))}
	for i := 1; i < len(pieces); i++ {
		x := pieces[i].From - pieces[i-1].From
		p.h[i] = p.h[i-1] + integral(&pieces[i-1].C, x)
	}
	return p
}

// at returns the index of the piece that holds t.
func (p *Pieces) at(t float64) int {
	i := 0
	for i+1 < len(p.pieces) && t >= p.pieces[i+1].From {
		i++
	}
	return i
}

// Conductivity returns the polynomial of the piece.
func (p *Pieces) Conductivity(t float64) float64 {
	piece := &p.pieces[p.at(t)]
	return cubic(&piece.K, t-piece.From)
}

// SpecificHeat returns the polynomial of the piece.
func (p *Pieces) SpecificHeat(t float64) float64 {
	piece := &p.pieces[p.at(t)]
	return cubic(&piece.C, t-piece.From)
}

// Enthalpy returns the integral of the specific heat from the start of the first piece.
func (p *Pieces) Enthalpy(t float64) float64 {
	i := p.at(t)
	return p.h[i] + integral(&p.pieces[i].C, t-p.pieces[i].From)
}

func cubic(a *[4]float64, x float64) float64 { return a[0] + x*(a[1]+x*(a[2]+x*a[3])) }

// integral returns that of the cubic from 0 to x.
func integral(a *[4]float64, x float64) float64 {
	return x * (a[0] + x*(a[1]/2+x*(a[2]/3+x*(a[3]/4))))
}

// times returns the product of two straight lines.
func times(p, q [4]float64) [4]float64 {
	return [4]float64{p[0] * q[0], p[0]*q[1] + p[1]*q[0], p[1] * q[1]}
}
