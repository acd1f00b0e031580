package main

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// A character cell is about twice as tall as it is wide.
const (
	cellWidth  = 0.5 // in
	cellHeight = 1.0 // in
)

// section draws the cross-section in characters: the form, the stirrup and
// each bar where its coordinates put it.
func (p *printer) section(r *beam.Result) {
	p.head("Section")
	columns := int(math.Round(r.Section.Width.In(units.Inch) / cellWidth))
	rows := int(math.Round(r.Section.Depth.In(units.Inch) / cellHeight))
	grid := make([][]rune, rows+1)
	for y := range grid {
		grid[y] = make([]rune, columns+1)
		for x := range grid[y] {
			grid[y][x] = ' '
			if edgeX, edgeY := x == 0 || x == columns, y == 0 || y == rows; edgeX && edgeY {
				grid[y][x] = '+'
			} else if edgeX {
				grid[y][x] = '|'
			} else if edgeY {
				grid[y][x] = '-'
			}
		}
	}
	put := func(x, y units.Length, c rune) {
		i := int(math.Round(x.In(units.Inch) / cellWidth))
		j := rows - int(math.Round(y.In(units.Inch)/cellHeight))
		if j >= 0 && j <= rows && i >= 0 && i <= columns {
			grid[j][i] = c
		}
	}
	if len(r.Layout.Transverse) > 0 {
		left, bottom := r.Cover, r.Cover
		right, top := r.Section.Width.Sub(left), r.Section.Depth.Sub(bottom)
		for x := left; !right.Less(x); x = x.Add(units.Inch.Of(cellWidth)) {
			put(x, bottom, '.')
			put(x, top, '.')
		}
		for y := bottom; !top.Less(y); y = y.Add(units.Inch.Of(cellHeight)) {
			put(left, y, '.')
			put(right, y, '.')
		}
	}
	for _, b := range r.Bars {
		put(b.X, b.Y, 'O')
	}
	for _, line := range grid {
		p.line("    %s", string(line))
	}
	p.line("    %s wide, %s deep", p.sys.Format(r.Section.Width.Amount()), p.sys.Format(r.Section.Depth.Amount()))
}
