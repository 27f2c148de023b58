/* Method f.reaction-tempered: vent of a runaway that its own boiling holds (vapour-pressure system), by Leung's equation. */
import { type Method } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { equilibriumRate, meanHeatRelease, temperedFlow, type TemperedSystem } from './reaction-flow';

const CLAUSE = 'Leung, AIChE Journal 32 (1986) 1622';

/** The thermal inertia of a test above which its rates are no longer close to those of the plant (practice). */
export const PHI_LIMIT = 1.15;

/** A rate of temperature rise, raised by the thermal inertia of the test. K/s. */
function rateStep(
  sheet: SheetBuilder,
  name: string,
  key: string,
  tex: string,
  words: string,
  phi: number,
): number {
  const measured = sheet.number(name, 'K/s', { above: 0 }, tex);
  return sheet.step(
    {
      key,
      tex: `${tex}^*`,
      meaning: `${words}, raised by the thermal inertia of the test`,
      value: measured * phi,
      unit: 'K/s',
    },
    (v) => `${v('phi')} \\cdot ${v(name)}`,
  );
}

function phiOf(sheet: SheetBuilder): number {
  const phi = sheet.number('phi', '-', { min: 1, max: 10, fallback: 1 }, '\\varphi');
  if (phi > PHI_LIMIT)
    sheet.warn(
      'PHI_HIGH',
      'The thermal inertia of the test is above 1.15: multiplying the rates is a first approximation only; repeat the test at low inertia.',
      'up to 1.15',
    );
  return phi;
}

function readSystem(sheet: SheetBuilder): TemperedSystem {
  const mass = sheet.number('mass', 'kg', { above: 0 }, 'm_0');
  const volume = sheet.number('volume', 'm3', { above: 0 }, 'V');
  const cp = sheet.number('cp', 'J/(kg.K)', { above: 0 }, 'c');
  const latent = sheet.number('latent_heat', 'J/kg', { above: 0 }, 'h_{fg}');
  const vf = sheet.number('v_liquid', 'm3/kg', { above: 0 }, 'v_f');
  const vg = sheet.number('v_vapour', 'm3/kg', { above: 0 }, 'v_g');
  if (vg <= vf)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'v_vapour',
      'The specific volume of the vapour must be above that of the liquid.',
    );
  if (mass * vf > volume * 1.01)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'mass',
      'The liquid does not fit into the vessel: mass times its specific volume is above the volume.',
    );
  const phi = phiOf(sheet);
  const a = rateStep(
    sheet,
    'rate_set',
    'rs',
    '\\dot T_s',
    'rate of temperature rise at the set pressure',
    phi,
  );
  const b = rateStep(
    sheet,
    'rate_max',
    'rm',
    '\\dot T_m',
    'rate of temperature rise at the greatest pressure',
    phi,
  );
  const dT = sheet.number('overtemperature', 'dK', { min: 0 }, '\\Delta T');
  const q = sheet.step(
    {
      key: 'q',
      meaning: 'mean heat release per mass',
      value: meanHeatRelease(cp, a, b),
      unit: 'W/kg',
      clause: CLAUSE,
    },
    (v) => `\\tfrac{1}{2} \\cdot ${v('cp')} (${v('rs')} + ${v('rm')})`,
  );
  const vfg = sheet.step(
    { key: 'vfg', tex: 'v_{fg}', meaning: 'volume of evaporation', value: vg - vf, unit: 'm3/kg' },
    (v) => `${v('v_vapour')} - ${v('v_liquid')}`,
  );
  return { mass, volume, q, latent, vfg, cp, dT };
}

/** The mass flux: as given, or by the equilibrium rate model. */
function fluxStep(sheet: SheetBuilder, s: TemperedSystem): number {
  if (sheet.has('mass_flux')) return sheet.number('mass_flux', 'kg/(m2.s)', { above: 0 }, 'G');
  const T = sheet.number('T', 'K', { above: 0 }, 'T_s');
  const F = sheet.number('flow_factor', '-', { above: 0, max: 1, fallback: 0.9 }, 'F');
  sheet.warn(
    'FLUX_BY_RATE_MODEL',
    'The mass flux is by the equilibrium rate model for a saturated liquid; a nozzle sheet of the two-phase mixture serves better.',
  );
  return sheet.step(
    {
      key: 'mass_flux',
      tex: 'G',
      meaning: 'mass flux of the vent',
      value: equilibriumRate(s.latent, s.vfg, s.cp, T, F),
      unit: 'kg/(m2.s)',
      clause: 'equilibrium rate model',
    },
    (v) =>
      `${v('flow_factor')} \\cdot \\frac{${v('latent_heat')}}{${v('vfg')}} \\sqrt{\\frac{1}{${v('cp')} \\cdot ${v('T')}}}`,
  );
}

/** f.reaction-tempered: two-phase load and vent area of a tempered runaway. */
export const REACTION_TEMPERED: Method = {
  id: 'f.reaction-tempered',
  version: 1,
  topic: 'f.reaction-tempered',
  title: 'Tempered runaway reaction: two-phase load and vent area',
  editions: ['Leung 1986, long form'],
  source:
    'J. C. Leung, “Simplified Vent Sizing Equations for Emergency Relief Requirements in Reactors and Storage Vessels”, AIChE Journal 32 (1986) 1622; also HSE Contract Research Report 136/1998, tempered systems (equations from memory)',
  validity:
    'Vapour-pressure (tempered) system without permanent gas, shown by a test; homogeneous two-phase flow from the vessel, turbulent; heat release nearly constant over the overpressure; constant properties; overpressure up to some 30 % of the absolute set pressure. Calorimetry at low thermal inertia of the worst credible charge.',
  inputs: [
    input('mass', 'charge in the vessel', 'mass', { rangeKey: 'inventory' }),
    input('volume', 'volume of the vessel', 'volume', { rangeKey: 'volume' }),
    input('rate_set', 'rate of temperature rise at the set pressure, by calorimetry', 'temperature-rate'),
    input(
      'rate_max',
      'rate of temperature rise at the greatest pressure, by calorimetry',
      'temperature-rate',
    ),
    optional('phi', 'thermal inertia of the test (1 when not given)', 'dimensionless'),
    input(
      'overtemperature',
      'rise of the boiling point from set to greatest pressure',
      'temperature-difference',
      { rangeKey: 'temperatureRise' },
    ),
    input('cp', 'heat capacity of the liquid', 'heat-capacity', { rangeKey: 'cpLiquid' }),
    input('latent_heat', 'latent heat at the set pressure', 'specific-energy', { rangeKey: 'latentHeat' }),
    input('v_liquid', 'specific volume of the liquid', 'specific-volume', { rangeKey: 'specificVolume' }),
    input('v_vapour', 'specific volume of the vapour', 'specific-volume', { rangeKey: 'specificVolume' }),
    optional('mass_flux', 'mass flux of the vent, from a nozzle sheet', 'mass-flux'),
    optional('T', 'boiling temperature at the set pressure, for the mass flux', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
    optional('flow_factor', 'factor on the ideal mass flux (0.9 when not given)', 'dimensionless'),
  ],
  outputs: [
    output('heat_release', 'heat release of the whole charge', 'power'),
    output('mass_flux', 'mass flux of the vent', 'mass-flux'),
    output('relief_load', 'two-phase load', 'mass-flow'),
    output('A_required', 'area of the vent at that mass flux', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const s = readSystem(sheet);
      const W = sheet.step(
        { key: 'W', meaning: 'two-phase load', value: temperedFlow(s), unit: 'kg/s', clause: CLAUSE },
        (v) =>
          `\\frac{${v('mass')} \\cdot ${v('q')}}{\\left[\\sqrt{\\frac{${v('volume')} \\cdot ${v('latent_heat')}}{${v('mass')} \\cdot ${v('vfg')}}} + \\sqrt{${v('cp')} \\cdot ${v('overtemperature')}}\\right]^2}`,
      );
      const unit = sheet.quantity('mass').unit === 'lb' ? 'lb/h' : 'kg/h';
      sheet.output('heat_release', (s.mass * s.q) / 1000, 'kW');
      sheet.output('relief_load', fromSI(W, unit).value, unit);
      if (!sheet.has('mass_flux') && !sheet.has('T')) return;
      const G = fluxStep(sheet, s);
      const A = sheet.step(
        { key: 'A', meaning: 'area of the vent', value: (W / G) * 1e6, unit: 'mm2' },
        (v) => `10^6 \\cdot \\frac{${v('W')}}{${v('mass_flux')}}`,
      );
      sheet.output('mass_flux', G, 'kg/(m2.s)');
      sheet.output('A_required', A, 'mm2');
    });
  },
};
