package text

import (
	"fmt"
	"io"
	"math"
	"strconv"

	"rimfall/hydrology"
	"rimfall/network/rain"
)

// Rain prints a rainfall file: its table, and the fits that were asked for.
func Rain(w io.Writer, s *rain.Source, markdown bool) error {
	p := &printer{w: w, markdown: markdown}
	p.heading([]string{"Rainfall", s.Describe()})
	p.table("Intensity, "+string(s.Unit)+", by duration and return period", rainGrid(s))
	if len(s.Notices) > 0 {
		p.title("Remarks on the file")
	}
	for _, n := range s.Notices {
		p.bullet(fmt.Sprintf("line %d: %s", n.Line, n.Text))
	}
	if len(s.Equations) > 0 {
		p.equations(s)
	}
	for i := range s.Distributions {
		d := &s.Distributions[i]
		p.table(fmt.Sprintf("Annual maxima, %s: depth in %s with its %g %% limits", d.Method, depthUnit(s.Unit), 100*rain.Confidence), distributionGrid(s, d))
	}
	return p.err
}

func depthUnit(u hydrology.IntensityUnit) string {
	if u == hydrology.InchesPerHour {
		return "in"
	}
	return "mm"
}

// rainDecimals: Atlas 14 prints thousandths of an inch, Environment Canada tenths of a millimetre; one more
// digit shows the quotient by the duration.
func rainDecimals(u hydrology.IntensityUnit) int {
	if u == hydrology.InchesPerHour {
		return 3
	}
	return 2
}

// shown prints an intensity, small ones of long durations with more decimals.
func shown(v float64, u hydrology.IntensityUnit) string {
	decimals := rainDecimals(u)
	if v > 0 && v < 0.1 {
		decimals += int(math.Ceil(-math.Log10(v))) - 1
	}
	return strconv.FormatFloat(v, 'f', decimals, 64)
}

func periodHeads(periods []float64) []string {
	var heads []string
	for _, y := range periods {
		unit := "years"
		if y == 1 {
			unit = "year"
		}
		heads = append(heads, fmt.Sprintf("%g\n%s", y, unit))
	}
	return heads
}

func rainGrid(s *rain.Source) grid {
	g := grid{head: append([]string{"duration\nmin"}, periodHeads(s.Table.Periods)...)}
	g.numbers = allNumbers(len(g.head))
	for row, d := range s.Table.Durations {
		cells := []string{strconv.FormatFloat(d, 'f', -1, 64)}
		for _, v := range s.Table.Values[row] {
			cells = append(cells, shown(v, s.Unit))
		}
		g.rows = append(g.rows, cells)
	}
	return g
}

func allNumbers(n int) []bool {
	all := make([]bool, n)
	for i := range all {
		all[i] = true
	}
	return all
}

// equations prints the constants of every form, then how far each is from the table.
func (p *printer) equations(s *rain.Source) {
	p.title(fmt.Sprintf("Equations by least squares of ln i; i in %s, t in min, T in years", s.Unit))
	for i := range s.Equations {
		e := &s.Equations[i]
		if e.Why != "" {
			p.bullet(e.Why)
			continue
		}
		p.bullet(fmt.Sprintf("%s: error %.1f %% in the mean square, %.1f %% at most", e.Form, 100*e.RootMeanSquare, 100*e.Largest))
		for _, c := range e.Equation.Constants {
			years := "every period"
			if c.Period > 0 {
				years = fmt.Sprintf("%g years", c.Period)
			}
			p.wrapped("  "+years+": ", c.String())
		}
	}
	p.table("Largest error at each duration, %, of all periods", errorGrid(s))
}

func errorGrid(s *rain.Source) grid {
	g := grid{head: []string{"duration\nmin"}}
	var fitted []*rain.Equation
	for i := range s.Equations {
		if e := &s.Equations[i]; e.Why == "" {
			fitted = append(fitted, e)
			g.head = append(g.head, e.Form.String())
		}
	}
	g.numbers = allNumbers(len(g.head))
	for row, d := range s.Table.Durations {
		cells := []string{strconv.FormatFloat(d, 'f', -1, 64)}
		for _, e := range fitted {
			cells = append(cells, signed(100*e.Worst(row)))
		}
		g.rows = append(g.rows, cells)
	}
	return g
}

// signed prints a percentage with its sign; nothing over is nothing under.
func signed(percent float64) string {
	if text := fmt.Sprintf("%+.1f", percent); text != "-0.0" && text != "+0.0" {
		return text
	}
	return "0.0"
}

// distributionGrid prints depths with their limits in brackets, and how well the distribution fits.
func distributionGrid(s *rain.Source, d *rain.Distribution) grid {
	g := grid{head: append([]string{"duration\nmin", "years\nof record"}, periodHeads(s.Periods)...)}
	g.head = append(g.head, "largest\ndistance", "correlation", "error\n"+depthUnit(s.Unit))
	g.numbers = allNumbers(len(g.head))
	decimals := rainDecimals(s.Unit) - 1
	for i := range d.Rows {
		r := &d.Rows[i]
		cells := []string{strconv.FormatFloat(r.Duration, 'f', -1, 64), strconv.Itoa(r.Years)}
		if r.Why != "" {
			g.rows = append(g.rows, append(cells, r.Why))
			continue
		}
		for _, l := range r.Depths {
			text := strconv.FormatFloat(l.Depth, 'f', decimals, 64)
			if l.HasLimits {
				text += fmt.Sprintf(" (%.*f–%.*f)", decimals, l.Lower, decimals, l.Upper)
			}
			cells = append(cells, text)
		}
		g.rows = append(g.rows, append(cells, fmt.Sprintf("%.3f", r.KolmogorovSmirnov), fmt.Sprintf("%.4f", r.Correlation), fmt.Sprintf("%.*f", decimals+1, r.RootMeanSquare)))
	}
	return g
}
