/* Method f.blocked-outlet: what a centrifugal pump delivers at the relieving pressure, on its curve. */
import { type Method } from '../../catalog/types';
import { fromSI, toSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { gaugePressure } from '../common/pressures';
import { PUMP_CURVE_INPUTS, readPumpCurve } from './pump-curve';

/** The relieving pressure in kPa gauge: P1 as given, or set with overpressure. */
export function relievingGauge(sheet: SheetBuilder): number {
  if (sheet.has('P1')) return gaugePressure(sheet, 'P1', 'p_1', 'SI');
  const set = sheet.number('set_pressure', 'kPa_g', { above: 0 }, 'p_{set}');
  const over = sheet.number('overpressure', '-', { min: 0, max: 1 }, 'x_{over}');
  return sheet.step(
    { key: 'P1', tex: 'p_1', meaning: 'relieving pressure', value: set * (1 + over), unit: 'kPa_g' },
    (v) => `${v('set_pressure')} \\cdot (1 + ${v('overpressure')})`,
  );
}

/** The mass flow when the density is known. */
export function pumpMassFlow(sheet: SheetBuilder, flow: number): void {
  if (!sheet.has('rho')) return;
  const given = sheet.quantity('rho');
  sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const si = (flow / 3600) * toSI(given);
  const unit = given.unit === 'lb/ft3' ? 'lb/h' : 'kg/h';
  const load = fromSI(si, unit).value;
  sheet.step({ key: 'W', meaning: 'relief load', value: load, unit }, (v) => `${v('rho')} \\cdot ${v('Q')}`);
  sheet.output('relief_load', load, unit);
}

/** f.blocked-outlet: blocked outlet of a centrifugal pump. */
export const BLOCKED_OUTLET: Method = {
  id: 'f.blocked-outlet',
  version: 1,
  topic: 'f.blocked-outlet',
  title: 'Blocked outlet of a centrifugal pump',
  editions: ['API 521, 5th to 7th edition'],
  source:
    'Pump curve ΔP = ΔP₀ − c Q², or its points, at relieving pressure (approach of API Standard 521, closed outlets; no clause quoted)',
  validity:
    'Centrifugal pump with a falling curve; suction at its maximum and referred to the valve inlet; no credit for losses of the line.',
  inputs: [
    optional('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('overpressure', 'overpressure as a fraction of set', 'dimensionless', {
      rangeKey: 'overpressure',
    }),
    optional('P1', 'relieving pressure, in place of set_pressure and overpressure', 'pressure-gauge'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    input('suction_pressure', 'greatest suction pressure, referred to the valve inlet', 'pressure-gauge'),
    ...PUMP_CURVE_INPUTS,
    optional('rho', 'liquid density, for the mass flow', 'density', { rangeKey: 'liquidDensity' }),
  ],
  outputs: [
    output('relieving_pressure', 'relieving pressure', 'pressure-gauge'),
    output('deadhead_pressure', 'pressure at shut-off', 'pressure-gauge'),
    output('relief_needed', 'whether the pump passes the relieving pressure'),
    output('relief_flow', 'flow at the relieving pressure', 'volume-flow'),
    output('relief_load', 'its mass flow', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const p1 = relievingGauge(sheet);
      const suction = sheet.number('suction_pressure', 'kPa_g', {}, 'p_s');
      const curve = readPumpCurve(sheet);
      const deadhead = sheet.step(
        {
          key: 'dead',
          tex: 'p_{dead}',
          meaning: 'pressure at shut-off',
          value: suction + curve.greatest,
          unit: 'kPa_g',
        },
        (v) => `${v('suction_pressure')} + ${v('shutoff_dp')}`,
      );
      const rise = sheet.step(
        {
          key: 'rise',
          tex: '\\Delta p',
          meaning: 'pressure rise at relief',
          value: p1 - suction,
          unit: 'kPa',
        },
        (v) => `${v('P1')} - ${v('suction_pressure')}`,
      );
      const flow = curve.flowStep(rise);
      sheet.output('relieving_pressure', p1, 'kPa_g');
      sheet.output('deadhead_pressure', deadhead, 'kPa_g');
      sheet.output('relief_needed', deadhead > p1);
      sheet.output('relief_flow', flow, 'm3/h');
      pumpMassFlow(sheet, flow);
    });
  },
};
