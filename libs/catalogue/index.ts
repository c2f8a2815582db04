export { CATALOGUE_VERSION } from './version';
export { type StarLabel } from './starLabels';
export {
  type Cone,
  type Star,
  type StarCatalogue,
  countInCone,
  loadStars,
  namedStars,
  starsInCone,
} from './stars';
export {
  type DeepSkyKind,
  type DeepSkyObject,
  type DoubleStar,
  deepSkyObjects,
  findDeepSky,
} from './deepSky';
export { type ConstellationFigure, type FigurePoint } from './figureFile';
export { constellationFigures } from './figures';
