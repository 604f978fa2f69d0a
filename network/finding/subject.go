package finding

import "slices"

// structureRules are the rules whose findings are about structures, areaRules those about areas, otherRules those about
// the rainfall or a row of departures.csv; all others are about pipes. A pipe and a structure may share an id, so the id
// alone does not tell.
var (
	structureRules = []string{"flooding", "freeboard", "rim-unknown", "unused-outfall"}
	areaRules      = []string{"time-assumed", "path-limit", "path-below-first-duration", "path-unused"}
	otherRules     = []string{"departure-unused", "storm-between-columns", "rainfall-converted", "rainfall-remark"}
)

// AboutStructure tells whether the subject is the id of a structure.
func (f *Finding) AboutStructure() bool { return slices.Contains(structureRules, f.Rule.Name) }

// AboutArea tells whether the subject is the id of an area.
func (f *Finding) AboutArea() bool { return slices.Contains(areaRules, f.Rule.Name) }

// AboutPipe tells whether the subject is the id of a pipe.
func (f *Finding) AboutPipe() bool {
	return !f.AboutStructure() && !f.AboutArea() && !slices.Contains(otherRules, f.Rule.Name)
}
