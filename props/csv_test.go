package props_test

import (
	"encoding/csv"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
)

// A sheet is one file of testdata: comment lines with the source, a header, rows.
type sheet struct {
	name    string
	columns map[string]int
	rows    [][]string
}

func readSheet(t *testing.T, name string) sheet {
	t.Helper()
	f, err := os.Open(filepath.Join("testdata", name))
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	r := csv.NewReader(f)
	r.Comment = '#'
	all, err := r.ReadAll()
	if err != nil {
		t.Fatal(name, err)
	}
	s := sheet{name: name, columns: map[string]int{}, rows: all[1:]}
	for i, c := range all[0] {
		s.columns[c] = i
	}
	return s
}

// cell is a printed number: the value, and half a unit of its last digit.
type cell struct {
	value, half float64
}

func (s sheet) cell(t *testing.T, row int, column string) cell {
	t.Helper()
	i, ok := s.columns[column]
	if !ok {
		t.Fatalf("%s has no column %q", s.name, column)
	}
	return parseCell(t, s.rows[row][i])
}

func parseCell(t *testing.T, text string) cell {
	t.Helper()
	v, err := strconv.ParseFloat(text, 64)
	if err != nil {
		t.Fatal(err)
	}
	mantissa, exponent, _ := strings.Cut(strings.ToLower(text), "e")
	e := 0
	if exponent != "" {
		if e, err = strconv.Atoi(exponent); err != nil {
			t.Fatal(err)
		}
	}
	if _, decimals, ok := strings.Cut(mantissa, "."); ok {
		e -= len(decimals)
	}
	return cell{v, 0.5 * math.Pow(10, float64(e))}
}

// check reports a failure unless got is within the half digit of want and a tolerance relative to got, because a stated
// uncertainty is relative to the value that it is stated of.
func check(t *testing.T, what string, got float64, want cell, relative float64, source string) {
	t.Helper()
	tolerance := want.half*(1+1e-6) + relative*math.Abs(got)
	if !(math.Abs(got-want.value) <= tolerance) {
		t.Errorf("%s: got %.9g, want %.9g ± %.2g (off by %.3f %%; %s)", what, got, want.value, tolerance, 100*(got/want.value-1), source)
	}
}
