package drawing

// spread moves places apart: neighbours i and i+1 come to stand at least gap[i] from one another, all stay between low
// and high, and the sum of the squares of the moves is the least. It pools neighbours that are in each other's way, as
// isotonic regression does (Barlow and others, Statistical Inference under Order Restrictions, 1972, from memory). The
// gaps must fit between low and high.
func spread(places, gap []float64, low, high float64) []float64 {
	type pool struct {
		sum   float64
		count int
	}
	// Without the gaps the places only have to keep their order.
	shift := make([]float64, len(places))
	for i := 1; i < len(places); i++ {
		shift[i] = shift[i-1] + gap[i-1]
	}
	var pools []pool
	for i, x := range places {
		pools = append(pools, pool{x - shift[i], 1})
		for len(pools) > 1 {
			last, before := pools[len(pools)-1], pools[len(pools)-2]
			if before.sum*float64(last.count) <= last.sum*float64(before.count) {
				break
			}
			pools = append(pools[:len(pools)-2], pool{before.sum + last.sum, before.count + last.count})
		}
	}
	spreadOut := make([]float64, 0, len(places))
	for _, p := range pools {
		mean := p.sum / float64(p.count)
		for range p.count {
			i := len(spreadOut)
			spreadOut = append(spreadOut, shift[i]+max(low, min(mean, high-shift[len(shift)-1])))
		}
	}
	return spreadOut
}
