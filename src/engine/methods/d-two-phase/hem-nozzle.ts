/* Methods d.hem-nozzle and d.hem-size: the homogeneous-equilibrium nozzle by direct integration, flux and required area. */
import { type Method, type MethodInput, type MethodOutput } from '../../catalog/types';
import { type Throat } from '../../nozzle/hem';
import { type Inlet } from '../../nozzle/inlet';
import { type PropertySource } from '../../properties/types';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import {
  AREA_OUTPUTS,
  areaSteps,
  FACTOR_INPUTS,
  FLUX_UNITS,
  OMEGA_CLAUSE,
  PRESSURE_INPUTS,
  readPressures,
} from './common';
import { defaultKd, FLUID_INPUTS, readFluid, readInlet } from './fluid';
import { omegaByVolumes, type OmegaResult } from './fluid-omega';
import { nozzleSteps } from './hem-steps';
import { inSI, warnIntegration } from './warnings';

const SHARED = {
  version: 1,
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I Annex B and C, isentropic homogeneous-equilibrium nozzle by numerical integration (from memory); properties as the sheet names them',
  validity:
    'Frictionless, homogeneous, in equilibrium: nozzle at least 100 mm long; states within the formulation of the fluid, away from its critical point where a cubic equation is used.',
};

const NOZZLE_LENGTH: MethodInput = optional('nozzle_length', 'flow length of the nozzle', 'length');

const THROAT_OUTPUTS: readonly MethodOutput[] = [
  output('inlet_density', 'density at the inlet', 'density'),
  output('inlet_temperature', 'temperature at the inlet', 'temperature'),
  output('mass_flux', 'mass flux at the throat', 'mass-flux'),
  output('throat_pressure', 'pressure at the throat', 'pressure-absolute'),
  output('throat_density', 'density at the throat', 'density'),
  output('throat_quality', 'vapour mass fraction at the throat', 'dimensionless'),
  output('choked', 'whether the flow is choked'),
  output('omega_isentropic_v9', 'omega from the volume at 90 % on the isentrope', 'dimensionless'),
  output('mass_flux_by_omega_method', 'mass flux by the omega method, for comparison', 'mass-flux'),
];

/** Difference between omega and integration that calls for a reason: common practice, no source. */
const OMEGA_DIFFERS = 0.15;

/** The omega method beside the integration, and a warning where they part. */
function omegaSteps(sheet: SheetBuilder, by: OmegaResult, throat: Throat): void {
  sheet.step(
    {
      key: 'omega',
      tex: '\\omega',
      meaning: 'for comparison: omega from the volume at 90 % on the isentrope',
      value: by.omega,
      unit: '-',
      clause: OMEGA_CLAUSE,
    },
    () =>
      by.Ps === undefined
        ? '9 \\left(\\frac{v(0.9 P_0, s_0)}{v_0} - 1\\right)'
        : `9 \\left(\\frac{v(0.9 P_s, s_s)}{v_0} - 1\\right),\\ P_s = ${texNumber(by.Ps / 1000)}\\,\\text{kPa}`,
  );
  sheet.step(
    {
      key: 'G_w',
      tex: 'G_\\omega',
      meaning: 'for comparison: mass flux by the omega method',
      value: by.flux,
      unit: 'kg/(m2.s)',
      clause: OMEGA_CLAUSE,
    },
    (v) => `G(${v('omega')})`,
  );
  sheet.output('omega_isentropic_v9', by.omega);
  sheet.output('mass_flux_by_omega_method', by.flux, 'kg/(m2.s)');
  const off = by.flux / throat.flux - 1;
  if (Math.abs(off) > OMEGA_DIFFERS)
    sheet.warn(
      'OMEGA_DIFFERS',
      `The omega method gives ${Math.abs(off * 100).toFixed(0)} % ${off > 0 ? 'more' : 'less'} mass flux than the integration: one omega does not follow this isentrope; rely on the integration.`,
      'within 15 %',
    );
}

/** Reads fluid and inlet, integrates and compares; pressures in Pa. */
function integrate(
  sheet: SheetBuilder,
  P0: number,
  Pb: number,
): { source: PropertySource; inlet: Inlet; throat: Throat } {
  const source = readFluid(sheet);
  sheet.keep('P0', P0 / 1000, 'P_0');
  const inlet = readInlet(sheet, source, P0);
  const throat = nozzleSteps(sheet, source, inlet, Pb);
  const omega = omegaByVolumes(source, inlet, Pb);
  if (omega) omegaSteps(sheet, omega, throat);
  warnIntegration(sheet, source, inlet, throat);
  return { source, inlet, throat };
}

/** Pressures of the sheet in Pa, whatever its unit system. */
export function pressuresInPa(
  sheet: SheetBuilder,
  system: System,
  back?: string,
): { P0: number; Pb: number } {
  const { P0, Pb } = readPressures(sheet, system, back);
  const unit = SYSTEM_UNITS[system].P;
  return { P0: inSI(P0, unit, 'Pa_abs'), Pb: inSI(Pb, unit, 'Pa_abs') };
}

/** The area of a load from a flux in kg/(m²·s), in the system of the sheet. */
export function sizeBy(sheet: SheetBuilder, system: System, flux: number, Kd: number): void {
  const W = sheet.number('W', SYSTEM_UNITS[system].W, { above: 0 });
  const unit = FLUX_UNITS[system].G;
  const G = inSI(flux, 'kg/(m2.s)', unit);
  if (system === 'US')
    sheet.step({ key: 'G', tex: 'G', meaning: 'mass flux in customary units', value: G, unit }, () =>
      texNumber(G),
    );
  areaSteps(sheet, system, { W, G, Kd });
}

/** d.hem-nozzle: mass flux of a frictionless nozzle on any fluid whose properties are known. */
export const HEM_NOZZLE: Method = {
  ...SHARED,
  id: 'd.hem-nozzle',
  topic: 'd.hem-nozzle',
  title: 'Homogeneous-equilibrium nozzle by direct integration: mass flux',
  inputs: [
    ...FLUID_INPUTS,
    input('P0', 'pressure at the inlet', 'pressure-absolute'),
    optional('Pb', 'back pressure (the barometric pressure when not given)', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    NOZZLE_LENGTH,
  ],
  outputs: [...THROAT_OUTPUTS],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const { P0, Pb } = pressuresInPa(sheet, systemOf(inputs, ['P0']), 'Pb');
      integrate(sheet, P0, Pb);
    });
  },
};

/** d.hem-size: required effective area by direct integration, for liquid that flashes, two phases, or vapour. */
export const HEM_SIZE: Method = {
  ...SHARED,
  id: 'd.hem-size',
  topic: 'd.hem-size',
  title: 'Two-phase or flashing inlet: required area by direct integration',
  inputs: [
    input('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...FLUID_INPUTS,
    ...PRESSURE_INPUTS,
    ...FACTOR_INPUTS,
    NOZZLE_LENGTH,
  ],
  outputs: [output('P1', 'relieving pressure', 'pressure-absolute'), ...THROAT_OUTPUTS, ...AREA_OUTPUTS],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'P0', 'set_pressure']);
      const { P0, Pb } = pressuresInPa(sheet, system);
      const { inlet, throat } = integrate(sheet, P0, Pb);
      sizeBy(sheet, system, throat.flux, defaultKd(inlet));
    });
  },
};
