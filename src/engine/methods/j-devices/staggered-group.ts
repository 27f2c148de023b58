/* Method j.staggered: several devices with staggered sets, who opens when, what each passes, and at which pressure a load is passed. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { absolutePressure, barometer } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { CODE_BASES, type CodeBasis, limitTerms, maap, maxSetPressure } from '../h-limits';
import { type FluxAt, pressureFor } from './staggered';
import { FULL_CLAUSE, type Named, readDevices, readFluid, stateSteps } from './staggered-steps';

/** How far above the highest full opening a pressure for the load is sought. */
const SEARCH = 3;

/** The pressure that a load drives the group to. */
function loadStep(
  sheet: SheetBuilder,
  devices: readonly Named[],
  flux: FluxAt,
  system: System,
): number | undefined {
  if (!sheet.has('W')) return undefined;
  const load = sheet.number('W', 'kg/s', { above: 0 }, 'W_{req}');
  const found = pressureFor(devices, load, flux, SEARCH * Math.max(...devices.map((one) => one.full)));
  if (found === undefined) {
    sheet.warn(
      'LOAD_NOT_PASSED',
      'Even at three times the highest full opening the devices do not pass the load.',
    );
    return undefined;
  }
  const { Pg } = SYSTEM_UNITS[system];
  sheet.step(
    {
      key: 'pW',
      tex: 'p_W',
      meaning: 'lowest pressure at which all together pass the load',
      value: found,
      unit: 'Pa_g',
      clause: FULL_CLAUSE,
    },
    (v) => `\\min\\{p : \\textstyle\\sum W_i(p) \\ge ${v('W')}\\}`,
  );
  sheet.output('pressure_for_load', fromSI(found, Pg).value, Pg);
  return found;
}

/** The equation of an accumulated pressure: its percentage, and its floor where the code has one. */
function limitTex(p: string, { factor, floor }: { factor: number; floor: number }): string {
  return floor === 0 ? `${factor} \\cdot ${p}` : `\\max(${factor} \\cdot ${p},\\ ${p} + ${floor})`;
}

/** Sets against the MAWP, and the pressure for the load against the accumulation allowed. */
function limitSteps(
  sheet: SheetBuilder,
  devices: readonly Named[],
  needed: number | undefined,
  system: System,
): void {
  if (!sheet.has('MAWP')) return;
  const { Pg } = SYSTEM_UNITS[system];
  const basis = sheet.word<CodeBasis>('code_basis', CODE_BASES, 'asme-viii-1');
  const mawp = sheet.number('MAWP', Pg, { above: 0 }, 'p_{MAWP}');
  const sets = devices.map((one) => fromSI(one.set, Pg).value).toSorted((a, b) => a - b);
  const allowed = sets.every(
    (set, i) => set <= maxSetPressure(mawp, i === 0 ? 'first' : 'additional', basis) * (1 + 1e-9),
  );
  sheet.output('sets_allowed', allowed);
  if (!allowed)
    sheet.warn(
      'SET_ABOVE_LIMIT',
      'The lowest set must not be above the MAWP, further ones not above 105 % of it.',
    );
  const limitClass = devices.length > 1 ? 'multiple' : 'single';
  const options = { basis, units: system };
  const limit = maap(mawp, limitClass, options);
  sheet.step(
    {
      key: 'maap',
      tex: 'p_{maap}',
      meaning: 'maximum allowable accumulated pressure',
      value: limit,
      unit: Pg,
      clause: 'ASME VIII-1 UG-125(c); PED Annex I 7.3',
      memory: true,
    },
    (v) => limitTex(v('MAWP'), limitTerms(limitClass, options)),
  );
  sheet.output('max_accumulated_pressure', limit, Pg);
  if (sheet.has('W'))
    sheet.output(
      'within_accumulation',
      needed !== undefined && fromSI(needed, Pg).value <= limit * (1 + 1e-9),
    );
}

/** j.staggered: a group of devices with staggered sets. */
export const STAGGERED: Method = {
  id: 'j.staggered',
  version: 1,
  topic: 'j.staggered',
  title: 'Several devices with staggered sets: who opens, what each passes',
  editions: ['ASME XIII:2021; EN ISO 4126-1:2013'],
  source:
    'Ideal-gas nozzle or liquid orifice with certified coefficient × actual area for each device; full capacity only from 10 % (3 psi) overpressure on, where devices are certified; limits of sets and accumulation by ASME VIII-1 UG-125, UG-134, from memory',
  validity:
    'One pressure at all inlets, one back pressure at all outlets, reclosing devices of one service. Partial lift is not claimed: the lift curve of a spring valve is not standardised. The dynamics of opening (who shuts when another opens) are not worked.',
  inputs: [
    { ...optional('tag', 'tag of the device'), each: 'device' },
    {
      ...input('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
      each: 'device',
    },
    { ...input('A_actual', 'actual flow area', 'area', { rangeKey: 'orificeArea' }), each: 'device' },
    {
      ...input('K_certified', 'certified coefficient', 'dimensionless', { rangeKey: 'kdGas' }),
      each: 'device',
    },
    optional('full_overpressure', 'overpressure of full opening (10 % when not given)', 'dimensionless', {
      rangeKey: 'overpressure',
    }),
    input('pressure', 'pressure at which the flows are asked', 'pressure-gauge'),
    optional('W', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
    optional('MAWP', 'maximum allowable working pressure', 'pressure-gauge', { rangeKey: 'mawp' }),
    optional('code_basis', 'code of the equipment (ASME VIII-1 when not given)', undefined, {
      words: [...CODE_BASES],
    }),
    ...GAS_INPUTS.map((one) => ({ ...one, required: false })),
    optional('rho', 'density of the liquid; makes the sheet one of liquid', 'density', {
      rangeKey: 'liquidDensity',
    }),
    optional('P2', 'total back pressure (the barometric pressure when not given)', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('order', 'order in which the devices open'),
    output('state', 'shut, opening or full (state_2 … of the others)'),
    output(
      'full_open_pressure',
      'pressure of full opening (full_open_pressure_2 … of the others)',
      'pressure-gauge',
    ),
    output('passed', 'what the device passes (passed_2 … of the others)', 'mass-flow'),
    output('total_passed', 'what all pass', 'mass-flow'),
    output('pressure_for_load', 'lowest pressure at which the load is passed', 'pressure-gauge'),
    output('sets_allowed', 'whether the sets keep their limits'),
    output('max_accumulated_pressure', 'maximum allowable accumulated pressure', 'pressure-gauge'),
    output('within_accumulation', 'whether the load is passed within it'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['set_pressure', 'W']);
      const devices = readDevices(sheet);
      const { P } = SYSTEM_UNITS[system];
      const atmosphere = convert({ value: barometer(sheet, system), unit: P }, 'Pa_abs');
      const back = sheet.has('P2')
        ? convert({ value: absolutePressure(sheet, 'P2', 'P_2', system), unit: P }, 'Pa_abs')
        : atmosphere;
      sheet.keep('patm', atmosphere, 'p_{atm}');
      sheet.keep('P2', back, 'P_2');
      const fluid = readFluid(sheet, atmosphere, back);
      const gauge = sheet.number('pressure', 'Pa_g', { min: 0 }, 'p');
      sheet.keep('p', gauge, 'p');
      const order = devices.toSorted((a, b) => a.set - b.set).map((one) => one.tag);
      sheet.output('order', order.join(', '));
      stateSteps(sheet, devices, gauge, fluid, system);
      limitSteps(sheet, devices, loadStep(sheet, devices, fluid.fluxAt, system), system);
    });
  },
};
