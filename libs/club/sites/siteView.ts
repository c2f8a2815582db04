import { type ClosedDates, type Gate, type HorizonPoint } from '#nights';
import { type Prisma } from '../database/generated/client';

/** A town's glow over a site's horizon, in degrees. */
export interface DomeView {
  readonly azimuthDeg: number;
  readonly widthDeg: number;
  readonly brighteningMag: number;
}

/** A site as it is told: degrees, metres, V mag/arcsec2, local times and dates. */
export interface SiteView {
  readonly id: string;
  readonly name: string;
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly elevationM: number;
  readonly zone: string;
  /** `bortleClass` is null where the sky was measured, else the class the value stands for. */
  readonly sky: { readonly magPerArcsec2: number; readonly bortleClass: number | null };
  readonly extinctionMagPerAirmass: number | null;
  readonly horizon: readonly HorizonPoint[];
  readonly domes: readonly DomeView[];
  readonly gate: Gate;
  readonly closures: readonly ClosedDates[];
  readonly directions: string;
  /** For helpers: what is dangerous there, and whom to call; empty where nothing is entered. */
  readonly hazards: string;
  readonly emergencyWords: string;
}

/** What is read with a site. */
export const siteParts = {
  horizon: { orderBy: { position: 'asc' } },
  domes: { orderBy: { position: 'asc' } },
  closures: { orderBy: [{ firstDate: 'asc' }, { lastDate: 'asc' }] },
} as const satisfies Prisma.SiteInclude;

export type SiteRow = Prisma.SiteGetPayload<{ include: typeof siteParts }>;

export function siteView(row: SiteRow): SiteView {
  return {
    id: row.id,
    name: row.name,
    latitudeDeg: row.latitudeDeg,
    longitudeDeg: row.longitudeDeg,
    elevationM: row.elevationM,
    zone: row.zone,
    sky: { magPerArcsec2: row.skyMagPerArcsec2, bortleClass: row.bortleClass },
    extinctionMagPerAirmass: row.extinctionMagPerAirmass,
    horizon: row.horizon.map(({ azimuthDeg, altitudeDeg }) => ({ azimuthDeg, altitudeDeg })),
    domes: row.domes.map(({ azimuthDeg, widthDeg, brighteningMag }) => ({
      azimuthDeg,
      widthDeg,
      brighteningMag,
    })),
    gate: { opens: row.gateOpens, closes: row.gateCloses },
    closures: row.closures.map(({ firstDate, lastDate, why }) => ({ from: firstDate, to: lastDate, why })),
    directions: row.directions,
    hazards: row.hazards,
    emergencyWords: row.emergencyWords,
  };
}
