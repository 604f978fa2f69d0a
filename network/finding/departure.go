package finding

import (
	"fmt"
	"strings"

	"rimfall/network"
)

// Departure accepts findings of a rule on a subject for a reason. The subject "*"
// stands for every subject; a storm, where one is given, for that return period alone.
type Departure struct {
	Rule, Subject, Reason string
	Storm                 network.Maybe
}

// accepts tells whether the departure is about a finding.
func (d *Departure) accepts(f *Finding) bool {
	return strings.EqualFold(f.Rule.Name, d.Rule) && (d.Subject == "*" || f.Subject == d.Subject) &&
		(!d.Storm.OK || f.Storm == d.Storm.V)
}

// Accept marks the findings that departures accept; nothing is taken away. A
// departure that matches nothing adds a notice.
func Accept(found []Finding, departures []Departure, storm float64) []Finding {
	for _, d := range departures {
		used := false
		for i := range found {
			f := &found[i]
			if d.accepts(f) {
				used = true
				if f.Accepted == "" {
					f.Accepted = d.Reason
				}
			}
		}
		if !used {
			found = append(found, Finding{
				Rule: rule("departure-unused"), Subject: d.Subject, Storm: storm,
				Value: network.Maybe{}, Limit: network.Maybe{},
				Message: fmt.Sprintf("no finding %s on %s: the departure (%s) matches nothing", d.Rule, d.Subject, d.Reason),
			})
		}
	}
	return found
}
