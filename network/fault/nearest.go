package fault

import (
	"fmt"
	"slices"
	"strings"
)

// Nearest returns the known word that is closest to word by edit distance, when
// it is close enough to be a likely slip of the pen (a third of its letters).
func Nearest(word string, known []string) (string, bool) {
	word = strings.ToLower(strings.TrimSpace(word))
	best, bestDistance := "", 1+max(1, len(word)/3)
	for _, k := range known {
		if d := editDistance(word, strings.ToLower(k)); d < bestDistance {
			best, bestDistance = k, d
		}
	}
	return best, best != ""
}

// Suggest words what would be right for an unknown word: the nearest known one
// if any is near, else the whole list.
func Suggest(word string, known []string) string {
	if k, ok := Nearest(word, known); ok {
		return fmt.Sprintf("did you mean %q?", k)
	}
	sorted := slices.Clone(known)
	slices.Sort(sorted)
	return "known: " + strings.Join(sorted, ", ")
}

// editDistance is the Levenshtein distance with the transposition of two
// neighbours counted as one step (optimal string alignment).
func editDistance(a, b string) int {
	ra, rb := []rune(a), []rune(b)
	before, last := make([]int, len(rb)+1), make([]int, len(rb)+1)
	for j := range last {
		last[j] = j
	}
	for i := 1; i <= len(ra); i++ {
		row := make([]int, len(rb)+1)
		row[0] = i
		for j := 1; j <= len(rb); j++ {
			cost := 1
			if ra[i-1] == rb[j-1] {
				cost = 0
			}
			row[j] = min(last[j]+1, row[j-1]+1, last[j-1]+cost)
			if i > 1 && j > 1 && ra[i-1] == rb[j-2] && ra[i-2] == rb[j-1] {
				row[j] = min(row[j], before[j-2]+1)
			}
		}
		before, last = last, row
	}
	return last[len(rb)]
}
