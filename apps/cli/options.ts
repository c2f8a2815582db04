import { type Observer, toRad } from '#sky';
import { IANAZone } from 'luxon';
import tzLookup from 'tz-lookup';
import { BadInput } from './badInput';

/** A place on the command line. */
export interface PlaceOption {
  readonly observer: Observer;
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
}

/** LAT,LON[,ELEVATION_M] in decimal degrees, east positive, and metres. */
export function parsePlace(text: string): PlaceOption {
  const parts = text.split(',').map((part) => (part.trim() === '' ? NaN : Number(part)));
  const [latitudeDeg = NaN, longitudeDeg = NaN, elevationM = 0] = parts;
  if (parts.length < 2 || parts.length > 3 || parts.some(Number.isNaN)) {
    throw new BadInput(
      'site',
      `--site was "${text}"; give LAT,LON or LAT,LON,ELEVATION_M as numbers, such as 47.1,8.2,600.`,
    );
  }
  const within = (name: string, value: number, low: number, high: number, unit: string) => {
    if (value >= low && value <= high) return;
    throw new BadInput('site', `--site has the ${name} ${value}; give ${unit} from ${low} to ${high}.`);
  };
  within('latitude', latitudeDeg, -90, 90, 'degrees');
  within('longitude', longitudeDeg, -180, 180, 'degrees, east positive,');
  within('elevation', elevationM, -430, 6500, 'metres');
  return {
    observer: { latitudeRad: toRad(latitudeDeg), longitudeRad: toRad(longitudeDeg), elevationM },
    latitudeDeg,
    longitudeDeg,
  };
}

/** An ISO 8601 instant with an offset or Z as UTC milliseconds. */
export function parseInstant(text: string): number {
  const match = /^(\d{4}-\d{2}-\d{2})T\d{2}:\d{2}(:\d{2}(\.\d+)?)?(Z|[+-]\d{2}:?\d{2})$/.exec(text);
  const utcMs = match === null ? NaN : Date.parse(text);
  if (Number.isNaN(utcMs) || !isDate(match![1]!)) {
    throw new BadInput(
      'at',
      `--at was "${text}"; give an instant that exists with its offset, such as 2027-03-01T20:00:00Z.`,
    );
  }
  return utcMs;
}

/** A calendar date 'YYYY-MM-DD' that exists. */
export function parseDate(option: string, text: string): string {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text) || !isDate(text)) {
    throw new BadInput(option, `--${option} was "${text}"; give a date that exists, as YYYY-MM-DD.`);
  }
  return text;
}

/** The zone named, which must exist, or else that of the place. */
export function zoneOf(zone: string | undefined, place: PlaceOption): string {
  if (zone === undefined) return tzLookup(place.latitudeDeg, place.longitudeDeg);
  if (!IANAZone.isValidZone(zone)) {
    throw new BadInput(
      'zone',
      `--zone was "${zone}"; give the IANA name of a time zone, such as Europe/Zurich.`,
    );
  }
  return zone;
}

/** A number inside bounds. */
export function parseNumber(option: string, text: string, low: number, high: number, unit: string): number {
  const value = text.trim() === '' ? NaN : Number(text);
  if (!(value >= low && value <= high)) {
    throw new BadInput(option, `--${option} was "${text}"; give ${unit} from ${low} to ${high}.`);
  }
  return value;
}

/** One of a few words. */
export function parseChoice<T extends string>(option: string, text: string, choices: readonly T[]): T {
  const found = choices.find((choice) => choice === text);
  if (found === undefined) {
    throw new BadInput(option, `--${option} was "${text}"; give ${choices.join(', ')}.`);
  }
  return found;
}

function isDate(day: string): boolean {
  const parsed = new Date(`${day}T00:00:00Z`);
  return !Number.isNaN(parsed.getTime()) && parsed.toISOString().startsWith(day);
}

/** A TT instant, ISO without an offset (a trailing Z is taken as part of TT), as a Julian date. */
export function parseTtInstant(text: string): number {
  const match = /^(\d{4}-\d{2}-\d{2})(?:T(\d{2}:\d{2}(?::\d{2}(?:\.\d+)?)?)Z?)?$/.exec(text);
  const ms = match === null ? NaN : Date.parse(`${match[1]!}T${match[2] ?? '00:00'}Z`);
  if (Number.isNaN(ms) || !isDate(match![1]!)) {
    throw new BadInput(
      'at',
      `--at was "${text}"; give a TT instant that exists, such as 2027-03-01T00:00:00.`,
    );
  }
  return ms / 86_400_000 + 2_440_587.5;
}
