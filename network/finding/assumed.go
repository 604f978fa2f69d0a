package finding

import (
	"strconv"

	"rimfall/network"
)

// assumed tells of every value that was not given and was taken from elsewhere.
func (j *judge) assumed() {
	for _, a := range j.Network.Assumptions {
		value := strconv.FormatFloat(a.Value, 'f', -1, 64)
		if a.Unit != "" {
			value = j.length(a.Value)
		}
		j.add("assumed", j.Network.Pipes[a.Pipe].ID, network.Some(a.Value), network.Maybe{}, "%s is not known: %s was taken, %s", a.What, value, a.Because)
	}
}
