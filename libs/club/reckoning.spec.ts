import { toRad } from '#sky';
import { smallClub, type TestClub } from './fixtures/smallClub';
import { getNightProgramme, getProgramme, updateProgramme } from './programmes/programmes';
import { nightSite } from './sites/nightSite';
import { createSite, getSite, updateSite } from './sites/sites';
import { jdToTtIso, ttIsoToJd } from './targets/elementSetInput';
import { addElementSet, createTarget, getSkyTarget, getTarget, listElementSets } from './targets/targets';

let club: TestClub;
beforeEach(async () => {
  club = await smallClub();
});
afterEach(() => club.close());

const comet = 'C/2026 Q9 (Thistlewood)';
const newer = {
  source: 'Invented for this test',
  kind: 'comet' as const,
  epoch: '2027-03-01',
  perihelionTime: '2027-03-14T09:00:00',
  perihelionDistanceAu: 0.911,
  eccentricity: 1.0003,
  inclinationDeg: 62.3,
  nodeDeg: 41.7,
  argumentOfPerihelionDeg: 133.2,
  absoluteMagnitude: 7,
  slope: 4,
};

it('turns a site into what the search reckons with', async () => {
  const site = nightSite(await getSite(club.database, 'Brackenfold'));
  expect(site).toMatchObject({
    name: 'Brackenfold',
    observer: { latitudeRad: toRad(47.1), longitudeRad: toRad(8.2), elevationM: 620 },
    zone: 'Europe/Zurich',
    sky: { zenithMagPerArcsec2: 21.3, domes: [] },
    gate: { opens: '17:00', closes: '00:30' },
    closed: [],
  });
  // Left out, it is reckoned from the elevation: clear air at 620 m loses a quarter of a magnitude or so.
  expect(site.sky.extinctionMagPerAirmass).toBeGreaterThan(0.15);
  expect(site.sky.extinctionMagPerAirmass).toBeLessThan(0.35);
});

it('changes only what is given of a site, and keeps its zone when it moves', async () => {
  const before = await getSite(club.database, 'Brackenfold');
  const domes = [{ azimuthDeg: 210, widthDeg: 40, brighteningMag: 1.5 }];
  expect(await updateSite(club.database, 'Brackenfold', { longitudeDeg: 5.9, domes })).toEqual({
    ...before,
    longitudeDeg: 5.9,
    domes,
  });
  expect(nightSite(await getSite(club.database, 'Brackenfold')).sky.domes).toEqual([
    { azimuthRad: toRad(210), widthRad: toRad(40), brighteningMag: 1.5 },
  ]);
});

it('takes the zone of the place where none is given', async () => {
  const sky = { magPerArcsec2: 21 };
  const places = [
    [-31.3, 149.1, 'Australia/Sydney'],
    [64.1, -21.9, 'Atlantic/Reykjavik'],
    [28.3, -16.5, 'Atlantic/Canary'],
  ] as const;
  for (const [latitudeDeg, longitudeDeg, zone] of places) {
    expect(await createSite(club.database, { name: zone, latitudeDeg, longitudeDeg, sky })).toMatchObject({
      zone,
    });
  }
});

it('turns a programme into what the search reckons with, in its order', async () => {
  const { programme, weights } = await getNightProgramme(club.database);
  expect(weights).toEqual({ programme: 50, darkness: 20, height: 15, moon: 15 });
  expect(programme).toMatchObject({
    name: 'Winter lights',
    moon: 'indifferent',
    weekdays: [5, 6],
    habit: { nth: 1, weekday: 6 },
    hours: { kind: 'dusk', from: 'civilDusk', offsetMinutes: 20, durationMinutes: 150, latest: '23:00' },
  });
  expect(
    programme.items.map(({ target, weight, leastMinutes }) => [target.name, weight, leastMinutes]),
  ).toEqual([
    ['Moon', 1, 15],
    ['Jupiter', 2, 20],
    ['M 31', 1, 20],
    [comet, 3, 20],
  ]);
  expect(programme.items[3]).toMatchObject({
    leastAltitudeRad: toRad(12),
    instrument: {
      name: 'Club reflector',
      kind: 'telescope',
      apertureMm: 200,
      magnifications: [48, 120],
      eyes: 1,
    },
    target: {
      kind: 'orbit',
      comaArcmin: 4,
      brightness: { kind: 'comet', absoluteMagnitude: 6.5, activity: 4 },
    },
  });
});

it('changes only what is given of a programme', async () => {
  const before = await getProgramme(club.database, 'Winter lights');
  expect(await updateProgramme(club.database, 'Winter lights', { moon: 'dark', habit: null })).toEqual({
    ...before,
    moon: 'dark',
    habit: null,
  });
});

it('uses the element set that came last and keeps the older ones as they were', async () => {
  const [first] = await listElementSets(club.database, comet);
  club.setNow('2027-02-01T12:00:00Z');
  await addElementSet(club.database, comet, newer);
  const sets = await listElementSets(club.database, comet);
  expect(sets).toHaveLength(2);
  expect(sets[1]).toEqual(first);
  expect(sets[0]).toMatchObject({ number: 2, receivedAt: '2027-02-01T12:00:00.000Z', eccentricity: 1.0003 });
  expect(await getTarget(club.database, comet)).toMatchObject({ elementSets: 2, elements: sets[0] });
  // Noon of 14 March 2027 is JD 2461479.0 (J2000.0, noon of 1 January 2000, is 2451545.0, and 9934 days passed).
  expect(await getSkyTarget(club.database, comet)).toMatchObject({
    elements: { perihelionTtJd: 2461478.875, perihelionDistanceAu: 0.911, inclinationRad: toRad(62.3) },
  });
});

it("calls a deep-sky object by people's name for it and places it by the list", async () => {
  expect(await getTarget(club.database, 'm 31')).toMatchObject({
    kind: 'deepSky',
    catalogueId: 'M 31',
    commonName: expect.stringMatching(/^Andromeda/) as unknown,
  });
  // M 31: 00h 42.7m, +41° 16' (J2000; from memory), to the arcminute.
  const target = await getSkyTarget(club.database, 'M 31');
  if (target.kind !== 'fixed') throw new Error('M 31 should be fixed.');
  expect(Math.abs(target.raRad - toRad(10.685))).toBeLessThan(toRad(1 / 60));
  expect(Math.abs(target.decRad - toRad(41.269))).toBeLessThan(toRad(1 / 60));
});

it('refuses elements that say too little, by the name of the field', async () => {
  const without = { ...newer, perihelionTime: null };
  await expect(
    createTarget(club.database, { kind: 'orbit', name: 'Half known', elements: without }),
  ).rejects.toMatchObject({
    kind: 'invalid',
    problems: [{ field: expect.stringMatching(/^elements/) as unknown }],
  });
});

it('writes and reads TT times as ISO', () => {
  expect(ttIsoToJd('2000-01-01T12:00:00')).toBe(2451545);
  expect(ttIsoToJd('1858-11-17')).toBe(2400000.5);
  expect(ttIsoToJd('2027-02-29')).toBeNull();
  expect(ttIsoToJd('2027-02-28T24:00')).toBeNull();
  for (const text of ['2027-03-14T05:20:00.00', '1986-02-09T11:01:02.34', '2161-12-31T23:59:59.99']) {
    expect(jdToTtIso(ttIsoToJd(text)!)).toBe(text);
  }
});
