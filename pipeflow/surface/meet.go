package surface

// meet is [Profile.join] for a steep pipe that begins at critical depth, carries less than its full-bore capacity and has
// water over critical depth below it, laying only the surfaces that are needed.
//
// There both surfaces use less slope than the pipe has, so that going upstream the tranquil one, the larger in area and the
// slower, loses specific force faster than the rapid one (dM/ds = A (Sf - S0)): the excess falls all the way up. Where it
// is not over zero at the lower end the rapid stream leaves; where the tranquil surface comes to the upper end, at which
// critical depth has the least force of all, it has drowned the pipe.
func (p *Profile) meet(d Depths) {
	w, length := &p.sub.water, p.pipe.Length
	below, _ := w.force(p.level)
	limit, _ := w.force(d.Normal) // the most that the rapid stream can come to
	laid := below <= limit
	if laid {
		p.sup.lay(w, d, true, d.Critical, length)
		if arriving, _ := w.force(p.sup.depth(0)); below <= arriving {
			p.leave(d)
			return
		}
	}
	p.sub.lay(d, true, p.level, length)
	if p.sub.end() >= length {
		p.hold(d, length)
		p.Upper, p.Drowned = p.sub.depth(length), true
		return
	}
	if !laid {
		p.sup.lay(w, d, true, d.Critical, length)
	}
	high := p.sub.end()
	excessLow, _ := p.sub.excess(&p.sup, 0)
	excessHigh, _ := p.sub.excess(&p.sup, high)
	p.stand(d, 0, high, high*excessLow/(excessLow-excessHigh))
}
