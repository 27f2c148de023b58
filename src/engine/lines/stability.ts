/* The published simple checks on the stability of a spring valve behind its inlet line. They support an analysis; they judge nothing. */

/** Time of a pressure wave to the vessel and back, s: 2 L/c. */
export function returnTime(L: number, c: number): number {
  return (2 * L) / c;
}

/** The longest line from which the wave is back while the valve still opens, m: c t/2 (Smith, Burgess, Powers 2011, from memory). */
export function longestLine(c: number, opening: number): number {
  return (c * opening) / 2;
}

/**
 * Fall of pressure at the valve when the flow in the line comes up, Pa: 2 L G/t for a steady opening in time t, never more than
 * the whole wave, G c. G kg/(m²·s), L m, c m/s, t s. Source: water-hammer theory (Joukowsky; slow closure), textbook.
 */
export function accelerationDrop(G: number, L: number, c: number, opening: number): number {
  return Math.min(G * c, (2 * L * G) / opening);
}

/** Lowest natural frequency of a line open at the vessel and closed at the valve, Hz: c/(4 L). */
export function quarterWave(L: number, c: number): number {
  return c / (4 * L);
}
