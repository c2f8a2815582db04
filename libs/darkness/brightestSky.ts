import { DEG } from '#sky';
import { type SkyLight } from './brightness';
import { moonScatter, skyAirmass } from './moonlight';

/** The bound of `brightestSky` holds for directions at least this far from the Moon. */
const MOON_CLEARANCE_RAD = 20 * DEG;
export const COS_MOON_CLEARANCE = Math.cos(MOON_CLEARANCE_RAD);

const SCATTER_AT_CLEARANCE = moonScatter(COS_MOON_CLEARANCE);
const THICKEST_AIR = skyAirmass(0);

/**
 * A luminance in nanolambert that `skyLuminance` exceeds nowhere above the horizon at 20 degrees or more from
 * the Moon, for the light as it is set; Infinity while there is twilight, whose bright side has no useful
 * bound. A search need not look closer at what shows even against such a sky.
 */
export function brightestSky(light: SkyLight): number {
  if (light.twilight > 0 || light.twilightEven > 0) return Infinity;
  // The night sky brightens towards the horizon until the air takes more than it adds.
  const air = Math.min(THICKEST_AIR, Math.max(1, -1 / light.fading));
  let night = light.night * air * Math.exp(light.fading * air);
  let glow = 0;
  for (let i = 3; i < light.domes.length; i += 4) glow += light.domes[i]!;
  night *= 1 + glow;
  // Beyond the clearance the scattering only falls, but for the rise towards the antilunar point, which stays
  // below its value here.
  return night + light.moon * SCATTER_AT_CLEARANCE * (1 - Math.exp(light.fading * THICKEST_AIR));
}
