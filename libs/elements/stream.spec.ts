import {
  bodyTest,
  collectElements,
  type ElementProgress,
  findBody,
  readElements,
  readElementStream,
} from '#elements';

// For machines that do other work at the same time.
jest.setTimeout(60_000);

// Invented bodies.
const LINE =
  '~1E3F   15.42  0.15 K31AB 211.30457   96.41208  318.77530    7.26419  0.1438207  0.23221081   2.6214873  0 MPO999993   412   9 2009-2030 0.48 M-v 3Ek Invented   0000 (912345)                    20301104';
const COMET =
  '    CK31K070  2032 02 11.4837  0.764213  1.000248  143.2097   61.8840   96.3152  20320217   7.5  4.0  C/2031 K7 (Ashgrove)                                     MPC 99991';
const NEWER = COMET.replace('20320217', '20320318').replace('0.764213', '0.764219');
const NUMBERED =
  '0999P         2031 09 03.2065  1.482907  0.617345  201.7730    8.0461   11.9026  20310823  11.0  6.0  999P/Wren-Okafor                                         MPC 99992';

function minorPlanet(number: number, name: string): string {
  const packed = `0${String(number).padStart(4, '0')}`;
  return `${packed.padEnd(7)}${LINE.slice(7, 166)}${`${`(${number})`.padStart(8)} ${name}`.padEnd(28)}${LINE.slice(194)}`;
}

const MANY = Array.from({ length: 3000 }, (_, i) => minorPlanet(i + 1, i % 10 === 0 ? `Tarn${i + 1}` : ''));
const TEXT = ['A heading of the published file', '-'.repeat(60), ...MANY, 'bad 1.5 line 7 7', LINE].join(
  '\n',
);

async function* pieces(text: string, size: number): AsyncGenerator<Uint8Array> {
  const bytes = Buffer.from(text);
  for (let at = 0; at < bytes.length; at += size) {
    await Promise.resolve();
    yield bytes.subarray(at, at + size);
  }
}

describe('readElementStream', () => {
  test.each([1000, 65_536, 10_000_000])(
    'gives what the whole text gives, in pieces of %d bytes',
    async (size) => {
      const whole = readElements(TEXT);
      expect(whole.sets).toHaveLength(3001);
      expect(whole.problems).toMatchObject([{ line: 3003, column: 1, severity: 'error' }]);
      const streamed = await collectElements(pieces(TEXT, size));
      expect(streamed).toEqual({ ...whole, lines: 3004 });
    },
  );

  test('CSV and JSON stream too, letters of several bytes cut anywhere', async () => {
    const csv = 'designation,name,q,e,i,Ω,ω,T\n2031 KQ12,Žďár,1.2,0.5,4,122,271,2463041.5\n';
    const json = JSON.stringify({
      designation: '2031 KQ12',
      name: 'Žďár',
      q: 1.2,
      e: 0.5,
      i: 4,
      Ω: 122,
      ω: 271,
      T: 2463041.5,
    });
    for (const text of [csv, json]) {
      const { sets, problems } = await collectElements(pieces(text, 1));
      expect(problems).toEqual([]);
      expect(sets).toMatchObject([{ name: 'Žďár', nodeDeg: 122 }]);
    }
  });

  test('picks out the wanted by number, packed designation and name, and passes over the rest', async () => {
    const wanted = ['(912345)', '00042', 'tarn 1001', 'nobody'];
    const { sets, problems, lines } = await collectElements(pieces(TEXT, 4096), { wanted });
    expect(sets.map((set) => set.label)).toEqual(['(42)', '(1001) Tarn1001', '(912345)']);
    expect(lines).toBe(3004);
    expect(problems.map((problem) => problem.line)).toEqual([3003]);
  });

  test('tells its progress and heeds a signal', async () => {
    const seen: ElementProgress[] = [];
    await collectElements(pieces(TEXT, 50_000), { onProgress: (progress) => seen.push(progress) });
    expect(seen.length).toBeGreaterThan(10);
    expect(seen.at(-1)).toEqual({ lines: 3004, bytes: TEXT.length, sets: 3001, problems: 1 });
    expect(seen.map((progress) => progress.lines)).toEqual(seen.map((p) => p.lines).sort((a, b) => a - b));

    const stop = new AbortController();
    const reading = (async () => {
      for await (const batch of readElementStream(pieces(TEXT, 1000), { signal: stop.signal })) {
        if (batch.lines > 100) stop.abort(new Error('enough'));
      }
    })();
    await expect(reading).rejects.toThrow('enough');
  });

  test('a line without end is passed over and the reading goes on', async () => {
    const text = `${COMET}\n${'x'.repeat(1_200_000)}\n${NUMBERED}\n`;
    const { sets, problems } = await collectElements(pieces(text, 65_536));
    expect(sets.map((set) => set.line)).toEqual([1, 3]);
    expect(problems).toEqual([
      { line: 2, column: 1_000_000, severity: 'error', message: expect.stringMatching(/longer than/) },
    ]);
  });
});

describe('findBody', () => {
  const { sets } = readElements([COMET, NUMBERED, minorPlanet(999, 'Quillon'), LINE, NEWER].join('\n'));

  test.each([
    ['C/2031 K7', 'C/2031 K7 (Ashgrove)'],
    ['c/2031k7', 'C/2031 K7 (Ashgrove)'],
    ['2031 K7', 'C/2031 K7 (Ashgrove)'],
    ['CK31K070', 'C/2031 K7 (Ashgrove)'],
    ['ASHGROVE', 'C/2031 K7 (Ashgrove)'],
    ['Comet Ashgrove', null],
    ['ashg', 'C/2031 K7 (Ashgrove)'],
    ['999P', '999P/Wren-Okafor'],
    ['999P/Wren-Okafor', '999P/Wren-Okafor'],
    ['wren okafor', '999P/Wren-Okafor'],
    ['Okafor', '999P/Wren-Okafor'],
    ['999', '(999) Quillon'],
    ['(999)', '(999) Quillon'],
    ['quillon', '(999) Quillon'],
    ['912345', '(912345)'],
    ['~1E3F', '(912345)'],
    ['2031 K8', null],
    ['12', null],
    ['', null],
  ])('%j', (name, label) => {
    expect(findBody(sets, name)?.label ?? null).toBe(label);
  });

  test('of an old and a new set the one with the later epoch', () => {
    expect(findBody(sets, 'Ashgrove')!.perihelionDistanceAu).toBe(0.764219);
    expect(findBody([...sets].reverse(), 'Ashgrove')!.perihelionDistanceAu).toBe(0.764219);
  });

  test('a part of a name finds a body but does not mean it', () => {
    expect(sets.filter(bodyTest('wren-okafor'))).toHaveLength(1);
    expect(sets.filter(bodyTest('wren'))).toHaveLength(0);
  });
});
