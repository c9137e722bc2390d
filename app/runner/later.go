package runner

import "time"

// later is an effect that waits a while for a newer one of its kind.
type later struct {
	wait time.Duration
	wish func() // nil: nothing waits
}

// wish has do carried out when the wait is over that the first of several wishes
// began; of these, only the newest is.
func (r *Runner) wish(l *later, do func()) {
	r.mu.Lock()
	waits := l.wish != nil
	l.wish = do
	r.mu.Unlock()
	if waits {
		return
	}
	r.after(l.wait, func() {
		r.mu.Lock()
		newest := l.wish
		l.wish = nil
		r.atWork++
		r.mu.Unlock()
		newest()
		r.rest()
	})
}

// rest ends a piece of work that atWork counts.
func (r *Runner) rest() {
	r.mu.Lock()
	r.atWork--
	r.mu.Unlock()
}
