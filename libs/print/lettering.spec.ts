import fc from 'fast-check';
import { fontOf, lineWidthMm, MM_PER_PT, printable, wrapped } from './lettering';

it('breaks at spaces and after hyphens', () => {
  expect(wrapped('high in the north-north-west', 'sans', 10, 22)).toEqual([
    'high in the',
    'north-north-',
    'west',
  ]);
});

it('keeps the line ends of the text', () => {
  expect(wrapped('one\n\ntwo\r\nthree', 'sans', 10, 100)).toEqual(['one', 'two', 'three']);
});

it('never makes a line wider than asked, and loses no letter', () => {
  fc.assert(
    fc.property(
      fc.string({ unit: fc.constantFrom('a', 'W', 'ö', '-', ' ', '.', '7'), maxLength: 80 }),
      fc.integer({ min: 8, max: 60 }),
      (text, widthMm) => {
        const lines = wrapped(text, 'sans', 10, widthMm);
        for (const line of lines) expect(lineWidthMm(line, 'sans', 10)).toBeLessThanOrEqual(widthMm + 1e-9);
        expect(lines.join('').replaceAll(' ', '')).toBe(text.replaceAll(' ', ''));
      },
    ),
    { seed: 1 },
  );
});

it('puts a stand-in or a question mark where a face lacks a sign', () => {
  expect(printable('Ö β −5 \u{1f319}', 'sans')).toMatch(/^Ö β [−–]5 \?$/u);
});

it('measures a line no narrower than the PDF writer draws it, and hardly wider', () => {
  const lines = [
    'Winter twelve at Marl Pit · Friday, 8 January 2027, 19:07 to 22:07 (Europe/Madrid)',
    'The Seven Sisters: young blue stars still passing through a veil of dust.',
    'first reflector, difficult affluent fjord',
  ];
  for (const face of ['sans', 'bold', 'serif'] as const) {
    const font = fontOf(face);
    for (const text of lines) {
      const units = text.split(/(?<= )/).reduce((sum, word) => sum + font.layout(word).advanceWidth, 0);
      const drawn = (units / font.unitsPerEm) * 10 * MM_PER_PT;
      const measured = lineWidthMm(text, face, 10);
      expect(measured / drawn).toBeGreaterThan(0.998);
      expect(measured / drawn).toBeLessThan(1.02);
    }
  }
});
