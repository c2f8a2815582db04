import fc from 'fast-check';
import {
  createSkyLight,
  limitingMagnitude,
  luminanceToMag,
  magToLuminance,
  setSkyLight,
  skyLuminance,
  airmass,
} from '#darkness';
import { place, separation, fromSpherical, toDeg, toRad, type SkyTarget } from '#sky';
import {
  DUSK_HOURS,
  inventedComet,
  galaxy,
  inventedProgramme,
  inventedSite,
  inventedSkyline,
  planet,
  programmeItem,
} from './fixtures';
import { horizonAltitude, prepareHorizon } from './horizon';
import { judgeEvening } from './judge';
import { createWorkbench } from './measure';
import { DEFAULT_WEIGHTS, type Programme } from './programme';
import { type JudgedEvening } from './result';
import { localTimeMs, zoneClock } from './zoneClock';
import { prepareSeason, type Season } from './season';
import { type NightSite } from './site';
import { prepareSite } from './siteInstant';

const from = '2027-01-01';
const to = '2027-12-31';
const season = prepareSeason(inventedProgramme(), from, to);
const bench = createWorkbench();

function judge(site: NightSite, date: string, of: Season = season): JudgedEvening {
  return judgeEvening(bench, of, prepareSite(site), DEFAULT_WEIGHTS, date);
}

function withProgramme(change: Partial<Programme>): Season {
  return { ...season, programme: { ...season.programme, ...change } };
}

const dates = fc
  .integer({ min: 0, max: 364 })
  .map((day) => new Date(Date.UTC(2027, 0, 1 + day)).toISOString().slice(0, 10));
const latitudes = fc.double({ min: -69, max: 69, noNaN: true });
const sites = fc
  .record({
    latitudeDeg: latitudes,
    longitudeDeg: fc.double({ min: -10, max: 30, noNaN: true }),
    high: fc.double({ min: 0, max: 30, noNaN: true }),
  })
  .map(({ latitudeDeg, longitudeDeg, high }) =>
    inventedSite({ latitudeDeg, longitudeDeg, horizon: inventedSkyline(high) }),
  );

describe('an evening, whatever the site and date', () => {
  it('keeps the public hours inside the gate hours', () => {
    const clock = fc.integer({ min: 0, max: 95 }).map((quarter) => {
      // From noon on, so that the later of two is later in the evening as well.
      const hour = (12 + Math.floor(quarter / 4)) % 24;
      return {
        quarter,
        text: `${String(hour).padStart(2, '0')}:${String((quarter % 4) * 15).padStart(2, '0')}`,
      };
    });
    fc.assert(
      fc.property(sites, dates, clock, clock, (site, date, a, b) => {
        const [opens, closes] = a.quarter <= b.quarter ? [a, b] : [b, a];
        const gated = { ...site, gate: { opens: opens.text, closes: closes.text } };
        const { publicHours, score } = judge(gated, date);
        if (publicHours === null) {
          expect(score).toBe(0);
          return;
        }
        const clock = zoneClock(site.zone);
        expect(publicHours.startMs).toBeGreaterThanOrEqual(localTimeMs(clock, date, opens.text));
        expect(publicHours.endMs).toBeLessThanOrEqual(localTimeMs(clock, date, closes.text));
        expect(publicHours.endMs).toBeGreaterThan(publicHours.startMs);
      }),
      { numRuns: 150 },
    );
  });

  it('gives parts that sum to the score, each within what it can bring', () => {
    fc.assert(
      fc.property(sites, dates, fc.constantFrom('dark', 'welcome', 'indifferent'), (site, date, moon) => {
        const { parts, score } = judge(site, date, withProgramme({ moon: moon as Programme['moon'] }));
        expect(parts.map(({ name }) => name)).toEqual(['programme', 'darkness', 'height', 'moon']);
        expect(parts.reduce((sum, { points }) => sum + points, 0)).toBeCloseTo(score, 9);
        for (const { points, of, why } of parts) {
          expect(points).toBeGreaterThanOrEqual(0);
          expect(points).toBeLessThanOrEqual(of);
          expect(why).toMatch(/^[A-Z0-9].*\.$/);
        }
      }),
      { numRuns: 100 },
    );
  });

  it('gives showings inside the public hours, apart from each other, above the skyline and the least altitude', () => {
    fc.assert(
      fc.property(sites, dates, (site, date) => {
        const { publicHours, showings } = judge(site, date);
        const horizon = prepareHorizon(site.horizon);
        showings.forEach(({ intervals, minutes, shown, best }, i) => {
          const { target, leastAltitudeRad, leastMinutes } = season.programme.items[i]!;
          let before = publicHours?.startMs ?? 0;
          let total = 0;
          for (const { startMs, endMs } of intervals) {
            expect(startMs).toBeGreaterThanOrEqual(before);
            expect(endMs).toBeGreaterThan(startMs);
            before = endMs;
            total += endMs - startMs;
            const moments = Array.from({ length: 8 }, (_, k) => startMs + ((endMs - startMs) * k) / 7);
            for (const utcMs of moments) {
              const { altitudeRad, azimuthRad } = place(target, utcMs, site.observer).horizontal!;
              const bound = Math.max(leastAltitudeRad, horizonAltitude(horizon, azimuthRad));
              // Half an arcsecond for what a track is worth.
              expect(toDeg(altitudeRad - bound) * 3600).toBeGreaterThan(-0.5);
            }
          }
          if (intervals.length > 0) expect(before).toBeLessThanOrEqual(publicHours!.endMs);
          expect(minutes).toBeCloseTo(total / 60_000, 9);
          expect(shown).toBe(total > 0 && total / 60_000 >= leastMinutes);
          expect(best === null).toBe(intervals.length === 0);
        });
      }),
      { numRuns: 60 },
    );
  });

  it('never lengthens a showing when the skyline rises', () => {
    fc.assert(
      fc.property(
        sites,
        dates,
        fc.array(fc.double({ min: 0, max: 12, noNaN: true }), { minLength: 14, maxLength: 14 }),
        (site, date, lift) => {
          const raised = {
            ...site,
            horizon: site.horizon.map((point, i) => ({
              ...point,
              altitudeDeg: point.altitudeDeg + lift[i]!,
            })),
          };
          const low = judge(site, date).showings;
          const high = judge(raised, date).showings;
          low.forEach((showing, i) => {
            expect(high[i]!.minutes).toBeLessThanOrEqual(showing.minutes);
            for (const { startMs, endMs } of high[i]!.intervals) {
              expect(showing.intervals.some((wide) => wide.startMs <= startMs && endMs <= wide.endMs)).toBe(
                true,
              );
            }
          });
        },
      ),
      { numRuns: 100 },
    );
  });
});

describe('showing edges', () => {
  // The same rules applied second by second to places worked out one by one, without tracks or tables.
  const targets: SkyTarget[] = [
    planet('Venus'),
    planet('Saturn'),
    galaxy(10.68, 41.27, 8.9, 30),
    inventedComet('2027-04-12T00:00:00Z'),
  ];
  const programme = inventedProgramme({
    items: targets.map((target) => programmeItem(target, { leastMinutes: 1 })),
    hours: { ...DUSK_HOURS, from: 'sunset', offsetMinutes: 0, durationMinutes: 300 },
  });
  const own = prepareSeason(programme, '2027-03-01', '2027-12-01');
  const site = inventedSite();

  function isShown(index: number, utcMs: number): boolean {
    const { target, leastAltitudeRad, instrument } = programme.items[index]!;
    const seen = place(target, utcMs, site.observer);
    const { altitudeRad, azimuthRad, refractedAltitudeRad } = seen.horizontal!;
    if (altitudeRad < leastAltitudeRad) return false;
    if (altitudeRad < horizonAltitude(prepareHorizon(site.horizon), azimuthRad)) return false;
    const sun = place({ kind: 'solarSystem', name: 'Sun', body: 'Sun' }, utcMs, site.observer).horizontal!;
    const moon = place(planet('Moon'), utcMs, site.observer);
    const light = createSkyLight();
    setSkyLight(
      light,
      site.sky,
      sun.altitudeRad,
      sun.azimuthRad,
      moon.horizontal!.altitudeRad,
      moon.phaseAngleRad!,
      moon.distanceAu!,
    );
    const apart = separation(
      fromSpherical(azimuthRad, altitudeRad),
      fromSpherical(moon.horizontal!.azimuthRad, moon.horizontal!.altitudeRad),
    );
    const luminance = skyLuminance(light, Math.sin(altitudeRad), azimuthRad, Math.cos(apart));
    const size =
      target.kind === 'fixed'
        ? [target.majorArcmin, target.minorArcmin]
        : target.kind === 'orbit'
          ? [target.comaArcmin, target.comaArcmin]
          : [0, 0];
    const limit = limitingMagnitude(instrument, luminanceToMag(luminance), size[0]!, size[1]!);
    return limit >= seen.magnitude! + site.sky.extinctionMagPerAirmass * airmass(refractedAltitudeRad);
  }

  test.each(['2027-03-14', '2027-04-03', '2027-08-20', '2027-10-09', '2027-11-04'])(
    'are found to 10 s on %s',
    (date) => {
      const { publicHours, showings } = judge(site, date, own);
      let edges = 0;
      showings.forEach(({ intervals }, index) => {
        for (const { startMs, endMs } of intervals) {
          for (const [edge, outward] of [
            [startMs, -1],
            [endMs, 1],
          ] as const) {
            if (edge === publicHours!.startMs || edge === publicHours!.endMs) continue;
            edges++;
            expect(isShown(index, edge - outward * 10_000)).toBe(true);
            expect(isShown(index, edge + outward * 10_000)).toBe(false);
          }
        }
      });
      expect(edges).toBeGreaterThan(0);
    },
  );
});

describe('polar and clock-change evenings', () => {
  const north = inventedSite({ latitudeDeg: 69, longitudeDeg: 20, zone: 'Europe/Oslo' });

  it('says plainly that there is no dusk in polar summer', () => {
    const evening = judge(north, '2027-06-21');
    expect(evening).toMatchObject({ publicHours: null, score: 0, shown: 0, darkMinutes: 0 });
    expect(evening.note).toBe('There is no civil dusk on this evening.');
  });

  it('has darkness in polar night, counted from a dusk that exists', () => {
    const evening = judge(north, '2027-12-27');
    expect(evening.publicHours).not.toBeNull();
    expect(evening.darkMinutes).toBeGreaterThan(60);
  });

  it('reads fixed hours by the clock before and after both changes', () => {
    const fixed = withProgramme({ hours: { kind: 'fixed', start: '20:00', end: '01:00' } });
    const start = (date: string) =>
      new Date(judge(inventedSite(), date, fixed).publicHours!.startMs).toISOString();
    // European Union summer time 2027: 28 March and 31 October, 01:00 UTC.
    expect(start('2027-03-27')).toBe('2027-03-27T19:00:00.000Z');
    expect(start('2027-03-28')).toBe('2027-03-28T18:00:00.000Z');
    expect(start('2027-10-30')).toBe('2027-10-30T18:00:00.000Z');
    expect(start('2027-10-31')).toBe('2027-10-31T19:00:00.000Z');
    const spring = judge(
      inventedSite(),
      '2027-03-27',
      withProgramme({ hours: { kind: 'fixed', start: '23:00', end: '04:00' } }),
    );
    // Five hours on the clock, but one of them was skipped.
    expect(spring.publicHours!.endMs - spring.publicHours!.startMs).toBe(4 * 3_600_000);
    const autumn = judge(
      inventedSite(),
      '2027-10-30',
      withProgramme({ hours: { kind: 'fixed', start: '23:00', end: '04:00' } }),
    );
    expect(autumn.publicHours!.endMs - autumn.publicHours!.startMs).toBe(6 * 3_600_000);
  });
});

describe('the reasons', () => {
  it('name what is not shown and why', () => {
    const evening = judge(inventedSite(), '2027-03-22');
    const { parts, showings } = evening;
    const missing = showings.filter(({ shown }) => !shown);
    expect(missing.length).toBeGreaterThan(0);
    for (const { target } of missing) expect(parts[0]!.why).toContain(target);
    for (const { why } of showings) expect(why.length).toBeGreaterThan(20);
  });

  it('keep the sky brightness of the best moment as a magnitude', () => {
    const { showings } = judge(inventedSite(), '2027-10-01');
    const best = showings.find(({ best }) => best !== null)!.best!;
    expect(magToLuminance(best.skyBrightness)).toBeGreaterThan(0);
    expect(best.skyBrightness).toBeGreaterThan(3);
    expect(best.skyBrightness).toBeLessThan(22);
    expect(best.altitudeDeg).toBeGreaterThanOrEqual(toDeg(toRad(10)));
  });
});
