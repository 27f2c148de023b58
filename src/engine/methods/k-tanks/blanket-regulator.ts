/* Method k.blanket-regulator: a blanket gas regulator that fails wide open, as the air that the vents must pass. */
import { type Method } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { systemOf } from '../common/system';
import { type CoefficientType, COEFFICIENTS, gasThrough, type ValveGas } from '../f-loads/control-valve';
import { readCoefficient, readPressures, readType, VALVE_INPUTS } from '../f-loads/valve-inputs';
import { airEquivalent, AIR_MOLAR_MASS, NORMAL_VOLUME } from './air';
import { airOutputs } from './breathing-steps';

const CLAUSE = 'IEC 60534-2-1:2011, compressible fluids';

function readGas(sheet: SheetBuilder): ValveGas {
  return {
    ...readPressures(sheet),
    T: sheet.number('T', 'K', { above: 0 }),
    Z: sheet.number('Z', '-', { above: 0 }),
    M: sheet.number('M', 'kg/kmol', { above: 0 }),
    k: sheet.number('k', '-', { min: 1 }),
    xT: sheet.number('xT', '-', { above: 0, max: 1 }, 'x_T'),
  };
}

/** Flow through the regulator, kg/h, with its steps. */
function flowSteps(sheet: SheetBuilder, gas: ValveGas, C: number, type: CoefficientType): number {
  const r = gasThrough(gas, C, type);
  sheet.keep('xs', r.used, r.choked ? 'x_{choked}' : 'x');
  sheet.step(
    {
      key: 'x',
      meaning: `ratio of pressure drop to inlet pressure, ${r.choked ? 'choked' : 'not choked'}`,
      value: r.x,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('P1')} - ${v('P2')}}{${v('P1')}}`,
  );
  sheet.step(
    {
      key: 'xc',
      tex: 'x_{choked}',
      meaning: 'ratio at which the regulator chokes',
      value: r.xChoked,
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('k')}}{1.4} \\cdot ${v('xT')}`,
  );
  sheet.step(
    { key: 'Y', meaning: 'expansion factor', value: r.Y, unit: '-', clause: CLAUSE },
    (v) => `1 - \\frac{${v('xs')}}{3 \\cdot ${v('xc')}}`,
  );
  sheet.output('choked', r.choked);
  return sheet.step(
    {
      key: 'Wg',
      tex: 'W_g',
      meaning: 'blanket gas through the regulator',
      value: r.W,
      unit: 'kg/h',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `${v('coefficient')} \\cdot ${COEFFICIENTS[type].N8} \\cdot ${v('P1')} \\cdot ${v('Y')} \\sqrt{\\frac{${v('xs')} \\cdot ${v('M')}}{${v('T')} \\cdot ${v('Z')}}}`,
  );
}

function airStep(sheet: SheetBuilder, gas: ValveGas, W: number): number {
  sheet.keep('Vn', NORMAL_VOLUME, 'V_n');
  sheet.keep('Mair', AIR_MOLAR_MASS, 'M_{air}');
  const value = fromSI(airEquivalent(W / 3600, gas.M), 'Nm3/h').value;
  sheet.step(
    {
      key: 'Va',
      tex: '\\dot V_a',
      meaning: 'the air that asks the same of a vent',
      value,
      unit: 'Nm3/h',
      clause: 'ratio of molar masses at equal temperature',
    },
    (v) => `\\frac{${v('Wg')} \\cdot ${v('Vn')}}{${v('M')}} \\sqrt{\\frac{${v('M')}}{${v('Mair')}}}`,
  );
  const unit = 'Nm3/h';
  const added = sheet.number('filling_as_air', unit, { min: 0, fallback: 0 }, '\\dot V_{add}');
  if (added === 0) return value;
  return sheet.step(
    {
      key: 'V',
      tex: '\\dot V',
      meaning: 'with what the tank breathes out besides',
      value: value + added,
      unit,
    },
    (v) => `${v('Va')} + ${v('filling_as_air')}`,
  );
}

/** k.blanket-regulator: blanket gas regulator failing open. */
export const BLANKET_REGULATOR: Method = {
  id: 'k.blanket-regulator',
  version: 1,
  topic: 'k.blanket-regulator',
  title: 'Blanket gas regulator failing open',
  editions: ['IEC 60534-2-1:2011'],
  source:
    'IEC 60534-2-1:2011 for the flow (N constants from memory); ISO 28300 names the failure as one to be considered (from memory)',
  validity:
    'Wide-open coefficient of the regulator as installed; supply at the highest pressure that it can have; the gas in the tank taken at the reference temperature of the vents.',
  inputs: [
    ...VALVE_INPUTS.filter((i) => !['d', 'D1', 'D2'].includes(i.name)).map((i) =>
      i.name === 'coefficient' ? { ...i, required: true } : i,
    ),
    ...GAS_INPUTS,
    input('xT', 'pressure ratio factor', 'dimensionless', { rangeKey: 'xT' }),
    optional('filling_as_air', 'out-breathing at the same time, as air', 'normal-volume-flow'),
  ],
  outputs: [
    output('choked', 'whether the regulator is choked'),
    output('gas_flow', 'blanket gas through the regulator', 'mass-flow'),
    output('air_equivalent', 'required venting in air', 'normal-volume-flow'),
    output('relief_load', 'the same air as a mass flow', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['P1', 'M']);
      const gas = readGas(sheet);
      const type = readType(sheet);
      const W = flowSteps(sheet, gas, readCoefficient(sheet, type), type);
      sheet.output(
        'gas_flow',
        fromSI(W / 3600, system === 'US' ? 'lb/h' : 'kg/h').value,
        system === 'US' ? 'lb/h' : 'kg/h',
      );
      airOutputs(sheet, airStep(sheet, gas, W), 'Nm3/h', system);
    });
  },
};
