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

// readmeProgram returns the program in README.md, and what the block after it says that it prints.
func readmeProgram(t *testing.T) (program, output string) {
	t.Helper()
	text, err := os.ReadFile(filepath.Join(published.Root(t), "README.md"))
	if err != nil {
		t.Fatal(err)
	}
	m := regexp.MustCompile("(?s)```go\n(.*?)```.*?```\n(.*?)```").FindStringSubmatch(string(text))
	if m == nil {
		t.Fatal("README.md has no program with its output")
	}
	return m[1], m[2]
}

// A module outside, which knows this one by a replace line only, builds and runs the program of
// README.md, and its start computes nothing.
func TestOutsideModule(t *testing.T) {
	if testing.Short() {
		t.Skip("builds a program")
	}
	source, want := readmeProgram(t)
	dir := t.TempDir()
	write := func(name, text string) {
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	write("main.go", source)
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
	if err != nil || string(out) != want {
		t.Fatalf("printed %q, %v; README.md says %q", out, err, want)
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
