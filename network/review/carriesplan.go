package review

import "fmt"

// CarriesClasses sorts the pipes of an answer into a few classes by what they carry, for a plan: under the
// smallest storm, between some of the columns of the rainfall, and over the largest storm. class is −1 where
// the limit is none for a pipe.
func (c *CarriesReport) CarriesClasses(limit LimitKind, most int) (words []string, class []int) {
	edges := spread(c.Subject.columns(), most-1)
	words = append(words, "under "+exact(edges[0])+" years")
	for k := 1; k < len(edges); k++ {
		words = append(words, fmt.Sprintf("%s to %s years", exact(edges[k-1]), exact(edges[k])))
	}
	words = append(words, exact(edges[len(edges)-1])+" years and more")
	class = make([]int, len(c.Pipes))
	for i, p := range c.Pipes {
		carried := p.Capacity
		if limit == Crown {
			carried = p.Crown
		}
		switch {
		case !carried.Judged:
			class[i] = -1
		case carried.All:
			class[i] = len(words) - 1
		case !carried.None:
			for class[i] < len(edges) && carried.Period >= edges[class[i]] {
				class[i]++
			}
			class[i] = min(class[i], len(edges)-1) // the largest storm does not hold
		}
	}
	return words, class
}

// spread picks at most some of a list, evenly, the first and the last among them.
func spread(all []float64, most int) []float64 {
	if len(all) <= most {
		return all
	}
	picked := make([]float64, most)
	for k := range picked {
		picked[k] = all[k*(len(all)-1)/(most-1)]
	}
	return picked
}
