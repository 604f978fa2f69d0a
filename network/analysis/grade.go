package analysis

import (
	"slices"

	"rimfall/network/grade"
	"rimfall/network/job"
)

// gradeSettings are the settings of a job for its grade lines, with the Manning factor of its storm.
func gradeSettings(j *job.Job) grade.Settings {
	s := &j.Settings
	return grade.Settings{
		Method:  grade.Method(max(0, slices.Index(grade.Methods, s.Grade.StructureLoss))),
		Start:   grade.Start(max(0, slices.Index(grade.Starts, s.Grade.OutfallStart))),
		Gravity: s.Units.Gravity,
		Manning: s.Storm.ManningFactor,
	}
}
