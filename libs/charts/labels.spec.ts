import { type Disc, type LabelWish, placeLabels, type Surroundings } from './labels';
import { spotsAround, spotsBeside } from './labelSpots';

const open: Surroundings = {
  frame: { shape: 'rectangle', xMm: 0, yMm: 0, widthMm: 100, heightMm: 100 },
  discs: [],
  walls: [],
  threads: [],
  isBarred: () => false,
};

function wish(text: string, owner: Disc, rank = 0): LabelWish {
  return {
    text,
    of: text,
    face: 'sans',
    sizePt: 8,
    gray: 0,
    spacingPt: 0,
    rank,
    owner,
    mayStray: false,
    spots: spotsBeside(owner),
  };
}

const disc = (xMm: number, yMm: number, radiusMm = 0.5): Disc => ({ xMm, yMm, radiusMm });

describe('placeLabels', () => {
  it('stands to the right of its dot where nothing is in the way', () => {
    const owner = disc(50, 50);
    const [label] = placeLabels([wish('Vega', owner)], { ...open, discs: [owner] });
    expect(label!.box[0]).toBeCloseTo(51, 6);
    expect((label!.box[1] + label!.box[3]) / 2).toBeCloseTo(50, 6);
  });

  it('moves aside for another dot, a wall or the frame', () => {
    const owner = disc(50, 50);
    const right = placeLabels([wish('Vega', owner)], { ...open, discs: [owner, disc(53, 50)] })[0]!;
    expect(right.box[2]).toBeLessThan(50);
    const walled = placeLabels([wish('Vega', owner)], {
      ...open,
      discs: [owner],
      walls: [
        [
          [52, 0],
          [52, 100],
        ],
      ],
    })[0]!;
    expect(walled.box[2]).toBeLessThan(52);
    const edge = disc(98, 50);
    expect(placeLabels([wish('Vega', edge)], { ...open, discs: [edge] })[0]!.box[2]).toBeLessThan(98);
  });

  it('is nearer to its own dot than to any other', () => {
    const owner = disc(50, 50);
    const neighbour = disc(50, 53.4);
    const placed = placeLabels([{ ...wish('Vega', owner), spots: spotsAround(owner, 6) }], {
      ...open,
      discs: [owner, neighbour, disc(53, 50), disc(47, 50), disc(50, 47)],
    });
    for (const { box } of placed) {
      const to = ({ xMm, yMm }: Disc): number =>
        Math.hypot(Math.max(box[0] - xMm, 0, xMm - box[2]), Math.max(box[1] - yMm, 0, yMm - box[3]));
      expect(to(owner)).toBeLessThan(to(neighbour));
    }
  });

  it('lets the better rank choose first and leaves out what finds no room', () => {
    const owner = disc(50, 50);
    const hemmed: Surroundings = {
      ...open,
      frame: { shape: 'rectangle', xMm: 48, yMm: 47, widthMm: 12, heightMm: 6 },
      discs: [owner],
    };
    const labels = placeLabels([wish('second', owner, 2), wish('first', owner, 1)], hemmed);
    expect(labels.map(({ text }) => text)).toEqual(['first']);
  });

  it('prints a stand-in for a sign the font lacks', () => {
    const owner = disc(50, 50);
    expect(placeLabels([wish('星', owner)], open)[0]!.text).toBe('?');
  });
});
