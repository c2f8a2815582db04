import { ARCSEC, axialDistances, KM_PER_AU, siderealAngle, toRad, ttMinusUtcSeconds } from '#sky';
import { expected } from './expected';

const { seconds, sidereal, places } = expected<{
  seconds: (readonly [utc: string, ttMinusUtc: number])[];
  sidereal: (readonly [utc: string, degrees: number])[];
  places: (readonly [latitude: number, metres: number, fromAxis: number, fromEquator: number])[];
}>('turning.json');

// Expected: ERFA (dat, gst06a, gd2gc); see README.md.
describe('the turning Earth', () => {
  it('has the leap seconds of ERFA from 1972 to 2031', () => {
    expect(seconds).toHaveLength(300);
    for (const [utc, expectedSeconds] of seconds) {
      expect([utc, ttMinusUtcSeconds(Date.parse(utc)).toFixed(3)]).toEqual([utc, expectedSeconds.toFixed(3)]);
    }
  });

  it('has the apparent sidereal time of ERFA to half an arcsecond', () => {
    expect(sidereal).toHaveLength(61);
    let worst = 0;
    for (const [utc, degrees] of sidereal) {
      const turn = Math.sin((siderealAngle(Date.parse(utc)) - toRad(degrees)) / 2);
      worst = Math.max(worst, (2 * Math.abs(turn)) / ARCSEC);
    }
    expect(worst).toBeLessThan(0.5);
  });

  it('has the shape of WGS84 to a centimetre', () => {
    expect(places).toHaveLength(26);
    for (const [latitude, metres, fromAxis, fromEquator] of places) {
      const found = axialDistances({ latitudeRad: toRad(latitude), longitudeRad: 0, elevationM: metres });
      const kmToM = 1000 * KM_PER_AU;
      expect(Math.abs(found.fromAxis * kmToM - fromAxis)).toBeLessThan(0.01);
      expect(Math.abs(found.fromEquator * kmToM - fromEquator)).toBeLessThan(0.01);
    }
  });
});
