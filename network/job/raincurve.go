package job

import (
	"fmt"
	"slices"
	"strconv"
	"strings"

	"rimfall/hydrology"
	"rimfall/hydrology/rainfile"
)

// Curve is the intensity of the storm of a return period, uplift included: of a
// column of the table, between two of them on the scale of its series, or of an
// equation. ok is false where the rainfall has no such storm.
func (j *Job) Curve(period float64) (storm hydrology.Intensity, ok bool) {
	storm, err := j.storm(period)
	if err != nil {
		return nil, false
	}
	return uplifted(storm, j.Settings.Storm.Uplift), true
}

// uplifted is a storm times a factor; a table keeps its form, in which it is read fastest.
func uplifted(storm hydrology.Intensity, factor float64) hydrology.Intensity {
	if factor == 1 {
		return storm
	}
	if c, ok := storm.(hydrology.Curve); ok {
		return c.Scaled(factor)
	}
	return hydrology.Uplifted{Storm: storm, Factor: factor}
}

// storm is the storm of a return period before uplift. The error says which there are.
func (j *Job) storm(period float64) (hydrology.Intensity, error) {
	if j.Rain.Equation() {
		return stormOf(j.Rain.equations, period, hydrology.IntensityUnit(j.Settings.Units.Intensity))
	}
	curve, ok := j.Rain.Table.CurveBetween(period, j.Rain.Series)
	if !ok {
		return nil, fmt.Errorf("no storm of %g years in %s; there are %s", period, j.Rain.File, j.Rain.periods())
	}
	return curve, nil
}

// periods words the return periods of a table.
func (rain *Rain) periods() string {
	var have []string
	for _, p := range rain.Table.Periods {
		have = append(have, strconv.FormatFloat(p, 'g', -1, 64))
	}
	return strings.Join(have, ", ") + " years"
}

// NoSuchPeriod words that the rainfall has no storm of a return period, and
// which it has.
func (j *Job) NoSuchPeriod(period float64) string {
	if _, err := j.storm(period); err != nil {
		return err.Error()
	}
	return ""
}

// Between gives the columns between which a return period is interpolated; ok is
// false where it has a column of its own, or the rainfall is an equation.
func (j *Job) Between(period float64) (lower, upper float64, ok bool) {
	periods := j.Rain.Table.Periods
	i, own := slices.BinarySearch(periods, period)
	if own || i == 0 || i == len(periods) {
		return 0, 0, false
	}
	return periods[i-1], periods[i], true
}

// judgePeriods holds the return periods of job.toml against the rainfall.
func (r *reader) judgePeriods(j *Job) {
	if len(j.Rain.Table.Periods) == 0 && !j.Rain.Equation() {
		return // a fault already
	}
	s := &j.Settings.Storm
	for _, p := range []struct {
		key   string
		years float64
	}{{"storm.return_period", s.ReturnPeriod}, {"storm.check_period", s.CheckPeriod.V}} {
		if p.years <= 0 {
			continue
		}
		if _, err := j.storm(p.years); err != nil {
			j.settings.fault(&r.faults, p.key, "%s", err)
		}
	}
}

// TwoYearDay is the 2-year 24-hour depth of the rainfall, in or mm and without
// uplift, else that of the settings. from says which; ok is false where there is neither.
func (j *Job) TwoYearDay() (depth float64, from string, ok bool) {
	const twoYears = 2
	if storm, err := j.storm(twoYears); err == nil {
		if i, where := storm.At(hydrology.MinutesPerDay); where == hydrology.Within {
			return i * hydrology.MinutesPerDay / 60, "the rainfall", true
		}
	}
	given := j.Settings.Rain.TwoYearDay
	return given.V, "two_year_day_depth", given.OK
}

// Describe says in one line where the rainfall is from; "" for a plain table of
// which there is nothing to say.
func (rain *Rain) Describe() string {
	var parts []string
	add := func(text string) {
		if text != "" {
			parts = append(parts, text)
		}
	}
	add(rain.Place)
	if rain.Kind != "table" {
		add(rain.Kind)
		add(rain.Source)
	}
	if !rain.Equation() && (rain.Kind != "table" || rain.Series != hydrology.PartialDuration) {
		add(rain.Series.String() + " series")
	}
	if rain.Kind != "table" {
		unit := string(rain.Unit)
		if rain.Converted {
			unit += ", converted"
		}
		add(unit)
	}
	switch {
	case rain.Bound == rainfile.Estimate:
	case rain.Confidence > 0:
		add(fmt.Sprintf("%s bound of the %g %% interval", rain.Bound, 100*rain.Confidence))
	default:
		add(rain.Bound.String() + " bound")
	}
	return strings.Join(parts, " · ")
}
