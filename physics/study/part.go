package study

// Figure finds a figure of the part by its ID.
func (p Part) Figure(id string) (Figure, bool) {
	for _, f := range p.Figures {
		if f.ID == id {
			return f, true
		}
	}
	return Figure{}, false
}
