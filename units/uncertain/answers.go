package uncertain

import (
	"errors"
	"fmt"
	"math"
	"strings"

	"example.com/coolward/units"
)

// A Kind is a reason for which a case has no answer.
type Kind uint8

// The kinds of cases without an answer.
const (
	Other         Kind = iota // any other error
	Never                     // *units.NeverError
	BeyondHorizon             // *units.HorizonError
	OutOfRange                // *units.RangeError
	NotAccepted               // *units.ArgumentError
	NotConverged              // *units.ConvergenceError
	NotFinite                 // an answer that is NaN or infinite, without an error
	kinds
)

var kindTexts = [kinds]string{
	Other: "fail", Never: "never reach it", BeyondHorizon: "do not reach it within the horizon",
	OutOfRange: "leave the range of a source", NotAccepted: "have an input that the model does not accept",
	NotConverged: "do not converge", NotFinite: "give no finite number",
}

// String says what such cases do, as in "never reach it".
func (k Kind) String() string {
	if k < kinds {
		return kindTexts[k]
	}
	return kindTexts[Other]
}

// MarshalText writes the kind as String does.
func (k Kind) MarshalText() ([]byte, error) { return []byte(k.String()), nil }

// kindOf classifies the error of a case.
func kindOf(err error) Kind {
	var never *units.NeverError
	var horizon *units.HorizonError
	var outside *units.RangeError
	var argument *units.ArgumentError
	var convergence *units.ConvergenceError
	switch {
	case errors.As(err, &never):
		return Never
	case errors.As(err, &horizon):
		return BeyondHorizon
	case errors.As(err, &outside):
		return OutOfRange
	case errors.As(err, &argument):
		return NotAccepted
	case errors.As(err, &convergence):
		return NotConverged
	case errors.Is(err, errNotFinite):
		return NotFinite
	}
	return Other
}

var errNotFinite = errors.New("the answer is not a finite number")

// A Missing counts the cases without an answer of one kind.
type Missing struct {
	Kind  Kind   `json:"kind"`
	Cases int    `json:"cases"`
	First error  `json:"-"`     // the error of the first of them
	Text  string `json:"first"` // its text
}

// missing collects the errors of a block of cases.
type missing [kinds]Missing

func (m *missing) add(err error) {
	k := kindOf(err)
	if m[k].Cases == 0 {
		m[k] = Missing{Kind: k, First: err, Text: err.Error()}
	}
	m[k].Cases++
}

// merge appends the errors of a later block.
func (m *missing) merge(later *missing) {
	for k := range m {
		if m[k].Cases == 0 {
			m[k] = later[k]
		} else {
			m[k].Cases += later[k].Cases
		}
	}
}

// list returns the kinds that occurred, in their order.
func (m *missing) list() (all []Missing) {
	for _, x := range m {
		if x.Cases > 0 {
			all = append(all, x)
		}
	}
	return all
}

// A NoAnswerError reports that too few cases have an answer to say anything about it. errors.Is and
// errors.As look into the first error of each kind.
type NoAnswerError struct {
	Cases    int // how many were tried
	Answered int // how many of them have an answer
	Needed   int // how many would be enough
	Missing  []Missing
}

// Error says how many cases have no answer, and why.
func (e *NoAnswerError) Error() string {
	var b strings.Builder
	fmt.Fprintf(&b, "%d of %d cases have an answer, %d are needed", e.Answered, e.Cases, e.Needed)
	for _, m := range e.Missing {
		fmt.Fprintf(&b, "; %d %v: %s", m.Cases, m.Kind, m.Text)
	}
	return b.String()
}

// Unwrap returns the first error of each kind.
func (e *NoAnswerError) Unwrap() []error {
	var all []error
	for _, m := range e.Missing {
		all = append(all, m.First)
	}
	return all
}

// number returns the SI number of an answer.
func number[Q interface{ SI() float64 }](answer Q, err error) (float64, error) {
	if err != nil {
		return math.NaN(), err
	}
	y := answer.SI()
	if !(math.Abs(y) <= math.MaxFloat64) {
		return math.NaN(), errNotFinite
	}
	return y, nil
}
