package units

import (
	"database/sql/driver"
	"fmt"
)

// Scan implements [database/sql.Scanner]. It reads text with a unit and refuses a bare number, of
// which nobody knows the unit.
func (q *Quantity[D]) Scan(src any) error { return scan(q, kindOf[D]().name, src) }

// Value implements [driver.Valuer] with the text of MarshalText.
func (q Quantity[D]) Value() (driver.Value, error) { return text(q.MarshalText()) }

// Scan implements [database/sql.Scanner], as [Quantity.Scan] does.
func (t *Temperature) Scan(src any) error { return scan(t, "temperature", src) }

// Value implements [driver.Valuer] with the text of MarshalText.
func (t Temperature) Value() (driver.Value, error) { return text(t.MarshalText()) }

func scan(dst interface{ UnmarshalText([]byte) error }, field string, src any) error {
	switch s := src.(type) {
	case string:
		return dst.UnmarshalText([]byte(s))
	case []byte:
		return dst.UnmarshalText(s)
	}
	return &ArgumentError{field + " from a database", fmt.Sprintf("%v of type %T", src, src), "text with a unit"}
}

func text(b []byte, err error) (driver.Value, error) {
	if err != nil {
		return nil, err
	}
	return string(b), nil
}
