import { findDeepSky } from '#catalogue';
import { type SkyTarget } from '#sky';
import { type z } from 'zod';
import { problem } from '../clubProblem';
import { type ChangeNotice } from '../changes/changeNotice';
import { type Database } from '../database/openDatabase';
import { checked, valueInWords } from '../input/checked';
import { refuseTakenName, requireNamed } from '../input/named';
import { clubId } from '../settings/club';
import { ElementSetInput } from './elementSetInput';
import { completedSet, elementSetColumns, elementSetView, type ElementSetView } from './elementSets';
import { keepSets } from './keepSets';
import { TargetChange, TargetInput } from './targetInput';
import { orbitRow, targetNames, targetRow } from './targetRows';
import { skyTarget, targetParts, targetView, type TargetView } from './targetView';

/** Enters a target; one that moves on an orbit together with its first element set. */
export async function createTarget(database: Database, input: TargetInput): Promise<TargetView> {
  const columns = targetColumns(checked(TargetInput, input), database.now());
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    refuseTakenName(await targetNames(tx, club), columns.name, 'target');
    const now = database.now();
    return targetView(
      await tx.target.create({
        data: { clubId: club, ...columns, createdAt: now, updatedAt: now },
        include: targetParts,
      }),
    );
  });
}

/** Changes a target's name, words or coma (id or name). */
export async function updateTarget(
  database: Database,
  target: string,
  change: TargetChange,
): Promise<TargetView> {
  const { name, gloss, comaArcmin } = checked(TargetChange, change);
  return database.client.$transaction(async (tx) => {
    const all = await targetNames(tx, await clubId(tx));
    const { id, kind } = requireNamed(all, target, 'target', 'target');
    if (name !== undefined) refuseTakenName(all, name, 'target', id);
    if (comaArcmin !== undefined && kind !== 'orbit') {
      throw problem(
        'invalid',
        'comaArcmin',
        comaArcmin,
        `comaArcmin was ${valueInWords(comaArcmin)}; leave it out, only a body on an orbit has a coma.`,
      );
    }
    const data = {
      ...(name !== undefined && { name }),
      ...(gloss !== undefined && { gloss }),
      ...(comaArcmin !== undefined && { comaArcmin }),
      updatedAt: database.now(),
    };
    return targetView(await tx.target.update({ where: { id }, data, include: targetParts }));
  });
}

/** What became of newer elements: the target as it is now, the set, and what it changes in the coming evenings. */
export interface RenewedTarget {
  readonly target: TargetView;
  readonly set: ElementSetView;
  /** Null for a target that had no set before. */
  readonly change: ChangeNotice | null;
}

/**
 * Adds a newer element set to a target on an orbit (id or name); the older ones are kept. A set that cannot be
 * followed to the coming evenings is refused.
 */
export async function addElementSet(
  database: Database,
  target: string,
  input: ElementSetInput,
): Promise<RenewedTarget> {
  const fields = checked(ElementSetInput, input);
  const row = await orbitRow(database, target);
  const { sets, change } = await keepSets(database, row, [
    elementSetColumns(completedSet(fields, row.name, ''), fields.source),
  ]);
  return { target: await getTarget(database, row.id), set: sets[0]!, change };
}

/** Every element set of a target (id or name), newest first. */
export async function listElementSets(
  database: Database,
  target: string,
): Promise<readonly ElementSetView[]> {
  const { client } = database;
  const { id } = requireNamed(await targetNames(client, await clubId(client)), target, 'target', 'target');
  const rows = await client.elementSet.findMany({ where: { targetId: id }, orderBy: { number: 'desc' } });
  return rows.map(elementSetView);
}

/** All targets, by name. */
export async function listTargets(database: Database): Promise<readonly TargetView[]> {
  const rows = await database.client.target.findMany({
    where: { clubId: await clubId(database.client) },
    include: targetParts,
    orderBy: { name: 'asc' },
  });
  return rows.map(targetView);
}

/** One target by id or name. */
export async function getTarget(database: Database, target: string): Promise<TargetView> {
  return targetView(await targetRow(database, target));
}

/** One target by id or name, as it is reckoned with. */
export async function getSkyTarget(database: Database, target: string): Promise<SkyTarget> {
  return skyTarget(await targetRow(database, target));
}

function targetColumns(fields: z.output<typeof TargetInput>, now: Date) {
  switch (fields.kind) {
    case 'solarSystem':
      return { ...fields, name: fields.name ?? fields.body };
    case 'deepSky': {
      const object = findDeepSky(fields.catalogueId);
      if (object === null) {
        throw problem(
          'invalid',
          'catalogueId',
          fields.catalogueId,
          `catalogueId was ${valueInWords(fields.catalogueId)}; give an identifier or name in the deep-sky list, ` +
            'such as M 31 or NGC 869, or enter it as a place.',
        );
      }
      const { id, gloss } = object;
      return { ...fields, catalogueId: id, name: fields.name ?? id, gloss: fields.gloss ?? gloss };
    }
    case 'place':
      return fields;
    case 'orbit': {
      const { elements, ...rest } = fields;
      const set = completedSet(elements, fields.name, 'elements');
      const first = { number: 1, receivedAt: now, ...elementSetColumns(set, elements.source) };
      return { ...rest, elementSets: { create: [first] } };
    }
  }
}
