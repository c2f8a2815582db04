// The few things of a request and a reply that this server touches.

export interface Request {
  readonly method: string;
  readonly path: string;
  readonly originalUrl: string;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
}

export interface Reply {
  readonly headersSent: boolean;
  status(code: number): Reply;
  setHeader(name: string, value: string): Reply;
  type(mediaType: string): Reply;
  send(body?: string | Buffer): Reply;
  redirect(code: number, address: string): void;
}

/** A header that may come once. */
export function header(request: Request, name: string): string | undefined {
  const value = request.headers[name];
  return Array.isArray(value) ? value[0] : value;
}

/** Sends a drawn sheet or packet to be looked at in the browser, which asks again before it shows it again. */
export function sendSheet(
  reply: Reply,
  sheet: { readonly contentType: string; readonly body: Buffer; readonly fileName: string },
): void {
  reply
    .setHeader('Content-Type', sheet.contentType)
    .setHeader('Content-Disposition', `inline; filename*=UTF-8''${encodeURIComponent(sheet.fileName)}`)
    .setHeader('Cache-Control', 'no-cache')
    .send(sheet.body);
}
