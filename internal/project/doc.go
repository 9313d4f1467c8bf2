// Package project holds the tests of the project as a whole: its exported names against the listing
// in testdata, its documentation, its top folder, and a module outside that imports it.
package project
