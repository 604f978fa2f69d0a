package job

import (
	"errors"

	"rimfall/network"
	"rimfall/network/units"
)

// ReadSize reads a size as pipes.csv has it: a diameter, or `span x rise`, each
// with a unit where another than the system's is meant. The error says what would
// be right.
func ReadSize(text, shape string, u units.System) (network.Size, error) {
	size, why := parseSize(text, shape, false, u)
	if why != "" {
		return network.Size{}, errors.New(why)
	}
	return size, nil
}
