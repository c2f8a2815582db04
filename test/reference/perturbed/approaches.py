"""Writes approaches.json: invented bodies that pass a planet, the Moon or the Sun closely, integrated apart."""

import sys
from pathlib import Path

import numpy as np

sys.dont_write_bytecode = True

from integration import elements_of, heliocentric, propagate, state_of  # noqa: E402
from ephemeris import about, barycentric, write  # noqa: E402

HERE = Path(__file__).parent

# Name, body passed, TT JD of the pass, distance then (au), direction there (RA, Dec, degrees), velocity relative
# to it (au/day; at right angles to the direction, turned by the angle in degrees), days from the epoch to the pass.
PASSES = [
    ["passes the Earth at 0.05 au", "Earth", 2461500.25, 0.05, (40.0, -25.0), 0.0061, 30.0, 140.0],
    ["passes the Earth at 0.01 au", "Earth", 2461610.75, 0.01, (200.0, 35.0), 0.0074, 110.0, 90.0],
    ["passes the Earth at 0.003 au", "Earth", 2461833.5, 0.003, (310.0, 10.0), 0.0052, 255.0, 20.0],
    ["passes the Moon at 0.0005 au", "Moon", 2461700.5, 0.0005, (100.0, -5.0), 0.0066, 75.0, 60.0],
    ["passes Venus at 0.01 au", "Venus", 2461580.0, 0.01, (15.0, 20.0), 0.0090, 200.0, 100.0],
    ["passes Mercury at 0.004 au", "Mercury", 2461555.5, 0.004, (270.0, -30.0), 0.0150, 320.0, 80.0],
    ["passes Mars at 0.005 au", "Mars", 2461650.5, 0.005, (80.0, 60.0), 0.0048, 10.0, 120.0],
    ["passes Jupiter at 0.3 au", "Jupiter", 2461620.5, 0.3, (160.0, 5.0), 0.0045, 65.0, 150.0],
    ["passes Jupiter at 0.02 au", "Jupiter", 2461700.25, 0.02, (340.0, -15.0), 0.0060, 140.0, 200.0],
    ["passes Saturn at 0.02 au", "Saturn", 2461640.5, 0.02, (190.0, 25.0), 0.0040, 310.0, 150.0],
]
# Name, elements (degrees, ecliptic J2000; perihelion TT JD), epoch.
ORBITS = [
    ["grazes the Sun at 0.05 au", [0.05, 1.0, 41.0, 77.0, 150.0, 2461600.0], 2461500.5],
    ["grazes the Sun at 0.006 au", [0.006, 0.99991, 144.0, 3.5, 82.0, 2461580.5], 2461500.5],
    ["on a hyperbola", [0.61, 1.31, 98.0, 214.0, 31.0, 2461550.0], 2461500.5],
    ["a fast hyperbola", [1.9, 4.2, 33.0, 120.0, 260.0, 2461700.0], 2461500.5],
    ["twice round the Sun", [0.31, 0.72, 12.0, 300.0, 190.0, 2461520.0], 2461500.5],
]
CHECKED_DAYS = [-200.0, -50.0, 40.0, 110.0, 180.0, 300.0, 500.0]


def passing(planet, time, distance, direction, speed, turn):
    ra, dec, turn = np.radians([*direction, turn])
    away = np.array([np.cos(dec) * np.cos(ra), np.cos(dec) * np.sin(ra), np.sin(dec)])
    east = np.array([-np.sin(ra), np.cos(ra), 0.0])
    north = np.cross(away, east)
    velocity = barycentric(planet, time)[1] - barycentric("Sun", time)[1]
    velocity = velocity + speed * (np.cos(turn) * east + np.sin(turn) * north)
    return np.concatenate((heliocentric(planet, time) + distance * away, velocity))


def rows_of(name, elements, epoch, days):
    """Heliocentric places of the body and of the Earth at those days from the epoch."""
    start = state_of(elements, epoch)
    later = [d for d in days if d > 0]
    before = sorted((d for d in days if d < 0), reverse=True)
    states = dict(zip(later, propagate(start, epoch, [epoch + d for d in later])))
    states |= dict(zip(before, propagate(start, epoch, [epoch + d for d in before])))
    # A second run with other steps: what the two differ by is the doubt of this file.
    again = dict(zip(later, propagate(start, epoch, [epoch + d for d in later], rtol=3e-12)))
    doubt = max(np.linalg.norm(again[d][:3] - states[d][:3]) for d in later)
    print(f"{name}: rerun differs by {doubt:.1e} au at most; q {elements[0]:.4f}, e {elements[1]:.4f}")
    return [
        [name, d, *(round(float(x), 12) for x in (*states[d][:3], *heliocentric("Earth", epoch + d)))]
        for d in sorted(states)
    ]


def main():
    bodies, rows = [], []
    for name, planet, time, distance, direction, speed, turn, lead in PASSES:
        epoch = time - lead
        state = propagate(passing(planet, time, distance, direction, speed, turn), time, [epoch])[0]
        elements = elements_of(state, epoch)
        bodies.append([name, epoch, *elements])
        rows += rows_of(name, elements, epoch, sorted({*CHECKED_DAYS, lead, lead + 1.0, lead + 15.0}))
    for name, elements, epoch in ORBITS:
        bodies.append([name, epoch, *elements])
        rows += rows_of(name, elements, epoch, CHECKED_DAYS)
    write(
        HERE / "approaches.json",
        {
            **about(
                "Invented bodies that pass a planet, the Moon or the Sun closely",
                "elements: body, epoch (TT JD), q (au), e, inclination, node, argument of perihelion (degrees, ecliptic "
                "J2000), perihelion (TT JD); places: body, days from the epoch (TT), heliocentric place of the body and "
                "of the Earth (au, ICRS)",
                ("libswe2.0", "swe-basic-data", "python3-mpmath", "python3-numpy"),
            ),
            "source": "SciPy's DOP853 at rtol 1e-13 with planets from the Swiss Ephemeris files (JPL DE431)",
        },
        {"elements": bodies, "places": rows},
    )


main()
