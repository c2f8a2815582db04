import { changedInputs, type Imprint, revisionOf, SHEET_NAMES, type SheetName } from '#print';
import { z } from 'zod';
import { type Database } from '../database/openDatabase';
import { checked } from '../input/checked';
import { imprintAsText, imprintFromText } from './keptPacket';
import { packetFacts } from './packetFacts';
import { PacketInput } from './packetInput';
import { type PacketTask, type PreviewSheet } from './packetDrawing';
import { drawInWorker, type PacketWatch, previewInWorker } from './packetPool';

/** A packet as it is sent or saved. */
export interface PrintedPacket {
  readonly contentType: 'application/pdf';
  readonly body: Buffer;
  readonly fileName: string;
  readonly revision: string;
  readonly sheets: number;
}

/**
 * Prints sheets of an event and keeps what they were computed from. Printing again with unchanged inputs gives
 * the same bytes. A ClubProblem where the event is unknown or a wish is none.
 */
export async function printPacket(
  database: Database,
  input: PacketInput,
  watch: PacketWatch = {},
): Promise<PrintedPacket> {
  const { facts, wishes, computedMs } = await packetTask(database, input);
  const { imprint, event } = facts;
  const revision = revisionOf(imprint);
  const { body, sheets } = await drawInWorker({ facts, wishes, computedMs }, watch);
  await database.client.$transaction(async (tx) => {
    const key = { eventId: event.id, revision };
    const packet = await tx.packet.upsert({
      where: { eventId_revision: key },
      create: { ...key, imprintText: imprintAsText(imprint), computedAt: new Date(computedMs) },
      update: {},
    });
    const number = (await tx.packetPrinting.count({ where: { packetId: packet.id } })) + 1;
    await tx.packetPrinting.create({
      data: {
        packetId: packet.id,
        number,
        at: database.now(),
        paper: wishes.paper,
        sheetsText: JSON.stringify(wishes.sheets),
      },
    });
  });
  return {
    contentType: 'application/pdf',
    body,
    fileName: `${event.date}-${event.site.name.replace(/[^\p{L}\p{N}]+/gu, '-')}-${revision}.pdf`,
    revision,
    sheets,
  };
}

/** The same sheets for the screen, as SVG; nothing is kept. */
export async function previewPacket(
  database: Database,
  input: PacketInput,
  watch: PacketWatch = {},
): Promise<readonly PreviewSheet[]> {
  return previewInWorker(await packetTask(database, input), watch);
}

/** A packet's facts and wishes; it counts as computed when these facts were first printed, or now. */
async function packetTask(database: Database, input: PacketInput): Promise<PacketTask> {
  const wishes = checked(PacketInput, input);
  const { leastLookMinutes, breaks } = wishes;
  const facts = await packetFacts(database, wishes.eventId, { leastLookMinutes, breaks });
  const key = { eventId: facts.event.id, revision: revisionOf(facts.imprint) };
  const earlier = await database.client.packet.findUnique({ where: { eventId_revision: key } });
  return { facts, wishes, computedMs: (earlier?.computedAt ?? database.now()).getTime() };
}

/** What was printed for an event, and whether it still holds. */
export interface PacketView {
  readonly revision: string;
  readonly computedAt: string;
  readonly imprint: Imprint;
  readonly printings: readonly {
    readonly at: string;
    readonly paper: string;
    readonly sheets: readonly SheetName[];
  }[];
  /** What has changed since, in words; empty: it is still right. */
  readonly changed: readonly string[];
}

/** The packets of an event, latest first. */
export async function listPackets(database: Database, eventId: string): Promise<readonly PacketView[]> {
  const rows = await database.client.packet.findMany({
    where: { eventId },
    include: { printings: { orderBy: { number: 'asc' } } },
    orderBy: [{ computedAt: 'desc' }, { revision: 'asc' }],
  });
  const views: PacketView[] = [];
  for (const { revision, computedAt, imprintText, printings } of rows) {
    const imprint = imprintFromText(imprintText);
    const now = await packetFacts(database, eventId, imprint.running);
    views.push({
      revision,
      computedAt: computedAt.toISOString(),
      imprint,
      printings: printings.map(({ at, paper, sheetsText }) => ({
        at: at.toISOString(),
        paper,
        sheets: z.array(z.enum(SHEET_NAMES)).parse(JSON.parse(sheetsText)),
      })),
      changed: changedInputs(imprint, now.imprint),
    });
  }
  return views;
}
