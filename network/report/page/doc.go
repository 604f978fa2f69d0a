// Package page writes reports as web pages that stand by themselves: one file, no script,
// nothing fetched, formulas in MathML (W3C MathML Core, 2024).
package page
