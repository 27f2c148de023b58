/* Reading omega on a sheet: as given, from two volumes, from inlet properties, without flashing, or with delayed boiling. */
import { type MethodInput } from '../../catalog/types';
import { unitLabel } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { type System } from '../common/system';
import { FLUX_UNITS } from './common';
import { mixtureVolume, omegaFromVolumes, omegaNonFlashing } from './omega-forms';
import { DELAYS, fromInlet, omegaInfo } from './omega-inlet';

/** The ways to omega that a sheet may take. */
export const OMEGA_FORMS = [
  'given',
  'two volumes',
  'inlet properties',
  'no flashing',
  'delayed boiling',
] as const;
type Form = (typeof OMEGA_FORMS)[number];

/** Inputs of the ways to omega. */
export const OMEGA_INPUTS: readonly MethodInput[] = [
  optional('omega_form', 'how omega is found (from what is given when not said)', undefined, {
    words: [...OMEGA_FORMS],
  }),
  optional('omega', 'omega as known', 'dimensionless', { rangeKey: 'omega' }),
  optional('v0', 'specific volume of the mixture at the inlet', 'specific-volume'),
  optional('v9', 'specific volume at 90 % of the inlet pressure, on the isentrope', 'specific-volume'),
  optional('x0', 'vapour mass fraction at the inlet', 'dimensionless', { rangeKey: 'quality' }),
  optional('v_vapour', 'specific volume of the vapour at the inlet', 'specific-volume'),
  optional('v_liquid', 'specific volume of the liquid at the inlet', 'specific-volume'),
  optional('cp', 'heat capacity of the liquid at the inlet', 'heat-capacity'),
  optional('T0', 'temperature at the inlet', 'temperature'),
  optional('latent_heat', 'latent heat at the inlet', 'specific-energy'),
  optional('k', 'ratio of specific heats of the gas, where the liquid does not flash', 'dimensionless'),
  optional('delay_for', 'what delays boiling: a safety valve or a short nozzle', undefined, {
    words: DELAYS,
  }),
];

/** Omega and the specific volume of the inlet, in the system's unit. */
export type OmegaRead = { omega: number; v0: number };

function formOf(sheet: SheetBuilder): Form {
  const derived: Form | undefined = sheet.has('omega')
    ? 'given'
    : sheet.has('v9')
      ? 'two volumes'
      : sheet.has('v_vapour') && sheet.has('latent_heat')
        ? 'inlet properties'
        : undefined;
  if (derived === undefined && !sheet.has('omega_form'))
    sheet.refuse(
      'INPUT_MISSING',
      'v9',
      'Omega cannot be found: give the specific volume at 90 % of the inlet pressure (v9), or omega itself, or x0, v_vapour, v_liquid, cp, T0 and latent_heat.',
    );
  return sheet.word('omega_form', OMEGA_FORMS, derived);
}

/** v0 as given; held against the volumes of the phases where these are given too. */
function givenVolume(sheet: SheetBuilder, system: System): number {
  const v0 = sheet.number('v0', FLUX_UNITS[system].v, { above: 0 }, 'v_0');
  if (!['x0', 'v_vapour', 'v_liquid'].every((name) => sheet.has(name))) return v0;
  const { x0, vVapour, vLiquid } = readPhases(sheet, system);
  const mixed = mixtureVolume(x0, vVapour, vLiquid);
  if (Math.abs(v0 / mixed - 1) > 0.02)
    sheet.warn(
      'VOLUME_DISAGREES',
      `v0 = ${v0.toPrecision(4)} ${unitLabel(FLUX_UNITS[system].v)} is not that of the phases, ${mixed.toPrecision(4)}: a mass quality averages specific volumes, never densities.`,
      'within 2 %',
    );
  return v0;
}

/** v0 as given, or from quality and the volumes of the phases. */
function volumeStep(sheet: SheetBuilder, system: System): number {
  const unit = FLUX_UNITS[system].v;
  if (sheet.has('v0')) return givenVolume(sheet, system);
  if (!sheet.has('x0'))
    sheet.refuse(
      'INPUT_MISSING',
      'v0',
      'The specific volume of the mixture at the inlet (v0) is missing, or quality x0 with v_vapour and v_liquid.',
    );
  const { x0, vVapour, vLiquid } = readPhases(sheet, system);
  return sheet.step(
    {
      key: 'v0',
      tex: 'v_0',
      meaning: 'specific volume of the mixture at the inlet',
      value: mixtureVolume(x0, vVapour, vLiquid),
      unit,
    },
    (v) => `${v('x0')} \\cdot ${v('v_vapour')} + (1 - ${v('x0')}) \\cdot ${v('v_liquid')}`,
  );
}

function readPhases(sheet: SheetBuilder, system: System) {
  const unit = FLUX_UNITS[system].v;
  const x0 = sheet.number('x0', '-', { min: 0, max: 1 }, 'x_0');
  const vVapour = sheet.number('v_vapour', unit, { above: 0 }, 'v_v');
  const vLiquid = sheet.number('v_liquid', unit, { above: 0 }, 'v_l');
  if (vVapour <= vLiquid)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'v_vapour',
      'The vapour cannot be denser than the liquid: v_vapour must be above v_liquid.',
    );
  return { x0, vVapour, vLiquid };
}

/** Omega as known; held against the two volumes where these are known too. */
function givenOmega(sheet: SheetBuilder, v0: number, system: System): number {
  const omega = sheet.number('omega', '-', { min: 0 }, '\\omega');
  if (!sheet.has('v9')) return omega;
  const other = omegaFromVolumes(v0, sheet.number('v9', FLUX_UNITS[system].v, { above: 0 }, 'v_9'));
  if (Math.abs(omega - other) > 0.05 * Math.abs(other))
    sheet.warn(
      'OMEGA_DISAGREES',
      `Omega is given as ${omega.toPrecision(3)}, but v0 and v9 make it ${other.toPrecision(3)}: one of them is of another state.`,
      'within 5 %',
    );
  return omega;
}

function fromTwoVolumes(sheet: SheetBuilder, v0: number, system: System): number {
  const v9 = sheet.number('v9', FLUX_UNITS[system].v, { above: 0 }, 'v_9');
  if (v9 < v0)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'v9',
      'The specific volume at 90 % of the inlet pressure (v9) is below that at the inlet (v0); a fluid that expands grows.',
    );
  return sheet.step(
    omegaInfo(omegaFromVolumes(v0, v9), false),
    (v) => `9 \\left(\\frac{${v('v9')}}{${v('v0')}} - 1\\right)`,
  );
}

function withoutFlashing(sheet: SheetBuilder, system: System): number {
  const { x0, vVapour, vLiquid } = readPhases(sheet, system);
  const k = sheet.number('k', '-', { min: 1 });
  return sheet.step(
    omegaInfo(omegaNonFlashing(x0, vVapour, vLiquid, k), true),
    (v) => `\\frac{${v('x0')} \\cdot ${v('v_vapour')}}{${v('v0')} \\cdot ${v('k')}}`,
  );
}

/** Reads the inlet's volume and finds omega in the way that is said or follows from what is given; P0 in Pa. */
export function readOmega(sheet: SheetBuilder, system: System, P0: number): OmegaRead {
  const form = formOf(sheet);
  const v0 = volumeStep(sheet, system);
  sheet.output('v0', v0, FLUX_UNITS[system].v);
  const ways: Record<Form, () => number> = {
    given: () => givenOmega(sheet, v0, system),
    'two volumes': () => fromTwoVolumes(sheet, v0, system),
    'inlet properties': () => fromInlet(sheet, 'inlet properties', P0),
    'delayed boiling': () => fromInlet(sheet, 'delayed boiling', P0),
    'no flashing': () => withoutFlashing(sheet, system),
  };
  const omega = ways[form]();
  if (omega < 0)
    sheet.refuse(
      'OMEGA_NEGATIVE',
      'omega',
      'Omega comes out negative with these properties; the inlet is too near the critical point for this way. Use two volumes of the isentrope.',
    );
  sheet.output('omega', omega);
  return { omega, v0 };
}
