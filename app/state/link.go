package state

import (
	"bytes"
	"compress/flate"
	"encoding/base64"
	"errors"
	"fmt"
	"io"
	"strings"

	"brinefront/physics/study"
)

// maxLink is how many characters of a study a link may have: far less than
// browsers take (common practice, no source), and a table of some thousand rows.
const maxLink = 1 << 17

// A link holds the study file, compressed with DEFLATE (RFC 1951) and written in
// base64url without padding (RFC 4648, section 5).
var linkText = base64.RawURLEncoding.Strict()

// writeLink is a study as a link holds it.
func writeLink(st study.Study) (string, error) {
	var b bytes.Buffer
	w, err := flate.NewWriter(&b, flate.BestCompression)
	if err != nil {
		panic("state: " + err.Error()) // the level is lawful
	}
	if _, err := io.WriteString(w, study.Write(st)); err != nil {
		panic("state: " + err.Error()) // memory takes everything
	}
	if err := w.Close(); err != nil {
		panic("state: " + err.Error())
	}
	link := linkText.EncodeToString(b.Bytes())
	if len(link) > maxLink {
		return "", fmt.Errorf("it would have %d characters, and at most %d are sure to arrive", len(link), maxLink)
	}
	return link, nil
}

// readLink reads a study out of a link, as strictly as out of a file. A link that
// was cut or changed on its way is refused, and so is one that swells beyond any
// study.
func readLink(link string) (study.Study, error) {
	if len(link) > maxLink {
		return study.Study{}, fmt.Errorf("it has %d characters; at most %d are allowed", len(link), maxLink)
	}
	if strings.ContainsAny(link, "\r\n") {
		return study.Study{}, errBroken // the decoder would pass over them
	}
	packed, err := linkText.DecodeString(link)
	if err != nil {
		return study.Study{}, errBroken
	}
	rest := bytes.NewReader(packed)
	text, err := io.ReadAll(io.LimitReader(flate.NewReader(rest), study.MaxBytes+1))
	switch {
	case err != nil:
		return study.Study{}, errBroken
	case len(text) > study.MaxBytes:
		return study.Study{}, fmt.Errorf("it holds more than %d MB, the most that a study may have", study.MaxBytes>>20)
	case rest.Len() > 0:
		return study.Study{}, errBroken
	}
	return study.Read(string(text))
}

var errBroken = errors.New("it was cut or changed on its way. Copy the whole link again")

// shared copies a link to the study as it stands.
func (m Model) shared() (Model, []Effect) {
	link, err := writeLink(m.Study)
	if err != nil {
		return m.notice("refused", "The study does not fit a link: "+err.Error()+". Save it as a file and send that."), nil
	}
	return m, []Effect{CopyLink{
		Fragment: Route{Sheet: m.Route.Sheet}.fragment() + "?study=" + link,
		Done:     "A link that holds the whole study is on the clipboard. No server sees the study, but everyone who has the link can read it.",
	}}
}
