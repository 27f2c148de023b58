/* Methods d.real-gas-nozzle and d.real-gas-size: a real gas through a frictionless nozzle, against the ideal-gas formula. */
import { type Method, type MethodOutput } from '../../catalog/types';
import { type Throat } from '../../nozzle/hem';
import { type PhaseState, type PropertySource } from '../../properties/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT, nozzleFlux } from '../a-gas/flow';
import { input, optional, output } from '../common/describe';
import { systemOf } from '../common/system';
import { AREA_OUTPUTS, FACTOR_INPUTS, PRESSURE_INPUTS } from './common';
import { FLUID_INPUTS, readFluid, readInlet } from './fluid';
import { nozzleSteps } from './hem-steps';
import { pressuresInPa, sizeBy } from './hem-nozzle';

const SHARED = {
  version: 1,
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I Annex B, isentropic nozzle by numerical integration with real-gas properties (from memory); properties as the sheet names them',
  validity:
    'One phase at the inlet, a gas or a supercritical fluid; frictionless, in equilibrium; the sheet warns where the gas condenses in the nozzle.',
};

const OUTPUTS: readonly MethodOutput[] = [
  output('inlet_density', 'density at the inlet', 'density'),
  output('inlet_temperature', 'temperature at the inlet', 'temperature'),
  output('mass_flux', 'mass flux at the throat', 'mass-flux'),
  output('throat_pressure', 'pressure at the throat', 'pressure-absolute'),
  output('throat_density', 'density at the throat', 'density'),
  output('throat_quality', 'vapour mass fraction at the throat', 'dimensionless'),
  output('choked', 'whether the flow is choked'),
  output('inlet_Z', 'compressibility factor at the inlet', 'dimensionless'),
  output('inlet_cp_over_cv', 'ratio of real specific heats at the inlet', 'dimensionless'),
  output('inlet_isentropic_exponent_n', 'isentropic exponent at the inlet, w² ρ/P', 'dimensionless'),
  output(
    'mass_flux_ideal_formula_with_Z_and_cp_cv',
    'mass flux by the ideal formula with Z and cp/cv',
    'mass-flux',
  ),
  output('mass_flux_ideal_formula_with_Z_and_n', 'mass flux by the ideal formula with Z and n', 'mass-flux'),
];

/** Difference between ideal formula and integration that calls for a word: common practice, no source. */
const IDEAL_DIFFERS = 0.05;

/** Z, cp/cv and n at the inlet, and what the ideal formula makes of them. */
function idealSteps(
  sheet: SheetBuilder,
  source: PropertySource,
  state: PhaseState,
  Pb: number,
  throat: Throat,
): void {
  const { P, T, rho } = state;
  const one = (key: string, tex: string, name: string, meaning: string, value: number, how: string) => {
    sheet.step({ key, tex, meaning, value, unit: '-', clause: source.source }, () => how);
    sheet.output(name, value);
    return value;
  };
  const Z = one(
    'Z',
    'Z',
    'inlet_Z',
    'compressibility factor at the inlet',
    (P * source.M) / (rho * GAS_CONSTANT * T),
    '\\frac{P_0 M}{\\rho_0 R T_0}',
  );
  const k = one(
    'k',
    'k',
    'inlet_cp_over_cv',
    'ratio of real specific heats at the inlet',
    state.cp / state.cv,
    '\\frac{c_p}{c_v}(P_0, T_0)',
  );
  const n = one(
    'n',
    'n',
    'inlet_isentropic_exponent_n',
    'isentropic exponent at the inlet',
    (state.w ** 2 * rho) / P,
    '\\frac{w_0^2 \\rho_0}{P_0}',
  );
  const flux = (key: string, tex: string, name: string, exponent: number) => {
    const value = nozzleFlux({ P1: P, P2: Pb, T, Z, M: source.M, k: exponent }).flux;
    sheet.step(
      {
        key,
        tex,
        meaning: `for comparison: the ideal formula with Z and ${tex.includes('k') ? 'cp/cv' : 'n'}`,
        value,
        unit: 'kg/(m2.s)',
        clause: 'API 520-1, isentropic nozzle of an ideal gas',
      },
      (v) => `G_{ideal}(${v('P0')}, ${v('T0')}, ${v('Z')}, ${v(key === 'G_k' ? 'k' : 'n')})`,
    );
    sheet.output(name, value, 'kg/(m2.s)');
    return value;
  };
  const ideal = flux('G_k', 'G_k', 'mass_flux_ideal_formula_with_Z_and_cp_cv', k);
  flux('G_n', 'G_n', 'mass_flux_ideal_formula_with_Z_and_n', n);
  const off = ideal / throat.flux - 1;
  if (Math.abs(off) > IDEAL_DIFFERS)
    sheet.warn(
      'IDEAL_DIFFERS',
      `The ideal formula with Z and real cp/cv gives ${Math.abs(off * 100).toFixed(0)} % ${off > 0 ? 'more' : 'less'} mass flux than this real gas: do not size by it here.`,
      'within 5 %',
    );
}

/** Reads a gas at the inlet, integrates and compares; gives the flux in kg/(m²·s). */
function integrateGas(sheet: SheetBuilder, P0: number, Pb: number): number {
  const source = readFluid(sheet);
  sheet.keep('P0', P0 / 1000, 'P_0');
  const inlet = readInlet(sheet, source, P0);
  const saturated = inlet.phase === 'saturated vapour' ? inlet.saturation?.vapour : undefined;
  const gas = inlet.phase === 'vapour' || inlet.phase === 'supercritical';
  const state = saturated ?? (gas ? source.atPT(P0, inlet.state.T) : undefined);
  if (!state)
    return sheet.refuse(
      'NOT_A_GAS',
      sheet.has('x0') ? 'x0' : 'T0',
      `The inlet is ${inlet.phase === 'two-phase' ? 'two-phase' : `a ${inlet.phase}`} at this pressure and temperature, not a gas: use the sheet for flashing and two-phase inlets (d.hem-nozzle, d.hem-size).`,
    );
  const throat = nozzleSteps(sheet, source, inlet, Pb);
  idealSteps(sheet, source, state, Pb, throat);
  if (throat.x !== undefined && throat.x < 1)
    sheet.warn(
      'CONDENSES',
      `The gas condenses in the nozzle: ${((1 - throat.x) * 100).toPrecision(2)} % by mass is liquid at the throat in equilibrium. In a short nozzle condensing lags, and the flux lies between this and the dry one.`,
    );
  return throat.flux;
}

/** d.real-gas-nozzle: mass flux of a real gas, against the ideal formula with Z and k or n. */
export const REAL_GAS_NOZZLE: Method = {
  ...SHARED,
  id: 'd.real-gas-nozzle',
  topic: 'd.real-gas-nozzle',
  title: 'Real-gas nozzle by direct integration: mass flux',
  inputs: [
    ...FLUID_INPUTS,
    input('P0', 'pressure at the inlet', 'pressure-absolute'),
    optional('Pb', 'back pressure (the barometric pressure when not given)', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [...OUTPUTS],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const { P0, Pb } = pressuresInPa(sheet, systemOf(inputs, ['P0']), 'Pb');
      integrateGas(sheet, P0, Pb);
    });
  },
};

/** d.real-gas-size: required effective area of a real gas by direct integration. */
export const REAL_GAS_SIZE: Method = {
  ...SHARED,
  id: 'd.real-gas-size',
  topic: 'd.real-gas-size',
  title: 'Real gas: required area by direct integration',
  inputs: [
    input('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...FLUID_INPUTS,
    ...PRESSURE_INPUTS,
    ...FACTOR_INPUTS,
  ],
  outputs: [output('P1', 'relieving pressure', 'pressure-absolute'), ...OUTPUTS, ...AREA_OUTPUTS],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'P0', 'set_pressure']);
      const { P0, Pb } = pressuresInPa(sheet, system);
      sizeBy(sheet, system, integrateGas(sheet, P0, Pb), 0.975);
    });
  },
};
