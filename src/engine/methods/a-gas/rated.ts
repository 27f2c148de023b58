/* Method a.rated-capacity: what a valve passes by its actual area and certified coefficient. */
import { type Method } from '../../catalog/types';
import { convert, fromSI, unitLabel } from '../../quantity';
import { type SheetBuilder, type Show, workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { absolutePressure, barometer, relievingAbsolute } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { GAS_CONSTANT, type GasState, nozzleFlux } from './flow';

/** Rated gas capacity in kg/s: K · A · G, with A the actual area in m² and K the certified (derated) coefficient. */
export function ratedCapacity(flux: number, area: number, K: number): number {
  return K * area * flux;
}

/** The gas at the nozzle in SI base units; refuses when nothing can flow. */
export function readState(sheet: SheetBuilder, system: System): GasState {
  const unit = SYSTEM_UNITS[system].P;
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const relieving = relievingAbsolute(sheet, system);
  const back = sheet.has('P2') ? absolutePressure(sheet, 'P2', 'P_2', system) : barometer(sheet, system);
  if (back >= relieving)
    sheet.refuse('NO_FLOW', 'P2', 'The relieving pressure is not above the back pressure: nothing can flow.');
  return {
    P1: convert({ value: relieving, unit }, 'Pa_abs'),
    P2: convert({ value: back, unit }, 'Pa_abs'),
    T,
    Z,
    M,
    k,
  };
}

/** The step of the theoretical mass flux. */
export function fluxStep(sheet: SheetBuilder, state: GasState): { flux: number; choked: boolean } {
  const { flux, choked } = nozzleFlux(state);
  sheet.keep('P1', state.P1, 'P_1');
  sheet.keep('P2', state.P2, 'P_2');
  sheet.keep('R', GAS_CONSTANT);
  const root = (v: Show) => `\\frac{${v('M')}}{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T')}}`;
  const r = (v: Show) => `\\left(\\frac{${v('P2')}}{${v('P1')}}\\right)`;
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
        ? `${v('P1')} \\sqrt{${root(v)} \\cdot ${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}`
        : `${v('P1')} \\sqrt{${root(v)} \\cdot \\frac{2 \\cdot ${v('k')}}{${v('k')}-1} \\left[${r(v)}^{2/${v('k')}} - ${r(v)}^{(${v('k')}+1)/${v('k')}}\\right]}`,
  );
  return { flux, choked };
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
    optional('Kc', 'combination factor with a rupture disk (1 when not given)', 'dimensionless', {
      rangeKey: 'kc',
    }),
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
      const Kc = sheet.number('Kc', '-', { above: 0, max: 1, fallback: 1 }, 'K_c');
      const { flux, choked } = fluxStep(sheet, readState(sheet, system));
      const W = fromSI(ratedCapacity(flux, A, K * Kc), u.W).value;
      sheet.step(
        { key: 'W', tex: 'W_{rated}', meaning: 'rated capacity', value: W, unit: u.W },
        (v) =>
          `${v('K_certified')} \\cdot ${v('A_actual')} \\cdot ${v('Kc')} \\cdot ${v('G')} \\quad (\\text{kg/s, shown as } ${unitLabel(u.W)})`,
      );
      sheet.output('choked', choked);
      sheet.output('mass_flux_theoretical', flux, 'kg/(m2.s)');
      sheet.output('W_rated', W, u.W);
    });
  },
};
