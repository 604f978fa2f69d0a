package main

import (
	"errors"
	"io"
	"os"
	"path/filepath"
	"runtime/debug"
	"strings"

	"github.com/spf13/cobra"

	"rimfall/network/fault"
)

// Exit statuses of every command.
const (
	exitRan    = 0
	exitBreaks = 1 // --strict, and a limit is broken
	exitInput  = 2 // input that cannot be run
	exitOther  = 3 // the machine failed: a disk, a pipe
)

// app is what the sub-commands share.
type app struct {
	in       io.Reader
	out, err io.Writer
	broken   bool // --strict found something
}

// gcPercent lets the memory grow more than Go's default before it is searched for
// waste: what a run makes, it mostly keeps to its end. A million pipes stay under 1.5 GB.
const gcPercent = 300

// run runs the program with its arguments and streams and returns the exit status.
func run(args []string, in io.Reader, out, err io.Writer) int {
	if os.Getenv("GOGC") == "" {
		debug.SetGCPercent(gcPercent)
	}
	a := &app{in: in, out: out, err: err}
	root := a.root()
	root.SetArgs(args)
	root.SetIn(in)
	root.SetOut(out)
	root.SetErr(err)
	failed := root.Execute()
	if failed != nil {
		a.tell(failed)
		return status(failed)
	}
	if a.broken {
		return exitBreaks
	}
	return exitRan
}

// root builds the tree of commands.
func (a *app) root() *cobra.Command {
	root := &cobra.Command{
		Use:   "rimfall",
		Short: "Size and check storm drains, line by line",
		Long: `rimfall lays out and checks gravity storm drains from a folder of plain text
files: Rational-method peaks, pipes sized part full by Manning's equation, inverts,
and a schedule in which every number can be traced. Results defer to the local
code; a licensed engineer checks and signs.`,
		Example:       "  rimfall new hillside\n  rimfall size hillside --out hillside-sized\n  rimfall check hillside-sized\n  rimfall schedule hillside-sized --format markdown",
		SilenceUsage:  true,
		SilenceErrors: true,
		RunE: func(cmd *cobra.Command, _ []string) error {
			return cmd.Help()
		},
	}
	root.AddCommand(a.checkCommand(), a.sizeCommand(), a.scheduleCommand(), a.newCommand(), a.rulesCommand(), a.manningCommand(), a.sizesCommand())
	root.AddCommand(a.profileCommand(), a.planCommand())
	root.AddCommand(a.rainCommand(), a.timesCommand())
	root.AddCommand(a.carriesCommand(), a.headroomCommand(), a.doubtCommand(), a.reliefCommand())
	root.AddCommand(a.compareCommand(), a.explainCommand())
	root.SetFlagErrorFunc(func(cmd *cobra.Command, err error) error {
		return usageError{plainFlagError(err) + "; see `" + cmd.CommandPath() + " --help`"}
	})
	return root
}

// plainFlagError words a flag's error without the name of a Go function.
func plainFlagError(err error) string {
	text, why, found := strings.Cut(err.Error(), ": strconv.")
	if found && strings.HasSuffix(why, "invalid syntax") {
		return text + ": that is no number"
	}
	return err.Error()
}

// usageError is a command line that cannot be run.
type usageError struct{ text string }

func (e usageError) Error() string { return e.text }

// status is the exit status that an error's type asks for.
func status(err error) int {
	var pathError *os.PathError
	if errors.As(err, &pathError) {
		return exitOther
	}
	return exitInput
}

// tell prints an error to people: faults one a line, then how many.
func (a *app) tell(err error) {
	var faults fault.List
	if errors.As(err, &faults) {
		a.say("%s", faults.Error())
		if len(faults) > 1 {
			a.say("%d faults; nothing was run and nothing was written", len(faults))
		}
		return
	}
	a.say("rimfall: %s", strings.TrimPrefix(err.Error(), "rimfall: "))
}

// oneJob takes exactly one argument, a job folder.
func oneJob(cmd *cobra.Command, args []string) error {
	if len(args) != 1 {
		return usageError{"name one job folder; see `" + cmd.CommandPath() + " --help`"}
	}
	info, err := os.Stat(args[0])
	switch {
	case errors.Is(err, os.ErrNotExist):
		return usageError{args[0] + ": no such folder; `rimfall new " + args[0] + "` starts a job there"}
	case err == nil && !info.IsDir():
		return usageError{args[0] + " is a file; name the job folder, " + filepath.Dir(args[0])}
	}
	return nil
}
