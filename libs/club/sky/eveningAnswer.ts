import { eveningLight } from '#darkness';
import { eveningSpan, localTimeMs, zoneClock } from '#nights';
import {
  moonAltitude,
  moonSemidiameter,
  type Observer,
  place,
  type SkyTarget,
  sunAltitude,
  toDeg,
} from '#sky';

/** The light of one evening, local noon to local noon; instants ISO UTC or null. */
export interface EveningAnswer {
  readonly date: string;
  readonly zone: string;
  readonly sunset: string | null;
  readonly civilDusk: string | null;
  readonly nauticalDusk: string | null;
  readonly astronomicalDusk: string | null;
  readonly astronomicalDawn: string | null;
  readonly nauticalDawn: string | null;
  readonly civilDawn: string | null;
  readonly sunrise: string | null;
  readonly moonrise: string | null;
  readonly moonset: string | null;
  readonly moon: {
    readonly illuminatedFraction: number;
    readonly phaseAngleDeg: number;
    readonly altitudeDegAtMidnight: number;
  };
  readonly darkMinutes: number;
}

const MOON: SkyTarget = { kind: 'solarSystem', name: 'Moon', body: 'Moon' };

/** Twilights, Moon and darkness of the evening that begins on a date, for a sea-level horizon. */
export function eveningAnswer(observer: Observer, zone: string, date: string): EveningAnswer {
  const clock = zoneClock(zone);
  const { fromMs, toMs } = eveningSpan(clock, date);
  const { darkMinutes, ...instants } = eveningLight(
    sunAltitude(observer),
    moonAltitude(observer),
    moonSemidiameter(observer),
    fromMs,
    toMs,
  );
  const moon = place(MOON, localTimeMs(clock, date, '00:00'), observer);
  const iso = (utcMs: number | null) => (utcMs === null ? null : new Date(Math.round(utcMs)).toISOString());
  return {
    date,
    zone,
    sunset: iso(instants.sunset),
    civilDusk: iso(instants.civilDusk),
    nauticalDusk: iso(instants.nauticalDusk),
    astronomicalDusk: iso(instants.astronomicalDusk),
    astronomicalDawn: iso(instants.astronomicalDawn),
    nauticalDawn: iso(instants.nauticalDawn),
    civilDawn: iso(instants.civilDawn),
    sunrise: iso(instants.sunrise),
    moonrise: iso(instants.moonrise),
    moonset: iso(instants.moonset),
    moon: {
      illuminatedFraction: moon.illuminatedFraction!,
      phaseAngleDeg: toDeg(moon.phaseAngleRad!),
      altitudeDegAtMidnight: toDeg(moon.horizontal!.altitudeRad),
    },
    darkMinutes,
  };
}
