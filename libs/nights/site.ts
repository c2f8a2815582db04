import { type SiteSky } from '#darkness';
import { type Observer } from '#sky';
import { type HorizonPoint } from './horizon';

/** A dark site as the search sees it. */
export interface NightSite {
  readonly name: string;
  readonly observer: Observer;
  /** IANA zone of its clocks. */
  readonly zone: string;
  readonly sky: SiteSky;
  readonly horizon: readonly HorizonPoint[];
  readonly gate: Gate;
  readonly closed: readonly ClosedDates[];
}

/** When the site may be used, local times 'HH:MM' inside the evening (noon to noon); null: no bound. */
export interface Gate {
  readonly opens: string | null;
  readonly closes: string | null;
}

/** Evenings on which a site is shut, first and last included, 'YYYY-MM-DD'. */
export interface ClosedDates {
  readonly from: string;
  readonly to: string;
  readonly why: string;
}
