package fluid

import "math"

// Liquid is the state of a liquid at one temperature and pressure.
type Liquid struct {
	Density      float64 // kg/m3
	Viscosity    float64 // Pa s
	HeatCapacity float64 // isobaric, J/(kg K)
}

// Water is pure liquid water at temperature t (K) and pressure p (Pa).
//
// Density and isobaric heat capacity follow from the specific Gibbs energy of
// region 1 of IAPWS-IF97, with pi = p/16.53 MPa and tau = 1386 K/T:
//
//	g/(R T) = gamma = sum n_i (7.1 - pi)^I_i (tau - 1.222)^J_i
//	v  = (R T/p) pi dgamma/dpi
//	cp = -R tau² d²gamma/dtau²
//
// viscosity from that density by WaterViscosity.
//
// Valid for 273.15 K <= t <= 623.15 K and from the saturation pressure up to
// 100 MPa; otherwise the error is a *RangeError. Below the freezing temperature
// at the given pressure, which is at most 0.01 K above 273.15 K, the answer is that
// of undercooled liquid: freezing is not checked.
//
// The release puts the uncertainty of density at 0.001 % at ambient pressure and
// within 0.02 % in the region.
//
// Source: IAPWS R7-97 (2012), eq. 7, tables 2 and 3. The coefficients are from
// memory and checked by the release's own verification table 5.
func Water(t, p float64) (Liquid, error) {
	const of = "IAPWS-IF97 region 1"
	if err := within(of, Temperature, t, zeroCelsius, 623.15); err != nil {
		return Liquid{}, err
	}
	least, err := SaturationPressure(t)
	if err != nil {
		return Liquid{}, err
	}
	if err := within(of, Pressure, p, least, 100e6); err != nil {
		return Liquid{}, err
	}
	pi, tau := p/16.53e6, 1386/t
	x, y := 7.1-pi, tau-1.222
	gammaPi, gammaTauTau := 0.0, 0.0
	for _, c := range region1 {
		xi, yj := power(x, c.i), power(y, c.j)
		gammaPi -= c.n * float64(c.i) * xi / x * yj
		gammaTauTau += c.n * xi * float64(c.j*(c.j-1)) * yj / (y * y)
	}
	const gasConstant = 461.526 // J/(kg K)
	density := p / (gasConstant * t * pi * gammaPi)
	viscosity, err := WaterViscosity(t, density)
	if err != nil {
		return Liquid{}, err
	}
	return Liquid{Density: density, Viscosity: viscosity, HeatCapacity: -gasConstant * tau * tau * gammaTauTau}, nil
}

// SaturationPressure is the pressure (Pa) at which water boils at temperature t (K).
//
//	p/1 MPa = [2 C/(-B + sqrt(B² - 4 A C))]^4
//	theta = t + n9/(t - n10)
//	A = theta² + n1 theta + n2, B = n3 theta² + n4 theta + n5, C = n6 theta² + n7 theta + n8
//
// Valid for 273.15 K <= t <= 647.096 K, the critical temperature; otherwise the
// error is a *RangeError. Source: IAPWS R7-97 (2012), eq. 30 and table 34; from memory,
// checked by the release's verification table 35.
func SaturationPressure(t float64) (float64, error) {
	if err := within("IAPWS-IF97 saturation line", Temperature, t, zeroCelsius, criticalTemperature); err != nil {
		return 0, err
	}
	theta := t - 0.23855557567849/(t-0.65017534844798e3)
	a := horner(theta, -0.72421316703206e6, 0.11670521452767e4, 1)
	b := horner(theta, -0.32325550322333e7, 0.12020824702470e5, -0.17073846940092e2)
	c := horner(theta, 0.40511340542057e6, -0.48232657361591e4, 0.14915108613530e2)
	root := 2 * c / (-b + math.Sqrt(b*b-4*a*c))
	return 1e6 * power(root, 4), nil
}

const criticalTemperature = 647.096

// WaterViscosity is the viscosity (Pa s) of water, liquid or vapour, at temperature
// t (K) and density rho (kg/m3).
//
//	mu = mu0(T) mu1(T, rho) mu2, T = t/647.096 K, rho = rho/322 kg/m3, in units of 1e-6 Pa s
//	mu0 = 100 sqrt(T)/sum H_i/T^i
//	mu1 = exp[rho sum_i (1/T - 1)^i sum_j H_ij (rho - 1)^j]
//
// The critical enhancement mu2 is 1 here: the release allows that for industrial use,
// and it differs from 1 by more than 2 % only next to the critical point.
//
// Valid for 273.15 K <= t <= 1173.15 K and 0 <= rho <= 1200 kg/m3, the span of the
// release's verification table; otherwise the error is a *RangeError. The release bounds
// the range by pressure (300 MPa at all temperatures, more below 873 K); that needs an
// equation of state and is not checked. Uncertainty for liquid water up to 100 MPa and
// 623 K: 1 % to 2 %.
//
// Source: IAPWS R12-08 (2008), eqs. 10 to 12, tables 1 and 2; from memory, checked by
// the release's own verification table 4.
func WaterViscosity(t, rho float64) (float64, error) {
	const of = "IAPWS R12-08 viscosity"
	if err := within(of, Temperature, t, zeroCelsius, 1173.15); err != nil {
		return 0, err
	}
	if err := within(of, Density, rho, 0, 1200); err != nil {
		return 0, err
	}
	tr, dr := t/criticalTemperature, rho/322
	mu0 := 100 * math.Sqrt(tr) / horner(1/tr, 1.67752, 2.20462, 0.6366564, -0.241605)
	exponent := 0.0
	for i := len(residualViscosity) - 1; i >= 0; i-- {
		exponent = exponent*(1/tr-1) + horner(dr-1, residualViscosity[i][:]...)
	}
	return 1e-6 * mu0 * math.Exp(dr*exponent), nil
}
