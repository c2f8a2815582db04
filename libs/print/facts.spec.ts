import { type PacketTarget, type TargetFacts } from './content';
import { eveningContent } from './fixtures/eveningContent';
import {
  angleWords,
  distanceWords,
  factLine,
  lightTimeWords,
  roundWords,
  spokenFacts,
  trueWidthWords,
  widthWords,
} from './facts';

const none: TargetFacts = {
  distanceKm: null,
  distanceLy: null,
  widthArcmin: null,
  widthKm: null,
  widthLy: null,
  magnitude: null,
  litShare: null,
  constellation: null,
};
const target = (change: Partial<PacketTarget>, facts: Partial<TargetFacts>): PacketTarget => ({
  ...eveningContent({ targets: 2 }).targets[1]!,
  ...change,
  facts: { ...none, ...facts },
});

it('rounds as people take numbers in', () => {
  expect([1.04, 12_742, 628_437_000, 2_536_000, 1.43e9, 0.96].map((value) => roundWords(value))).toEqual([
    '1',
    '13,000',
    '630 million',
    '2.5 million',
    '1.4 billion',
    '0.96',
  ]);
});

// Light takes 499.005 s for one astronomical unit, 149,597,870.7 km (IAU 2012 resolution B2 and the exact c),
// and 1.28 s for the mean distance of the Moon, 384,400 km.
it.each([
  [384_400, '1.3 seconds'],
  [149_597_870.7, '8 minutes'],
  [4_500_000_000, '4.2 hours'],
])('gives the light time of %d km', (distanceKm, words) => {
  expect(lightTimeWords({ ...none, distanceKm })).toBe(words);
});

it('says the distance in the unit that fits', () => {
  expect(distanceWords({ ...none, distanceKm: 384_400 })).toBe('384,000 km away');
  expect(distanceWords({ ...none, distanceLy: 2_540_000 })).toBe('2.5 million light years away');
  expect(distanceWords(none)).toBeNull();
  expect(lightTimeWords(none)).toBeNull();
});

it('compares widths with the Moon', () => {
  expect(widthWords({ ...none, widthArcmin: 190 }, false)).toBe(
    '3.2° across, 6 times as wide as the full Moon',
  );
  expect(widthWords({ ...none, widthArcmin: 62 }, false)).toBe('1° across, twice as wide as the full Moon');
  expect(widthWords({ ...none, widthArcmin: 30 }, false)).toContain('about as wide');
  expect(widthWords({ ...none, widthArcmin: 0.7 }, false)).toBe('42″ across, 1/44 as wide as the full Moon');
  expect(widthWords({ ...none, widthArcmin: 31 }, true)).toBe('31′ across');
  expect(widthWords(none, false)).toBeNull();
  expect(angleWords(1.4)).toBe('1.4′');
});

it('compares true widths with the Earth, where that helps', () => {
  expect(trueWidthWords({ ...none, widthKm: 139_822 })).toBe('140,000 km wide, 11 Earths side by side');
  expect(trueWidthWords({ ...none, widthKm: 3474 })).toBe('3,500 km wide');
  expect(trueWidthWords({ ...none, widthLy: 1.02 })).toBe('1 light year wide');
});

it('makes one sentence of what is known, and none of nothing', () => {
  const venus = target({ name: 'Venus', kind: 'planet' }, { distanceKm: 149_597_870.7, litShare: 0.61 });
  expect(factLine(venus)).toBe(
    '61% of its face is lit; 150 million km away; its light set out 8 minutes ago.',
  );
  expect(spokenFacts(venus)).toBe('150 million km away; light set out 8 minutes ago.');
  expect(spokenFacts(target({}, { distanceLy: 430 }))).toBe('Its light set out 430 years ago.');
  expect(factLine(target({}, {}))).toBe('');
});
