import { ChartProblem, type ChartScale } from '#charts';
import {
  drawPacket,
  type FinderOrder,
  type PacketContent,
  packetSheets,
  renderSheetSvg,
  type SheetName,
} from '#print';
import { chartScene } from '../charts/chartFor';
import { ClubProblem } from '../clubProblem';
import { observerAt, packetContent } from './packetContent';
import { type PacketFacts } from './packetFacts';
import { type PacketWishes } from './packetInput';

/** What a worker needs to draw a packet. */
export interface PacketTask {
  readonly facts: PacketFacts;
  readonly wishes: PacketWishes;
  readonly computedMs: number;
}

/** Draws a packet as PDF; the same task gives the same bytes. `onSheet` hears of each sheet that is done. */
export async function drawPacketPdf(
  { facts, wishes, computedMs }: PacketTask,
  onSheet: (done: number, count: number) => void = () => undefined,
): Promise<{ readonly body: Buffer; readonly sheets: number }> {
  const content = packetContent(facts, wishes, computedMs);
  const { count, sheets } = packetSheets(content, wishes.sheets, finderOrders(content, facts, wishes));
  const body = await drawPacket(
    sheets,
    {
      title: `${content.event.title}, packet ${content.revision}`,
      subject: `Sheets for the public evening of ${content.event.date} at ${content.site.name}`,
      computedMs,
    },
    (done) => {
      onSheet(done, count);
    },
  );
  return { body, sheets: count };
}

/** A sheet of a packet as it shows on screen. */
export interface PreviewSheet {
  readonly name: SheetName;
  readonly title: string;
  readonly svg: string;
}

/** The same sheets as SVG, the same in geometry as the PDF. */
export function drawPacketSvg(
  { facts, wishes, computedMs }: PacketTask,
  onSheet: (done: number, count: number) => void = () => undefined,
): PreviewSheet[] {
  const content = packetContent(facts, wishes, computedMs);
  const { count, sheets } = packetSheets(content, wishes.sheets, finderOrders(content, facts, wishes));
  const drawn: PreviewSheet[] = [];
  for (const sheet of sheets) {
    drawn.push({ name: sheet.name, title: sheet.title, svg: renderSheetSvg(sheet) });
    onSheet(drawn.length, count);
  }
  return drawn;
}

const SCALE_WORDS: Readonly<Record<ChartScale, string>> = {
  eye: 'by eye',
  binocular: 'binoculars or finder',
  eyepiece: 'eyepiece',
};

/** One chart a target and scale, for the middle of the target's look. */
function finderOrders(content: PacketContent, facts: PacketFacts, wishes: PacketWishes): FinderOrder[] {
  const { site, event, imprint } = facts;
  return content.targets.flatMap(({ name, standing }) => {
    const { named } = facts.items.find(({ item }) => item.target === name)!;
    return wishes.scales.map((scale): FinderOrder => ({
      title: wishes.scales.length === 1 ? name : `${name}, ${SCALE_WORDS[scale]}`,
      target: name,
      scene: (foot) => {
        try {
          return chartScene({
            target: named,
            observer: observerAt(facts),
            zone: event.zone,
            siteName: event.title.includes(site.name) ? event.title : `${event.title} · ${site.name}`,
            utcMs: standing.utcMs,
            scale,
            fieldDeg: null,
            orientation: 'upright',
            paper: wishes.paper,
            occasion: null,
            computedUtcMs: content.computedMs,
            programVersion: imprint.programVersion,
            foot,
          });
        } catch (error) {
          // The rest of the packet is worth printing; this sheet says what is wrong.
          if (error instanceof ChartProblem || error instanceof ClubProblem) {
            return { refused: error.message };
          }
          throw error;
        }
      },
    }));
  });
}
