/* Methods f.stated-rate, f.compressor-rate, f.positive-displacement: loads that a machine or a study states. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { absolutePressure } from '../common/pressures';
import { SYSTEM_UNITS, systemOf } from '../common/system';

/** Mass flow of a machine that takes in a fixed volume: its rated flow scaled by suction density (ideal gas). */
export function suctionScaled(rate: number, pressure: number, ratedPressure: number): number {
  return (rate * pressure) / ratedPressure;
}

/** Volume flow of a positive-displacement machine in m³/h: m³ a turn, turns a minute; no credit for slip. */
export function displaced(volume: number, rpm: number): number {
  return volume * rpm * 60;
}

const RATE = input('rate', 'rate', 'mass-flow', { rangeKey: 'reliefLoad' });
const FACTOR = optional('factor', 'factor on the rate (1 when not given)', 'dimensionless');
const LOAD = output('relief_load', 'relief load', 'mass-flow');

/** f.stated-rate: a rate from a simulation, curve or note, with a factor. */
export const STATED_RATE: Method = {
  id: 'f.stated-rate',
  version: 1,
  topic: 'f.stated-rate',
  title: 'Load stated by a simulation, curve or note',
  editions: ['any'],
  source: 'The document that the origin of the rate names; the sheet adds nothing but the factor',
  validity:
    'As good as the document that states the rate, and only for the relieving conditions of that document.',
  inputs: [RATE, FACTOR],
  outputs: [LOAD],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const u = SYSTEM_UNITS[systemOf(inputs, ['rate'])];
      const rate = sheet.number('rate', u.W, { above: 0 }, 'W_0');
      const factor = sheet.number('factor', '-', { above: 0, fallback: 1 }, 'f');
      const W = sheet.step(
        { key: 'W', meaning: 'relief load', value: rate * factor, unit: u.W },
        (v) => `${v('rate')} \\cdot ${v('factor')}`,
      );
      sheet.output('relief_load', W, u.W);
    });
  },
};

/** The share of the rated suction density that the machine sees at relief. */
function suctionStep(sheet: SheetBuilder): number {
  if (!sheet.has('suction_pressure')) return sheet.keep('s', 1, 's');
  const P = absolutePressure(sheet, 'suction_pressure', 'P_s', 'SI');
  const rated = absolutePressure(sheet, 'rated_suction_pressure', 'P_{s0}', 'SI');
  const hot = sheet.has('suction_temperature');
  const T = hot ? sheet.number('suction_temperature', 'K', { above: 0 }, 'T_s') : 1;
  const T0 = hot ? sheet.number('rated_suction_temperature', 'K', { above: 0 }, 'T_{s0}') : 1;
  return sheet.step(
    {
      key: 's',
      meaning: 'suction density at relief over that of the rating',
      value: suctionScaled(T0 / T, P, rated),
      unit: '-',
      clause: 'fixed intake volume, ideal gas',
    },
    (v) =>
      `\\frac{${v('suction_pressure')}}{${v('rated_suction_pressure')}}${hot ? ` \\cdot \\frac{${v('rated_suction_temperature')}}{${v('suction_temperature')}}` : ''}`,
  );
}

/** f.compressor-rate: rated delivery of a reciprocating or rotary compressor. */
export const COMPRESSOR_RATE: Method = {
  id: 'f.compressor-rate',
  version: 1,
  topic: 'f.compressor-rate',
  title: 'Compressor of positive displacement: rated delivery',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521, closed outlets: the load of a compressor is what it delivers at relieving conditions (from memory); fixed intake volume',
  validity:
    'Reciprocating and rotary compressors at full speed and load; a centrifugal one is worked on its curve. No credit for lower volumetric efficiency.',
  inputs: [
    RATE,
    FACTOR,
    optional('suction_pressure', 'greatest suction pressure at relief', 'pressure-absolute'),
    optional('rated_suction_pressure', 'suction pressure of the rating', 'pressure-absolute'),
    optional('suction_temperature', 'suction temperature at relief', 'temperature'),
    optional('rated_suction_temperature', 'suction temperature of the rating', 'temperature'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [LOAD],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const u = SYSTEM_UNITS[systemOf(inputs, ['rate'])];
      const rate = sheet.number('rate', u.W, { above: 0 }, 'W_0');
      const factor = sheet.number('factor', '-', { above: 0, fallback: 1 }, 'f');
      const scale = suctionStep(sheet);
      const W = sheet.step(
        { key: 'W', meaning: 'relief load', value: rate * factor * scale, unit: u.W },
        (v) => `${v('rate')} \\cdot ${v('factor')} \\cdot ${v('s')}`,
      );
      sheet.output('relief_load', W, u.W);
    });
  },
};

/** The machine's volume flow in m³/h: as rated, or by its displacement and speed. */
function machineFlow(sheet: SheetBuilder): number {
  if (sheet.has('rated_flow')) return sheet.number('rated_flow', 'm3/h', { above: 0 }, 'Q_0');
  if (!sheet.has('displacement_per_turn'))
    sheet.refuse(
      'INPUT_MISSING',
      'rated_flow',
      'The flow is missing: give rated_flow, or displacement_per_turn with speed.',
    );
  const volume = sheet.number('displacement_per_turn', 'm3', { above: 0 }, 'V_r');
  const speed = sheet.number('speed', 'rpm', { above: 0 }, 'n');
  return sheet.step(
    {
      key: 'rated_flow',
      tex: 'Q_0',
      meaning: 'displacement at speed, no credit for slip',
      value: displaced(volume, speed),
      unit: 'm3/h',
    },
    (v) => `60 \\cdot ${v('displacement_per_turn')} \\cdot ${v('speed')}`,
  );
}

/** f.positive-displacement: a piston, gear, screw or diaphragm pump against a closed outlet. */
export const POSITIVE_DISPLACEMENT: Method = {
  id: 'f.positive-displacement',
  version: 1,
  topic: 'f.positive-displacement',
  title: 'Positive-displacement pump: full rate at relief',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521, closed outlets: a positive-displacement machine delivers its full rate at any pressure (from memory)',
  validity:
    'Full speed and stroke; no credit for slip or for an internal relief valve that returns to the suction.',
  inputs: [
    optional('rated_flow', 'rated flow', 'volume-flow', { rangeKey: 'machineFlow' }),
    optional('displacement_per_turn', 'displacement a turn, in place of the rated flow', 'volume'),
    optional('speed', 'greatest speed', 'rotation', { rangeKey: 'speed' }),
    FACTOR,
    input('rho', 'liquid density at the pump', 'density', { rangeKey: 'liquidDensity' }),
  ],
  outputs: [output('relief_flow', 'volume flow', 'volume-flow'), LOAD],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['rated_flow', 'rho']);
      const rated = machineFlow(sheet);
      const factor = sheet.number('factor', '-', { above: 0, fallback: 1 }, 'f');
      const rho = sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
      const Q = sheet.step(
        { key: 'Q', meaning: 'volume flow', value: rated * factor, unit: 'm3/h' },
        (v) => `${v('rated_flow')} \\cdot ${v('factor')}`,
      );
      const W = sheet.step(
        { key: 'W', meaning: 'relief load', value: Q * rho, unit: 'kg/h' },
        (v) => `${v('Q')} \\cdot ${v('rho')}`,
      );
      const flow = system === 'SI' ? 'm3/h' : 'US gpm';
      sheet.output('relief_flow', convert({ value: Q, unit: 'm3/h' }, flow), flow);
      sheet.output('relief_load', fromSI(W / 3600, SYSTEM_UNITS[system].W).value, SYSTEM_UNITS[system].W);
    });
  },
};
