package study

import (
	"encoding/json"
)

// Write is the study as a file: indented JSON in the order of the document, the
// same text for the same study. Read gives the study back unchanged.
func Write(st Study) string {
	st = st.Clone()
	st.Type, st.Version, st.Program = Type, Version, Program
	text, err := json.MarshalIndent(st, "", "  ")
	if err != nil {
		panic("study: " + err.Error()) // only a NaN or an infinity, which no study in memory holds
	}
	return string(text) + "\n"
}

// Clone copies a study so that changing one leaves the other alone.
func (s Study) Clone() Study {
	c := s
	for _, t := range labTables {
		if columns, source := t.get(&s); columns != nil {
			for i := range columns {
				columns[i] = column(columns[i])
			}
			t.set(&c, columns, source)
		}
	}
	c.Cases = cloneCases(s.Cases)
	for _, spec := range specs {
		if in := spec.Get(&s); in != nil {
			copied := *in
			copied.Low, copied.High = number(in.Low), number(in.High)
			spec.Set(&c, &copied)
		}
	}
	return c
}

// column copies a column; a document's column is a list, empty rather than null.
func column(values []float64) []float64 { return append([]float64{}, values...) }

func number(n *float64) *float64 {
	if n == nil {
		return nil
	}
	copied := *n
	return &copied
}
