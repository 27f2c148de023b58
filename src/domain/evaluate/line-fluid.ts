/* What flows in a line: the fluid of an answer, as numbers for the arithmetic and as inputs with their paths for a sheet. */
import { type Fluid, type Path, quantityOf } from '@domain/basis';
import { fromSI, type Q, toSI } from '@engine/quantity';
import { fluidOf, fluidValues } from './implicit';
import { outputOf } from './sheets';
import { type CredibleAnswer, type Work } from './work';

type Sourced = { q: Q; path: Path };
export type LineInputs = Record<string, Sourced>;

/** A fluid in a line: SI numbers, and the same as inputs of the line methods. */
export type LineFluid = { inputs: LineInputs; mu: number; fluid: Fluid } & (
  | { kind: 'gas'; T: number; Z: number; M: number; k: number }
  | { kind: 'liquid'; rho: number }
  | { kind: 'mixture'; P0: number; v0: number; omega: number }
);

const NAMES = {
  gas: ['T', 'Z', 'M', 'k', 'mu'],
  liquid: ['rho', 'mu'],
  mixture: ['v0'],
} as const;

function kindOf(fluid: Fluid): LineFluid['kind'] {
  if (fluid.phase === 'liquid') return 'liquid';
  return fluid.phase === 'two-phase' || fluid.phase === 'flashing-liquid' ? 'mixture' : 'gas';
}

function read(
  work: Work,
  ca: CredibleAnswer,
  fluid: Fluid,
  names: readonly string[],
): LineInputs | undefined {
  const values = fluidValues(work, fluid);
  const own = quantityOf(ca.answer.T);
  const inputs: LineInputs = {};
  for (const name of names) {
    const found = values[name]?.();
    if (typeof found?.value !== 'object') return undefined;
    inputs[name] = { q: found.value, path: found.path };
  }
  if (own && 'T' in inputs)
    inputs['T'] = { q: own, path: `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/T` };
  return inputs;
}

/** Omega by the specific volumes at the inlet and at nine tenths of its pressure; viscosity of the liquid, which wets the wall. */
function mixtureOf(work: Work, ca: CredibleAnswer, fluid: Fluid): LineFluid | undefined {
  const inputs = read(work, ca, fluid, NAMES.mixture);
  const v9 = quantityOf(fluid.v9);
  const mu = quantityOf(fluid.muLiquid) ?? quantityOf(fluid.muVapour);
  const P0 = outputOf(work.sheets[`limit:${ca.id}`], 'P1');
  const v0 = inputs?.['v0'];
  if (!inputs || !v0 || !v9 || !mu || !P0) return undefined;
  const omega = 9 * (toSI(v9) / toSI(v0.q) - 1);
  if (!(omega >= 0)) return undefined;
  const at = `fluids/${fluid.id}`;
  inputs['omega'] = { q: { value: omega, unit: '-' }, path: `${at}/v9` };
  inputs['P0'] = { q: P0, path: `sheets/limit:${ca.id}#P1` };
  inputs['mu'] = { q: mu, path: fluid.muLiquid ? `${at}/muLiquid` : `${at}/muVapour` };
  return { kind: 'mixture', inputs, mu: toSI(mu), fluid, P0: toSI(P0), v0: toSI(v0.q), omega };
}

/** The fluid of an answer as lines need it; nothing while a figure is not known. */
export function lineFluid(work: Work, ca: CredibleAnswer): LineFluid | undefined {
  const fluid = fluidOf(work, ca);
  if (!fluid) return undefined;
  const kind = kindOf(fluid);
  if (kind === 'mixture') return mixtureOf(work, ca, fluid);
  const inputs = read(work, ca, fluid, NAMES[kind]);
  if (!inputs) return undefined;
  const number = (name: string) => (inputs[name] ? toSI(inputs[name].q) : Number.NaN);
  const mu = number('mu');
  if (!(mu > 0)) return undefined;
  if (kind === 'liquid')
    return number('rho') > 0 ? { kind, inputs, mu, fluid, rho: number('rho') } : undefined;
  const gas = { T: number('T'), Z: number('Z'), M: number('M'), k: number('k') };
  if (!(gas.T > 0 && gas.Z > 0 && gas.M > 0 && gas.k >= 1)) return undefined;
  return { kind, inputs, mu, fluid, ...gas };
}

/** The first figure of a fluid that a line would need and does not have: its path and a sentence. */
export function lackingInLine(work: Work, ca: CredibleAnswer): { field: Path; text: string } | undefined {
  const fluid = fluidOf(work, ca);
  if (!fluid) return undefined;
  const kind = kindOf(fluid);
  const at = `fluids/${fluid.id}`;
  const wanted: [keyof Fluid, string][] =
    kind === 'liquid'
      ? [
          ['rhoLiquid', 'density of the liquid'],
          ['muLiquid', 'viscosity of the liquid'],
        ]
      : kind === 'mixture'
        ? [
            ['v0', 'specific volume at the inlet'],
            ['v9', 'specific volume at nine tenths of the inlet pressure'],
            ['muLiquid', 'viscosity of the liquid'],
          ]
        : [
            ['T', 'temperature'],
            ['Z', 'compressibility factor'],
            ['M', 'molar mass'],
            ['k', 'ratio of specific heats'],
            ['muVapour', 'viscosity of the vapour'],
          ];
  const missing = wanted.find(([field]) => quantityOf(fluid[field] as Fluid['T']) === undefined);
  if (!missing) return undefined;
  return {
    field: `${at}/${missing[0]}`,
    text: `The ${missing[1]} of ${fluid.name} is not known: without it the line cannot be worked.`,
  };
}

/** A pressure in the absolute unit of a basis. */
export function absoluteQ(work: Work, pa: number): Q {
  return fromSI(pa, work.basis.units === 'US' ? 'psia' : 'kPa_abs');
}
