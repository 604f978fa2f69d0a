package job

import (
	"fmt"
	"strings"

	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/pipeflow"
	"rimfall/pipeflow/catalog"
)

// sectionKey names a section that pipes share.
type sectionKey struct {
	shape, material string
	size            network.Size
}

// sizeAndWall reads the size, makes the section, and finds the wall: as given,
// else the catalogue's. A blank size leaves the section to be chosen.
func (r *reader) sizeAndWall(t *table, row *pipeRow, p *network.Pipe) {
	wall := t.number("wall", row.Wall, notNegative)
	if wall.OK {
		p.Wall, p.HasWall = wall.V/r.settings.Units.SizeFactor, true
	}
	text := strings.TrimSpace(t.unlessUnknown("size", row.Size))
	if text == "" {
		r.judgeBlankSize(t, row, p)
		return
	}
	size, why := parseSize(text, p.Shape, t.comma, r.settings.Units)
	if why != "" {
		t.faultAt("size", "size %q: %s", text, why)
		return
	}
	m := r.section(sectionKey{p.Shape, p.Material, size})
	if m.Why != "" {
		t.faultAt("size", "size %q: %s", text, m.Why)
		return
	}
	p.Size, p.Section = size, m.Section
	if !wall.OK {
		p.Wall, p.HasWall = m.Wall, m.HasWall
	}
}

// judgeBlankSize: a pipe that is checked needs a size; one that is to be sized
// needs sizes to choose from.
func (r *reader) judgeBlankSize(t *table, row *pipeRow, p *network.Pipe) {
	if r.purpose == ToCheck {
		t.faultAt("size", "pipe %s has no size: write it, or let `rimfall size` choose it", p.ID)
		return
	}
	if _, known := catalog.MaterialByName(p.Material); !known && p.Material != "" && strings.TrimSpace(row.N) == "" {
		return // the material is a fault already
	}
	if len(r.catalog.ForMaterial(r.settings.Units.Name, p.Material, catalog.Shape(p.Shape))) == 0 {
		t.faultAt("size", "pipe %s has no size, and no %s of %s is in the catalogue to choose from: write the size, or list sizes in %s",
			p.ID, p.Shape, materialWord(p.Material), r.settings.Files["catalog"])
	}
}

func materialWord(material string) string {
	if material == "" {
		return "concrete"
	}
	return material
}

// section makes a section once for all pipes that share it.
func (r *reader) section(key sectionKey) Made {
	if key == r.lastKey { // most pipes are like the one before
		return r.lastMade
	}
	m, ok := r.sections[key]
	if !ok {
		m = MakeSection(r.catalog, r.settings.Units.Name, r.settings.Units.SizeFactor, key.shape, key.material, key.size)
		r.sections[key] = m
	}
	r.lastKey, r.lastMade = key, m
	return m
}

// Made is a section with the wall that the catalogue gives it.
type Made struct {
	Section pipeflow.Section
	Wall    float64 // ft or m
	HasWall bool
	Why     string // what keeps the section from being made; "" where it was
}

// Candidate is a size of the catalogue that may be chosen.
type Candidate struct {
	Size network.Size
	Made
}

// Candidates lists the sizes from which a pipe of a shape and material is chosen.
func (j *Job) Candidates(shape, material string) []Candidate {
	u := j.Settings.Units
	var list []Candidate
	for _, s := range j.Catalog.ForMaterial(u.Name, material, catalog.Shape(shape)) {
		size := network.Size{Span: s.Span, Rise: s.Rise}
		if m := MakeSection(j.Catalog, u.Name, u.SizeFactor, shape, material, size); m.Why == "" {
			list = append(list, Candidate{size, m})
		}
	}
	return list
}

// MakeSection makes the section of a shape and size in coherent units: by the
// row of the catalogue where it has one, else from span and rise alone, which
// the shapes that are built of arcs do not allow.
func MakeSection(c catalog.Catalog, system string, factor float64, shape, material string, size network.Size) Made {
	listed, ok := c.Find(system, material, catalog.Shape(shape), size.Span, size.Rise)
	var section pipeflow.Section
	var err error
	switch {
	case ok:
		section, err = listed.Section()
	case shape == string(catalog.Circle):
		section, err = pipeflow.NewCircle(size.Rise / factor)
	case shape == string(catalog.Box):
		section, err = pipeflow.NewBox(size.Span/factor, size.Rise/factor)
	case shape == string(catalog.Ellipse) || shape == string(catalog.UprightEllipse):
		section, err = pipeflow.NewEllipse(size.Span/factor, size.Rise/factor)
	default:
		return Made{Why: fmt.Sprintf("no %s of that size is in the catalogue, from which its radii come; listed: %s", shape, listedSizes(c, system, shape))}
	}
	if err != nil {
		return Made{Why: err.Error()}
	}
	wall, hasWall := c.Wall(system, material, catalog.Shape(shape), size.Span, size.Rise)
	return Made{section, wall / factor, hasWall, ""}
}

func listedSizes(c catalog.Catalog, system, shape string) string {
	var words []string
	for _, s := range c.Sizes(system, catalog.Shape(shape)) {
		words = append(words, fmt.Sprintf("%gx%g", s.Span, s.Rise))
	}
	if len(words) == 0 {
		return "none in these units"
	}
	return strings.Join(words, " ")
}

func suggestMaterial(name string) string {
	var known []string
	for _, m := range catalog.Materials() {
		known = append(known, m.Name)
	}
	return fault.Suggest(name, known)
}
