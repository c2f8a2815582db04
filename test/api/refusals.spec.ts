import 'reflect-metadata';
import { closeSearchPool, updateClub } from '#club';
import request from 'supertest';
import { wholeDatabase } from '../../libs/club/fixtures/smallClub';
import { startServer, type TestServer } from './testServer';

let server: TestServer;
let eventId: string;
beforeAll(async () => {
  server = await startServer();
  await updateClub(server.database, { publicAddress: 'https://evenings.example.org' });
  const evening = { siteName: 'Brackenfold', programmeName: 'Winter lights', date: '2027-01-29' };
  const { body } = await request(server.address).post('/api/events').send(evening).expect(201);
  eventId = body.id as string;
});
afterAll(async () => {
  await server.close();
  await closeSearchPool();
});

const site = { name: 'New ground', latitudeDeg: 47, longitudeDeg: 8, sky: { magPerArcsec2: 21 } };
const elements = {
  kind: 'comet',
  perihelionTime: '2027-03-14',
  perihelionDistanceAu: 0.9,
  eccentricity: -0.2,
  inclinationDeg: 60,
  nodeDeg: 40,
  argumentOfPerihelionDeg: 130,
};
const hours = { kind: 'fixed', start: '20:00', end: '23:00' };

/** Bad requests: what, method, path, body, status, the field named first, and what its message must hold. */
const bad: readonly (readonly [string, 'post' | 'patch' | 'get', string, object, number, string, string])[] =
  [
    [
      'a latitude out of range',
      'post',
      '/api/sites',
      { ...site, latitudeDeg: 95 },
      400,
      'latitudeDeg',
      'was 95; give degrees from -90 to 90',
    ],
    [
      'a longitude that is text',
      'post',
      '/api/sites',
      { ...site, longitudeDeg: 'east' },
      400,
      'longitudeDeg',
      'was "east"; give degrees from -180 to 180',
    ],
    [
      'an unknown zone',
      'post',
      '/api/sites',
      { ...site, zone: 'Mars/Olympus' },
      400,
      'zone',
      'was "Mars/Olympus"; give the IANA name',
    ],
    [
      'a horizon that goes backwards',
      'post',
      '/api/sites',
      {
        ...site,
        horizon: [
          { azimuthDeg: 90, altitudeDeg: 3 },
          { azimuthDeg: 45, altitudeDeg: 3 },
        ],
      },
      400,
      'horizon[1].azimuthDeg',
      'was 45; give azimuths that rise',
    ],
    [
      'an unknown field',
      'post',
      '/api/sites',
      { ...site, colour: 'red' },
      400,
      'colour',
      'is not a field that is known here',
    ],
    [
      'an unknown field in a change',
      'patch',
      '/api/sites/Brackenfold',
      { colour: 'red' },
      400,
      'colour',
      'is not a field that is known here',
    ],
    [
      'a list in place of an object',
      'post',
      '/api/sites',
      [site],
      400,
      '',
      'give an object with named fields',
    ],
    [
      'an unknown site',
      'patch',
      '/api/sites/Elsewhere',
      { elevationM: 1 },
      404,
      'site',
      'there are Brackenfold, Wether Downs',
    ],
    [
      'a name that is taken',
      'post',
      '/api/sites',
      { ...site, name: 'Brackenfold' },
      409,
      'name',
      'give a name that no other site has',
    ],
    [
      'an empty programme',
      'post',
      '/api/programmes',
      { name: 'Nothing', items: [], hours },
      400,
      'items',
      'an empty programme promises nothing',
    ],
    [
      'a season longer than five years',
      'post',
      '/api/searches',
      { from: '2027-01-01', to: '2032-06-01' },
      400,
      'to',
      'a season is at most five years long',
    ],
    [
      'a season over dates that do not exist',
      'post',
      '/api/searches',
      { from: '2027-02-30', to: '2027-06-31' },
      400,
      'from',
      'was "2027-02-30"; give a date that exists',
    ],
    [
      'a season at an unknown site',
      'post',
      '/api/searches',
      { from: '2027-01-01', to: '2027-02-01', siteNames: ['Elsewhere'] },
      404,
      'siteNames',
      'was "Elsewhere"',
    ],
    [
      'elements with e < 0',
      'post',
      '/api/targets',
      { kind: 'orbit', name: 'Comet', elements },
      400,
      'elements.eccentricity',
      'was -0.2; give a number from 0',
    ],
    [
      'newer elements with e < 0',
      'post',
      '/api/targets/C%2F2026%20Q9%20(Thistlewood)/element-sets',
      elements,
      400,
      'eccentricity',
      'was -0.2; give a number from 0',
    ],
    [
      'an event on a date that does not exist',
      'post',
      '/api/events',
      { siteName: 'Brackenfold', programmeName: 'Winter lights', date: '2027-13-01' },
      400,
      'date',
      'was "2027-13-01"; give a date that exists',
    ],
    [
      'an evening without its date',
      'get',
      '/api/evenings?siteName=Brackenfold&programmeName=Winter%20lights',
      {},
      400,
      'date',
      'was left out',
    ],
    [
      'a query nobody knows',
      'get',
      '/api/evenings?siteName=Brackenfold&programmeName=Winter%20lights&date=2027-01-29&moon=1',
      {},
      400,
      'moon',
      'is not a field that is known here',
    ],
    ['an event nobody knows', 'get', '/api/events/nothing', {}, 404, 'event', 'give the id of an event'],
  ];

it.each(bad)(
  'answers %s with a problem that says what would be right',
  async (_what, method, path, body, status, field, message) => {
    const before = await wholeDatabase(server.database);
    const call = request(server.address)[method](path);
    const answer = await (method === 'get' ? call : call.send(body)).expect(status);
    expect(answer.headers['content-type']).toBe('application/problem+json; charset=utf-8');
    const { title, detail, problems } = JSON.parse(answer.text) as {
      readonly title: string;
      readonly detail: string;
      readonly problems: readonly { readonly field: string; readonly message: string }[];
    };
    expect(problems[0]).toMatchObject({ field, message: expect.stringContaining(message) as unknown });
    expect(detail).toContain(problems[0]!.message);
    expect(title).not.toBe('');
    expect(await wholeDatabase(server.database)).toBe(before);
  },
);

describe('whatever the body', () => {
  it.each([
    ['broken JSON', 'application/json', '{"name":', 400],
    ['more than it takes', 'application/json', JSON.stringify({ name: 'x'.repeat(600_000) }), 413],
    ['JSON in an encoding nobody speaks', 'application/json; charset=utf-99', '{}', 415],
  ])('refuses %s without a stack trace', async (_what, type, body, status) => {
    const before = await wholeDatabase(server.database);
    const { text, headers } = await request(server.address)
      .post('/api/sites')
      .set('Content-Type', type)
      .send(body)
      .expect(status);
    expect(headers['content-type']).toContain('application/problem+json');
    expect(text).not.toMatch(/\bat \S+ \(|node_modules|\.ts:/);
    expect(await wholeDatabase(server.database)).toBe(before);
  });

  it('answers an unknown address with a problem, to people with a page', async () => {
    const { body } = await request(server.address).get('/api/nothing').expect(404);
    expect(body).toMatchObject({ title: 'Not Found', status: 404 });
    const page = await request(server.address).get('/nothing').set('Accept', 'text/html').expect(404);
    expect(page.text).toContain('Nothing was changed.');
  });

  it('says when an address cannot be read', async () => {
    const { body } = await request(server.address).get('/api/sites/%E0%A4%A').expect(400);
    expect(body.detail).toBe("Failed to decode param '%E0%A4%A'");
  });

  it('escapes what it quotes', async () => {
    const page = await request(server.address)
      .get('/?from=%3Cscript%3E')
      .set('Accept', 'text/html')
      .expect(400);
    expect(page.text).not.toContain('<script>');
    expect(page.text).toContain('&lt;script&gt;');
  });
});

describe("a stranger's page", () => {
  const publish = () => request(server.address).post(`/api/events/${eventId}/publish`);

  it.each([
    ['another origin', { Origin: 'https://evil.example' }],
    ['an origin that is hidden', { Origin: 'null' }],
    ['another port of this machine', { Origin: 'http://127.0.0.1:1' }],
    ['a request marked cross-site', { 'Sec-Fetch-Site': 'cross-site' }],
    ['a request from a neighbouring name', { 'Sec-Fetch-Site': 'same-site' }],
  ])('changes nothing from %s', async (_what, headers) => {
    const before = await wholeDatabase(server.database);
    await publish().set(headers).expect(403);
    await request(server.address).post(`/events/${eventId}/publish`).type('form').set(headers).expect(403);
    expect(await wholeDatabase(server.database)).toBe(before);
  });

  it.each([['evil.example'], ['evil.example:4680'], ['localhost.evil.example'], ['127.0.0.1.evil.example']])(
    'reads nothing by the name %s',
    async (host) => {
      const { text } = await request(server.address).get('/api/events').set('Host', host).expect(421);
      expect(text).not.toContain('Winter lights');
    },
  );

  it.each([['localhost:4680'], ['127.0.0.1'], ['[::1]:4680'], ['evenings.example.org']])(
    'is none when it asks for %s',
    async (host) => {
      await request(server.address).get('/api/events').set('Host', host).expect(200);
    },
  );

  it('is none when the page is our own', async () => {
    const own = { Origin: server.address, 'Sec-Fetch-Site': 'same-origin' };
    await publish().set(own).expect(200);
  });
});

it('sends headers that let nothing foreign in', async () => {
  const { headers } = await request(server.address).get('/').expect(200);
  expect(headers['content-security-policy']).toContain("default-src 'none'");
  expect(headers['content-security-policy']).toContain("script-src 'none'");
  expect(headers['x-content-type-options']).toBe('nosniff');
  expect(headers['x-powered-by']).toBeUndefined();
});
