import PDFDocument from 'pdfkit';
import { haloMm } from './halo';
import type { Mark, Scene, SceneText, SheetPoint, SheetText, Stroke, TextRole } from './scene';
import { type Face, fontOf, mmPerPt } from './typeface';

const pt = 1 / mmPerPt;

/**
 * The scene as a PDF of one page: tagged, titled, its fonts embedded, ink in greys only. The same scene and
 * date give the same bytes.
 */
export function renderPdf(scene: Scene, when: { readonly creationUtcMs: number }): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const date = new Date(when.creationUtcMs);
    const document = new PDFDocument({
      autoFirstPage: false,
      // Else PDFKit loads Helvetica, which no sheet uses.
      font: '',
      pdfVersion: '1.7',
      tagged: true,
      lang: scene.language,
      displayTitle: true,
      info: { Title: scene.title, Subject: scene.description, CreationDate: date, ModDate: date },
    });
    const chunks: Buffer[] = [];
    document.on('data', (chunk: Buffer) => chunks.push(chunk));
    document.on('end', () => {
      resolve(Buffer.concat(chunks));
    });
    document.on('error', reject);
    drawScene(document, scene);
    document.end();
  });
}

/**
 * Adds one page to a document and draws the scene on it; a packet calls this for each of its sheets. The sheet
 * becomes a section of `within`, the packet's own structure, or a document element of its own.
 */
export function drawScene(
  document: PDFKit.PDFDocument,
  scene: Scene,
  within?: PDFKit.PDFStructureElement,
): void {
  document.addPage({ size: [scene.widthMm * pt, scene.heightMm * pt], margin: 0 });
  const root = within ?? document.struct('Document', { title: scene.title });
  if (within === undefined) document.addStructure(root);
  const sheet = document.struct('Sect', { title: scene.title });
  root.add(sheet);
  for (const role of ['title', 'subtitle', 'instrument'] as const) {
    addParagraphs(document, sheet, scene, role);
  }
  sheet.add(
    document.struct('Figure', { alt: scene.description }, () => {
      drawChart(document, scene);
    }),
  );
  for (const role of ['key', 'step', 'caution', 'note', 'foot'] as const) {
    addParagraphs(document, sheet, scene, role);
  }
  sheet.end();
  if (within === undefined) root.end();
}

function addParagraphs(
  document: PDFKit.PDFDocument,
  sheet: PDFKit.PDFStructureElement,
  scene: Scene,
  role: TextRole,
): void {
  const paragraphs = new Map<number, SheetText[]>();
  for (const text of scene.texts) {
    if (text.role !== role) continue;
    const lines = paragraphs.get(text.paragraph);
    if (lines === undefined) paragraphs.set(text.paragraph, [text]);
    else lines.push(text);
  }
  for (const lines of paragraphs.values()) {
    sheet.add(
      document.struct(role === 'title' ? 'H1' : 'P', {}, () => {
        for (const line of lines) drawText(document, line);
      }),
    );
  }
}

/** Everything but the paragraphs: marks in their order, dots between the lower and the upper ones, labels. */
function drawChart(document: PDFKit.PDFDocument, scene: Scene): void {
  const { frame } = scene;
  document.save();
  if (frame.shape === 'circle') document.circle(frame.xMm * pt, frame.yMm * pt, frame.radiusMm * pt);
  else document.rect(frame.xMm * pt, frame.yMm * pt, frame.widthMm * pt, frame.heightMm * pt);
  document.clip();
  for (const mark of scene.marks) if (mark.clipped && mark.layer === 'under') drawMark(document, mark);
  drawStars(document, scene);
  for (const mark of scene.marks) if (mark.clipped && mark.layer === 'over') drawMark(document, mark);
  document.restore();
  for (const mark of scene.marks) if (!mark.clipped) drawMark(document, mark);
  for (const label of scene.labels) drawText(document, label);
}

function drawStars(document: PDFKit.PDFDocument, scene: Scene): void {
  let waiting = false;
  for (const star of scene.stars) {
    if (star.halo) {
      if (waiting) document.fill('#000000');
      document.circle(star.xMm * pt, star.yMm * pt, (star.radiusMm + haloMm) * pt).fill('#ffffff');
    }
    document.circle(star.xMm * pt, star.yMm * pt, star.radiusMm * pt);
    waiting = true;
  }
  if (waiting) document.fill('#000000');
}

function drawMark(document: PDFKit.PDFDocument, mark: Mark): void {
  switch (mark.shape) {
    case 'circle':
      document.circle(mark.xMm * pt, mark.yMm * pt, mark.radiusMm * pt);
      break;
    case 'ellipse':
      document.save();
      document.translate(mark.xMm * pt, mark.yMm * pt).rotate(mark.angleDeg);
      document.ellipse(0, 0, mark.semiMajorMm * pt, mark.semiMinorMm * pt);
      paint(document, mark.stroke, mark.fillGray);
      document.restore();
      return;
    case 'arc':
      drawPoints(document, arcPoints(mark.xMm, mark.yMm, mark.radiusMm, mark.fromDeg, mark.toDeg));
      break;
    case 'polyline':
      drawPoints(document, mark.points);
      break;
    case 'polygon':
      drawPoints(document, mark.points);
      document.closePath();
      break;
  }
  paint(document, mark.stroke, mark.fillGray);
}

/** An arc as short chords: at 4 degrees each they stay within 2 µm of a 3 mm ring. */
function arcPoints(xMm: number, yMm: number, radiusMm: number, fromDeg: number, toDeg: number): SheetPoint[] {
  const steps = Math.max(1, Math.ceil((toDeg - fromDeg) / 4));
  return Array.from({ length: steps + 1 }, (_, step) => {
    const angle = ((fromDeg + ((toDeg - fromDeg) * step) / steps) * Math.PI) / 180;
    return [xMm + radiusMm * Math.cos(angle), yMm + radiusMm * Math.sin(angle)];
  });
}

function drawPoints(document: PDFKit.PDFDocument, points: readonly SheetPoint[]): void {
  points.forEach(([x, y], index) => {
    if (index === 0) document.moveTo(x * pt, y * pt);
    else document.lineTo(x * pt, y * pt);
  });
}

function paint(document: PDFKit.PDFDocument, stroke: Stroke | null, fillGray: number | null): void {
  if (stroke !== null) {
    document.lineWidth(stroke.widthPt);
    if (stroke.dashMm === undefined) document.undash();
    else document.dash(stroke.dashMm.map((length) => length * pt) as unknown as number, {});
  }
  if (stroke !== null && fillGray !== null) document.fillAndStroke(grey(fillGray), grey(stroke.gray));
  else if (fillGray !== null) document.fill(grey(fillGray));
  else if (stroke !== null) document.stroke(grey(stroke.gray));
}

function grey(gray: number): string {
  const level = Math.round(gray * 255)
    .toString(16)
    .padStart(2, '0');
  return `#${level}${level}${level}`;
}

function drawText(document: PDFKit.PDFDocument, text: SceneText): void {
  useFace(document, text.face);
  document
    .fontSize(text.sizePt)
    .fillColor(grey(text.gray))
    .text(text.text, text.xMm * pt, text.yMm * pt, {
      lineBreak: false,
      baseline: 'alphabetic',
      characterSpacing: text.spacingPt,
    });
}

/** PDFKit takes an already parsed font as well as a file; its types know only of files. */
function useFace(document: PDFKit.PDFDocument, face: Face): void {
  const name = `duskwright-${face}`;
  document.registerFont(name, fontOf(face) as unknown as Buffer);
  document.font(name);
}
