import { createHash } from 'node:crypto';

/**
 * A calendar identity made from an event's own identifier: a UUID (RFC 9562, version 8), free of host names as
 * RFC 7986 (5.3) asks, and the same whenever it is made from the same identifier.
 */
export function eventUid(identifier: string): string {
  const bytes = createHash('sha256').update(`duskwright event ${identifier}`).digest().subarray(0, 16);
  bytes[6] = (bytes[6]! & 0x0f) | 0x80;
  bytes[8] = (bytes[8]! & 0x3f) | 0x80;
  return bytes.toString('hex').replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
}

/** A strong entity tag (RFC 9110, 8.8.3) of a text: equal for equal bytes. */
export function etagOf(text: string): string {
  return `"${createHash('sha256').update(text).digest('base64url').slice(0, 27)}"`;
}
