// Package archtest holds the house together: its test asserts which package
// may import which. It has no code of its own.
package archtest
