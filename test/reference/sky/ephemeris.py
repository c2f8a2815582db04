"""An apparent-place chain that shares no code with libs/sky.

Geometric barycentric vectors (ICRS) come from the Swiss Ephemeris files, which are compressed JPL DE431;
precession-nutation, Earth rotation, light deflection and aberration come from ERFA (IAU 2006/2000A).
Light time and the two-body orbit are worked out here. UT1 is taken as UTC, polar motion as zero.
"""

import ctypes
import json
import subprocess
import warnings
from datetime import datetime, timedelta, timezone

import ephem
import erfa
import mpmath
import numpy as np

# ERFA 2.0.0 doubts leap seconds more than five years past its release; none has been announced since.
warnings.filterwarnings("ignore", category=erfa.ErfaWarning)

BODIES = ["Sun", "Moon", "Mercury", "Venus", "Mars", "Jupiter", "Saturn", "Uranus", "Neptune"]
EARTH = 14
AU_PER_DAY = 173.1446326847
DATA_DIRECTORY = "/usr/share/libswe/ephe"

FROM_FILES = 2
GEOMETRIC = 16
J2000 = 32
SPEED = 256
EQUATORIAL = 2048
RECTANGULAR = 4096
BARYCENTRIC = 16384
ICRS = 131072

_library = ctypes.CDLL("libswe.so.2.0")
_library.swe_calc.restype = ctypes.c_int32
_library.swe_calc.argtypes = [
    ctypes.c_double,
    ctypes.c_int,
    ctypes.c_int32,
    ctypes.POINTER(ctypes.c_double),
    ctypes.c_char_p,
]
_library.swe_pheno.restype = ctypes.c_int32
_library.swe_pheno.argtypes = _library.swe_calc.argtypes
_library.swe_set_ephe_path(DATA_DIRECTORY.encode())


def _call(function, tt_jd, number, flags):
    out = (ctypes.c_double * 20)()
    message = ctypes.create_string_buffer(256)
    used = function(tt_jd, number, flags, out, message)
    if used < 0 or not used & FROM_FILES:
        raise RuntimeError(f"the ephemeris files were not read: {message.value.decode()}")
    return list(out)


def body_number(body):
    return EARTH if body == "Earth" else BODIES.index(body)


def barycentric(body, tt_jd):
    """Barycentric place (au) and velocity (au/day), ICRS, geometric."""
    flags = FROM_FILES | GEOMETRIC | J2000 | ICRS | SPEED | EQUATORIAL | RECTANGULAR | BARYCENTRIC
    out = _call(_library.swe_calc, tt_jd, body_number(body), flags)
    return np.array(out[:3]), np.array(out[3:6])


def library_apparent(body, tt_jd):
    """The ephemeris library's own geocentric apparent RA and Dec in degrees, to check this chain by."""
    out = _call(_library.swe_calc, tt_jd, body_number(body), FROM_FILES | EQUATORIAL)
    return out[0], out[1]


def library_look(body, tt_jd):
    """The ephemeris library's phase angle, elongation (degrees) and magnitude, geocentric."""
    out = _call(_library.swe_pheno, tt_jd, body_number(body), FROM_FILES)
    return {"phase": out[0], "elongation": out[2], "magnitude": out[4]}


def libastro_astrometric(body, tt_jd):
    """Astrometric geocentric RA and Dec in degrees (J2000) by libastro, whose theory (VSOP87) is another."""
    days = tt_jd - 2415020.0
    days -= ephem.delta_t(ephem.Date(days)) / 86400
    found = getattr(ephem, body)()
    found.compute(ephem.Date(days), epoch="2000")
    return np.degrees(float(found.a_ra)), np.degrees(float(found.a_dec))


def apart(a, b):
    """Angle between two (RA, Dec) in degrees, arcsec."""
    return np.degrees(erfa.seps(*np.radians(a), *np.radians(b))) * 3600


def julian(utc):
    """A UTC datetime as a two-part Julian date."""
    whole = datetime(utc.year, utc.month, utc.day, tzinfo=timezone.utc)
    return 2440587.5 + (whole - datetime(1970, 1, 1, tzinfo=timezone.utc)).days, (utc - whole) / timedelta(days=1)


def tt_parts(utc):
    day, part = julian(utc)
    return day, part + (32.184 + erfa.dat(utc.year, utc.month, utc.day, 0.0)) / 86400


def light_left(place_at, viewer, tt_jd):
    """Where a body stood when the light left it that reaches the viewer now; barycentric, au."""
    tau = 0.0
    for _ in range(12):
        place = place_at(tt_jd - tau)
        later = np.linalg.norm(place - viewer) / AU_PER_DAY
        if abs(later - tau) < 1e-13:
            break
        tau = later
    return place


def spherical(v):
    lon, lat = np.arctan2(v[1], v[0]), np.arctan2(v[2], np.hypot(v[0], v[1]))
    return np.degrees(lon) % 360, np.degrees(lat)


def _deflect(direction, body, astrom, tt_jd):
    sun = barycentric("Sun", tt_jd)[0]
    from_sun = body - sun
    q = from_sun / np.linalg.norm(from_sun)
    em = float(astrom["em"])
    return erfa.ld(1.0, direction, q, astrom["eh"], em, 1e-6 / max(1.0, em * em))


def seen(utc, place_at=None, star=None, observer=None, deflect=True):
    """Astrometric and apparent place, and altitude and azimuth where an observer is given (degrees).

    place_at(tt_jd) is barycentric (ICRS, au); star is (ra, dec) in degrees without motion or parallax;
    observer is (latitude, east longitude, metres), geodetic WGS84.
    """
    tt1, tt2 = tt_parts(utc)
    tt_jd = tt1 + tt2
    earth, velocity = barycentric("Earth", tt_jd)
    earth_pv = np.array((earth, velocity), dtype=erfa.dt_pv)
    heliocentric = earth - barycentric("Sun", tt_jd)[0]
    if observer is None:
        astrom = erfa.apcg(tt1, tt2, earth_pv, heliocentric)
    else:
        x, y, s = erfa.xys06a(tt1, tt2)
        latitude, longitude, metres = observer
        theta = erfa.era00(*julian(utc))
        astrom = erfa.apco(
            tt1, tt2, earth_pv, heliocentric, x, y, s, theta,
            np.radians(longitude), np.radians(latitude), metres, 0.0, 0.0, 0.0, 0.0, 0.0,
        )
    viewer = np.array(astrom["eb"])
    if star is None:
        body = light_left(place_at, viewer, tt_jd)
        away = body - viewer
    else:
        away = erfa.s2c(np.radians(star[0]), np.radians(star[1]))
    distance = np.linalg.norm(away)
    direction = away / distance
    natural = direction
    if star is not None:
        natural = erfa.ldsun(direction, astrom["eh"], astrom["em"])
    elif deflect:
        natural = _deflect(direction, body, astrom, tt_jd)
    proper = erfa.ab(natural, astrom["v"], astrom["em"], astrom["bm1"])
    result = {
        "astrometric": spherical(direction),
        "apparent": spherical(erfa.pnm06a(tt1, tt2) @ proper),
        "distance": distance,
    }
    if observer is not None:
        cirs = astrom["bpn"] @ proper
        eral = float(astrom["eral"])
        meridian = np.cos(eral) * cirs[0] + np.sin(eral) * cirs[1]
        east = -np.sin(eral) * cirs[0] + np.cos(eral) * cirs[1]
        sin, cos = np.sin(np.radians(latitude)), np.cos(np.radians(latitude))
        north, up = cos * cirs[2] - sin * meridian, sin * cirs[2] + cos * meridian
        result["azimuth"] = np.degrees(np.arctan2(east, north)) % 360
        result["altitude"] = np.degrees(np.arctan2(up, np.hypot(east, north)))
    return result


def solar(body):
    return lambda tt_jd: barycentric(body, tt_jd)[0]


# The two-body orbit, each kind of conic by its own textbook equation.

mpmath.mp.dps = 60
_GAUSS = mpmath.mpf("0.01720209895")


def conic(q, e, days):
    """Place (au) and velocity (au/day) in the orbit's plane. Kepler's equation for the ellipse and the
    hyperbola, Barker's for the parabola, by Newton and bisection in 60-digit arithmetic."""
    q, e, days = mpmath.mpf(q), mpmath.mpf(e), mpmath.mpf(days)
    if e == 1:
        w = 3 * _GAUSS * days / mpmath.sqrt(2 * q**3)
        root = mpmath.cbrt(abs(w) / 2 + mpmath.sqrt(w * w / 4 + 1))
        tangent = (root - 1 / root) * mpmath.sign(w)
        nu = 2 * mpmath.atan(tangent)
    else:
        a = abs(q / (1 - e))
        mean = _GAUSS * days / mpmath.sqrt(a**3)
        if e < 1:
            mean -= 2 * mpmath.pi * mpmath.nint(mean / (2 * mpmath.pi))
            anomaly = _root(lambda E: E - e * mpmath.sin(E) - mean, lambda E: 1 - e * mpmath.cos(E), mean, mpmath.pi)
            nu = 2 * mpmath.atan(mpmath.sqrt((1 + e) / (1 - e)) * mpmath.tan(anomaly / 2))
        else:
            bound = mpmath.asinh(abs(mean) / (e - 1)) + 1
            anomaly = _root(lambda H: e * mpmath.sinh(H) - H - mean, lambda H: e * mpmath.cosh(H) - 1, mean, bound)
            nu = 2 * mpmath.atan(mpmath.sqrt((e + 1) / (e - 1)) * mpmath.tanh(anomaly / 2))
    r = q * (1 + e) / (1 + e * mpmath.cos(nu))
    speed = _GAUSS / mpmath.sqrt(q * (1 + e))
    return (
        (r * mpmath.cos(nu), r * mpmath.sin(nu)),
        (-speed * mpmath.sin(nu), speed * (e + mpmath.cos(nu))),
    )


def _root(f, slope, mean, bound):
    if mean == 0:
        return mpmath.mpf(0)
    low, high = (mpmath.mpf(0), bound) if mean > 0 else (-bound, mpmath.mpf(0))
    x = (low + high) / 2
    for _ in range(400):
        value = f(x)
        if value > 0:
            high = x
        else:
            low = x
        step = value / slope(x)
        nearer = x - step
        if not low <= nearer <= high:
            nearer = (low + high) / 2
        if abs(nearer - x) <= mpmath.mpf(10) ** -52 * abs(nearer):
            return nearer
        x = nearer
    raise RuntimeError("Kepler's equation was not solved")


def orbit_state(q, e, inclination, node, argument, days):
    """Heliocentric ecliptic place and velocity, by three plain rotations of the plane; angles in degrees."""
    place, velocity = conic(q, e, days)
    i, node, w = (mpmath.radians(mpmath.mpf(x)) for x in (inclination, node, argument))

    def turn(x, y):
        x, y = x * mpmath.cos(w) - y * mpmath.sin(w), x * mpmath.sin(w) + y * mpmath.cos(w)
        y, z = y * mpmath.cos(i), y * mpmath.sin(i)
        return [x * mpmath.cos(node) - y * mpmath.sin(node), x * mpmath.sin(node) + y * mpmath.cos(node), z]

    return turn(*place), turn(*velocity)


def comet(q, e, inclination, node, argument, perihelion_tt_jd):
    """A two-body comet as barycentric ICRS vectors; elements on the J2000 ecliptic (obliquity 84381.448")."""
    obliquity = np.radians(84381.448 / 3600)
    cos, sin = np.cos(obliquity), np.sin(obliquity)

    def place_at(tt_jd):
        x, y, z = (float(v) for v in orbit_state(q, e, inclination, node, argument, tt_jd - perihelion_tt_jd)[0])
        return barycentric("Sun", tt_jd)[0] + np.array([x, cos * y - sin * z, sin * y + cos * z])

    return place_at


def versions():
    def package(name):
        return subprocess.check_output(["dpkg-query", "-W", "-f", "${Version}", name], text=True)

    names = ["libswe2.0", "swe-basic-data", "python3-erfa", "liberfa1", "python3-mpmath", "python3-numpy"]
    return {name: package(name) for name in names}


def write(path, about, tables):
    """JSON with one row a line, so that a change can be read."""
    with open(path, "w") as out:
        out.write("{\n" + f'  "about": {json.dumps(about)}')
        for name, rows in tables.items():
            lines = ",\n".join("    " + json.dumps(row, separators=(",", ":")) for row in rows)
            out.write(f',\n  "{name}": [\n{lines}\n  ]')
        out.write("\n}\n")


def about(what, columns, packages=("libswe2.0", "swe-basic-data", "python3-erfa", "liberfa1")):
    found = versions()
    return {
        "what": what,
        "columns": columns,
        "source": "Swiss Ephemeris files (JPL DE431) for the vectors, ERFA for frames, Earth rotation and aberration",
        "licence": "the ephemeris data CC0-1.0, ERFA BSD-3-Clause; this file Apache-2.0",
        "packages": {name: found[name] for name in packages},
    }
