/* Rules on fluid states and on the methods that use them. */
import { type Fluid, quantityOf } from '@domain/basis';
import { type CredibleAnswer } from '@domain/evaluate';
import { convert, type Q, toSI } from '@engine/quantity';
import { gt, isFire, onScenario, output, param, percent, scenarioName, told } from './reading';
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

/** Answers with their fluid. */
function withFluid(ctx: RuleContext): { ca: CredibleAnswer; fluid: Fluid }[] {
  return ctx.answers.flatMap((ca) => {
    const fluid = ctx.lookup.fluids.get(ca.answer.fluid ?? '');
    return fluid ? [{ ca, fluid }] : [];
  });
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
    condition: 'k ≤ 1.00 or > 1.667 refuse; 1.00–1.05 warn; ideal formula with k flagged real-gas',
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
      'Z < 0.80 or Z > 1.10 with ideal formula; 0.30–0.80 also asks for isentropic exponent or integration',
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
      'abs(ρ·Z·R·T/(P·M) − 1) > 0.03 (R = 8314.46 J/(kmol·K)); liquid: ρ and ρ(relative)·999 differ > 1 %',
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
    condition: 'λ < 115 kJ/kg (50 Btu/lb) used in W = Q/λ',
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
      'abs(P_fluid/P1 − 1) > 0.02 or abs(T_fluid − T1) > 5 K; name, equation of state or source missing',
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

const FAMILIES: [RegExp, Fluid['phase'][]][] = [
  [/(^|:)(a\.gas|i\.iso4126-gas)/, ['gas', 'vapour', 'supercritical']],
  [/(^|:)(b\.steam|i\.iso4126-steam)/, ['gas', 'vapour']],
  [/(^|:)(c\.liquid|i\.iso4126-liquid)/, ['liquid']],
  [/(^|:)d\.omega/, ['two-phase', 'flashing-liquid']],
];

export const phaseMismatch = rule(
  {
    code: 'phase-mismatch',
    subject: 'scenario',
    statement: '{scenario} is sized as {a} but {fluid} is {b} at relief.',
    condition:
      'method family ≠ phase at (P1,T1); vapour fraction 0<x<1 with a single-phase method; liquid with Psat(T1) > P2 (or > choke pressure) sized as liquid',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 Annex C 10th [M]; chooser rule trade practice',
  },
  (ctx) =>
    withFluid(ctx).flatMap(({ ca, fluid }): Hit[] => {
      const sheet = ctx.evaluation.sheets[`size:${ca.id}`];
      const family = FAMILIES.find(([name]) => name.test(sheet?.method ?? ''));
      if (!sheet || !family || family[1].includes(fluid.phase)) return [];
      const values = { a: family[1].join(' or '), fluid: fluid.name, b: fluid.phase.replace('-', ' ') };
      return [
        onScenario(ca.scenario, values, {
          field: `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/size`,
        }),
      ];
    }),
);

export const correctionFactorMissing = rule(
  {
    code: 'correction-factor-missing',
    subject: 'scenario',
    statement: '{factor} is left at 1 although {why}.',
    condition:
      'Kv = 1 and Re < 100 000; KSH = 1 and steam > Tsat + 5 K; KN = 1 and 1 500 psi < P1 (10 339 kPa) ≤ 3 200 psi; Kb/Kw = 1 beyond onset; F2 absent when subcritical; Kp absent when op ≠ 25 % in the non-certified liquid method; Kc = 1 with disk',
    severity: 'stop',
    gate: 'scenarios',
    source: 'API 520-1 7th–10th [M]; method b, c',
  },
  (ctx) =>
    ctx.answers.flatMap((ca): Hit[] => {
      const kc = ctx.evaluation.sheets[`size:${ca.id}`]?.inputs['Kc'];
      const disked = ca.group?.members
        .map((member) => ctx.lookup.points.get(member.point))
        .find((point) => point?.with?.side === 'inlet' && point.with.certifiedPair === undefined);
      if (typeof kc !== 'object' || kc.value < 0.999 || !disked) return [];
      const values = { factor: 'Kc', why: `a disk stands below ${disked.tag}` };
      return [
        onScenario(ca.scenario, values, {
          field: `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/size`,
        }),
      ];
    }),
);

const REACTIONS = ['runaway-reaction', 'reaction-upset'];

export const reactionDataMissing = rule(
  {
    code: 'reaction-data-missing',
    subject: 'scenario',
    statement: '{scenario} is a reaction case without calorimetry or a stated equivalent.',
    condition:
      'scenario ∈ {runaway-reaction, reaction-upset}, credible, and no reference of kind calorimetry; or foamy/level-swell flag blank',
    severity: 'stop',
    gate: 'scenarios',
    source: 'HSE CRR 136/1998, DIERS [P]',
  },
  (ctx) =>
    withFluid(ctx).flatMap(({ ca, fluid }): Hit[] => {
      if (!REACTIONS.includes(ca.scenario.key) || isFire(ca)) return [];
      const measured = ctx.doc.references.some((reference) => reference.kind === 'calorimetry');
      return measured && fluid.foamy !== undefined ? [] : [onScenario(ca.scenario, { fluid: fluid.name })];
    }),
);
