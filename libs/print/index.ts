export * from './runSheet';
export {
  type EveningTimes,
  type PacketContent,
  type PacketStation,
  type PacketTarget,
  type ScheduledEvent,
  type SkyAbove,
  type SkyPlace,
  type Standing,
  type TargetFacts,
} from './content';
export { changedInputs, fingerprintOf, type Imprint, type ImprintedElements, revisionOf } from './imprint';
export { type PacketSheet, SHEET_NAMES, type SheetName, type TextSheet } from './sheet';
export { type FinderOrder, packetSheets } from './packet';
export { renderSheetSvg } from './sheetSvg';
export { drawPacket, type PacketTitle } from './drawPacket';
export { FAINTEST_ON_MAP } from './skyMap';
