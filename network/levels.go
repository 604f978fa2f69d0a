package network

// End is one end of a pipe.
type End int8

// The ends of a pipe.
const (
	Upper End = iota
	Lower
)

func (e End) String() string {
	if e == Upper {
		return "upper"
	}
	return "lower"
}

// StructureAt is the structure at an end of a pipe.
func (p *Pipe) StructureAt(e End) StructureIndex {
	if e == Upper {
		return p.From
	}
	return p.To
}

// Invert is the level of the inside bottom at an end, where it is known.
func (p *Pipe) Invert(e End) Maybe {
	if e == Upper {
		return p.InvertUpper
	}
	return p.InvertLower
}

// Cover is the height of the rim over the outside of a pipe at one end: its
// crown and its wall, an unknown wall counting nothing. There is none where the
// invert or the rim is not known. At an outfall, where the pipe comes to light,
// it is a number and is not judged.
func (n *Network) Cover(p *Pipe, e End) Maybe {
	s := &n.Structures[p.StructureAt(e)]
	invert := p.Invert(e)
	if !invert.OK || !s.Rim.OK || p.Section == nil {
		return Maybe{}
	}
	return Some(s.Rim.V - (invert.V + p.Section.Rise() + p.Wall))
}

// LargestIn is the largest full area among the pipes that enter a structure. Of
// equal ones it is the pipe whose id comes first, so that the order of the rows
// changes no result.
func (n *Network) LargestIn(s StructureIndex) (pipe PipeIndex, area float64, ok bool) {
	for _, i := range n.PipesIn(s) {
		if a := n.Pipes[i].FullArea(); !ok || a > area || a == area && n.Pipes[i].ID < n.Pipes[pipe].ID {
			pipe, area, ok = i, a, true
		}
	}
	return pipe, area, ok
}

// LowestIn is the lowest invert among the pipes that enter a structure; of equal
// ones that of the pipe whose id comes first.
func (n *Network) LowestIn(s StructureIndex) (pipe PipeIndex, invert float64, ok bool) {
	for _, i := range n.PipesIn(s) {
		if v := n.Pipes[i].InvertLower; v.OK && (!ok || v.V < invert || v.V == invert && n.Pipes[i].ID < n.Pipes[pipe].ID) {
			pipe, invert, ok = i, v.V, true
		}
	}
	return pipe, invert, ok
}
