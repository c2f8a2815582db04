import { type Database } from '#club';
import { NestFactory } from '@nestjs/core';
import { type NestExpressApplication } from '@nestjs/platform-express';
import { type Logger } from 'pino';
import { documentApi } from './documentation';
import { nestLog } from './nestLog';
import { ProblemFilter } from './problems/problemFilter';
import { documentationHeaders, pageHeaders } from './security/headers';
import { requestGuard } from './security/requestGuard';
import { ServerModule } from './serverModule';

/** Larger than any horizon profile or programme; small enough to be no burden. */
const MOST_JSON = '512kb';
const MOST_FORM = '16kb';

/** The whole server over an open database, ready to listen. */
export async function createApplication(database: Database, log: Logger): Promise<NestExpressApplication> {
  const application = await NestFactory.create<NestExpressApplication>(ServerModule.over(database), {
    logger: nestLog(log),
    bodyParser: false,
    forceCloseConnections: true,
    abortOnError: false,
  });
  application.disable('x-powered-by');
  application.set('query parser', 'simple');
  application.use(headers);
  application.use(requestGuard(database));
  application.useBodyParser('json', { limit: MOST_JSON });
  application.useBodyParser('urlencoded', { limit: MOST_FORM, extended: false });
  application.useGlobalFilters(new ProblemFilter(log));
  documentApi(application);
  await application.init();
  return application;
}

const DOCUMENTATION = /^\/api\/docs(?:[/?]|$)/;

const headers: typeof pageHeaders = (request, reply, next) => {
  const fitting = DOCUMENTATION.test(request.url ?? '') ? documentationHeaders : pageHeaders;
  fitting(request, reply, next);
};
