/* Method f.compressor-curve: what a centrifugal compressor delivers at the relieving pressure, on its curve. */
import { type Method } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { input, optional, output, RELIEVING_INPUTS } from '../common/describe';
import { mustRun, readColumns } from '../common/numbered';
import { absolutePressure, relievingAbsolute } from '../common/pressures';
import { meetCurve } from './curve';

const CLAUSE = 'polytropic compression of a gas with constant Z';

/** Polytropic head in J/kg for a pressure ratio r; e = (n−1)/n, its limit at e = 0 is isothermal. T K, M kg/kmol. */
export function polytropicHead(T: number, Z: number, M: number, e: number, r: number): number {
  const scale = (Z * GAS_CONSTANT * T) / M;
  return Math.abs(e) < 1e-9 ? scale * Math.log(r) : (scale * (r ** e - 1)) / e;
}

/** The exponent (n−1)/n from the ratio of specific heats and the polytropic efficiency: (k−1)/(k η). */
export function polytropicExponent(k: number, efficiency: number): number {
  return (k - 1) / (k * efficiency);
}

type Suction = { P: number; T: number; Z: number; M: number; e: number };

function readSuction(sheet: SheetBuilder): Suction {
  const P = absolutePressure(sheet, 'suction_pressure', 'P_s', 'SI');
  const T = sheet.number('suction_temperature', 'K', { above: 0 }, 'T_s');
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const efficiency = sheet.number('efficiency', '-', { above: 0, max: 1, fallback: 0.75 }, '\\eta_p');
  const e = sheet.step(
    {
      key: 'e',
      tex: '\\tfrac{n-1}{n}',
      meaning: 'polytropic exponent',
      value: polytropicExponent(k, efficiency),
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('k')} - 1}{${v('k')} \\cdot ${v('efficiency')}}`,
  );
  return { P, T, Z, M, e };
}

/** The curve in m³/h against J/kg or pressure ratio, at the speed of the case. */
function readCurve(
  sheet: SheetBuilder,
  kind: 'curve_head' | 'curve_ratio',
): { flows: number[]; values: number[] } {
  const heads = kind === 'curve_head';
  const [flows = [], values = []] = readColumns(
    sheet,
    [
      { name: 'curve_flow', unit: 'm3/h', tex: 'Q', bounds: { min: 0 } },
      heads
        ? { name: kind, unit: 'kJ/kg', tex: 'H', bounds: { min: 0 } }
        : { name: kind, unit: '-', tex: 'r', bounds: { min: 1 } },
    ],
    2,
  );
  mustRun(sheet, 'curve_flow', flows, 'rise');
  const speed = sheet.number('speed_ratio', '-', { above: 0, max: 2, fallback: 1 }, 's');
  if (!heads && speed !== 1)
    sheet.refuse(
      'SPEED_RATIO',
      'speed_ratio',
      'Another speed needs the head curve: heads go with the square of the speed, pressure ratios do not.',
    );
  return { flows: flows.map((q) => q * speed), values: values.map((h) => h * speed ** 2) };
}

/** What the machine must do at relief, in the measure of its curve: head in kJ/kg or pressure ratio. */
function needStep(sheet: SheetBuilder, s: Suction, r: number, heads: boolean): number {
  if (!heads) return r;
  return sheet.step(
    {
      key: 'H',
      tex: 'H_p',
      meaning: 'polytropic head at the relieving pressure',
      value: polytropicHead(s.T, s.Z, s.M, s.e, r) / 1000,
      unit: 'kJ/kg',
      clause: CLAUSE,
    },
    (v) =>
      `\\frac{${v('Z')} \\cdot ${v('R')} \\cdot ${v('suction_temperature')}}{1000 \\cdot ${v('M')}} \\cdot \\frac{${v('r')}^{${v('e')}} - 1}{${v('e')}}`,
  );
}

/** The flow at the suction where the curve gives what is needed. */
function flowStep(
  sheet: SheetBuilder,
  curve: { flows: number[]; values: number[] },
  need: number,
  heads: boolean,
): number {
  const met = meetCurve(curve.flows, curve.values, need);
  const last = curve.flows.at(-1) ?? 0;
  if (met.at === 'beyond')
    sheet.warn(
      'CURVE_ENDS',
      'The relieving pressure lies below the last point of the curve: its flow is taken, as for a choked stage. Enter points further out where the curve goes on.',
    );
  if (met.at === 'never')
    sheet.warn(
      'SURGE',
      'The compressor cannot reach the relieving pressure with this suction: it surges before.',
    );
  const value = met.at === 'flow' ? met.flow : met.at === 'beyond' ? last : 0;
  return sheet.step(
    {
      key: 'Q',
      tex: 'Q_s',
      meaning: 'suction flow on the curve at relief, straight lines between points',
      value,
      unit: 'm3/h',
    },
    (v) => `Q_s(${heads ? v('H') : v('r')})`,
  );
}

/** Mass flow by the suction density, and the discharge temperature. */
function loadSteps(sheet: SheetBuilder, s: Suction, r: number, Q: number): void {
  const W = sheet.step(
    {
      key: 'W',
      meaning: 'relief load',
      value: (Q * s.P * 1000 * s.M) / (s.Z * GAS_CONSTANT * s.T),
      unit: 'kg/h',
    },
    (v) =>
      `${v('Q')} \\cdot \\frac{1000 \\cdot ${v('suction_pressure')} \\cdot ${v('M')}}{${v('Z')} \\cdot ${v('R')} \\cdot ${v('suction_temperature')}}`,
  );
  const T = sheet.step(
    {
      key: 'T2',
      tex: 'T_d',
      meaning: 'discharge temperature',
      value: s.T * r ** s.e,
      unit: 'K',
      clause: CLAUSE,
    },
    (v) => `${v('suction_temperature')} \\cdot ${v('r')}^{${v('e')}}`,
  );
  const unit = sheet.quantity('M').unit.startsWith('lb') ? 'lb/h' : 'kg/h';
  sheet.output('suction_flow', Q, 'm3/h');
  sheet.output('relief_needed', Q > 0);
  sheet.output('discharge_temperature', T, 'K');
  sheet.output('relief_load', fromSI(W / 3600, unit).value, unit);
}

/** f.compressor-curve: blocked outlet of a centrifugal compressor. */
export const COMPRESSOR_CURVE: Method = {
  id: 'f.compressor-curve',
  version: 1,
  topic: 'f.compressor-curve',
  title: 'Blocked outlet of a centrifugal compressor, on its curve',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'Compressor curve at relieving pressure (approach of API Standard 521, closed outlets; no clause quoted); polytropic head by any compressor handbook (GPSA, section 13, from memory)',
  validity:
    'Curve of the gas and suction of the case, in head or pressure ratio against suction volume; greatest suction pressure; speed by the fan laws for head curves; Z constant.',
  inputs: [
    ...RELIEVING_INPUTS,
    input('suction_pressure', 'greatest suction pressure at relief', 'pressure-absolute'),
    input('suction_temperature', 'suction temperature', 'temperature', { rangeKey: 'relievingTemperature' }),
    input('Z', 'compressibility factor, mean of suction and discharge', 'dimensionless', { rangeKey: 'z' }),
    input('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
    input('k', 'ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
    optional('efficiency', 'polytropic efficiency (0.75 when not given)', 'dimensionless'),
    input(
      'curve_flow',
      'suction flow of a point of the curve (curve_flow_2, … further points)',
      'volume-flow',
      { each: 'point' },
    ),
    optional('curve_head', 'polytropic head at that point (curve_head_2, …)', 'specific-energy', {
      each: 'point',
    }),
    optional('curve_ratio', 'pressure ratio at that point, in place of the head', 'dimensionless', {
      each: 'point',
    }),
    optional('speed_ratio', 'speed over that of a head curve (1 when not given)', 'dimensionless'),
  ],
  outputs: [
    output('P1', 'relieving pressure', 'pressure-absolute'),
    output('pressure_ratio', 'pressure ratio at relief', 'dimensionless'),
    output('suction_flow', 'flow at the suction', 'volume-flow'),
    output('relief_needed', 'whether the machine passes the relieving pressure'),
    output('discharge_temperature', 'discharge temperature', 'temperature'),
    output('relief_load', 'relief load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const P1 = relievingAbsolute(sheet, 'SI');
      const suction = readSuction(sheet);
      sheet.keep('R', GAS_CONSTANT);
      const r = sheet.step(
        { key: 'r', meaning: 'pressure ratio at relief', value: P1 / suction.P, unit: '-' },
        (v) => `\\frac{${v('P1')}}{${v('suction_pressure')}}`,
      );
      if (r <= 1)
        sheet.refuse(
          'NO_RISE',
          'suction_pressure',
          'The suction already stands at or above the relieving pressure: the machine is not what limits the flow.',
        );
      const heads = !sheet.has('curve_ratio');
      const curve = readCurve(sheet, heads ? 'curve_head' : 'curve_ratio');
      const Q = flowStep(sheet, curve, needStep(sheet, suction, r, heads), heads);
      sheet.output('pressure_ratio', r);
      loadSteps(sheet, suction, r, Q);
    });
  },
};
