import { type PublicHours } from './hours';
import { type EveningItem } from './look';
import { type Season } from './season';
import { seasonSidereal } from '#sky';
import { type PreparedSite } from './siteInstant';

const TURN = 2 * Math.PI;
/** Rounding, and what a straight track over the hours leaves of a curved one. */
const SLACK_RAD = 1e-4;

/**
 * Whether an item certainly stays below its least altitude all through the public hours: by the greatest
 * altitude a fixed direction reaches over those hour angles, with the item's own motion and its parallax
 * granted on top. Spares the search every step of what has not risen or has long set.
 */
export function staysLow(
  season: Season,
  site: PreparedSite,
  { path, nearby, sinLeastAltitude }: EveningItem,
  { startMs, endMs }: PublicHours,
): boolean {
  const x = path[0]!;
  const y = path[4]!;
  const z = path[8]!;
  const distance = Math.sqrt(x * x + y * y + z * z);
  const moved = Math.hypot(
    path[1]! + path[2]! + path[3]!,
    path[5]! + path[6]! + path[7]!,
    path[9]! + path[10]! + path[11]!,
  );
  const shift = nearby ? site.fromAxisAu + Math.abs(site.fromEquatorAu) : 0;
  const granted = SLACK_RAD + (1.1 * (moved + shift)) / distance;
  const { longitudeRad } = site.site.observer;
  const startAngle = seasonSidereal(season.frame, startMs) + longitudeRad - Math.atan2(y, x);
  const endAngle = startAngle + seasonSidereal(season.frame, endMs) - seasonSidereal(season.frame, startMs);
  const culminates = Math.ceil(startAngle / TURN) * TURN <= endAngle;
  const cosine = culminates ? 1 : Math.max(Math.cos(startAngle), Math.cos(endAngle));
  const highest = (site.sinLatitude * z + site.cosLatitude * Math.sqrt(x * x + y * y) * cosine) / distance;
  return highest + granted < sinLeastAltitude;
}
