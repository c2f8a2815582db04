import * as fc from 'fast-check';
import { contentLine, escapeText, uriValue } from './contentLine';

const octets = (text: string): number => Buffer.byteLength(text, 'utf8');
const unfold = (text: string): string => text.replaceAll('\r\n ', '');

it('folds before the 76th octet: 60 times é after SUMMARY: give lines of 74 and 55 octets', () => {
  // 8 + 33 x 2 = 74, the next é would make 76; a blank and the other 27 x 2 = 55.
  const lines = contentLine('SUMMARY', 'é'.repeat(60)).split('\r\n');
  expect(lines.map(octets)).toEqual([74, 55, 0]);
});

it('fills a line of ASCII to 75 octets', () => {
  expect(contentLine('X', 'a'.repeat(73)).split('\r\n').map(octets)).toEqual([75, 0]);
  expect(contentLine('X', 'a'.repeat(74)).split('\r\n').map(octets)).toEqual([75, 2, 0]);
});

it('never splits a character nor loses one (RFC 5545, 3.1)', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'grapheme', maxLength: 300 }), (text) => {
      const value = escapeText(text);
      const line = contentLine('DESCRIPTION', value);
      expect(unfold(line)).toBe(`DESCRIPTION:${value}\r\n`);
      for (const part of line.split('\r\n')) {
        expect(octets(part)).toBeLessThanOrEqual(75);
        expect(!/\p{Cs}/u.test(part)).toBe(true);
      }
    }),
    { numRuns: 500 },
  );
});

it('escapes backslash, semicolon, comma and line ends, and nothing else (RFC 5545, 3.3.11)', () => {
  expect(escapeText('a\\b; c, d: "e"\r\nf\rg\nh')).toBe('a\\\\b\\; c\\, d: "e"\\nf\\ng\\nh');
});

it('leaves control characters and broken surrogates out', () => {
  expect(escapeText('a\u0000b\u0007c\td\u007fe\ud83ef')).toBe('abc\tde\ufffdf');
});

it('writes an address without anything that could end the line', () => {
  expect(uriValue('https://example.org/a b\r\nX:1?q=1,2;3')).toBe('https://example.org/a%20bX:1?q=1,2;3');
});
