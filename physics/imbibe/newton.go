package imbibe

import "math"

// response is how a panel answers changes of P at its right edge, of Q at its left edge
// and of K: each vector holds the part of its own, of P, of Q and of K.
type response struct {
	w    [4][order]float64 // changes of w
	p    [3]float64        // change of P at the left edge: own, by P at the right, by K
	from [3]float64        // change of Q at the left edge: own, by P there, by K
}

// newton takes one step towards  w gap = K source,  gap = u P + Q - R rise,  Q(S0) = total.
//
// On a panel the equations are dense and small; between panels only P and Q pass. A
// sweep from the left carries the linear relation between Q, P and K at each edge, the last
// edge gives K, and a sweep back gives the rest.
func (s *solver) newton() {
	answers := s.answers[:len(s.panels)]
	from := [3]float64{}
	for i := range s.panels {
		from = s.eliminate(&s.panels[i], &answers[i], from)
	}
	end := &s.panels[len(s.panels)-1]
	_, q := end.sum()
	dk := (s.total - end.left - q - from[0]) / from[2]
	dp := 0.0
	for i := len(s.panels) - 1; i >= 0; i-- {
		p, a := &s.panels[i], &answers[i]
		dpl := a.p[0] + a.p[1]*dp + a.p[2]*dk
		dql := a.from[0] + a.from[1]*dpl + a.from[2]*dk
		for j := range p.w {
			a.w[0][j] += a.w[1][j]*dp + a.w[2][j]*dql + a.w[3][j]*dk
		}
		// the panel's own w no longer needs its second vector: it takes the changes of the gap
		for j := range p.w {
			prime, q := dp, dql
			for n, dw := range a.w[0] {
				prime += p.half() * (gauss.weight[n] - gauss.left[j][n]) * dw
				q += p.half() * gauss.left[j][n] * p.u[n] * dw
			}
			a.w[1][j] = p.u[j]*prime + q + s.miss(p, j)
		}
		dp = dpl
	}
	cut(&s.k, dk)
	for i := range s.panels {
		p, a := &s.panels[i], &answers[i]
		for j := range p.w {
			cut(&p.w[j], a.w[0][j])
			cut(&p.gap[j], a.w[1][j])
		}
	}
	s.integrate()
}

// cut adds a change to a positive number and leaves it a tenth at least. Each unknown is cut
// for itself: one step length for all would be that of the worst, and where f has corners
// the iteration then stands still. What is missed for that, the next step sees.
func cut(v *float64, change float64) { *v += max(change, -0.9**v) }

// miss is by how much the gap of a point differs from that of the w.
func (s *solver) miss(p *panel, j int) float64 {
	prime, q := p.state(&gauss.left[j])
	return p.u[j]*prime + q - s.ratio*p.rise[j] - p.gap[j]
}

// eliminate solves for the changes of w on a panel and returns the relation between Q, P
// and K at its right edge.
func (s *solver) eliminate(p *panel, a *response, from [3]float64) [3]float64 {
	var m [order][order]float64
	h := p.half()
	for i := range p.w {
		pull := p.w[i] / p.gap[i]
		for j := range p.w {
			m[i][j] = pull * h * (p.u[i]*(gauss.weight[j]-gauss.left[i][j]) + gauss.left[i][j]*p.u[j])
		}
		m[i][i]++
		a.w[0][i] = s.k*p.source[i]/p.gap[i] - p.w[i] - pull*s.miss(p, i)
		a.w[1][i] = -pull * p.u[i]
		a.w[2][i] = -pull
		a.w[3][i] = p.source[i] / p.gap[i]
	}
	solve(&m, &a.w)
	var prime, q [4]float64
	for n := range a.w {
		for j, w := range a.w[n] {
			prime[n] += h * gauss.weight[j] * w
			q[n] += h * gauss.weight[j] * p.u[j] * w
		}
	}
	prime[1]++
	q[2]++
	a.from = from
	less := 1 - prime[2]*from[1]
	a.p = [3]float64{(prime[0] + prime[2]*from[0]) / less, prime[1] / less, (prime[3] + prime[2]*from[2]) / less}
	ql := [3]float64{from[0] + from[1]*a.p[0], from[1] * a.p[1], from[2] + from[1]*a.p[2]}
	return [3]float64{q[0] + q[2]*ql[0], q[1] + q[2]*ql[1], q[3] + q[2]*ql[2]}
}

// solve replaces four right-hand sides by the solutions, by elimination with row pivots.
func solve(m *[order][order]float64, b *[4][order]float64) {
	for i := range m {
		best := i
		for r := i + 1; r < order; r++ {
			if math.Abs(m[r][i]) > math.Abs(m[best][i]) {
				best = r
			}
		}
		m[i], m[best] = m[best], m[i]
		for n := range b {
			b[n][i], b[n][best] = b[n][best], b[n][i]
		}
		for r := i + 1; r < order; r++ {
			times := m[r][i] / m[i][i]
			if times == 0 {
				continue
			}
			for c := i + 1; c < order; c++ {
				m[r][c] -= times * m[i][c]
			}
			for n := range b {
				b[n][r] -= times * b[n][i]
			}
		}
	}
	for n := range b {
		for i := order - 1; i >= 0; i-- {
			for c := i + 1; c < order; c++ {
				b[n][i] -= m[i][c] * b[n][c]
			}
			b[n][i] /= m[i][i]
		}
	}
}
