import { fontOf, printable, textWidthMm, wrapped } from './typeface';

describe('textWidthMm', () => {
  it('adds up the advances that the font file states', () => {
    // Noto Sans: "H" is 741, "l" 258 thousandths of an em wide and the pair is not kerned.
    expect(textWidthMm('Hl', 'sans', 10)).toBeCloseTo((0.741 + 0.258) * 10 * (25.4 / 72), 6);
  });

  it('counts extra space between letters, not after the last', () => {
    expect(textWidthMm('HHH', 'sans', 10, 2) - textWidthMm('HHH', 'sans', 10)).toBeCloseTo(
      4 * (25.4 / 72),
      6,
    );
  });
});

describe('printable', () => {
  it('leaves alone what the fonts have, Greek, superscripts and primes included', () => {
    for (const face of ['sans', 'bold', 'serif'] as const) {
      expect(printable('αβγδεζηθικλμνξοπρστυφχψω ¹²³ ° ′ ″ – − ≈ é ø ł', face)).toBe(
        'αβγδεζηθικλμνξοπρστυφχψω ¹²³ ° ′ ″ – − ≈ é ø ł',
      );
    }
  });

  it('never leaves a sign the font would print as an empty box', () => {
    const printed = printable('−5 ≈ 星 ☉', 'sans');
    expect(printed).toBe('−5 ≈ ? ?');
    for (const sign of printed) expect(fontOf('sans').hasGlyphForCodePoint(sign.codePointAt(0)!)).toBe(true);
  });
});

describe('wrapped', () => {
  it('breaks at spaces so that no line is too wide, and loses no word', () => {
    const text = 'The comet moves about two finder fields between the first and the last showing of the week';
    const lines = wrapped(text, 'sans', 9, 40);
    expect(lines.length).toBeGreaterThan(2);
    expect(lines.join(' ')).toBe(text);
    for (const line of lines) expect(textWidthMm(line, 'sans', 9)).toBeLessThanOrEqual(40);
  });

  it('gives no lines for no words', () => {
    expect(wrapped('  ', 'sans', 9, 40)).toEqual([]);
  });
});
