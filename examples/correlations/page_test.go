package main

import (
	"bytes"
	"os"
	"strings"
	"testing"

	"example.com/coolward/correlations"
)

// The page that is kept beside the package is the one that the correlations give.
func TestPageIsUpToDate(t *testing.T) {
	kept, err := os.ReadFile("../../correlations/CORRELATIONS.md")
	if err != nil {
		t.Fatal(err)
	}
	var now bytes.Buffer
	if err := page(&now, ""); err != nil {
		t.Fatal(err)
	}
	if !bytes.Equal(kept, now.Bytes()) {
		t.Error("correlations/CORRELATIONS.md is stale: go run ./examples/correlations > correlations/CORRELATIONS.md")
	}
	for c := range correlations.All() {
		if !strings.Contains(now.String(), c.Citation()) || !strings.Contains(now.String(), capital(c.Name())+"\n") {
			t.Errorf("the page lacks %s", c.Name())
		}
	}
}

func TestPageOfOneBody(t *testing.T) {
	var b strings.Builder
	if err := page(&b, "vertical plate"); err != nil {
		t.Fatal(err)
	}
	if s := b.String(); !strings.Contains(s, "Churchill and Chu vertical plate, natural") || strings.Contains(s, "Whitaker sphere") {
		t.Errorf("page of the vertical plate:\n%s", s)
	}
	if err := page(&b, "teapot"); err == nil {
		t.Error("a page of the teapot")
	}
}
