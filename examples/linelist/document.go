package main

import (
	"bytes"
	"errors"
	"fmt"
	"slices"
	"strconv"
	"strings"

	"github.com/pelletier/go-toml/v2"
	"github.com/pelletier/go-toml/v2/unstable"
)

// document is a TOML file with the line of every key.
type document struct {
	name  string
	lines map[string]int // by joined path
}

// table is one table of a document.
type table struct {
	doc    *document
	path   []string
	values map[string]any
}

// inputError is what is wrong with the value of a key.
type inputError struct {
	file       string
	line       int
	key        string
	value      string // as written; "missing" for a key that is not there
	allowed    string // values, or keys for an unknown key
	unknownKey bool
}

func (e *inputError) Error() string {
	what := ""
	if e.unknownKey {
		what = "unknown key "
	}
	return fmt.Sprintf("%s:%d: %s%s = %s; allowed: %s", e.file, e.line, what, e.key, e.value, e.allowed)
}

// parseDocument returns the top table of a file.
func parseDocument(name string, data []byte) (table, error) {
	top := table{&document{name, make(map[string]int)}, nil, nil}
	if err := toml.Unmarshal(data, &top.values); err != nil {
		var decode *toml.DecodeError
		if errors.As(err, &decode) {
			line, column := decode.Position()
			return top, fmt.Errorf("%s:%d: column %d: %s; allowed: a file in TOML", name, line, column, strings.TrimPrefix(err.Error(), "toml: "))
		}
		return top, fmt.Errorf("%s:1: %v; allowed: a file in TOML", name, err)
	}
	return top, top.doc.findLines(data)
}

// findLines notes the line of every key, by the syntax tree, since the values do not hold it.
func (d *document) findLines(data []byte) error {
	var p unstable.Parser
	p.Reset(data)
	var prefix []string
	for p.NextExpression() {
		switch e := p.Expression(); e.Kind {
		case unstable.Table, unstable.ArrayTable:
			prefix = d.note(data, nil, e.Key())
		case unstable.KeyValue:
			d.keyValue(data, prefix, e)
		}
	}
	return p.Error()
}

func (d *document) keyValue(data []byte, prefix []string, e *unstable.Node) {
	path := d.note(data, prefix, e.Key())
	if e.Value().Kind == unstable.InlineTable {
		for it := e.Value().Children(); it.Next(); {
			d.keyValue(data, path, it.Node())
		}
	}
}

// note records a dotted key, and returns its path.
func (d *document) note(data []byte, prefix []string, key unstable.Iterator) []string {
	path := slices.Clone(prefix)
	for key.Next() {
		path = append(path, string(key.Node().Data))
		if id := pathID(path); d.lines[id] == 0 {
			d.lines[id] = 1 + bytes.Count(data[:key.Node().Raw.Offset], []byte("\n"))
		}
	}
	return path
}

func pathID(path []string) string { return strings.Join(path, "\x00") }

// fail returns the error for the value of a key, which may be missing.
func (t table) fail(key, allowed string) error {
	v, ok := t.values[key]
	return t.failValue(key, valueText(v, ok), allowed)
}

func (t table) failValue(key, value, allowed string) error {
	return &inputError{file: t.doc.name, line: t.line(key), key: keyText(append(slices.Clone(t.path), key)), value: value, allowed: allowed}
}

// line returns the line of a key, that of the table for a key that is not there, 1 for the top table.
func (t table) line(key string) int {
	for path := append(slices.Clone(t.path), key); len(path) > 0; path = path[:len(path)-1] {
		if n := t.doc.lines[pathID(path)]; n > 0 {
			return n
		}
	}
	return 1
}

func keyText(path []string) string {
	quoted := make([]string, len(path))
	for i, p := range path {
		quoted[i] = p
		if p == "" || strings.ContainsFunc(p, func(r rune) bool {
			return !(r >= 'a' && r <= 'z' || r >= 'A' && r <= 'Z' || r >= '0' && r <= '9' || r == '_' || r == '-')
		}) {
			quoted[i] = strconv.Quote(p)
		}
	}
	return strings.Join(quoted, ".")
}

func valueText(v any, ok bool) string {
	switch v := v.(type) {
	case string:
		if len(v) > 60 {
			v = v[:60] + "..."
		}
		return strconv.Quote(v)
	case map[string]any:
		return "a table"
	case []any:
		return "an array"
	}
	if !ok {
		return "missing"
	}
	return fmt.Sprint(v)
}

// only returns an error for the first key, by lines, that is not among the allowed ones.
func (t table) only(allowed ...string) error {
	for _, key := range t.keys() {
		if !slices.Contains(allowed, key) {
			e := t.fail(key, strings.Join(allowed, ", ")).(*inputError)
			e.unknownKey = true
			return e
		}
	}
	return nil
}

// keys returns the keys in the order of their lines, on one line by name.
func (t table) keys() []string {
	var list []string
	for key := range t.values {
		list = append(list, key)
	}
	slices.SortFunc(list, func(a, b string) int {
		if d := t.line(a) - t.line(b); d != 0 {
			return d
		}
		return strings.Compare(a, b)
	})
	return list
}

func (t table) has(key string) bool {
	_, ok := t.values[key]
	return ok
}

// text returns a string of one line that is not empty.
func (t table) text(key string) (string, error) {
	v, ok := t.values[key].(string)
	if !ok || strings.TrimSpace(v) == "" || strings.ContainsFunc(v, func(r rune) bool { return r < ' ' || r == 0x7f }) {
		return "", t.fail(key, "a string of one line, not empty")
	}
	return v, nil
}

// table returns a table within this one.
func (t table) table(key string) (table, error) {
	v, ok := t.values[key].(map[string]any)
	if !ok || len(v) == 0 {
		return table{}, t.fail(key, "a table with at least one key")
	}
	return table{t.doc, append(slices.Clone(t.path), key), v}, nil
}
