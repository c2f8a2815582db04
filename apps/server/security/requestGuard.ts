import { type Database, findClub } from '#club';
import { header, type Reply, type Request } from '../http';
import { problemBody } from '../problems/problemBody';

const SAFE_METHODS: ReadonlySet<string> = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses requests that a stranger's page could make a browser send: those for another host (a name that was
 * made to point here), and changes that come from another site.
 */
export function requestGuard(database: Database) {
  return async (request: Request, reply: Reply, next: (error?: unknown) => void): Promise<void> => {
    try {
      const host = header(request, 'host') ?? '';
      if (!(await isOurs(host, database))) {
        refuse(reply, 421, `This server does not answer for the host "${host.slice(0, 200)}".`);
      } else if (!SAFE_METHODS.has(request.method) && fromElsewhere(request, host)) {
        refuse(reply, 403, 'Changes are taken from pages of this server only.');
      } else {
        next();
      }
    } catch (error) {
      next(error);
    }
  };
}

async function isOurs(host: string, database: Database): Promise<boolean> {
  if (/^(localhost|127\.0\.0\.1|\[::1\])(:\d{1,5})?$/i.test(host)) return true;
  const address = (await findClub(database))?.publicAddress ?? null;
  return address !== null && hostOf(address) === host.toLowerCase();
}

function fromElsewhere(request: Request, host: string): boolean {
  const site = header(request, 'sec-fetch-site');
  if (site !== undefined && site !== 'same-origin' && site !== 'none') return true;
  const origin = header(request, 'origin');
  return origin !== undefined && hostOf(origin) !== host.toLowerCase();
}

function hostOf(address: string): string | null {
  return URL.canParse(address) ? new URL(address).host : null;
}

function refuse(reply: Reply, status: number, detail: string): void {
  reply
    .status(status)
    .type('application/problem+json')
    .send(JSON.stringify(problemBody(status, detail)));
}
