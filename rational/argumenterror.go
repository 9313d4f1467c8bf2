package rational

import "fmt"

// ArgumentError is the panic value of every function of this module that is given a malformed
// argument, such as a negative j, or a projection m that does not differ from its j by an integer.
// A selection rule that fails is no error: the symbol is zero. Functions that read text or files
// never panic with it; where the text is well formed and its value is not, they return it.
type ArgumentError struct {
	Func    string // function with its package, "wigner.ThreeJ"
	Arg     string // name of the argument in its documentation, "m2"
	Value   string // the value given, as text
	Allowed string // what would have been accepted, as text
}

// Error names function, argument, value and what is allowed.
func (e *ArgumentError) Error() string {
	return fmt.Sprintf("%s: %s = %s; allowed: %s", e.Func, e.Arg, e.Value, e.Allowed)
}
