package data

import "rimfall/network/job"

// rainfall writes where the rainfall of a run is from; what is not known is left out.
func (s *sink) rainfall(j *job.Job) {
	rain, file := &j.Rain, j.Settings.Rainfall
	if rain.Equation() {
		file = job.File
	}
	s.add(",\n\"rainfall\":{\"file\":")
	s.b = appendString(s.b, file)
	for _, pair := range [][2]string{
		{"kind", rain.Kind},
		{"place", rain.Place},
		{"source", rain.Source},
		{"series", rain.SeriesWord()},
		{"unit", string(rain.Unit)},
		{"bound", rain.Bound.String()},
	} {
		if pair[1] != "" {
			s.add(",\"" + pair[0] + "\":")
			s.b = appendString(s.b, pair[1])
		}
	}
	s.add("}")
}
