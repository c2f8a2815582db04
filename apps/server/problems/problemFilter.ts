import { type ArgumentsHost, Catch, type ExceptionFilter } from '@nestjs/common';
import { type Logger } from 'pino';
import { type Reply, type Request } from '../http';
import { problemPage } from '../pages/problemPage';
import { problemBody, problemOf } from './problemBody';

/** Turns every error into an answer: a problem body for programs, a page for people, never a stack trace. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  constructor(private readonly log: Logger) {}

  catch(error: unknown, host: ArgumentsHost): void {
    const request = host.switchToHttp().getRequest<Request>();
    const reply = host.switchToHttp().getResponse<Reply>();
    const known = problemOf(error);
    if (known === null) {
      this.log.error({ err: error, method: request.method, path: request.path }, 'request failed');
    }
    if (reply.headersSent) return;
    const body = known ?? problemBody(500, 'Something went wrong here; nothing was kept. The log says more.');
    reply.setHeader('Cache-Control', 'no-store').status(body.status);
    if (forPeople(request)) reply.type('text/html').send(problemPage(body));
    else reply.type('application/problem+json').send(JSON.stringify(body));
  }
}

function forPeople({ path, headers }: Request): boolean {
  const accepts = headers['accept'];
  return !path.startsWith('/api/') && !path.endsWith('.ics') && String(accepts ?? '').includes('text/html');
}
