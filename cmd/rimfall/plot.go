package main

import (
	"rimfall/network/calculator"
	"rimfall/network/report/drawing"
)

// plotAnswer draws an answer where --plot asks for it.
func (a *app) plotAnswer(m *manningFlags, answer *calculator.Answer) error {
	if m.svg == "" {
		return nil
	}
	return a.plot(m, answer.Picture())
}

// plotRating draws a section and its curves where --plot asks for it.
func (a *app) plotRating(m *manningFlags, r *calculator.Rating) error {
	if m.svg == "" {
		return nil
	}
	return a.plot(m, r.Picture())
}

func (a *app) plot(m *manningFlags, p calculator.Picture) error {
	page := drawing.Calculation(p)
	return a.writeFiles([]outputFile{{m.svg, page.Bytes()}}, m.force)
}
