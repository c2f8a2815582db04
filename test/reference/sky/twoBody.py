"""Writes twoBody.json: heliocentric two-body places and velocities in 60-digit arithmetic."""

import random
import sys
from pathlib import Path

import mpmath

sys.dont_write_bytecode = True

from ephemeris import about, conic, orbit_state, write

HERE = Path(__file__).parent
PERIHELION_DISTANCES = [0.005, 0.0123, 0.05, 0.2, 0.7, 1.0, 1.6, 3.0, 6.0, 10.0]
ECCENTRICITIES = [
    0.0, 1e-9, 0.0167, 0.2, 0.5, 0.85, 0.97, 0.999, 0.99999, 1 - 1e-7, 1 - 1e-9, 1 - 1e-12,
    1.0, 1 + 1e-12, 1 + 1e-9, 1 + 1e-7, 1.00001, 1.0005, 1.013, 1.2, 1.9, 3.3,
]
# Sums of powers of two, so that the date less that of perihelion is exact in double precision.
DAYS = [0.0009765625, 0.015625, 0.25, 1.5, 7.0625, 30.75, 99.9375, 260.5, 611.125, 999.25, 1500.0]


def digits(value):
    return float(mpmath.nstr(value, 17))


# Meeus, Astronomical Algorithms (2nd ed.), chapter 35, p. 247: q, e, days, true anomaly, radius vector.
PUBLISHED = [
    (0.921326, 1.0, 138.4783, 102.74426, 2.364192),
    (0.1, 0.987, 254.9, 164.50029, 4.063777),
    (3.363943, 1.05731, 1237.1, 109.40598, 10.668551),
]


def verify():
    for q, e, days, anomaly, radius in PUBLISHED:
        x, y = conic(q, e, days)[0]
        if abs(mpmath.degrees(mpmath.atan2(y, x)) - anomaly) > 1e-5 or abs(mpmath.hypot(x, y) - radius) > 1e-6:
            raise RuntimeError(f"q {q}, e {e}, {days} days does not give the published place")


def main():
    verify()
    chosen = random.Random(20261201)
    rows = []
    for q in PERIHELION_DISTANCES:
        for e in ECCENTRICITIES:
            angles = [round(chosen.uniform(0, high), 3) for high in (180, 360, 360)]
            for days in chosen.sample(DAYS, 2):
                days *= chosen.choice((-1, 1))
                place, velocity = orbit_state(q, e, *angles, days)
                # A thousandth of the tolerance is written, or the sixteenth digit.
                values = [digits(mpmath.nint(v * 10**13) / mpmath.mpf(10) ** 13) for v in (*place, *velocity)]
                rows.append([q, e, *angles, days, *values])
    write(
        HERE / "twoBody.json",
        about(
            "Two-body places: Kepler's equation (ellipse, hyperbola) and Barker's, k = 0.01720209895",
            "q (au), e, inclination, node, argument of perihelion (degrees), days from perihelion, x, y, z (au), "
            "velocity (au/day), ecliptic J2000",
            ("python3-mpmath",),
        )
        | {"source": "computed here with mpmath, 60 digits", "licence": "Apache-2.0"},
        {"rows": rows},
    )


if __name__ == "__main__":
    main()
