package main

import (
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
)

// file is an output file: the option that names it, its path and what goes into it.
type file struct {
	option, path string
	data         []byte
}

// writeFiles writes all files or none: each under another name first, beside its place, and all are
// moved to their places when every one is complete.
func writeFiles(files []file) (err error) {
	var temporary []string
	defer func() {
		if err != nil {
			for _, name := range temporary {
				os.Remove(name)
			}
		}
	}()
	for _, f := range files {
		if info, err := os.Stat(f.path); err == nil && !info.Mode().IsRegular() {
			return f.fail(errors.New("not a regular file"))
		}
		name, err := f.writeBeside()
		if name != "" {
			temporary = append(temporary, name)
		}
		if err != nil {
			return f.fail(err)
		}
	}
	for i, f := range files {
		if err := os.Rename(temporary[i], f.path); err != nil {
			return f.fail(err)
		}
	}
	return nil
}

// writeBeside writes the data to a new file in the folder of the path, and returns its name, "" where
// there is none.
func (f file) writeBeside() (string, error) {
	t, err := os.CreateTemp(filepath.Dir(f.path), ".linelist-*")
	if err != nil {
		return "", err
	}
	_, err = t.Write(f.data)
	if err == nil {
		err = t.Chmod(0o644)
	}
	return t.Name(), errors.Join(err, t.Close())
}

func (f file) fail(err error) error {
	return fmt.Errorf("%s = %q: %v; allowed: a file in a folder that can be written", f.option, f.path, cause(err))
}

// cause returns an error without the names of temporary files.
func cause(err error) error {
	if e, ok := errors.AsType[*fs.PathError](err); ok {
		return e.Err
	}
	if e, ok := errors.AsType[*os.LinkError](err); ok {
		return e.Err
	}
	return err
}
