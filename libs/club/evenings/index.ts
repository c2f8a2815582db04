export { judgeEvening, rankEvenings } from './evenings';
export {
  type ClosedEvening,
  type Ranking,
  searchSeason,
  type SeasonSearch,
  type SearchWatch,
} from './seasonSearch';
export { type EveningJson, eveningJson, type NightsJson, toNightsJson } from './nightsJson';
export { closeSearchPool } from './workerPool';
