import { findDeepSky } from '#catalogue';
import { type ChartScale, type Orientation, type Paper } from '#charts';
import { toRad } from '#sky';
import { type Database } from '../database/openDatabase';
import { getEvent } from '../events/events';
import { type EventView } from '../events/eventView';
import { programVersion } from '../programVersion';
import { problem } from '../clubProblem';
import { getSite } from '../sites/sites';
import { type ElementsOrigin, movedTarget, type NamedTarget } from '../sky/namedTarget';
import { ttIsoToJd } from '../targets/elementSetInput';
import { getSkyTarget, getTarget } from '../targets/targets';
import { type TargetView } from '../targets/targetView';
import { type ChartOrder, chartScene, drawChart, type DrawnChart } from './chartFor';

/** The finder chart of a programme target for an event. */
export interface EventChartRequest {
  readonly eventId: string;
  /** Name of a target of the event's programme. */
  readonly target: string;
  readonly scale: ChartScale;
  readonly format: 'pdf' | 'svg';
  readonly paper?: Paper | undefined;
  readonly fieldDeg?: number | undefined;
  readonly orientation?: Orientation | undefined;
}

/**
 * Draws it for the moment at which the target is shown best, or for the middle of the event. Throws a
 * ClubProblem of kind 'notFound' where event or target is unknown.
 */
export async function chartForEvent(database: Database, request: EventChartRequest): Promise<DrawnChart> {
  const event = await getEvent(database, request.eventId);
  const showing = event.evening.showings.find(({ target }) => target === request.target);
  if (showing === undefined) {
    const names = event.evening.showings.map(({ target }) => target).join(', ');
    throw problem(
      'notFound',
      'target',
      request.target,
      `target was ${JSON.stringify(request.target)}; give a target of the event's programme: ${names}.`,
    );
  }
  const site = await getSite(database, event.site.id);
  const utcMs = showing.best?.utcMs ?? middleOf(event);
  const order: ChartOrder = {
    target: await clubTarget(database, request.target, utcMs),
    observer: {
      latitudeRad: toRad(site.latitudeDeg),
      longitudeRad: toRad(site.longitudeDeg),
      elevationM: site.elevationM,
    },
    zone: event.zone,
    siteName: site.name,
    utcMs,
    scale: request.scale,
    fieldDeg: request.fieldDeg ?? null,
    orientation: request.orientation ?? 'upright',
    paper: request.paper ?? 'a4',
    skyline: site.horizon,
    publicHours: { startUtcMs: Date.parse(event.startsAt), endUtcMs: Date.parse(event.endsAt) },
    occasion: event.title,
    computedUtcMs: database.now().getTime(),
    programVersion: programVersion(),
  };
  return drawChart(chartScene(order), order, request.format);
}

/** A target of the club with all that is known of it, its motion followed to around a UTC instant. */
export async function clubTarget(database: Database, name: string, utcMs: number): Promise<NamedTarget> {
  const view = await getTarget(database, name);
  const sky = await getSkyTarget(database, name);
  const deepSky = view.kind === 'deepSky' ? findDeepSky(view.catalogueId) : null;
  const target = { sky, kind: kindOf(view, deepSky?.kind ?? 'asterism'), deepSky, origin: originOf(view) };
  return movedTarget(target, utcMs);
}

function kindOf(view: TargetView, deepSkyKind: NamedTarget['kind']): NamedTarget['kind'] {
  if (view.kind === 'solarSystem') {
    return view.body === 'Moon' || view.body === 'Sun' ? view.body : 'planet';
  }
  return view.kind === 'orbit' ? view.elements.kind : deepSkyKind;
}

function originOf(view: TargetView): ElementsOrigin | null {
  if (view.kind !== 'orbit') return null;
  const { epoch, source } = view.elements;
  return { epochTtJd: epoch === null ? null : ttIsoToJd(epoch), source };
}

function middleOf({ startsAt, endsAt }: EventView): number {
  return (Date.parse(startsAt) + Date.parse(endsAt)) / 2;
}
