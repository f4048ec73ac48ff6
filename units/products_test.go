package units

import (
	"math"
	"testing"
	"testing/quick"
)

// Each product agrees with the dynamic algebra, which finds the dimension by itself.
func TestProductsHaveTheirDimension(t *testing.T) {
	check := func(name string, got Value, want Value, err error) bool {
		if err != nil || got.dim != want.dim || math.Abs(got.si-want.si) > 4e-16*math.Abs(want.si) {
			t.Logf("%s is %v in %s, the algebra gives %v in %s, %v", name, got.si, got.dim, want.si, want.dim, err)
			return false
		}
		return true
	}
	f := func(seeds [4]float64) bool {
		var x [4]float64
		for i, s := range seeds {
			x[i] = math.Exp(math.Mod(s, 8))
		}
		times := func(a, b Value) (Value, error) { return a.Mul(b) }
		over := func(a, b Value) (Value, error) { return a.Div(b) }
		ok := true
		test := func(name string, got Value, op func(a, b Value) (Value, error), a, b Value) {
			want, err := op(a, b)
			ok = check(name, got, want, err) && ok
		}
		l, a, v, m, tm := Metre.Of(x[0]), SquareMetre.Of(x[1]), CubicMetre.Of(x[2]), Kilogram.Of(x[3]), Second.Of(x[0])
		k, rho, c := WattPerMetreKelvin.Of(x[0]), KilogramPerCubicMetre.Of(x[1]), JoulePerKilogramKelvin.Of(x[2])
		h, q, d, p := WattPerSquareMetreKelvin.Of(x[0]), WattPerSquareMetre.Of(x[1]), KelvinDifference.Of(x[2]), Watt.Of(x[3])
		mu, flux, latent := PascalSecond.Of(x[0]), KilogramPerSquareMetreSecond.Of(x[1]), JoulePerKilogram.Of(x[2])
		r, resistance := SquareMetreKelvinPerWatt.Of(x[0]), KelvinPerWatt.Of(x[1])
		capacity, conductance, gradient := JoulePerKelvin.Of(x[0]), WattPerKelvin.Of(x[1]), KelvinPerMetre.Of(x[2])
		test("area", AreaOf(l, l).Dynamic(), times, l.Dynamic(), l.Dynamic())
		test("volume", VolumeOf(a, l).Dynamic(), times, a.Dynamic(), l.Dynamic())
		test("mass", MassOf(rho, v).Dynamic(), times, rho.Dynamic(), v.Dynamic())
		test("volumetric heat capacity", VolumetricHeatCapacityOf(rho, c).Dynamic(), times, rho.Dynamic(), c.Dynamic())
		test("heat capacity", HeatCapacityOf(rho, c, v).Dynamic(), times, VolumetricHeatCapacityOf(rho, c).Dynamic(), v.Dynamic())
		test("diffusivity", DiffusivityOf(k, rho, c).Dynamic(), over, k.Dynamic(), VolumetricHeatCapacityOf(rho, c).Dynamic())
		test("kinematic viscosity", KinematicViscosityOf(mu, rho).Dynamic(), over, mu.Dynamic(), rho.Dynamic())
		test("flux", FluxOf(h, d).Dynamic(), times, h.Dynamic(), d.Dynamic())
		test("power", PowerOf(q, a).Dynamic(), times, q.Dynamic(), a.Dynamic())
		test("energy", EnergyOf(p, tm).Dynamic(), times, p.Dynamic(), tm.Dynamic())
		test("heat", HeatOf(capacity, d).Dynamic(), times, capacity.Dynamic(), d.Dynamic())
		test("conductance", ConductanceOf(h, a).Dynamic(), times, h.Dynamic(), a.Dynamic())
		test("time constant", TimeConstantOf(capacity, conductance).Dynamic(), over, capacity.Dynamic(), conductance.Dynamic())
		test("distance", DistanceOf(MetrePerSecond.Of(x[0]), tm).Dynamic(), times, MetrePerSecond.Of(x[0]).Dynamic(), tm.Dynamic())
		test("conduction", ConductionFluxOf(k, gradient).Dynamic(), times, k.Dynamic(), gradient.Dynamic())
		test("gradient", GradientOf(d, l).Dynamic(), over, d.Dynamic(), l.Dynamic())
		test("rate", RateOf(d, tm).Dynamic(), over, d.Dynamic(), tm.Dynamic())
		test("coefficient", CoefficientOf(q, d).Dynamic(), over, q.Dynamic(), d.Dynamic())
		test("insulance", InsulanceOf(l, k).Dynamic(), over, l.Dynamic(), k.Dynamic())
		test("resistance", ResistanceOf(r, a).Dynamic(), over, r.Dynamic(), a.Dynamic())
		test("driven power", DrivenPowerOf(d, resistance).Dynamic(), over, d.Dynamic(), resistance.Dynamic())
		test("heat source", HeatSourceOf(p, v).Dynamic(), over, p.Dynamic(), v.Dynamic())
		test("latent heat", LatentHeatOf(m, latent).Dynamic(), times, m.Dynamic(), latent.Dynamic())
		test("mass flow", MassFlowOf(flux, a).Dynamic(), times, flux.Dynamic(), a.Dynamic())
		test("evaporation", EvaporationFluxOf(flux, latent).Dynamic(), times, flux.Dynamic(), latent.Dynamic())
		e := EffusivityOf(k, rho, c).Dynamic()
		square, err := e.Mul(e)
		want, err2 := k.Dynamic().Mul(VolumetricHeatCapacityOf(rho, c).Dynamic())
		if err != nil || err2 != nil || square.dim != want.dim || math.Abs(square.si/want.si-1) > 1e-15 {
			t.Logf("effusivity squared is %v in %s, want %v in %s", square.si, square.dim, want.si, want.dim)
			ok = false
		}
		return ok
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
}
