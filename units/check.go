package units

import "strconv"

// CheckPositive returns an [*ArgumentError] for field unless q is finite and above zero.
func CheckPositive[D Dimension](field string, q Quantity[D]) error {
	if q.si > 0 && q.IsFinite() {
		return nil
	}
	return &ArgumentError{field, q, "finite and above 0 " + kindOf[D]().units[0].symbol}
}

// CheckNotNegative returns an [*ArgumentError] for field unless q is finite and not below zero.
func CheckNotNegative[D Dimension](field string, q Quantity[D]) error {
	if q.si >= 0 && q.IsFinite() {
		return nil
	}
	return &ArgumentError{field, q, "finite and not below 0 " + kindOf[D]().units[0].symbol}
}

// CheckFinite returns an [*ArgumentError] for field unless q is finite.
func CheckFinite[D Dimension](field string, q Quantity[D]) error {
	if q.IsFinite() {
		return nil
	}
	return &ArgumentError{field, q, "finite"}
}

// CheckTemperature returns an [*ArgumentError] for field unless t is finite and above 0 K.
func CheckTemperature(field string, t Temperature) error {
	if t.kelvin > 0 && t.IsFinite() {
		return nil
	}
	value := any(t.dynamicOn(Kelvin))
	if t.kelvin != 0 { // a forgotten one is 0 K; the others were given on some scale
		value = t.dynamicOn(Kelvin).String() + " (" + t.String() + ")"
	}
	return &ArgumentError{field, value, "finite and above 0 K"}
}

// CheckNumber returns an [*ArgumentError] for field unless min ≤ x ≤ max.
func CheckNumber(field string, x, min, max float64) error {
	if x >= min && x <= max && isFinite(x) {
		return nil
	}
	return &ArgumentError{field, x, "finite, from " + strconv.FormatFloat(min, 'g', -1, 64) + " to " + strconv.FormatFloat(max, 'g', -1, 64)}
}
