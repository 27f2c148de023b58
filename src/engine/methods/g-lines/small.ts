/* Methods g.critical-flow, g.fanno-function and g.sonic-velocity: single relations of gas dynamics. */
import { type Method } from '../../catalog/types';
import { boreArea, fannoFunction, fannoPressureRatio } from '../../lines';
import { workSheet } from '../../sheet';
import { criticalRatio, GAS_CONSTANT } from '../a-gas/flow';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { absoluteIn } from '../common/pressures';
import { pressureOutput } from './pressures';

const TEXTBOOK = 'Textbook of gas dynamics; ideal gas';

/** g.critical-flow: pressure and temperature where an ideal gas expanding from rest reaches the speed of sound. */
export const CRITICAL_FLOW: Method = {
  id: 'g.critical-flow',
  version: 1,
  topic: 'g.critical-flow',
  title: 'Critical pressure and temperature of a gas',
  editions: ['textbook'],
  source: `${TEXTBOOK}, isentropic expansion to Mach 1`,
  validity: 'Ideal gas with constant k, from rest, without friction.',
  inputs: [
    input('P0', 'stagnation pressure', 'pressure-absolute'),
    input('T0', 'stagnation temperature', 'temperature', { rangeKey: 'relievingTemperature' }),
    input('k', 'ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('critical_pressure', 'pressure at Mach 1', 'pressure-absolute'),
    output('critical_temperature', 'temperature at Mach 1', 'temperature'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const P0 = absoluteIn(sheet, 'P0', 'P_0', 'kPa_abs');
      const T0 = sheet.number('T0', 'K', { above: 0 }, 'T_0');
      const k = sheet.number('k', '-', { min: 1 });
      const pressure = sheet.step(
        {
          key: 'pc',
          tex: 'p^*',
          meaning: 'pressure at Mach 1',
          value: P0 * criticalRatio(k),
          unit: 'kPa_abs',
          clause: TEXTBOOK,
        },
        (v) => `${v('P0')} \\left(\\frac{2}{${v('k')}+1}\\right)^{${v('k')}/(${v('k')}-1)}`,
      );
      const temperature = sheet.step(
        {
          key: 'Tc',
          tex: 'T^*',
          meaning: 'temperature at Mach 1',
          value: (2 * T0) / (k + 1),
          unit: 'K',
          clause: TEXTBOOK,
        },
        (v) => `\\frac{2 \\, ${v('T0')}}{${v('k')}+1}`,
      );
      pressureOutput(sheet, 'critical_pressure', pressure, 'absolute');
      sheet.output('critical_temperature', temperature, 'K');
    });
  },
};

/** g.fanno-function: velocity heads to Mach 1 and pressure over that at Mach 1, for a Mach number. */
export const FANNO_FUNCTION: Method = {
  id: 'g.fanno-function',
  version: 1,
  topic: 'g.fanno-function',
  title: 'Fanno function of a Mach number',
  editions: ['textbook'],
  source: `${TEXTBOOK}, adiabatic flow with friction; tabulated for k = 1.4 in many books`,
  validity: 'Ideal gas with constant k in a bore of constant diameter; Mach above 0, up to 50.',
  inputs: [
    input('k', 'ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
    input('Mach', 'Mach number', 'dimensionless'),
  ],
  outputs: [
    output('fLstar_over_D', 'velocity heads to Mach 1 (Darcy friction factor)', 'dimensionless'),
    output('p_over_pstar', 'pressure over that at Mach 1', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const k = sheet.number('k', '-', { min: 1 });
      const mach = sheet.number('Mach', '-', { above: 0, max: 50 }, 'Ma');
      const heads = sheet.step(
        {
          key: 'heads',
          tex: 'f L^*/D',
          meaning: 'velocity heads to Mach 1',
          value: fannoFunction(mach, k),
          unit: '-',
          clause: TEXTBOOK,
        },
        (v) =>
          `\\frac{1 - ${v('Mach')}^2}{${v('k')} \\cdot ${v('Mach')}^2} + \\frac{${v('k')}+1}{2 \\, ${v('k')}} \\ln \\frac{(${v('k')}+1) \\, ${v('Mach')}^2}{2 + (${v('k')}-1) \\, ${v('Mach')}^2}`,
      );
      const ratio = sheet.step(
        {
          key: 'ratio',
          tex: 'p/p^*',
          meaning: 'pressure over that at Mach 1',
          value: fannoPressureRatio(mach, k),
          unit: '-',
          clause: TEXTBOOK,
        },
        (v) => `\\frac{1}{${v('Mach')}} \\sqrt{\\frac{${v('k')}+1}{2 + (${v('k')}-1) \\, ${v('Mach')}^2}}`,
      );
      sheet.output('fLstar_over_D', heads);
      sheet.output('p_over_pstar', ratio);
    });
  },
};

/** g.sonic-velocity: speed of sound of a gas, and velocity and Mach number of a flow in a bore. */
export const SONIC_VELOCITY: Method = {
  id: 'g.sonic-velocity',
  version: 1,
  topic: 'g.sonic-velocity',
  title: 'Speed of sound and Mach number in a line',
  editions: ['API 521, 6th and 7th edition'],
  source: 'c = √(k Z R T/M), textbook; API 521 prints 91.2 √(kT/M) (from memory)',
  validity: 'Ideal gas with Z; velocity and Mach number at the static pressure given.',
  inputs: [
    ...GAS_INPUTS,
    input('W', 'mass flow', 'mass-flow'),
    input('P', 'static pressure in the line', 'pressure-absolute'),
    input('D', 'inside diameter', 'length', { rangeKey: 'bore' }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('sonic_velocity', 'speed of sound', 'velocity'),
    output('velocity', 'velocity in the bore', 'velocity'),
    output('Mach', 'Mach number', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const T = sheet.number('T', 'K', { above: 0 });
      const Z = sheet.number('Z', '-', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0 });
      const k = sheet.number('k', '-', { min: 1 });
      const W = sheet.number('W', 'kg/s', { above: 0 });
      const P = absoluteIn(sheet, 'P', 'p', 'kPa_abs');
      const D = sheet.number('D', 'm', { above: 0 });
      sheet.keep('R', GAS_CONSTANT, 'R');
      const sound = sheet.step(
        {
          key: 'c',
          meaning: 'speed of sound',
          value: Math.sqrt((k * Z * GAS_CONSTANT * T) / M),
          unit: 'm/s',
          clause: 'textbook of gas dynamics',
        },
        (v) => `\\sqrt{\\frac{${v('k')} \\cdot ${v('Z')} \\cdot ${v('R')} \\cdot ${v('T')}}{${v('M')}}}`,
      );
      const rho = sheet.step(
        {
          key: 'rho',
          tex: '\\rho',
          meaning: 'density',
          value: (P * 1e3 * M) / (Z * GAS_CONSTANT * T),
          unit: 'kg/m3',
        },
        (v) => `\\frac{10^3 \\cdot ${v('P')} \\cdot ${v('M')}}{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T')}}`,
      );
      const velocity = sheet.step(
        { key: 'v', meaning: 'velocity', value: W / rho / boreArea(D), unit: 'm/s' },
        (v) => `\\frac{4 \\, ${v('W')}}{\\pi \\, ${v('D')}^2 \\cdot ${v('rho')}}`,
      );
      const mach = sheet.step(
        { key: 'Ma', meaning: 'Mach number', value: velocity / sound, unit: '-' },
        (v) => `\\frac{${v('v')}}{${v('c')}}`,
      );
      sheet.output('sonic_velocity', sound, 'm/s');
      sheet.output('velocity', velocity, 'm/s');
      sheet.output('Mach', mach);
      if (mach >= 1)
        sheet.warn(
          'SUPERSONIC',
          'The flow would pass the speed of sound: it chokes, and the pressure in the line is higher.',
          'Mach below 1',
        );
    });
  },
};
