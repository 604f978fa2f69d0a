package text

import (
	"io"
	"strings"

	"github.com/olekukonko/tablewriter"
	"github.com/olekukonko/tablewriter/renderer"
	"github.com/olekukonko/tablewriter/tw"

	"rimfall/network/report"
)

// grid is a table of texts ready to be drawn.
type grid struct {
	head    []string // may hold line breaks
	numbers []bool   // right-aligned
	rows    [][]string
}

// leftOutAtZero are the columns that tell nothing where every row is 0.
var leftOutAtZero = map[string]bool{"inflow": true}

// makeGrid shows rows in columns; a column that tells nothing in any row is left out.
func makeGrid[R any](style report.Style, columns []report.Column[R], rows []R) grid {
	var g grid
	g.rows = make([][]string, len(rows))
	for _, c := range columns {
		if c.Head == nil {
			continue
		}
		cells := make([]string, len(rows))
		filled := false
		for i := range rows {
			v := c.Value(&rows[i])
			cells[i] = style.Show(c.Quantity, v)
			filled = filled || cells[i] != "" && (v.Number != 0 || !leftOutAtZero[c.Key])
		}
		if !filled && len(rows) > 0 {
			continue
		}
		g.head = append(g.head, heading(style, c.Head, c.Quantity))
		g.numbers = append(g.numbers, c.Quantity != report.Text)
		for i := range rows {
			g.rows[i] = append(g.rows[i], cells[i])
		}
	}
	return g
}

// heading is the words of a column with its unit, a line each.
func heading(style report.Style, words []string, q report.Quantity) string {
	lines := words
	if unit := style.Unit(q); unit != "" {
		lines = append(append([]string(nil), words...), unit)
	}
	return strings.Join(lines, "\n")
}

// drawText draws a grid with a line under its headings and two blanks between columns.
func (g grid) drawText(w io.Writer) error {
	off := tw.Off
	return g.draw(w, renderer.NewBlueprint(tw.Rendition{
		Borders: tw.BorderNone,
		Symbols: tw.NewSymbols(tw.StyleASCII),
		Settings: tw.Settings{
			Lines:      tw.Lines{ShowHeaderLine: tw.On, ShowTop: off, ShowBottom: off, ShowFooterLine: off},
			Separators: tw.Separators{ShowHeader: off, ShowFooter: off, BetweenRows: off, BetweenColumns: off},
		},
	}), tw.Padding{Left: "", Right: "  ", Overwrite: true})
}

// drawMarkdown draws a grid as a Markdown table; a bar inside a cell is escaped.
func (g grid) drawMarkdown(w io.Writer) error {
	escape := strings.NewReplacer("|", `\|`, "\n", " ")
	m := grid{numbers: g.numbers}
	for _, h := range g.head {
		m.head = append(m.head, escape.Replace(h))
	}
	for _, row := range g.rows {
		cells := make([]string, len(row))
		for i, c := range row {
			cells[i] = escape.Replace(c)
		}
		m.rows = append(m.rows, cells)
	}
	return m.draw(w, renderer.NewMarkdown(), tw.Padding{Left: " ", Right: " ", Overwrite: true})
}

// draw renders through tablewriter, whose formatting of headings and wrapping
// are turned off: it would print d/D as D / D.
func (g grid) draw(w io.Writer, r tw.Renderer, padding tw.Padding) error {
	align := make([]tw.Align, len(g.numbers))
	for i, number := range g.numbers {
		align[i] = tw.AlignLeft
		if number {
			align[i] = tw.AlignRight
		}
	}
	cell := tw.CellConfig{
		Formatting: tw.CellFormatting{AutoFormat: tw.Off, AutoWrap: tw.WrapNone},
		Alignment:  tw.CellAlignment{PerColumn: align},
		Padding:    tw.CellPadding{Global: padding},
	}
	table := tablewriter.NewTable(w, tablewriter.WithRenderer(r), tablewriter.WithConfig(tablewriter.Config{
		Header: cell, Row: cell,
		Behavior: tw.Behavior{TrimSpace: tw.Off},
	}))
	table.Header(g.head)
	if err := table.Bulk(g.rows); err != nil {
		return err
	}
	return table.Render()
}
