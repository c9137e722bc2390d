// Package pattern floods the rock between repeated wells: the potential flow of a well
// pattern, cut into streamtubes, each of which carries an exact linear displacement.
//
// Streamtubes (Higgins & Leighton 1962) are those of unit mobility and stay where they
// are while the mobilities change; what changes is the resistance of each tube, and with
// it the share of the injection that it takes. That is the stated limit of the method.
package pattern

// Response is what a body of rock between wells does under a pressure difference, freed
// of its size. With k the permeability, phi the porosity, A the area of the pattern and
// dp the pressure difference between its wells,
//
//	theta = k/(phi A) int dp dt    (Pa s)
//
// fixes everything, whatever the history of dp: layers of the same curves under common
// wells differ in k/phi only, and a given rate fixes dp. Thickness cancels.
type Response interface {
	// At is the state at theta >= 0.
	At(theta float64) Point
	// Theta is the inverse: the theta at which pvi pore volumes of the pattern are injected.
	Theta(pvi float64) float64
}

// Point is the state of a pattern, volumes in pore volumes of it at reservoir conditions.
// Rates are slopes against theta, 1/(Pa s): the injection rate in m3/s is
// Rate k h dp, with h the thickness.
type Point struct {
	PVI, Rate        float64 // injected
	Oil, OilRate     float64 // produced
	Water, WaterRate float64 // produced
	Recovery         float64 // mean saturation less the initial one
	Swept            float64 // areal sweep: the part of the area behind the foremost front
}
