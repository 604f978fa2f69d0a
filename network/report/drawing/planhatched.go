package drawing

import (
	"fmt"
	"math"

	"rimfall/network"
	"rimfall/network/analysis"
)

// Hatching is what a hatched plan shows: a class for every pipe, hatched the closer the weaker it is.
type Hatching struct {
	Title   string   // of the sheet
	Lines   []string // under it
	Classes []string // in words, the weakest first; the last one is not hatched
	Class   []int    // of every pipe, by index; −1: it has none
}

// hatchSteps are the distances of the strokes of the classes, mm: each nearly twice that of the one before, so that
// they are told apart on a copy too.
var hatchSteps = []float64{0.55, 1, 1.8, 3.2, 5.8}

// MostClasses is how many classes a hatching may have, the one without strokes included.
const MostClasses = 6

// hatchReach is how far a stroke reaches to either side of a pipe, mm.
const hatchReach = 1.5

// HatchedPlan draws the plan of a run with its pipes hatched by class. There are no findings on it. The error is
// [ErrNoCoordinates] or a [NoScale].
func HatchedPlan(result *analysis.Result, h Hatching, o PlanOptions) (Sheet, PlanNotes, error) {
	r := newRun(result)
	if o.Paper.Name == "" {
		o.Paper, _ = PaperNamed("", r.units)
	}
	extent, ok := planExtent(r.Network)
	if !ok {
		return Sheet{}, PlanNotes{}, ErrNoCoordinates
	}
	p := &plan{sheet: newSheet(o.Paper, h.Title+" of "+r.Job.Settings.Title), r: r}
	if err := p.fitIn(extent, o.Scale); err != nil {
		return Sheet{}, PlanNotes{}, err
	}
	p.spans()
	for i, class := range h.Class {
		p.hatchPipe(network.PipeIndex(i), h.step(class))
	}
	for i := range r.Network.Pipes {
		p.pipe(network.PipeIndex(i))
	}
	for i := range r.Network.Structures {
		p.structure(network.StructureIndex(i))
	}
	p.structureNames()
	p.pipeNames()
	p.finishHatched(&h)
	return Sheet{"carries", p.Canvas}, p.notes, nil
}

// step is the distance of the strokes of a class; 0: no strokes.
func (h *Hatching) step(class int) float64 {
	if class < 0 || class >= len(h.Classes)-1 {
		return 0
	}
	return hatchSteps[min(class, len(hatchSteps)-1)]
}

// hatchPipe hatches one pipe and keeps labels off its strokes.
func (p *plan) hatchPipe(i network.PipeIndex, step float64) {
	from, to, ok := p.ends(i)
	if !ok || step == 0 {
		return
	}
	p.strokes(from, to, step)
	p.place.takeLine(from, to, 2*hatchReach)
}

// strokes draws strokes at 45 degrees across a line, the first half a step from its end.
func (s *sheet) strokes(from, to Point, step float64) {
	length := math.Hypot(to.X-from.X, to.Y-from.Y)
	ux, uy := (to.X-from.X)/length, (to.Y-from.Y)/length
	dx, dy := hatchReach*(ux-uy)/math.Sqrt2, hatchReach*(uy+ux)/math.Sqrt2
	count := max(1, int(length/step))
	for k := range count {
		along := (float64(k) + 0.5) * length / float64(count)
		at := Point{from.X + ux*along, from.Y + uy*along}
		s.Line(Point{at.X - dx, at.Y - dy}, Point{at.X + dx, at.Y + dy}, thin)
	}
}

// finishHatched writes legend, scale bar, notes and title.
func (p *plan) finishHatched(h *Hatching) {
	left := p.legendBox()
	bar := left
	left.Right -= 44
	bar.Left = left.Right
	p.legend(p.hatchSamples(h), left)
	p.northAndScale(bar)
	notes := []string{}
	if k := len(p.notes.NoCoordinates); k > 0 {
		notes = append(notes, fmt.Sprintf("Left out, having no coordinates, with their pipes (%d): %s.", k, shortList(p.notes.NoCoordinates, 12)))
	}
	if k := p.notes.NoRoom; k > 0 {
		notes = append(notes, fmt.Sprintf("%d labels have no room at this scale; larger paper has more.", k))
	}
	notes = append(notes, "North is taken along the y axis of the coordinates. Structures are signs, not to scale.")
	p.titled(p.r, heading{
		title: h.Title,
		lines: append([]string{fmt.Sprintf("Scale on %s: %s; sizes of pipes in %s", p.paper.Title, p.scale.say(p.r.units), sizeUnitWord(p.r.units))}, h.Lines...),
		notes: notes,
		count: "sheet 1 of 1",
	})
}

// hatchSamples is the legend: the classes, then existing pipes and the kinds of structure.
func (p *plan) hatchSamples(h *Hatching) []sample {
	var list []sample
	for class, words := range h.Classes {
		list = append(list, sample{func(b Box) {
			from, to := Point{b.Left + 1, (b.Top + b.Bottom) / 2}, Point{b.Right - 1, (b.Top + b.Bottom) / 2}
			if step := h.step(class); step > 0 {
				p.strokes(from, to, step)
			}
			p.Line(from, to, Pen{Width: 0.6})
		}, words})
	}
	list = append(list, p.penSample(Pen{Width: 0.5, Dashes: []float64{2.4, 1}}, "existing pipe"))
	for _, k := range [...]network.Kind{network.Manhole, network.Inlet, network.BlindJunction, network.Outfall} {
		list = append(list, sample{func(b Box) {
			p.symbol(Point{(b.Left + b.Right) / 2, (b.Top + b.Bottom) / 2}, k, 0)
		}, kindText(k)})
	}
	return list
}
