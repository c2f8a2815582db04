import { readElements, toCheckJson } from '#elements';

const HEADINGS = 'designation,name,q,e,i,node,peri,T,epoch,H,G';
const ROW = '2031 KQ12,,1.0335630,0.5120884,4.81377,122.68014,271.05533,2031-06-23.8203,2463150.5,19.07,0.15';

describe('CSV', () => {
  test('the standard symbols', () => {
    const { sets, problems } = readElements(`${HEADINGS}\n${ROW}\n`);
    expect(problems).toEqual([]);
    expect(sets).toMatchObject([
      {
        line: 2,
        format: 'csv',
        designation: '2031 KQ12',
        perihelionDistanceAu: 1.033563,
        eccentricity: 0.5120884,
        perihelionTtJd: 2463041.3203,
        epochTtJd: 2463150.5,
        brightness: { kind: 'asteroid', absoluteMagnitude: 19.07, slope: 0.15 },
      },
    ]);
  });

  test.each([
    ['Greek letters', 'Designation,q,e,i,Ω,ω,T', '2031 KQ12,1.2,0.5,4,122,271,2463041.5'],
    [
      'English names with units',
      '"Designation","Perihelion distance (au)",Eccentricity,Inclination [deg],Longitude of the ascending node,Argument of perihelion,Time of perihelion (TT)',
      '2031 KQ12,1.2,0.5,4,122,271,2031 Jun 24.0',
    ],
    [
      'the names of the JSON form',
      'designation,perihelionDistanceAu,eccentricity,inclinationDeg,nodeDeg,argumentOfPerihelionDeg,perihelionTime',
      '2031 KQ12,1.2,0.5,4,122,271,2031-06-24T00:00:00',
    ],
    [
      'semicolons and decimal commas',
      'designation;q;e;i;node;peri;T',
      '2031 KQ12;1,2;0,5;4;122;271;20310624',
    ],
    ['tabs', 'designation\tq\te\ti\tnode\tperi\tT', '2031 KQ12\t1.2\t0.5\t4\t122\t271\tK316O'],
    [
      'a byte order mark, quotation marks, CRLF',
      '\uFEFF"designation",q,e,i,node,peri,T',
      '"2031 KQ12",1.2,0.5,4,122,271,JD 2463041.5\r',
    ],
  ])('%s', (_what, headings, row) => {
    const { sets, problems } = readElements(`${headings}\n${row}`);
    expect(problems).toEqual([]);
    expect(sets).toMatchObject([
      {
        designation: '2031 KQ12',
        perihelionDistanceAu: 1.2,
        eccentricity: 0.5,
        inclinationDeg: 4,
        nodeDeg: 122,
        argumentOfPerihelionDeg: 271,
        perihelionTtJd: 2463041.5,
      },
    ]);
  });

  test('M is the mean anomaly, n the mean motion, M1 and K1 the comet’s magnitude law', () => {
    const text =
      'designation,n,e,i,node,peri,M,epoch,M1,K1\n999P,0.129195,0.617345,11.9,8,201.8,358.55,2463101.5,11,15';
    const [set] = readElements(text).sets;
    expect(set).toMatchObject({
      meanMotionDegPerDay: 0.129195,
      meanAnomalyDeg: 358.55,
      brightness: { kind: 'comet', absoluteMagnitude: 11, activity: 6 },
      given: expect.arrayContaining(['meanMotionDegPerDay', 'absoluteMagnitude', 'slope']),
    });
    expect(set!.semiMajorAxisAu).toBeCloseTo(3.8753, 4);
  });

  test('problems name line, column, value and what would be right; the good lines still load', () => {
    const rows = [
      ROW,
      ROW.replace('0.5120884', 'half'),
      ROW.replace('1.0335630', '-1'),
      `${ROW},more`,
      `"${ROW}`,
      ROW,
    ];
    const { sets, problems } = readElements([HEADINGS, ...rows].join('\n'));
    expect(sets.map((set) => set.line)).toEqual([2, 7]);
    expect(problems).toEqual([
      { line: 3, column: 22, severity: 'error', message: 'e is "half"; expected a number, like 0.764213.' },
      {
        line: 4,
        column: 12,
        severity: 'error',
        message: expect.stringMatching(/q is -1; it must be above 0/),
      },
      {
        line: 5,
        column: ROW.length + 2,
        severity: 'error',
        message: expect.stringMatching(/12 columns, the heading line 11/),
      },
      { line: 6, column: 1, severity: 'error', message: expect.stringMatching(/not closed/) },
    ]);
  });

  test('civil time is turned into TT, and said so', () => {
    const { sets, problems } = readElements(
      `${HEADINGS}\n${ROW.replace('2463150.5', '2031-10-11T00:00:00Z')}`,
    );
    // TT - UTC = 69.184 s since 2017 (IERS Bulletin C).
    expect((sets[0]!.epochTtJd! - 2463150.5) * 86400).toBeCloseTo(69.184, 3);
    expect(problems).toMatchObject([
      { line: 2, severity: 'warning', message: expect.stringMatching(/civil time/) },
    ]);
  });
});

describe('JSON', () => {
  const object = {
    designation: 'C/2031 K7',
    name: 'Ashgrove',
    perihelionTime: '2032-02-11T11:36:31.680',
    perihelionDistanceAu: 0.764213,
    eccentricity: 1.000248,
    argumentOfPerihelionDeg: 143.2097,
    nodeDeg: 61.884,
    inclinationDeg: 96.3152,
    epoch: '2032-02-17T00:00:00',
    absoluteMagnitude: 7.5,
    slope: 4,
  };

  test.each([
    ['one object', JSON.stringify(object)],
    ['an array', JSON.stringify([object])],
    ['under "sets"', JSON.stringify({ sets: [object], problems: [] }, null, 2)],
    ['one object a line', `${JSON.stringify(object)}\n`],
  ])('%s', (_what, text) => {
    const { sets, problems } = readElements(text);
    expect(problems).toEqual([]);
    expect(sets).toMatchObject([
      {
        label: 'C/2031 K7 (Ashgrove)',
        kind: 'comet',
        perihelionDistanceAu: 0.764213,
        epochTtJd: 2463279.5,
        brightness: { kind: 'comet', absoluteMagnitude: 7.5, activity: 4 },
      },
    ]);
    expect(sets[0]!.perihelionTtJd).toBeCloseTo(2463273.9837, 8);
  });

  test('what it prints it reads back as the same sets, given and derived apart', () => {
    const text = [
      JSON.stringify(object),
      JSON.stringify({
        name: '(7) Quillon',
        a: 2.6214873,
        e: 0.1438207,
        i: 7.26,
        node: 318.7,
        peri: 96.4,
        M: 211.3,
        epoch: 'K31AB',
        H: 15.4,
      }),
      JSON.stringify({
        ...object,
        designation: 'C/2031 K8',
        name: null,
        eccentricity: 1,
        frame: 'equator',
        equinox: 'B1950',
      }),
    ].join('\n');
    const first = toCheckJson(readElements(text));
    expect(first.sets.map((set) => set.label)).toEqual(['C/2031 K7 (Ashgrove)', '(7) Quillon', 'C/2031 K8']);
    const again = toCheckJson(readElements(JSON.stringify(first)));
    const same = (set: (typeof first.sets)[number]) => ({ ...set, line: 0, converted: null });
    expect(again.sets.map(same)).toEqual(first.sets.map(same));
    expect(again.problems).toEqual([]);
  });

  test('a fault is shown where it stands', () => {
    const text = `[\n  {"designation": "C/2031 K7",\n   "q": 0.76, "e": -0.5, "i": 96, "node": 61, "peri": 143,\n   "T": "2032-02-11"}\n]`;
    expect(readElements(text)).toEqual({
      sets: [],
      problems: [{ line: 3, column: 20, severity: 'error', message: expect.stringMatching(/e is -0.5/) }],
    });
  });

  test('what stood whole before a fault in the text still loads', () => {
    const whole = JSON.stringify(object);
    const { sets, problems } = readElements(`[${whole},\n${whole},\n${whole.slice(0, 60)}`);
    expect(sets).toHaveLength(2);
    expect(problems).toMatchObject([{ line: 3, severity: 'error' }]);
    expect(readElements('{"designation": }').problems).toMatchObject([{ line: 1, column: 17 }]);
  });

  test('nesting without end is a problem, not a crash', () => {
    const { problems } = readElements('['.repeat(100_000));
    expect(problems).toMatchObject([{ severity: 'error', message: expect.stringMatching(/nested deeper/) }]);
  });
});

describe('frames', () => {
  const body = { designation: '2031 KQ12', q: 1.2, e: 0.5, i: 30, node: 40, peri: 50, T: 2463041.5 };

  test('another frame is converted when declared, and both are kept', () => {
    const [set] = readElements(JSON.stringify({ ...body, frame: 'equator B1950' })).sets;
    expect(set!.converted).toEqual({
      frame: 'equator B1950',
      inclinationDeg: 30,
      nodeDeg: 40,
      argumentOfPerihelionDeg: 50,
    });
    expect(set!.inclinationDeg).not.toBeCloseTo(30, 0);
  });

  test('a frame that is not known is refused', () => {
    const { sets, problems } = readElements(JSON.stringify({ ...body, equinox: '1875' }));
    expect(sets).toEqual([]);
    expect(problems).toMatchObject([{ message: expect.stringMatching(/frame "1875" is not known/) }]);
  });
});
