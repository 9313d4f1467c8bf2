package project_test

import (
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"example.org/couplet/internal/published"
)

const consumer = `package main

import (
	"fmt"

	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

func main() {
	half, one := rational.Halves(1), rational.Int(1)
	fmt.Println(wigner.ClebschGordan(one, rational.Int(0), half, half, rational.Halves(3), half))
}
`

// A module outside, which knows this one by a replace line only, builds, runs, and pays less than a
// millisecond for the import.
func TestOutsideModule(t *testing.T) {
	if testing.Short() {
		t.Skip("builds a program")
	}
	dir := t.TempDir()
	write := func(name, text string) {
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	write("main.go", consumer)
	write("go.mod", "module example.net/consumer\n\ngo 1.26\n\nrequire example.org/couplet v0.0.0\n\nreplace example.org/couplet => "+
		strconv.Quote(published.Root(t))+"\n")
	program := filepath.Join(dir, "consumer.exe")
	build := exec.Command("go", "build", "-o", program, ".")
	build.Dir = dir
	build.Env = append(os.Environ(), "GOWORK=off", "GOFLAGS=-mod=mod")
	if out, err := build.CombinedOutput(); err != nil {
		t.Fatalf("go build: %v\n%s", err, out)
	}
	run := exec.Command(program)
	run.Env = append(os.Environ(), "GODEBUG=inittrace=1")
	var trace strings.Builder
	run.Stderr = &trace
	out, err := run.Output()
	if err != nil || string(out) != "1/3*sqrt(6)\n" {
		t.Fatalf("printed %q, %v", out, err)
	}
	// "init internal/bytealg @0.008 ms, 0 ms clock, 0 bytes, 0 allocs"
	line := regexp.MustCompile(`(?m)^init (\S+) @\S+ ms, (\S+) ms clock, (\d+) bytes`)
	packages := 0
	for _, m := range line.FindAllStringSubmatch(trace.String(), -1) {
		packages++
		if !strings.HasPrefix(m[1], "example.org/couplet") {
			continue
		}
		// The clock of a busy machine is no measure; memory tells whether a table was built.
		if bytes, err := strconv.Atoi(m[3]); err != nil || bytes > 4096 {
			t.Errorf("importing computes something: %s", m[0])
		}
	}
	if packages == 0 {
		t.Errorf("no trace of the start: %q", trace.String())
	}
}
