/* Reading a liquid flow: volume flow and relative density, or mass flow and density. */
import { convert, fromSI, toSI } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { SYSTEM_UNITS, type System } from '../common/system';
import { WATER_DENSITY } from './flow';

const DENSITY_UNIT: Record<System, string> = { SI: 'kg/m3', US: 'lb/ft3' };

function relativeDensity(sheet: SheetBuilder, system: System): number {
  if (sheet.has('G')) return sheet.number('G', '-', { above: 0 });
  if (!sheet.has('rho'))
    sheet.refuse('INPUT_MISSING', 'G', 'The relative density (G) or the liquid density (rho) is missing.');
  const unit = DENSITY_UNIT[system];
  const rho = sheet.number('rho', unit, { above: 0 }, '\\rho');
  const water = sheet.keep('rho_w', fromSI(WATER_DENSITY, unit).value, '\\rho_w');
  return sheet.step(
    { key: 'G', meaning: 'relative density to water at 15 °C', value: rho / water, unit: '-' },
    (v) => `\\frac{${v('rho')}}{${v('rho_w')}}`,
  );
}

/** The volume flow (L/min or US gpm) and relative density G of a liquid. */
export function readFlow(sheet: SheetBuilder, system: System): { Q: number; G: number } {
  const u = SYSTEM_UNITS[system];
  const G = relativeDensity(sheet, system);
  if (sheet.has('Q')) return { Q: sheet.number('Q', u.Q, { above: 0 }), G };
  if (!sheet.has('W') || !sheet.has('rho'))
    sheet.refuse(
      'INPUT_MISSING',
      'Q',
      'The volume flow (Q), or the relief load (W) with the density (rho), is missing.',
    );
  const W = sheet.number('W', u.W, { above: 0 });
  const rho = sheet.quantity('rho');
  const value = convert(fromSI(toSI({ value: W, unit: u.W }) / toSI(rho), 'm3/h'), u.Q);
  const tex = system === 'SI' ? '\\frac{1000}{60}' : '\\frac{7.48052}{60}';
  const Q = sheet.step(
    { key: 'Q', meaning: 'volume flow at the inlet', value, unit: u.Q },
    (v) => `${tex} \\cdot \\frac{${v('W')}}{${v('rho')}}`,
  );
  sheet.output('Q', Q, u.Q);
  return { Q, G };
}
