import { type ChartOrder, chartScene, drawChart, namedTarget } from '#club';
import { loadStars } from '#catalogue';
import { toRad } from '#sky';
import { measurement, type Measurement, median } from './measurement';

const TARGETS = ['M 13', 'M 22', 'NGC 869', 'M 31', 'M 57', 'Jupiter'] as const;

/** A finder chart from target to finished PDF, beside reading the star file alone. */
export async function benchChart(): Promise<Measurement[]> {
  const draw = async (i: number) => {
    const order = orderOf(TARGETS[i % TARGETS.length]!);
    const start = performance.now();
    await drawChart(chartScene(order), order, 'pdf');
    return performance.now() - start;
  };
  const start = performance.now();
  loadStars();
  const loading = performance.now() - start;
  const first = await draw(0);
  for (let i = 0; i < 12; i++) await draw(i);
  const warm: number[] = [];
  for (let i = 0; i < 24; i++) warm.push(await draw(i));
  return [
    measurement(
      'chart-warm',
      median(warm),
      'ms',
      'reading the star file once',
      loading,
      `median of ${warm.length}, slowest ${Math.max(...warm).toFixed(0)} ms; the first chart of a process ${first.toFixed(0)} ms`,
    ),
  ];
}

function orderOf(target: string): ChartOrder {
  return {
    target: namedTarget(target),
    observer: { latitudeRad: toRad(42), longitudeRad: toRad(-7), elevationM: 500 },
    zone: 'Europe/Madrid',
    siteName: 'Invented Heath',
    utcMs: Date.parse('2027-10-01T20:00:00Z'),
    scale: 'binocular',
    fieldDeg: null,
    orientation: 'upright',
    paper: 'a4',
    occasion: null,
    computedUtcMs: Date.parse('2026-12-01T00:00:00Z'),
    programVersion: 'bench',
  };
}
