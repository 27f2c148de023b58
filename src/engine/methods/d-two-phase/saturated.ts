/* Method d.omega-saturated: a saturated or two-phase inlet by the omega method, mass flux and required area. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import {
  AREA_OUTPUTS,
  areaSteps,
  FACTOR_INPUTS,
  FLUX_UNITS,
  OMEGA_CLAUSE,
  PRESSURE_INPUTS,
  readPressures,
  sayRegime,
} from './common';
import { omegaFluxAt } from './omega';
import { OMEGA_INPUTS, readOmega } from './omega-inputs';
import { RATIO_INPUT, ratioStep } from './ratio';
import { DOUBT_INPUTS, inSI, warnDoubts } from './warnings';

/** The mass flux of the regime, in the system's unit. */
function fluxStep(sheet: SheetBuilder, system: System, critical: boolean, flux: number): number {
  const units = FLUX_UNITS[system];
  sheet.keep('c', units.P, String(Math.round(units.P * 10) / 10));
  const info = {
    key: 'G',
    meaning: 'mass flux',
    value: inSI(flux, 'kg/(m2.s)', units.G),
    unit: units.G,
    clause: OMEGA_CLAUSE,
  };
  const G = critical
    ? sheet.step(
        info,
        (v) => `${v('eta_c')} \\sqrt{\\frac{${v('c')} \\cdot ${v('P0')}}{${v('v0')} \\cdot ${v('omega')}}}`,
      )
    : sheet.step(
        info,
        (v) =>
          `\\frac{\\sqrt{-2\\left[${v('omega')} \\ln ${v('eta_a')} + (${v('omega')} - 1)(1 - ${v('eta_a')})\\right]}}{${v('omega')}\\left(\\frac{1}{${v('eta_a')}} - 1\\right) + 1} \\sqrt{\\frac{${v('c')} \\cdot ${v('P0')}}{${v('v0')}}}`,
      );
  sheet.output('mass_flux', G, units.G);
  return G;
}

/** d.omega-saturated: required effective area of a saturated or two-phase inlet. */
export const OMEGA_SATURATED: Method = {
  id: 'd.omega-saturated',
  version: 1,
  topic: 'd.omega-saturated',
  title: 'Two-phase or flashing inlet: required area by the omega method',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I Annex C (Annex D of the 7th edition), after Leung 1986 and 1995; equations from memory; delayed boiling after Diener and Schmidt 2004 and ISO 4126-10, from memory',
  validity:
    'Homogeneous flow in equilibrium, frictionless; saturated or two-phase inlet below 0.9 of the critical temperature and 0.5 of the critical pressure; boiling range up to 83 K; nozzle at least 100 mm long.',
  inputs: [
    input('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...PRESSURE_INPUTS,
    ...OMEGA_INPUTS,
    RATIO_INPUT,
    ...FACTOR_INPUTS,
    ...DOUBT_INPUTS,
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('v0', 'specific volume of the mixture at the inlet', 'specific-volume'),
    output('omega', 'omega parameter', 'dimensionless'),
    output('critical_pressure_ratio', 'critical pressure over inlet pressure', 'dimensionless'),
    output('critical_pressure', 'critical pressure', 'pressure-absolute'),
    output('regime', 'critical or subcritical'),
    output('mass_flux', 'mass flux', 'mass-flux'),
    ...AREA_OUTPUTS,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'P0', 'set_pressure']);
      const u = SYSTEM_UNITS[system];
      const W = sheet.number('W', u.W, { above: 0 });
      const { P0, Pb } = readPressures(sheet, system);
      const [pa, back] = [inSI(P0, u.P, 'Pa_abs'), inSI(Pb, u.P, 'Pa_abs')];
      const { omega, v0 } = readOmega(sheet, system, pa);
      const ratio = ratioStep(sheet, omega);
      sheet.output('critical_pressure_ratio', ratio);
      const Pc = sheet.step(
        {
          key: 'Pcf',
          tex: 'P_c',
          meaning: 'critical pressure',
          value: ratio * P0,
          unit: u.P,
          clause: OMEGA_CLAUSE,
        },
        (v) => `${v('eta_c')} \\cdot ${v('P0')}`,
      );
      sheet.output('critical_pressure', Pc, u.P);
      const { flux, critical } = omegaFluxAt(omega, pa, inSI(v0, FLUX_UNITS[system].v, 'm3/kg'), back, ratio);
      sayRegime(sheet, critical);
      if (!critical)
        sheet.step(
          {
            key: 'eta_a',
            tex: '\\eta_a',
            meaning: 'back pressure over inlet pressure',
            value: Pb / P0,
            unit: '-',
          },
          (v) => `\\frac{${v('back_pressure')}}{${v('P0')}}`,
        );
      const G = fluxStep(sheet, system, critical, flux);
      const T0 = sheet.has('T0') ? sheet.number('T0', 'K', { above: 0 }, 'T_0') : undefined;
      warnDoubts(sheet, { P0: pa, T0 });
      areaSteps(sheet, system, { W, G, Kd: 0.85 });
    });
  },
};
