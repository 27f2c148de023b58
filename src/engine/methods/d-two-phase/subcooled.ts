/* Method d.omega-subcooled: a liquid that is subcooled at the inlet, by the omega method, mass flux and required area. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absolutePressure } from '../common/pressures';
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
import { subcooledFlux, transitionRatio } from './omega';
import { omegaSubcooledFromProperties } from './omega-forms';
import { readFlashInlet } from './omega-inlet';
import { fluxStep, regionSteps } from './subcooled-steps';
import { DOUBT_INPUTS, inSI, warnDoubts } from './warnings';

const OMEGA_S = {
  key: 'omega_s',
  tex: '\\omega_s',
  meaning: 'omega parameter at saturation',
  unit: '-',
  clause: OMEGA_CLAUSE,
};

/** ω_s as given, from the density at 90 % of the saturation pressure, or from properties at saturation. */
function readOmegaS(sheet: SheetBuilder, system: System, rho0: number, Ps: number): number {
  if (sheet.has('omega_s')) return sheet.number('omega_s', '-', { above: 0 }, '\\omega_s');
  if (sheet.has('rho9')) {
    const rho9 = sheet.number(
      'rho9',
      FLUX_UNITS[system].rho,
      { above: 0, max: rho0 * (1 - 1e-9) },
      '\\rho_9',
    );
    return sheet.step(
      { ...OMEGA_S, value: 9 * (rho0 / rho9 - 1) },
      (v) => `9 \\left(\\frac{${v('rho0')}}{${v('rho9')}} - 1\\right)`,
    );
  }
  if (!sheet.has('latent_heat'))
    sheet.refuse(
      'INPUT_MISSING',
      'omega_s',
      'Omega at saturation (omega_s) is missing, or the density at 90 % of the saturation pressure (rho9), or cp, T0, latent_heat, v_vapour and v_liquid at saturation.',
    );
  const inlet = readFlashInlet(sheet, inSI(Ps, SYSTEM_UNITS[system].P, 'Pa_abs'), false);
  sheet.keep('Ps SI', inlet.P0, 'P_{s,Pa}');
  return sheet.step(
    { ...OMEGA_S, value: omegaSubcooledFromProperties(inlet), memory: true },
    (v) =>
      `\\frac{${v('cp')} \\cdot ${v('T0')} \\cdot ${v('Ps SI')}}{${v('v_liquid')}} \\left(\\frac{${v('v_vapour')} - ${v('v_liquid')}}{${v('latent_heat')}}\\right)^2`,
  );
}

function saturationPressure(sheet: SheetBuilder, system: System, P0: number): number {
  const Ps = absolutePressure(sheet, 'Ps', 'P_s', system);
  if (Ps > P0)
    sheet.refuse(
      'NOT_SUBCOOLED',
      'Ps',
      'The saturation pressure at the inlet temperature is above the inlet pressure: the liquid boils already. Use the sheet for a saturated or two-phase inlet (d.omega-saturated).',
    );
  return Ps;
}

/** The load as mass flow: as given, or from a volume flow at the inlet density. */
function loadStep(sheet: SheetBuilder, system: System, rho0: number): number {
  const u = SYSTEM_UNITS[system];
  if (sheet.has('W')) return sheet.number('W', u.W, { above: 0 });
  const Q = sheet.number('Q', u.Q, { above: 0 });
  sheet.keep('c_q', FLUX_UNITS[system].volume, texNumber(FLUX_UNITS[system].volume));
  return sheet.step(
    {
      key: 'W',
      meaning: 'required relief load as mass flow',
      value: FLUX_UNITS[system].volume * Q * rho0,
      unit: u.W,
    },
    (v) => `${v('c_q')} \\cdot ${v('Q')} \\cdot ${v('rho0')}`,
  );
}

/** d.omega-subcooled: required effective area of a liquid that is subcooled, or just saturated, at the inlet. */
export const OMEGA_SUBCOOLED: Method = {
  id: 'd.omega-subcooled',
  version: 1,
  topic: 'd.omega-subcooled',
  title: 'Subcooled flashing liquid: required area by the omega method',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'API Standard 520 Part I Annex C (Annex D of the 7th edition), initially subcooled liquid, after Leung and Grolmes 1988; equations from memory',
  validity:
    'A liquid without gas or vapour at the inlet, below 0.9 of the critical temperature and 0.5 of the critical pressure; boiling range up to 83 K; homogeneous equilibrium, nozzle at least 100 mm long.',
  inputs: [
    optional('Q', 'required relief load as volume flow at the inlet (or W)', 'volume-flow'),
    optional('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    ...PRESSURE_INPUTS,
    input('rho0', 'density of the liquid at the inlet', 'density', { rangeKey: 'liquidDensity' }),
    input(
      'Ps',
      'saturation pressure at the inlet temperature (bubble pressure of a mixture)',
      'pressure-absolute',
    ),
    optional('omega_s', 'omega parameter at saturation', 'dimensionless', { rangeKey: 'omega' }),
    optional('rho9', 'density at 90 % of the saturation pressure, on the isentrope', 'density'),
    optional('v_vapour', 'specific volume of the vapour at saturation', 'specific-volume'),
    optional('v_liquid', 'specific volume of the liquid at saturation', 'specific-volume'),
    optional('cp', 'heat capacity of the liquid', 'heat-capacity'),
    optional('T0', 'temperature at the inlet', 'temperature'),
    optional('latent_heat', 'latent heat at saturation', 'specific-energy'),
    ...FACTOR_INPUTS,
    ...DOUBT_INPUTS,
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('omega_s', 'omega parameter at saturation', 'dimensionless'),
    output(
      'transition_saturation_pressure_ratio',
      'saturation over inlet pressure between the regions',
      'dimensionless',
    ),
    output('region', 'low or high subcooling'),
    output('critical_pressure', 'critical pressure', 'pressure-absolute'),
    output('regime', 'critical or subcritical'),
    output('mass_flux', 'mass flux', 'mass-flux'),
    ...AREA_OUTPUTS,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['W', 'Q', 'P0', 'set_pressure']);
      const u = SYSTEM_UNITS[system];
      const { P0, Pb } = readPressures(sheet, system);
      const rho0 = sheet.number('rho0', FLUX_UNITS[system].rho, { above: 0 }, '\\rho_0');
      const W = loadStep(sheet, system, rho0);
      const Ps = saturationPressure(sheet, system, P0);
      const omegaS = readOmegaS(sheet, system, rho0, Ps);
      sheet.output('omega_s', omegaS);
      const transition = sheet.step(
        {
          key: 'eta_st',
          tex: '\\eta_{st}',
          meaning: 'saturation over inlet pressure at the transition',
          value: transitionRatio(omegaS),
          unit: '-',
          clause: OMEGA_CLAUSE,
        },
        (v) => `\\frac{2 \\cdot ${v('omega_s')}}{1 + 2 \\cdot ${v('omega_s')}}`,
      );
      sheet.output('transition_saturation_pressure_ratio', transition);
      const [pa, back, sat] = [P0, Pb, Ps].map((p) => inSI(p, u.P, 'Pa_abs')) as [number, number, number];
      const rho = inSI(rho0, FLUX_UNITS[system].rho, 'kg/m3');
      const flow = subcooledFlux({ P0: pa, rho0: rho, Ps: sat, omegaS }, back);
      const one = { system, P0, Pb, Ps, flow };
      regionSteps(sheet, one);
      sayRegime(sheet, flow.critical);
      const G = fluxStep(sheet, one);
      sheet.output('mass_flux', G, FLUX_UNITS[system].G);
      const T0 = sheet.has('T0') ? sheet.number('T0', 'K', { above: 0 }, 'T_0') : undefined;
      warnDoubts(sheet, { P0: pa, T0 });
      areaSteps(sheet, system, { W, G, Kd: 0.65 });
    });
  },
};
