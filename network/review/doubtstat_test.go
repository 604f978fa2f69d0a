package review

import (
	"bufio"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// secondOpinion reads columns of numbers and what another implementation says of them; see the head of the file.
func secondOpinion(t *testing.T) (columns map[string][]float64, said [][]string) {
	t.Helper()
	f, err := os.Open(filepath.Join("..", "..", "testdata", "review", "quantiles-and-ranks.csv"))
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	columns = map[string][]float64{}
	for lines := bufio.NewScanner(f); lines.Scan(); {
		words := strings.Fields(strings.TrimPrefix(lines.Text(), "#"))
		var a, b, c float64
		if k, _ := fmt.Sscanf(lines.Text(), "%g,%g,%g", &a, &b, &c); k == 3 {
			columns["a"], columns["b"], columns["c"] = append(columns["a"], a), append(columns["b"], b), append(columns["c"], c)
		} else if len(words) > 0 && (words[0] == "quantiles" || words[0] == "spearman") {
			said = append(said, words)
		}
	}
	if len(columns["a"]) != 57 || len(said) != 6 {
		t.Fatalf("%d rows, %d statements", len(columns["a"]), len(said))
	}
	return columns, said
}

func number(t *testing.T, text string) float64 {
	t.Helper()
	var v float64
	if _, err := fmt.Sscan(text, &v); err != nil {
		t.Fatal(err)
	}
	return v
}

// The tolerance is rounding: a sum of 57 products, and one step of interpolation.
func TestQuantilesAndRankCorrelationsAgreeWithASecondImplementation(t *testing.T) {
	const tolerance = 1e-14
	columns, said := secondOpinion(t)
	hold := func(what string, got, want float64) {
		if !(math.Abs(got-want) <= tolerance*max(1, math.Abs(want))) {
			t.Errorf("%s is %.17g, the second implementation says %.17g", what, got, want)
		}
	}
	for _, words := range said {
		if words[0] == "quantiles" {
			q := quantiles(columns[words[1]])
			hold("5 % of "+words[1], q.P05, number(t, words[2]))
			hold("50 % of "+words[1], q.P50, number(t, words[3]))
			hold("95 % of "+words[1], q.P95, number(t, words[4]))
			continue
		}
		r := correlation(ranks(columns[words[1]]), ranks(columns[words[2]]))
		if !r.OK {
			t.Errorf("%v: no correlation", words)
		}
		hold("correlation of "+words[1]+" and "+words[2], r.V, number(t, words[3]))
	}
}

func TestNoCorrelationWithWhatNeverChanges(t *testing.T) {
	if r := correlation(ranks([]float64{1, 2, 3}), ranks([]float64{5, 5, 5})); r.OK {
		t.Errorf("%+v", r)
	}
}

func TestOneRunHasAllItsQuantilesThere(t *testing.T) {
	if q := quantiles([]float64{7}); q != (Quantiles{7, 7, 7, true}) {
		t.Errorf("%+v", q)
	}
	if q := quantiles(nil); q.OK {
		t.Errorf("%+v of nothing", q)
	}
}
