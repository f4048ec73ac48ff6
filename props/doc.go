// Package props gives the thermophysical properties of fluids and solids.
package props
