import { findDeepSky } from '#catalogue';
import { type SkyTarget } from '#sky';
import { type z } from 'zod';
import { problem } from '../clubProblem';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { checked, valueInWords } from '../input/checked';
import { refuseTakenName, requireNamed } from '../input/named';
import { clubId } from '../settings/club';
import { ElementSetInput } from './elementSetInput';
import { completedSet, elementSetColumns, elementSetView, type ElementSetView } from './elementSets';
import { TargetChange, TargetInput } from './targetInput';
import { skyTarget, targetParts, targetView, type TargetView } from './targetView';

/** Enters a target; one that moves on an orbit together with its first element set. */
export async function createTarget(database: Database, input: TargetInput): Promise<TargetView> {
  const columns = targetColumns(checked(TargetInput, input), database.now());
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    refuseTakenName(await names(tx, club), columns.name, 'target');
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
    const all = await names(tx, await clubId(tx));
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

/** Adds a newer element set to a target on an orbit (id or name). The older ones are kept. */
export async function addElementSet(
  database: Database,
  target: string,
  input: ElementSetInput,
): Promise<ElementSetView> {
  const fields = checked(ElementSetInput, input);
  return database.client.$transaction(async (tx) => {
    const { id, kind, name } = requireNamed(await names(tx, await clubId(tx)), target, 'target', 'target');
    if (kind !== 'orbit') {
      throw problem(
        'conflict',
        'target',
        target,
        `${name} does not move on an orbit; it takes no element set.`,
      );
    }
    const set = completedSet(fields, name, '');
    const last = await tx.elementSet.findFirst({ where: { targetId: id }, orderBy: { number: 'desc' } });
    return elementSetView(
      await tx.elementSet.create({
        data: {
          targetId: id,
          number: (last?.number ?? 0) + 1,
          receivedAt: database.now(),
          ...elementSetColumns(set, fields),
        },
      }),
    );
  });
}

/** Every element set of a target (id or name), newest first. */
export async function listElementSets(
  database: Database,
  target: string,
): Promise<readonly ElementSetView[]> {
  const { client } = database;
  const { id } = requireNamed(await names(client, await clubId(client)), target, 'target', 'target');
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

async function targetRow(database: Database, target: string) {
  const { client } = database;
  const { id } = requireNamed(await names(client, await clubId(client)), target, 'target', 'target');
  return client.target.findUniqueOrThrow({ where: { id }, include: targetParts });
}

function names(client: Prisma.TransactionClient, club: string) {
  return client.target.findMany({
    where: { clubId: club },
    select: { id: true, name: true, kind: true },
    orderBy: { name: 'asc' },
  });
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
      const first = { number: 1, receivedAt: now, ...elementSetColumns(set, elements) };
      return { ...rest, elementSets: { create: [first] } };
    }
  }
}
