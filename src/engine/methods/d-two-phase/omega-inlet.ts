/* Omega from the properties of the inlet on a sheet, in equilibrium or with boiling delayed; the equations in coherent SI. */
import { type SheetBuilder } from '../../sheet';
import { OMEGA_CLAUSE } from './common';
import { omegaRatio } from './omega';
import {
  BOILING_DELAY,
  type FlashInlet,
  mixtureVolume,
  omegaDelayed,
  omegaFromProperties,
} from './omega-forms';

/** What may delay boiling. */
export const DELAYS = Object.keys(BOILING_DELAY) as (keyof typeof BOILING_DELAY)[];

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

/** How omega stands on a sheet. */
export function omegaInfo(value: number, memory: boolean) {
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

/** Omega from inlet properties, or with boiling delayed; P0 in Pa. */
export function fromInlet(
  sheet: SheetBuilder,
  form: 'inlet properties' | 'delayed boiling',
  P0: number,
): number {
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
