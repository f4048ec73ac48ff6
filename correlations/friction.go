package correlations

import (
	"math"

	"example.com/coolward/units"
)

// The friction factors are those of Darcy: pressure drop × diameter / (length × ρ speed²/2), 64/Re in
// laminar flow. All stand from memory. Roughness is the height of the roughness over the diameter. They
// return a [*units.RangeError] outside their range and an [*units.ArgumentError] for what is no number.

// PetukhovFriction returns the friction factor of turbulent flow in a smooth tube,
//
//	f = (0.790 ln Re - 1.64)^(-2)
//
// for Re 3000 to 5e6. It is from B. S. Petukhov, Adv. Heat Transfer 6 (1970) 503-564.
func PetukhovFriction(re float64) (float64, error) {
	if err := friction("Petukhov friction", "B. S. Petukhov 1970", re, within(Reynolds, "3000", "5e6")); err != nil {
		return 0, err
	}
	return petukhov(re), nil
}

// BlasiusFriction returns the friction factor of turbulent flow in a smooth tube,
//
//	f = 0.3164 Re^(-1/4)
//
// for Re 4e3 to 1e5. It is from H. Blasius 1913.
func BlasiusFriction(re float64) (float64, error) {
	if err := friction("Blasius friction", "H. Blasius 1913", re, within(Reynolds, "4e3", "1e5")); err != nil {
		return 0, err
	}
	return 0.3164 / quarter(re), nil
}

// HaalandFriction returns the friction factor of turbulent flow in a tube,
//
//	f^(-1/2) = -1.8 log10((roughness/3.7)^1.11 + 6.9/Re)
//
// for Re 4e3 to 1e8 and a roughness up to 0.05. It is from S. E. Haaland, J. Fluids Eng. 105 (1983) 89-90.
func HaalandFriction(re, roughness float64) (float64, error) {
	if err := rough("Haaland friction", "S. E. Haaland 1983", re, roughness); err != nil {
		return 0, err
	}
	x := 1.8 * math.Log10(power(roughness/3.7, 1.11)+6.9/re)
	return 1 / (x * x), nil
}

// ColebrookFriction returns the friction factor of turbulent flow in a tube, the solution of
//
//	f^(-1/2) = -2 log10(roughness/3.7 + 2.51/(Re f^(1/2)))
//
// for Re 4e3 to 1e8 and a roughness up to 0.05. It is from C. F. Colebrook, J. Inst. Civ. Eng. 11 (1939)
// 133-156.
func ColebrookFriction(re, roughness float64) (float64, error) {
	if err := rough("Colebrook friction", "C. F. Colebrook 1939", re, roughness); err != nil {
		return 0, err
	}
	// Newton's method for x = f^(-1/2). The function x + 2 log10(a + b x) rises and is concave in x, so
	// that it converges from the left; it takes four steps.
	a, b := roughness/3.7, 2.51/re
	x := 3.0
	for range 20 {
		step := (x + 2*math.Log10(a+b*x)) / (1 + 2*b/(math.Ln10*(a+b*x)))
		x -= step
		if math.Abs(step) <= 1e-15*x {
			break
		}
	}
	return 1 / (x * x), nil
}

// ChurchillFriction returns the friction factor of laminar and turbulent flow in a tube,
//
//	f = 8 ((8/Re)^12 + (A + B)^(-3/2))^(1/12)
//	A = (2.457 ln(1/((7/Re)^0.9 + 0.27 roughness)))^16, B = (37530/Re)^16
//
// for Re 1 to 1e8 and a roughness up to 0.05. It is from S. W. Churchill, Chem. Eng. 84 (1977) no. 24, 91-92.
func ChurchillFriction(re, roughness float64) (float64, error) {
	const source = "S. W. Churchill 1977"
	if err := friction("Churchill friction", source, re, within(Reynolds, "1", "1e8")); err != nil {
		return 0, err
	}
	if err := friction("Churchill friction", source, roughness, roughnesses); err != nil {
		return 0, err
	}
	a := math.Pow(2.457*math.Log(1/(power(7/re, 0.9)+0.27*roughness)), 16)
	b := math.Pow(37530/re, 16)
	return 8 * math.Pow(math.Pow(8/re, 12)+math.Pow(a+b, -1.5), 1.0/12), nil
}

var roughnesses = within(Roughness, "0", "0.05")

func rough(model, source string, re, roughness float64) error {
	if err := friction(model, source, re, within(Reynolds, "4e3", "1e8")); err != nil {
		return err
	}
	return friction(model, source, roughness, roughnesses)
}

func friction(model, source string, x float64, r Range) error {
	if math.IsNaN(x) {
		return &units.ArgumentError{Field: model + ": " + r.Group.String(), Value: x, Accepted: "a number"}
	}
	if !r.Admits(x) {
		return r.outside(model, source, x)
	}
	return nil
}
