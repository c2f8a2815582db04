import { halfMonthDays, halfMonthProblem, orderToLetters } from './halfMonth';
import { packAsteroidNumber, packAsteroidProvisional, packComet } from './packDesignation';

/** Orbit types of the comet series. */
export type CometPrefix = 'P' | 'C' | 'D' | 'X' | 'A' | 'I';
/** The four surveys whose finds carry a running number and the survey's sign. */
export type Survey = 'P-L' | 'T-1' | 'T-2' | 'T-3';

/** The parts of a designation, as far as it has them. */
export interface DesignationParts {
  /** The series it belongs to; objects of the comet series that look like asteroids (A/) count as comets. */
  readonly kind: 'comet' | 'asteroid';
  readonly prefix: CometPrefix | null;
  /** The permanent number. */
  readonly number: number | null;
  readonly year: number | null;
  readonly halfMonth: string | null;
  /** Order in the half-month from 1: the 7 of K7; 316 for the minor planet's Q12; a survey's running number. */
  readonly order: number | null;
  /** Whether the order is written with a second letter, as minor planets and some comets (P/2016 SV) have it. */
  readonly lettered: boolean;
  readonly survey: Survey | null;
  readonly fragment: string | null;
  /** The proper name, where the text carries one. */
  readonly name: string | null;
}

/** A designation as understood, or why it is none. */
export interface Designation {
  readonly text: string;
  readonly valid: boolean;
  readonly kind: 'comet' | 'asteroid' | null;
  readonly prefix: CometPrefix | null;
  readonly number: number | null;
  readonly year: number | null;
  readonly halfMonth: string | null;
  readonly order: number | null;
  readonly survey: Survey | null;
  readonly fragment: string | null;
  readonly name: string | null;
  /** First and last day of the half-month of discovery, ISO dates. */
  readonly discoveryFrom: string | null;
  readonly discoveryTo: string | null;
  /** The Minor Planet Center's packed form; null where the published rules give none. */
  readonly packed: string | null;
  /** The way the designation is written in full, without the name. */
  readonly canonical: string | null;
  readonly problem: string | null;
}

/** Why these parts make no designation, or null where they do. */
export function partsProblem(parts: DesignationParts): string | null {
  if (parts.number === 0) return 'Permanent numbers begin at 1.';
  if (parts.halfMonth !== null) {
    const wrongHalf = halfMonthProblem(parts.halfMonth);
    if (wrongHalf !== null) return wrongHalf;
  }
  if (parts.order === 0) return 'The order in the half-month begins at 1.';
  if (parts.kind === 'asteroid' && parts.year !== null && parts.year < 1801) {
    return `The first minor planet was found in 1801, so ${parts.year} cannot be a year of discovery.`;
  }
  return null;
}

/** A valid designation from its parts. */
export function designationOf(text: string, parts: DesignationParts): Designation {
  const problem = partsProblem(parts);
  if (problem !== null) return invalidDesignation(text, problem);
  const days =
    parts.year === null || parts.halfMonth === null ? null : halfMonthDays(parts.year, parts.halfMonth);
  return {
    text,
    valid: true,
    kind: parts.kind,
    prefix: parts.prefix,
    number: parts.number,
    year: parts.year,
    halfMonth: parts.halfMonth,
    order: parts.order,
    survey: parts.survey,
    fragment: parts.fragment,
    name: parts.name,
    discoveryFrom: days?.from ?? null,
    discoveryTo: days?.to ?? null,
    packed: packed(parts),
    canonical: canonical(parts),
    problem: null,
  };
}

/** A text that is no designation, with the reason. */
export function invalidDesignation(text: string, problem: string): Designation {
  return {
    text,
    valid: false,
    kind: null,
    prefix: null,
    number: null,
    year: null,
    halfMonth: null,
    order: null,
    survey: null,
    fragment: null,
    name: null,
    discoveryFrom: null,
    discoveryTo: null,
    packed: null,
    canonical: null,
    problem,
  };
}

function canonical(parts: DesignationParts): string {
  const fragment = parts.fragment === null ? '' : `-${parts.fragment}`;
  if (parts.kind === 'asteroid') {
    return parts.number === null ? provisional(parts) : `(${parts.number})`;
  }
  if (parts.number !== null) return `${parts.number}${parts.prefix ?? ''}${fragment}`;
  return `${parts.prefix === null ? '' : `${parts.prefix}/`}${provisional(parts)}${fragment}`;
}

/** Year, half-month and order as written in full: `2031 K7`, `2031 KQ12`, `A904 OA`, `2040 P-L`. */
export function provisional(parts: Omit<DesignationParts, 'number' | 'fragment' | 'name'>): string {
  const order = parts.order ?? 0;
  if (parts.survey !== null) return `${order} ${parts.survey}`;
  const year = parts.year ?? 0;
  const oldMinorPlanet = parts.kind === 'asteroid' && year < 1925;
  const when = `${oldMinorPlanet ? `A${String(year).slice(1)}` : year} ${parts.halfMonth ?? ''}`;
  if (!parts.lettered) return `${when}${order}`;
  const { letter, cycle } = orderToLetters(order);
  return `${when}${letter}${cycle === 0 ? '' : cycle}`;
}

function packed(parts: DesignationParts): string | null {
  if (parts.kind === 'comet') return packComet(parts);
  return parts.number === null ? packAsteroidProvisional(parts) : packAsteroidNumber(parts.number);
}
