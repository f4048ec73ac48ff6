package correlations

import (
	"iter"
	"strings"

	"example.com/coolward/units"
)

// all is never written to.
var all = [...]*record{
	&sphereConduction,
	&churchillSphere,
	&yugeSphereNatural,
	&yugeSphereRayleigh,
	&amatoTienSphere,
	&raithbyHollandsSphere,
	&ranzMarshallSphere,
	&whitakerSphere,
	&froesslingSphere,
	&cliftSphere,
	&cliftSphereShort,
	&yugeSphereForced,
	&mcAdamsSphere,
	&achenbachSphere,
	&achenbachSphereSupercritical,
	&gnielinskiSphere,
	&melissariSphere,
	&witteSphere,
	&kramersSphere,
	&acrivosGoddardSphere,
	&combinedSphere,
	&churchillChuCylinder,
	&churchillChuCylinderLaminar,
	&morganCylinderNatural,
	&churchillBernsteinCylinder,
	&churchillBernsteinCylinderMiddle,
	&nakaiOkazakiCylinder,
	&hilpertCylinder,
	&morganCylinderForced,
	&zukauskasCylinder,
	&whitakerCylinder,
	&sparrowCylinder,
	&fandCylinder,
	&fandCylinderShort,
	&khanCylinder,
	&khanCylinderFlux,
	&kramersCylinder,
	&ishiguroCylinder,
	&collisWilliamsWire,
	&jakobSquareCornerOn,
	&jakobSquareFaceOn,
	&jakobHexagonFaceOn,
	&jakobHexagonCornerOn,
	&jakobPlateNormal,
	&bedingfieldDrewCylinder,
	&leFevreEdeCylinder,
	&popielCylinder,
	&plateLaminarLocal,
	&plateLaminar,
	&plateLiquidMetalLocal,
	&plateLiquidMetal,
	&churchillOzoePlateLocal,
	&churchillOzoePlate,
	&churchillOzoePlateFluxLocal,
	&plateTurbulentLocal,
	&plateTurbulent,
	&plateMixed,
	&whitakerPlateMixed,
	&gnielinskiPlate,
	&schultzGrunowPlateLocal,
	&unheatedPlateLaminarLocal,
	&unheatedPlateTurbulentLocal,
	&unheatedPlateLaminar,
	&unheatedPlateTurbulent,
	&plateFluxLaminarLocal,
	&plateFluxTurbulentLocal,
	&churchillChuPlate,
	&churchillChuPlateLaminar,
	&churchillChuPlateFlux,
	&mcAdamsPlateVertical,
	&leFevrePlateLocal,
	&leFevrePlate,
	&eckertPlateLocal,
	&vlietPlateFluxLocal,
	&vlietPlateFluxTurbulent,
	&churchillChuPlateInclined,
	&fujiiImuraPlateDown,
	&fujiiImuraPlateUp,
	&horizontalPlateUp,
	&mcAdamsPlateDown,
	&radziemskaPlateDown,
	&goldsteinPlateUp,
	&fujiiImuraPlateFluxDown,
	&fujiiImuraPlateFluxUp,
	&barCohenChannel,
	&barCohenChannelOneSide,
	&barCohenChannelFlux,
	&barCohenChannelFluxOneSide,
	&barCohenChannelFluxMiddle,
	&elenbaasChannel,
	&cattonEnclosureLow,
	&cattonEnclosure,
	&macGregorEmeryEnclosure,
	&macGregorEmeryEnclosureTurbulent,
	&elSherbinyEnclosure,
	&globeDropkinLayer,
	&hollandsLayer,
	&raithbyHollandsAnnulus,
	&raithbyHollandsShell,
	&yovanovichBody,
	&yovanovichVanoverbekeBody,
	&sparrowAnsariCylinder,
	&lienhardBody,
	&kingBlock,
	&tubeLaminar,
	&tubeLaminarFlux,
	&hausenTubeLaminar,
	&siederTateTubeLaminar,
	&gnielinskiTubeLaminar,
	&baehrStephanTube,
	&hausenTubeTransition,
	&dittusBoelterHeating,
	&dittusBoelterCooling,
	&siederTateTube,
	&petukhovTube,
	&gnielinskiTube,
	&gnielinskiTubeEntry,
	&gnielinskiTubeAll,
	&sebanShimazakiTube,
	&skupinskiTube,
	&martinJet,
	&martinJetArray,
	&martinSlotJet,
	&martinSlotJetArray,
	&rotatingDisk,
	&rotatingDiskTurbulentLocal,
	&rotatingDiskMixed,
	&kreithRotatingSphere,
	&wakaoBed,
	&gunnBed,
	&gnielinskiBed,
	&zukauskasBankAligned,
	&zukauskasBankStaggered,
	&tubeBankLiquidMetal,
	&bromleyCylinder,
	&bromleySphere,
	&berensonPlate,
	&frederkingClarkSphere,
	&nusseltPlate,
	&nusseltCylinder,
	&nusseltSphere,
	&wavyFilmPlate,
	&turbulentFilmPlate,
}

// All lists every correlation of the package, in the order of its body and regime.
func All() iter.Seq[Correlation] {
	return func(yield func(Correlation) bool) {
		for _, d := range all {
			if !yield(Correlation{d}) {
				return
			}
		}
	}
}

// For lists the correlations for a body, such as "sphere", in a regime; local ones are among them.
func For(body string, regime Regime) iter.Seq[Correlation] {
	return func(yield func(Correlation) bool) {
		for c := range All() {
			if c.Body() == body && c.Regime() == regime && !yield(c) {
				return
			}
		}
	}
}

// Compare evaluates those among the correlations whose published range admits g, which has to be on
// the length that they share. The spread of the results shows how far methods differ.
func Compare(among iter.Seq[Correlation], g Groups) iter.Seq2[Correlation, Result] {
	return func(yield func(Correlation, Result) bool) {
		for c := range among {
			if r, err := c.Nu(g); err == nil && !yield(c, r) {
				return
			}
		}
	}
}

// Lookup returns the correlation of that name. It returns an [*units.ArgumentError] that lists the
// names if there is none.
func Lookup(name string) (Correlation, error) {
	names := make([]string, 0, len(all))
	for c := range All() {
		if c.Name() == name {
			return c, nil
		}
		names = append(names, `"`+c.Name()+`"`)
	}
	return Correlation{}, &units.ArgumentError{Field: "correlation", Value: name, Accepted: strings.Join(names, ", ")}
}
