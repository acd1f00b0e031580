// Command soffitd serves the JSON door of the beam designer.
//
// It listens on 127.0.0.1:8318 unless told otherwise, and then also needs to
// be told by which host names it may be addressed. Every flag can be given as
// an environment variable too; soffitd --help lists them.
package main

import (
	"context"
	"errors"
	"flag"
	"fmt"
	"io"
	"log/slog"
	"net"
	"net/http"
	"os"
	"os/signal"
	"syscall"
	"time"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/service"
)

// codes lists the design codes on offer, the preferred one first. It is the
// only such list.
func codes() []beam.Code {
	var list []beam.Code
	for _, c := range aci318.Editions() {
		list = append(list, c)
	}
	return list
}

func main() {
	ctx, stop := signal.NotifyContext(context.Background(), os.Interrupt, syscall.SIGTERM)
	context.AfterFunc(ctx, stop) // a second signal ends the program at once
	os.Exit(run(ctx, os.Args[1:], os.LookupEnv, os.Stdout, os.Stderr))
}

// Exit statuses.
const (
	exitFailed = 1
	exitUsage  = 2
)

// run is the program, with what it touches handed in.
func run(ctx context.Context, args []string, getenv func(string) (string, bool), out, errs io.Writer) int {
	c, err := configure(args, getenv, out)
	switch {
	case errors.Is(err, flag.ErrHelp):
		return 0
	case err != nil:
		fmt.Fprintln(errs, "soffitd:", err)
		fmt.Fprintln(errs, "soffitd --help lists what it takes")
		return exitUsage
	}
	log := slog.New(slog.NewTextHandler(errs, nil))
	if err := serve(ctx, c, log); err != nil {
		log.Error("stopped", "error", err)
		return exitFailed
	}
	return 0
}

// serve answers requests until ctx ends, and then finishes those that run.
func serve(ctx context.Context, c *config, log *slog.Logger) error {
	door, err := service.New(service.Options{Codes: codes(), Limits: c.limits, Hosts: c.hosts(), Log: log})
	if err != nil {
		return err
	}
	listener, err := net.Listen("tcp", c.listen)
	if err != nil {
		return err
	}
	return serveOn(ctx, listener, door, c, log)
}

// serveOn serves on a listener that is open.
func serveOn(ctx context.Context, listener net.Listener, door *service.Service, c *config, log *slog.Logger) error {
	server := &http.Server{
		Handler:           door,
		ReadHeaderTimeout: 5 * time.Second,
		ReadTimeout:       c.readTimeout,
		WriteTimeout:      c.readTimeout + c.limits.Wait + c.limits.Time + writeAllowance,
		IdleTimeout:       60 * time.Second,
		MaxHeaderBytes:    16 << 10,
		ErrorLog:          slog.NewLogLogger(log.Handler(), slog.LevelWarn),
	}
	failed := make(chan error, 1)
	go func() { failed <- server.Serve(listener) }()
	log.Info("listening", "address", listener.Addr().String())

	select {
	case err := <-failed:
		return err
	case <-ctx.Done():
	}
	// Readiness goes first, so that no more requests are sent here while
	// those that run are finished.
	door.Stopping()
	log.Info("stopping", "drain", c.drain, "grace", c.grace)
	time.Sleep(c.drain)
	grace, cancel := context.WithTimeout(context.Background(), c.grace)
	defer cancel()
	if err := server.Shutdown(grace); err != nil {
		_ = server.Close()
		return fmt.Errorf("requests were still running after %s: %w", c.grace, err)
	}
	log.Info("stopped")
	return nil
}

// writeAllowance is the time for a reply to be taken.
const writeAllowance = 15 * time.Second
