import { type Scene } from '#charts';
import { toRad } from '#sky';
import { ClubProblem } from '../clubProblem';
import { namedTarget } from '../sky/namedTarget';
import { type ChartOrder, chartScene } from './chartFor';
import { whenUp } from './whenUp';

function order(target: string, at: string, more: Partial<ChartOrder> = {}): ChartOrder {
  return {
    target: namedTarget(target),
    observer: { latitudeRad: toRad(47.1), longitudeRad: toRad(8.2), elevationM: 600 },
    zone: 'Europe/Zurich',
    siteName: 'Hollin Top',
    utcMs: Date.parse(at),
    scale: 'binocular',
    fieldDeg: null,
    orientation: 'upright',
    paper: 'a4',
    occasion: null,
    computedUtcMs: Date.parse('2026-12-01T10:00:00Z'),
    programVersion: '0.0.0',
    ...more,
  };
}

const wordsOf = (scene: Scene, ...roles: string[]): string =>
  scene.texts
    .filter(({ role }) => roles.includes(role))
    .map(({ text }) => text)
    .join(' ');

const refusal = (one: ChartOrder): string => {
  try {
    chartScene(one);
  } catch (error) {
    if (error instanceof ClubProblem) return error.message;
    throw error;
  }
  throw new Error('no refusal');
};

describe('chartScene', () => {
  it('shows the frame of the narrower sheet that follows, at both wider scales', () => {
    const frames = (['eye', 'binocular', 'eyepiece'] as const).map((scale) =>
      chartScene(order('M 13', '2027-07-01T21:30:00Z', { scale }))
        .marks.filter(({ role }) => role === 'nextFrame')
        .map(({ of }) => of),
    );
    expect(frames).toEqual([['binocular'], ['eyepiece'], []]);
  });

  it('refuses an eye chart of what is down, saying when it is up', () => {
    expect(refusal(order('M 42', '2027-07-01T21:30:00Z', { scale: 'eye' }))).toMatch(
      /^at was 1 July 2027, 23:30, when M 42 stands \d+\.\d degrees below the horizon; it rises next on 2 July 2027, 0\d:\d\d \(Europe\/Zurich\) in the E and sets on 2 July 2027, 1\d:\d\d\.$/,
    );
    expect(whenUp(order('NGC 104', '2027-07-01T21:30:00Z'))).toBe('it does not rise there on that date');
  });

  it('refuses the Sun, and what stands near it while it is up', () => {
    expect(refusal(order('Sun', '2027-07-01T12:00:00Z'))).toMatch(/no finder chart is drawn for it/);
  });

  it('says size, rings and motion of Saturn and draws it apart', () => {
    const scene = chartScene(order('Saturn', '2027-11-05T21:30:00Z', { scale: 'eyepiece' }));
    expect(wordsOf(scene, 'note')).toMatch(
      /Disc \d+″ across, 100% lit\. Rings \d+″ by \d+″, tilted \d+\.\d°: the (northern|southern) face shows\. Moves \d+″ an hour towards the west\./,
    );
    expect(scene.marks.some(({ role }) => role === 'inset')).toBe(true);
    expect(wordsOf(scene, 'step')).toMatch(/^Setting circles at 22:30: hour angle/);
  });

  it('names Jupiter’s moons by letter, and says the Moon’s phase and libration', () => {
    const jupiter = chartScene(order('Jupiter', '2027-03-01T20:00:00Z', { scale: 'eyepiece' }));
    expect(wordsOf(jupiter, 'key')).toMatch(/I Io, G Ganymede, C Callisto; Europa behind the planet/);
    const moon = chartScene(order('Moon', '2027-03-14T20:00:00Z', { scale: 'binocular' }));
    expect(wordsOf(moon, 'note')).toMatch(
      /40% lit\. Libration tips its south-western limb towards us by 7\.\d°/,
    );
    expect(moon.marks.some(({ role, shape }) => role === 'target' && shape === 'polygon')).toBe(true);
  });

  it('gives a moving target the ends of the public hours, and leads to it step by step', () => {
    const utcMs = Date.parse('2027-03-14T20:00:00Z');
    const scene = chartScene(
      order('Moon', '2027-03-14T20:00:00Z', {
        publicHours: { startUtcMs: utcMs - 7_200_000, endUtcMs: utcMs + 7_200_000 },
      }),
    );
    expect(scene.labels.map(({ text }) => text)).toEqual(
      expect.arrayContaining(['opens 19:00', 'closes 23:00']),
    );
    const globular = chartScene(order('M 13', '2027-07-01T21:30:00Z'));
    expect(wordsOf(globular, 'step')).toMatch(/^The way to M 13, with a finder that shows 6° 1 From /);
  });
});
