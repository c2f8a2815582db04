/** Prints a result on standard output. */
export function print(text: string): void {
  process.stdout.write(text.endsWith('\n') ? text : `${text}\n`);
}

/** Prints a result as one JSON document. */
export function printJson(value: unknown): void {
  print(JSON.stringify(value, null, 2));
}

/** Messages go to standard error: standard output belongs to results. */
export function say(message: string): void {
  process.stderr.write(`${message}\n`);
}
