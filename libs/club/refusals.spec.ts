import { ClubProblem } from './clubProblem';
import { checked } from './input/checked';
import { smallClub, type TestClub, wholeDatabase } from './fixtures/smallClub';
import { createInstrument } from './instruments/instruments';
import { createProgramme, updateProgramme } from './programmes/programmes';
import { SeasonInput } from './season/seasonInput';
import { createClub, updateClub } from './settings/club';
import { createClubDate } from './settings/clubDates';
import { createSite, getSite, updateSite } from './sites/sites';
import { addElementSet, createTarget, updateTarget } from './targets/targets';

let club: TestClub;
beforeAll(async () => {
  club = await smallClub();
});
afterAll(() => club.close());

const site = { name: 'New ground', latitudeDeg: 47, longitudeDeg: 8, sky: { magPerArcsec2: 21 } };
const programme = {
  name: 'Another',
  items: [{ target: 'Moon', instrument: 'Naked eye' }],
  hours: { kind: 'fixed' as const, start: '20:00', end: '23:00' },
};
const elements = {
  kind: 'comet' as const,
  perihelionTime: '2027-03-14',
  perihelionDistanceAu: 0.9,
  eccentricity: 1,
  inclinationDeg: 60,
  nodeDeg: 40,
  argumentOfPerihelionDeg: 130,
};
const comet = 'C/2026 Q9 (Thistlewood)';

type Request = () => unknown;

/** What is asked, the field that is at fault, and how the message goes. */
const refusals: readonly (readonly [string, Request, string, string])[] = [
  [
    'a latitude out of range',
    () => createSite(club.database, { ...site, latitudeDeg: 95 }),
    'latitudeDeg',
    'latitudeDeg was 95; give degrees from -90 to 90, north positive.',
  ],
  [
    'a longitude out of range',
    () => createSite(club.database, { ...site, longitudeDeg: -200 }),
    'longitudeDeg',
    'longitudeDeg was -200; give degrees from -180 to 180, east positive.',
  ],
  [
    'a place that is no number',
    () => createSite(club.database, { ...site, latitudeDeg: NaN }),
    'latitudeDeg',
    'latitudeDeg was NaN; give degrees from -90 to 90, north positive.',
  ],
  [
    'an elevation on no mountain',
    () => createSite(club.database, { ...site, elevationM: 20000 }),
    'elevationM',
    'elevationM was 20000; give metres above sea level, from -430 to 6500.',
  ],
  [
    'an unknown zone',
    () => createSite(club.database, { ...site, zone: 'Europe/Brackenfold' }),
    'zone',
    'zone was "Europe/Brackenfold"; give the IANA name of a time zone, such as Europe/Zurich.',
  ],
  [
    'a horizon that goes backwards',
    () =>
      createSite(club.database, {
        ...site,
        horizon: [
          { azimuthDeg: 10, altitudeDeg: 5 },
          { azimuthDeg: 120, altitudeDeg: 5 },
          { azimuthDeg: 90, altitudeDeg: 5 },
        ],
      }),
    'horizon[2].azimuthDeg',
    'horizon[2].azimuthDeg was 90; give azimuths that rise from point to point: more than 120, that of the point before.',
  ],
  [
    'a horizon beyond a full turn',
    () => createSite(club.database, { ...site, horizon: [{ azimuthDeg: 360, altitudeDeg: 5 }] }),
    'horizon[0].azimuthDeg',
    'horizon[0].azimuthDeg was 360; give degrees from 0 to below 360, north through east.',
  ],
  [
    'a horizon overhead',
    () => createSite(club.database, { ...site, horizon: [{ azimuthDeg: 0, altitudeDeg: 88 }] }),
    'horizon[0].altitudeDeg',
    'horizon[0].altitudeDeg was 88; give degrees above the level, from -5 to 85.',
  ],
  [
    'no sky value',
    () => createSite(club.database, { ...site, sky: {} }),
    'sky',
    'sky was {}; give either magPerArcsec2 or bortleClass.',
  ],
  [
    'a sky darker than space',
    () => createSite(club.database, { ...site, sky: { magPerArcsec2: 25 } }),
    'sky.magPerArcsec2',
    'sky.magPerArcsec2 was 25; give the zenith sky in V mag/arcsec2, from 15 to 22.2.',
  ],
  [
    'a Bortle class of 0',
    () => createSite(club.database, { ...site, sky: { bortleClass: 0 } }),
    'sky.bortleClass',
    'sky.bortleClass was 0; give a Bortle class, a whole number from 1 to 9.',
  ],
  [
    'a gate that closes before it opens',
    () => createSite(club.database, { ...site, gate: { opens: '22:00', closes: '18:00' } }),
    'gate.closes',
    'gate.closes was "18:00"; give a time after the gate opens at 22:00, in an evening that runs from noon to noon.',
  ],
  [
    'a closure on a date that does not exist',
    () =>
      createSite(club.database, {
        ...site,
        closures: [{ from: '2027-02-29', to: '2027-03-01', why: 'Lambing' }],
      }),
    'closures[0].from',
    'closures[0].from was "2027-02-29"; give a date that exists, as YYYY-MM-DD, from 1900-01-01 to 2199-12-31.',
  ],
  [
    'a field nobody knows',
    () => createSite(club.database, { ...site, horizen: [] } as never),
    'horizen',
    'horizen is not a field that is known here; leave it out.',
  ],
  [
    'a site without a name',
    () => createSite(club.database, { ...site, name: '  ' }),
    'name',
    'name was "  "; give one line of text, 1 to 120 characters.',
  ],
  [
    'a name that is taken',
    () => createSite(club.database, { ...site, name: 'brackenfold' }),
    'name',
    'name was "brackenfold"; give a name that no other site has.',
  ],
  [
    'a change that makes a site wrong',
    () => updateSite(club.database, 'Brackenfold', { latitudeDeg: -91 }),
    'latitudeDeg',
    'latitudeDeg was -91; give degrees from -90 to 90, north positive.',
  ],
  [
    'a change of an unknown site',
    () => updateSite(club.database, 'Elsewhere', { name: 'X' }),
    'site',
    'site was "Elsewhere"; give the name of a site: there are Brackenfold, Wether Downs.',
  ],
  [
    'a second club',
    () => createClub(club.database, { name: 'Another club' }),
    'name',
    'There is a club already; change its settings instead.',
  ],
  [
    'a public address with a path',
    () => updateClub(club.database, { publicAddress: 'https://example.org/x' }),
    'publicAddress',
    'publicAddress was "https://example.org/x"; give a web address without a path, such as https://evenings.example.org, or null.',
  ],
  [
    'a club date that does not exist',
    () => createClubDate(club.database, { date: '2027-04-31', name: 'Fair' }),
    'date',
    'date was "2027-04-31"; give a date that exists, as YYYY-MM-DD, from 1900-01-01 to 2199-12-31.',
  ],
  [
    'an instrument without aperture',
    () => createInstrument(club.database, { name: 'Tube', kind: 'telescope', magnifications: [50] }),
    'apertureMm',
    'apertureMm was left out; give the clear aperture of the telescope in millimetres, at least 10.',
  ],
  [
    'magnifications out of order',
    () =>
      createInstrument(club.database, {
        name: 'Tube',
        kind: 'telescope',
        apertureMm: 100,
        magnifications: [90, 50],
      }),
    'magnifications',
    'magnifications was [90,50]; give at least one magnification, each once, in rising order.',
  ],
  [
    'the Sun',
    () => createTarget(club.database, { kind: 'solarSystem', body: 'Sun' as never }),
    'body',
    'body was "Sun"; give one of Moon, Mercury, Venus, Mars, Jupiter, Saturn, Uranus, Neptune; the Sun is never offered to the public through an instrument here.',
  ],
  [
    'a catalogue entry nobody knows',
    () => createTarget(club.database, { kind: 'deepSky', catalogueId: 'M 999' }),
    'catalogueId',
    'catalogueId was "M 999"; give an identifier or name in the deep-sky list, such as M 31 or NGC 869, or enter it as a place.',
  ],
  [
    'a target of an unknown kind',
    () => createTarget(club.database, { kind: 'satellite' } as never),
    'kind',
    'kind was "satellite"; give a kind: solarSystem, deepSky, place or orbit.',
  ],
  [
    'elements with e < 0',
    () =>
      createTarget(club.database, {
        kind: 'orbit',
        name: 'Comet',
        elements: { ...elements, eccentricity: -0.1 },
      }),
    'elements.eccentricity',
    'elements.eccentricity was -0.1; give a number from 0 (circle) by way of 1 (parabola) to 100.',
  ],
  [
    'newer elements with e < 0',
    () => addElementSet(club.database, comet, { ...elements, eccentricity: -1 }),
    'eccentricity',
    'eccentricity was -1; give a number from 0 (circle) by way of 1 (parabola) to 100.',
  ],
  [
    'elements with q = 0',
    () => addElementSet(club.database, comet, { ...elements, perihelionDistanceAu: 0 }),
    'perihelionDistanceAu',
    'perihelionDistanceAu was 0; give the perihelion distance in au, more than 0, at most 1000.',
  ],
  [
    'a perihelion on a date that does not exist',
    () => addElementSet(club.database, comet, { ...elements, perihelionTime: '2027-02-30' }),
    'perihelionTime',
    'perihelionTime was "2027-02-30"; give a TT time as ISO, such as 2027-03-14T05:20:00 or 2027-03-14.',
  ],
  [
    'elements for a planet',
    () => addElementSet(club.database, 'Jupiter', elements),
    'target',
    'Jupiter does not move on an orbit; it takes no element set.',
  ],
  [
    'a coma on a planet',
    () => updateTarget(club.database, 'Jupiter', { comaArcmin: 3 }),
    'comaArcmin',
    'comaArcmin was 3; leave it out, only a body on an orbit has a coma.',
  ],
  [
    'an empty programme',
    () => createProgramme(club.database, { ...programme, items: [] }),
    'items',
    'items was []; give at least one target; an empty programme promises nothing.',
  ],
  [
    'a programme emptied by a change',
    () => updateProgramme(club.database, 'Winter lights', { items: [] }),
    'items',
    'items was []; give at least one target; an empty programme promises nothing.',
  ],
  [
    'a programme with an unknown target',
    () =>
      createProgramme(club.database, { ...programme, items: [{ target: 'Pluto', instrument: 'Naked eye' }] }),
    'items[0].target',
    'items[0].target was "Pluto"; give the name or id of a target the club has.',
  ],
  [
    'a programme that promises twice',
    () => createProgramme(club.database, { ...programme, items: [...programme.items, ...programme.items] }),
    'items[1].target',
    'items[1].target was "Moon" once more; give each target once.',
  ],
  [
    'public hours that end before they start',
    () =>
      createProgramme(club.database, {
        ...programme,
        hours: { kind: 'fixed', start: '23:00', end: '20:00' },
      }),
    'hours.end',
    'hours.end was "20:00"; give a time after the start at 23:00, in an evening that runs from noon to noon.',
  ],
  [
    'weights that bring no points',
    () =>
      createProgramme(club.database, {
        ...programme,
        weights: { programme: 0, darkness: 0, height: 0, moon: 0 },
      }),
    'weights',
    'weights was {"programme":0,"darkness":0,"height":0,"moon":0}; give points above 0 for at least one part.',
  ],
  [
    'a season longer than five years',
    () => checked(SeasonInput, { from: '2027-01-01', to: '2032-01-01' }),
    'to',
    'to was "2032-01-01"; give a date no later than 2031-12-31: a season is at most five years long.',
  ],
  [
    'a season that ends before it begins',
    () => checked(SeasonInput, { from: '2027-02-01', to: '2027-01-01' }),
    'to',
    'to was "2027-01-01"; give a date on or after from, which is 2027-02-01.',
  ],
  [
    'a season from a date that does not exist',
    () => checked(SeasonInput, { from: '2027-02-29', to: '2027-03-01' }),
    'from',
    'from was "2027-02-29"; give a date that exists, as YYYY-MM-DD, from 1900-01-01 to 2199-12-31.',
  ],
  [
    'a season without dates',
    () => checked(SeasonInput, {}),
    'from',
    'from was left out; give a date that exists, as YYYY-MM-DD, from 1900-01-01 to 2199-12-31.',
  ],
  [
    'no request at all',
    () => checked(SeasonInput, null),
    '',
    'The request was null; give an object with named fields.',
  ],
];

it.each(refusals)('refuses %s and changes nothing', async (_what, request, field, message) => {
  const before = await wholeDatabase(club.database);
  const refusal = await Promise.resolve()
    .then(request)
    .then(
      () => null,
      (reason: unknown) => reason,
    );
  expect(refusal).toBeInstanceOf(ClubProblem);
  expect((refusal as ClubProblem).problems[0]).toMatchObject({ field, message });
  expect(await wholeDatabase(club.database)).toBe(before);
});

it('takes a season of exactly five years', () => {
  expect(checked(SeasonInput, { from: '2028-02-29', to: '2033-02-28' })).toEqual({
    from: '2028-02-29',
    to: '2033-02-28',
  });
});

it('lists everything that is wrong at once', async () => {
  const refusal = await createSite(club.database, {
    ...site,
    latitudeDeg: 95,
    longitudeDeg: 300,
    name: '',
  }).catch((reason: unknown) => reason);
  expect((refusal as ClubProblem).problems.map(({ field }) => field).sort()).toEqual([
    'latitudeDeg',
    'longitudeDeg',
    'name',
  ]);
});

it('keeps nothing of a request that fails half way', async () => {
  const before = await wholeDatabase(club.database);
  await expect(
    updateSite(club.database, 'Brackenfold', { name: 'Wether Downs', horizon: [] }),
  ).rejects.toMatchObject({
    kind: 'conflict',
  });
  expect(await wholeDatabase(club.database)).toBe(before);
  expect((await getSite(club.database, 'brackenfold ')).horizon).toHaveLength(2);
});
