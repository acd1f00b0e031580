// Command generate writes the OpenAPI document of the JSON door.
package main

import (
	"flag"
	"log"
	"os"

	"soffit.example/service/internal/openapi"
)

func main() {
	log.SetFlags(0)
	log.SetPrefix("generate: ")
	out := flag.String("o", "openapi.json", "file to write")
	flag.Parse()
	data, err := openapi.JSON()
	if err == nil {
		err = os.WriteFile(*out, data, 0o644)
	}
	if err != nil {
		log.Fatal(err)
	}
}
