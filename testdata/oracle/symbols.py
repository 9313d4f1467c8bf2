# Writes symbols.csv in this folder: values of coupling coefficients from SymPy, a computer-algebra
# system, for the tests of this module. On Debian:
#
#   apt-get install python3-sympy
#   cd testdata/oracle && /usr/bin/python3 symbols.py > symbols.csv
#
# It takes about half a minute. The draw has a fixed seed: the same SymPy writes the same file.
import platform
import random
import sys

import sympy
from sympy import Rational, pi, sign, sqrt
from sympy.physics.wigner import clebsch_gordan, gaunt, racah, wigner_3j, wigner_6j, wigner_9j

SEED = 20261201
COUNT = 500
rng = random.Random(SEED)


def triad(a, b, c):
    """Whether a, b, c, given as twice their values, can couple to zero."""
    return (a + b + c) % 2 == 0 and abs(a - b) <= c <= a + b


def draw(n, triads, top):
    """n momenta up to top, twice their values, that fulfill the triads given by place."""
    while True:
        j = [rng.randint(0, 2 * top) for _ in range(n)]
        if all(triad(j[a], j[b], j[c]) for a, b, c in triads):
            return j


def projected(top, whole):
    """Three momenta and three projections that add up to zero, twice their values."""
    while True:
        j = draw(3, [(0, 1, 2)], top)
        if whole and any(x % 2 for x in j):
            continue
        m1, m2 = (rng.randrange(-x, x + 1, 2) for x in j[:2])
        if abs(m1 + m2) <= j[2]:
            return j, [m1, m2, -m1 - m2]


def value_3j(top):
    j, m = projected(top, False)
    return j + m, wigner_3j(*map(half, j + m))


def value_cg(top):
    # SymPy's order is j1, j2, j3, m1, m2, m3; the table's is j1, m1, j2, m2, j, m.
    j, m = projected(top, False)
    m[2] = -m[2]
    return [j[0], m[0], j[1], m[1], j[2], m[2]], clebsch_gordan(*map(half, j + m))


def value_6j(top):
    j = draw(6, [(0, 1, 2), (0, 4, 5), (3, 1, 5), (3, 4, 2)], top)
    return j, wigner_6j(*map(half, j))


def value_w(top):
    # W(abcd;ef), in SymPy racah(a, b, c, d, e, f)
    j = draw(6, [(0, 1, 4), (2, 3, 4), (0, 2, 5), (1, 3, 5)], top)
    return j, racah(*map(half, j))


def value_9j(top):
    j = draw(9, [(0, 1, 2), (3, 4, 5), (6, 7, 8), (0, 3, 6), (1, 4, 7), (2, 5, 8)], top)
    return j, wigner_9j(*map(half, j), prec=None)


def value_gaunt(top):
    # SymPy's order is l1, l2, l3, m1, m2, m3; the table's is l1, m1, l2, m2, l3, m3.
    while True:
        j, m = projected(top, True)
        if sum(j) % 4 == 0:  # odd sums give zero
            break
    value = gaunt(*(x // 2 for x in j + m)) * sqrt(4 * pi)
    return [j[0], m[0], j[1], m[1], j[2], m[2]], value


def half(twice):
    return Rational(twice, 2)


def top_of(n, large):
    """The largest momentum of the n-th draw: a quarter small, the others up to large."""
    return 5 if n % 4 == 0 else rng.randint(5, large)


def main():
    print("# Coupling coefficients for random allowed arguments, value = sign*sqrt(num/den); zero is 0,0,1.")
    print("# Tool: SymPy %s (sympy.physics.wigner) under Python %s, seed %d." % (sympy.__version__, platform.python_version(), SEED))
    print("# Made by: /usr/bin/python3 symbols.py > symbols.csv, in this folder.")
    print("# 3j: j1 j2 j3 m1 m2 m3; cg: j1 m1 j2 m2 j m; 6j: row by row; w: a b c d e f of W(abcd;ef); 9j: row by row;")
    print("# gaunt: l1 m1 l2 m2 l3 m3, no function conjugated, in units of 1/sqrt(4 pi). Condon-Shortley phases.")
    print("# j is drawn up to a limit between 5 and 30, for most 9j between 5 and 12.")
    print("symbol,a1,a2,a3,a4,a5,a6,a7,a8,a9,sign,num,den")
    for name, compute in (("3j", value_3j), ("cg", value_cg), ("6j", value_6j), ("w", value_w), ("9j", value_9j), ("gaunt", value_gaunt)):
        for n in range(COUNT):
            large = 30 if name != "9j" or n % 8 == 1 and n < 480 else 12
            arguments, value = compute(top_of(n, large))
            square = value**2
            assert square.is_Rational, (name, arguments, value)
            cells = [str(half(a)) for a in arguments] + [""] * (9 - len(arguments))
            print(",".join([name] + cells + [str(sign(value)), str(square.p), str(square.q)]))
        print(name, "done", file=sys.stderr)


main()
