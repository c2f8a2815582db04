import { fieldWords } from './instrument';
import type { ChartRequest } from './request';

/** A sheet in a sentence, for those who cannot see it. */
export function describe(request: ChartRequest, fieldDeg: number, count: number, faintest: number): string {
  const instrument = {
    eye: 'the unaided eye',
    binocular: 'binoculars or a finder',
    eyepiece: 'a telescope’s eyepiece',
  }[request.scale];
  return (
    `Finder chart of ${request.target.name} for ${instrument}, ${fieldWords(fieldDeg)} across, ` +
    `with ${String(count)} stars to magnitude ${faintest.toFixed(1)}.`
  );
}
