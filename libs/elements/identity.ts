import { type Designation } from './designation';
import { parseDesignation } from './parseDesignation';
import { type FieldProblem, quoted } from './problem';

/** Who a body is: what it is called in every way that matters. */
export interface Identity {
  readonly designation: string;
  readonly packed: string | null;
  readonly name: string;
  readonly label: string;
  readonly parsed: Designation | null;
  readonly problems: readonly FieldProblem[];
}

/**
 * The identity of a body from its designation and name as somebody wrote them. A body without a designation by
 * the rules (one just found, say) keeps what was written, with a warning.
 */
export function identify(designation: string, name: string): Identity {
  const designated = designation.trim();
  const named = name.trim();
  const text = designated === '' ? named : designated;
  if (text === '') {
    return unruly('unnamed', '', [
      { field: 'designation', severity: 'warning', message: 'The set has neither a designation nor a name.' },
    ]);
  }
  const parsed = parseDesignation(text);
  if (!parsed.valid || parsed.canonical === null) {
    if (designated === '') return unruly(named, named, []);
    const message = `${parsed.problem ?? ''} It is kept as written.`;
    return unruly(designated, named, [{ field: 'designation', severity: 'warning', message }]);
  }
  const canonical = parsed.canonical;
  const fromName = designated !== '' && named !== '' ? parseDesignation(named) : null;
  const proper = (fromName?.valid === true ? fromName.name : named) || parsed.name || '';
  const finalName = proper === text || proper === canonical ? (parsed.name ?? '') : proper;
  const problems: FieldProblem[] = [];
  if (fromName?.valid === true && fromName.canonical !== canonical && !sameBody(fromName, parsed)) {
    const message = `The designation says ${canonical}, the name ${quoted(named)}; the designation is used.`;
    problems.push({ field: 'name', severity: 'warning', message });
  }
  return {
    designation: canonical,
    packed: parsed.packed,
    name: finalName,
    label: labelOf(parsed, canonical, finalName),
    parsed,
    problems,
  };
}

/** Designation and name together, as people write them. */
export function labelOf(parsed: Designation, canonical: string, name: string): string {
  if (name === '') return canonical;
  if (parsed.kind === 'asteroid') return `${canonical} ${name}`;
  return parsed.number === null ? `${canonical} (${name})` : `${canonical}/${name}`;
}

function sameBody(a: Designation, b: Designation): boolean {
  if (a.number !== null && b.number !== null) return a.number === b.number && a.kind === b.kind;
  const sameFind = a.year === b.year && a.halfMonth === b.halfMonth && a.order === b.order;
  return sameFind && a.fragment === b.fragment && (a.prefix === b.prefix || !a.prefix || !b.prefix);
}

function unruly(designation: string, name: string, problems: readonly FieldProblem[]): Identity {
  const label = name === '' || name === designation ? designation : `${designation} (${name})`;
  return { designation, packed: null, name, label, parsed: null, problems };
}
