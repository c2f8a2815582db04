/** One thing that is wrong, in words a person can act on. */
export interface FieldProblem {
  /** Path of the field, such as `horizon[3].azimuthDeg`; empty where the whole is meant. */
  readonly field: string;
  /** What it was. */
  readonly value: unknown;
  /** Names the field, what it was and what would be right. */
  readonly message: string;
}

/**
 * invalid: the request itself is wrong; notFound: what it names does not exist; conflict: it does not fit
 * what there is.
 */
export type ProblemKind = 'invalid' | 'notFound' | 'conflict';

/** A request that was refused. Nothing was changed. */
export class ClubProblem extends Error {
  constructor(
    readonly kind: ProblemKind,
    readonly problems: readonly FieldProblem[],
  ) {
    super(problems.map((problem) => problem.message).join(' '));
    this.name = 'ClubProblem';
  }
}

/** A refusal with a single reason. */
export function problem(kind: ProblemKind, field: string, value: unknown, message: string): ClubProblem {
  return new ClubProblem(kind, [{ field, value, message }]);
}
