#!/usr/bin/python3
"""Where bright stars stand over two places, found independently of the TypeScript, for the map on the handout.

Needs Debian's python3-erfa. Rewrites skyMap.json beside itself. ERFA's atco13 takes ICRS places (Hipparcos
values, rounded, proper motion to 2027 left out: at most 6 arcsec here) to observed azimuth and height, refraction
at 1010 hPa and 10 degrees C included; UT1 = UTC, no polar motion.
"""
import json
from datetime import datetime
from pathlib import Path

import erfa
import numpy as np

STARS = {
    "Capella": (79.17233, 45.99799),
    "Rigel": (78.63447, -8.20164),
    "Betelgeuse": (88.79294, 7.40706),
    "Aldebaran": (68.98016, 16.50930),
    "Castor": (113.64943, 31.88828),
    "Procyon": (114.82549, 5.22499),
    "Sirius": (101.28716, -16.71612),
    "Canopus": (95.98796, -52.69566),
    "Achernar": (24.42853, -57.23675),
    "Deneb": (310.35798, 45.28034),
    "Fomalhaut": (344.41269, -29.62224),
    "Acrux": (186.64956, -63.09909),
}
CASES = [
    ("Brackenfold", 47.1, 8.2, 620.0, "2027-02-06T19:40:00"),
    ("Wether Downs", -44.2, 170.4, 0.0, "2027-02-06T10:00:00"),
]


def horizontal(ra, dec, latitude, longitude, height, utc):
    at = datetime.fromisoformat(utc)
    utc1, utc2 = erfa.dtf2d("UTC", at.year, at.month, at.day, at.hour, at.minute, at.second)
    azimuth, zenith, *_ = erfa.atco13(
        np.radians(ra), np.radians(dec), 0.0, 0.0, 0.0, 0.0, utc1, utc2, 0.0,
        np.radians(longitude), np.radians(latitude), height, 0.0, 0.0, 1010.0, 10.0, 0.5, 0.55,
    )
    return round(90 - float(np.degrees(zenith)), 4), round(float(np.degrees(azimuth)) % 360, 4)


cases = []
for site, latitude, longitude, height, utc in CASES:
    stars = []
    for name, (ra, dec) in STARS.items():
        altitude, azimuth = horizontal(ra, dec, latitude, longitude, height, utc)
        if altitude > 10:
            stars.append({"name": name, "altitudeDeg": altitude, "azimuthDeg": azimuth})
    cases.append(
        {"site": site, "latitudeDeg": latitude, "longitudeDeg": longitude, "elevationM": height,
         "utc": utc + "Z", "stars": stars}
    )
Path(__file__).with_name("skyMap.json").write_text(json.dumps(cases, indent=2) + "\n")
