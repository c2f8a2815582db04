import { type Designation, parseDesignation } from '#elements';

/** The published rules that the rows below go by. */
const RULES = {
  packed: 'Minor Planet Center, "Packed Provisional and Permanent Designations"',
  scheme: 'IAU 1994 resolution on comet designations, in force from 1995 (Minor Planet Circulars 23803-4)',
  minor: 'Minor Planet Center, "New- and Old-Style Minor Planet Designations"',
} as const;

type Expected = Partial<Designation>;
type Row = readonly [text: string, expected: Expected, rule: keyof typeof RULES];

const VALID: readonly Row[] = [
  // Published pairs of the packed rules, written side and packed side.
  ['1995 XA', { kind: 'asteroid', year: 1995, halfMonth: 'X', order: 1, packed: 'J95X00A' }, 'packed'],
  ['J95X00A', { canonical: '1995 XA', packed: 'J95X00A' }, 'packed'],
  ['1998 SV127', { order: 127 * 25 + 21, packed: 'J98SC7V' }, 'packed'],
  ['J98SC7V', { canonical: '1998 SV127' }, 'packed'],
  ['2007 TA418', { packed: 'K07Tf8A' }, 'packed'],
  ['K07Tf8A', { canonical: '2007 TA418' }, 'packed'],
  ['2040 P-L', { kind: 'asteroid', order: 2040, year: null, packed: 'PLS2040' }, 'packed'],
  ['PLS2040', { canonical: '2040 P-L', survey: 'P-L' }, 'packed'],
  ['3138 T-1', { packed: 'T1S3138', survey: 'T-1' }, 'packed'],
  ['T2S1010', { canonical: '1010 T-2' }, 'packed'],
  ['2026 CZ6190', { order: 154775, packed: '_QC0aEM' }, 'packed'],
  ['_QC0aEM', { canonical: '2026 CZ6190', order: 154775 }, 'packed'],
  ['_QC0000', { order: 15501, canonical: '2026 CA620' }, 'packed'],
  ['2026 CZ619', { order: 15500, packed: 'K26Cz9Z' }, 'packed'],
  ['2026 CA620', { packed: '_QC0000' }, 'packed'],
  ['1995 A1', { kind: 'comet', prefix: null, order: 1, packed: 'J95A010' }, 'packed'],
  ['J95A010', { kind: 'comet', canonical: '1995 A1' }, 'packed'],
  ['1994 P1-B', { fragment: 'B', packed: 'J94P01b' }, 'packed'],
  ['J94P01b', { canonical: '1994 P1-B' }, 'packed'],
  ['2088 A103', { packed: 'K88AA30', order: 103 }, 'packed'],
  ['K88AA30', { canonical: '2088 A103' }, 'packed'],
  ['3202', { kind: 'asteroid', number: 3202, packed: '03202', canonical: '(3202)' }, 'packed'],
  ['03202', { number: 3202 }, 'packed'],
  ['(100345)', { packed: 'A0345' }, 'packed'],
  ['A0345', { number: 100345 }, 'packed'],
  ['360017', { packed: 'a0017' }, 'packed'],
  ['a0017', { number: 360017 }, 'packed'],
  ['619999', { packed: 'z9999' }, 'packed'],
  ['620000', { packed: '~0000' }, 'packed'],
  ['620061', { packed: '~000z' }, 'packed'],
  ['~000z', { number: 620061 }, 'packed'],
  ['3140113', { packed: '~AZaz' }, 'packed'],
  ['~AZaz', { number: 3140113 }, 'packed'],
  ['15396335', { packed: '~zzzz' }, 'packed'],
  ['15396336', { packed: null, number: 15396336 }, 'packed'],
  ['912345', { packed: '~1E3F' }, 'packed'],
  // Comets, numbered and not.
  ['C/2031 K7', { prefix: 'C', year: 2031, halfMonth: 'K', order: 7, packed: 'CK31K070' }, 'scheme'],
  ['CK31K070', { canonical: 'C/2031 K7', prefix: 'C' }, 'packed'],
  ['C/2031 K7 (Ashgrove)', { canonical: 'C/2031 K7', name: 'Ashgrove' }, 'scheme'],
  ['c/2031 k7', { canonical: 'C/2031 K7' }, 'scheme'],
  ['D/1993 F2-A', { prefix: 'D', fragment: 'A', packed: 'DJ93F02a' }, 'packed'],
  ['D/1993 F2-AA', { fragment: 'AA', packed: null }, 'packed'],
  ['X/2031 B3', { prefix: 'X', packed: 'XK31B030' }, 'scheme'],
  ['A/2031 U1', { kind: 'comet', prefix: 'A', packed: 'AK31U010' }, 'scheme'],
  ['I/2031 U1', { prefix: 'I', packed: 'IK31U010' }, 'scheme'],
  ['P/2016 SV', { kind: 'comet', prefix: 'P', order: 21, packed: 'PK16S00V' }, 'scheme'],
  ['PK16S00V', { canonical: 'P/2016 SV' }, 'packed'],
  ['C/2031 K620', { packed: null, order: 620 }, 'packed'],
  ['C/-43 K1', { year: -43, packed: null }, 'scheme'],
  ['999P', { number: 999, prefix: 'P', packed: '0999P', canonical: '999P', year: null }, 'packed'],
  ['0999P', { number: 999, canonical: '999P' }, 'packed'],
  ['999P/Wren-Okafor', { name: 'Wren-Okafor', canonical: '999P', packed: '0999P' }, 'scheme'],
  ['998P/Tarn 3-B', { name: 'Tarn 3', fragment: 'B', canonical: '998P-B' }, 'scheme'],
  ['998P-AV', { fragment: 'AV', packed: '0998P     av' }, 'packed'],
  ['0998P      b', { canonical: '998P-B', fragment: 'B' }, 'packed'],
  ['0999PK31K070', { number: 999, year: 2031, order: 7, canonical: '999P' }, 'packed'],
  ['999P/2031 K7 (Wren)', { number: 999, year: 2031, name: 'Wren', canonical: '999P' }, 'scheme'],
  ['3D', { prefix: 'D', number: 3, packed: '0003D' }, 'scheme'],
  ['1I', { prefix: 'I', number: 1, packed: '0001I' }, 'scheme'],
  // Minor planets.
  ['2031 KQ12', { kind: 'asteroid', order: 316, packed: 'K31K12Q' }, 'minor'],
  ['2031kq12', { canonical: '2031 KQ12' }, 'minor'],
  ['2031 KQ₁₂', { canonical: '2031 KQ12' }, 'minor'],
  ['A904 OA', { year: 1904, packed: 'J04O00A', canonical: 'A904 OA' }, 'minor'],
  ['J04O00A', { canonical: 'A904 OA' }, 'minor'],
  ['(4179) Toutatis', { number: 4179, name: 'Toutatis', packed: '04179' }, 'minor'],
  ['85 Io', { number: 85, name: 'Io' }, 'minor'],
  ['(612345) 2002 AB12', { number: 612345, year: 2002, order: 302, canonical: '(612345)' }, 'minor'],
];

const INVALID: readonly (readonly [text: string, reason: RegExp, rule: keyof typeof RULES])[] = [
  ['C/2031 I7', /letter I is not used/, 'scheme'],
  ['C/2031 Z7', /letter Z is not used; the last is Y/, 'scheme'],
  ['2031 KI', /second letter I is not used/, 'minor'],
  ['2031 IA', /letter I is not used/, 'minor'],
  ['C/2031 K', /order in the half-month is missing/, 'scheme'],
  ['C/2031 K0', /from 1 on/, 'scheme'],
  ['C/2031 K07', /without leading zeros, not 07/, 'scheme'],
  ['2031 KQ0', /counts from 1 without leading zeros/, 'minor'],
  ['K/2031 K7', /K\/ is no prefix/, 'scheme'],
  ['12C', /Only comets with the letters P, D and I carry numbers/, 'scheme'],
  ['0P', /begin at 1/, 'scheme'],
  ['(0)', /begin at 1/, 'packed'],
  ['1904 OA', /written with A for the 1 of the year: A904/, 'minor'],
  ['A931 OA', /write the year 1931 in full/, 'minor'],
  ['12345 P-L', /from 1 to 9999/, 'minor'],
  ['1996 XII', /before 1995/, 'scheme'],
  ['1994n', /before 1995/, 'scheme'],
  ['J95I00A', /letter I is not used/, 'packed'],
  ['J95Z010', /letter Z is not used/, 'packed'],
  ['J95A000', /begins at 1/, 'packed'],
  ['2031 KQ12-B', /ends with its letters and cycle/, 'minor'],
  ['P/Ashgrove', /comes year, half-month and order/, 'scheme'],
  ['Ashgrove', /is no designation/, 'scheme'],
  ['', /Nothing was given/, 'scheme'],
];

describe('parseDesignation', () => {
  test.each(VALID)('understands %s', (text, expected, rule) => {
    const { valid, problem, ...found } = parseDesignation(text);
    expect({ valid, problem, rule: RULES[rule] }).toEqual({ valid: true, problem: null, rule: RULES[rule] });
    expect(found).toMatchObject(expected);
  });

  test.each(INVALID)('refuses %s with the reason', (text, reason) => {
    const found = parseDesignation(text);
    expect(found.valid).toBe(false);
    expect(found.problem).toMatch(reason);
    expect([found.canonical, found.packed, found.kind, found.discoveryFrom]).toEqual([
      null,
      null,
      null,
      null,
    ]);
  });

  // Half-months: A 1-15 January, B 16-31, … Y 16-31 December, I omitted (the 1994 resolution).
  test.each([
    ['C/2031 A1', '2031-01-01', '2031-01-15'],
    ['C/2031 B1', '2031-01-16', '2031-01-31'],
    ['C/2031 D1', '2031-02-16', '2031-02-28'],
    ['C/2032 D1', '2032-02-16', '2032-02-29'],
    ['C/1900 D1', '1900-02-16', '1900-02-28'],
    ['C/1500 D1', '1500-02-16', '1500-02-29'],
    ['2031 HA', '2031-04-16', '2031-04-30'],
    ['2031 JA', '2031-05-01', '2031-05-15'],
    ['2031 KQ12', '2031-05-16', '2031-05-31'],
    ['2031 YA', '2031-12-16', '2031-12-31'],
  ])('dates the discovery of %s from %s to %s', (text, from, to) => {
    expect(parseDesignation(text)).toMatchObject({ discoveryFrom: from, discoveryTo: to });
  });

  test('packs and unpacks every half-month, second letter and a spread of cycles to the same designation', () => {
    const letters = 'ABCDEFGHJKLMNOPQRSTUVWXYZ';
    let count = 0;
    for (const half of letters.slice(0, 24)) {
      for (const second of letters) {
        for (const cycle of ['', '1', '9', '10', '99', '100', '359', '360', '619', '620', '6190']) {
          const written = `2027 ${half}${second}${cycle}`;
          const { packed } = parseDesignation(written);
          expect(packed).toHaveLength(7);
          expect(parseDesignation(packed!).canonical).toBe(written);
          count++;
        }
      }
    }
    expect(count).toBe(24 * 25 * 11);
  });

  test('packs and unpacks numbers on both sides of every change of form', () => {
    for (const number of [1, 9999, 10000, 99999, 100000, 359999, 360000, 619999, 620000, 15396335]) {
      const { packed } = parseDesignation(String(number));
      expect(parseDesignation(packed!).number).toBe(number);
    }
  });
});
