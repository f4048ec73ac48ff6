package series

import (
	"context"

	"example.com/coolward/units"
)

// checkSolid returns what is wrong with the properties of a body, or with a context, first of all the error of a
// context that is done.
func checkSolid(ctx context.Context, k units.Conductivity, rho units.Density, c units.SpecificHeat) error {
	if ctx == nil {
		return &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if err := ctx.Err(); err != nil {
		return err
	}
	if err := units.CheckPositive("conductivity", k); err != nil {
		return err
	}
	if err := units.CheckPositive("density", rho); err != nil {
		return err
	}
	return units.CheckPositive("specific heat", c)
}
