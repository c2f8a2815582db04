import { findDeepSky } from '#catalogue';
import { type OrbitTarget, SOLAR_BODIES, type SkyTarget, type SolarBody, toRad } from '#sky';
import { type Prisma } from '../database/generated/client';
import { brightness, elementSetView, type ElementSetView, orbitalElements } from './elementSets';

interface TargetBase {
  readonly id: string;
  readonly name: string;
  /** One plain sentence for visitors; may be empty. */
  readonly gloss: string;
}

/** A target as it is told. */
export type TargetView = TargetBase &
  (
    | { readonly kind: 'solarSystem'; readonly body: SolarBody }
    | {
        readonly kind: 'deepSky';
        readonly catalogueId: string;
        /** What people call it, such as 'Andromeda Galaxy'; null where it has only numbers. */
        readonly commonName: string | null;
      }
    | {
        readonly kind: 'place';
        readonly raDeg: number;
        readonly decDeg: number;
        readonly magnitude: number;
        readonly majorArcmin: number;
        readonly minorArcmin: number;
      }
    | {
        readonly kind: 'orbit';
        readonly comaArcmin: number;
        /** The set in use: the one received last. */
        readonly elements: ElementSetView;
        /** How many sets have been received in all. */
        readonly elementSets: number;
      }
  );

/** What is read with a target: its newest element set. */
export const targetParts = {
  elementSets: { orderBy: { number: 'desc' }, take: 1 },
} as const satisfies Prisma.TargetInclude;

export type TargetRow = Prisma.TargetGetPayload<{ include: typeof targetParts }>;

export function targetView(row: TargetRow): TargetView {
  const { id, name, gloss } = row;
  const base = { id, name, gloss };
  switch (row.kind) {
    case 'solarSystem':
      return { ...base, kind: 'solarSystem', body: solarBody(row) };
    case 'deepSky':
      return {
        ...base,
        kind: 'deepSky',
        catalogueId: row.catalogueId!,
        commonName: commonName(row.catalogueId!),
      };
    case 'place':
      return {
        ...base,
        kind: 'place',
        raDeg: row.raDeg!,
        decDeg: row.decDeg!,
        magnitude: row.magnitude!,
        majorArcmin: row.majorArcmin!,
        minorArcmin: row.minorArcmin!,
      };
    case 'orbit': {
      const newest = newestSet(row);
      const elements = elementSetView(newest);
      return {
        ...base,
        kind: 'orbit',
        comaArcmin: row.comaArcmin ?? 0,
        elements,
        elementSets: newest.number,
      };
    }
    default:
      throw unreadable(row, `kind "${row.kind}"`);
  }
}

/** The target as it is reckoned with. */
export function skyTarget(row: TargetRow): SkyTarget {
  const { name } = row;
  switch (row.kind) {
    case 'solarSystem':
      return { kind: 'solarSystem', name, body: solarBody(row) };
    case 'deepSky': {
      const object = findDeepSky(row.catalogueId!);
      if (object === null) throw unreadable(row, `catalogue entry "${String(row.catalogueId)}"`);
      const { raDeg, decDeg, magnitude, majorArcmin, minorArcmin } = object;
      return {
        kind: 'fixed',
        name,
        raRad: toRad(raDeg),
        decRad: toRad(decDeg),
        magnitude,
        majorArcmin,
        minorArcmin,
      };
    }
    case 'place':
      return {
        kind: 'fixed',
        name,
        raRad: toRad(row.raDeg!),
        decRad: toRad(row.decDeg!),
        magnitude: row.magnitude!,
        majorArcmin: row.majorArcmin!,
        minorArcmin: row.minorArcmin!,
      };
    case 'orbit':
      return orbitTargetOf(row, newestSet(row));
    default:
      throw unreadable(row, `kind "${row.kind}"`);
  }
}

/** A target on an orbit as one of its element sets moves it. */
export function orbitTargetOf(
  { name, comaArcmin }: Pick<TargetRow, 'name' | 'comaArcmin'>,
  set: Prisma.ElementSetModel,
): OrbitTarget {
  return {
    kind: 'orbit',
    name,
    elements: orbitalElements(set),
    brightness: brightness(set),
    comaArcmin: comaArcmin ?? 0,
  };
}

/** The first of its names that is not a catalogue number. */
function commonName(catalogueId: string): string | null {
  const names = findDeepSky(catalogueId)?.otherNames ?? [];
  return names.find((name) => !/\d/.test(name)) ?? null;
}

function solarBody(row: TargetRow): SolarBody {
  const body = SOLAR_BODIES.find((name) => name === row.body);
  if (body === undefined) throw unreadable(row, `body "${String(row.body)}"`);
  return body;
}

function newestSet(row: TargetRow): Prisma.ElementSetModel {
  const [set] = row.elementSets;
  if (set === undefined) throw unreadable(row, 'no element set');
  return set;
}

function unreadable(row: TargetRow, what: string): Error {
  return new Error(
    `Target ${row.id} (${row.name}) of the database has ${what}, which this version cannot read.`,
  );
}
