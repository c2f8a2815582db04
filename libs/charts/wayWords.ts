import { namedStars, type Star, type StarCatalogue } from '#catalogue';
import { compassPoint } from '#sky';
import { type LocalSky, positionAngle } from './horizon';
import { coordinateWords, declinationWords, fieldWords } from './instrument';
import { type Landmark, separationOf, surroundingsRad } from './landmarks';
import { starKey } from './labelWords';
import type { SkyPoint } from './projection';
import type { ChartTarget, ChartView } from './request';
import { circleReadings } from './settingCircles';
import type { Hop, Way } from './way';

const degree = Math.PI / 180;

/** The way in words, for someone with a finder in one hand: one line a step, numbered as on the chart. */
export interface WayText {
  readonly heading: string;
  readonly steps: readonly string[];
  /** What stands in for steps, or follows them. */
  readonly notes: readonly string[];
}

export interface WayScene {
  readonly stars: StarCatalogue;
  readonly target: ChartTarget;
  readonly finderFieldRad: number;
  readonly view: ChartView | null;
  readonly sky: LocalSky | null;
  readonly isHidden: (place: SkyPoint) => boolean;
}

/** Puts a way into words. */
export function wayText(way: Way, scene: WayScene): WayText {
  const { target, finderFieldRad } = scene;
  const finder = fieldWords(finderFieldRad / degree);
  const heading = `The way to ${target.name}`;
  if (way.kind === 'plain') {
    return {
      heading,
      steps: [],
      notes: [
        `Bright enough to point at: magnitude ${magnitudeWords(target.magnitude ?? 0)}${whereWords(target, scene)}.`,
      ],
    };
  }
  if (way.kind === 'none') {
    return {
      heading,
      steps: [],
      notes: [
        `No good way from star to star with a ${finder} finder: too few stars stand out here. Set the mount by its circles.`,
        ...circleWords(scene),
      ],
    };
  }
  return {
    heading: `${heading}, with a finder that shows ${finder}`,
    steps: way.hops.map((hop, index) => hopWords(hop, index === 0, scene)),
    notes: [],
  };
}

/** "Circles at 23:30: hour angle 1h 12m west, Dec +36° 25′; altitude 62°, azimuth 143°." None without a view. */
export function circleWords({ target, view, sky }: Pick<WayScene, 'target' | 'view' | 'sky'>): string[] {
  if (view === null || sky === null) return [`${coordinateWords(target.raRad, target.decRad)} (J2000).`];
  const { hourAngleRad, decRad, altitudeRad, azimuthRad } = circleReadings(sky, view, target);
  const minutes = Math.round((Math.abs(hourAngleRad) / degree) * 4);
  const side = minutes === 0 ? '' : hourAngleRad < 0 ? ' east' : ' west';
  const hour = `${String(Math.floor(minutes / 60))}h ${String(minutes % 60).padStart(2, '0')}m${side}`;
  const when = view.clock === undefined ? '' : ` at ${view.clock}`;
  return [
    `Setting circles${when}: hour angle ${hour} of the meridian, ${declinationWords(decRad)} (of date); ` +
      `altitude ${tenths(altitudeRad)}°, azimuth ${tenths(azimuthRad)}°.`,
  ];
}

function hopWords(hop: Hop, isFirst: boolean, scene: WayScene): string {
  const from = isFirst
    ? `${nameOf(hop.from)} (magnitude ${magnitudeWords(hop.from.star.magnitude)}${whereWords(hop.from.star, scene)})`
    : nameOf(hop.from);
  const length = `${(hop.lengthRad / degree).toFixed(1)}°, ${shareWords(hop.lengthRad / scene.finderFieldRad)}`;
  const to = hop.to?.star ?? scene.target;
  const way = [turnWords(hop.from.star, to, scene), aimWords(hop, scene)].filter((part) => part !== '');
  const landing = hop.to === null ? `to ${scene.target.name}` : `to ${landingWords(hop.to)}`;
  return `From ${from} go ${length}, ${way.map((part) => `${part}, `).join('')}${landing}.`;
}

function nameOf({ star, partner }: Landmark): string {
  // Hard spaces: a designation is one word.
  if (star.label !== null) return (star.label.name ?? starKey(star.label)).replaceAll(' ', '\u00a0');
  return partner === null ? `that star` : `that pair`;
}

function landingWords({ star, partner, rivals }: Landmark): string {
  const magnitude = `magnitude\u00a0${magnitudeWords(star.magnitude)}`;
  const alone = rivals === 0 ? `, the brightest within ${fieldWords(surroundingsRad / degree)}` : '';
  if (partner !== null) {
    const apart = Math.max(1, Math.round((separationOf(star, partner) / degree) * 60));
    const pair = `${magnitude} and ${magnitudeWords(partner.magnitude)}, ${String(apart)}′ apart`;
    return star.label === null
      ? `a close pair (${pair})`
      : `${nameOf({ star, partner, rivals })}, a close pair (${pair})`;
  }
  return star.label === null
    ? `a star of ${magnitude}${alone}`
    : `${nameOf({ star, partner, rivals })} (${magnitude})${alone}`;
}

/** "; 62° high in the south" at the view's hour. */
function whereWords(place: SkyPoint, { sky }: WayScene): string {
  if (sky === null) return '';
  const { altitudeRad, azimuthRad } = sky.altAz(place);
  return `, ${String(Math.round(altitudeRad / degree))}° high in the ${compassPoint(azimuthRad, 8).word}`;
}

/** Above this left and right mean little: one leans back and any side may be up. */
const besidePole = 80 * degree;
const nearOverhead = 72 * degree;
const turns = [
  'up',
  'up and left',
  'left',
  'down and left',
  'down',
  'down and right',
  'right',
  'up and right',
] as const;

/** Which way to go: as one stands facing there, or by the sky's own north where that would mislead. */
function turnWords(from: SkyPoint, to: SkyPoint, { sky }: WayScene): string {
  const heading = positionAngle(from, to);
  const eighth = (angle: number): number => ((Math.round(angle / (Math.PI / 4)) % 8) + 8) % 8;
  const side = `to the ${compassPoint(heading, 8).word}`;
  if (sky === null || sky.altAz(from).altitudeRad > nearOverhead) return side;
  const turn = turns[eighth(heading - positionAngle(from, sky.zenith))]!;
  // Beside a pole north and east change within a step.
  return Math.abs(from.decRad) > besidePole ? turn : `${turn} (${side})`;
}

const aimFaintest = 2.6;
const aimWithinRad = 6 * degree;
const aimFarthestRad = 40 * degree;

/** "towards Arcturus", where a bright star lies on the line beyond the landing. */
function aimWords({ from, to, lengthRad }: Hop, scene: WayScene): string {
  const end = to?.star ?? scene.target;
  if (to !== null && to.star.magnitude <= aimFaintest) return '';
  const heading = positionAngle(from.star, end);
  let best: { readonly star: Star; readonly cost: number } | null = null;
  for (const star of namedStars(scene.stars)) {
    if (star.magnitude > aimFaintest) break;
    const name = star.label?.name ?? null;
    if (name === null || scene.isHidden(star)) continue;
    const distance = separationOf(from.star, star);
    if (distance < 1.3 * lengthRad || distance > aimFarthestRad) continue;
    const aside = positionAngle(from.star, star) - heading;
    const off = Math.abs(Math.atan2(Math.sin(aside), Math.cos(aside)));
    if (off > aimWithinRad) continue;
    const cost = off / aimWithinRad + 0.3 * star.magnitude + distance / aimFarthestRad;
    if (best === null || cost < best.cost) best = { star, cost };
  }
  return best === null ? '' : `towards ${best.star.label!.name!}`;
}

const shares: readonly (readonly [number, string])[] = [
  [0.17, 'a sixth of a finder field'],
  [0.2, 'a fifth of a finder field'],
  [0.25, 'a quarter of a finder field'],
  [0.33, 'a third of a finder field'],
  [0.5, 'half a finder field'],
  [0.67, 'two thirds of a finder field'],
  [0.75, 'three quarters of a finder field'],
  [0.9, 'nearly a finder field'],
  [1, 'a finder field'],
];

function shareWords(share: number): string {
  if (share < 0.12) return 'a tenth of a finder field';
  let best = shares[0]!;
  for (const entry of shares) if (Math.abs(entry[0] - share) < Math.abs(best[0] - share)) best = entry;
  return best[1];
}

/** "4.3", "−1.4", never "−0.0". */
export function magnitudeWords(magnitude: number): string {
  const rounded = Math.round(magnitude * 10) / 10;
  return `${rounded < 0 ? '−' : ''}${Math.abs(rounded).toFixed(1)}`;
}

function tenths(rad: number): string {
  return (Math.round((rad / degree) * 10) / 10).toFixed(1);
}
