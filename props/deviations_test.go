package props_test

import (
	"flag"
	"os"
	"testing"
)

var update = flag.Bool("update", false, "write DEVIATIONS.md")

// compared is how many values from another source make a substance count as compared.
const compared = 3

const deviationsHead = `# Deviations of the solids and fluids

The largest deviation of each from values of sources other than the one that it was made from: ours over theirs, less one, with
the temperature, the source and, in brackets, the stated uncertainty. An asterisk marks a value outside the uncertainty; each has a
reason. A dash: nothing to compare with.

This file is written by ` + "`go test ./props -run TestDeviationsAreCurrent -update`" + `, and the test fails if it is stale.

`

// DEVIATIONS.md is what the comparisons of this package make of it.
func TestDeviationsAreCurrent(t *testing.T) {
	const name = "DEVIATIONS.md"
	want := deviationsHead + solidsSection(t) + "\n" + fluidsSection(t)
	if *update {
		if err := os.WriteFile(name, []byte(want), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	have, err := os.ReadFile(name)
	if err != nil || string(have) != want {
		t.Errorf("%s is stale: run go test ./props -run TestDeviationsAreCurrent -update (%v)", name, err)
	}
}
