import { completeElements, type ElementSet } from '#elements';
import { type Brightness, type OrbitalElements, toRad } from '#sky';
import { z } from 'zod';
import { type Prisma } from '../database/generated/client';
import { ClubProblem } from '../clubProblem';
import { valueInWords } from '../input/checked';
import { type ElementSetInput, jdToTtIso, ttIsoToJd } from './elementSetInput';

const givenFields = z.array(z.string());

/** One set of orbital elements as it is told; fields as `elements check` prints them. */
export interface ElementSetView {
  readonly id: string;
  /** From 1 in the order of receipt. */
  readonly number: number;
  /** ISO, UTC. */
  readonly receivedAt: string;
  readonly source: string;
  readonly designation: string;
  readonly kind: 'comet' | 'asteroid';
  /** ISO, TT; null where the set does not say. */
  readonly epoch: string | null;
  /** ISO, TT. */
  readonly perihelionTime: string;
  readonly perihelionDistanceAu: number;
  readonly eccentricity: number;
  readonly inclinationDeg: number;
  readonly nodeDeg: number;
  readonly argumentOfPerihelionDeg: number;
  readonly absoluteMagnitude: number | null;
  /** n of a comet's law, G of an asteroid's; null without a magnitude. */
  readonly slope: number | null;
  readonly given: readonly string[];
}

/**
 * The complete set that follows from what was given. Throws a ClubProblem that names the fields, below
 * `within`, where it contradicts itself, is impossible or not enough.
 */
export function completedSet(
  input: z.output<typeof ElementSetInput>,
  name: string,
  within: string,
): ElementSet {
  const { epoch, perihelionTime, ...values } = input;
  const { set, problems } = completeElements({
    ...values,
    name,
    epochTtJd: epoch === null || epoch === undefined ? null : ttIsoToJd(epoch),
    perihelionTtJd:
      perihelionTime === null || perihelionTime === undefined ? null : ttIsoToJd(perihelionTime),
  });
  const errors = problems.filter(({ severity }) => severity === 'error');
  if (set !== null && errors.length === 0) return set;
  throw new ClubProblem(
    'invalid',
    errors.map(({ field, message }) => {
      const path = [within, field ?? ''].filter((step) => step !== '').join('.');
      const value = field === null ? null : ((input as Readonly<Record<string, unknown>>)[field] ?? null);
      const was = value === null ? '' : ` was ${valueInWords(value)}`;
      return { field: path, value, message: path === '' ? message : `${path}${was}: ${message}` };
    }),
  );
}

/** A complete set as a row, without its owner, number and time of receipt. */
export function elementSetColumns(set: ElementSet, source: string) {
  return {
    source,
    designation: set.designation,
    bodyKind: set.kind,
    epochTtJd: set.epochTtJd,
    perihelionTtJd: set.perihelionTtJd,
    perihelionDistanceAu: set.perihelionDistanceAu,
    eccentricity: set.eccentricity,
    inclinationDeg: set.inclinationDeg,
    nodeDeg: set.nodeDeg,
    argumentOfPerihelionDeg: set.argumentOfPerihelionDeg,
    ...brightnessColumns(set.brightness),
    givenText: JSON.stringify(set.given),
  };
}

export function elementSetView(row: Prisma.ElementSetModel): ElementSetView {
  return {
    id: row.id,
    number: row.number,
    receivedAt: row.receivedAt.toISOString(),
    source: row.source,
    designation: row.designation,
    kind: row.bodyKind === 'comet' ? 'comet' : 'asteroid',
    epoch: row.epochTtJd === null ? null : jdToTtIso(row.epochTtJd),
    perihelionTime: jdToTtIso(row.perihelionTtJd),
    perihelionDistanceAu: row.perihelionDistanceAu,
    eccentricity: row.eccentricity,
    inclinationDeg: row.inclinationDeg,
    nodeDeg: row.nodeDeg,
    argumentOfPerihelionDeg: row.argumentOfPerihelionDeg,
    absoluteMagnitude: row.absoluteMagnitude,
    slope: row.activity ?? row.slope,
    given: givenFields.parse(JSON.parse(row.givenText)),
  };
}

/** The row's orbit as it is reckoned with, at full precision. */
export function orbitalElements(row: Prisma.ElementSetModel): OrbitalElements {
  return {
    perihelionDistanceAu: row.perihelionDistanceAu,
    eccentricity: row.eccentricity,
    inclinationRad: toRad(row.inclinationDeg),
    nodeRad: toRad(row.nodeDeg),
    argumentOfPerihelionRad: toRad(row.argumentOfPerihelionDeg),
    perihelionTtJd: row.perihelionTtJd,
    epochTtJd: row.epochTtJd,
  };
}

/** The row's magnitude law; null where its brightness is unknown. */
export function brightness(row: Prisma.ElementSetModel): Brightness | null {
  const { absoluteMagnitude, activity, slope } = row;
  if (absoluteMagnitude === null) return null;
  if (activity !== null) return { kind: 'comet', absoluteMagnitude, activity };
  return slope === null ? null : { kind: 'asteroid', absoluteMagnitude, slope };
}

function brightnessColumns(law: Brightness | null) {
  return {
    absoluteMagnitude: law?.absoluteMagnitude ?? null,
    activity: law?.kind === 'comet' ? law.activity : null,
    slope: law?.kind === 'asteroid' ? law.slope : null,
  };
}
