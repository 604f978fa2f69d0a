package job

import (
	"strings"

	"rimfall/network"
	"rimfall/network/fault"
)

// Departure is a finding that the designer accepts, with the reason.
type Departure struct {
	Rule    string
	Subject string // an id, or "*" for every subject
	Reason  string
	Storm   network.Maybe // return period, years, for which alone it is accepted
	Line    int
}

// departureRow is a row of departures.csv as texts.
type departureRow struct {
	Rule    string `csv:"rule"`
	Subject string `csv:"subject"`
	Reason  string `csv:"reason"`
	Storm   string `csv:"storm"`
	Note    string `csv:"note"`
}

// readDepartures reads departures.csv. rules are the names of the rules there are.
func (r *reader) readDepartures(t *table, rules []string) []Departure {
	var all []Departure
	eachRow(t, func(row *departureRow) {
		d := Departure{note(row.Rule), note(row.Subject), note(row.Reason), t.number("storm", row.Storm, positive), t.line}
		switch {
		case d.Rule == "":
			t.faultAt("rule", "rule is blank: name the rule that is departed from")
		case len(rules) > 0 && !contains(rules, d.Rule):
			t.faultAt("rule", "unknown rule %q: %s", d.Rule, fault.Suggest(d.Rule, rules))
		}
		if d.Subject == "" {
			t.faultAt("subject", "subject is blank: write the id of a pipe or structure, or * for all")
		}
		if d.Reason == "" {
			t.faultAt("reason", "reason is blank: a departure is accepted for a reason, which is printed with it")
		}
		all = append(all, d)
	})
	return all
}

func contains(words []string, word string) bool {
	for _, w := range words {
		if strings.EqualFold(w, word) {
			return true
		}
	}
	return false
}
