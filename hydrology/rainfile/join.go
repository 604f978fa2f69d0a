package rainfile

import (
	"errors"
	"fmt"
	"slices"
)

// Join puts an estimate and its bounds, sent as files of their own, into one. It is an error where they are not of
// one place, series, unit and set of durations and periods, or where two give the same bound; all of it is said.
func Join(files ...File) (File, error) {
	if len(files) == 0 {
		return File{}, errors.New("there is no file to join")
	}
	joined := files[0]
	var faults []error
	for k, f := range files[1:] {
		if f.Place != joined.Place {
			faults = append(faults, fmt.Errorf("file %d is of %s, file 1 of %s", k+2, f.Place, joined.Place))
		}
		if f.Kind != joined.Kind || f.Series != joined.Series || f.Unit != joined.Unit {
			faults = append(faults, fmt.Errorf("file %d is a %s, %s, %s; file 1 is a %s, %s, %s",
				k+2, f.Kind, f.Series, f.Unit, joined.Kind, joined.Series, joined.Unit))
		}
		for bound := range f.tables {
			if err := joined.take(Bound(bound), f); err != nil {
				faults = append(faults, fmt.Errorf("file %d: %w", k+2, err))
			}
		}
		joined.Confidence = max(joined.Confidence, f.Confidence)
		joined.Notices = slices.Concat(joined.Notices, f.Notices)
	}
	if len(faults) > 0 {
		return File{}, errors.Join(faults...)
	}
	return joined, nil
}

func (f *File) take(b Bound, from File) error {
	table, ok := from.Table(b)
	if !ok {
		return nil
	}
	if _, twice := f.Table(b); twice {
		return fmt.Errorf("a second table of the %s", b)
	}
	for other := range f.tables {
		have, ok := f.Table(Bound(other))
		if ok && !(slices.Equal(have.Durations, table.Durations) && slices.Equal(have.Periods, table.Periods)) {
			return fmt.Errorf("the %s has other durations or periods than the %s", b, Bound(other))
		}
	}
	f.tables[b] = table
	return nil
}
