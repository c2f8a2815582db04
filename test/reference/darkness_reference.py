#!/usr/bin/python3
"""Independent values for libs/darkness, written from the papers, not from the TypeScript.

Needs numpy. Run from anywhere; it rewrites darkness.json beside itself.

Moonlight: Krisciunas & Schaefer 1991, PASP 103, 1033, in the paper's own units (degrees, nanolambert), with
the larger of the two near-Moon branches within 10 degrees. No distance factor, Moon at 5 degrees or higher.
Twilight's pattern: Schaefer 1998, Sky & Telescope 95(5), 57, as a multiple of the zenith.
Limits: Crumey 2014, MNRAS 442, 2600, full-range pair, as the threshold contrast itself: the limit is found by
solving (object's illuminance over area) = (threshold contrast) x (background) for the magnitude, not by the
paper's closed formula for the magnitude, so that algebra is checked too.
"""
import json
import os

import numpy as np

HERE = os.path.dirname(os.path.abspath(__file__))


def airmass(zenith):
    return (1 - 0.96 * np.sin(np.radians(zenith)) ** 2) ** -0.5


def moonlight(alpha, rho, zenith, moon_zenith, k):
    intensity = 10 ** (-0.4 * (3.84 + 0.026 * abs(alpha) + 4e-9 * alpha**4))
    far = 10 ** (6.15 - rho / 40)
    mie = max(far, 6.2e7 / rho**2) if rho < 10 else far
    scatter = 10**5.36 * (1.06 + np.cos(np.radians(rho)) ** 2) + mie
    return (
        scatter
        * intensity
        * 10 ** (-0.4 * k * airmass(moon_zenith))
        * (1 - 10 ** (-0.4 * k * airmass(zenith)))
    )


def night(zenith_mag, zenith, k):
    base = 34.08 * np.exp(20.7233 - 0.92104 * zenith_mag)
    x = airmass(zenith)
    return base * x * 10 ** (-0.4 * k * (x - 1))


def small_disc(b):
    return (
        np.sqrt(5.949e-8 * b**-0.5 - 2.389e-7 * b**-0.25 + 2.459e-7) + 4.120e-4 * b**-0.25 - 4.225e-4
    ) ** 2


def large_disc(b):
    return np.sqrt(9.606e-6 * b**-0.5 - 4.112e-5 * b**-0.25 + 5.019e-5) + 4.837e-3 * b**-0.25 - 4.884e-3


def exponent(b):
    if b < 0.193:
        return 0.6
    if b < 3.40:
        return 0.8861 + 0.4 * np.log10(b)
    return 1.146 - 0.0885 * np.log10(b)


def threshold(b, area, factor):
    """Eq. 41: least contrast for a disc of `area` sr on `b` cd/m2."""
    q = exponent(b)
    return factor * ((small_disc(b) / area) ** q + large_disc(b) ** q) ** (1 / q)


def limit(sky_mag, area, aperture, power, dimming, pupil, factor):
    """V magnitude of the faintest visible disc seen through an instrument (the eye: aperture = pupil, power 1)."""
    sky = 10 ** ((12.58 - sky_mag) / 2.5)
    exit_pupil = aperture / power
    through = (min(exit_pupil, pupil) / pupil) ** 2 / dimming
    background = max(1e-5, sky * through)
    seen_area = area * power**2
    needed = threshold(background, seen_area, factor) * background  # luminance of the disc at the eye
    # illuminance at the eye = what falls on the aperture, less losses, over the area of the beam the eye takes
    gain = (aperture / max(exit_pupil, pupil)) ** 2 / dimming
    illuminance = needed * seen_area / gain  # lux, at the top of the instrument
    return -13.99 - 2.5 * np.log10(illuminance)


def twilight(sun, altitude, away, k):
    """Schaefer 1998, V band, nanolambert; degrees; `away` is azimuth from the Sun's."""
    z = 90 - altitude
    cosine = np.sin(np.radians(sun)) * np.sin(np.radians(altitude)) + np.cos(np.radians(sun)) * np.cos(
        np.radians(altitude)
    ) * np.cos(np.radians(away))
    rho = np.degrees(np.arccos(np.clip(cosine, -1, 1)))
    x = 1 / (np.cos(np.radians(z)) + 0.025 * np.exp(-11 * np.cos(np.radians(z))))
    mag = -26.74 + 11.05 + 32.5 - sun - z / (360 * k)
    return 10 ** (-0.4 * mag) * (100 / rho) * (1 - 10 ** (-0.4 * k * x)) / 1.11e-15


def twilight_rows():
    return [
        [sun, altitude, away, k, float(twilight(sun, altitude, away, k) / twilight(sun, 90.0, 0.0, k))]
        for sun in (-3.0, -5.0, -8.0, -12.0)
        for altitude in (0.0, 6.0, 25.0, 60.0, 85.0)
        for away in (0.0, 40.0, 100.0, 180.0)
        for k in (0.12, 0.22, 0.4)
    ]


def moon_rows():
    rows = []
    for alpha in (0.0, 30.0, 75.0, 120.0):
        for rho in (2.0, 7.0, 9.0, 25.0, 60.0, 110.0):
            for zenith in (0.0, 35.0, 60.0, 80.0, 90.0):
                for moon_zenith in (5.0, 45.0, 70.0, 84.0):
                    for k in (0.15, 0.30):
                        rows.append(
                            [alpha, rho, zenith, moon_zenith, k, float(moonlight(alpha, rho, zenith, moon_zenith, k))]
                        )
    return rows


def night_rows():
    return [
        [mag, zenith, k, float(night(mag, zenith, k))]
        for mag in (17.5, 20.0, 21.3, 22.0)
        for zenith in (0.0, 20.0, 45.0, 60.0, 75.0, 90.0)
        for k in (0.12, 0.20, 0.35)
    ]


def limit_rows():
    rows = []
    views = [
        (7.0, 1.0, 1.0, 7.0, 2.0),
        (6.0, 1.0, 1.0, 6.0, 1.4),
        (50.0, 10.0, 1.25, 7.0, 2.0),
        (200.0, 50.0, 1.33, 7.0, 2.0 * np.sqrt(2)),
        (200.0, 20.0, 1.33, 6.0, 2.0 * np.sqrt(2)),
        (300.0, 250.0, 1.4, 7.0, 1.4 * np.sqrt(2)),
    ]
    for aperture, power, dimming, pupil, factor in views:
        for sky in (4.0, 7.0, 10.0, 12.5, 13.5, 14.5, 16.0, 17.5, 18.5, 19.5, 20.5, 21.5, 22.0, 23.0):
            for diameter in (0.01, 0.5, 3.0, 10.0, 30.0, 180.0):
                area = np.pi / 4 * np.radians(diameter / 60) ** 2
                rows.append(
                    [aperture, power, dimming, pupil, factor, sky, diameter]
                    + [float(limit(sky, area, aperture, power, dimming, pupil, factor))]
                )
    return rows


def chain():
    """From a zenith brightness to a margin: a comet of magnitude 7.5 and 8 arcmin at 60 degrees, 10x50, p 7."""
    k, zenith = 0.25, 60.0
    sky = night(21.3, zenith, k)
    moonlit = sky + moonlight(90.0, 70.0, zenith, 50.0, k)
    h = 90 - zenith
    dimmed = 7.5 + k / (np.sin(np.radians(h)) + 0.50572 * (h + 6.07995) ** -1.6364)  # Kasten & Young 1989
    area = np.pi / 4 * np.radians(8 / 60) ** 2
    mags = [(20.7233 - np.log(b / 34.08)) / 0.92104 for b in (sky, moonlit)]
    return {
        "skyMags": [float(m) for m in mags],
        "margins": [float(limit(m, area, 50.0, 10.0, 1.25, 7.0, 2.0) - dimmed) for m in mags],
    }


def table(columns, rows):
    body = ",\n".join(json.dumps(row) for row in rows)
    return '{"columns": %s, "rows": [\n%s\n]}' % (json.dumps(columns), body)


with open(os.path.join(HERE, "darkness.json"), "w") as out:
    out.write('{\n"madeBy": "darkness_reference.py",\n"moonlight": ')
    out.write(
        table(
            ["phaseAngleDeg", "separationDeg", "zenithDistanceDeg", "moonZenithDistanceDeg", "extinction", "nL"],
            moon_rows(),
        )
    )
    out.write(',\n"night": ')
    out.write(table(["zenithMag", "zenithDistanceDeg", "extinction", "nL"], night_rows()))
    out.write(',\n"twilight": ')
    out.write(
        table(["sunAltitudeDeg", "altitudeDeg", "azimuthFromSunDeg", "extinction", "timesZenith"], twilight_rows())
    )
    out.write(',\n"limits": ')
    out.write(
        table(
            ["apertureMm", "magnification", "dimming", "pupilMm", "observerFactor", "skyMag", "diameterArcmin", "limit"],
            limit_rows(),
        )
    )
    out.write(',\n"chain": ' + json.dumps(chain()))
    out.write("\n}\n")
