import { type EveningRow } from './search';

/** What keeping to a habit costs the club beside choosing freely. */
export interface HabitCost {
  /** "first Saturday of the month" */
  readonly words: string;
  readonly evenings: readonly HabitMonth[];
  /** Mean scores over the months in which the habit has an evening. */
  readonly averageScore: number;
  readonly freeAverageScore: number;
}

/** One month: the habit's evening at its best site, and the best evening of the month. */
export interface HabitMonth {
  readonly month: string;
  /** Null where the habit's evening is closed everywhere. */
  readonly habit: { readonly date: string; readonly site: string; readonly score: number } | null;
  readonly free: { readonly date: string; readonly site: string; readonly score: number };
}

/**
 * Scores a habit beside the free choice, month by month.
 *
 * @param ranked rows best first
 * @param dates the habit's dates
 */
export function habitCost(
  words: string,
  ranked: readonly EveningRow[],
  dates: readonly string[],
): HabitCost | null {
  const named = new Set(dates);
  const months = new Map<string, { free: EveningRow; habit: EveningRow | null }>();
  for (const row of ranked) {
    const month = row.date.slice(0, 7);
    const known = months.get(month);
    const isHabit = named.has(row.date);
    if (known === undefined) months.set(month, { free: row, habit: isHabit ? row : null });
    else if (isHabit) known.habit ??= row;
  }
  const evenings = [...months]
    .filter(([month]) => dates.some((date) => date.startsWith(month)))
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([month, { free, habit }]): HabitMonth => ({
      month,
      habit: habit && brief(habit),
      free: brief(free),
    }));
  if (evenings.length === 0) return null;
  const mean = (scores: readonly number[]) => scores.reduce((sum, score) => sum + score, 0) / scores.length;
  return {
    words,
    evenings,
    averageScore: mean(evenings.map(({ habit }) => habit?.score ?? 0)),
    freeAverageScore: mean(evenings.map(({ free }) => free.score)),
  };
}

function brief({ date, site, score }: EveningRow): { date: string; site: string; score: number } {
  return { date, site, score };
}
