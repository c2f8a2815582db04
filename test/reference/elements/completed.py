"""Invented element sets, complete and in shortened forms, worked out in 50-digit decimals."""

import json
import random
from datetime import datetime, timedelta
from decimal import Decimal, getcontext

getcontext().prec = 50
K = Decimal("0.01720209895")
PI = Decimal("3.14159265358979323846264338327950288419716939937511")
DEG = 180 / PI
draw = random.Random(20311011)


def number(low, high, places):
    return Decimal(str(round(draw.uniform(low, high), places)))


def iso(days):
    """A TT instant so many days after 2000 January 1.5 (JD 2451545.0), rounded to the millisecond."""
    instant = datetime(2000, 1, 1, 12) + timedelta(microseconds=int((days * 86_400_000_000).to_integral_value()))
    rounded = instant + timedelta(microseconds=500)
    return rounded.strftime("%Y-%m-%dT%H:%M:%S.") + f"{rounded.microsecond // 1000:03d}"


def complete(open_orbit):
    e = number(1.0001, 4, 6) if open_orbit else number(0, 0.999, 6)
    q = number(0.05, 30, 6)
    a = q / (1 - e)
    n = K * DEG / (abs(a) * abs(a).sqrt())
    epoch = Decimal(draw.randrange(8000, 14000)) + Decimal("0.5")
    if open_orbit:
        since = number(-900, 900, 4)
        anomaly = n * since
    else:
        # The passage nearest the epoch, well away from the half-way point where two are equally near.
        anomaly = number(-175, 175, 5)
        since = anomaly / n
    time = epoch - since
    whole = {
        "perihelionDistanceAu": q,
        "eccentricity": e,
        "semiMajorAxisAu": a,
        "meanMotionDegPerDay": n,
        "periodYears": None if open_orbit else 360 / n / Decimal("365.25"),
        "meanAnomalyDeg": anomaly if open_orbit else anomaly % 360 + (360 if anomaly % 360 < 0 else 0),
        "perihelionTtJd": time + 2451545,
        "epochTtJd": epoch + 2451545,
    }
    ways = [
        ["perihelionDistanceAu", "eccentricity", "perihelionTtJd", "epochTtJd"],
        ["semiMajorAxisAu", "eccentricity", "meanAnomalyDeg", "epochTtJd"],
        ["meanMotionDegPerDay", "eccentricity", "meanAnomalyDeg", "epochTtJd"],
        ["perihelionDistanceAu", "semiMajorAxisAu", "perihelionTtJd", "epochTtJd"],
    ]
    if not open_orbit:
        ways.append(["periodYears", "eccentricity", "perihelionTtJd", "epochTtJd"])
        ways.append(["perihelionDistanceAu", "periodYears", "meanAnomalyDeg", "epochTtJd"])
    plain = {key: None if value is None else float(value) for key, value in whole.items()}
    times = {"epoch": iso(epoch), "perihelionTime": iso(time) if abs(time) < 700_000 else None}
    return {"whole": plain, "times": times, "ways": ways}


print(json.dumps([complete(i % 3 == 2) for i in range(30)], indent=1))
