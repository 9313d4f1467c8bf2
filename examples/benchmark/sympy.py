# Times SymPy's coupling coefficients for the program in this folder. Each line of standard input names
# a symbol and twice each of its arguments; each line of standard output gives the seconds that one
# call took, the sign of the value, and numerator and denominator of its square.
import sys
import time

import sympy
from sympy import Rational, sign
from sympy.physics.wigner import wigner_3j, wigner_6j, wigner_9j

SYMBOLS = {"3j": wigner_3j, "6j": wigner_6j, "9j": wigner_9j}

# A large first call fills the list of factorials that SymPy keeps.
wigner_3j(1000, 1000, 1000, 0, 0, 0)
wigner_6j(1000, 1000, 1000, 2, 2, 2)
print("SymPy", sympy.__version__, "Python", sys.version.split()[0], flush=True)

for line in sys.stdin:
    name, *twice = line.split()
    arguments = [Rational(int(n), 2) for n in twice]
    start = time.perf_counter()
    value = SYMBOLS[name](*arguments)
    seconds = time.perf_counter() - start
    square = value**2
    print(seconds, sign(value), square.p, square.q, flush=True)
