package analysis

import (
	"rimfall/network/grade"
	"rimfall/network/job"
)

// GradeSettings are the settings of a job for its grade lines, for those who run its storms themselves.
func GradeSettings(j *job.Job) grade.Settings { return gradeSettings(j) }
