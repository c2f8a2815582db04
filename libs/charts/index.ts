export {
  ChartProblem,
  type ChartRequest,
  type ChartScale,
  type ChartTarget,
  type ChartView,
  type ChartWords,
  type Orientation,
  type Paper,
  type PathPoint,
  usualFieldDeg,
  usualFinderFieldDeg,
} from './request';
export type {
  Frame,
  Mark,
  MarkRole,
  Scene,
  SceneLabel,
  SceneStar,
  SceneText,
  SheetText,
  Stroke,
} from './scene';
export { buildScene } from './buildScene';
export { dotDiameterMm } from './dots';
export type { DiscInset, Inset, InsetMoon, InsetRings, PairInset } from './inset';
export { type SkylinePoint } from './skyline';
export { type Projection, projectionAbout, type ProjectionKind } from './projection';
export { renderSvg } from './svg';
export { drawScene, renderPdf } from './pdf';
export { type Face, fontFile } from './typeface';
