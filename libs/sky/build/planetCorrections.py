"""Writes planetCorrectionTable.ts: what JPL's DE431 adds to the planetary library's heliocentric places.

Run with Debian's libswe2.0, swe-basic-data (the ephemeris files, CC0-1.0), python3-erfa, python3-mpmath and
python3-numpy, from the repository's root, after npm install:
    /usr/bin/python3 libs/sky/build/planetCorrections.py

Layout, little-endian and in base64, body after body in the order of PIECES (as in planetCorrection.ts):
one float64, the unit in au; then int16 [piece][axis x y z][order], Chebyshev series of the correction.
"""

import base64
import json
import subprocess
import sys
from pathlib import Path

import numpy as np

ROOT = Path(__file__).resolve().parents[3]
sys.path.insert(0, str(ROOT / "test/reference/sky"))
sys.dont_write_bytecode = True

from ephemeris import barycentric  # noqa: E402

FIRST_TT_JD = 2451536.5
DAYS = 22528
PIECES = {
    "Mercury": (16, 7),
    "Venus": (128, 11),
    "Earth": (16, 7),
    "Mars": (256, 15),
    "Jupiter": (512, 11),
    "Saturn": (1024, 11),
    "Uranus": (1024, 11),
    "Neptune": (1024, 11),
}


HEADER = """// Made by build/planetCorrections.py from the Swiss Ephemeris files (JPL DE431; CC0-1.0); not to be edited.
"""


def nodes(days, degree):
    k = np.arange(degree + 1)
    x = np.cos(np.pi * (k + 0.5) / (degree + 1))
    starts = FIRST_TT_JD + days * np.arange(DAYS // days)
    return (starts[:, None] + (x[None, :] + 1) * days / 2).ravel()


def main():
    dates = {body: nodes(*piece).tolist() for body, piece in PIECES.items()}
    printed = subprocess.run(
        ["node", str(Path(__file__).with_name("libraryPlaces.cjs"))],
        input=json.dumps(dates), capture_output=True, text=True, check=True, cwd=ROOT,
    ).stdout.splitlines()
    table = b""
    for (body, (_, degree)), line in zip(PIECES.items(), printed):
        count = degree + 1
        library = np.array(json.loads(line)).reshape(-1, 3)
        true = np.array([barycentric(body, t)[0] - barycentric("Sun", t)[0] for t in dates[body]])
        values = (true - library).reshape(-1, count, 3)
        k, j = np.arange(count), np.arange(count)
        cosines = np.cos(np.pi * j[:, None] * (k[None, :] + 0.5) / count) * 2 / count
        cosines[0] /= 2
        series = np.einsum("jk,pkc->pcj", cosines, values)
        unit = np.abs(series).max() / 32767
        table += np.array([unit], "<f8").tobytes() + np.rint(series / unit).astype("<i2").tobytes()
    with open(ROOT / "libs/sky/planetCorrectionTable.ts", "w") as out:
        out.write(HEADER + f"export const TABLE =\n  '{base64.b64encode(table).decode()}';\n")


if __name__ == "__main__":
    main()
