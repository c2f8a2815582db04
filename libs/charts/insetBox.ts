import { dotDiameterMm } from './dots';
import { fieldWords } from './instrument';
import type { DiscInset, Inset, InsetMoon, PairInset } from './inset';
import { type Disc, type LabelWish, placeLabels } from './labels';
import { spotsAround } from './labelSpots';
import { sheetAngle, type Turn } from './orientation';
import { phaseMarks } from './phase';
import type { Mark, SheetPoint, SheetText, Stroke } from './scene';
import { type PanelBox, type PanelSize, Typesetter } from './sheet';
import { textWidthMm } from './typeface';

const degree = Math.PI / 180;
const textPt = 8;
const headMm = 5;
/** A line of words at the foot, the last of which carries the scale as well. */
const footLineMm = 3.6;
const footMm = 5.2;
const edgeMm = 2.5;
const line: Stroke = { widthPt: 0.7, gray: 0 };

/** How large a box an inset takes beside the notes. */
export function insetSize(inset: Inset): PanelSize {
  if (inset.kind === 'pair') return { widthMm: 48, heightMm: 34 };
  if (inset.moons !== undefined) return { widthMm: 82, heightMm: 40 };
  if (inset.rings !== undefined) return { widthMm: 54, heightMm: 36 };
  return inset.libration === undefined ? { widthMm: 52, heightMm: 34 } : { widthMm: 50, heightMm: 46 };
}

/** What an inset is drawn for. */
export interface InsetScene {
  readonly inset: Inset;
  readonly name: string;
  /** The sheet's own turn, so that the inset shows what the instrument shows. */
  readonly turn: Turn;
  /** Local time, "23:30"; left out where none is known. */
  readonly clock: string | undefined;
}

/** The box of an inset: frame, heading, the object as the view shows it, its scale. */
export function drawInset(scene: InsetScene, box: PanelBox): { marks: Mark[]; texts: SheetText[] } {
  const text = new Typesetter();
  text.begin();
  const { xMm, yMm, widthMm, heightMm } = box;
  const marks: Mark[] = [
    {
      ...shared(scene.name),
      shape: 'polygon',
      points: [
        [xMm, yMm],
        [xMm + widthMm, yMm],
        [xMm + widthMm, yMm + heightMm],
        [xMm, yMm + heightMm],
      ],
      stroke: { widthPt: 0.5, gray: 0 },
      fillGray: null,
    },
  ];
  const { inset } = scene;
  const when = scene.clock === undefined ? '' : ` at ${scene.clock}`;
  const heading = inset.kind === 'pair' ? `${scene.name} in high power` : `${scene.name}${when}`;
  text.write('key', heading, xMm + edgeMm, yMm + 4, 'bold', textPt);
  const hasMoons = inset.kind === 'disc' && inset.moons !== undefined;
  const bottomMm = hasMoons ? footMm + footLineMm : footMm;
  const room: Room = {
    middle: [xMm + widthMm / 2, yMm + headMm + (heightMm - headMm - bottomMm) / 2],
    halfWidthMm: widthMm / 2 - edgeMm,
    halfHeightMm: (heightMm - headMm - bottomMm) / 2 - 0.8,
    footMm: yMm + heightMm - 1.7,
    leftMm: xMm + edgeMm,
    rightMm: xMm + widthMm - edgeMm,
  };
  if (inset.kind === 'pair') drawPair(marks, text, scene, inset, room);
  else drawDisc(marks, text, scene, inset, room);
  return { marks, texts: text.texts };
}

interface Room {
  readonly middle: SheetPoint;
  readonly halfWidthMm: number;
  readonly halfHeightMm: number;
  /** Baseline of the line at the foot. */
  readonly footMm: number;
  readonly leftMm: number;
  readonly rightMm: number;
}

function shared(of: string) {
  return { role: 'inset', of, layer: 'over', clipped: false } as const;
}

function drawDisc(marks: Mark[], text: Typesetter, scene: InsetScene, inset: DiscInset, room: Room): void {
  const { middle } = room;
  const { turn, name } = scene;
  const mmPerArcsec = discScale(inset, turn, room);
  const radiusMm = (inset.diameterArcsec / 2) * mmPerArcsec;
  const disc: Mark = {
    ...shared(name),
    shape: 'circle',
    xMm: middle[0],
    yMm: middle[1],
    radiusMm,
    stroke: line,
    fillGray: 1,
  };
  const bright = sheetAngle(turn, inset.brightLimbDeg * degree);
  if (inset.rings === undefined || inset.axisDeg === null) {
    marks.push(disc, ...phaseMarks(middle, radiusMm, inset.litFraction, bright, 'inset', name));
  } else {
    const { rings } = inset;
    const axis = sheetAngle(turn, inset.axisDeg * degree);
    const near = rings.showsNorth ? axis + Math.PI : axis;
    const half = (share: number, towards: number): SheetPoint[] =>
      halfEllipse(
        middle,
        (rings.majorArcsec / 2) * mmPerArcsec * share,
        (rings.minorArcsec / 2) * mmPerArcsec * share,
        towards,
      );
    // Filled without an edge and edged along its arcs only, so that the halves meet without a seam.
    const band = (towards: number): Mark[] => {
      const outer = half(1, towards);
      const inner = half(rings.innerShare, towards);
      return [
        {
          ...shared(name),
          shape: 'polygon',
          points: [...outer, ...inner.toReversed()],
          stroke: null,
          fillGray: 0.9,
        },
        ...[outer, inner].map((points): Mark => ({
          ...shared(name),
          shape: 'polyline',
          points,
          stroke: line,
          fillGray: null,
        })),
      ];
    };
    // The far half of the ring, the ball before it, the near half before that.
    marks.push(...band(near + Math.PI), disc, ...band(near));
  }
  if (inset.libration !== undefined && inset.axisDeg !== null) {
    drawMoonMarks(marks, text, inset.libration, inset.axisDeg, turn, middle, radiusMm);
  }
  const moons = inset.moons ?? [];
  if (moons.length > 0) {
    drawMoons(marks, text, moons, scene, room, mmPerArcsec, radiusMm);
    text.writeRight('key', moonWords(moons), room.rightMm, room.footMm - footLineMm, 'sans', textPt);
  }
  writeFoot(marks, text, room, mmPerArcsec, turnedWords);
}

/** Millimetres in an arcsecond: as large as lets everything in. */
function discScale(inset: DiscInset, turn: Turn, room: Room): number {
  const { halfWidthMm, halfHeightMm } = room;
  // The libration's mark and the pole's letter stand outside the limb.
  const margin = inset.libration === undefined ? 0 : 3.4;
  let scale = (Math.min(halfWidthMm, halfHeightMm) - margin) / (inset.diameterArcsec / 2);
  if (inset.rings !== undefined) scale = Math.min(scale, (halfWidthMm - 1) / (inset.rings.majorArcsec / 2));
  for (const moon of inset.moons ?? []) {
    const [right, down] = onSheet(moon, turn);
    if (right !== 0) scale = Math.min(scale, (halfWidthMm - 2) / Math.abs(right));
    if (down !== 0) scale = Math.min(scale, (halfHeightMm - 2.5) / Math.abs(down));
  }
  return scale;
}

function onSheet({ eastArcsec, northArcsec }: InsetMoon, turn: Turn): SheetPoint {
  return [turn.a * eastArcsec + turn.b * northArcsec, turn.c * eastArcsec + turn.d * northArcsec];
}

/** The moons that can be seen as dots, each with its letter beside it. */
function drawMoons(
  marks: Mark[],
  text: Typesetter,
  moons: readonly InsetMoon[],
  { turn, name }: InsetScene,
  { middle, halfWidthMm, halfHeightMm }: Room,
  mmPerArcsec: number,
  planetMm: number,
): void {
  const radiusMm = 0.5;
  const seen = moons.filter(({ state }) => state !== 'behind' && state !== 'inShadow');
  const discs = seen.map((moon): Disc => {
    const [right, down] = onSheet(moon, turn);
    return { xMm: middle[0] + right * mmPerArcsec, yMm: middle[1] + down * mmPerArcsec, radiusMm };
  });
  discs.forEach((disc, index) => {
    marks.push({
      ...shared(`${name} ${seen[index]!.letter}`),
      shape: 'circle',
      ...disc,
      stroke: null,
      fillGray: 0,
    });
  });
  const labels = placeLabels(
    seen.map(({ letter }, index): LabelWish => ({
      text: letter,
      of: letter,
      face: 'bold',
      sizePt: textPt,
      gray: 0,
      spacingPt: 0,
      mayStray: false,
      rank: index,
      owner: discs[index]!,
      spots: spotsAround(discs[index]!, 4),
    })),
    {
      frame: {
        shape: 'rectangle',
        xMm: middle[0] - halfWidthMm - 2,
        yMm: middle[1] - halfHeightMm - 1,
        widthMm: 2 * halfWidthMm + 4,
        heightMm: 2 * halfHeightMm + 2,
      },
      discs: [...discs, { xMm: middle[0], yMm: middle[1], radiusMm: planetMm }],
      walls: [],
      threads: [],
      isBarred: () => false,
    },
  );
  for (const label of labels) text.write('key', label.text, label.xMm, label.yMm, 'bold', textPt);
}

/** "I Io, G Ganymede, C Callisto; Europa is behind the planet". */
function moonWords(moons: readonly InsetMoon[]): string {
  const states = {
    behind: 'behind the planet',
    inFront: 'before the planet',
    inShadow: 'in its shadow',
  } as const;
  const clear = moons.filter(({ state }) => state === 'clear').map(({ letter, name }) => `${letter} ${name}`);
  const others = moons.flatMap(({ state, name }) => (state === 'clear' ? [] : [`${name} ${states[state]}`]));
  return [clear.join(', '), ...others].filter((part) => part !== '').join('; ');
}

const turnedWords = 'turned as the chart';

/** The pole's letter, and a mark on the limb that libration tips towards us most. */
function drawMoonMarks(
  marks: Mark[],
  text: Typesetter,
  { latitudeDeg, longitudeDeg }: NonNullable<DiscInset['libration']>,
  axisDeg: number,
  turn: Turn,
  middle: SheetPoint,
  radiusMm: number,
): void {
  const out = (positionAngleRad: number, mm: number): SheetPoint => {
    const angle = sheetAngle(turn, positionAngleRad);
    return [middle[0] + mm * Math.cos(angle), middle[1] + mm * Math.sin(angle)];
  };
  const pole = out(axisDeg * degree, radiusMm + 2);
  text.write('key', 'N', pole[0] - textWidthMm('N', 'bold', textPt) / 2, pole[1] + 1, 'bold', textPt);
  marks.push({
    ...shared('pole'),
    shape: 'polyline',
    points: [out(axisDeg * degree, radiusMm - 1.2), out(axisDeg * degree, radiusMm + 0.6)],
    stroke: line,
    fillGray: null,
  });
  // The Moon's own east lies on the sky's west.
  const favoured = axisDeg * degree - Math.atan2(longitudeDeg, latitudeDeg);
  const [x, y] = out(favoured, radiusMm + 1.6);
  marks.push({
    ...shared('libration'),
    shape: 'circle',
    xMm: x,
    yMm: y,
    radiusMm: 0.8,
    stroke: line,
    fillGray: 0,
  });
}

const roundArcsec = [1, 2, 5, 10, 20, 60, 120, 300, 600, 900];

/** A bar of a round length, then words. */
function writeFoot(marks: Mark[], text: Typesetter, room: Room, mmPerArcsec: number, words: string): void {
  const longestMm = 14;
  const arcsec = roundArcsec.findLast((value) => value * mmPerArcsec <= longestMm) ?? 1;
  const length = arcsec * mmPerArcsec;
  const y = room.footMm - 1;
  const bar = (from: SheetPoint, to: SheetPoint): Mark => ({
    ...shared('scale'),
    shape: 'polyline',
    points: [from, to],
    stroke: line,
    fillGray: null,
  });
  marks.push(bar([room.leftMm, y], [room.leftMm + length, y]));
  for (const end of [room.leftMm, room.leftMm + length]) marks.push(bar([end, y - 0.9], [end, y + 0.9]));
  const measure = arcsec < 60 ? `${String(arcsec)}″` : fieldWords(arcsec / 3600);
  text.write('key', measure, room.leftMm + length + 1, room.footMm, 'sans', textPt);
  text.writeRight('key', words, room.rightMm, room.footMm, 'sans', textPt);
}

function drawPair(marks: Mark[], text: Typesetter, scene: InsetScene, inset: PairInset, room: Room): void {
  const { middle } = room;
  const [bright, faint] = inset.magnitudes;
  const faintestShown = faint + 1.5;
  const apartMm = 13;
  const angle = sheetAngle(scene.turn, inset.positionAngleDeg * degree);
  const dot = (sign: number, magnitude: number): void => {
    marks.push({
      ...shared(scene.name),
      shape: 'circle',
      xMm: middle[0] + (sign * apartMm * Math.cos(angle)) / 2,
      yMm: middle[1] + (sign * apartMm * Math.sin(angle)) / 2,
      radiusMm: dotDiameterMm(magnitude, faintestShown),
      stroke: null,
      fillGray: 0,
    });
  };
  dot(-1, bright);
  dot(1, faint);
  const length = inset.separationArcsec;
  const measure = `${length < 10 ? length.toFixed(1) : length.toFixed(0)}″ apart, position angle ${inset.positionAngleDeg.toFixed(0)}°`;
  text.write('key', measure, room.leftMm, room.footMm, 'sans', textPt);
}

/** Half an ellipse about a middle, bulging towards an angle of the sheet. */
function halfEllipse(middle: SheetPoint, major: number, minor: number, towards: number): SheetPoint[] {
  const steps = 40;
  return Array.from({ length: steps + 1 }, (_, step) => {
    const turn = -Math.PI / 2 + (Math.PI * step) / steps;
    const out = minor * Math.cos(turn);
    const aside = major * Math.sin(turn);
    return [
      middle[0] + out * Math.cos(towards) - aside * Math.sin(towards),
      middle[1] + out * Math.sin(towards) + aside * Math.cos(towards),
    ] as const;
  });
}
