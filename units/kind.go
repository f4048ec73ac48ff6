package units

//go:generate go run ../internal/unitgen

// A Dimension marks the kind of a [Quantity]. Only this package can make one.
type Dimension interface {
	comparable
	kind() *kind
}

// A kind is what reading and printing need to know of a kind of quantity.
type kind struct {
	index int
	name  string
	dim   dimension
	units []unitRow // the first is the coherent SI unit
}

// A unitRow is one line of units.csv.
type unitRow struct {
	name      string
	symbol    string
	factor    float64
	spellings []string
	auto      bool // chosen by magnitude when printing
	prefix    bool // takes SI prefixes when reading
	source    string
}

func kindOf[D Dimension]() *kind {
	var d D
	return d.kind()
}
