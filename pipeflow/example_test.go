package pipeflow_test

import (
	"fmt"

	"rimfall/pipeflow"
)

// Shammas and Wang, Fair, Geyer, and Okun's Water and Wastewater Engineering, 3rd ed. 2011, Example 13.1: a 12 in sewer,
// n 0.013, slope 0.00405, runs full at 2.89 ft/s. The flow printed is 2.25 cfs: a rounded constant costs it 0.7 %.
func ExampleManning_FullFlow() {
	sewer, _ := pipeflow.NewCircle(1)
	m := pipeflow.Manning{Factor: 1.486, N: 0.013, Slope: 0.00405}
	fmt.Printf("%.2f ft/s, %.2f cfs\n", m.FullVelocity(sewer), m.FullFlow(sewer))
	// Output: 2.89 ft/s, 2.27 cfs
}

// The same book, Example 13.4: an 8 in sewer at 0.3 of its depth has 0.252 of the area, 0.684 of the hydraulic radius,
// 0.776 of the velocity and 0.196 of the flow of the full one. To be scoured as well as full on 5.20 per thousand, it
// needs the same shear, hence 7.6 per thousand.
func ExampleShear() {
	sewer, _ := pipeflow.NewCircle(8. / 12)
	m := pipeflow.Manning{Factor: 1.486, N: 0.013, Slope: 0.0052}
	y := 0.3 * sewer.Rise()
	part, full := sewer.At(y), sewer.At(sewer.Rise())
	fmt.Printf("area %.3f, radius %.3f, velocity %.3f, flow %.3f\n",
		part.Area/full.Area, part.HydraulicRadius()/full.HydraulicRadius(),
		m.Velocity(sewer, y)/m.FullVelocity(sewer), m.Flow(sewer, y)/m.FullFlow(sewer))
	shear := pipeflow.Shear(62.4, full.HydraulicRadius(), m.Slope)
	fmt.Printf("slope %.4f\n", shear/(62.4*part.HydraulicRadius()))
	// Output:
	// area 0.252, radius 0.684, velocity 0.776, flow 0.196
	// slope 0.0076
}

// The same book, Example 13.9: critical depth in sewers of 4 ft at 60 cfs and 10 ft at 400 cfs. Read off a chart it prints
// 2.36 and 4.7 ft.
func ExampleCriticalDepth() {
	for _, sewer := range []struct{ diameter, flow float64 }{{4, 60}, {10, 400}} {
		s, _ := pipeflow.NewCircle(sewer.diameter)
		depth, _ := pipeflow.CriticalDepth(s, 32.2, sewer.flow)
		fmt.Printf("%.3f ft\n", depth)
	}
	// Output:
	// 2.334 ft
	// 4.748 ft
}

// The same 10 ft sewer on slope 0.0005 with n 0.012 has a normal depth of 8.18 ft for 400 cfs (recomputed).
func ExampleManning_NormalDepth() {
	sewer, _ := pipeflow.NewCircle(10)
	m := pipeflow.Manning{Factor: 1.486, N: 0.012, Slope: 0.0005}
	depth, _ := m.NormalDepth(sewer, 400)
	fmt.Printf("%.2f ft\n", depth)
	// Output: 8.18 ft
}

// Between full-bore capacity and the largest discharge two depths carry the same flow.
func ExampleManning_NormalDepths() {
	sewer, _ := pipeflow.NewCircle(1)
	m := pipeflow.Manning{Factor: 1, N: 0.013, Slope: 0.01}
	depths := m.NormalDepths(sewer, 1.05*m.FullFlow(sewer))
	fmt.Printf("%d depths: %.3f and %.3f\n", depths.Count, depths.Lower, depths.Upper)
	fmt.Println(m.WhyNoNormalDepth(sewer, 1.2*m.FullFlow(sewer)))
	// Output:
	// 2 depths: 0.874 and 0.985
	// flow 2.8771 is over the largest discharge 2.57909, at depth 0.938181; full-bore capacity is 2.39758; slope 0.0144 or 1.071 times the size would carry it full
}

// Chow, Open-Channel Hydraulics, 1959, Examples 4-2 and 6-2, from memory: a trapezoid of 20 ft bottom and sides 2 to 1,
// slope 0.0016, n 0.025, carries 400 cfs at a normal depth of 3.36 ft; its critical depth is 2.15 ft.
func ExampleNewTrapezoid() {
	channel, _ := pipeflow.NewTrapezoid(20, 2, 2)
	m := pipeflow.Manning{Factor: 1.49, N: 0.025, Slope: 0.0016}
	normal, _ := m.NormalDepth(channel, 400)
	critical, _ := pipeflow.CriticalDepth(channel, 32.2, 400)
	fmt.Printf("normal %.2f ft, critical %.2f ft\n", normal, critical)
	// Output: normal 3.36 ft, critical 2.15 ft
}

// An invented ditch with a rough bench, and two published rules for the roughness of the whole. By hand: the bench is wet
// over 5 ft with A 1.25, P 5.025, n 0.05, the rest has A 10.167, P 8.639, n 0.03.
func ExampleGround_Linings() {
	ditch, _ := pipeflow.NewGround([]pipeflow.Point{
		{Station: 0, Elevation: 3, N: 0.05},
		{Station: 10, Elevation: 2, N: 0.03},
		{Station: 14, Elevation: 0, N: 0.03},
		{Station: 18, Elevation: 3},
	})
	parts := ditch.Linings(2.5)
	einstein, _ := pipeflow.HortonN(parts)
	lotter, _ := pipeflow.LotterN(parts)
	fmt.Printf("%d parts, equal velocity %.4f, sum of flows %.4f\n", len(parts), einstein, lotter)
	// Output: 2 parts, equal velocity 0.0380, sum of flows 0.0261
}
