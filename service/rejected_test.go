package service

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
)

// A reply has room for so many rejected arrangements, and counts the others.
func TestRepliesCountTheRejectedThatTheyLeaveOut(t *testing.T) {
	for _, tc := range []struct{ all, given, more int }{
		{0, 0, 0}, {mostRejected, mostRejected, 0}, {mostRejected + 1, mostRejected, 1}, {30_000, mostRejected, 29_500},
	} {
		result := &beam.Result{Rejected: make([]beam.Rejected, tc.all)}
		for i := range result.Rejected {
			result.Rejected[i].Arrangement.Legs = 2 + i
		}
		out := outlet{}
		reply := out.design(result, "")
		require.Len(t, reply.Rejected, tc.given)
		require.Equal(t, tc.more, reply.RejectedMore)
		for i := range reply.Rejected {
			require.Equal(t, result.Rejected[i].Arrangement.Describe(out.system), reply.Rejected[i].Arrangement)
		}
	}
}
