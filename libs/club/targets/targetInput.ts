import { z } from 'zod';
import { between, line, prose } from '../input/fields';
import { ElementSetInput } from './elementSetInput';

const BODIES = ['Moon', 'Mercury', 'Venus', 'Mars', 'Jupiter', 'Saturn', 'Uranus', 'Neptune'] as const;

const BODY_RIGHT = `one of ${BODIES.join(', ')}; the Sun is never offered to the public through an instrument here`;

const name = line(120);
const gloss = prose(400);
const size = between(0, 1800, 'arcminutes from 0 (a point) to 1800');

/** Something in the sky that can be promised to the public. */
export const TargetInput = z.discriminatedUnion(
  'kind',
  [
    z.strictObject({
      kind: z.literal('solarSystem'),
      body: z.enum(BODIES, { error: BODY_RIGHT }),
      /** Left out: the body's own. */
      name: name.optional(),
      gloss: gloss.default(''),
    }),
    z.strictObject({
      kind: z.literal('deepSky'),
      /** An identifier or name in the deep-sky list, such as 'M 31' or 'Andromeda Galaxy'. */
      catalogueId: line(60),
      name: name.optional(),
      /** Left out: that of the list. */
      gloss: gloss.optional(),
    }),
    z.strictObject({
      kind: z.literal('place'),
      name,
      raDeg: between(0, 360, 'right ascension J2000 in degrees, from 0 to 360'),
      decDeg: between(-90, 90, 'declination J2000 in degrees, from -90 to 90'),
      magnitude: between(-5, 25, 'the total V magnitude, from -5 to 25'),
      majorArcmin: size.default(0),
      minorArcmin: size.default(0),
      gloss: gloss.default(''),
    }),
    z.strictObject({
      kind: z.literal('orbit'),
      name,
      elements: ElementSetInput,
      comaArcmin: between(0, 300, 'arcminutes from 0 (a point) to 300').default(0),
      gloss: gloss.default(''),
    }),
  ],
  { error: 'a kind: solarSystem, deepSky, place or orbit' },
);

export type TargetInput = z.input<typeof TargetInput>;

/** What may be changed of a target; another place or body is another target. */
export const TargetChange = z.strictObject({
  name: name.optional(),
  gloss: gloss.optional(),
  comaArcmin: between(0, 300, 'arcminutes from 0 (a point) to 300').optional(),
});

export type TargetChange = z.input<typeof TargetChange>;
