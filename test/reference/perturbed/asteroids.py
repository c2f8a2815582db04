"""Writes asteroids.json: elements of four asteroids at several epochs and where an ephemeris has them later.

The velocity read from a compressed ephemeris is noisy (3e-9 au/day), so the state at each epoch is fitted to
places within 100 days of it; what is checked lies beyond.
"""

import ctypes
import sys
from pathlib import Path

import numpy as np

sys.dont_write_bytecode = True

from integration import elements_of, propagate  # noqa: E402
from ephemeris import (  # noqa: E402
    BARYCENTRIC, EQUATORIAL, FROM_FILES, GEOMETRIC, ICRS, J2000, RECTANGULAR, SPEED,
    _call, _library, about, barycentric, light_left, spherical, write,
)

HERE = Path(__file__).parent
NUMBERS = {"Ceres": 17, "Pallas": 18, "Juno": 19, "Vesta": 20}
# 0h TT of 2003-01-12, 2006-10-03, 2010-05-18, 2014-02-07, 2018-11-25, 2022-08-19, 2026-12-01, 2030-04-10.
EPOCHS = [2452651.5, 2454011.5, 2455334.5, 2456695.5, 2458447.5, 2459810.5, 2461375.5, 2462601.5]
LATER = [-700, -500, -300, -120, 120, 300, 500, 700]
FITTED_DAYS = np.arange(5, 101, 5)


def place(body, tt_jd):
    """Barycentric geometric place of an asteroid (ICRS, au) and its noisy velocity."""
    flags = FROM_FILES | GEOMETRIC | J2000 | ICRS | SPEED | EQUATORIAL | RECTANGULAR | BARYCENTRIC
    out = _call(_library.swe_calc, tt_jd, NUMBERS[body], flags)
    return np.array(out[:3]), np.array(out[3:6])


def heliocentric(body, tt_jd):
    return place(body, tt_jd)[0] - barycentric("Sun", tt_jd)[0]


def around(state, epoch):
    after = propagate(state, epoch, epoch + FITTED_DAYS, rtol=1e-11)
    before = propagate(state, epoch, epoch - FITTED_DAYS, rtol=1e-11)
    return np.array([s[:3] for s in (*before[::-1], *after)]).ravel()


def fit(body, epoch):
    """The state at the epoch that fits the ephemeris within 100 days of it best, and the residual in au."""
    days = np.concatenate((-FITTED_DAYS[::-1], FITTED_DAYS))
    observed = np.array([heliocentric(body, epoch + d) for d in days]).ravel()
    state = np.concatenate((heliocentric(body, epoch), place(body, epoch)[1] - barycentric("Sun", epoch)[1]))
    base = around(state, epoch)
    small = [1e-6] * 3 + [1e-8] * 3
    slopes = np.array([(around(state + np.eye(6)[i] * s, epoch) - base) / s for i, s in enumerate(small)]).T
    for _ in range(3):
        change = np.linalg.lstsq(slopes, observed - base, rcond=None)[0]
        state = state + change
        base = around(state, epoch)
    if np.max(np.abs(change)) > 1e-11:
        raise RuntimeError(f"the fit of {body} at {epoch} does not settle")
    return state, np.sqrt(np.mean((observed - base) ** 2))


def main():
    elements, rows = [], []
    for body in NUMBERS:
        for epoch in EPOCHS:
            state, residual = fit(body, epoch)
            elements.append([body, epoch, *elements_of(state, epoch)])
            print(body, epoch, f"residual {residual:.1e} au")
            for days in LATER:
                tt = epoch + days
                earth = barycentric("Earth", tt)[0]
                seen = light_left(lambda t: place(body, t)[0], earth, tt) - earth
                ra, dec = spherical(seen)
                rows.append([body, epoch, days, round(ra, 8), round(dec, 8), round(float(np.linalg.norm(seen)), 9)])
    write(
        HERE / "asteroids.json",
        {
            **about(
                "Osculating elements fitted to an ephemeris within 100 days of the epoch, and its places beyond",
                "elements: body, epoch (TT JD), q (au), e, inclination, node, argument of perihelion (degrees, ecliptic "
                "J2000), perihelion (TT JD); places: body, epoch, days from it (TT), geocentric astrometric right "
                "ascension and declination (degrees, ICRS), distance (au)",
                ("libswe2.0", "swe-basic-data", "python3-mpmath", "python3-numpy"),
            ),
            "source": "Swiss Ephemeris asteroid file seas_18.se1 and planets (JPL DE431); fit with SciPy's DOP853",
        },
        {"elements": elements, "places": rows},
    )


main()
