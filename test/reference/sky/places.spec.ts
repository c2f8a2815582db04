import { type OrbitTarget, place, type SolarBody, toRad, type FixedTarget } from '#sky';
import { expected, horizontalMiss, missArcsec, observerOf, type ObserverRow, solarTarget } from './expected';

// Expected: Swiss Ephemeris files (JPL DE431) with ERFA; see README.md.

describe('geocentric place', () => {
  type Row = readonly [
    SolarBody,
    string,
    ra: number,
    dec: number,
    raOfDate: number,
    decOfDate: number,
    au: number,
  ];
  const { rows } = expected<{ rows: Row[] }>('geocentric.json');
  const bodies = [...new Set(rows.map(([body]) => body))];

  it('is checked for all nine bodies', () => {
    expect(bodies).toHaveLength(9);
    expect(rows).toHaveLength(540);
  });

  test.each(bodies)('of %s agrees with DE431 and ERFA', (body) => {
    const arcsec = body === 'Moon' ? 4 : 1;
    for (const [name, utc, ra, dec, raOfDate, decOfDate, au] of rows) {
      if (name !== body) continue;
      const found = place(solarTarget(body), Date.parse(utc), null);
      expect(missArcsec(found.astrometric, ra, dec)).toBeLessThan(arcsec);
      expect(missArcsec(found.apparent, raOfDate, decOfDate)).toBeLessThan(arcsec);
      expect(Math.abs(found.distanceAu! / au - 1)).toBeLessThan(1e-4);
    }
  });
});

describe('place of a fixed target', () => {
  type Row = readonly [
    ra: number,
    dec: number,
    observer: number,
    utc: string,
    raOfDate: number,
    decOfDate: number,
    altitude: number,
    azimuth: number,
  ];
  const { observers, rows } = expected<{ observers: ObserverRow[]; rows: Row[] }>('stars.json');
  const star = (ra: number, dec: number): FixedTarget => ({
    kind: 'fixed',
    name: 'a direction',
    raRad: toRad(ra),
    decRad: toRad(dec),
    magnitude: 0,
    majorArcmin: 0,
    minorArcmin: 0,
  });

  it('agrees with ERFA to an arcsecond, the poles included', () => {
    expect(rows).toHaveLength(120);
    for (const [ra, dec, , utc, raOfDate, decOfDate] of rows) {
      const found = place(star(ra, dec), Date.parse(utc), null);
      expect(missArcsec(found.apparent, raOfDate, decOfDate)).toBeLessThan(1);
      expect(missArcsec(found.astrometric, ra, dec)).toBeLessThan(1e-6);
    }
  });

  it('has altitude and azimuth within an arcsecond', () => {
    for (const [ra, dec, observer, utc, , , altitudeDeg, azimuthDeg] of rows) {
      const found = place(star(ra, dec), Date.parse(utc), observerOf(observers[observer]!));
      const miss = horizontalMiss(found.horizontal!, altitudeDeg, azimuthDeg);
      expect(miss.altitude).toBeLessThan(1);
      expect(miss.azimuth).toBeLessThan(1);
    }
  });
});

describe('place of a comet', () => {
  type Elements = readonly [
    q: number,
    e: number,
    inclination: number,
    node: number,
    argument: number,
    perihelion: number,
  ];
  type Row = readonly [
    comet: number,
    observer: number,
    utc: string,
    ra: number,
    dec: number,
    altitude: number,
    azimuth: number,
    au: number,
  ];
  const { observers, comets, rows } = expected<{
    observers: ObserverRow[];
    comets: Elements[];
    rows: Row[];
  }>('comets.json');
  const target = ([q, e, inclination, node, argument, perihelionTtJd]: Elements): OrbitTarget => ({
    kind: 'orbit',
    name: 'an invented comet',
    elements: {
      perihelionDistanceAu: q,
      eccentricity: e,
      inclinationRad: toRad(inclination),
      nodeRad: toRad(node),
      argumentOfPerihelionRad: toRad(argument),
      perihelionTtJd,
      epochTtJd: null,
    },
    brightness: null,
    comaArcmin: 0,
  });

  test.each(comets.map((elements, number) => [number, elements] as const))(
    'number %d agrees from its observers',
    (number, elements) => {
      const at = rows.filter(([of]) => of === number);
      expect(at).toHaveLength(16);
      for (const [, observer, utc, ra, dec, altitudeDeg, azimuthDeg, au] of at) {
        const found = place(target(elements), Date.parse(utc), observerOf(observers[observer]!));
        const miss = horizontalMiss(found.horizontal!, altitudeDeg, azimuthDeg);
        const astrometric = missArcsec(found.astrometric, ra, dec);
        expect(Math.max(astrometric, miss.altitude, miss.azimuth)).toBeLessThan(0.5);
        expect(Math.abs(found.distanceAu! - au)).toBeLessThan(1e-6);
      }
    },
  );
});
