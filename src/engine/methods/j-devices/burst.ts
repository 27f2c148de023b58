/* Bare arithmetic of burst pressures: what may be marked, at what it may burst, and what may be specified under a limit. */

/** Manufacturing range of a lot: fractions above and below the specified burst pressure. */
export type BurstRange = { rangeUp: number; rangeDown: number };

/** What a specified burst pressure can come to: marked between two ends, bursting between two wider ones; one unit throughout. */
export function burstSpan(
  specified: number,
  { rangeUp, rangeDown }: BurstRange,
  tolerance: (marked: number) => number,
) {
  const markedMax = specified * (1 + rangeUp);
  const markedMin = specified * (1 - rangeDown);
  return {
    markedMax,
    markedMin,
    burstMax: markedMax + tolerance(markedMax),
    burstMin: markedMin - tolerance(markedMin),
  };
}

/** The highest burst pressure that may be specified so that no disk of the lot is marked above the limit. */
export function highestSpecified(limit: number, rangeUp: number): number {
  return limit / (1 + rangeUp);
}
