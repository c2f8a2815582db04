import { type z } from 'zod';
import { ClubProblem, type FieldProblem } from '../clubProblem';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { checked, valueInWords } from '../input/checked';
import { findNamed, refuseTakenName, requireNamed } from '../input/named';
import { clubId } from '../settings/club';
import { ProgrammeInput } from './programmeInput';
import {
  nightProgramme,
  type NightProgramme,
  programmeParts,
  programmeView,
  type ProgrammeView,
} from './programmeView';

/** Enters a programme; its items name targets and instruments that the club has. */
export async function createProgramme(database: Database, input: ProgrammeInput): Promise<ProgrammeView> {
  const fields = checked(ProgrammeInput, input);
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    refuseTakenName(await names(tx, club), fields.name, 'programme');
    const now = database.now();
    const items = await itemRows(tx, club, fields.items);
    const position = await tx.programme.count({ where: { clubId: club } });
    const row = await tx.programme.create({
      data: {
        clubId: club,
        position,
        ...columns(fields),
        items: { create: items },
        createdAt: now,
        updatedAt: now,
      },
      include: programmeParts,
    });
    return programmeView(row);
  });
}

/** Changes the given fields of a programme (id or name) and leaves the others; items are replaced whole. */
export async function updateProgramme(
  database: Database,
  programme: string,
  change: Partial<ProgrammeInput>,
): Promise<ProgrammeView> {
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    const all = await names(tx, club);
    const { id } = requireNamed(all, programme, 'programme', 'programme');
    const kept = programmeView(
      await tx.programme.findUniqueOrThrow({ where: { id }, include: programmeParts }),
    );
    const fields = checked(ProgrammeInput, { ...asInput(kept), ...change });
    refuseTakenName(all, fields.name, 'programme', id);
    const items = await itemRows(tx, club, fields.items);
    await tx.programmeItem.deleteMany({ where: { programmeId: id } });
    const row = await tx.programme.update({
      where: { id },
      data: { ...columns(fields), items: { create: items }, updatedAt: database.now() },
      include: programmeParts,
    });
    return programmeView(row);
  });
}

/** All programmes, in the order they were entered. */
export async function listProgrammes(database: Database): Promise<readonly ProgrammeView[]> {
  const rows = await database.client.programme.findMany({
    where: { clubId: await clubId(database.client) },
    include: programmeParts,
    orderBy: [{ position: 'asc' }, { name: 'asc' }],
  });
  return rows.map(programmeView);
}

/** One programme by id or name. */
export async function getProgramme(
  database: Database,
  programme: string,
  field = 'programme',
): Promise<ProgrammeView> {
  return programmeView(await programmeRow(database, programme, field));
}

/**
 * A programme as the search reckons with it, by id or name; left out, the one entered first. `field` is how
 * the request calls it.
 */
export async function getNightProgramme(
  database: Database,
  programme?: string,
  field = 'programmeName',
): Promise<NightProgramme> {
  return nightProgramme(await programmeRow(database, programme, field));
}

async function programmeRow(database: Database, programme: string | undefined, field: string) {
  const { client } = database;
  const all = await names(client, await clubId(client));
  const { id } =
    programme === undefined ? first(all, field) : requireNamed(all, programme, 'programme', field);
  return client.programme.findUniqueOrThrow({ where: { id }, include: programmeParts });
}

function first<T>(rows: readonly T[], field: string): T {
  const [row] = rows;
  if (row !== undefined) return row;
  throw new ClubProblem('notFound', [
    { field, value: null, message: 'There is no programme yet; enter one with at least one target first.' },
  ]);
}

function names(client: Prisma.TransactionClient, club: string) {
  return client.programme.findMany({
    where: { clubId: club },
    select: { id: true, name: true },
    orderBy: [{ position: 'asc' }, { name: 'asc' }],
  });
}

type ProgrammeFields = z.output<typeof ProgrammeInput>;

function columns(fields: ProgrammeFields) {
  const { name, moon, hours, weekdays, habit, weights } = fields;
  return {
    name,
    moon,
    hoursText: JSON.stringify(hours),
    weekdaysText: JSON.stringify(weekdays),
    habitNth: habit?.nth ?? null,
    habitWeekday: habit?.weekday ?? null,
    programmePoints: weights.programme,
    darknessPoints: weights.darkness,
    heightPoints: weights.height,
    moonPoints: weights.moon,
  };
}

async function itemRows(tx: Prisma.TransactionClient, club: string, items: ProgrammeFields['items']) {
  const select = { id: true, name: true } as const;
  const targets = await tx.target.findMany({ where: { clubId: club }, select });
  const instruments = await tx.instrument.findMany({ where: { clubId: club }, select });
  const problems: FieldProblem[] = [];
  const used = new Set<string>();
  const rows = items.map(({ target, instrument, ...wishes }, position) => {
    const found = { target: findNamed(targets, target), instrument: findNamed(instruments, instrument) };
    if (found.target === undefined) problems.push(unknownItem(position, 'target', target));
    else if (used.has(found.target.id)) problems.push(twice(position, target));
    else used.add(found.target.id);
    if (found.instrument === undefined) problems.push(unknownItem(position, 'instrument', instrument));
    return {
      position,
      targetId: found.target?.id ?? '',
      instrumentId: found.instrument?.id ?? '',
      ...wishes,
    };
  });
  if (problems.length > 0) throw new ClubProblem('invalid', problems);
  return rows;
}

function unknownItem(position: number, what: 'target' | 'instrument', value: string): FieldProblem {
  const field = `items[${String(position)}].${what}`;
  return {
    field,
    value,
    message: `${field} was ${valueInWords(value)}; give the name or id of ${what === 'target' ? 'a target' : 'an instrument'} the club has.`,
  };
}

function twice(position: number, value: string): FieldProblem {
  const field = `items[${String(position)}].target`;
  return { field, value, message: `${field} was ${valueInWords(value)} once more; give each target once.` };
}

function asInput({ id: _id, items, ...rest }: ProgrammeView) {
  return {
    ...rest,
    items: items.map(({ targetId, instrumentId, weight, leastMinutes, leastAltitudeDeg }) => ({
      target: targetId,
      instrument: instrumentId,
      weight,
      leastMinutes,
      leastAltitudeDeg,
    })),
  };
}
