package study

import (
	"reflect"
	"slices"

	"brinefront/physics/fit"
)

// Memory runs studies like Run does and keeps the last fit of each family, the last match and the last patterns of wells, for a
// caller that runs a study again and again with little changed: a fit depends on the
// laboratory points and its options alone, streamtubes on the pattern alone. Results
// are the same to the last bit.
//
// The zero value is ready; a nil Memory remembers nothing. It is not for several
// goroutines at once.
type Memory struct {
	last     map[string]remembered
	patterns map[cut]repeated
}

type remembered struct {
	points, options any
	fit             any
	err             error
}

// through draws a family through the points, or remembers that it did.
func (m *Memory) through(f family, points fit.Points, options fit.Options) (fit.Fit, error) {
	kept := points // the caller's columns may be written to
	kept.Sw, kept.Krw, kept.Kro = slices.Clone(points.Sw), slices.Clone(points.Krw), slices.Clone(points.Kro)
	return recall(m, f.kind, kept, options, func() (fit.Fit, error) { return f.through(points, options) })
}

// recall is what run gives, or gave the last time this kind was asked for with the same
// points and options. They are kept as they are, and not to be written to.
func recall[F any](m *Memory, kind string, points, options any, run func() (F, error)) (F, error) {
	if m == nil {
		return run()
	}
	if was, ok := m.last[kind]; ok && reflect.DeepEqual(was.points, points) && reflect.DeepEqual(was.options, options) {
		return was.fit.(F), was.err
	}
	f, err := run()
	if m.last == nil {
		m.last = map[string]remembered{}
	}
	m.last[kind] = remembered{points, options, f, err}
	return f, err
}
