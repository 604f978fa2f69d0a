package finding

// Severity says how grave a finding is.
type Severity int8

// An Error breaks a limit of the criteria or cannot work; a Warning is for the
// engineer to look at; a Notice tells how a result came about.
const (
	Notice Severity = iota
	Warning
	Error
)

func (s Severity) String() string { return [...]string{"notice", "warning", "error"}[s] }

// Rule is one entry of the catalogue.
type Rule struct {
	Name     string
	Title    string
	Meaning  string // when it is found, in the terms of the results
	Why      string // why it matters
	Severity Severity
	Setting  string // the key of job.toml or the column that holds the limit; "" where there is none
	Source   string // where the rule comes from
}

// Catalogue lists every rule in the order in which it is judged and printed.
func Catalogue() []Rule { return rules }

// Names lists the names of all rules.
func Names() []string {
	names := make([]string, len(rules))
	for i, r := range rules {
		names[i] = r.Name
	}
	return names
}

// rule finds a rule by name; a name that is not in the catalogue is a mistake of
// this package, which its tests find.
func rule(name string) *Rule {
	for i := range rules {
		if rules[i].Name == name {
			return &rules[i]
		}
	}
	panic("no rule " + name)
}

// places gives every rule its place in the catalogue.
func places() map[*Rule]int {
	at := make(map[*Rule]int, len(rules))
	for i := range rules {
		at[&rules[i]] = i
	}
	return at
}
