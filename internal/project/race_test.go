package project_test

import (
	"os"
	"os/exec"
	"sync"
	"testing"

	"example.org/couplet/racah"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// The first calls of a program build the tables. This test runs itself again, so that its calls are the
// first, and all of them at once; the race detector sees to the rest.
func TestFirstCallsRace(t *testing.T) {
	if os.Getenv("COUPLET_FIRST_CALLS") == "" {
		self := exec.Command(os.Args[0], "-test.run=^TestFirstCallsRace$")
		self.Env = append(os.Environ(), "COUPLET_FIRST_CALLS=1")
		if out, err := self.CombinedOutput(); err != nil {
			t.Fatalf("%v\n%s", err, out)
		}
		return
	}
	i := rational.Int
	calls := []func() float64{
		func() float64 { return wigner.ThreeJFloat(i(5), i(4), i(3), i(2), i(-1), i(-1)) },
		func() float64 { return wigner.ThreeJ(i(5), i(4), i(3), i(2), i(-1), i(-1)).Float64() },
		func() float64 { return wigner.ThreeJFloat(i(50), i(40), i(30), i(2), i(-1), i(-1)) },
		func() float64 { return wigner.ThreeJFloat(i(400), i(400), i(300), i(2), i(-1), i(-1)) },
		func() float64 { return wigner.ThreeJ(i(400), i(400), i(300), i(2), i(-1), i(-1)).Float64() },
		func() float64 { return racah.SixJFloat(i(5), i(4), i(3), i(2), i(3), i(4)) },
		func() float64 { return racah.SixJ(i(500), i(400), i(300), i(200), i(300), i(400)).Float64() },
		func() float64 { return racah.NineJFloat(i(5), i(4), i(3), i(2), i(3), i(4), i(5), i(4), i(3)) },
	}
	var group sync.WaitGroup
	start := make(chan struct{})
	results := make([][]float64, 4)
	for n := range results {
		group.Go(func() {
			<-start
			for k := range calls {
				results[n] = append(results[n], calls[(k+2*n)%len(calls)]())
			}
		})
	}
	close(start)
	group.Wait()
	for n := range results {
		for k, v := range results[n] {
			if want := calls[(k+2*n)%len(calls)](); v != want {
				t.Errorf("call %d gave %g among the first, %g later", (k+2*n)%len(calls), v, want)
			}
		}
	}
}
