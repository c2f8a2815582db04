import 'reflect-metadata';
import { closeDatabase, closePacketPool, closeSearchPool, findClub, openDatabase } from '#club';
import pino from 'pino';
import { createApplication } from './application';
import { readSettings } from './environment';
import { SearchJobs } from './searches/searchJobs';

async function start(): Promise<void> {
  const settings = readSettings(process.env);
  const log = pino({ level: settings.logLevel }, pino.destination(2));
  const database = await openDatabase({ file: settings.databaseFile });
  if ((await findClub(database)) === null) {
    process.stderr.write('Loading the demo club …\n');
    const { loadDemo } = await import('#demo-data');
    await loadDemo(database, { asOf: new Date().toISOString().slice(0, 10) });
  }
  const application = await createApplication(database, log);
  await application.listen(settings.port, '127.0.0.1');

  let stopping = false;
  const stop = async (): Promise<void> => {
    if (stopping) return;
    stopping = true;
    application.get(SearchJobs).stopAll();
    await application.close();
    await closeSearchPool();
    await closePacketPool();
    await closeDatabase(database);
    process.exit(0);
  };
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void stop());

  const { port } = application.getHttpServer().address() as { readonly port: number };
  process.stdout.write(`Duskwright is ready: http://localhost:${String(port)}/\n`);
}

start().catch((error: unknown) => {
  const busy = error instanceof Error && 'code' in error && error.code === 'EADDRINUSE';
  const why = busy
    ? `${error.message}. Another program listens there; set DUSKWRIGHT_PORT to a free port.`
    : error instanceof Error
      ? error.message
      : String(error);
  process.stderr.write(`Duskwright could not start: ${why}\n`);
  process.exit(1);
});
