package network

// adjacency groups indexes by structure without a slice of its own for each:
// the members of structure s are items[start[s]:start[s+1]].
type adjacency[I ~int32] struct {
	start []int32
	items []I
}

// of lists the members of structure s, in file order.
func (a adjacency[I]) of(s StructureIndex) []I {
	return a.items[a.start[s]:a.start[s+1]]
}

// group sorts items 0…count−1 by the structure they belong to, by counting,
// and keeps file order within a structure.
func group[I ~int32](structures, count int, structureOf func(item int) StructureIndex) adjacency[I] {
	start := make([]int32, structures+1)
	for i := range count {
		start[structureOf(i)+1]++
	}
	for s := range structures {
		start[s+1] += start[s]
	}
	next := make([]int32, structures)
	copy(next, start)
	items := make([]I, count)
	for i := range count {
		s := structureOf(i)
		items[next[s]] = I(i)
		next[s]++
	}
	return adjacency[I]{start, items}
}
