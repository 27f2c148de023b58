/* Methods i.iso4126-gas, -steam, -liquid: required actual flow area with the certified derated coefficient. */
import { type Method, type MethodInput } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { absoluteIn, shownPressure } from '../common/pressures';
import { isoC, isoGasArea, isoKb, isoLiquidArea, isoSteamArea } from './flow';

const CLAUSE = 'ISO 4126-1, sizing';
const T0: MethodInput = input('T0', 'relieving temperature', 'temperature', {
  rangeKey: 'relievingTemperature',
});

const SHARED_INPUTS: readonly MethodInput[] = [
  input('Qm', 'required relief load', 'mass-flow', { rangeKey: 'reliefLoad' }),
  input('p0', 'relieving pressure', 'pressure-absolute'),
  input('pb', 'back pressure', 'pressure-absolute'),
  optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  input('Kdr', 'certified derated coefficient of discharge', 'dimensionless', { rangeKey: 'kdGas' }),
];

/** Load, both pressures in bar absolute, and the coefficient; refuses when nothing can flow. */
function readShared(sheet: SheetBuilder): { Qm: number; p0: number; pb: number; Kdr: number } {
  const Qm = sheet.number('Qm', 'kg/h', { above: 0 }, 'Q_m');
  const p0 = absoluteIn(sheet, 'p0', 'p_0', 'bar_abs');
  const pb = absoluteIn(sheet, 'pb', 'p_b', 'bar_abs');
  if (pb >= p0)
    sheet.refuse(
      'NO_FLOW',
      'pb',
      `Relieving pressure ${shownPressure(sheet, 'p0', p0, 'bar_abs')} is not above the back pressure ${shownPressure(sheet, 'pb', pb, 'bar_abs')}: nothing can flow.`,
    );
  return { Qm, p0, pb, Kdr: sheet.number('Kdr', '-', { above: 0, max: 1 }, 'K_{dr}') };
}

/** C and Kb with their steps and outputs. */
function factorSteps(sheet: SheetBuilder, k: number, p0: number, pb: number): { C: number; Kb: number } {
  const C = sheet.step(
    {
      key: 'C',
      meaning: 'coefficient of the isentropic exponent',
      value: isoC(k),
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) => `3.948 \\sqrt{${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}`,
  );
  const value = isoKb(k, pb / p0);
  const Kb = sheet.step(
    {
      key: 'Kb',
      tex: 'K_b',
      meaning:
        value === 1
          ? 'factor for back pressure, critical flow'
          : 'factor for back pressure, subcritical flow',
      value,
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) => {
      const r = `\\left(\\frac{${v('pb')}}{${v('p0')}}\\right)`;
      return value === 1
        ? '1'
        : `\\sqrt{\\frac{\\frac{2 \\cdot ${v('k')}}{${v('k')}-1} \\left[${r}^{2/${v('k')}} - ${r}^{(${v('k')}+1)/${v('k')}}\\right]}{${v('k')} \\left(\\frac{2}{${v('k')}+1}\\right)^{(${v('k')}+1)/(${v('k')}-1)}}}`;
    },
  );
  sheet.output('C', C);
  sheet.output('critical', value === 1);
  sheet.output('Kb', Kb);
  return { C, Kb };
}

const AREA = output('A_required', 'required actual flow area', 'area');
const FACTORS = [
  output('C', 'coefficient C', 'dimensionless'),
  output('critical', 'whether the flow is critical'),
  output('Kb', 'factor for back pressure', 'dimensionless'),
];

const SHARED = {
  version: 1,
  editions: ['EN ISO 4126-1:2013'],
  source: 'ISO 4126-1, sizing equations (clause text not at hand; from memory)',
};

/** i.iso4126-gas: required flow area for gas. */
export const ISO_GAS: Method = {
  ...SHARED,
  id: 'i.iso4126-gas',
  topic: 'i.iso4126-gas',
  title: 'ISO 4126-1, gas: required flow area',
  validity: 'Ideal-gas nozzle with inlet Z; actual flow area with the certified derated coefficient Kdr.',
  inputs: [...SHARED_INPUTS, T0, ...GAS_INPUTS.filter((i) => i.name !== 'T')],
  outputs: [...FACTORS, AREA],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const { Qm, p0, pb, Kdr } = readShared(sheet);
      const T = sheet.number('T0', 'K', { above: 0 }, 'T_0');
      const Z = sheet.number('Z', '-', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0 });
      const k = sheet.number('k', '-', { min: 1 });
      const { C, Kb } = factorSteps(sheet, k, p0, pb);
      const A = sheet.step(
        {
          key: 'A',
          meaning: 'required actual flow area',
          value: isoGasArea({ Qm, p0, T, Z, M, C, Kdr, Kb }),
          unit: 'mm2',
          clause: CLAUSE,
        },
        (v) =>
          `\\frac{${v('Qm')}}{${v('p0')} \\cdot ${v('C')} \\cdot ${v('Kdr')} \\cdot ${v('Kb')}} \\sqrt{\\frac{${v('Z')} \\cdot ${v('T0')}}{${v('M')}}}`,
      );
      sheet.output('A_required', A, 'mm2');
    });
  },
};

/** i.iso4126-steam: required flow area for steam by its specific volume. */
export const ISO_STEAM: Method = {
  ...SHARED,
  id: 'i.iso4126-steam',
  topic: 'i.iso4126-steam',
  title: 'ISO 4126-1, steam: required flow area',
  validity:
    'Dry or superheated steam; k from the steam table; actual flow area with the certified derated coefficient Kdr.',
  inputs: [
    ...SHARED_INPUTS,
    input('v', 'specific volume at relief', 'specific-volume'),
    input('k', 'isentropic exponent', 'dimensionless', { rangeKey: 'isentropicExponent' }),
  ],
  outputs: [...FACTORS, AREA],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const { Qm, p0, pb, Kdr } = readShared(sheet);
      const v = sheet.number('v', 'm3/kg', { above: 0 });
      const k = sheet.number('k', '-', { above: 0 });
      const { C, Kb } = factorSteps(sheet, k, p0, pb);
      const A = sheet.step(
        {
          key: 'A',
          meaning: 'required actual flow area',
          value: isoSteamArea({ Qm, p0, v, C, Kdr, Kb }),
          unit: 'mm2',
          clause: CLAUSE,
          memory: true,
        },
        (s) =>
          `\\frac{${s('Qm')}}{0.2883 \\cdot ${s('C')} \\cdot ${s('Kdr')} \\cdot ${s('Kb')}} \\sqrt{\\frac{${s('v')}}{${s('p0')}}}`,
      );
      sheet.output('A_required', A, 'mm2');
    });
  },
};

/** i.iso4126-liquid: required flow area for liquid. */
export const ISO_LIQUID: Method = {
  ...SHARED,
  id: 'i.iso4126-liquid',
  topic: 'i.iso4126-liquid',
  title: 'ISO 4126-1, liquid: required flow area',
  validity: 'Liquid that does not flash; actual flow area with the certified derated coefficient Kdr.',
  inputs: [
    ...SHARED_INPUTS.map((one) => (one.name === 'Kdr' ? { ...one, rangeKey: 'kdLiquid' } : one)),
    input('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
    optional('Kv', 'viscosity factor (1 when not given)', 'dimensionless', { rangeKey: 'kv' }),
  ],
  outputs: [AREA],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const { Qm, p0, pb, Kdr } = readShared(sheet);
      const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
      const Kv = sheet.number('Kv', '-', { above: 0, max: 1, fallback: 1 }, 'K_v');
      const A = sheet.step(
        {
          key: 'A',
          meaning: 'required actual flow area',
          value: isoLiquidArea({ Qm, p0, pb, rho, Kdr, Kv }),
          unit: 'mm2',
          clause: CLAUSE,
          memory: true,
        },
        (v) =>
          `\\frac{${v('Qm')}}{1.61 \\cdot ${v('Kdr')} \\cdot ${v('Kv')} \\sqrt{(${v('p0')} - ${v('pb')}) \\cdot ${v('rho')}}}`,
      );
      sheet.output('A_required', A, 'mm2');
    });
  },
};
