import { DEG } from '#sky';
import { type SkyLight } from './brightness';
import { moonScatter, skyAirmass } from './moonlight';
import { lowAirmass } from './twilight';

/** The bound of `brightestSky` holds for directions at least this far from the Moon. */
const MOON_CLEARANCE_RAD = 20 * DEG;
export const COS_MOON_CLEARANCE = Math.cos(MOON_CLEARANCE_RAD);

const SCATTER_AT_CLEARANCE = moonScatter(COS_MOON_CLEARANCE);
const THICKEST_AIR = skyAirmass(0);
const LONGEST_PATH = lowAirmass(0);
const SHORTEST_PATH = lowAirmass(1);

/**
 * A luminance in nanolambert that `skyLuminance` exceeds nowhere above the horizon at 20 degrees or more from
 * the Moon, for the light as it is set. A search need not look closer at what shows even against such a sky.
 */
export function brightestSky(light: SkyLight): number {
  // The night sky brightens towards the horizon until the air takes more than it adds.
  const air = Math.min(THICKEST_AIR, Math.max(1, -1 / light.fading));
  let glow = 0;
  for (let i = 3; i < light.domes.length; i += 4) glow += light.domes[i]!;
  const night = light.night * air * Math.exp(light.fading * air) * (1 + glow);
  // Beyond the clearance the scattering only falls, but for the rise towards the antilunar point, which stays
  // below its value here.
  const moon = light.moon * SCATTER_AT_CLEARANCE * (1 - Math.exp(light.fading * THICKEST_AIR));
  return night + moon + light.twilightEven + brightestTwilight(light);
}

/** The twilight's pattern at its brightest: on the horizon, over the Sun. */
function brightestTwilight(light: SkyLight): number {
  if (light.twilight === 0) return 0;
  const scattered = 1 - Math.exp(light.twilightFading * LONGEST_PATH);
  return (
    (light.twilight * Math.exp((light.twilightTilt * Math.PI) / 2) * scattered) / -Math.asin(light.sunSin)
  );
}

/** A luminance in nanolambert that `skyLuminance` stays below nowhere above the horizon. */
export function darkestSky(light: SkyLight): number {
  const overhead = Math.exp(light.fading);
  const onHorizon = THICKEST_AIR * Math.exp(light.fading * THICKEST_AIR);
  const twilight = (light.twilight * (1 - Math.exp(light.twilightFading * SHORTEST_PATH))) / Math.PI;
  return light.night * Math.min(overhead, onHorizon) + light.twilightEven + twilight;
}
