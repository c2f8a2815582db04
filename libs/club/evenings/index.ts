export { judgeEvening, rankEvenings } from './evenings';
export {
  type ClosedEvening,
  type Ranking,
  searchSeason,
  type SeasonSearch,
  type SearchWatch,
} from './seasonSearch';
export { toNightsJson, type NightsJson } from './nightsJson';
export { closeSearchPool } from './workerPool';
