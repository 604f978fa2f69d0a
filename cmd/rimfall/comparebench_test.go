package main

import (
	"fmt"
	"io"
	"os"
	"testing"

	"rimfall/network/networktest"
)

// BenchmarkCompare is `rimfall compare --format json` of two forests, in processor time a
// pipe, with `rimfall check --format json` of one of them beside it. Both jobs are alike,
// or every pipe differs, since every area of the second one is larger.
func BenchmarkCompare(b *testing.B) {
	for _, pipes := range benchmarkSizes[:2] {
		one, more := forestFolder(b, pipes), wetterFolder(b, pipes)
		for _, c := range []struct {
			name string
			args []string
		}{
			{"check", []string{"check", one, "--format", "json"}},
			{"alike", []string{"compare", one, one, "--format", "json"}},
			{"all", []string{"compare", one, more, "--format", "json"}},
		} {
			b.Run(fmt.Sprintf("%s/forest/%.0e", c.name, float64(pipes)), func(b *testing.B) {
				perPipe(b, pipes, func() {
					if status := run(c.args, nil, io.Discard, os.Stderr); status != exitRan {
						b.Fatalf("exit status %d", status)
					}
				})
			})
		}
	}
}

// wetterFolder is the forest with every area a tenth larger.
func wetterFolder(b *testing.B, pipes int) string {
	n := networktest.New(networktest.Forest, pipes)
	for i := range n.Areas {
		n.Areas[i].Area *= 1.1
	}
	dir := b.TempDir()
	if err := networktest.WriteFolder(dir, n); err != nil {
		b.Fatal(err)
	}
	return dir
}
