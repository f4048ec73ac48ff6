// Package uncertain says how sure an answer is: it takes inputs with their uncertainties through any function, and so
// through every model of this module or of the caller, without the model's knowing.
//
//	var s uncertain.Study
//	d := uncertain.Add(&s, "diameter", uncertain.PlusMinus(units.Millimetre.Of(60), units.Millimetre.Of(0.5)).Rectangular(), uncertain.Source("calliper"))
//	h := uncertain.Add(&s, "h", uncertain.WithinFactor(units.WattPerSquareMetreKelvin.Of(12), 1.25).LogNormal(0.95), uncertain.Model("scatter of the correlation"))
//	room := uncertain.Add(&s, "room", uncertain.Between(units.Celsius.Of(3), units.Celsius.Of(5)).ArcSine(), uncertain.Assumed("as last winter"))
//
//	r, err := uncertain.Propagate(ctx, &s, func(x uncertain.Draw) (units.Duration, error) {
//		return timeToCool(d.In(x), h.In(x), room.In(x))
//	})
//	fmt.Println(r)                     // about 38 min, 31 to 48 min at 95 %
//	r.High.In(units.Minute)            // 47.6…
//	r.Shares, r.Halvings               // where the spread comes from, and what measuring better would bring
//
// # Inputs
//
// An input has a name, a distribution, and an [Origin]: a [Source], [Assumed], or [Model] for the uncertainty of a model
// itself, which is a factor of the answer or of a coefficient and an input like any other. A distribution is stated as
// limits ([PlusMinus], [Between], [PerCent], [WithinFactor]) with a shape within them, or by a standard uncertainty
// ([Normal], [StudentT]), repeated readings ([Readings]) or a sample of a population ([Sampled]). It may be of a quantity, of a
// temperature (a point, with a spread in kelvins), or of a plain [Number]; the compiler keeps them apart. Inputs may be
// correlated ([Study.Correlate], [Study.CorrelateRanks]).
//
// # Two ways
//
// [Propagate] draws from the distributions (JCGM 101:2008, the Monte Carlo method of the Guide to the Expression of Uncertainty in
// Measurement): the answer may be asymmetric, and some cases may have none. [Linearise] uses the law of propagation of uncertainty (JCGM
// 100:2008, the GUM): two evaluations for each input, right where the model is straight over the uncertainties.
// [Validate] compares the two.
//
// A case whose temperature is never reached, which leaves the range of a source, or which fails in another way is counted by its
// kind and never dropped silently: "97 % of the cases have an answer (3 % never reach it); of those about …".
//
// # Digits
//
// The same [Study.Seed] gives the same digits on any number of workers. Every number of a result comes with the error that a
// finite number of trials leaves, from the scatter between independent blocks of trials. In the tests these errors hold for 93 to 97 %
// of a thousand seeds, as they should. Texts show the digits that are known; the numbers beneath are whole.
//
// What a result cannot know is an error of the model that no input stands for, and a distribution that was stated too narrow.
package uncertain
