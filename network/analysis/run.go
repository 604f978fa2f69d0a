package analysis

import (
	"cmp"
	"slices"

	"rimfall/network"
	"rimfall/network/fault"
	"rimfall/network/finding"
	"rimfall/network/grade"
	"rimfall/network/job"
	"rimfall/network/size"
	"rimfall/network/sweep"
	"rimfall/network/times"
)

// Options say how a job is run. The zero value checks the pipes as they are for
// the job's own storms.
type Options struct {
	Size         bool    // choose what is blank
	ReturnPeriod float64 // design storm in place of the job's, years; 0: the job's
}

// Result is a job that has been run.
type Result struct {
	Job      *job.Job
	Network  *network.Network // complete: what was blank has been chosen
	Design   StormRun
	Check    *StormRun // nil where the job has no check storm
	Findings []finding.Finding
	Sized    bool
}

// StormRun is one storm in the network.
type StormRun struct {
	Storm network.Storm
	Flows sweep.Flows
	Lines *grade.Lines
	Paths []times.Walked // flow paths of areas, worked out for this storm

	Network *network.Network // with the inlet times of those paths; the pipes are those of Result.Network
}

// Read reads a job folder for a run with the given options.
func Read(dir string, o Options) (*job.Job, error) {
	purpose := job.ToCheck
	if o.Size {
		purpose = job.ToSize
	}
	return job.Read(dir, purpose, finding.Names())
}

// Run runs a job. The error, if any, is a fault.List: a storm that the rainfall
// does not have, or a time beyond its last duration.
func Run(j *job.Job, o Options) (*Result, error) {
	r := &Result{Job: j, Network: j.Network, Sized: o.Size}
	storm := j.Settings.Storm
	if o.ReturnPeriod > 0 {
		storm.ReturnPeriod = o.ReturnPeriod
	}
	var choose sweep.Chooser
	var chooser *size.Chooser
	var larger enlargement
	if o.Size {
		r.Network = j.Network.Clone()
		candidates := Candidates(j)
		chooser = size.New(r.Network, &j.Settings.Criteria, j.Settings.Units, storm.ManningFactor, candidates)
		choose = chooser
		if j.Settings.Criteria.SizeFor == network.ForGradeLine {
			larger = enlarge(j, storm, candidates)
			chooser.AtLeast = larger.atLeast
		}
	}
	design, err := runStorm(j, r.Network, storm, choose)
	if err != nil {
		return nil, err
	}
	r.Design, r.Network = design, design.Network
	r.Design.Lines = grade.Up(r.Network, gradeSettings(j), &r.Design.Flows, grade.DesignTailwater)
	if check := storm.CheckPeriod; check.OK {
		storm.ReturnPeriod = check.V
		run, err := runStorm(j, r.Network, storm, nil)
		if err != nil {
			return nil, err
		}
		r.Check = &run
		r.Check.Lines = grade.Up(r.Network, gradeSettings(j), &r.Check.Flows, grade.CheckTailwater)
	}
	r.Findings = judge(r, chooser, larger)
	return r, nil
}

// runStorm sweeps one storm down the network.
func runStorm(j *job.Job, n *network.Network, storm network.Storm, choose sweep.Chooser) (StormRun, error) {
	curve, ok := j.Curve(storm.ReturnPeriod)
	if !ok {
		return StormRun{}, fault.List{{File: j.Rain.File, Text: j.NoSuchPeriod(storm.ReturnPeriod)}}
	}
	timed, walked, problems := Timed(j, n, curve)
	var flows sweep.Flows
	if len(problems) == 0 {
		flows, problems = sweep.Down(timed, &storm, curve, choose)
	}
	var faults fault.List
	for _, p := range problems {
		faults = append(faults, j.Locate(p))
	}
	return StormRun{Storm: storm, Flows: flows, Paths: walked, Network: timed}, faults.Err()
}

// Candidates lists the sizes of a job's catalogue by shape and material,
// ascending by full area, each list made once.
func Candidates(j *job.Job) func(shape, material string) []size.Candidate {
	type key struct{ shape, material string }
	made := map[key][]size.Candidate{}
	return func(shape, material string) []size.Candidate {
		k := key{shape, material}
		if list, ok := made[k]; ok {
			return list
		}
		var list []size.Candidate
		for _, c := range j.Candidates(shape, material) {
			list = append(list, size.Candidate{Size: c.Size, Section: c.Section, Wall: c.Wall, HasWall: c.HasWall})
		}
		slices.SortStableFunc(list, func(a, b size.Candidate) int {
			return cmp.Or(cmp.Compare(fullArea(a), fullArea(b)), cmp.Compare(a.Size.Rise, b.Size.Rise))
		})
		made[k] = list
		return list
	}
}

func fullArea(c size.Candidate) float64 { return c.Section.At(c.Section.Rise()).Area }

// judge applies the rules to the design storm and the departures to what they find.
func judge(r *Result, chooser *size.Chooser, larger enlargement) []finding.Finding {
	s := &r.Job.Settings
	run := finding.Run{
		Network: r.Network, Criteria: &s.Criteria, Storm: &r.Design.Storm, Units: s.Units, FlowUnit: s.FlowUnit, Flows: &r.Design.Flows,
		Lines: r.Design.Lines, Growth: larger.growth, Uncured: larger.uncured, Paths: r.Design.Paths, Rain: rainRemarks(r.Job, r.Design.Storm.ReturnPeriod),
	}
	if c := r.Check; c != nil {
		run.Check = &finding.StormLines{Storm: &c.Storm, Flows: &c.Flows, Lines: c.Lines, Tailwater: grade.CheckTailwater}
	}
	if chooser != nil {
		run.Remarks = chooser.Remarks()
	}
	found := finding.Judge(run)
	accepted := make([]finding.Departure, len(r.Job.Departures))
	for i, d := range r.Job.Departures {
		accepted[i] = finding.Departure{Rule: d.Rule, Subject: d.Subject, Reason: d.Reason, Storm: d.Storm}
	}
	return finding.Accept(found, accepted, r.Design.Storm.ReturnPeriod)
}
