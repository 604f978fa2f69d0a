package calculator

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/pipeflow"
)

// Rating is the table of a section: what it holds and carries at each depth.
type Rating struct {
	Question Question
	Section  pipeflow.Section
	Rows     []RatingRow
	Notes    []string
}

// RatingRow is one depth. Flow and velocity are there where n and slope are given;
// ratios to the full section where it has a roof, those of flow and velocity for any n
// and slope.
type RatingRow struct {
	Depth float64
	pipeflow.Geometry
	Radius         float64
	Flow, Velocity network.Maybe

	DepthRatio, AreaRatio, RadiusRatio, VelocityRatio, FlowRatio network.Maybe
}

// ratingParts is into how many steps a depth without a list is cut.
const ratingParts = 20

// Rate makes the table of a section at the depths of the questions; where none is given
// at every twentieth of the rise.
func Rate(s Series) (*Rating, error) {
	q := s.Questions[0]
	if err := q.mayRate(s.Listed); err != nil {
		return nil, err
	}
	section, err := q.Conduit.section(q.Units)
	if err != nil {
		return nil, err
	}
	depths, err := ratedDepths(s, section)
	if err != nil {
		return nil, err
	}
	r := &Rating{Question: q, Section: section}
	u := q.uniformIn(section, q.N.Or(1), q.Slope.Or(1)) // any n and slope serve for ratios
	known := (q.N.OK || q.Conduit.roughEverywhere()) && q.Slope.OK
	for _, depth := range depths {
		r.Rows = append(r.Rows, rate(u, depth, known))
	}
	r.note(u, known)
	return r, nil
}

// mayRate refuses what a table cannot take.
func (q *Question) mayRate(listed string) error {
	if err := q.judge(); err != nil {
		return err
	}
	if open := q.Conduit.missing(); len(open) > 0 {
		return refuse("a table needs the section: "+list(open, "and")+" not given", "give it")
	}
	if q.Flow.OK || q.Velocity.OK {
		return refuse("a table is of depths: flow and velocity come out of it", "leave out flow and velocity, or leave out table")
	}
	if listed != "" && listed != Depth {
		return refuse("a table is of one section: a list of "+listed+" does not go with it", "give one value, or leave out table")
	}
	if open := q.Conduit.Shape == Ground && q.Conduit.roughSomewhere() && !q.Conduit.roughEverywhere() && !q.N.OK; open {
		return refuse("some stretches of the ground line have no n", "give n for them")
	}
	return nil
}

// ratedDepths are the depths of the rows.
func ratedDepths(s Series, section pipeflow.Section) ([]float64, error) {
	a := Answer{Question: s.Questions[0], Conduit: s.Questions[0].Conduit, Section: section}
	most := section.Rise()
	if s.Listed == "" && a.Depth.OK {
		depth, err := a.depthIn(section)
		if err != nil {
			return nil, err
		}
		most = depth
	}
	var depths []float64
	if s.Listed == "" {
		if math.IsInf(most, 1) {
			return nil, refuse("an open channel has no end to its depth", "give the depth to which the table goes, or a list such as 0.5:4:0.5")
		}
		for i := range ratingParts {
			depths = append(depths, most*float64(i+1)/ratingParts)
		}
		return depths, nil
	}
	for _, q := range s.Questions {
		if err := q.judge(); err != nil {
			return nil, err
		}
		a.Question.Depth = q.Depth
		depth, err := a.depthIn(section)
		if err != nil {
			return nil, err
		}
		depths = append(depths, depth)
	}
	return depths, nil
}

func rate(u uniform, depth float64, known bool) RatingRow {
	wet := u.section.At(depth)
	row := RatingRow{Depth: depth, Geometry: wet, Radius: wet.HydraulicRadius()}
	if known {
		row.Flow, row.Velocity = network.Some(u.flow(depth)), network.Some(u.velocity(depth))
	}
	if !u.section.Closed() {
		return row
	}
	rise := u.section.Rise()
	full := u.section.At(rise)
	row.DepthRatio = network.Some(depth / rise)
	row.AreaRatio = network.Some(wet.Area / full.Area)
	row.RadiusRatio = network.Some(row.Radius / full.HydraulicRadius())
	row.VelocityRatio = network.Some(u.velocity(depth) / u.velocity(rise))
	row.FlowRatio = network.Some(u.flow(depth) / u.flow(rise))
	return row
}

// note says where the most is carried.
func (r *Rating) note(u uniform, known bool) {
	if most, at, ok := u.largest(); ok {
		rise := r.Section.Rise()
		where := fmt.Sprintf("at depth %s (%s of the rise)", Length.With(r.Question.Units, at), figure(at/rise))
		if at == rise {
			where = "just below the roof, which takes away when it is wetted"
		}
		text := fmt.Sprintf("Largest discharge: %s of the full-bore capacity, %s.", figure(most/u.flow(rise)), where)
		if known {
			text = fmt.Sprintf("Largest discharge: %s, %s of the full-bore capacity, %s.", Discharge.With(r.Question.Units, most), figure(most/u.flow(rise)), where)
		}
		r.Notes = append(r.Notes, text)
	}
	if r.Question.VaryingN {
		r.Notes = append(r.Notes, "n varies with depth (Camp 1946, from memory; the curve is of circular pipes).")
	}
	if !known && r.Section.Closed() {
		r.Notes = append(r.Notes, "The ratios hold for any n and slope; give both for flows and velocities.")
	}
}
