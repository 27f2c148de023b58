/* Rules on fluid states and on the methods that use them. */
import { type Fluid, quantityOf } from '@domain/basis';
import { convert, type Q, toSI } from '@engine/quantity';
import { withFluid, gt, output, param, percent, scenarioName, told } from './reading';
import { type Hit, rule, type RuleContext } from './types';

const GAS_CONSTANT = 8314.462618;
const IDEAL = /(^|:)(a\.gas|i\.iso4126-gas)/;

function onFluid(fluid: Fluid, values: Hit['values'], extra: Partial<Hit> = {}): Hit {
  return {
    subject: `fluids/${fluid.id}`,
    tag: fluid.name,
    values: { fluid: fluid.name, ...values },
    ...extra,
  };
}

/** Fluids that the ideal nozzle formula is used on, each once. */
function idealFluids(ctx: RuleContext): Fluid[] {
  const used = withFluid(ctx).filter(({ ca }) =>
    IDEAL.test(ctx.evaluation.sheets[`size:${ca.id}`]?.method ?? ''),
  );
  return [...new Set(used.map(({ fluid }) => fluid))];
}

export const kOutsideRange = rule(
  {
    code: 'k-outside-range',
    subject: 'fluid',
    statement: 'k = {k} of {fluid} is outside {lo}–{hi}, or is a real-gas ratio used in the ideal formula.',
    condition:
      'k is 1.00 or less, or above 1.667 (impossible); or between 1.00 and 1.05; or is marked as a real-gas ratio and goes into the ideal formula.',
    severity: 'justify',
    gate: 'check',
    source:
      'API 520-1 task force 2008: k is the ideal-gas cp/cv; the real-gas ratio is not the isentropic exponent [S]',
    parameter: 'kWarnBelow',
  },
  (ctx) =>
    idealFluids(ctx).flatMap((fluid): Hit[] => {
      const k = quantityOf(fluid.k);
      if (!k) return [];
      const lo = param(ctx, 'kWarnBelow', 1.05);
      const outside = k.value < lo || k.value > 1.667 * 1.001;
      if (!outside && fluid.kIs !== 'real') return [];
      const values = { k: told(k.value, '-'), lo: told(lo, '-'), hi: told(1.667, '-') };
      return [onFluid(fluid, values, { field: `fluids/${fluid.id}/k`, worse: Math.abs(k.value - 1.35) })];
    }),
);

export const zOutsideRange = rule(
  {
    code: 'z-outside-range',
    subject: 'fluid',
    statement: 'Z = {z}: outside {lo}–{hi} the ideal nozzle formula can be far off.',
    condition:
      'Z is below 0.80 or above 1.10 with the ideal formula. From 0.30 to 0.80 it also asks for an isentropic exponent or an integration.',
    severity: 'justify',
    gate: 'check',
    source: 'API 520-1 Annex B range 0.8–1.1 [M]',
    parameter: 'zLow',
  },
  (ctx) =>
    idealFluids(ctx).flatMap((fluid): Hit[] => {
      const z = quantityOf(fluid.Z);
      const [lo, hi] = [param(ctx, 'zLow', 0.8), param(ctx, 'zHigh', 1.1)];
      if (!z || (z.value >= lo && z.value <= hi)) return [];
      const more = z.value >= 0.3 && z.value < lo ? 'Give the isentropic exponent, or integrate.' : undefined;
      const values = { z: told(z.value, '-'), lo: told(lo, '-'), hi: told(hi, '-') };
      return [
        onFluid(fluid, values, {
          field: `fluids/${fluid.id}/Z`,
          worse: Math.abs(z.value - 0.95),
          ...(more ? { more } : {}),
        }),
      ];
    }),
);

/** Density of an ideal gas with Z over the stated one, less one; nothing when a figure is missing. */
function gasDeviation(ctx: RuleContext, fluid: Fluid): number | undefined {
  const [rho, Z, T, M] = [fluid.rhoVapour, fluid.Z, fluid.T, fluid.M].map((figure) => quantityOf(figure));
  const P = quantityOf(fluid.P) ?? quantityOf(fluid.from.saturatedAt);
  if (!rho || !Z || !T || !M || !P) return undefined;
  const pa = convert(P, 'Pa_abs', { barometer: ctx.rules.barometer });
  return (toSI(rho) * Z.value * GAS_CONSTANT * toSI(T)) / (pa * convert(M, 'kg/kmol')) - 1;
}

function liquidDeviation(fluid: Fluid): number | undefined {
  const [rho, relative] = [quantityOf(fluid.rhoLiquid), quantityOf(fluid.relativeDensity)];
  return rho && relative ? toSI(rho) / (relative.value * 999) - 1 : undefined;
}

export const densityInconsistent = rule(
  {
    code: 'density-inconsistent',
    subject: 'fluid',
    statement: 'Density, pressure, temperature, molar mass and Z of {fluid} do not agree ({x} %).',
    condition:
      'Gas: density, Z, temperature, pressure and molar mass depart from the gas law by more than 3 %. Liquid: density and relative density differ by more than 1 %.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'ideal identity [P]',
    parameter: 'densityBand',
  },
  (ctx) =>
    ctx.doc.fluids.flatMap((fluid): Hit[] => {
      const gas = Math.abs(gasDeviation(ctx, fluid) ?? 0);
      const liquid = Math.abs(liquidDeviation(fluid) ?? 0);
      const off = gas > param(ctx, 'densityBand', 0.03) ? gas : liquid > 0.01 ? liquid : undefined;
      if (off === undefined) return [];
      const field = `fluids/${fluid.id}/${off === gas ? 'rhoVapour' : 'rhoLiquid'}`;
      return [onFluid(fluid, { x: percent(off) }, { field, worse: off })];
    }),
);

export const latentHeatLow = rule(
  {
    code: 'latent-heat-low',
    subject: 'fluid',
    statement: 'The latent heat of {fluid} is {l} kJ/kg, below the floor for near-critical liquids.',
    condition: 'A latent heat below 115 kJ/kg (50 Btu/lb) divides the heat input.',
    severity: 'justify',
    gate: 'check',
    source: 'trade practice [P]',
    parameter: 'latentFloor',
  },
  (ctx) =>
    withFluid(ctx).flatMap(({ ca, fluid }): Hit[] => {
      const l = ctx.evaluation.sheets[`load:${ca.id}`]?.inputs['latent_heat'];
      const floor = param(ctx, 'latentFloor', 115);
      if (typeof l !== 'object' || !gt(floor, convert(l, 'kJ/kg'))) return [];
      return [
        onFluid(
          fluid,
          { l: told(convert(l, 'kJ/kg'), '-'), scenario: scenarioName(ca.scenario) },
          { worse: -convert(l, 'kJ/kg') },
        ),
      ];
    }),
);

export const stateNotAtRelief = rule(
  {
    code: 'state-not-at-relief',
    subject: 'fluid',
    statement: 'The properties of {fluid} are at {T},{P}, not at the relieving conditions of {scenario}.',
    condition:
      'The pressure of the fluid’s state is more than 2 %, or its temperature more than 5 K, from the relieving conditions; or name, equation of state or source is missing.',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 [M]; [P] tolerances',
    parameter: 'statePressure',
  },
  (ctx) =>
    withFluid(ctx).flatMap(({ ca, fluid }): Hit[] => {
      const p1 = output(ctx, `limit:${ca.id}`, 'P1');
      const P = quantityOf(fluid.P) ?? quantityOf(fluid.from.saturatedAt);
      if (!p1 || !P) return [];
      const off = Math.abs(convert(P, 'Pa_abs', { barometer: ctx.rules.barometer }) / toSI(p1) - 1);
      const own = quantityOf(ca.answer.T);
      const T = quantityOf(fluid.T);
      const apart = own && T ? Math.abs(toSI(own) - toSI(T)) : 0;
      if (off <= param(ctx, 'statePressure', 0.02) && apart <= param(ctx, 'stateTemperature', 5)) return [];
      const values: Record<string, Q | string> = {
        T: T ?? 'no temperature',
        P,
        scenario: scenarioName(ca.scenario),
      };
      return [onFluid(fluid, values, { worse: off })];
    }),
);
