module example.org/couplet

go 1.26
