export { ClubProblem, type FieldProblem, type ProblemKind } from './clubProblem';
export { projectRoot } from './projectRoot';
export { closeDatabase, type Database, type DatabasePlace, openDatabase } from './database/openDatabase';
export { checked } from './input/checked';
export { ClubInput, type ClubView, createClub, findClub, getClub, updateClub } from './settings/club';
export { ClubDateInput, type ClubDateView, createClubDate, listClubDates } from './settings/clubDates';
export { SiteInput } from './sites/siteInput';
export { type DomeView, type SiteView } from './sites/siteView';
export { createSite, getSite, listSites, updateSite } from './sites/sites';
export { nightSite } from './sites/nightSite';
export {
  createInstrument,
  getInstrument,
  InstrumentInput,
  type InstrumentView,
  listInstruments,
  updateInstrument,
} from './instruments/instruments';
export { ElementSetInput } from './targets/elementSetInput';
export { type ElementSetView } from './targets/elementSets';
export { TargetChange, TargetInput } from './targets/targetInput';
export { type TargetView } from './targets/targetView';
export {
  addElementSet,
  createTarget,
  getSkyTarget,
  getTarget,
  listElementSets,
  listTargets,
  type RenewedTarget,
  updateTarget,
} from './targets/targets';
export {
  addElementReading,
  addElementText,
  elementNames,
  ElementText,
  type ElementWishes,
  type LoadedElements,
} from './targets/loadElements';
export { ProgrammeInput } from './programmes/programmeInput';
export { type NightProgramme, type ProgrammeItemView, type ProgrammeView } from './programmes/programmeView';
export {
  createProgramme,
  getNightProgramme,
  getProgramme,
  listProgrammes,
  updateProgramme,
} from './programmes/programmes';
export { EveningInput, SeasonInput } from './season/seasonInput';
export * from './evenings';
export { CallOff, EventChange, EventInput } from './events/eventInput';
export { type EventStatus, type EventStepView, type EventView } from './events/eventView';
export { plannedShowings } from './events/plannedShowings';
export { callOffEvent, changeEvent, getEvent, listEvents, makeEvent, publishEvent } from './events/events';
export { dateWords, directionWords, eveningSentence, moonSentence, timesWords } from './events/eveningWords';
export { CAUTIONS, clubCalendar } from './feed/clubCalendar';
export { usualDatabaseFile } from './programVersion';
export * from './sky';
export * from './charts';
export * from './packets';
export * from './trust';
export * from './changes';
