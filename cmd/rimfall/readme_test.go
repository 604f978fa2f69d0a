package main

import (
	"bytes"
	"flag"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"
)

// updateReadme writes what the commands print now into README.md:
//
//	go test ./cmd/rimfall -run README -update-readme
var updateReadme = flag.Bool("update-readme", false, "write the real output of its commands into README.md")

// TestREADMECommandsPrintWhatREADMESays runs every command block of README.md in
// a folder that holds a copy of the examples. A block is a fence marked console;
// a line that begins with "$ " is a command, and what follows is its output.
func TestREADMECommandsPrintWhatREADMESays(t *testing.T) {
	bash, err := exec.LookPath("bash")
	if err != nil {
		t.Skip("needs bash")
	}
	root, err := filepath.Abs("../..")
	if err != nil {
		t.Fatal(err)
	}
	path := filepath.Join(root, "README.md")
	text, err := os.ReadFile(path)
	if err != nil {
		t.Fatal(err)
	}
	dir := t.TempDir()
	build := exec.Command("go", "build", "-o", filepath.Join(dir, "bin", "rimfall"), "./cmd/rimfall")
	build.Dir = root
	if out, err := build.CombinedOutput(); err != nil {
		t.Fatalf("%v\n%s", err, out)
	}
	if err := os.CopyFS(filepath.Join(dir, "examples"), os.DirFS(filepath.Join(root, "examples"))); err != nil {
		t.Fatal(err)
	}
	got := runBlocks(t, bash, dir, string(text))
	if got == string(text) {
		return
	}
	if *updateReadme {
		if err := os.WriteFile(path, []byte(got), 0o644); err != nil {
			t.Fatal(err)
		}
		return
	}
	t.Errorf("README.md is not what its commands print; see -update-readme. First difference:\n%s", firstDifference(string(text), got))
}

// runBlocks gives the text with the real output under each command.
func runBlocks(t *testing.T, bash, dir, text string) string {
	var out strings.Builder
	inBlock := false
	for line := range strings.Lines(text) {
		switch {
		case strings.HasPrefix(line, "```"):
			inBlock = strings.HasPrefix(line, "```console")
			out.WriteString(line)
		case inBlock && strings.HasPrefix(line, "$ "):
			out.WriteString(line)
			out.WriteString(runLine(t, bash, dir, strings.TrimSpace(line[2:])))
		case !inBlock:
			out.WriteString(line)
		}
	}
	return out.String()
}

// runLine runs one command as a user would, the program by its name, and gives
// what it prints on both streams.
func runLine(t *testing.T, bash, dir, command string) string {
	if strings.HasPrefix(command, "go test") {
		return "" // these are the tests
	}
	command = strings.ReplaceAll(command, "go run ./cmd/rimfall", "rimfall")
	cmd := exec.Command(bash, "-c", command)
	cmd.Dir = dir
	cmd.Env = append(os.Environ(), "PATH="+filepath.Join(dir, "bin")+string(os.PathListSeparator)+os.Getenv("PATH"))
	var printed bytes.Buffer
	cmd.Stdout, cmd.Stderr = &printed, &printed
	if err := cmd.Run(); err != nil && printed.Len() == 0 {
		t.Errorf("%s: %v", command, err)
	}
	return printed.String()
}

func firstDifference(want, got string) string {
	a, b := strings.Split(want, "\n"), strings.Split(got, "\n")
	for i := range min(len(a), len(b)) {
		if a[i] != b[i] {
			return "README: " + a[i] + "\nreal:   " + b[i]
		}
	}
	return "one is longer than the other"
}

// TestREADMEBeginsWithTwoCommands: the first block is what a newcomer types.
func TestREADMEBeginsWithTwoCommands(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	_, block, _ := strings.Cut(string(text), "```")
	block, _, _ = strings.Cut(block, "```")
	var commands []string
	for line := range strings.Lines(block) {
		if strings.HasPrefix(line, "go ") {
			commands = append(commands, strings.TrimSpace(line))
		}
	}
	if len(commands) != 2 || !strings.HasPrefix(commands[0], "go run ./cmd/rimfall size examples/") || commands[1] != "go test ./..." {
		t.Errorf("the first block holds %q", commands)
	}
}
