import type { Frame, Mark } from './scene';

/** The line round the chart. */
export function frameMark(frame: Frame): Mark {
  const shared = {
    role: 'frame',
    of: null,
    stroke: { widthPt: 1, gray: 0 },
    fillGray: null,
    layer: 'over',
    clipped: false,
  } as const;
  if (frame.shape === 'circle') {
    return { ...shared, shape: 'circle', xMm: frame.xMm, yMm: frame.yMm, radiusMm: frame.radiusMm };
  }
  const right = frame.xMm + frame.widthMm;
  const bottom = frame.yMm + frame.heightMm;
  return {
    ...shared,
    shape: 'polygon',
    points: [
      [frame.xMm, frame.yMm],
      [right, frame.yMm],
      [right, bottom],
      [frame.xMm, bottom],
    ],
  };
}
