/* Method f.thermal-expansion: a blocked-in liquid that is warmed. */
import { type Method } from '../../catalog/types';
import { convert, fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { systemOf } from '../common/system';

const CLAUSE = 'API 521, hydraulic expansion';

/** Volume flow in m³/s: α in 1/K, heat in W, density in kg/m³, heat capacity in J/(kg·K). Compressibility neglected. */
export function thermalExpansion(alpha: number, heat: number, density: number, cp: number): number {
  return (alpha * heat) / (density * cp);
}

/** The density in kg/m³: `rho`, or G times 1 000 kg/m³ as in the printed equation. */
function density(sheet: SheetBuilder): number {
  if (sheet.has('rho')) return sheet.number('rho', 'kg/m3', { above: 0 }, '\\rho');
  const G = sheet.number('G', '-', { above: 0 });
  return sheet.step(
    { key: 'rho', tex: '\\rho', meaning: 'density', value: 1000 * G, unit: 'kg/m3' },
    (v) => `1000 \\cdot ${v('G')}`,
  );
}

/** f.thermal-expansion: volumetric load of a warmed liquid. */
export const THERMAL_EXPANSION: Method = {
  id: 'f.thermal-expansion',
  version: 1,
  topic: 'f.thermal-expansion',
  title: 'Thermal expansion of a blocked-in liquid',
  editions: ['API 521, 5th to 7th edition'],
  source: 'API Standard 521, hydraulic expansion q = α φ/(1000 d c) (from memory)',
  validity:
    'Liquid that does not boil below the relieving pressure; α at the temperature of interest; liquid compressibility neglected.',
  inputs: [
    input('expansion_coefficient', 'cubic expansion coefficient', 'cubic-expansion', {
      rangeKey: 'cubicExpansion',
    }),
    input('heat_input', 'heat input', 'power', { rangeKey: 'heatInput' }),
    optional('G', 'relative density to water (or give rho)', 'dimensionless'),
    optional('rho', 'liquid density', 'density', { rangeKey: 'liquidDensity' }),
    input('cp', 'heat capacity of the liquid', 'heat-capacity', { rangeKey: 'cpLiquid' }),
  ],
  outputs: [
    output('volumetric_load', 'volume flow to be relieved', 'volume-flow'),
    output('relief_load', 'its mass flow', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['heat_input', 'expansion_coefficient']);
      const alpha = sheet.number('expansion_coefficient', '1/K', { min: 0 }, '\\alpha');
      const heat = sheet.number('heat_input', 'W', { min: 0 }, '\\varphi');
      const rho = density(sheet);
      const cp = sheet.number('cp', 'J/(kg.K)', { above: 0 }, 'c');
      const si = thermalExpansion(alpha, heat, rho, cp);
      sheet.step(
        {
          key: 'q',
          meaning: 'volume flow to be relieved',
          value: convert(fromSI(si, 'm3/s'), 'm3/h'),
          unit: 'm3/h',
          clause: CLAUSE,
          memory: true,
        },
        (v) =>
          `3600 \\cdot \\frac{${v('expansion_coefficient')} \\cdot ${v('heat_input')}}{${v('rho')} \\cdot ${v('cp')}}`,
      );
      const [flow, load] = system === 'SI' ? ['m3/h', 'kg/h'] : ['US gpm', 'lb/h'];
      sheet.output('volumetric_load', fromSI(si, flow ?? 'm3/h').value, flow);
      const W = sheet.step(
        { key: 'W', meaning: 'relief load', value: si * rho * 3600, unit: 'kg/h' },
        (v) => `${v('rho')} \\cdot ${v('q')}`,
      );
      sheet.output('relief_load', fromSI(W / 3600, load ?? 'kg/h').value, load);
    });
  },
};
