package strict

import (
	"strconv"
	"strings"
)

var pointerEscapes = strings.NewReplacer("~", "~0", "/", "~1")

// appendName appends a member's name to a pointer.
func appendName(path []byte, name string) []byte {
	path = append(path, '/')
	if strings.ContainsAny(name, "~/") {
		name = pointerEscapes.Replace(name)
	}
	return append(path, name...)
}

func appendIndex(path []byte, i int) []byte {
	return strconv.AppendInt(append(path, '/'), int64(i), 10)
}

// Subject names in words what a pointer points at, to begin a sentence about
// it: "width" for /section/width, "spans item 2" for /spans/1.
func Subject(path string) string {
	i := strings.LastIndexByte(path, '/')
	if i < 0 {
		return "the request"
	}
	last := path[i+1:]
	if n, err := strconv.Atoi(last); err == nil && i > 0 {
		return Subject(path[:i]) + " item " + strconv.Itoa(n+1)
	}
	return strings.NewReplacer("~1", "/", "~0", "~").Replace(last)
}
