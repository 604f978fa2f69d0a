package job_test

import (
	"testing"

	"rimfall/network/job"
)

func TestFaultsOfDepartures(t *testing.T) {
	check(t, job.ToCheck, []faultCase{
		{"a rule is unknown", `
-- departures.csv --
rule,subject,reason
covr,P1,shallow rock
speed,P1,steep street
`, `
departures.csv:2:1: unknown rule "covr": did you mean "cover"?
departures.csv:3:1: unknown rule "speed": known: cover, slope
`},
		{"rule, subject and reason are blank", `
-- departures.csv --
rule,subject,reason
,P1,rock
cover,,rock
cover,P1,
`, `
departures.csv:2:1: rule is blank: name the rule that is departed from
departures.csv:3:7: subject is blank: write the id of a pipe or structure, or * for all
departures.csv:4:10: reason is blank: a departure is accepted for a reason, which is printed with it
`},
		{"a column is missing", `
-- departures.csv --
rule,subject
cover,P1
`, `
departures.csv:1:1: missing column "reason"
`},
		{"no row stands below the headings", `
-- departures.csv --
rule,subject,reason
`, `
departures.csv:1: empty table: no row below the headings
`},
	})
}
