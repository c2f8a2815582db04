import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import {
  addElementSet,
  closeDatabase,
  closePacketPool,
  closeSearchPool,
  createClub,
  createInstrument,
  createProgramme,
  createSite,
  createTarget,
  type Database,
  makeEvent,
  openDatabase,
  printPacket,
} from '#club';
import { measurement, type Measurement, median } from './measurement';

const TARGETS = ['M 31', 'NGC 869', 'M 42', 'M 45', 'M 35', 'M 37', 'M 36', 'M 1', 'M 33', 'M 44'] as const;
const PRINTINGS = 8;

/** A whole packet for an evening with 12 targets, every kind of sheet, drawn in its worker on one core. */
export async function benchPacket(): Promise<Measurement[]> {
  const folder = mkdtempSync(join(tmpdir(), 'duskwright-bench-'));
  const database = await openDatabase({ file: join(folder, 'club.db') });
  try {
    const eventId = await eveningOfTwelve(database);
    // Its workers picked the evening; they are no part of printing.
    await closeSearchPool();
    let peak = 0;
    const onProgress = () => {
      peak = Math.max(peak, process.memoryUsage.rss() / 2 ** 20);
    };
    const times: number[] = [];
    let words = '';
    for (let i = 0; i <= PRINTINGS; i++) {
      const start = performance.now();
      const { sheets, body } = await printPacket(database, { eventId }, { onProgress });
      times.push(performance.now() - start);
      words = `${sheets} sheets, ${Math.round(body.length / 1024)} KB, ${Math.round(body.length / 1024 / sheets)} KB a sheet`;
    }
    const [first, ...warm] = times;
    return [
      measurement(
        'packet',
        median(warm),
        'ms',
        'bound',
        2500,
        `${words}; the first, its worker starting and the stars read, ${first!.toFixed(0)} ms; slowest of ${warm.length} others ${Math.max(...warm).toFixed(0)} ms`,
      ),
      measurement(
        'packet-memory',
        peak,
        'MB',
        'bound',
        400,
        'the whole process with its worker and database, the most seen after any sheet',
      ),
    ];
  } finally {
    await closePacketPool();
    await closeDatabase(database);
    rmSync(folder, { recursive: true });
  }
}

async function eveningOfTwelve(database: Database): Promise<string> {
  await createClub(database, { name: 'Bench club', publicAddress: 'https://evenings.example.org' });
  await createSite(database, {
    name: 'Invented Heath',
    latitudeDeg: 42.1,
    longitudeDeg: -7.2,
    elevationM: 600,
    sky: { magPerArcsec2: 21.4 },
    horizon: [
      { azimuthDeg: 0, altitudeDeg: 4 },
      { azimuthDeg: 180, altitudeDeg: 7.5 },
    ],
  });
  await createInstrument(database, {
    name: 'Reflector',
    kind: 'telescope',
    apertureMm: 200,
    magnifications: [40, 100],
  });
  await createInstrument(database, {
    name: 'Binoculars',
    kind: 'binocular',
    apertureMm: 50,
    magnifications: [10],
  });
  for (const catalogueId of TARGETS) await createTarget(database, { kind: 'deepSky', catalogueId });
  await createTarget(database, { kind: 'solarSystem', body: 'Jupiter' });
  const orbit = {
    kind: 'comet',
    epoch: '2027-01-09',
    perihelionTime: '2027-03-02T00:00:00',
    perihelionDistanceAu: 1.27,
    eccentricity: 1.0003,
    inclinationDeg: 61.97,
    nodeDeg: 312,
    argumentOfPerihelionDeg: 149.6,
    absoluteMagnitude: 5,
    slope: 4,
  } as const;
  await createTarget(database, { kind: 'orbit', name: 'Comet Benchmark', elements: orbit, comaArcmin: 5 });
  await addElementSet(database, 'Comet Benchmark', orbit);
  await createProgramme(database, {
    name: 'Twelve',
    items: [...TARGETS, 'Jupiter', 'Comet Benchmark'].map((target, i) => ({
      target,
      instrument: i % 2 === 0 ? 'Reflector' : 'Binoculars',
      weight: 1 + (i % 3),
      leastMinutes: 10,
      leastAltitudeDeg: 5,
    })),
    hours: { kind: 'fixed', start: '20:00', end: '23:30' },
  });
  const event = await makeEvent(database, {
    siteName: 'Invented Heath',
    programmeName: 'Twelve',
    date: '2027-01-09',
  });
  const shown = event.evening.showings.filter((showing) => showing.shown);
  if (shown.length !== 12) {
    const missing = event.evening.showings.filter((showing) => !showing.shown);
    throw new Error(`Not all are shown: ${missing.map(({ target, why }) => `${target}: ${why}`).join(' ')}`);
  }
  return event.id;
}
