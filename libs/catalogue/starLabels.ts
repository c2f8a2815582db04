/** What a star is called. Greek letters stand as such ('α'), with their component as a superscript ('β¹'). */
export interface StarLabel {
  /** Proper name, 'Vega'. */
  readonly name: string | null;
  /** Bayer designation with the constellation, 'α Lyr'. */
  readonly bayer: string | null;
  /** The letter alone, 'α' or 'β¹'. */
  readonly bayerLetter: string | null;
  /** Flamsteed number. */
  readonly flamsteed: number | null;
  /** IAU abbreviation of the constellation that the designation belongs to, 'Lyr'. */
  readonly constellation: string | null;
  /** Number in the Bright Star Catalogue. */
  readonly hr: number | null;
}

/** A label with the index in the star file of the star that bears it. */
export interface LabelledIndex {
  readonly index: number;
  readonly label: StarLabel;
}

export const LABEL_COLUMNS = ['star', 'hr', 'bayer', 'flamsteed', 'constellation', 'name'] as const;

export class StarNamesError extends Error {
  override readonly name = 'StarNamesError';
}

const numberOrNull = (text: string): number | null => (text === '' ? null : Number(text));

/** Text of a star-names file; `stars` is the count of the star file its indices belong to. */
export const writeStarNames = (
  labels: readonly LabelledIndex[],
  version: string,
  stars: number,
  comment: readonly string[],
): string => {
  const rows = [...labels]
    .sort((a, b) => a.index - b.index)
    .map(({ index, label }) =>
      [index, label.hr, label.bayerLetter, label.flamsteed, label.constellation, label.name]
        .map((value) => value ?? '')
        .join('\t'),
    );
  return [
    ...comment.map((line) => `# ${line}`),
    `# version ${version}, belongs to a star file of ${stars} stars`,
    LABEL_COLUMNS.join('\t'),
    ...rows,
    '',
  ].join('\n');
};

/** The labels of a star file. Lines are taken apart only when their star is asked for. */
export interface StarNames {
  /** Indices of all labelled stars, ascending. */
  readonly indices: Uint32Array;
  /** The label of the star at an index of the star file; null where it has none. */
  readonly labelOf: (index: number) => StarLabel | null;
}

const readLabel = (line: string, at: number): StarLabel => {
  const [, hr, letter, flamsteed, constellation, name, ...more] = line.split('\t');
  if (name === undefined || more.length > 0) {
    throw new StarNamesError(`Star names, line ${at}: expected ${LABEL_COLUMNS.length} columns.`);
  }
  return {
    name: name || null,
    bayer: letter ? `${letter} ${constellation}` : null,
    bayerLetter: letter || null,
    flamsteed: numberOrNull(flamsteed!),
    constellation: constellation || null,
    hr: numberOrNull(hr!),
  };
};

const indexOf = (sorted: Uint32Array, value: number): number => {
  let low = 0;
  let high = sorted.length - 1;
  while (low <= high) {
    const middle = (low + high) >> 1;
    if (sorted[middle]! < value) low = middle + 1;
    else high = middle - 1;
  }
  return sorted[low] === value ? low : -1;
};

/**
 * Reads a star-names file for a star file of `stars` stars. Throws a StarNamesError, with the line number, where it
 * belongs to another star file, lacks its column names, or its stars are not in ascending order.
 */
export const readStarNames = (text: string, stars: number): StarNames => {
  const lines = text.split('\n');
  if (lines.at(-1) === '') lines.pop();
  let first = 0;
  while (lines[first]?.startsWith('#')) {
    const belongs = /^# version .* star file of (\d+) stars$/.exec(lines[first]!);
    if (belongs && Number(belongs[1]) !== stars) {
      throw new StarNamesError(`Star names belong to ${belongs[1]} stars, the star file has ${stars}.`);
    }
    first++;
  }
  if (lines[first] !== LABEL_COLUMNS.join('\t')) {
    throw new StarNamesError(
      `Star names, line ${first + 1}: expected the columns ${LABEL_COLUMNS.join(', ')}.`,
    );
  }
  first++;
  const indices = new Uint32Array(lines.length - first);
  let before = -1;
  for (let i = 0; i < indices.length; i++) {
    const index = Number.parseInt(lines[first + i]!, 10);
    if (!(index > before && index < stars)) {
      throw new StarNamesError(
        `Star names, line ${first + i + 1}: star ${index} should lie above ${before} and below ${stars}.`,
      );
    }
    indices[i] = index;
    before = index;
  }
  const labels: (StarLabel | undefined)[] = new Array<StarLabel | undefined>(indices.length);
  return {
    indices,
    labelOf: (index) => {
      const i = indexOf(indices, index);
      if (i < 0) return null;
      labels[i] ??= readLabel(lines[first + i]!, first + i + 1);
      return labels[i];
    },
  };
};
