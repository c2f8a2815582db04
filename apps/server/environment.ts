import { usualDatabaseFile } from '#club';
import { z } from 'zod';

const PORT_RIGHT = 'a whole number from 0 to 65535';

const Environment = z.object({
  DUSKWRIGHT_PORT: z.coerce
    .number({ error: PORT_RIGHT })
    .int({ error: PORT_RIGHT })
    .min(0, { error: PORT_RIGHT })
    .max(65535, { error: PORT_RIGHT })
    .default(4680),
  DUSKWRIGHT_DB: z.string().min(1, { error: 'the name of a file' }).optional(),
  DUSKWRIGHT_LOG: z
    .enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent'], {
      error: 'one of fatal, error, warn, info, debug, silent',
    })
    .default('warn'),
});

/** What the server takes from its environment. */
export interface ServerSettings {
  /** 0: any free one. */
  readonly port: number;
  readonly databaseFile: string;
  readonly logLevel: z.output<typeof Environment>['DUSKWRIGHT_LOG'];
}

/** The settings in an environment. Throws an error that names every variable that is wrong. */
export function readSettings(environment: Readonly<Record<string, string | undefined>>): ServerSettings {
  const result = Environment.safeParse(environment);
  if (!result.success) {
    const lines = result.error.issues.map(({ path, message }) => {
      const name = String(path[0]);
      return `${name} was "${environment[name] ?? ''}"; give ${message}.`;
    });
    throw new Error(lines.join('\n'));
  }
  const { DUSKWRIGHT_PORT, DUSKWRIGHT_DB, DUSKWRIGHT_LOG } = result.data;
  return {
    port: DUSKWRIGHT_PORT,
    databaseFile: DUSKWRIGHT_DB ?? usualDatabaseFile(),
    logLevel: DUSKWRIGHT_LOG,
  };
}
