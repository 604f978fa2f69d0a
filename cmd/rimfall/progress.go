package main

import (
	"fmt"
	"os"
	"time"
)

// progressAfter is how long a run stays silent.
const progressAfter = time.Second

// progress shows a line on standard error when what follows takes over a second
// and a person watches. The function that it returns takes the line away.
func (a *app) progress(what string) (done func()) {
	file, ok := a.err.(*os.File)
	if !ok {
		return func() {}
	}
	info, err := file.Stat()
	if err != nil || info.Mode()&os.ModeCharDevice == 0 {
		return func() {}
	}
	stop, stopped := make(chan struct{}), make(chan struct{})
	go func() {
		defer close(stopped)
		select {
		case <-stop:
			return
		case <-time.After(progressAfter):
		}
		fmt.Fprintf(file, "%s …", what)
		<-stop
		fmt.Fprint(file, "\r\x1b[K")
	}()
	return func() {
		close(stop)
		<-stopped
	}
}
