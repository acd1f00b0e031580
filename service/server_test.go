package service_test

import (
	"bytes"
	"fmt"
	"io"
	"log/slog"
	"net"
	"net/http"
	"net/http/httptest"
	"strings"
	"sync"
	"testing"
	"time"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/service"
	"soffit.example/service/internal/wire"
)

func TestReferenceDataIsCacheable(t *testing.T) {
	s := newService(t)
	for _, path := range []string{"/v1/bars", "/v1/bars/astm-inch", "/v1/bars/en-10080", "/v1/codes", "/v1/units", "/openapi.json", "/"} {
		t.Run(path, func(t *testing.T) {
			w := send(s, "GET", path, "")
			require.Equal(t, http.StatusOK, w.Code)
			tag := w.Header().Get("ETag")
			require.Regexp(t, `^"[0-9a-f]{32}"$`, tag, "a strong tag")
			require.Equal(t, tag, send(s, "GET", path, "").Header().Get("ETag"))
			require.Equal(t, tag, send(newService(t), "GET", path, "").Header().Get("ETag"), "of the content alone")

			again := send(s, "GET", path, "", "If-None-Match", tag)
			require.Equal(t, http.StatusNotModified, again.Code)
			require.Zero(t, again.Body.Len())
			require.Equal(t, tag, again.Header().Get("ETag"))
			require.Equal(t, http.StatusOK, send(s, "GET", path, "", "If-None-Match", `"other"`).Code)

			head := send(s, "HEAD", path, "")
			require.Equal(t, http.StatusOK, head.Code)
			require.Zero(t, head.Body.Len())
			require.Equal(t, w.Header().Get("Content-Type"), head.Header().Get("Content-Type"))
			require.Equal(t, fmt.Sprint(w.Body.Len()), head.Header().Get("Content-Length"))
		})
	}
}

func TestReferenceDataSaysWhatItShould(t *testing.T) {
	s := newService(t)
	bars := decode[wire.Catalog](t, send(s, "GET", "/v1/bars/astm-inch", ""))
	for _, size := range bars.Sizes {
		if size.Name == "#8" { // ASTM A615/A615M, Table 1
			require.Equal(t, "1 in", size.Diameter.String())
			require.Equal(t, "0.79 in2", size.Area.String())
			require.Equal(t, "2.67 lb/ft", size.Mass.String())
		}
	}
	codes := decode[wire.Codes](t, send(s, "GET", "/v1/codes", ""))
	require.Equal(t, "ACI 318-19", codes.Codes[0].ID)
	units := decode[wire.Units](t, send(s, "GET", "/v1/units", ""))
	found := false
	for _, d := range units.Dimensions {
		for _, u := range d.Units {
			if u.Symbol == "in" { // NIST SP 811, appendix B.8: exactly 0.0254 m
				found = true
				require.Equal(t, "0.0254", u.Factor)
				require.Equal(t, "[in_i]", u.UCUM)
				require.Equal(t, "in", d.Prints.US)
				require.Equal(t, "mm", d.Prints.SI)
			}
		}
	}
	require.True(t, found)
}

func TestThePageLinksToWhatThereIs(t *testing.T) {
	s := newService(t)
	w := send(s, "GET", "/", "")
	require.Equal(t, "text/html; charset=utf-8", w.Header().Get("Content-Type"))
	require.Contains(t, w.Header().Get("Content-Security-Policy"), "default-src 'none'")
	page := w.Body.String()
	require.NotContains(t, page, "<script")
	for link := range strings.SplitSeq(page, `href="`) {
		if path, _, ok := strings.Cut(link, `"`); ok && strings.HasPrefix(path, "/") {
			require.Equal(t, http.StatusOK, send(s, "GET", path, "").Code, path)
		}
	}
	// The type of a problem leads to its description on the page.
	p := problemOf(t, send(s, "GET", "/none", ""))
	where := send(s, "GET", p.Type, "")
	require.Equal(t, http.StatusFound, where.Code)
	require.Equal(t, "/#problem-not-found", where.Header().Get("Location"))
	require.Contains(t, page, `id="problem-not-found"`)
}

func TestReadinessFlipsAndTheRestGoesOn(t *testing.T) {
	s := newService(t)
	require.Equal(t, http.StatusOK, send(s, "GET", "/readyz", "").Code)
	s.Stopping()
	require.Equal(t, http.StatusServiceUnavailable, send(s, "GET", "/readyz", "").Code)
	require.Equal(t, http.StatusOK, send(s, "GET", "/healthz", "").Code)
	require.Equal(t, http.StatusOK, send(s, "POST", "/v1/fits", goodFits).Code)
	require.Equal(t, http.StatusOK, send(s, "HEAD", "/healthz", "").Code)
}

func TestHosts(t *testing.T) {
	loopback := newService(t)
	named := newService(t, func(o *service.Options) { o.Hosts = []string{"beams.example"} })
	for _, tc := range []struct {
		s    *service.Service
		host string
		want int
	}{
		{loopback, "127.0.0.1:8318", 200}, {loopback, "localhost:8318", 200}, {loopback, "LOCALHOST", 200},
		{loopback, "[::1]:8318", 200}, {loopback, "[::1]", 200}, {loopback, "beams.example", 421}, {loopback, "127.0.0.1.evil.example", 421},
		{loopback, "", 421}, {named, "beams.example", 200}, {named, "Beams.Example:443", 200}, {named, "localhost", 421},
	} {
		require.Equal(t, tc.want, send(tc.s, "GET", "/v1/codes", "", "Host", tc.host).Code, tc.host)
	}
	// Probes address a machine by its number.
	require.Equal(t, 200, send(named, "GET", "/healthz", "", "Host", "10.0.0.7:8318").Code)
	require.Equal(t, 200, send(named, "GET", "/readyz", "", "Host", "10.0.0.7:8318").Code)
}

func TestAccept(t *testing.T) {
	s := newService(t)
	for accept, want := range map[string]int{
		"": 200, "*/*": 200, "application/json": 200, "application/*": 200, "text/html, */*;q=0.1": 200,
		"application/json;q=0.5, text/html": 200, "text/*": 406, "application/json;q=0": 406, "application/xml": 406,
	} {
		require.Equal(t, want, send(s, "POST", "/v1/fits", goodFits, "Accept", accept).Code, accept)
	}
	require.Equal(t, "Accept", send(s, "POST", "/v1/designs", goodBrief).Header().Get("Vary"))
}

func TestRequestID(t *testing.T) {
	s := newService(t)
	id := func(given string) string {
		return send(s, "GET", "/healthz", "", "X-Request-Id", given).Header().Get("X-Request-Id")
	}
	require.Equal(t, "job-7.a_B", id("job-7.a_B"))
	for _, bad := range []string{"", "a b", "a\"b", strings.Repeat("x", 65), "naïve", "<script>"} {
		require.Regexp(t, `^[0-9a-f]{24}$`, id(bad), bad)
	}
	require.NotEqual(t, id(""), id(""))
}

// stubborn is a code whose Strengths does what a test wants before it answers.
type stubborn struct {
	beam.Code
	first func()
}

func (c stubborn) Strengths(q beam.SectionQuery) (beam.Strengths, error) {
	c.first()
	return c.Code.Strengths(q)
}

// bare is a code that leaves section strengths out.
type bare struct{ beam.Code }

func (bare) Strengths(beam.SectionQuery) (beam.Strengths, error) {
	return beam.Strengths{}, fmt.Errorf("bare: %w", beam.ErrNotOffered)
}

func TestACodeMayLeaveStrengthsOut(t *testing.T) {
	s := newService(t, func(o *service.Options) { o.Codes = []beam.Code{bare{codes()[0]}} })
	w := send(s, "POST", "/v1/strengths", goodStrengths)
	require.Equal(t, http.StatusUnprocessableEntity, w.Code)
	require.Equal(t, "/code", problemOf(t, w).Errors[0].Path)
}

func TestAPanicBecomesAProblemThatSaysNothing(t *testing.T) {
	var log bytes.Buffer
	s := newService(t, func(o *service.Options) {
		o.Codes = []beam.Code{stubborn{codes()[0], func() { panic("the secret of the house") }}}
		o.Log = slog.New(slog.NewTextHandler(&log, nil))
	})
	w := send(s, "POST", "/v1/strengths", goodStrengths, "X-Request-Id", "job-9")
	require.Equal(t, http.StatusInternalServerError, w.Code)
	p := problemOf(t, w)
	require.Equal(t, "/problems/internal", p.Type)
	require.NotContains(t, w.Body.String(), "secret")
	require.Contains(t, log.String(), "the secret of the house")
	require.Contains(t, log.String(), "job-9")
	require.Equal(t, http.StatusOK, send(s, "POST", "/v1/fits", goodFits).Code, "the service goes on")
}

func TestTheLogHasNoQuery(t *testing.T) {
	var log bytes.Buffer
	s := newService(t, func(o *service.Options) { o.Log = slog.New(slog.NewTextHandler(&log, nil)) })
	send(s, "GET", "/v1/codes?token=abc", "")
	require.Contains(t, log.String(), "path=/v1/codes")
	require.NotContains(t, log.String(), "token")
}

// held is a service with one place, and a request that holds it until let go.
func held(t *testing.T, limits service.Limits) (s *service.Service, letGo func()) {
	entered, leave := make(chan struct{}), make(chan struct{})
	s = newService(t, func(o *service.Options) {
		o.Codes = []beam.Code{stubborn{codes()[0], func() { entered <- struct{}{}; <-leave }}}
		o.Limits = limits
	})
	done := make(chan int)
	go func() { done <- send(s, "POST", "/v1/strengths", goodStrengths).Code }()
	<-entered
	return s, func() {
		close(leave)
		require.Equal(t, http.StatusOK, <-done)
	}
}

func TestWorkIsBounded(t *testing.T) {
	s, letGo := held(t, service.Limits{Work: 1, Wait: 5 * time.Millisecond})
	w := send(s, "POST", "/v1/fits", goodFits)
	require.Equal(t, http.StatusServiceUnavailable, w.Code)
	require.Equal(t, "/problems/busy", problemOf(t, w).Type)
	require.Equal(t, "1", w.Header().Get("Retry-After"))
	require.Equal(t, http.StatusUnprocessableEntity, send(s, "POST", "/v1/fits", `{}`).Code, "faults need no place")
	require.Equal(t, http.StatusOK, send(s, "GET", "/v1/codes", "").Code, "nor does reference data")
	letGo()
	require.Equal(t, http.StatusOK, send(s, "POST", "/v1/fits", goodFits).Code)
}

func TestAWaitingRequestGetsItsTurn(t *testing.T) {
	s, letGo := held(t, service.Limits{Work: 1, Wait: 10 * time.Second})
	done := make(chan int)
	go func() { done <- send(s, "POST", "/v1/fits", goodFits).Code }()
	letGo()
	require.Equal(t, http.StatusOK, <-done)
}

func TestAClientHasItsShare(t *testing.T) {
	s, letGo := held(t, service.Limits{Work: 8, PerClient: 1})
	w := send(s, "POST", "/v1/fits", goodFits)
	require.Equal(t, http.StatusTooManyRequests, w.Code)
	require.Equal(t, "/problems/too-many", problemOf(t, w).Type)
	require.Equal(t, "1", w.Header().Get("Retry-After"))

	r := httptest.NewRequest("POST", "/v1/fits", strings.NewReader(goodFits))
	r.Header.Set("Content-Type", "application/json")
	r.Host, r.RemoteAddr = "localhost", "192.0.2.99:4000"
	other := httptest.NewRecorder()
	s.ServeHTTP(other, r)
	require.Equal(t, http.StatusOK, other.Code, "another client is let in")
	letGo()
	require.Equal(t, http.StatusOK, send(s, "POST", "/v1/fits", goodFits).Code)
}

func TestTimeIsBounded(t *testing.T) {
	s := newService(t, func(o *service.Options) { o.Limits.Time = time.Nanosecond })
	w := send(s, "POST", "/v1/designs", goodBrief)
	require.Equal(t, http.StatusServiceUnavailable, w.Code)
	require.Equal(t, "/problems/time-limit", problemOf(t, w).Type)
	require.Equal(t, "1", w.Header().Get("Retry-After"))
}

func TestBodyAndDepthAreBounded(t *testing.T) {
	s := newService(t, func(o *service.Options) { o.Limits.Body, o.Limits.Depth = 100, 3 })
	require.Equal(t, http.StatusRequestEntityTooLarge, send(s, "POST", "/v1/fits", goodFits).Code)
	require.Equal(t, http.StatusBadRequest, send(s, "POST", "/v1/fits", `{"layers": [{"size": []}]}`).Code)
}

func TestASlowBodyIsGivenUp(t *testing.T) {
	server := httptest.NewUnstartedServer(newService(t))
	server.Config.ReadTimeout = 50 * time.Millisecond
	server.Start()
	defer server.Close()
	conn, err := net.Dial("tcp", server.Listener.Addr().String())
	require.NoError(t, err)
	defer conn.Close()
	_, err = fmt.Fprint(conn, "POST /v1/fits HTTP/1.1\r\nHost: localhost\r\nContent-Type: application/json\r\nContent-Length: 1000\r\n\r\n{")
	require.NoError(t, err)
	require.NoError(t, conn.SetReadDeadline(time.Now().Add(5*time.Second)))
	reply := make([]byte, 200)
	n, err := conn.Read(reply)
	require.NoError(t, err)
	require.Contains(t, string(reply[:n]), "HTTP/1.1 408 ")
}

func TestManyAtOnceGetTheSameBytes(t *testing.T) {
	s := newService(t, func(o *service.Options) { o.Limits.Wait = time.Minute; o.Limits.Work = 4 })
	want := map[string]string{}
	for path, body := range goodRequests() {
		want[path] = send(s, "POST", path, body).Body.String()
	}
	var wg sync.WaitGroup
	for range 8 {
		for path, body := range goodRequests() {
			wg.Go(func() {
				if got := send(s, "POST", path, body).Body.String(); got != want[path] {
					t.Errorf("%s: another reply under load", path)
				}
				send(s, "POST", path, body[1:])
			})
		}
	}
	wg.Wait()
}

// What cannot be read as a body at all is the sender's fault too.
func TestABrokenBodyIsTheSendersFault(t *testing.T) {
	server := httptest.NewServer(newService(t))
	defer server.Close()
	for name, request := range map[string]string{
		"chunk":  "Transfer-Encoding: chunked\r\n\r\nzz\r\n{}\r\n0\r\n\r\n",
		"length": "Content-Length: 1000\r\n\r\n{}",
	} {
		t.Run(name, func(t *testing.T) {
			conn, err := net.Dial("tcp", server.Listener.Addr().String())
			require.NoError(t, err)
			defer conn.Close()
			_, err = fmt.Fprint(conn, "POST /v1/fits HTTP/1.1\r\nHost: localhost\r\nContent-Type: application/json\r\n"+request)
			require.NoError(t, err)
			require.NoError(t, conn.(*net.TCPConn).CloseWrite())
			require.NoError(t, conn.SetReadDeadline(time.Now().Add(5*time.Second)))
			reply, err := io.ReadAll(conn)
			require.NoError(t, err)
			require.Contains(t, string(reply), "HTTP/1.1 400 ")
			require.Contains(t, string(reply), "the body does not arrive as its headers announce it")
		})
	}
}

func TestOddPathsAreNotFoundOrMisplaced(t *testing.T) {
	s := newService(t)
	for path, want := range map[string]int{
		"/v1/bars/%2e%2e": 404, "//": 404, "/v1//bars": 404, "/V1/bars": 404, "/v1/bars/astm-inch/": 404, "/v1/bars/astm%2Dinch": 200, "/problems/%00": 404,
	} {
		require.Equal(t, want, send(s, "GET", path, "").Code, path)
	}
	for _, method := range []string{"PUT", "DELETE", "PATCH", "HEAD", "TRACE"} {
		w := send(s, method, "/v1/designs", "")
		require.Equal(t, http.StatusMethodNotAllowed, w.Code, method)
		require.Contains(t, w.Header().Get("Allow"), "POST")
	}
	require.Contains(t, send(s, "OPTIONS", "/v1/designs", "").Header().Get("Allow"), "POST")
}

// The dearest documents that the limits let in are still cheap to refuse.
func TestHostileDocumentsAreCheap(t *testing.T) {
	s := newService(t)
	var unknown, similar strings.Builder
	for i := range 9000 {
		fmt.Fprintf(&unknown, `"colour of the beam %d":1,`, i)
		if i < 3000 {
			fmt.Fprintf(&similar, `{"intensity_and": "1 k%d"},`, i)
		}
	}
	for name, body := range map[string]string{
		"unknown members": `{` + strings.TrimSuffix(unknown.String(), ",") + `}`,
		"faulty items":    `{"loads": [` + strings.TrimSuffix(similar.String(), ",") + `]}`,
		"long text":       `{"reference": "` + strings.Repeat("é", 120<<10) + `"}`,
		"long number":     `{"serviceability": {"months": ` + strings.Repeat("9", 200<<10) + `}}`,
		"many digits":     strings.Replace(goodFits, `"16 in"`, `"`+strings.Repeat("9", 200<<10)+` in"`, 1),
	} {
		start := time.Now()
		w := send(s, "POST", "/v1/designs", body)
		require.Contains(t, []int{400, 422}, w.Code, name)
		require.Less(t, time.Since(start), 2*time.Second, name)
		require.Less(t, w.Body.Len(), 200<<10, name)
		t.Logf("%s: %v, %d, %d bytes back", name, time.Since(start), w.Code, w.Body.Len())
	}
}
