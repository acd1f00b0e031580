package tiny

import "testing"

func TestMost(t *testing.T) {
	if Most(1, 2) != 2 || Most(2, 1) != 2 {
		t.Fatal("Most")
	}
}

func TestScaled(t *testing.T) {
	if Scaled(3) != 6 {
		t.Fatal("Scaled")
	}
}

func TestBoth(t *testing.T) {
	if !Both(true, true) || Both(true, false) || Both(false, false) {
		t.Fatal("Both")
	}
}

func TestCount(t *testing.T) {
	if Count(4) != 6 {
		t.Fatal("Count")
	}
}

func TestClamp(t *testing.T) {
	if Clamp(0.5) != 0.5 {
		t.Fatal("Clamp")
	}
}

func TestFits(t *testing.T) {
	a, b := Length{1}, Length{2}
	if !Fits(a, b, Length{3}) || !Fits(a, b, Length{4}) || Fits(a, b, Length{2.5}) {
		t.Fatal("Fits")
	}
}

func TestHalvings(t *testing.T) {
	if Halvings(2) != 1 || Halvings(5) != 2 {
		t.Fatal("Halvings")
	}
}
