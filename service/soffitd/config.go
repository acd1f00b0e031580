package main

import (
	"flag"
	"fmt"
	"io"
	"net"
	"slices"
	"strconv"
	"strings"
	"time"

	"soffit.example/service"
)

// config is what the program was told.
type config struct {
	listen      string
	allowHosts  []string
	limits      service.Limits
	readTimeout time.Duration
	drain       time.Duration
	grace       time.Duration
}

// usage precedes the list of flags.
const usage = `soffitd serves the JSON door of the beam designer.

Each flag can also be given as the environment variable beside it; the flag
wins. On an address that other machines can reach, --allow-host must name the
hosts that requests may be addressed to: without it any web page open on this
network could use the service under a name of its own. There is no login; put
a proxy that knows the users in front of it.

`

// configure reads flags and environment. Its error is flag.ErrHelp where help
// was asked for and has been written to out.
func configure(args []string, getenv func(string) (string, bool), out io.Writer) (*config, error) {
	var c config
	var hosts string
	fs := flag.NewFlagSet("soffitd", flag.ContinueOnError)
	fs.SetOutput(io.Discard)
	fs.StringVar(&c.listen, "listen", "127.0.0.1:8318", "`address` to listen on")
	fs.StringVar(&hosts, "allow-host", "", "comma-separated `names` by which requests may address this service, without port; needed unless listening on a loopback address (then: localhost, 127.0.0.1, ::1)")
	fs.Int64Var(&c.limits.Body, "max-body", 256<<10, "`bytes` of a request body")
	fs.IntVar(&c.limits.Depth, "max-depth", 16, "`levels` of nesting in a request")
	fs.IntVar(&c.limits.Values, "max-values", 20_000, "`number` of names and values in a request")
	fs.IntVar(&c.limits.Faults, "max-faults", 100, "`number` of faults listed in one reply")
	fs.DurationVar(&c.limits.Time, "max-time", 10*time.Second, "`time` for the computation of one request")
	fs.IntVar(&c.limits.Work, "max-work", 0, "`number` of requests computed at once; 0: one for each processor")
	fs.DurationVar(&c.limits.Wait, "max-wait", 50*time.Millisecond, "`time` that a request waits for its turn before it is told to come back")
	fs.IntVar(&c.limits.PerClient, "max-per-client", 0, "`number` of requests that one client address may have in hand; 0: not limited")
	fs.DurationVar(&c.readTimeout, "read-timeout", 15*time.Second, "`time` for a request to arrive")
	fs.DurationVar(&c.drain, "drain", 0, "`time` between announcing the stop on /readyz and taking no more requests")
	fs.DurationVar(&c.grace, "grace", 30*time.Second, "`time` for running requests to finish when stopping")

	if err := fs.Parse(args); err != nil {
		if err == flag.ErrHelp {
			fmt.Fprint(out, usage)
			describe(fs, out)
		}
		return nil, err
	}
	if fs.NArg() > 0 {
		return nil, fmt.Errorf("%q is not a flag", fs.Arg(0))
	}
	if err := fromEnvironment(fs, getenv); err != nil {
		return nil, err
	}
	for h := range strings.SplitSeq(hosts, ",") {
		if h = strings.TrimSpace(h); h != "" {
			c.allowHosts = append(c.allowHosts, h)
		}
	}
	return &c, c.check()
}

// variable is the environment variable of a flag.
func variable(name string) string {
	return "SOFFIT_" + strings.ToUpper(strings.ReplaceAll(name, "-", "_"))
}

// fromEnvironment sets the flags that were not given from their variables.
func fromEnvironment(fs *flag.FlagSet, getenv func(string) (string, bool)) error {
	given := map[string]bool{}
	fs.Visit(func(f *flag.Flag) { given[f.Name] = true })
	var failed error
	fs.VisitAll(func(f *flag.Flag) {
		v, ok := getenv(variable(f.Name))
		if !ok || given[f.Name] || failed != nil {
			return
		}
		if err := fs.Set(f.Name, v); err != nil {
			failed = fmt.Errorf("%s is %q: %w", variable(f.Name), v, err)
		}
	})
	return failed
}

// describe lists the flags with their variables and defaults.
func describe(fs *flag.FlagSet, out io.Writer) {
	fs.VisitAll(func(f *flag.Flag) {
		arg, text := flag.UnquoteUsage(f)
		fmt.Fprintf(out, "  --%s %s  (%s)\n        %s", f.Name, strings.ToUpper(arg), variable(f.Name), text)
		if f.DefValue != "" {
			fmt.Fprintf(out, " (default %s)", f.DefValue)
		}
		fmt.Fprintln(out)
	})
}

func (c *config) check() error {
	host, port, err := net.SplitHostPort(c.listen)
	if err != nil {
		return fmt.Errorf("--listen is %q; it must be an address like 127.0.0.1:8318", c.listen)
	}
	if n, err := strconv.Atoi(port); err != nil || n < 0 || n > 65535 {
		return fmt.Errorf("--listen has the port %q; it must be a number from 0 to 65535", port)
	}
	if !loopback(host) && len(c.allowHosts) == 0 {
		return fmt.Errorf("--listen %s can be reached by other machines; name the hosts that requests may be addressed to with --allow-host", c.listen)
	}
	for _, h := range c.allowHosts {
		if strings.ContainsAny(h, "/*[] ") || strings.Contains(h, ":") && net.ParseIP(h) == nil {
			return fmt.Errorf("--allow-host has %q; it must be a host name or address, without port", h)
		}
	}
	for _, l := range []struct {
		name        string
		v, least    int64
		most        int64
		allowedText string
	}{
		{"max-body", c.limits.Body, 1 << 10, 64 << 20, "1024 to 67108864"},
		{"max-depth", int64(c.limits.Depth), 4, 1000, "4 to 1000"},
		{"max-values", int64(c.limits.Values), 100, 10_000_000, "100 to 10000000"},
		{"max-faults", int64(c.limits.Faults), 1, 10_000, "1 to 10000"},
		{"max-time", int64(c.limits.Time), int64(time.Millisecond), int64(time.Hour), "1ms to 1h"},
		{"max-work", int64(c.limits.Work), 0, 100_000, "0 to 100000"},
		{"max-wait", int64(c.limits.Wait), 1, int64(time.Minute), "1ns to 1m"},
		{"max-per-client", int64(c.limits.PerClient), 0, 100_000, "0 to 100000"},
		{"read-timeout", int64(c.readTimeout), int64(time.Millisecond), int64(time.Hour), "1ms to 1h"},
		{"drain", int64(c.drain), 0, int64(time.Hour), "0s to 1h"},
		{"grace", int64(c.grace), 0, int64(time.Hour), "0s to 1h"},
	} {
		if l.v < l.least || l.v > l.most {
			return fmt.Errorf("--%s is out of range; it must be from %s", l.name, l.allowedText)
		}
	}
	return nil
}

// hosts are the names that requests may be addressed to; none stands for the
// loopback names.
func (c *config) hosts() []string { return slices.Clone(c.allowHosts) }

// loopback reports whether an address can be reached from this machine alone.
func loopback(host string) bool {
	if host == "localhost" {
		return true
	}
	ip := net.ParseIP(host)
	return ip != nil && ip.IsLoopback()
}
