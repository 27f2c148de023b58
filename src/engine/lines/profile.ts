/* What happens along a line, point by point, for a drawing: pressure, velocity, Mach number, temperature, density. */
import { GAS_CONSTANT } from '../methods/a-gas/flow';
import { adiabaticLine } from './adiabatic';
import { fannoUpstream, temperatureRatio } from './fanno';
import { isothermalLine, isothermalRatio } from './isothermal';
import { marchedLine, type RisingSegment, upstreamPressure } from './march';
import { type Enlargement, fluxOf, type LineGas } from './segment';
import { homogeneousMach, volumeAt, type VolumeCurve } from './volume';

/** A point of a line: metres from the device, segment counted from 1, Pa absolute, m/s, Mach, K (where known), kg/m³. */
export type LinePoint = {
  x: number;
  segment: number;
  P: number;
  velocity: number;
  mach: number;
  T?: number;
  rho: number;
};

/** A segment with its length for the drawing, m; fittings are spread over it. */
export type DrawnSegment = RisingSegment & { L: number };

type State = Omit<LinePoint, 'x' | 'segment'>;

/** Points of all segments: `at` gives the state where a share of the segment's heads is still to come. */
function points(
  segments: readonly DrawnSegment[],
  each: number,
  at: (segment: DrawnSegment, index: number, left: number) => State | undefined,
): LinePoint[] {
  const all: LinePoint[] = [];
  let start = 0;
  segments.forEach((segment, index) => {
    for (let j = 0; j <= each; j += 1) {
      const state = at(segment, index, 1 - j / each);
      if (state) all.push({ x: start + (segment.L * j) / each, segment: index + 1, ...state });
    }
    start += segment.L;
  });
  return all;
}

/** Profile of an isothermal line; `each` + 1 points a segment. The Mach number is by the adiabatic speed of sound. */
export function isothermalProfile(
  segments: readonly DrawnSegment[],
  gas: LineGas,
  end: number,
  each = 20,
): LinePoint[] {
  const worked = isothermalLine(segments, gas, end);
  return points(segments, each, (segment, index, left) => {
    const found = worked[index];
    if (!found) return undefined;
    const r = ((segment.Z ?? gas.Z) * GAS_CONSTANT) / gas.M;
    const limit = fluxOf(segment) * Math.sqrt(r * gas.T);
    const P = found.outlet * isothermalRatio((limit / found.outlet) ** 2, segment.N * left);
    const rho = P / (r * gas.T);
    return { P, velocity: fluxOf(segment) / rho, mach: limit / P / Math.sqrt(gas.k), T: gas.T, rho };
  });
}

/** Profile of an adiabatic line; gas.T is the stagnation temperature. */
export function adiabaticProfile(
  segments: readonly DrawnSegment[],
  gas: LineGas,
  end: number,
  model: Enlargement = 'static',
  each = 20,
): LinePoint[] {
  const worked = adiabaticLine(segments, gas, end, model);
  const r = (gas.Z * GAS_CONSTANT) / gas.M;
  return points(segments, each, (segment, index, left) => {
    const found = worked[index];
    if (!found) return undefined;
    const mach2 = 1 / fannoUpstream(1 / found.machOut ** 2, segment.N * left, gas.k);
    const T = gas.T / temperatureRatio(mach2, gas.k);
    const velocity = Math.sqrt(mach2 * gas.k * r * T);
    const rho = fluxOf(segment) / velocity;
    return { P: rho * r * T, velocity, mach: Math.sqrt(mach2), T, rho };
  });
}

/** Profile of a homogeneous line, one phase or two; pressure follows friction, rise being spread evenly. */
export function marchedProfile(
  segments: readonly DrawnSegment[],
  curve: VolumeCurve,
  end: number,
  each = 20,
): LinePoint[] {
  const worked = marchedLine(segments, curve, end) ?? [];
  return points(segments, each, (segment, index, left) => {
    const found = worked[index];
    if (!found) return undefined;
    const G = fluxOf(segment);
    const level = upstreamPressure(curve, G, segment.N * left, found.outlet);
    const whole = upstreamPressure(curve, G, segment.N, found.outlet);
    if (level === undefined || whole === undefined) return undefined;
    const P = level + (found.inlet - whole) * left;
    const rho = 1 / volumeAt(curve, P);
    return { P, velocity: G / rho, mach: homogeneousMach(curve, G, P), rho };
  });
}
