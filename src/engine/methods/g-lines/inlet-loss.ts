/* Method g.inlet-loss: non-recoverable loss of an inlet line, by incompressible flow or, for a gas, by adiabatic flow from the vessel. */
import { type Method } from '../../catalog/types';
import { boreArea } from '../../lines';
import { type SheetBuilder, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { GAS_CONSTANT } from '../a-gas/flow';
import { absoluteIn } from '../common/pressures';
import { adiabaticInlet } from './inlet-adiabatic';
import { fractionOfSet, pressureOutput } from './pressures';
import { FLOW_INPUTS, readSegments, SEGMENT_INPUTS } from './read';
import { nameAt, ofSegment, symbolAt } from './series';

const CLAUSE = 'Darcy–Weisbach; API 520-2, non-recoverable inlet loss';

/** Velocity and loss of one segment; kPa. */
function segmentLoss(
  sheet: SheetBuilder,
  i: number,
  count: number,
  { W, D, N, rho }: { W: number; D: number; N: number; rho: number },
): { loss: number; velocity: number } {
  const velocity = sheet.step(
    {
      key: `v ${i}`,
      tex: symbolAt('v', i, count),
      meaning: `velocity${ofSegment(i, count)}`,
      value: W / rho / boreArea(D),
      unit: 'm/s',
    },
    (v) => `\\frac{4 \\, ${v(nameAt('W', i))}}{\\pi \\, ${v(nameAt('D', i))}^2 \\cdot ${v('rho')}}`,
  );
  const loss = sheet.step(
    {
      key: `dp ${i}`,
      tex: symbolAt('\\Delta p', i, count),
      meaning: `non-recoverable loss${ofSegment(i, count)}`,
      value: (N * rho * velocity ** 2) / 2e3,
      unit: 'kPa',
      clause: CLAUSE,
    },
    (v) => `10^{-3} \\cdot ${v(`N ${i}`)} \\, \\frac{${v('rho')} \\cdot ${v(`v ${i}`)}^2}{2}`,
  );
  return { loss, velocity };
}

/** The density as given, or of the gas at the pressure and temperature of the vessel. */
function vesselDensity(sheet: SheetBuilder): number {
  if (sheet.has('rho') || !sheet.has('P1')) return sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const P1 = absoluteIn(sheet, 'P1', 'P_1', 'kPa_abs');
  const T = sheet.number('T0', 'K', { above: 0 }, 'T_0');
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  sheet.keep('R', GAS_CONSTANT, 'R');
  return sheet.step(
    {
      key: 'rho',
      tex: '\\rho',
      meaning: 'density ahead of the line',
      value: (P1 * 1e3 * M) / (Z * GAS_CONSTANT * T),
      unit: 'kg/m3',
    },
    (v) => `\\frac{10^3 \\cdot ${v('P1')} \\cdot ${v('M')}}{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T0')}}`,
  );
}

/** The loss by incompressible flow at the density ahead of the line. */
function incompressibleInlet(sheet: SheetBuilder): void {
  const rho = vesselDensity(sheet);
  const { count, D, W, N, f, Re } = readSegments(sheet);
  const each = D.map((bore, i) => segmentLoss(sheet, i, count, { W: W[i] ?? 0, D: bore, N: N[i] ?? 0, rho }));
  const total = each.reduce((sum, one) => sum + one.loss, 0);
  sheet.step(
    {
      key: 'dp',
      tex: '\\Delta p',
      meaning: 'non-recoverable loss of the line',
      value: total,
      unit: 'kPa',
      clause: CLAUSE,
    },
    (v) => each.map((_, i) => v(`dp ${i}`)).join(' + '),
  );
  pressureOutput(sheet, 'loss', total, 'difference');
  sheet.output('velocity', Math.max(...each.map((one) => one.velocity)), 'm/s');
  if (Re.length > 0) sheet.output('Reynolds', Re.at(-1) ?? 0);
  sheet.output('f_darcy', f.at(-1) ?? 0);
  judge(sheet, 'dp', total);
}

/** Loss as a fraction of set, held against the limit. */
function judge(sheet: SheetBuilder, key: string, loss: number): void {
  const share = fractionOfSet(sheet, key, {
    output: 'loss_fraction_of_set',
    tex: '\\Delta p/p_{set}',
    meaning: 'loss as a fraction of set',
    value: loss,
  });
  if (share === undefined) return;
  const limit = sheet.number('loss_limit', '-', { above: 0, max: 1, fallback: 0.03 }, 'x_{lim}');
  sheet.output('within_3_percent', share <= 0.03);
  sheet.output('within_limit', share <= limit);
  if (share > limit)
    sheet.warn(
      'INLET_LOSS_HIGH',
      `The loss is ${(share * 100).toPrecision(3)} % of set, above ${(limit * 100).toPrecision(3)} %: the valve may chatter. More is accepted only with an engineering analysis.`,
    );
}

/** g.inlet-loss: loss between the protected equipment and the device, at the flow that the device passes. */
export const INLET_LOSS: Method = {
  id: 'g.inlet-loss',
  version: 1,
  topic: 'g.inlet-loss',
  title: 'Inlet line: non-recoverable loss',
  editions: ['API 520-2, 6th and 7th edition'],
  source:
    'Darcy–Weisbach with Colebrook–White (textbook); limit of 3 % of set from ASME VIII-1 Appendix M and API 520-2 (from memory); adiabatic form from textbook gas dynamics',
  validity:
    'Without P0: density of the vessel along the whole line, good for liquids and for gases at Mach below about 0.2. With P0, T0: ideal gas, adiabatic, isentropic entrance, entrance loss among the velocity heads. The velocity head and height are recoverable and left out.',
  inputs: [
    ...FLOW_INPUTS,
    ...SEGMENT_INPUTS,
    optional('rho', 'density ahead of the line (incompressible form)', 'density'),
    optional('P1', 'pressure in the vessel, from which the density of a gas follows', 'pressure-absolute'),
    optional('N', 'resistance in velocity heads, in place of lengths and fittings', 'dimensionless', {
      each: 'segment',
    }),
    optional('P0', 'pressure in the vessel (adiabatic form)', 'pressure-absolute'),
    optional('T0', 'temperature in the vessel', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
    optional('Z', 'compressibility factor', 'dimensionless', { rangeKey: 'z' }),
    optional('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
    optional('k', 'ideal-gas ratio of specific heats', 'dimensionless', {
      rangeKey: 'kIdeal',
    }),
    optional('set_pressure', 'set pressure of the device', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('loss_limit', 'greatest loss as a fraction of set (0.03 when not given)', 'dimensionless'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('velocity', 'highest velocity in the line', 'velocity'),
    output('Reynolds', 'Reynolds number at the device', 'dimensionless'),
    output('f_darcy', 'Darcy friction factor at the device', 'dimensionless'),
    output('loss', 'non-recoverable loss', 'pressure-difference'),
    output('loss_fraction_of_set', 'the same as a fraction of set', 'dimensionless'),
    output('within_3_percent', 'whether it is at most 3 % of set'),
    output('within_limit', 'whether it is within the limit given'),
    output('Mach_in', 'Mach number behind the entrance', 'dimensionless'),
    output('Mach_out', 'Mach number at the device', 'dimensionless'),
    output('static_pressure_at_valve', 'static pressure at the device', 'pressure-absolute'),
    output('stagnation_pressure_at_valve', 'stagnation pressure at the device', 'pressure-absolute'),
    output('stagnation_loss', 'loss of stagnation pressure', 'pressure-difference'),
    output('incompressible_estimate', 'the loss at the density of the vessel', 'pressure-difference'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      if (sheet.has('P0')) judge(sheet, 'stagnation loss', adiabaticInlet(sheet));
      else incompressibleInlet(sheet);
    });
  },
};
