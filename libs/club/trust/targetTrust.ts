import { type Database } from '../database/openDatabase';
import { checked } from '../input/checked';
import { date } from '../input/fields';
import { getEvent } from '../events/events';
import { type EventView } from '../events/eventView';
import { perturbing } from '../sky/perturbing';
import { orbitRow, targetRow } from '../targets/targetRows';
import { orbitTargetOf, type TargetRow } from '../targets/targetView';
import { type BodyTrust, bodyTrust, type TrustedBody } from './bodyTrust';
import { z } from 'zod';

const MS_PER_DAY = 86_400_000;

/** The evening for which a target's trust is asked. */
export const TrustInput = z.strictObject({ date });

export type TrustInput = z.input<typeof TrustInput>;

/**
 * How far the place of a target on an orbit (id or name) can be trusted on the evening of a date, by the
 * elements in use: at the end of that day in UTC, for an hour more or less is nothing to it.
 */
export async function targetTrust(
  database: Database,
  target: string,
  request: TrustInput,
): Promise<BodyTrust> {
  const { date: evening } = checked(TrustInput, request);
  return bodyTrust(trustedBody(await orbitRow(database, target)), Date.parse(evening) + MS_PER_DAY);
}

/**
 * The same for each comet and asteroid of an event's evening, at the moment it is shown best, or in the middle of
 * the event where it is not shown.
 */
export async function eventTrust(database: Database, eventId: string): Promise<readonly BodyTrust[]> {
  return trustOfEvent(database, await getEvent(database, eventId));
}

/** `eventTrust` of an event that has been read already. */
export async function trustOfEvent(database: Database, event: EventView): Promise<readonly BodyTrust[]> {
  const perturbed = perturbing();
  const middle = (Date.parse(event.startsAt) + Date.parse(event.endsAt)) / 2;
  const trusts: BodyTrust[] = [];
  const kinds = await database.client.target.findMany({
    where: { kind: 'orbit', name: { in: event.evening.showings.map(({ target }) => target) } },
    select: { name: true },
  });
  for (const { target, best } of event.evening.showings) {
    if (!kinds.some(({ name }) => name === target)) continue;
    const body = trustedBody(await targetRow(database, target));
    trusts.push(bodyTrust(body, best?.utcMs ?? middle, undefined, perturbed));
  }
  return trusts;
}

function trustedBody(row: TargetRow): TrustedBody {
  const [set] = row.elementSets;
  if (set === undefined) {
    throw new Error(`Target ${row.id} (${row.name}) of the database has no element set.`);
  }
  return {
    target: orbitTargetOf(row, set),
    kind: set.bodyKind === 'comet' ? 'comet' : 'asteroid',
    designation: set.designation,
    source: set.source,
    observed: null,
    epochTtJd: set.epochTtJd,
  };
}
