package finding

import "slices"

// structureRules are the rules whose findings are about structures, areaRules those about areas. The others are about
// pipes, and a departure that matches nothing is about a row of its file. A pipe and a structure may share an id, so the
// id alone does not tell.
var (
	structureRules = []string{"flooding", "freeboard", "rim-unknown", "unused-outfall"}
	areaRules      = []string{"time-assumed"}
	otherRules     = []string{"departure-unused"}
)

// AboutStructure tells whether the subject is the id of a structure.
func (f *Finding) AboutStructure() bool { return slices.Contains(structureRules, f.Rule.Name) }

// AboutPipe tells whether the subject is the id of a pipe.
func (f *Finding) AboutPipe() bool {
	return !f.AboutStructure() && !slices.Contains(areaRules, f.Rule.Name) && !slices.Contains(otherRules, f.Rule.Name)
}
