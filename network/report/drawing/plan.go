package drawing

import (
	"errors"
	"fmt"
	"math"
	"slices"
	"strings"

	"rimfall/network"
	"rimfall/network/analysis"
)

// PlanOptions say how the plan is drawn.
type PlanOptions struct {
	Paper Paper   // the zero value: usual for the units
	Scale float64 // 40 for 1 in = 40 ft, 500 for 1:500; zero: chosen
}

// PlanNotes say what the plan does not show.
type PlanNotes struct {
	NoCoordinates []string // structures left out with all their pipes
	NoRoom        int      // labels for which there was no room
}

// ErrNoCoordinates says that there is no plan to draw.
var ErrNoCoordinates = errors.New("no structure has coordinates, so there is no plan to draw: give x and y in structures.csv")

// plan is the plan while it is drawn.
type plan struct {
	*sheet
	r        *run
	box      Box // of the drawing
	scale    scale
	origin   Point // plan coordinates of the upper left corner of the box
	least    float64
	greatest float64 // spans of the pipes
	marks    []mark
	place    *placer
	notes    PlanNotes
}

// Plan draws the plan of a run: x to the right, y upwards. The error is [ErrNoCoordinates] or a [NoScale].
func Plan(result *analysis.Result, o PlanOptions) (Sheet, PlanNotes, error) {
	r := newRun(result)
	if o.Paper.Name == "" {
		o.Paper, _ = PaperNamed("", r.units)
	}
	extent, ok := planExtent(r.Network)
	if !ok {
		return Sheet{}, PlanNotes{}, ErrNoCoordinates
	}
	p := &plan{sheet: newSheet(o.Paper, "Plan of "+r.Job.Settings.Title), r: r}
	p.marks = r.marks
	if err := p.fitIn(extent, o.Scale); err != nil {
		return Sheet{}, PlanNotes{}, err
	}
	p.spans()
	p.draw()
	return Sheet{"plan", p.Canvas}, p.notes, nil
}

// planExtent is the rectangle of all structures, x and y upwards; ok is false where none has coordinates.
func planExtent(n *network.Network) (extent Box, ok bool) {
	extent = Box{math.Inf(1), math.Inf(1), math.Inf(-1), math.Inf(-1)}
	for i := range n.Structures {
		if s := &n.Structures[i]; s.X.OK && s.Y.OK {
			extent, ok = extent.with(Point{s.X.V, s.Y.V}), true
		}
	}
	return extent, ok
}

// planMargin is kept around the structures for labels, mm; findingsWidth is that of the list of findings.
const planMargin, findingsWidth = 16.0, 92.0

// fitIn takes the scale that is asked for, or the largest customary one at which all structures fit, and puts them in the middle.
func (p *plan) fitIn(extent Box, fixed float64) error {
	p.box = p.body
	if len(p.marks) > 0 {
		p.box.Right -= findingsWidth
	}
	fits := func(s scale) bool {
		return extent.width()*s.mm <= p.box.width()-2*planMargin && extent.height()*s.mm <= p.box.height()-2*planMargin
	}
	if fixed > 0 {
		p.scale = newScale(p.r.units, fixed)
		if !fits(p.scale) {
			return NoScale{"the network does not fit on " + p.paper.Title + " at the scale that is asked for; take a smaller scale, that is a larger number, or larger paper"}
		}
	} else {
		all := scales(p.r.units, firstScale(p.r.units))
		i := slices.IndexFunc(all, fits)
		if i < 0 {
			return NoScale{"the coordinates of the structures lie too far apart for any drawing"}
		}
		p.scale = all[i]
	}
	p.origin = Point{
		(extent.Left+extent.Right)/2 - p.box.width()/2/p.scale.mm,
		(extent.Top+extent.Bottom)/2 + p.box.height()/2/p.scale.mm,
	}
	p.place = newPlacer(p.box.grown(-0.8))
	return nil
}

// at is the place of a structure on the sheet; ok is false where it has no coordinates.
func (p *plan) at(s network.StructureIndex) (Point, bool) {
	given := &p.r.Network.Structures[s]
	return Point{
		p.box.Left + (given.X.V-p.origin.X)*p.scale.mm,
		p.box.Top + (p.origin.Y-given.Y.V)*p.scale.mm,
	}, given.X.OK && given.Y.OK
}

// ends are the places of both ends of a pipe, in the direction of flow.
func (p *plan) ends(i network.PipeIndex) (from, to Point, ok bool) {
	pipe := &p.r.Network.Pipes[i]
	from, ok1 := p.at(pipe.From)
	to, ok2 := p.at(pipe.To)
	return from, to, ok1 && ok2 && from != to
}

// draw draws pipes under structures, then lets the labels find room: structures first, then pipes, then findings.
func (p *plan) draw() {
	for i := range p.r.Network.Pipes {
		p.pipe(network.PipeIndex(i))
	}
	for i := range p.r.Network.Structures {
		p.structure(network.StructureIndex(i))
	}
	p.structureNames()
	p.pipeNames()
	p.findingMarks()
	p.findingList()
	p.finish()
}

// finish writes legend, scale bar, notes and title.
func (p *plan) finish() {
	left := p.legendBox()
	bar := left
	left.Right -= 44
	bar.Left = left.Right
	p.legend(p.samples(), left)
	p.northAndScale(bar)
	var notes []string
	if k := len(p.notes.NoCoordinates); k > 0 {
		notes = append(notes, fmt.Sprintf("Left out, having no coordinates, with their pipes (%d): %s.", k, shortList(p.notes.NoCoordinates, 12)))
	}
	if k := p.notes.NoRoom; k > 0 {
		notes = append(notes, fmt.Sprintf("%d labels have no room at this scale; larger paper has more.", k))
	}
	notes = append(notes, "North is taken along the y axis of the coordinates. Structures are signs, not to scale.")
	p.titled(p.r, heading{
		title: "Plan",
		lines: []string{fmt.Sprintf("Scale on %s: %s; sizes of pipes in %s", p.paper.Title, p.scale.say(p.r.units), sizeUnitWord(p.r.units))},
		notes: notes,
		count: "sheet 1 of 1",
	})
}

// shortList joins the first words of a list.
func shortList(all []string, most int) string {
	if len(all) > most {
		return strings.Join(all[:most], ", ") + fmt.Sprintf(" and %d more", len(all)-most)
	}
	return strings.Join(all, ", ")
}

// northAndScale draws the arrow and the bar.
func (p *plan) northAndScale(box Box) {
	x := box.Left + 8
	p.Line(Point{x, box.Top + 21}, Point{x, box.Top + 9}, medium)
	p.Polygon([]Point{{x, box.Top + 7}, {x - 2.4, box.Top + 15}, {x, box.Top + 13}}, medium, Black)
	p.Polygon([]Point{{x, box.Top + 7}, {x + 2.4, box.Top + 15}, {x, box.Top + 13}}, medium, White)
	p.Text(Label{At: Point{x, box.Top + 5.6}, Size: 3.2, Anchor: Middle, Bold: true, Text: "N"})
	length := roundStep(6.5 / p.scale.mm) // 6.5 to 16 mm
	const height = 1.6
	left, top := box.Left+3, box.Bottom-5
	for i := range 2 {
		fill := Black
		if i == 1 {
			fill = White
		}
		from := left + float64(i)*length*p.scale.mm
		p.Rect(Box{from, top, from + length*p.scale.mm, top + height}, thin, fill)
	}
	for i := range 3 {
		text := fmt.Sprintf("%g", float64(i)*length)
		if i == 2 {
			text += " " + p.r.units.Length
		}
		p.Text(Label{At: Point{left + float64(i)*length*p.scale.mm, top - 0.8}, Size: smallType, Anchor: Middle, Text: text})
	}
}
