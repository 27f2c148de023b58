/* Lines fed from a vessel at rest: what the inlet line of a device loses, and what a pipe lets out to the air. */
import { GAS_CONSTANT } from '../methods/a-gas/flow';
import { findRoot } from '../numeric';
import { fannoOfS, fannoUpstream, machSquared, stagnationRatio, temperatureRatio } from './fanno';
import { type LineGas } from './segment';

/** A line from a vessel at rest: Mach at both ends, pressures Pa, exit temperature K, flux kg/(m²·s). */
export type FedLine = {
  machIn: number;
  machOut: number;
  flux: number;
  exit: number;
  exitStagnation: number;
  exitTemperature: number;
  choked: boolean;
};

/** Flux at Mach² `m2` behind an isentropic entrance from P0, T0. */
function fluxFrom(P0: number, gas: LineGas, m2: number): number {
  const { k, T, Z, M } = gas;
  const p = P0 / stagnationRatio(m2, k);
  return p * Math.sqrt((k * m2 * temperatureRatio(m2, k) * M) / (Z * GAS_CONSTANT * T));
}

function pressureFrom(flux: number, gas: LineGas, m2: number): number {
  const { k, T, Z, M } = gas;
  return flux * Math.sqrt((Z * GAS_CONSTANT * T) / (M * k * m2 * temperatureRatio(m2, k)));
}

function fed(P0: number, gas: LineGas, in2: number, out2: number, choked: boolean): FedLine {
  const flux = fluxFrom(P0, gas, in2);
  const exit = pressureFrom(flux, gas, out2);
  return {
    machIn: Math.sqrt(in2),
    machOut: Math.sqrt(out2),
    flux,
    exit,
    exitStagnation: exit * stagnationRatio(out2, gas.k),
    exitTemperature: gas.T / temperatureRatio(out2, gas.k),
    choked,
  };
}

/** Mach² that lies N velocity heads downstream of `in2`, or undefined when the flow chokes before. */
function downstream(in2: number, N: number, k: number): number | undefined {
  const left = fannoOfS(1 / in2, k) - N;
  if (left < 0) return undefined;
  const found = findRoot((s) => fannoOfS(s, k) - left, 1, 1 / in2, { tolerance: 1e-14 });
  return found.ok ? 1 / found.x : undefined;
}

/**
 * An adiabatic line of one bore from a vessel at rest that carries a given flux: isentropic entrance, then N velocity heads
 * (the entrance loss among them).
 * @returns undefined when the line cannot pass that flux at P0
 */
export function inletLine(P0: number, gas: LineGas, flux: number, N: number): FedLine | undefined {
  const { k } = gas;
  if (!(fluxFrom(P0, gas, 1) > flux)) return undefined;
  const found = findRoot((ln) => fluxFrom(P0, gas, Math.exp(ln)) / flux - 1, Math.log(1e-16), 0, {
    tolerance: 1e-14,
  });
  if (!found.ok) return undefined;
  const in2 = Math.exp(found.x);
  const out2 = downstream(in2, N, k);
  return out2 === undefined ? undefined : fed(P0, gas, in2, out2, false);
}

/**
 * What a pipe of one bore and N velocity heads lets out of a vessel at P0 to `ambient` Pa: adiabatic, choked at its end where
 * the ambient pressure is low enough. Source: Perry's handbook, adiabatic discharge (Lapple), in closed form.
 * @returns undefined when P0 is not above the ambient pressure
 */
export function pipeDischarge(P0: number, gas: LineGas, N: number, ambient: number): FedLine | undefined {
  if (!(P0 > ambient)) return undefined;
  const { k } = gas;
  const sonic = fed(P0, gas, 1 / fannoUpstream(1, N, k), 1, true);
  if (sonic.exit >= ambient) return sonic;
  const at = (ln: number) => {
    const out2 = Math.exp(ln);
    return fed(P0, gas, 1 / fannoUpstream(1 / out2, N, k), out2, false);
  };
  const found = findRoot((ln) => at(ln).exit / ambient - 1, Math.log(1e-16), 0, { tolerance: 1e-13 });
  return found.ok ? at(found.x) : undefined;
}

/** State of an ideal gas where it leaves an opening of known area to the air: sonic when the ambient pressure allows no less. */
export type Exit = { mach: number; pressure: number; temperature: number; velocity: number; choked: boolean };

/** Exit of a flow W through area A to `ambient` Pa; gas.T is the stagnation temperature. */
export function exitState(W: number, A: number, gas: LineGas, ambient: number): Exit {
  const { k, T, Z, M } = gas;
  const G = W / A;
  const r = (Z * GAS_CONSTANT) / M;
  const free = machSquared((G * G * r * T) / (k * ambient * ambient), k);
  const m2 = Math.min(1, free);
  const temperature = T / temperatureRatio(m2, k);
  return {
    mach: Math.sqrt(m2),
    pressure: free >= 1 ? pressureFrom(G, gas, 1) : ambient,
    temperature,
    velocity: Math.sqrt(m2 * k * r * temperature),
    choked: free >= 1,
  };
}
