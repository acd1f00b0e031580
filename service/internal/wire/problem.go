package wire

import "soffit.example/service/internal/strict"

// Problem is a problem reply as RFC 9457 has it.
type Problem struct {
	Type     string         `json:"type" doc:"Relative reference to the description of this kind of problem."`
	Title    string         `json:"title" doc:"The kind of problem in words."`
	Status   int            `json:"status" doc:"The HTTP status."`
	Detail   string         `json:"detail" doc:"What is wrong with this request."`
	Instance string         `json:"instance" doc:"Path that was asked for."`
	Errors   []strict.Fault `json:"errors,omitzero" doc:"Every fault of the request."`
}

// Health is the reply of /healthz and /readyz.
type Health struct {
	Status string `json:"status" enum:"ok ready stopping" doc:"State of the service."`
}
