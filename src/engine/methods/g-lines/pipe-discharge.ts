/* Method g.pipe-discharge: what a pipe lets out of a vessel to a lower pressure, adiabatic with friction. */
import { type Method } from '../../catalog/types';
import { boreArea, pipeDischarge } from '../../lines';
import { workSheet } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { GAS_INPUTS, input, optional, output } from '../common/describe';
import { absoluteIn } from '../common/pressures';
import { pressureOutput } from './pressures';

const CLAUSE = 'adiabatic discharge through a pipe (Lapple), in closed form';

/** g.pipe-discharge: flow of a gas from a vessel through a pipe of N velocity heads. */
export const PIPE_DISCHARGE: Method = {
  id: 'g.pipe-discharge',
  version: 1,
  topic: 'g.pipe-discharge',
  title: 'Discharge of a gas through a pipe',
  editions: ['textbook'],
  source: 'Isentropic entrance and Fanno flow; Perry’s handbook, section 6 (charts for the same relations)',
  validity:
    'Ideal gas with constant k and Z from a vessel at rest; one bore; N holds friction and all fittings, entrance included.',
  inputs: [
    input('P0', 'pressure in the vessel', 'pressure-absolute'),
    input('T0', 'temperature in the vessel', 'temperature', { rangeKey: 'relievingTemperature' }),
    ...GAS_INPUTS.filter((one) => one.name !== 'T'),
    input('D', 'inside diameter', 'length', { rangeKey: 'bore' }),
    input('N', 'resistance in velocity heads, f L/D + ΣK', 'dimensionless'),
    input('P_ambient', 'pressure beyond the end', 'pressure-absolute'),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('choked', 'whether flow is sonic at the end'),
    output('exit_pressure', 'static pressure at the end', 'pressure-absolute'),
    output('mass_flux', 'mass flux', 'mass-flux'),
    output('W', 'mass flow', 'mass-flow'),
    output('Mach_in', 'Mach number behind the entrance', 'dimensionless'),
    output('Mach_out', 'Mach number at the end', 'dimensionless'),
    output('exit_temperature', 'static temperature at the end', 'temperature'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const P0 = absoluteIn(sheet, 'P0', 'P_0', 'kPa_abs');
      const T = sheet.number('T0', 'K', { above: 0 }, 'T_0');
      const Z = sheet.number('Z', '-', { above: 0 });
      const M = sheet.number('M', 'kg/kmol', { above: 0 });
      const k = sheet.number('k', '-', { min: 1 });
      const D = sheet.number('D', 'm', { above: 0 });
      const N = sheet.number('N', '-', { min: 0 });
      const ambient = absoluteIn(sheet, 'P_ambient', 'p_a', 'kPa_abs');
      sheet.keep('R', GAS_CONSTANT, 'R');
      if (P0 <= ambient)
        sheet.refuse(
          'NO_FLOW',
          'P_ambient',
          'The pressure in the vessel is not above that beyond the pipe: nothing flows.',
        );
      const found = pipeDischarge(P0 * 1e3, { T, Z, M, k }, N, ambient * 1e3);
      if (!found)
        return sheet.refuse(
          'NO_RESULT',
          'N',
          'No flow was found with these figures; check N and the pressures.',
        );
      sheet.keep('Mout', found.machOut, 'Ma_{out}');
      sheet.step(
        {
          key: 'Min',
          tex: 'Ma_{in}',
          meaning: 'Mach number behind the entrance',
          value: found.machIn,
          unit: '-',
          clause: CLAUSE,
        },
        (v) => `\\varphi^{-1}\\left(\\varphi(${v('Mout')}) + ${v('N')}\\right)`,
      );
      sheet.step(
        {
          key: 'Mout',
          tex: 'Ma_{out}',
          meaning: 'Mach number at the end',
          value: found.machOut,
          unit: '-',
          clause: CLAUSE,
        },
        (v) => (found.choked ? '1' : `Ma(p_{out} = ${v('P_ambient')})`),
      );
      sheet.step(
        { key: 'G', meaning: 'mass flux', value: found.flux, unit: 'kg/(m2.s)', clause: CLAUSE },
        (v) =>
          `\\frac{10^3 \\cdot ${v('P0')} \\cdot ${v('Min')} \\sqrt{${v('k')} \\, ${v('M')} / (${v('Z')} \\cdot ${v('R')} \\cdot ${v('T0')})}}{\\left(1 + \\frac{${v('k')}-1}{2} ${v('Min')}^2\\right)^{(${v('k')}+1)/(2(${v('k')}-1))}}`,
      );
      sheet.step(
        {
          key: 'pout',
          tex: 'p_{out}',
          meaning: 'static pressure at the end',
          value: found.exit / 1e3,
          unit: 'kPa_abs',
          clause: CLAUSE,
        },
        (v) =>
          `10^{-3} \\, \\frac{${v('G')}}{${v('Mout')}} \\sqrt{\\frac{${v('Z')} \\cdot ${v('R')} \\cdot ${v('T0')}}{${v('M')} \\cdot ${v('k')} \\left(1 + \\frac{${v('k')}-1}{2} ${v('Mout')}^2\\right)}}`,
      );
      const W = sheet.step(
        { key: 'W', meaning: 'mass flow', value: found.flux * boreArea(D), unit: 'kg/s' },
        (v) => `\\frac{\\pi}{4} \\, ${v('D')}^2 \\cdot ${v('G')}`,
      );
      sheet.output('choked', found.choked);
      pressureOutput(sheet, 'exit_pressure', found.exit / 1e3, 'absolute');
      sheet.output('mass_flux', found.flux, 'kg/(m2.s)');
      sheet.output('W', W, 'kg/s');
      sheet.output('Mach_in', found.machIn);
      sheet.output('Mach_out', found.machOut);
      sheet.output('exit_temperature', found.exitTemperature, 'K');
    });
  },
};
