import type { Star, StarCatalogue } from '#catalogue';
import type { LocalSky } from './horizon';
import { type ChartRequest, usualFinderFieldDeg } from './request';
import type { SkyPoint } from './projection';
import { skylineOf } from './skyline';
import { type Way, wayTo } from './way';
import { circleWords, type WayScene, type WayText, wayText } from './wayWords';

const degree = Math.PI / 180;

export interface Guide {
  readonly way: Way;
  /** Null where the sheet tells no way. */
  readonly text: WayText | null;
  /** The stars the way goes by, which the sheet must show. */
  readonly stars: readonly Star[];
}

/** Nobody points at, or looks over a skyline for, what stands lower than this. */
const lowestStartRad = 5 * degree;
const overSkylineRad = 1 * degree;

/** The way to the target as a sheet tells it: steps where one finds them, circles to set at the eyepiece. */
export function wayFor(stars: StarCatalogue, request: ChartRequest, sky: LocalSky | null): Guide {
  const { target, view, scale } = request;
  const nothing: Guide = { way: { kind: 'plain' }, text: null, stars: [] };
  if (request.finderFieldDeg === null) return nothing;
  const finderFieldRad = (request.finderFieldDeg ?? usualFinderFieldDeg) * degree;
  const skyline = skylineOf(request.skyline ?? []);
  const isHidden = (place: SkyPoint): boolean => {
    if (sky === null) return false;
    const { altitudeRad, azimuthRad } = sky.altAz(place);
    return altitudeRad < Math.max(lowestStartRad, skyline(azimuthRad) + overSkylineRad);
  };
  const scene: WayScene = { stars, target, finderFieldRad, view, sky, isHidden };
  if (scale === 'eyepiece') {
    const notes = sky === null ? [] : circleWords(scene);
    return { ...nothing, text: { heading: '', steps: [], notes } };
  }
  const way = wayTo(stars, { target, finderFieldRad, isHidden });
  const landings = way.kind === 'hops' ? way.hops.map(({ from }) => from) : [];
  return {
    way,
    text: wayText(way, scene),
    stars: landings.flatMap(({ star, partner }) => (partner === null ? [star] : [star, partner])),
  };
}
