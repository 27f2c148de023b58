/* Method f.blocked-outlet: what a centrifugal pump delivers at the relieving pressure, on its curve. */
import { type Method } from '../../catalog/types';
import { fromSI, toSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { gaugePressure } from '../common/pressures';

/** A pump curve ΔP = ΔP₀ − c Q² in kPa and m³/h: the flow at a pressure rise, 0 at or above shut-off. */
export function pumpFlow(shutoff: number, coefficient: number, rise: number): number {
  return rise >= shutoff ? 0 : Math.sqrt((shutoff - rise) / coefficient);
}

/** The relieving pressure in kPa gauge: P1 as given, or set with overpressure. */
function relieving(sheet: SheetBuilder): number {
  if (sheet.has('P1')) return gaugePressure(sheet, 'P1', 'p_1', 'SI');
  const set = sheet.number('set_pressure', 'kPa_g', { above: 0 }, 'p_{set}');
  const over = sheet.number('overpressure', '-', { min: 0, max: 1 }, 'x_{over}');
  return sheet.step(
    { key: 'P1', tex: 'p_1', meaning: 'relieving pressure', value: set * (1 + over), unit: 'kPa_g' },
    (v) => `${v('set_pressure')} \\cdot (1 + ${v('overpressure')})`,
  );
}

/** The mass flow when the density is known. */
function massFlow(sheet: SheetBuilder, flow: number): void {
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
    'Pump curve ΔP = ΔP₀ − c Q² at relieving pressure (approach of API Standard 521, closed outlets; no clause quoted)',
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
    input('shutoff_dp', 'pressure rise at shut-off', 'pressure-difference', { rangeKey: 'pumpShutoff' }),
    input('curve_coefficient', 'coefficient c of the curve', 'pump-curve'),
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
      const p1 = relieving(sheet);
      const suction = sheet.number('suction_pressure', 'kPa_g', {}, 'p_s');
      const shutoff = sheet.number('shutoff_dp', 'kPa', { above: 0 }, '\\Delta p_0');
      const c = sheet.number('curve_coefficient', 'kPa/(m3/h)^2', { above: 0 }, 'c');
      const deadhead = sheet.step(
        {
          key: 'dead',
          tex: 'p_{dead}',
          meaning: 'pressure at shut-off',
          value: suction + shutoff,
          unit: 'kPa_g',
        },
        (v) => `${v('suction_pressure')} + ${v('shutoff_dp')}`,
      );
      const flow = sheet.step(
        {
          key: 'Q',
          meaning: 'flow at the relieving pressure',
          value: pumpFlow(shutoff, c, p1 - suction),
          unit: 'm3/h',
        },
        (v) => `\\sqrt{\\frac{\\max(0,\\ ${v('dead')} - ${v('P1')})}{${v('curve_coefficient')}}}`,
      );
      sheet.output('relieving_pressure', p1, 'kPa_g');
      sheet.output('deadhead_pressure', deadhead, 'kPa_g');
      sheet.output('relief_needed', deadhead > p1);
      sheet.output('relief_flow', flow, 'm3/h');
      massFlow(sheet, flow);
    });
  },
};
