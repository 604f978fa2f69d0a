package drawing

import (
	"math"
	"strconv"
	"strings"

	"rimfall/network"
	"rimfall/network/finding"
)

// mark is a number beside a structure or pipe that findings are about.
type mark struct {
	number    int
	subject   string
	breaks    bool // one of the findings is an error that no departure accepts
	findings  []*finding.Finding
	structure network.StructureIndex
	pipe      network.PipeIndex
	isPipe    bool
}

// marksOf numbers the structures and pipes with errors and warnings, structures first, in the order of the files. What is
// found of an area is marked at the structure to which it drains. Notices and accepted departures have no mark.
func marksOf(r *run) []mark {
	bySubject := map[string][]*finding.Finding{}
	for i := range r.Findings {
		if f := &r.Findings[i]; f.Accepted == "" && f.Rule.Severity != finding.Notice {
			bySubject[f.Subject] = append(bySubject[f.Subject], f)
		}
	}
	var marks []mark
	add := func(m mark) {
		if len(m.findings) > 0 {
			m.number = len(marks) + 1
			marks = append(marks, m)
		}
	}
	n := r.Network
	for i := range n.Structures {
		s := network.StructureIndex(i)
		m := mark{structure: s, subject: n.Structures[i].ID}
		m.take(bySubject[m.subject], (*finding.Finding).AboutStructure)
		for _, a := range n.AreasAt(s) {
			m.take(bySubject[n.Areas[a].ID], (*finding.Finding).AboutArea)
		}
		add(m)
	}
	for i := range n.Pipes {
		m := mark{pipe: network.PipeIndex(i), isPipe: true, subject: n.Pipes[i].ID}
		m.take(bySubject[m.subject], (*finding.Finding).AboutPipe)
		add(m)
	}
	return marks
}

// take adds the findings that are about its kind of thing; another kind may have the same id.
func (m *mark) take(found []*finding.Finding, about func(*finding.Finding) bool) {
	for _, f := range found {
		if about(f) {
			m.findings = append(m.findings, f)
			m.breaks = m.breaks || f.Breaks()
		}
	}
}

// names is the subject with the names of the rules, and the storm where it is not the design storm.
func (m *mark) names(r *run) string {
	var names []string
	for _, f := range m.findings {
		name := f.Rule.Name
		if f.AboutArea() {
			name += " of area " + f.Subject
		}
		if f.Storm != r.Design.Storm.ReturnPeriod {
			name += " (" + strconv.FormatFloat(f.Storm, 'g', -1, 64) + " years)"
		}
		names = append(names, name)
	}
	return m.subject + ": " + strings.Join(names, ", ")
}

const markRadius = 1.75

// findingMarks places the numbers.
func (p *plan) findingMarks() {
	for i := range p.marks {
		m := &p.marks[i]
		at, ok := p.at(m.structure)
		radius := symbolSize
		if m.isPipe {
			var from, to Point
			from, to, ok = p.ends(m.pipe)
			at, radius = Point{(from.X + to.X) / 2, (from.Y + to.Y) / 2}, 0.6
		}
		if !ok {
			continue
		}
		chosen, ok := p.place.choose(markSpots(at, radius))
		if !ok {
			p.notes.NoRoom++
			continue
		}
		b := chosen.room[0]
		if chosen.leader {
			p.Line(chosen.from(), chosen.at, leader)
		}
		p.drawMark(Point{(b.Left + b.Right) / 2, (b.Top + b.Bottom) / 2}, m.number, m.breaks)
	}
}

// markSpots are places for a number around a point.
func markSpots(at Point, radius float64) []spot {
	var spots []spot
	for out := 0.5; out < 15; out = out*1.35 + 1 {
		for d := range 16 {
			sin, cos := math.Sincos(-math.Pi/4 + 2*math.Pi*float64(d)/16)
			c := Point{at.X + (radius+out+markRadius)*cos, at.Y + (radius+out+markRadius)*sin}
			spots = append(spots, spot{
				room:   []Box{Box{c.X, c.Y, c.X, c.Y}.grown(markRadius)},
				leader: out > 0.5, at: Point{at.X + radius*cos, at.Y + radius*sin},
			})
		}
	}
	return spots
}

// drawMark draws a number in a ring: white on black for errors.
func (s *sheet) drawMark(at Point, n int, breaks bool) {
	fill := White
	if breaks {
		fill = Black
	}
	s.Ellipse(at, markRadius, markRadius, medium, fill)
	size := 2.2
	if n > 99 {
		size = 1.8
	}
	s.Text(Label{At: Point{at.X, at.Y + 0.36*size}, Size: size, Anchor: Middle, Bold: true, White: breaks, Text: strconv.Itoa(n)})
}
