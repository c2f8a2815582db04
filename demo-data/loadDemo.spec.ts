import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import {
  closeDatabase,
  closeSearchPool,
  type Database,
  listElementSets,
  listEvents,
  listProgrammes,
  listSites,
  openDatabase,
  rankEvenings,
} from '#club';
import { loadDemo } from '.';
import { COMET_NAME, cometDesignation } from './orbits';

const folder = mkdtempSync(join(tmpdir(), 'duskwright-demo-'));

afterAll(async () => {
  await closeSearchPool();
  rmSync(folder, { recursive: true });
});

async function withDemo(asOf: string, look: (database: Database) => Promise<void>): Promise<void> {
  const database = await openDatabase({
    file: join(folder, `${asOf}.db`),
    now: () => new Date(`${asOf}T12:00:00Z`),
  });
  try {
    await loadDemo(database, { asOf });
    await look(database);
  } finally {
    await closeDatabase(database);
  }
}

describe('loadDemo', () => {
  it('holds what a newcomer needs to see', async () => {
    await withDemo('2026-12-01', async (database) => {
      const sites = await listSites(database);
      expect(sites.length).toBeGreaterThanOrEqual(4);
      expect(new Set(sites.map(({ zone }) => zone)).size).toBeGreaterThan(1);
      expect(new Set(sites.map(({ horizon }) => JSON.stringify(horizon))).size).toBe(sites.length);
      const [programme] = await listProgrammes(database);
      const targets = programme!.items.map(({ target }) => target);
      expect(targets).toEqual(
        expect.arrayContaining(['Moon', 'Jupiter', 'Saturn', 'M 31', `Comet ${COMET_NAME}`]),
      );
      expect(await listElementSets(database, `Comet ${COMET_NAME}`)).toHaveLength(2);
      const events = await listEvents(database);
      expect(events.map(({ status }) => status)).toEqual(['published']);
      expect(events[0]!.date > '2026-12-10' && events[0]!.date < '2027-01-16').toBe(true);
    });
  });

  // The comet and the asteroids must be in the coming season's evenings whenever the demo is first started.
  test.each(['2026-02-14', '2026-05-03', '2026-06-20', '2026-08-31', '2026-10-11'])(
    'has its small bodies in the evenings after %s',
    async (asOf) => {
      await withDemo(asOf, async (database) => {
        const { evenings } = await rankEvenings(database, {
          from: asOf,
          to: new Date(Date.parse(asOf) + 120 * 86_400_000).toISOString().slice(0, 10),
        });
        for (const name of [`Comet ${COMET_NAME}`, 'Corvane', 'Lindeth']) {
          const shown = evenings.filter(({ showings }) =>
            showings.some(({ target, shown }) => target === name && shown),
          );
          expect([name, shown.length / evenings.length > 0.15]).toEqual([name, true]);
        }
      });
    },
  );
});

describe('cometDesignation', () => {
  it('names the half-month 200 days before', () => {
    expect(cometDesignation('2026-12-01')).toBe('C/2026 J4');
    expect(cometDesignation('2027-07-25')).toBe('C/2027 A4');
  });
});
