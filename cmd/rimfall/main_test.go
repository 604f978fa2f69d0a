package main

import (
	"os"
	"testing"

	"github.com/rogpeppe/go-internal/testscript"
)

// TestMain makes the program itself a command of the session scripts.
func TestMain(m *testing.M) {
	testscript.Main(m, map[string]func(){
		"rimfall": func() { os.Exit(run(os.Args[1:], os.Stdin, os.Stdout, os.Stderr)) },
	})
}

// TestSessions runs the session scripts: whole sessions of a user, as typed.
// EXAMPLES names the folder of example jobs, TESTDATA that of test jobs.
func TestSessions(t *testing.T) {
	root, err := os.Getwd()
	if err != nil {
		t.Fatal(err)
	}
	testscript.Run(t, testscript.Params{
		Dir:           "testdata/script",
		UpdateScripts: *updateReadme, // with the flag of the README's test: look at what changed
		Setup: func(e *testscript.Env) error {
			e.Setenv("EXAMPLES", root+"/../../examples")
			e.Setenv("TESTDATA", root+"/../../testdata")
			return nil
		},
	})
}
