// Package pattern is the geometry of flow between wells that are repeated without end:
// the potential of a pattern at unit mobility, its streamlines and streamtubes, the area
// they sweep, and what converging flow takes near the wells.
//
// A streamtube is a body with a varying cross-section: how its pore volume and its
// geometric resistance go together is all that a displacement along it needs to know.
// Streamtubes (Higgins & Leighton 1962) are those of unit mobility and stay where they
// are while the mobilities change; what changes is the resistance of each, and with it
// the share of the injection it takes. That is the stated limit of the method.
//
// Lengths are in units of the distance d between unlike wells or rows; see Kind.
package pattern
