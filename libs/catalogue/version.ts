/**
 * Version of everything this part ships: star file, names, deep-sky list, figures. Raise it whenever any of
 * them is changed; printed packets carry it in their imprint, and the star file is checked against it.
 */
export const CATALOGUE_VERSION = '2026.12';
