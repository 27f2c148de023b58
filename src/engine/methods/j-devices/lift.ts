/* Bare arithmetic of lift: the curtain between seat and disk against the bore of the nozzle. */

/** Seats as words of the sheet, with the factor of ASME VIII-1 UG-131(d) on the curtain (1 flat, 0.707 at 45°; from memory). */
export const SEAT_FACTORS = { flat: 1, '45 degrees': 0.707 } as const;

/** A kind of seat. */
export type Seat = keyof typeof SEAT_FACTORS;

/** Curtain area π·d·h, times the factor of the seat; d seat diameter, h lift, one unit of length. */
export function curtainArea(d: number, h: number, seat: Seat): number {
  return SEAT_FACTORS[seat] * Math.PI * d * h;
}

/** Bore area of the nozzle. */
export function boreAreaOf(d: number): number {
  return (Math.PI / 4) * d ** 2;
}

/** The area that limits the flow, and which: the curtain of a low-lift device, the bore of a full-lift one. */
export function flowAreaOf(curtain: number, bore: number): { area: number; by: 'curtain' | 'bore' } {
  return curtain < bore ? { area: curtain, by: 'curtain' } : { area: bore, by: 'bore' };
}

/** Lowest restricted lift: 30 % of the full lift and 2 mm (0.080 in), ASME XIII (VIII-1 UG-131 before), from memory; m. */
export function leastRestricted(full: number): number {
  return Math.max(0.3 * full, 0.002);
}
