import { type SolarBody, toRad } from '#sky';
import { sunCautions } from './packetContent';

const observer = { latitudeRad: toRad(47.1), longitudeRad: toRad(8.2), elevationM: 600 };
const target = (body: SolarBody) => ({ kind: 'solarSystem', name: body, body }) as const;
const sunset = Date.parse('2027-02-03T16:34:00Z');

// Mercury stands at its greatest eastern elongation, 18 degrees, on 3 February 2027 (from memory).
it('tells from when a target near the Sun may be looked at', () => {
  const cautions = sunCautions(
    target('Mercury'),
    Date.parse('2027-02-03T17:10:00Z'),
    observer,
    sunset,
    'Europe/Zurich',
  );
  expect(cautions).toEqual(['It stands 18° from the Sun: point at it only after sunset at 17:34.']);
});

it('says that the Sun is still up', () => {
  const [caution] = sunCautions(
    target('Mercury'),
    Date.parse('2027-02-03T16:00:00Z'),
    observer,
    sunset,
    'Europe/Zurich',
  );
  expect(caution).toContain('which is still up then: point at it only after sunset at 17:34.');
});

it('is silent about what stands far from it', () => {
  expect(
    sunCautions(target('Jupiter'), Date.parse('2027-02-03T20:00:00Z'), observer, sunset, 'Europe/Zurich'),
  ).toEqual([]);
});
