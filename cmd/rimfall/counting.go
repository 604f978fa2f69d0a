package main

import (
	"fmt"
	"os"
	"sync"
	"time"
)

// countingEvery is how often a count is shown anew.
const countingEvery = 200 * time.Millisecond

// counting shows on standard error how many of a number of things are done, from the first second on and where a person
// watches. step may be called from any thread; done takes the line away.
func (a *app) counting(what string, of int) (step func(int), done func()) {
	file, ok := a.err.(*os.File)
	if !ok {
		return nil, func() {}
	}
	info, err := file.Stat()
	if err != nil || info.Mode()&os.ModeCharDevice == 0 {
		return nil, func() {}
	}
	var lock sync.Mutex
	next, shown := time.Now().Add(progressAfter), false
	step = func(count int) {
		lock.Lock()
		defer lock.Unlock()
		if now := time.Now(); now.After(next) {
			next, shown = now.Add(countingEvery), true
			fmt.Fprintf(file, "\r\x1b[K%s %d of %d …", what, count, of)
		}
	}
	done = func() {
		if shown {
			fmt.Fprint(file, "\r\x1b[K")
		}
	}
	return step, done
}
