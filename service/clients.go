package service

import (
	"net"
	"sync"
)

// clients counts the requests in hand by client address, that of the
// connection: what a forwarding header says can be made up.
type clients struct {
	most int // 0: not limited
	mu   sync.Mutex
	busy map[string]int
}

// enter counts a request in; ok is false where its client has as many in hand
// as it may.
func (c *clients) enter(remote string) (leave func(), ok bool) {
	if c.most == 0 {
		return func() {}, true
	}
	host, _, err := net.SplitHostPort(remote)
	if err != nil {
		host = remote
	}
	c.mu.Lock()
	defer c.mu.Unlock()
	if c.busy[host] >= c.most {
		return nil, false
	}
	if c.busy == nil {
		c.busy = make(map[string]int)
	}
	c.busy[host]++
	return func() {
		c.mu.Lock()
		defer c.mu.Unlock()
		if c.busy[host]--; c.busy[host] == 0 {
			delete(c.busy, host)
		}
	}, true
}
