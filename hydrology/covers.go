package hydrology

import (
	"slices"
	"strings"
)

// Cover is a ground cover on which water runs, and the number that goes with it.
type Cover struct {
	Name        string
	Coefficient float64 // shallow flow: c in V = c·√S, ft/s; sheet flow: Manning's n
	Source      string
}

const (
	neh15 = "NRCS NEH 630, ch. 15 (2010), Table 15-3"
	hds2n = "FHWA HDS-2, 2nd ed. (2002), Table 2.1"
)

// shallowCovers: NEH 630 Table 15-3, and TR-55 (1986) appendix F for paved and unpaved, which are its first two
// rows. HDS-2 Table 2.2 gives 33·k within 1 % of them (3 % for row crops), and grassed waterways lower.
var shallowCovers = []Cover{
	{"paved", 20.3282, "TR-55 (1986), appendix F"},
	{"unpaved", 16.1345, "TR-55 (1986), appendix F"},
	{"pavement and small upland gullies", 20.328, neh15},
	{"grassed waterways", 16.135, neh15},
	{"nearly bare and untilled", 9.965, neh15},
	{"cultivated straight row crops", 8.762, neh15},
	{"short-grass pasture", 6.962, neh15},
	{"minimum tillage, contour or strip cropped, woodland", 5.032, neh15},
	{"forest with heavy litter, hay meadow", 2.516, neh15},
}

// sheetCovers: HDS-2 Table 2.1 (from SCS 1986 and McCuen 1989), n for flow in a thin sheet.
var sheetCovers = []Cover{
	{"smooth asphalt", 0.011, hds2n},
	{"smooth concrete", 0.012, hds2n},
	{"concrete lining", 0.013, hds2n},
	{"good wood", 0.014, hds2n},
	{"brick with cement mortar", 0.014, hds2n},
	{"vitrified clay", 0.015, hds2n},
	{"cast iron", 0.015, hds2n},
	{"corrugated metal pipe", 0.024, hds2n},
	{"cement rubble", 0.024, hds2n},
	{"fallow, no residue", 0.05, hds2n},
	{"cultivated, residue to 20%", 0.06, hds2n},
	{"cultivated, residue over 20%", 0.17, hds2n},
	{"range, natural", 0.13, hds2n},
	{"short grass prairie", 0.15, hds2n},
	{"dense grasses", 0.24, hds2n},
	{"bermuda grass", 0.41, hds2n},
	{"woods, light underbrush", 0.4, hds2n},
	{"woods, dense underbrush", 0.8, hds2n},
}

// ShallowCovers lists the covers of shallow concentrated flow, with c in ft/s; times 0.3048 it is in m/s.
func ShallowCovers() []Cover { return slices.Clone(shallowCovers) }

// SheetCovers lists the covers of sheet flow, with Manning's n.
func SheetCovers() []Cover { return slices.Clone(sheetCovers) }

func shallowCover(name string) (Cover, bool) {
	at := slices.IndexFunc(shallowCovers, func(c Cover) bool { return strings.EqualFold(c.Name, name) })
	if at < 0 {
		return Cover{}, false
	}
	return shallowCovers[at], true
}

func coverNames() string {
	var names []string
	for _, c := range shallowCovers {
		names = append(names, c.Name)
	}
	return strings.Join(names, "; ")
}
