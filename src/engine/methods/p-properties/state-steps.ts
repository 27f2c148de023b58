/* The lines of a sheet that lead from pressure and temperature to the properties of one phase. */
import { type CubicFluid, figuresOf, rackettDensity } from '../../fluids';
import { type PhaseState } from '../../properties/types';
import { type SheetBuilder } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';

const EOS = 'Peng and Robinson (1976)';
const SHIFT = 'Péneloux (1982), constant translation';

/** A, B, the root and the translation: Z of the library; kept under `Z`. */
export function equationSteps(
  sheet: SheetBuilder,
  fluid: CubicFluid,
  P: number,
  T: number,
): number | undefined {
  const f = figuresOf(fluid, P, T);
  if (f === undefined) return undefined;
  const one = (key: string, tex: string, meaning: string, value: number, how: string, clause = EOS) =>
    sheet.step({ key, tex, meaning, value, unit: '-', clause }, () => how);
  one('A', 'A', 'reduced attraction, a with the Twu alpha function', f.A, '\\frac{a(T) P}{R^2 T^2}');
  one('B', 'B', 'reduced covolume', f.B, '\\frac{b P}{R T}');
  sheet.step(
    {
      key: 'Z_PR',
      tex: 'Z_{PR}',
      meaning: 'root of the equation of state',
      value: f.root,
      unit: '-',
      clause: EOS,
    },
    (v) =>
      `\\text{root of } Z^3 - (1 - ${v('B')}) Z^2 + (${v('A')} - 3 \\cdot ${v('B')}^2 - 2 \\cdot ${v('B')}) Z - (${v('A')} \\cdot ${v('B')} - ${v('B')}^2 - ${v('B')}^3)`,
  );
  one('shift', 's', 'translation of volume', f.shift, '\\frac{c P}{R T}', SHIFT);
  return sheet.step(
    { key: 'Z', meaning: 'compressibility factor', value: f.root - f.shift, unit: '-', clause: SHIFT },
    (v) => `${v('Z_PR')} - ${v('shift')}`,
  );
}

/** The ideal ratio of specific heats at T, which the gas equations of the standards take as k. */
export function idealRatioStep(sheet: SheetBuilder, M: number, cpIdeal: number): number {
  sheet.keep('cp0', cpIdeal, 'c_p^0');
  const gas = sheet.keep('R/M', GAS_CONSTANT / M, '\\frac{R}{M}');
  return sheet.step(
    {
      key: 'k0',
      tex: 'k',
      meaning: 'ideal-gas ratio of specific heats at this temperature',
      value: cpIdeal / (cpIdeal - gas),
      unit: '-',
    },
    (v) => `\\frac{${v('cp0')}}{${v('cp0')} - ${v('R/M')}}`,
  );
}

/** Real heat capacities, their ratio, the speed of sound and the isentropic exponent of a phase. */
export function caloricSteps(
  sheet: SheetBuilder,
  state: PhaseState,
  source: string,
): { ratio: number; n: number } {
  const { cp, cv, w, rho, P } = state;
  sheet.step(
    {
      key: 'cv',
      tex: 'c_v',
      meaning: 'real heat capacity at constant volume',
      value: cv / 1e3,
      unit: 'kJ/(kg.K)',
      clause: source,
    },
    () => 'c_v^0 + c_v^{res}',
  );
  sheet.step(
    {
      key: 'cp',
      tex: 'c_p',
      meaning: 'real heat capacity at constant pressure',
      value: cp / 1e3,
      unit: 'kJ/(kg.K)',
      clause: source,
    },
    () => 'c_v - \\frac{T}{M} \\frac{(\\partial P/\\partial T)_v^2}{(\\partial P/\\partial v)_T}',
  );
  const ratio = sheet.step(
    {
      key: 'ratio',
      tex: '\\frac{c_p}{c_v}',
      meaning: 'ratio of real specific heats',
      value: cp / cv,
      unit: '-',
    },
    (v) => `\\frac{${v('cp')}}{${v('cv')}}`,
  );
  sheet.keep('rho', rho, '\\rho');
  sheet.keep('P kPa', P / 1e3, 'P_1');
  sheet.step(
    { key: 'w', meaning: 'speed of sound', value: w, unit: 'm/s', clause: source },
    () => '\\sqrt{\\left(\\frac{\\partial P}{\\partial \\rho}\\right)_s}',
  );
  const n = sheet.step(
    { key: 'n', meaning: 'isentropic exponent of the real fluid', value: (w * w * rho) / P, unit: '-' },
    (v) => `\\frac{${v('w')}^2 \\cdot ${v('rho')}}{1000 \\cdot ${v('P kPa')}}`,
  );
  return { ratio, n };
}

/** Density of a liquid by the Rackett equation beside that of the equation of state, and the expansion of the liquid. */
export function liquidSteps(sheet: SheetBuilder, fluid: CubicFluid, state: PhaseState): void {
  const f = figuresOf(fluid, state.P, state.T);
  const rackett = rackettDensity(fluid.mixture, state.T);
  if (rackett !== undefined) {
    sheet.step(
      {
        key: 'rho_R',
        tex: '\\rho_{R}',
        meaning: 'for comparison: density of the saturated liquid by the Rackett equation',
        value: rackett,
        unit: 'kg/m3',
        clause: 'Spencer and Danner (1972)',
      },
      () => 'M \\left[R \\sum_i \\frac{z_i T_{c,i}}{P_{c,i}}\\; Z_{RA}^{1 + (1 - T_r)^{2/7}}\\right]^{-1}',
    );
    sheet.output('density_rackett', rackett, 'kg/m3');
  }
  if (f === undefined) return;
  sheet.step(
    { key: 'beta', tex: '\\beta', meaning: 'cubic expansion coefficient', value: f.expansion, unit: '1/K' },
    () => '\\frac{1}{v} \\left(\\frac{\\partial v}{\\partial T}\\right)_P',
  );
  sheet.step(
    {
      key: 'kappa',
      tex: '\\kappa_T',
      meaning: 'isothermal compressibility',
      value: f.compressibility * 1e9,
      unit: '1/GPa',
    },
    () => '-\\frac{1}{v} \\left(\\frac{\\partial v}{\\partial P}\\right)_T',
  );
  sheet.warn(
    'EXPANSION_APPROXIMATE',
    'The expansion coefficient and the compressibility of a liquid by a cubic equation may be off by 20 %, the expansion most often low, and with it a thermal-expansion load: take measured ones where they matter.',
  );
  sheet.output('expansion_coefficient', f.expansion, '1/K');
  sheet.output('compressibility', f.compressibility * 1e9, '1/GPa');
}
