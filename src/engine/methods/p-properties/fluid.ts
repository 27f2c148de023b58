/* The fluid of a property sheet: from the library or water, beside figures of the user's own. */
import { type MethodInput } from '../../catalog/types';
import { binaryParameter, BINARY_SOURCE, type CubicFluid, FLUID_SOURCES } from '../../fluids';
import { type PropertySource } from '../../properties/types';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { readFluid } from '../d-two-phase/fluid';

/** Where the governing figures come from. */
export const USES = ['library', 'own figures'] as const;

/** The fluid, and which figures govern when both exist. */
export const FLUID_INPUTS: readonly MethodInput[] = [
  optional('fluid', 'fluid by name, or composition in mole fractions such as "propane 0.6; n-butane 0.4"'),
  optional(
    'use',
    'which figures govern when own figures stand beside those worked here (the library when not given)',
    undefined,
    {
      words: [...USES],
    },
  ),
];

/** A fluid whose properties are worked; `cubic` when it is of the library. */
export type Worked = { source: PropertySource; cubic?: CubicFluid };

function isCubic(source: PropertySource): source is CubicFluid {
  return 'mixture' in source;
}

/** The keys of the sources of the equation's data of a fluid, without repetition. */
function dataSources({ mixture }: CubicFluid): string[] {
  const keys = mixture.substances.flatMap((s) => [s.Tc[1], s.twu[1], s.cp.source]);
  return [...new Set(keys)].map((key) => FLUID_SOURCES[key]);
}

/** Pairs of the composition for which no interaction parameter is known. */
function unknownPairs({ mixture }: CubicFluid): string[] {
  const names = mixture.substances.map((s) => s.name);
  return names.flatMap((one, i) =>
    names.slice(i + 1).flatMap((two) => (binaryParameter(one, two).known ? [] : [`${one} with ${two}`])),
  );
}

const APART = ['water', 'ethylene glycol'];

function warnOfPairs(sheet: SheetBuilder, fluid: CubicFluid): void {
  const names = fluid.mixture.substances.map((s) => s.name);
  const pairs = unknownPairs(fluid);
  if (pairs.length > 0) {
    const shown = pairs.slice(0, 4).join(', ');
    const rest = pairs.length > 4 ? ` and ${pairs.length - 4} more` : '';
    sheet.warn(
      'BINARY_UNKNOWN',
      `No interaction parameter is known for ${shown}${rest}; it is taken as 0. Between unlike substances the boiling points may be off by several kelvin.`,
    );
  }
  if (names.length > 1 && names.some((n) => APART.includes(n)))
    sheet.warn(
      'TWO_LIQUIDS',
      'Water and glycols part from hydrocarbons as a second liquid, which boils apart. This sheet knows one liquid only: check the mixture in a three-phase calculation.',
    );
}

/** The fluid the sheet names, with a line that says equation and data; undefined when only own figures are given. */
export function readWorked(sheet: SheetBuilder): Worked | undefined {
  if (!sheet.has('fluid')) return undefined;
  const source = readFluid(sheet);
  if (!isCubic(source)) {
    sheet.say({
      symbol: '\\text{fluid}',
      meaning: `${source.name}: ${source.source}`,
      value: 'water',
      tex: '\\text{water and steam}',
    });
    return { source };
  }
  const { mixture } = source;
  const kind = mixture.n === 1 ? 'library' : 'composition';
  sheet.say({
    symbol: '\\text{fluid}',
    meaning: `${source.name}: ${source.source}`,
    value: kind,
    tex: `\\text{${kind}}`,
    clause: dataSources(source).join('; '),
  });
  if (mixture.n > 1) {
    sheet.say({
      symbol: 'k_{ij}',
      meaning: `binary interaction parameters: ${BINARY_SOURCE}`,
      value: `${(mixture.n * (mixture.n - 1)) / 2 - unknownPairs(source).length} known`,
      tex: 'a = \\sum_i \\sum_j z_i z_j \\sqrt{a_i a_j}\\,(1 - k_{ij})',
    });
    warnOfPairs(sheet, source);
  }
  return { source, cubic: source };
}

/** Difference between own and worked figures above which the sheet says so: common practice, no source. */
const DIFFERS = 0.05;

/** One property that may come from two sides: its name, meaning, symbol and unit. */
export type Figure = { name: string; meaning: string; tex: string; unit: string };

/** Whether own figures govern: the word of the sheet, or that nothing else is there. */
export function ownGovern(sheet: SheetBuilder, worked: unknown): boolean {
  return sheet.word('use', USES, worked === undefined ? 'own figures' : 'library') === 'own figures';
}

/**
 * Settles one figure: shows the user's own (input `own_<name>`) beside the worked one with their difference, and gives
 * the output of the side that governs. Own figures that are missing leave the worked one; undefined when neither is there.
 */
export function settle(
  sheet: SheetBuilder,
  figure: Figure,
  worked: number | undefined,
  ownGoverns: boolean,
): number | undefined {
  const { name, meaning, tex, unit } = figure;
  const input = `own_${name}`;
  const own = sheet.has(input) ? sheet.number(input, unit, { above: 0 }, `${tex}^{own}`) : undefined;
  const value = ownGoverns ? (own ?? worked) : (worked ?? own);
  if (value === undefined) return undefined;
  sheet.output(name, value, unit);
  if (own === undefined || worked === undefined) return value;
  sheet.keep(`${name} worked`, worked, tex);
  const off = sheet.step(
    {
      key: `${name} off`,
      tex: `\\Delta ${tex}`,
      meaning: `own ${meaning} against the one worked here`,
      value: (own / worked - 1) * 100,
      unit: '%',
    },
    (v) => `100 \\left(\\frac{${v(input)}}{${v(`${name} worked`)}} - 1\\right)`,
  );
  if (Math.abs(off) > DIFFERS * 100)
    sheet.warn(
      'SOURCES_DIFFER',
      `The own ${meaning} differs from the one worked here by ${off.toFixed(1)} %; ${ownGoverns ? 'the own figure' : 'the one worked here'} governs. Find out which is right.`,
      'within 5 %',
    );
  return value;
}
