package data

import (
	"io"

	"rimfall/network/finding"
	"rimfall/network/report"
	"rimfall/network/review"
)

// CompareJSON writes what changed from one job to another as one object. What was given
// and what resulted are objects by key, each with the value before and after.
func CompareJSON(w io.Writer, c *review.Comparison) error {
	s := newSink(w)
	s.add("{\n\"before\":")
	s.b = appendString(s.b, c.Before.Job.Settings.Title)
	s.add(",\n\"after\":")
	s.b = appendString(s.b, c.After.Job.Settings.Title)
	s.add(",\n\"units\":")
	s.b = appendString(s.b, c.After.Job.Settings.Units.Name)
	s.add(",\n\"worse\":")
	s.add(word(c.Worse()))
	s.texts("cautions", report.Cautions)
	s.assumptions(c.After.Network)
	s.add(",\n\"settings\":")
	s.changes(c.Settings)
	s.changed(c.Changed)
	s.elements("added", c.Added)
	s.elements("removed", c.Removed)
	s.add(",\n\"findings\":{")
	s.findingChanges("new", c.Findings.New)
	s.add(",")
	s.findingChanges("worse", c.Findings.Worse)
	s.add(",")
	s.findingChanges("cured", c.Findings.Cured)
	s.add("}\n}\n")
	s.flush(true)
	return s.err
}

func word(v bool) string {
	if v {
		return "true"
	}
	return "false"
}

// element opens the object of an element.
func (s *sink) element(e review.Element) {
	s.add("{\"kind\":")
	s.b = appendString(s.b, e.Kind.String())
	s.add(",\"id\":")
	s.b = appendString(s.b, e.ID)
}

func (s *sink) changed(all []review.Changed) {
	s.add(",\n\"changed\":[")
	for i, e := range all {
		if i > 0 {
			s.add(",")
		}
		s.add("\n")
		s.element(e.Element)
		if len(e.Given) > 0 {
			s.add(",\"given\":")
			s.changes(e.Given)
		}
		if len(e.Results) > 0 {
			s.add(",\"results\":")
			s.changes(e.Results)
		}
		s.add("}")
		s.flush(false)
	}
	s.add("\n]")
}

func (s *sink) changes(all []review.Change) {
	s.add("{")
	for i, c := range all {
		if i > 0 {
			s.add(",")
		}
		s.b = appendString(s.b, c.Key)
		s.add(":")
		s.b = appendObject(s.b, []report.Column[review.Change]{
			{Key: "before", Value: func(c *review.Change) report.Value { return c.Before }},
			{Key: "after", Value: func(c *review.Change) report.Value { return c.After }},
		}, &c)
	}
	s.add("}")
}

func (s *sink) elements(key string, all []review.Element) {
	s.add(",\n\"" + key + "\":[")
	for i, e := range all {
		if i > 0 {
			s.add(",")
		}
		s.add("\n")
		s.element(e)
		s.add("}")
		s.flush(false)
	}
	s.add("\n]")
}

// findingChanges writes findings as they stand now, or stood where they are cured; of one
// that grew worse, value and message before as well.
func (s *sink) findingChanges(key string, all []review.FindingChange) {
	s.add("\n\"" + key + "\":[")
	for i, c := range all {
		if i > 0 {
			s.add(",")
		}
		s.add("\n")
		f := c.After
		if f == nil {
			f = c.Before
		}
		s.b = appendObject(s.b, report.FindingColumns, f)
		s.b = s.b[:len(s.b)-1] // open the object again
		s.before(c)
		s.add("}")
		s.flush(false)
	}
	s.add("\n]")
}

func (s *sink) before(c review.FindingChange) {
	switch {
	case c.Removed:
		s.add(",\"removed\":true")
	case c.Before != nil && c.After != nil:
		s.add(",\"before\":")
		s.b = appendObject(s.b, []report.Column[finding.Finding]{
			{Key: "message", Value: func(f *finding.Finding) report.Value { return report.T(f.Message) }},
			{Key: "value", Value: func(f *finding.Finding) report.Value { return report.M(f.Value) }},
			{Key: "limit", Value: func(f *finding.Finding) report.Value { return report.M(f.Limit) }},
		}, c.Before)
	}
}
