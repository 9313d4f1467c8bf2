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

// The compiler may fuse x*y+z into one rounding where the processor can, and the bits of a correctly
// rounded value must not depend on that: in the packages that round, only lines that say math.FMA hold
// fused instructions. arm64 always has them.
func TestNoAccidentalFusing(t *testing.T) {
	if testing.Short() {
		t.Skip("compiles for another processor")
	}
	root := published.Root(t)
	build := exec.Command("go", "build", "-gcflags=-S", "./rational", "./internal/dd", "./internal/row", "./internal/binsum", "./wigner", "./racah")
	build.Dir = root
	build.Env = append(os.Environ(), "GOARCH=arm64", "GOOS=linux", "CGO_ENABLED=0")
	out, err := build.CombinedOutput()
	if err != nil {
		t.Fatalf("go build: %v\n%s", err, out)
	}
	instruction := regexp.MustCompile(`\(([^()]+\.go):(\d+)\)\s+(FN?M(?:ADD|SUB)[DS])\b`)
	sources := map[string][]string{}
	fused := 0
	for _, m := range instruction.FindAllStringSubmatch(string(out), -1) {
		name := m[1]
		if !filepath.IsAbs(name) {
			name = filepath.Join(root, name)
		}
		if sources[name] == nil {
			text, err := os.ReadFile(name)
			if err != nil {
				t.Fatal(err)
			}
			sources[name] = strings.Split(string(text), "\n")
		}
		line, err := strconv.Atoi(m[2])
		if err != nil || line > len(sources[name]) {
			t.Fatalf("line %s of %s", m[2], name)
		}
		fused++
		if !strings.Contains(sources[name][line-1], "math.FMA") {
			t.Errorf("%s:%d: %s: %s", m[1], line, m[3], strings.TrimSpace(sources[name][line-1]))
		}
	}
	if fused == 0 {
		t.Error("no fused instruction at all: the listing is not what this test reads")
	}
}
