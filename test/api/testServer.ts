import { type Database } from '#club';
import { type NestExpressApplication } from '@nestjs/platform-express';
import pino from 'pino';
import { createApplication } from '../../apps/server/application';
import { smallClub } from '../../libs/club/fixtures/smallClub';

/** The real server over a small club in a database of its own, listening on a free port of this machine. */
export interface TestServer {
  readonly database: Database;
  readonly application: NestExpressApplication;
  readonly address: string;
  readonly setNow: (iso: string) => void;
  readonly close: () => Promise<void>;
}

export async function startServer(): Promise<TestServer> {
  const { database, setNow, close } = await smallClub();
  const application = await createApplication(database, pino({ level: 'silent' }));
  await application.listen(0, '127.0.0.1');
  const { port } = application.getHttpServer().address() as { readonly port: number };
  return {
    database,
    application,
    address: `http://127.0.0.1:${String(port)}`,
    setNow,
    close: async () => {
      await application.close();
      await close();
    },
  };
}
