package linear

import (
	"math"

	"gonum.org/v1/gonum/mat"
)

// A Network is what the modes follow from.
type Network struct {
	Capacity []float64 // of each node, J/K, above 0
	Links    []Link
	Leaks    []Leak
}

// A Link is a conductance between two nodes, W/K.
type Link struct {
	A, B        int
	Conductance float64
}

// A Leak is a conductance from a node to what has a temperature of its own.
type Leak struct {
	Node        int
	Conductance float64
}

// Modes are the decaying modes of a network. With x_k the size of mode k the temperatures are
// T_i = Σ_k Shape[k][i] x_k, and a power P_i in the nodes drives x_k' = −Rate[k] x_k + Σ_i Shape[k][i] P_i. The size of a
// mode at temperatures T is x_k = Σ_i C_i Shape[k][i] T_i.
type Modes struct {
	Rate  []float64   // 1/s, rising within a part of the network
	Shape [][]float64 // a row for each mode
	Part  []int       // of each node: nodes of one number are joined
	Open  []bool      // of each part: whether it has a leak
}

// Modes finds the modes. The matrix is made symmetric with the roots of the capacities, and decomposed part by part. A
// part without a leak has one mode of rate 0 exactly, in which all its nodes are at one temperature.
// It reports false if the decomposition fails, or if the capacities are so far apart (beyond some 1e20) that
// a mode is lost in rounding.
func (n *Network) Modes() (*Modes, bool) {
	m := &Modes{Part: make([]int, len(n.Capacity))}
	n.findParts(m)
	for part := range m.Open {
		var nodes []int
		for i, p := range m.Part {
			if p == part {
				nodes = append(nodes, i)
			}
		}
		if !n.decompose(m, part, nodes) {
			return nil, false
		}
	}
	return m, true
}

// findParts numbers the parts that links join.
func (n *Network) findParts(m *Modes) {
	for i := range m.Part {
		m.Part[i] = i
	}
	for changed := true; changed; {
		changed = false
		for _, l := range n.Links {
			if a, b := m.Part[l.A], m.Part[l.B]; l.Conductance > 0 && a != b {
				m.Part[l.A], m.Part[l.B], changed = min(a, b), min(a, b), true
			}
		}
	}
	numbers := map[int]int{}
	for i, first := range m.Part {
		if _, ok := numbers[first]; !ok {
			numbers[first] = len(numbers)
		}
		m.Part[i] = numbers[first]
	}
	m.Open = make([]bool, len(numbers))
	for _, l := range n.Leaks {
		if l.Conductance > 0 {
			m.Open[m.Part[l.Node]] = true
		}
	}
}

// decompose appends the modes of one part.
func (n *Network) decompose(m *Modes, part int, nodes []int) bool {
	place := make(map[int]int, len(nodes))
	total := 0.0
	for k, i := range nodes {
		place[i] = k
		total += n.Capacity[i]
	}
	a := mat.NewSymDense(len(nodes), nil)
	add := func(i, j int, g float64) {
		a.SetSym(i, j, a.At(i, j)+g/math.Sqrt(n.Capacity[nodes[i]])/math.Sqrt(n.Capacity[nodes[j]]))
	}
	for _, l := range n.Links {
		i, ok := place[l.A]
		if j := place[l.B]; ok && i != j {
			add(i, i, l.Conductance)
			add(j, j, l.Conductance)
			add(i, j, -l.Conductance)
		}
	}
	for _, l := range n.Leaks {
		if i, ok := place[l.Node]; ok {
			add(i, i, l.Conductance)
		}
	}
	for i := range nodes {
		for j := range nodes {
			if !isFinite(a.At(i, j)) {
				return false
			}
		}
	}
	var eigen mat.EigenSym
	if !eigen.Factorize(a, true) {
		return false
	}
	var q mat.Dense
	eigen.VectorsTo(&q)
	for k := range nodes {
		shape := make([]float64, len(n.Capacity))
		for i, node := range nodes {
			shape[node] = q.At(i, k) / math.Sqrt(n.Capacity[node])
		}
		var rate float64
		switch {
		case m.Open[part]:
			rate = n.quotient(shape, place)
		case k == 0:
			for _, node := range nodes {
				shape[node] = 1 / math.Sqrt(total)
			}
		default:
			n.level(shape, nodes, total)
			rate = n.quotient(shape, place)
		}
		if !n.holds(shape, rate, nodes, place) {
			return false
		}
		m.Rate, m.Shape = append(m.Rate, rate), append(m.Shape, shape)
	}
	return true
}

// lost is the part of the temperatures of a network by which a mode may be wrong.
const lost = 1e-6

// holds reports whether a mode satisfies its equation at every node, what flows out of it is rate C u, so nearly that
// its share in the temperatures is right.
func (n *Network) holds(shape []float64, rate float64, nodes []int, place map[int]int) bool {
	miss, conductance := make([]float64, len(nodes)), make([]float64, len(nodes))
	for _, l := range n.Links {
		if a, ok := place[l.A]; ok {
			b, flow := place[l.B], l.Conductance*(shape[l.A]-shape[l.B])
			miss[a] += flow
			miss[b] -= flow
			conductance[a] += l.Conductance
			conductance[b] += l.Conductance
		}
	}
	for _, l := range n.Leaks {
		if k, ok := place[l.Node]; ok {
			miss[k] += l.Conductance * shape[l.Node]
			conductance[k] += l.Conductance
		}
	}
	size := 0.0 // of the mode, where all temperatures are 1
	for _, i := range nodes {
		size += n.Capacity[i] * math.Abs(shape[i])
	}
	for k, i := range nodes {
		if conductance[k] == 0 {
			continue
		}
		wrong := math.Abs(miss[k]-rate*n.Capacity[i]*shape[i]) / conductance[k]
		if !(wrong*size <= lost) {
			return false
		}
	}
	return isFinite(rate)
}

// level takes from a mode what heat it holds: none but the mode of rate 0 holds any, to more digits than the
// decomposition gives beside a fast mode.
func (n *Network) level(shape []float64, nodes []int, total float64) {
	heat := 0.0
	for _, i := range nodes {
		heat += n.Capacity[i] * shape[i]
	}
	for _, i := range nodes {
		shape[i] -= heat / total
	}
}

// quotient returns Rayleigh's quotient of a mode, as a sum of squares: a slow mode beside a
// fast one keeps its digits, which the decomposition loses.
func (n *Network) quotient(shape []float64, place map[int]int) float64 {
	sum, norm := 0.0, 0.0
	for _, l := range n.Links {
		if _, ok := place[l.A]; ok {
			d := shape[l.A] - shape[l.B]
			sum += l.Conductance * d * d
		}
	}
	for _, l := range n.Leaks {
		if _, ok := place[l.Node]; ok {
			sum += l.Conductance * shape[l.Node] * shape[l.Node]
		}
	}
	for i := range place {
		norm += n.Capacity[i] * shape[i] * shape[i]
	}
	return sum / norm
}

// Sizes returns the sizes of the modes at temperatures T.
func (m *Modes) Sizes(n *Network, temperatures []float64) []float64 {
	x := make([]float64, len(m.Rate))
	for k, shape := range m.Shape {
		for i, u := range shape {
			x[k] += n.Capacity[i] * u * temperatures[i]
		}
	}
	return x
}

func isFinite(x float64) bool { return math.Abs(x) <= math.MaxFloat64 }
