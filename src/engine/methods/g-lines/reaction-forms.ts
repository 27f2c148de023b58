/* The three forms of the reaction force, each with its steps. */
import { dimensionOf, fromSI, toSI } from '../../quantity';
import { boreArea, exitState } from '../../lines';
import { homogeneousVolume, sonicMomentum, thrust } from '../../lines/discharge';
import { type SheetBuilder } from '../../sheet';
import { GAS_CONSTANT } from '../a-gas/flow';
import { absoluteIn, barometerIn } from '../common/pressures';
import { systemOf } from '../common/system';
import { pressureOutput } from './pressures';

/** A force with the unit it was worked in. */
export type Force = { force: number; unit: 'N' | 'lbf' };

const PRINTED = 'API 520-2, reaction forces, open discharge of gas';

/** The exit pressure as gauge in the unit of the printed form. */
function exitGauge(sheet: SheetBuilder, gauge: 'bar_g' | 'psig'): number {
  const absolute = gauge === 'psig' ? 'psia' : 'bar_abs';
  if (dimensionOf(sheet.quantity('P_exit').unit) !== 'pressure-absolute')
    return sheet.number('P_exit', gauge, { min: 0 }, 'P');
  const given = sheet.number('P_exit', absolute, { above: 0 }, 'P_{abs}');
  sheet.keep('P_exit absolute', given, 'P_{abs}');
  const barometer = barometerIn(sheet, absolute);
  return sheet.step(
    { key: 'P_exit', tex: 'P', meaning: 'as a gauge pressure', value: given - barometer, unit: gauge },
    (v) => `${v('P_exit absolute')} - ${v('atmospheric_pressure')}`,
  );
}

/** The printed form of API 520-2, sonic exit: N from kg/s, K, mm², barg, or lbf from lb/h, °R, in², psig. */
export function printedForce(sheet: SheetBuilder): Force {
  const US = systemOf(sheet.inputs, ['W', 'A']) === 'US';
  const unit = US ? 'lbf' : 'N';
  const W = sheet.number('W', US ? 'lb/h' : 'kg/s', { above: 0 });
  const k = sheet.number('k', '-', { min: 1 });
  const T = sheet.number('T', US ? 'degR' : 'K', { above: 0 });
  const M = sheet.number('M', US ? 'lb/lbmol' : 'kg/kmol', { above: 0 });
  const A = sheet.number('A', US ? 'in2' : 'mm2', { above: 0 });
  const P = exitGauge(sheet, US ? 'psig' : 'bar_g');
  const momentum = sheet.step(
    {
      key: 'Fm',
      tex: 'F_m',
      meaning: 'force of the momentum',
      value: sonicMomentum(W, k, T, M, US ? 'US' : 'SI'),
      unit,
      clause: PRINTED,
      memory: true,
    },
    (v) =>
      `${US ? `\\frac{${v('W')}}{366}` : `129 \\cdot ${v('W')}`} \\sqrt{\\frac{${v('k')} \\cdot ${v('T')}}{(${v('k')}+1) \\cdot ${v('M')}}}`,
  );
  const force = sheet.step(
    {
      key: 'F',
      meaning: 'reaction force',
      value: momentum + (US ? 1 : 0.1) * A * P,
      unit,
      clause: PRINTED,
      memory: true,
    },
    (v) => `${v('Fm')} + ${US ? '' : '0.1 \\cdot '}${v('A')} \\cdot ${v('P_exit')}`,
  );
  sheet.output('momentum_term', momentum, unit);
  return { force, unit };
}

/** The barometric pressure where the surroundings are not given. */
function ambient(sheet: SheetBuilder): number {
  if (sheet.has('P_ambient')) return absoluteIn(sheet, 'P_ambient', 'p_a', 'kPa_abs');
  return sheet.keep('P_ambient', barometerIn(sheet, 'kPa_abs'), 'p_a');
}

/** Momentum and pressure on the exit, N or lbf by the system of the flow. */
function forceSteps(sheet: SheetBuilder, W: number, velocity: number, exit: number, area: number): Force {
  const around = ambient(sheet);
  const unit = systemOf(sheet.inputs, ['W']) === 'US' ? 'lbf' : 'N';
  const told = (newton: number) => fromSI(newton, unit).value;
  const factor = unit === 'N' ? '' : `${told(1).toPrecision(6)} \\cdot `;
  const momentum = sheet.step(
    { key: 'Fm', tex: 'F_m', meaning: 'force of the momentum', value: told(W * velocity), unit },
    (v) => `${factor}${v('W')} \\cdot ${v('v')}`,
  );
  sheet.keep('area', area, 'A');
  sheet.keep('p exit', exit, 'p_{e}');
  const force = sheet.step(
    {
      key: 'F',
      meaning: 'reaction force',
      value: told(thrust(W, velocity, area, exit * 1e3, around * 1e3)),
      unit,
      clause: 'momentum and static term on the exit',
    },
    (v) => `${v('Fm')} + ${factor}10^{3} \\cdot ${v('area')} \\, (${v('p exit')} - ${v('P_ambient')})`,
  );
  sheet.output('momentum_term', momentum, unit);
  sheet.output('exit_velocity', velocity, 'm/s');
  return { force, unit };
}

/** From first principles: state at the exit, sonic where the surroundings allow no less, then momentum and static term. */
export function exitForce(sheet: SheetBuilder): Force {
  const W = sheet.number('W', 'kg/s', { above: 0 });
  const D = sheet.number('D_outlet', 'm', { above: 0 }, 'D');
  const T = sheet.number('T0', 'K', { above: 0 }, 'T_0');
  const k = sheet.number('k', '-', { min: 1 });
  const M = sheet.number('M', 'kg/kmol', { above: 0 });
  const Z = sheet.number('Z', '-', { above: 0, fallback: 1 });
  const around = ambient(sheet);
  sheet.keep('R', GAS_CONSTANT, 'R');
  const exit = exitState(W, boreArea(D), { T, Z, M, k }, around * 1e3);
  sheet.step(
    { key: 'G', meaning: 'mass flux', value: W / boreArea(D), unit: 'kg/(m2.s)' },
    (v) => `\\frac{4 \\, ${v('W')}}{\\pi \\, ${v('D_outlet')}^2}`,
  );
  sheet.step(
    {
      key: 'Ma',
      tex: 'Ma_e',
      meaning: 'Mach number at the exit',
      value: exit.mach,
      unit: '-',
      clause: exit.choked ? 'sonic: the flow needs more than the pressure around' : 'at the pressure around',
    },
    (v) => (exit.choked ? '1' : `Ma(${v('G')},\\ ${v('P_ambient')},\\ ${v('T0')})`),
  );
  sheet.step(
    { key: 'Te', tex: 'T_e', meaning: 'static temperature at the exit', value: exit.temperature, unit: 'K' },
    (v) => `\\frac{${v('T0')}}{1 + \\frac{${v('k')}-1}{2} ${v('Ma')}^2}`,
  );
  sheet.step(
    { key: 'v', meaning: 'velocity at the exit', value: exit.velocity, unit: 'm/s' },
    (v) =>
      `${v('Ma')} \\sqrt{\\frac{${v('k')} \\cdot ${v('Z')} \\cdot ${v('R')} \\cdot ${v('Te')}}{${v('M')}}}`,
  );
  sheet.step(
    {
      key: 'p exit',
      tex: 'p_{e}',
      meaning: 'static pressure at the exit',
      value: exit.pressure / 1e3,
      unit: 'kPa_abs',
    },
    (v) =>
      `10^{-3} \\, \\frac{${v('G')} \\cdot ${v('Z')} \\cdot ${v('R')} \\cdot ${v('Te')}}{${v('M')} \\cdot ${v('v')}}`,
  );
  sheet.output('choked', exit.choked);
  sheet.output('exit_Mach', exit.mach);
  pressureOutput(sheet, 'exit_pressure', exit.pressure / 1e3, 'absolute');
  sheet.output('exit_temperature', exit.temperature, 'K');
  return forceSteps(sheet, W, exit.velocity, exit.pressure / 1e3, boreArea(D));
}

/** Two phases, or a liquid with x = 0: velocity of the homogeneous mixture, then momentum and static term. */
export function twoPhaseForce(sheet: SheetBuilder): Force {
  const W = sheet.number('W', 'kg/s', { above: 0 });
  const x = sheet.number('x', '-', { min: 0, max: 1 });
  const rhoG = x > 0 ? sheet.number('rho_g', 'kg/m3', { above: 0 }, '\\rho_g') : 1;
  const rhoL = x < 1 ? sheet.number('rho_l', 'kg/m3', { above: 0 }, '\\rho_l') : 1;
  const A = toSI({ value: sheet.number('A', 'm2', { above: 0 }), unit: 'm2' });
  const exit = sheet.has('P_exit') ? absoluteIn(sheet, 'P_exit', 'p_e', 'kPa_abs') : ambient(sheet);
  const volume = homogeneousVolume(x, rhoG, rhoL);
  sheet.step(
    { key: 'vol', tex: '\\nu', meaning: 'specific volume of the mixture', value: volume, unit: 'm3/kg' },
    (v) =>
      x === 0
        ? `\\frac{1}{${v('rho_l')}}`
        : x === 1
          ? `\\frac{1}{${v('rho_g')}}`
          : `\\frac{${v('x')}}{${v('rho_g')}} + \\frac{1 - ${v('x')}}{${v('rho_l')}}`,
  );
  sheet.step(
    { key: 'v', meaning: 'velocity at the exit', value: (W * volume) / A, unit: 'm/s' },
    (v) => `\\frac{${v('W')} \\cdot ${v('vol')}}{${v('A')}}`,
  );
  pressureOutput(sheet, 'exit_pressure', exit, 'absolute');
  return forceSteps(sheet, W, (W * volume) / A, exit, A);
}
