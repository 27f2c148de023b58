/* Methods f.control-valve-gas and f.gas-blowby: what an open control valve passes of a gas, or the Kv it needs. */
import { type Method } from '../../catalog/types';
import { findRoot } from '../../numeric';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import {
  COEFFICIENTS,
  type CoefficientType,
  type Fittings,
  gasThrough,
  type ValveGas,
} from './control-valve';
import { fittingSteps, velocityTex } from './fitting-steps';
import { readCoefficient, readFittings, readPressures, readType, VALVE_INPUTS } from './valve-inputs';

const CLAUSE = 'IEC 60534-2-1:2011, compressible fluids';

/** Volume of a kmol of ideal gas at 0 °C and 101.325 kPa, m³. */
const NORMAL_VOLUME = 22.413969545;

function readGas(sheet: SheetBuilder): ValveGas {
  const T = sheet.number('T', 'K', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const xT = sheet.number('xT', '-', { above: 0, max: 1 }, 'x_T');
  return { ...readPressures(sheet), T, Z, M, k, xT };
}

type Through = ReturnType<typeof gasThrough>;

/** The fittings and the pressure ratio factor xTP with them. */
function ratioStep(sheet: SheetBuilder, r: Through, type: CoefficientType, fittings: Fittings): void {
  fittingSteps(sheet, r.FP, type, fittings);
  sheet.step(
    {
      key: 'xTP',
      tex: 'x_{TP}',
      meaning: 'pressure ratio factor with fittings',
      value: r.xTP,
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `\\frac{${v('xT')}/${v('FP')}^2}{1 + \\frac{${v('xT')} \\cdot ${v('zi')}}{${COEFFICIENTS[type].N5}} ${velocityTex(v)}}`,
  );
  sheet.output('xTP', r.xTP);
}

/** Where the valve chokes, and the expansion factor. */
function expansionSteps(sheet: SheetBuilder, r: Through, ratio: 'xT' | 'xTP'): void {
  sheet.step(
    {
      key: 'xc',
      tex: 'x_{choked}',
      meaning: 'ratio at which the valve chokes',
      value: r.xChoked,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('k')}}{1.4} \\cdot ${v(ratio)}`,
  );
  sheet.keep('xs', r.used, r.choked ? 'x_{choked}' : 'x');
  sheet.step(
    {
      key: 'Y',
      meaning: `expansion factor, ${r.choked ? 'choked' : 'not choked'}`,
      value: r.Y,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `1 - \\frac{${v('xs')}}{3 \\cdot ${v('xc')}}`,
  );
  sheet.output('x_choked', r.xChoked);
  sheet.output('choked', r.choked);
  sheet.output('Y', r.Y);
}

/** The steps of one gas flow through a known coefficient, or through the one just found; gives all outputs but the inverse. */
function flowSteps(
  sheet: SheetBuilder,
  gas: ValveGas,
  C: number,
  type: CoefficientType,
  fittings: Fittings | undefined,
): void {
  const r = gasThrough(gas, C, type, fittings);
  sheet.step(
    { key: 'x', meaning: 'ratio of pressure drop to inlet pressure', value: r.x, unit: '-', clause: CLAUSE },
    (v) => `\\frac{${v('P1')} - ${v('P2')}}{${v('P1')}}`,
  );
  if (fittings) ratioStep(sheet, r, type, fittings);
  expansionSteps(sheet, r, fittings ? 'xTP' : 'xT');
  sheet.step(
    { key: 'W', meaning: 'mass flow', value: r.W, unit: 'kg/h', clause: CLAUSE, memory: true },
    (v) =>
      `${v('coefficient')} \\cdot ${COEFFICIENTS[type].N8} \\cdot ${fittings ? `${v('FP')} \\cdot ` : ''}${v('P1')} \\cdot ${v('Y')} \\sqrt{\\frac{${v('xs')} \\cdot ${v('M')}}{${v('T')} \\cdot ${v('Z')}}}`,
  );
  sheet.output('x', r.x);
  sheet.output('W', r.W, 'kg/h');
}

/** The relief load in the unit system of the molar mass. */
function loadOutput(sheet: SheetBuilder): void {
  const W = sheet.outputs['W'];
  if (typeof W !== 'object') return;
  const molar = sheet.quantity('M').unit;
  const unit = molar.startsWith('lb') ? 'lb/h' : 'kg/h';
  sheet.output('relief_load', fromSI(W.value / 3600, unit).value, unit);
}

/** The flow for which a Kv is sought, kg/h. */
function wantedFlow(sheet: SheetBuilder, M: number): number {
  if (sheet.has('W')) return sheet.number('W', 'kg/h', { above: 0 }, 'W');
  const Q = sheet.number('Q_normal', 'Nm3/h', { above: 0 }, 'Q_n');
  sheet.keep('Vn', NORMAL_VOLUME, 'V_n');
  return sheet.step(
    {
      key: 'W',
      meaning: 'mass flow of the normal volume flow',
      value: (Q * M) / NORMAL_VOLUME,
      unit: 'kg/h',
    },
    (v) => `${v('Q_normal')} \\cdot \\frac{${v('M')}}{${v('Vn')}}`,
  );
}

/** The coefficient that passes a wanted flow, between nought and the greatest that the fittings let work. */
function requiredSteps(
  sheet: SheetBuilder,
  gas: ValveGas,
  type: CoefficientType,
  fittings: Fittings | undefined,
): void {
  const wanted = wantedFlow(sheet, gas.M);
  const bare = wanted / gasThrough(gas, 1, type).W;
  const search = findRoot((C) => gasThrough(gas, C, type, fittings).W - wanted, bare * 0.5, bare * 5);
  if (!search.ok)
    return sheet.refuse(
      'NO_RESULT',
      'W',
      `No coefficient passes this flow with these fittings. ${search.reason}`,
    );
  const tex = type === 'Kv' ? 'K_v' : 'C_v';
  sheet.step(
    {
      key: 'coefficient',
      tex,
      meaning:
        'coefficient that passes the flow, found by iteration; the lines below pass the flow through it',
      value: search.x,
      unit: type,
      clause: CLAUSE,
    },
    (v) => `\\text{root of } W(${tex}) = ${v('W')}`,
  );
  flowSteps(sheet, gas, search.x, type, fittings);
  sheet.output('Kv_required', type === 'Kv' ? search.x : search.x * 0.865, 'm3/h');
}

const OUTPUTS = [
  output('x', 'pressure drop ratio', 'dimensionless'),
  output('x_choked', 'ratio at which the valve chokes', 'dimensionless'),
  output('choked', 'whether the valve is choked'),
  output('Y', 'expansion factor', 'dimensionless'),
  output('FP', 'piping geometry factor', 'dimensionless'),
  output('xTP', 'pressure ratio factor with fittings', 'dimensionless'),
  output('W', 'mass flow', 'mass-flow'),
  output('relief_load', 'mass flow in the site’s unit system', 'mass-flow'),
];

const SHARED = {
  version: 1,
  editions: ['IEC 60534-2-1:2011'],
  source: 'IEC 60534-2-1:2011 as implemented in the open library CalebBell/fluids; N constants from memory',
  validity:
    'Turbulent flow; x_T of the installed trim at full travel; k as F_γ = k/1.40; Y with xTP where fittings are given.',
};

/** f.control-valve-gas: gas through an open control valve, or the Kv that a flow needs. */
export const CONTROL_VALVE_GAS: Method = {
  ...SHARED,
  id: 'f.control-valve-gas',
  topic: 'f.control-valve-gas',
  title: 'Control valve failing open, gas',
  inputs: [
    ...VALVE_INPUTS,
    ...GAS_INPUTS,
    input('xT', 'pressure ratio factor', 'dimensionless', { rangeKey: 'xT' }),
    optional('Q_normal', 'normal volume flow, to find the Kv', 'normal-volume-flow'),
    optional('W', 'mass flow, to find the Kv', 'mass-flow'),
  ],
  outputs: [...OUTPUTS, output('Kv_required', 'Kv that passes the flow', 'volume-flow')],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const gas = readGas(sheet);
      const type = readType(sheet);
      const fittings = readFittings(sheet);
      if (!sheet.has('coefficient')) return requiredSteps(sheet, gas, type, fittings);
      flowSteps(sheet, gas, readCoefficient(sheet, type), type, fittings);
      loadOutput(sheet);
    });
  },
};

/** f.gas-blowby: gas through a liquid level control valve after loss of level. */
export const GAS_BLOWBY: Method = {
  ...SHARED,
  id: 'f.gas-blowby',
  topic: 'f.gas-blowby',
  title: 'Gas blow-by through a level control valve',
  inputs: [
    ...VALVE_INPUTS,
    ...GAS_INPUTS,
    input('xT', 'pressure ratio factor', 'dimensionless', { rangeKey: 'xT' }),
  ],
  outputs: OUTPUTS,
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const gas = readGas(sheet);
      const type = readType(sheet);
      flowSteps(sheet, gas, readCoefficient(sheet, type), type, readFittings(sheet));
      loadOutput(sheet);
    });
  },
};
