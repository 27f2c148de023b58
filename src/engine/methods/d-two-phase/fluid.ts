/* The fluid of a sheet by its name or composition, and its state at rest ahead of the nozzle. */
import { type MethodInput } from '../../catalog/types';
import { fluidOf, readComposition } from '../../fluids';
import { type Inlet, inletAtQuality, inletAtTemperature } from '../../nozzle/inlet';
import { type PropertySource } from '../../properties/types';
import { type SheetBuilder } from '../../sheet';
import { WATER } from '../../water';
import { optional, input } from '../common/describe';

/** Fluid and inlet condition of the methods that work with properties. */
export const FLUID_INPUTS: readonly MethodInput[] = [
  input('fluid', 'fluid by name, or composition in mole fractions such as "propane 0.6; n-butane 0.4"'),
  optional('T0', 'temperature at the inlet (or x0)', 'temperature', { rangeKey: 'relievingTemperature' }),
  optional('x0', 'vapour mass fraction at the inlet, of a saturated or two-phase inlet', 'dimensionless', {
    rangeKey: 'quality',
  }),
];

const WATER_NAMES = /^(water|steam|water and steam|h2o)$/i;

/** The properties of the fluid that the sheet names: water by its own formulation, others by the cubic equation. */
export function readFluid(sheet: SheetBuilder): PropertySource {
  const words = sheet.inputs['fluid'];
  if (words === undefined || typeof words !== 'string' || words.trim() === '')
    sheet.refuse(
      'INPUT_MISSING',
      'fluid',
      'The fluid is missing: name a substance of the library, or a composition such as "propane 0.6; n-butane 0.4".',
    );
  if (WATER_NAMES.test(words.trim())) return WATER;
  const read = readComposition(words);
  if (!read.ok) sheet.refuse('FLUID_UNKNOWN', 'fluid', read.text);
  if (read.note !== undefined) sheet.warn('COMPOSITION_SCALED', read.note);
  const source = fluidOf(read.composition);
  if (!source)
    sheet.refuse(
      'FLUID_NOT_WORKED',
      'fluid',
      `The properties of "${words.trim()}" cannot be worked here; give a table of its isentrope instead (d.isentrope-table-integration).`,
    );
  return source;
}

/** The inlet at P0 (Pa) with T0 or x0 of the sheet; refuses what the formulation does not reach. */
export function readInlet(sheet: SheetBuilder, source: PropertySource, P0: number): Inlet {
  if (sheet.has('x0')) {
    if (sheet.has('T0') && source.pure)
      sheet.refuse(
        'INLET_TWICE',
        'x0',
        'Quality and temperature are both given; of a substance at saturation the pressure fixes the temperature. Leave one out.',
      );
    const x0 = sheet.number('x0', '-', { min: 0, max: 1 }, 'x_0');
    const inlet = inletAtQuality(source, P0, x0);
    if (inlet) return inlet;
    const kPa = (p: number) => `${Math.round(p / 100) / 10} kPa`;
    return sheet.refuse(
      'NO_SATURATION',
      'x0',
      `${source.name} has no saturated state at ${kPa(P0)}: its critical pressure is ${kPa(source.critical.P)}. Give the temperature (T0) instead.`,
    );
  }
  const T0 = sheet.number('T0', 'K', { above: 0 }, 'T_0');
  const inlet = inletAtTemperature(source, P0, T0);
  if (inlet) return inlet;
  return sheet.refuse(
    'OUTSIDE_FORMULATION',
    'T0',
    `The properties of ${source.name} do not reach ${T0.toPrecision(4)} K at ${(P0 / 1000).toPrecision(4)} kPa (${source.source}).`,
  );
}

/** The effective coefficient of discharge that API 520-1 gives for the phase at the inlet (from memory). */
export function defaultKd(inlet: Inlet): number {
  if (inlet.phase === 'subcooled liquid') return 0.65;
  return inlet.phase === 'vapour' || inlet.phase === 'supercritical' ? 0.975 : 0.85;
}
