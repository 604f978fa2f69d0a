package report

import "rimfall/network/finding"

// FindingColumns are the columns of the table of findings.
var FindingColumns = []Column[finding.Finding]{
	{"rule", []string{"rule"}, Text, func(f *finding.Finding) Value { return T(f.Rule.Name) }},
	{"severity", []string{"severity"}, Text, func(f *finding.Finding) Value { return T(f.Rule.Severity.String()) }},
	{"subject", []string{"subject"}, Text, func(f *finding.Finding) Value { return T(f.Subject) }},
	{"message", []string{"what was found"}, Text, func(f *finding.Finding) Value { return T(f.Message) }},
	{"value", nil, Number, func(f *finding.Finding) Value { return M(f.Value) }},
	{"limit", nil, Number, func(f *finding.Finding) Value { return M(f.Limit) }},
	{"storm", []string{"storm,", "years"}, Count, func(f *finding.Finding) Value { return N(f.Storm) }},
	{"accepted", []string{"accepted departure, reason"}, Text, func(f *finding.Finding) Value { return T(f.Accepted) }},
}
