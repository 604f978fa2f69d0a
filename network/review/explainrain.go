package review

import (
	"fmt"
	"slices"

	"rimfall/hydrology"
	"rimfall/network"
)

// rain is the intensity at the time of a structure: between two durations of the table a
// straight line in the logarithms of both.
func (s *sheet) rain(at network.StructureIndex) {
	run := &s.Design.Flows.Structures[at]
	if !run.Rained() {
		s.set("i", run.Intensity, s.units.Intensity)
		return
	}
	s.rainAt(run.Time, run.Intensity)
}

// rainAt writes how an intensity at a time came about; the time has the symbol t.
func (s *sheet) rainAt(t, intensity float64) {
	s.part(fmt.Sprintf("Rainfall of %g years", s.storm.ReturnPeriod))
	storm, ok := s.Job.Curve(s.storm.ReturnPeriod)
	if uplifted, is := storm.(hydrology.Uplifted); is {
		storm = uplifted.Storm
	}
	switch storm := storm.(type) {
	case hydrology.Curve:
		if ok {
			s.tableAt(storm.Durations(), t, intensity)
			return
		}
	case hydrology.EquationStorm:
		if law, within := storm.Law(t); ok && within {
			s.equationAt(&law, t, intensity)
			return
		}
	}
	s.given("i", "intensity at that time", intensity, s.units.Intensity, s.Job.Rain.File)
}

// tableAt is the intensity of a table: between two durations a straight line in the
// logarithms of both.
func (s *sheet) tableAt(durations []float64, t, intensity float64) {
	k := 0 // the last duration that is not over t
	for k+1 < len(durations) && durations[k+1] <= t {
		k++
	}
	s.periods()
	s.tabulated("1", k)
	switch {
	case t < durations[0]:
		s.remark("The time is shorter than the first duration, whose intensity holds.")
		s.found("i", "intensity", "i_1", intensity, s.units.Intensity, "")
	case t == durations[k]:
		s.found("i", "intensity", "i_1", intensity, s.units.Intensity, "")
	default:
		s.tabulated("2", k+1)
		s.computed("m", "slope between them in logarithms", "ln(i_2/i_1)/ln(t_2/t_1)", "", fromLogLog)
		s.found("i", "intensity", "i_1 × (t/t_1)^m", intensity, s.units.Intensity, fromLogLog)
	}
}

// periods is the share of a return period between two columns of the table, on the scale of
// its series; nothing where it has a column of its own.
func (s *sheet) periods() {
	lower, upper, between := s.Job.Between(s.storm.ReturnPeriod)
	if !between {
		return
	}
	scale, source := "ln(T_%s)", "partial-duration series: linear in ln T"
	if s.Job.Rain.Series == hydrology.AnnualMaximum {
		scale, source = "−ln(−ln(1 − 1/T_%s))", "annual maxima: Gumbel's variate"
	}
	for _, p := range []struct {
		index, name string
		years       float64
	}{{"d", "return period, years", s.storm.ReturnPeriod}, {"a", "the column below it", lower}, {"b", "the column above it", upper}} {
		s.given("T_"+p.index, p.name, p.years, "", s.Job.Rain.File)
		s.computed("Y_"+p.index, "on the scale of the series", fmt.Sprintf(scale, p.index), "", source)
	}
	s.computed("s", "share of the way from column to column", "(Y_d − Y_a)/(Y_b − Y_a)", "", source)
}

// tabulated writes a duration of the table and the intensity there, of the row k: of its
// column, or between two columns; and with the uplift.
func (s *sheet) tabulated(index string, k int) {
	table, file, unit := s.Job.Rain.Table, s.Job.Rain.File, s.units.Intensity
	s.given("t_"+index, "duration", table.Durations[k], "min", file)
	name, symbol := "intensity there", "i_"+index
	if s.storm.Uplift != 1 {
		symbol = "r_" + index
	}
	lower, upper, between := s.Job.Between(s.storm.ReturnPeriod)
	if between {
		a, b := slices.Index(table.Periods, lower), slices.Index(table.Periods, upper)
		s.given("a_"+index, fmt.Sprintf("intensity of %g years", lower), table.Values[k][a], unit, file)
		s.given("b_"+index, fmt.Sprintf("intensity of %g years", upper), table.Values[k][b], unit, file)
		s.computed(symbol, "between the columns", "a_"+index+" + s × (b_"+index+" − a_"+index+")", unit, "linear on that scale")
	} else {
		s.given(symbol, name, table.Values[k][slices.Index(table.Periods, s.storm.ReturnPeriod)], unit, file)
	}
	if s.storm.Uplift != 1 {
		s.set("u", s.storm.Uplift, "")
		s.computed("i_"+index, "with uplift", "u × r_"+index, unit, "uplift")
	}
}

// equationAt is the intensity of an equation, the return period put in.
func (s *sheet) equationAt(law *hydrology.Law, t, intensity float64) {
	if law.Minutes > t {
		s.remark("The time is shorter than the shortest that the equation is for, whose intensity holds.")
		s.given("t", "shortest time of the equation", law.Minutes, "min", s.Job.Rain.File)
	}
	x := "t"
	if law.PerMinute != 1 {
		s.set("p", 1/law.PerMinute, "")
		x = "t/p"
	}
	text := ""
	for k, term := range law.Terms {
		i := fmt.Sprint(k + 1)
		s.given("a_"+i, "numerator of this storm", term.Numerator, "", s.Job.Rain.File)
		s.given("d_"+i, "shift", term.Shift, "", s.Job.Rain.File)
		s.given("e_"+i, "exponent", term.Exponent, "", s.Job.Rain.File)
		if k > 0 {
			text += " + "
		}
		text += "a_" + i + "/(" + x + " + d_" + i + ")^e_" + i
	}
	if len(law.Terms) == 0 {
		for k, c := range law.Cubic {
			s.given(fmt.Sprintf("c_%d", k), "constant of the cubic", c, "", s.Job.Rain.File)
		}
		s.computed("x", "logarithm of the time", "ln("+x+")", "", "")
		text = "exp(c_0 + c_1 × x + c_2 × x^2 + c_3 × x^3)"
	}
	if scale := law.Scale * s.storm.Uplift; scale != 1 {
		s.given("u", "uplift and change of unit", scale, "", "uplift")
		text = "u × (" + text + ")"
	}
	s.found("i", "intensity", text, intensity, s.units.Intensity, s.Job.Rain.Source)
}
