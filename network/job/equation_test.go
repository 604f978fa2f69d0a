package job_test

import (
	"math"
	"testing"

	"rimfall/network/job"
)

// equationCase is a published equation as job.toml has it, and the intensity that its source prints.
type equationCase struct {
	name, units, equation string
	period, minutes, want float64
	digits                float64 // half of the last printed digit
}

// The constants are published; Charlottetown's stand in the agency's file (testdata/rainfall), Malaysia's in testdata/hydrology.
var equationCases = []equationCase{
	{
		"DAEE (1999), Andradina, São Paulo: two terms, the second with ln ln(T/(T−1))", "si",
		`[storm.equation]
intensity_unit = "mm/min"
shortest = 10
longest = 1440
source = "DAEE 1999"
[[storm.equation.term]]
numerator = 34.5743
shift = 20
exponent = 0.8809
[[storm.equation.term]]
numerator = 2.6906
shift = 10
exponent = 0.6683
gumbel_offset = -0.4766
gumbel_factor = -0.8977`, 10, 60, 58.3, 0.05,
	},
	{
		"Beijing: q = 2001·(1 + 0.811·lg P)/(t + 8)^0.711 in L/(s·ha)", "si",
		`[storm.equation]
intensity_unit = "L/(s·ha)"
numerator = 2001
period_factor = 0.811
shift = 8
exponent = 0.711`, 1, 10, 92.3, 0.05,
	},
	{
		"Ministry of Health (1930), UK, the first of two ranges: 762/(t + 10) for 5 to 20 min", "si", ministryOfHealth, 1, 10, 38.1, 0.05,
	},
	{
		"Ministry of Health (1930), UK, where the two ranges meet: 25.4 mm/h", "si", ministryOfHealth, 1, 20, 25.4, 0.05,
	},
	{
		"Ministry of Health (1930), UK, the second range: 1016/(t + 20) for 20 to 100 min", "si", ministryOfHealth, 1, 80, 10.16, 0.005,
	},
	{
		"Urban Stormwater Management Manual (Malaysia 2000), Table 13.A1, Ipoh, 10 years: a cubic in ln t", "si",
		`[storm.equation]
return_period = 10
form = "cubic-log"
cubic = [5.0707, 0.6515, -0.2522, 0.0138]
shortest = 30
longest = 1000`, 10, 30, 135.9, 0.05,
	},
	{
		"HDS-2 (2002), Example 2.3: i = 47/(0.285 + D) mm/h, D in hours, at 18 min", "si",
		`[storm.equation]
form = "talbot"
time_unit = "h"
numerator = 47
shift = 0.285`, 2, 18, 80, 0.5,
	},
	{
		"an equation in mm/h in a job in in/h: 762/(t + 10) at 20 min is an inch in an hour", "us",
		`[storm.equation]
intensity_unit = "mm/h"
form = "talbot"
numerator = 762
shift = 10`, 10, 20, 1, 1e-12,
	},
}

const ministryOfHealth = `[[storm.equation]]
form = "talbot"
numerator = 762
shift = 10
shortest = 5
longest = 20
[[storm.equation]]
form = "talbot"
numerator = 1016
shift = 20
shortest = 20
longest = 100`

func TestPublishedEquationsGiveTheirPublishedIntensities(t *testing.T) {
	for _, c := range equationCases {
		t.Run(c.name, func(t *testing.T) {
			settings := "-- job.toml --\nunits = \"" + c.units + "\"\n[storm]\nreturn_period = " + number(c.period) + "\n" + c.equation + "\n-- rainfall.csv --\nabsent\n"
			dir := folder(t, settings)
			j, err := job.Read(dir, job.ToSize, rules)
			if err != nil {
				t.Fatal(err)
			}
			storm, ok := j.Curve(c.period)
			if !ok {
				t.Fatal(j.NoSuchPeriod(c.period))
			}
			if got, _ := storm.At(c.minutes); math.Abs(got-c.want) > c.digits {
				t.Errorf("%v at %v min, want %v", got, c.minutes, c.want)
			}
		})
	}
}

func TestFaultsOfEquations(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"there is a file and an equation", `
-- job.toml --
[storm]
return_period = 10
rainfall = "rainfall.csv"
[storm.equation]
numerator = 100
exponent = 0.8
`, `
job.toml:3:1: the job has rainfall = "rainfall.csv" and a [storm.equation]: leave one of them out
`},
		{"a setting is unknown, one is a text, one is not finite", `
-- job.toml --
[storm]
return_period = 10
[storm.equation]
numerator = "many"
exponent = nan
shft = 10
intensity_unit = "in/min"
time_unit = "s"
`, `
job.toml:4:1: storm.equation.numerator takes a finite number, not the text "many"
job.toml:5:1: storm.equation.exponent takes a finite number, not the number NaN
job.toml:6:1: unknown setting "storm.equation.shft": did you mean "shift"?
job.toml:7:1: intensity_unit = in/min: write one of "in/h", "mm/h", "mm/min", "cm/h", "L/s/ha"
job.toml:8:1: time_unit = s: write "min" or "h"
`},
		{"a form lacks a setting and has one too many", `
-- job.toml --
[storm]
return_period = 10
[storm.equation]
form = "sherman"
numerator = 100
exponent = 0.8
period_exponent = 0.2
`, `
job.toml:4:1: form "sherman" needs shift
job.toml:7:1: form "sherman" takes no period_exponent; leave out the form, or the setting
`},
		{"a form is unknown", `
-- job.toml --
[storm]
return_period = 10
[storm.equation]
form = "talbott"
numerator = 100
exponent = 0.8
`, `
job.toml:4:1: unknown form "talbott": did you mean "talbot"?
`},
		{"the storm is outside the equation's range", `
-- job.toml --
[storm]
return_period = 10
check_period = 100
[storm.equation]
numerator = 100
exponent = 0.8
least_period = 2
greatest_period = 50
`, `
job.toml:3:1: no equation gives a storm of 100 years: return period 100 is outside the equation's range, 2 to 50 years
`},
		{"each equation is for one period, and the storm has none", `
-- job.toml --
[storm]
return_period = 25
[[storm.equation]]
return_period = 10
numerator = 100
exponent = 0.8
[[storm.equation]]
return_period = 50
numerator = 150
exponent = 0.8
`, `
job.toml:2:1: no equation gives a storm of 25 years: one is for 10 years only; one is for 50 years only
`},
		{"the equation rises with duration", `
-- job.toml --
[storm]
return_period = 10
[storm.equation]
numerator = 100
exponent = -0.8
shortest = 5
`, `
job.toml:2:1: no equation gives a storm of 10 years: the equation rises with duration, near 5.298 min for a storm of 10 years
`},
		{"a term has no exponent", `
-- job.toml --
[storm]
return_period = 10
[storm.equation]
numerator = 100
shift = 10
`, `
job.toml:4:1: a term of the equation has no numerator or no exponent, or it is 0: an intensity falls as numerator/(t + shift)^exponent
`},
		{"two ranges leave a gap", `
-- job.toml --
[storm]
return_period = 10
[[storm.equation]]
numerator = 100
exponent = 0.8
shortest = 5
longest = 20
[[storm.equation]]
numerator = 100
exponent = 0.8
shortest = 30
longest = 60
`, `
job.toml:2:1: an equation ends at 20 min and the next starts at 30 min
`},
	})
}
