package main

import (
	"bufio"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/fault"
	"rimfall/network/finding"
	"rimfall/network/report/text"
)

// rulesCommand prints the catalogue of rules.
func (a *app) rulesCommand() *cobra.Command {
	var format string
	cmd := &cobra.Command{
		Use:     "rules [RULE]",
		Short:   "Print the rules by which a design is judged",
		Long:    "rules prints every rule: when it is found, why it matters, how grave it is, and the setting that holds its limit.",
		Example: "  rimfall rules\n  rimfall rules cover\n  rimfall rules --format markdown",
		Args:    cobra.MaximumNArgs(1),
		RunE: func(_ *cobra.Command, args []string) error {
			ruleFormats := []string{"table", "markdown"}
			if !slices.Contains(ruleFormats, format) {
				return usageError{fmt.Sprintf("--format %s: write one of %s", format, strings.Join(ruleFormats, ", "))}
			}
			rules := finding.Catalogue()
			if len(args) == 1 {
				i := slices.Index(finding.Names(), args[0])
				if i < 0 {
					return usageError{fmt.Sprintf("no rule %q: %s", args[0], fault.Suggest(args[0], finding.Names()))}
				}
				rules = rules[i : i+1]
			}
			w := bufio.NewWriter(a.out)
			if err := text.Rules(w, rules, format == "markdown"); err != nil {
				return err
			}
			return w.Flush()
		},
		ValidArgs: finding.Names(),
	}
	cmd.Flags().StringVar(&format, "format", "table", "how to print: table, markdown")
	complete(cmd, "format", []string{"table", "markdown"})
	return cmd
}
