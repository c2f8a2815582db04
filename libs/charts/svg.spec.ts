import { constellationFigures, deepSkyObjects, loadStars } from '#catalogue';
import { buildScene } from './buildScene';
import { renderSvg } from './svg';

const scene = buildScene(loadStars(), deepSkyObjects(), constellationFigures(), {
  scale: 'binocular',
  fieldDeg: null,
  orientation: 'upright',
  paper: 'a4',
  target: {
    name: 'Comet <Tarn> & "Ilves"',
    raRad: 5.6,
    decRad: 0.2,
    magnitude: 8,
    kind: 'comet',
    majorArcmin: 5,
    minorArcmin: 5,
    positionAngleDeg: null,
  },
  path: [],
  view: null,
  words: { title: 'A & B', subtitle: '', notes: [], cautions: [], foot: '' },
});
const svg = renderSvg(scene);

describe('renderSvg', () => {
  it('has every star where the scene has it, to a thousandth of a millimetre', () => {
    const drawn = svg.slice(svg.indexOf('class="stars"'));
    const circles = [
      ...drawn
        .slice(0, drawn.indexOf('</g>'))
        .matchAll(/<circle cx="([\d.]+)" cy="([\d.]+)" r="([\d.]+)"\/>/g),
    ];
    expect(circles).toHaveLength(scene.stars.length);
    circles.forEach(([, x, y, r], index) => {
      const star = scene.stars[index]!;
      expect(Math.abs(Number(x) - star.xMm)).toBeLessThan(0.00051);
      expect(Math.abs(Number(y) - star.yMm)).toBeLessThan(0.00051);
      expect(Math.abs(Number(r) - star.radiusMm)).toBeLessThan(0.00051);
    });
  });

  it('is well formed: signs escaped, every element closed, no number missing', () => {
    expect(svg).toContain('Comet &lt;Tarn&gt; &amp; &quot;Ilves&quot;');
    expect(svg).not.toMatch(/NaN|undefined|Infinity/);
    const open: string[] = [];
    for (const [, closing, name, rest] of svg.matchAll(/<(\/?)(\w+)([^<>]*)>/g)) {
      if (closing === '/') expect(open.pop()).toBe(name);
      else if (!rest!.endsWith('/')) open.push(name!);
    }
    expect(open).toEqual([]);
  });

  it('has a title, a description, and ink in greys only', () => {
    expect(svg).toContain('<title id="t">A &amp; B</title>');
    expect(svg).toMatch(/<desc id="d">Finder chart of /);
    const colours = new Set([...svg.matchAll(/#[0-9a-f]{3,6}/g)].map(([colour]) => colour));
    for (const colour of colours) expect(colour).toMatch(/^#(fff|([0-9a-f]{2})\2\2)$/);
  });
});
