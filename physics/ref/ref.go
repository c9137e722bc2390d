// Package ref is the bibliography: the one place where a source is spelled out.
// Everything else names a source by its ID.
package ref

import "sort"

// ID names a source. It is short and stable: it travels in results and reports.
type ID string

// Source is a bibliographic entry.
type Source struct {
	ID      ID
	Authors string
	Year    int
	Title   string
	Where   string // journal, volume, pages; publisher; standard number
}

// Short is the author-year form used beside a figure, e.g. "Welge (1952)".
func (s Source) Short() string { return s.Authors + " (" + itoa(s.Year) + ")" }

// Long is the full entry used in the report's list of sources.
func (s Source) Long() string {
	return s.Authors + " (" + itoa(s.Year) + ") " + s.Title + ". " + s.Where + "."
}

// Get returns the source with the given ID. It panics when there is none: an ID
// is written by a programmer, never by a user.
func Get(id ID) Source {
	s, ok := sources[id]
	if !ok {
		panic("ref: no source with ID " + string(id))
	}
	s.ID = id
	return s
}

// All returns every source, ordered by authors, then year.
func All() []Source {
	all := make([]Source, 0, len(sources))
	for id := range sources {
		all = append(all, Get(id))
	}
	sort.Slice(all, func(i, j int) bool {
		if all[i].Authors != all[j].Authors {
			return all[i].Authors < all[j].Authors
		}
		return all[i].Year < all[j].Year
	})
	return all
}

func itoa(year int) string {
	digits := [4]byte{}
	for i := 3; i >= 0; i-- {
		digits[i] = byte('0' + year%10)
		year /= 10
	}
	return string(digits[:])
}
