"""Writes horizontal.json, geocentric.json, stars.json, comets.json, brightness.json and turning.json."""

import sys
from datetime import datetime, timedelta, timezone
from pathlib import Path

import erfa
import numpy as np

sys.dont_write_bytecode = True

from ephemeris import (
    BODIES,
    about,
    apart,
    comet,
    julian,
    libastro_astrometric,
    library_apparent,
    library_look,
    seen,
    solar,
    tt_parts,
    write,
)

HERE = Path(__file__).parent
FIRST = datetime(2026, 1, 1, tzinfo=timezone.utc)
LAST = datetime(2031, 12, 31, tzinfo=timezone.utc)
GOLDEN = 0.6180339887498949

# Latitude, east longitude, metres: both hemispheres to 69 degrees, no town or observatory meant.
OBSERVERS = [
    (69.0, 20.5, 90), (-69.0, 39.6, 30), (64.2, -147.1, 210), (-64.8, -64.1, 5), (60.3, 5.2, 15),
    (55.9, -3.4, 120), (-54.6, -68.2, 40), (51.2, 178.9, 0), (47.6, 8.9, 450), (-45.1, 170.2, 620),
    (43.4, -80.6, 330), (39.2, -106.4, 3150), (-38.3, 145.7, 95), (35.1, 139.4, 260), (-33.2, -70.9, 2200),
    (29.8, 31.1, 60), (-26.5, 28.3, 1680), (21.4, -157.6, 4180), (-17.9, -149.7, 10), (12.3, 77.2, 920),
    (-8.1, 115.3, 700), (4.9, -52.5, 20), (0.0, 36.9, 1850), (-0.2, -78.4, 2850),
]
DATES_PER_OBSERVER = 6


def spread(count, start=0.0):
    """Instants over the six years without a common period with anything in the sky, to a whole second."""
    span = (LAST - FIRST).total_seconds()
    return [FIRST + timedelta(seconds=round(((start + i * GOLDEN) % 1) * span)) for i in range(count)]


def iso(utc):
    return utc.strftime("%Y-%m-%dT%H:%M:%SZ")


def body_seen(body, utc, observer=None):
    # Light from the Sun and the Moon does not pass by the Sun.
    return seen(utc, solar(body), observer=observer, deflect=body not in ("Sun", "Moon"))


def horizontal():
    times = spread(len(OBSERVERS) * DATES_PER_OBSERVER)
    rows = []
    for i, utc in enumerate(times):
        at = i % len(OBSERVERS)
        row = [at, iso(utc)]
        for body in BODIES:
            s = body_seen(body, utc, OBSERVERS[at])
            row += [round(s["altitude"], 5), round(s["azimuth"], 5)]
        rows.append(row)
    columns = "observer, UTC, then altitude and azimuth (airless, degrees) of " + ", ".join(BODIES)
    write(
        HERE / "horizontal.json",
        about("Apparent topocentric airless altitude and azimuth from north through east; UT1 = UTC", columns)
        | {"observers": "latitude, east longitude (degrees, WGS84), metres"},
        {"observers": OBSERVERS, "rows": rows},
    )


def geocentric():
    rows, own, other = [], 0.0, 0.0
    for utc in spread(60, 0.31):
        tt_jd = sum(tt_parts(utc))
        for body in BODIES:
            s = body_seen(body, utc)
            own = max(own, apart(s["apparent"], library_apparent(body, tt_jd)))
            if body != "Moon":  # libastro leaves the Earth's motion in light time out of the Moon's place
                other = max(other, apart(s["astrometric"], libastro_astrometric(body, tt_jd)))
            rows.append(
                [body, iso(utc)]
                + [round(x, 5) for x in (*s["astrometric"], *s["apparent"])]
                + [float(f"{s['distance']:.8g}")]
            )
    if own > 0.01 or other > 2:
        raise RuntimeError(f"the chain is {own} arcsec from the ephemeris library, {other} from libastro")
    print(f"geocentric places: {own:.4f} arcsec at most from the ephemeris library's, {other:.2f} from libastro's")
    columns = "body, UTC, astrometric RA and Dec (ICRS), apparent RA and Dec (true equator and equinox of date), au"
    write(
        HERE / "geocentric.json",
        about("Geocentric places in degrees; astrometric: light time, no aberration, no deflection", columns),
        {"rows": rows},
    )


# Right ascension and declination at J2000, degrees, over the whole sphere with both poles.
STARS = [
    (0.0, 89.26), (37.95, 88.0), (10.68, 41.27), (56.75, 24.12), (83.63, 22.01), (101.29, -16.72),
    (148.89, 69.07), (201.3, -11.16), (213.92, 19.18), (201.7, -47.48), (250.42, 36.46), (270.9, -24.38),
    (279.23, 38.78), (310.36, 45.28), (322.49, 12.17), (344.41, -29.62), (6.02, -72.08), (80.89, -69.76),
    (186.65, -63.1), (317.2, -88.96),
]


def stars():
    rows = []
    for i, utc in enumerate(spread(120, 0.77)):
        star = STARS[i % len(STARS)]
        at = (7 * i) % len(OBSERVERS)
        geo, topo = seen(utc, star=star), seen(utc, star=star, observer=OBSERVERS[at])
        rows.append(
            [*star, at, iso(utc)] + [round(x, 6) for x in (*geo["apparent"], topo["altitude"], topo["azimuth"])]
        )
    columns = "RA, Dec (ICRS), observer, UTC, geocentric apparent RA, Dec, topocentric airless altitude, azimuth"
    write(
        HERE / "stars.json",
        about("Directions without motion or parallax, degrees", columns, ("python3-erfa", "liberfa1", "libswe2.0")),
        {"observers": OBSERVERS, "rows": rows},
    )


# Invented: q, e, inclination, node, argument of perihelion, perihelion (TT Julian date).
COMETS = [
    (0.764213, 1.000248, 96.3152, 61.884, 143.2097, 2461720.25),
    (1.482907, 0.617345, 11.9026, 8.0461, 201.773, 2461905.5),
    (0.021, 0.99993, 144.1, 310.2, 80.4, 2462100.75),
    (2.9, 1.13, 67.7, 150.3, 12.6, 2461650.5),
    (1.003, 0.97, 24.0, 199.5, 186.0, 2462240.0),
    (1.9, 0.24, 7.3, 95.1, 250.9, 2461500.0),
    (3.1, 3.2, 43.0, 228.4, 305.5, 2461950.0),
    # Passes the Earth at 0.04 au about its perihelion.
    (0.95, 0.6, 8.0, 100.0, 359.0, 2461768.0),
]


def comets():
    rows = []
    for number, elements in enumerate(COMETS):
        perihelion = elements[5]
        start = datetime(1970, 1, 1, tzinfo=timezone.utc) + timedelta(days=perihelion - 2440587.5)
        for i in range(16):
            # Crowded about perihelion, a year and a half to either side.
            days = 540 * ((i - 7.5) / 7.5) ** 3
            utc = (start + timedelta(days=days)).replace(microsecond=0)
            at = (5 * i + 3 * number) % len(OBSERVERS)
            topo = seen(utc, comet(*elements), observer=OBSERVERS[at], deflect=False)
            rows.append(
                [number, at, iso(utc)]
                + [round(x, 5) for x in (*topo["astrometric"], topo["altitude"], topo["azimuth"])]
                + [float(f"{topo['distance']:.8g}")]
            )
    columns = "comet, observer, UTC, topocentric astrometric RA, Dec (ICRS), airless altitude, azimuth, au"
    write(
        HERE / "comets.json",
        about("Two-body comets from the observer, degrees; light deflection left out", columns)
        | {"comets": "q (au), e, inclination, node, argument of perihelion (J2000 ecliptic), perihelion (TT JD)"},
        {"observers": OBSERVERS, "comets": COMETS, "rows": rows},
    )


def brightness():
    rows = []
    for utc in spread(80, 0.13):
        for body in BODIES[1:]:
            look = library_look(body, sum(tt_parts(utc)))
            magnitude = None if body == "Moon" else round(look["magnitude"], 3)
            rows.append([body, iso(utc), round(look["phase"], 4), round(look["elongation"], 4), magnitude])
    write(
        HERE / "brightness.json",
        about(
            "Geocentric phase angle and elongation in degrees, and V after Mallama and Hilton 2018, as the "
            "Swiss Ephemeris library (AGPL-3.0, run, not copied) computes them",
            "body, UTC, phase angle, elongation, magnitude",
            ("libswe2.0", "swe-basic-data"),
        )
        | {"source": "Swiss Ephemeris library, function swe_pheno"},
        {"rows": rows},
    )


def turning():
    """What the Earth does: TT - UTC, sidereal time and the observer's vector, by ERFA alone."""
    seconds = []
    for year in range(1972, 2032):
        for month, day, hour in ((1, 1, 0), (3, 17, 5), (6, 30, 23), (7, 1, 0), (12, 31, 23)):
            utc = datetime(year, month, day, hour, tzinfo=timezone.utc)
            seconds.append([iso(utc), round(32.184 + float(erfa.dat(year, month, day, 0.0)), 3)])
    sidereal = []
    for utc in [datetime(1987, 4, 10, tzinfo=timezone.utc)] + spread(60, 0.5):
        day, part = julian(utc)
        sidereal.append([iso(utc), round(float(np.degrees(erfa.gst06a(day, part, *tt_parts(utc)))), 6)])
    places = []
    for latitude, longitude, metres in [*OBSERVERS, (90.0, 0.0, 0), (-90.0, 0.0, 2800)]:
        x, y, z = erfa.gd2gc(1, np.radians(longitude), np.radians(latitude), metres)
        places.append([latitude, metres, round(float(np.hypot(x, y)), 3), round(float(z), 3)])
    write(
        HERE / "turning.json",
        about(
            "The Earth's turning and shape",
            "seconds: UTC, TT - UTC; sidereal: UTC (= UT1), Greenwich apparent sidereal time in degrees; "
            "places: latitude, metres, metres from the axis and from the equator (WGS84)",
            ("python3-erfa", "liberfa1"),
        )
        | {"source": "ERFA: dat, gst06a, gd2gc"},
        {"seconds": seconds, "sidereal": sidereal, "places": places},
    )


if __name__ == "__main__":
    horizontal()
    geocentric()
    stars()
    comets()
    brightness()
    turning()
