import { completeElements, isoTt, readElements, readTime, toEclipticJ2000 } from '#elements';
import {
  ARCSEC,
  eclipticToEquatorial,
  fromSpherical,
  heliocentricState,
  place,
  separation,
  toDeg,
  toRad,
  ttJdToUtcMs,
} from '#sky';

test('2P/Encke from a, e and T stands where the worked example has it', () => {
  // Meeus, Astronomical Algorithms, 2nd edition, example 33.b: 1990 October 6.0 TT,
  // RA 10h34m14.2s, Dec +19 deg 09' 31", elongation 40.51 deg.
  const line = '2.2091404,0.8502196,11.94524,334.75006,186.23352,1990 Oct 28.54502';
  const { sets, problems } = readElements(`designation,a,e,i,node,peri,T\n2P,${line}`);
  expect(problems).toEqual([]);
  const [set] = sets;
  expect(set!.perihelionDistanceAu).toBeCloseTo(2.2091404 * (1 - 0.8502196), 12);
  // The mean motion in the example, 0.300171252 deg/day (from memory).
  expect(set!.meanMotionDegPerDay).toBeCloseTo(0.300171252, 8);
  const target = {
    kind: 'orbit',
    name: '2P',
    elements: set!.elements,
    brightness: null,
    comaArcmin: 0,
  } as const;
  const seen = place(target, ttJdToUtcMs(readTime('1990 Oct 6.0').ttJd!), null);
  const [x, y, z] = eclipticToEquatorial(
    heliocentricState(set!.elements, readTime('1990 Oct 6.0').ttJd!).position,
  );
  // The example's heliocentric place on the equator J2000 (from memory), to one unit of its last digit.
  [x - 0.2508066, y - 0.4849175, z - 0.3573373].forEach((off) => {
    expect(Math.abs(off)).toBeLessThan(1e-7);
  });
  expect(seen.sunDistanceAu).toBeCloseTo(0.652575, 5);
  expect(seen.distanceAu).toBeCloseTo(0.824281, 5);
  // Half a unit of the example's last digit in RA is 0.7 arcsec; the planetary library's Earth is good to 1.8 arcsec.
  const published = fromSpherical(toRad(15 * (10 + 34 / 60 + 14.2 / 3600)), toRad(19 + 9 / 60 + 31 / 3600));
  const shown = fromSpherical(seen.astrometric.raRad, seen.astrometric.decRad);
  expect(separation(published, shown) / ARCSEC).toBeLessThan(0.7 + 1.8);
  expect(toDeg(seen.elongationRad)).toBeCloseTo(40.51, 2);
});

test('elements declared on the equator give the published state of Ceres', () => {
  // JPL Horizons, quoted in Skyfield's tests: JD 2458886.5 TDB, elements on the ICRF equator, heliocentric au.
  const { set, problems } = completeElements({
    designation: '1 Ceres',
    frame: 'equator J2000',
    semiMajorAxisAu: 2.768873850275102,
    eccentricity: 0.07705857791518426,
    inclinationDeg: 27.18528770987308,
    nodeDeg: 23.36112629072238,
    argumentOfPerihelionDeg: 132.8964361683606,
    meanAnomalyDeg: 138.2501360489816,
    epochTtJd: 2458886.5,
  });
  expect(problems).toEqual([]);
  const [x, y, z] = eclipticToEquatorial(heliocentricState(set!.elements, 2458886.5).position);
  expect(Math.abs(x - 1.33898182)).toBeLessThan(1e-8);
  expect(Math.abs(y + 2.24634734)).toBeLessThan(1e-8);
  expect(Math.abs(z + 1.33185153)).toBeLessThan(1e-8);
  expect(set!.converted).toMatchObject({ frame: 'equator J2000', inclinationDeg: 27.18528770987308 });
});

test('an orbit of B1950 comes out in J2000 as in the worked example', () => {
  // Meeus, chapter 24, example 24.b, 2P/Encke: both sets of angles from memory.
  const j2000 = toEclipticJ2000(
    { inclinationDeg: 11.93911, nodeDeg: 334.04096, argumentOfPerihelionDeg: 186.24444 },
    'ecliptic B1950',
  );
  expect(j2000.inclinationDeg).toBeCloseTo(11.94521, 5);
  expect(j2000.nodeDeg).toBeCloseTo(334.75043, 5);
  expect(j2000.argumentOfPerihelionDeg).toBeCloseTo(186.23327, 5);
});

test('an orbit on the equator of B1950 is the same orbit as on its ecliptic', () => {
  // Rotated by hand about the equinox by Newcomb's obliquity of 1950, 23.4457889 deg (from memory).
  const rad = Math.PI / 180;
  const tilt = 23.4457889 * rad;
  const onEcliptic = { inclinationDeg: 11.93911, nodeDeg: 334.04096, argumentOfPerihelionDeg: 186.24444 };
  const i = onEcliptic.inclinationDeg * rad;
  const node = onEcliptic.nodeDeg * rad;
  const pole = [Math.sin(i) * Math.sin(node), -Math.sin(i) * Math.cos(node), Math.cos(i)] as const;
  const y = pole[1] * Math.cos(tilt) - pole[2] * Math.sin(tilt);
  const z = pole[1] * Math.sin(tilt) + pole[2] * Math.cos(tilt);
  const equatorNode = Math.atan2(pole[0], -y);
  // The argument shifts by the arc between the two nodes along the orbit.
  const onOrbit = (longitude: number, tipped: number): readonly [number, number, number] => [
    Math.cos(longitude),
    Math.sin(longitude) * Math.cos(tipped),
    Math.sin(longitude) * Math.sin(tipped),
  ];
  const ascending = onOrbit(equatorNode, -tilt);
  const start = [Math.cos(node), Math.sin(node), 0] as const;
  const cosArc = start[0] * ascending[0] + start[1] * ascending[1];
  const crossed = [
    start[1] * ascending[2] - start[2] * ascending[1],
    start[2] * ascending[0] - start[0] * ascending[2],
    start[0] * ascending[1] - start[1] * ascending[0],
  ] as const;
  const sinArc = crossed[0] * pole[0] + crossed[1] * pole[1] + crossed[2] * pole[2];
  const onEquator = {
    inclinationDeg: Math.acos(z) / rad,
    nodeDeg: equatorNode / rad,
    argumentOfPerihelionDeg: onEcliptic.argumentOfPerihelionDeg - Math.atan2(sinArc, cosArc) / rad,
  };
  const a = toEclipticJ2000(onEquator, 'equator B1950');
  const b = toEclipticJ2000(onEcliptic, 'ecliptic B1950');
  expect(a.inclinationDeg).toBeCloseTo(b.inclinationDeg, 6);
  expect(a.nodeDeg).toBeCloseTo(b.nodeDeg, 6);
  expect(a.argumentOfPerihelionDeg).toBeCloseTo(b.argumentOfPerihelionDeg, 6);
});

test.each([
  // Minor Planet Center, "Packed Dates": K205V is 2020 May 31.
  ['K205V', '2020-05-31T00:00:00.000'],
  // Meeus, chapter 7, example 7.a: 1957 October 4.81 is JD 2436116.31.
  ['2436116.31', '1957-10-04T19:26:24.000'],
  ['1957 Oct 4.81', '1957-10-04T19:26:24.000'],
  ['19571004.81', '1957-10-04T19:26:24.000'],
])('the time %s', (text, iso) => {
  expect(isoTt(readTime(text).ttJd!)).toBe(iso);
});

test('the Julian calendar holds before 1582 October 15', () => {
  // Meeus, chapter 7, example 7.b: 333 January 27.5 is JD 1842713.0; 1582 October 4.0 is 2299159.5, the next day
  // October 15.0 is 2299160.5.
  expect(readTime('333 January 27.5').ttJd).toBe(1842713);
  expect(readTime('1582 Oct 4.0').ttJd).toBe(2299159.5);
  expect(readTime('1582 Oct 15.0').ttJd).toBe(2299160.5);
});
