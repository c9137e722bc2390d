package state

import (
	"strings"

	"brinefront/app/plot"
	"brinefront/physics/report"
	"brinefront/physics/study"
)

// exported hands over what was asked for. Answers go out only with the study they
// answer: while they are being computed the export is owed, and follows.
func (m Model) exported(what string) (Model, []Effect) {
	if what == "damaged" {
		if m.Damaged == "" {
			return m, nil
		}
		return m, []Effect{Download{Name: "kept-and-damaged.txt", Mime: "text/plain", Data: m.Damaged}}
	}
	write, ok := exports[what]
	if !ok {
		return m, nil
	}
	if m.Computing {
		m.owed = what
		return m, nil
	}
	if m.ResultRevision != m.Revision {
		return m.notice("refused", "There are no answers to write, since the program failed to compute them."), nil
	}
	file := write(m)
	file.Name = m.filename(file.Name)
	return m, []Effect{file}
}

// exports write a file of the answers; the Name they give is its ending.
var exports = map[string]func(Model) Download{
	"report-text": func(m Model) Download {
		return Download{"-report.txt", "text/plain", report.Text(report.Build(m.Study, m.Whole, m.System))}
	},
	"charts-csv": func(m Model) Download {
		return m.sheetsOf("-curves.csv", func(p study.Part, add func(title, csv string)) {
			for _, c := range p.Charts {
				add(c.Title, plot.From(c, m.System).CSV())
			}
		})
	},
	"tables-csv": func(m Model) Download {
		return m.sheetsOf("-tables.csv", func(p study.Part, add func(title, csv string)) {
			for _, g := range p.Tables {
				add(g.Title, report.CSV(g, m.System))
			}
		})
	},
}

// sheetsOf gathers CSV tables of every sheet in one file: each under a line with
// its title, an empty line between.
func (m Model) sheetsOf(ending string, list func(p study.Part, add func(title, csv string))) Download {
	var b strings.Builder
	add := func(title, csv string) {
		if b.Len() > 0 {
			b.WriteString("\r\n")
		}
		b.WriteString(`"` + strings.ReplaceAll(title, `"`, `""`) + "\"\r\n" + csv)
	}
	for _, sheet := range study.Sheets() {
		list(m.Whole.Parts[sheet], add)
	}
	return Download{ending, "text/csv", b.String()}
}
