"""Motion of a small body under the Sun, eight planets and the Moon that shares no code with libs/sky.

SciPy's DOP853 at its finest tolerance, planets and Moon straight from the Swiss Ephemeris files (JPL DE431) at
every evaluation; conics in 60-digit arithmetic (../sky/ephemeris.py). Heliocentric, ICRS, au and au/day, TT.
"""

import sys
from pathlib import Path

import mpmath
import numpy as np
from scipy.integrate import solve_ivp

sys.dont_write_bytecode = True
sys.path.insert(0, str(Path(__file__).resolve().parents[1] / "sky"))

from ephemeris import AU_PER_DAY, barycentric, orbit_state  # noqa: E402

MU = 0.01720209895**2
# Sun's mass over each one's: IAU 2009, systems' masses; Earth and Moon apart by their ratio 81.3005691.
_PAIR, _RATIO = 328900.5596, 81.3005691
INVERSE_MASS = {
    "Mercury": 6023600.0,
    "Venus": 408523.719,
    "Earth": _PAIR * (1 + 1 / _RATIO),
    "Moon": _PAIR * (1 + _RATIO),
    "Mars": 3098703.59,
    "Jupiter": 1047.348644,
    "Saturn": 3497.9018,
    "Uranus": 22902.98,
    "Neptune": 19412.26,
}
OBLIQUITY = mpmath.radians(mpmath.mpf("84381.448") / 3600)


def heliocentric(body, tt_jd):
    return barycentric(body, tt_jd)[0] - barycentric("Sun", tt_jd)[0]


def _rates(tt_jd, state):
    r, v = state[:3], state[3:]
    sun = barycentric("Sun", tt_jd)[0]
    distance = np.linalg.norm(r)
    pull = -MU * r / distance**3
    # The Sun's relativity on a test body, first post-Newtonian order, harmonic coordinates.
    pull += MU / (AU_PER_DAY**2 * distance**3) * ((4 * MU / distance - v @ v) * r + 4 * (r @ v) * v)
    for body, inverse in INVERSE_MASS.items():
        p = barycentric(body, tt_jd)[0] - sun
        away = p - r
        pull += MU / inverse * (away / np.linalg.norm(away) ** 3 - p / np.linalg.norm(p) ** 3)
    return np.concatenate((v, pull))


def propagate(state, epoch, times, rtol=1e-13):
    """States at times (rising away from the epoch, all on one side of it); each is the end of a run of steps."""
    at, found = epoch, []
    for time in times:
        # Time since the epoch, so that steps keep their digits.
        run = solve_ivp(
            lambda t, y: _rates(epoch + t, y), (at - epoch, time - epoch), state, method="DOP853", rtol=rtol, atol=1e-16
        )
        if not run.success:
            raise RuntimeError(run.message)
        state, at = run.y[:, -1], time
        found.append(state)
    return found


def state_of(elements, tt_jd):
    """Two-body state from (q, e, i, node, argument of perihelion, T), angles in degrees, ecliptic J2000."""
    q, e, i, node, argument, perihelion = elements
    days = mpmath.mpf(tt_jd) - mpmath.mpf(perihelion)
    cos, sin = mpmath.cos(OBLIQUITY), mpmath.sin(OBLIQUITY)
    return np.array(
        [float(f) for x, y, z in orbit_state(q, e, i, node, argument, days) for f in (x, cos * y - sin * z, sin * y + cos * z)]
    )


def elements_of(state, tt_jd):
    """The elements that osculate in a state, each rounded to a float; the inverse of state_of."""
    mpf = mpmath.mpf
    cos, sin = mpmath.cos(OBLIQUITY), mpmath.sin(OBLIQUITY)

    def ecliptic(x, y, z):
        x, y, z = mpf(x), mpf(y), mpf(z)
        return [x, cos * y + sin * z, cos * z - sin * y]

    def dot(a, b):
        return sum(p * q for p, q in zip(a, b))

    def cross(a, b):
        return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]]

    r, v = ecliptic(*(float(c) for c in state[:3])), ecliptic(*(float(c) for c in state[3:]))
    mu = mpf("0.01720209895") ** 2
    distance = mpmath.sqrt(dot(r, r))
    h = cross(r, v)
    hh = dot(h, h)
    towards = [a / mu - b / distance for a, b in zip(cross(v, h), r)]
    e = mpmath.sqrt(dot(towards, towards))
    q = hh / mu / (1 + e)
    i = mpmath.atan2(mpmath.hypot(h[0], h[1]), h[2])
    node = mpmath.atan2(h[0], -h[1])
    line = [mpmath.cos(node), mpmath.sin(node), mpf(0)]
    across = [c / mpmath.sqrt(hh) for c in cross(h, line)]
    argument = mpmath.atan2(dot(towards, across), dot(towards, line))
    sideways = [c / mpmath.sqrt(hh) for c in cross(h, towards)]
    half = mpmath.atan2(dot(r, sideways), dot(r, towards)) / 2
    a = q / (1 - e)
    if e < 1:
        anomaly = 2 * mpmath.atan(mpmath.sqrt((1 - e) / (1 + e)) * mpmath.tan(half))
        since = (anomaly - e * mpmath.sin(anomaly)) * mpmath.sqrt(a**3 / mu)
    else:
        anomaly = 2 * mpmath.atanh(mpmath.sqrt((e - 1) / (e + 1)) * mpmath.tan(half))
        since = (e * mpmath.sinh(anomaly) - anomaly) * mpmath.sqrt(-(a**3) / mu)
    turn = lambda x: float(mpmath.degrees(x) % 360)  # noqa: E731
    elements = [float(q), float(e), float(mpmath.degrees(i)), turn(node), turn(argument), float(mpf(tt_jd) - since)]
    back = state_of(elements, tt_jd)
    if np.max(np.abs(back - state)) > 2e-11:
        raise RuntimeError(f"elements do not give the state back: {back - state}")
    return elements
