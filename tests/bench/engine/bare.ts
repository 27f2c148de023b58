/* The bare forms: SI numbers in, numbers out, no sheet; every input varies from call to call. */
import { criticalRatio, gasArea, gasC, type GasFlow, nozzleFlux } from '@engine/methods/a-gas/flow';
import { ksh10, steamArea, steamKN } from '@engine/methods/b-steam/factors';
import { balancedKw, kv10, liquidArea, liquidReynolds, viscousArea } from '@engine/methods/c-liquid/flow';
import { omegaFlux, subcooledFlux } from '@engine/methods/d-two-phase/omega';
import { effectiveHeight, wettedArea } from '@engine/methods/e-fire/geometry';
import { fireHeat, insulationFactor } from '@engine/methods/e-fire/heat';
import { gasThrough, liquidThrough } from '@engine/methods/f-loads/control-valve';
import { liquidFlux } from '@engine/methods/f-loads/orifice';
import { thermalExpansion } from '@engine/methods/f-loads/thermal';
import { maap } from '@engine/methods/h-limits/limits';
import { isoC, isoGasArea, isoKb } from '@engine/methods/i-iso4126/flow';
import { chooseLetter } from '@engine/methods/i-letters/letters';
import {
  adiabaticLine,
  fannoFunction,
  frictionFactor,
  inletLine,
  isothermalLine,
  pipeDischarge,
} from '@engine/lines';
import { drain } from './measure';

/** So many different sets of inputs: more than any compiler specialises for, few enough to stay in the cache. */
const SETS = 1024;

/** Inputs varied by up to ±10 %, each its own way, always the same. */
function varied<T>(make: (by: () => number) => T): T[] {
  let seed = 12345;
  const by = () => {
    seed = (seed * 1103515245 + 12345) % 2147483648;
    return 0.9 + (0.2 * seed) / 2147483648;
  };
  return Array.from({ length: SETS }, () => make(by));
}

/** A bare form over its sets of inputs. */
function over<T>(sets: readonly T[], form: (set: T) => number): (i: number) => void {
  return (i) => {
    drain(form(sets[i % SETS] as T));
  };
}

const GAS = varied((by): GasFlow => ({
  W: 24270 * by(),
  T: 348 * by(),
  Z: 0.9 * by(),
  M: 51 * by(),
  k: 1.2 * by(),
  P1: 670 * by(),
  P2: 300 * by(),
  Kd: 0.975,
  Kb: 1,
  Kc: 1,
}));
const NUMBERS = varied((by) => by());
const LINE = { T: 390, Z: 0.95, M: 28, k: 1.3 };
const SEGMENTS = varied((by) => [
  { D: 0.1 * by(), N: 4 * by(), W: 2 * by() },
  { D: 0.2 * by(), N: 12 * by(), W: 2 * by() },
]);
const VALVE = varied((by) => ({
  P1: 680 * by(),
  P2: 310 * by(),
  T: 433 * by(),
  Z: 0.988,
  M: 43,
  k: 1.2 * by(),
  xT: 0.6 * by(),
}));
const FITTED = { d: 50, D1: 80, D2: 100 };
const LIQUID = varied((by) => ({
  Q: 6814 * by(),
  G: 0.9 * by(),
  dp: 1724 * by(),
  Kd: 0.65,
  Kw: 0.97,
  Kc: 1,
}));
const VESSEL = { orientation: 'horizontal', heads: 'ellipsoidal', D: 3, L: 9 } as const;

/** Bare forms by topic; where a topic has several, the name says which. */
export const BARE: Readonly<Record<string, (i: number) => void>> = {
  'a.gas': over(GAS, (gas) => gasArea(gas, 'SI').area),
  'a.gas-C': over(NUMBERS, (by) => gasC(1.3 * by, 'SI')),
  'a.rated-capacity': over(GAS, (gas) => nozzleFlux({ ...gas, P1: gas.P1 * 1e3, P2: gas.P2 * 1e3 }).flux),
  'b.steam': over(NUMBERS, (by) => {
    const P1 = 12236 * by;
    const factors = { KN: steamKN(P1, 'SI') ?? 1, KSH: ksh10(P1, 400 * by) ?? 1 };
    return steamArea({ W: 69615 * by, P1, Kd: 0.975, Kb: 1, Kc: 1, ...factors }, 'SI');
  }),
  'c.liquid': over(LIQUID, (flow) => {
    const bare = liquidArea(flow, 'SI');
    const Re = (area: number) => liquidReynolds(flow.Q, flow.G, { mu: 400 }, area, 'SI');
    return viscousArea(bare, Re, '10E', 'SI').passes.length;
  }),
  'c.backpressure-factor': over(NUMBERS, (by) => balancedKw(30 * by) ?? 0),
  'c.viscosity-factor': over(NUMBERS, (by) => kv10(2000 * by)),
  'd.omega-saturated': over(NUMBERS, (by) => omegaFlux(9.15 * by, 556_800 * by, 0.0232 * by, 204_700).flux),
  'd.omega-subcooled': over(
    NUMBERS,
    (by) => subcooledFlux({ P0: 2e6, rho0: 511 * by, Ps: 1.8e6 * by, omegaS: 4 * by }, 1e5).flux,
  ),
  'e.fire-wetted': over(NUMBERS, (by) => {
    const h = effectiveHeight(VESSEL, { level: 2 * by, elevation: 4 * by, fireHeight: 7.6 });
    return fireHeat(wettedArea(VESSEL, h), 1, true, 'SI');
  }),
  'e.fire-insulation': over(NUMBERS, (by) => insulationFactor(0.05 * by, 150, 0.1 * by)),
  'f.control-valve-gas': over(VALVE, (gas) => gasThrough(gas, 100, 'Kv').W),
  'f.control-valve-gas, with fittings': over(VALVE, (gas) => gasThrough(gas, 100, 'Kv', FITTED).W),
  'f.control-valve-liquid': over(
    VALVE,
    ({ P1, P2 }) => liquidThrough({ P1, P2, rho: 965, Pv: 70, Pc: 22120, FL: 0.9 }, 100, 'Kv').Q,
  ),
  'f.tube-rupture': over(NUMBERS, (by) => liquidFlux(900 * by, 2e6 * by)),
  'f.thermal-expansion': over(NUMBERS, (by) => thermalExpansion(1e-3 * by, 1e5, 800 * by, 2200)),
  'g.fanno-function': over(NUMBERS, (by) => fannoFunction(0.4 * by, 1.4)),
  'g.friction factor': over(NUMBERS, (by) => frictionFactor(2e5 * by, 3e-4 * by)),
  'g.inlet-loss, adiabatic': over(NUMBERS, (by) => inletLine(1.2e6, LINE, 1000 * by, 1.5 * by)?.machOut ?? 0),
  'g.outlet-isothermal': over(
    SEGMENTS,
    ([one]) => isothermalLine(one ? [one] : [], LINE, 101_325)[0]?.inlet ?? 0,
  ),
  'g.outlet-isothermal, two segments': over(
    SEGMENTS,
    (segments) => isothermalLine(segments, LINE, 101_325)[0]?.inlet ?? 0,
  ),
  'g.outlet-fanno, two segments': over(
    SEGMENTS,
    (segments) => adiabaticLine(segments, LINE, 101_325, 'momentum')[0]?.inlet ?? 0,
  ),
  'g.pipe-discharge': over(NUMBERS, (by) => pipeDischarge(5e5 * by, LINE, 5.6 * by, 101_325)?.flux ?? 0),
  'h.accumulation': over(NUMBERS, (by) => maap(1000 * by, 'multiple', { basis: 'asme-viii-1', units: 'SI' })),
  'i.api526-letters': over(NUMBERS, (by) => chooseLetter(1800 * by)?.mm2 ?? 0),
  'i.iso4126-gas': over(NUMBERS, (by) => {
    const k = 1.3 * by;
    const Kb = isoKb(k, 0.7 * by);
    return (
      isoGasArea({ Qm: 1e4 * by, p0: 12, T: 300, Z: 1, M: 29, C: isoC(k), Kdr: 0.8, Kb }) + criticalRatio(k)
    );
  }),
};
