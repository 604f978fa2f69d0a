package main

import (
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"
)

// reviewPrinting are the flags of a command that prints the answer to a question.
type reviewPrinting struct {
	format, table string
	tables        []string
}

// addTo defines the flags; tables are those that can be printed alone, if any.
func (p *reviewPrinting) addTo(cmd *cobra.Command, tables ...string) {
	p.tables = tables
	f := cmd.Flags()
	f.StringVar(&p.format, "format", "table", "how to print: "+strings.Join(formats, ", "))
	complete(cmd, "format", formats)
	if len(tables) > 0 {
		f.StringVar(&p.table, "table", "", "print one table only: "+strings.Join(tables, ", "))
		complete(cmd, "table", tables)
	}
}

// judge checks the words of the flags.
func (p *reviewPrinting) judge() error {
	if !slices.Contains(formats, p.format) {
		return usageError{fmt.Sprintf("--format %s: write one of %s", p.format, strings.Join(formats, ", "))}
	}
	if p.table != "" && !slices.Contains(p.tables, p.table) {
		return usageError{fmt.Sprintf("--table %s: write one of %s", p.table, strings.Join(p.tables, ", "))}
	}
	return nil
}
