package job

import (
	"testing"

	"rimfall/network/fault"
)

func TestANumberOfJobTomlIsChangedInItsPlace(t *testing.T) {
	var faults fault.List
	text := []byte("units = \"us\"\n[storm]\n  return_period = 10   # years = 10\ncheck_period = 100\n")
	d := parseTOML("job.toml", text, &faults)
	got := string(d.withNumber(text, "storm.return_period", 25))
	want := "units = \"us\"\n[storm]\n  return_period = 25   # years = 10\ncheck_period = 100\n"
	if got != want || len(faults) > 0 {
		t.Errorf("got\n%s\nfaults %v", got, faults)
	}
}
