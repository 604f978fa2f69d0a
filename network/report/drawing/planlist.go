package drawing

import (
	"fmt"
)

// entry is one number of the list of findings with its lines.
type entry struct {
	mark  *mark
	lines []string
	gap   float64 // under it
}

// The list of findings: room to the left of its text, and the heights of its lines, mm.
const (
	listIndent = 7.0
	listStep   = 3.2
	listGap    = 0.9
	closeGap   = 0.25 // where the list is long
)

// findingList writes what the numbers mean: in full where there is room for all, else the names of the rules, as many as
// there is room for.
func (p *plan) findingList() {
	if len(p.marks) == 0 {
		return
	}
	left := p.box.Right
	p.Line(Point{left, p.body.Top}, Point{left, p.body.Bottom}, medium)
	p.Text(Label{At: Point{left + 2.5, p.body.Top + 5.5}, Size: 3.2, Bold: true, Text: "Findings"})
	room := p.body.height() - 8 - 6
	list := p.entries(p.inFull)
	for _, shorter := range []func(*mark) []string{p.errorsInFull, p.byName} {
		if height(list) > room {
			list = p.entries(shorter)
		}
	}
	if height(list) > room {
		for i := range list {
			list[i].gap = closeGap
		}
	}
	y, bottom := p.body.Top+8, p.body.Top+8+room
	for i, e := range list {
		if y+e.height() > bottom {
			p.words(left+listIndent, y+3, smallType, fmt.Sprintf("and %d more numbers; `rimfall check` prints all", len(list)-i))
			return
		}
		p.drawMark(Point{left + 3.6, y + 2.1}, e.mark.number, e.mark.breaks)
		for k, l := range e.lines {
			p.Text(Label{At: Point{left + listIndent, y + 2.9 + float64(k)*listStep}, Size: smallType, Bold: k == 0 && l == e.mark.subject+p.missing(e.mark), Text: l})
		}
		y += e.height()
	}
}

func (e *entry) height() float64 { return max(2*markRadius, float64(len(e.lines))*listStep) + e.gap }

func height(list []entry) float64 {
	sum := 0.0
	for i := range list {
		sum += list[i].height()
	}
	return sum
}

// entries words every mark.
func (p *plan) entries(say func(*mark) []string) []entry {
	list := make([]entry, len(p.marks))
	for i := range p.marks {
		list[i] = entry{&p.marks[i], say(&p.marks[i]), listGap}
	}
	return list
}

// listWidth is the width of the text of the list.
const listWidth = findingsWidth - listIndent - 2

// inFull is the subject, then every finding with its message.
func (p *plan) inFull(m *mark) []string {
	lines := []string{Shorten(m.subject+p.missing(m), smallType, listWidth, true)}
	for _, f := range m.findings {
		text := f.Rule.Title + ": " + f.Message
		if f.AboutArea() {
			text = "area " + f.Subject + ", " + text
		}
		lines = append(lines, wrap(text, smallType, listWidth)...)
	}
	return lines
}

// errorsInFull spares the messages of what only warns.
func (p *plan) errorsInFull(m *mark) []string {
	if m.breaks {
		return p.inFull(m)
	}
	return p.byName(m)
}

// missing says of a subject without coordinates that its number is not on the drawing.
func (p *plan) missing(m *mark) string {
	_, ok := p.at(m.structure)
	if m.isPipe {
		_, _, ok = p.ends(m.pipe)
	}
	if ok {
		return ""
	}
	return " (not on the plan)"
}

// byName is the subject and the names of the rules, with the storm where it is not the design storm.
func (p *plan) byName(m *mark) []string {
	return wrap(m.names(p.r)+p.missing(m), smallType, listWidth)
}
