/* Method f.control-valve-bypass: a control valve fails open while its bypass stands open. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absolutePressure } from '../common/pressures';
import { COEFFICIENTS, type CoefficientType, gasThrough, liquidThrough } from './control-valve';
import { loadOutput } from './orifice';
import { readPressures, readType, VALVE_INPUTS } from './valve-inputs';

const CLAUSE = 'IEC 60534-2-1:2011';

/** One open path: its coefficient, its trim (xT for gas, FL for liquid), and the names under which they are kept. */
type Path = { name: 'coefficient' | 'bypass_coefficient'; trim: string; C: number; factor: number };

function readPath(sheet: SheetBuilder, name: Path['name'], type: CoefficientType, letter: 'xT' | 'FL'): Path {
  const bypass = name === 'bypass_coefficient';
  const given = sheet.quantity(name).unit;
  const C = sheet.number(
    name,
    given === '-' ? '-' : type,
    bypass ? { min: 0 } : { above: 0 },
    bypass ? 'C_b' : 'C',
  );
  const own = bypass && sheet.has(`bypass_${letter}`);
  const trim = own ? `bypass_${letter}` : letter;
  const index = letter === 'xT' ? 'x_T' : 'F_L';
  const factor = sheet.number(
    trim,
    '-',
    { above: 0, max: 1 },
    own ? `${index.replace('_', '_{b,')}}` : index,
  );
  return { name, trim, C, factor };
}

function gasPath(sheet: SheetBuilder, path: Path, type: CoefficientType): number {
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const r = gasThrough(
    { ...readPressures(sheet), T, Z, M, k, xT: path.factor },
    Math.max(path.C, 1e-12),
    type,
  );
  const b = path.name === 'coefficient' ? 'v' : 'b';
  sheet.step(
    {
      key: `x${b}`,
      tex: `x_${b}`,
      meaning: `ratio of pressure drop to inlet pressure, ${r.choked ? 'held where it chokes' : 'not choked'}`,
      value: r.used,
      unit: '-',
      clause: CLAUSE,
    },
    (v) =>
      `\\min\\left(\\frac{${v('P1')} - ${v('P2')}}{${v('P1')}},\\ \\frac{${v('k')}}{1.4} \\cdot ${v(path.trim)}\\right)`,
  );
  sheet.step(
    {
      key: `Y${b}`,
      tex: `Y_${b}`,
      meaning: `expansion factor, ${r.choked ? 'choked' : 'not choked'}`,
      value: r.Y,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `1 - \\frac{${v(`x${b}`)}}{3 \\cdot \\frac{${v('k')}}{1.4} \\cdot ${v(path.trim)}}`,
  );
  return sheet.step(
    {
      key: `W${b}`,
      tex: `W_${b}`,
      meaning: b === 'v' ? 'flow through the control valve' : 'flow through the bypass',
      value: path.C === 0 ? 0 : r.W,
      unit: 'kg/h',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `${v(path.name)} \\cdot ${COEFFICIENTS[type].N8} \\cdot ${v('P1')} \\cdot ${v(`Y${b}`)} \\sqrt{\\frac{${v(`x${b}`)} \\cdot ${v('M')}}{${v('T')} \\cdot ${v('Z')}}}`,
  );
}

function liquidPath(sheet: SheetBuilder, path: Path, type: CoefficientType): number {
  const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const pressures = readPressures(sheet);
  const Pv = absolutePressure(sheet, 'Pv', 'P_v', 'SI');
  const Pc = absolutePressure(sheet, 'Pc', 'P_c', 'SI');
  if (Pv >= pressures.P1)
    sheet.refuse(
      'PHASE',
      'Pv',
      'The vapour pressure is not below the pressure before the valve: it is no liquid there.',
    );
  const r = liquidThrough({ ...pressures, rho, Pv, Pc, FL: path.factor }, Math.max(path.C, 1e-12), type);
  const b = path.name === 'coefficient' ? 'v' : 'b';
  sheet.step(
    {
      key: `dp${b}`,
      tex: `\\Delta P_${b}`,
      meaning: `pressure drop that counts, ${r.choked ? 'held where it chokes' : 'not choked'}`,
      value: r.drop,
      unit: 'kPa',
      clause: CLAUSE,
    },
    (v) =>
      `\\min\\left(${v('P1')} - ${v('P2')},\\ ${v(path.trim)}^2 \\left(${v('P1')} - \\left(0.96 - 0.28 \\sqrt{\\frac{${v('Pv')}}{${v('Pc')}}}\\right) ${v('Pv')}\\right)\\right)`,
  );
  return sheet.step(
    {
      key: `W${b}`,
      tex: `W_${b}`,
      meaning: `${b === 'v' ? 'flow through the control valve' : 'flow through the bypass'}, ${r.choked ? 'choked' : 'not choked'}`,
      value: path.C === 0 ? 0 : r.Q * rho,
      unit: 'kg/h',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `${v(path.name)} \\cdot ${COEFFICIENTS[type].N1} \\cdot ${v('rho')} \\sqrt{\\frac{${v(`dp${b}`)}}{${v('rho')}/999}}`,
  );
}

/** f.control-valve-bypass: control valve wide open with its bypass, less the flow that surely leaves. */
export const CONTROL_VALVE_BYPASS: Method = {
  id: 'f.control-valve-bypass',
  version: 1,
  topic: 'f.control-valve-bypass',
  title: 'Control valve failing open with its bypass',
  editions: ['IEC 60534-2-1:2011'],
  source:
    'IEC 60534-2-1:2011 for both paths, N constants from memory; that an open bypass adds to a valve that fails open: API Standard 521, automatic controls (from memory)',
  validity:
    'Both paths between the same pressures, valves in lines of their own size; gas turbulent, liquid not flashing to choke the pipe; credit only for flow that leaves through paths that stay open.',
  inputs: [
    optional('phase', 'gas or liquid (gas when not given)', undefined, { words: ['gas', 'liquid'] }),
    ...VALVE_INPUTS.filter((one) => !['d', 'D1', 'D2'].includes(one.name)).map((one) =>
      one.name === 'coefficient' ? { ...one, required: true } : one,
    ),
    input(
      'bypass_coefficient',
      'flow coefficient of the open bypass, of the same kind (0 when shut)',
      'flow-coefficient',
    ),
    optional('T', 'temperature of the gas', 'temperature', { rangeKey: 'relievingTemperature' }),
    optional('Z', 'compressibility factor', 'dimensionless', { rangeKey: 'z' }),
    optional('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
    optional('k', 'ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
    optional('xT', 'pressure ratio factor, gas', 'dimensionless', { rangeKey: 'xT' }),
    optional('bypass_xT', 'that of the bypass (the valve’s when not given)', 'dimensionless', {
      rangeKey: 'xT',
    }),
    optional('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
    optional('Pv', 'vapour pressure of the liquid', 'pressure-absolute'),
    optional('Pc', 'critical pressure of the liquid', 'pressure-absolute'),
    optional('FL', 'pressure recovery factor, liquid', 'dimensionless', { rangeKey: 'fL' }),
    optional('bypass_FL', 'that of the bypass (the valve’s when not given)', 'dimensionless', {
      rangeKey: 'fL',
    }),
    optional('outflow_kept', 'flow that surely leaves through paths that stay open', 'mass-flow'),
  ],
  outputs: [
    output('valve_flow', 'flow through the control valve', 'mass-flow'),
    output('bypass_flow', 'flow through the bypass', 'mass-flow'),
    output('relief_load', 'relief load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const type = readType(sheet);
      const gas = sheet.word('phase', ['gas', 'liquid'] as const, 'gas') === 'gas';
      const through = (name: Path['name']) => {
        const path = readPath(sheet, name, type, gas ? 'xT' : 'FL');
        return gas ? gasPath(sheet, path, type) : liquidPath(sheet, path, type);
      };
      const valve = through('coefficient');
      const bypass = through('bypass_coefficient');
      const kept = sheet.number('outflow_kept', 'kg/h', { min: 0, fallback: 0 }, 'W_{out}');
      const W = sheet.step(
        { key: 'W', meaning: 'relief load', value: Math.max(0, valve + bypass - kept), unit: 'kg/h' },
        (v) => `\\max(0,\\ ${v('Wv')} + ${v('Wb')} - ${v('outflow_kept')})`,
      );
      loadOutput(sheet, 'valve_flow', valve);
      loadOutput(sheet, 'bypass_flow', bypass);
      loadOutput(sheet, 'relief_load', W);
    });
  },
};
