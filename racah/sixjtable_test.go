package racah_test

import (
	"context"
	"errors"
	"fmt"
	"math"
	"testing"

	"example.org/couplet/internal/verify"
	"example.org/couplet/racah"
	"example.org/couplet/rational"
)

// Every symbol with arguments to 2j = 8, allowed or not, and allowed ones to 12.
func TestSixJTable(t *testing.T) {
	for _, limit := range []int{8, 11} {
		table, err := racah.NewSixJTable(context.Background(), h(limit), nil)
		if err != nil {
			t.Fatal(err)
		}
		const k = 9
		for n := range k * k * k * k * k * k {
			a, b, c, d, e, f := h(n%k), h(n/k%k), h(n/k/k%k), h(n/k/k/k%k), h(n/k/k/k/k%k), h(n/k/k/k/k/k)
			if got, want := table.At(a, b, c, d, e, f), racah.SixJFloat(a, b, c, d, e, f); math.Float64bits(got) != math.Float64bits(want) {
				t.Fatalf("%v %v %v; %v %v %v: %g, want %g", a, b, c, d, e, f, got, want)
			}
		}
	}
	table, err := racah.NewSixJTable(context.Background(), rational.Int(6), nil)
	if err != nil {
		t.Fatal(err)
	}
	cases := 0
	sixJs(12, func(q [6]int) {
		cases++
		got := table.At(h(q[0]), h(q[1]), h(q[2]), h(q[3]), h(q[4]), h(q[5]))
		if want := sixJValue(q).Float64(); math.Float64bits(got) != math.Float64bits(want) {
			t.Fatalf("%v (halves): %g, want %g", q, got, want)
		}
	})
	t.Logf("jmax = 6: %d numbers for %d symbols", table.Len(), cases)
}

func TestSixJTableLimits(t *testing.T) {
	i := rational.Int
	var reports []int
	table, err := racah.NewSixJTable(context.Background(), i(1), func(done, total int) { reports = append(reports, done, total) })
	if err != nil || table.Len() != 28 || table.JMax() != i(1) || len(reports) != 6 || reports[4] != 28 || reports[5] != 28 { // C(8, 6)
		t.Errorf("%d numbers, progress %v, %v", table.Len(), reports, err)
	}
	ctx, cancel := context.WithCancel(context.Background())
	if _, err := racah.NewSixJTable(ctx, i(6), func(done, _ int) { cancel() }); !errors.Is(err, context.Canceled) {
		t.Errorf("canceled: %v", err)
	}
	for _, jmax := range []rational.Half{h(-1), h(61)} {
		_, err := racah.NewSixJTable(context.Background(), jmax, nil)
		if want := fmt.Sprintf("racah.NewSixJTable: jmax = %v; allowed: from 0 to 30", jmax); err == nil || err.Error() != want {
			t.Errorf("%v, want %s", err, want)
		}
	}
	for want, f := range map[string]func(){
		"racah.SixJTable.At: l1 = 3/2; allowed: at most 1, the limit of the table": func() { table.At(i(1), i(1), i(1), h(3), i(1), i(1)) },
		"racah.SixJTable.At: j2 = -1; allowed: an integer or half-integer >= 0":    func() { table.At(i(1), i(-1), i(1), i(1), i(1), i(1)) },
	} {
		if e := verify.Recovered(f); e == nil || e.Error() != want {
			t.Errorf("panic %v, want %s", e, want)
		}
	}
}

func BenchmarkSixJTable(b *testing.B) {
	table, err := racah.NewSixJTable(context.Background(), rational.Int(8), nil)
	if err != nil {
		b.Fatal(err)
	}
	for _, size := range []int{1, 4, 8} {
		b.Run(fmt.Sprintf("j=%d", size), func(b *testing.B) {
			sets := drawSixJ(256, size)
			b.ReportAllocs()
			sum := 0.0
			for i := 0; b.Loop(); i++ {
				q := &sets[i&255]
				sum += table.At(q[0], q[1], q[2], q[3], q[4], q[5])
			}
		})
	}
}

func ExampleNewSixJTable() {
	table, err := racah.NewSixJTable(context.Background(), rational.Int(2), nil)
	if err != nil {
		fmt.Println(err)
		return
	}
	i := rational.Int
	fmt.Printf("%d numbers, %.6f\n", table.Len(), table.At(i(2), i(2), i(2), i(2), i(2), i(2)))
	// Output: 210 numbers, -0.042857
}
