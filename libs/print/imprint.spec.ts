import fc from 'fast-check';
import { inventedImprint } from './fixtures/eveningContent';
import { changedInputs, fingerprintOf, revisionOf } from './imprint';

it('makes six unmistakable signs of an imprint', () => {
  expect(revisionOf(inventedImprint())).toMatch(/^[0-9A-HJKMNP-TV-Z]{6}$/);
});

it('is the same for the same inputs in any order of their keys', () => {
  const imprint = inventedImprint();
  const turned = Object.fromEntries(Object.entries(imprint).reverse()) as unknown as typeof imprint;
  expect(revisionOf(turned)).toBe(revisionOf(imprint));
  expect(fingerprintOf({ a: 1, b: [1, { c: 2, d: 3 }] })).toBe(
    fingerprintOf({ b: [1, { d: 3, c: 2 }], a: 1 }),
  );
  expect(fingerprintOf([1, 2])).not.toBe(fingerprintOf([2, 1]));
});

it('differs for any other input', () => {
  const revision = revisionOf(inventedImprint());
  fc.assert(
    fc.property(
      fc.constantFrom('site', 'programme', 'words', 'programVersion', 'catalogueVersion'),
      fc.string(),
      (field, value) => {
        fc.pre(value !== (inventedImprint() as unknown as Record<string, unknown>)[field]);
        expect(revisionOf(inventedImprint({ [field]: value }))).not.toBe(revision);
      },
    ),
    { seed: 3, numRuns: 200 },
  );
});

it('says in words what has changed', () => {
  const printed = inventedImprint();
  expect(changedInputs(printed, printed)).toEqual([]);
  const [set] = printed.elementSets;
  expect(
    changedInputs(printed, {
      ...printed,
      hours: { ...printed.hours, endsAt: '2027-02-06T22:40:00+01:00' },
      running: { leastLookMinutes: 10, breaks: [{ from: '20:00', to: '20:10' }] },
      elementSets: [
        { ...set!, setId: 'set-2', number: 2 },
        { ...set!, target: 'Corvane', setId: 'set-9' },
      ],
    }),
  ).toEqual([
    'Comet Thistlewood has new elements (set 2, printed from set 1)',
    'Corvane is new on the programme',
    'the public hours have changed',
    'the breaks or the shortest look have changed',
  ]);
});
