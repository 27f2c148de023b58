/* Adiabatic (Fanno) gas flow in a line, marched from its end to the device, with the sonic check at the end of every segment. */
import { findRoot } from '../numeric';
import { GAS_CONSTANT } from '../methods/a-gas/flow';
import { fannoUpstream, machSquared, stagnationRatio, temperatureRatio } from './fanno';
import { boreArea, type Enlargement, fluxOf, type LineGas, type LineSegment } from './segment';

/** A segment of a worked line: static pressures Pa and temperatures K, Mach numbers, whether its end is sonic. */
export type AdiabaticSegment = {
  inlet: number;
  outlet: number;
  choked: boolean;
  machOut: number;
  machIn: number;
  temperatureOut: number;
  temperatureIn: number;
};

/** Gas constants of a line: r = Z R/M, J/(kg·K), with T0 and k. */
type Constants = { rT: number; k: number };

/** Static pressure at Mach √m2 and flux G: G √(r T0/k)/(Ma √(1 + (k−1)/2 Ma²)). */
function pressureAt(G: number, m2: number, { rT, k }: Constants): number {
  return G * Math.sqrt(rT / k / (m2 * temperatureRatio(m2, k)));
}

function machAt(G: number, p: number, { rT, k }: Constants): number {
  return machSquared((G * G * rT) / (k * p * p), k);
}

/**
 * Mach² ahead of a sudden enlargement by the momentum balance p1 A2 + p1 A1 k Ma1² = p2 A2 (1 + k Ma2²), the static pressure of
 * the smaller pipe standing on the annulus. 1 where the balance would need more than Mach 1.
 */
function beforeEnlargement(
  small: LineSegment,
  large: LineSegment,
  behind: number,
  constants: Constants,
): number {
  const [A1, A2] = [boreArea(small.D), boreArea(large.D)];
  const { k } = constants;
  const force = behind * A2 * (1 + k * machAt(fluxOf(large), behind, constants));
  const G = fluxOf(small);
  const off = (m2: number) => pressureAt(G, m2, constants) * (A2 + A1 * k * m2) - force;
  if (off(1) >= 0) return 1;
  const found = findRoot((ln) => off(Math.exp(ln)), Math.log(1e-14), 0, { tolerance: 1e-13 });
  return found.ok ? Math.exp(found.x) : 1;
}

/** Mach² ahead of a reduction, where stagnation pressure is kept (its loss stands among the velocity heads). */
function beforeReduction(
  large: LineSegment,
  small: LineSegment,
  behind: number,
  constants: Constants,
): number {
  const { k } = constants;
  const stagnation = behind * stagnationRatio(machAt(fluxOf(small), behind, constants), k);
  const G = fluxOf(large);
  const off = (ln: number) =>
    pressureAt(G, Math.exp(ln), constants) * stagnationRatio(Math.exp(ln), k) - stagnation;
  if (off(0) >= 0) return 1;
  const found = findRoot(off, Math.log(1e-14), 0, { tolerance: 1e-13 });
  return found.ok ? Math.exp(found.x) : 1;
}

/** Mach² at the end of a segment: by what follows it, never above 1. */
function endMach(
  segment: LineSegment,
  next: LineSegment | undefined,
  behind: number,
  model: Enlargement,
  constants: Constants,
): number {
  if (next && next.D > segment.D * (1 + 1e-9) && model === 'momentum')
    return beforeEnlargement(segment, next, behind, constants);
  if (next && next.D < segment.D * (1 - 1e-9)) return beforeReduction(segment, next, behind, constants);
  return machAt(fluxOf(segment), behind, constants);
}

/**
 * Works an adiabatic line from its end upstream: ideal gas, constant k, Z inside the gas constant, constant stagnation
 * temperature. A segment whose end would pass Mach 1 is sonic there and its own pressure stands.
 * @param segments from the device to the end
 * @param gas T is the stagnation temperature
 * @param end static pressure beyond the last segment, Pa absolute, > 0
 * Source: Fanno relations, any textbook of gas dynamics.
 */
export function adiabaticLine(
  segments: readonly LineSegment[],
  gas: LineGas,
  end: number,
  model: Enlargement = 'static',
): AdiabaticSegment[] {
  const { k, T } = gas;
  const constants = { rT: (gas.Z * GAS_CONSTANT * T) / gas.M, k };
  const worked: AdiabaticSegment[] = new Array<AdiabaticSegment>(segments.length);
  let behind = end;
  for (let i = segments.length - 1; i >= 0; i -= 1) {
    const segment = segments[i];
    if (!segment) break;
    const G = fluxOf(segment);
    const found = endMach(segment, segments[i + 1], behind, model, constants);
    const choked = found >= 1;
    const out2 = choked ? 1 : found;
    const in2 = 1 / fannoUpstream(1 / out2, segment.N, k);
    const inlet = pressureAt(G, in2, constants);
    worked[i] = {
      inlet,
      outlet: pressureAt(G, out2, constants),
      choked,
      machOut: Math.sqrt(out2),
      machIn: Math.sqrt(in2),
      temperatureOut: T / temperatureRatio(out2, k),
      temperatureIn: T / temperatureRatio(in2, k),
    };
    behind = inlet;
  }
  return worked;
}
