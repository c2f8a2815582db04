import { haloMm } from './halo';
import type { Mark, Scene, SceneText, Stroke } from './scene';
import { type Face, mmPerPt } from './typeface';

const families: Readonly<Record<Face, string>> = {
  sans: 'font-family="Noto Sans, sans-serif"',
  bold: 'font-family="Noto Sans, sans-serif" font-weight="700"',
  serif: 'font-family="Gentium Plus, serif"',
};

/** The scene as one SVG picture in millimetres, its text real and as wide as on paper. */
export function renderSvg(scene: Scene): string {
  const { widthMm, heightMm } = scene;
  const under = scene.marks.filter((mark) => mark.layer === 'under');
  const over = scene.marks.filter((mark) => mark.layer === 'over');
  const clipped = (marks: readonly Mark[]): string =>
    marks
      .filter((mark) => mark.clipped)
      .map(svgMark)
      .join('');
  const stars = scene.stars.map((star) => {
    const at = `cx="${mm(star.xMm)}" cy="${mm(star.yMm)}"`;
    const edge = star.halo ? `<circle ${at} r="${mm(star.radiusMm + haloMm)}" fill="#fff"/>` : '';
    return `${edge}<circle ${at} r="${mm(star.radiusMm)}"/>`;
  });
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${mm(widthMm)}mm" height="${mm(heightMm)}mm"`,
    ` viewBox="0 0 ${mm(widthMm)} ${mm(heightMm)}" lang="${scene.language}" role="img" aria-labelledby="t d">`,
    `<title id="t">${escaped(scene.title)}</title><desc id="d">${escaped(scene.description)}</desc>`,
    `<defs><clipPath id="f">${frameShape(scene)}</clipPath></defs>`,
    `<rect width="${mm(widthMm)}" height="${mm(heightMm)}" fill="#fff"/>`,
    `<g clip-path="url(#f)">${clipped(under)}<g class="stars">${stars.join('')}</g>${clipped(over)}</g>`,
    [...under, ...over]
      .filter((mark) => !mark.clipped)
      .map(svgMark)
      .join(''),
    `<g class="labels">${scene.labels.map((label) => svgText(label)).join('')}</g>`,
    `<g class="texts">${scene.texts.map((text) => svgText(text)).join('')}</g>`,
    '</svg>\n',
  ].join('');
}

function frameShape({ frame }: Scene): string {
  if (frame.shape === 'circle') {
    return `<circle cx="${mm(frame.xMm)}" cy="${mm(frame.yMm)}" r="${mm(frame.radiusMm)}"/>`;
  }
  return `<rect x="${mm(frame.xMm)}" y="${mm(frame.yMm)}" width="${mm(frame.widthMm)}" height="${mm(frame.heightMm)}"/>`;
}

function svgMark(mark: Mark): string {
  const paint =
    `fill="${mark.fillGray === null ? 'none' : grey(mark.fillGray)}"` +
    (mark.stroke === null ? '' : ` ${strokeWords(mark.stroke)}`);
  switch (mark.shape) {
    case 'circle':
      return `<circle cx="${mm(mark.xMm)}" cy="${mm(mark.yMm)}" r="${mm(mark.radiusMm)}" ${paint}/>`;
    case 'ellipse':
      return (
        `<ellipse rx="${mm(mark.semiMajorMm)}" ry="${mm(mark.semiMinorMm)}" ` +
        `transform="translate(${mm(mark.xMm)} ${mm(mark.yMm)}) rotate(${mm(mark.angleDeg)})" ${paint}/>`
      );
    case 'arc': {
      const at = (angleDeg: number): string => {
        const angle = (angleDeg * Math.PI) / 180;
        return `${mm(mark.xMm + mark.radiusMm * Math.cos(angle))} ${mm(mark.yMm + mark.radiusMm * Math.sin(angle))}`;
      };
      const large = mark.toDeg - mark.fromDeg > 180 ? 1 : 0;
      const r = mm(mark.radiusMm);
      return `<path d="M${at(mark.fromDeg)}A${r} ${r} 0 ${String(large)} 1 ${at(mark.toDeg)}" ${paint}/>`;
    }
    case 'polyline':
    case 'polygon':
      return `<${mark.shape} points="${mark.points.map(([x, y]) => `${mm(x)},${mm(y)}`).join(' ')}" ${paint}/>`;
  }
}

function strokeWords(stroke: Stroke): string {
  const dash = stroke.dashMm === undefined ? '' : ` stroke-dasharray="${stroke.dashMm.map(mm).join(' ')}"`;
  return `stroke="${grey(stroke.gray)}" stroke-width="${mm(stroke.widthPt * mmPerPt)}"${dash}`;
}

function svgText(text: SceneText): string {
  const spacing = text.spacingPt === 0 ? '' : ` letter-spacing="${mm(text.spacingPt * mmPerPt)}"`;
  // Letter-spacing is added after the last letter too, in browsers.
  const length = text.widthMm + text.spacingPt * mmPerPt;
  return (
    `<text x="${mm(text.xMm)}" y="${mm(text.yMm)}" ${families[text.face]} ` +
    `font-size="${mm(text.sizePt * mmPerPt)}" fill="${grey(text.gray)}"${spacing} ` +
    `textLength="${mm(length)}" lengthAdjust="spacingAndGlyphs">${escaped(text.text)}</text>`
  );
}

/** A number to a thousandth of a millimetre, as short as can be. */
function mm(value: number): string {
  return String(Math.round(value * 1000) / 1000 + 0);
}

function grey(gray: number): string {
  const level = Math.round(gray * 255)
    .toString(16)
    .padStart(2, '0');
  return `#${level}${level}${level}`;
}

const entities: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
};

function escaped(text: string): string {
  // Control characters have no place in XML at all.

  return text
    .replaceAll(/[\u0000-\u0008\u000b\u000c\u000e-\u001f]/g, '')
    .replaceAll(/[&<>"]/g, (sign) => entities[sign]!);
}
