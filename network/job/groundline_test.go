package job_test

import (
	"strings"
	"testing"

	"rimfall/network/job"
)

func TestGroundLineIsReadAsASpreadsheetWritesIt(t *testing.T) {
	text := "\xef\xbb\xbf# surveyed\r\nElevation;Station;n;x_code\r\n10,5;0;0,03;a\r\n8;5;;b\r\n11;10;;c\r\n"
	points, err := job.ReadGroundLine("line.csv", []byte(text))
	if err != nil {
		t.Fatal(err)
	}
	if len(points) != 3 || points[0].Elevation != 10.5 || points[0].N != 0.03 || points[1].Station != 5 || points[1].N != 0 {
		t.Errorf("got %+v", points)
	}
}

func TestEveryFaultOfAGroundLineIsTold(t *testing.T) {
	_, err := job.ReadGroundLine("line.csv", []byte("station,elevation,n\n0,ten,0.03\n5,,0\n"))
	if err == nil {
		t.Fatal("no fault")
	}
	for _, want := range []string{
		`line.csv:2:3: elevation: "ten" is no number`, "line.csv:3:3: elevation is blank", "line.csv:3:4: n = 0: it must be over 0",
	} {
		if !strings.Contains(err.Error(), want) {
			t.Errorf("no %q in\n%v", want, err)
		}
	}
}

// FuzzReadGroundLine: no text makes the reader panic, and stations never go back.
func FuzzReadGroundLine(f *testing.F) {
	f.Add([]byte("station,elevation,n\n0,10,0.03\n5,8,\n10,12,\n"))
	f.Add([]byte("station;elevation\n0;10,5\n"))
	f.Add([]byte("\"station\nelevation"))
	f.Fuzz(func(t *testing.T, text []byte) {
		points, err := job.ReadGroundLine("f.csv", text)
		for i := 1; err == nil && i < len(points); i++ {
			if points[i].Station < points[i-1].Station {
				t.Errorf("station %g behind %g", points[i].Station, points[i-1].Station)
			}
		}
	})
}
