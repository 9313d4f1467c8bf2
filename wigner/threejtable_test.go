package wigner_test

import (
	"context"
	"errors"
	"fmt"
	"testing"

	"example.org/couplet/internal/verify"
	"example.org/couplet/rational"
	"example.org/couplet/wigner"
)

// Every symbol with 2j to 12, allowed or not, from a table that reaches just so far and from a larger one.
func TestThreeJTable(t *testing.T) {
	const top = 12
	h := rational.Halves
	for _, limit := range []int{top, top + 3} {
		table, err := wigner.NewThreeJTable(context.Background(), h(limit), nil)
		if err != nil {
			t.Fatal(err)
		}
		cases, nonzero := 0, 0
		for a := range top + 1 {
			for b := range top + 1 {
				for c := range top + 1 {
					for x := -a; x <= a; x += 2 {
						for y := -b; y <= b; y += 2 {
							z := -x - y
							if (c-z)&1 != 0 {
								continue
							}
							cases++
							got, want := table.At(h(a), h(b), h(c), h(x), h(y), h(z)), wigner.ThreeJFloat(h(a), h(b), h(c), h(x), h(y), h(z))
							if got != want {
								t.Fatalf("%d %d %d; %d %d %d (halves): %g, want %g", a, b, c, x, y, z, got, want)
							}
							if want != 0 {
								nonzero++
							}
						}
					}
				}
			}
		}
		t.Logf("jmax = %v: %d numbers for %d symbols, %d of them not zero", table.JMax(), table.Len(), cases, nonzero)
		if nonzero < 10000 {
			t.Error("too few symbols")
		}
	}
}

func TestThreeJTableLarge(t *testing.T) {
	table, err := wigner.NewThreeJTable(context.Background(), rational.Int(15), nil)
	if err != nil {
		t.Fatal(err)
	}
	for _, q := range draw(20000, 15) {
		if got, want := table.At(q[0], q[1], q[2], q[3], q[4], q[5]), wigner.ThreeJFloat(q[0], q[1], q[2], q[3], q[4], q[5]); got != want {
			t.Fatalf("%v: %g, want %g", q, got, want)
		}
	}
	q := draw(1, 15)[0]
	if n := testing.AllocsPerRun(10, func() { table.At(q[0], q[1], q[2], q[3], q[4], q[5]) }); n != 0 {
		t.Errorf("%v allocations", n)
	}
}

func TestThreeJTableLimits(t *testing.T) {
	h, i := rational.Halves, rational.Int
	var reports []int
	table, err := wigner.NewThreeJTable(context.Background(), i(3), func(done, total int) { reports = append(reports, done, total) })
	if err != nil || table.Len() != 462 || len(reports) != 14 || reports[12] != 462 || reports[13] != 462 { // C(11, 5)
		t.Errorf("%d numbers, progress %v, %v", table.Len(), reports, err)
	}
	ctx, cancel := context.WithCancel(context.Background())
	if _, err := wigner.NewThreeJTable(ctx, i(12), func(done, _ int) { cancel() }); !errors.Is(err, context.Canceled) {
		t.Errorf("canceled: %v", err)
	}
	for _, jmax := range []rational.Half{h(-1), h(129)} {
		_, err := wigner.NewThreeJTable(context.Background(), jmax, nil)
		if want := fmt.Sprintf("wigner.NewThreeJTable: jmax = %v; allowed: from 0 to 64", jmax); err == nil || err.Error() != want {
			t.Errorf("%v, want %s", err, want)
		}
	}
	for want, f := range map[string]func(){
		"wigner.ThreeJTable.At: j2 = 7/2; allowed: at most 3, the limit of the table":        func() { table.At(i(3), h(7), h(1), i(0), h(1), h(-1)) },
		"wigner.ThreeJTable.At: j1 = -1; allowed: an integer or half-integer >= 0":           func() { table.At(i(-1), i(1), i(1), i(0), i(0), i(0)) },
		"wigner.ThreeJTable.At: m3 = 1/2; allowed: j3 plus or minus an integer, with j3 = 1": func() { table.At(i(1), i(1), i(1), i(0), i(0), h(1)) },
	} {
		if e := verify.Recovered(f); e == nil || e.Error() != want {
			t.Errorf("panic %v, want %s", e, want)
		}
	}
}

func BenchmarkThreeJTable(b *testing.B) {
	table, err := wigner.NewThreeJTable(context.Background(), rational.Int(10), nil)
	if err != nil {
		b.Fatal(err)
	}
	for _, size := range []int{1, 4, 10} {
		b.Run(fmt.Sprintf("j=%d", size), func(b *testing.B) {
			sets := draw(256, size)
			b.ReportAllocs()
			sum := 0.0
			for i := 0; b.Loop(); i++ {
				q := &sets[i&255]
				sum += table.At(q[0], q[1], q[2], q[3], q[4], q[5])
			}
		})
	}
}

func ExampleNewThreeJTable() {
	table, err := wigner.NewThreeJTable(context.Background(), rational.Int(2), nil)
	if err != nil {
		fmt.Println(err)
		return
	}
	i := rational.Int
	fmt.Printf("%d numbers, %.6f\n", table.Len(), table.At(i(2), i(2), i(2), i(1), i(-1), i(0)))
	// Output: 126 numbers, 0.119523
}
