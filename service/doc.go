// Package service is the JSON door of the beam designer: it reads requests
// strictly, hands them to package beam with the design codes it was given,
// and writes the results.
//
// It knows no design code by name. [New] takes the codes as values and
// returns an http.Handler; the program that lists the codes, opens the
// listener and handles signals is soffitd.
//
// A request passes three gates. Package strict reads the document and lists
// everything structurally wrong with it; the conversion to package beam's
// types adds what contradicts itself; package beam adds what no code is
// needed to see, and what the code's tables do not know. All of it comes back
// in one RFC 9457 problem. A beam that fails or lies outside the method is no
// problem: it is a result.
//
// The service keeps no state between requests. The same request gives the
// same bytes: no clock and no random value is in a body.
package service

//go:generate go run ./internal/openapi/generate -o openapi.json
