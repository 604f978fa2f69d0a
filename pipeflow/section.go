package pipeflow

// Section is the inside of a conduit across the flow. Depths are measured from its lowest point.
//
// Implementations are read-only after construction and safe for concurrent use.
type Section interface {
	// Rise is the greatest depth inside. For an open section it is the depth to which the shape is described,
	// +Inf where the walls go on without end.
	Rise() float64
	// Span is the greatest width inside, +Inf for an open section without end.
	Span() float64
	// At measures the wetted section at a depth, which is clamped to 0..Rise. At Rise a closed section is full:
	// the whole perimeter is wet, a flat roof included, and there is no top width.
	At(depth float64) Geometry
	// Moment is the first moment of the wetted area about the water surface, area times depth of the centroid
	// (length³). At Rise of a closed section the water surface touches the highest point inside.
	Moment(depth float64) float64
	// Closed reports whether there is a roof, so that the section can flow full.
	Closed() bool
}

// Geometry is the wetted section at one depth, in the coherent unit of the section.
type Geometry struct {
	Area      float64 // across the flow, length²
	Perimeter float64 // wall in touch with water, length
	TopWidth  float64 // width of the free surface; 0 where the section is dry or full
}

// HydraulicRadius is the wetted area over the wetted perimeter; 0 for a dry section, which is its limit.
func (g Geometry) HydraulicRadius() float64 {
	if g.Perimeter == 0 {
		return 0
	}
	return g.Area / g.Perimeter
}

// HydraulicDepth is the wetted area over the top width. A section that is dry or full has no free surface and so no
// hydraulic depth.
func (g Geometry) HydraulicDepth() (depth float64, ok bool) {
	if g.TopWidth <= 0 {
		return 0, false
	}
	return g.Area / g.TopWidth, true
}

// clampDepth brings a depth into 0..rise; what is not a number counts as dry.
func clampDepth(depth, rise float64) float64 {
	if !(depth > 0) {
		return 0
	}
	return min(depth, rise)
}
