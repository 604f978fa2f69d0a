package hydrology

import (
	"fmt"
	"math"
	"testing"
)

// FHWA, Highway Hydrology, HDS-2, 2nd ed. (FHWA-NHI-02-001, 2002), Example 5.5: 43.7 ha in three pieces with a
// composite C of 0.32, 85 mm/h. Published: 3.3 m³/s.
func ExampleRational() {
	fmt.Printf("%.1f m³/s\n", Rational(RationalFactorSI, 0.32*43.7, 85))
	// Output: 3.3 m³/s
}

func TestFrequencyFactor(t *testing.T) {
	cases := []struct {
		name         string
		period, want float64
	}{
		{"a common storm has 1", 2, 1},
		{"up to 10 years it is 1", 10, 1},
		{"25 years", 25, 1.1},
		{"50 years", 50, 1.2},
		{"100 years", 100, 1.25},
		{"rarer storms have no more than 100 years", 500, 1.25},
		{"halfway in ln T between 10 and 25 years", math.Sqrt(250), 1.05},
		{"halfway in ln T between 50 and 100 years", math.Sqrt(5000), 1.225},
	}
	for _, k := range cases {
		t.Run(k.name, func(t *testing.T) {
			if got := FrequencyFactor(k.period); math.Abs(got-k.want) > 1e-12 { // rounding
				t.Errorf("got %v, want %v", got, k.want)
			}
		})
	}
}
