package report

// ShowBoth prints two cells of one quantity for people, with as many decimals more as it
// takes to tell them apart.
func (s Style) ShowBoth(q Quantity, before, after Value) (b, a string) {
	b, a = s.Show(q, before), s.Show(q, after)
	if b != a || before.Text != "" || after.Text != "" || !before.OK || !after.OK {
		return b, a
	}
	const most = 9 // decimals: what differs by less was taken as the same
	for decimals := 4; decimals <= most && b == a; decimals++ {
		b, a = fixed(before.Number, decimals), fixed(after.Number, decimals)
	}
	return b, a
}
