package drawing

import (
	"slices"

	"rimfall/network/report"
	"rimfall/network/units"
)

// Sheet is one finished page.
type Sheet struct {
	Name string // of its file, without extension: "profile-a", "plan"
	Page *Canvas
}

// Paper is a size of paper, lying.
type Paper struct {
	Name          string // "a3"
	Title         string // with its measures
	Width, Height float64
}

// Papers are the sizes that are offered: the first is the default of jobs in metres, the second that of jobs in feet. A
// sizes are those of ISO 216, the others those of ANSI/ASME Y14.1, 17 by 11 and 34 by 22 inches (from memory).
var Papers = []Paper{
	{"a3", "A3, 420 × 297 mm", 420, 297},
	{"ansi-b", "ANSI B, 17 × 11 in", 17 * 25.4, 11 * 25.4},
	{"a1", "A1, 841 × 594 mm", 841, 594},
	{"ansi-d", "ANSI D, 34 × 22 in", 34 * 25.4, 22 * 25.4},
}

// PaperNamed finds a paper; "" gives the default of a job.
func PaperNamed(name string, u units.System) (Paper, bool) {
	if name == "" {
		if u.Name == units.SI.Name {
			return Papers[0], true
		}
		return Papers[1], true
	}
	for _, p := range Papers {
		if p.Name == name {
			return p, true
		}
	}
	return Paper{}, false
}

// The measures of every sheet, mm.
const (
	edge        = 10.0 // from the edge of the paper to the frame
	stripHeight = 36.0 // legend, notes and title along the lower edge
	typeSize    = 2.6  // capitals 1.9 mm high: legible on A3 and ANSI B
	smallType   = 2.3
	lineHeight  = 3.7
)

// The pens: the weights and dashes of engineering drawing, heavy for what is built, medium for water, thin for what
// guides the eye (common practice).
var (
	frame  = Pen{Width: 0.5}
	thin   = Pen{Width: 0.15}
	medium = Pen{Width: 0.25}
	fine   = Pen{Width: 0.1, Grey: true}
	leader = Pen{Width: 0.13}
	noEdge = Pen{}
)

// sheet is a page while it is drawn: its frame and strip stand, and body is the room above the strip.
type sheet struct {
	*Canvas
	paper Paper
	body  Box
	strip Box
}

// heading is what the title of a sheet says.
type heading struct {
	title string   // of this sheet
	lines []string // scales and the like
	notes []string // over the cautions, each wrapped
	count string   // "sheet 1 of 3"
}

// newSheet draws a frame and divides the page.
func newSheet(paper Paper, title string) *sheet {
	s := &sheet{Canvas: NewCanvas(paper.Width, paper.Height, title), paper: paper}
	whole := Box{edge, edge, paper.Width - edge, paper.Height - edge}
	s.strip = Box{whole.Left, whole.Bottom - stripHeight, whole.Right, whole.Bottom}
	s.body = Box{whole.Left, whole.Top, whole.Right, s.strip.Top}
	s.Rect(whole, frame, Empty)
	s.Line(Point{s.strip.Left, s.strip.Top}, Point{s.strip.Right, s.strip.Top}, frame)
	return s
}

// Shares of the strip's width: the legend (with a scale bar on plans), the notes; the title has the rest.
const legendShare, notesShare = 0.30, 0.32

func (s *sheet) legendBox() Box {
	return Box{s.strip.Left, s.strip.Top, s.strip.Left + legendShare*s.strip.width(), s.strip.Bottom}
}

func (s *sheet) notesBox() Box {
	left := s.legendBox().Right
	return Box{left, s.strip.Top, left + notesShare*s.strip.width(), s.strip.Bottom}
}

func (s *sheet) titleBox() Box {
	return Box{s.notesBox().Right, s.strip.Top, s.strip.Right, s.strip.Bottom}
}

// words writes a text level, from the left.
func (s *sheet) words(x, y, size float64, text string) {
	s.Text(Label{At: Point{x, y}, Size: size, Text: text})
}

// titled draws the strip's notes and title. What every report says stands on every sheet.
func (s *sheet) titled(r *run, h heading) {
	s.notes(slices.Concat(h.notes[:1], assumedNote(r.Network), h.notes[1:], report.Cautions))
	box := s.titleBox()
	s.Line(Point{box.Left, box.Top}, Point{box.Left, box.Bottom}, medium)
	lines := report.Heading(r.Result)
	const margin = 2.5
	left, width := box.Left+margin, box.width()-2*margin
	y := box.Top + 6
	s.Text(fit(Label{At: Point{left, y}, Size: 4.2, Bold: true, Text: lines[0]}, width, typeSize))
	y += 4.8
	s.Text(fit(Label{At: Point{left, y}, Size: 3.2, Bold: true, Text: h.title}, width, smallType))
	rest := slices.Concat(lines[1:], h.lines)
	const signatureHeight, gap = 7.5, 1.0
	step := min(lineHeight-0.1, (box.Bottom-signatureHeight-1-y)/float64(len(rest)))
	for _, l := range rest {
		y += step
		s.Text(fit(Label{At: Point{left, y}, Size: typeSize, Text: l}, width, 1.8))
	}
	s.signatures(box, h.count)
}

// signatureHeight is that of the boxes for people's hands, mm.
const signatureHeight = 7.5

// signatures draws the boxes that people fill in by hand, and the count of sheets.
func (s *sheet) signatures(box Box, count string) {
	top := box.Bottom - signatureHeight
	s.Line(Point{box.Left, top}, Point{box.Right, top}, thin)
	names := []string{"designed", "checked", "date", "seal"}
	width := box.width() / float64(len(names)+1)
	for i, name := range names {
		x := box.Left + float64(i)*width
		s.words(x+1, top+2.6, 2, name)
		s.Line(Point{x + width, top}, Point{x + width, box.Bottom}, thin)
	}
	centre := box.Left + (float64(len(names))+0.5)*width
	s.Text(fit(Label{At: Point{centre, box.Bottom - 2.6}, Size: typeSize, Anchor: Middle, Bold: true, Text: count}, width-2, 1.8))
}

// notes writes the notes. Where there is no room for all, the first gives way: it is the list of findings, which the
// tables have as well.
func (s *sheet) notes(notes []string) {
	box := s.notesBox()
	s.Line(Point{box.Left, box.Top}, Point{box.Left, box.Bottom}, medium)
	const margin, step = 2.5, 3.1
	width := box.width() - 2*margin
	first := wrap(notes[0], smallType, width)
	var rest []string
	for _, n := range notes[1:] {
		rest = append(rest, wrap(n, smallType, width)...)
	}
	if room := int((box.height()-3)/step) - len(rest); len(first) > room {
		first = append(first[:max(room-1, 0)], "… and more; see the table of findings")
	}
	for i, l := range append(first, rest...) {
		s.words(box.Left+margin, box.Top+4+float64(i)*step, smallType, l)
	}
}

// sample is one entry of a legend.
type sample struct {
	draw func(at Box) // fills the box, 14 by 4 mm
	text string
}

// legend draws the samples in two columns and leaves out what has no room below, which the tests forbid.
func (s *sheet) legend(samples []sample, box Box) {
	const rowHeight, drawn, margin = 4.15, 13.0, 2.0
	rows := int((box.height() - 2) / rowHeight)
	columns := 1 + (len(samples)-1)/rows
	width := box.width() / float64(columns)
	for i, item := range samples {
		x := box.Left + float64(i/rows)*width + margin
		y := box.Top + 1.2 + float64(i%rows)*rowHeight
		item.draw(Box{x, y, x + drawn, y + rowHeight})
		s.Text(fit(Label{At: Point{x + drawn + 1.5, y + 2.9}, Size: smallType, Text: item.text}, width-drawn-margin-2, 1.8))
	}
}

// penSample shows a line.
func (s *sheet) penSample(pen Pen, text string) sample {
	return sample{func(b Box) {
		y := (b.Top + b.Bottom) / 2
		s.Line(Point{b.Left, y}, Point{b.Right, y}, pen)
	}, text}
}
