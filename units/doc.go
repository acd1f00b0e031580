// Package units holds the physical quantities of beam design as types, reads
// them from text and JSON, and prints them.
package units
