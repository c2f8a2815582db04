import { type ChartWords } from '#charts';
import { compassPoint, HOUR, type Place, toDeg, utcMsToTtJd } from '#sky';
import { DateTime } from 'luxon';
import { type ChartOrder } from './chartFor';
import { lookNote } from './lookNote';
import { motionNote } from './motionNote';

/** The words round a chart: for what, where and when it holds, and from what it was computed. */
export function chartWords(order: ChartOrder, seen: Place, catalogueVersion: string): ChartWords {
  const local = DateTime.fromMillis(order.utcMs, { zone: order.zone, locale: 'en-GB' });
  const when = `${local.toFormat('cccc d LLLL yyyy, HH:mm')} ${local.toFormat('ZZZZ')} (${order.zone})`;
  return {
    title: titleOf(order),
    subtitle: [order.occasion, order.siteName, when].filter((part) => part !== null).join(' · '),
    notes: [
      placeNote(seen),
      [...brightnessNote(order, seen), ...lookNote(order, seen), ...motionNote(order)].join(' '),
      ...elementsNote(order),
    ].filter((note) => note !== ''),
    cautions: cautions(seen),
    foot:
      order.foot ??
      `Duskwright ${order.programVersion} · star catalogue ${catalogueVersion} · computed ${DateTime.fromMillis(order.computedUtcMs, { zone: 'utc' }).toFormat("yyyy-LL-dd HH:mm 'UTC'")}`,
  };
}

function titleOf({ target }: ChartOrder): string {
  const { deepSky, sky } = target;
  const [other] = deepSky?.otherNames.filter((name) => !/^(NGC|IC|M) \d/.test(name)) ?? [];
  return other === undefined ? sky.name : `${sky.name}, ${other.replaceAll("'", '’')}`;
}

function placeNote({ astrometric, horizontal }: Place): string {
  const where = `RA ${rightAscension(astrometric.raRad)}, Dec ${declination(astrometric.decRad)} (J2000)`;
  if (horizontal === null) return `${where}.`;
  const altitude = Math.round(toDeg(horizontal.altitudeRad));
  return altitude < 0
    ? `${where}; below the horizon at this hour.`
    : `${where}; ${altitude}° high in the ${compassPoint(horizontal.azimuthRad, 16).letters}.`;
}

function brightnessNote({ target }: ChartOrder, { magnitude, magnitudeRange }: Place): string[] {
  if (magnitude === null) return [];
  if (target.kind === 'comet' && magnitudeRange !== null) {
    const [bright, faint] = magnitudeRange.map(signed);
    return [`Total magnitude about ${signed(magnitude)}; comets often run ${bright!} to ${faint!}.`];
  }
  return [`Magnitude ${signed(magnitude)}.`];
}

function elementsNote({ target, utcMs }: ChartOrder): string[] {
  const set = target.origin;
  if (set === null) return [];
  const source = set.source === '' ? '' : `, ${set.source}`;
  if (set.epochTtJd === null) return [`Orbital elements without an epoch${source}.`];
  const epoch = DateTime.fromMillis((set.epochTtJd - 2_440_587.5) * 86_400_000, { zone: 'utc' });
  const age = Math.round(utcMsToTtJd(utcMs) - set.epochTtJd);
  return [
    `Orbital elements of epoch ${epoch.toFormat('yyyy-LL-dd')}${source}, ${Math.abs(age)} days ${age < 0 ? 'after' : 'before'} this chart’s hour; ${motionWords(target)}.`,
  ];
}

function cautions({ elongationRad }: Place): string[] {
  const general =
    'Let eyes adapt; red light only. Lasers only where local law allows, never towards aircraft, vehicles or people.';
  return toDeg(elongationRad) < 30
    ? ['This target stands near the Sun: begin only after sunset, end before sunrise.', general]
    : [general];
}

/** "16h 41.7m" */
function rightAscension(rad: number): string {
  const tenths = Math.round((rad / HOUR) * 600) % 14_400;
  return `${Math.floor(tenths / 600)}h ${((tenths % 600) / 10).toFixed(1).padStart(4, '0')}m`;
}

/** "+36° 28′" */
function declination(rad: number): string {
  const minutes = Math.round(Math.abs(toDeg(rad)) * 60);
  return `${rad < 0 ? '−' : '+'}${Math.floor(minutes / 60)}° ${String(minutes % 60).padStart(2, '0')}′`;
}

/** "8.3", "−2.5". */
function signed(value: number): string {
  return value.toFixed(1).replace('-', '−');
}

/** By what law a body was moved from its elements' epoch. */
function motionWords({ sky }: ChartOrder['target']): string {
  return sky.kind === 'orbit' && sky.motion !== undefined
    ? 'moved on under the planets’ pull'
    : 'two-body motion';
}
