const MOST_OCTETS = 75;

/**
 * A content line (RFC 5545, 3.1) with its CRLF, folded so that no line has more than 75 octets and no character
 * is split. `value` is taken as it is; pass text through `escapeText` first.
 */
export function contentLine(name: string, value: string): string {
  let folded = '';
  let octets = 0;
  for (const character of `${name}:${value}`) {
    const width = octetsOf(character);
    if (octets + width > MOST_OCTETS) {
      folded += '\r\n ';
      octets = 1;
    }
    folded += character;
    octets += width;
  }
  return `${folded}\r\n`;
}

/** A TEXT value (RFC 5545, 3.3.11). Control characters other than tabs and line ends are left out. */
export function escapeText(text: string): string {
  return text
    .replace(/\r\n?/g, '\n')
    .replace(/[^\P{Cc}\t\n]/gu, '')
    .replace(/\p{Cs}/gu, '\ufffd')
    .replace(/[\\;,]/g, '\\$&')
    .replace(/\n/g, '\\n');
}

/** A URI value: what would end the line or the text is percent-encoded. */
export function uriValue(uri: string): string {
  return new URL(uri).href;
}

/** UTF-8 octets of one character. */
function octetsOf(character: string): number {
  const code = character.codePointAt(0)!;
  if (code < 0x80) return 1;
  if (code < 0x800) return 2;
  return code < 0x10000 ? 3 : 4;
}
