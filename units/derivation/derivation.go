// Package derivation records how a number was obtained: every intermediate with its unit, what it
// rests on, and the warnings that go with it. A record prints for a person and marshals to JSON for
// a quality file.
package derivation

import (
	"encoding/json"
	"fmt"
	"math"
	"strconv"
	"strings"

	"example.com/coolward/units"
)

// A Line is one step of a derivation.
type Line struct {
	Symbol string      // short name, unique in the record, such as "Bi"
	Name   string      // what it is, such as "Biot number"
	Value  units.Value // the number
	How    string      // formula or origin, such as "h R / k"; may be empty
}

// A Record is an ordered list of steps with sources, notes and warnings. The zero Record is empty
// and ready for use. A Record that a solution hands out is the caller's own copy.
type Record struct {
	Title    string
	Lines    []Line
	Sources  []string // where data and formulas come from
	Notes    []string // assumptions and remarks
	Warnings []string // what a reader must know before using the number
}

// A Dynamic is anything with a dynamic value: every quantity, and a temperature.
type Dynamic interface{ Dynamic() units.Value }

// Add appends a quantity or a temperature. A nil q is no number.
func (r *Record) Add(symbol, name string, q Dynamic, how string) {
	value := units.Number(math.NaN()) // of nothing at all
	if q != nil {
		value = q.Dynamic()
	}
	r.Lines = append(r.Lines, Line{symbol, name, value, how})
}

// AddNumber appends a number of dimension 1.
func (r *Record) AddNumber(symbol, name string, x float64, how string) {
	r.Lines = append(r.Lines, Line{symbol, name, units.Number(x), how})
}

// Source appends where data or a formula comes from, unless it is there already.
func (r *Record) Source(text string) { r.Sources = appendNew(r.Sources, text) }

// Note appends an assumption or a remark, unless it is there already.
func (r *Record) Note(text string) { r.Notes = appendNew(r.Notes, text) }

// Warn appends a warning, unless it is there already.
func (r *Record) Warn(text string) { r.Warnings = appendNew(r.Warnings, text) }

func appendNew(list []string, text string) []string {
	for _, s := range list {
		if s == text {
			return list
		}
	}
	return append(list, text)
}

// Value returns the value of the line with the given symbol, and whether there is one.
func (r Record) Value(symbol string) (units.Value, bool) {
	for _, l := range r.Lines {
		if l.Symbol == symbol {
			return l.Value, true
		}
	}
	return units.Value{}, false
}

// Append adds the lines and texts of another record behind those of r.
func (r *Record) Append(other Record) {
	r.Lines = append(r.Lines, other.Lines...)
	for _, s := range other.Sources {
		r.Source(s)
	}
	for _, s := range other.Notes {
		r.Note(s)
	}
	for _, s := range other.Warnings {
		r.Warn(s)
	}
}

// printed is the number of significant digits of a line, enough to recompute an answer by hand.
const printed = 10

// String writes the record for a person, a line each.
func (r Record) String() string {
	var b strings.Builder
	if r.Title != "" {
		b.WriteString(r.Title + "\n")
	}
	symbol, name, value := 0, 0, 0
	texts := make([]string, len(r.Lines))
	for i, l := range r.Lines {
		texts[i] = strings.TrimSpace(strconv.FormatFloat(l.Value.Number(), 'g', printed, 64) + " " + l.Value.Unit())
		symbol = max(symbol, width(l.Symbol))
		name = max(name, width(l.Name))
		value = max(value, width(texts[i]))
	}
	for i, l := range r.Lines {
		line := fmt.Sprintf("  %s  %s = %s  %s", pad(l.Name, name), pad(l.Symbol, symbol), pad(texts[i], value), l.How)
		b.WriteString(strings.TrimRight(line, " ") + "\n")
	}
	for _, part := range []struct {
		word  string
		texts []string
	}{{"source", r.Sources}, {"note", r.Notes}, {"warning", r.Warnings}} {
		for _, s := range part.texts {
			b.WriteString("  " + part.word + ": " + s + "\n")
		}
	}
	return b.String()
}

func width(s string) int { return len([]rune(s)) }

func pad(s string, n int) string { return s + strings.Repeat(" ", n-width(s)) }

// MarshalJSON writes the record with every digit of each number, in its unit and in SI.
func (r Record) MarshalJSON() ([]byte, error) {
	type line struct {
		Symbol string  `json:"symbol"`
		Name   string  `json:"name"`
		Number float64 `json:"number"`
		Unit   string  `json:"unit,omitempty"`
		SI     float64 `json:"si"`
		How    string  `json:"how,omitempty"`
	}
	lines := make([]line, len(r.Lines))
	for i, l := range r.Lines {
		if !l.Value.IsFinite() {
			return nil, &units.ArgumentError{Field: "derivation: " + l.Name, Value: l.Value, Accepted: "finite"}
		}
		lines[i] = line{l.Symbol, l.Name, l.Value.Number(), l.Value.Unit(), l.Value.SI(), l.How}
	}
	return json.Marshal(struct {
		Title    string   `json:"title,omitempty"`
		Lines    []line   `json:"lines"`
		Sources  []string `json:"sources,omitempty"`
		Notes    []string `json:"notes,omitempty"`
		Warnings []string `json:"warnings,omitempty"`
	}{r.Title, lines, r.Sources, r.Notes, r.Warnings})
}
