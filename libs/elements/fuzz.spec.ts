import fc from 'fast-check';
import {
  completeElements,
  parseDesignation,
  readElements,
  readTime,
  writeCometLine,
  writeMinorPlanetLine,
} from '#elements';

// For machines that do other work at the same time.
jest.setTimeout(60_000);

const LINES = [
  '    CK31K070  2032 02 11.4837  0.764213  1.000248  143.2097   61.8840   96.3152  20320217   7.5  4.0  C/2031 K7 (Ashgrove)                                     MPC 99991',
  '0999P         2031 09 03.2065  1.482907  0.617345  201.7730    8.0461   11.9026  20310823  11.0  6.0  999P/Wren-Okafor                                         MPC 99992',
  '~1E3F   15.42  0.15 K31AB 211.30457   96.41208  318.77530    7.26419  0.1438207  0.23221081   2.6214873  0 MPO999993   412   9 2009-2030 0.48 M-v 3Ek Invented   0000 (912345)                    20301104',
  'K31K12Q 19.07  0.15 K31AB  34.90216  271.05533  122.68014    4.81377  0.5120884  0.31967626   2.1183406  6 E2031-L07    61   1   38 days 0.37 M-v 3Ek Invented   0804          2031 KQ12          20310628',
  'designation,name,q,e,i,node,peri,T,epoch,H,G\n2031 KQ12,,1.0335630,0.5120884,4.81377,122.68014,271.05533,2031-06-23.8203,2463150.5,19.07,0.15',
  '{"designation":"C/2031 K7","T":"2032-02-11.4837","q":0.764213,"e":1.000248,"i":96.3,"node":61.8,"peri":143.2,"frame":"equator B1950"}',
];
const DESIGNATIONS = [
  'C/2031 K7-B (Ashgrove)',
  '73P-B/Tarn 3',
  'K31K12Q',
  '~1E3F',
  '(912345) 2002 AB12',
  'A904 OA',
  '2040 P-L',
  '_QC0aEM',
  '0998P      b',
];
const ALPHABET = ' .,;-+/"{}[]:()~_0123456789ABIKPZabeiz\t\n\rΩω₁é\u0000\uFEFF';

/** A published line with some of its characters changed, dropped, doubled or cut off. */
function mutated(originals: readonly string[], mostChanges = 5): fc.Arbitrary<string> {
  const change = fc.tuple(
    fc.nat(210),
    fc.constantFrom<'put' | 'drop' | 'insert' | 'cut'>('put', 'put', 'put', 'drop', 'insert', 'cut'),
    fc.nat(ALPHABET.length - 1),
  );
  return fc
    .tuple(fc.constantFrom(...originals), fc.array(change, { minLength: 1, maxLength: mostChanges }))
    .map(([line, changes]) =>
      changes.reduce((text, [at, how, which]) => {
        const where = at % (text.length + 1);
        if (how === 'cut') return at % 4 === 0 ? text.slice(0, where) : text;
        const put = how === 'drop' ? '' : ALPHABET.charAt(which);
        return text.slice(0, where) + put + text.slice(how === 'insert' ? where : where + 1);
      }, line),
    );
}

/** Whatever was read is described: every set is sound, every problem has a place and a text. */
function checkReading(text: string): number {
  const { sets, problems } = readElements(text);
  const lineCount = text.split('\n').length;
  // Plain conditions here and below: an assertion object a problem would take most of the time.
  for (const { line, column, message } of problems) {
    const placed = line >= 1 && line <= lineCount && column >= 1 && message.length > 10;
    if (!placed) throw new Error(`Problem at ${line}:${column} "${message}" from ${JSON.stringify(text)}`);
  }
  if (sets.length === 0 && !problems.some((problem) => problem.severity === 'error')) {
    throw new Error(`Neither a set nor an error from ${JSON.stringify(text)}`);
  }
  for (const set of sets) {
    const { elements } = set;
    const sound =
      elements.perihelionDistanceAu > 0 &&
      elements.eccentricity >= 0 &&
      Number.isFinite(elements.perihelionTtJd + elements.inclinationRad + elements.nodeRad) &&
      Number.isFinite(
        elements.argumentOfPerihelionRad + elements.perihelionDistanceAu + elements.eccentricity,
      ) &&
      set.label !== '';
    if (!sound) throw new Error(`Unsound set from ${JSON.stringify(text)}`);
    const { line, problem } = set.kind === 'comet' ? writeCometLine(set) : writeMinorPlanetLine(set);
    if ((line ?? problem).length < 10) throw new Error(`Written badly from ${JSON.stringify(text)}`);
  }
  return sets.length;
}

// 100,000 texts in all. Seeds are fixed so that a failure can be met again.
test('45,000 mutated lines give sound sets or described problems', () => {
  let sets = 0;
  fc.assert(
    fc.property(mutated(LINES), (text) => {
      sets += checkReading(text);
    }),
    { numRuns: 45_000, seed: 20311011 },
  );
  // The mutations are mild enough that many lines still load: both ways are exercised.
  expect(sets).toBeGreaterThan(5_000);
  expect(sets).toBeLessThan(40_000);
});

test('15,000 random texts give described problems', () => {
  const text = fc.oneof(
    fc.string({ maxLength: 220 }),
    fc.string({ unit: 'binary', maxLength: 120 }),
    fc.array(fc.constantFrom(...ALPHABET), { maxLength: 220 }).map((letters) => letters.join('')),
  );
  fc.assert(
    fc.property(text, (random) => {
      checkReading(random);
    }),
    { numRuns: 15_000, seed: 20311012 },
  );
});

test('30,000 random and mutated designations parse to the same again or are refused with a reason', () => {
  const text = fc.oneof(
    mutated(DESIGNATIONS, 2),
    fc.string({ maxLength: 30 }),
    fc.string({ unit: 'binary', maxLength: 20 }),
  );
  let valid = 0;
  fc.assert(
    fc.property(text, (random) => {
      const found = parseDesignation(random);
      if (!found.valid) {
        expect(found.problem).not.toBeNull();
        return;
      }
      valid++;
      const again = parseDesignation(found.canonical!);
      const unpacked = found.packed === null ? found : parseDesignation(found.packed);
      const same = again.packed === found.packed && again.canonical === found.canonical;
      if (!same || unpacked.canonical !== found.canonical) throw new Error(`Not the same again: ${random}`);
    }),
    { numRuns: 30_000, seed: 20311013 },
  );
  expect(valid).toBeGreaterThan(3_000);
});

test('10,000 random times and hand-given sets are answered', () => {
  const some = fc.option(fc.oneof(fc.double(), fc.double({ min: -10, max: 400, noNaN: true })));
  const jd = fc.option(fc.oneof(fc.double(), fc.double({ min: 2.4e6, max: 2.5e6, noNaN: true })));
  const given = fc.record({
    perihelionDistanceAu: some,
    eccentricity: some,
    semiMajorAxisAu: some,
    meanMotionDegPerDay: some,
    meanAnomalyDeg: some,
    inclinationDeg: some,
    nodeDeg: some,
    argumentOfPerihelionDeg: some,
    perihelionTtJd: jd,
    epochTtJd: jd,
    absoluteMagnitude: some,
    slope: some,
  });
  fc.assert(
    fc.property(
      given,
      fc.string({ maxLength: 30 }),
      mutated(['2032-02-11T11:36:31.5', '2032 Feb 11.4837']),
      (set, noise, time) => {
        const completed = completeElements(set);
        if (completed.set === null) expect(completed.problems.some((p) => p.severity === 'error')).toBe(true);
        else {
          const { perihelionTtJd, elements } = completed.set;
          expect(elements.perihelionDistanceAu > 0 && elements.eccentricity >= 0).toBe(true);
          expect(Number.isFinite(perihelionTtJd)).toBe(true);
          for (const value of Object.values(completed.set)) {
            if (typeof value === 'number' && !Number.isFinite(value)) {
              throw new Error('A value is not finite');
            }
          }
        }
        for (const text of [noise, time]) {
          const read = readTime(text);
          expect(read.ttJd === null ? read.problem.length > 10 : Number.isFinite(read.ttJd)).toBe(true);
        }
      },
    ),
    { numRuns: 10_000, seed: 20311014 },
  );
});
