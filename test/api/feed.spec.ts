import 'reflect-metadata';
import { closeSearchPool } from '#club';
import ical from 'node-ical';
import request from 'supertest';
import { startServer, type TestServer } from './testServer';

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(async () => {
  await server.close();
  await closeSearchPool();
});

const api = () => request(server.address);

async function publish(siteName: string, date: string): Promise<string> {
  const { body } = await api()
    .post('/api/events')
    .send({ siteName, programmeName: 'Winter lights', date })
    .expect(201);
  await api().post(`/api/events/${body.id}/publish`).expect(200);
  return body.id as string;
}

const eventsOf = (text: string) =>
  Object.values(ical.sync.parseICS(text)).filter((component) => component.type === 'VEVENT');

it('follows an event through its life, and sends nothing twice', async () => {
  const empty = await api().get('/calendar.ics').expect(200);
  expect(empty.headers['content-type']).toBe('text/calendar; charset=utf-8');
  expect(empty.headers['cache-control']).toBe('no-cache');
  expect(eventsOf(empty.text)).toEqual([]);

  const id = await publish('Brackenfold', '2027-01-29');
  const shown = await api().get('/calendar.ics').expect(200);
  expect(shown.headers['etag']).not.toBe(empty.headers['etag']);
  const { body: event } = await api().get(`/api/events/${id}`).expect(200);
  expect(eventsOf(shown.text)).toMatchObject([
    {
      uid: event.uid,
      status: 'CONFIRMED',
      summary: 'Winter lights at Brackenfold',
      start: new Date(event.startsAt),
      end: new Date(event.endsAt),
    },
  ]);

  const again = await api().get('/calendar.ics').set('If-None-Match', shown.headers['etag']!).expect(304);
  expect(again.text).toBe('');
  expect(again.headers['etag']).toBe(shown.headers['etag']);
  await api().get('/calendar.ics').set('If-None-Match', `"x", W/${shown.headers['etag']!}`).expect(304);
  await api().get('/calendar.ics').set('If-None-Match', '"x"').expect(200);

  server.setNow('2027-01-29T10:00:00Z');
  await api().post(`/api/events/${id}/call-off`).send({ why: 'Fog in the valley.' }).expect(200);
  const off = await api().get('/calendar.ics').set('If-None-Match', shown.headers['etag']!).expect(200);
  expect(eventsOf(off.text)).toMatchObject([{ uid: event.uid, status: 'CANCELLED', sequence: '1' }]);
  expect(eventsOf(off.text)[0]!.description).toContain('This evening is called off: Fog in the valley.');
});

it('keeps drafts to the club, and has a calendar for each site', async () => {
  await api()
    .post('/api/events')
    .send({ siteName: 'Brackenfold', programmeName: 'Winter lights', date: '2027-02-05' })
    .expect(201);
  await publish('Wether Downs', '2027-02-12');
  const { body: sites } = await api().get('/api/sites').expect(200);
  const counts = await Promise.all(
    sites.map(async ({ id, name }: { id: string; name: string }) => [
      name,
      eventsOf((await api().get(`/sites/${id}/calendar.ics`).expect(200)).text).length,
    ]),
  );
  expect(counts).toEqual([
    ['Brackenfold', 1],
    ['Wether Downs', 1],
  ]);
  await api().get('/sites/nowhere/calendar.ics').expect(404);
});
