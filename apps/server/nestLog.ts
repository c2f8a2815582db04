import { type LoggerService } from '@nestjs/common';
import { type Logger } from 'pino';

/** Sends what the framework has to say to the log: its chatter as debug, the rest as it is. */
export function nestLog(log: Logger): LoggerService {
  const framework = log.child({ from: 'nest' });
  const say =
    (level: 'debug' | 'warn' | 'error') =>
    (message: unknown, ...rest: unknown[]) => {
      framework[level]({ rest }, String(message));
    };
  return {
    log: say('debug'),
    debug: say('debug'),
    verbose: say('debug'),
    warn: say('warn'),
    error: say('error'),
  };
}
