import { symbolKindOf, symbolSize, type SymbolSize } from './deepSky';
import { dotDiameterMm } from './dots';
import { type DrawnStar, starAt } from './drawnStars';
import type { Plate } from './plate';
import type { SkyPoint } from './projection';
import type { ChartTarget } from './request';
import { smallSymbolMm, type SymbolKind } from './symbols';

const degree = Math.PI / 180;

/** True for a star that the Sun's or the Moon's disc covers. */
export function isBehindDisc(star: SkyPoint, target: ChartTarget): boolean {
  if (target.kind !== 'Moon' && target.kind !== 'Sun') return false;
  const across = 2 * Math.sin((star.raRad - target.raRad) / 2) * Math.cos(target.decRad);
  return Math.hypot(across, star.decRad - target.decRad) < ((target.majorArcmin / 2) * degree) / 60;
}

/** What a target is drawn as, and how large: to scale where that can be seen, else by its brightness. */
export function targetSymbol(
  plate: Plate,
  target: ChartTarget,
  drawn: readonly DrawnStar[],
  faintestMagnitude: number,
): SymbolSize & { readonly kind: SymbolKind } {
  const kind = symbolKindOf(target.kind);
  if (kind === 'doubleStar' || target.kind === 'star') {
    // A star that is itself the target has its dot already.
    const magnitude = drawn[starAt(drawn, target)]?.star.magnitude ?? target.magnitude ?? faintestMagnitude;
    return { kind, ...symbolSize(plate, target, dotDiameterMm(magnitude, faintestMagnitude) / 2) };
  }
  const toScale = symbolSize(plate, target, null);
  if (kind === 'point') {
    if (target.majorArcmin > 0 && toScale.semiMajorMm > smallSymbolMm * 1.2) {
      return { kind: 'disc', ...toScale };
    }
    const radius =
      target.magnitude === null ? smallSymbolMm / 2 : dotDiameterMm(target.magnitude, faintestMagnitude) / 2;
    return { kind, semiMajorMm: radius, semiMinorMm: radius, angleDeg: 0 };
  }
  return { kind, ...toScale };
}
