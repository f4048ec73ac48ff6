// Package table reads the tables in testdata, for tests. A table is a CSV file: lines with # say where it
// comes from, and the first other line names the columns.
package table

import (
	"encoding/csv"
	"os"
	"strconv"
	"testing"
)

// Read returns the names of the columns and the rows. A file that cannot be read, or that has no row, ends the test.
func Read(t testing.TB, file string) (columns []string, rows [][]string) {
	t.Helper()
	f, err := os.Open(file)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	r := csv.NewReader(f)
	r.Comment = '#'
	all, err := r.ReadAll()
	if err != nil {
		t.Fatal(file, err)
	}
	if len(all) < 2 {
		t.Fatal(file, "has no rows")
	}
	return all[0], all[1:]
}

// Named returns the rows by the names of the columns.
func Named(t testing.TB, file string) []map[string]string {
	t.Helper()
	columns, rows := Read(t, file)
	named := make([]map[string]string, len(rows))
	for i, row := range rows {
		named[i] = map[string]string{}
		for j, name := range columns {
			named[i][name] = row[j]
		}
	}
	return named
}

// Number reads a number. What is none ends the test.
func Number(t testing.TB, text string) float64 {
	t.Helper()
	x, err := strconv.ParseFloat(text, 64)
	if err != nil {
		t.Fatal(err)
	}
	return x
}
