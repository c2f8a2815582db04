/**
 * The same plain value with every Float64Array in memory that threads share, so that handing it to a worker
 * again and again copies no numbers. What stands in it twice stays one thing.
 */
export function withSharedArrays<T>(value: T): T {
  return share(value, new Map()) as T;
}

function share(value: unknown, made: Map<object, unknown>): unknown {
  if (typeof value !== 'object' || value === null) return value;
  const known = made.get(value);
  if (known !== undefined) return known;
  if (isNumbers(value)) {
    const copy = new Float64Array(new SharedArrayBuffer(value.byteLength));
    copy.set(value);
    made.set(value, copy);
    return copy;
  }
  if (Array.isArray(value)) {
    const copy = value.map((entry) => share(entry, made));
    made.set(value, copy);
    return copy;
  }
  const copy = Object.fromEntries(Object.entries(value).map(([key, entry]) => [key, share(entry, made)]));
  made.set(value, copy);
  return copy;
}

/** By its kind, not its class: what a worker sent may carry the class of another realm. */
function isNumbers(value: object): value is Float64Array {
  return ArrayBuffer.isView(value) && Object.prototype.toString.call(value) === '[object Float64Array]';
}
