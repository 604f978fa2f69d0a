// Package text prints a run for people: tables that fit a terminal, and Markdown
// that a forge renders.
package text
