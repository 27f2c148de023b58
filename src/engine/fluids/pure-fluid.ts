/* A pure substance of the library as a source of properties. */
import { type FluidState, type PhaseState, type Saturation } from '../properties/types';
import { type CubicFluid, type Equilibrium } from './cubic-fluid';
import { type Mixture } from './cubic/mixture';
import { evaluatePhase } from './cubic/phase';
import { molar, phaseState } from './cubic/state';
import { newThermal, setTemperature } from './cubic/thermal';
import { at } from './cubic/vector';
import { type Held, phaseHolding } from './flash/one-phase';
import { type Boiling, boilingAt, newBoiling } from './flash/pure';
import { pressureInside, temperatureRange } from './range';

/** The state that has a vapour share by mass `x` between two phases in equilibrium. */
export function between(liquid: PhaseState, vapour: PhaseState, x: number): FluidState {
  const mean = (of: 'h' | 's') => liquid[of] + x * (vapour[of] - liquid[of]);
  const v = 1 / liquid.rho + x * (1 / vapour.rho - 1 / liquid.rho);
  return { P: liquid.P, T: liquid.T, rho: 1 / v, h: mean('h'), s: mean('s'), x };
}

/** The properties of a pure substance; `mixture` holds one component. Every answer outside its range is undefined. */
export function pureFluid(mixture: Mixture, name: string, source: string): CubicFluid {
  const t = newThermal(mixture);
  const M = at(mixture.M, 0);
  const critical = { P: at(mixture.Pc, 0), T: at(mixture.Tc, 0) };
  const { low, high } = temperatureRange(mixture);
  const scratch = newBoiling().vapour;
  const boil = newBoiling();

  const atPT = (P: number, T: number): PhaseState | undefined => {
    if (!(pressureInside(P) && T >= low && T <= high)) return undefined;
    setTemperature(mixture, t, T);
    return evaluatePhase(mixture, t, P, 'stable', scratch) ? phaseState(mixture, t, scratch) : undefined;
  };

  const saturation = (P: number): Saturation | undefined => {
    if (!(pressureInside(P) && boilingAt(mixture, t, P, boil) && boil.T > low)) return undefined;
    setTemperature(mixture, t, boil.T);
    const liquid = phaseState(mixture, t, boil.liquid);
    const vapour = phaseState(mixture, t, boil.vapour);
    return liquid && vapour ? { liquid, vapour } : undefined;
  };

  const atPx = (P: number, x: number): FluidState | undefined => {
    if (!(x >= 0 && x <= 1)) return undefined;
    const sat = saturation(P);
    return sat && between(sat.liquid, sat.vapour, x);
  };

  const onePhase = (
    P: number,
    held: Held,
    from: Boiling | undefined,
    side: 'liquid' | 'vapour' | 'stable',
  ) => {
    const start = from?.T ?? critical.T;
    const span = { low: side === 'vapour' ? start : low, high: side === 'liquid' ? start : high, start };
    const T = phaseHolding(mixture, t, P, held, side, span, scratch);
    return T === undefined ? undefined : phaseState(mixture, t, scratch);
  };

  const holding = (P: number, kind: 'h' | 's', perMass: number): FluidState | undefined => {
    if (!(pressureInside(P) && Number.isFinite(perMass))) return undefined;
    const held: Held = { kind, value: perMass * M };
    if (P >= critical.P) return onePhase(P, held, undefined, 'stable');
    if (!boilingAt(mixture, t, P, boil)) return undefined;
    // Below the range of the data there is no boiling, but there may still be gas.
    if (boil.T <= low) return onePhase(P, held, undefined, 'vapour');
    setTemperature(mixture, t, boil.T);
    const liquid = molar(mixture, t, boil.liquid)[kind];
    const vapour = molar(mixture, t, boil.vapour)[kind];
    if (held.value < liquid) return onePhase(P, held, boil, 'liquid');
    if (held.value > vapour) return onePhase(P, held, boil, 'vapour');
    const [l, v] = [phaseState(mixture, t, boil.liquid), phaseState(mixture, t, boil.vapour)];
    return l && v && between(l, v, (held.value - liquid) / (vapour - liquid));
  };

  const equilibrium = (P: number, T: number): Equilibrium | undefined => {
    const state = atPT(P, T);
    return state && { state };
  };

  return {
    name,
    source,
    M,
    critical,
    pure: true,
    mixture,
    range: { low, high },
    equilibrium,
    boundary: (P) => {
      const sat = saturation(P);
      return sat && { T: sat.liquid.T, ...sat, x: [1], y: [1] };
    },
    atPT,
    atPx,
    atPH: (P, h) => holding(P, 'h', h),
    atPS: (P, s) => holding(P, 's', s),
    saturation,
  };
}
