package beam

// String gives the word of the JSON door; empty when not stated.
func (s Shape) String() string { return shapeWords.text(uint8(s)) }

// MarshalText gives the same word as String.
func (s Shape) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (s *Shape) UnmarshalText(text []byte) error {
	n, err := shapeWords.parse(string(text))
	*s = Shape(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (e Exposure) String() string { return exposureWords.text(uint8(e)) }

// MarshalText gives the same word as String.
func (e Exposure) MarshalText() ([]byte, error) { return []byte(e.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (e *Exposure) UnmarshalText(text []byte) error {
	n, err := exposureWords.parse(string(text))
	*e = Exposure(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (c ConcreteKind) String() string { return kindWords.text(uint8(c)) }

// MarshalText gives the same word as String.
func (c ConcreteKind) MarshalText() ([]byte, error) { return []byte(c.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (c *ConcreteKind) UnmarshalText(text []byte) error {
	n, err := kindWords.parse(string(text))
	*c = ConcreteKind(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (c Coating) String() string { return coatingWords.text(uint8(c)) }

// MarshalText gives the same word as String.
func (c Coating) MarshalText() ([]byte, error) { return []byte(c.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (c *Coating) UnmarshalText(text []byte) error {
	n, err := coatingWords.parse(string(text))
	*c = Coating(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (l LoadCase) String() string { return caseWords.text(uint8(l)) }

// MarshalText gives the same word as String.
func (l LoadCase) MarshalText() ([]byte, error) { return []byte(l.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (l *LoadCase) UnmarshalText(text []byte) error {
	n, err := caseWords.parse(string(text))
	*l = LoadCase(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (l LoadShape) String() string { return loadShapeWords.text(uint8(l)) }

// MarshalText gives the same word as String.
func (l LoadShape) MarshalText() ([]byte, error) { return []byte(l.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (l *LoadShape) UnmarshalText(text []byte) error {
	n, err := loadShapeWords.parse(string(text))
	*l = LoadShape(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (a Attachment) String() string { return attachmentWords.text(uint8(a)) }

// MarshalText gives the same word as String.
func (a Attachment) MarshalText() ([]byte, error) { return []byte(a.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (a *Attachment) UnmarshalText(text []byte) error {
	n, err := attachmentWords.parse(string(text))
	*a = Attachment(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (p Preference) String() string { return preferenceWords.text(uint8(p)) }

// MarshalText gives the same word as String.
func (p Preference) MarshalText() ([]byte, error) { return []byte(p.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (p *Preference) UnmarshalText(text []byte) error {
	n, err := preferenceWords.parse(string(text))
	*p = Preference(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (s ShearRow) String() string { return shearRowWords.text(uint8(s)) }

// MarshalText gives the same word as String.
func (s ShearRow) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (s *ShearRow) UnmarshalText(text []byte) error {
	n, err := shearRowWords.parse(string(text))
	*s = ShearRow(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (s ShearMethod) String() string { return shearMethodWords.text(uint8(s)) }

// MarshalText gives the same word as String.
func (s ShearMethod) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (s *ShearMethod) UnmarshalText(text []byte) error {
	n, err := shearMethodWords.parse(string(text))
	*s = ShearMethod(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (s Sense) String() string { return senseWords.text(uint8(s)) }

// MarshalText gives the same word as String.
func (s Sense) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (s *Sense) UnmarshalText(text []byte) error {
	n, err := senseWords.parse(string(text))
	*s = Sense(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (f Face) String() string { return faceWords.text(uint8(f)) }

// MarshalText gives the same word as String.
func (f Face) MarshalText() ([]byte, error) { return []byte(f.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (f *Face) UnmarshalText(text []byte) error {
	n, err := faceWords.parse(string(text))
	*f = Face(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (v Verdict) String() string { return verdictWords.text(uint8(v)) }

// MarshalText gives the same word as String.
func (v Verdict) MarshalText() ([]byte, error) { return []byte(v.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (v *Verdict) UnmarshalText(text []byte) error {
	n, err := verdictWords.parse(string(text))
	*v = Verdict(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (o Outcome) String() string { return outcomeWords.text(uint8(o)) }

// MarshalText gives the same word as String.
func (o Outcome) MarshalText() ([]byte, error) { return []byte(o.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (o *Outcome) UnmarshalText(text []byte) error {
	n, err := outcomeWords.parse(string(text))
	*o = Outcome(n)
	return err
}

// String gives the word of the JSON door; empty when not stated.
func (p TorquePath) String() string { return torquePathWords.text(uint8(p)) }

// MarshalText gives the same word as String.
func (p TorquePath) MarshalText() ([]byte, error) { return []byte(p.String()), nil }

// UnmarshalText accepts exactly the words that String gives.
func (p *TorquePath) UnmarshalText(text []byte) error {
	n, err := torquePathWords.parse(string(text))
	*p = TorquePath(n)
	return err
}
