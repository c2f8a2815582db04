import { extinctionForElevation } from '#darkness';
import { type NightSite } from '#nights';
import { toRad } from '#sky';
import { type SiteView } from './siteView';

/** The site as the search and the charts reckon with it. */
export function nightSite(site: SiteView): NightSite {
  return {
    name: site.name,
    observer: {
      latitudeRad: toRad(site.latitudeDeg),
      longitudeRad: toRad(site.longitudeDeg),
      elevationM: site.elevationM,
    },
    zone: site.zone,
    sky: {
      zenithMagPerArcsec2: site.sky.magPerArcsec2,
      extinctionMagPerAirmass: site.extinctionMagPerAirmass ?? extinctionForElevation(site.elevationM),
      domes: site.domes.map((dome) => ({
        azimuthRad: toRad(dome.azimuthDeg),
        widthRad: toRad(dome.widthDeg),
        brighteningMag: dome.brighteningMag,
      })),
    },
    horizon: site.horizon,
    gate: site.gate,
    closed: site.closures,
  };
}
