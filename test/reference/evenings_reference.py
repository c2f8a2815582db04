#!/usr/bin/python3
"""Sunset to sunrise, twilights, moonrise and moonset, found independently of the TypeScript.

Needs numpy and erfa, and Debian's libswe2.0 with swe-basic-data (the Moon). Rewrites evenings.json beside
itself. Definitions: Sun's centre at -0.8333, -6, -12, -18 degrees; Moon's upper limb at -0.5667 degrees, its
centre at that less the topocentric semidiameter; airless, topocentric, apparent; UT1 = UTC,
TT = UTC + 69.184 s. The Sun is ERFA's (epv00), aberrated by ERFA; the Moon is Swiss Ephemeris' apparent
geocentric place (file ephemeris); precession-nutation and sidereal time are ERFA's (IAU 2006/2000A).
Crossings are found by brute force: every minute of the day is evaluated, every change of side refined.
"""
import ctypes
import json
import os

import erfa
import numpy as np

HERE = os.path.dirname(os.path.abspath(__file__))
TT_MINUS_UTC = 69.184
AU_KM = 149597870.7
MOON_RADIUS_KM = 1737.4
DAY_MS = 86_400_000
UNIX_JD = 2440587.5

swe = ctypes.CDLL("libswe.so.2")
swe.swe_set_ephe_path.argtypes = [ctypes.c_char_p]
swe.swe_calc.argtypes = [
    ctypes.c_double,
    ctypes.c_int,
    ctypes.c_int32,
    ctypes.POINTER(ctypes.c_double),
    ctypes.c_char_p,
]
swe.swe_calc.restype = ctypes.c_int32
swe.swe_set_ephe_path(b"/usr/share/libswe/ephe")
SWIEPH, EQUATORIAL, XYZ = 2, 2048, 4096


def split(utc_ms):
    days, rest = divmod(utc_ms, DAY_MS)
    return UNIX_JD + days, rest / DAY_MS


def moon_of_date(utc_ms):
    """Apparent geocentric Moon, true equator and equinox of date, au."""
    jd, part = split(utc_ms)
    out = (ctypes.c_double * 6)()
    message = ctypes.create_string_buffer(256)
    flags = SWIEPH | EQUATORIAL | XYZ
    got = swe.swe_calc(jd + part + TT_MINUS_UTC / 86400, 1, flags, out, message)
    if got != flags:
        raise RuntimeError(message.value.decode() or f"ephemeris answered with flags {got}, not {flags}")
    return np.array(out[:3])


def sun_of_date(utc_ms):
    """Apparent geocentric Sun, true equator and equinox of date, au."""
    jd, part = split(utc_ms)
    tt = part + TT_MINUS_UTC / 86400
    helio, bary = erfa.epv00(jd, tt)
    towards = -helio["p"]
    distance = np.linalg.norm(towards)
    v = bary["v"] * AU_KM / 86400 / 299792.458
    seen = erfa.ab(towards / distance, v, distance, np.sqrt(1 - v @ v))
    return erfa.pnm06a(jd, tt) @ seen * distance


def altitude_and_distance(geocentric, lat, lon, height, utc_ms):
    jd, part = split(utc_ms)
    gast = erfa.gst06a(jd, part, jd, part + TT_MINUS_UTC / 86400)
    theta = gast + lon
    rotate = np.array(
        [[np.cos(theta), -np.sin(theta), 0], [np.sin(theta), np.cos(theta), 0], [0, 0, 1]]
    )
    site = erfa.gd2gc(1, 0.0, lat, height) / 1000 / AU_KM  # meridian frame
    seen = geocentric - rotate @ site
    up = rotate @ np.array([np.cos(lat), 0, np.sin(lat)])
    distance = np.linalg.norm(seen)
    return np.degrees(np.arcsin(seen @ up / distance)), distance


def bisect(f, low, high):
    side = f(low) < 0
    while high - low > 0.5:
        middle = 0.5 * (low + high)
        if (f(middle) < 0) == side:
            low = middle
        else:
            high = middle
    return 0.5 * (low + high)


def crossings(f, times, values, level):
    found = []
    for i in range(1, len(times)):
        a, b = values[i - 1] - level, values[i] - level
        if (a < 0) != (b < 0):
            at = bisect(lambda t: f(t) - level, times[i - 1], times[i])
            rate = (f(at + 10_000) - f(at - 10_000)) / 20_000 * 3_600_000
            found.append({"utcMs": round(at), "rising": bool(b >= 0), "degPerHour": round(rate, 3)})
    return found


def first(found, rising):
    for c in found:
        if c["rising"] == rising:
            return {"utcMs": c["utcMs"], "degPerHour": c["degPerHour"]}
    return None


def spans(found, begins_below, start, end):
    out, since = [], start if begins_below else None
    for c in found:
        if c["rising"] and since is not None:
            out.append((since, c["utcMs"]))
            since = None
        elif not c["rising"]:
            since = c["utcMs"]
    if since is not None:
        out.append((since, end))
    return out


# Invented sites at real latitudes, up to 69 degrees: ordinary nights, no dusk, polar day and night, the south,
# evenings where the Sun only just reaches a level, and the Moon near its standstill.
CASES = [
    (47.1, 8.2, 600, "2027-03-01"),
    (47.1, 8.2, 600, "2027-06-21"),
    (47.1, 8.2, 600, "2026-12-21"),
    (51.4, -1.2, 100, "2027-05-20"),
    (51.4, -1.2, 100, "2027-06-15"),
    (40.2, -105.4, 2300, "2028-02-29"),
    (35.9, -110.1, 1800, "2027-10-31"),
    (19.8, -155.5, 4200, "2027-08-12"),
    (0.3, 36.1, 1900, "2027-09-23"),
    (-1.1, -78.4, 2800, "2028-12-31"),
    (-24.6, -70.4, 2400, "2027-01-15"),
    (-33.5, 151.1, 30, "2027-07-04"),
    (-43.9, 170.5, 1000, "2028-06-21"),
    (-45.0, 168.6, 400, "2027-12-22"),
    (-54.8, -68.3, 10, "2027-12-10"),
    (55.7, 12.5, 20, "2027-04-28"),
    (59.4, 24.7, 40, "2027-07-10"),
    (60.2, 25.0, 30, "2028-11-08"),
    (64.1, -21.9, 60, "2027-06-20"),
    (64.1, -21.9, 60, "2027-12-20"),
    (65.8, 24.1, 10, "2027-06-24"),
    (67.9, 20.2, 420, "2027-12-15"),
    (69.0, 19.0, 100, "2027-06-10"),
    (69.0, 19.0, 100, "2027-12-28"),
    (69.0, 19.0, 100, "2028-01-16"),
    (69.0, 19.0, 100, "2027-03-22"),
    (48.55, 2.0, 150, "2027-06-18"),
    (48.55, 2.0, 150, "2027-07-01"),
    (54.5, -3.0, 150, "2027-06-30"),
    (-66.0, 110.5, 40, "2027-06-25"),
]


def evening(lat_deg, lon_deg, height, date):
    lat, lon = np.radians(lat_deg), np.radians(lon_deg)
    day = int(np.datetime64(date, "ms").astype("int64"))
    start = day + DAY_MS // 2 - round(lon_deg / 15 * 3600) * 1000
    end = start + DAY_MS

    def sun(t):
        return altitude_and_distance(sun_of_date(t), lat, lon, height, t)[0]

    def limb(t):
        centre, distance = altitude_and_distance(moon_of_date(t), lat, lon, height, t)
        return centre + np.degrees(np.arcsin(MOON_RADIUS_KM / AU_KM / distance))

    times = [start + i * 60_000 for i in range(1441)]
    suns = [sun(t) for t in times]
    limbs = [limb(t) for t in times]
    horizon, civil, nautical, astronomical = (
        crossings(sun, times, suns, level) for level in (-0.8333, -6, -12, -18)
    )
    moon = crossings(limb, times, limbs, -0.5667)
    dark = 0
    for a0, a1 in spans(astronomical, suns[0] < -18, start, end):
        for b0, b1 in spans(moon, limbs[0] < -0.5667, start, end):
            dark += max(0, min(a1, b1) - max(a0, b0))
    return {
        "latitudeDeg": lat_deg,
        "longitudeDeg": lon_deg,
        "elevationM": height,
        "date": date,
        "fromMs": start,
        "toMs": end,
        "sunset": first(horizon, False),
        "civilDusk": first(civil, False),
        "nauticalDusk": first(nautical, False),
        "astronomicalDusk": first(astronomical, False),
        "astronomicalDawn": first(astronomical, True),
        "nauticalDawn": first(nautical, True),
        "civilDawn": first(civil, True),
        "sunrise": first(horizon, True),
        "moonrise": first(moon, True),
        "moonset": first(moon, False),
        "darkMinutes": round(dark / 60_000, 3),
        "lowestSunDeg": round(min(suns), 3),
        "highestSunDeg": round(max(suns), 3),
    }


with open(os.path.join(HERE, "evenings.json"), "w") as out:
    rows = ",\n".join(json.dumps(evening(*case)) for case in CASES)
    out.write('{\n"madeBy": "evenings_reference.py",\n"evenings": [\n%s\n]\n}\n' % rows)
