/* Method c.liquid: required effective area for liquid, capacity-certified valves, with the viscosity procedure. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { optional, output, RELIEVING_INPUTS } from '../common/describe';
import { letterStep } from '../common/letter-step';
import { gaugePressure } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { chooseLetter } from '../i-letters/letters';
import { KV_FORMULAS, liquidArea, type LiquidFlow } from './flow';
import { readFlow } from './read-flow';
import { formulaFor, readViscosity, viscosityOutputs } from './viscosity-steps';

const CLAUSE = 'API 520-1, sizing for liquid relief, valves with capacity certification';

/** The relieving pressure, gauge: P1 as given, or set pressure with overpressure. Gives the output `p1`. */
function relievingGauge(sheet: SheetBuilder, system: System): number {
  const { Pg } = SYSTEM_UNITS[system];
  if (sheet.has('P1')) {
    const given = gaugePressure(sheet, 'P1', 'p_1', system);
    sheet.output('p1', given, Pg);
    return sheet.keep('p1', given, 'p_1');
  }
  const set = sheet.number('set_pressure', Pg, { above: 0 }, 'p_{set}');
  const over = sheet.number('overpressure', '-', { min: 0, max: 1 }, 'x_{over}');
  const p1 = sheet.step(
    { key: 'p1', tex: 'p_1', meaning: 'relieving pressure, gauge', value: set * (1 + over), unit: Pg },
    (v) => `${v('set_pressure')} \\cdot (1 + ${v('overpressure')})`,
  );
  sheet.output('p1', p1, Pg);
  return p1;
}

/** The total back pressure, gauge: `back_pressure` or `P2`; atmosphere when neither is given. */
function backGauge(sheet: SheetBuilder, system: System): number {
  const name = sheet.has('back_pressure') ? 'back_pressure' : 'P2';
  const value = sheet.has(name) ? gaugePressure(sheet, name, 'p_2', system) : 0;
  return sheet.keep('p2', value, 'p_2');
}

function readLiquid(sheet: SheetBuilder, system: System): LiquidFlow {
  const { Q, G } = readFlow(sheet, system);
  const p1 = relievingGauge(sheet, system);
  const p2 = backGauge(sheet, system);
  if (p2 >= p1) {
    const show = (p: number) =>
      `${texNumber(p).replace(/\\,/g, '\u2009')} ${system === 'SI' ? 'kPag' : 'psig'}`;
    sheet.refuse(
      'NO_FLOW',
      'back_pressure',
      `Relieving pressure ${show(p1)} is not above the back pressure ${show(p2)}: nothing can flow.`,
    );
  }
  const factor = (name: string, tex: string, fallback: number) =>
    sheet.number(name, '-', { above: 0, max: 1, fallback }, tex);
  return {
    Q,
    G,
    dp: p1 - p2,
    Kd: factor('Kd', 'K_d', 0.65),
    Kw: factor('Kw', 'K_w', 1),
    Kc: factor('Kc', 'K_c', 1),
  };
}

function bareStep(sheet: SheetBuilder, flow: LiquidFlow, system: System): number {
  const u = SYSTEM_UNITS[system];
  const area = sheet.step(
    {
      key: 'A_R',
      meaning: 'required effective area without viscosity correction',
      value: liquidArea(flow, system),
      unit: u.A,
      clause: CLAUSE,
      memory: system === 'US',
    },
    (v) => {
      const factors = `${v('Kd')} \\cdot ${v('Kw')} \\cdot ${v('Kc')}`;
      const front =
        system === 'SI'
          ? `\\frac{11.78 \\cdot ${v('Q')}}{${factors}}`
          : `\\frac{${v('Q')}}{38 \\cdot ${factors}}`;
      return `${front} \\sqrt{\\frac{${v('G')}}{${v('p1')} - ${v('p2')}}}`;
    },
  );
  sheet.output('A_without_viscosity', area, u.A);
  return area;
}

/** c.liquid: required effective area for liquid, capacity-certified valves. */
export const LIQUID: Method = {
  id: 'c.liquid',
  version: 1,
  topic: 'c.liquid',
  title: 'Liquid: required effective area, certified valves',
  editions: ['API 520-1, 10th edition', 'API 520-1, 7th to 9th edition'],
  source:
    'API Standard 520 Part I, liquid equation for valves with capacity certification; Re and both Kv formulas read in the open library CalebBell/fluids, US 38 form from memory',
  validity:
    'Liquid that does not flash; turbulent nozzle flow, with Kv for viscous liquids; the 10th edition Kv for Re above 80.',
  inputs: [
    optional('Q', 'required volume flow at the inlet (or give W and rho)', 'volume-flow'),
    optional('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    optional('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
    optional('G', 'relative density to water (or give rho)', 'dimensionless'),
    ...RELIEVING_INPUTS,
    optional('back_pressure', 'total back pressure, gauge', 'pressure-gauge'),
    optional('P2', 'total back pressure, in place of back_pressure', 'pressure-absolute'),
    optional('Kd', 'effective coefficient of discharge (0.65 when not given)', 'dimensionless', {
      rangeKey: 'kdLiquid',
    }),
    optional('Kw', 'back-pressure factor of a balanced valve (1 when not given)', 'dimensionless', {
      rangeKey: 'kw',
    }),
    optional('Kc', 'combination factor with a rupture disk (1 when not given)', 'dimensionless', {
      rangeKey: 'kc',
    }),
    optional('mu', 'dynamic viscosity', 'viscosity', { rangeKey: 'viscosityLiquid' }),
    optional('viscosity', 'viscosity in Saybolt Universal seconds', 'saybolt-viscosity'),
    optional('Kv_formula', 'which viscosity formula', undefined, { words: [...KV_FORMULAS] }),
  ],
  outputs: [
    output('Q', 'volume flow, when W and rho were given', 'volume-flow'),
    output('p1', 'relieving pressure, gauge', 'pressure-gauge'),
    output('A_without_viscosity', 'required area before the viscosity correction', 'area'),
    output('first_letter', 'letter for that area'),
    output('Re', 'Reynolds number at the selected letter', 'dimensionless'),
    output('Kv', 'viscosity factor of the formula used', 'dimensionless'),
    output('Kv_7th_to_9th_ed', 'viscosity factor, 7th to 9th editions', 'dimensionless'),
    output('A_required_7th_to_9th_ed', 'required area, 7th to 9th editions', 'area'),
    output('Kv_10th_ed', 'viscosity factor, 10th edition', 'dimensionless'),
    output('A_required_10th_ed', 'required area, 10th edition', 'area'),
    output('A_required', 'required effective area', 'area'),
    output('orifice_letter', 'smallest sufficient letter'),
    output('orifice_effective_area', 'its effective area', 'area'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['Q', 'W', 'set_pressure']);
      const formula = formulaFor(sheet, edition);
      const flow = readLiquid(sheet, system);
      const viscosity = readViscosity(sheet);
      const bare = bareStep(sheet, flow, system);
      const first = chooseLetter(bare, system);
      if (first !== undefined) sheet.output('first_letter', first.letter);
      const area = viscosity ? viscosityOutputs(sheet, bare, flow, viscosity, formula, system) : bare;
      sheet.output('A_required', area, SYSTEM_UNITS[system].A);
      letterStep(sheet, area, system);
    });
  },
};
