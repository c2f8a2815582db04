import { clockWords, localTimeMs, zoneClock } from '#nights';
import {
  type PacketContent,
  type PacketStation,
  type PacketTarget,
  planRunSheet,
  revisionOf,
  type RunSheet,
} from '#print';
import {
  moonAltitude,
  moonSemidiameter,
  type Observer,
  place,
  type SkyTarget,
  SUN_UP_RAD,
  toDeg,
  toRad,
} from '#sky';
import { plannedShowings } from '../events/plannedShowings';
import { type InstrumentView } from '../instruments/instruments';
import { eveningAnswer } from '../sky/eveningAnswer';
import { type PacketFacts } from './packetFacts';
import { type PacketWishes } from './packetInput';
import { horizontal, skyAbove } from './skyAbove';
import { kindWords, targetFacts } from './targetFacts';

/** Airless altitude of a limb that stands on the horizon to the eye: 34 arcminutes of refraction. */
const RISING_RAD = toRad(-0.5667);

const SUN: SkyTarget = { kind: 'solarSystem', name: 'Sun', body: 'Sun' };
/** A target this near the Sun is shown in twilight only, and its sheets say when that begins. */
const NEAR_SUN_DEG = 30;

/** Works out all that the sheets of a packet say. Pure: the same facts give the same content. */
export function packetContent(facts: PacketFacts, wishes: PacketWishes, computedMs: number): PacketContent {
  const { club, event, site, items, imprint } = facts;
  const observer = observerAt(facts);
  const startMs = Date.parse(event.startsAt);
  const endMs = Date.parse(event.endsAt);
  const runSheet = runSheetOf(facts, wishes);
  const stations = stationsOf(facts);
  const order = [
    ...runSheet.slots.map(({ target }) => target),
    ...runSheet.leftOut.map(({ target }) => target),
  ];
  const light = eveningAnswer(observer, event.zone, event.date);
  const instant = (iso: string | null): number | null => (iso === null ? null : Date.parse(iso));
  return {
    paper: wishes.paper,
    club: {
      name: club.name,
      locale: club.locale,
      bringWords: club.bringWords,
      callOffWords: club.callOffWords,
      scheduleAddress: club.publicAddress,
    },
    event: {
      title: event.title,
      words: event.words,
      status: event.status,
      date: event.date,
      zone: event.zone,
      startMs,
      endMs,
    },
    site: {
      name: site.name,
      latitudeDeg: site.latitudeDeg,
      longitudeDeg: site.longitudeDeg,
      elevationM: site.elevationM,
      directions: site.directions,
      hazards: site.hazards,
      emergencyWords: site.emergencyWords,
      gate: site.gate,
      horizon: site.horizon,
      skyMagPerArcsec2: site.sky.magPerArcsec2,
    },
    light: {
      sunsetMs: instant(light.sunset),
      civilDuskMs: instant(light.civilDusk),
      astronomicalDuskMs: instant(light.astronomicalDusk),
      moonriseMs: instant(light.moonrise),
      moonsetMs: instant(light.moonset),
      moonLitShare: light.moon.illuminatedFraction,
      moonUpMinutes: moonUpMinutes(startMs, endMs, observer),
    },
    stations,
    targets: order.map((name) => targetOf(facts, runSheet, name, observer, instant(light.sunset))),
    runSheet,
    notShown: notShown(facts),
    sky: skyAbove(
      observer,
      wholeMinute((startMs + endMs) / 2),
      items.flatMap(({ view }) =>
        view.kind === 'solarSystem' && order.includes(view.name) ? [view.body] : [],
      ),
    ),
    schedule: facts.schedule,
    cautions: facts.cautions,
    imprint,
    revision: revisionOf(imprint),
    computedMs,
  };
}

/** Minutes of the hours in which the Moon's upper limb is up, counted minute by minute. */
function moonUpMinutes(startMs: number, endMs: number, observer: Observer): number {
  const altitude = moonAltitude(observer);
  const semidiameter = moonSemidiameter(observer);
  let minutes = 0;
  for (let ms = startMs + 30_000; ms < endMs; ms += 60_000) {
    if (altitude(ms) + semidiameter(ms) > RISING_RAD) minutes += 1;
  }
  return minutes;
}

export function observerAt({ site }: PacketFacts): Observer {
  return {
    latitudeRad: toRad(site.latitudeDeg),
    longitudeRad: toRad(site.longitudeDeg),
    elevationM: site.elevationM,
  };
}

/** The event's programme in order, from its showings. */
export function runSheetOf(facts: PacketFacts, wishes: PacketWishes): RunSheet {
  const { event, items } = facts;
  const clock = zoneClock(event.zone);
  const showings = plannedShowings(event);
  return planRunSheet(
    items.flatMap(({ item }) => {
      const showing = showings.find(({ target }) => target === item.target);
      if (showing === undefined) return [];
      return [
        {
          target: item.target,
          station: item.instrument,
          weight: item.weight,
          intervals: showing.intervals,
          bestMs: showing.best?.utcMs ?? null,
        },
      ];
    }),
    {
      hours: { startMs: Date.parse(event.startsAt), endMs: Date.parse(event.endsAt) },
      breaks: wishes.breaks.map(({ from, to }) => ({
        startMs: localTimeMs(clock, event.date, from),
        endMs: localTimeMs(clock, event.date, to),
      })),
      leastLookMinutes: wishes.leastLookMinutes,
    },
  );
}

/** What the evening promised and the event does not show, each with its reason. */
function notShown({ event, items }: PacketFacts): PacketContent['notShown'] {
  const planned = plannedShowings(event);
  return event.evening.showings.flatMap(({ target, shown, why }) => {
    // Renamed or dropped since the evening was judged.
    if (!items.some(({ item }) => item.target === target)) {
      return [{ target, why: 'It is no longer on the programme under this name.' }];
    }
    if (planned.some((showing) => showing.target === target)) return [];
    return [{ target, why: shown ? `${why} That is outside the hours of this event.` : why }];
  });
}

/** The instruments that have something to show, in the order of the programme. */
function stationsOf({ instruments, items, event }: PacketFacts): PacketStation[] {
  const shown = plannedShowings(event).map(({ target }) => target);
  const names = items.filter(({ item }) => shown.includes(item.target)).map(({ item }) => item.instrument);
  return [...new Set(names)].map((name) => {
    const instrument = instruments.find((one) => one.name === name)!;
    return { name, kind: instrument.kind, words: instrumentWords(instrument) };
  });
}

function instrumentWords({ kind, apertureMm, magnifications }: InstrumentView): string {
  if (kind === 'nakedEye') return 'No instrument: the eyes, and someone who points the way.';
  const powers = magnifications.map((power) => `${String(power)}×`).join(', ');
  const what = kind === 'binocular' ? 'Binoculars' : 'Telescope';
  return `${what}, ${String(apertureMm)} mm aperture, magnifying ${powers}.`;
}

function targetOf(
  { event, items }: PacketFacts,
  runSheet: RunSheet,
  name: string,
  observer: Observer,
  sunsetMs: number | null,
): PacketTarget {
  const { item, view, named } = items.find((one) => one.item.target === name)!;
  const showing = plannedShowings(event).find(({ target }) => target === name)!;
  const slot = runSheet.slots.find(({ target }) => target === name);
  const middleMs = wholeMinute((Date.parse(event.startsAt) + Date.parse(event.endsAt)) / 2);
  const [first] = showing.intervals;
  const utcMs = wholeMinute(
    slot === undefined
      ? (showing.best?.utcMs ?? (first!.startMs + first!.endMs) / 2)
      : (slot.startMs + slot.endMs) / 2,
  );
  const standing = { utcMs, ...horizontal(named.sky, utcMs, observer) };
  return {
    name,
    otherName: otherNameOf(view, named.deepSky?.otherNames ?? []),
    kind: kindWords(named),
    gloss: view.gloss,
    station: item.instrument,
    intervals: showing.intervals,
    standing,
    atMiddle: { utcMs: middleMs, ...horizontal(named.sky, middleMs, observer) },
    facts: targetFacts(named, utcMs, observer),
    uncertain: showing.range?.words ?? null,
    cautions: sunCautions(named.sky, utcMs, observer, sunsetMs, event.zone),
  };
}

/** Down to the minute, so that every sheet, however it rounds, prints the same time. */
function wholeMinute(utcMs: number): number {
  return Math.floor(utcMs / 60_000) * 60_000;
}

function otherNameOf(view: PacketFacts['items'][number]['view'], names: readonly string[]): string | null {
  // A name such as Albireo needs no other; a number does.
  return /\d/.test(view.name) ? (names.find((name) => !/\d/.test(name)) ?? null) : null;
}

/** What to mind with a target that stands near the Sun in the sky; common practice. */
export function sunCautions(
  target: SkyTarget,
  utcMs: number,
  observer: Observer,
  sunsetMs: number | null,
  zone: string,
): string[] {
  const { elongationRad } = place(target, utcMs, observer);
  if (toDeg(elongationRad) >= NEAR_SUN_DEG) return [];
  const sunUp = place(SUN, utcMs, observer).horizontal!.altitudeRad > SUN_UP_RAD;
  const apart = `It stands ${String(Math.round(toDeg(elongationRad)))}° from the Sun`;
  const after =
    sunsetMs === null ? 'only while the Sun is down' : `only after sunset at ${clockWords(sunsetMs, zone)}`;
  return [`${apart}${sunUp ? ', which is still up then' : ''}: point at it ${after}.`];
}
