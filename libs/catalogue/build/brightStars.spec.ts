import { readBrightStars } from './brightStars';

describe('reading the Bright Star Catalogue', () => {
  it('takes number, letter, component and constellation from the name', () => {
    const stars = readBrightStars(
      [
        '# comment',
        ' 38.7836 18.6156  0.03 "  3Alp Lyr" 7001 172167  67174',
        '-60.8353 14.6600 -0.01 "   Alp1Cen" 5459 128620 252838',
        ' 24.5353  8.4445  7.81 " 24    Cnc" 3313  71153  80185',
        ' 25.9203 15.9917  2.00 "          " 5958 143454  84129',
        '-60.8356 14.6600  1.33 "   Alp2Cen" 5460 128621      0',
        '',
      ].join('\n'),
    );
    expect(
      stars.map(({ hr, bayerLetter, flamsteed, constellation }) => [
        hr,
        bayerLetter,
        flamsteed,
        constellation,
      ]),
    ).toEqual([
      [7001, 'α', 3, 'Lyr'],
      [5459, 'α¹', null, 'Cen'],
      [3313, null, 24, 'Cnc'],
      [5958, null, null, null],
      [5460, 'α²', null, 'Cen'],
    ]);
    expect(stars[0]!.raRad).toBeCloseTo((18.6156 * Math.PI) / 12, 12);
    expect(stars[1]!.decRad).toBeCloseTo((-60.8353 * Math.PI) / 180, 12);
    expect(stars[1]!.magnitude).toBe(-0.01);
  });

  it('names the line it cannot read', () => {
    expect(() => readBrightStars('# comment\n12 13\n')).toThrow('line 2: cannot read "12 13"');
  });
});
