import { CATALOGUE_VERSION, constellationFigures, deepSkyObjects, loadStars } from '#catalogue';
import {
  buildScene,
  type ChartRequest,
  type ChartScale,
  type Orientation,
  type Paper,
  renderPdf,
  renderSvg,
  type Scene,
  type SkylinePoint,
  usualFieldDeg,
} from '#charts';
import { isNearRisenSun, type Observer, type Place, place, positionAngle, type SkyTarget, toDeg } from '#sky';
import { DateTime } from 'luxon';
import { problem } from '../clubProblem';
import { movedTarget, type NamedTarget } from '../sky/namedTarget';
import { chartInset } from './chartInset';
import { chartPath, pathPoint } from './chartPath';
import { chartWords } from './chartWords';
import { clockDate, whenUp } from './whenUp';

/** A finder chart as it is asked for: what, from where, when and how. */
export interface ChartOrder {
  readonly target: NamedTarget;
  readonly observer: Observer;
  readonly zone: string;
  /** The site's name, or its coordinates in words. */
  readonly siteName: string;
  readonly utcMs: number;
  readonly scale: ChartScale;
  /** Null takes the scale's usual field. */
  readonly fieldDeg: number | null;
  readonly orientation: Orientation;
  readonly paper: Paper;
  /** The site's skyline, drawn at the foot of an eye chart; left out where none is known. */
  readonly skyline?: readonly SkylinePoint[];
  /** The public hours, whose ends a moving target's sheet shows. */
  readonly publicHours?: { readonly startUtcMs: number; readonly endUtcMs: number };
  /** Width of the finder's field in degrees; left out: the usual one. */
  readonly finderFieldDeg?: number;
  /** For what it is printed, such as an event's title; null for a chart by itself. */
  readonly occasion: string | null;
  /** When it is computed, for the foot line. */
  readonly computedUtcMs: number;
  readonly programVersion: string;
  /** The foot line of a sheet of a packet; left out: the chart's own. */
  readonly foot?: string;
}

/** What a finished chart is sent or saved as. */
export interface DrawnChart {
  readonly contentType: 'application/pdf' | 'image/svg+xml';
  readonly body: Buffer;
  readonly fileName: string;
}

const SUN: SkyTarget = { kind: 'solarSystem', name: 'Sun', body: 'Sun' };

/**
 * The scene of a chart. Throws a ClubProblem where the target is the Sun or stands within 15 degrees of a Sun
 * that is up, and a ChartProblem where scale, field or paper is none.
 */
export function chartScene(given: ChartOrder): Scene {
  const order = { ...given, target: movedTarget(given.target, given.utcMs) };
  const seen = place(order.target.sky, order.utcMs, order.observer);
  refuseNearSun(order, seen);
  refuseBelowHorizon(order, seen);
  return buildScene(loadStars(), deepSkyObjects(), constellationFigures(), chartRequest(order, seen));
}

/** A chart drawn as PDF or SVG. The same order gives the same bytes. */
export async function drawChart(scene: Scene, order: ChartOrder, format: 'pdf' | 'svg'): Promise<DrawnChart> {
  const name = `${order.target.sky.name} ${order.scale} chart`.replace(/[^\p{L}\p{N}]+/gu, '-');
  return format === 'svg'
    ? { contentType: 'image/svg+xml', body: Buffer.from(renderSvg(scene)), fileName: `${name}.svg` }
    : {
        contentType: 'application/pdf',
        body: await renderPdf(scene, { creationUtcMs: order.computedUtcMs }),
        fileName: `${name}.pdf`,
      };
}

function chartRequest(order: ChartOrder, seen: Place): ChartRequest {
  const { target, observer, utcMs, scale } = order;
  const { deepSky, sky } = target;
  const fieldDeg = order.fieldDeg ?? usualFieldDeg[scale];
  const next = nextSheet(scale, fieldDeg);
  const inset = chartInset(target, seen, utcMs, observer);
  const sizeArcmin = seen.angularDiameterRad === null ? 0 : toDeg(seen.angularDiameterRad) * 60;
  return {
    scale,
    fieldDeg: order.fieldDeg,
    orientation: order.orientation,
    paper: order.paper,
    target: {
      name: sky.name,
      raRad: seen.astrometric.raRad,
      decRad: seen.astrometric.decRad,
      magnitude: seen.magnitude,
      kind: target.kind,
      majorArcmin: deepSky?.majorArcmin ?? sizeArcmin,
      minorArcmin: deepSky?.minorArcmin ?? sizeArcmin,
      positionAngleDeg: deepSky?.positionAngleDeg ?? null,
      tailDeg: target.kind === 'comet' ? tailAngleDeg(order, seen) : null,
    },
    path: chartPath(sky, observer, order.zone, utcMs, fieldDeg, sizeArcmin / 60),
    ...publicHoursOn(order),
    view: {
      utcMs,
      latitudeRad: observer.latitudeRad,
      longitudeRad: observer.longitudeRad,
      clock: DateTime.fromMillis(utcMs, { zone: order.zone }).toFormat('HH:mm'),
    },
    ...(next === null ? {} : { next }),
    ...(inset === null ? {} : { inset }),
    ...(order.skyline === undefined ? {} : { skyline: order.skyline }),
    ...(order.finderFieldDeg === undefined ? {} : { finderFieldDeg: order.finderFieldDeg }),
    words: chartWords(order, seen, CATALOGUE_VERSION),
  };
}

/** The narrower sheet that follows one of a scale, where its field is narrower indeed. */
function nextSheet(scale: ChartScale, fieldDeg: number): NonNullable<ChartRequest['next']> | null {
  if (scale === 'eyepiece') return null;
  const next = scale === 'eye' ? 'binocular' : 'eyepiece';
  return usualFieldDeg[next] < fieldDeg ? { scale: next, fieldDeg: usualFieldDeg[next] } : null;
}

function publicHoursOn(order: ChartOrder): Pick<ChartRequest, 'publicHours'> {
  const { publicHours, target, observer, zone } = order;
  if (publicHours === undefined || target.sky.kind === 'fixed') return {};
  return {
    publicHours: {
      opens: pathPoint(target.sky, observer, zone, publicHours.startUtcMs, 'HH:mm'),
      closes: pathPoint(target.sky, observer, zone, publicHours.endUtcMs, 'HH:mm'),
    },
  };
}

/** A comet's tail points away from the Sun: its position angle, degrees. */
function tailAngleDeg({ utcMs, observer }: ChartOrder, { astrometric }: Place): number {
  const sun = place(SUN, utcMs, observer).astrometric;
  return toDeg(positionAngle(astrometric.raRad, astrometric.decRad, sun.raRad, sun.decRad) + Math.PI) % 360;
}

/** Throws for an eye chart of a target below the level horizon, saying when it is up next. */
function refuseBelowHorizon(order: ChartOrder, seen: Place): void {
  if (order.scale !== 'eye' || seen.horizontal === null || seen.horizontal.altitudeRad >= 0) return;
  throw problem(
    'invalid',
    'at',
    new Date(order.utcMs).toISOString(),
    `at was ${clockDate(order.utcMs, order.zone)}, when ${order.target.sky.name} stands ` +
      `${toDeg(-seen.horizontal.altitudeRad).toFixed(1)} degrees below the horizon; ${whenUp(order)}.`,
  );
}

function refuseNearSun({ target, observer, utcMs }: ChartOrder, seen: Place): void {
  const isSun = target.kind === 'Sun';
  const sun = place(SUN, utcMs, observer).horizontal!;
  if (!isSun && !isNearRisenSun(seen.elongationRad, sun.altitudeRad)) return;
  throw problem(
    'invalid',
    'target',
    target.sky.name,
    isSun
      ? 'target was the Sun; no finder chart is drawn for it. Solar viewing needs certified filters and trained hands.'
      : `target was ${target.sky.name}, which stands ${toDeg(seen.elongationRad).toFixed(1)} degrees from a Sun that is up; choose a time after sunset. Never point an instrument there.`,
  );
}
