package units

import (
	"fmt"
	"strings"
)

// An ArgumentError reports a field or argument that cannot be used.
type ArgumentError struct {
	Field    string // which one, such as "shape.Sphere: diameter"
	Value    any    // what was given, a quantity with its unit; nil where there is no value
	Accepted string // what would have been accepted
}

// Error names the field, the value and what is accepted.
func (e *ArgumentError) Error() string {
	if e.Value == nil {
		return e.Field + ": missing; accepted: " + e.Accepted
	}
	return fmt.Sprintf("%s: %v not accepted; accepted: %s", e.Field, e.Value, e.Accepted)
}

// A RangeError reports an argument outside the range in which a source supports a property, a
// correlation or a table.
type RangeError struct {
	Model    string // what was evaluated, such as "thermal conductivity of copper"
	Quantity string // which argument, such as "temperature" or "Rayleigh number"
	Value    Value  // what was given
	Min, Max Value  // the range that the source supports; an infinite end is open
	Above    bool   // Min itself lies outside: the range begins above it
	Below    bool   // Max itself lies outside: the range ends below it
	Source   string // where the range comes from
}

// Error names the quantity, its value, the range and the source.
func (e *RangeError) Error() string {
	var b strings.Builder
	fmt.Fprintf(&b, "%s: %s %v outside its range", e.Model, e.Quantity, e.Value)
	upTo := "up to"
	if e.Below {
		upTo = "below"
	}
	switch {
	case !e.Max.IsFinite() && e.Above:
		fmt.Fprintf(&b, ", above %v", e.Min)
	case !e.Max.IsFinite():
		fmt.Fprintf(&b, ", from %v up", e.Min)
	case !e.Min.IsFinite():
		fmt.Fprintf(&b, ", %s %v", upTo, e.Max)
	case e.Above:
		fmt.Fprintf(&b, ", above %v and %s %v", e.Min, upTo, e.Max)
	case e.Below:
		fmt.Fprintf(&b, ", %v to below %v", e.Min, e.Max)
	default:
		fmt.Fprintf(&b, ", %v to %v", e.Min, e.Max)
	}
	if e.Source != "" {
		b.WriteString(" (" + e.Source + ")")
	}
	return b.String()
}

// A NeverError is the answer that a temperature is not reached however long one waits.
type NeverError struct {
	Place     string      // where, such as "centre"
	Target    Temperature // what was asked
	Limit     Temperature // what the place tends to
	Condition string      // under which condition, such as "if conditions stay as at 2 h"; may be empty
}

// Error says what is never reached, and the limit.
func (e *NeverError) Error() string {
	s := fmt.Sprintf("the %s never reaches %v, it tends to %v", e.Place, e.Target, e.Limit)
	if e.Condition != "" {
		s += " " + e.Condition
	}
	return s
}

// A HorizonError is the answer that a temperature is not reached within the time that was solved for.
type HorizonError struct {
	Place   string      // where, such as "centre"
	Target  Temperature // what was asked
	Horizon Duration    // how long was solved for
	Reached Temperature // the temperature of the place then
	Limit   Temperature // what it tends to if conditions stay as then
}

// Error says how far the place has come, and the limit.
func (e *HorizonError) Error() string {
	return fmt.Sprintf("the %s does not reach %v within %v: it is at %v then and tends to %v",
		e.Place, e.Target, e.Horizon, e.Reached, e.Limit)
}

// A ConvergenceError reports a computation that was given up. What was computed until then stays
// readable where the solver says so.
type ConvergenceError struct {
	Method string   // which computation
	Time   Duration // how far it came in the time of the problem
	Place  string   // where it failed; empty where it has no place
	Reason string   // why, with the remedy
	Cause  error    // the error that ended it, if one did; errors.Is and errors.As look into it
}

// Error says where the computation ended, and why.
func (e *ConvergenceError) Error() string {
	s := e.Method + ": given up at " + e.Time.String()
	if e.Place != "" {
		s += " at the " + e.Place
	}
	s += ": " + e.Reason
	if e.Cause != nil {
		s += ": " + e.Cause.Error()
	}
	return s
}

// Unwrap returns the cause.
func (e *ConvergenceError) Unwrap() error { return e.Cause }

// A DimensionError reports an operation on a [Value] that its dimension does not allow.
type DimensionError struct {
	Operation string // such as "take the logarithm of"
	Operand   string // the value with its dimension
	Accepted  string // what would have been accepted
}

// Error names the operation, the operand and what is accepted.
func (e *DimensionError) Error() string {
	return "cannot " + e.Operation + " " + e.Operand + "; accepted: " + e.Accepted
}
