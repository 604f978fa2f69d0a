package calculator_test

import (
	"fmt"
	"log"

	"rimfall/network/calculator"
)

// answer asks a typed question in US units.
func answer(g calculator.Given) *calculator.Answer {
	g.Units = "us"
	s, err := calculator.Read(g)
	if err != nil {
		log.Fatal(err)
	}
	a, err := calculator.Ask(s.Questions[0])
	if err != nil {
		log.Fatal(err)
	}
	return a
}

// Shammas and Wang 2011, Example 13.1: a 12 in sewer, n 0.013, at a slope of 0.00405
// runs full at 2.89 ft/s. The book's flow of 2.25 cfs has a rounded constant; it is 2.27.
func ExampleAsk_flowRunningFull() {
	a := answer(calculator.Given{Size: "12", N: "0.013", Slope: "0.00405", Depth: "full"})
	fmt.Printf("%.2f ft/s, %.2f cfs\n", a.First.Velocity, a.First.Flow)
	// Output: 2.89 ft/s, 2.27 cfs
}

// Shammas and Wang 2011, Example 13.4: an 8 in sewer running 0.3 full has 0.252 of the
// area, 0.684 of the radius, 0.776 of the velocity and 0.196 of the flow.
func ExampleRate() {
	s, err := calculator.Read(calculator.Given{Units: "us", Size: "8", Depth: "0.3D,1D"})
	if err != nil {
		log.Fatal(err)
	}
	r, err := calculator.Rate(s)
	if err != nil {
		log.Fatal(err)
	}
	at := r.Rows[0]
	fmt.Printf("%.3f %.3f %.3f %.3f\n", at.AreaRatio.V, at.RadiusRatio.V, at.VelocityRatio.V, at.FlowRatio.V)
	// Output: 0.252 0.684 0.776 0.196
}

// The same example: what cleanses at 5.20 per mille running full takes 7.6 per mille at
// 0.3 of the diameter, for then the boundary shear is the same.
func ExampleAsk_equalCleansing() {
	full := answer(calculator.Given{Size: "8", N: "0.013", Slope: "0.00520", Depth: "full"})
	part := answer(calculator.Given{Size: "8", N: "0.013", Slope: "0.0076", Depth: "0.3D"})
	fmt.Printf("%.3f lb/ft² and %.3f lb/ft²\n", full.First.Shear, part.First.Shear)
	// Output: 0.054 lb/ft² and 0.054 lb/ft²
}

// Texas Tech CE 3372, Exercise Set 18: 192 cfs in a channel 16 ft wide on a slope of
// 0.0035 has a normal depth of 1.509 ft.
func ExampleAsk_normalDepth() {
	a := answer(calculator.Given{Shape: "rectangle", Bottom: "16", N: "0.01296", Slope: "0.0035", Flow: "192"})
	fmt.Printf("%.3f ft, %s\n", a.First.Depth, a.First.FlowState)
	// Output: 1.509 ft, supercritical
}
