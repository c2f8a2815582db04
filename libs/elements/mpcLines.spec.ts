import { readElements, writeCometLine, writeMinorPlanetLine } from '#elements';

// Every line is invented. Together they put something into every column of both formats.
const COMETS = [
  '    CK31K070  2032 02 11.4837  0.764213  1.000248  143.2097   61.8840   96.3152  20320217   7.5  4.0  C/2031 K7 (Ashgrove)                                     MPC 99991',
  '0999P         2031 09 03.2065  1.482907  0.617345  201.7730    8.0461   11.9026  20310823  11.0  6.0  999P/Wren-Okafor                                         MPC 99992',
  '0998P      b  2030 12 31.9999 12.345678  0.000000    0.0000  360.0000  180.0000  20301231  -1.5 10.5  998P-B/Tarn                                              MPEC 2031',
  '0998P     av  2030 01 01.0000  0.000001  0.999999  359.9999    0.0001    0.0000            16.2       998P-AV/Tarn',
  '0997PK31U05c  2031 10 20.5000  2.100000  0.500000   10.0000   20.0000   30.0000  20311020             997P-C/Holloway-Quince-Abernathy-Vanterpool-Ostrander-Li MPC 99993',
  '    PK29S00V  2029 11 05.2500  1.300000  0.600000   10.0000   20.0000   30.0000  20291101  14.0  4.0  P/2029 SV                                                MPC 99994',
  '    AJ31A010  1931 01 05.2500  1.300000  1.100000   10.0000   20.0000   30.0000  19310101  14.0  4.0  A/1931 A1                                                MPC 99995',
  '    J95A010   1995 01 05.2500  1.300000  1.000000   10.0000   20.0000   30.0000            14.0  4.0  1995 A1',
];
COMETS[7] = `     J95A010${COMETS[7]!.slice(12)}`;

const MINOR_PLANETS = [
  '~1E3F   15.42  0.15 K31AB 211.30457   96.41208  318.77530    7.26419  0.1438207  0.23221081   2.6214873  0 MPO999993   412   9 2009-2030 0.48 M-v 3Ek Invented   0000 (912345)                    20301104',
  'K31K12Q 19.07  0.15 K31AB  34.90216  271.05533  122.68014    4.81377  0.5120884  0.31967626   2.1183406  6 E2031-L07    61   1   38 days 0.37 M-v 3Ek Invented   0804          2031 KQ12          20310628',
  'a0017   -1.25 -0.12 K205V   0.00000  360.00000    0.00001  180.00000  0.0000000  0.00035098 199.0447290  E MPO123456 12345 167 1801-2031 1.05 Abc 9Fz Wren-Okafo FFFF (360017) Fern-Hollow-Gateway20311231',
  '00007               K31C9 100.00000  100.00000  100.00000  100.00000  0.1000000 22.72124255   0.1234567                                                                    (7) Quillon',
  'PLS2040 15.00       I9911 100.00000  100.00000  100.00000  100.00000  0.1000000               2.6214873',
  '_QC0aEM 21.50  0.15 K26B1 100.00000  100.00000  100.00000  100.00000  0.1000000  0.23221081              8 E2026-C01     5   1    2 days 0.10         Invented   0000          2026 CZ6190        20260214',
];

describe('the comet format', () => {
  test('round-trips every line to the character', () => {
    const { sets, problems } = readElements(COMETS.join('\n'));
    expect(problems.filter((problem) => problem.severity === 'error')).toEqual([]);
    expect(sets.map((set) => writeCometLine(set))).toEqual(COMETS.map((line) => ({ line, problem: null })));
  });

  test('the lines fill every column of the format', () => {
    const gaps = [13, 14, 19, 22, 30, 40, 41, 50, 51, 60, 61, 70, 71, 80, 81, 90, 91, 96, 101, 102, 159];
    expect(emptyColumns(COMETS, 168)).toEqual(gaps);
  });

  test('gives every column its meaning', () => {
    const [set] = readElements(COMETS[0]!).sets;
    expect(set).toMatchObject({
      line: 1,
      format: 'mpcComet',
      designation: 'C/2031 K7',
      packed: 'CK31K070',
      name: 'Ashgrove',
      label: 'C/2031 K7 (Ashgrove)',
      kind: 'comet',
      // Julian dates of 2032 February 11.4837 and 17.0, counted from J2000.0 (2000 January 1.5, 2451545.0).
      perihelionTtJd: 2463273.9837,
      epochTtJd: 2463279.5,
      perihelionDistanceAu: 0.764213,
      eccentricity: 1.000248,
      argumentOfPerihelionDeg: 143.2097,
      nodeDeg: 61.884,
      inclinationDeg: 96.3152,
      absoluteMagnitude: 7.5,
      slope: 4,
      brightness: { kind: 'comet', absoluteMagnitude: 7.5, activity: 4 },
      source: 'MPC 99991',
      periodYears: null,
    });
    expect(set!.semiMajorAxisAu).toBeCloseTo(0.764213 / -0.000248, 6);
  });

  test('a blank epoch is null, a blank n is the assumed 4', () => {
    const [set] = readElements(COMETS[3]!).sets;
    expect(set).toMatchObject({ epochTtJd: null, meanAnomalyDeg: null, slope: 4, assumed: ['slope'] });
    expect(set!.given).not.toContain('slope');
    expect(readElements(COMETS[4]!).sets[0]).toMatchObject({ brightness: null, slope: null, assumed: [] });
  });

  test.each([
    ['q', 30, 'abcdefghi', 31, /perihelion distance, like 0.764213, in columns 31-39; found "abcdefghi"/],
    ['q of zero', 30, ' 0.000000', 31, /must be above 0/],
    ['e left blank', 41, '        ', 42, /eccentricity.*1.000000 for a parabola.*found nothing/],
    ['e below zero', 41, '-0.20000', 42, /must be 0 \(a circle\) or more/],
    ['i past 180', 71, '196.3152', 72, /between 0 and 180/],
    ['node past 360', 61, '461.8840', 62, /node is 461.884 deg; here it must lie between 0 and 360/],
    ['a month 13', 19, '13', 15, /date of perihelion/],
    ['a 30 February', 22, '30.0000', 15, /"2032 02 30.0000" is none/],
    ['an epoch of month 13', 81, '20321317', 82, /Expected the epoch as a date/],
  ])('refuses %s at its column', (_what, from, text, column, message) => {
    const broken = COMETS[0]!.slice(0, from) + text + COMETS[0]!.slice(from + text.length);
    const { sets, problems } = readElements([COMETS[1], broken, COMETS[5]].join('\n'));
    expect(sets.map((set) => set.line)).toEqual([1, 3]);
    expect(problems).toEqual([
      { line: 2, column, severity: 'error', message: expect.stringMatching(message) },
    ]);
  });

  test('an unreadable magnitude is left out with a warning, the orbit still loads', () => {
    const { sets, problems } = readElements(COMETS[0]!.replace(' 7.5 ', ' x.5 '));
    expect(sets[0]!.brightness).toBeNull();
    expect(problems).toMatchObject([{ line: 1, column: 92, severity: 'warning' }]);
  });

  test('warns where the name contradicts columns 1-12', () => {
    const { sets, problems } = readElements(COMETS[0]!.replace('C/2031 K7', 'C/2031 K8'));
    expect(sets[0]!.designation).toBe('C/2031 K7');
    expect(problems).toMatchObject([{ column: 103, severity: 'warning' }]);
  });

  test('a body without a designation by the rules is kept as written', () => {
    const { sets, problems } = readElements(COMETS[0]!.replace('    CK31K070', '     XyZ12ab'));
    expect(sets[0]!.label).toBe('C/2031 K7 (Ashgrove)');
    expect(problems).toMatchObject([{ column: 1, severity: 'warning' }]);
  });
});

describe('the minor-planet format', () => {
  test('round-trips every line to the character', () => {
    const { sets, problems } = readElements(MINOR_PLANETS.join('\r\n'));
    expect(problems.filter((problem) => problem.severity === 'error')).toEqual([]);
    const written = sets.map((set) => writeMinorPlanetLine(set).line);
    expect(written.slice(0, 4)).toEqual(MINOR_PLANETS.slice(0, 4));
    // What the last two lines leave out (name, motion, axis) is filled in, the rest stays.
    const filled = (line: string): string => line.slice(0, 80) + line.slice(103, 166);
    const asRead = MINOR_PLANETS.map((line) => filled(line.padEnd(202)));
    expect(written.slice(4).map((line) => filled(line!))).toEqual(asRead.slice(4));
    expect(written[4]!.slice(80)).toBe(` 0.23221081   2.6214873${' '.repeat(72)}2040 P-L`);
  });

  test('the lines fill every column of the format', () => {
    const gaps = [8, 14, 20, 26, 36, 37, 47, 48, 58, 59, 69, 70, 80, 92, 104, 105, 107, 117, 123, 127, 137];
    expect(emptyColumns(MINOR_PLANETS, 202)).toEqual(
      [...gaps, 142, 146, 150, 161, 166, 175].sort((a, b) => a - b),
    );
  });

  test('gives every column its meaning', () => {
    const [set] = readElements(MINOR_PLANETS[2]!).sets;
    expect(set).toMatchObject({
      designation: '(360017)',
      name: 'Fern-Hollow-Gateway',
      label: '(360017) Fern-Hollow-Gateway',
      brightness: { kind: 'asteroid', absoluteMagnitude: -1.25, slope: -0.12 },
      epochTtJd: 2459000.5, // 2020 May 31, the published example of a packed date
      meanAnomalyDeg: 0,
      argumentOfPerihelionDeg: 360,
      nodeDeg: 0.00001,
      inclinationDeg: 180,
      eccentricity: 0,
      meanMotionDegPerDay: 0.00035098,
      semiMajorAxisAu: 199.044729,
      source: 'MPO123456',
      observed: {
        uncertainty: 'E',
        observations: 12345,
        oppositions: 167,
        arc: '1801-2031',
        rmsArcsec: 1.05,
        coarsePerturbers: 'Abc',
        precisePerturbers: '9Fz',
        computer: 'Wren-Okafo',
        flags: 'FFFF',
        lastObserved: '20311231',
      },
    });
  });

  test('derives T from the mean anomaly, the passage nearest the epoch', () => {
    const [first, second] = readElements(MINOR_PLANETS.join('\n')).sets;
    // 211.30457 deg is 148.69543 deg short of perihelion; n = 0.2322108 deg/day from a = 2.6214873 au.
    expect(first!.perihelionTtJd - first!.epochTtJd!).toBeCloseTo(148.69543 / 0.23221081, 3);
    expect(second!.epochTtJd! - second!.perihelionTtJd).toBeCloseTo(34.90216 / 0.31967626, 3);
    expect(second!.perihelionDistanceAu).toBeCloseTo(2.1183406 * (1 - 0.5120884), 12);
  });

  test('a missing axis follows from the motion and the other way round', () => {
    const [, , , , noMotion, noAxis] = readElements(MINOR_PLANETS.join('\n')).sets;
    expect(noMotion!.meanMotionDegPerDay).toBeCloseTo(0.23221081, 7);
    expect(noMotion!.derived).toContain('meanMotionDegPerDay');
    expect(noAxis!.semiMajorAxisAu).toBeCloseTo(2.6214873, 6);
    expect(noAxis!.derived).toContain('semiMajorAxisAu');
  });

  test.each([
    ['the epoch', 20, 'K31DB', 21, /packed date, like K31AB, in columns 21-25; found "K31DB"/],
    ['the mean anomaly', 26, '21x.30457', 27, /mean anomaly, like 211.30457, in columns 27-35/],
    ['a mean anomaly past 360', 26, '911.30457', 27, /mean anomaly is 911.30457 deg/],
    ['the inclination', 59, '197.26419', 60, /between 0 and 180/],
    ['the eccentricity', 70, '1.1438207', 71, /ellipses only, e below 1/],
    ['the axis', 92, '  2.62O4873', 93, /semi-major axis, like 2.6214873/],
    ['an axis of zero', 92, '  0.0000000', 93, /must be above 0/],
  ])('refuses %s at its column', (_what, from, text, column, message) => {
    const good = MINOR_PLANETS[0]!;
    const broken = good.slice(0, from) + text + good.slice(from + text.length);
    const { sets, problems } = readElements([good, broken, good].join('\n'));
    expect(sets.map((set) => set.line)).toEqual([1, 3]);
    expect(problems).toEqual([
      { line: 2, column, severity: 'error', message: expect.stringMatching(message) },
    ]);
  });

  test('reports a motion that contradicts the axis, with the size of it', () => {
    const { sets, problems } = readElements(MINOR_PLANETS[0]!.replace('0.23221081', '0.23321081'));
    expect(problems).toMatchObject([{ line: 1, column: 81, severity: 'warning' }]);
    expect(problems[0]!.message).toMatch(/difference of 0.001 deg\/day \(0.43 %\)/);
    expect(sets[0]!.meanMotionDegPerDay).toBeCloseTo(0.23221081, 7);
  });

  test('an orbit that the format cannot hold is refused with the reason', () => {
    const [comet] = readElements(COMETS[0]!).sets;
    expect(writeMinorPlanetLine(comet!)).toEqual({
      line: null,
      problem: expect.stringMatching(/ellipses only/),
    });
    const far = { ...comet!, perihelionDistanceAu: 1234.5 };
    expect(writeCometLine(far).problem).toMatch(/does not fit columns 31-39/);
  });
});

describe('whole files', () => {
  test('header text above the orbits and blank lines among them are passed over', () => {
    const header = [
      'MINOR PLANETS, an invented file of 2031',
      'Desn      H     G   Epoch',
      '-'.repeat(80),
      '',
    ];
    const { sets, problems } = readElements([...header, MINOR_PLANETS[0], '', MINOR_PLANETS[1]].join('\n'));
    expect(sets.map((set) => set.line)).toEqual([5, 7]);
    expect(problems).toEqual([]);
  });

  test('both formats may stand in one file, and what is neither is reported', () => {
    const { sets, problems } = readElements([COMETS[0], MINOR_PLANETS[0], '1 2 3', 'prose'].join('\n'));
    expect(sets.map((set) => set.kind)).toEqual(['comet', 'asteroid']);
    expect(problems.map(({ line, severity }) => [line, severity])).toEqual([
      [3, 'error'],
      [4, 'error'],
    ]);
  });

  test.each(['', '\n\n', 'a letter to the club\nwith no orbits'])(
    'a text without orbits says so: %j',
    (text) => {
      const { sets, problems } = readElements(text);
      expect(sets).toEqual([]);
      expect(problems).toEqual([
        { line: 1, column: 1, severity: 'error', message: expect.stringMatching(/no orbital elements here/) },
      ]);
    },
  );
});

/** Columns, from 1, in which none of the lines has anything. */
function emptyColumns(lines: readonly string[], width: number): number[] {
  const columns = Array.from({ length: width }, (_, i) => i + 1);
  return columns.filter((column) => lines.every((line) => (line[column - 1] ?? ' ') === ' '));
}
