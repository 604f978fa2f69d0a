package calculator

import "fmt"

// Conclusion is the answer in words, a line each.
func (a *Answer) Conclusion() []string {
	lines := []string{a.found()}
	lines = append(lines, a.runs(&a.First))
	if a.Second != nil {
		lines = append(lines, "or "+a.Named(Depth)+" "+a.deep(a.Second)+": "+a.runs(a.Second))
	}
	return lines
}

// Named is what was asked for, in words.
func (a *Answer) Named(asked string) string {
	return map[string]string{
		Flow: "flow", Depth: "depth", Slope: "slope", N: "roughness n", Size: "size", Bottom: "bottom width", Side: "side slope",
	}[asked]
}

// found is the unknown with its value.
func (a *Answer) found() string {
	name := a.Named(a.Asked) + " "
	switch a.Asked {
	case Flow:
		return name + a.say(Discharge, a.First.Flow)
	case Slope:
		return name + figure(a.Slope)
	case N:
		return name + figure(a.N)
	case Bottom:
		return name + a.say(Length, a.Conduit.Bottom.V)
	case Side:
		return name + figure(a.Conduit.Left.V) + " horizontal for 1 vertical"
	case Size:
		return name + a.sizeFoundWords()
	}
	return name + a.deep(&a.First)
}

// deep is a depth with its share of the rise.
func (a *Answer) deep(st *State) string {
	text := a.say(Length, st.Depth)
	switch {
	case st.Ratio.OK && st.Ratio.V == 1:
		text += " (the rise)"
	case st.Ratio.OK:
		text += fmt.Sprintf(" (%s of the rise)", figure(st.Ratio.V))
	}
	return text
}

func (a *Answer) sizeFoundWords() string {
	exact := figure(a.Exact.Size.Rise)
	if a.Exact.Size.Span != a.Exact.Size.Rise {
		exact = figure(a.Exact.Size.Span) + " x " + exact
	}
	if !a.Exact.Listed {
		return fmt.Sprintf("%s %s, over the largest that is listed", exact, a.Units.Size)
	}
	return fmt.Sprintf("%s %s, the next listed over %s", a.Conduit.SizeLabel(), a.Units.Size, exact)
}

// runs is how the water runs.
func (a *Answer) runs(st *State) string {
	words := fmt.Sprintf("velocity %s", a.say(Speed, st.Velocity))
	if a.Asked != Flow && !a.Question.Flow.OK {
		words = "flow " + a.say(Discharge, st.Flow) + ", " + words
	}
	if a.Asked != Depth {
		words = "depth " + a.deep(st) + ", " + words
	}
	words += ", " + st.Regime
	if st.FlowState != "" && st.FlowState != st.Regime {
		words += ", " + st.FlowState
	}
	return words
}
