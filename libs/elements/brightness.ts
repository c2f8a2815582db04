import { type Brightness } from '#sky';
import { figure } from './figures';
import { type FieldProblem } from './problem';

/** n of a comet's law and G of an asteroid's where a list leaves them out (common practice; IAU 1985 for G). */
export const DEFAULT_ACTIVITY = 4;
export const DEFAULT_SLOPE = 0.15;

export interface BrightnessLaw {
  readonly brightness: Brightness | null;
  /** The n or G in use; null without a magnitude and without one given. */
  readonly slope: number | null;
  readonly assumed: boolean;
  readonly problems: readonly FieldProblem[];
}

/** The brightness law from an absolute magnitude and n or G as far as given. */
export function brightnessLaw(
  law: 'comet' | 'asteroid',
  absoluteMagnitude: number | null,
  slope: number | null,
): BrightnessLaw {
  if (absoluteMagnitude === null) return { brightness: null, slope, assumed: false, problems: [] };
  const assumed = slope === null;
  const problems: FieldProblem[] = [];
  const warn = (message: string): void => {
    problems.push({ field: 'slope', severity: 'warning', message });
  };
  if (law === 'comet') {
    const activity = slope ?? DEFAULT_ACTIVITY;
    if (activity < 1 || activity > 20) {
      const hint = activity >= -0.2 && activity < 1 ? '; it looks like an asteroid’s G' : '';
      warn(`n = ${figure(activity)} in the comet's law is out of all custom (2 to 10 is usual)${hint}.`);
    }
    return { brightness: { kind: 'comet', absoluteMagnitude, activity }, slope: activity, assumed, problems };
  }
  const g = slope ?? DEFAULT_SLOPE;
  if (g < -0.5 || g > 1) {
    warn(`G = ${figure(g)} in the asteroid's law is out of all custom (0 to 0.5 is usual).`);
  }
  return { brightness: { kind: 'asteroid', absoluteMagnitude, slope: g }, slope: g, assumed, problems };
}
