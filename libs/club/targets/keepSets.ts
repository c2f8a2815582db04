import { randomUUID } from 'node:crypto';
import { type ChangeNotice } from '../changes/changeNotice';
import { noticeOfNewSet } from '../changes/elementChanges';
import { problem } from '../clubProblem';
import { type Database } from '../database/openDatabase';
import { type elementSetColumns, elementSetView, type ElementSetView } from './elementSets';
import { type TargetRow } from './targetView';

type SetColumns = ReturnType<typeof elementSetColumns>;

/** Sets that were kept, and what the last of them changes beside the one that was in use. */
export interface KeptSets {
  readonly sets: readonly ElementSetView[];
  readonly change: ChangeNotice | null;
}

/**
 * Keeps newer element sets of a target in the order given, all or none; the last is then in use. What it changes
 * is worked out first, so that a set which cannot be followed to the coming evenings is never kept.
 */
export async function keepSets(
  database: Database,
  target: TargetRow,
  columns: readonly SetColumns[],
): Promise<KeptSets> {
  const newest = target.elementSets[0]?.number ?? 0;
  const receivedAt = database.now();
  const rows = columns.map((set, i) => ({
    id: randomUUID(),
    targetId: target.id,
    number: newest + 1 + i,
    receivedAt,
    ...set,
  }));
  const last = rows.at(-1);
  const change = last === undefined ? null : await noticeOfNewSet(database, target, last);
  await database.client.$transaction(async (tx) => {
    const inUse = await tx.elementSet.count({ where: { targetId: target.id } });
    if (inUse !== newest) {
      const why = 'Other elements of it came in at the same moment; look at them, then send these again.';
      throw problem('conflict', 'target', target.name, `${target.name} was not changed. ${why}`);
    }
    await tx.elementSet.createMany({ data: rows });
  });
  return { sets: rows.map(elementSetView), change };
}
