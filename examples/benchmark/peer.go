package main

import (
	"bufio"
	"fmt"
	"io"
	"os/exec"
)

// peer is a running process that computes the same symbols: it answers each line with lines.
type peer struct {
	name string
	in   io.Writer
	out  *bufio.Scanner
}

func start(name string, args ...string) (*peer, error) {
	command := exec.Command(name, args...)
	in, err := command.StdinPipe()
	if err != nil {
		return nil, err
	}
	out, err := command.StdoutPipe()
	if err != nil {
		return nil, err
	}
	if err := command.Start(); err != nil {
		return nil, err
	}
	p := &peer{in: in, out: bufio.NewScanner(out)}
	p.out.Buffer(nil, 1<<20)
	return p, nil
}

// ask sends a line and returns the line that answers it.
func (p *peer) ask(line string) (string, error) {
	if _, err := fmt.Fprintln(p.in, line); err != nil {
		return "", err
	}
	return p.next()
}

func (p *peer) next() (string, error) {
	if !p.out.Scan() {
		return "", fmt.Errorf("%s gives no answer", p.name)
	}
	return p.out.Text(), nil
}
