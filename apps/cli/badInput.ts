/** An option or a line that cannot be used: the command ends with exit status 2 and nothing is written. */
export class BadInput extends Error {
  constructor(
    /** The option or field that is wrong. */
    readonly field: string,
    message: string,
  ) {
    super(message);
    this.name = 'BadInput';
  }
}

/** What is wrong with the input, in words, where an error says that it is; null for any other failure. */
export function badInputOf(error: unknown): { readonly field: string; readonly message: string } | null {
  if (error instanceof BadInput) return { field: error.field, message: error.message };
  if (!(error instanceof Error)) return null;
  // Problems of the libraries are told by their shape, so that no library loads just to name its class.
  if (error.name === 'ClubProblem') {
    const { problems } = error as Error & { readonly problems: readonly { readonly field: string }[] };
    return { field: problems[0]?.field ?? '', message: error.message };
  }
  if (error.name === 'ChartProblem') {
    return { field: (error as Error & { readonly field: string }).field, message: `${error.message}.` };
  }
  return null;
}
