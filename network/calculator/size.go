package calculator

import (
	"cmp"
	"fmt"
	"math"
	"slices"

	"rimfall/network"
	"rimfall/pipeflow"
	"rimfall/pipeflow/catalog"
)

// findSize finds the smallest listed size of the shape that carries the flow at no
// more than the given depth (or has the velocity at it), and the exact size in the
// proportions of the listed one.
func (a *Answer) findSize() error {
	if err := a.judgeSizeQuestion(); err != nil {
		return err
	}
	rows := a.candidates()
	if len(rows) == 0 {
		return refuse(fmt.Sprintf("no %s of %s is listed, so there are no sizes to choose from", a.Conduit.Shape, a.Conduit.Material),
			"give the size, or another material; `rimfall sizes` prints what is listed")
	}
	chosen, listed := a.smallest(rows)
	scale, err := a.exactScale(chosen)
	if err != nil {
		return err
	}
	a.Exact = Exact{Size: network.Size{Span: chosen.Span * scale, Rise: chosen.Rise * scale}, Listed: listed}
	if listed {
		a.Exact.Source = chosen.Standard + ", " + chosen.Series
	} else {
		chosen = scaled(chosen, scale)
	}
	s, err := chosen.Section()
	if err != nil {
		return err
	}
	a.Conduit.Size, a.Conduit.Haunch = network.Size{Span: chosen.Span, Rise: chosen.Rise}, chosen.Haunch
	a.setSection(s)
	return a.stateInSize(listed)
}

// judgeSizeQuestion takes the depth as full where it is left open.
func (a *Answer) judgeSizeQuestion() error {
	d := &a.Question.Depth
	switch {
	case !d.OK && a.Question.Flow.OK && a.Velocity.OK:
		return refuse("a size is not sought from flow and velocity alone, since any depth ratio answers", "give the depth too, such as 0.8D or full, and leave out the flow or the velocity")
	case !d.OK:
		*d, a.fullDepth = Full, true
	case d.OfRise && d.V > 1:
		return refuse("depth "+d.Written+" is over the rise", "give at most 1D, or full")
	case !d.OfRise && a.Velocity.OK:
		return refuse("the size for a velocity is sought at a share of the rise, not at a depth", "write the depth as 0.8D or full")
	}
	return nil
}

// candidates are the listed sizes of shape and material by full area, the order in which
// a job's sizes are chosen too.
func (a *Answer) candidates() []catalog.Size {
	rows := catalog.ForMaterial(a.Units.Name, a.Conduit.Material, catalog.Shape(a.Conduit.Shape))
	area := func(row catalog.Size) float64 {
		s, err := row.Section()
		if err != nil {
			return math.Inf(1)
		}
		return s.At(s.Rise()).Area
	}
	slices.SortStableFunc(rows, func(x, y catalog.Size) int { return cmp.Compare(area(x), area(y)) })
	return rows
}

// smallest is the first row that answers; where none does, the largest row.
func (a *Answer) smallest(rows []catalog.Size) (chosen catalog.Size, listed bool) {
	for _, row := range rows {
		s, err := row.Section()
		if err != nil {
			continue
		}
		u := a.uniformIn(s, a.N, a.Slope)
		limit := a.limitIn(s)
		if a.Velocity.OK && u.velocity(limit) >= a.Velocity.V*(1-sameLength) ||
			a.Question.Flow.OK && u.flow(limit) >= a.Question.Flow.V*(1-sameLength) {
			return row, true
		}
	}
	return rows[len(rows)-1], false
}

// limitIn is the depth that the flow may reach in a section.
func (a *Answer) limitIn(s pipeflow.Section) float64 {
	if d := a.Question.Depth; !d.OfRise {
		return min(d.V, s.Rise())
	}
	return a.Question.Depth.V * s.Rise()
}

// exactScale is by how much all lengths of a row are multiplied so that it answers to
// the digit.
func (a *Answer) exactScale(row catalog.Size) (float64, error) {
	s, err := row.Section()
	if err != nil {
		return 0, err
	}
	u := a.uniformIn(s, a.N, a.Slope)
	d := a.Question.Depth
	if !d.OfRise {
		if scale, ok := a.scaleAtDepth(row, s); ok {
			return scale, nil
		}
		d = Full // the exact size is less high than the depth that is allowed, and runs full
	}
	m := u.at(d.V * s.Rise())
	scale, ok := m.ScaleFor(s, d.V, a.Question.Flow.V)
	if a.Velocity.OK {
		scale, ok = m.ScaleForVelocity(s, d.V, a.Velocity.V)
	}
	if !ok {
		return 0, refuse("no size answers", "give another flow, slope or depth")
	}
	return scale, nil
}

// scaleAtDepth is the scale at which a row runs at a depth of its own, in ft or m:
// the wider the section, the more it carries at that depth.
func (a *Answer) scaleAtDepth(row catalog.Size, s pipeflow.Section) (scale float64, ok bool) {
	depth := a.Question.Depth.V
	m := a.uniformIn(s, a.N, a.Slope).manning
	least := depth / s.Rise() // full at that depth
	return m.LengthFor(a.Question.Flow.V, least, math.Inf(1), func(k float64) (pipeflow.Section, float64, error) {
		larger, err := scaled(row, k).Section()
		return larger, depth, err
	})
}

// scaled is a row with all its lengths multiplied.
func scaled(row catalog.Size, by float64) catalog.Size {
	for _, length := range []*float64{&row.Span, &row.Rise, &row.Haunch, &row.BottomRadius, &row.TopRadius, &row.CornerRadius} {
		*length *= by
	}
	return row
}

// stateInSize is how the flow runs in the size that was taken: at its normal depth,
// or for a velocity at the given share of the rise.
func (a *Answer) stateInSize(listed bool) error {
	if a.Velocity.OK {
		return a.findFlow()
	}
	if !listed && a.Question.Depth.OfRise { // it runs at the given depth by definition
		a.First = a.state(a.limitIn(a.Section), a.Question.Flow.V)
		return nil
	}
	return a.findDepth()
}

// nextSize is the smallest listed size that carries the flow full at the slope.
func (a *Answer) nextSize() (catalog.Size, bool) {
	rows := a.candidates()
	if len(rows) == 0 {
		return catalog.Size{}, false
	}
	full := *a
	full.Question.Depth = Full
	return full.smallest(rows)
}
