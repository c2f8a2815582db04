import { ChartProblem } from '#charts';
import { ClubProblem, type FieldProblem, type ProblemKind } from '#club';
import { HttpException } from '@nestjs/common';
import { STATUS_CODES } from 'node:http';

/** An RFC 9457 problem; `problems` lists the fields at fault. */
export interface ProblemBody {
  readonly type: 'about:blank';
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly problems: readonly FieldProblem[];
}

const STATUS: Readonly<Record<ProblemKind, number>> = { invalid: 400, notFound: 404, conflict: 409 };

/** What is told of an error. Null: one that nobody outside should read of. */
export function problemOf(error: unknown): ProblemBody | null {
  if (error instanceof ClubProblem) return problemBody(STATUS[error.kind], error.message, error.problems);
  if (error instanceof ChartProblem) {
    const { field, value, message } = error;
    return problemBody(400, message, [{ field, value, message }]);
  }
  if (error instanceof HttpException) return problemBody(error.getStatus(), error.message);
  const status = parserStatus(error);
  return status === null ? null : problemBody(status, parserWords(status));
}

export function problemBody(
  status: number,
  detail: string,
  problems: readonly FieldProblem[] = [],
): ProblemBody {
  return { type: 'about:blank', title: STATUS_CODES[status] ?? 'Problem', status, detail, problems };
}

/** Errors of the body parser carry the status they stand for. */
function parserStatus(error: unknown): number | null {
  if (!(error instanceof Error) || !('status' in error)) return null;
  const { status } = error;
  return typeof status === 'number' && status >= 400 && status < 500 ? status : null;
}

function parserWords(status: number): string {
  if (status === 413) return 'The request is larger than this server takes.';
  if (status === 415) return 'The request is in an encoding this server does not read.';
  return 'The body of the request could not be read; send JSON as UTF-8.';
}
