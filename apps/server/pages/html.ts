/** A piece of a page whose text is already safe. */
export interface Html {
  readonly markup: string;
}

type HtmlPart = string | number | Html | null | false | readonly Html[];

/** Markup with everything that is put into it escaped; null and false leave nothing. */
export function html(pieces: TemplateStringsArray, ...parts: readonly HtmlPart[]): Html {
  return { markup: pieces.reduce((page, piece, i) => page + markupOf(parts[i - 1] ?? null) + piece) };
}

function markupOf(part: HtmlPart): string {
  if (part === null || part === false) return '';
  if (typeof part === 'string' || typeof part === 'number') return escapeHtml(String(part));
  return 'markup' in part ? part.markup : part.map(({ markup }) => markup).join('');
}

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => ENTITIES[character]!);
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
