import { drawScene, type Face } from '#charts';
import PDFDocument from 'pdfkit';
import { fontOf, MM_PER_PT } from './lettering';
import { type Ink, type PacketSheet, type Part, type SheetName, type TextSheet } from './sheet';

const PT_PER_MM = 1 / MM_PER_PT;

export interface PacketTitle {
  readonly title: string;
  readonly subject: string;
  /** Stands in the file as its date: the same for each printing of the same packet. */
  readonly computedMs: number;
}

/** Bookmarks that gather several sheets under one line. */
const GATHERED: Readonly<Partial<Record<SheetName, string>>> = {
  finder: 'Finder charts',
  station: 'Stations',
};

/**
 * Draws the sheets as one tagged PDF with bookmarks, greys only, fonts embedded. The same sheets and title give
 * the same bytes. `onSheet` hears of each sheet that is done.
 */
export function drawPacket(
  sheets: Iterable<PacketSheet>,
  title: PacketTitle,
  onSheet: (done: number) => void = () => undefined,
): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const date = new Date(title.computedMs);
    const document = new PDFDocument({
      autoFirstPage: false,
      // Else PDFKit loads Helvetica, which no sheet uses.
      font: '',
      pdfVersion: '1.7',
      tagged: true,
      lang: 'en',
      displayTitle: true,
      info: { Title: title.title, Subject: title.subject, CreationDate: date, ModDate: date },
    });
    const chunks: Buffer[] = [];
    document.on('data', (chunk: Buffer) => chunks.push(chunk));
    document.on('end', () => {
      resolve(Buffer.concat(chunks));
    });
    document.on('error', reject);
    const root = document.struct('Document', { title: title.title });
    document.addStructure(root);
    const bookmark = bookmarker(document);
    let done = 0;
    for (const sheet of sheets) {
      if (sheet.kind === 'chart') drawScene(document, sheet.scene, root);
      else drawText(document, sheet, root);
      if (!sheet.continued) bookmark(sheet);
      done += 1;
      onSheet(done);
    }
    root.end();
    document.end();
  });
}

/** Adds a bookmark to the page just drawn; neighbours of a gathered kind share a line above them. */
function bookmarker(document: PDFKit.PDFDocument): (sheet: PacketSheet) => void {
  let parent: PDFKit.PDFOutline | null = null;
  let name: SheetName | null = null;
  return (sheet) => {
    const gathered = GATHERED[sheet.name];
    if (gathered === undefined) {
      document.outline.addItem(sheet.title);
    } else {
      if (name !== sheet.name || parent === null) parent = document.outline.addItem(gathered);
      parent.addItem(sheet.title);
    }
    name = sheet.name;
  };
}

function drawText(document: PDFKit.PDFDocument, sheet: TextSheet, root: PDFKit.PDFStructureElement): void {
  document.addPage({ size: [sheet.widthMm * PT_PER_MM, sheet.heightMm * PT_PER_MM], margin: 0 });
  document.markContent('Artifact', { type: 'Layout' });
  for (const ink of sheet.ornaments) drawInk(document, ink);
  document.endMarkedContent();
  const section = document.struct('Sect', { title: sheet.title });
  root.add(section);
  for (const part of sheet.parts) addPart(document, section, part);
  section.end();
}

function addPart(
  document: PDFKit.PDFDocument,
  within: PDFKit.PDFStructureElement,
  { tag, alt, scope, ink, parts }: Part,
): void {
  const options = {
    ...(alt !== undefined && { alt }),
    ...(scope !== undefined && { scope }),
  };
  if (parts.length === 0) {
    within.add(
      document.struct(tag, options, () => {
        for (const one of ink) drawInk(document, one);
      }),
    );
    return;
  }
  const element = document.struct(tag, options);
  within.add(element);
  if (ink.length > 0) {
    element.add(() => {
      for (const one of ink) drawInk(document, one);
    });
  }
  for (const part of parts) addPart(document, element, part);
  element.end();
}

function drawInk(document: PDFKit.PDFDocument, ink: Ink): void {
  switch (ink.shape) {
    case 'text':
      useFace(document, ink.face);
      document
        .fontSize(ink.sizePt)
        .fillColor(grey(ink.gray))
        .text(ink.text, ink.xMm * PT_PER_MM, ink.yMm * PT_PER_MM, {
          lineBreak: false,
          baseline: 'alphabetic',
        });
      return;
    case 'line':
      trace(document, ink.points);
      document.lineWidth(ink.widthPt);
      if (ink.dashMm === undefined) document.undash();
      else document.dash(ink.dashMm.map((length) => length * PT_PER_MM) as unknown as number, {});
      document.stroke(grey(ink.gray));
      return;
    case 'area':
      trace(document, ink.points);
      document.closePath().fill(grey(ink.gray));
      return;
    case 'disc':
      document.circle(ink.xMm * PT_PER_MM, ink.yMm * PT_PER_MM, ink.radiusMm * PT_PER_MM);
      if (ink.strokePt !== null) document.undash().lineWidth(ink.strokePt);
      if (ink.fillGray !== null && ink.strokePt !== null) {
        document.fillAndStroke(grey(ink.fillGray), '#000000');
      } else if (ink.fillGray !== null) document.fill(grey(ink.fillGray));
      else document.stroke('#000000');
  }
}

function trace(document: PDFKit.PDFDocument, points: readonly (readonly [number, number])[]): void {
  points.forEach(([x, y], index) => {
    if (index === 0) document.moveTo(x * PT_PER_MM, y * PT_PER_MM);
    else document.lineTo(x * PT_PER_MM, y * PT_PER_MM);
  });
}

/** Under the names the charts use, so that both share one embedded font; PDFKit's types know only of files. */
function useFace(document: PDFKit.PDFDocument, face: Face): void {
  const name = `duskwright-${face}`;
  document.registerFont(name, fontOf(face) as unknown as Buffer);
  document.font(name);
}

function grey(gray: number): string {
  const level = Math.round(gray * 255)
    .toString(16)
    .padStart(2, '0');
  return `#${level}${level}${level}`;
}
