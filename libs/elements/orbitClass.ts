/**
 * The kind of orbit in plain words, for people who do not know the trade's groups; the group's name follows in
 * brackets. The limits are common practice (from memory): Jupiter family below 20 years, Halley type to 200;
 * near-Earth asteroids q < 1.3 au, Apollo and Aten either side of a = 1 au with the Earth's own q 0.983 and
 * Q 1.017 au as the crossing limits; belt zones cut at the gaps of 2.06, 2.5, 2.82 and 3.28 au.
 */
export function orbitClass(
  kind: 'comet' | 'asteroid',
  perihelionDistanceAu: number,
  eccentricity: number,
  semiMajorAxisAu: number | null,
  periodYears: number | null,
): string {
  return kind === 'comet'
    ? cometClass(eccentricity, periodYears)
    : asteroidClass(perihelionDistanceAu, eccentricity, semiMajorAxisAu);
}

function cometClass(eccentricity: number, periodYears: number | null): string {
  if (eccentricity === 1) return 'comet on a parabola, its true period not known';
  if (eccentricity > 1.1) return 'comet passing the Sun once, from outside the solar system';
  if (eccentricity > 1 || periodYears === null) {
    return 'comet leaving on a slightly open orbit (hyperbolic)';
  }
  if (periodYears < 20) return 'short-period comet, back within 20 years (Jupiter family)';
  if (periodYears < 200) return 'comet back within a long lifetime or two (Halley type)';
  return 'long-period comet, away for centuries or more';
}

function asteroidClass(q: number, e: number, a: number | null): string {
  if (a === null || a < 0 || e >= 1) return 'asteroid on an open orbit, passing the Sun once';
  const aphelion = a * (1 + e);
  if (q < 1.3) {
    if (aphelion < 0.983) return 'near-Earth asteroid that stays inside the Earth’s orbit (Atira group)';
    if (a < 1) return 'near-Earth asteroid that crosses the Earth’s orbit from inside (Aten group)';
    if (q < 1.017) return 'near-Earth asteroid that crosses the Earth’s orbit (Apollo group)';
    return 'near-Earth asteroid that stays outside the Earth’s orbit (Amor group)';
  }
  if (a < 2.06) {
    return q < 1.666 ? 'asteroid that crosses the orbit of Mars' : 'asteroid inside the main belt';
  }
  if (q < 1.666) return 'asteroid that crosses the orbit of Mars';
  if (a < 2.5) return 'asteroid of the inner main belt';
  if (a < 2.82) return 'asteroid of the middle main belt';
  if (a < 3.28) return 'asteroid of the outer main belt';
  if (a < 4.6) return 'asteroid beyond the main belt';
  if (a < 5.5) return e < 0.3 ? 'asteroid sharing Jupiter’s orbit (Trojan)' : 'asteroid near Jupiter’s orbit';
  if (a < 30.1) return 'icy body among the giant planets (Centaur)';
  return 'icy body beyond Neptune (trans-Neptunian)';
}
