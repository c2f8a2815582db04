import { completeElements, type GivenElements } from '#elements';

/** An invented asteroid; q, n and P worked out by hand from a and e with k = 0.9856076686 deg/day. */
const A = 2.5;
const E = 0.2;
const N = 0.9856076686014251 / (A * Math.sqrt(A));
const EPOCH = 2463150.5;
const ANGLES = { inclinationDeg: 7, nodeDeg: 318, argumentOfPerihelionDeg: 96 } as const;
const BODY: GivenElements = { designation: '2031 KQ12', ...ANGLES };

function errorsOf(given: GivenElements): string[] {
  const { set, problems } = completeElements(given);
  expect(set).toBeNull();
  return problems.filter((problem) => problem.severity === 'error').map((problem) => problem.message);
}

describe('any sufficient set is enough', () => {
  test.each<[string, GivenElements]>([
    [
      'q, e, T',
      { perihelionDistanceAu: 2, eccentricity: E, perihelionTtJd: EPOCH - 30 / N, epochTtJd: EPOCH },
    ],
    ['a, e, M, epoch', { semiMajorAxisAu: A, eccentricity: E, meanAnomalyDeg: 30, epochTtJd: EPOCH }],
    ['n in place of a', { meanMotionDegPerDay: N, eccentricity: E, meanAnomalyDeg: 30, epochTtJd: EPOCH }],
    [
      'P in place of n',
      { periodYears: 360 / N / 365.25, eccentricity: E, meanAnomalyDeg: 30, epochTtJd: EPOCH },
    ],
    [
      'q, a, T',
      { perihelionDistanceAu: 2, semiMajorAxisAu: A, perihelionTtJd: EPOCH - 30 / N, epochTtJd: EPOCH },
    ],
    [
      'q, P, T',
      { perihelionDistanceAu: 2, periodYears: 360 / N / 365.25, meanAnomalyDeg: 30, epochTtJd: EPOCH },
    ],
    ['q, Q, T', { perihelionDistanceAu: 2, aphelionDistanceAu: 3, meanAnomalyDeg: 30, epochTtJd: EPOCH }],
    ['a, Q, T', { semiMajorAxisAu: A, aphelionDistanceAu: 3, meanAnomalyDeg: 30, epochTtJd: EPOCH }],
    ['Q, e, T', { aphelionDistanceAu: 3, eccentricity: E, meanAnomalyDeg: 30, epochTtJd: EPOCH }],
  ])('%s', (_what, given) => {
    const { set, problems } = completeElements({ ...BODY, ...given });
    expect(problems).toEqual([]);
    expect(set!.perihelionDistanceAu).toBeCloseTo(2, 9);
    expect(set!.eccentricity).toBeCloseTo(E, 9);
    expect(set!.semiMajorAxisAu).toBeCloseTo(A, 9);
    expect(set!.meanMotionDegPerDay).toBeCloseTo(N, 9);
    expect(set!.periodYears).toBeCloseTo(360 / N / 365.25, 8);
    expect(set!.meanAnomalyDeg).toBeCloseTo(30, 6);
    expect(set!.perihelionTtJd).toBeCloseTo(EPOCH - 30 / N, 5);
    expect(set!.elements.perihelionTtJd).toBe(set!.perihelionTtJd);
    expect(set!.elements.nodeRad).toBeCloseTo((318 * Math.PI) / 180, 12);
  });

  test('shows what was given apart from what was derived', () => {
    const { set } = completeElements({
      ...BODY,
      meanMotionDegPerDay: N,
      eccentricity: E,
      meanAnomalyDeg: 30,
      epochTtJd: EPOCH,
      absoluteMagnitude: 15,
    });
    expect(set!.given).toEqual([
      'epoch',
      'eccentricity',
      'inclinationDeg',
      'nodeDeg',
      'argumentOfPerihelionDeg',
      'meanAnomalyDeg',
      'meanMotionDegPerDay',
      'absoluteMagnitude',
    ]);
    expect(set!.derived).toEqual([
      'perihelionTime',
      'perihelionDistanceAu',
      'semiMajorAxisAu',
      'periodYears',
    ]);
    expect(set!.assumed).toEqual(['slope']);
    expect(set!.brightness).toEqual({ kind: 'asteroid', absoluteMagnitude: 15, slope: 0.15 });
  });

  test('of the passages of an ellipse the one nearest the epoch is taken', () => {
    const at = (meanAnomalyDeg: number): number =>
      completeElements({ ...BODY, semiMajorAxisAu: A, eccentricity: E, meanAnomalyDeg, epochTtJd: EPOCH })
        .set!.perihelionTtJd;
    expect(at(350) - EPOCH).toBeCloseTo(10 / N, 6);
    expect(at(-10) - EPOCH).toBeCloseTo(10 / N, 6);
    expect(EPOCH - at(179)).toBeCloseTo(179 / N, 6);
  });

  test('a parabola has no axis, motion or period; a hyperbola a negative axis and no period', () => {
    const comet = { ...BODY, designation: 'C/2031 K7', perihelionDistanceAu: 0.8, perihelionTtJd: EPOCH + 9 };
    const parabola = completeElements({ ...comet, eccentricity: 1, epochTtJd: EPOCH }).set!;
    expect([parabola.semiMajorAxisAu, parabola.meanMotionDegPerDay, parabola.periodYears]).toEqual([
      null,
      null,
      null,
    ]);
    expect([parabola.meanAnomalyDeg, parabola.derived]).toEqual([null, []]);
    const hyperbola = completeElements({ ...comet, eccentricity: 1.25, epochTtJd: EPOCH }).set!;
    expect(hyperbola.semiMajorAxisAu).toBeCloseTo(-3.2, 12);
    expect(hyperbola.periodYears).toBeNull();
    expect(hyperbola.meanAnomalyDeg).toBeCloseTo((-9 * 0.9856076686) / 3.2 ** 1.5, 8);
    const again = completeElements({
      ...BODY,
      semiMajorAxisAu: -3.2,
      eccentricity: 1.25,
      meanAnomalyDeg: hyperbola.meanAnomalyDeg,
      epochTtJd: EPOCH,
    }).set!;
    expect(again.perihelionTtJd).toBeCloseTo(EPOCH + 9, 6);
  });

  test('the longitude of perihelion stands for the argument', () => {
    const angles = { inclinationDeg: 7, nodeDeg: 318 };
    const given = { ...angles, longitudeOfPerihelionDeg: 54, perihelionDistanceAu: 2, eccentricity: E };
    const { set } = completeElements({ designation: '2031 KQ12', ...given, perihelionTtJd: EPOCH });
    expect(set!.argumentOfPerihelionDeg).toBeCloseTo(96, 12);
    expect(set!.derived).toContain('argumentOfPerihelionDeg');
  });
});

describe('contradictions are reported with their size', () => {
  const good = { ...BODY, perihelionDistanceAu: 2, eccentricity: E, perihelionTtJd: EPOCH, epochTtJd: EPOCH };

  test.each<[string, GivenElements, RegExp]>([
    [
      'a',
      { semiMajorAxisAu: 3 },
      /given as 3 au, but q and e make it 2.5 au: a difference of 0.5 au \(20 %\)/,
    ],
    ['n', { meanMotionDegPerDay: 0.3 }, /make it 0.24934[0-9]+ deg\/day: a difference of 0.0507 deg\/day/],
    ['P', { periodYears: 5 }, /period P is given as 5 years.*make it 3.95292/],
    [
      'Q',
      { aphelionDistanceAu: 3.5 },
      /aphelion distance Q is given as 3.5 au.*make it 3 au: a difference of 0.5 au/,
    ],
    ['M', { meanAnomalyDeg: 25 }, /given as 25 deg, but T .* makes it 0 deg at the epoch: 100 days apart/],
    [
      'ϖ',
      { longitudeOfPerihelionDeg: 60 },
      /given as 60 deg, but node and argument add up to 54: a difference of 6 deg/,
    ],
  ])('%s', (_what, given, message) => {
    const { set, problems } = completeElements({ ...good, ...given });
    expect(problems).toEqual([
      {
        line: 1,
        column: 1,
        severity: 'warning',
        field: expect.any(String),
        message: expect.stringMatching(message),
      },
    ]);
    // The set is computed from what the message names, and shows the overruled value as derived.
    expect(set!.semiMajorAxisAu).toBeCloseTo(2.5, 12);
    expect(set!.meanAnomalyDeg).toBeCloseTo(0, 9);
    expect(set!.given).not.toContain(problems[0]!.field);
  });

  test('rounding is no contradiction', () => {
    const rounded = {
      semiMajorAxisAu: 2.5,
      meanMotionDegPerDay: 0.2493,
      periodYears: 3.95,
      aphelionDistanceAu: 3,
    };
    expect(completeElements({ ...good, ...rounded, meanAnomalyDeg: 360 }).problems).toEqual([]);
    // Near e = 1 a rounded e leaves the axis uncertain by far more than its own last digit.
    const nearParabola = { designation: 'C/2031 K7', perihelionDistanceAu: 0.764213, eccentricity: 1.000248 };
    expect(completeElements({ ...good, ...nearParabola, semiMajorAxisAu: -3085.2 }).problems).toEqual([]);
  });
});

describe('impossible and insufficient sets are refused with the reason', () => {
  const good = { ...BODY, perihelionDistanceAu: 2, eccentricity: E, perihelionTtJd: EPOCH };

  test.each<[string, GivenElements, RegExp]>([
    ['q = 0', { perihelionDistanceAu: 0 }, /q is 0; it must be above 0/],
    ['q < 0', { perihelionDistanceAu: -1 }, /q is -1; it must be above 0/],
    ['e < 0', { eccentricity: -0.1 }, /e is -0.1; it must be 0 \(a circle\) or more/],
    ['a < 0 for an ellipse', { semiMajorAxisAu: -2.5 }, /a is -2.5; with e = 0.2 it is above 0/],
    ['a > 0 for a hyperbola', { eccentricity: 1.2, semiMajorAxisAu: 3 }, /below 0, but a is 3/],
    [
      'a for a parabola',
      { eccentricity: 1, semiMajorAxisAu: 3 },
      /parabola \(e = 1\) has no semi-major axis/,
    ],
    ['P for a hyperbola', { eccentricity: 1.2, periodYears: 3 }, /has no period/],
    [
      'M for a parabola',
      { eccentricity: 1, perihelionTtJd: null, meanAnomalyDeg: 1, epochTtJd: EPOCH },
      /no mean anomaly/,
    ],
    ['i > 180', { inclinationDeg: 181 }, /i is 181 deg; it must lie between 0 and 180/],
    ['neither T nor epoch', { perihelionTtJd: null }, /neither T nor an epoch is given/],
    ['an epoch without M', { perihelionTtJd: null, epochTtJd: EPOCH }, /epoch stands without a mean anomaly/],
    ['M without epoch', { perihelionTtJd: null, meanAnomalyDeg: 30 }, /give the epoch, or T/],
    ['no e', { eccentricity: null }, /write 1 if the orbit is meant as a parabola/],
    [
      'no q',
      { perihelionDistanceAu: null },
      /give q, or the semi-major axis a, the mean motion n or the period P/,
    ],
    ['no node', { nodeDeg: null }, /node is missing/],
    ['q beyond a', { eccentricity: null, semiMajorAxisAu: 1, perihelionDistanceAu: 2 }, /eccentricity of -1/],
    ['NaN', { eccentricity: NaN }, /NaN is not a finite number/],
    ['q in metres', { perihelionDistanceAu: 3e11 }, /which no body has: q is given in au/],
    ['T as a year', { perihelionTtJd: 2e8 }, /beyond every reach/],
  ])('%s', (_what, given, message) => {
    expect(errorsOf({ ...good, ...given })).toEqual([expect.stringMatching(message)]);
  });
});

describe('a prefix that the orbit does not bear out', () => {
  const short = { ...ANGLES, perihelionDistanceAu: 1, eccentricity: 0.6, perihelionTtJd: EPOCH };
  const long = { ...short, eccentricity: 0.999 };
  const open = { ...short, eccentricity: 1.3 };

  test.each<[string, GivenElements, RegExp | null]>([
    ['C/2031 K7', short, /C\/ means a period over 200 years, but this orbit takes 3.953 years/],
    ['C/2031 K7', long, null],
    ['P/2031 K7', short, null],
    ['P/2031 K7', long, /P\/ means a period under 200 years, but this orbit takes 31620 years/],
    ['P/2031 K7', open, /never returns/],
    // Seen at more than one perihelion, and so numbered, a comet is P/ whatever its period.
    ['999P', long, null],
    ['I/2031 U1', short, /bound to the Sun/],
    ['1I', open, null],
    ['X/2031 B3', short, /without a known orbit/],
    ['2031 KQ12', open, /open orbit/],
  ])('%s', (designation, given, message) => {
    const { problems } = completeElements({ designation, ...given });
    expect(problems.map((problem) => problem.message)).toEqual(
      message === null ? [] : [expect.stringMatching(message)],
    );
  });
});

describe('the orbit in plain words', () => {
  test.each([
    ['999P', 1, 0.6, 'short-period comet, back within 20 years (Jupiter family)'],
    ['P/2031 K7', 1, 0.95, 'comet back within a long lifetime or two (Halley type)'],
    ['C/2031 K7', 1, 0.999, 'long-period comet, away for centuries or more'],
    ['C/2031 K7', 1, 1, 'comet on a parabola, its true period not known'],
    ['C/2031 K7', 1, 1.0001, 'comet leaving on a slightly open orbit (hyperbolic)'],
    ['1I', 0.25, 1.2, 'comet passing the Sun once, from outside the solar system'],
    ['2031 KA', 0.5, 0.1, 'near-Earth asteroid that stays inside the Earth’s orbit (Atira group)'],
    ['2031 KA', 0.6, 0.3, 'near-Earth asteroid that crosses the Earth’s orbit from inside (Aten group)'],
    ['2031 KA', 0.8, 0.5, 'near-Earth asteroid that crosses the Earth’s orbit (Apollo group)'],
    ['2031 KA', 1.1, 0.5, 'near-Earth asteroid that stays outside the Earth’s orbit (Amor group)'],
    ['2031 KA', 1.5, 0.3, 'asteroid that crosses the orbit of Mars'],
    ['2031 KA', 1.8, 0.05, 'asteroid inside the main belt'],
    ['2031 KA', 2.1, 0.1, 'asteroid of the inner main belt'],
    ['2031 KA', 2.5, 0.1, 'asteroid of the middle main belt'],
    ['2031 KA', 2.7, 0.1, 'asteroid of the outer main belt'],
    ['2031 KA', 5, 0.05, 'asteroid sharing Jupiter’s orbit (Trojan)'],
    ['2031 KA', 10, 0.3, 'icy body among the giant planets (Centaur)'],
    ['2031 KA', 38, 0.1, 'icy body beyond Neptune (trans-Neptunian)'],
  ])('%s with q %p and e %p: %s', (designation, perihelionDistanceAu, eccentricity, orbitClass) => {
    const given = { designation, ...ANGLES, perihelionDistanceAu, eccentricity, perihelionTtJd: EPOCH };
    expect(completeElements(given).set!.orbitClass).toBe(orbitClass);
  });
});
