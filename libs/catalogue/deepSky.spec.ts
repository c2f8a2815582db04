import { DeepSkyListError, deepSkyObjects, findDeepSky, readDeepSkyList } from './deepSky';
import { foldName } from './foldName';

const objects = deepSkyObjects();

describe('deep-sky list', () => {
  it('has 249 objects: the 110 Messier objects, 91 more, and 48 doubles', () => {
    expect(objects).toHaveLength(249);
    expect(objects.filter(({ id }) => id.startsWith('M '))).toHaveLength(110);
    expect(objects.filter(({ double }) => double)).toHaveLength(49);
    expect(new Set(objects.map(({ id }) => foldName(id))).size).toBe(249);
  });

  it('serves both hemispheres', () => {
    expect(objects.filter(({ decDeg }) => decDeg < -30).length).toBeGreaterThan(50);
    expect(objects.filter(({ decDeg }) => decDeg > 30).length).toBeGreaterThan(50);
  });

  it('keeps its numbers within what they can be', () => {
    for (const one of objects) {
      expect(one.raDeg).toBeGreaterThanOrEqual(0);
      expect(one.raDeg).toBeLessThan(360);
      expect(Math.abs(one.decDeg)).toBeLessThan(90);
      expect(one.magnitude).toBeGreaterThan(-1);
      expect(one.magnitude).toBeLessThan(12);
      expect(one.majorArcmin).toBeGreaterThanOrEqual(one.minorArcmin);
      expect(one.minorArcmin).toBeGreaterThan(0);
      expect(one.distanceLy === null || one.distanceLy > 4).toBe(true);
      const angle = one.positionAngleDeg;
      expect(angle === null || (angle >= 0 && angle <= 180)).toBe(true);
      if (one.double) {
        const [bright, faint] = one.double.magnitudes;
        const both = -2.5 * Math.log10(10 ** (-0.4 * bright) + 10 ** (-0.4 * faint));
        expect([one.id, Math.abs(both - one.magnitude) <= 0.11]).toEqual([one.id, true]);
        expect(one.double.positionAngleDeg).toBeLessThan(360);
      }
    }
  });

  it('tells visitors something of each in one sentence of its own', () => {
    expect(new Set(objects.map(({ gloss }) => gloss)).size).toBe(249);
    for (const { id, gloss } of objects) {
      expect([id, /^[A-Z][^.]{15,118}\.$/.test(gloss)]).toEqual([id, true]);
    }
  });

  it('leaves no name to two objects, save names of a whole of which both are parts', () => {
    const owners = new Map<string, string[]>();
    for (const { id, otherNames } of objects) {
      for (const name of [id, ...otherNames]) {
        owners.set(foldName(name), [...(owners.get(foldName(name)) ?? []), id]);
      }
    }
    const shared = [...owners].filter(([, ids]) => ids.length > 1);
    expect(shared).toEqual([
      ['doublecluster', ['NGC 869', 'NGC 884']],
      ['veilnebula', ['NGC 6960', 'NGC 6992']],
    ]);
  });
});

describe('findDeepSky', () => {
  it.each([
    ['m31', 'M 31'],
    ['M 31', 'M 31'],
    ['Messier 31', 'M 31'],
    ['M031', 'M 31'],
    ['Andromeda Galaxy', 'M 31'],
    ['andromeda   galaxy', 'M 31'],
    ['ngc 224', 'M 31'],
    ['NGC0224', 'M 31'],
    ['ngc 869', 'NGC 869'],
    ['Double Cluster', 'NGC 869'],
    ['47 tuc', 'NGC 104'],
    ['ω Cen', 'NGC 5139'],
    ['omega cen', 'NGC 5139'],
    ['ALBIREO', 'Albireo'],
    ['β Cyg', 'Albireo'],
    ['beta cyg', 'Albireo'],
    ['epsilon lyr', 'Epsilon Lyrae'],
    ['ο² Eri', 'Omicron-2 Eridani'],
    ["Bode's galaxy", 'M 81'],
    ['bodes galaxy', 'M 81'],
    ['Seven Sisters', 'M 45'],
    ['LMC', 'LMC'],
  ])('%s is %s', (name, id) => {
    expect(findDeepSky(name)?.id).toBe(id);
  });

  it.each(['', ' ', 'M', 'M 111', 'NGC', 'Nowhere', '31'])('"%s" is nothing', (name) => {
    expect(findDeepSky(name)).toBeNull();
  });

  it('finds every object by every name it bears', () => {
    for (const one of objects) {
      for (const name of [one.id, ...one.otherNames]) {
        const found = findDeepSky(name)!;
        expect([found.id, ...found.otherNames].map(foldName)).toContain(foldName(name));
      }
    }
  });
});

describe('a spoilt list', () => {
  const head =
    'id otherNames kind constellation raDeg decDeg magnitude major minor positionAngle distanceLy magnitudeA magnitudeB separation pairAngle colours gloss'.replaceAll(
      ' ',
      '\t',
    );
  const row = (kind: string, ra: string): string =>
    ['X 1', '', kind, 'Ori', ra, '1', '5', '1', '1', '', '', '', '', '', '', '', 'A test.'].join('\t');

  it('is read when it is sound', () => {
    expect(readDeepSkyList(`# comment\n${head}\n${row('galaxy', '10')}\n`)).toHaveLength(1);
  });

  it.each([
    ['line 2: unknown kind "blob"', `${head}\n${row('blob', '10')}\n`],
    ['line 2: "ten" in column 5 is no number', `${head}\n${row('galaxy', 'ten')}\n`],
    ['line 2: "" in column 5 is no number', `${head}\n${row('galaxy', '')}\n`],
    ['line 3: 1 columns, expected 17', `${head}\n${row('galaxy', '1')}\nX 2\n`],
    ['expected the columns', `${row('galaxy', '1')}\n`],
  ])('is refused: %s', (message, text) => {
    expect(() => readDeepSkyList(text)).toThrow(DeepSkyListError);
    expect(() => readDeepSkyList(text)).toThrow(message);
  });
});
