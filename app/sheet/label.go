package sheet

import "brinefront/physics/report"

// Label names an input as its field does, in the words of the study's fluids.
func (b *Bench) Label(path string) string { return report.Label(&b.model.Study, path) }
