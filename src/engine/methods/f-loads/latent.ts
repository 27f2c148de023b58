/* Vapour made by heat at the relieving pressure: W = Q/λ, shared by every load that boils a liquid. */
import { toSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { SYSTEM_UNITS, type System } from '../common/system';

/** The latent heat below which a liquid near its critical point makes W = Q/λ doubtful, J/kg (50 Btu/lb, practice). */
export const LATENT_FLOOR = 115_000;

/** Vapour load in kg/s from heat in W and latent heat in J/kg; 0 when no heat is left. */
export function vaporisation(heat: number, latentHeat: number): number {
  return Math.max(0, heat) / latentHeat;
}

/** The step W = Q/λ for a heat in the system's unit, kept under the key `q`; gives `relief_load`. */
export function vaporisationStep(sheet: SheetBuilder, heat: number, system: System): number {
  const u = SYSTEM_UNITS[system];
  const latent = sheet.number('latent_heat', u.latent, { above: 0 }, '\\lambda');
  if (toSI({ value: latent, unit: u.latent }) < LATENT_FLOOR)
    sheet.warn(
      'LATENT_HEAT_LOW',
      'The latent heat is below 115 kJ/kg (50 Btu/lb), as near the critical point: W = Q/λ is doubtful there.',
      '115 kJ/kg and above',
    );
  const value = system === 'SI' ? vaporisation(heat, latent * 1000) * 3600 : vaporisation(heat, latent);
  const load = sheet.step(
    { key: 'W', meaning: 'vapour made at relieving pressure', value, unit: u.W, clause: 'W = Q/λ' },
    (v) =>
      system === 'SI'
        ? `3.6 \\cdot \\frac{${v('q')}}{${v('latent_heat')}}`
        : `\\frac{${v('q')}}{${v('latent_heat')}}`,
  );
  sheet.output('relief_load', load, u.W);
  return load;
}
