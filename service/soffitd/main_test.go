package main

import (
	"bytes"
	"context"
	"errors"
	"flag"
	"fmt"
	"io"
	"log/slog"
	"net"
	"net/http"
	"strings"
	"testing"
	"time"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/service"
)

func environment(pairs ...string) func(string) (string, bool) {
	return func(name string) (string, bool) {
		for i := 0; i < len(pairs); i += 2 {
			if pairs[i] == name {
				return pairs[i+1], true
			}
		}
		return "", false
	}
}

func TestConfigure(t *testing.T) {
	c, err := configure(nil, environment(), io.Discard)
	require.NoError(t, err)
	require.Equal(t, "127.0.0.1:8318", c.listen)
	require.Empty(t, c.hosts(), "the loopback names")

	c, err = configure([]string{"--listen", "[::1]:9000", "--max-time=2s"}, environment("SOFFIT_LISTEN", "127.0.0.1:1", "SOFFIT_MAX_BODY", "4096"), io.Discard)
	require.NoError(t, err)
	require.Equal(t, "[::1]:9000", c.listen, "the flag wins")
	require.Equal(t, 2*time.Second, c.limits.Time)
	require.Equal(t, int64(4096), c.limits.Body)

	c, err = configure(nil, environment("SOFFIT_LISTEN", "0.0.0.0:8318", "SOFFIT_ALLOW_HOST", "beams.example, 10.0.0.7"), io.Discard)
	require.NoError(t, err)
	require.Equal(t, []string{"beams.example", "10.0.0.7"}, c.hosts())
}

func TestConfigureRefuses(t *testing.T) {
	for name, tc := range map[string]struct {
		args []string
		env  []string
		want string
	}{
		"open address without hosts": {[]string{"--listen", "0.0.0.0:8318"}, nil, "--allow-host"},
		"every address":              {[]string{"--listen", ":8318"}, nil, "--allow-host"},
		"named address":              {[]string{"--listen", "beams.example:8318"}, nil, "--allow-host"},
		"no port":                    {[]string{"--listen", "127.0.0.1"}, nil, `--listen is "127.0.0.1"`},
		"port out of range":          {[]string{"--listen", "127.0.0.1:99999"}, nil, `"99999"; it must be a number from 0 to 65535`},
		"any host":                   {[]string{"--allow-host", "*"}, nil, `--allow-host has "*"`},
		"host with port":             {[]string{"--allow-host", "beams.example:80"}, nil, "without port"},
		"unknown flag":               {[]string{"--lisen", "x"}, nil, "lisen"},
		"argument":                   {[]string{"serve"}, nil, `"serve" is not a flag`},
		"body too small":             {[]string{"--max-body", "1"}, nil, "1024 to 67108864"},
		"time without unit":          {[]string{"--max-time", "10"}, nil, "max-time"},
		"negative work":              {[]string{"--max-work", "-1"}, nil, "0 to 100000"},
		"variable not a number":      {nil, []string{"SOFFIT_MAX_DEPTH", "deep"}, `SOFFIT_MAX_DEPTH is "deep"`},
	} {
		t.Run(name, func(t *testing.T) {
			_, err := configure(tc.args, environment(tc.env...), io.Discard)
			require.ErrorContains(t, err, tc.want)
			var errs bytes.Buffer
			require.Equal(t, exitUsage, run(context.Background(), tc.args, environment(tc.env...), io.Discard, &errs))
			require.Contains(t, errs.String(), tc.want)
		})
	}
}

func TestHelpListsEveryFlagWithItsVariable(t *testing.T) {
	var out bytes.Buffer
	_, err := configure([]string{"--help"}, environment(), &out)
	require.ErrorIs(t, err, flag.ErrHelp)
	for _, name := range []string{"listen", "allow-host", "max-body", "max-depth", "max-values", "max-faults", "max-time", "max-work", "max-wait", "max-per-client", "read-timeout", "drain", "grace"} {
		require.Contains(t, out.String(), "--"+name+" ")
		require.Contains(t, out.String(), "("+variable(name)+")")
	}
	require.Contains(t, out.String(), "(default 127.0.0.1:8318)")
	require.Equal(t, 0, run(context.Background(), []string{"--help"}, environment(), io.Discard, io.Discard))
}

func TestCodesAreTheEditionsOffered(t *testing.T) {
	var ids []string
	for _, c := range codes() {
		ids = append(ids, c.Edition().ID)
	}
	require.Equal(t, []string{"ACI 318-19", "ACI 318M-19", "ACI 318-14", "ACI 318M-14"}, ids)
}

// stubborn is a code whose Strengths waits to be let go.
type stubborn struct {
	beam.Code
	entered chan<- struct{}
	leave   <-chan struct{}
}

func (c stubborn) Strengths(q beam.SectionQuery) (beam.Strengths, error) {
	c.entered <- struct{}{}
	<-c.leave
	return c.Code.Strengths(q)
}

// started runs the program's server on a free port with a stubborn code.
func started(t *testing.T, grace time.Duration) (url string, entered, leave chan struct{}, stop func(), ended chan error) {
	entered, leave, ended = make(chan struct{}), make(chan struct{}), make(chan error, 1)
	log := slog.New(slog.NewTextHandler(io.Discard, nil))
	door, err := service.New(service.Options{Codes: []beam.Code{stubborn{codes()[0], entered, leave}}, Limits: service.Limits{Work: 2}, Log: log})
	require.NoError(t, err)
	c, err := configure([]string{"--grace", grace.String(), "--drain", "200ms"}, environment(), io.Discard)
	require.NoError(t, err)
	listener, err := net.Listen("tcp", "127.0.0.1:0")
	require.NoError(t, err)
	ctx, cancel := context.WithCancel(context.Background())
	t.Cleanup(cancel)
	go func() { ended <- serveOn(ctx, listener, door, c, log) }()
	return "http://" + listener.Addr().String(), entered, leave, cancel, ended
}

const strengths = `{"code": "ACI 318-19", "section": {"shape": "rectangular", "width": "16 in", "depth": "26 in"},
  "concrete": {"strength": "4.5 ksi"}, "layers": [{"area": "3.16 in2", "depth": "23.5 in", "yield": "60 ksi"}]}`

func ask(url string) (status int, err error) {
	r, err := http.Post(url+"/v1/strengths", "application/json", strings.NewReader(strengths))
	if err != nil {
		return 0, err
	}
	defer r.Body.Close()
	_, err = io.Copy(io.Discard, r.Body)
	return r.StatusCode, err
}

func TestStoppingFinishesRunningRequests(t *testing.T) {
	url, entered, leave, stop, ended := started(t, 10*time.Second)
	type outcome struct {
		status int
		err    error
	}
	running := make(chan outcome, 1)
	go func() {
		status, err := ask(url)
		running <- outcome{status, err}
	}()
	<-entered
	stop()

	// Readiness flips while requests are still taken, for the time of --drain.
	require.Eventually(t, func() bool {
		r, err := http.Get(url + "/readyz")
		if err != nil {
			return false
		}
		r.Body.Close()
		return r.StatusCode == http.StatusServiceUnavailable
	}, 5*time.Second, 5*time.Millisecond)
	select {
	case err := <-ended:
		require.Fail(t, "it ended with a request running", "%v", err)
	case <-time.After(300 * time.Millisecond):
	}
	close(leave)
	got := <-running
	require.NoError(t, got.err)
	require.Equal(t, http.StatusOK, got.status)
	require.NoError(t, <-ended)
	_, err := ask(url)
	require.Error(t, err, "nobody listens any more")
}

func TestStoppingGivesUpAfterItsGrace(t *testing.T) {
	url, entered, leave, stop, ended := started(t, 50*time.Millisecond)
	go func() { _, _ = ask(url) }()
	<-entered
	stop()
	require.ErrorContains(t, <-ended, "still running after 50ms")
	close(leave)
}

func TestRunSaysWhatFailed(t *testing.T) {
	taken, err := net.Listen("tcp", "127.0.0.1:0")
	require.NoError(t, err)
	defer taken.Close()
	var errs bytes.Buffer
	require.Equal(t, exitFailed, run(context.Background(), []string{"--listen", taken.Addr().String()}, environment(), io.Discard, &errs))
	require.Contains(t, errs.String(), "address already in use")

	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	require.Equal(t, 0, run(ctx, []string{"--listen", "127.0.0.1:0"}, environment(), io.Discard, io.Discard))
}

func TestTheServerKeepsHeadersShort(t *testing.T) {
	url, _, leave, _, _ := started(t, time.Second)
	defer close(leave)
	r, err := http.NewRequest("GET", url+"/v1/codes", nil)
	require.NoError(t, err)
	r.Header.Set("X-Long", strings.Repeat("x", 64<<10))
	reply, err := http.DefaultClient.Do(r)
	if errors.Is(err, io.EOF) || err != nil && strings.Contains(fmt.Sprint(err), "reset") {
		return // the server hung up before all of it was sent
	}
	require.NoError(t, err)
	defer reply.Body.Close()
	require.Equal(t, http.StatusRequestHeaderFieldsTooLarge, reply.StatusCode)
}
