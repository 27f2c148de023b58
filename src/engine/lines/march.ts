/* Homogeneous flow in a line, one phase or two, marched from its end to the device on any v(P): liquids, gases, flashing mixtures. */
import { findRoot } from '../numeric';
import { fluxOf, type LineSegment } from './segment';
import { densityIntegral, homogeneousMach, limitPressure, volumeAt, type VolumeCurve } from './volume';

const GRAVITY = 9.80665;
/** Steps a segment is cut into where it rises or falls, so that weight follows the density. */
const LIFTS = 32;

/** A segment with the height its end stands above its beginning, m. */
export type RisingSegment = LineSegment & { rise?: number };

/** A segment of a worked line: pressures Pa, specific volumes m³/kg, Mach of the homogeneous mixture, whether its end is at its limit. */
export type MarchedSegment = {
  inlet: number;
  outlet: number;
  choked: boolean;
  machOut: number;
  machIn: number;
  volumeOut: number;
  volumeIn: number;
};

/**
 * Velocity heads that a fall from `p1` to `p2` pays for at flux G: N = (2/G²) ∫ ρ dP − 2 ln(v2/v1). Energy of flow with friction,
 * homogeneous velocities. Rises with p1 wherever the mixture is below its limit.
 */
export function headsPaid(curve: VolumeCurve, G: number, p1: number, p2: number): number {
  return (
    (2 / (G * G)) * densityIntegral(curve, p2, p1) - 2 * Math.log(volumeAt(curve, p2) / volumeAt(curve, p1))
  );
}

/** The pressure N velocity heads upstream of `p2`, Pa; undefined when none below 10 000 times the pressures at hand pays them. */
export function upstreamPressure(curve: VolumeCurve, G: number, N: number, p2: number): number | undefined {
  if (N <= 0) return p2;
  const off = (p: number) => headsPaid(curve, G, p, p2) - N;
  let high = p2 + (N * G * G * volumeAt(curve, p2)) / 2 + G * G * volumeAt(curve, p2);
  for (let round = 0; round < 60 && !(off(high) > 0); round += 1) high *= 2;
  const found = findRoot(off, p2, high, { tolerance: 1e-12 });
  return found.ok ? found.x : undefined;
}

/**
 * The pressure upstream of `p2` where weight pays `gain` velocity heads more than friction takes, so that pressure falls on the way
 * up; no lower than the limit of the flux, and undefined where the liquid would stand below no pressure at all.
 */
function regainedPressure(curve: VolumeCurve, G: number, gain: number, p2: number): number | undefined {
  const limit = limitPressure(curve, G, 0);
  const floor = limit > 0 ? limit : p2 * 1e-6;
  const off = (p: number) => headsPaid(curve, G, p2, p) - gain;
  if (!(off(floor) > 0)) return limit > 0 ? limit : undefined;
  const found = findRoot(off, floor, p2, { tolerance: 1e-12 });
  return found.ok ? found.x : undefined;
}

/** Upstream pressure of a segment that also rises: over short lengths the weight counts as velocity heads, 2 g h/(G v)². */
function upstreamRising(
  curve: VolumeCurve,
  G: number,
  { rise = 0, N }: RisingSegment,
  p2: number,
): number | undefined {
  if (rise === 0) return upstreamPressure(curve, G, N, p2);
  const above = (p: number, v: number) => {
    const heads = (N + (2 * GRAVITY * rise) / (G * v) ** 2) / LIFTS;
    return heads < 0 ? regainedPressure(curve, G, -heads, p) : upstreamPressure(curve, G, heads, p);
  };
  let p = p2;
  for (let i = 0; i < LIFTS; i += 1) {
    const near = above(p, volumeAt(curve, p));
    const found = near === undefined ? undefined : above(p, volumeAt(curve, (p + near) / 2));
    if (found === undefined) return undefined;
    p = found;
  }
  return p;
}

/**
 * Works a line of homogeneous flow from its end upstream, choking where the mixture reaches its own speed of sound at a
 * segment's end. Static pressure is continuous at a change of bore, except at a reduction, where the flow speeds up without loss.
 * @param end static pressure beyond the last segment, Pa absolute, > 0
 * @returns undefined when no pressure can be found (absurd inputs)
 */
export function marchedLine(
  segments: readonly RisingSegment[],
  curve: VolumeCurve,
  end: number,
): MarchedSegment[] | undefined {
  const worked: MarchedSegment[] = new Array<MarchedSegment>(segments.length);
  let behind: number | undefined = end;
  for (let i = segments.length - 1; i >= 0; i -= 1) {
    const segment = segments[i];
    if (!segment || behind === undefined) return undefined;
    const G = fluxOf(segment);
    const next = segments[i + 1];
    const joined: number | undefined =
      next && next.D < segment.D * (1 - 1e-9) ? beforeReduction(curve, G, fluxOf(next), behind) : behind;
    if (joined === undefined) return undefined;
    const outlet = limitPressure(curve, G, joined);
    const inlet = upstreamRising(curve, G, segment, outlet);
    if (inlet === undefined) return undefined;
    worked[i] = {
      inlet,
      outlet,
      choked: outlet > joined * (1 + 1e-12),
      machOut: homogeneousMach(curve, G, outlet),
      machIn: homogeneousMach(curve, G, inlet),
      volumeOut: volumeAt(curve, outlet),
      volumeIn: volumeAt(curve, inlet),
    };
    behind = inlet;
  }
  return worked;
}

/** Pressure ahead of a reduction, where the flow speeds up without loss: ∫ v dP = (u2² − u1²)/2. */
function beforeReduction(curve: VolumeCurve, G1: number, G2: number, behind: number): number | undefined {
  const u2 = G2 * volumeAt(curve, behind);
  const off = (p: number) => {
    const u1 = G1 * volumeAt(curve, p);
    return meanVolume(curve, behind, p) * (p - behind) - (u2 * u2 - u1 * u1) / 2;
  };
  let high = behind + (G2 * G2 * volumeAt(curve, behind)) / 2;
  for (let round = 0; round < 60 && !(off(high) > 0); round += 1) high *= 1.5;
  const found = findRoot(off, behind, high, { tolerance: 1e-12 });
  return found.ok ? found.x : undefined;
}

/** Mean of v between two pressures, by Simpson's rule: exact enough over the small fall of a reduction. */
function meanVolume(curve: VolumeCurve, p: number, q: number): number {
  return (volumeAt(curve, p) + 4 * volumeAt(curve, (p + q) / 2) + volumeAt(curve, q)) / 6;
}
