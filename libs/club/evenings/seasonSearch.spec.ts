import { DEFAULT_WEIGHTS } from '#nights';
import { inventedProgramme, inventedSite, programmeItem, planet, galaxy } from '../../nights/fixtures';
import { searchSeason, type SeasonSearch } from './seasonSearch';
import { closeSearchPool } from './workerPool';

const search: SeasonSearch = {
  sites: [
    inventedSite({ name: 'Heath' }),
    inventedSite({
      name: 'Shore',
      latitudeDeg: 44,
      closed: [{ from: '2027-02-01', to: '2027-02-10', why: 'birds nest' }],
    }),
  ],
  programme: inventedProgramme({
    items: [programmeItem(planet('Jupiter')), programmeItem(galaxy(83.8, -5.4, 4, 40))],
    weekdays: [5, 6],
    habit: { nth: 1, weekday: 6 },
  }),
  clubDates: [{ date: '2027-01-15', name: 'annual meeting' }],
  from: '2027-01-01',
  to: '2027-03-31',
  weights: DEFAULT_WEIGHTS,
  limit: 5,
};

afterAll(closeSearchPool);

describe('searchSeason', () => {
  it('ranks every open evening, best first, and tells the closed ones', async () => {
    const ranking = await searchSeason(search);
    const { searched, rows, evenings, closed } = ranking;
    // 13 Fridays and 13 Saturdays at two sites, less one club date each and two closed evenings.
    expect(searched).toMatchObject({ sites: 2, evenings: 26 * 2 - 2 - 2, targets: 2 });
    expect(rows).toHaveLength(searched.evenings);
    expect(searched.steps).toBeGreaterThan(searched.evenings * 2 * 37);
    for (let i = 1; i < rows.length; i++) expect(rows[i - 1]!.score).toBeGreaterThanOrEqual(rows[i]!.score);
    expect(evenings).toHaveLength(5);
    evenings.forEach((evening, i) => {
      const { site, date, score, shown } = rows[i]!;
      expect(evening).toMatchObject({ site, date, score, shown });
    });
    expect(closed).toContainEqual({
      site: 'Shore',
      date: '2027-02-05',
      why: 'The site is closed: birds nest.',
    });
    expect(closed).toContainEqual({
      site: 'Heath',
      date: '2027-01-15',
      why: 'The club already holds: annual meeting.',
    });
    expect(closed.some(({ date }) => rows.some((row) => row.date === date && row.site === 'Heath'))).toBe(
      closed.some(({ site, date }) => site === 'Shore' && date.startsWith('2027-02')),
    );
  });

  it('scores the habit beside the free choice', async () => {
    const { habit, rows } = await searchSeason(search);
    expect(habit!.words).toBe('first Saturday of the month');
    expect(habit!.evenings.map(({ month }) => month)).toEqual(['2027-01', '2027-02', '2027-03']);
    expect(habit!.evenings.map((month) => month.habit?.date)).toEqual([
      '2027-01-02',
      '2027-02-06',
      '2027-03-06',
    ]);
    for (const { month, habit: custom, free } of habit!.evenings) {
      const scores = rows.filter(({ date }) => date.startsWith(month)).map(({ score }) => score);
      expect(free.score).toBe(Math.max(...scores));
      expect(custom!.score).toBeLessThanOrEqual(free.score);
    }
    expect(habit!.freeAverageScore).toBeGreaterThanOrEqual(habit!.averageScore);
  });

  it('reports progress that rises to the whole', async () => {
    const seen: [number, number][] = [];
    const { searched } = await searchSeason(search, {
      onProgress: (done, total) => {
        seen.push([done, total]);
      },
    });
    expect(seen[0]).toEqual([0, searched.evenings]);
    expect(seen.at(-1)).toEqual([searched.evenings, searched.evenings]);
    seen.reduce((before, now) => {
      expect(now[0]).toBeGreaterThanOrEqual(before[0]);
      return now;
    });
  });

  it('stops when cancelled, before and on the way', async () => {
    await expect(searchSeason(search, { signal: AbortSignal.abort() })).rejects.toThrow(/abort/i);
    const cancel = new AbortController();
    const running = searchSeason(
      { ...search, to: '2031-12-31', programme: { ...search.programme, weekdays: [] } },
      {
        signal: cancel.signal,
        onProgress: (done) => {
          if (done > 0) cancel.abort();
        },
      },
    );
    await expect(running).rejects.toThrow(/abort/i);
  });
});
