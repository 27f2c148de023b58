/* Method p.fluid-properties: what stands at a pressure and temperature, with every figure that sizing and lines ask for. */
import { type Method } from '../../catalog/types';
import { CRITICAL_VOLUME, figuresOf, type TwoPhases } from '../../fluids';
import { type PhaseState } from '../../properties/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { input, RELIEVING_INPUTS } from '../common/describe';
import { relievingAbsolute } from '../common/pressures';
import { FIGURES, OWN_INPUTS, PROPERTY_OUTPUTS } from './figures';
import { FLUID_INPUTS, ownGovern, readWorked, settle, type Worked } from './fluid';
import { caloricSteps, equationSteps, idealRatioStep, liquidSteps } from './state-steps';

/** Reduced pressure and temperature around 1 in which a cubic equation is doubtful: common practice, no source. */
const NEAR_CRITICAL = { P: [0.9, 1.6], T: [0.95, 1.15] } as const;

function warnNearCritical(sheet: SheetBuilder, { source }: Worked, P: number, T: number): void {
  const pr = P / source.critical.P;
  const tr = T / source.critical.T;
  const inside = (value: number, [low, high]: readonly [number, number]) => value > low && value < high;
  if (inside(pr, NEAR_CRITICAL.P) && inside(tr, NEAR_CRITICAL.T))
    sheet.warn(
      'NEAR_CRITICAL',
      'The state lies near the critical point: there the density of a cubic equation may be off by 10 % and the isentropic exponent by as much. Compare with a reference equation of state.',
    );
}

/** The word for one phase: by the boiling point of a pure substance, by the critical volume of the equation in a mixture. */
function phaseWord({ source, cubic }: Worked, { P, T }: PhaseState): string {
  if (T >= source.critical.T) return P >= source.critical.P ? 'supercritical' : 'gas';
  if (source.pure) {
    const boiling = source.saturation(P)?.liquid.T;
    return P >= source.critical.P || (boiling !== undefined && T < boiling) ? 'liquid' : 'gas';
  }
  const figures = cubic && figuresOf(cubic, P, T);
  return figures && figures.root < CRITICAL_VOLUME * figures.B ? 'liquid' : 'gas';
}

/** Lines and outputs of one phase. */
function onePhase(sheet: SheetBuilder, worked: Worked, state: PhaseState, own: boolean): void {
  const { source, cubic } = worked;
  const phase = phaseWord(worked, state);
  sheet.say({
    symbol: '\\text{phase}',
    meaning: 'what stands at this pressure and temperature',
    value: phase,
    tex: `\\text{${phase}}`,
  });
  sheet.output('phase', phase);
  sheet.keep('M', source.M, 'M');
  sheet.keep('P_kPa', state.P / 1e3, 'P_1');
  const fromEquation = cubic && equationSteps(sheet, cubic, state.P, state.T);
  const density = sheet.step(
    {
      key: 'density',
      tex: '\\rho',
      meaning: 'density',
      value: state.rho,
      unit: 'kg/m3',
      clause: source.source,
    },
    (v) =>
      fromEquation === undefined
        ? `\\rho(${v('P_kPa')}, ${v('T')})`
        : `\\frac{${v('P_kPa')} \\cdot ${v('M')}}{${v('Z')} \\cdot 8.314463 \\cdot ${v('T')}}`,
  );
  const Z = (state.P * source.M) / (density * GAS_CONSTANT * state.T);
  const { n } = caloricSteps(sheet, state, source.source);
  const ideal = cubic && figuresOf(cubic, state.P, state.T)?.cpIdeal;
  const k = ideal === undefined ? undefined : idealRatioStep(sheet, source.M, ideal);
  if (phase === 'liquid' && cubic) liquidSteps(sheet, cubic, state);
  sheet.output('cp', state.cp / 1e3, 'kJ/(kg.K)');
  sheet.output('cv', state.cv / 1e3, 'kJ/(kg.K)');
  sheet.output('cp_over_cv', state.cp / state.cv);
  sheet.output('enthalpy', state.h / 1e3, 'kJ/kg');
  sheet.output('entropy', state.s / 1e3, 'kJ/(kg.K)');
  settle(sheet, FIGURES.M, source.M, own);
  settle(sheet, FIGURES.density, density, own);
  settle(sheet, FIGURES.Z, Z, own);
  settle(sheet, FIGURES.k, k, own);
  settle(sheet, FIGURES.n, n, own);
  settle(sheet, FIGURES.w, state.w, own);
  settle(sheet, FIGURES.mu, state.mu === undefined ? undefined : state.mu * 1e3, own);
  viscosityWarnings(sheet, worked, state, phase);
}

/** Reduced pressure above which a gas is notably more viscous than the dilute gas: common practice, no source. */
const DILUTE = 0.3;

function viscosityWarnings(
  sheet: SheetBuilder,
  { source, cubic }: Worked,
  state: PhaseState,
  phase: string,
): void {
  if (sheet.has('own_mu')) return;
  if (state.mu === undefined)
    sheet.warn(
      'NO_VISCOSITY',
      'No viscosity is known of this fluid at this temperature; give your own where one is needed.',
    );
  else if (cubic && phase !== 'liquid' && state.P > DILUTE * source.critical.P)
    sheet.warn(
      'VISCOSITY_DILUTE',
      'The viscosity is that of the dilute gas; at this pressure the true one is higher.',
      'below 0.3 of the critical pressure',
    );
}

/** Lines and outputs of a liquid and a vapour that stand together. */
function twoPhases(
  sheet: SheetBuilder,
  worked: Worked,
  state: { rho: number; x?: number; h: number; s: number },
  two: TwoPhases,
): void {
  const { liquid, vapour } = two;
  sheet.output('phase', two.twoLiquids ? 'two liquids' : 'vapour and liquid');
  if (two.twoLiquids)
    sheet.warn(
      'LIQUIDS_PART',
      'The feed parts into two liquids at this pressure and temperature; the lighter one stands here as the vapour.',
    );
  else
    sheet.warn(
      'TWO_PHASES',
      'The feed is part vapour, part liquid: size it as a two-phase flow (d.hem-nozzle), not by gas or liquid equations.',
    );
  const line = (key: string, tex: string, meaning: string, value: number, unit: string, how: string) => {
    sheet.step({ key, tex, meaning, value, unit, clause: worked.source.source }, () => how);
    return value;
  };
  const x = line('x', 'x', 'vapour fraction by mass', state.x ?? 0, '-', '\\text{flash with } f_i^v = f_i^l');
  line('rho_l', '\\rho_l', 'density of the liquid', liquid.rho, 'kg/m3', '\\rho(P_1, T, x_i)');
  line('rho_v', '\\rho_v', 'density of the vapour', vapour.rho, 'kg/m3', '\\rho(P_1, T, y_i)');
  sheet.step(
    { key: 'density', tex: '\\rho', meaning: 'density of both together', value: state.rho, unit: 'kg/m3' },
    (v) => `\\left[\\frac{1 - ${v('x')}}{${v('rho_l')}} + \\frac{${v('x')}}{${v('rho_v')}}\\right]^{-1}`,
  );
  sheet.output('vapour_fraction', x);
  sheet.output('density', state.rho, 'kg/m3');
  sheet.output('density_liquid', liquid.rho, 'kg/m3');
  sheet.output('density_vapour', vapour.rho, 'kg/m3');
  sheet.output('M', worked.source.M, 'kg/kmol');
  sheet.output('enthalpy', state.h / 1e3, 'kJ/kg');
  sheet.output('entropy', state.s / 1e3, 'kJ/(kg.K)');
}

/** The properties worked here at P (Pa) and T (K). */
function workedProperties(sheet: SheetBuilder, worked: Worked, P: number, T: number, own: boolean): void {
  const { source, cubic } = worked;
  const outside = () =>
    sheet.refuse(
      'OUTSIDE_FORMULATION',
      'T',
      `The properties of ${source.name} do not reach ${T.toPrecision(4)} K at ${(P / 1000).toPrecision(4)} kPa${cubic ? ` (data from ${cubic.range.low.toFixed(0)} to ${cubic.range.high.toFixed(0)} K, up to 100 MPa)` : ''}; give your own figures instead.`,
    );
  warnNearCritical(sheet, worked, P, T);
  if (!cubic) {
    const state = source.atPT(P, T) ?? outside();
    return onePhase(sheet, worked, state, own);
  }
  const found = cubic.equilibrium(P, T) ?? outside();
  if (found.two) return twoPhases(sheet, worked, found.state, found.two);
  return onePhase(sheet, worked, found.state as PhaseState, own);
}

/** p.fluid-properties: state and properties at relieving pressure and temperature. */
export const FLUID_PROPERTIES: Method = {
  id: 'p.fluid-properties',
  version: 1,
  topic: 'p.fluid-properties',
  title: 'Properties of a fluid at pressure and temperature',
  editions: ['Peng–Robinson 1976 with Twu alpha function and translation of volume, 2018 parameters'],
  source:
    'Peng and Robinson (1976), Ind. Eng. Chem. Fundam. 15, 59; Twu et al. (1991); Péneloux et al. (1982); parameters of Pina-Martinez et al. (2018); water by IAPWS-IF97',
  validity:
    'Pure substances and mixtures of the library (at most 20), up to 100 MPa, vapour and one liquid. Densities of gases within about 3 %, of liquids within about 2 to 5 % (water and methanol 9 %) up to nine tenths of the critical temperature; near the critical point doubtful. Polar mixtures without interaction parameters are estimates. Liquid hydrogen is outside.',
  inputs: [
    ...FLUID_INPUTS,
    ...RELIEVING_INPUTS,
    input('T', 'temperature', 'temperature', { rangeKey: 'relievingTemperature' }),
    ...OWN_INPUTS,
  ],
  outputs: [...PROPERTY_OUTPUTS],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const P = relievingAbsolute(sheet, 'SI') * 1000;
      const T = sheet.number('T', 'K', { above: 0 }, 'T');
      const worked = readWorked(sheet);
      const own = ownGovern(sheet, worked);
      const any = OWN_INPUTS.some((o) => sheet.has(o.name));
      if (worked === undefined && !any)
        sheet.refuse(
          'INPUT_MISSING',
          'fluid',
          'The fluid is missing: name it (fluid), or give your own figures (own_Z, own_k, own_M and others).',
        );
      if (own && !any)
        sheet.refuse(
          'OWN_MISSING',
          'use',
          'Own figures shall govern, but none is given: give own_Z, own_k, own_M or others, or let the library govern.',
        );
      sheet.output('source', own ? 'own figures' : (worked?.source.source ?? ''));
      if (worked === undefined) {
        sheet.say({
          symbol: '\\text{fluid}',
          meaning: 'own figures, not worked here',
          value: 'own figures',
          tex: '\\text{own figures}',
        });
        for (const figure of Object.values(FIGURES)) settle(sheet, figure, undefined, true);
        return;
      }
      workedProperties(sheet, worked, P, T, own);
    });
  },
};
