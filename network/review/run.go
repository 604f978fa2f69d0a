package review

import (
	"runtime"
	"slices"
	"sync"
	"sync/atomic"

	"rimfall/hydrology"
	"rimfall/network"
	"rimfall/network/analysis"
	"rimfall/network/fault"
	"rimfall/network/grade"
	"rimfall/network/job"
	"rimfall/network/sweep"
)

// Subject is a job that is asked questions: its pipes as they are.
type Subject struct {
	Job     *job.Job
	Network *network.Network
	Storm   network.Storm // the design storm, or the one asked for in its place

	settings grade.Settings
}

// Of prepares a job that was read to be checked. period is the design storm in place of the job's, years; 0: the job's.
func Of(j *job.Job, period float64) *Subject {
	s := &Subject{Job: j, Network: j.Network, Storm: j.Settings.Storm, settings: analysis.GradeSettings(j)}
	if period > 0 {
		s.Storm.ReturnPeriod = period
	}
	return s
}

// rain is the storm of a return period, uplift included, as the job has it: of a column of the rainfall, between
// two of them, or of an equation. The error is a fault.List.
func (s *Subject) rain(period float64) (hydrology.Intensity, error) {
	storm, ok := s.Job.Curve(period)
	if !ok {
		return nil, fault.List{{File: s.Job.Rain.File, Text: s.Job.NoSuchPeriod(period)}}
	}
	return storm, nil
}

// timed is the network with the inlet times that the flow paths of its areas have in a storm; without paths it is the
// network itself. The pipes are shared. The error is a fault.List.
func (s *Subject) timed(rain hydrology.Intensity) (*network.Network, error) {
	n, _, problems := analysis.Timed(s.Job, s.Network, rain)
	return n, s.problems(problems)
}

// problems turns problems of a run into faults with their places.
func (s *Subject) problems(all []network.Problem) error {
	var faults fault.List
	for _, p := range all {
		faults = append(faults, s.Job.Locate(p))
	}
	return faults.Err()
}

// runner runs storms over one network in its own room; each thread has one. Areas and structures of its network are
// its own, and may be changed from run to run; pipes and adjacency are shared.
type runner struct {
	network *network.Network
	sweep   *sweep.Again
	grade   *grade.Again
}

func newRunner(n *network.Network, settings grade.Settings, peak network.Peak) *runner {
	own := *n
	own.Areas, own.Structures = slices.Clone(n.Areas), slices.Clone(n.Structures)
	return &runner{&own, sweep.NewAgain(&own, peak), grade.NewAgain(&own, settings)}
}

// runners makes a runner for each of a number of threads over one network.
func (s *Subject) runners(threads int, peak network.Peak) []*runner {
	all := make([]*runner, threads)
	for i := range all {
		all[i] = newRunner(s.Network, s.settings, peak)
	}
	return all
}

// threadsOr is the number of threads asked for; 0: as many as the program may use. There are no more than tasks.
func threadsOr(asked, tasks int) int {
	if asked <= 0 {
		asked = runtime.GOMAXPROCS(0)
	}
	return max(1, min(asked, tasks))
}

// each does tasks 0…count−1 on a number of threads; do is told its thread. Which thread does which task is left
// to chance, so a task may write only to places of its own and to those of its thread.
func each(threads, count int, do func(thread, task int)) {
	var next atomic.Int64
	var all sync.WaitGroup
	for thread := range threads {
		all.Go(func() {
			for {
				task := int(next.Add(1)) - 1
				if task >= count {
					return
				}
				do(thread, task)
			}
		})
	}
	all.Wait()
}

// firstError is the first of several errors by their task, whichever came first in time.
func firstError(all []error) error {
	for _, err := range all {
		if err != nil {
			return err
		}
	}
	return nil
}
