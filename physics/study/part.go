package study

// Figure finds a figure of the part by its ID.
func (p Part) Figure(id string) (Figure, bool) {
	for i := range p.Figures {
		if p.Figures[i].ID == id {
			return p.Figures[i], true
		}
	}
	return Figure{}, false
}
