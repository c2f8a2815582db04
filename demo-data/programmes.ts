import { type InstrumentInput, type ProgrammeInput, type TargetInput } from '#club';
import {
  BELT_ASTEROID_NAME,
  beltAsteroidElements,
  COMET_NAME,
  cometElementSets,
  NEAR_ASTEROID_NAME,
  nearAsteroidElements,
} from './orbits';

/** Instruments that a small club has. */
export const DEMO_INSTRUMENTS: readonly InstrumentInput[] = [
  { name: 'Naked eye', kind: 'nakedEye', transmission: 1 },
  { name: '10×50 binoculars', kind: 'binocular', apertureMm: 50, magnifications: [10], transmission: 0.8 },
  {
    name: '200 mm reflector',
    kind: 'telescope',
    apertureMm: 200,
    magnifications: [40, 80, 133, 200],
    transmission: 0.75,
  },
  {
    name: '100 mm refractor',
    kind: 'telescope',
    apertureMm: 100,
    magnifications: [25, 50, 100, 160],
    transmission: 0.9,
  },
];

/** The targets of the demo's programmes; the comet comes with its first elements. */
export function demoTargets(asOf: string): readonly TargetInput[] {
  return [
    { kind: 'solarSystem', body: 'Moon', gloss: 'Craters and plains along the line between day and night.' },
    { kind: 'solarSystem', body: 'Venus', gloss: 'A small bright Moon-like shape under unbroken cloud.' },
    { kind: 'solarSystem', body: 'Mars', gloss: 'The red planet; best in the months around opposition.' },
    { kind: 'solarSystem', body: 'Jupiter', gloss: 'Cloud bands and four moons that move within the hour.' },
    { kind: 'solarSystem', body: 'Saturn', gloss: 'The rings, and Titan beside them.' },
    ...['M 31', 'NGC 869', 'M 42', 'M 45', 'M 44', 'M 13', 'M 57', 'M 51', 'M 22', 'Albireo', 'Mizar'].map(
      (catalogueId): TargetInput => ({ kind: 'deepSky', catalogueId }),
    ),
    {
      kind: 'orbit',
      name: `Comet ${COMET_NAME}`,
      elements: cometElementSets(asOf)[0],
      comaArcmin: 7,
      gloss: 'An invented comet on its way past the Sun.',
    },
    {
      kind: 'orbit',
      name: BELT_ASTEROID_NAME,
      elements: beltAsteroidElements(asOf),
      gloss: 'An invented minor planet; a star that has moved by tomorrow.',
    },
    {
      kind: 'orbit',
      name: NEAR_ASTEROID_NAME,
      elements: nearAsteroidElements(asOf),
      gloss: 'An invented near-Earth asteroid that drifts while you watch.',
    },
  ];
}

const BINOCULARS = '10×50 binoculars';
const REFLECTOR = '200 mm reflector';
const REFRACTOR = '100 mm refractor';

/** The first is the one a search takes unless told otherwise. */
export const DEMO_PROGRAMMES: readonly ProgrammeInput[] = [
  {
    name: 'Open sky',
    items: [
      item('Moon', REFRACTOR, 1),
      item('Venus', REFRACTOR, 1, 15, 8),
      item('Mars', REFLECTOR, 1),
      item('Jupiter', REFRACTOR, 3),
      item('Saturn', REFLECTOR, 3),
      item('M 31', BINOCULARS, 2),
      item('NGC 869', BINOCULARS, 1),
      item('M 42', REFLECTOR, 2),
      item('M 45', BINOCULARS, 1),
      item('M 13', REFLECTOR, 2),
      item('M 57', REFLECTOR, 1),
      item('Albireo', REFRACTOR, 1),
      item(`Comet ${COMET_NAME}`, BINOCULARS, 3),
      item(BELT_ASTEROID_NAME, REFLECTOR, 1),
      item(NEAR_ASTEROID_NAME, REFLECTOR, 1),
    ],
    moon: 'dark',
    hours: { kind: 'dusk', from: 'civilDusk', offsetMinutes: 20, durationMinutes: 150, latest: '23:45' },
    weekdays: [5, 6],
    habit: { nth: 1, weekday: 6 },
  },
  {
    name: 'Moon and planets',
    items: [
      item('Moon', REFRACTOR, 3),
      item('Venus', REFRACTOR, 1, 15, 8),
      item('Mars', REFLECTOR, 1),
      item('Jupiter', REFRACTOR, 2),
      item('Saturn', REFLECTOR, 2),
      item('Mizar', REFRACTOR, 1),
    ],
    moon: 'welcome',
    hours: { kind: 'fixed', start: '20:30', end: '22:30' },
  },
  {
    name: 'Faint and far',
    items: [
      item('M 31', BINOCULARS, 1),
      item('M 51', REFLECTOR, 2),
      item('M 57', REFLECTOR, 1),
      item('M 22', REFLECTOR, 1),
      item('M 44', BINOCULARS, 1),
      item(`Comet ${COMET_NAME}`, BINOCULARS, 2),
    ],
    moon: 'dark',
    hours: { kind: 'dusk', from: 'nauticalDusk', offsetMinutes: 0, durationMinutes: 180, latest: null },
  },
];

function item(target: string, instrument: string, weight: number, leastMinutes = 30, leastAltitudeDeg = 15) {
  return { target, instrument, weight, leastMinutes, leastAltitudeDeg };
}
