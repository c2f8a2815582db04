import { type Habit, type HoursRule, type MoonWish, type Programme, type ScoreWeights } from '#nights';
import { toRad } from '#sky';
import { type Prisma } from '../database/generated/client';
import { instrumentOf } from '../instruments/instruments';
import { skyTarget, targetParts } from '../targets/targetView';
import { HoursInput, ProgrammeInput, WeekdaysInput } from './programmeInput';

export interface ProgrammeItemView {
  readonly target: string;
  readonly targetId: string;
  readonly instrument: string;
  readonly instrumentId: string;
  readonly weight: number;
  readonly leastMinutes: number;
  readonly leastAltitudeDeg: number;
}

/** A programme as it is told. */
export interface ProgrammeView {
  readonly id: string;
  readonly name: string;
  readonly items: readonly ProgrammeItemView[];
  readonly moon: MoonWish;
  readonly hours: HoursRule;
  readonly weekdays: readonly number[];
  readonly habit: Habit | null;
  readonly weights: ScoreWeights;
}

/** A programme as the search reckons with it, and the weights of its score. */
export interface NightProgramme {
  readonly id: string;
  readonly programme: Programme;
  readonly weights: ScoreWeights;
}

/** What is read with a programme. */
export const programmeParts = {
  items: { orderBy: { position: 'asc' }, include: { target: { include: targetParts }, instrument: true } },
} as const satisfies Prisma.ProgrammeInclude;

export type ProgrammeRow = Prisma.ProgrammeGetPayload<{ include: typeof programmeParts }>;

export function programmeView(row: ProgrammeRow): ProgrammeView {
  return {
    id: row.id,
    name: row.name,
    items: row.items.map(({ target, instrument, weight, leastMinutes, leastAltitudeDeg }) => ({
      target: target.name,
      targetId: target.id,
      instrument: instrument.name,
      instrumentId: instrument.id,
      weight,
      leastMinutes,
      leastAltitudeDeg,
    })),
    ...wishes(row),
    weights: weights(row),
  };
}

/** The rows as the search reckons with them. */
export function nightProgramme(row: ProgrammeRow): NightProgramme {
  const items = row.items.map(({ target, instrument, weight, leastMinutes, leastAltitudeDeg }) => ({
    target: skyTarget(target),
    weight,
    leastMinutes,
    leastAltitudeRad: toRad(leastAltitudeDeg),
    instrument: instrumentOf(instrument),
  }));
  return { id: row.id, programme: { name: row.name, items, ...wishes(row) }, weights: weights(row) };
}

function wishes(row: Prisma.ProgrammeModel) {
  const { habitNth: nth, habitWeekday: weekday } = row;
  const { moon, habit } = ProgrammeInput.shape;
  return {
    moon: moon.parse(row.moon),
    hours: HoursInput.parse(JSON.parse(row.hoursText)),
    weekdays: WeekdaysInput.parse(JSON.parse(row.weekdaysText)),
    habit: habit.parse(nth === null ? null : { nth, weekday }),
  };
}

function weights(row: Prisma.ProgrammeModel): ScoreWeights {
  return {
    programme: row.programmePoints,
    darkness: row.darknessPoints,
    height: row.heightPoints,
    moon: row.moonPoints,
  };
}
