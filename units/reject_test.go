package units_test

import (
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"
)

// TestReject compiles testdata/reject and requires an error on exactly the lines that ask for one.
func TestReject(t *testing.T) {
	src, err := os.ReadFile("testdata/reject/reject.go")
	if err != nil {
		t.Fatal(err)
	}
	// The go command caches a passing test until a file that it has read changes, and does not see
	// what a subprocess reads: read the sources of the package here.
	files, _ := filepath.Glob("*.go")
	for _, f := range files {
		if _, err := os.ReadFile(f); err != nil {
			t.Fatal(err)
		}
	}
	out, _ := exec.Command("go", "build", "-gcflags=-e", "./testdata/reject").CombinedOutput()
	got := map[int]string{}
	for _, m := range regexp.MustCompile(`reject\.go:(\d+):\d+: (.*)`).FindAllStringSubmatch(string(out), -1) {
		n, _ := strconv.Atoi(m[1])
		got[n] += m[2] + "\n"
	}
	if len(got) == 0 {
		t.Fatalf("no diagnostics: %s", out)
	}
	for i, line := range strings.Split(string(src), "\n") {
		want := regexp.MustCompile(`// want "(.*)"`).FindStringSubmatch(line)
		messages, found := got[i+1]
		switch {
		case want == nil && found:
			t.Errorf("line %d: unexpected error: %s", i+1, messages)
		case want != nil && !found:
			t.Errorf("line %d compiles: %s", i+1, strings.TrimSpace(line))
		case want != nil && !regexp.MustCompile(want[1]).MatchString(messages):
			t.Errorf("line %d: error %q does not match %q", i+1, messages, want[1])
		}
	}
}
