/* Reading omega on a sheet: as given, from two volumes, from inlet properties, without flashing, or with delayed boiling. */
import { type MethodInput } from '../../catalog/types';
import { unitLabel } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { type System } from '../common/system';
import { FLUX_UNITS, OMEGA_CLAUSE } from './common';
import { omegaRatio } from './omega';
import {
  BOILING_DELAY,
  type FlashInlet,
  mixtureVolume,
  omegaDelayed,
  omegaFromProperties,
  omegaFromVolumes,
  omegaNonFlashing,
} from './omega-forms';

/** The ways to omega that a sheet may take. */
export const OMEGA_FORMS = [
  'given',
  'two volumes',
  'inlet properties',
  'no flashing',
  'delayed boiling',
] as const;
type Form = (typeof OMEGA_FORMS)[number];

const DELAYS = Object.keys(BOILING_DELAY) as (keyof typeof BOILING_DELAY)[];

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
  const derived: Form = sheet.has('omega')
    ? 'given'
    : sheet.has('v9')
      ? 'two volumes'
      : sheet.has('latent_heat')
        ? 'inlet properties'
        : sheet.has('k')
          ? 'no flashing'
          : 'two volumes';
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

/** Reads the inlet in coherent SI, keeps the symbols in SI, and so lets one equation serve both systems. */
export function readFlashInlet(sheet: SheetBuilder, P0: number, withQuality = true): FlashInlet {
  const x0 = withQuality ? sheet.number('x0', '-', { min: 0, max: 1 }, 'x_0') : 0;
  const vVapour = sheet.number('v_vapour', 'm3/kg', { above: 0 }, 'v_v');
  const vLiquid = sheet.number('v_liquid', 'm3/kg', { above: 0 }, 'v_l');
  if (vVapour <= vLiquid)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'v_vapour',
      'The vapour cannot be denser than the liquid: v_vapour must be above v_liquid.',
    );
  const cp = sheet.number('cp', 'J/(kg.K)', { above: 0 }, 'c_p');
  const T0 = sheet.number('T0', 'K', { above: 0 }, 'T_0');
  const latentHeat = sheet.number('latent_heat', 'J/kg', { above: 0 }, '\\lambda');
  return { x0, vVapour, vLiquid, cp, T0, P0, latentHeat };
}

type Show = (key: string) => string;
const flashTex = (v: Show): string =>
  `\\frac{${v('cp')} \\cdot ${v('T0')} \\cdot ${v('P0 SI')}}{${v('v0 SI')}} \\left(\\frac{${v('v_vapour')} - ${v('v_liquid')}}{${v('latent_heat')}}\\right)^2`;
const vapourTex = (v: Show): string => `\\frac{${v('x0')} \\cdot ${v('v_vapour')}}{${v('v0 SI')}}`;

function omegaInfo(value: number, memory: boolean) {
  return {
    key: 'omega',
    tex: '\\omega',
    meaning: 'omega parameter',
    value,
    unit: '-',
    clause: OMEGA_CLAUSE,
    memory,
  };
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

function fromInlet(sheet: SheetBuilder, form: Form, P0: number): number {
  const inlet = readFlashInlet(sheet, P0);
  sheet.keep('P0 SI', P0, 'P_{0,Pa}');
  sheet.keep('v0 SI', mixtureVolume(inlet.x0, inlet.vVapour, inlet.vLiquid), 'v_{0,SI}');
  if (form === 'inlet properties')
    return sheet.step(
      omegaInfo(omegaFromProperties(inlet), true),
      (v) =>
        `${vapourTex(v)} \\left(1 - \\frac{2 \\cdot ${v('P0 SI')} (${v('v_vapour')} - ${v('v_liquid')})}{${v('latent_heat')}}\\right) + ${flashTex(v)}`,
    );
  const a = sheet.keep('a', BOILING_DELAY[sheet.word('delay_for', DELAYS, 'safety valve')]);
  const equilibrium = omegaDelayed(inlet, 0, omegaRatio).omega;
  sheet.step(
    {
      key: 'omega_e',
      tex: '\\omega_e',
      meaning: 'omega without delay of boiling',
      value: equilibrium,
      unit: '-',
      memory: true,
    },
    (v) => `${vapourTex(v)} + ${flashTex(v)}`,
  );
  sheet.step(
    {
      key: 'eta_e',
      tex: '\\eta_e',
      meaning: 'critical pressure ratio without delay',
      value: omegaRatio(equilibrium),
      unit: '-',
    },
    (v) => `\\eta_c(${v('omega_e')})`,
  );
  const { omega, N } = omegaDelayed(inlet, a, omegaRatio);
  sheet.step(
    {
      key: 'N',
      meaning: 'share of equilibrium boiling',
      value: N,
      unit: '-',
      clause: 'ISO 4126-10; Diener and Schmidt 2004',
      memory: true,
    },
    (v) =>
      `\\min\\left(1, \\left(${v('x0')} + \\frac{${v('cp')} \\cdot ${v('T0')} \\cdot ${v('P0 SI')} (${v('v_vapour')} - ${v('v_liquid')})}{${v('latent_heat')}^2} \\ln\\frac{1}{${v('eta_e')}}\\right)^{${v('a')}}\\right)`,
  );
  return sheet.step(
    { ...omegaInfo(omega, true), clause: 'ISO 4126-10; Diener and Schmidt 2004' },
    (v) => `${vapourTex(v)} + ${v('N')} \\cdot ${flashTex(v)}`,
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
  const ways: Record<Form, () => number> = {
    given: () => sheet.number('omega', '-', { min: 0 }, '\\omega'),
    'two volumes': () => fromTwoVolumes(sheet, v0, system),
    'inlet properties': () => fromInlet(sheet, form, P0),
    'delayed boiling': () => fromInlet(sheet, form, P0),
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
