import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { answer, duskwright } from './run';

const folder = mkdtempSync(join(tmpdir(), 'duskwright-cli-'));
afterAll(() => {
  rmSync(folder, { recursive: true });
});

interface SkyJson {
  readonly target: string;
  readonly astrometric: { readonly raDeg: number; readonly decDeg: number };
  readonly horizontal: { readonly altitudeDeg: number; readonly azimuthDeg: number } | null;
  readonly magnitude: number | null;
  readonly constellation: string;
  readonly skyBrightness: number | null;
  readonly moon: { readonly separationDeg: number } | null;
}

const at = ['--site', '47.1,8.2,600', '--at', '2027-03-01T20:00:00Z'];

describe('sky', () => {
  it('prints every field of the contract', () => {
    const sky = answer<SkyJson>(['sky', '--target', 'Mars', ...at]);
    expect(Object.keys(sky)).toEqual(
      expect.arrayContaining([
        'target',
        'at',
        'astrometric',
        'apparent',
        'horizontal',
        'distanceAu',
        'sunDistanceAu',
        'elongationDeg',
        'phaseAngleDeg',
        'illuminatedFraction',
        'magnitude',
        'magnitudeRange',
        'constellation',
        'angularDiameterArcsec',
        'sun',
        'moon',
        'skyBrightness',
        'limitingMagnitude',
      ]),
    );
    expect(sky).toMatchObject({ target: 'Mars', constellation: 'Leo' });
  });

  it('knows catalogued objects by any of their names', () => {
    for (const name of ['M 31', 'm31', 'Andromeda Galaxy', 'NGC 224']) {
      const sky = answer<SkyJson>(['sky', '--target', name, ...at]);
      expect(sky.target).toBe('M 31');
      expect(sky.constellation).toBe('And');
    }
  });

  it('reads a body from an element file and drops the site when geocentric', () => {
    const file = join(folder, 'comet.json');
    writeFileSync(
      file,
      JSON.stringify([
        {
          designation: 'C/2031 K7',
          name: 'Ashgrove',
          kind: 'comet',
          perihelionTime: '2032-02-11T11:37:00',
          perihelionDistanceAu: 0.764213,
          eccentricity: 1,
          inclinationDeg: 96.3152,
          nodeDeg: 61.884,
          argumentOfPerihelionDeg: 143.2097,
          absoluteMagnitude: 7.5,
          slope: 4,
        },
      ]),
    );
    const sky = answer<SkyJson>([
      'sky',
      '--target',
      'Ashgrove',
      '--elements',
      file,
      '--geocentric',
      '--at',
      '2032-02-01T00:00:00Z',
    ]);
    expect(sky).toMatchObject({ target: 'C/2031 K7 (Ashgrove)', horizontal: null, moon: null });
    expect(sky.magnitude).not.toBeNull();
  });

  it('answers a batch line by line and a bad line in its place', () => {
    const lines = [
      { target: 'Mars', site: '47.1,8.2,600', at: '2027-03-01T20:00:00Z' },
      { target: 'Mars', site: '147.1,8.2', at: '2027-03-01T20:00:00Z' },
      { target: 'Moon', site: '47.1,8.2,600', at: '2027-03-01T20:00:00Z' },
    ];
    const { status, stdout } = duskwright(
      ['sky', '--batch', '-'],
      lines.map((line) => JSON.stringify(line)).join('\n'),
    );
    const answers = stdout
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as SkyJson & { error?: { field: string; message: string } });
    expect(status).toBe(2);
    expect(answers.map(({ target, error }) => target ?? error?.field)).toEqual(['Mars', 'site', 'Moon']);
    expect(answers[1]!.error!.message).toContain('latitude 147.1');
    expect(answers[0]).toEqual(answer(['sky', '--target', 'Mars', ...at]));
  });

  test.each([
    [['--target', 'Marz', ...at], 'target was "Marz"'],
    [['--target', 'Mars', '--site', '47,200', '--at', '2027-03-01T20:00:00Z'], 'longitude 200'],
    [['--target', 'Mars', '--site', 'here', '--at', '2027-03-01T20:00:00Z'], '--site was "here"'],
    [
      ['--target', 'Mars', '--site', '47,8', '--at', '2027-02-30T20:00:00Z'],
      '--at was "2027-02-30T20:00:00Z"',
    ],
    [['--target', 'Mars', '--site', '47,8', '--at', '2027-02-20T20:00:00'], 'with its offset'],
    [['--target', 'Mars', '--at', '2027-02-20T20:00:00Z'], '--site was left out'],
    [['--target', 'Mars', '--bortle', '12', ...at], '--bortle was "12"'],
    [['--target', 'Mars', '--elements', 'no-such-file', ...at], '--elements was "no-such-file"'],
    [['--nonsense'], "unknown option '--nonsense'"],
  ])('refuses %j with exit status 2', (args, message) => {
    const { status, stdout, stderr } = duskwright(['sky', ...args, '--json']);
    expect(stderr).toContain(message);
    expect(stdout).toBe('');
    expect(status).toBe(2);
  });
});

describe('evening', () => {
  it('gives the light from noon to noon', () => {
    const evening = answer<Record<string, string | number | null>>([
      'evening',
      '--site',
      '47.1,8.2,600',
      '--zone',
      'Europe/Zurich',
      '--date',
      '2027-03-01',
    ]);
    const order = [
      'sunset',
      'civilDusk',
      'nauticalDusk',
      'astronomicalDusk',
      'astronomicalDawn',
      'nauticalDawn',
      'civilDawn',
      'sunrise',
    ];
    const instants = order.map((name) => Date.parse(String(evening[name])));
    expect([...instants].sort((a, b) => a - b)).toEqual(instants);
    expect(evening['zone']).toBe('Europe/Zurich');
  });

  it('answers null where there is no such light, and takes the zone of the place', () => {
    const evening = answer<Record<string, unknown>>(['evening', '--site', '69,20', '--date', '2027-06-21']);
    expect(evening).toMatchObject({
      zone: 'Europe/Stockholm',
      sunset: null,
      astronomicalDusk: null,
      darkMinutes: 0,
    });
  });

  test.each([
    [['--site', '47,8', '--date', '2027-02-30'], '--date was "2027-02-30"'],
    [['--site', '47,8', '--zone', 'Mars/Olympus', '--date', '2027-02-20'], '--zone was "Mars/Olympus"'],
    [['--site', '47,8'], '--date was left out'],
  ])('refuses %j with exit status 2', (args, message) => {
    const { status, stderr } = duskwright(['evening', ...args]);
    expect(stderr).toContain(message);
    expect(status).toBe(2);
  });
});

describe('elements', () => {
  it('tells the state of a body at a TT instant', () => {
    // Meeus, Astronomical Algorithms (2nd ed.), chapter 35: q 0.921326, e 1, 138.4783 days: r 2.364192.
    const file = join(folder, 'parabola.csv');
    writeFileSync(file, 'name,T,q,e,i,node,peri\nExample,2000-01-01,0.921326,1,0,0,0\n');
    const { heliocentricEcliptic: state } = answer<{ heliocentricEcliptic: [number, number, number] }>([
      'elements',
      'state',
      file,
      '--body',
      'Example',
      '--at',
      '2000-05-18T11:28:45.12',
      '--two-body',
    ]);
    expect(Math.abs(Math.hypot(...state) - 2.364192)).toBeLessThan(1e-6);
    expect(Math.abs((Math.atan2(state[1], state[0]) * 180) / Math.PI - 102.74426)).toBeLessThan(1e-5);
  });

  it('takes designations apart, one or many', () => {
    expect(answer(['elements', 'designation', 'C/2031 K7'])).toMatchObject({
      valid: true,
      packed: 'CK31K070',
    });
    const { status, stdout } = duskwright(
      ['elements', 'designation', '--batch', '-'],
      '{"text":"C/2031 K7"}\n{"text":"C/2031 I7"}\n',
    );
    const lines = stdout
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as { valid: boolean });
    expect(lines.map(({ valid }) => valid)).toEqual([true, false]);
    expect(status).toBe(0);
  });
});
