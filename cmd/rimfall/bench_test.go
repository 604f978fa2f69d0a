package main

import (
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"strconv"
	"syscall"
	"testing"
	"time"

	"rimfall/network/networktest"
)

// benchmarkSizes are numbers of pipes of the job folders, forests all of them.
var benchmarkSizes = []int{1e4, 1e5, 1e6}

// BenchmarkCheckCSV is `rimfall check --format csv`, from the folder to the last
// row, in processor time a pipe.
func BenchmarkCheckCSV(b *testing.B) {
	for _, pipes := range benchmarkSizes {
		b.Run(fmt.Sprintf("forest/%.0e", float64(pipes)), func(b *testing.B) {
			dir := forestFolder(b, pipes)
			perPipe(b, pipes, func() {
				if status := run([]string{"check", dir, "--format", "csv"}, nil, io.Discard, os.Stderr); status != exitRan {
					b.Fatalf("exit status %d", status)
				}
			})
		})
	}
}

// BenchmarkPlainReading is the yardstick beside it: a plain program that reads
// the same tables with encoding/csv and parses each number, and does nothing else.
func BenchmarkPlainReading(b *testing.B) {
	for _, pipes := range benchmarkSizes {
		b.Run(fmt.Sprintf("forest/%.0e", float64(pipes)), func(b *testing.B) {
			dir := forestFolder(b, pipes)
			perPipe(b, pipes, func() {
				for _, table := range []string{"structures.csv", "pipes.csv", "areas.csv", "rainfall.csv"} {
					plainRead(b, filepath.Join(dir, table))
				}
			})
		})
	}
}

func plainRead(b *testing.B, path string) (sum float64) {
	f, err := os.Open(path)
	if err != nil {
		b.Fatal(err)
	}
	defer f.Close()
	r := csv.NewReader(f)
	for {
		record, err := r.Read()
		if errors.Is(err, io.EOF) {
			return sum
		}
		if err != nil {
			b.Fatal(err)
		}
		for _, cell := range record {
			if v, err := strconv.ParseFloat(cell, 64); err == nil {
				sum += v
			}
		}
	}
}

func forestFolder(b *testing.B, pipes int) string {
	dir := filepath.Join(b.TempDir(), "job")
	if err := networktest.WriteFolder(dir, networktest.New(networktest.Forest, pipes)); err != nil {
		b.Fatal(err)
	}
	return dir
}

// perPipe runs work and reports processor time, user and system of all threads, a pipe.
func perPipe(b *testing.B, pipes int, work func()) {
	before := processorTime()
	for b.Loop() {
		work()
	}
	b.ReportMetric(float64((processorTime()-before).Nanoseconds())/float64(b.N)/float64(pipes), "cpu-ns/pipe")
}

func processorTime() time.Duration {
	var u syscall.Rusage
	if err := syscall.Getrusage(syscall.RUSAGE_SELF, &u); err != nil {
		return 0
	}
	return time.Duration(u.Utime.Nano() + u.Stime.Nano())
}
