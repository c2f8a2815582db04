import { create } from 'qrcode';
import { type Ink } from './sheet';

/** White cells that a QR code keeps around itself (ISO/IEC 18004). */
const QUIET_CELLS = 4;

/** A QR code of an address, its quiet zone included, as black squares; runs along a row are one shape. */
export function scanCode(address: string, leftMm: number, topMm: number, sizeMm: number): Ink[] {
  const { modules } = create(address, { errorCorrectionLevel: 'M' });
  const cell = sizeMm / (modules.size + 2 * QUIET_CELLS);
  const at = (index: number): number => (index + QUIET_CELLS) * cell;
  const ink: Ink[] = [];
  for (let row = 0; row < modules.size; row++) {
    let from = -1;
    for (let column = 0; column <= modules.size; column++) {
      const dark = column < modules.size && modules.get(row, column) === 1;
      if (dark && from < 0) from = column;
      if (dark || from < 0) continue;
      const [left, right] = [leftMm + at(from), leftMm + at(column)];
      const [top, bottom] = [topMm + at(row), topMm + at(row + 1)];
      ink.push({
        shape: 'area',
        points: [
          [left, top],
          [right, top],
          [right, bottom],
          [left, bottom],
        ],
        gray: 0,
      });
      from = -1;
    }
  }
  return ink;
}
