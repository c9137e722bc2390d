package serve

import (
	"bytes"
	"encoding/json"
	"time"

	"brinefront/app/wire"
	"brinefront/physics/study"
)

const (
	drawn = 100 * time.Millisecond // how often a part that grows is worth drawing
	heard = 8 * time.Millisecond   // how long a newer request may have to wait
)

// pieces answers the sheet that is looked at as soon as it is computed, and while it
// grows; the others together, or now and then when they take long. It ends when
// another request for pieces has come, which may go on from here: then all that was
// computed has been sent.
func pieces(d *Desk, asked wire.Request, send func(wire.Reply, ...[]byte), turn func()) {
	if asked.Study != nil {
		d.evaluation = d.memory.Begin(*asked.Study)
	}
	if d.evaluation == nil {
		panic("a request for pieces that holds no study and follows none")
	}
	var held [][]byte
	sent, turned := time.Now(), time.Now()
	for piece := range d.evaluation.Pieces(asked.First) {
		now := time.Now()
		whole, shown, due := piece.Part.Left == 0, piece.Sheet == asked.First, now.Sub(sent) > drawn
		if whole || shown && due {
			held = append(held, d.written(piece))
		}
		if len(held) > 0 && (shown || due) {
			send(wire.Reply{More: true}, held...)
			held, sent = nil, now
		}
		if whole || now.Sub(turned) > heard {
			turn()
			turned = time.Now()
			if d.superseded() {
				send(wire.Reply{More: true}, held...)
				return
			}
		}
	}
	send(wire.Reply{}, held...)
}

// written is a piece as it travels. A part that is as it was last sent does not.
func (d *Desk) written(p study.Piece) []byte {
	rest, numbers := wire.Pack(p.Part)
	text := encoded(wire.Piece{Sheet: p.Sheet, Part: &rest, Numbers: numbers})
	if bytes.Equal(d.sent[p.Sheet], text) {
		return encoded(wire.Piece{Sheet: p.Sheet})
	}
	if d.sent == nil {
		d.sent = map[study.Sheet][]byte{}
	}
	d.sent[p.Sheet] = text
	return text
}

func encoded(p wire.Piece) []byte {
	text, err := json.Marshal(p)
	if err != nil {
		panic(err) // a part that holds what JSON cannot say, as NaN
	}
	return text
}
