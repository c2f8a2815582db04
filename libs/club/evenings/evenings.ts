import { type JudgedEvening } from '#nights';
import { type Database } from '../database/openDatabase';
import { checked } from '../input/checked';
import { requireNamed } from '../input/named';
import { getNightProgramme } from '../programmes/programmes';
import { EveningInput, SeasonInput } from '../season/seasonInput';
import { listClubDates } from '../settings/clubDates';
import { nightSite } from '../sites/nightSite';
import { listSites } from '../sites/sites';
import { problem } from '../clubProblem';
import { type Ranking, searchSeason, type SearchWatch } from './seasonSearch';

/**
 * Ranks the evenings of a season at the club's sites for a programme, in worker threads. Throws a ClubProblem
 * where the request is wrong, and an AbortError where the watch's signal is aborted.
 */
export async function rankEvenings(
  database: Database,
  request: SeasonInput,
  watch: SearchWatch = {},
): Promise<Ranking> {
  const { from, to, siteNames, programmeName, limit, weights } = checked(SeasonInput, request);
  const all = await listSites(database);
  const chosen = siteNames?.map((name) => requireNamed(all, name, 'site', 'siteNames')) ?? all;
  if (chosen.length === 0) {
    throw problem('invalid', 'siteNames', [], 'The club has no site yet; enter one first.');
  }
  const night = await getNightProgramme(database, programmeName, 'programmeName');
  return searchSeason(
    {
      sites: [...new Set(chosen)].map(nightSite),
      programme: night.programme,
      clubDates: await listClubDates(database),
      from,
      to,
      weights: weights ?? night.weights,
      limit: limit ?? Infinity,
    },
    watch,
  );
}

/** One evening at one site for a programme, whether or not the club's rules keep it open. */
export async function judgeEvening(database: Database, request: EveningInput): Promise<JudgedEvening> {
  const { siteName, programmeName, date } = checked(EveningInput, request);
  const site = requireNamed(await listSites(database), siteName, 'site', 'siteName');
  const { programme, weights } = await getNightProgramme(database, programmeName, 'programmeName');
  const { evenings } = await searchSeason({
    sites: [nightSite({ ...site, closures: [] })],
    programme: { ...programme, weekdays: [] },
    clubDates: [],
    from: date,
    to: date,
    weights,
    limit: 1,
  });
  return evenings[0]!;
}
