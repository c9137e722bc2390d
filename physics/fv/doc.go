// Package fv steps a scalar conservation law on the unit length by finite volumes: explicit
// ones in a Run, implicit ones, with capillary diffusion where there is any, in an Implicit. It
// knows flux functions, not rocks.
//
//	dS/dQ + df(S)/dx = 0,  0 < x < 1,  S(0, Q) injected, S(x, 0) initial
//
// Q is the volume injected, in pore volumes when S is a saturation and f a fractional
// flow. The unit length is cut into N equal cells, dx = 1/N; what leaves one through a
// face enters the next:
//
//	S_i(Q+dQ) = S_i(Q) - (dQ/dx) (F_(i+1/2) - F_(i-1/2))
//
// F is the flux of Godunov (1959), exact for any f, inflections and turning points
// included; where f rises it is single-point upstream. First order takes the cells as
// constant. Its truncation acts like a diffusion (f' dx/2)(1 - CFL), LeVeque (2002), sec. 8.6.
// Second order puts a limited slope into each cell, MUSCL of van Leer (1979), and takes two
// stages a step.
//
// Stability: CFL = max|df/ds| dQ/dx up to 1 at first order and up to 1/2 at second
// order. Then no cell leaves the range of its neighbours, itself included, so that no
// new extrema arise: at first order since the scheme is monotone (Crandall & Majda 1980), at
// second order since a cell is the mean of its two face states, each of which takes such
// a monotone step twice as long (Perthame & Shu 1996). The first-order scheme converges
// to the entropy solution for every f.
package fv
