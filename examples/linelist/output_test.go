package main

import (
	"os"
	"path/filepath"
	"slices"
	"testing"
)

// Files are written whole, over files that are there, and nothing else is left.
func TestOutputFiles(t *testing.T) {
	dir := t.TempDir()
	list, picture := filepath.Join(dir, "list.csv"), filepath.Join(dir, "plot.svg")
	if err := os.WriteFile(list, []byte("old"), 0o600); err != nil {
		t.Fatal(err)
	}
	if out := succeed(t, "-format", "csv", "-o", list, "-plot", picture); out != "" {
		t.Errorf("standard output %q", out)
	}
	got, err := os.ReadFile(list)
	if err != nil || string(got) != succeed(t, "-format", "csv") {
		t.Errorf("%s: %v, %q", list, err, got)
	}
	if got, want := files(t, dir), []string{"list.csv", "plot.svg"}; !slices.Equal(got, want) {
		t.Errorf("files %q, want %q", got, want)
	}
	// A plot alone leaves the list on standard output.
	if out := succeed(t, "-format", "csv", "-plot", picture); out != string(got) {
		t.Errorf("standard output %q", out)
	}
}

// Wrong input leaves a file that is there alone.
func TestOutputKept(t *testing.T) {
	dir := t.TempDir()
	list := filepath.Join(dir, "list")
	if err := os.WriteFile(list, []byte("old"), 0o644); err != nil {
		t.Fatal(err)
	}
	if status, _, _ := program("-o", list, "-plot", filepath.Join(dir, "none", "a.png")); status != 2 {
		t.Errorf("status %d", status)
	}
	if got, err := os.ReadFile(list); err != nil || string(got) != "old" {
		t.Errorf("%q, %v", got, err)
	}
	if got := files(t, dir); len(got) != 1 {
		t.Errorf("files %q", got)
	}
}
