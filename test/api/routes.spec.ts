import 'reflect-metadata';
import { closeSearchPool } from '#club';
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

const date = '2027-01-29';
const evening = { siteName: 'Brackenfold', programmeName: 'Winter lights', date };

/** Waits until a search is over. */
async function finished(location: string) {
  for (;;) {
    const { body } = await api().get(location).expect(200);
    if (body.state !== 'running') return body;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

describe('what the club has', () => {
  it('tells and changes its settings', async () => {
    await api().patch('/api/club').send({ bringWords: 'A warm hat.' }).expect(200);
    const { body } = await api().get('/api/club').expect(200);
    expect(body).toMatchObject({ name: 'Fernhollow Sky Club', locale: 'en-GB', bringWords: 'A warm hat.' });
  });

  it('enters a site with the zone of its place, finds and changes it', async () => {
    const made = await api()
      .post('/api/sites')
      .send({ name: 'Gull Point', latitudeDeg: 69.6, longitudeDeg: 18.9, sky: { bortleClass: 3 } })
      .expect(201);
    expect(made.headers['location']).toBe(`/api/sites/${made.body.id}`);
    // Bortle class 3: the middle of 21.69 to 21.89 mag/arcsec2 (common practice, see libs/darkness/luminance.ts).
    expect(made.body).toMatchObject({ zone: 'Europe/Oslo', sky: { magPerArcsec2: 21.79, bortleClass: 3 } });

    const changed = await api()
      .patch(made.headers['location']!)
      .send({
        horizon: [{ azimuthDeg: 90, altitudeDeg: 12 }],
        closures: [{ from: date, to: date, why: 'Storm' }],
      })
      .expect(200);
    const { body } = await api().get('/api/sites/gull%20point').expect(200);
    expect(body).toEqual(changed.body);
    expect(body).toMatchObject({ name: 'Gull Point', horizon: [{ azimuthDeg: 90, altitudeDeg: 12 }] });
    const all = await api().get('/api/sites').expect(200);
    expect(all.body.map((site: { name: string }) => site.name)).toEqual([
      'Brackenfold',
      'Gull Point',
      'Wether Downs',
    ]);
  });

  it('enters and changes an instrument', async () => {
    const made = await api()
      .post('/api/instruments')
      .send({ name: 'Loan binocular', kind: 'binocular', apertureMm: 50, magnifications: [10] })
      .expect(201);
    expect(made.body).toMatchObject({ eyes: 2, transmission: 0.8 });
    await api().patch(made.headers['location']!).send({ transmission: 0.9 }).expect(200);
    expect((await api().get(made.headers['location']!).expect(200)).body).toMatchObject({
      transmission: 0.9,
    });
    expect((await api().get('/api/instruments').expect(200)).body).toHaveLength(3);
  });

  it('enters targets of every kind and keeps every element set', async () => {
    for (const target of [
      { kind: 'solarSystem', body: 'Saturn' },
      { kind: 'deepSky', catalogueId: 'ngc 869' },
      { kind: 'place', name: 'The red star', raDeg: 77.28, decDeg: -14.8, magnitude: 7.7 },
    ]) {
      await api().post('/api/targets').send(target).expect(201);
    }
    const made = await api()
      .post('/api/targets')
      .send({
        kind: 'orbit',
        name: '(912345) Larkspur',
        elements: {
          kind: 'asteroid',
          epoch: '2027-02-01',
          semiMajorAxisAu: 2.5,
          eccentricity: 0.2,
          meanAnomalyDeg: 0,
          inclinationDeg: 10,
          nodeDeg: 80,
          argumentOfPerihelionDeg: 120,
          absoluteMagnitude: 9,
          slope: 0.15,
        },
      })
      .expect(201);
    // q = a (1 - e) = 2.5 x 0.8 au; a mean anomaly of 0 puts the perihelion at the epoch.
    expect(made.body.elements.perihelionDistanceAu).toBeCloseTo(2, 12);
    expect(made.body.elements.perihelionTime).toBe('2027-02-01T00:00:00.00');

    const comet = encodeURIComponent('C/2026 Q9 (Thistlewood)');
    const newer = {
      kind: 'comet',
      epoch: '2027-03-01',
      perihelionTime: '2027-03-14T09:00:00',
      perihelionDistanceAu: 0.911,
      eccentricity: 1.0003,
      inclinationDeg: 62.3,
      nodeDeg: 41.7,
      argumentOfPerihelionDeg: 133.2,
      absoluteMagnitude: 7,
      slope: 4,
    };
    await api().post(`/api/targets/${comet}/element-sets`).send(newer).expect(201);
    const sets = await api().get(`/api/targets/${comet}/element-sets`).expect(200);
    expect(sets.body.map((set: { number: number }) => set.number)).toEqual([2, 1]);
    const { body } = await api().get(`/api/targets/${comet}`).expect(200);
    expect(body).toMatchObject({
      elementSets: 2,
      elements: { number: 2, perihelionTime: '2027-03-14T09:00:00.00' },
    });

    await api().patch(`/api/targets/${comet}`).send({ comaArcmin: 6, gloss: 'A comet.' }).expect(200);
    expect((await api().get('/api/targets').expect(200)).body).toHaveLength(8);
  });

  it('enters and changes a programme', async () => {
    const made = await api()
      .post('/api/programmes')
      .send({
        name: 'Saturn nights',
        items: [{ target: 'Saturn', instrument: 'Club reflector' }],
        hours: { kind: 'fixed', start: '21:00', end: '23:30' },
      })
      .expect(201);
    await api().patch(made.headers['location']!).send({ moon: 'dark' }).expect(200);
    expect((await api().get('/api/programmes/saturn%20nights').expect(200)).body).toMatchObject({
      moon: 'dark',
      items: [{ target: 'Saturn', weight: 1, leastMinutes: 20, leastAltitudeDeg: 15 }],
    });
    expect((await api().get('/api/programmes').expect(200)).body).toHaveLength(2);
  });

  it("enters the club's other dates", async () => {
    await api().post('/api/club-dates').send({ date: '2027-02-06', name: 'Annual meeting' }).expect(201);
    expect((await api().get('/api/club-dates').expect(200)).body).toMatchObject([{ date: '2027-02-06' }]);
  });
});

describe('searches', () => {
  it('runs one as a job: accepted, looked at, done, best first', async () => {
    const started = await api()
      .post('/api/searches')
      .send({ from: '2027-01-10', to: '2027-02-28' })
      .expect(202);
    const search = await finished(started.headers['location']!);
    expect(search).toMatchObject({ state: 'done', problem: null });
    const scores = search.result.evenings.map(({ score }: { score: number }) => score);
    expect(scores.length).toBeGreaterThan(5);
    expect(scores).toEqual([...scores].sort((a, b) => b - a));
    expect(search.progress.done).toBe(search.progress.total);
    for (const { parts, score } of search.result.evenings) {
      const sum = parts.reduce((points: number, part: { points: number }) => points + part.points, 0);
      expect(sum).toBeCloseTo(score, 9);
    }
    expect(search.result.closed).toContainEqual({
      site: 'Brackenfold',
      date: '2027-02-06',
      why: 'The club already holds: Annual meeting.',
    });
  });

  it('gives no more evenings than asked for', async () => {
    const started = await api()
      .post('/api/searches')
      .send({ from: '2027-01-10', to: '2027-02-28', limit: 2, siteNames: ['Wether Downs'] })
      .expect(202);
    const { result } = await finished(started.headers['location']!);
    expect(result.evenings).toHaveLength(2);
    expect(result.searched.sites).toBe(1);
  });

  it('cancels one, which is then gone', async () => {
    const started = await api()
      .post('/api/searches')
      .send({ from: '2027-01-01', to: '2031-12-31' })
      .expect(202);
    await api().delete(started.headers['location']!).expect(204);
    await api().get(started.headers['location']!).expect(404);
    await api().delete(started.headers['location']!).expect(404);
  });

  it('takes three at once and no more', async () => {
    const long = { from: '2027-01-01', to: '2031-12-31' };
    const started = await Promise.all(
      [1, 2, 3].map(() => api().post('/api/searches').send(long).expect(202)),
    );
    const refused = await api().post('/api/searches').send(long).expect(429);
    expect(refused.body.detail).toBe('3 searches run already; wait for one or cancel it.');
    for (const { headers } of started) await api().delete(headers['location']!).expect(204);
  });
});

describe('evenings, events, charts', () => {
  it('judges one evening', async () => {
    const { body } = await api().get('/api/evenings').query(evening).expect(200);
    expect(body).toMatchObject({ site: 'Brackenfold', date, zone: 'Europe/Zurich', of: 4 });
    expect(Date.parse(body.publicHours.start)).toBeLessThan(Date.parse(body.publicHours.end));
  });

  it('takes an event from draft to called off', async () => {
    const made = await api().post('/api/events').send(evening).expect(201);
    const at = made.headers['location']!;
    expect(made.body).toMatchObject({
      status: 'draft',
      sequence: 0,
      title: 'Winter lights at Brackenfold',
      date,
    });
    await api().post(`${at}/publish`).expect(200);
    const changed = await api().patch(at).send({ words: 'Bring a friend.' }).expect(200);
    expect(changed.body).toMatchObject({ status: 'published', sequence: 1, uid: made.body.uid });
    const off = await api().post(`${at}/call-off`).send({ why: 'Fog.' }).expect(200);
    expect(off.body).toMatchObject({ status: 'calledOff', sequence: 2, callOffWhy: 'Fog.' });
    expect((await api().get(at).expect(200)).body).toEqual(off.body);
    expect((await api().get('/api/events').expect(200)).body).toEqual([off.body]);
    await api().post(`${at}/publish`).expect(409);
  });

  it('prints the packet of an event and remembers it', async () => {
    const { body: event } = await api().post('/api/events').send(evening).expect(201);
    const printed = await api()
      .post(`/api/events/${event.id}/packets`)
      .send({ sheets: ['runSheet'], paper: 'letter' })
      .expect(200)
      .expect('Content-Type', /application\/pdf/);
    expect(printed.body.subarray(0, 5).toString()).toBe('%PDF-');
    const { body: packets } = await api().get(`/api/events/${event.id}/packets`).expect(200);
    expect(packets).toHaveLength(1);
    await api().post('/api/events/nowhere/packets').send({}).expect(404);
    const wrong = await api().post(`/api/events/${event.id}/packets`).send({ sheets: [] }).expect(400);
    expect(wrong.body.problems[0].field).toBe('sheets');
    await api().post(`/api/events/${event.id}/call-off`).send({ why: 'Done.' }).expect(200);
  });

  it('draws the charts of an event', async () => {
    const { body } = await api().post('/api/events').send(evening).expect(201);
    const charts = `/api/events/${body.id}/charts`;
    const pdf = await api()
      .get(`${charts}/Jupiter?scale=eye&paper=letter`)
      .expect(200)
      .expect('Content-Type', 'application/pdf');
    expect(pdf.body.subarray(0, 5).toString()).toBe('%PDF-');
    const svg = await api()
      .get(`${charts}/M%2031?scale=binocular&format=svg&field=6`)
      .expect(200)
      .expect('Content-Type', /^image\/svg\+xml/);
    expect(svg.body.toString()).toContain('<svg');
    const unknown = await api().get(`${charts}/Vulcan?scale=eye`).expect(404);
    expect(unknown.body.problems[0]).toMatchObject({ field: 'target', value: 'Vulcan' });
    const wrong = await api().get(`${charts}/Jupiter?scale=huge`).expect(400);
    expect(wrong.body.problems[0].message).toBe('scale was "huge"; give one of eye, binocular, eyepiece.');
  });
});

describe('the documentation', () => {
  it('describes every route of the API, with the fields of what is sent', async () => {
    const { body } = await api().get('/api/openapi.json').expect(200);
    const described = Object.entries(body.paths as Record<string, object>)
      .flatMap(([path, methods]) => Object.keys(methods).map((method) => `${method} ${path}`))
      .sort();
    expect(described).toEqual(
      [
        'get /api/club',
        'patch /api/club',
        'get /api/club-dates',
        'post /api/club-dates',
        ...['sites/{site}', 'instruments/{instrument}', 'targets/{target}', 'programmes/{programme}'].flatMap(
          (one) => [
            `get /api/${one.split('/')[0]!}`,
            `post /api/${one.split('/')[0]!}`,
            `get /api/${one}`,
            `patch /api/${one}`,
          ],
        ),
        'get /api/targets/{target}/element-sets',
        'post /api/targets/{target}/element-sets',
        'get /api/targets/{target}/changes',
        'get /api/targets/{target}/trust',
        'post /api/searches',
        'get /api/searches/{id}',
        'delete /api/searches/{id}',
        'get /api/evenings',
        'get /api/events',
        'post /api/events',
        'get /api/events/{id}',
        'patch /api/events/{id}',
        'post /api/events/{id}/publish',
        'post /api/events/{id}/call-off',
        'get /api/events/{id}/charts/{target}',
        'get /api/events/{id}/packets',
        'post /api/events/{id}/packets',
        'get /api/events/{id}/changes',
        'get /api/events/{id}/trust',
        'get /calendar.ics',
        'get /sites/{site}/calendar.ics',
      ].sort(),
    );
    const { SiteBody, TargetBody, ElementsBody } = body.components.schemas;
    expect(SiteBody.properties.latitudeDeg).toMatchObject({ type: 'number', minimum: -90, maximum: 90 });
    expect(SiteBody.required).toEqual(['name', 'latitudeDeg', 'longitudeDeg', 'sky']);
    expect(TargetBody.oneOf ?? TargetBody.anyOf).toHaveLength(4);
    expect(ElementsBody.anyOf).toHaveLength(2);
  });

  it('has a page for people that runs its own scripts only', async () => {
    const page = await api().get('/api/docs').expect(200);
    expect(page.headers['content-security-policy']).toContain("script-src 'self'");
    expect(page.text).toContain('Duskwright');
  });
});
