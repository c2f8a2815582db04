import { loadStars } from '#catalogue';
import { localSky } from './horizon';
import { landmarkOf, separationOf, starField, visitNear } from './landmarks';
import { wayTo } from './way';
import { circleReadings } from './settingCircles';
import { circleWords, type WayScene, wayText } from './wayWords';

const degree = Math.PI / 180;
const stars = loadStars();

function sceneOf(name: string, raDeg: number, decDeg: number, magnitude: number): WayScene {
  return {
    stars,
    target: {
      name,
      raRad: raDeg * degree,
      decRad: decDeg * degree,
      magnitude,
      kind: 'galaxy',
      majorArcmin: 0,
      minorArcmin: 0,
      positionAngleDeg: null,
    },
    finderFieldRad: 6 * degree,
    view: null,
    sky: null,
    isHidden: () => false,
  };
}

const star = (raDeg: number, decDeg: number, magnitude: number) => ({
  raRad: raDeg * degree,
  decRad: decDeg * degree,
  magnitude,
  label: null,
});

describe('landmarkOf', () => {
  it('counts as rivals what is near and about as bright, and pairs what stands close', () => {
    const field = starField([
      star(10, 0, 5),
      star(10.1, 0, 5.5),
      star(11, 0, 5.4),
      star(10, 1, 6),
      star(14, 0, 4),
    ]);
    const index = field.stars.findIndex(({ raRad }) => raRad === 10 * degree);
    const bright = field.stars.findIndex((one) => one.magnitude === 5);
    expect(index).toBeGreaterThanOrEqual(0);
    const { partner, rivals } = landmarkOf(field, bright);
    expect(partner?.magnitude).toBe(5.5);
    expect(rivals).toBe(1);
  });

  it('visits each star within the radius, across 0h too', () => {
    const field = starField([star(359.5, 10, 4), star(0.5, 10, 4), star(3, 10, 4)]);
    const found: number[] = [];
    visitNear(field, { raRad: 0, decRad: 10 * degree }, degree, (_, separation) =>
      found.push(separation / degree),
    );
    expect(found).toHaveLength(2);
    for (const separation of found) expect(separation).toBeCloseTo(0.4924, 3);
  });
});

describe('wayTo', () => {
  it('leads to the Ring Nebula from one of the two stars it lies between', () => {
    const way = wayTo(stars, {
      target: sceneOf('M 57', 283.396, 33.029, 8.8).target,
      finderFieldRad: 6 * degree,
      isHidden: () => false,
    });
    if (way.kind !== 'hops') throw new Error('there is a way');
    expect(way.hops).toHaveLength(1);
    expect(['Sulafat', 'Sheliak']).toContain(way.hops[0]!.from.star.label?.name);
  });

  it('joins its hops end to end and ends at the target', () => {
    const { target } = sceneOf('M 81', 148.888, 69.065, 6.9);
    const way = wayTo(stars, { target, finderFieldRad: 6 * degree, isHidden: () => false });
    if (way.kind !== 'hops') throw new Error('there is a way');
    way.hops.forEach(({ from, to, lengthRad }, index) => {
      expect(to?.star).toBe(way.hops[index + 1]?.from.star);
      expect(separationOf(from.star, to?.star ?? target)).toBeCloseTo(lengthRad, 12);
    });
    expect(way.hops.at(-1)!.to).toBeNull();
  });

  it('goes by nothing that is hidden', () => {
    const { target } = sceneOf('M 57', 283.396, 33.029, 8.8);
    const isHidden = ({ decRad }: { decRad: number }): boolean => decRad < 33.029 * degree;
    const way = wayTo(stars, { target, finderFieldRad: 6 * degree, isHidden });
    if (way.kind !== 'hops') throw new Error('there is a way from the north');
    for (const { from } of way.hops) expect(isHidden(from.star)).toBe(false);
  });

  it('needs none to what is bright, and finds none where nothing stands out or a finder shows too little', () => {
    const bright = { ...sceneOf('Venus', 100, 20, -4).target };
    expect(wayTo(stars, { target: bright, finderFieldRad: 6 * degree, isHidden: () => false }).kind).toBe(
      'plain',
    );
    const { target } = sceneOf('M 81', 148.888, 69.065, 6.9);
    expect(wayTo(stars, { target, finderFieldRad: 6 * degree, isHidden: () => true }).kind).toBe('none');
    expect(wayTo(stars, { target, finderFieldRad: 1 * degree, isHidden: () => false }).kind).toBe('none');
  });
});

describe('wayText', () => {
  it('says each step with its length, its share of the finder and where it lands', () => {
    const scene = sceneOf('M 57', 283.396, 33.029, 8.8);
    const way = wayTo(stars, {
      target: scene.target,
      finderFieldRad: scene.finderFieldRad,
      isHidden: () => false,
    });
    expect(wayText(way, scene)).toEqual({
      heading: 'The way to M 57, with a finder that shows 6°',
      steps: ['From Sulafat (magnitude 3.2) go 1.2°, a fifth of a finder field, to the west, to M 57.'],
      notes: [],
    });
  });

  it('says so where there is no good way, and gives the circles', () => {
    const view = {
      utcMs: Date.parse('2027-07-01T21:30:00Z'),
      latitudeRad: 47 * degree,
      longitudeRad: 8 * degree,
      clock: '23:30',
    };
    const scene = { ...sceneOf('M 57', 283.396, 33.029, 8.8), view, sky: localSky(view) };
    const { notes } = wayText({ kind: 'none' }, scene);
    expect(notes[0]).toMatch(/^No good way from star to star with a 6° finder/);
    expect(notes[1]).toMatch(
      /^Setting circles at 23:30: hour angle \d+h \d\dm east of the meridian, Dec \+33° 0\d′ \(of date\); altitude \d+\.\d°, azimuth \d+\.\d°\.$/,
    );
  });

  it('gives the place of J2000 alone where no hour is known', () => {
    expect(circleWords(sceneOf('M 57', 283.396, 33.029, 8.8))).toEqual([
      'RA 18h 53.6m, Dec +33° 02′ (J2000).',
    ]);
  });
});

describe('circleReadings', () => {
  it('gives back the altitude by the formula from hour angle and declination', () => {
    // sin h = sin φ sin δ + cos φ cos δ cos H (Meeus 1998, equation 13.6), worked from the readings.
    for (const latitudeDeg of [-52, -3, 0, 30, 71]) {
      const view = {
        utcMs: Date.parse('2027-03-01T20:00:00Z'),
        latitudeRad: latitudeDeg * degree,
        longitudeRad: 1,
      };
      const sky = localSky(view);
      for (let ra = 0; ra < 6; ra += 1.3) {
        const { hourAngleRad, decRad, altitudeRad, azimuthRad } = circleReadings(sky, view, {
          raRad: ra,
          decRad: 0.4,
        });
        const sine =
          Math.sin(view.latitudeRad) * Math.sin(decRad) +
          Math.cos(view.latitudeRad) * Math.cos(decRad) * Math.cos(hourAngleRad);
        expect(sine).toBeCloseTo(Math.sin(altitudeRad), 9);
        // West of the meridian means a positive hour angle and an azimuth past south.
        expect(Math.sign(Math.sin(hourAngleRad))).toBe(-Math.sign(Math.sin(azimuthRad)));
        // Precession moves a declination by 20″ a year at most.
        expect(Math.abs(decRad - 0.4)).toBeLessThan(0.003);
      }
    }
  });
});
