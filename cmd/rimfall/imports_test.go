package main

import (
	"encoding/json"
	"errors"
	"io"
	"os/exec"
	"slices"
	"strings"
	"testing"
)

// arrows says which packages of the project a package may import: those listed,
// and the packages below them where a name ends in "/…". DEVELOPERS.md explains them.
var arrows = map[string][]string{
	"pipeflow":             {},
	"pipeflow/catalog":     {"pipeflow"},
	"pipeflow/surface":     {"pipeflow"},
	"pipeflow/sectiontest": {"pipeflow"},
	"hydrology":            {},
	"hydrology/rainfile":   {"hydrology"},
	"hydrology/fit":        {"hydrology"},

	"network":             {"network/fault", "network/units", "pipeflow"},
	"network/fault":       {},
	"network/units":       {},
	"network/job":         {"network", "network/fault", "network/units", "network/times", "pipeflow", "pipeflow/catalog", "hydrology/…"},
	"network/times":       {"network", "network/fault", "network/units", "network/sweep", "hydrology/…", "pipeflow"},
	"network/rain":        {"network/fault", "hydrology/…"},
	"network/size":        {"network", "network/units", "pipeflow"},
	"network/sweep":       {"network", "network/units", "pipeflow", "hydrology"},
	"network/grade":       {"network", "network/units", "network/sweep", "pipeflow", "pipeflow/surface"},
	"network/finding":     {"network", "network/units", "network/size", "network/sweep", "network/grade", "network/times", "pipeflow", "hydrology"},
	"network/analysis":    {"network", "network/fault", "network/units", "network/job", "network/size", "network/sweep", "network/grade", "network/finding", "network/times", "hydrology"},
	"network/calculator":  {"network", "network/fault", "network/units", "network/job", "pipeflow", "pipeflow/catalog"},
	"network/review":      {"network/…", "network/review/formula", "hydrology/…", "pipeflow/…"},
	"network/networktest": {"network", "pipeflow"},
	"network/report":      {"network", "network/units", "network/analysis", "network/finding", "network/sweep", "network/grade", "network/calculator", "network/times", "network/job", "hydrology/…", "pipeflow", "pipeflow/catalog"},

	"network/review/formula": {},
	"network/report/page":    {"network/…", "pipeflow/…"},
	"network/report/text":    {"network/…", "hydrology/…", "pipeflow/…"},
	"network/report/data":    {"network/…", "hydrology/…", "pipeflow/…"},
	"network/report/drawing": {"network/…", "hydrology/…", "pipeflow/…"},

	"cmd/rimfall": {"network/…", "hydrology/…", "pipeflow/…"},
}

// heavy names the libraries that live in one place only.
var heavy = map[string][]string{
	"github.com/spf13/cobra":            {"cmd/rimfall"},
	"github.com/olekukonko/tablewriter": {"network/report/text"},
	"github.com/jszwec/csvutil":         {"network/job"},
	"github.com/pelletier/go-toml":      {"network/job"},
	"gonum.org/v1/gonum/graph":          {"network"},
	"gonum.org/v1/gonum":                {"network", "hydrology/fit", "network/review"},
	"github.com/rogpeppe/go-internal":   {},
	"github.com/xuri/excelize":          {"network/report/sheet"},
}

// TestImportsFollowTheArrows holds every package of the project to the list above.
func TestImportsFollowTheArrows(t *testing.T) {
	for _, p := range listPackages(t) {
		own := strings.TrimPrefix(p.ImportPath, "rimfall/")
		allowed, known := arrows[own]
		if !known {
			t.Errorf("package %s has no arrows: add it to the list, and to DEVELOPERS.md", own)
			continue
		}
		for _, imported := range p.Imports {
			if to, inside := strings.CutPrefix(imported, "rimfall/"); inside && !mayImport(allowed, own, to) {
				t.Errorf("%s imports %s, which no arrow allows", own, to)
			}
			for library, homes := range heavy {
				if within(imported, library) && !slices.Contains(homes, own) {
					t.Errorf("%s imports %s, whose home is %v", own, imported, homes)
				}
			}
			standard := !strings.Contains(strings.SplitN(imported, "/", 2)[0], ".")
			library := strings.HasPrefix(own, "pipeflow") || own == "hydrology"
			if library && !standard && !strings.HasPrefix(imported, "rimfall/") {
				t.Errorf("%s imports %s; it stands on the standard library alone", own, imported)
			}
		}
	}
}

func within(path, root string) bool { return path == root || strings.HasPrefix(path, root+"/") }

func mayImport(allowed []string, own, to string) bool {
	for _, a := range allowed {
		if root, below := strings.CutSuffix(a, "/…"); a == to || below && within(to, root) && !within(to, own) {
			return true
		}
	}
	return false
}

type goPackage struct {
	ImportPath string
	Imports    []string
}

func listPackages(t *testing.T) []goPackage {
	cmd := exec.Command("go", "list", "-json=ImportPath,Imports", "./...")
	cmd.Dir = "../.."
	out, err := cmd.Output()
	if err != nil {
		t.Fatal(err)
	}
	var all []goPackage
	decoder := json.NewDecoder(strings.NewReader(string(out)))
	for {
		var p goPackage
		err := decoder.Decode(&p)
		if errors.Is(err, io.EOF) {
			return all
		}
		if err != nil {
			t.Fatal(err)
		}
		all = append(all, p)
	}
}
