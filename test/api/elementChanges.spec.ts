import 'reflect-metadata';
import {
  closeDatabase,
  closeSearchPool,
  type Database,
  getSkyTarget,
  judgeEvening,
  openDatabase,
} from '#club';
import { loadDemo } from '#demo-data';
import { type Observer, place, type SkyTarget, toRad, withPerturbations } from '#sky';
import { type NestExpressApplication } from '@nestjs/platform-express';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pino from 'pino';
import request from 'supertest';
import { createApplication } from '../../apps/server/application';
import { COMET_NAME, cometElementSets } from '../../demo-data/orbits';

// Worker threads start on the way, on machines that may be busy.
jest.setTimeout(30_000);

const asOf = '2026-12-01';
const comet = `Comet ${COMET_NAME}`;
const path = `/api/targets/${encodeURIComponent(comet)}`;
const [oldSet, newSet] = cometElementSets(asOf);

const folder = mkdtempSync(join(tmpdir(), 'duskwright-changes-'));
let database: Database;
let application: NestExpressApplication;
let now = new Date(`${asOf}T12:00:00Z`);

beforeAll(async () => {
  database = await openDatabase({ file: join(folder, 'demo.db'), now: () => now });
  await loadDemo(database, { asOf });
  application = await createApplication(database, pino({ level: 'silent' }));
  await application.listen(0, '127.0.0.1');
});
afterAll(async () => {
  await application.close();
  await closeDatabase(database);
  await closeSearchPool();
  rmSync(folder, { recursive: true });
});

const api = () => request(application.getHttpServer());

interface Evening {
  readonly siteName: string;
  readonly programmeName: string;
  readonly date: string;
}

/** The comet's showing as the season search judges it with the elements in use. */
async function showingNow(evening: Evening) {
  const { showings } = await judgeEvening(database, evening);
  return showings.find(({ target }) => target === comet)!;
}

/** A place on the sky with the planets' pull worked in, degrees. */
function seenAt(target: SkyTarget, utcMs: number, observer: Observer) {
  const day = 86_400_000;
  const moving = withPerturbations(target, utcMs - day, utcMs + day);
  const { astrometric, magnitude } = place(moving, utcMs, observer);
  return { ...astrometric, magnitude: magnitude! };
}

it("replaces the demo comet's old set with the new one and lists what that touches, figure by figure", async () => {
  // The club works with the old set, and makes a second event by it.
  now = new Date('2026-12-02T12:00:00Z');
  await api().post(`${path}/element-sets`).send(oldSet).expect(201);
  now = new Date('2026-12-03T12:00:00Z');
  const events = (await api().get('/api/events').expect(200)).body;
  const evenings: Evening[] = [
    ...events.map((event: { site: { name: string }; programme: { name: string }; date: string }) => ({
      siteName: event.site.name,
      programmeName: event.programme.name,
      date: event.date,
    })),
    { siteName: events[0].site.name, programmeName: 'Open sky', date: '2027-02-05' },
  ];
  await api().post('/api/events').send(evenings[1]).expect(201);
  const before = await getSkyTarget(database, comet);
  const showingsBefore = [await showingNow(evenings[0]!), await showingNow(evenings[1]!)];

  now = new Date('2026-12-04T12:00:00Z');
  const { body: added } = await api().post(`${path}/element-sets`).send(newSet).expect(201);
  expect(added).toMatchObject({ number: 4, target: { name: comet, elementSets: 4 } });
  const { touched } = added.change;
  expect(touched.map(({ date, site }: { date: string; site: string }) => [date, site])).toEqual(
    evenings.map(({ date, siteName }) => [date, siteName]),
  );
  const after = await getSkyTarget(database, comet);

  for (const [i, evening] of evenings.entries()) {
    const told = touched[i];
    // Showings: the same evening judged by the season search with the one set in use, then the other.
    const old = showingsBefore[i]!;
    const renewed = await showingNow(evening);
    for (const [showing, said] of [
      [old, told.before],
      [renewed, told.after],
    ]) {
      expect(said.shown).toBe(showing.shown);
      expect(said.intervals).toHaveLength(showing.intervals.length);
      showing.intervals.forEach((interval: { startMs: number; endMs: number }, k: number) => {
        // An edge is found to 5 s.
        expect(Math.abs(Date.parse(said.intervals[k].start) - interval.startMs)).toBeLessThan(5000);
        expect(Math.abs(Date.parse(said.intervals[k].end) - interval.endMs)).toBeLessThan(5000);
      });
    }
    expect([old.shown, renewed.shown]).toEqual([true, true]);
    expect(['same', 'moved']).toContain(told.showing);
    expect(Math.abs(Date.parse(told.at) - renewed.best!.utcMs)).toBeLessThan(1000);

    // The shift: two places, and the angle between them by a formula of this test's own.
    const { body: site } = await api()
      .get(`/api/sites/${encodeURIComponent(evening.siteName)}`)
      .expect(200);
    const observer: Observer = {
      latitudeRad: toRad(site.latitudeDeg),
      longitudeRad: toRad(site.longitudeDeg),
      elevationM: site.elevationM,
    };
    const a = seenAt(before, Date.parse(told.at), observer);
    const b = seenAt(after, Date.parse(told.at), observer);
    const half = (angle: number): number => Math.sin(angle / 2) ** 2;
    const chord =
      half(b.decRad - a.decRad) + Math.cos(a.decRad) * Math.cos(b.decRad) * half(b.raRad - a.raRad);
    const arcmin = (2 * Math.asin(Math.sqrt(chord)) * 10_800) / Math.PI;
    expect(arcmin).toBeGreaterThan(5);
    expect(Math.abs(told.shiftArcmin - arcmin)).toBeLessThan(0.002);
    const east = (b.raRad - a.raRad) * Math.cos((a.decRad + b.decRad) / 2);
    const north = b.decRad - a.decRad;
    // On so small a piece of sky the plane serves: to a quarter of a degree.
    const angleDeg = ((Math.atan2(east, north) * 180) / Math.PI + 360) % 360;
    expect(Math.abs(told.positionAngleDeg - angleDeg)).toBeLessThan(0.25);
    expect(told.magnitudeChange).toBeCloseTo(b.magnitude - a.magnitude, 4);

    // Fields of 60, 8 and 1.5 degrees; half a millimetre of the widest sheet's 191.9.
    for (const [k, fieldDeg] of [60, 8, 1.5].entries()) {
      const scale = told.scales[k];
      expect(scale).toMatchObject({ fieldDeg, harmless: !told.printAgain.includes(scale.scale) });
      expect(scale.fieldFraction).toBeCloseTo(arcmin / 60 / fieldDeg, 5);
      expect(Math.abs(scale.shiftMm / ((191.9 * arcmin) / 60 / fieldDeg) - 1)).toBeLessThan(0.025);
    }
    expect(told.printAgain).toEqual(expect.arrayContaining(['binocular', 'eyepiece']));
  }

  // It can be had again. Of the event that was judged by the old set the pages say it; the demo's own had been
  // judged by the very set that came back.
  expect((await api().get(`${path}/changes`).expect(200)).body).toEqual({ change: added.change });
  const [{ id: first }] = touched[0].events;
  const [{ id }] = touched[1].events;
  expect((await api().get(`/api/events/${first}/changes`).expect(200)).body).toEqual([]);
  const { body: ofEvent } = await api().get(`/api/events/${id}/changes`).expect(200);
  expect(ofEvent).toMatchObject([{ target: comet, date: evenings[1]!.date }]);
  for (const page of [`/events/${id}`, '/?from=2026-12-05&to=2026-12-20']) {
    const { text } = await api().get(page).set('Accept', 'text/html').expect(200);
    expect(text).toMatch(
      new RegExp(
        `<p class="notice">\\s*New elements: ${comet} stands [^<]* where charts printed before [^<]*: print `,
      ),
    );
  }
});

it('tells how far the comet can be trusted, for a date and for an event', async () => {
  const { body: trust } = await api().get(`${path}/trust?date=2027-01-15`).expect(200);
  expect(trust).toMatchObject({ body: comet, observedArcDays: 107, arcFrom: 'source' });
  // The epoch lies 12 days before the demo's day; midnight at the end of the date is 58 days on.
  expect(trust.ageDays).toBeCloseTo(58, 2);
  expect(trust.eyepiece.bad).toBeCloseTo(trust.expectedError.badArcsec / 2700, 9);
  expect(trust.words).toMatch(/outgassing.*rule of thumb/);
  const [event] = (await api().get('/api/events').expect(200)).body;
  const { body: bodies } = await api().get(`/api/events/${event.id}/trust`).expect(200);
  expect(bodies.map(({ body }: { body: string }) => body)).toEqual(
    expect.arrayContaining([comet, 'Corvane']),
  );
  const { text } = await api().get(`/events/${event.id}`).set('Accept', 'text/html').expect(200);
  expect(text).toContain(bodies.find(({ body }: { body: string }) => body === comet).line);

  await api().get(`${path}/trust`).expect(400);
  await api().get('/api/targets/Jupiter/trust?date=2027-01-15').expect(409);
  await api().get('/api/targets/Jupiter/changes').expect(409);
});

it('takes a pasted text of elements, the good lines of it', async () => {
  const lines = [
    'designation,T,q,e,i,node,peri,epoch,H',
    `${newSet.designation!},2027-03-12.1,1.2737,1.0003,61.97,334.4,149.64,2026-12-01,5.6`,
    `${newSet.designation!},2027-03-12.1,-1,1.0003,61.97,334.4,149.64,2026-12-01,5.6`,
  ];
  const { body } = await api()
    .post(`${path}/element-sets`)
    .send({ text: lines.join('\n') })
    .expect(201);
  expect(body).toMatchObject({ sets: [{ number: 5 }], held: 0, change: { after: { number: 5 } } });
  expect(body.problems).toMatchObject([{ line: 3, severity: 'error' }]);
  expect(body.problems[0].column).toBeGreaterThan(1);

  const bad = await api().post(`${path}/element-sets`).send({ text: 'No orbit in here.' }).expect(400);
  expect(bad.body.problems[0].message).toMatch(/^Line 1, column 1: /);
  await api().post(`${path}/element-sets`).send({ text: '' }).expect(400);
  await api().post(`${path}/element-sets`).send({}).expect(400);
  expect((await api().get(`${path}/element-sets`).expect(200)).body).toHaveLength(5);
});
