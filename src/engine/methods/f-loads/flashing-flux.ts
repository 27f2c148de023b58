/* Mass flux of a fluid that flashes through a break: as given, or by the omega method. */
import { type MethodInput } from '../../catalog/types';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { omegaFlux } from '../d-two-phase/omega';
import { readSides } from './orifice';

const CLAUSE = 'omega method, Leung, AIChE Journal 32 (1986) 1743';

/** Inputs of a flashing break. */
export const FLASHING_INPUTS: readonly MethodInput[] = [
  optional('mass_flux', 'mass flux of the flashing fluid, from a nozzle sheet', 'mass-flux'),
  optional('v0', 'specific volume on the high side, flashing', 'specific-volume', {
    rangeKey: 'specificVolume',
  }),
  optional('v9', 'specific volume at 90 % of the pressure of the high side', 'specific-volume', {
    rangeKey: 'specificVolume',
  }),
];

/** ω = 9 (v9/v0 − 1). */
export function omegaOf(v0: number, v9: number): number {
  return 9 * (v9 / v0 - 1);
}

function omegaSteps(sheet: SheetBuilder, high: number, low: number): number {
  const v0 = sheet.number('v0', 'm3/kg', { above: 0 }, 'v_0');
  const v9 = sheet.number('v9', 'm3/kg', { above: 0 }, 'v_9');
  if (v9 < v0)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'v9',
      'The specific volume at 90 % of the pressure (v9) cannot be below the one at full pressure (v0).',
    );
  const omega = sheet.step(
    {
      key: 'omega',
      tex: '\\omega',
      meaning: 'omega parameter',
      value: omegaOf(v0, v9),
      unit: '-',
      clause: CLAUSE,
    },
    (v) => `9 \\left(\\frac{${v('v9')}}{${v('v0')}} - 1\\right)`,
  );
  const flow = omegaFlux(omega, high * 1000, v0, low * 1000);
  sheet.keep('eta', flow.critical ? flow.ratio : low / high, '\\eta');
  sheet.step(
    {
      key: 'etac',
      tex: '\\eta_c',
      meaning: 'critical pressure ratio',
      value: flow.ratio,
      unit: '-',
      clause: CLAUSE,
    },
    (v) =>
      `\\text{root of } \\eta^2 + (\\omega^2 - 2\\omega)(1-\\eta)^2 + 2\\omega^2 \\ln\\eta + 2\\omega^2(1-\\eta) = 0,\\ \\omega = ${v('omega')}`,
  );
  sheet.output('choked', flow.critical);
  return sheet.step(
    {
      key: 'G',
      meaning: `mass flux, flashing, ${flow.critical ? 'choked' : 'not choked'}`,
      value: flow.flux,
      unit: 'kg/(m2.s)',
      clause: CLAUSE,
    },
    (v) =>
      `\\frac{\\sqrt{-2\\left[${v('omega')} \\ln ${v('eta')} + (${v('omega')} - 1)(1 - ${v('eta')})\\right]}}{${v('omega')}\\left(\\frac{1}{${v('eta')}} - 1\\right) + 1} \\sqrt{\\frac{1000 \\cdot ${v('P_high')}}{${v('v0')}}}`,
  );
}

/** The flux in kg/(m²·s), kept under `G`. */
export function flashingFlux(sheet: SheetBuilder): number {
  const { high, low } = readSides(sheet);
  if (!sheet.has('mass_flux')) return omegaSteps(sheet, high, low);
  return sheet.keep('G', sheet.number('mass_flux', 'kg/(m2.s)', { above: 0 }, 'G'), 'G');
}
