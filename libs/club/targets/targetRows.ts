import { problem } from '../clubProblem';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { requireNamed } from '../input/named';
import { clubId } from '../settings/club';
import { targetParts, type TargetRow } from './targetView';

/** Ids, names and kinds of all targets, for finding one by its name. */
export function targetNames(client: Prisma.TransactionClient, club: string) {
  return client.target.findMany({
    where: { clubId: club },
    select: { id: true, name: true, kind: true },
    orderBy: { name: 'asc' },
  });
}

/** The row of a target (id or name). */
export async function targetRow({ client }: Pick<Database, 'client'>, target: string): Promise<TargetRow> {
  const { id } = requireNamed(await targetNames(client, await clubId(client)), target, 'target', 'target');
  return client.target.findUniqueOrThrow({ where: { id }, include: targetParts });
}

/** The row of a target that moves on an orbit; a ClubProblem of kind 'conflict' for any other. */
export async function orbitRow(database: Pick<Database, 'client'>, target: string): Promise<TargetRow> {
  const row = await targetRow(database, target);
  if (row.kind === 'orbit') return row;
  throw problem(
    'conflict',
    'target',
    target,
    `${row.name} does not move on an orbit; it takes no element set.`,
  );
}
