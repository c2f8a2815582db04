/** A place in radians. */
export interface Place {
  readonly raRad: number;
  readonly decRad: number;
}

/** One row of sefstars.txt: ICRS place of epoch J2000, V magnitude, '' where it has no name. */
export interface NamedPlace extends Place {
  readonly name: string;
  readonly designation: string;
  /** Where the star stood at epoch J1991.25, by its proper motion. */
  readonly earlier: Place;
  readonly magnitude: number;
}

const sexagesimal = (whole: string, minutes: string, seconds: string): number =>
  (whole.trim().startsWith('-') ? -1 : 1) *
  (Math.abs(Number(whole)) + Number(minutes) / 60 + Number(seconds) / 3600);

const YEARS_BEFORE = 8.75;
const MILLIARCSEC = Math.PI / 648e6;

/** Reads sefstars.txt (comma-separated; its columns are described in its own comments). */
export const readNamedPlaces = (text: string): NamedPlace[] =>
  text
    .split('\n')
    .filter((line) => !line.startsWith('#') && line.includes(',ICRS,'))
    .map((line) => {
      const columns = line.split(',');
      const [
        name,
        designation,
        ,
        hours,
        minutes,
        seconds,
        degrees,
        arcminutes,
        arcseconds,
        eastward,
        northward,
      ] = columns;
      const raRad = (sexagesimal(hours!, minutes!, seconds!) * Math.PI) / 12;
      const decRad = (sexagesimal(degrees!, arcminutes!, arcseconds!) * Math.PI) / 180;
      const moved = YEARS_BEFORE * MILLIARCSEC;
      return {
        name: name!.trim(),
        designation: designation!.trim(),
        raRad,
        decRad,
        earlier: {
          raRad: raRad - (Number(eastward) * moved) / Math.cos(decRad),
          decRad: decRad - Number(northward) * moved,
        },
        magnitude: Number(columns[13]),
      };
    });

/** The rows of sefstars.txt that the list of chosen names asks for; throws where a name is missing or doubtful. */
export const chooseNames = (list: string, places: readonly NamedPlace[]): NamedPlace[] =>
  list
    .split('\n')
    .filter((line) => line.trim() !== '' && !line.startsWith('#'))
    .map((line) => {
      const [name, designation] = line.split('|').map((part) => part.trim());
      const found = places.filter(
        (place) => place.name === name && (designation === undefined || place.designation === designation),
      );
      const first = found[0];
      if (!first) throw new Error(`Proper names: sefstars.txt has no "${line}".`);
      if (found.some((other) => Math.abs(other.decRad - first.decRad) > 1e-5)) {
        throw new Error(
          `Proper names: "${name}" stands for ${found.map((place) => place.designation).join(', ')}; say which.`,
        );
      }
      return first;
    });
