/* Isothermal gas flow in a line, marched from its end to the device, with the choking check at the end of every segment. */
import { GAS_CONSTANT } from '../methods/a-gas/flow';
import { fluxOf, type LineGas, type LineSegment } from './segment';

/** A segment of a worked line: static pressures Pa, whether its end is at the limit, Mach numbers by the adiabatic sound speed. */
export type IsothermalSegment = {
  inlet: number;
  outlet: number;
  choked: boolean;
  machOut: number;
  machIn: number;
};

/**
 * Inlet pressure of one bore from p1² − p2² = G² Z R T/M (N + 2 ln(p1/p2)); Newton on u = (p1/p2)², which is convex and
 * comes down on the root from above, so it cannot leave it. `a` = (G/p2)² Z R T/M ≤ 1.
 */
export function isothermalRatio(a: number, N: number): number {
  let u = 1 + a * N;
  for (let round = 0; round < 40; round += 1) {
    const slope = 1 - a / u;
    if (slope <= 0) return u;
    const step = (u - 1 - a * (N + Math.log(u))) / slope;
    u -= step;
    if (u < 1) u = 1;
    if (Math.abs(step) <= 1e-14 * u) break;
  }
  return Math.sqrt(u);
}

/**
 * Pressure ahead of a reduction from that behind it: the gas speeds up without loss (the loss of the fitting stands among the
 * velocity heads), ln(p1/p2) = (Ma2² − Ma1²)/2 with isothermal Mach numbers. `before` and `after` are G √(Z R T/M)/p2 of both.
 */
function beforeReduction(behind: number, before: number, after: number): number {
  let y = 0;
  for (let round = 0; round < 40; round += 1) {
    const mach2 = before * before * Math.exp(-2 * y);
    const step = (y - (after * after - mach2) / 2) / (1 - mach2);
    y -= step;
    if (Math.abs(step) <= 1e-14) break;
  }
  return behind * Math.exp(Math.max(0, y));
}

/**
 * Works an isothermal line from its end upstream. Limit at a segment's end: isothermal Mach G √(Z R T/M)/p = 1.
 * @param segments from the device to the end; N may differ, W may differ where lines join
 * @param end static pressure beyond the last segment, Pa absolute, > 0
 * @returns one entry a segment, in the same order
 * Source: API 521 (isothermal form), any textbook of gas dynamics.
 */
export function isothermalLine(
  segments: readonly LineSegment[],
  gas: LineGas,
  end: number,
): IsothermalSegment[] {
  const rT = (GAS_CONSTANT * gas.T) / gas.M;
  const perMach = 1 / Math.sqrt(gas.k);
  const worked: IsothermalSegment[] = new Array<IsothermalSegment>(segments.length);
  let behind = end;
  let next: LineSegment | undefined;
  for (let i = segments.length - 1; i >= 0; i -= 1) {
    const segment = segments[i];
    if (!segment) break;
    const c = Math.sqrt((segment.Z ?? gas.Z) * rT);
    const limit = fluxOf(segment) * c;
    const reduces = next !== undefined && next.D < segment.D * (1 - 1e-9);
    const joined =
      reduces && next ? beforeReduction(behind, limit / behind, (fluxOf(next) * c) / behind) : behind;
    const choked = limit > joined;
    const outlet = choked ? limit : joined;
    const inlet = outlet * isothermalRatio((limit / outlet) ** 2, segment.N);
    worked[i] = {
      inlet,
      outlet,
      choked,
      machOut: (limit / outlet) * perMach,
      machIn: (limit / inlet) * perMach,
    };
    behind = inlet;
    next = segment;
  }
  return worked;
}
