package props_test

import (
	"math"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"example.com/coolward/internal/table"
)

// A sheet is one file of testdata: its rows by the names of the columns.
type sheet struct {
	name string
	rows []map[string]string
}

func readSheet(t *testing.T, name string) sheet {
	t.Helper()
	return sheet{name, table.Named(t, filepath.Join("testdata", name))}
}

// cell is a printed number: the value, and half a unit of its last digit.
type cell struct {
	value, half float64
}

func (s sheet) cell(t *testing.T, row int, column string) cell {
	t.Helper()
	return parseCell(t, s.text(t, row, column))
}

// text is what is printed.
func (s sheet) text(t *testing.T, row int, column string) string {
	t.Helper()
	text, ok := s.rows[row][column]
	if !ok {
		t.Fatalf("%s has no column %q", s.name, column)
	}
	return text
}

func parseCell(t *testing.T, text string) cell {
	t.Helper()
	v := table.Number(t, text)
	mantissa, exponent, _ := strings.Cut(strings.ToLower(text), "e")
	e := 0
	if exponent != "" {
		var err error
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
