export { type AltitudeOf, type Crossing, crossings } from './crossings';
export { type EveningLight, eveningLight } from './light';
export { airmass, extinctionForElevation } from './airmass';
export { luminanceToMag, magToLuminance, skyFromBortle } from './luminance';
export {
  type LightDome,
  type SiteSky,
  type SkyLight,
  createSkyLight,
  setSkyLight,
  skyLuminance,
} from './brightness';
export { moonIlluminatedFraction } from './moonlight';
export {
  BINOCULAR_10X50,
  DEFAULT_OBSERVING,
  type Instrument,
  InstrumentError,
  NAKED_EYE,
  type Observing,
  TELESCOPE_200,
} from './instrument';
export {
  limitingMagnitude,
  nakedEyeLimit,
  telescopeReach,
  visibilityMargin,
  type VisibleObject,
} from './visibility';
export {
  brightestSkyShowing,
  darkestSkyHiding,
  type LimitTable,
  limitFromTable,
  limitTable,
} from './limitTable';
export { brightestSky, COS_MOON_CLEARANCE, darkestSky } from './brightestSky';
