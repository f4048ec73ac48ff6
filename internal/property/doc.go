// Package property holds the equations of the substances as kernels on plain SI numbers: kelvin,
// pascal, kilogram per cubic metre, joule, watt. It knows neither units nor ranges; package props
// checks the range before it calls a kernel.
package property
