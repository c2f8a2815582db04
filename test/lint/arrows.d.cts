export const allowed: Readonly<Record<string, readonly string[]>>;
export function forbiddenImport(file: string, source: string): string | null;
