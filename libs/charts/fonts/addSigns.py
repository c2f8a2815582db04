"""Adds the signs that Noto Sans leaves to its mathematical sister: the minus, "almost equal" and the
non-breaking hyphen. Each is built from the font's own plus, tilde and hyphen, so weight and width agree.

    python3 addSigns.py FILE.ttf …        (needs fontTools: Debian package python3-fonttools)

Run it on unchanged copies only; a font that has the signs already is left as it is. The Open Font License
allows changed copies; "Noto" is no reserved name. The files' version record says what was added.
"""

import sys

from fontTools.pens.recordingPen import DecomposingRecordingPen
from fontTools.pens.transformPen import TransformPen
from fontTools.pens.ttGlyphPen import TTGlyphPen
from fontTools.ttLib import TTFont


def add(font, name, code, glyph, like):
    order = font.getGlyphOrder()
    font["glyf"][name] = glyph
    font.setGlyphOrder(order + [name] if name not in order else order)
    glyph.recalcBounds(font["glyf"])
    font["hmtx"][name] = (font["hmtx"][like][0], glyph.xMin)
    for table in font["cmap"].tables:
        if table.isUnicode():
            table.cmap[code] = name


def minus(font, plus):
    """The plus without its upright: its bar runs between the two inner heights of the outline."""
    points, _, _ = font["glyf"][plus].getCoordinates(font["glyf"])
    heights = sorted({y for _, y in points})
    sides = [x for x, _ in points]
    low, high, left, right = heights[1], heights[2], min(sides), max(sides)
    pen = TTGlyphPen(None)
    pen.moveTo((left, low))
    for corner in ((left, high), (right, high), (right, low)):
        pen.lineTo(corner)
    pen.closePath()
    return pen.glyph()


def almost_equal(font, tilde):
    glyphs = font.getGlyphSet()
    outline = font["glyf"][tilde]
    outline.recalcBounds(font["glyf"])
    apart = round((outline.yMax - outline.yMin) * 0.62)
    pen = TTGlyphPen(None)
    for shift in (-apart, apart):
        recorded = DecomposingRecordingPen(glyphs)
        glyphs[tilde].draw(recorded)
        recorded.replay(TransformPen(pen, (1, 0, 0, 1, 0, shift)))
    return pen.glyph()


def main(files):
    for file in files:
        font = TTFont(file, recalcTimestamp=False)
        names = font.getBestCmap()
        if 0x2212 in names:
            print(f"{file}: has a minus already")
            continue
        plus, tilde, hyphen = names[ord("+")], names[ord("~")], names[ord("-")]
        add(font, "minus", 0x2212, minus(font, plus), plus)
        add(font, "approxequal", 0x2248, almost_equal(font, tilde), tilde)
        for table in font["cmap"].tables:
            if table.isUnicode():
                table.cmap[0x2011] = hyphen
        for record in font["name"].names:
            if record.nameID == 5:
                record.string = record.toUnicode() + "; minus and almost-equal added"
        font.save(file)
        print(f"{file}: added")


main(sys.argv[1:])
