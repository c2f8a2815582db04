import { type Instrument } from '#darkness';
import { z } from 'zod';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { checked } from '../input/checked';
import { between, line } from '../input/fields';
import { refuseTakenName, requireNamed } from '../input/named';
import { clubId } from '../settings/club';

const POWERS_RIGHT = 'at least one magnification, each once, in rising order';

const power = between(1, 2000, 'a magnification from 1 to 2000');

/** What the public looks with. */
export const InstrumentInput = z
  .strictObject({
    name: line(120),
    kind: z.enum(['nakedEye', 'binocular', 'telescope']),
    apertureMm: between(5, 5000, 'the clear aperture in millimetres, from 5 to 5000').default(7),
    magnifications: z
      .array(power)
      .min(1, { error: POWERS_RIGHT })
      .max(20, { error: 'at most 20 magnifications' })
      .refine((powers) => powers.every((value, i) => i === 0 || value > powers[i - 1]!), {
        error: POWERS_RIGHT,
      })
      .default([1]),
    /** Eyes that look at once; left out: one for a telescope, else two. */
    eyes: z.union([z.literal(1), z.literal(2)], { error: '1 or 2' }).optional(),
    transmission: z
      .number({ error: 'the share of light that comes through, above 0 to 1' })
      .gt(0, { error: 'the share of light that comes through, above 0 to 1' })
      .max(1, { error: 'the share of light that comes through, above 0 to 1' })
      .default(0.8),
  })
  .superRefine(({ kind, apertureMm, magnifications }, context) => {
    if (kind === 'nakedEye') return;
    if (magnifications.some((value) => value <= 1)) {
      const message = `powers above 1 for a ${kind}`;
      context.addIssue({ code: 'custom', path: ['magnifications'], message });
    }
    if (apertureMm < 10) {
      const message = `the clear aperture of the ${kind} in millimetres, at least 10`;
      context.addIssue({ code: 'custom', path: ['apertureMm'], message });
    }
  });

export type InstrumentInput = z.input<typeof InstrumentInput>;

export interface InstrumentView extends Instrument {
  readonly id: string;
}

/** Enters an instrument. */
export async function createInstrument(database: Database, input: InstrumentInput): Promise<InstrumentView> {
  const fields = checked(InstrumentInput, input);
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    refuseTakenName(await names(tx, club), fields.name, 'instrument');
    const now = database.now();
    const row = await tx.instrument.create({
      data: { clubId: club, ...columns(fields), createdAt: now, updatedAt: now },
    });
    return instrumentView(row);
  });
}

/** Changes the given fields of an instrument (id or name) and leaves the others. */
export async function updateInstrument(
  database: Database,
  instrument: string,
  change: Partial<InstrumentInput>,
): Promise<InstrumentView> {
  return database.client.$transaction(async (tx) => {
    const all = await names(tx, await clubId(tx));
    const { id } = requireNamed(all, instrument, 'instrument', 'instrument');
    const kept = instrumentOf(await tx.instrument.findUniqueOrThrow({ where: { id } }));
    const fields = checked(InstrumentInput, { ...kept, ...change });
    refuseTakenName(all, fields.name, 'instrument', id);
    return instrumentView(
      await tx.instrument.update({ where: { id }, data: { ...columns(fields), updatedAt: database.now() } }),
    );
  });
}

/** All instruments, by name. */
export async function listInstruments(database: Database): Promise<readonly InstrumentView[]> {
  const rows = await database.client.instrument.findMany({
    where: { clubId: await clubId(database.client) },
    orderBy: { name: 'asc' },
  });
  return rows.map(instrumentView);
}

/** One instrument by id or name. */
export async function getInstrument(database: Database, instrument: string): Promise<InstrumentView> {
  return requireNamed(await listInstruments(database), instrument, 'instrument', 'instrument');
}

/** The row as it is told. */
function instrumentView(row: Prisma.InstrumentModel): InstrumentView {
  return { id: row.id, ...instrumentOf(row) };
}

/** The row as it is reckoned with. */
export function instrumentOf(row: Prisma.InstrumentModel): Instrument {
  const { name, apertureMm, transmission } = row;
  return {
    name,
    kind: InstrumentInput.shape.kind.parse(row.kind),
    apertureMm,
    magnifications: z.array(power).parse(JSON.parse(row.magnificationsText)),
    eyes: row.eyes === 1 ? 1 : 2,
    transmission,
  };
}

function columns(fields: z.output<typeof InstrumentInput>) {
  const { name, kind, apertureMm, magnifications, transmission } = fields;
  const eyes = fields.eyes ?? (kind === 'telescope' ? 1 : 2);
  return { name, kind, apertureMm, magnificationsText: JSON.stringify(magnifications), eyes, transmission };
}

function names(client: Prisma.TransactionClient, club: string) {
  return client.instrument.findMany({
    where: { clubId: club },
    select: { id: true, name: true },
    orderBy: { name: 'asc' },
  });
}
