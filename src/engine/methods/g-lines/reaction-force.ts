/* Method g.reaction-force: thrust of an open discharge, by the printed form, from first principles, or for two phases. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { exitForce, printedForce, twoPhaseForce } from './reaction-forms';

/** The force on the support where a dynamic load factor is given. */
function supportStep(sheet: SheetBuilder, force: number, unit: string): void {
  if (!sheet.has('dynamic_load_factor')) return;
  sheet.number('dynamic_load_factor', '-', { min: 1, max: 2 }, 'DLF');
  sheet.keep('F all', force, 'F');
  const design = sheet.step(
    {
      key: 'F design',
      tex: 'F_{s}',
      meaning: 'force on the support',
      value: force * sheet.number('dynamic_load_factor', '-'),
      unit,
      clause: 'dynamic load factor 1.1 to 2.0: API 520-2, ASME B31.1 Appendix II (from memory)',
    },
    (v) => `${v('dynamic_load_factor')} \\cdot ${v('F all')}`,
  );
  sheet.output('support_force', design, unit);
}

/** g.reaction-force: force of an open discharge on the device and its support. */
export const REACTION_FORCE: Method = {
  id: 'g.reaction-force',
  version: 1,
  topic: 'g.reaction-force',
  title: 'Reaction force of an open discharge',
  editions: ['API 520-2, 6th and 7th edition'],
  source:
    'API Standard 520 Part II, reaction forces, gas and two-phase forms (constants 129 and 366 from memory; 366 is rounded, 367.3 follows from the units); first principles F = W v + A (p − p_a)',
  validity:
    'Steady flow out of an open end, after a last elbow; the force acts against the jet. With A and P_exit: gas, sonic at the exit. With D_outlet and T0: gas, sonic or not. With x: homogeneous two phases. In a closed system the steady forces balance inside the piping.',
  inputs: [
    input('W', 'mass flow', 'mass-flow'),
    optional('k', 'ideal-gas ratio of specific heats', 'dimensionless', { rangeKey: 'kIdeal' }),
    optional('T', 'temperature at the inlet of the device (printed form)', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
    optional('M', 'molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
    optional('Z', 'compressibility factor (1 when not given)', 'dimensionless', { rangeKey: 'z' }),
    optional('A', 'area of the exit', 'area'),
    optional('P_exit', 'static pressure at the exit', 'pressure-absolute'),
    optional('D_outlet', 'inside diameter of the exit (first principles)', 'length', { rangeKey: 'bore' }),
    optional('T0', 'stagnation temperature (first principles)', 'temperature', {
      rangeKey: 'relievingTemperature',
    }),
    optional('P_ambient', 'pressure around the exit', 'pressure-absolute'),
    optional('x', 'vapour mass fraction at the exit (two phases; 0 for a liquid)', 'dimensionless'),
    optional('rho_g', 'density of the vapour at the exit', 'density'),
    optional('rho_l', 'density of the liquid at the exit', 'density'),
    optional('dynamic_load_factor', 'dynamic load factor of the support', 'dimensionless', {
      rangeKey: 'dlf',
    }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
  ],
  outputs: [
    output('momentum_term', 'force of the momentum', 'force'),
    output('reaction_force', 'reaction force', 'force'),
    output('support_force', 'the same with the dynamic load factor', 'force'),
    output('choked', 'whether the exit is sonic'),
    output('exit_Mach', 'Mach number at the exit', 'dimensionless'),
    output('exit_pressure', 'static pressure at the exit', 'pressure-absolute'),
    output('exit_temperature', 'static temperature at the exit', 'temperature'),
    output('exit_velocity', 'velocity at the exit', 'velocity'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const { force, unit } = sheet.has('x')
        ? twoPhaseForce(sheet)
        : sheet.has('D_outlet')
          ? exitForce(sheet)
          : printedForce(sheet);
      sheet.output('reaction_force', force, unit);
      supportStep(sheet, force, unit);
    });
  },
};
