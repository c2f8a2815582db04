import { readSettings } from './environment';

it('has an answer where nothing is set', () => {
  const { port, databaseFile, logLevel } = readSettings({});
  expect({ port, logLevel }).toEqual({ port: 4680, logLevel: 'warn' });
  expect(databaseFile).toMatch(/duskwright\.db$/);
});

it('takes what is set', () => {
  expect(readSettings({ DUSKWRIGHT_PORT: '0', DUSKWRIGHT_DB: 'x.db', DUSKWRIGHT_LOG: 'debug' })).toEqual({
    port: 0,
    databaseFile: 'x.db',
    logLevel: 'debug',
  });
});

it('names everything that is wrong at once', () => {
  expect(() => readSettings({ DUSKWRIGHT_PORT: 'eighty', DUSKWRIGHT_LOG: 'loud' })).toThrow(
    'DUSKWRIGHT_PORT was "eighty"; give a whole number from 0 to 65535.\n' +
      'DUSKWRIGHT_LOG was "loud"; give one of fatal, error, warn, info, debug, silent.',
  );
});
