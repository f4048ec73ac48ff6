package props

import (
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"
	"text/tabwriter"

	"example.com/coolward/units"
)

// A Column of a printed table: a property in a unit. [ColumnOf] makes one.
type Column[S Substance] struct {
	heading string
	text    func(s S, T units.Temperature) (string, error)
}

// ColumnOf returns a column with a heading, a property such as Solid.Conductivity, a unit and the number of significant digits.
//
//	props.ColumnOf("k", props.Solid.Conductivity, units.WattPerMetreKelvin, 3)
func ColumnOf[S Substance, D units.Dimension](heading string, property func(S, units.Temperature) (units.Quantity[D], error), unit units.Unit[D], digits int) Column[S] {
	// A quantity prints its unit after a space.
	_, symbol, _ := strings.Cut(unit.Of(1).Text(unit, 1), " ")
	return Column[S]{heading + ", " + symbol, func(s S, T units.Temperature) (string, error) {
		if property == nil {
			return "", &units.ArgumentError{Field: "props.ColumnOf: property " + heading, Accepted: "a function of a substance and a temperature"}
		}
		q, err := property(s, T)
		if err != nil {
			return "", err
		}
		return significant(q.In(unit), digits), nil
	}}
}

// significant writes x with so many digits, all that it needs if they are fewer than 1, and without an exponent where
// that can be read.
func significant(x float64, digits int) string {
	if digits < 1 {
		digits = -1
	}
	text := strconv.FormatFloat(x, 'g', digits, 64)
	if rounded, err := strconv.ParseFloat(text, 64); err == nil && math.Abs(rounded) >= 1e-4 && math.Abs(rounded) < 1e9 {
		text = strconv.FormatFloat(rounded, 'f', -1, 64)
	}
	return text
}

// WriteTable writes a table of properties: a line with the name, the headings, a row for each temperature on the
// scale, the source, the uncertainty, and the caution. It returns the first error of a property, before anything is
// written, or that of the writer.
func WriteTable[S Substance](w io.Writer, s S, scale units.Scale, temperatures []units.Temperature, columns ...Column[S]) error {
	if w == nil {
		return &units.ArgumentError{Field: "props.WriteTable: writer", Accepted: "a writer that is not nil"}
	}
	var b strings.Builder
	fmt.Fprintln(&b, s.Name())
	t := tabwriter.NewWriter(&b, 0, 8, 2, ' ', tabwriter.AlignRight)
	fmt.Fprintf(t, "T, %v\t", scale)
	for _, c := range columns {
		fmt.Fprintf(t, "%s\t", c.heading)
	}
	fmt.Fprintln(t)
	for _, T := range temperatures {
		number, _, _ := strings.Cut(T.Text(scale, 2), " ")
		fmt.Fprintf(t, "%s\t", number)
		for _, c := range columns {
			if c.text == nil {
				return &units.ArgumentError{Field: "props.WriteTable: column", Accepted: "a column made by ColumnOf"}
			}
			text, err := c.text(s, T)
			if err != nil {
				return err
			}
			fmt.Fprintf(t, "%s\t", text)
		}
		fmt.Fprintln(t)
	}
	if err := t.Flush(); err != nil {
		return err
	}
	fmt.Fprintf(&b, "Source: %s\nUncertainty: %s\n", s.Source(), s.UncertaintySource())
	if c, ok := any(s).(interface{ Caution() string }); ok && c.Caution() != "" {
		fmt.Fprintf(&b, "Caution: %s\n", c.Caution())
	}
	_, err := io.WriteString(w, b.String())
	return err
}
