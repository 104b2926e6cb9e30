"""Writes elementary-*.csv: reference values of the engine's elementary functions.

    python3 elementary.py            (needs mpmath; takes a minute or two)

Each row holds the arguments (shortest decimals that read back to the same double), the correctly rounded result, and
what the rounding left, in units of the last place of that result: exact = rounded + left * ulp. Values are computed with
60 digits by mpmath, from definitions that share nothing with the engine's methods. Arguments come from a fixed seed.
"""

import math
import pathlib
import random
import struct

from mpmath import mp, mpf

mp.dps = 60
HERE = pathlib.Path(__file__).parent
R = random.Random(20250101)


def ulp(value):
    """Distance of doubles at the value's binade; 2^-1074 among the subnormals."""
    return mpf(math.ulp(value))


def row(arguments, exact):
    rounded = float(exact)
    left = (exact - mpf(rounded)) / ulp(rounded)
    return ",".join([repr(a) for a in arguments] + [repr(rounded), f"{float(left):.4f}"])


def write(name, header, rows):
    path = HERE / f"elementary-{name}.csv"
    path.write_text(f"{header},rounded,left\n" + "\n".join(rows) + "\n", newline="\n")
    print(name, len(rows), path.stat().st_size)


def any_positive():
    """Every exponent, subnormals included."""
    return struct.unpack("<d", struct.pack("<Q", R.randrange(1, 0x7FF0_0000_0000_0000)))[0]


def signed_tiny_to(limit):
    return R.choice((-1, 1)) * limit * 2.0 ** R.uniform(-60, 0)


def near(value, steps=40):
    """Neighbours of a value, some ulps away."""
    for n in (*range(-3, 4), *(R.randrange(-(2**30), 2**30) for _ in range(steps))):
        yield struct.unpack("<d", struct.pack("<q", struct.unpack("<q", struct.pack("<d", value))[0] + n))[0]


def exp_arguments():
    yield from (R.uniform(-745.1, 709.78) for _ in range(1500))
    yield from (R.uniform(-1, 1) for _ in range(1200))
    yield from (signed_tiny_to(1.0) for _ in range(400))
    yield from (R.uniform(-745.1, -708.4) for _ in range(300))
    for k in (-1074, -1022, -2, -1, 1, 2, 3, 1023):
        yield from near((k + 0.5) * math.log(2), 8)
    yield from (709.782712893384, -708.3964185322641, -744.4400719213812, -745.1332191019411)


def log_arguments():
    yield from (any_positive() for _ in range(1200))
    yield from (R.uniform(0.5, 2.0) for _ in range(1200))
    yield from (1 + signed_tiny_to(0.4) for _ in range(600))
    yield from (5e-324 * R.randrange(1, 2**52) for _ in range(150))
    for centre in (1.0, math.sqrt(0.5), math.sqrt(2), 2.0, 0.5):
        yield from (x for x in near(centre) if x != 1.0)
    yield from (5e-324, 2.2250738585072014e-308, 1.7976931348623157e308)


def expm1_arguments():
    yield from (R.uniform(-2, 2) for _ in range(1800))
    yield from (signed_tiny_to(0.5) for _ in range(700))
    yield from (R.uniform(-45, 709.78) for _ in range(800))
    for k in (-2, -1, 0, 1, 2):
        yield from near((k + 0.5) * math.log(2), 8)


def log1p_arguments():
    yield from (R.uniform(-1, 3) for _ in range(1800))
    yield from (signed_tiny_to(0.5) for _ in range(900))
    yield from (any_positive() for _ in range(400))
    yield from (-1 + 2.0 ** R.uniform(-53, -1) for _ in range(200))
    for centre in (math.sqrt(2) - 1, math.sqrt(0.5) - 1):
        yield from near(centre, 30)


def pow_arguments():
    result = 0
    while result < 2600:
        x = R.choice((any_positive(), R.uniform(0.5, 2.0), 1 + signed_tiny_to(0.3), R.uniform(0, 1000)))
        y = R.choice((R.uniform(-5, 5), R.uniform(-800, 800), signed_tiny_to(1e6), float(R.randrange(-40, 41))))
        size = abs(y * math.log(x))
        if size == 0 or size > 744.0 or (size > 709.0 and y * math.log(x) > 0):
            continue
        result += 1
        yield x, y


def normal_cdf(x):
    return mp.erfc(-mpf(x) / mp.sqrt(2)) / 2


def cdf_arguments():
    yield from (R.uniform(-6, 6) for _ in range(1500))
    yield from (R.uniform(-38.4, -6) for _ in range(900))
    yield from (signed_tiny_to(1.0) for _ in range(300))
    yield from (R.uniform(6, 9) for _ in range(100))
    yield from (-38.4674, -37.5193, -37.0, 8.2, 8.3)


def normal_quantile(u):
    """Halley's iteration on the tail that is not near 1."""
    p = mpf(u)
    sign = -1
    if p > mpf(1) / 2:
        p, sign = 1 - p, 1
    if p == mpf(1) / 2:
        return mpf(0)
    z = mp.sqrt(-2 * mp.log(p)) if p < mpf("0.1") else mp.sqrt(2 * mp.pi) * (mpf(1) / 2 - p)
    for _ in range(200):
        density = mp.exp(-z * z / 2) / mp.sqrt(2 * mp.pi)
        step = (mp.erfc(z / mp.sqrt(2)) / 2 - p) / density
        step = step / (1 - z * step / 2)
        z += step
        if abs(step) < abs(z) * mpf(10) ** -40:
            return sign * z
    raise ArithmeticError(u)


def quantile_arguments():
    def lattice():
        return (2 * R.randrange(2**52) + 1) * 2.0**-53

    yield from (lattice() for _ in range(1500))
    yield from (R.uniform(0, 1) for _ in range(300))
    yield from (0.5 + signed_tiny_to(0.25) for _ in range(400))
    yield from ((2 * R.randrange(int(2 ** R.uniform(0, 52))) + 1) * 2.0**-53 for _ in range(500))
    yield from (1 - (2 * R.randrange(int(2 ** R.uniform(0, 52))) + 1) * 2.0**-53 for _ in range(250))
    yield from (2.0 ** R.uniform(-1074, -1) for _ in range(400))
    edge = (1 - math.sqrt(1 - math.exp(-5.75))) / 2
    yield from near(edge, 60)
    yield from (5e-324, 2.2250738585072014e-308, 2.0**-53, 1 - 2.0**-53)


def log_gamma_arguments():
    yield from (R.uniform(0, 4) for _ in range(900))
    yield from (10 ** R.uniform(-300, 300) for _ in range(400))
    yield from (R.uniform(4, 200) for _ in range(400))
    yield from (1 + signed_tiny_to(0.2) for _ in range(150))
    yield from (2 + signed_tiny_to(0.2) for _ in range(150))


def incomplete_gamma_arguments():
    for _ in range(700):
        a = 10 ** R.uniform(-2, 6)
        x = a * 10 ** R.uniform(-1, 0.5) if a < 30 else a + R.uniform(-6, 6) * math.sqrt(a)
        if mp.gammainc(a, 0, x, regularized=True) > mpf("1e-290"):
            yield a, x


def unary(name, function, arguments):
    write(name, "x", [row([x], function(mpf(x))) for x in arguments])


def main():
    unary("exp", mp.exp, exp_arguments())
    unary("log", mp.log, log_arguments())
    unary("expm1", mp.expm1, expm1_arguments())
    unary("log1p", mp.log1p, log1p_arguments())
    write("pow", "x,y", [row([x, y], mpf(x) ** mpf(y)) for x, y in pow_arguments()])
    unary("normal-cdf", normal_cdf, cdf_arguments())
    unary("normal-quantile", normal_quantile, quantile_arguments())
    unary("log-gamma", mp.loggamma, (x for x in log_gamma_arguments() if x not in (0.0, 1.0, 2.0)))
    write(
        "gamma-lower",
        "a,x",
        [row([a, x], mp.gammainc(mpf(a), 0, mpf(x), regularized=True)) for a, x in incomplete_gamma_arguments()],
    )
    write(
        "gamma-upper",
        "a,x",
        [row([a, x], mp.gammainc(mpf(a), mpf(x), regularized=True)) for a, x in incomplete_gamma_arguments()],
    )


if __name__ == "__main__":
    main()
