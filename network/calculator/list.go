package calculator

import (
	"fmt"
	"math"
	"strconv"
	"strings"
)

// mostRows is how long a list may be: far over what anyone reads, far below what fills
// a machine.
const mostRows = 10000

// expand makes the single values of a list, as texts: `0.1:0.9:0.1` from, to and step,
// or `12,15,18`. A text that is no list is its own only value.
func expand(name, text string) ([]string, error) {
	if strings.Contains(text, ",") {
		values := strings.Split(text, ",")
		if len(values) == 2 && strings.TrimSpace(values[0]) == "0" {
			return nil, refuse(fmt.Sprintf("%s %q", name, text), "write a decimal point, "+strings.Replace(text, ",", ".", 1)+"; a comma parts the values of a list")
		}
		return values, nil
	}
	parts := strings.Split(text, ":")
	switch {
	case len(parts) == 3:
		return expandSteps(name, text, parts)
	case len(parts) == 1 || name == Side && len(parts) == 2:
		return []string{text}, nil
	}
	return nil, refuse(fmt.Sprintf("%s %q is no list", name, text), "write from:to:step, such as 0.1:0.9:0.1, or values with commas between")
}

// expandSteps counts from the first value to the second; a unit stands at each of the
// three or at the last one only.
func expandSteps(name, text string, parts []string) ([]string, error) {
	var v [3]float64
	_, unit := split(strings.TrimSpace(parts[2]))
	for i, part := range parts {
		digits, own := split(strings.TrimSpace(part))
		value, err := strconv.ParseFloat(digits, 64)
		if err != nil || own != "" && own != unit {
			return nil, refuse(fmt.Sprintf("%s %q is no list", name, text), "write from:to:step as numbers, such as 0.1:0.9:0.1")
		}
		v[i] = value
	}
	steps := (v[1] - v[0]) / v[2]
	if !(steps >= 0) || steps > mostRows {
		return nil, refuse(fmt.Sprintf("%s %q has no or too many values", name, text), fmt.Sprintf("write from:to:step with a step that leads from the first to the second in at most %d steps", mostRows))
	}
	var values []string
	for i := range int(math.Floor(steps+1e-9)) + 1 {
		value := v[0] + float64(i)*v[2]
		values = append(values, short(value)+unit)
	}
	return values, nil
}
