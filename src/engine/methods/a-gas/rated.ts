/* Method a.rated-capacity: what a valve passes by its actual area and certified coefficient. */
import { type Method } from '../../catalog/types';
import { convert, fromSI, unitLabel } from '../../quantity';
import { workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { absolutePressure, barometer, relievingAbsolute } from '../common/pressures';
import { systemOf, SYSTEM_UNITS } from '../common/system';
import { GAS_CONSTANT, nozzleFlux } from './flow';

/** Rated gas capacity in kg/s: K · A · G, with A the actual area in m² and K the certified (derated) coefficient. */
export function ratedCapacity(flux: number, area: number, K: number): number {
  return K * area * flux;
}

/** a.rated-capacity: rated capacity in gas service. */
export const RATED: Method = {
  id: 'a.rated-capacity',
  version: 1,
  topic: 'a.rated-capacity',
  title: 'Rated capacity from actual area and certified coefficient',
  editions: ['API 520-1, 7th to 10th edition'],
  source:
    'Isentropic nozzle of an ideal gas: basis of API 520-1 Annex B.1 and of the ASME capacity formula (clause from memory)',
  validity:
    'Ideal gas with inlet Z and k. Actual area with the certified coefficient only; never an actual area with the effective 0.975.',
  inputs: [
    input('A_actual', 'actual flow area', 'area', { rangeKey: 'orificeArea' }),
    input('K_certified', 'certified coefficient of discharge', 'dimensionless', { rangeKey: 'kdGas' }),
    ...GAS_INPUTS,
    optional('P1', 'relieving pressure', 'pressure-absolute'),
    optional('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('overpressure', 'overpressure as a fraction of set', 'dimensionless', {
      rangeKey: 'overpressure',
    }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    optional('P2', 'total back pressure (the barometric pressure when not given)', 'pressure-absolute'),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('mass_flux_theoretical', 'theoretical mass flux', 'mass-flux'),
    output('choked', 'whether the nozzle is choked'),
    output('W_rated', 'rated capacity', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['A_actual']);
      const u = SYSTEM_UNITS[system];
      const A = sheet.number('A_actual', 'm2', { above: 0 }, 'A');
      const K = sheet.number('K_certified', '-', { above: 0, max: 1 }, 'K');
      const [T, Z, M] = [
        sheet.number('T', 'K', { above: 0 }),
        sheet.number('Z', '-', { above: 0 }),
        sheet.number('M', 'kg/kmol', { above: 0 }),
      ];
      const k = sheet.number('k', '-', { min: 1 });
      const P1 = convert({ value: relievingAbsolute(sheet, system), unit: u.P }, 'Pa_abs');
      const P2 = convert(
        {
          value: sheet.has('P2') ? absolutePressure(sheet, 'P2', 'P_2', system) : barometer(sheet, system),
          unit: u.P,
        },
        'Pa_abs',
      );
      if (P2 >= P1)
        sheet.refuse(
          'NO_FLOW',
          'P2',
          'The relieving pressure is not above the back pressure: nothing can flow.',
        );
      const { flux, choked } = nozzleFlux({ P1, P2, T, Z, M, k });
      sheet.keep('P1', P1, 'P_1');
      sheet.keep('P2', P2, 'P_2');
      sheet.keep('R', GAS_CONSTANT);
      sheet.step(
        {
          key: 'G',
          meaning: `theoretical mass flux, ${choked ? 'choked' : 'not choked'}, in SI base units`,
          value: flux,
          unit: 'kg/(m2.s)',
          clause: 'isentropic nozzle of an ideal gas',
        },
        (v) =>
          choked
            ? `${v('P1')} \\sqrt{\\frac{${v('M')}}{${v('Z')} ${v('R')} ${v('T')}}\\, ${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}`
            : `${v('P1')} \\sqrt{\\frac{${v('M')}}{${v('Z')} ${v('R')} ${v('T')}} \\frac{2 ${v('k')}}{${v('k')}-1} \\left[\\left(\\frac{${v('P2')}}{${v('P1')}}\\right)^{2/${v('k')}} - \\left(\\frac{${v('P2')}}{${v('P1')}}\\right)^{(${v('k')}+1)/${v('k')}}\\right]}`,
      );
      const W = fromSI(ratedCapacity(flux, A, K), u.W).value;
      sheet.step(
        { key: 'W', tex: 'W_{rated}', meaning: 'rated capacity', value: W, unit: u.W },
        (v) =>
          `${v('K_certified')} \\cdot ${v('A_actual')} \\cdot ${v('G')} \\quad (\\text{kg/s, shown as } ${unitLabel(u.W)})`,
      );
      sheet.output('choked', choked);
      sheet.output('mass_flux_theoretical', flux, 'kg/(m2.s)');
      sheet.output('W_rated', W, u.W);
    });
  },
};
